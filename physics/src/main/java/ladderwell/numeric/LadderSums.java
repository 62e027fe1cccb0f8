package ladderwell.numeric;

import java.util.Arrays;
import java.util.Optional;

/**
 * Sums over a ladder of levels that give the mean and the fluctuations of a and of n, for every row of coefficients (every time of a run).
 *
 * <p>With a|n⟩ = √n|n-1⟩ and coefficients c_n of norm N = Σ|c_n|²: amplitude ⟨a⟩ = Σ √(n+1) c_n* c_{n+1} / N, fluctuation ⟨δ†δ⟩ and
 * squeezing ⟨δ²⟩ with δ = a - ⟨a⟩. For x = (a + a†)/√2 and p = (a - a†)/(i√2): ⟨x⟩ = √2 Re⟨a⟩, ⟨p⟩ = √2 Im⟨a⟩,
 * Var x = ½ + ⟨δ†δ⟩ + Re⟨δ²⟩, Var p = ½ + ⟨δ†δ⟩ - Re⟨δ²⟩, covariance Im⟨δ²⟩. All values are those of the normalised state.
 * Levels outside the row count as empty.
 *
 * <p>The sums are taken about a reference α near ⟨a⟩, the ratio √(m+1) c_{m+1}/c_m of the two most populated neighbours, so that a
 * narrow state far up the ladder loses no digits: with b = (a - α)c and g = (a - α)†c, and Δ = Σ c* b / N,
 * ⟨a⟩ = α + Δ, ⟨δ†δ⟩ = Σ|b|²/N - |Δ|², ⟨δ²⟩ = Σ g* b / N - Δ² [derived: δ = a - α - Δ].
 */
public final class LadderSums {
    private static final double U = 0x1p-53;

    /** Levels summed before their sums go to the row's: their coefficients stay in the first-level cache. */
    private static final int LEVEL_BLOCK = ExactPhases.LEVEL_BLOCK;

    /** A task takes at most this many blocks of levels and this many rows; fixed, so that threads do not change the order of sums. */
    private static final int BLOCKS_PER_TASK = 16;

    private static final int ROWS_PER_TASK = 2048;

    private static final double[][] EMPTY = {};

    private final int first;
    private final double coefficientError;
    private final int terms;
    private final Quanta[] quanta;
    private final double[] referenceRe;
    private final double[] referenceIm;
    private final double[] sums;
    /** Turns from the frame in which the sums were taken, one for each row, or empty for none. */
    private double[] turnRe = {};

    private double[] turnIm = {};

    /**
     * The sums for coefficients that evolve by phases; rows of coefficients are never all in memory. They are taken in a frame that turns
     * with the ladder about its most populated levels, where phases are small.
     *
     * @param first level of the first coefficient (0 for the whole ladder)
     * @throws IllegalArgumentException if first is negative or all coefficients are 0
     * @throws java.util.concurrent.CancellationException if the thread is interrupted
     */
    public static LadderSums of(ExactPhases phases, int first, Workers workers) {
        Quanta quanta = Quanta.of(phases, first);
        int m = quanta.densest;
        if (m >= 0) {
            double rate = phases.energy(m + 1) - phases.energy(m);
            Optional<ExactPhases> turning = phases.turning(m, rate);
            if (turning.isPresent()) {
                LadderSums result = new LadderSums(first, turning.get(), quanta);
                result.turnRe = new double[phases.times()];
                result.turnIm = new double[phases.times()];
                phases.writeTurns(rate, result.turnRe, result.turnIm);
                result.placeReferences(turning.get());
                result.sum(turning.get(), workers, EMPTY, EMPTY);
                return result;
            }
        }
        LadderSums result = new LadderSums(first, phases, quanta);
        result.placeReferences(phases);
        result.sum(phases, workers, EMPTY, EMPTY);
        return result;
    }

