package ladderwell.kernel.command;

/** A command that cannot be carried out; the message is one sentence for the user. */
final class CommandException extends Exception {
    private static final long serialVersionUID = 1L;

    CommandException(String message) {
        super(message);
    }

    CommandException(String message, Throwable cause) {
        super(message, cause);
    }
}
