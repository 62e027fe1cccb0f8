package ladderwell.numeric;

/**
 * Phase factors e^{-i E t} for a block of levels at one time, E and t double-double.
 *
 * <p>The product E t is formed exactly (fused multiply-add), multiples of π/2 are taken off with π/2 in three parts
 * (Cody-Waite reduction, see Muller, Elementary Functions, ch. 11), and sine and cosine of the rest come from their Taylor series.
 * The loops have no branches, all their arrays are read at the same index, and each is short: so the compiler vectorises them
 * (an offset that differs between arrays makes them four times slower).
 *
 * <p>Error budget, u = 2^-53, for |E t| ≤ {@link #FAST_LIMIT}. The quadrant k comes from the rounded product, so the rest r is at most
 * π/4 + 2^48 u (quotient, product and tail) &lt; 0.87. r0 = p - k P1 is exact (a multiple of 2^-53 below 2). The tail is summed to 0.12 u,
 * the last addition costs 0.5 u: 0.62 u in the angle. Series: cosine 1.1 u, sine 0.9 u, together 1.4 u. In all 2.1 u; stated as
 * {@link #ERROR}. Beyond the fast limit the rest is kept in two doubles and the same bound holds.
 */
final class PhaseFactors {
    /** Bound on |computed - e^{-iEt}|, relative and absolute (the factor has modulus 1). */
    static final double ERROR = 2.5 * 0x1p-53;

    /** Largest |E t| for the branch-free loops. */
    static final double FAST_LIMIT = 0x1p48;

    // π/2 = PI_2_HIGH + PI_2_MIDDLE + PI_2_LOW to 2^-162; each part is π/2 minus the parts before, rounded to double.
    static final double PI_2_HIGH = 0x1.921fb54442d18p0;
    static final double PI_2_MIDDLE = 0x1.1a62633145c07p-54;
    static final double PI_2_LOW = -0x1.f1976b7ed8fbcp-110;
    private static final double TWO_OVER_PI = 0x1.45f306dc9c883p-1;
    // Adding and subtracting 1.5 · 2^52 rounds to the nearest integer (for |x| < 2^51).
    private static final double ROUND = 0x1.8p52;

    private final double[] rest;
    private final double[] quadrant;

    /** Scratch for up to {@code capacity} levels at a time; for one thread. */
    PhaseFactors(int capacity) {
        rest = new double[capacity];
        quadrant = new double[capacity];
    }

    /**
     * Writes cos(E t) and -sin(E t) for the first {@code count} levels.
     *
     * @param largestPhase bound on |E t| over the levels; chooses the loops
     */
    void write(
            double[] energyHigh,
            double[] energyLow,
            int count,
            double timeHigh,
            double timeLow,
            double largestPhase,
            double[] re,
            double[] im) {
        if (largestPhase > FAST_LIMIT) {
            for (int k = 0; k < count; k++) {
                writeFar(energyHigh[k], energyLow[k], timeHigh, timeLow, re, im, k);
            }
            return;
        }
        reduce(energyHigh, energyLow, count, timeHigh, timeLow, rest, quadrant);
        cosineAndSine(rest, count, re, im);
        turn(quadrant, count, re, im);
    }

    private static void reduce(
            double[] energyHigh,
            double[] energyLow,
            int length,
            double timeHigh,
            double timeLow,
            double[] rest,
            double[] quadrant) {
        for (int k = 0; k < length; k++) {
            double high = energyHigh[k];
            double p = high * timeHigh;
            double tail = Math.fma(high, timeHigh, -p) + Math.fma(high, timeLow, energyLow[k] * timeHigh);
            double q = (p * TWO_OVER_PI + ROUND) - ROUND;
            double r0 = Math.fma(-q, PI_2_HIGH, p);
            rest[k] = r0 + Math.fma(-q, PI_2_MIDDLE, tail);
            quadrant[k] = q - 4 * ((q * 0.25 + ROUND) - ROUND);
        }
    }

    private static void cosineAndSine(double[] rest, int length, double[] cosine, double[] sine) {
        for (int k = 0; k < length; k++) {
            double r = rest[k];
            double z = r * r;
            cosine[k] = cosine(z);
            sine[k] = sine(r, z);
        }
    }

