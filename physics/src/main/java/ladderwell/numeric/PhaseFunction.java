package ladderwell.numeric;

/**
 * One oscillator function phi_n(x) at any x for the price of a few dozen operations, whatever n from 512 up.
 *
 * <p>Letters: M = 2n+1 = mu^2, x = mu t. With the phase counted from the centre and from the turning point,
 *
 * <pre>
 *   Phi = (M asin t + x sqrt(M - x^2))/2,   xi = M pi/4 - Phi     (inside)
 *   xi  = (x sqrt(x^2 - M) - M arcosh t)/2                        (outside)
 * </pre>
 *
 * the function is, to all orders in 1/M, sqrt(2/Z') Ai(Z) with a Z(x) that is smooth through the turning point,
 * Z Z'^2 - {Z,x}/2 = x^2 - M (Schwarzian derivative; substitute y = w(Z)/sqrt(Z') in y'' = (x^2 - M) y). Three pieces:
 *
 * <ul>
 *   <li>|Z| below 12: Z = 2^(1/3) mu^(4/3) (W0 + W1/M^2 + W2/M^4), power series in d = 1 - t that solve that equation order by order.
 *       d is formed from mu in double-double, so that nothing is lost in mu - x.
 *   <li>inside: amplitude and phase. Phi is reduced modulo pi/2 in double-double (a double Phi of 1e6 is only good to 1e-10).
 *       Corrections: the Airy function's own asymptotic series, 15 orders, which alone count near the turning point, and what the first
 *       four WKB orders (closed forms, below) have beyond it; from n = 512 up the fifth has nothing to add.
 *   <li>outside: the same with exp(-xi) for the cosine; xi in double-double, so that the relative error does not grow with xi.
 * </ul>
 *
 * <p>asin and arcosh in double-double: with the angle a_i = i/64 nearest to the wanted one, and sin a_i, cos a_i (sinh, cosh) tabled,
 * the sine of the small rest is x cos a_i - sqrt(M-x^2) sin a_i over mu, and its arc is that plus a correction so small that a double
 * holds it.
 *
 * @accuracy absolute 3e-16 for every x and n from 512 to 1000000 (worst seen 1e-16 against 40-digit references); in the tail also
 *     relative, 2e-15, however small the value
 * @source W1, W2 and the WKB orders are exact rationals derived by phase_function_series.py beside the tests; NIST Digital Library of
 *     Mathematical Functions 12.10 has the first of them and the form of the expansion
 */
final class PhaseFunction {
    /** The first index for which the orders kept here reach rounding. */
    static final int FIRST_INDEX = 512;

    private static final int PER_UNIT = 64;
    /** Angles to 2; windows that start at 512 ask for points to 95 = 3 mu, arcosh 3 = 1.76; the circular table uses only those to pi/2. */
    private static final int ANGLES = 2 * PER_UNIT;

    private static final double[][] CIRCULAR = anglesTable(-1.0);
    private static final double[][] HYPERBOLIC = anglesTable(1.0);

    private static final double PI_OVER_2_HI = DoubleDouble.QUARTER_TURN.hi();
    private static final double PI_OVER_2_LO = DoubleDouble.QUARTER_TURN.lo();
    private static final double LN_2_HI = DoubleDouble.LN_2.hi();
    private static final double LN_2_LO = DoubleDouble.LN_2.lo();
    private static final double ROOT_2_OVER_PI = 0x1.9884533d43651p-1;

    /** W0 = -d f, f = S^(2/3), S = sum 3 binomial(1/2,k) (-d/2)^k/(2k+3): from xi = M times the integral of sqrt(u(2-u)) to d. */
    private static final double[] W0 = leadingSeries(20);

    /** (f - 1)/d. */
    private static final double[] BEND = bend(W0);

    private static final double[] W0_SLOPE = slope(W0);
    private static final double[] W1 = {
        -9.0 / 280,
        -7.0 / 450,
        -20689.0 / 2425500,
        -74059.0 / 15765750,
        -7274713.0 / 2837835000.0,
        -0.0013849705136651915,
        -7.416994678730806E-4,
        -3.9428516648528766E-4,
        -2.0831852512119426E-4,
        -1.0950141205953803E-4
    };
    private static final double[] W1_SLOPE = slope(W1);
    private static final double[] W2 = {
        737.0 / 65000,
        3922909.0 / 382016250,
        0.009654554468992244,
        0.008427826261840498,
        0.0068632094095046805,
        0.0052810223480935494
    };
    private static final double[] W2_SLOPE = slope(W2);

    private final int n;
    private final double square;
    private final double mu;
    private final double muLo;
    private final double inverseMu;
    private final double inverseMuLo;
    private final double order;
    /** (2 mu)^(1/3), one over the length on which the function turns, and its low part. */
    private final double inverseLength;

