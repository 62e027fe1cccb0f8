package ladderwell.kernel.cell;

/** What the workbench lends to sentences while they run. */
public interface SentenceContext {
    /** The names declared so far, to read and to declare. */
    Names names();

    /**
     * The line of the cell at which the text begins, from 1, to name the place of a mistake.
     */
    int firstLine();

    /**
     * The value of a Java expression in the session: {@code nbar} of {@code mean {nbar}}. The first call waits for the
     * Java session to start.
     *
     * @throws SentenceFailure when Java refuses the expression, it throws, or it has no value or a null one; the
     *     message says which. The lines are left to the caller, who knows the place in the sentence
     */
    Object evaluate(String expression) throws SentenceFailure;

    /**
     * Gives the result of a sentence. It is rendered at once; the last one of a cell becomes the result of the cell, the
     * earlier ones are displayed.
     */
    void emit(Object result);

    /** Where to show progress while a sentence runs. */
    CellOutput output();
}
