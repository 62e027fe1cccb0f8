package ladderwell.kernel.notebook;

import java.time.Duration;
import ladderwell.kernel.cell.CellEnd;

/** Hears how a {@link NotebookRun} gets on. Code cells are counted from 1, blank and skipped ones left out. */
public interface Progress {
    /** A cell is about to run. */
    void starts(Cell cell, int number, int of);

    /** A cell has ended. */
    void ended(Cell cell, int number, int of, CellEnd end, Duration taken);
}
