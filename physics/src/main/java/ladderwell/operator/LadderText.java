package ladderwell.operator;

/** Terms of ladder polynomials as they stand on the board: "0.5 a†² a²", "(0.1 − 0.2i) a". */
final class LadderText {
    private LadderText() {}

    /** (re + i im) a†^j a^k. */
    static String term(double re, double im, int j, int k) {
        String number = number(re, im);
        if (j + k == 0) {
            return number;
        }
        if (number.equals("1") || number.equals("−1")) {
            return number.substring(0, number.length() - 1) + name(j, k);
        }
        return number + " " + name(j, k);
    }

    /** A complex number as it is written on the board. */
    static String number(double re, double im) {
        if (im == 0) {
            return plain(re);
        }
        String imaginary = Math.abs(im) == 1 ? (im < 0 ? "−i" : "i") : plain(im) + "i";
        if (re == 0) {
            return imaginary;
        }
        String joined = im < 0 ? " − " + imaginary.substring(1) : " + " + imaginary;
        return "(" + plain(re) + joined + ")";
    }

    private static String plain(double value) {
        String digits = value == Math.rint(value) && Math.abs(value) < 1e15
                ? Long.toString((long) Math.abs(value))
                : Double.toString(Math.abs(value));
        return value < 0 ? "−" + digits : digits;
    }

    /** a†^j a^k, or 1. */
    static String name(int j, int k) {
        if (j + k == 0) {
            return "1";
        }
        String raising = j == 0 ? "" : "a†" + exponent(j);
        String lowering = k == 0 ? "" : "a" + exponent(k);
        return raising.isEmpty() || lowering.isEmpty() ? raising + lowering : raising + " " + lowering;
    }

    private static String exponent(int power) {
        if (power == 1) {
            return "";
        }
        StringBuilder raised = new StringBuilder();
        for (char digit : Integer.toString(power).toCharArray()) {
            raised.append("⁰¹²³⁴⁵⁶⁷⁸⁹".charAt(digit - '0'));
        }
        return raised.toString();
    }
}
