package ladderwell.numeric;

/**
 * The wave functions of the harmonic oscillator in scaled units ([x, p] = i, energy (p^2 + x^2)/2),
 *
 * <pre>
 *   phi_n(x) = H_n(x) exp(-x^2/2) / sqrt(2^n n! sqrt(pi)),    integral of phi_n^2 over x = 1,
 * </pre>
 *
 * for any index from 0 to {@value #LAST_INDEX} and any x. Levels below 512 come from the three-term recurrence, started at the ground
 * state; from there up each window starts from its own two lowest levels, given by amplitude and phase ({@code PhaseFunction}), so the cost
 * follows the number of levels asked for and not the index.
 *
 * @source the recurrence is DLMF 18.9.1 with 18.3 for the norm; it is stable upwards for every x, inside the turning points and out
 */
public final class HermiteFunctions {
    /** The largest index offered: the accuracy has been measured up to here. */
    public static final int LAST_INDEX = 1_000_000;

    private static final double FAR = 1e6;

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
        checkWindow(first, count);
        checkPoints(x);
        checkRow(rowLength, x.length);
        double[][] table = new double[count][];
        for (int k = 0; k < count; k++) {
            table[k] = new double[rowLength];
        }
        HermiteLadder.fill(table, first, finite(x));
        return table;
    }

    /**
     * The same into a table that exists already, which saves the time of making one (most of the time for a few hundred levels).
     *
     * @param table out: row k becomes level first+k in columns 0 .. x.length-1; columns beyond are left alone
     * @throws IllegalArgumentException as for the plain window, or if a row is shorter than x
     */
    public static void window(int first, double[] x, double[][] table) {
        checkWindow(first, table.length);
        checkPoints(x);
        for (double[] row : table) {
            checkRow(row.length, x.length);
        }
        HermiteLadder.fill(table, first, finite(x));
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
     * The largest absolute error of any value returned for indices up to lastIndex, at any x: 3e-15 (lastIndex + 1)^0.4, so 5e-14 at
     * index 1000 and 7.5e-13 at 1000000.
     *
     * <p>Estimated, not proved: at least four times the worst error found in a search over 15 windows of 1024 levels (10 000 seeded points,
     * three quarters of them around the turning points, where it is largest: 9e-15 at 1000, 2e-14 at 16 000, 1.3e-13 at 1000000), against
     * values that agree with references of 40 digits to 1e-16. The error is the rounding of up to 1023 recurrence steps; {@link #single}
     * from index 512 up takes none and is right to 3e-16.
     *
     * @param lastIndex the highest index of the window
     * @throws IllegalArgumentException if lastIndex is outside 0 .. 1000000
     */
    public static double errorBound(int lastIndex) {
        checkIndex(lastIndex);
        return 3e-15 * Math.pow(lastIndex + 1.0, 0.4);
    }

    /** The same points, infinite ones drawn in to where every function is 0 all the same (0 times infinity would be no number). */
    private static double[] finite(double[] x) {
        double[] finite = x;
        for (int j = 0; j < x.length; j++) {
            if (Math.abs(x[j]) > FAR) {
                if (finite == x) {
                    finite = x.clone();
                }
                finite[j] = Math.copySign(FAR, x[j]);
            }
        }
        return finite;
    }

    private static void checkIndex(int n) {
        if (n < 0 || n > LAST_INDEX) {
            throw new IllegalArgumentException(
                    "index " + n + " of an oscillator function is outside 0 .. " + LAST_INDEX);
        }
    }

    private static void checkWindow(int first, int count) {
        if (count < 1) {
            throw new IllegalArgumentException("count of levels " + count + ": a window needs at least 1 level");
        }
        checkIndex(first);
        if (first > LAST_INDEX - count + 1) {
            throw new IllegalArgumentException("window of " + count + " levels from " + first + " ends above "
                    + LAST_INDEX + ", the largest index offered");
        }
    }

    private static void checkRow(int rowLength, int points) {
        if (rowLength < points) {
            throw new IllegalArgumentException(
                    "row length " + rowLength + " is shorter than the " + points + " points");
        }
    }

    private static void checkPoints(double[] x) {
        for (int j = 0; j < x.length; j++) {
            if (Double.isNaN(x[j])) {
                throw new IllegalArgumentException(
                        "point " + j + " of " + x.length + " is not a number (NaN); a position was expected");
            }
        }
    }
}
