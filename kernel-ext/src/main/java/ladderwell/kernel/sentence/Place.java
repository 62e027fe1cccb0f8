package ladderwell.kernel.sentence;

import java.util.List;

/**
 * A stretch of a text.
 *
 * @param start where it begins
 * @param end where it ends, exclusive
 */
public record Place(int start, int end) {
    /** Longest piece of a line shown around a place. */
    private static final int WINDOW = 100;

    /** Most carets under a place. */
    private static final int CARETS = 60;

    /** Checks the order. */
    public Place {
        if (start < 0 || end < start) {
            throw new IllegalArgumentException("no text reaches from " + start + " to " + end);
        }
    }

    Place to(Place other) {
        return new Place(Math.min(start, other.start), Math.max(end, other.end));
    }

    /** The empty place just behind this one. */
    Place behind() {
        return new Place(end, end);
    }

    /** Whether a cursor touches it, at its end included. */
    boolean touches(int cursor) {
        return start <= cursor && cursor <= end;
    }

    /**
     * The line of the text on which this place begins, and under it carets that mark the place. Long lines are cut,
     * characters that cannot be shown are replaced.
     *
     * @param text the text this is a place of
     * @param firstLine the number of its first line
     */
    public List<String> marked(String text, int firstLine) {
        int at = Math.min(start, text.length());
        int lineStart = text.lastIndexOf('\n', at - 1) + 1;
        int lineEnd = text.indexOf('\n', at);
        lineEnd = lineEnd < 0 ? text.length() : lineEnd;
        int number = firstLine
                + (int) text.substring(0, lineStart)
                        .chars()
                        .filter(c -> c == '\n')
                        .count();
        int from = at - lineStart <= WINDOW * 2 / 3 ? lineStart : at - WINDOW / 2;
        int to = Math.min(lineEnd, Math.max(from + WINDOW, Math.min(end, at + CARETS)));
        String before = (from > lineStart ? "…" : "") + Words.shown(text.substring(from, at));
        String after = Words.shown(text.substring(at, to)).stripTrailing() + (to < lineEnd ? "…" : "");
        String label = "line " + number + ": ";
        int marked = Words.shown(text.substring(at, Math.max(at, Math.min(Math.min(end, to), at + CARETS))))
                .stripTrailing()
                .codePoints()
                .map(c -> 1)
                .sum();
        int indent = label.length() + (int) before.codePoints().count();
        return List.of(label + before + after, " ".repeat(indent) + "^".repeat(Math.max(1, marked)));
    }
}
