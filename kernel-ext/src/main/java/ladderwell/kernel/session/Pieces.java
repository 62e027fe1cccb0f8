package ladderwell.kernel.session;

import java.util.ArrayList;
import java.util.List;
import jdk.jshell.SourceCodeAnalysis;
import jdk.jshell.SourceCodeAnalysis.Completeness;
import jdk.jshell.SourceCodeAnalysis.CompletionInfo;

/** A text of Java cut into the snippets that JShell takes one by one. */
final class Pieces {
    private Pieces() {}

    /**
     * One snippet.
     *
     * @param source its source, ready to evaluate, without leading blanks
     * @param written what its author wrote, without a semicolon added
     * @param start where it begins in the text
     * @param line the line of the text at which it begins, from 0
     * @param completeness what JShell thinks of it
     */
    record Piece(String source, String written, int start, int line, Completeness completeness) {
        /** Whether the snippet was closed by its author; if not, it is an expression whose value is wanted. */
        boolean openEnded() {
            return lastSign(written) != ';';
        }

        /** Whether the parser could make nothing of it, or wants more. */
        boolean doubtful() {
            return completeness != Completeness.COMPLETE && completeness != Completeness.COMPLETE_WITH_SEMI;
        }
    }

    /** The last character of the source that is neither blank nor in a comment; in a literal, its closing quote. */
    private static char lastSign(String source) {
        char last = ' ';
        for (int i = 0; i < source.length(); ) {
            char c = source.charAt(i);
            if (source.startsWith("//", i)) {
                i = after(source, "\n", i + 2);
            } else if (source.startsWith("/*", i)) {
                i = after(source, "*/", i + 2);
            } else {
                String quote = source.startsWith("\"\"\"", i) ? "\"\"\"" : c == '"' || c == '\'' ? "" + c : "";
                last = Character.isWhitespace(c) ? last : c;
                i = quote.isEmpty() ? i + 1 : after(source, quote, i + quote.length());
            }
        }
        return last;
    }

    /** The position after the next {@code end} that no backslash precedes. */
    private static int after(String source, String end, int from) {
        for (int i = from; i < source.length(); i++) {
            if (source.startsWith(end, i)) {
                return i + end.length();
            }
            if (source.charAt(i) == '\\' && !end.equals("\n") && !end.equals("*/")) {
                i++;
            }
        }
        return source.length();
    }

    static List<Piece> of(String text, SourceCodeAnalysis analysis) {
        List<Piece> pieces = new ArrayList<>();
        int start = 0;
        int line = 0;
        while (start < text.length()) {
            while (start < text.length() && Character.isWhitespace(text.charAt(start))) {
                line += text.charAt(start) == '\n' ? 1 : 0;
                start++;
            }
            String rest = text.substring(start);
            CompletionInfo info = analysis.analyzeCompletion(rest);
            if (info.completeness() == Completeness.EMPTY) {
                break;
            }
            boolean whole = info.source() == null || info.completeness() == Completeness.CONSIDERED_INCOMPLETE;
            String source = whole ? rest : info.source();
            int length =
                    whole ? rest.length() : rest.length() - info.remaining().length();
            pieces.add(new Piece(source, rest.substring(0, length), start, line, info.completeness()));
            line += (int)
                    rest.substring(0, length).chars().filter(c -> c == '\n').count();
            start += length;
        }
        return pieces;
    }
}
