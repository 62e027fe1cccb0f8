package ladderwell.formula;

/**
 * A point where a formula is not smooth in x.
 *
 * @param position x
 * @param kind what breaks there
 */
public record Break(double position, Kind kind) {

    /** What breaks. */
    public enum Kind {
        /** The value jumps. */
        VALUE,
        /** The value is continuous, the slope jumps: a kink. */
        SLOPE,
        /** Value and slope are continuous, a higher derivative may jump. */
        HIGHER
    }
}
