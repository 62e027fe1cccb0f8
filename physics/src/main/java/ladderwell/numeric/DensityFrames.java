package ladderwell.numeric;

/**
 * Frames of the density |Σ_k c_k(t) φ_k(x)|² on a grid, for many times.
 *
 * <p>When the φ_k are even and odd in turn and the grid is symmetric, even and odd levels are summed on half the grid: half the work.
 *
 * @accuracy see {@link #errorBound(double, double, double)}
 */
public final class DensityFrames {
    /**
     * Frames for real functions given on a grid. The table is copied.
     *
     * @shape functions is [levels][points]
     */
    public static DensityFrames of(double[][] functions) {
        throw new UnsupportedOperationException();
    }

    /**
     * Frames for functions that are even and odd in turn on a grid symmetric about its middle: φ_k(x_{points-1-i}) = ±φ_k(x_i).
     * Only the upper half of each row is read.
     *
     * @shape functions is [levels][points]
     * @param firstIsEven whether row 0 is an even function
     */
    public static DensityFrames alternating(double[][] functions, boolean firstIsEven) {
        throw new UnsupportedOperationException();
    }

    private DensityFrames() {}

    /**
     * The density at each time.
     *
     * @shape re and im are [times][levels]; the result is [times][points]
     */
    public double[][] of(double[][] re, double[][] im, Workers workers) {
        throw new UnsupportedOperationException();
    }

    /**
     * The density at each time of the phases, without keeping all coefficients.
     *
     * @shape the result is [phases.times()][points]
     */
    public double[][] of(ExactPhases phases, Workers workers) {
        throw new UnsupportedOperationException();
    }

    /**
     * Guaranteed bound on the error of any density value, given the errors of what went in.
     *
     * @param coefficientError bound on the 2-norm of the error of a row of coefficients
     * @param functionError bound on the error of any entry of the functions
     * @param norm bound on the 2-norm of a row of coefficients
     */
    public double errorBound(double coefficientError, double functionError, double norm) {
        throw new UnsupportedOperationException();
    }
}
