package ladderwell.level;

import java.util.Arrays;
import java.util.function.DoubleUnaryOperator;
import ladderwell.evidence.Bound;
import ladderwell.evidence.Certainty;

/** Bloch levels over one turn, as {@link Levels}: x from −period/2 to period/2, wave functions real. */
final class CircleLevels implements Levels {
    /** A periodic integrand of whole turns is summed exactly by as many points as it has waves, and a few more. */
    private static final int SPARE_POINTS = 64;

    private final PeriodicLevels bloch;
    private final boolean real;

    CircleLevels(PeriodicLevels bloch, PotentialCurve curve) {
        this.bloch = bloch;
        real = curve.isEven() && (bloch.phase() == 0 || Math.abs(bloch.phase()) == Math.PI);
    }

    @Override
    public Kind kind() {
        return Kind.GENERAL;
    }

    @Override
    public boolean hasWaveFunctions() {
        return real;
    }

    @Override
    public long count() {
        return PeriodicLevels.MOST_LEVELS;
    }

    private static int index(long n) {
        Points.checkLevel(n, PeriodicLevels.MOST_LEVELS);
        return (int) n;
    }

    @Override
    public double energyHigh(long n) {
        return bloch.energy(index(n));
    }

    @Override
    public double energyLow(long n) {
        Points.checkLevel(n, PeriodicLevels.MOST_LEVELS);
        return 0;
    }

    @Override
    public double energyError(long n) {
        return energyBound(n).size();
    }

    @Override
    public Bound energyBound(long n) {
        return bloch.energyBound(index(n));
    }

    @Override
    public double threshold() {
        return Double.POSITIVE_INFINITY;
    }

    @Override
    public double binding(long n) {
        Points.checkLevel(n, PeriodicLevels.MOST_LEVELS);
        return Double.POSITIVE_INFINITY;
    }

    @Override
    public double decay(long n) {
        Points.checkLevel(n, PeriodicLevels.MOST_LEVELS);
        return Double.POSITIVE_INFINITY;
    }

    @Override
    public double decayError(long n) {
        Points.checkLevel(n, PeriodicLevels.MOST_LEVELS);
        return 0;
    }

    private void requireReal() {
        if (!real) {
            throw new IllegalArgumentException("at a boundary phase of " + bloch.phase()
                    + " rad the wave functions are complex: only the energies of these levels are given; expected an even"
                    + " potential and a phase of 0 or π");
        }
    }

    @Override
    public double[][] waveFunctions(long first, int count, double[] x) {
        Points.check(first, count, PeriodicLevels.MOST_LEVELS, x);
        requireReal();
        double half = bloch.period() / 2;
        double[][] table = new double[count][];
        for (int row = 0; row < count; row++) {
            double[][] parts = bloch.waveFunction((int) first + row, x);
            double[] wave = parts[larger(parts)];
            for (int i = 0; i < x.length; i++) {
                if (Math.abs(x[i]) > half) {
                    wave[i] = 0;
                }
            }
            table[row] = wave;
        }
        return table;
    }

    /** An even state is real and an odd one imaginary, or the other way round: the part that is not rounding. */
    private static int larger(double[][] parts) {
        double[] size = new double[2];
        for (int k = 0; k < 2; k++) {
            for (double value : parts[k]) {
                size[k] = Math.max(size[k], Math.abs(value));
            }
        }
        return size[1] > size[0] ? 1 : 0;
    }

    private double waveError(long n) {
        double gap = Double.POSITIVE_INFINITY;
        // Parity keeps neighbours apart: what mixes is two levels away.
        if (n >= 2) {
            gap = energyHigh(n) - energyHigh(n - 2);
        }
        if (n + 2 < count()) {
            gap = Math.min(gap, energyHigh(n + 2) - energyHigh(n));
        }
        return gap > 0 ? Math.min(2, 2 * energyError(n) / gap + 4e-15) : 2;
    }

    @Override
    public double waveFunctionError(long last) {
        double worst = 0;
        for (long n = Math.max(0, last - 3); n <= last; n++) {
            worst = Math.max(worst, waveError(n));
        }
        return 2 * worst * Math.sqrt((last + 2) * 2 * Math.PI / bloch.period());
    }