    private final double inverseLengthLo;
    private final double airyScale;
    private final double seamDistance;

    PhaseFunction(int n) {
        if (n < FIRST_INDEX) {
            throw new IllegalArgumentException(
                    "index " + n + " is below " + FIRST_INDEX + ", where the phase function starts");
        }
        this.n = n;
        square = 2.0 * n + 1.0;
        DoubleDouble root = DoubleDouble.of(square).sqrt();
        mu = root.hi();
        muLo = root.lo();
        DoubleDouble inverse = DoubleDouble.ONE.dividedBy(root);
        inverseMu = inverse.hi();
        inverseMuLo = inverse.lo();
        order = 1.0 / (square * square);
        DoubleDouble length = cubeRoot(root.times(2.0));
        inverseLength = length.hi();
        inverseLengthLo = length.lo();
        airyScale = inverseLength * mu;
        seamDistance = AiryFunction.SEAM / inverseLength;
    }

    /** phi_n(x); 0 where it is below the smallest double. */
    double at(double x) {
        return scaled(x, 0);
    }

    /** phi_n(x) times 2^shift, computed without underflow on the way; x finite. */
    double scaled(double x, int shift) {
        if (x == 0.0 && (n & 1) != 0) {
            return 0.0;
        }
        double distance = Math.abs(x);
        double value;
        if (distance > mu + seamDistance) {
            value = outside(distance, shift);
        } else if (distance < mu - seamDistance) {
            value = Math.scalb(inside(distance), shift);
        } else {
            value = Math.scalb(aroundTurningPoint(distance), shift);
        }
        return x < 0 && (n & 1) != 0 ? -value : value;
    }

    /** The binary exponent k for which phi_n(x) 2^k is near 1 in the tail; 0 elsewhere. */
    int tailShift(double x) {
        double distance = Math.abs(x);
        if (distance <= mu + seamDistance) {
            return 0;
        }
        double root = Math.sqrt((distance - mu) * (distance + mu));
        double xi = 0.5 * (distance * root - square * Math.log((distance + root) * inverseMu));
        return (int) Math.rint(xi / LN_2_HI);
    }

    private double inside(double x) {
        double xx = x * x;
        double q = square - xx;
        double qLo = DoubleDouble.sumError(square, -xx, q) - DoubleDouble.productError(x, x, xx);
        double near = Math.sqrt(q);
        double nearLo = (Math.fma(-near, near, q) + qLo) / (2.0 * near);
        // Close to the turning point qLo is many units of q, so the pair is brought to order again.
        double root = near + nearLo;
        double rootLo = nearLo - (root - near);

        // Twice the phase: M a_i + M (asin t - a_i) + x sqrt(M - x^2), each with its rounding error.
        int i = (int) Math.rint(PER_UNIT * roughAngle(x, root));
        double cos = CIRCULAR[0][i];
        double sin = CIRCULAR[2][i];
        double p1 = x * cos;
        double p2 = root * sin;
        double e1 = Math.fma(x, cos, -p1) + x * CIRCULAR[1][i];
        double e2 = Math.fma(root, sin, -p2) + (root * CIRCULAR[3][i] + rootLo * sin);
        double u = p1 - p2;
        double uLo = DoubleDouble.sumError(p1, -p2, u) + (e1 - e2);
        double s = u * inverseMu;
        double sLo = Math.fma(u, inverseMu, -s) + (u * inverseMuLo + uLo * inverseMu);
        double s2 = s * s;
        double arc = s * s2 * (1.0 / 6 + s2 * (3.0 / 40 + s2 * (5.0 / 112 + s2 * (35.0 / 1152))));
        double a = square * ((double) i / PER_UNIT);
        double b = square * s;
        double bLo = Math.fma(square, s, -b) + square * (sLo + (arc + 0.5 * s2 * sLo));
        double c = x * root;
        double cLo = Math.fma(x, root, -c) + x * rootLo;
        double ab = a + b;
        double twice = ab + c;
        double twiceLo = DoubleDouble.sumError(a, b, ab) + DoubleDouble.sumError(ab, c, twice) + bLo + cLo;
        double phase = 0.5 * twice;
        double phaseLo = 0.5 * twiceLo;

        double t = x * inverseMu;
        double tt = t * t;
        double w = mu / (root * (q + qLo));
        double ww = w * w;
        double half = square * PI_OVER_2_HI;
        double halfLo = Math.fma(square, PI_OVER_2_HI, -half) + square * PI_OVER_2_LO;
        double xi = 0.5 * ((half - twice) + (halfLo - twiceLo));
        double[] g = AiryFunction.LOGARITHM;
        double z = 1.0 / xi;
        double zz = z * z;
        double first = w * t * firstOrder(tt) + g[1] * z;
        double shift = first - w * ww * t * thirdOrder(tt) - zz * (g[3] * z + g[1] * first);
        double steepness =
                -ww * (secondOrder(tt) - ww * fourthOrder(tt)) + zz * (g[2] - zz * g[4] - 2.0 * g[2] * z * first);
        z = 1.0 / (xi + shift);
        double correction = shift + AiryFunction.phaseCorrection(z);
        double logAmplitude = steepness + AiryFunction.logModulus(z);
        double amplitude = ROOT_2_OVER_PI
                / Math.sqrt(root)
                * (1.0 + logAmplitude * (1.0 + logAmplitude * (0.5 + logAmplitude / 6.0)));

        // phi = amplitude cos(n pi/2 - Phi + correction)
        double quarters = Math.rint(phase * (1.0 / PI_OVER_2_HI));
        double rest =
                Math.fma(-quarters, PI_OVER_2_HI, phase) + (Math.fma(-quarters, PI_OVER_2_LO, phaseLo) - correction);
        int quadrant = (n - (int) quarters) & 3;
        double wave = (quadrant & 1) == 0 ? Math.cos(rest) : Math.sin(rest);
        return quadrant < 2 ? amplitude * wave : -amplitude * wave;
    }