    /**
     * The same sums, and the coefficients themselves, as {@link ExactPhases#fill} writes them but for rounding.
     *
     * @shape re and im are [phases.times()][at least levels]; written
     */
    public static LadderSums of(ExactPhases phases, int first, double[][] re, double[][] im, Workers workers) {
        LadderSums result = new LadderSums(first, phases, Quanta.of(phases, first));
        result.placeReferences(phases);
        result.sum(phases, workers, re, im);
        return result;
    }

    /**
     * The sums of given rows of coefficients, taken as exact numbers.
     *
     * @shape re and im are [rows][levels]
     * @param first level of the first column
     * @throws IllegalArgumentException if first is negative, rows differ in length, or all coefficients of a row are 0 or one is not finite
     * @throws java.util.concurrent.CancellationException if the thread is interrupted
     */
    public static LadderSums of(double[][] re, double[][] im, int first, Workers workers) {
        if (re.length != im.length) {
            throw new IllegalArgumentException(re.length + " rows of real parts and " + im.length
                    + " of imaginary parts, expected the same number");
        }
        int levels = re.length == 0 ? 0 : re[0].length;
        Quanta[] quanta = new Quanta[re.length];
        for (int j = 0; j < re.length; j++) {
            if (re[j].length != levels || im[j].length != levels) {
                throw new IllegalArgumentException("row " + j + " has " + re[j].length + " real and " + im[j].length
                        + " imaginary parts, expected " + levels);
            }
            quanta[j] = Quanta.of(re[j], im[j], first, j);
        }
        LadderSums result = new LadderSums(first, levels, re.length, 0, quanta);
        for (int j = 0; j < re.length; j++) {
            result.placeReference(j, quanta[j].densest, re[j], im[j]);
        }
        result.sum(levels, workers, (from, to, rows) -> (j, toRe, toIm) -> {
            int start = Math.max(0, from);
            int count = Math.min(levels, to) - start;
            System.arraycopy(re[j], start, toRe, start - from, count);
            System.arraycopy(im[j], start, toIm, start - from, count);
        });
        return result;
    }

    private LadderSums(int first, ExactPhases phases, Quanta quanta) {
        this(first, phases.levels(), phases.times(), phases.errorBound(), new Quanta[] {quanta});
    }

    private LadderSums(int first, int levels, int rows, double coefficientError, Quanta[] quanta) {
        this.first = first;
        this.coefficientError = coefficientError;
        // Each sum adds at most a block's terms in a lane, the lanes, the blocks and the tasks.
        terms = Math.min(levels, LEVEL_BLOCK) + levels / LEVEL_BLOCK + 16;
        this.quanta = quanta;
        referenceRe = new double[rows];
        referenceIm = new double[rows];
        sums = new double[rows * Loops.LADDER_SUMS];
    }

    private void placeReferences(ExactPhases phases) {
        int m = quanta[0].densest;
        if (m < 0) {
            return;
        }
        phases.writeTurns(phases.energy(m + 1) - phases.energy(m), referenceRe, referenceIm);
        double a = phases.initialRe(m);
        double b = phases.initialIm(m);
        double c = phases.initialRe(m + 1);
        double d = phases.initialIm(m + 1);
        double scale = Math.sqrt(first + m + 1.0) / (a * a + b * b);
        double ratioRe = scale * (a * c + b * d);
        double ratioIm = scale * (a * d - b * c);
        for (int j = 0; j < referenceRe.length; j++) {
            double re = referenceRe[j];
            double im = referenceIm[j];
            referenceRe[j] = re * ratioRe - im * ratioIm;
            referenceIm[j] = re * ratioIm + im * ratioRe;
        }
    }

    private void placeReference(int j, int m, double[] re, double[] im) {
        if (m < 0) {
            return;
        }
        double scale = Math.sqrt(first + m + 1.0) / (re[m] * re[m] + im[m] * im[m]);
        referenceRe[j] = scale * (re[m] * re[m + 1] + im[m] * im[m + 1]);
        referenceIm[j] = scale * (re[m] * im[m + 1] - im[m] * re[m + 1]);
    }

