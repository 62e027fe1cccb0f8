package ladderwell.kernel.command;

import java.io.PrintStream;
import java.time.Duration;
import java.util.Locale;
import ladderwell.kernel.cell.CellEnd;
import ladderwell.kernel.notebook.Cell;
import ladderwell.kernel.notebook.Progress;

/** One line per cell: its number, its first line, and how long it took or that it failed. */
record ProgressLines(PrintStream out) implements Progress {
    private static final int WIDTH = 56;

    @Override
    public void starts(Cell cell, int number, int of) {
        String line = cell.firstLine().replaceAll("\\p{Cntrl}", " ");
        int points = line.codePointCount(0, line.length());
        String shown = points > WIDTH
                ? line.substring(0, line.offsetByCodePoints(0, WIDTH - 1)) + "…"
                : line + " ".repeat(WIDTH - points);
        out.printf(Locale.ROOT, "[%" + String.valueOf(of).length() + "d/%d] %s ", number, of, shown);
        out.flush();
    }

    @Override
    public void ended(Cell cell, int number, int of, CellEnd end, Duration taken) {
        String how = end instanceof CellEnd.Failed ? "  failed" : end instanceof CellEnd.Interrupted ? "  stopped" : "";
        out.printf(Locale.ROOT, "%7.2f s%s%n", taken.toMillis() / 1e3, how);
        out.flush();
    }
}
