package ladderwell.level;

import java.util.Arrays;
import ladderwell.evidence.PhysicsException;

/**
 * Lowest eigenvalues of a real symmetric band matrix: plane rotations make it tridiagonal, then the QL iteration without square roots
 * (Pal, Walker and Kahan; see Parlett, The Symmetric Eigenvalue Problem, section 8.15) takes them from the top down and stops when the
 * wanted ones are found and a Sturm count shows that none was left out.
 */
final class BandSpectrum {
    private static final double EPS = 0x1p-52;
    private static final int SWEEPS = 60;

    private BandSpectrum() {}

    /**
     * @param rows rows[q][j] = A(j, j + q), j + q &lt; size used
     * @param wanted how many, at most size
     */
    static double[] lowest(double[][] rows, int size, int wanted) {
        double[] diagonal = Arrays.copyOf(rows[0], size);
        double[] next = new double[size];
        int width = Math.min(rows.length - 1, size - 1);
        if (width >= 1) {
            System.arraycopy(rows[1], 0, next, 0, size - 1);
        }
        if (width == 2) {
            double[] second = new double[size];
            System.arraycopy(rows[2], 0, second, 0, size - 2);
            chaseTwo(diagonal, next, second);
        } else if (width > 2) {
            chase(rows, size, width, diagonal, next);
        }
        return smallest(diagonal, next, wanted);
    }

    /** Width two, the commonest: next[j] = A(j+1, j), second[j] = A(j+2, j). */
    private static void chaseTwo(double[] d, double[] next, double[] second) {
        int n = d.length;
        for (int k = 0; k < n - 2; k++) {
            double gone = second[k];
            if (gone == 0) {
                continue;
            }
            int i = k + 1;
            double pivot = next[k];
            double inverse = 1 / Math.sqrt(pivot * pivot + gone * gone);
            double c = pivot * inverse;
            double s = gone * inverse;
            next[k] = c * pivot + s * gone;
            second[k] = 0;
            while (true) {
                int j = i + 1;
                double di = d[i];
                double dj = d[j];
                double e = next[i];
                double shift = s * (s * (dj - di) + 2 * c * e);
                d[i] = di + shift;
                d[j] = dj - shift;
                next[i] = (c - s) * (c + s) * e + c * s * (dj - di);
                if (j + 1 < n) {
                    double a = second[i];
                    double b = next[j];
                    second[i] = c * a + s * b;
                    next[j] = c * b - s * a;
                }
                if (j + 2 >= n) {
                    break;
                }
                double bulge = s * second[j];
                second[j] *= c;
                if (bulge == 0) {
                    break;
                }
                double a = second[i];
                inverse = 1 / Math.sqrt(a * a + bulge * bulge);
                c = a * inverse;
                s = bulge * inverse;
                second[i] = c * a + s * bulge;
                double b1 = next[j];
                double b2 = second[j];
                next[j] = c * b1 + s * b2;
                second[j] = c * b2 - s * b1;
                i = j + 1;
            }
        }
    }

    /** Any width: column by column, outermost element first, each bulge chased off the end. */
    private static void chase(double[][] rows, int n, int width, double[] diagonal, double[] next) {
        int stride = width + 2;
        double[] a = new double[n * stride];
        for (int j = 0; j < n; j++) {
            for (int q = 0; q <= width && j + q < n; q++) {
                a[j * stride + q] = rows[q][j];
            }
        }
        for (int k = 0; k < n - 2; k++) {
            for (int r = Math.min(width, n - 1 - k); r >= 2; r--) {
                int column = k;
                int row = k + r;
                // (row, column) is to vanish by turning rows row − 1 and row.
                while (row < n) {
                    double above = a[column * stride + row - 1 - column];
                    double gone = a[column * stride + row - column];
                    if (gone == 0) {
                        break;
                    }
                    double length = Math.hypot(above, gone);
                    turn(a, stride, n, width, row - 1, above / length, gone / length, column);
                    a[column * stride + row - column] = 0;
                    // The turn filled (row + width, row − 1).
                    column = row - 1;
                    row += width;
                }
            }
        }
        for (int j = 0; j < n; j++) {
            diagonal[j] = a[j * stride];
            next[j] = j + 1 < n ? a[j * stride + 1] : 0;
        }
    }