    /** Sums over the rows of phases, which are written to keepRe and keepIm on the way unless these are empty. */
    private void sum(ExactPhases phases, Workers workers, double[][] keepRe, double[][] keepIm) {
        int levels = phases.levels();
        sum(levels, workers, (from, to, rows) -> {
            ExactPhases.Block block = phases.block(from, to, rows);
            if (keepRe.length == 0) {
                return (row, toRe, toIm) -> block.write(row, toRe, toIm, 0);
            }
            // The first and last level of a block belong to its neighbours.
            int start = Math.max(0, from + 1);
            int count = Math.min(levels, to - 1) - start;
            return (row, toRe, toIm) -> {
                block.write(row, toRe, toIm, 0);
                System.arraycopy(toRe, start - from, keepRe[row], start, count);
                System.arraycopy(toIm, start - from, keepIm[row], start, count);
            };
        });
    }

    /** Where rows come from, a block of levels at a time; levels outside the row read as 0. */
    private interface Source {
        Rows block(int from, int to, int rows);
    }

    private interface Rows {
        void write(int row, double[] toRe, double[] toIm);
    }

    private void sum(int levels, Workers workers, Source source) {
        int rows = referenceRe.length;
        // Level first - 1 has a b of its own, so the sums run over levels + 1 levels.
        int blocks = (levels + 1 + LEVEL_BLOCK - 1) / LEVEL_BLOCK;
        int levelTasks = (blocks + BLOCKS_PER_TASK - 1) / BLOCKS_PER_TASK;
        int rowTasks = (rows + ROWS_PER_TASK - 1) / ROWS_PER_TASK;
        double[][] partial = new double[levelTasks * rowTasks][];
        Loops loops = Loops.chosen();
        workers.forEach(levelTasks * rowTasks, task -> {
            int levelTask = task / rowTasks;
            int rowTask = task % rowTasks;
            int fromRow = rowTask * ROWS_PER_TASK;
            int toRow = Math.min(rows, fromRow + ROWS_PER_TASK);
            double[] into = new double[(toRow - fromRow) * Loops.LADDER_SUMS];
            int lastBlock = Math.min(blocks, (levelTask + 1) * BLOCKS_PER_TASK);
            for (int block = levelTask * BLOCKS_PER_TASK; block < lastBlock; block++) {
                int from = block * LEVEL_BLOCK - 1;
                sumBlock(loops, source, levels, from, Math.min(levels, from + LEVEL_BLOCK), fromRow, toRow, into);
            }
            partial[task] = into;
        });
        for (int task = 0; task < partial.length; task++) {
            int at = (task % rowTasks) * ROWS_PER_TASK * Loops.LADDER_SUMS;
            for (int i = 0; i < partial[task].length; i++) {
                sums[at + i] += partial[task][i];
            }
        }
    }

    /** Adds the terms of levels from … to-1 (counted from {@code first}; from may be -1) for some rows. */
    private void sumBlock(
            Loops loops, Source source, int levels, int from, int to, int fromRow, int toRow, double[] into) {
        int count = to - from;
        // Whole vectors; what is beyond the last level is 0 and adds nothing (only the last block is not a multiple of
        // 8).
        int padded = (count + 7) / 8 * 8;
        double[] up = new double[padded];
        double[] down = new double[padded];
        for (int i = 0; i < count; i++) {
            double n = (double) first + from + i;
            up[i] = Math.sqrt(n + 1);
            down[i] = Math.sqrt(Math.max(0, n));
        }
        // Entry 0 is the level below the first of the block; what lies outside the row stays 0.
        double[] re = new double[padded + 2];
        double[] im = new double[padded + 2];
        Rows rows = source.block(from - 1, to + 1, toRow - fromRow);
        for (int j = fromRow; j < toRow; j++) {
            Interruption.check();
            rows.write(j, re, im);
            loops.ladder(
                    re,
                    im,
                    up,
                    down,
                    0,
                    padded,
                    referenceRe[j],
                    referenceIm[j],
                    into,
                    (j - fromRow) * Loops.LADDER_SUMS);
        }
    }

    /** The number of rows (times). */
    public int rows() {
        return referenceRe.length;
    }

    /** Σ|c_n|² of row j; for phases, of the initial coefficients. */
    public double norm(int j) {
        return quanta(j).norm;
    }

