package ladderwell.numeric;

/**
 * Frames of the density |Σ_k c_k(t) φ_k(x)|² on a grid, for many times.
 *
 * <p>When the φ_k are even and odd in turn and the grid is symmetric, levels of either parity are summed on half the grid: half the work.
 * Functions below 2^-62 of the largest are left out where they are so on a whole strip of the grid and at the low or high end of the
 * levels; what is left out enters {@link #errorBound}.
 */
public final class DensityFrames {
    private static final double U = 0x1p-53;
    private static final double NEGLIGIBLE = 0x1p-62;

    /** Times handled together: their packed coefficients stay in the second-level cache. */
    private static final int GROUP = 16;

    private final Loops loops;
    private final int levels;
    private final int points;
    private final boolean alternating;
    private final PackedColumns even;
    private final PackedColumns odd;
    private final double largestColumn;
    private final double droppedNorm;

    /**
     * Frames for real functions given on a grid. The table is copied.
     *
     * @shape functions is [levels][points]
     * @throws IllegalArgumentException if rows differ in length or an entry is not finite
     */
    public static DensityFrames of(double[][] functions) {
        return new DensityFrames(Loops.chosen(), functions, false);
    }

    /**
     * Frames for functions that are even and odd in turn (either may be first) on a grid symmetric about its middle:
     * φ_k(x_{points-1-i}) = ±φ_k(x_i). Only the upper half of each row is used.
     *
     * @shape functions is [levels][points]
     * @throws IllegalArgumentException if rows differ in length or an entry is not finite
     */
    public static DensityFrames alternating(double[][] functions) {
        return new DensityFrames(Loops.chosen(), functions, true);
    }

    DensityFrames(Loops loops, double[][] functions, boolean alternating) {
        this.loops = loops;
        levels = functions.length;
        points = levels == 0 ? 0 : functions[0].length;
        this.alternating = alternating;
        double largest = 0;
        double[] columnSquares = new double[points];
        for (int k = 0; k < levels; k++) {
            double[] row = functions[k];
            if (row.length != points) {
                throw new IllegalArgumentException(
                        "function " + k + " has " + row.length + " points, expected " + points);
            }
            for (int i = 0; i < points; i++) {
                double value = row[i];
                if (!Double.isFinite(value)) {
                    throw new IllegalArgumentException(
                            "function " + k + " is " + value + " at point " + i + ", expected a finite number");
                }
                largest = Math.max(largest, Math.abs(value));
                columnSquares[i] += value * value;
            }
        }
        double largestSquare = 0;
        for (double square : columnSquares) {
            largestSquare = Math.max(largestSquare, square);
        }
        largestColumn = Math.sqrt(largestSquare) * (1 + 0x1p-30);
        double negligible = largest * NEGLIGIBLE;
        if (alternating) {
            int half = points - points / 2;
            even = new PackedColumns(loops, functions, 0, 2, points / 2, half, negligible);
            odd = new PackedColumns(loops, functions, 1, 2, points / 2, half, negligible);
            droppedNorm = Math.hypot(even.droppedNorm(), odd.droppedNorm());
        } else {
            even = new PackedColumns(loops, functions, 0, 1, 0, points, negligible);
            odd = even;
            droppedNorm = even.droppedNorm();
        }
    }

    /** Gives the coefficients of a few times. */
    private interface Rows {
        void read(int fromTime, int toTime, double[][] re, double[][] im);
    }

    /**
     * The density at each time.
     *
     * @shape re and im are [times][levels]; the result is [times][points]
     * @throws IllegalArgumentException if a row does not have one coefficient for each function
     * @throws java.util.concurrent.CancellationException if the thread is interrupted
     */
    public double[][] of(double[][] re, double[][] im, Workers workers) {
        double[][] density = new double[re.length][points];
        fill(re, im, density, workers);
        return density;
    }

    /**
     * The same, into given frames: for frames asked for again and again, new memory would cost a tenth of the time.
     *
     * @shape re and im are [times][levels]; density is [at least times][points], written
     * @throws IllegalArgumentException if a row does not have one coefficient for each function, or a frame one entry for each point
     * @throws java.util.concurrent.CancellationException if the thread is interrupted
     */
    public void fill(double[][] re, double[][] im, double[][] density, Workers workers) {
        if (re.length != im.length) {
            throw new IllegalArgumentException(re.length + " rows of real parts and " + im.length
                    + " of imaginary parts, expected the same number");
        }
        for (int j = 0; j < re.length; j++) {
            if (re[j].length != levels || im[j].length != levels) {
                throw new IllegalArgumentException("row " + j + " has " + re[j].length + " real and " + im[j].length
                        + " imaginary parts, expected " + levels + " (one for each function)");
            }
        }
        if (density.length < re.length) {
            throw new IllegalArgumentException(
                    density.length + " frames to write to, expected one for each of " + re.length + " times");
        }
        for (int j = 0; j < re.length; j++) {
            if (density[j].length != points) {
                throw new IllegalArgumentException(
                        "frame " + j + " has " + density[j].length + " entries, expected " + points);
            }
        }
        frames(re.length, density, workers, (from, to, toRe, toIm) -> {
            for (int j = from; j < to; j++) {
                toRe[j - from] = re[j];
                toIm[j - from] = im[j];
            }
        });
    }