    private static void turn(double[] a, int stride, int n, int width, int i, double c, double s, int firstColumn) {
        for (int p = firstColumn; p < i; p++) {
            int at = p * stride + i - p;
            double upper = a[at];
            double lower = a[at + 1];
            a[at] = c * upper + s * lower;
            a[at + 1] = c * lower - s * upper;
        }
        int left = i * stride;
        int right = left + stride;
        double di = a[left];
        double dj = a[right];
        double e = a[left + 1];
        double shift = s * (s * (dj - di) + 2 * c * e);
        a[left] = di + shift;
        a[right] = dj - shift;
        a[left + 1] = (c - s) * (c + s) * e + c * s * (dj - di);
        int last = Math.min(n - 1, i + 1 + width);
        for (int r = i + 2; r <= last; r++) {
            double x = a[left + r - i];
            double y = a[right + r - i - 1];
            a[left + r - i] = c * x + s * y;
            a[right + r - i - 1] = c * y - s * x;
        }
    }

    /** Lowest eigenvalues of a tridiagonal matrix, ascending; both arrays are overwritten. */
    private static double[] smallest(double[] d, double[] e, int wanted) {
        int n = d.length;
        for (int i = 0; i < n; i++) {
            e[i] = i + 1 < n ? e[i] * e[i] : 0;
        }
        for (int top = 0; top < n; top++) {
            if (top >= wanted) {
                double[] found = Arrays.copyOf(d, top);
                Arrays.sort(found);
                if (noneBelow(d, e, top, found[wanted - 1])) {
                    return Arrays.copyOf(found, wanted);
                }
            }
            settle(d, e, top);
        }
        Arrays.sort(d);
        return Arrays.copyOf(d, wanted);
    }

    /** Whether the part from {@code top} on has no eigenvalue below x: the number of negative pivots. */
    private static boolean noneBelow(double[] d, double[] e, int top, double x) {
        double pivot = d[top] - x;
        for (int i = top + 1; i < d.length && pivot > 0; i++) {
            pivot = d[i] - x - e[i - 1] / pivot;
        }
        return pivot > 0;
    }

    private static void settle(double[] d, double[] e, int top) {
        int n = d.length;
        for (int sweep = 0; ; sweep++) {
            int m = top;
            while (m < n - 1 && !(Math.abs(e[m]) <= EPS * EPS * Math.abs(d[m] * d[m + 1]))) {
                m++;
            }
            if (m < n - 1) {
                e[m] = 0;
            }
            if (m == top) {
                return;
            }
            if (sweep == SWEEPS) {
                throw new PhysicsException.NotConverged(
                        "an eigenvalue of the oscillator basis", sweep, Math.sqrt(Math.abs(e[top])), 0);
            }
            double root = Math.sqrt(e[top]);
            double sigma = (d[top + 1] - d[top]) / (2 * root);
            sigma = d[top] - root / (sigma + Math.copySign(Math.sqrt(sigma * sigma + 1), sigma));
            double c = 1;
            double s = 0;
            double gamma = d[m] - sigma;
            double p = gamma * gamma;
            for (int i = m - 1; i >= top; i--) {
                double square = e[i];
                double r = p + square;
                if (i != m - 1) {
                    e[i + 1] = s * r;
                }
                double before = c;
                double inverse = 1 / r;
                c = p * inverse;
                s = square * inverse;
                double last = gamma;
                double here = d[i];
                gamma = c * (here - sigma) - s * last;
                d[i + 1] = last + (here - gamma);
                p = p > 0x1p-900 ? gamma * gamma * (r / p) : before * square;
            }
            e[top] = s * p;
            d[top] = sigma + gamma;
        }
    }
}
