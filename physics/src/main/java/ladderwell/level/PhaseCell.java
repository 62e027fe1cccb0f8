package ladderwell.level;

import org.jspecify.annotations.Nullable;

/**
 * The slow phase function of −y″ + v y = e y on an interval deep inside the allowed region: y = w^{−1/2} sin ∫w with w² = q − L″/2 + L′²/4, q = e −
 * v, L = ln w (Milne, Phys. Rev. 35 (1930) 863; without steps for as many waves as one likes). The equation is iterated on Chebyshev points
 * from w² = q; each round brings the next order of the semiclassical series.
 */
final class PhaseCell {
    private static final int N = 20;
    private static final int ROUNDS = 12;

    private static final double[] NODE = new double[N + 1];
    private static final double[] WEIGHT = new double[N + 1];
    /** Columns one after the other. */
    private static final double[] SLOPE = new double[(N + 1) * (N + 1)];

    private static final double[][] LAST = new double[2][N + 1];
    private static final double[] CHECKS = {-0.993, -0.77, -0.31, 0.06, 0.43, 0.87, 0.998};

    static {
        for (int j = 0; j <= N; j++) {
            // Sines of the small angle keep the symmetry exact.
            NODE[j] = Math.sin(Math.PI * (2 * j - N) / (2.0 * N));
        }
        for (int j = 0; j <= N; j++) {
            double sum = 0;
            for (int k = 0; k <= N; k += 2) {
                double half = k == 0 || k == N ? 0.5 : 1;
                sum += half * Math.cos(Math.PI * j * k / N) * 2 / (1.0 - k * k);
            }
            WEIGHT[j] = sum * (j == 0 || j == N ? 1.0 : 2.0) / N;
        }
        for (int i = 0; i <= N; i++) {
            double sum = 0;
            for (int j = 0; j <= N; j++) {
                if (i != j) {
                    double c = (i == 0 || i == N ? 2.0 : 1) / (j == 0 || j == N ? 2.0 : 1);
                    double d = c * ((i + j) % 2 == 0 ? 1 : -1) / (NODE[i] - NODE[j]);
                    SLOPE[j * (N + 1) + i] = d;
                    sum += d;
                }
            }
            SLOPE[i * (N + 1) + i] = -sum;
        }
        for (int k = N - 1; k <= N; k++) {
            for (int j = 0; j <= N; j++) {
                double half = j == 0 || j == N ? 0.5 : 1;
                LAST[k - N + 1][j] = (k == N ? 1.0 : 2.0) / N * half * Math.cos(Math.PI * k * (N - j) / N);
            }
        }
    }

    final double a;
    final double b;
    /** At least max |v − polynomial| where sampled. */
    final double fit;

    private final double r;
    private final double[] v;

    /** Largest change that a further round would make in ∫w, and what the Chebyshev series leaves off. */
    double open;
    /** ∫w over the cell. */
    double phase;
    /** ∫dx/w, to which the probability of being here is proportional. */
    double stay;
    /** w and w′/2w at a. */
    double wa;

    double bendA;
    /** The same at b. */
    double wb;

    double bendB;

    private PhaseCell(double a, double b, double[] v, double fit) {
        this.a = a;
        this.b = b;
        this.v = v;
        this.fit = fit;
        r = (b - a) / 2;
    }

    /**
     * The cell on [a, b] where v follows a polynomial there; otherwise null.
     *
     * @param size of v that the fit may refer to besides the values in the cell
     */
    static @Nullable PhaseCell build(CurveSurvey survey, double a, double b, double size) {
        double c = (a + b) / 2;
        double r = (b - a) / 2;
        double[] v = new double[N + 1];
        double scale = size;
        for (int j = 0; j <= N; j++) {
            double x = j == 0 ? Math.nextUp(a) : j == N ? Math.nextDown(b) : c + r * NODE[j];
            v[j] = survey.v(x);
            scale = Math.max(scale, Math.abs(v[j]));
        }
        double allowed = 1e-15 * scale;
        double left = Math.abs(last(v, 0)) + Math.abs(last(v, 1));
        if (!(left <= allowed)) {
            return null;
        }
        double fit = left;
        for (double s : CHECKS) {
            fit = Math.max(fit, Math.abs(between(v, s) - survey.v(c + r * s)));
        }
        return fit <= 4 * allowed && survey.agrees(a, b, 4 * allowed, x -> between(v, (x - c) / r))
                ? new PhaseCell(a, b, v, fit)
                : null;
    }

