package ladderwell.numeric;

/** Elementary functions in double-double arithmetic, for single values such as the parameters of a recurrence. */
public final class DoubleDoubleFunctions {
    private static final DoubleDouble HALF = DoubleDouble.of(0.5);

    private DoubleDoubleFunctions() {}

    /** A pair of values that come together. */
    public record Pair(DoubleDouble first, DoubleDouble second) {}

    /**
     * e^x.
     *
     * @param x between −700 and 700
     * @accuracy some 1e-30 of the result
     */
    public static DoubleDouble exp(DoubleDouble x) {
        if (!(Math.abs(x.hi()) <= 700)) {
            throw new IllegalArgumentException("exp is computed between -700 and 700, not at " + x.hi());
        }
        int twos = (int) Math.rint(x.hi() / Math.log(2));
        DoubleDouble rest = x.minus(DoubleDouble.LN_2.times(twos)).times(1.0 / 256);
        // |rest| < 0.0014: 10 terms leave 1e-35
        DoubleDouble sum = DoubleDouble.ZERO;
        for (int k = 10; k >= 1; k--) {
            sum = sum.plus(1.0).times(rest).dividedBy(k);
        }
        // e^y − 1 is carried, so that squaring does not lose what is small: (1 + s)² − 1 = s (2 + s)
        for (int i = 0; i < 8; i++) {
            sum = sum.times(sum.plus(2.0));
        }
        DoubleDouble all = sum.plus(1.0);
        return new DoubleDouble(Math.scalb(all.hi(), twos), Math.scalb(all.lo(), twos));
    }

    /**
     * cosh x and sinh x.
     *
     * @param x between −700 and 700
     * @accuracy some 1e-30 of each
     */
    public static Pair coshSinh(double x) {
        DoubleDouble up = exp(DoubleDouble.of(x));
        DoubleDouble down = DoubleDouble.ONE.dividedBy(up);
        DoubleDouble cosh = up.plus(down).times(HALF);
        if (Math.abs(x) > 0.5) {
            return new Pair(cosh, up.minus(down).times(HALF));
        }
        DoubleDouble square = DoubleDouble.product(x, x);
        DoubleDouble sum = DoubleDouble.ZERO;
        // Σ x^(2k)/(2k+1)!, 0.25^13/27! is 1e-36
        for (int k = 13; k >= 1; k--) {
            sum = sum.plus(1.0).times(square).dividedBy(2.0 * k * (2 * k + 1));
        }
        return new Pair(cosh, sum.plus(1.0).times(x));
    }

    /**
     * cos x and sin x.
     *
     * @param x an angle in radians, up to 1e15 in size
     * @accuracy 1e-31 plus 1e-33 of the angle
     */
    public static Pair cosSin(DoubleDouble x) {
        if (!(Math.abs(x.hi()) <= 1e15)) {
            throw new IllegalArgumentException("angles are taken up to 1e15 rad, not " + x.hi());
        }
        double quarters = Math.rint(x.hi() / (Math.PI / 2));
        DoubleDouble rest = x.minus(DoubleDouble.QUARTER_TURN.times(quarters));
        DoubleDouble square = rest.times(rest);
        DoubleDouble cos = DoubleDouble.ZERO;
        DoubleDouble sin = DoubleDouble.ZERO;
        // |rest| ≤ 0.79: (0.62)^15/30! is 1e-36
        for (int k = 15; k >= 1; k--) {
            cos = cos.plus(1.0).times(square).dividedBy(-(2.0 * k - 1) * (2 * k));
            sin = sin.plus(1.0).times(square).dividedBy(-(2.0 * k) * (2 * k + 1));
        }
        cos = cos.plus(1.0);
        sin = sin.plus(1.0).times(rest);
        return switch ((int) Math.floorMod((long) quarters, 4L)) {
            case 0 -> new Pair(cos, sin);
            case 1 -> new Pair(sin.negated(), cos);
            case 2 -> new Pair(cos.negated(), sin.negated());
            default -> new Pair(sin, cos.negated());
        };
    }
}