    private double outside(double x, int shift) {
        double xx = x * x;
        double q = xx - square;
        double qLo = DoubleDouble.sumError(xx, -square, q) + DoubleDouble.productError(x, x, xx);
        double near = Math.sqrt(q);
        double nearLo = (Math.fma(-near, near, q) + qLo) / (2.0 * near);
        // Close to the turning point qLo is many units of q, so the pair is brought to order again.
        double root = near + nearLo;
        double rootLo = nearLo - (root - near);

        int i = (int) Math.rint(PER_UNIT * Math.log((x + root) * inverseMu));
        if (i > ANGLES) {
            // Farther than 3.7 mu, where xi is above 5 M: phi is below exp(-5000).
            return 0.0;
        }
        double cosh = HYPERBOLIC[0][i];
        double sinh = HYPERBOLIC[2][i];
        double p1 = root * cosh;
        double p2 = x * sinh;
        double e1 = Math.fma(root, cosh, -p1) + (root * HYPERBOLIC[1][i] + rootLo * cosh);
        double e2 = Math.fma(x, sinh, -p2) + x * HYPERBOLIC[3][i];
        double u = p1 - p2;
        double uLo = DoubleDouble.sumError(p1, -p2, u) + (e1 - e2);
        double s = u * inverseMu;
        double sLo = Math.fma(u, inverseMu, -s) + (u * inverseMuLo + uLo * inverseMu);
        double s2 = s * s;
        double arc = -s * s2 * (1.0 / 6 - s2 * (3.0 / 40 - s2 * (5.0 / 112 - s2 * (35.0 / 1152))));
        double a = square * ((double) i / PER_UNIT);
        double b = square * s;
        double bLo = Math.fma(square, s, -b) + square * (sLo + (arc - 0.5 * s2 * sLo));
        double c = x * root;
        double cLo = Math.fma(x, root, -c) + x * rootLo;
        double ca = c - a;
        double twice = ca - b;
        double twiceLo = DoubleDouble.sumError(c, -a, ca) + DoubleDouble.sumError(ca, -b, twice) + (cLo - bLo);
        double xi = 0.5 * (twice + twiceLo);
        double xiLo = 0.5 * (twiceLo - (2.0 * xi - twice));

        double t = x * inverseMu;
        double tt = t * t;
        double w = mu / (root * (q + qLo));
        double ww = w * w;
        double[] g = AiryFunction.LOGARITHM;
        double z = 1.0 / xi;
        double zz = z * z;
        double first = -w * t * firstOrder(tt) - g[1] * z;
        double farther = first - w * ww * t * thirdOrder(tt) - zz * (g[3] * z - g[1] * first);
        double steepness =
                ww * (secondOrder(tt) + ww * fourthOrder(tt)) - zz * (g[2] + zz * g[4] - 2.0 * g[2] * z * first);
        z = 1.0 / (xi + farther);
        double logarithm = steepness - farther + AiryFunction.logDecay(z);
        double powers = Math.rint(xi / LN_2_HI);
        double rest = Math.fma(-powers, LN_2_HI, xi) + (Math.fma(-powers, LN_2_LO, xiLo) - logarithm);
        return Math.scalb(0.5 * ROOT_2_OVER_PI / Math.sqrt(root) * Math.exp(-rest), shift - (int) powers);
    }

