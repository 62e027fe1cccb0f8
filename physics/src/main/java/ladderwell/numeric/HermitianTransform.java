package ladderwell.numeric;

import java.util.Arrays;

/**
 * Real Fourier sums of rows whose entries at −k are the conjugates of those at k,
 *
 * <pre>
 *   F(φ) = Re f_0 + 2 Σ_{k ≥ 1} (Re f_k cos kφ + Im f_k sin kφ),    φ = 2 a (c + b l),   l = j − (columns − 1)/2, j = 0 … columns − 1,
 * </pre>
 *
 * as two real matrix products for the angles on one side of the middle; the other side is their difference. Each row is as long as it needs
 * to be. Not to be shared between threads: it keeps its tables and work arrays.
 *
 * @accuracy see {@link #errorFactor}
 */
public final class HermitianTransform {
    /** Rows of the tables of cosines and sines; longer sums are cut into pieces of this length. */
    private static final int PIECE = 1024;

    /** Entries of a table that stay in the first-level cache while all rows are multiplied with them: 28 kB. */
    private static final int BLOCK = 3584;

    private static final int ROWS = Loops.ROWS;
    private static final double U = 0x1p-53;

    private final Loops loops;
    private final double step;
    private final double spacing;
    private final double centre;
    private final int columns;
    private final int half;
    private final int width;
    private final int panels;

    /** Rows of the tables made so far. */
    private int tabled;

    private double[][] cosine;
    private double[][] sine;
    private double[][] pieceCosine = {};
    private double[][] pieceSine = {};

    private double[] packedRe = {};
    private double[] packedIm = {};
    private double[] sumsOfCosines = {};
    private double[] sumsOfSines = {};
    private double[][] rowRe = new double[ROWS][0];
    private double[][] rowIm = new double[ROWS][0];
    private int steppedBy = -1;
    private final double[] stepCosine;
    private final double[] stepSine;
    private double[] turnRe = {};
    private double[] turnIm = {};

    /** Gives the rows. */
    public interface Rows {
        /** How many entries f_0, f_1, … a row has; 0 for none. */
        int length(int row);

        /** Writes f_from … f_{from+count−1} of a row to entries 0 … count−1. */
        void fill(int row, int from, int count, double[] re, double[] im);
    }

    /**
     * For these angles.
     *
     * @param step a
     * @param spacing b
     * @param centre c
     * @param columns how many angles, at least 1
     */
    public HermitianTransform(double step, double spacing, double centre, int columns) {
        this(Loops.chosen(), step, spacing, centre, columns);
    }

    HermitianTransform(Loops loops, double step, double spacing, double centre, int columns) {
        if (!Double.isFinite(step) || !Double.isFinite(spacing) || !Double.isFinite(centre)) {
            throw new IllegalArgumentException(
                    "angles come from finite numbers, not from " + step + ", " + spacing + ", " + centre);
        }
        if (columns < 1) {
            throw new IllegalArgumentException("a transform needs at least 1 angle, not " + columns);
        }
        this.loops = loops;
        this.step = step;
        this.spacing = spacing;
        this.centre = centre;
        this.columns = columns;
        half = (columns + 1) / 2;
        width = loops.columns();
        panels = (half + width - 1) / width;
        cosine = new double[panels][0];
        sine = new double[panels][0];
        stepCosine = new double[width];
        stepSine = new double[width];
    }

    /** Whether this transform is the one for these angles. */
    public boolean isFor(double step, double spacing, double centre, int columns) {
        return this.step == step && this.spacing == spacing && this.centre == centre && this.columns == columns;
    }

    /**
     * |error| of any sum is at most this times Σ_k |f_k| over all k of both signs, for rows up to this length: rounding of the sum, and of the
     * cosines and sines (at most 22 factors, each within 5, and 21 products, each within 3 units of rounding).
     */
    public static double errorFactor(int longest) {
        return 1.5 * (longest + 176.0) * U;
    }

