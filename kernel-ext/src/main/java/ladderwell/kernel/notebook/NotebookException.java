package ladderwell.kernel.notebook;

/** A notebook that cannot be read or run; the message is one sentence for the user. */
public final class NotebookException extends Exception {
    private static final long serialVersionUID = 1L;

    /** What is wrong, where, and what was expected. */
    public NotebookException(String message) {
        super(message);
    }

    /** As {@link #NotebookException(String)}, with the error that led to it. */
    public NotebookException(String message, Throwable cause) {
        super(message, cause);
    }
}
