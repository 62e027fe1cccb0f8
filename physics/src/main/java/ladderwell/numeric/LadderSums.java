package ladderwell.numeric;

/**
 * Sums over a ladder of levels that give ⟨a⟩, fluctuations of a, and moments of n, at every time of a run.
 *
 * <p>With a|n⟩ = √n|n-1⟩ and coefficients c_n: norm Σ|c_n|², amplitude ⟨a⟩ = Σ √(n+1) c_n* c_{n+1}, fluctuation
 * ⟨δ†δ⟩ and squeezing ⟨δ²⟩ with δ = a - ⟨a⟩. They are summed about a reference amplitude near ⟨a⟩, so that a narrow state far up the
 * ladder loses no digits. For x = (a + a†)/√2, p = (a - a†)/(i√2) and norm 1: ⟨x⟩ = √2 Re⟨a⟩, ⟨p⟩ = √2 Im⟨a⟩,
 * Var x = ½ + ⟨δ†δ⟩ + Re⟨δ²⟩, Var p = ½ + ⟨δ†δ⟩ - Re⟨δ²⟩, covariance Im⟨δ²⟩.
 * All sums are taken as they stand: nothing is divided by the norm except the mean and variance of n.
 *
 * <p>Levels outside the row count as empty.
 */
public final class LadderSums {
    /**
     * The sums for coefficients that evolve by phases; rows of coefficients are never all in memory.
     *
     * @param first level of the first coefficient (0 for the whole ladder)
     */
    public static LadderSums of(ExactPhases phases, int first, Workers workers) {
        throw new UnsupportedOperationException();
    }

    /**
     * The sums of given rows of coefficients.
     *
     * @shape re and im are [rows][levels]
     * @param first level of the first column
     */
    public static LadderSums of(double[][] re, double[][] im, int first) {
        throw new UnsupportedOperationException();
    }

    private LadderSums() {}

    /** The number of rows (times). */
    public int rows() {
        throw new UnsupportedOperationException();
    }

    /** Σ|c_n|² of row j. */
    public double norm(int j) {
        throw new UnsupportedOperationException();
    }

    /** Re⟨a⟩ of row j. */
    public double amplitudeRe(int j) {
        throw new UnsupportedOperationException();
    }

    /** Im⟨a⟩ of row j. */
    public double amplitudeIm(int j) {
        throw new UnsupportedOperationException();
    }

    /** ⟨δ†δ⟩ of row j, δ = a - ⟨a⟩. */
    public double fluctuation(int j) {
        throw new UnsupportedOperationException();
    }

    /** Re⟨δ²⟩ of row j. */
    public double squeezingRe(int j) {
        throw new UnsupportedOperationException();
    }

    /** Im⟨δ²⟩ of row j. */
    public double squeezingIm(int j) {
        throw new UnsupportedOperationException();
    }

    /** Σ n|c_n|² / Σ|c_n|² of row j. */
    public double meanQuanta(int j) {
        throw new UnsupportedOperationException();
    }

    /** The variance of n in row j, summed about its mean. */
    public double varianceQuanta(int j) {
        throw new UnsupportedOperationException();
    }

    /** Guaranteed bound on the error of the norm, of any row, from rounding and from the errors of the coefficients. */
    public double normError() {
        throw new UnsupportedOperationException();
    }

    /** Guaranteed bound on |⟨a⟩ - exact| in any row. */
    public double amplitudeError() {
        throw new UnsupportedOperationException();
    }

    /** Guaranteed bound on the error of ⟨δ†δ⟩, and of |⟨δ²⟩|, in row j. */
    public double fluctuationError(int j) {
        throw new UnsupportedOperationException();
    }

    /** Guaranteed bound on the error of the mean of n. */
    public double meanQuantaError() {
        throw new UnsupportedOperationException();
    }

    /** Guaranteed bound on the error of the variance of n. */
    public double varianceQuantaError() {
        throw new UnsupportedOperationException();
    }
}
