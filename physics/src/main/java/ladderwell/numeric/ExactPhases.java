package ladderwell.numeric;

import java.util.Optional;
import org.jspecify.annotations.Nullable;

/**
 * Coefficients c_k e^{-i E_k t_j} of a state on levels E_k at times t_j, with phases reduced mod 2π so that their error does not grow
 * with E t.
 *
 * <p>Energies are double-double, E = high + low; times are the doubles given, taken as exact numbers. When the times lie on a uniform
 * grid to rounding, t_j = T_q + T_r + δ_j with j = qB + r, most sines and cosines are saved: the factor is the product of one entry for
 * T_q and one for T_r (both double-double), and e^{-iEδ_j}, which carries the rounding of the stored time, by its Taylor series.
 *
 * <p>Objects do not change; all methods may be called from several threads.
 *
 * @units E t is an angle in rad: energies in any unit, times in its inverse (ħ = 1)
 */
public final class ExactPhases {
    /** Largest |E t|, in rad, that is accepted. */
    public static final double LARGEST_PHASE = 0x1p56;

    private static final double U = 0x1p-53;

    /** Rounding of one complex product (Jeannerod, Kornerup, Louvet and Muller 2017: √5 u, 2 u with fused multiply-add). */
    private static final double PRODUCT_ERROR = 2.25 * U;

    /** Largest E δ for 1 - iEδ: remainder 2^-57. */
    private static final double FIRST_ORDER = 0x1p-28;

    /** Largest E δ for the series to (Eδ)³: remainder below 2^-56.5. */
    private static final double THIRD_ORDER = 0x1p-13;

    private static final double MINUS_SIXTH = -1.0 / 6;

    /** Fewer times than this do not pay for a table. */
    private static final int FEWEST_FOR_TABLE = 12;

    /** Up to this many levels the tables of T_r are kept; above, each is made when needed (all would be 0.5 kB per level). */
    private static final int KEPT_LEVELS = 4096;

    /** Levels handled together: their table, 32 rows of 2 × 256 numbers, fits a second-level cache. */
    static final int LEVEL_BLOCK = 256;

    private final double[] energyHigh;
    private final double[] energyLow;
    private final double[] re;
    private final double[] im;
    private final double[] times;
    private final double largestPhase;
    private final double phaseError;
    private final Grid grid;
    private Table @Nullable [] kept; // guarded by this

    /**
     * E t mod 2π in [-π, π] (to rounding).
     *
     * @units rad
     * @accuracy absolute error at most 2.5e-16 + |E t| 2^-100
     * @throws IllegalArgumentException if an argument is not finite or |E t| exceeds {@link #LARGEST_PHASE}
     */
    public static double reduced(double energyHigh, double energyLow, double time) {
        requireFinite(energyHigh, "energy", 0);
        requireFinite(energyLow, "energy", 0);
        requireFinite(time, "time", 0);
        double high = energyHigh + energyLow;
        requireReducible(Math.abs(high * time));
        double low = PhaseFactors.sumError(energyHigh, energyLow, high);
        PhaseFactors.Angle angle = PhaseFactors.Angle.of(high, low, time, 0);
        int quadrant = angle.quadrant() & 3;
        int signed = quadrant == 3 || (quadrant == 2 && angle.high() > 0) ? quadrant - 4 : quadrant;
        double turned = signed * PhaseFactors.PI_2_HIGH;
        double sum = turned + angle.high();
        double error = PhaseFactors.sumError(turned, angle.high(), sum);
        return sum + (error + angle.low() + signed * PhaseFactors.PI_2_MIDDLE);
    }

