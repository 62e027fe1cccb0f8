package ladderwell.evidence;

import java.util.Locale;
import ladderwell.quantity.Digits;

/**
 * Physics or numerics that cannot give the number asked for. The message is one sentence built from the fields, which are
 * typed so that a notebook can show them and a test can check them. Mistakes in an argument are
 * {@link IllegalArgumentException}s instead.
 */
public abstract sealed class PhysicsException extends RuntimeException {

    private static final long serialVersionUID = 1L;

    private PhysicsException(String message) {
        super(message);
    }

    /** What was asked needs more memory than is allowed; refused before anything is allocated. */
    public static final class TooLarge extends PhysicsException {
        private static final long serialVersionUID = 1L;

        private final String what;
        private final double estimate;
        private final double allowed;
        private final String remedy;

        /**
         * Message: "{what} ({estimate}, allowed {allowed}); {remedy}".
         *
         * @param what the request and its size in the caller's words: "1e9 frames of 400 points need too much memory"
         * @param estimate bytes needed (a double: the request may exceed a long)
         * @param allowed bytes allowed
         * @param remedy what to try: "ask for at most 2.5e6 frames"
         */
        public TooLarge(String what, double estimate, double allowed, String remedy) {
            super(what + " (" + bytes(estimate) + ", allowed " + bytes(allowed) + "); " + remedy);
            this.what = what;
            this.estimate = estimate;
            this.allowed = allowed;
            this.remedy = remedy;
        }

        /** The request. */
        public String what() {
            return what;
        }

        /** Bytes needed. */
        public double estimate() {
            return estimate;
        }

        /** Bytes allowed. */
        public double allowed() {
            return allowed;
        }

        /** What to try. */
        public String remedy() {
            return remedy;
        }
    }

    /** What was asked would take far longer than anyone waits; refused before it is begun or as soon as it shows. */
    public static final class TooLong extends PhysicsException {
        private static final long serialVersionUID = 1L;

        private final String what;
        private final double seconds;
        private final String remedy;

        /**
         * Message: "{what} would take about {seconds}; {remedy}".
         *
         * @param what the request and its size in the caller's words
         * @param seconds estimate
         * @param remedy what to try
         */
        public TooLong(String what, double seconds, String remedy) {
            super(what + " would take about "
                    + (seconds < 2e5
                            ? Digits.significant(seconds / 3600, 2) + " hours"
                            : seconds < 1e8
                                    ? Digits.significant(seconds / 86400, 2) + " days"
                                    : Digits.significant(seconds / 31557600, 2) + " years")
                    + "; " + remedy);
            this.what = what;
            this.seconds = seconds;
            this.remedy = remedy;
        }

        /** The request. */
        public String what() {
            return what;
        }

        /** Seconds it would take, roughly. */
        public double seconds() {
            return seconds;
        }

        /** What to try. */
        public String remedy() {
            return remedy;
        }
    }

    /** An iteration reached its cap before its tolerance. */
    public static final class NotConverged extends PhysicsException {
        private static final long serialVersionUID = 1L;

        private final String what;
        private final long steps;
        private final double reached;
        private final double wanted;

        /**
         * Message: "{what} did not converge in {steps} steps: error {reached} reached, {wanted} wanted".
         *
         * @param what what was iterated: "level n = 12 of well"
         * @param steps steps made
         * @param reached error reached; infinite if nothing is known
         * @param wanted error wanted
         */
        public NotConverged(String what, long steps, double reached, double wanted) {
            super(what + " did not converge in " + steps + " steps: error "
                    + (Double.isFinite(reached) ? Digits.significant(reached, 2) : "unknown") + " reached, "
                    + Digits.significant(wanted, 2) + " wanted");
            this.what = what;
            this.steps = steps;
            this.reached = reached;
            this.wanted = wanted;
        }

        /** What was iterated. */
        public String what() {
            return what;
        }

        /** Steps made. */
        public long steps() {
            return steps;
        }

        /** Error reached. */
        public double reached() {
            return reached;
        }

        /** Error wanted. */
        public double wanted() {
            return wanted;
        }
    }

    /** A state has weight where the oscillator has no bound level. */
    public static final class NotCarried extends PhysicsException {
        private static final long serialVersionUID = 1L;

        private final String state;
        private final double missingWeight;
        private final int levels;
        private final String remedy;

        /**
         * Message: "{state} needs weight {missingWeight} above the last bound level (n = {levels − 1}); the bound levels
         * cannot carry it: {remedy}".
         *
         * @param state the state in the caller's words: "the coherent state psi of mean 6"
         * @param missingWeight probability outside the bound levels, 0 to 1
         * @param levels number of bound levels
         * @param remedy what to try: "lower the mean, or make the well deeper or wider"
         */
        public NotCarried(String state, double missingWeight, int levels, String remedy) {
            super(
                    levels == 0
                            ? state + " needs bound levels, and there are none: " + remedy
                            : state + " needs weight " + Digits.significant(missingWeight, 2)
                                    + " above the last bound level (n = " + (levels - 1)
                                    + "); the bound levels cannot carry it: " + remedy);
            this.state = state;
            this.missingWeight = missingWeight;
            this.levels = levels;
            this.remedy = remedy;
        }

        /** The state. */
        public String state() {
            return state;
        }

        /** Probability outside the bound levels. */
        public double missingWeight() {
            return missingWeight;
        }

        /** Number of bound levels. */
        public int levels() {
            return levels;
        }

        /** What to try. */
        public String remedy() {
            return remedy;
        }
    }

    private static String bytes(double count) {
        String[] units = {"bytes", "kB", "MB", "GB", "TB", "PB", "EB"};
        double size = count;
        int unit = 0;
        while (size >= 999.5 && unit < units.length - 1) {
            size /= 1000;
            unit++;
        }
        return (size < 1e6
                        ? String.format(Locale.ROOT, size < 9.95 && unit > 0 ? "%.1f" : "%.0f", size)
                        : Digits.significant(size, 2))
                + " " + units[unit];
    }
}