    /** Re⟨a⟩ of row j. */
    public double amplitudeRe(int j) {
        return turnRe.length == 0 ? amplitude(j, 0) : amplitude(j, 0) * turnRe[j] - amplitude(j, 1) * turnIm[j];
    }

    /** Im⟨a⟩ of row j. */
    public double amplitudeIm(int j) {
        return turnRe.length == 0 ? amplitude(j, 1) : amplitude(j, 0) * turnIm[j] + amplitude(j, 1) * turnRe[j];
    }

    /** ⟨δ†δ⟩ of row j, δ = a - ⟨a⟩; never negative. */
    public double fluctuation(int j) {
        double re = mean(j, 0);
        double im = mean(j, 1);
        return Math.max(0, mean(j, 2) - re * re - im * im);
    }

    /** Re⟨δ²⟩ of row j. */
    public double squeezingRe(int j) {
        if (turnRe.length == 0) {
            return squareRe(j);
        }
        double cosine = turnRe[j] * turnRe[j] - turnIm[j] * turnIm[j];
        return squareRe(j) * cosine - squareIm(j) * (2 * turnRe[j] * turnIm[j]);
    }

    /** Im⟨δ²⟩ of row j. */
    public double squeezingIm(int j) {
        if (turnRe.length == 0) {
            return squareIm(j);
        }
        double cosine = turnRe[j] * turnRe[j] - turnIm[j] * turnIm[j];
        return squareRe(j) * (2 * turnRe[j] * turnIm[j]) + squareIm(j) * cosine;
    }

    /** One of the sums of row j, over the norm. */
    private double mean(int j, int sum) {
        return sums[Loops.LADDER_SUMS * j + sum] / norm(j);
    }

    /** ⟨a⟩ in the frame of the sums, real (0) or imaginary (1) part. */
    private double amplitude(int j, int part) {
        return (part == 0 ? referenceRe[j] : referenceIm[j]) + mean(j, part);
    }

    /** Re⟨δ²⟩ in the frame of the sums. */
    private double squareRe(int j) {
        double re = mean(j, 0);
        double im = mean(j, 1);
        return mean(j, 3) - re * re + im * im;
    }

    private double squareIm(int j) {
        return mean(j, 4) - 2 * mean(j, 0) * mean(j, 1);
    }

    /** ⟨n⟩ of row j. */
    public double meanQuanta(int j) {
        return first + quanta(j).meanAboveFirst;
    }

    /** The variance of n in row j, summed about its mean. */
    public double varianceQuanta(int j) {
        return quanta(j).variance;
    }

    /** Guaranteed bound on the error of {@link #norm} in row j, against the given coefficients. */
    public double normError(int j) {
        return 6 * U * norm(j);
    }

    /** Guaranteed bound on |computed - exact| of ⟨a⟩ in row j, from rounding and from the errors of the coefficients. */
    public double amplitudeError(int j) {
        double size = Math.hypot(referenceRe[j], referenceIm[j]) + lowered(j);
        return 1.01 * shiftError(j) + (2 * U + turnError()) * size;
    }

    /** Guaranteed bound on the error of ⟨δ†δ⟩, and of |⟨δ²⟩|, in row j. */
    public double fluctuationError(int j) {
        double b = lowered(j);
        double bError = loweredError(j);
        double gError = bError + coefficientError + 5 * U;
        double g = Math.sqrt(b * b + 1);
        double products = (b + bError) * gError + g * bError + (terms + 16) * U * (b + bError) * (g + gError);
        double shift = Math.hypot(mean(j, 0), mean(j, 1));
        double shiftError = shiftError(j);
        return 1.01 * (products + (2 * shift + shiftError) * shiftError + 8 * U * shift * shift)
                + 2 * turnError() * Math.hypot(squareRe(j), squareIm(j));
    }

    /** Bound on the error of Σ c* b over the norm. */
    private double shiftError(int j) {
        double bError = loweredError(j);
        return bError + (coefficientError + (terms + 16) * U) * (lowered(j) + bError);
    }

