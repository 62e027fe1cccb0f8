package ladderwell.kernel.host;

/** Clients count positions in code points, Java in chars. */
final class CodePoints {
    private CodePoints() {}

    /** The char offset of a position; positions outside the text are drawn to its ends. */
    static int toChars(String text, int position) {
        int points = text.codePointCount(0, text.length());
        return text.offsetByCodePoints(0, Math.max(0, Math.min(position, points)));
    }

    /** The position of a char offset. */
    static int fromChars(String text, int offset) {
        return text.codePointCount(0, Math.max(0, Math.min(offset, text.length())));
    }
}