    /**
     * The sums of all rows, times a factor.
     *
     * @param out written: row i, column j for the j-th angle
     * @shape out is [at least rows][columns]
     * @throws java.util.concurrent.CancellationException if the thread is interrupted
     */
    public void transform(Rows rows, int count, double factor, double[][] out) {
        int groups = (count + ROWS - 1) / ROWS;
        int longest = 0;
        for (int i = 0; i < count; i++) {
            longest = Math.max(longest, rows.length(i));
        }
        int sums = groups * ROWS * width * panels;
        if (sumsOfCosines.length < sums) {
            sumsOfCosines = new double[sums];
            sumsOfSines = new double[sums];
        } else {
            Arrays.fill(sumsOfCosines, 0, sums, 0);
            Arrays.fill(sumsOfSines, 0, sums, 0);
        }
        int[] depth = new int[groups];
        int[] at = new int[groups];
        for (int from = 0; from < longest; from += PIECE) {
            int piece = Math.min(PIECE, longest - from);
            tables(from, piece);
            pack(rows, count, from, piece, depth, at);
            for (int panel = 0; panel < panels; panel++) {
                Interruption.check();
                double[] c = from == 0 ? cosine[panel] : pieceCosine[panel];
                double[] s = from == 0 ? sine[panel] : pieceSine[panel];
                int sumAt = panel * groups * ROWS * width;
                multiply(packedRe, c, piece, groups, depth, at, sumsOfCosines, sumAt);
                multiply(packedIm, s, piece, groups, depth, at, sumsOfSines, sumAt);
            }
        }
        combine(count, groups, 2 * factor, out);
    }

    private void multiply(
            double[] packed, double[] table, int piece, int groups, int[] depth, int[] at, double[] sums, int sumAt) {
        int rows = Math.max(64, BLOCK / width);
        for (int block = 0; block < piece; block += rows) {
            for (int g = 0; g < groups; g++) {
                int count = Math.min(depth[g] - block, rows);
                if (count > 0) {
                    loops.product(
                            packed,
                            at[g] + ROWS * block,
                            table,
                            block * width,
                            count,
                            true,
                            sums,
                            sumAt + g * ROWS * width,
                            width);
                }
            }
        }
    }

    private void combine(int count, int groups, double factor, double[][] out) {
        for (int i = 0; i < count; i++) {
            double[] row = out[i];
            for (int j = 0; j < half; j++) {
                int at = (j / width * groups * ROWS + i) * width + j % width;
                double c = factor * sumsOfCosines[at];
                double s = factor * sumsOfSines[at];
                row[columns / 2 + j] = c + s;
                row[half - 1 - j] = c - s;
            }
        }
    }

    /** Entries of four rows side by side, the first entry halved; shorter rows end in zeros. */
    private void pack(Rows rows, int count, int from, int piece, int[] depth, int[] at) {
        int groups = depth.length;
        int total = 0;
        for (int g = 0; g < groups; g++) {
            int longest = 0;
            for (int i = g * ROWS; i < Math.min(count, (g + 1) * ROWS); i++) {
                longest = Math.max(longest, Math.min(piece, rows.length(i) - from));
            }
            depth[g] = longest;
            at[g] = total;
            total += ROWS * longest;
        }
        if (packedRe.length < total) {
            packedRe = new double[total];
            packedIm = new double[total];
        }
        if (rowRe[0].length < piece) {
            rowRe = new double[ROWS][piece];
            rowIm = new double[ROWS][piece];
        }
        if (centre != 0) {
            turnsOfTheCentre(from, piece);
        }
        for (int g = 0; g < groups; g++) {
            if (depth[g] == 0) {
                continue;
            }
            for (int r = 0; r < ROWS; r++) {
                int i = g * ROWS + r;
                int length = i < count ? Math.max(0, Math.min(piece, rows.length(i) - from)) : 0;
                if (length > 0) {
                    rows.fill(i, from, length, rowRe[r], rowIm[r]);
                    if (from == 0) {
                        rowRe[r][0] /= 2;
                        rowIm[r][0] = 0;
                    }
                    if (centre != 0) {
                        turn(rowRe[r], rowIm[r], length);
                    }
                }
                Arrays.fill(rowRe[r], length, depth[g], 0);
                Arrays.fill(rowIm[r], length, depth[g], 0);
            }
            interleave(rowRe, depth[g], packedRe, at[g]);
            interleave(rowIm, depth[g], packedIm, at[g]);
        }
    }

