package ladderwell.window;

import ladderwell.evidence.Bound;

/**
 * A density operator on consecutive levels. Immutable; the arrays are handed out themselves for hot loops: read only.
 *
 * @shape lower triangle by rows: ρ_mn with m ≥ n, counted from the first level, at m (m + 1)/2 + n
 */
public final class MixedWindow implements WindowState {
    private final long first;
    private final int levels;
    private final double[] re;
    private final double[] im;
    private final Bound error;

    MixedWindow(long first, int levels, double[] re, double[] im, Bound error) {
        this.first = first;
        this.levels = levels;
        this.re = re;
        this.im = im;
        this.error = error;
    }

    @Override
    public long first() {
        return first;
    }

    @Override
    public int levels() {
        return levels;
    }

    /** Real parts of the lower triangle, the array itself. */
    public double[] lowerRe() {
        return re;
    }

    /** Imaginary parts of the lower triangle, the array itself. */
    public double[] lowerIm() {
        return im;
    }

    @Override
    public Bound error() {
        return error;
    }

    @Override
    public Bound traceNormError() {
        return error;
    }

    private static int at(int m, int n) {
        return m * (m + 1) / 2 + n;
    }

    @Override
    public double population(int i) {
        return re[at(i, i)];
    }

    @Override
    public double[] lowering(int k) {
        // tr(a^k ρ) = Σ √… ⟨n + k|ρ|n⟩
        double sumRe = 0;
        double sumIm = 0;
        for (int n = 0; n + k < levels; n++) {
            double root = Roots.of(first + n, k);
            sumRe += root * re[at(n + k, n)];
            sumIm += root * im[at(n + k, n)];
        }
        return new double[] {sumRe, sumIm};
    }

    @Override
    public double trace() {
        double sum = 0;
        for (int i = 0; i < levels; i++) {
            sum += population(i);
        }
        return sum;
    }

    @Override
    public double purity() {
        double sum = 0;
        for (int m = 0; m < levels; m++) {
            for (int n = 0; n < m; n++) {
                int i = at(m, n);
                sum += 2 * (re[i] * re[i] + im[i] * im[i]);
            }
            sum += population(m) * population(m);
        }
        return sum;
    }
}
