package ladderwell.kernel.sentence;

/** A sentence that cannot be read: what is wrong and what was expected, in one sentence, and the place it speaks of. */
public final class MisreadSentence extends Exception {
    private static final long serialVersionUID = 1L;

    private final transient Place place;

    /** A mistake at a place. */
    public MisreadSentence(String message, Place place) {
        super(message);
        this.place = place;
    }

    /** A mistake at a place, with the error that led to it. */
    public MisreadSentence(String message, Place place, Throwable cause) {
        super(message, cause);
        this.place = place;
    }

    /** What is wrong. */
    public String message() {
        return String.valueOf(getMessage());
    }

    /** Where. */
    public Place place() {
        return place;
    }
}
