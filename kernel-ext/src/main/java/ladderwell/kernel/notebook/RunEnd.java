package ladderwell.kernel.notebook;

import java.util.OptionalInt;

/** How the run of a notebook ended. */
public sealed interface RunEnd {
    /** Every cell ran; those tagged {@code raises-exception} may have failed. */
    record Finished(int cells) implements RunEnd {}

    /**
     * A cell failed, and the cells after it did not run.
     *
     * @param number the number the cell ran under, {@code [3]}
     * @param line its line, from 1, where the error knows it
     * @param name the kind of error
     * @param message one sentence
     */
    record Failed(int number, OptionalInt line, String name, String message) implements RunEnd {}

    /**
     * The run was stopped from outside.
     *
     * @param number the number of the cell that was interrupted or would have been next
     */
    record Stopped(int number) implements RunEnd {}
}
