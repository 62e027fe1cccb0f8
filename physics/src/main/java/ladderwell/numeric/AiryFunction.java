package ladderwell.numeric;

/**
 * The Airy function Ai for -12.5 <= z <= 12.5, and the coefficients of the logarithm of its asymptotic series outside.
 *
 * <p>Inside: Taylor series about the nearest of 101 centres a quarter apart. Their values are built once, in double-double, by the same
 * series: from z = 0 down (both solutions oscillate, nothing is lost), and from z = 15 to 0 for the other half, where Ai grows and
 * every error made at the start dies; the scale there comes from Ai(0).
 *
 * @accuracy relative to the modulus of Ai, a few 1e-16 for given z (absolute for z < 0, relative for z > 0)
 * @source NIST Digital Library of Mathematical Functions 9.2.1, 9.2.3, 9.7.1-9.7.9
 */
final class AiryFunction {
    /** Beyond this |z| the asymptotic series is used: the phase 2/3 z^(3/2) is then at least 27.7 and its 15 terms reach 1e-16. */
    static final double SEAM = 12.0;

    private static final double RANGE = 12.5;
    private static final int PER_UNIT = 4;
    /** Half a spacing is 1/8; the next term would be (sqrt(12.5)/8)^16/16! = 1e-19 of the modulus. */
    private static final int TERMS = 16;

    private static final DoubleDouble AT_ZERO = new DoubleDouble(0x1.6b8c7962715b8p-2, 0x1.7a96d7bb04e65p-56);
    private static final DoubleDouble SLOPE_AT_ZERO = new DoubleDouble(-0x1.0907f42b70f8bp-2, 0x1.d1459035afde2p-56);
    private static final double[][] SERIES = series();

    /** a_k, k = 0..15, with log(sum u_k t^k) = sum a_k t^k and u_k the coefficients of DLMF 9.7.2; t = 1/(2/3 z^(3/2)). */
    static final double[] LOGARITHM = logarithm(16);

    private AiryFunction() {}

    /** Ai(z + rest) for |z + rest| <= 12.5; rest carries what z was rounded by, or any small part of it. */
    static double value(double z, double rest) {
        int centre = (int) Math.rint((z + rest) * PER_UNIT);
        double h = (z - (double) centre / PER_UNIT) + rest;
        double[] a = SERIES[centre + (int) (RANGE * PER_UNIT)];
        double h2 = h * h;
        // Even and odd powers apart: two short chains instead of one long one.
        double even = a[TERMS - 2];
        double odd = a[TERMS - 1];
        for (int k = TERMS - 4; k >= 0; k -= 2) {
            even = Math.fma(even, h2, a[k]);
            odd = Math.fma(odd, h2, a[k + 1]);
        }
        return Math.fma(odd, h, even);
    }

    /** Phase of Ai(-z) less 2/3 z^(3/2) - pi/4, for t = 1/(2/3 z^(3/2)). */
    static double phaseCorrection(double t) {
        double tt = t * t;
        double sum = 0.0;
        for (int k = 15; k >= 1; k -= 2) {
            sum = LOGARITHM[k] - tt * sum;
        }
        return -t * sum;
    }

    /** Logarithm of the modulus of Ai(-z), over its leading term 1/(sqrt(pi) z^(1/4)). */
    static double logModulus(double t) {
        double tt = t * t;
        double sum = 0.0;
        for (int k = 14; k >= 2; k -= 2) {
            sum = LOGARITHM[k] - tt * sum;
        }
        return -tt * sum;
    }

    /** Logarithm of Ai(z) over its leading term exp(-1/t)/(2 sqrt(pi) z^(1/4)). */
    static double logDecay(double t) {
        double sum = 0.0;
        for (int k = 15; k >= 1; k--) {
            sum = -t * (sum + LOGARITHM[k]);
        }
        return sum;
    }

