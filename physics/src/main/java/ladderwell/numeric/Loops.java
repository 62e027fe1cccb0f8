package ladderwell.numeric;

/**
 * The inner loops that the compiler does not make fast by itself: sums along rows and the innermost block of a matrix product. They come
 * in two kinds, plain and with the Vector API; which one runs is chosen once.
 */
interface Loops {
    /** Rows of the left factor that {@link #product} takes together. */
    int ROWS = 4;

    /** Sums that {@link #ladder} adds to: Re, Im of Σ c* b; Σ|b|²; Re, Im of Σ g* b. */
    int LADDER_SUMS = 5;

    /** The loops of this machine: with the Vector API where its module is present. */
    static Loops chosen() {
        return Chosen.LOOPS;
    }

    /** Columns of the right factor that {@link #product} takes together. */
    int columns();

    /**
     * The product of a panel of {@link #ROWS} rows and a panel of {@link #columns} columns:
     * c[r][j] (+)= Σ_l a[l][r] b[l][j], summed in ascending order of l.
     *
     * @shape a is [depth][ROWS] from aAt, b is [depth][columns] from bAt, c is rows of {@code stride} from cAt
     * @param add whether c is added to (true) or overwritten
     */
    void product(double[] a, int aAt, double[] b, int bAt, int depth, boolean add, double[] c, int cAt, int stride);

    /**
     * Sums over levels n for b_n = √(n+1) c_{n+1} - α c_n and g_n = √n c_{n-1} - α* c_n, which are (a - α)c and (a - α)†c:
     * adds Σ c* b, Σ |b|², Σ g* b to sums.
     *
     * @shape re, im hold c_{n-1} for the first n at entry 0, thus [count + 2]; up, down hold √(n+1), √n, [count] from weightAt;
     *     sums is [LADDER_SUMS] from sumAt
     */
    void ladder(
            double[] re,
            double[] im,
            double[] up,
            double[] down,
            int weightAt,
            int count,
            double alphaRe,
            double alphaIm,
            double[] sums,
            int sumAt);

    /**
     * Squares of sums on one panel: for each column j below count, |u_j|² to frame[upper + j], u = even + odd, and, when odd is given,
     * |even - odd|² to frame[lower - j]; where both are the same entry the first stays. Rows row and row + 1 of the panels are real and
     * imaginary parts.
     *
     * @shape even and odd are [ROWS][columns]
     * @param mirrored whether odd counts and the lower half is written
     */
    void squares(
            double[] even, double[] odd, int row, boolean mirrored, double[] frame, int upper, int lower, int count);

    /**
     * Products of places that mirror one another about a centre: outRe + i outIm = f(centre + k) f(centre - k)* for k = from … from+count-1,
     * written from entry 0 on.
     */
    void mirrored(double[] re, double[] im, int centre, int from, int count, double[] outRe, double[] outIm);

    /**
     * Turns rows of {@link #columns} unit numbers: row to + r becomes row from + r times row {@code by} of the turning table, for all r below
     * count. From and to may overlap only where they are the same.
     */
    void turn(
            double[] cosine,
            double[] sine,
            int from,
            double[] byCosine,
            double[] bySine,
            int by,
            double[] toCosine,
            double[] toSine,
            int to,
            int count);

    /** The same for k = done … count-1, one by one. */
    static void mirroredOneByOne(
            double[] re, double[] im, int centre, int from, int done, int count, double[] outRe, double[] outIm) {
        for (int k = done; k < count; k++) {
            double a = re[centre + from + k];
            double b = im[centre + from + k];
            double u = re[centre - from - k];
            double v = im[centre - from - k];
            outRe[k] = Math.fma(a, u, b * v);
            outIm[k] = Math.fma(b, u, -(a * v));
        }
    }

    /** The same for columns from … count-1, one by one. */
    static void squaresOneByOne(
            int columns,
            double[] even,
            double[] odd,
            int row,
            boolean mirrored,
            double[] frame,
            int upper,
            int lower,
            int from,
            int count) {
        int re = row * columns;
        int im = re + columns;
        for (int j = from; j < count; j++) {
            double u = even[re + j];
            double v = even[im + j];
            if (mirrored) {
                double p = u - odd[re + j];
                double q = v - odd[im + j];
                u += odd[re + j];
                v += odd[im + j];
                frame[lower - j] = Math.fma(p, p, q * q);
            }
            frame[upper + j] = Math.fma(u, u, v * v);
        }
    }

    /** Holds the choice, made when first asked for. */
    final class Chosen {
        private static final Loops LOOPS = VectorSupport.available() ? new VectorLoops() : new PlainLoops();

        private Chosen() {}
    }
}
