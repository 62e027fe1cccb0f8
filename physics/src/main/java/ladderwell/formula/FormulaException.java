package ladderwell.formula;

/** A formula that cannot be read; the message is one sentence, the place is kept beside it. */
public final class FormulaException extends IllegalArgumentException {

    private static final long serialVersionUID = 1L;

    private final String reason;
    private final String text;
    private final int start;
    private final int end;

    /**
     * Message: "{reason} (at character {start + 1} of the formula)".
     *
     * @param reason what is wrong and what was expected, in one sentence
     * @param text the formula
     * @param start first character of the place, from 0
     * @param end one past the last character of the place
     */
    public FormulaException(String reason, String text, int start, int end) {
        super(reason + " (at character " + (start + 1) + " of the formula)");
        this.reason = reason;
        this.text = text;
        this.start = Math.max(0, Math.min(start, text.length()));
        this.end = Math.max(this.start, Math.min(end, text.length()));
    }

    /** The sentence without the place. */
    public String reason() {
        return reason;
    }

    /** The formula. */
    public String text() {
        return text;
    }

    /** First character of the place, from 0. */
    public int start() {
        return start;
    }

    /** One past the last character of the place; equal to {@link #start} where something is missing. */
    public int end() {
        return end;
    }
}
