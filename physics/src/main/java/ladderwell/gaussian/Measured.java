package ladderwell.gaussian;

import static java.util.Objects.requireNonNull;

import ladderwell.evidence.Bound;

/**
 * A number and how far it may be off.
 *
 * @param value the number, finite
 * @param bound its bound
 */
public record Measured(double value, Bound bound) {
    /** Refuses NaN and infinities. */
    public Measured {
        requireNonNull(bound, "bound");
        if (!Double.isFinite(value)) {
            throw new IllegalArgumentException("a value read from a state must be finite, not " + value);
        }
    }

    /** With the digits that the bound supports. */
    @Override
    public String toString() {
        return bound.beside(value);
    }
}