    /**
     * Phases for levels with energies high + low, initial coefficients re + i im, at the given times. The arrays are copied.
     *
     * @shape energyHigh, energyLow, re, im are [levels]; times is [times], in any order
     * @throws IllegalArgumentException if lengths differ, a number is not finite, or some |E t| exceeds {@link #LARGEST_PHASE}
     */
    public static ExactPhases of(double[] energyHigh, double[] energyLow, double[] re, double[] im, double[] times) {
        int levels = energyHigh.length;
        requireLength(energyLow, levels, "low parts of energies");
        requireLength(re, levels, "real parts");
        requireLength(im, levels, "imaginary parts");
        double[] high = new double[levels];
        double[] low = new double[levels];
        for (int k = 0; k < levels; k++) {
            high[k] = requireFinite(energyHigh[k] + requireFinite(energyLow[k], "energy", k), "energy", k);
            low[k] = PhaseFactors.sumError(energyHigh[k], energyLow[k], high[k]);
            requireFinite(re[k], "coefficient", k);
            requireFinite(im[k], "coefficient", k);
        }
        for (int j = 0; j < times.length; j++) {
            requireFinite(times[j], "time", j);
        }
        requireReducible(largest(high) * largest(times));
        return new ExactPhases(high, low, re.clone(), im.clone(), times.clone(), 0);
    }

    private ExactPhases(
            double[] energyHigh, double[] energyLow, double[] re, double[] im, double[] times, double energyError) {
        this.energyHigh = energyHigh;
        this.energyLow = energyLow;
        this.re = re;
        this.im = im;
        this.times = times;
        double largestEnergy = largest(energyHigh);
        double largestTime = largest(times);
        largestPhase = largestEnergy * largestTime;
        phaseError = energyError * largestTime;
        grid = Grid.through(times, largestEnergy, largestTime, largestPhase);
    }

    /** The tables of T_r for each block of levels, made at the first call; none for irregular times or too many levels. */
    private synchronized Table[] kept() {
        if (kept == null) {
            int levels = levels();
            boolean keep = grid.uniform() && levels <= KEPT_LEVELS;
            kept = new Table[keep ? (levels + LEVEL_BLOCK - 1) / LEVEL_BLOCK : 0];
            for (int i = 0; i < kept.length; i++) {
                kept[i] = new Table(i * LEVEL_BLOCK, Math.min(levels, (i + 1) * LEVEL_BLOCK));
            }
        }
        return kept;
    }

    /**
     * The same coefficients in a frame that turns with the ladder, c_k e^{i(E_m + (k - m)Ω)t}: what is left of the energies is their
     * curvature about level m. Errors of the new energies enter {@link #errorBound}. Empty when that does not make phases smaller.
     *
     * @param rate Ω, taken as an exact number
     */
    Optional<ExactPhases> turning(int m, double rate) {
        int levels = levels();
        double[] high = new double[levels];
        double[] low = new double[levels];
        for (int k = 0; k < levels; k++) {
            double difference = energyHigh[k] - energyHigh[m];
            double lowPart =
                    PhaseFactors.sumError(energyHigh[k], -energyHigh[m], difference) + (energyLow[k] - energyLow[m]);
            double turned = (k - m) * rate;
            double rest = difference - turned;
            lowPart += PhaseFactors.sumError(difference, -turned, rest) - Math.fma(k - m, rate, -turned);
            high[k] = rest + lowPart;
            low[k] = PhaseFactors.sumError(rest, lowPart, high[k]);
        }
        double largest = largest(energyHigh);
        if (!(largest(high) <= largest)) {
            return Optional.empty();
        }
        // Every rounding above is of a number below 2^-51 (2 largest + levels Ω).
        double error = 0x1p-102 * (largest + levels * Math.abs(rate));
        return Optional.of(new ExactPhases(high, low, re, im, times, error));
    }

    /** The number of levels. */
    public int levels() {
        return energyHigh.length;
    }

    /** The number of times. */
    public int times() {
        return times.length;
    }

    /** The j-th time. */
    public double time(int j) {
        return times[j];
    }

    /** Whether the times lie on a uniform grid (to rounding), so that the two-level table is used. */
    public boolean onUniformGrid() {
        return grid.uniform();
    }

