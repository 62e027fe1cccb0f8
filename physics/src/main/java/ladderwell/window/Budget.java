package ladderwell.window;

/**
 * What a run may be off. What is left of it is spent evenly over the time that is left, once the rounding still to come is set aside: 45 %
 * for the series, 45 % for the border, 10 % for levels dropped.
 */
final class Budget {
    private static final double KEPT = 0.95;
    /** Rounding may not press the rest below this share of an even spending. */
    private static final double LEAST = 0.02;

    private static final double SERIES = 0.45;
    private static final double BORDER = 0.45;
    private static final double DROPPED = 0.05;

    private final double tolerance;
    private final double duration;
    private final double initial;

    private double rate;
    private double series;
    private double border;
    private double dropped;
    private double rounding;

    /**
     * @param tolerance of the whole run
     * @param initial what the start is off already
     * @param duration length of the run
     */
    Budget(double tolerance, double initial, double duration) {
        this.tolerance = tolerance;
        this.initial = initial;
        this.duration = duration;
        rate = Math.max(0, KEPT * tolerance - initial) / duration;
    }

    /** Spreads what is left over the time left. */
    void spread(double time) {
        double left = duration - time;
        if (left > 0) {
            double even = KEPT * tolerance / duration;
            rate = Math.max(LEAST * even, (KEPT * tolerance - spent() - roundingToCome(time)) / left);
        }
    }

    /** Rounding up to the end, if it goes on as it did. */
    double roundingToCome(double time) {
        return time > 0 ? rounding * (duration - time) / time : 0;
    }

    double forSeries(double time) {
        return SERIES * rate * time;
    }

    double forBorder(double time) {
        return BORDER * rate * time;
    }

    /** For one drop on one side. */
    double forDrop(double time) {
        return DROPPED * rate * time;
    }

    void series(double more) {
        series += more;
    }

    void border(double more) {
        border += more;
    }

    void dropped(double more) {
        dropped += more;
    }

    void rounding(double more) {
        rounding += more;
    }

    double duration() {
        return duration;
    }

    double timeLeft(double time) {
        return duration - time;
    }

    /** What has been spent, the sum rounded up. */
    double spent() {
        return (initial + series + border + dropped + rounding) * (1 + 0x1p-48);
    }

    double tolerance() {
        return tolerance;
    }
}
