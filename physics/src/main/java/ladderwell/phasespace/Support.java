package ladderwell.phasespace;

import ladderwell.evidence.Bound;

/**
 * A box of phase space that holds a state: all of its positions lie between left and right and all of its momenta between low and high, but for
 * parts of the wave function whose norms are within {@code missed}.
 *
 * @param left least position
 * @param right greatest position
 * @param low least momentum
 * @param high greatest momentum
 * @param missed bound on ‖ψ outside [left, right]‖ and on ‖φ outside [low, high]‖; for a mixed state on the root of the weight outside
 */
public record Support(double left, double right, double low, double high, Bound missed) {

    /** Largest value of any oscillator function: that of the ground state at the origin, π^{−1/4}. */
    private static final double HIGHEST = Math.pow(Math.PI, -0.25);

    private static final double WANTED = 1e-17;

    public Support {
        if (!(right > left && high > low) || !Double.isFinite(right - left) || !Double.isFinite(high - low)) {
            throw new IllegalArgumentException(
                    "a support is a box with ends, not " + left + " … " + right + " by " + low + " … " + high);
        }
    }

    /**
     * Of every state on the harmonic levels 0 … last: a box about a circle a little wider than the classical orbit of the last level.
     *
     * <p>Beyond its turning point μ = √(2n+1) an oscillator function solves φ″ = (x² − μ²)φ and falls, so φ(x) ≤ φ(μ) e^{−S(x)}, S(x) =
     * ∫_μ^x √(s² − μ²) ds, and ∫_X^∞ φ² ≤ φ(μ)² e^{−2S(X)}/(2√(X² − μ²)); of a sum over levels the weight outside is at most the sum of
     * theirs, of which the last is the largest. Guaranteed.
     */
    public static Support ofLevels(long last) {
        if (last < 0) {
            throw new IllegalArgumentException("levels count from 0, not from " + last);
        }
        double square = 2.0 * last + 1;
        double turning = Math.sqrt(square);
        // What may lie outside, its logarithm: both sides, all levels.
        double allowed = Math.log(WANTED * WANTED / (2 * (last + 1.0) * HIGHEST * HIGHEST));
        double near = turning + 1;
        double far = turning + 12;
        while (far - near > 1e-3) {
            double middle = (near + far) / 2;
            double root = Math.sqrt((middle - turning) * (middle + turning));
            double action = (middle * root - square * Math.log((middle + root) / turning)) / 2;
            if (-2 * action - Math.log(2 * root) < allowed) {
                far = middle;
            } else {
                near = middle;
            }
        }
        // The logarithm above loses about n units of rounding; the margin of a thousandth gains 0.03 √n in the
        // exponent.
        return new Support(-far, far, -far, far, Bound.guaranteed(WANTED));
    }

    /** The least box around this one and another. */
    public Support around(Support other) {
        return new Support(
                Math.min(left, other.left),
                Math.max(right, other.right),
                Math.min(low, other.low),
                Math.max(high, other.high),
                missed.widest(other.missed));
    }
}
