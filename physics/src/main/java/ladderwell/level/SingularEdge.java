package ladderwell.level;

/**
 * The regular solution of −y″ + v y = e y next to a left end where t² v is smooth, t the distance from the end: y = t^s Σ a_k (t/t₁)^k with
 * s (s − 1) = (t² v)(0) (Frobenius).
 */
final class SingularEdge {
    private static final int TERMS = 80;

    private final double end;
    private final double width;
    private final double exponent;
    private final double[] shape;

    private SingularEdge(double end, double width, double[] shape) {
        this.end = end;
        this.width = width;
        this.shape = shape;
        exponent = 0.5 + Math.sqrt(0.25 + shape[0]);
    }

    /** t₁: the series serves distances up to this. */
    double width() {
        return width;
    }

    /** @param eHigh no energy above four times the distance of this from 0 will be asked for */
    static SingularEdge at(CurveSurvey survey, double eHigh) {
        double most = Math.sqrt(5 / (4 * Math.max(Math.abs(eHigh), 1e-300)));
        double end = survey.left;
        int d = Chebyshev.DEGREE;
        for (double h = Math.min(survey.length, most); h > 1e-12 * survey.length; h *= 0.6) {
            double[] f = new double[d + 1];
            double size = 1e-2;
            for (int j = 0; j <= d; j++) {
                double t = h / 2 * (1 + Chebyshev.NODE[j]);
                f[j] = t * t * survey.v(end + t);
                size = Math.max(size, Math.abs(f[j]));
            }
            double[] t = Chebyshev.coefficients(f);
            int n = d;
            while (n > 0 && Math.abs(t[n]) <= 3e-16 * size) {
                n--;
            }
            if (n > 9) {
                continue;
            }
            double[] q = shifted(t, n);
            double sum = 0;
            for (int k = 1; k <= n; k++) {
                sum += Math.abs(q[k]);
            }
            // l (l + 1) is most often a whole number.
            double near = Math.rint(q[0]);
            if (Math.abs(q[0] - near) < 1e-13 * (1 + sum)) {
                q[0] = near;
            }
            if (q[0] < -0.25) {
                throw new IllegalArgumentException("the potential falls faster than −1/(8 t²) at its left end x = "
                        + end + ": it has no lowest level");
            }
            if (sum <= 0.5) {
                return new SingularEdge(end, h, q);
            }
        }
        throw new IllegalArgumentException("the potential at its left end x = " + end
                + " is singular in another way than 1/t or 1/t²; declare a wall a little inside");
    }

    /** Powers of τ = (1 + s)/2 from Chebyshev coefficients, by Clenshaw's rule on polynomials. */
    private static double[] shifted(double[] t, int n) {
        double[] b1 = new double[n + 1];
        double[] b2 = new double[n + 1];
        for (int i = n; i >= 0; i--) {
            double[] b = new double[n + 1];
            double m = i == 0 ? 1 : 2;
            for (int k = 0; k <= n; k++) {
                b[k] = m * ((k > 0 ? 2 * b1[k - 1] : 0) - b1[k]) - b2[k];
            }
            b[0] += t[i];
            b2 = b1;
            b1 = b;
        }
        return b1;
    }

    boolean serves(double e) {
        return Math.abs(e) * width * width <= 6;
    }

    /** {y, y′, ∂y/∂e, ∂y′/∂e} at t₁ with y ∝ t^s normed so that the first coefficient is 1 there. */
    double[] values(double e) {
        return at(e, 1);
    }

    /** The same at τ t₁, 0 &lt; τ ≤ 1. */
    double[] at(double e, double tau) {
        double w = e * width * width;
        double[] a = new double[TERMS];
        double[] b = new double[TERMS];
        double lead = Math.pow(tau, exponent);
        a[0] = 1;
        double y = 1;
        double d = exponent;
        double yE = 0;
        double dE = 0;
        double power = 1;
        for (int k = 1; k < TERMS; k++) {
            double p = 0;
            double q = 0;
            for (int j = 1; j <= k && j < shape.length; j++) {
                p += shape[j] * a[k - j];
                q += shape[j] * b[k - j];
            }
            if (k >= 2) {
                p -= w * a[k - 2];
                q -= w * b[k - 2] + width * width * a[k - 2];
            }
            double denominator = k * (2 * exponent + k - 1);
            a[k] = p / denominator;
            b[k] = q / denominator;
            power *= tau;
            y += a[k] * power;
            d += (exponent + k) * a[k] * power;
            yE += b[k] * power;
            dE += (exponent + k) * b[k] * power;
            if (k > 12 && Math.abs(a[k]) + Math.abs(a[k - 1]) < 1e-18) {
                break;
            }
        }
        double slope = lead / (tau * width);
        return new double[] {lead * y, slope * d, lead * yE, slope * dE};
    }
}
