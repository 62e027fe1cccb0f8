package ladderwell.kernel.cell;

import java.util.Optional;

/**
 * The declarations language, as the workbench sees it. A text is either a whole cell that starts with {@code %%}, that
 * line included, or a run of consecutive lines that start with {@code %}, blank lines between them included (see {@link
 * CellText}).
 */
public interface Sentences {
    /**
     * Runs the sentences of a text in order. Long work polls {@link Thread#interrupted()}; once it finds itself
     * interrupted it may throw anything, or declare and emit what it has so far and return.
     *
     * @throws SentenceFailure when a sentence is wrong; nothing that this cell declared is then kept
     */
    void run(String text, SentenceContext context) throws SentenceFailure;

    /** What could stand at the cursor. Inside braces the workbench completes Java itself and does not ask. */
    Completion complete(String text, int cursor, Names names);

    /**
     * What the word at the cursor means, its unit, default and formula.
     *
     * @param detail 0 for the short form, 1 for the long one
     */
    Optional<MimeBundle> inspect(String text, int cursor, int detail, Names names);
}