    /**
     * Writes the coefficients at times fromTime … toTime-1. May be called from several threads for separate rows.
     *
     * @shape re and im are [at least toTime - fromTime][at least levels]; row r is time fromTime + r
     * @throws java.util.concurrent.CancellationException if the thread is interrupted
     */
    public void fill(int fromTime, int toTime, double[][] re, double[][] im) {
        if (fromTime < 0 || toTime > times.length || fromTime > toTime) {
            throw new IllegalArgumentException(
                    "times " + fromTime + " to " + toTime + ", expected a range within 0 to " + times.length);
        }
        int rows = toTime - fromTime;
        Table[] tables = kept();
        for (int level = 0; level < levels(); level += LEVEL_BLOCK) {
            int to = Math.min(levels(), level + LEVEL_BLOCK);
            Block block =
                    tables.length > 0 ? new Block(level, to, tables[level / LEVEL_BLOCK]) : block(level, to, rows);
            for (int j = 0; j < rows; j++) {
                Interruption.check();
                block.write(fromTime + j, re[j], im[j], level);
            }
        }
    }

    /**
     * Guaranteed bound on |computed - exact| / |c_k| for every coefficient and time, against the given energies, times and c_k as exact
     * numbers, for coefficients of at least 1e-290 in size (below, the absolute error is at most 1e-305).
     */
    public double errorBound() {
        double one = PhaseFactors.ERROR + PRODUCT_ERROR + 0.01 * U + phaseError;
        if (!grid.uniform()) {
            return one;
        }
        // First order: one rounding per part and the remainder 2^-57. Third order: series, remainder and a complex
        // product.
        double shift = grid.firstOrder() ? 1.1 * U : 2 * U + PRODUCT_ERROR;
        return one + PhaseFactors.ERROR + PRODUCT_ERROR + shift;
    }

    double initialRe(int level) {
        return re[level];
    }

    double initialIm(int level) {
        return im[level];
    }

    double energy(int level) {
        return energyHigh[level];
    }

    /**
     * Writes e^{-i rate t} at all times.
     *
     * @accuracy {@link PhaseFactors#ERROR}, the rate taken as an exact number
     */
    void writeTurns(double rate, double[] toRe, double[] toIm) {
        // E t is symmetric: here the times stand where levels stand elsewhere, so that one energy serves many times.
        double phase = Math.abs(rate) * largest(times);
        new PhaseFactors(times.length).write(times, new double[times.length], times.length, rate, 0, phase, toRe, toIm);
    }

    /**
     * The levels from … to-1, for one thread. Levels outside 0 … {@link #levels} count as empty.
     *
     * @param rows about how many rows will be asked for; decides whether a table pays
     */
    Block block(int from, int to, int rows) {
        return new Block(from, to, grid.uniform() && rows >= 2 * grid.period() ? new Table(from, to) : null);
    }

    /** A part of an array over levels; 0 outside. */
    private double[] part(double[] array, int from, int to) {
        double[] part = new double[to - from];
        int start = Math.max(0, from);
        int end = Math.min(array.length, to);
        if (end > start) {
            System.arraycopy(array, start, part, start - from, end - start);
        }
        return part;
    }

    /** Factors e^{-i E T_r} for r = 0 … B-1 and a range of levels. */
    private final class Table {
        final double[][] re;
        final double[][] im;

        Table(int from, int to) {
            int length = to - from;
            re = new double[grid.period()][length];
            im = new double[grid.period()][length];
            double[] high = part(energyHigh, from, to);
            double[] low = part(energyLow, from, to);
            PhaseFactors factors = new PhaseFactors(length);
            for (int r = 0; r < re.length; r++) {
                factors.write(high, low, length, grid.fineHigh(r), grid.fineLow(r), largestPhase, re[r], im[r]);
            }
        }
    }

    /** A range of levels on its way through time; keeps the last entry for T_q. */
    final class Block {
        private final int length;
        private final @Nullable Table table;
        private final PhaseFactors factors;
        // All arrays of a block begin at its first level: see PhaseFactors on offsets.
        private final double[] high;
        private final double[] low;
        private final double[] startRe;
        private final double[] startIm;
        private final double[] coarseRe;
        private final double[] coarseIm;
        private final double[] scratchRe;
        private final double[] scratchIm;
        private int coarse = -1;

