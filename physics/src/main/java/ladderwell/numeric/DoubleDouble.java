package ladderwell.numeric;

/**
 * A number held as the unevaluated sum of two doubles, hi + lo with |lo| at most half a unit in the last place of hi: about 32
 * digits. For constants, tables and single values; hot loops use the two static error terms on plain doubles instead.
 *
 * @param hi the value rounded to double
 * @param lo what the rounding left over
 * @accuracy each operation is right to a few 1e-32 of its result, as long as neither overflow nor underflow occurs
 */
public record DoubleDouble(double hi, double lo) {
    /** Zero. */
    public static final DoubleDouble ZERO = new DoubleDouble(0.0, 0.0);
    /** One. */
    public static final DoubleDouble ONE = new DoubleDouble(1.0, 0.0);
    /** A quarter turn, pi/2, to 32 digits. */
    public static final DoubleDouble QUARTER_TURN = new DoubleDouble(0x1.921fb54442d18p+0, 0x1.1a62633145c07p-54);
    /** The natural logarithm of 2, to 32 digits. */
    public static final DoubleDouble LN_2 = new DoubleDouble(0x1.62e42fefa39efp-1, 0x1.abc9e3b39803fp-56);

    /** The double itself, nothing left over. */
    public static DoubleDouble of(double value) {
        return new DoubleDouble(value, 0.0);
    }

    /** The exact sum of two doubles. */
    public static DoubleDouble sum(double a, double b) {
        double s = a + b;
        return new DoubleDouble(s, sumError(a, b, s));
    }

    /** The exact product of two doubles. */
    public static DoubleDouble product(double a, double b) {
        double p = a * b;
        return new DoubleDouble(p, productError(a, b, p));
    }

    /** What rounding took from a + b: exactly a + b - sum, where sum is the double a + b. */
    public static double sumError(double a, double b, double sum) {
        double shadow = sum - a;
        return (a - (sum - shadow)) + (b - shadow);
    }

    /** What rounding took from a * b: exactly a * b - product, where product is the double a * b. */
    public static double productError(double a, double b, double product) {
        return Math.fma(a, b, -product);
    }

    /** This plus other. */
    public DoubleDouble plus(DoubleDouble other) {
        double s = hi + other.hi;
        double e = sumError(hi, other.hi, s);
        double t = lo + other.lo;
        double f = sumError(lo, other.lo, t);
        double u = s + (e + t);
        double v = (e + t) - (u - s);
        return normalised(u, v + f);
    }

    /** This plus a double. */
    public DoubleDouble plus(double other) {
        double s = hi + other;
        return normalised(s, sumError(hi, other, s) + lo);
    }

    /** This minus other. */
    public DoubleDouble minus(DoubleDouble other) {
        return plus(other.negated());
    }

    /** The same size with the opposite sign. */
    public DoubleDouble negated() {
        return new DoubleDouble(-hi, -lo);
    }

    /** This times other. */
    public DoubleDouble times(DoubleDouble other) {
        double p = hi * other.hi;
        double e = productError(hi, other.hi, p) + (hi * other.lo + lo * other.hi);
        return normalised(p, e);
    }

    /** This times a double. */
    public DoubleDouble times(double other) {
        double p = hi * other;
        return normalised(p, productError(hi, other, p) + lo * other);
    }

    /** This divided by other. */
    public DoubleDouble dividedBy(DoubleDouble other) {
        double first = hi / other.hi;
        DoubleDouble rest = minus(other.times(first));
        double second = rest.hi / other.hi;
        rest = rest.minus(other.times(second));
        return sum(first, second).plus(rest.hi / other.hi);
    }

    /** This divided by a double. */
    public DoubleDouble dividedBy(double other) {
        return dividedBy(of(other));
    }

    /** The square root of a positive number or zero. */
    public DoubleDouble sqrt() {
        if (hi == 0.0) {
            return ZERO;
        }
        double root = Math.sqrt(hi);
        return normalised(root, minus(product(root, root)).hi / (2.0 * root));
    }

    /** The nearest double. */
    public double value() {
        return hi + lo;
    }

    private static DoubleDouble normalised(double large, double small) {
        double s = large + small;
        return new DoubleDouble(s, small - (s - large));
    }
}
