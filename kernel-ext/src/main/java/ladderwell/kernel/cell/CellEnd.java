package ladderwell.kernel.cell;

import java.util.List;
import java.util.Optional;

/** How a cell ended. What it showed before its end went to its {@link CellOutput}. */
public sealed interface CellEnd {
    /**
     * The cell ran to its end.
     *
     * @param result the value of its last line, if it has one; in a cell of several sentences the earlier values were
     *     displayed, and the last one is the result
     */
    record Done(Optional<MimeBundle> result) implements CellEnd {}

    /**
     * The cell failed. The session and every name declared before stay as they were.
     *
     * @param name the kind of error, such as {@code java.lang.ArithmeticException} or {@code Declaration}
     * @param message one sentence
     * @param traceback the lines to show, with ANSI colours; the user's own line is named as {@code cell [3], line 2}
     */
    record Failed(String name, String message, List<String> traceback) implements CellEnd {
        /** Copies the lines. */
        public Failed {
            traceback = List.copyOf(traceback);
        }
    }

    /**
     * The cell was interrupted on request; what it had declared by then is kept.
     *
     * @param traceback the lines to show, as in {@link Failed}
     */
    record Interrupted(List<String> traceback) implements CellEnd {
        /** Copies the lines. */
        public Interrupted {
            traceback = List.copyOf(traceback);
        }
    }
}
