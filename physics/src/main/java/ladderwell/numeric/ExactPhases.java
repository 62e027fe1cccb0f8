package ladderwell.numeric;

/**
 * Coefficients c_k e^{-i E_k t_j} of a state on levels E_k at times t_j, with phases reduced mod 2π so that their error does not grow with E t.
 *
 * <p>Energies are double-double, E = high + low; times are the doubles given, taken as exact numbers. On a uniform grid of times a
 * two-level table replaces most sines and cosines; the differences between the stored times and the exact grid are corrected.
 *
 * @units E t is an angle in rad: energies in any unit, times in its inverse (ħ = 1)
 */
public final class ExactPhases {
    /** Largest |E t|, in rad, that is accepted. */
    public static final double LARGEST_PHASE = 0x1p60;

    /**
     * E t mod 2π in [-π, π] (to rounding).
     *
     * @units rad
     * @accuracy absolute error at most 2.5e-16 + |E t| 2^-100
     * @throws IllegalArgumentException if an argument is not finite or |E t| exceeds {@link #LARGEST_PHASE}
     */
    public static double reduced(double energyHigh, double energyLow, double time) {
        throw new UnsupportedOperationException();
    }

    /**
     * Phases for levels with energies high + low, initial coefficients re + i im, at the given times. The arrays are copied.
     *
     * @shape energyHigh, energyLow, re, im are [levels]; times is [times], in any order
     * @throws IllegalArgumentException if lengths differ, a number is not finite, or some |E t| exceeds {@link #LARGEST_PHASE}
     */
    public static ExactPhases of(double[] energyHigh, double[] energyLow, double[] re, double[] im, double[] times) {
        throw new UnsupportedOperationException();
    }

    private ExactPhases() {}

    /** The number of levels. */
    public int levels() {
        throw new UnsupportedOperationException();
    }

    /** The number of times. */
    public int times() {
        throw new UnsupportedOperationException();
    }

    /** The j-th time. */
    public double time(int j) {
        throw new UnsupportedOperationException();
    }

    /** Whether the times lie on a uniform grid (to rounding), so that the two-level table is used. */
    public boolean onUniformGrid() {
        throw new UnsupportedOperationException();
    }

    /**
     * Writes the coefficients at times fromTime … toTime-1. May be called from several threads for separate ranges.
     *
     * @shape re and im are [at least toTime - fromTime][at least levels]; row r is time fromTime + r
     */
    public void fill(int fromTime, int toTime, double[][] re, double[][] im) {
        throw new UnsupportedOperationException();
    }

    /**
     * Guaranteed bound on |computed - exact| / |c_k| for every coefficient and time, against the given energies, times and c_k as exact
     * numbers, for coefficients of at least 1e-290 in size (below, the absolute error is at most 1e-305).
     */
    public double errorBound() {
        throw new UnsupportedOperationException();
    }
}
