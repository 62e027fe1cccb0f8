package ladderwell.state;

/**
 * A density operator on a window of consecutive levels. Hermitian, so only the lower triangle is kept. Immutable; {@link #lowerRe} and {@link
 * #lowerIm} hand out the arrays themselves for hot loops: read only.
 *
 * @shape lower triangle by rows: ρ_mn with m ≥ n, counted from the first level, at m (m + 1)/2 + n
 */
public final class DensityOperator {
    private final long first;
    private final int size;
    private final double[] re;
    private final double[] im;
    private final double traceNormError;

    private DensityOperator(long first, int size, double[] re, double[] im, double traceNormError) {
        this.first = first;
        this.size = size;
        this.re = re;
        this.im = im;
        this.traceNormError = traceNormError;
    }

    /** Gathers weighted pure states. */
    static final class Sum {
        private final long first;
        private final int size;
        private final double[] re;
        private final double[] im;

        Sum(long first, int size) {
            this.first = first;
            this.size = size;
            int count = (int) ((long) size * (size + 1) / 2);
            re = new double[count];
            im = new double[count];
        }

        void add(double weight, Amplitudes state) {
            for (int s = 0; s < state.segments(); s++) {
                for (int t = 0; t <= s; t++) {
                    add(weight, state, s, t);
                }
            }
        }

        private void add(double weight, Amplitudes state, int s, int t) {
            double[] rowRe = state.reals(s);
            double[] rowIm = state.imaginaries(s);
            double[] columnRe = state.reals(t);
            double[] columnIm = state.imaginaries(t);
            int rowFirst = (int) (state.first(s) - first);
            int columnFirst = (int) (state.first(t) - first);
            for (int i = 0; i < rowRe.length; i++) {
                int m = rowFirst + i;
                double a = weight * rowRe[i];
                double b = weight * rowIm[i];
                int at = m * (m + 1) / 2 + columnFirst;
                int count = s == t ? i + 1 : columnRe.length;
                for (int j = 0; j < count; j++) {
                    re[at + j] += a * columnRe[j] + b * columnIm[j];
                    im[at + j] += b * columnRe[j] - a * columnIm[j];
                }
            }
        }

        DensityOperator total(double traceNormError) {
            return new DensityOperator(first, size, re, im, traceNormError);
        }
    }

    /** First level of the window. */
    public long first() {
        return first;
    }

    /** Number of levels. */
    public int size() {
        return size;
    }

    /** Real part of ⟨first + m| ρ |first + n⟩. */
    public double re(int m, int n) {
        return re[at(m, n)];
    }

    /** Imaginary part of ⟨first + m| ρ |first + n⟩. */
    public double im(int m, int n) {
        return m >= n ? im[at(m, n)] : -im[at(m, n)];
    }

    private int at(int m, int n) {
        if (Math.min(m, n) < 0 || Math.max(m, n) >= size) {
            throw new IllegalArgumentException(
                    "the window has rows and columns 0 … " + (size - 1) + ", got " + m + ", " + n);
        }
        return m >= n ? m * (m + 1) / 2 + n : n * (n + 1) / 2 + m;
    }

    /** Real parts of the lower triangle, the array itself; read only. */
    public double[] lowerRe() {
        return re;
    }

    /** Imaginary parts of the lower triangle, the array itself; read only. */
    public double[] lowerIm() {
        return im;
    }

    /** tr ρ of what is kept; 1 within the error. */
    public double trace() {
        double sum = 0;
        for (int m = 0; m < size; m++) {
            sum += re[m * (m + 3) / 2];
        }
        return sum;
    }

    /** tr ρ². */
    public double purity() {
        double sum = 0;
        for (int m = 0; m < size; m++) {
            for (int n = 0; n <= m; n++) {
                int i = m * (m + 1) / 2 + n;
                sum += (m == n ? 1 : 2) * (re[i] * re[i] + im[i] * im[i]);
            }
        }
        return sum;
    }

    /** ‖ρ − ρ̃‖₁ ≤ this, guaranteed: ρ the state meant, ρ̃ what is kept. */
    public double traceNormError() {
        return traceNormError;
    }
}