    private double aroundTurningPoint(double x) {
        // Z = -r (mu - x) (f(d) + ...) with r = (2 mu)^(1/3). The phase turns by |Z|^(1/2) dZ, so the product r (mu -
        // x)
        // is kept exactly, and only what the small rest of f adds is rounded.
        double gap = mu - x;
        double y = gap * inverseLength;
        double yLo = Math.fma(gap, inverseLength, -y) + (gap * inverseLengthLo + muLo * inverseLength);
        double d = (gap + muLo) * inverseMu;
        double bend = y * d * polynomial(BEND, d);
        double higher = airyScale * order * (polynomial(W1, d) + order * polynomial(W2, d));
        double slope = polynomial(W0_SLOPE, d) + order * (polynomial(W1_SLOPE, d) + order * polynomial(W2_SLOPE, d));
        return Math.sqrt(2.0 / (-slope * inverseLength)) * AiryFunction.value(-y, (higher - bend) - yLo);
    }

    // WKB orders 1 to 4 of log phi outside, without their factor w^k, w = mu/sqrt(|M - x^2|)^3; odd ones also want a
    // factor t. Inside
    // w^2 changes sign, which makes phases of the odd ones.

    private static double firstOrder(double tt) {
        return -1.0 / 4 + tt / 24;
    }

    private static double secondOrder(double tt) {
        return 1.0 / 8 + 3.0 / 16 * tt;
    }

    private static double thirdOrder(double tt) {
        return -19.0 / 32 + tt * (-31.0 / 96 + tt * (-49.0 / 640 + tt * (7.0 / 160 - 7.0 / 720 * tt)));
    }

    private static double fourthOrder(double tt) {
        return 5.0 / 16 + tt * (93.0 / 32 + 153.0 / 128 * tt);
    }

    /** atan2(y, x) for the first quadrant to 0.004, enough to pick a row of the table. */
    private static double roughAngle(double y, double x) {
        if (y <= x) {
            double r = y / x;
            return r * (1.0584 - 0.273 * r);
        }
        double r = x / y;
        return PI_OVER_2_HI - r * (1.0584 - 0.273 * r);
    }

    private static double polynomial(double[] coefficients, double d) {
        double value = coefficients[coefficients.length - 1];
        for (int k = coefficients.length - 2; k >= 0; k--) {
            value = Math.fma(value, d, coefficients[k]);
        }
        return value;
    }

    private static double[] slope(double[] coefficients) {
        double[] slope = new double[coefficients.length - 1];
        for (int k = 0; k < slope.length; k++) {
            slope[k] = (k + 1) * coefficients[k + 1];
        }
        return slope;
    }

    private static double[] leadingSeries(int terms) {
        double[] s = new double[terms];
        double binomial = 1.0;
        for (int k = 0; k < terms; k++) {
            s[k] = 3.0 * binomial / (2 * k + 3);
            binomial *= -0.5 * (0.5 - k) / (k + 1);
        }
        // f = s^(2/3) from f' s = 2/3 s' f, coefficient by coefficient.
        double[] f = new double[terms];
        f[0] = 1.0;
        for (int k = 1; k < terms; k++) {
            for (int j = 1; j <= k; j++) {
                f[k] += (2.0 / 3 * j - (k - j)) * s[j] * f[k - j] / k;
            }
        }
        double[] w = new double[terms + 1];
        for (int k = 0; k < terms; k++) {
            w[k + 1] = -f[k];
        }
        return w;
    }

    private static double[] bend(double[] w0) {
        double[] bend = new double[w0.length - 2];
        for (int k = 0; k < bend.length; k++) {
            bend[k] = -w0[k + 2];
        }
        return bend;
    }

    private static DoubleDouble cubeRoot(DoubleDouble a) {
        DoubleDouble near = DoubleDouble.of(Math.cbrt(a.hi()));
        DoubleDouble square = near.times(near);
        return near.minus(square.times(near).minus(a).dividedBy(square.times(3.0)));
    }

    /** Rows cos, its low part, sin, its low part of i/64 (sign -1), or cosh and sinh (sign +1), by their power series in double-double. */
    private static double[][] anglesTable(double sign) {
        double[][] table = new double[4][ANGLES + 1];
        for (int i = 0; i <= ANGLES; i++) {
            double angle = (double) i / PER_UNIT;
            double square = sign * angle * angle;
            DoubleDouble cos = DoubleDouble.ONE;
            DoubleDouble sin = DoubleDouble.ONE;
            for (int k = 40; k >= 2; k -= 2) {
                cos = cos.times(square).dividedBy((k - 1.0) * k).plus(1.0);
                sin = sin.times(square).dividedBy(k * (k + 1.0)).plus(1.0);
            }
            sin = sin.times(angle);
            table[0][i] = cos.hi();
            table[1][i] = cos.lo();
            table[2][i] = sin.hi();
            table[3][i] = sin.lo();
        }
        return table;
    }
}