        private Block(int from, int to, @Nullable Table table) {
            length = to - from;
            this.table = table;
            factors = new PhaseFactors(length);
            high = part(energyHigh, from, to);
            low = part(energyLow, from, to);
            startRe = part(re, from, to);
            startIm = part(im, from, to);
            coarseRe = new double[length];
            coarseIm = new double[length];
            scratchRe = new double[length];
            scratchIm = new double[length];
        }

        /** Writes the coefficients at the j-th time to entries at, at + 1, … */
        void write(int j, double[] toRe, double[] toIm, int at) {
            if (at == 0) {
                write(j, toRe, toIm);
            } else {
                write(j, scratchRe, scratchIm);
                System.arraycopy(scratchRe, 0, toRe, at, length);
                System.arraycopy(scratchIm, 0, toIm, at, length);
            }
        }

        private void write(int j, double[] toRe, double[] toIm) {
            if (table == null) {
                factors.write(high, low, length, times[j], 0, largestPhase, toRe, toIm);
                multiply(startRe, startIm, toRe, toIm, length);
                return;
            }
            int q = j / grid.period();
            if (q != coarse) {
                factors.write(
                        high, low, length, grid.coarseHigh(q), grid.coarseLow(q), largestPhase, coarseRe, coarseIm);
                multiply(startRe, startIm, coarseRe, coarseIm, length);
                coarse = q;
            }
            int r = j - q * grid.period();
            double shift = grid.shift(j);
            if (grid.firstOrder()) {
                productFirstOrder(coarseRe, coarseIm, table.re[r], table.im[r], high, shift, toRe, toIm, length);
            } else {
                productThirdOrder(coarseRe, coarseIm, table.re[r], table.im[r], high, shift, toRe, toIm, length);
            }
        }
    }

    /** to = c · to. */
    private static void multiply(double[] re, double[] im, double[] toRe, double[] toIm, int length) {
        for (int k = 0; k < length; k++) {
            double a = re[k];
            double b = im[k];
            double c = toRe[k];
            double d = toIm[k];
            toRe[k] = Math.fma(a, c, -(b * d));
            toIm[k] = Math.fma(a, d, b * c);
        }
    }

    /** to = p · q · (1 - iy), y = E shift. */
    private static void productFirstOrder(
            double[] pRe,
            double[] pIm,
            double[] qRe,
            double[] qIm,
            double[] energy,
            double shift,
            double[] toRe,
            double[] toIm,
            int length) {
        for (int k = 0; k < length; k++) {
            double a = pRe[k];
            double b = pIm[k];
            double c = qRe[k];
            double d = qIm[k];
            double x = Math.fma(a, c, -(b * d));
            double z = Math.fma(a, d, b * c);
            double y = energy[k] * shift;
            toRe[k] = Math.fma(y, z, x);
            toIm[k] = Math.fma(-y, x, z);
        }
    }

    /** to = p · q · (1 - y²/2 - i(y - y³/6)), y = E shift. */
    private static void productThirdOrder(
            double[] pRe,
            double[] pIm,
            double[] qRe,
            double[] qIm,
            double[] energy,
            double shift,
            double[] toRe,
            double[] toIm,
            int length) {
        for (int k = 0; k < length; k++) {
            double a = pRe[k];
            double b = pIm[k];
            double c = qRe[k];
            double d = qIm[k];
            double x = Math.fma(a, c, -(b * d));
            double z = Math.fma(a, d, b * c);
            double y = energy[k] * shift;
            double cosine = Math.fma(y * y, -0.5, 1.0);
            double sine = Math.fma(y * y, y * MINUS_SIXTH, y);
            toRe[k] = Math.fma(sine, z, cosine * x);
            toIm[k] = Math.fma(-sine, x, cosine * z);
        }
    }

