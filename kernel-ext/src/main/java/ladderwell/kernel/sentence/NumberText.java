package ladderwell.kernel.sentence;

/**
 * Reads numbers at the start of a word: digits with a point, a sign, a power of ten; the same in every locale.
 *
 * @param value the number; infinite where it is too large, 0 where it is too small
 * @param end where the number ends in the word
 */
record NumberText(double value, int end) {
    private static final NumberText NONE = new NumberText(0, 0);

    /** The number at {@code from}; it ends at {@code from} where there is none. */
    static NumberText at(String word, int from) {
        int at = from;
        if (at < word.length() && isSign(word.charAt(at))) {
            at++;
        }
        int digits = at;
        at = afterDigits(word, at);
        int count = at - digits;
        if (at < word.length() && word.charAt(at) == '.') {
            int fraction = afterDigits(word, at + 1);
            count += fraction - at - 1;
            // "1..100" is no decimal followed by a point.
            if (!word.startsWith("..", at)) {
                at = fraction;
            }
        }
        if (count == 0) {
            return from == 0 ? NONE : new NumberText(0, from);
        }
        if (at < word.length() && (word.charAt(at) == 'e' || word.charAt(at) == 'E')) {
            int power = at + 1;
            if (power < word.length() && isSign(word.charAt(power))) {
                power++;
            }
            int end = afterDigits(word, power);
            at = end > power ? end : at;
        }
        return new NumberText(Double.parseDouble(word.substring(from, at).replace('−', '-')), at);
    }

    /** Whether digits other than 0 were typed, so that a value of 0 means that they were too small. */
    static boolean saysNonzero(String number) {
        for (int i = 0; i < number.length() && number.charAt(i) != 'e' && number.charAt(i) != 'E'; i++) {
            if (number.charAt(i) >= '1' && number.charAt(i) <= '9') {
                return true;
            }
        }
        return false;
    }

    static boolean isSign(char c) {
        return c == '-' || c == '+' || c == '−';
    }

    private static int afterDigits(String word, int from) {
        int at = from;
        while (at < word.length() && word.charAt(at) >= '0' && word.charAt(at) <= '9') {
            at++;
        }
        return at;
    }
}
