package ladderwell.kernel.cell;

/** Turns any value that a cell returns into what clients can show. */
@FunctionalInterface
public interface Renderer {
    /** The forms of a value. Never fails for want of a special form: plain text is always possible. */
    MimeBundle render(Object value);
}
