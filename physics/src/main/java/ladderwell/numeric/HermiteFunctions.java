package ladderwell.numeric;

/**
 * The wave functions of the harmonic oscillator in scaled units ([x, p] = i, energy (p^2 + x^2)/2),
 *
 * <pre>
 *   phi_n(x) = H_n(x) exp(-x^2/2) / sqrt(2^n n! sqrt(pi)),    integral of phi_n^2 over x = 1,
 * </pre>
 *
 * for any index from 0 to {@value #LAST_INDEX} and any x. Levels below 512 come from the three-term recurrence, started at the ground
 * state; from there up each window starts from its own two lowest levels, given by {@link PhaseFunction phase and amplitude}, so the cost
 * follows the number of levels asked for and not the index.
 *
 * @source the recurrence is DLMF 18.9.1 with 18.3 for the norm; it is stable upwards for every x, inside the turning points and out
 */
public final class HermiteFunctions {
    /** The largest index offered: the accuracy has been measured up to here. */
    public static final int LAST_INDEX = 1_000_000;

    private HermiteFunctions() {}

    /**
     * A window of neighbouring levels at many points: phi_n(x_j) for n = first .. first+count-1.
     *
     * @param first the lowest index, 0 or above
     * @param count how many levels, 1 or above; the highest index first+count-1 is at most {@link #LAST_INDEX}
     * @param x points in units of the zero-point length sqrt(hbar/(m omega)), in any order; not modified. An infinite point gives 0
     * @return a new table, row = level, column = point
     * @shape result is [count][x.length]
     * @accuracy see {@link #errorBound}; a value is an exact 0 only at a node (odd level at x = 0) or where its size is below 1e-300
     * @throws IllegalArgumentException if the window leaves 0 .. 1000000 or is empty, or a point is not a number
     */
    public static double[][] window(int first, int count, double[] x) {
        return window(first, count, x, x.length);
    }

    /**
     * The same with rows made longer than the points: columns x.length and above are 0. Kernels that step through rows of a length
     * that is no power of two lose less to cache conflicts.
     *
     * @param rowLength length of every row, at least x.length
     * @shape result is [count][rowLength]
     * @throws IllegalArgumentException as for the plain window, or if rowLength is below x.length
     */
    public static double[][] window(int first, int count, double[] x, int rowLength) {
        if (count < 1) {
            throw new IllegalArgumentException("count of levels " + count + ": a window needs at least 1 level");
        }
        checkIndex(first);
        if (first > LAST_INDEX - count + 1) {
            throw new IllegalArgumentException(
                    "window of " + count + " levels from " + first + " ends above " + LAST_INDEX + ", the largest index offered");
        }
        if (rowLength < x.length) {
            throw new IllegalArgumentException("row length " + rowLength + " is shorter than the " + x.length + " points");
        }
        checkPoints(x);
        double[][] rows = new double[count][];
        HermiteLadder.fill(rows, rowLength, first, x);
        return rows;
    }

    /**
     * One wave function at many points.
     *
     * @param n the index, 0 .. {@link #LAST_INDEX}
     * @param x points in units of the zero-point length, in any order; not modified. An infinite point gives 0
     * @return phi_n(x_j)
     * @shape result is [x.length]
     * @throws IllegalArgumentException if n is outside 0 .. 1000000, or a point is not a number
     */
    public static double[] single(int n, double[] x) {
        return window(n, 1, x)[0];
    }

    /**
     * The largest absolute error of any value returned for indices up to lastIndex, at any x.
     *
     * <p>Estimated, not proved: it is at least four times the worst error seen against references of 40 digits and more, made by the same
     * recurrence in 320-bit fixed point, at thousands of seeded random points, turning regions and tails included. Windows are the worse
     * case: a level is at most 1024 recurrence steps above its start. The values of {@link #single} from index 512 up are
     * better, 1e-15.
     *
     * @param lastIndex the highest index of the window
     * @throws IllegalArgumentException if lastIndex is outside 0 .. 1000000
     */
    public static double errorBound(int lastIndex) {
        checkIndex(lastIndex);
        return 1e-13;
    }

    private static void checkIndex(int n) {
        if (n < 0 || n > LAST_INDEX) {
            throw new IllegalArgumentException("index " + n + " of an oscillator function is outside 0 .. " + LAST_INDEX);
        }
    }

    private static void checkPoints(double[] x) {
        for (int j = 0; j < x.length; j++) {
            if (Double.isNaN(x[j])) {
                throw new IllegalArgumentException("point " + j + " of " + x.length + " is not a number (NaN); a position was expected");
            }
        }
    }
}
