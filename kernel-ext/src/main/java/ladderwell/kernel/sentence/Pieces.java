package ladderwell.kernel.sentence;

import java.util.ArrayList;
import java.util.List;
import ladderwell.kernel.sentence.Piece.Sort;

/** Cuts a stretch of text into pieces. Never fails: what is wrong becomes a piece that says so. */
final class Pieces {
    private final String text;
    private final int end;

    private Pieces(String text, int end) {
        this.text = text;
        this.end = end;
    }

    static List<Piece> of(String text, int start, int end) {
        return new Pieces(text, end).from(start);
    }

    private List<Piece> from(int start) {
        List<Piece> pieces = new ArrayList<>();
        for (int at = start; at < end; ) {
            char c = text.charAt(at);
            Piece piece;
            if (blank(c)) {
                at++;
                continue;
            } else if (c == '#') {
                int stop = text.indexOf('\n', at);
                piece = piece(Sort.COMMENT, at, stop < 0 || stop > end ? end : stop);
            } else if (c == ',') {
                piece = piece(Sort.COMMA, at, at + 1);
            } else if (c == ':') {
                piece = piece(Sort.COLON, at, at + 1);
            } else if (c == '{') {
                piece = enclosed(Sort.JAVA, at, afterBraces(at));
            } else if (c == '"') {
                piece = enclosed(Sort.QUOTED, at, afterQuotes(at));
            } else if (c == '}') {
                piece = piece(Sort.STRAY, at, at + 1);
            } else {
                int stop = at + 1;
                while (stop < end && !blank(text.charAt(stop)) && "#,:{}\"".indexOf(text.charAt(stop)) < 0) {
                    stop++;
                }
                piece = piece(Sort.WORD, at, stop);
            }
            pieces.add(piece);
            at = piece.place().end();
        }
        return pieces;
    }

    static boolean blank(char c) {
        return Character.isWhitespace(c) || Character.isSpaceChar(c);
    }

    private Piece piece(Sort sort, int from, int to) {
        return new Piece(sort, text.substring(from, to), new Place(from, to));
    }

    private Piece enclosed(Sort sort, int from, int to) {
        return to < 0
                ? piece(Sort.UNCLOSED, from, end)
                : new Piece(sort, text.substring(from + 1, to - 1), new Place(from, to));
    }

    /** The position behind the brace that closes the one at {@code open}, or −1. */
    private int afterBraces(int open) {
        int depth = 0;
        for (int at = open; at < end; ) {
            char c = text.charAt(at);
            if (c == '"' || c == '\'') {
                int after = afterQuotes(at);
                if (after < 0) {
                    return -1;
                }
                at = after;
                continue;
            }
            depth += c == '{' ? 1 : c == '}' ? -1 : 0;
            at++;
            if (depth == 0) {
                return at;
            }
        }
        return -1;
    }

    /** The position behind the quote that closes the one at {@code open}, on the same line, or −1. */
    private int afterQuotes(int open) {
        char quote = text.charAt(open);
        for (int at = open + 1; at < end && text.charAt(at) != '\n'; at++) {
            if (text.charAt(at) == '\\') {
                at++;
            } else if (text.charAt(at) == quote) {
                return at + 1;
            }
        }
        return -1;
    }
}
