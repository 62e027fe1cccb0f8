package ladderwell.kernel.notebook;

import com.google.gson.JsonObject;
import java.time.Duration;
import java.util.List;
import java.util.OptionalInt;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import ladderwell.kernel.cell.CellEnd;

/**
 * Runs the code cells of a notebook in order and stores outputs and counts in it, as a Jupyter client would. Outputs of
 * an earlier run are dropped before the first cell runs, so that the file never mixes two runs. A blank cell takes no
 * number; a cell tagged {@code skip-execution} is left as it is; the first error ends the run, except in a cell tagged
 * {@code raises-exception}.
 */
public final class NotebookRun {
    private final Notebook notebook;
    private final CellRunner runner;
    private final Progress progress;
    private volatile boolean stopped;

    /** A run of this notebook that has not begun. */
    public NotebookRun(Notebook notebook, CellRunner runner, Progress progress) {
        this.notebook = notebook;
        this.runner = runner;
        this.progress = progress;
    }

    /** Runs the cells; returns when the last has ended. */
    public RunEnd run() {
        List<Cell> cells = prepared();
        OutputStore store = new OutputStore(notebook);
        for (int i = 0; i < cells.size(); i++) {
            Cell cell = cells.get(i);
            int count = i + 1;
            if (stopped) {
                return new RunEnd.Stopped(count);
            }
            synchronized (notebook) {
                cell.startsAs(count);
            }
            progress.starts(cell, count, cells.size());
            long start = System.nanoTime();
            OutputStore.OfCell output = store.of(cell);
            CellEnd end = runner.run(cell.source(), count, output);
            output.end(count, end);
            progress.ended(cell, count, cells.size(), end, Duration.ofNanos(System.nanoTime() - start));
            if (end instanceof CellEnd.Interrupted) {
                return new RunEnd.Stopped(count);
            }
            if (end instanceof CellEnd.Failed failed && !cell.tags().contains("raises-exception")) {
                return new RunEnd.Failed(count, line(failed.traceback(), count), failed.name(), failed.message());
            }
        }
        return new RunEnd.Finished(cells.size());
    }

    /** Ends the run as soon as the running cell can be ended; from any thread. */
    public void stop() {
        stopped = true;
        runner.interrupt();
    }

    /** The cells to run, with what an earlier run left in the notebook removed. */
    private List<Cell> prepared() {
        synchronized (notebook) {
            List<Cell> code = notebook.cells().stream()
                    .filter(cell -> cell.kind() == Cell.Kind.CODE)
                    .filter(cell -> !cell.tags().contains("skip-execution"))
                    .toList();
            code.forEach(Cell::clear);
            if (!notebook.metadata().has("kernelspec")) {
                JsonObject kernel = new JsonObject();
                kernel.addProperty("display_name", "Ladderwell");
                kernel.addProperty("language", "java");
                kernel.addProperty("name", "ladderwell");
                notebook.metadata().add("kernelspec", kernel);
            }
            return code.stream().filter(cell -> !cell.source().isBlank()).toList();
        }
    }

    /** The line of the cell that a traceback names first: Java says cell and line, a sentence the line alone. */
    private static OptionalInt line(List<String> traceback, int count) {
        Pattern place = Pattern.compile("(?:^|cell \\[" + count + "], )line (\\d{1,9})\\b");
        for (String line : traceback) {
            Matcher found = place.matcher(Ansi.plain(line));
            if (found.find()) {
                return OptionalInt.of(Integer.parseInt(found.group(1)));
            }
        }
        return OptionalInt.empty();
    }
}
