package ladderwell.kernel.cell;

import java.util.Optional;

/**
 * What a cell says while it runs. A kernel turns the calls into messages, a notebook runner into stored outputs.
 *
 * <p>Calls come from any thread, one at a time (the workbench holds a lock), in the order in which the cell said them.
 * Text that a thread of an earlier cell prints late is given to the output of the last cell run.
 */
public interface CellOutput {
    /** A piece of standard output; pieces are cut anywhere but inside a character. */
    void stdout(String text);

    /** A piece of standard error; pieces are cut anywhere but inside a character. */
    void stderr(String text);

    /**
     * Shows a value in the middle of a cell.
     *
     * @param displayId a name under which {@link #update} may replace it later, if any
     */
    void display(MimeBundle bundle, Optional<String> displayId);

    /** Replaces everything shown under {@code displayId}, in this cell or an earlier one. */
    void update(MimeBundle bundle, String displayId);

    /**
     * Removes what the cell has shown so far.
     *
     * @param wait whether to wait with it until the next output comes, which avoids flicker
     */
    void clear(boolean wait);
}