    /**
     * The uniform grid through given times: T_q = t_0 + q B h and T_r = r h in double-double, h = (t_last - t_0)/(count - 1), and the
     * exact differences δ_j to the stored times.
     */
    private record Grid(
            boolean uniform,
            boolean firstOrder,
            int period,
            double[] coarseHighs,
            double[] coarseLows,
            double[] fineHighs,
            double[] fineLows,
            double[] shifts) {
        private static final double[] NONE = {};
        private static final Grid IRREGULAR = new Grid(false, false, 1, NONE, NONE, NONE, NONE, NONE);

        double coarseHigh(int q) {
            return coarseHighs[q];
        }

        double coarseLow(int q) {
            return coarseLows[q];
        }

        double fineHigh(int r) {
            return fineHighs[r];
        }

        double fineLow(int r) {
            return fineLows[r];
        }

        double shift(int j) {
            return shifts[j];
        }

        static Grid through(double[] times, double largestEnergy, double largestTime, double largestPhase) {
            int count = times.length;
            if (count < FEWEST_FOR_TABLE || largestPhase > PhaseFactors.FAST_LIMIT || largestTime > 0x1p1000) {
                return IRREGULAR;
            }
            double start = times[0];
            double span = times[count - 1] - start;
            double spanLow = PhaseFactors.sumError(times[count - 1], -start, span);
            double step = span / (count - 1);
            double stepLow = (Math.fma(-step, count - 1, span) + spanLow) / (count - 1);
            int period = Math.max(8, Math.min(128, (int) Math.round(Math.sqrt(count))));
            int blocks = (count + period - 1) / period;
            double[] fineHighs = new double[period];
            double[] fineLows = new double[period];
            for (int r = 0; r < period; r++) {
                fineHighs[r] = r * step;
                fineLows[r] = Math.fma(r, step, -fineHighs[r]) + r * stepLow;
            }
            double[] coarseHighs = new double[blocks];
            double[] coarseLows = new double[blocks];
            for (int q = 0; q < blocks; q++) {
                double high = (double) q * period * step;
                double low = Math.fma((double) q * period, step, -high) + (double) q * period * stepLow;
                double sum = start + high;
                coarseHighs[q] = sum;
                coarseLows[q] = PhaseFactors.sumError(start, high, sum) + low;
            }
            double[] shifts = new double[count];
            double largest = 0;
            for (int j = 0; j < count; j++) {
                int q = j / period;
                int r = j - q * period;
                double first = times[j] - coarseHighs[q];
                double firstLow = PhaseFactors.sumError(times[j], -coarseHighs[q], first);
                double second = first - fineHighs[r];
                double secondLow = PhaseFactors.sumError(first, -fineHighs[r], second);
                shifts[j] = second + (firstLow + secondLow - coarseLows[q] - fineLows[r]);
                largest = Math.max(largest, Math.abs(shifts[j]));
            }
            double angle = largestEnergy * largest;
            if (largest > 4 * Math.ulp(largestTime) || angle > THIRD_ORDER) {
                return IRREGULAR;
            }
            return new Grid(true, angle <= FIRST_ORDER, period, coarseHighs, coarseLows, fineHighs, fineLows, shifts);
        }
    }

    private static double largest(double[] numbers) {
        double largest = 0;
        for (double number : numbers) {
            largest = Math.max(largest, Math.abs(number));
        }
        return largest;
    }

    private static void requireReducible(double phase) {
        if (!(phase <= LARGEST_PHASE)) {
            throw new IllegalArgumentException("energy times time reaches " + phase + " rad, allowed " + LARGEST_PHASE
                    + " rad; shorten the time or count energies from a level of the state");
        }
    }

    private static double requireFinite(double value, String name, int index) {
        if (!Double.isFinite(value)) {
            throw new IllegalArgumentException(name + " " + index + " is " + value + ", expected a finite number");
        }
        return value;
    }

    private static void requireLength(double[] array, int length, String name) {
        if (array.length != length) {
            throw new IllegalArgumentException(
                    array.length + " " + name + ", expected one for each of " + length + " levels");
        }
    }
}
