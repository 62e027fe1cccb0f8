package ladderwell.kernel.cell;

import java.util.List;
import java.util.Optional;

/**
 * The bench at which the cells of one notebook are worked: its declared names, its Java session, its sentences. It is
 * there at once; the Java session starts in the background, and only what needs Java waits for it.
 *
 * <p>Cells run one at a time, on the thread that calls {@link #run}; {@link #interrupt} comes from any other thread.
 * While it is open, a workbench owns {@code System.out}, {@code System.err} and {@code System.in} of the process.
 */
public final class Workbench implements AutoCloseable {
    /** A workbench with the imports that every Ladderwell notebook starts with. */
    public Workbench(Sentences sentences, Renderer renderer) {
        throw new UnsupportedOperationException();
    }

    /** The names declared so far. */
    public Names names() {
        throw new UnsupportedOperationException();
    }

    /**
     * Runs a cell and renders its result. Never throws for what the cell does.
     *
     * @param code the text of the cell
     * @param number the number of the cell in tracebacks, as in {@code cell [3], line 2}
     * @param output where the cell shows what it has to show while it runs
     */
    public CellEnd run(String code, int number, CellOutput output) {
        throw new UnsupportedOperationException();
    }

    /** The rendered value of one Java expression, with its side effects and without any output. */
    public CellEnd evaluate(String expression) {
        throw new UnsupportedOperationException();
    }

    /** What could stand at the cursor. */
    public Completion complete(String code, int cursor) {
        throw new UnsupportedOperationException();
    }

    /**
     * What the word at the cursor means.
     *
     * @param detail 0 for the short form, 1 for the long one
     */
    public Optional<MimeBundle> inspect(String code, int cursor, int detail) {
        throw new UnsupportedOperationException();
    }

    /** Whether the text can be run as it stands. */
    public Completeness completeness(String code) {
        throw new UnsupportedOperationException();
    }

    /** Ends the running cell, if one is running, within a fraction of a second; returns at once. */
    public void interrupt() {
        throw new UnsupportedOperationException();
    }

    /** Ends the Java session and gives the standard streams back. */
    @Override
    public void close() {}

    /** The imports that every notebook starts with. */
    static List<String> standardImports() {
        return List.of();
    }
}