    private static double[][] series() {
        int half = (int) (RANGE * PER_UNIT);
        double[][] series = new double[2 * half + 1][];
        DoubleDouble[] state = {AT_ZERO, SLOPE_AT_ZERO};
        for (int c = 0; c >= -half; c--) {
            series[half + c] = coefficients((double) c / PER_UNIT, state);
            state = stepped((double) c / PER_UNIT, -1.0 / PER_UNIT, state);
        }
        // Downwards from z = 15 Ai is the growing solution. The slope it starts with is right to 1e-16; the part of the
        // other solution
        // this lets in has died to 1e-16 exp(-2 (38.7 - 29.5)) = 1e-24 by z = 12.5.
        int top = half + 10;
        DoubleDouble[][] states = new DoubleDouble[top + 1][];
        states[top] = new DoubleDouble[] {DoubleDouble.ONE, logarithmicSlope((double) top / PER_UNIT)};
        for (int c = top; c > 0; c--) {
            states[c - 1] = stepped((double) c / PER_UNIT, -1.0 / PER_UNIT, states[c]);
        }
        DoubleDouble scale = AT_ZERO.dividedBy(states[0][0]);
        for (int c = 1; c <= half; c++) {
            DoubleDouble[] scaled = {states[c][0].times(scale), states[c][1].times(scale)};
            series[half + c] = coefficients((double) c / PER_UNIT, scaled);
        }
        return series;
    }

    /** Ai'/Ai at a large z from the asymptotic series, good to 1e-16 at z = 15. */
    private static DoubleDouble logarithmicSlope(double z) {
        double root = Math.sqrt(z);
        double t = 1.0 / (z * root / 1.5);
        double slope = -root - 0.25 / z;
        double power = 1.0;
        double[] a = logarithm(16);
        for (int k = 1; k < a.length; k++) {
            power *= -t;
            // d/dz of a_k (-t)^k with t = 1.5 z^(-3/2)
            slope += -1.5 * k / z * a[k] * power;
        }
        return DoubleDouble.of(slope);
    }

    private static double[] coefficients(double centre, DoubleDouble[] state) {
        double[] rounded = new double[TERMS];
        DoubleDouble[] exact = taylor(centre, state, TERMS);
        for (int k = 0; k < TERMS; k++) {
            rounded[k] = exact[k].value();
        }
        return rounded;
    }

    /** Ai'' = z Ai about a centre: (k+2)(k+1) a_(k+2) = centre a_k + a_(k-1). */
    private static DoubleDouble[] taylor(double centre, DoubleDouble[] state, int terms) {
        DoubleDouble[] a = new DoubleDouble[terms];
        a[0] = state[0];
        a[1] = state[1];
        for (int k = 0; k + 2 < terms; k++) {
            DoubleDouble right = a[k].times(centre);
            if (k > 0) {
                right = right.plus(a[k - 1]);
            }
            a[k + 2] = right.dividedBy((k + 2.0) * (k + 1.0));
        }
        return a;
    }

    private static DoubleDouble[] stepped(double centre, double h, DoubleDouble[] state) {
        DoubleDouble[] a = taylor(centre, state, 40);
        DoubleDouble value = DoubleDouble.ZERO;
        DoubleDouble slope = DoubleDouble.ZERO;
        for (int k = a.length - 1; k >= 0; k--) {
            value = value.times(h).plus(a[k]);
            if (k > 0) {
                slope = slope.times(h).plus(a[k].times(k));
            }
        }
        return new DoubleDouble[] {value, slope};
    }

    private static double[] logarithm(int terms) {
        double[] u = new double[terms];
        double[] a = new double[terms];
        u[0] = 1.0;
        for (int k = 1; k < terms; k++) {
            u[k] = u[k - 1] * ((6.0 * k - 5) * (6.0 * k - 3) * (6.0 * k - 1)) / (216.0 * k * (2.0 * k - 1));
            double rest = 0.0;
            for (int j = 1; j < k; j++) {
                rest += j * a[j] * u[k - j];
            }
            a[k] = u[k] - rest / k;
        }
        return a;
    }
}
