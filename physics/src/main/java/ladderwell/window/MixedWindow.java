package ladderwell.window;

import ladderwell.evidence.Bound;
import ladderwell.state.Amplitudes;

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
    public double re(int m, int n) {
        return re[m >= n ? at(m, n) : at(n, m)];
    }

    @Override
    public double im(int m, int n) {
        return m >= n ? im[at(m, n)] : -im[at(n, m)];
    }

    @Override
    public double fidelity(Amplitudes phi) {
        double[] a = new double[levels];
        double[] b = new double[levels];
        for (int s = 0; s < phi.segments(); s++) {
            for (int i = 0; i < phi.length(s); i++) {
                long n = phi.first(s) + i - first;
                if (n >= 0 && n < levels) {
                    a[(int) n] = phi.re(s, i);
                    b[(int) n] = phi.im(s, i);
                }
            }
        }
        double sum = 0;
        for (int m = 0; m < levels; m++) {
            for (int n = 0; n < m; n++) {
                int i = at(m, n);
                // twice the real part of φ_m* ρ_mn φ_n
                sum += 2 * (re[i] * (a[m] * a[n] + b[m] * b[n]) - im[i] * (a[m] * b[n] - b[m] * a[n]));
            }
            sum += population(m) * (a[m] * a[m] + b[m] * b[m]);
        }
        return sum;
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
