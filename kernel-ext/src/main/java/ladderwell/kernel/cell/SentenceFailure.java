package ladderwell.kernel.cell;

import java.util.List;

/** A sentence that cannot be carried out: one sentence for the user, and the place marked. */
public final class SentenceFailure extends Exception {
    private static final long serialVersionUID = 1L;

    private final transient List<String> lines;

    /**
     * @param message what is wrong, where, and what was expected, in one sentence
     * @param lines what to show above the message: the sentence with a caret under the place; may be empty
     */
    public SentenceFailure(String message, List<String> lines) {
        super(message);
        this.lines = List.copyOf(lines);
    }

    /** As {@link #SentenceFailure(String, List)}, with the error that led to it. */
    public SentenceFailure(String message, List<String> lines, Throwable cause) {
        super(message, cause);
        this.lines = List.copyOf(lines);
    }

    /** What is wrong, in one sentence. */
    public String message() {
        return String.valueOf(getMessage());
    }

    /** The sentence with the place marked, ready to print. */
    public List<String> lines() {
        return lines;
    }
}
