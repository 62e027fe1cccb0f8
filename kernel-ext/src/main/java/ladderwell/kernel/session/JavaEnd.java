package ladderwell.kernel.session;

import java.util.List;
import java.util.Optional;

/** How a text of Java ended. */
public sealed interface JavaEnd {
    /**
     * It ran to its end.
     *
     * @param value the value of its last expression; empty when the text ends with a statement, or with null
     * @param isNull whether the text ends with an expression whose value is null
     */
    record Done(Optional<Object> value, boolean isNull) implements JavaEnd {}

    /**
     * Java refused the text, or it threw. What earlier snippets of the text did stays done; a variable whose new value
     * failed keeps its old one.
     *
     * @param name the class of the exception, or {@code CompilationError}
     * @param message its message, in one sentence as far as Java gives one
     * @param traceback lines to show, with ANSI colours
     */
    record Failed(String name, String message, List<String> traceback) implements JavaEnd {
        /** Copies the lines. */
        public Failed {
            traceback = List.copyOf(traceback);
        }
    }

    /**
     * It was stopped on request.
     *
     * @param abandoned whether code that heeds no interrupt had to be left running in the background
     */
    record Stopped(boolean abandoned) implements JavaEnd {}
}