    @Override
    public double reach(long n, double drop) {
        Points.checkLevel(n, PeriodicLevels.MOST_LEVELS);
        Points.checkDrop(drop);
        return bloch.period() / 2;
    }

    /**
     * x and x² are those of the turn from −period/2 to period/2, so ⟨i|x|j⟩ is no element of a smooth operator on the circle; p is.
     */
    @Override
    public Elements elements(long[] levels) {
        Points.checkList(levels, PeriodicLevels.MOST_LEVELS);
        requireReal();
        int size = levels.length;
        long top = Arrays.stream(levels).max().orElse(0);
        // Gauss panels: the saw-tooth x breaks the trapezoidal rule's accuracy.
        int panels = 2 + (int) (top + 8) / 2;
        double[][] rule = GaussRule.of(24);
        double[] x = new double[24 * panels];
        double[] weight = new double[x.length];
        double half = bloch.period() / (2 * panels);
        for (int i = 0; i < x.length; i++) {
            x[i] = -bloch.period() / 2 + half * (2 * (i / 24) + 1 + rule[0][i % 24]);
            weight[i] = half * rule[1][i % 24];
        }
        double[][] waves = new double[size][];
        for (int i = 0; i < size; i++) {
            waves[i] = waveFunctions(levels[i], 1, x)[0];
        }
        double[][] position = new double[size][size];
        double[][] square = new double[size][size];
        double[][] momentum = new double[size][size];
        double[][] momentumSquare = new double[size][size];
        double[][] slopes = new double[size][];
        for (int i = 0; i < size; i++) {
            slopes[i] = bloch.slope(index(levels[i]), x, larger(bloch.waveFunction(index(levels[i]), x)));
        }
        double off = 0;
        double fastest = 0;
        for (int i = 0; i < size; i++) {
            off = Math.max(off, waveError(levels[i]));
            for (int j = 0; j < size; j++) {
                for (int k = 0; k < x.length; k++) {
                    double product = weight[k] * waves[i][k] * waves[j][k];
                    position[i][j] += product * x[k];
                    square[i][j] += product * x[k] * x[k];
                    momentum[i][j] -= weight[k] * waves[i][k] * slopes[j][k];
                    momentumSquare[i][j] += weight[k] * slopes[i][k] * slopes[j][k];
                }
            }
            fastest = Math.max(fastest, Math.sqrt(momentumSquare[i][i]));
        }
        double relative = 4 * off + 1e-14;
        double reach = bloch.period() / 2;
        return new Elements(
                levels,
                position,
                square,
                momentum,
                momentumSquare,
                new double[] {
                    relative * reach, relative * reach * reach, relative * fastest, relative * fastest * fastest
                },
                Certainty.ESTIMATED);
    }

    @Override
    public Element element(long m, long n, DoubleUnaryOperator f) {
        requireReal();
        int points = 8 * (int) (Math.max(m, n) + 8) + SPARE_POINTS;
        double fine = sum(m, n, f, 2 * points);
        double coarse = sum(m, n, f, points);
        double size = sum(m, m, x -> Math.abs(f.applyAsDouble(x)), points)
                + sum(n, n, x -> Math.abs(f.applyAsDouble(x)), points);
        return new Element(
                fine, Bound.estimated(Math.abs(fine - coarse) + size * (1e-14 + 2 * waveError(m) + 2 * waveError(n))));
    }

    private double sum(long m, long n, DoubleUnaryOperator f, int points) {
        double[] x = new double[points];
        for (int i = 0; i < points; i++) {
            x[i] = bloch.period() * ((i + 0.5) / points - 0.5);
        }
        double[] a = waveFunctions(m, 1, x)[0];
        double[] b = waveFunctions(n, 1, x)[0];
        double sum = 0;
        for (int i = 0; i < points; i++) {
            double value = f.applyAsDouble(x[i]);
            if (Double.isNaN(value)) {
                throw new IllegalArgumentException("the function is not a number at x = " + x[i]);
            }
            sum += value * a[i] * b[i];
        }
        return sum * bloch.period() / points;
    }

    @Override
    public String toString() {
        return bloch.toString();
    }
}
