package ladderwell.kernel.cell;

/** The few terminal colours that tracebacks use. */
final class Ansi {
    private Ansi() {}

    /** What went wrong: bold and red. */
    static String bad(String text) {
        return "\u001b[1;31m" + text + "\u001b[0m";
    }
}
