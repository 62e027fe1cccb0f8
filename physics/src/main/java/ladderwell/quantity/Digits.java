package ladderwell.quantity;

import java.math.BigDecimal;
import java.math.BigInteger;
import java.math.MathContext;
import java.math.RoundingMode;
import java.util.List;

/**
 * Numbers as text: the same text in every locale and on every Java, in ASCII; {@link #pretty} turns it into −1.2×10⁻⁹.
 *
 * <p>Notation is fixed from 1e-4 up to below 1e7 and scientific (mantissa, e, exponent) outside, or where fixed notation would have to
 * invent digits.
 */
public final class Digits {

    private Digits() {}

    /**
     * The shortest decimal that reads back as the same double: "1.2", "-3e-9", "0".
     *
     * @throws IllegalArgumentException for NaN and infinities
     */
    public static String shortest(double value) {
        requireFinite(value);
        if (value == 0) {
            return "0";
        }
        BigDecimal exact = new BigDecimal(value);
        // A normal double that some decimal of up to 15 digits stands for is that decimal when rounded to 15 digits.
        int first = Math.abs(value) >= Double.MIN_NORMAL ? 15 : 1;
        for (int digits = first; digits < 17; digits++) {
            // Above a power of two doubles lie twice as far apart as below it, so there the decimal above may serve
            // where the nearest one, below, does not.
            for (RoundingMode mode : List.of(RoundingMode.HALF_EVEN, RoundingMode.UP)) {
                BigDecimal rounded = exact.round(new MathContext(digits, mode));
                if (rounded.doubleValue() == value) {
                    return write(rounded.stripTrailingZeros(), "", true);
                }
            }
        }
        return write(exact.round(new MathContext(17, RoundingMode.HALF_EVEN)).stripTrailingZeros(), "", true);
    }

    /**
     * Rounded to at most {@code digits} significant digits, trailing zeros dropped: significant(0.12345, 3) is "0.123".
     *
     * @param digits 1 to 17
     * @throws IllegalArgumentException for NaN and infinities
     */
    public static String significant(double value, int digits) {
        requireFinite(value);
        return rounded(new BigDecimal(value), digits, RoundingMode.HALF_EVEN);
    }

    private static String rounded(BigDecimal exact, int digits, RoundingMode mode) {
        if (digits < 1 || digits > 17) {
            throw new IllegalArgumentException("a double has 1 to 17 significant digits, not " + digits);
        }
        BigDecimal rounded = exact.round(new MathContext(digits, mode));
        boolean zerosAreTrue = rounded.scale() >= 0 || rounded.compareTo(exact) == 0;
        return write(rounded.stripTrailingZeros(), "", zerosAreTrue);
    }

    /**
     * Rounded up in magnitude to at most {@code digits} significant digits, for the size of an error: upward(2.04e-10, 2)
     * is "2.1e-10". The double is taken as its shortest decimal, so that 2e-10 stays "2e-10".
     *
     * @throws IllegalArgumentException for NaN and infinities
     */
    public static String upward(double value, int digits) {
        return rounded(new BigDecimal(shortest(value)), digits, RoundingMode.UP);
    }

    /**
     * Only the digits that a bound supports, the bound in the last place beside them: 0.1582113883(2) is
     * 0.1582113883 ± 0.0000000002.
     *
     * <p>The bound is rounded up after the rounding of the value itself has been added, so the printed interval always
     * contains [value − bound, value + bound]. A bound of 0 prints the value in full; an infinite bound, which says that
     * nothing is known, prints the value to three digits and (?).
     *
     * @throws IllegalArgumentException if the value is not finite, or the bound is negative or NaN
     */
    public static String withBound(double value, double bound) {
        requireFinite(value);
        if (!(bound >= 0)) {
            throw new IllegalArgumentException("a bound must be at least 0, not " + text(bound));
        }
        if (bound == 0) {
            return shortest(value);
        }
        if (Double.isInfinite(bound)) {
            return insert(significant(value, 3), "(?)");
        }
        BigDecimal exact = new BigDecimal(value);
        BigDecimal wide = new BigDecimal(bound);
        // Decimal place of the bound's first digit, but no further down than a double has digits.
        int place = wide.precision() - wide.scale() - 1;
        if (value != 0) {
            place = Math.max(place, exact.precision() - exact.scale() - 17);
        }
        while (true) {
            BigDecimal rounded = exact.setScale(-place, RoundingMode.HALF_EVEN);
            BigInteger last = wide.add(exact.subtract(rounded).abs())
                    .scaleByPowerOfTen(-place)
                    .setScale(0, RoundingMode.CEILING)
                    .toBigInteger();
            if (last.compareTo(BigInteger.TEN) < 0) {
                return write(rounded, "(" + last + ")", false);
            }
            place++;
        }
    }

    /** Two digits of a standard uncertainty in the last places, as in tables of constants: 9.1093837139(28)e-31. */
    static String withStandardUncertainty(double value, double uncertainty) {
        BigDecimal two = new BigDecimal(uncertainty).round(new MathContext(2, RoundingMode.HALF_EVEN));
        return write(
                new BigDecimal(value).setScale(two.scale(), RoundingMode.HALF_EVEN),
                "(" + two.unscaledValue() + ")",
                false);
    }

    /** A number written by this class for people: minus sign −, and ×10ⁿ for the exponent. */
    public static String pretty(String plain) {
        int e = plain.indexOf('e');
        String mantissa = (e < 0 ? plain : plain.substring(0, e)).replace('-', '−');
        if (e < 0) {
            return mantissa;
        }
        StringBuilder text = new StringBuilder();
        if (mantissa.equals("1") || mantissa.equals("−1")) {
            text.append(mantissa, 0, mantissa.length() - 1).append("10");
        } else {
            text.append(mantissa).append("×10");
        }
        for (int i = e + 1; i < plain.length(); i++) {
            char c = plain.charAt(i);
            if (c == '-') {
                text.append('⁻');
            } else if (c != '+') {
                text.append("⁰¹²³⁴⁵⁶⁷⁸⁹".charAt(c - '0'));
            }
        }
        return text.toString();
    }

    /** Any double for a message, NaN and infinities included. */
    static String text(double value) {
        return Double.isFinite(value) ? shortest(value) : String.valueOf(value);
    }

    private static void requireFinite(double value) {
        if (!Double.isFinite(value)) {
            throw new IllegalArgumentException("expected a finite number to print, not " + value);
        }
    }

    private static String insert(String number, String mark) {
        int e = number.indexOf('e');
        return e < 0 ? number + mark : number.substring(0, e) + mark + number.substring(e);
    }

    /** Writes all digits of the unscaled value; zeros before the decimal point are padded only where they are true. */
    private static String write(BigDecimal number, String mark, boolean padded) {
        int place = -number.scale();
        int top = number.signum() == 0 ? place : number.precision() - 1 + place;
        if (top >= -4 && top < 7 && (place <= 0 || padded)) {
            return number.toPlainString() + mark;
        }
        BigDecimal mantissa = new BigDecimal(number.unscaledValue(), top - place);
        return mantissa.toPlainString() + mark + "e" + top;
    }
}
