package ladderwell.level;

import java.util.Arrays;
import java.util.function.DoubleUnaryOperator;
import org.jspecify.annotations.Nullable;

/**
 * One cell of the shooting mesh for −y″ + v y = e y, v = 2V, e = 2E. With s = (x − centre)/r in [−1, 1], the two solutions that start from the
 * centre are u = ξ + Σ C_m(s) s^(2m+1) η_m(Z s²) and v = Σ C_m(s) s^(2m+1) η_m(Z s²), Z = r² (mean − e), where the polynomials C_m do not
 * depend on e (constant perturbation method: Ixaru 1984; Ledoux, Van Daele and Vanden Berghe 2005; here all orders at once by
 * C_{m+1}[k] = ((r²Δv C_m)[k] − (k+2)(k+1) C_m[k+2]) / (2 (k+m+1))).
 */
final class Cell {
    /** Longest sum over η. */
    static final int TERMS = 40;

    private static final int LONGEST = 80;
    /** 1/2k. */
    private static final double[] HALVES = new double[LONGEST + TERMS + 2];

    static {
        for (int k = 1; k < HALVES.length; k++) {
            HALVES[k] = 0.5 / k;
        }
    }

    /** Rounding of v may exceed the tolerance by so much. */
    private static final double ROUGHEST = 64;

    private static final double[] CHECKS = {-1, -0.97, -0.31, 0.55, 0.93, 1};

    final double a;
    final double b;
    final double centre;
    final double r;
    final double mean;
    /** At least r² max |v − mean|. */
    final double theta;
    /** At least max |v − polynomial| where sampled. */
    final double fit;
    /** Lower bound of v. */
    final double low;
    /** Largest |v| met. */
    final double size;

    final int terms;
    private final double[][] ofU;
    private final double[][] ofV;
    /** Rows u, u′, v, v′ at s = 1, then at s = −1, each over ξ, η₀ … */
    private final double[] ends;

    /**
     * A try.
     *
     * @param cell the cell, null where refused
     * @param shorter by what factor to shorten then
     * @param misfit whether the polynomial did not follow the potential
     */
    record Attempt(@Nullable Cell cell, double shorter, boolean misfit) {}

    private Cell(
            double a,
            double b,
            double mean,
            double theta,
            double fit,
            double size,
            double[][] ofU,
            double[][] ofV,
            int terms) {
        this.a = a;
        this.b = b;
        centre = (a + b) / 2;
        r = (b - a) / 2;
        this.mean = mean;
        this.theta = theta;
        this.fit = fit;
        this.size = size;
        low = mean - theta / (r * r);
        this.terms = terms;
        this.ofU = ofU;
        this.ofV = ofV;
        int w = terms + 1;
        ends = new double[8 * w];
        double[] last = new double[4];
        for (int f = 0; f < 2; f++) {
            for (int m = terms - 1; m >= 0; m--) {
                double[] p = f == 0 ? ofU[m] : ofV[m];
                for (int side = 0; side < 2; side++) {
                    double s = 1 - 2 * side;
                    double value = Chebyshev.value(p, s);
                    int y = (4 * side + 2 * f) * w;
                    int d = y + w;
                    ends[y + 1 + m] = s * value;
                    // The derivative of s^(2m+1) η_m is s^(2m) η_{m−1}.
                    ends[d + 1 + m] = s * Chebyshev.slope(p, s) + (m + 1 < terms ? last[2 * f + side] : 0);
                    last[2 * f + side] = value;
                    if (m == 0) {
                        ends[d] = value;
                        ends[y] = f == 0 ? 1 : 0;
                    }
                }
            }
        }
    }

