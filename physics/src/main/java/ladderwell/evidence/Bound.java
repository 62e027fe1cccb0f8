package ladderwell.evidence;

import static java.util.Objects.requireNonNull;

import ladderwell.quantity.Digits;

/**
 * How far a number can be from the exact answer: |number − exact| ≤ {@code size}, with the stated certainty.
 *
 * <p>Combining rounds outward and takes the weakest certainty, so a bound never becomes better than what it came from. An
 * infinite size is allowed and says that nothing is known; sums that overflow end there instead of failing.
 *
 * @param kind what stands behind it
 * @param size at least 0, in the unit of the number; infinite if nothing is known
 */
public record Bound(Certainty kind, double size) {

    private static final Bound EXACT = new Bound(Certainty.GUARANTEED, 0);

    /** Refuses NaN and negative sizes. */
    public Bound {
        requireNonNull(kind, "kind");
        if (!(size >= 0)) {
            throw new IllegalArgumentException("a bound must be at least 0, not " + size);
        }
        size = size + 0.0; // −0 becomes 0
    }

    /** A bound that is a theorem about this run. */
    public static Bound guaranteed(double size) {
        return new Bound(Certainty.GUARANTEED, size);
    }

    /** A bound found by refinement. */
    public static Bound estimated(double size) {
        return new Bound(Certainty.ESTIMATED, size);
    }

    /** Half the width of a confidence interval. */
    public static Bound statistical(double size) {
        return new Bound(Certainty.STATISTICAL, size);
    }

    /** No error at all: what was typed, or what is true by definition. */
    public static Bound exact() {
        return EXACT;
    }

    /** True if the size is 0. */
    public boolean isExact() {
        return size == 0;
    }

    /** False if the size is infinite: nothing is known. */
    public boolean isKnown() {
        return size < Double.POSITIVE_INFINITY;
    }

    /** True if it is a theorem. */
    public boolean isGuaranteed() {
        return kind == Certainty.GUARANTEED;
    }

    /** Bound of a sum or difference of two numbers: sizes add, rounded up; the weaker certainty. */
    public Bound plus(Bound other) {
        double sum = size == 0 || other.size == 0 ? size + other.size : Math.nextUp(size + other.size);
        return new Bound(kind.weaker(other.kind), sum);
    }

    /**
     * Adds an error of the same certainty, such as an allowance for rounding.
     *
     * @param more at least 0
     */
    public Bound plus(double more) {
        return plus(new Bound(kind, more));
    }

    /**
     * Bound of {@code factor} times the number, rounded up; an unknown bound stays unknown.
     *
     * @param factor finite, of any sign
     */
    public Bound times(double factor) {
        if (!Double.isFinite(factor)) {
            throw new IllegalArgumentException("a bound can be scaled by a finite number, not by " + factor);
        }
        double magnitude = Math.abs(factor);
        if (!isKnown() || magnitude == 1) {
            return this;
        }
        return new Bound(kind, size == 0 || magnitude == 0 ? 0 : Math.nextUp(size * magnitude));
    }

    /** The wider size with the weaker certainty: a bound that holds for both numbers. */
    public Bound widest(Bound other) {
        return new Bound(kind.weaker(other.kind), Math.max(size, other.size));
    }

    /** The same size with a certainty at most as strong as {@code other}; a bound is never promoted. */
    public Bound atMost(Certainty other) {
        return new Bound(kind.weaker(other), size);
    }

    /** The number with only the digits that this bound supports: "0.1582113883(2)"; see {@link Digits#withBound}. */
    public String beside(double value) {
        return Digits.withBound(value, size);
    }

    /** For instance "2e-10 guaranteed", "exact" or "unknown"; the size rounded up to two digits. */
    @Override
    public String toString() {
        if (isExact()) {
            return kind == Certainty.GUARANTEED ? "exact" : "0 " + kind.word();
        }
        return (isKnown() ? Digits.upward(size, 2) : "unknown") + " " + kind.word();
    }
}