    /**
     * The density at each time of the phases, without keeping all coefficients.
     *
     * @shape the result is [phases.times()][points]
     * @throws IllegalArgumentException if the phases do not have one level for each function
     * @throws java.util.concurrent.CancellationException if the thread is interrupted
     */
    public double[][] of(ExactPhases phases, Workers workers) {
        if (phases.levels() != levels) {
            throw new IllegalArgumentException(
                    phases.levels() + " levels in the phases, expected " + levels + " (one for each function)");
        }
        double[][] density = new double[phases.times()][points];
        frames(phases.times(), density, workers, (from, to, toRe, toIm) -> {
            for (int j = 0; j < to - from; j++) {
                if (toRe[j] == null) {
                    toRe[j] = new double[levels];
                    toIm[j] = new double[levels];
                }
            }
            phases.fill(from, to, toRe, toIm);
        });
        return density;
    }

    private void frames(int times, double[][] density, Workers workers, Rows rows) {
        int groups = (times + GROUP - 1) / GROUP;
        // A few parts per thread, so that scratch arrays are made rarely; every frame is computed alone, so parts
        // change no bit.
        int parts = workers.threads() == 1 ? 1 : Math.min(groups, 4 * workers.threads());
        workers.forEach(parts, part -> {
            Panel panel = new Panel();
            int last = (int) ((part + 1L) * groups / parts);
            for (int group = (int) ((long) part * groups / parts); group < last; group++) {
                int from = group * GROUP;
                panel.frames(from, Math.min(times, from + GROUP), rows, density);
            }
        });
    }

    /** Scratch arrays of one thread, and the work on one group of times. */
    private final class Panel {
        private final double[][] re = new double[GROUP][];
        private final double[][] im = new double[GROUP][];
        private final double[] evenLeft = new double[2 * GROUP * even.depth()];
        private final double[] oddLeft = new double[alternating ? 2 * GROUP * odd.depth() : 0];
        private final int width = loops.columns();
        private final double[] evenSums = new double[Loops.ROWS * width];
        private final double[] oddSums = new double[Loops.ROWS * width];

        void frames(int from, int to, Rows rows, double[][] density) {
            rows.read(from, to, re, im);
            int count = to - from;
            int strips = (count + 1) / 2;
            for (int s = 0; s < strips; s++) {
                int second = Math.min(count - 1, 2 * s + 1);
                pack(2 * s, second, 0, even.depth(), evenLeft, s * Loops.ROWS * even.depth());
                if (alternating) {
                    pack(2 * s, second, 1, odd.depth(), oddLeft, s * Loops.ROWS * odd.depth());
                }
            }
            int middle = alternating ? points / 2 : 0;
            for (int panel = 0; panel < even.panels(); panel++) {
                Interruption.check();
                int column = panel * width;
                int columns = Math.min(width, points - middle - column);
                // On an odd number of points upper and lower half share the middle one.
                int lower = points - 1 - middle - column;
                for (int s = 0; s < strips; s++) {
                    even.multiply(evenLeft, s * Loops.ROWS * even.depth(), panel, evenSums, 0, width);
                    if (alternating) {
                        odd.multiply(oddLeft, s * Loops.ROWS * odd.depth(), panel, oddSums, 0, width);
                    }
                    double[] frame = density[from + 2 * s];
                    loops.squares(evenSums, oddSums, 0, alternating, frame, middle + column, lower, columns);
                    if (2 * s + 1 < count) {
                        frame = density[from + 2 * s + 1];
                        loops.squares(evenSums, oddSums, 2, alternating, frame, middle + column, lower, columns);
                    }
                }
            }
        }

        private void pack(int first, int second, int parity, int depth, double[] left, int at) {
            DensityFrames.pack(
                    re[first], im[first], re[second], im[second], parity, alternating ? 2 : 1, depth, left, at);
        }
    }

    private static void pack(
            double[] re0,
            double[] im0,
            double[] re1,
            double[] im1,
            int first,
            int step,
            int depth,
            double[] left,
            int at) {
        for (int l = 0; l < depth; l++) {
            int k = first + l * step;
            left[at + 4 * l] = re0[k];
            left[at + 4 * l + 1] = im0[k];
            left[at + 4 * l + 2] = re1[k];
            left[at + 4 * l + 3] = im1[k];
        }
    }

    /**
     * Guaranteed bound on the error of any density value, given the errors of what went in.
     *
     * @param coefficientError bound on the 2-norm of the error of a row of coefficients
     * @param functionError bound on the error of any entry of the functions (in the unit of the functions)
     * @param norm bound on the 2-norm of a row of coefficients
     * @return in the square of the unit of the functions
     */
    public double errorBound(double coefficientError, double functionError, double norm) {
        double columnError = Math.sqrt(levels) * functionError;
        double size = norm * (largestColumn + columnError);
        double error = coefficientError * (largestColumn + columnError)
                + norm * (columnError + droppedNorm)
                + (levels + 3) * U * size;
        return 1.01 * ((2 * size + error) * error + 4 * U * size * size);
    }
}