    private static void interleave(double[][] rows, int count, double[] packed, int at) {
        double[] a = rows[0];
        double[] b = rows[1];
        double[] c = rows[2];
        double[] d = rows[3];
        for (int k = 0; k < count; k++) {
            packed[at + 4 * k] = a[k];
            packed[at + 4 * k + 1] = b[k];
            packed[at + 4 * k + 2] = c[k];
            packed[at + 4 * k + 3] = d[k];
        }
    }

    private void turn(double[] re, double[] im, int count) {
        for (int k = 0; k < count; k++) {
            double x = re[k];
            double y = im[k];
            re[k] = Math.fma(x, turnRe[k], y * turnIm[k]);
            im[k] = Math.fma(y, turnRe[k], -(x * turnIm[k]));
        }
    }

    private void turnsOfTheCentre(int from, int piece) {
        if (turnRe.length < piece) {
            turnRe = new double[piece];
            turnIm = new double[piece];
        }
        DoubleDouble unit = DoubleDouble.product(2 * step, centre);
        for (int k = 0; k < piece; k++) {
            double angle = reduced(unit.times(from + k));
            turnRe[k] = Math.cos(angle);
            turnIm[k] = Math.sin(angle);
        }
    }

    private void tables(int from, int piece) {
        if (tabled < piece) {
            base(piece);
        }
        if (from > 0) {
            if (pieceCosine.length == 0) {
                pieceCosine = new double[panels][PIECE * width];
                pieceSine = new double[panels][PIECE * width];
            }
            double[] c = new double[width];
            double[] s = new double[width];
            for (int panel = 0; panel < panels; panel++) {
                units(panel, from, c, s, 0);
                loops.turn(cosine[panel], sine[panel], 0, c, s, 0, pieceCosine[panel], pieceSine[panel], 0, piece);
            }
        }
    }

    /** Rows 2^b by themselves, each row between as the product of two. */
    private void base(int piece) {
        tabled = piece;
        for (int panel = 0; panel < panels; panel++) {
            cosine[panel] = new double[tabled * width];
            sine[panel] = new double[tabled * width];
            Arrays.fill(cosine[panel], 0, width, 1);
        }
        for (int k = 1; k < tabled; k *= 2) {
            for (int panel = 0; panel < panels; panel++) {
                double[] c = cosine[panel];
                double[] s = sine[panel];
                units(panel, k, c, s, k);
                loops.turn(c, s, 1, c, s, k, c, s, k + 1, Math.min(k, piece - k) - 1);
            }
        }
    }

    /** Cosine and sine of k times the angles of one panel, to the row of a table: of its first angle times those from it to the others. */
    private void units(int panel, int k, double[] c, double[] s, int row) {
        DoubleDouble unit = DoubleDouble.product(2 * step, spacing);
        double first = columns % 2 == 0 ? 0.5 : 0;
        double base = reduced(unit.times(k * (first + panel * width)));
        double u = Math.cos(base);
        double v = Math.sin(base);
        if (steppedBy != k) {
            steppedBy = k;
            for (int j = 0; j < width; j++) {
                double angle = reduced(unit.times((double) k * j));
                stepCosine[j] = Math.cos(angle);
                stepSine[j] = Math.sin(angle);
            }
        }
        int at = row * width;
        for (int j = 0; j < width; j++) {
            double x = stepCosine[j];
            double y = stepSine[j];
            c[at + j] = Math.fma(u, x, -(v * y));
            s[at + j] = Math.fma(v, x, u * y);
        }
    }

    /** An angle to the nearest turn, within 1e-15 for angles up to 1e12. */
    private static double reduced(DoubleDouble angle) {
        double turns = Math.rint(angle.hi() / (2 * Math.PI));
        double high = 4 * DoubleDouble.QUARTER_TURN.hi();
        double low = 4 * DoubleDouble.QUARTER_TURN.lo();
        return Math.fma(-turns, high, angle.hi()) + Math.fma(-turns, low, angle.lo());
    }
}
