package ladderwell.bench;

/** Answers that are checked before they are timed. */
final class Checked {
    private Checked() {}

    static void below(String what, double error, double limit) {
        if (!(error <= limit)) {
            throw new IllegalStateException("error of " + what + " is " + error + ", expected at most " + limit);
        }
    }
}
