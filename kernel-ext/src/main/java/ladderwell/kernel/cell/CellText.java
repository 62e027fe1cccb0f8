package ladderwell.kernel.cell;

import java.util.List;

/**
 * The text of a cell cut into sentences and Java. A cell whose first line that is not blank starts with {@code %%} is
 * one text of sentences. In any other cell a line that starts with {@code %} and a letter, and does not stand inside a
 * bracket, a string or a comment of the Java before it, is a sentence; everything else is Java. (A remainder {@code %}
 * at the start of a line of Java is written with a blank after it.)
 *
 * @param parts the parts in order; blank parts are left out
 */
public record CellText(List<Part> parts) {
    /** Copies the parts. */
    public CellText {
        parts = List.copyOf(parts);
    }

    /** The parts of a cell. */
    public static CellText of(String cell) {
        return new CellText(CellScanner.parts(cell));
    }

    /** Whether any part is Java. A sentence may still hold a Java expression in braces. */
    public boolean hasJava() {
        return parts.stream().anyMatch(part -> !part.sentences());
    }

    /**
     * A run of lines of one language.
     *
     * @param sentences whether it is sentences; Java otherwise
     * @param text the lines
     * @param start where the text begins in the cell
     * @param firstLine the line of the cell at which it begins, from 1
     */
    public record Part(boolean sentences, String text, int start, int firstLine) {}
}