    /**
     * The cell on [a, b], unless v does not fit or varies too much.
     *
     * @param scale size of v that the fit may refer to besides the values in the cell
     * @param tolerance fit over that size
     * @param thetaMost largest r² max|v − mean| in any case
     * @param eLow the mesh serves energies above this: a cell may be longer if the phase outruns theta
     * @param survey whose places the cell is held against as well
     */
    static Attempt build(
            DoubleUnaryOperator v,
            double a,
            double b,
            double scale,
            double tolerance,
            double thetaMost,
            double eLow,
            CurveSurvey survey) {
        int d = Chebyshev.DEGREE;
        double c = (a + b) / 2;
        double r = (b - a) / 2;
        double[] f = new double[d + 1];
        double size = scale;
        double most = Double.NEGATIVE_INFINITY;
        double least = Double.POSITIVE_INFINITY;
        for (int j = 0; j <= d; j++) {
            f[j] = v.applyAsDouble(c + r * Chebyshev.NODE[j]);
            size = Math.max(size, Math.abs(f[j]));
            most = Math.max(most, f[j]);
            least = Math.min(least, f[j]);
        }
        double[] t = Chebyshev.coefficients(f);
        // The second part is the rounding of x itself; a cell so short that a jump would hide in it is none.
        double rounding = 2e-16 * Math.max(Math.abs(a), Math.abs(b)) * (most - least) / (2 * r);
        double eps = tolerance * size + Math.min(rounding, 1e-11 * size);
        double misfit = Math.abs(t[d]) + Math.abs(t[d - 1]);
        if (misfit > eps && misfit <= ROUGHEST * eps) {
            // Large terms that cancel leave a roughness that no shorter cell would lose; the fit measures it below.
            eps = Math.max(eps, Math.min(ROUGHEST * eps, 4 * roughness(v, c, r)));
        }
        if (!(misfit <= eps)) {
            return new Attempt(null, 0.75, true);
        }
        int n = d;
        while (n > 0 && Math.abs(t[n]) <= 0.4 * eps) {
            n--;
        }
        double fit = 0;
        for (int i = n + 1; i <= d; i++) {
            fit += Math.abs(t[i]);
        }
        double mean = t[0];
        for (int i = 2; i <= n; i += 2) {
            mean -= t[i] / (i * i - 1.0);
        }
        t[0] -= mean;
        double theta = 0;
        for (int i = 0; i <= n; i++) {
            theta += Math.abs(t[i]);
        }
        double fast = Math.sqrt(Math.max(0, r * r * (eLow - mean - theta)));
        theta *= r * r;
        if (!(theta <= Math.max(thetaMost, fast))) {
            double shorter = 0.97 * Math.cbrt(Math.max(thetaMost, fast) / theta);
            return new Attempt(null, Math.max(0.2, Math.min(0.9, shorter)), false);
        }
        double[] q = Chebyshev.powers(t, n);
        for (double s : CHECKS) {
            double x = s == -1 ? Math.nextUp(a) : s == 1 ? Math.nextDown(b) : c + r * s;
            fit = Math.max(fit, Math.abs(mean + Chebyshev.value(q, s) - v.applyAsDouble(x)));
        }
        double level = mean;
        if (!(fit <= 4 * eps && survey.agrees(a, b, 4 * eps, x -> level + Chebyshev.value(q, (x - c) / r)))) {
            return new Attempt(null, 0.75, true);
        }
        for (int j = 0; j <= n; j++) {
            q[j] *= r * r;
        }
        double[][] ofU = new double[TERMS + 1][];
        double[][] ofV = new double[TERMS + 1][];
        double[] first = new double[n + 2];
        for (int j = 0; j <= n; j++) {
            first[j + 1] = 0.5 * q[j] / (j + 1);
        }
        ofU[0] = first;
        ofV[0] = new double[] {1};
        double odd = 1;
        double base = Math.max(fast, 1e-9);
        double power = base;
        int m = 0;
        while (true) {
            ofU[m + 1] = next(ofU[m], q, m);
            ofV[m + 1] = next(ofV[m], q, m);
            odd *= 2 * m + 3;
            power *= base;
            if (m + 2 >= TERMS) {
                return new Attempt(null, 0.75, false);
            }
            if (m > 1 && Math.max(bound(ofU[m + 1]), bound(ofV[m + 1])) < 2e-17 * Math.max(odd, power)) {
                break;
            }
            m++;
        }
        return new Attempt(new Cell(a, b, mean, theta, fit, size, ofU, ofV, m + 1), 1, false);
    }

    /** Rounding of the values of v around c, from fourth differences so close together that a smooth function has none. */
    private static double roughness(DoubleUnaryOperator v, double c, double r) {
        double step = r * 0x1p-16;
        double[] f = new double[12];
        for (int i = 0; i < f.length; i++) {
            f[i] = v.applyAsDouble(c + (i - 6) * step);
        }
        double square = 0;
        for (int i = 0; i + 4 < f.length; i++) {
            double difference = (f[i] + f[i + 4]) - 4 * (f[i + 1] + f[i + 3]) + 6 * f[i + 2];
            square += difference * difference;
        }
        // 70 is the sum of the squares of 1, 4, 6, 4, 1.
        return Math.sqrt(square / (f.length - 4) / 70);
    }