    /** Of a turn back from the frame: the factor and a complex product (twice that for ⟨δ²⟩). */
    private double turnError() {
        return turnRe.length == 0 ? 0 : 1.01 * (PhaseFactors.ERROR + 3 * U);
    }

    /** Guaranteed bound on the error of {@link #meanQuanta} in row j, against the given coefficients. */
    public double meanQuantaError(int j) {
        return 20 * U * quanta(j).meanAboveFirst + U * meanQuanta(j);
    }

    /** Guaranteed bound on the error of {@link #varianceQuanta} in row j, against the given coefficients. */
    public double varianceQuantaError(int j) {
        double mean = 20 * U * quanta(j).meanAboveFirst;
        return 24 * U * quanta(j).variance + 1.01 * mean * mean;
    }

    private Quanta quanta(int j) {
        return quanta.length == 1 ? quanta[0] : quanta[j];
    }

    /** ‖b‖/‖c‖ of row j. */
    private double lowered(int j) {
        return Math.sqrt(mean(j, 2));
    }

    /**
     * Bound on the error of b, in the norm of b over that of c: each b_n is off by at most
     * (coefficient error + 5 u)(√(n+1)|c_{n+1}| + |α||c_n|), 5 u for the root, the products and the sums.
     */
    private double loweredError(int j) {
        double mean = Math.sqrt(meanQuanta(j) + 1) * 1.01;
        return (coefficientError + 5 * U) * (mean + Math.hypot(referenceRe[j], referenceIm[j]));
    }

    /** What depends on |c_n|² alone. */
    private static final class Quanta {
        final double norm;
        final double meanAboveFirst;
        final double variance;
        /** The m with the largest |c_m c_{m+1}|, or -1 when all are 0 (or too small to divide by). */
        final int densest;

        private Quanta(double norm, double meanAboveFirst, double variance, int densest) {
            this.norm = norm;
            this.meanAboveFirst = meanAboveFirst;
            this.variance = variance;
            this.densest = densest;
        }

        static Quanta of(ExactPhases phases, int first) {
            double[] re = new double[phases.levels()];
            double[] im = new double[phases.levels()];
            Arrays.setAll(re, phases::initialRe);
            Arrays.setAll(im, phases::initialIm);
            return of(re, im, first, 0);
        }

        static Quanta of(double[] re, double[] im, int first, int row) {
            if (first < 0) {
                throw new IllegalArgumentException("first level is " + first + ", expected 0 or above");
            }
            int levels = re.length;
            double[] weight = new double[levels];
            CompensatedSum norm = new CompensatedSum();
            CompensatedSum mean = new CompensatedSum();
            double largest = 0x1p-900;
            int densest = -1;
            for (int k = 0; k < levels; k++) {
                weight[k] = re[k] * re[k] + im[k] * im[k];
                norm.add(weight[k]);
                mean.add(k * weight[k]);
                if (k > 0 && weight[k - 1] > 0x1p-450 && weight[k] * weight[k - 1] > largest) {
                    largest = weight[k] * weight[k - 1];
                    densest = k - 1;
                }
            }
            double total = norm.value();
            if (!(total > 0x1p-900 && total < 0x1p900)) {
                throw new IllegalArgumentException("the coefficients of row " + row + " have norm " + total
                        + ", expected a positive finite number");
            }
            double meanAboveFirst = mean.value() / total;
            CompensatedSum variance = new CompensatedSum();
            for (int k = 0; k < levels; k++) {
                double distance = k - meanAboveFirst;
                variance.add(weight[k] * distance * distance);
            }
            return new Quanta(total, meanAboveFirst, variance.value() / total, densest);
        }
    }

    /** A sum with its rounding errors carried along (Ogita, Rump and Oishi 2005): relative error about 2 u for positive terms. */
    private static final class CompensatedSum {
        private double sum;
        private double carry;

        void add(double term) {
            double next = sum + term;
            carry += PhaseFactors.sumError(sum, term, next);
            sum = next;
        }

        double value() {
            return sum + carry;
        }
    }
}
