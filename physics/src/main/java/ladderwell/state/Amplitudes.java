package ladderwell.state;

import ladderwell.level.Levels;

/**
 * A pure state on levels: complex amplitudes on sorted segments of consecutive levels, parts kept apart (re, im).
 *
 * <p>Between two segments lie at least two levels that are not kept, so a and a² never couple two segments. Immutable.
 * {@link #reals} and {@link #imaginaries} hand out the arrays themselves for hot loops: read only.
 */
public final class Amplitudes {
    private final long[] firsts;
    private final double[][] re;
    private final double[][] im;
    private final double normError;
    private final double[] tailMoments;
    private final double tailSum;
    private final double missingWeight;

    Amplitudes(
            long[] firsts,
            double[][] re,
            double[][] im,
            double normError,
            double[] tailMoments,
            double tailSum,
            double missingWeight) {
        this.firsts = firsts;
        this.re = re;
        this.im = im;
        this.normError = normError;
        this.tailMoments = tailMoments;
        this.tailSum = tailSum;
        this.missingWeight = missingWeight;
    }

    /** The level n alone. */
    public static Amplitudes level(long n) {
        throw new UnsupportedOperationException();
    }

    /** Σ (re + i im) |level⟩, normalised. */
    public static Amplitudes superposition(long[] levels, double[] re, double[] im) {
        throw new UnsupportedOperationException();
    }

    /** The coherent state c_n = e^{−n̄/2} √(n̄^n / n!) e^{inφ}, with n̄ = mean and φ = phase, to the given norm error. */
    public static Amplitudes coherent(double mean, double phase, double tolerance) {
        throw new UnsupportedOperationException();
    }

    /** The packet of spread Δx = width about position with mean momentum, carried by the levels to the norm error given. */
    public static Amplitudes packet(
            Levels levels, double position, double momentum, double width, double tolerance) {
        throw new UnsupportedOperationException();
    }

    /** Number of segments. */
    public int segments() {
        return firsts.length;
    }

    /** First level of a segment. */
    public long first(int segment) {
        return firsts[segment];
    }

    /** Number of levels in a segment. */
    public int length(int segment) {
        return re[segment].length;
    }

    /** Real part of the amplitude of level first(segment) + i. */
    public double re(int segment, int i) {
        return re[segment][i];
    }

    /** Imaginary part of the amplitude of level first(segment) + i. */
    public double im(int segment, int i) {
        return im[segment][i];
    }

    /** All real parts of a segment, the array itself; read only. */
    public double[] reals(int segment) {
        return re[segment];
    }

    /** All imaginary parts of a segment, the array itself; read only. */
    public double[] imaginaries(int segment) {
        return im[segment];
    }

    /** ‖ψ − ψ̃‖ ≤ this, guaranteed: ψ the state meant, ψ̃ the amplitudes kept (discarded tail and rounding). */
    public double normError() {
        return normError;
    }

    /** Guaranteed upper bound of Σ (n+1)^k |c_n|² over the discarded levels, k = 0 … 4. */
    public double tailMoment(int k) {
        return tailMoments[k];
    }

    /** Guaranteed upper bound of Σ |c_n| over the discarded levels. */
    public double tailSum() {
        return tailSum;
    }

    /** Upper bound of the weight the state meant has outside the kept levels. */
    public double missingWeight() {
        return missingWeight;
    }

    /** How many levels are kept, over all segments. */
    public long levels() {
        long sum = 0;
        for (double[] part : re) {
            sum += part.length;
        }
        return sum;
    }
}
