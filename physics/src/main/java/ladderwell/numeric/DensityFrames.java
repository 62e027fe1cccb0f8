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

    /** Times handled together: 32 rows of real and imaginary parts and their sums fit a second-level cache. */
    private static final int GROUP = 16;

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
        return frames(re.length, workers, (from, to, toRe, toIm) -> {
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
        return frames(phases.times(), workers, (from, to, toRe, toIm) -> {
            for (int j = 0; j < to - from; j++) {
                if (toRe[j] == null) {
                    toRe[j] = new double[levels];
                    toIm[j] = new double[levels];
                }
            }
            phases.fill(from, to, toRe, toIm);
        });
    }

    private double[][] frames(int times, Workers workers, Rows rows) {
        double[][] density = new double[times][points];
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
        return density;
    }

    /** Scratch arrays of one thread, and the work on one group of times. */
    private final class Panel {
        private final double[][] re = new double[GROUP][];
        private final double[][] im = new double[GROUP][];
        private final double[] left = new double[2 * GROUP * even.depth()];
        private final int stride = even.paddedColumns();
        private final double[] evenSums = new double[2 * GROUP * stride];
        private final double[] oddSums = alternating ? new double[2 * GROUP * stride] : evenSums;
        private final double[] mirrored = new double[alternating ? stride : 0];

        void frames(int from, int to, Rows rows, double[][] density) {
            rows.read(from, to, re, im);
            multiply(even, 0, alternating ? 2 : 1, to - from, evenSums);
            if (!alternating) {
                for (int j = from; j < to; j++) {
                    squares(evenSums, 2 * (j - from) * stride, stride, density[j], points);
                }
                return;
            }
            multiply(odd, 1, 2, to - from, oddSums);
            int middle = points / 2;
            int half = points - middle;
            for (int j = from; j < to; j++) {
                double[] frame = density[j];
                bothSides(evenSums, oddSums, 2 * (j - from) * stride, stride, frame, middle, mirrored, half);
                // On an odd number of points the middle one belongs to both sides and is there already.
                for (int i = half - middle; i < half; i++) {
                    frame[half - 1 - i] = mirrored[i];
                }
            }
        }

        /** Sums of c_k φ_k over k = first, first + step, …: rows 2j real, 2j + 1 imaginary part of time j. */
        private void multiply(PackedColumns functions, int first, int step, int count, double[] sums) {
            int depth = functions.depth();
            int strips = (count + 1) / 2;
            for (int s = 0; s < strips; s++) {
                int second = Math.min(count - 1, 2 * s + 1);
                pack(re[2 * s], im[2 * s], re[second], im[second], first, step, depth, left, s * Loops.ROWS * depth);
            }
            for (int panel = 0; panel < functions.panels(); panel++) {
                Interruption.check();
                for (int s = 0; s < strips; s++) {
                    functions.multiply(left, s * Loops.ROWS * depth, panel, sums, s * Loops.ROWS * stride, stride);
                }
            }
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

    private static void squares(double[] sums, int at, int stride, double[] frame, int count) {
        for (int i = 0; i < count; i++) {
            double u = sums[at + i];
            double v = sums[at + stride + i];
            frame[i] = Math.fma(u, u, v * v);
        }
    }

    /** |even + odd|² to the upper half of the frame, |even - odd|² to mirrored. */
    private static void bothSides(
            double[] even, double[] odd, int at, int stride, double[] frame, int middle, double[] mirrored, int half) {
        for (int i = 0; i < half; i++) {
            double evenRe = even[at + i];
            double oddRe = odd[at + i];
            double evenIm = even[at + stride + i];
            double oddIm = odd[at + stride + i];
            double u = evenRe + oddRe;
            double v = evenIm + oddIm;
            double p = evenRe - oddRe;
            double q = evenIm - oddIm;
            frame[middle + i] = Math.fma(u, u, v * v);
            mirrored[i] = Math.fma(p, p, q * q);
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
