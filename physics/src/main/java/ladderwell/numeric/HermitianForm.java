package ladderwell.numeric;

import java.util.Arrays;

/**
 * A Hermitian form in real functions, g(u, v) = Σ_mn φ_m(u) ρ_mn φ_n(v), at pairs of places of an evenly numbered line that mirror one another about
 * given middles.
 *
 * <p>All pairs whose sum leaves the same rest are found in a few whole matrix products: places are sorted by their rest modulo M, and where sums
 * leave the rest s, places of rest a pair with all of rest s − a and no others. Not to be shared between threads: it keeps its work arrays.
 */
public final class HermitianForm {
    private static final int ROWS = Loops.ROWS;

    private final Loops loops;
    private final int size;
    private final int paddedSize;
    private final double[] packedForm;

    private int modulus;
    private int rest;
    private int points;
    private int stride;
    private double[][] table = {};
    private double[] functionPanel = {};
    private double[][] halfProducts = {};
    private double[] leftPanels = {};
    private double[][] re = {};
    private double[][] im = {};

    /** Gives the functions. */
    public interface Functions {
        /** Writes φ_m at each place to row m; places of number −1 are padding, where anything finite will do. */
        void fill(int[] places, double[][] table);
    }

    /**
     * A form by its lower triangle; the arrays are copied.
     *
     * @shape lowerRe, lowerIm: ρ_mn with m ≥ n at m (m + 1)/2 + n
     */
    public static HermitianForm of(int size, double[] lowerRe, double[] lowerIm) {
        return new HermitianForm(Loops.chosen(), size, lowerRe, lowerIm);
    }

    HermitianForm(Loops loops, int size, double[] lowerRe, double[] lowerIm) {
        long entries = (long) size * (size + 1) / 2;
        if (size < 1 || lowerRe.length != entries || lowerIm.length != entries) {
            throw new IllegalArgumentException("a Hermitian form of " + size + " functions has " + entries
                    + " entries in its lower triangle, not " + lowerRe.length + " and " + lowerIm.length);
        }
        this.loops = loops;
        this.size = size;
        paddedSize = (size + ROWS - 1) / ROWS * ROWS;
        packedForm = new double[2 * paddedSize * size];
        for (int m = 0; m < size; m++) {
            int real = m / ROWS * ROWS * size + m % ROWS;
            int imaginary = real + paddedSize * size;
            int row = m * (m + 1) / 2;
            for (int n = 0; n < size; n++) {
                int at = n <= m ? row + n : n * (n + 1) / 2 + m;
                packedForm[real + ROWS * n] = lowerRe[at];
                packedForm[imaginary + ROWS * n] = n < m ? lowerIm[at] : n == m ? 0 : -lowerIm[at];
            }
        }
    }

    /** Number of functions. */
    public int size() {
        return size;
    }

    /**
     * Finds the form at all pairs u, v of places 0 … points − 1 with u + v ≡ rest modulo modulus that have their middle in a range.
     *
     * @param leastSum least u + v that will be asked for
     * @param greatestSum greatest u + v that will be asked for
     * @throws java.util.concurrent.CancellationException if the thread is interrupted
     */
    public void pairs(Functions functions, int points, int modulus, int rest, int leastSum, int greatestSum) {
        this.points = points;
        this.modulus = modulus;
        this.rest = Math.floorMod(rest, modulus);
        int width = loops.columns();
        int inClass = (points + modulus - 1) / modulus;
        int panelsInClass = (inClass + width - 1) / width;
        int groupsInClass = (inClass + ROWS - 1) / ROWS;
        stride = panelsInClass * width;
        int[] places = new int[modulus * stride];
        Arrays.fill(places, -1);
        for (int u = 0; u < points; u++) {
            places[u % modulus * stride + u / modulus] = u;
        }
        if (table.length < size || table[0].length != places.length) {
            table = new double[size][places.length];
            functionPanel = new double[size * width];
            halfProducts = new double[modulus * panelsInClass][2 * paddedSize * width];
            leftPanels = new double[groupsInClass * ROWS * size];
            re = new double[modulus][];
            im = new double[modulus][];
        }
        functions.fill(places, table);
        for (int panel = 0; panel < halfProducts.length; panel++) {
            Interruption.check();
            for (int m = 0; m < size; m++) {
                System.arraycopy(table[m], panel * width, functionPanel, m * width, width);
            }
            for (int row = 0; row < 2 * paddedSize; row += ROWS) {
                loops.product(
                        packedForm, row * size, functionPanel, 0, size, false, halfProducts[panel], row * width, width);
            }
        }
        for (int a = 0; a < modulus; a++) {
            int b = Math.floorMod(this.rest - a, modulus);
            if (a <= b) {
                Interruption.check();
                pack(a, groupsInClass);
                product(a, b, groupsInClass, panelsInClass, leastSum, greatestSum);
            }
        }
    }

    private void pack(int a, int groups) {
        for (int m = 0; m < size; m++) {
            double[] row = table[m];
            for (int g = 0; g < groups; g++) {
                // Beyond the last place of a class stands padding, at most up to its stride.
                int from = a * stride + g * ROWS;
                int at = (g * size + m) * ROWS;
                for (int r = 0; r < ROWS; r++) {
                    leftPanels[at + r] = row[from + r];
                }
            }
        }
    }

    private void product(int a, int b, int groups, int panels, int leastSum, int greatestSum) {
        int width = loops.columns();
        if (re[a] == null || re[a].length < groups * ROWS * stride) {
            re[a] = new double[groups * ROWS * stride];
            im[a] = new double[groups * ROWS * stride];
        }
        for (int panel = 0; panel < panels; panel++) {
            double[] right = halfProducts[b * panels + panel];
            int leastV = b + modulus * panel * width;
            int greatestV = b + modulus * ((panel + 1) * width - 1);
            for (int g = 0; g < groups; g++) {
                int leastU = a + modulus * g * ROWS;
                int greatestU = a + modulus * ((g + 1) * ROWS - 1);
                boolean asked = leastU + leastV <= greatestSum
                        && greatestU + greatestV >= leastSum
                        && (a != b || greatestU >= leastV);
                if (asked) {
                    int at = g * ROWS * stride + panel * width;
                    int left = g * ROWS * size;
                    loops.product(leftPanels, left, right, 0, size, false, re[a], at, stride);
                    loops.product(leftPanels, left, right, paddedSize * width, size, false, im[a], at, stride);
                }
            }
        }
    }

    /** Writes g(middle + k, middle − k) for k = from … from + count − 1 to entries 0 … count − 1, from the pairs found last. */
    public void fill(int middle, int from, int count, double[] outRe, double[] outIm) {
        if (middle - from - count + 1 < 0
                || middle + from + count > points
                || Math.floorMod(2 * middle - rest, modulus) != 0) {
            throw new IllegalArgumentException(
                    "the pairs about " + middle + " up to a distance of " + (from + count - 1) + " were not asked for");
        }
        for (int start = 0; start < Math.min(modulus, count); start++) {
            int u = middle + from + start;
            int v = middle - from - start;
            int a = u % modulus;
            int b = v % modulus;
            boolean straight = a <= b;
            double[] r = straight ? re[a] : re[b];
            double[] i = straight ? im[a] : im[b];
            double sign = straight ? 1 : -1;
            int at = straight ? u / modulus * stride + v / modulus : v / modulus * stride + u / modulus;
            int next = straight ? stride - 1 : 1 - stride;
            for (int k = start; k < count; k += modulus) {
                outRe[k] = r[at];
                outIm[k] = sign * i[at];
                at += next;
            }
        }
    }
}
