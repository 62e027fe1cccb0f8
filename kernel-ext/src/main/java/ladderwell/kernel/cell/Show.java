package ladderwell.kernel.cell;

import java.util.Optional;
import org.jspecify.annotations.Nullable;

/**
 * What a Java cell may call to show values before its end. Every notebook imports these methods by name. They speak to
 * the running cell, from whatever thread they are called.
 */
public final class Show {
    private static volatile @Nullable CellRun running;

    private Show() {}

    static void during(CellRun run) {
        running = run;
    }

    static void ended() {
        running = null;
    }

    private static CellRun cell() {
        CellRun cell = running;
        if (cell == null) {
            throw new IllegalStateException("nothing can be shown: no cell is running");
        }
        return cell;
    }

    /** Shows a value below the cell. */
    public static void display(Object value) {
        CellRun cell = cell();
        MimeBundle bundle = cell.render(value);
        cell.say(output -> output.display(bundle, Optional.empty()));
    }

    /** Shows a value below the cell under a name, to be replaced later by {@link #updateDisplay}. */
    public static void display(Object value, String displayId) {
        CellRun cell = cell();
        MimeBundle bundle = cell.render(value);
        cell.say(output -> output.display(bundle, Optional.of(displayId)));
    }

    /** Replaces what was shown under a name, in this cell or an earlier one. */
    public static void updateDisplay(Object value, String displayId) {
        CellRun cell = cell();
        MimeBundle bundle = cell.render(value);
        cell.say(output -> output.update(bundle, displayId));
    }

    /**
     * Removes what the cell has shown so far.
     *
     * @param wait whether to wait with it until the next output comes
     */
    public static void clearOutput(boolean wait) {
        cell().say(output -> output.clear(wait));
    }
}
