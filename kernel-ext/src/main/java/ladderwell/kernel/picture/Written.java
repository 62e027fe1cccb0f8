package ladderwell.kernel.picture;

import java.math.BigDecimal;
import java.math.MathContext;
import ladderwell.quantity.Digits;

/** Numbers and units as a picture writes them. */
final class Written {
    private Written() {}

    /** A number with no more digits than a picture can show. */
    static double rounded(double value, int digits) {
        return value == 0
                ? 0
                : new BigDecimal(value).round(new MathContext(digits)).doubleValue();
    }

    /** A few digits for people. */
    static String number(double value, int digits) {
        return Digits.pretty(Digits.significant(value, digits));
    }

    /** An axis title: "position x / nm"; natural units have no symbol. */
    static String axis(String quantity, String unit) {
        return unit.isEmpty() ? quantity + " (natural units)" : quantity + " / " + unit;
    }

    /** The unit of a density: "nm⁻¹". */
    static String inverse(String unit) {
        return unit.isEmpty() ? "" : unit + "⁻¹";
    }

    /** Digits behind the point, so that the number reads to about three digits. */
    static int decimals(double largest) {
        if (!(largest > 0)) {
            return 0;
        }
        return Math.max(0, Math.min(6, 2 - (int) Math.floor(Math.log10(largest))));
    }

    /** " µs", or " (natural units)" behind a number. */
    static String behind(String unit) {
        return unit.isEmpty() ? " (natural units)" : " " + unit;
    }
}
