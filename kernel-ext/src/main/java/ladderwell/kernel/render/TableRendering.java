package ladderwell.kernel.render;

import java.util.Map;
import ladderwell.Run;
import ladderwell.kernel.cell.MimeBundle;
import ladderwell.kernel.picture.Markup;
import tech.tablesaw.api.Table;
import tech.tablesaw.columns.Column;

/** Tables: names at the left, numbers at the right, the unit in the head, the error beside in lighter ink. */
final class TableRendering {
    /** Rows shown; the rest is counted. */
    static final int MOST_ROWS = 20;

    /** Columns shown; the rest is counted. */
    static final int MOST_COLUMNS = 40;

    /** Characters of one cell. */
    private static final int MOST_CHARACTERS = 200;

    private TableRendering() {}

    /** A table that was read from a run. */
    static MimeBundle read(Run run, Table table) {
        MimeBundle bundle = table(table, "", run.errorLine());
        return new MimeBundle(bundle.data(), Map.of("ladderwell", CardRendering.record(run)));
    }

    /** Any table. @param head a bold line above it, may be empty @param below a line below it, may be empty */
    static MimeBundle table(Table table, String head, String below) {
        return MimeBundle.plain(plain(table, head, below)).with(MimeBundle.HTML, html(table, head, below));
    }

    static String html(Table table, String head, String below) {
        int rows = Math.min(table.rowCount(), MOST_ROWS);
        int columns = Math.min(table.columnCount(), MOST_COLUMNS);
        String[][] cells = cells(table, rows, columns);
        StringBuilder html = new StringBuilder(4000);
        html.append(PageStyle.ELEMENT).append("<div class=\"lw-sheet\">\n");
        if (!head.isEmpty()) {
            html.append("<div class=\"lw-head\">").append(Markup.text(head)).append("</div>\n");
        }
        html.append("<table class=\"lw-table\"><thead><tr>");
        for (int c = 0; c < columns; c++) {
            html.append("<th scope=\"col\"")
                    .append(look(table.column(c)))
                    .append(" title=\"")
                    .append(Markup.text(cut(table.column(c).name())))
                    .append("\">")
                    .append(Markup.text(cut(head(table, c))))
                    .append("</th>");
        }
        html.append("</tr></thead><tbody>\n");
        for (int r = 0; r < rows; r++) {
            html.append("<tr>");
            for (int c = 0; c < columns; c++) {
                html.append("<td")
                        .append(look(table.column(c)))
                        .append(">")
                        .append(Markup.text(cells[c][r]))
                        .append("</td>");
            }
            html.append("</tr>\n");
        }
        html.append("</tbody></table>\n");
        String rest = rest(table);
        if (!rest.isEmpty()) {
            html.append("<div class=\"lw-error\">").append(rest).append("</div>\n");
        }
        if (!below.isEmpty()) {
            html.append("<div class=\"lw-error\">").append(Markup.text(below)).append("</div>\n");
        }
        return html.append("</div>").toString();
    }

    /** The heading; an error column right of its value is just "± guaranteed", since name and unit stand beside it. */
    private static String head(Table table, int c) {
        String name = table.column(c).name();
        if (c == 0 || !RoundedColumn.isError(table.column(c)) || !name.endsWith(")")) {
            return name;
        }
        String of = "± " + table.column(c - 1).name() + " (";
        return name.startsWith(of) ? "± " + name.substring(of.length(), name.length() - 1) : name;
    }

    private static String look(Column<?> column) {
        String names =
                (RoundedColumn.isNumber(column) ? "lw-number" : "") + (RoundedColumn.isError(column) ? " lw-pm" : "");
        return names.isEmpty() ? "" : " class=\"" + names.strip() + "\"";
    }

    static String plain(Table table, String head, String below) {
        int rows = Math.min(table.rowCount(), MOST_ROWS);
        int columns = Math.min(table.columnCount(), MOST_COLUMNS);
        String[][] cells = cells(table, rows, columns);
        boolean[] right = new boolean[columns];
        String[] heads = new String[columns];
        for (int c = 0; c < columns; c++) {
            right[c] = RoundedColumn.isNumber(table.column(c));
            heads[c] = cut(head(table, c));
        }
        PlainTable plain = new PlainTable(right);
        plain.row(heads);
        for (int r = 0; r < rows; r++) {
            String[] row = new String[columns];
            for (int c = 0; c < columns; c++) {
                row[c] = cells[c][r];
            }
            plain.row(row);
        }
        StringBuilder text = new StringBuilder();
        if (!head.isEmpty()) {
            text.append(head).append('\n');
        }
        text.append(plain.text());
        String rest = rest(table);
        if (!rest.isEmpty()) {
            text.append('\n').append(rest);
        }
        return below.isEmpty()
                ? text.toString()
                : text.append('\n').append(below).toString();
    }

    /** What is not shown, counted; empty if all is. */
    private static String rest(Table table) {
        int rows = table.rowCount() - MOST_ROWS;
        int columns = table.columnCount() - MOST_COLUMNS;
        StringBuilder rest = new StringBuilder();
        if (rows > 0) {
            rest.append("… ").append(rows).append(rows == 1 ? " more row" : " more rows");
        }
        if (columns > 0) {
            rest.append(rest.isEmpty() ? "… " : " and ")
                    .append(columns)
                    .append(columns == 1 ? " more column" : " more columns");
        }
        return rest.toString();
    }

    private static String[][] cells(Table table, int rows, int columns) {
        String[][] cells = new String[columns][];
        for (int c = 0; c < columns; c++) {
            cells[c] = RoundedColumn.cells(table, c, rows);
            for (int r = 0; r < rows; r++) {
                cells[c][r] = cut(cells[c][r]);
            }
        }
        return cells;
    }

    private static String cut(String cell) {
        return cell.codePointCount(0, cell.length()) <= MOST_CHARACTERS
                ? cell
                : cell.substring(0, cell.offsetByCodePoints(0, MOST_CHARACTERS - 1)) + "…";
    }
}
