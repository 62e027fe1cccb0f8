package ladderwell.kernel.notebook;

import java.io.IOException;
import java.math.BigDecimal;
import org.erdtman.jcs.NumberToJSON;

/**
 * A double as Jupyter's own writer prints it: the shortest digits that read back as the same double, a point always, and
 * an exponent of two digits at least below 1e-4 and from 1e16 on. Java's own text differs in form and, before 19, in
 * digits.
 */
final class NumberText {
    private static final int FIRST_EXPONENT = -4;
    private static final int LAST_EXPONENT = 15;

    private NumberText() {}

    static String of(double number) {
        if (!Double.isFinite(number)) {
            return Double.isNaN(number) ? "NaN" : number > 0 ? "Infinity" : "-Infinity";
        }
        if (number == 0) {
            return 1 / number < 0 ? "-0.0" : "0.0";
        }
        BigDecimal shortest = shortest(number);
        int exponent = shortest.precision() - shortest.scale() - 1;
        if (exponent < FIRST_EXPONENT || exponent > LAST_EXPONENT) {
            String digits = shortest.unscaledValue().abs().toString();
            String fraction = digits.length() > 1 ? "." + digits.substring(1) : "";
            return (number < 0 ? "-" : "") + digits.charAt(0) + fraction + "e" + (exponent < 0 ? "-" : "+")
                    + (Math.abs(exponent) < 10 ? "0" : "") + Math.abs(exponent);
        }
        String plain = shortest.toPlainString();
        return plain.contains(".") ? plain : plain + ".0";
    }

    private static BigDecimal shortest(double number) {
        try {
            return new BigDecimal(NumberToJSON.serializeNumber(number)).stripTrailingZeros();
        } catch (IOException e) {
            throw new IllegalArgumentException("no finite number: " + number, e);
        }
    }
}