    private static double[] next(double[] p, double[] q, int m) {
        int length = Math.min(p.length + q.length - 1, LONGEST);
        double[] o = new double[length];
        for (int j = 0; j < q.length; j++) {
            double factor = q[j];
            int many = Math.min(p.length, length - j);
            if (factor != 0) {
                for (int i = 0; i < many; i++) {
                    o[i + j] += factor * p[i];
                }
            }
        }
        int inner = Math.min(length, p.length - 2);
        for (int k = 0; k < inner; k++) {
            o[k] -= (k + 2.0) * (k + 1) * p[k + 2];
        }
        for (int k = 0; k < length; k++) {
            o[k] *= HALVES[k + m + 1];
        }
        while (length > 1 && Math.abs(o[length - 1]) < 1e-19) {
            length--;
        }
        return length == o.length ? o : Arrays.copyOf(o, length);
    }

    private static double bound(double[] p) {
        double sum = 0;
        for (int i = 0; i < p.length; i++) {
            sum += Math.abs(p[i]) * (1 + i);
        }
        return sum;
    }

    /** Z at an energy. */
    double z(double e) {
        return r * r * (mean - e);
    }

    /**
     * The eight numbers u, u′, v, v′ at s = side (out[0 … 3]) and their derivatives by Z (out[4 … 7]).
     *
     * @param g η at Z, up to index {@link #terms} + 1
     */
    void end(int side, double z, double[] g, boolean slopes, double[] out) {
        int w = terms + 1;
        int at = side > 0 ? 0 : 4 * w;
        double[] all = ends;
        double extra = side * z * g[1];
        double u = 0;
        double du = extra;
        double v = 0;
        double dv = 0;
        if (!slopes) {
            for (int i = 0; i <= terms; i++, at++) {
                double here = g[i];
                u = Math.fma(all[at], here, u);
                du = Math.fma(all[at + w], here, du);
                v += all[at + 2 * w] * here;
                dv += all[at + 3 * w] * here;
            }
        } else {
            // d(Z η₀)/dZ = (ξ + η₀)/2, dξ/dZ = η₀/2
            double uz = 0;
            double duz = side * (g[0] + g[1]);
            double vz = 0;
            double dvz = 0;
            double here = g[0];
            for (int i = 0; i <= terms; i++, at++) {
                double next = g[i + 1];
                double a = all[at];
                double b = all[at + w];
                double c = all[at + 2 * w];
                double d = all[at + 3 * w];
                u = Math.fma(a, here, u);
                uz = Math.fma(a, next, uz);
                du = Math.fma(b, here, du);
                duz = Math.fma(b, next, duz);
                v = Math.fma(c, here, v);
                vz = Math.fma(c, next, vz);
                dv = Math.fma(d, here, dv);
                dvz = Math.fma(d, next, dvz);
                here = next;
            }
            out[4] = 0.5 * uz;
            out[5] = 0.5 * duz;
            out[6] = 0.5 * vz;
            out[7] = 0.5 * dvz;
        }
        out[0] = u;
        out[1] = du;
        out[2] = v;
        out[3] = dv;
    }

    /** {y, dy/ds} at s for the solution with value yc and slope dc (in s) at the centre. */
    void at(double s, double z, double yc, double dc, double[] g, double[] out) {
        int exponent = EtaSeries.fill(z * s * s, terms, g);
        double y = yc * g[0];
        double d = yc * z * s * g[1];
        double even = 1;
        for (int m = 0; m < terms; m++) {
            double odd = even * s;
            double c = yc * Chebyshev.value(ofU[m], s) + dc * Chebyshev.value(ofV[m], s);
            double cs = yc * Chebyshev.slope(ofU[m], s) + dc * Chebyshev.slope(ofV[m], s);
            y += c * odd * g[1 + m];
            d += cs * odd * g[1 + m] + c * even * g[m];
            even = odd * s;
        }
        out[0] = exponent == 0 ? y : Math.scalb(y, exponent);
        out[1] = exponent == 0 ? d : Math.scalb(d, exponent);
    }

    /** C_m(s) s^(2m+1) of both solutions, for any number of {@link #value}s at s. */
    void shapes(double s, double[] u, double[] v) {
        double odd = s;
        for (int m = 0; m < terms; m++) {
            u[m] = odd * Chebyshev.value(ofU[m], s);
            v[m] = odd * Chebyshev.value(ofV[m], s);
            odd *= s * s;
        }
    }

    /** y at s for the solution with value yc and slope dc at the centre, from the {@link #shapes} there. */
    double value(double s, double z, double yc, double dc, double[] u, double[] v, double[] g) {
        int exponent = EtaSeries.fill(z * s * s, terms, g);
        double y = yc * g[0];
        for (int m = 0; m < terms; m++) {
            y += (yc * u[m] + dc * v[m]) * g[1 + m];
        }
        return exponent == 0 ? y : Math.scalb(y, exponent);
    }

    /** v at s by the polynomial. */
    double potential(double s) {
        return mean + 2 * Chebyshev.slope(ofU[0], s) / (r * r);
    }
}
