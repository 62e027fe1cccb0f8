package ladderwell.kernel.render;

import java.util.ArrayList;
import java.util.List;

/** Rows of text in columns that stand under each other. */
final class PlainTable {
    private final List<String[]> rows = new ArrayList<>();
    private final boolean[] right;

    /** @param right which columns are aligned to the right */
    PlainTable(boolean... right) {
        this.right = right.clone();
    }

    void row(String... cells) {
        String[] row = new String[right.length];
        for (int c = 0; c < row.length; c++) {
            row[c] = c < cells.length ? oneLine(cells[c]) : "";
        }
        rows.add(row);
    }

    private static String oneLine(String cell) {
        return cell.replaceAll("\\p{Cntrl}", " ");
    }

    /** The rows, two blanks between columns, nothing behind the last. */
    String text() {
        int[] width = new int[right.length];
        for (String[] row : rows) {
            for (int c = 0; c < width.length; c++) {
                width[c] = Math.max(width[c], length(row[c]));
            }
        }
        StringBuilder text = new StringBuilder();
        for (String[] row : rows) {
            StringBuilder line = new StringBuilder();
            for (int c = 0; c < row.length; c++) {
                String blanks = " ".repeat(width[c] - length(row[c]));
                line.append(c == 0 ? "" : "  ").append(right[c] ? blanks + row[c] : row[c] + blanks);
            }
            text.append(text.isEmpty() ? "" : "\n").append(line.toString().stripTrailing());
        }
        return text.toString();
    }

    /** Characters that take a place of their own; accents that combine with the one before do not. */
    private static int length(String cell) {
        return (int) cell.codePoints()
                .filter(c -> Character.getType(c) != Character.NON_SPACING_MARK)
                .count();
    }
}
