package ladderwell.level;

import ladderwell.numeric.DoubleDouble;
import ladderwell.numeric.HermiteFunctions;

/** Levels of the harmonic oscillator. */
final class HarmonicLevels implements Levels {
    /** Highest level with wave functions, see {@link HermiteFunctions}. */
    private static final int LAST_WAVE_FUNCTION = 1_000_000;

    /** Highest level with a number: n + 1/2 and its neighbours are exact in double-double. */
    private static final long LAST = Long.MAX_VALUE - 4;

    /** Cramér: |φ_n| ≤ 1.0865 π^{−1/4} everywhere (Abramowitz and Stegun 22.14.17). */
    private static final double CRAMER = 0.8161;

    @Override
    public Kind kind() {
        return Kind.HARMONIC;
    }

    @Override
    public boolean alternates() {
        return true;
    }

    @Override
    public long count() {
        return Long.MAX_VALUE;
    }

    /** n + 1/2, exactly. */
    private static DoubleDouble energy(long n) {
        Points.checkLevel(n, LAST + 1);
        // Halves of n are exact doubles; the sum is too, in two parts.
        double top = n >>> 32;
        double bottom = (n & 0xffffffffL) + 0.5;
        return DoubleDouble.sum(top * 0x1p32, bottom);
    }

    @Override
    public double energyHigh(long n) {
        return energy(n).hi();
    }

    @Override
    public double energyLow(long n) {
        return energy(n).lo();
    }

    @Override
    public double energyError(long n) {
        Points.checkLevel(n, LAST + 1);
        return 0;
    }

    @Override
    public double threshold() {
        return Double.POSITIVE_INFINITY;
    }

    @Override
    public double binding(long n) {
        Points.checkLevel(n, LAST + 1);
        return Double.POSITIVE_INFINITY;
    }

    @Override
    public double decay(long n) {
        Points.checkLevel(n, LAST + 1);
        return Double.POSITIVE_INFINITY;
    }

    @Override
    public double decayError(long n) {
        Points.checkLevel(n, LAST + 1);
        return 0;
    }

    private static void checkWaveFunction(long n) {
        Points.checkLevel(n, LAST + 1);
        if (n > LAST_WAVE_FUNCTION) {
            throw new IllegalArgumentException("harmonic wave functions are computed up to n = 1000000, got " + n);
        }
    }

    @Override
    public double[][] waveFunctions(long first, int count, double[] x) {
        Points.check(first, count, LAST + 1, x);
        checkWaveFunction(first + count - 1);
        return HermiteFunctions.window((int) first, count, x);
    }

    @Override
    public double waveFunctionError(long last) {
        checkWaveFunction(last);
        return HermiteFunctions.errorBound((int) last);
    }

    /**
     * Beyond the turning point b = √(2n+1) the decaying solution has −φ′/φ ≥ √(x² − b²) (Riccati, growing potential), so |φ(b cosh u)|
     * ≤ |φ(b)| exp(−b² (sinh 2u − 2u) / 4).
     */
    @Override
    public double reach(long n, double drop) {
        Points.checkLevel(n, LAST + 1);
        Points.checkDrop(drop);
        double square = 2 * energyHigh(n);
        double turn = Math.sqrt(square);
        if (drop >= CRAMER) {
            return turn;
        }
        double wanted = 4 * Math.log(CRAMER / drop) / square;
        // sinh 2u − 2u ≥ (2u)³/6 and ≥ the value at any smaller u: bisect between 0 and the root of the cubic.
        double low = 0;
        double high = Math.cbrt(6 * wanted) / 2;
        for (int i = 0; i < 60; i++) {
            double middle = 0.5 * (low + high);
            if (excess(2 * middle) < wanted) {
                low = middle;
            } else {
                high = middle;
            }
        }
        return turn * Math.cosh(high) * (1 + 0x1p-40);
    }

    /** sinh v − v from below. */
    private static double excess(double v) {
        double cubic = v * v * v / 6;
        return v < 0.5 ? cubic : Math.max(cubic, Math.sinh(v) - v);
    }

    @Override
    public Elements elements(long[] levels) {
        Points.checkList(levels, LAST + 1);
        ElementTable table = new ElementTable(levels);
        double largest = 0;
        for (int i = 0; i < levels.length; i++) {
            double own = energyHigh(levels[i]);
            largest = Math.max(largest, own);
            table.diagonal(i, own, own);
            for (int j = 0; j < i; j++) {
                long upper = Math.max(levels[i], levels[j]);
                long step = upper - Math.min(levels[i], levels[j]);
                if (step == 1) {
                    // ⟨n+1|p|n⟩ = i √((n+1)/2)
                    double x = Math.sqrt(upper / 2.0);
                    table.opposite(i, j, x, levels[i] > levels[j] ? x : -x);
                } else if (step == 2) {
                    double xx = 0.5 * Math.sqrt((double) upper) * Math.sqrt(upper - 1.0);
                    table.equal(i, j, xx, -xx);
                }
            }
        }
        return table.elements(5 * 0x1p-53, new double[] {0x1p-53 * largest, 0x1p-53 * largest});
    }

    @Override
    public String toString() {
        return "harmonic levels";
    }
}
