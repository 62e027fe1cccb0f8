package ladderwell.level;

/** Chebyshev interpolation of one fixed degree on [−1, 1]. */
final class Chebyshev {
    static final int DEGREE = 14;

    /** Nodes cos(π (2j + 1) / 30). */
    static final double[] NODE = new double[DEGREE + 1];

    private static final double[][] TRANSFORM = new double[DEGREE + 1][DEGREE + 1];
    private static final double[][] POWERS = new double[DEGREE + 1][DEGREE + 1];

    static {
        int n = DEGREE + 1;
        for (int j = 0; j < n; j++) {
            NODE[j] = cosine(2 * j + 1, n);
        }
        for (int i = 0; i < n; i++) {
            for (int j = 0; j < n; j++) {
                TRANSFORM[i][j] = (i == 0 ? 1.0 : 2.0) / n * cosine(i * (2 * j + 1), n);
            }
        }
        POWERS[0][0] = 1;
        POWERS[1][1] = 1;
        for (int i = 2; i < n; i++) {
            for (int j = 0; j <= i; j++) {
                POWERS[i][j] = (j > 0 ? 2 * POWERS[i - 1][j - 1] : 0) - POWERS[i - 2][j];
            }
        }
    }

    private Chebyshev() {}

    /** cos(π k / 2n) with the argument reduced exactly. */
    private static double cosine(int k, int n) {
        int turn = k % (4 * n);
        if (turn > 2 * n) {
            turn = 4 * n - turn;
        }
        if (turn > n) {
            return -cosine(2 * n - turn, n);
        }
        return 2 * turn > n ? Math.sin(Math.PI * (n - turn) / (2 * n)) : Math.cos(Math.PI * turn / (2 * n));
    }

    /** Coefficients of the interpolant through the values at the nodes. */
    static double[] coefficients(double[] values) {
        double[] t = new double[DEGREE + 1];
        for (int i = 0; i <= DEGREE; i++) {
            double sum = 0;
            for (int j = 0; j <= DEGREE; j++) {
                sum += TRANSFORM[i][j] * values[j];
            }
            t[i] = sum;
        }
        return t;
    }

    /** Powers of s from Chebyshev coefficients 0 … last. */
    static double[] powers(double[] t, int last) {
        double[] p = new double[last + 1];
        for (int i = 0; i <= last; i++) {
            for (int j = i % 2; j <= i; j += 2) {
                p[j] += t[i] * POWERS[i][j];
            }
        }
        return p;
    }

    /** Σ p_k s^k. */
    static double value(double[] p, double s) {
        double y = 0;
        for (int i = p.length - 1; i >= 0; i--) {
            y = y * s + p[i];
        }
        return y;
    }

    /** Σ k p_k s^(k−1). */
    static double slope(double[] p, double s) {
        double y = 0;
        for (int i = p.length - 1; i > 0; i--) {
            y = y * s + i * p[i];
        }
        return y;
    }
}