    /** cos r from z = r², |r| < 0.87; truncation below 0.1 u. */
    private static double cosine(double z) {
        double c = Math.fma(z, 1.0 / 20922789888000.0, -1.0 / 87178291200.0);
        c = Math.fma(z, c, 1.0 / 479001600.0);
        c = Math.fma(z, c, -1.0 / 3628800.0);
        c = Math.fma(z, c, 1.0 / 40320.0);
        c = Math.fma(z, c, -1.0 / 720.0);
        c = Math.fma(z, c, 1.0 / 24.0);
        c = Math.fma(z, c, -0.5);
        return Math.fma(z, c, 1.0);
    }

    /** sin r with z = r², |r| < 0.87; truncation below 0.01 u. */
    private static double sine(double r, double z) {
        double s = Math.fma(z, 1.0 / 355687428096000.0, -1.0 / 1307674368000.0);
        s = Math.fma(z, s, 1.0 / 6227020800.0);
        s = Math.fma(z, s, -1.0 / 39916800.0);
        s = Math.fma(z, s, 1.0 / 362880.0);
        s = Math.fma(z, s, -1.0 / 5040.0);
        s = Math.fma(z, s, 1.0 / 120.0);
        s = Math.fma(z, s, -1.0 / 6.0);
        return Math.fma(r * z, s, r);
    }

    /** (cos r, sin r) to (cos, -sin) of r + quadrant π/2, quadrant in -2 … 2; multiplications by 0 and ±1 are exact. */
    private static void turn(double[] quadrant, int length, double[] re, double[] im) {
        for (int k = 0; k < length; k++) {
            double q = quadrant[k];
            double absolute = Math.abs(q);
            double cosineQ = 1 - absolute;
            double sineQ = q * (2 - absolute);
            double c = re[k];
            double s = im[k];
            re[k] = c * cosineQ - s * sineQ;
            im[k] = -(s * cosineQ + c * sineQ);
        }
    }

    private static void writeFar(
            double energyHigh, double energyLow, double timeHigh, double timeLow, double[] re, double[] im, int at) {
        Angle angle = Angle.of(energyHigh, energyLow, timeHigh, timeLow);
        double z = angle.high * angle.high;
        double cosine0 = cosine(z);
        double sine0 = sine(angle.high, z);
        double c = Math.fma(-angle.low, sine0, cosine0);
        double s = Math.fma(angle.low, cosine0, sine0);
        switch (angle.quadrant & 3) {
            case 0 -> {
                re[at] = c;
                im[at] = -s;
            }
            case 1 -> {
                re[at] = -s;
                im[at] = -c;
            }
            case 2 -> {
                re[at] = -c;
                im[at] = s;
            }
            default -> {
                re[at] = s;
                im[at] = c;
            }
        }
    }

    /** E t = quadrant π/2 + high + low mod 2π, |high + low| ≤ π/4 to rounding. */
    record Angle(double high, double low, int quadrant) {
        /**
         * Reduces twice: the first quotient of a phase near 2^56 is wrong by up to 16, the second repairs it. Every step is exact or
         * booked in {@code low}; the error is below 2^-98 + |E t| 2^-104.
         */
        static Angle of(double energyHigh, double energyLow, double timeHigh, double timeLow) {
            double p = energyHigh * timeHigh;
            double e = Math.fma(energyHigh, timeHigh, -p);
            double g = Math.fma(energyHigh, timeLow, energyLow * timeHigh);
            double q = Math.rint(p * TWO_OVER_PI);
            double r0 = Math.fma(-q, PI_2_HIGH, p);
            double m = q * PI_2_MIDDLE;
            double mLow = Math.fma(q, PI_2_MIDDLE, -m);
            double s1 = r0 + e;
            double low = sumError(r0, e, s1);
            double s2 = s1 - m;
            low += sumError(s1, -m, s2);
            double s3 = s2 + g;
            low += sumError(s2, g, s3);
            low -= mLow + q * PI_2_LOW;
            double again = Math.rint(s3 * TWO_OVER_PI);
            double r = Math.fma(-again, PI_2_HIGH, s3);
            low = Math.fma(-again, PI_2_MIDDLE, low);
            double high = r + low;
            low = sumError(r, low, high);
            int quadrant = (int) (q - 4 * Math.rint(q * 0.25)) + (int) (again - 4 * Math.rint(again * 0.25));
            return new Angle(high, low, quadrant);
        }
    }

    /** a + b - sum exactly, for sum = a + b rounded (Knuth's two-sum). */
    static double sumError(double a, double b, double sum) {
        double bVirtual = sum - a;
        return (a - (sum - bVirtual)) + (b - bVirtual);
    }
}