    /** Coefficient N − 1 or N of the Chebyshev series. */
    private static double last(double[] f, int which) {
        double sum = 0;
        for (int j = 0; j <= N; j++) {
            sum += LAST[which][j] * f[j];
        }
        return sum;
    }

    /** The interpolant at s by the barycentric formula. */
    private static double between(double[] f, double s) {
        double above = 0;
        double below = 0;
        for (int j = 0; j <= N; j++) {
            double d = s - NODE[j];
            if (d == 0) {
                return f[j];
            }
            double t = (j == 0 || j == N ? 0.5 : 1) * ((j & 1) == 0 ? 1 : -1) / d;
            above += t * f[j];
            below += t;
        }
        return above / below;
    }

    private static void slope(double[] f, double scale, double[] out) {
        for (int i = 0; i <= N; i++) {
            out[i] = 0;
        }
        for (int j = 0; j <= N; j++) {
            double here = scale * f[j];
            int column = j * (N + 1);
            for (int i = 0; i <= N; i++) {
                out[i] = Math.fma(SLOPE[column + i], here, out[i]);
            }
        }
    }

    /**
     * The phase function at e, left in the fields.
     *
     * @param allowed phase that may be left open
     * @param room arrays of {@link #room}
     * @return whether it converged
     */
    boolean at(double e, double allowed, double[][] room) {
        double[] log = room[0];
        double[] first = room[1];
        double[] second = room[2];
        double[] w = room[3];
        double least = Double.POSITIVE_INFINITY;
        double most = 0;
        for (int j = 0; j <= N; j++) {
            double q = e - v[j];
            least = Math.min(least, q);
            most = Math.max(most, q);
        }
        if (!(least > 0)) {
            return false;
        }
        // Logarithms about the middle: their derivatives lose fewer digits.
        double unit = Math.sqrt(least * most);
        for (int j = 0; j <= N; j++) {
            log[j] = 0.5 * Math.log((e - v[j]) / unit);
        }
        double waves = 2 * r * Math.sqrt(most);
        double change = Double.POSITIVE_INFINITY;
        for (int round = 0; round < ROUNDS; round++) {
            slope(log, 1 / r, first);
            slope(first, 1 / r, second);
            double before = change;
            change = 0;
            for (int j = 0; j <= N; j++) {
                double square = e - v[j] - 0.5 * second[j] + 0.25 * first[j] * first[j];
                if (!(square > 0)) {
                    return false;
                }
                w[j] = Math.sqrt(square);
                double next = 0.5 * Math.log(square / unit);
                change = Math.max(change, Math.abs(next - log[j]));
                log[j] = next;
            }
            if (change * waves <= 0.3 * allowed || change >= 0.5 * before) {
                break;
            }
        }
        open = (change + Math.abs(last(log, 0)) + Math.abs(last(log, 1))) * waves;
        if (!(open <= allowed)) {
            return false;
        }
        phase = 0;
        stay = 0;
        for (int j = 0; j <= N; j++) {
            phase += WEIGHT[j] * w[j];
            stay += WEIGHT[j] / w[j];
        }
        wa = w[0];
        wb = w[N];
        phase *= r;
        stay *= r;
        slope(log, 1 / r, first);
        bendA = 0.5 * first[0];
        bendB = 0.5 * first[N];
        return true;
    }

    static double[][] room() {
        return new double[4][N + 1];
    }
}
