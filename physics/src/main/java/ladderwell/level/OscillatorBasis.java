package ladderwell.level;

import java.util.Arrays;

/**
 * p²/2 + V for a polynomial V in the functions 0 … size−1 of an oscillator of frequency Ω about a chosen centre, as a band matrix with the
 * border that leads out of the basis.
 *
 * @param rows rows[q][n] = H(n, n + q) for n &lt; size, q = 0 … degree; columns from size on are the border
 */
record OscillatorBasis(int size, double omega, double centre, int degree, double[][] rows, Polynomial polynomial) {

    static OscillatorBasis of(Polynomial polynomial, int size, double omega, double centre) {
        double[] b = polynomial.about(centre)[0];
        double[][] rows = band(b, size, omega);
        for (int n = 0; n < size; n++) {
            double quarter = omega / 4;
            rows[0][n] += quarter * (2 * n + 1);
            rows[2][n] -= quarter * Math.sqrt((n + 1.0) * (n + 2.0));
        }
        return new OscillatorBasis(size, omega, centre, polynomial.degree(), rows, polynomial);
    }

    /** Sizes of the elements, see {@link #rounding}. */
    double[][] sizes() {
        double[][] about = polynomial.about(centre);
        double[] b = new double[degree + 1];
        for (int k = 0; k <= degree; k++) {
            b[k] = Math.abs(about[0][k]) + 0x1p-45 * about[1][k];
        }
        double[][] rows = band(b, size, omega);
        for (int n = 0; n < size; n++) {
            double quarter = omega / 4;
            rows[0][n] += quarter * (2 * n + 1);
            rows[2][n] += quarter * Math.sqrt((n + 1.0) * (n + 2.0));
        }
        return rows;
    }

    /** Rounding of an element over its size: two per step of Horner's rule, three for each root of x, four for p². */
    double rounding() {
        return (5 * degree + 8) * 0x1p-53;
    }

    /** Upper bound of Ω² y²/2 − V: outside the basis H is at least Ω (size + 1/2) less this. */
    double excess() {
        double excess = Polynomial.excess(polynomial.about(centre)[0], omega);
        return excess + 0x1p-40 * (Math.abs(excess) + 1);
    }

    /** The band of Σ b_k y^k: Horner's rule on rows, (M y)(n, n+q) = M(n, n+q−1) s(n+q) + M(n, n+q+1) s(n+q+1), s(j) = √(j/2Ω). */
    private static double[][] band(double[] b, int size, double omega) {
        int degree = b.length - 1;
        boolean even = true;
        for (int k = 1; k <= degree; k += 2) {
            even &= b[k] == 0;
        }
        int far = size + degree + 2;
        double[] s = new double[far];
        for (int j = 0; j < far; j++) {
            s[j] = Math.sqrt(j / (2 * omega));
        }
        double[][] m = new double[degree + 3][size];
        if (even) {
            // Horner's rule in y²: half the steps, and only even offsets.
            double[] square = new double[far];
            double[] up = new double[far];
            for (int j = 0; j < far; j++) {
                square[j] = (2 * j + 1) / (2 * omega);
                up[j] = Math.sqrt((double) j * (j + 1)) / (2 * omega);
            }
            evenBand(b, m, size, square, up);
            return Arrays.copyOf(m, degree + 1);
        }
        Arrays.fill(m[0], b[degree]);
        double[][] next = new double[degree + 3][size];
        for (int k = degree - 1; k >= 0; k--) {
            int width = degree - k;
            for (int q = 0; q <= width; q++) {
                for (int n = 0; n < size; n++) {
                    double before = q > 0 ? m[q - 1][n] * s[n + q] : n > 0 ? m[1][n - 1] * s[n] : 0;
                    next[q][n] = before + m[q + 1][n] * s[n + q + 1];
                }
            }
            for (int n = 0; n < size; n++) {
                next[0][n] += b[k];
            }
            double[][] swap = m;
            m = next;
            next = swap;
        }
        return Arrays.copyOf(m, degree + 1);
    }

    /** (M y²)(n, n+q) = M(n, n+q−2) up(n+q−1) + M(n, n+q) square(n+q) + M(n, n+q+2) up(n+q+1). */
    private static void evenBand(double[] b, double[][] m, int size, double[] square, double[] up) {
        int degree = b.length - 1;
        int columns = size;
        Arrays.fill(m[0], b[degree]);
        double[] left = new double[columns];
        double[] own = new double[columns];
        for (int k = degree - 2; k >= 0; k -= 2) {
            int width = degree - k;
            // M(n, n−2) = M(n−2, n)
            for (int n = 0; n < columns; n++) {
                left[n] = n >= 2 ? m[2][n - 2] : 0;
            }
            for (int q = 0; q <= width; q += 2) {
                double[] here = m[q];
                double[] right = m[q + 2];
                for (int n = 0; n < columns; n++) {
                    own[n] = here[n];
                    double before = n + q >= 1 ? left[n] * up[n + q - 1] : 0;
                    here[n] = before + here[n] * square[n + q] + right[n] * up[n + q + 1];
                }
                double[] swap = left;
                left = own;
                own = swap;
            }
            for (int n = 0; n < columns; n++) {
                m[0][n] += b[k];
            }
        }
    }

    /** The part of one parity (0 or 1) of a band whose odd offsets vanish. */
    static double[][] parity(double[][] rows, int size, int parity) {
        int count = (size - parity + 1) / 2;
        int width = (rows.length - 1) / 2;
        double[][] part = new double[width + 1][count];
        for (int q = 0; q <= width; q++) {
            double[] from = rows[2 * q];
            double[] to = part[q];
            for (int j = 0; j < count; j++) {
                to[j] = from[2 * j + parity];
            }
        }
        return part;
    }
}
