package ladderwell.kernel.cell;

import java.util.ArrayList;
import java.util.List;
import ladderwell.kernel.cell.CellText.Part;

/**
 * Cuts a cell into sentences and Java. Follows Java's brackets, strings, text blocks and comments only as far as needed
 * to know whether a line begins outside all of them.
 */
final class CellScanner {
    private final String cell;
    private int depth;
    private String open = "";

    private CellScanner(String cell) {
        this.cell = cell;
    }

    static List<Part> parts(String cell) {
        if (cell.stripLeading().startsWith("%%")) {
            return List.of(new Part(true, cell, 0, 1));
        }
        return new CellScanner(cell).split();
    }

    private List<Part> split() {
        List<Part> parts = new ArrayList<>();
        int partStart = 0;
        int partLine = 1;
        boolean inSentences = false;
        int line = 1;
        for (int at = 0; at < cell.length(); line++) {
            int end = cell.indexOf('\n', at);
            int next = end < 0 ? cell.length() : end + 1;
            String text = cell.substring(at, next);
            boolean sentence = depth <= 0 && open.isEmpty() && startsSentence(text);
            if (sentence != inSentences && !(inSentences && text.isBlank())) {
                add(parts, inSentences, partStart, at, partLine);
                partStart = at;
                partLine = line;
                inSentences = sentence;
            }
            if (!inSentences) {
                followJava(text);
            }
            at = next;
        }
        add(parts, inSentences, partStart, cell.length(), partLine);
        return parts;
    }

    private void add(List<Part> parts, boolean sentences, int from, int to, int line) {
        String text = cell.substring(from, to);
        if (!text.isBlank()) {
            parts.add(new Part(sentences, text, from, line));
        }
    }

    private static boolean startsSentence(String line) {
        String text = line.stripLeading();
        return text.startsWith("%")
                && (text.length() == 1 || text.charAt(1) == '\n' || Character.isLetter(text.charAt(1)));
    }

    /** Moves over one line of Java; {@code open} holds what closes the comment or text block that is open, if any. */
    private void followJava(String line) {
        for (int i = 0; i < line.length(); ) {
            if (!open.isEmpty()) {
                boolean escaped = open.startsWith("\"") && line.charAt(i) == '\\';
                if (line.startsWith(open, i)) {
                    i += open.length();
                    open = "";
                } else {
                    i += escaped ? 2 : 1;
                }
            } else if (line.startsWith("//", i)) {
                return;
            } else if (line.startsWith("/*", i)) {
                open = "*/";
                i += 2;
            } else if (line.startsWith("\"\"\"", i)) {
                open = "\"\"\"";
                i += 3;
            } else if (line.charAt(i) == '"' || line.charAt(i) == '\'') {
                i = afterQuoted(line, i);
            } else {
                depth += "([{".indexOf(line.charAt(i)) >= 0 ? 1 : ")]}".indexOf(line.charAt(i)) >= 0 ? -1 : 0;
                i++;
            }
        }
    }

    private static int afterQuoted(String line, int start) {
        char quote = line.charAt(start);
        for (int i = start + 1; i < line.length(); i++) {
            if (line.charAt(i) == '\\') {
                i++;
            } else if (line.charAt(i) == quote) {
                return i + 1;
            }
        }
        return line.length();
    }
}
