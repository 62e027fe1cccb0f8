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
    private static final double LEAST = 0x1p-900;

    private BandSpectrum() {}

    /**
     * @param rows rows[q][j] = A(j, j + q), j + q &lt; size used
     * @param wanted how many, at most size
     */
    static double[] lowest(double[][] rows, int size, int wanted) {
        return new Sweeps(tridiagonal(rows, size), wanted).finished();
    }

    /**
     * The lowest eigenvalues of two matrices at once. Each step of a sweep waits for the division before it; two sweeps side by side fill that
     * time.
     */
    static double[][] lowest(double[][] first, int firstWanted, double[][] second, int secondWanted) {
        double[][][] both = tridiagonal(first, second);
        Sweeps a = new Sweeps(both[0], firstWanted);
        Sweeps b = new Sweeps(both[1], secondWanted);
        while (a.ready() & b.ready()) {
            Sweeps.both(a, b);
        }
        return new double[][] {a.finished(), b.finished()};
    }

    private static double[][][] tridiagonal(double[][] first, double[][] second) {
        if (first.length != 3 || second.length != 3 || Math.min(first[0].length, second[0].length) < 3) {
            return new double[][][] {tridiagonal(first, first[0].length), tridiagonal(second, second[0].length)};
        }
        double[][] a = {first[0].clone(), first[1].clone(), first[2].clone()};
        double[][] b = {second[0].clone(), second[1].clone(), second[2].clone()};
        BandChase.both(new BandChase(a[0], a[1], a[2]), new BandChase(b[0], b[1], b[2]));
        return new double[][][] {a, b};
    }

    /** {diagonal, off-diagonal} of a tridiagonal matrix with the same eigenvalues. */
    private static double[][] tridiagonal(double[][] rows, int size) {
        double[] diagonal = Arrays.copyOf(rows[0], size);
        double[] next = new double[size];
        int width = Math.min(rows.length - 1, size - 1);
        if (width >= 1) {
            System.arraycopy(rows[1], 0, next, 0, size - 1);
        }
        if (width == 2) {
            double[] second = new double[size];
            System.arraycopy(rows[2], 0, second, 0, size - 2);
            new BandChase(diagonal, next, second).run();
        } else if (width > 2) {
            chase(rows, size, width, diagonal, next);
        }
        return new double[][] {diagonal, next};
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

    /** The iteration on one tridiagonal matrix, sweep by sweep. */
    private static final class Sweeps {
        private final double[] d;
        /** Squares of the off-diagonal. */
        private final double[] e;

        private final int wanted;
        private int top;
        private int sweep;
        private int m;
        private double[] found = new double[0];

        Sweeps(double[][] tridiagonal, int wanted) {
            d = tridiagonal[0];
            e = tridiagonal[1];
            this.wanted = wanted;
            int n = d.length;
            for (int i = 0; i < n; i++) {
                e[i] = i + 1 < n ? e[i] * e[i] : 0;
            }
        }

        double[] finished() {
            while (ready()) {
                run(m - 1, new Carried(this));
            }
            return found;
        }

        /** Settles what is settled; whether a sweep from m to top is needed. */
        boolean ready() {
            int n = d.length;
            while (found.length == 0) {
                if (top == n || (top >= wanted && sweep == 0 && complete())) {
                    found = Arrays.copyOf(d, top);
                    Arrays.sort(found);
                    found = Arrays.copyOf(found, wanted);
                    return false;
                }
                m = top;
                while (m < n - 1 && !(Math.abs(e[m]) <= EPS * EPS * Math.abs(d[m] * d[m + 1]))) {
                    m++;
                }
                if (m < n - 1) {
                    e[m] = 0;
                }
                if (m > top) {
                    if (sweep == SWEEPS) {
                        throw new PhysicsException.NotConverged(
                                "an eigenvalue of the oscillator basis", sweep, Math.sqrt(Math.abs(e[top])), 0);
                    }
                    sweep++;
                    return true;
                }
                top++;
                sweep = 0;
            }
            return false;
        }

        /** Whether the part from {@code top} on has no eigenvalue below those found: the number of negative pivots. */
        private boolean complete() {
            double[] sorted = Arrays.copyOf(d, top);
            Arrays.sort(sorted);
            double x = sorted[wanted - 1];
            double pivot = d[top] - x;
            for (int i = top + 1; i < d.length && pivot > 0; i++) {
                pivot = d[i] - x - e[i - 1] / pivot;
            }
            return pivot > 0;
        }

        private double shift() {
            double root = Math.sqrt(e[top]);
            double sigma = (d[top + 1] - d[top]) / (2 * root);
            return d[top] - root / (sigma + Math.copySign(Math.sqrt(sigma * sigma + 1), sigma));
        }

        /** What a sweep carries from row to row. */
        private static final class Carried {
            double sigma;
            double c = 1;
            double s;
            double gamma;
            double p;

            Carried(Sweeps of) {
                sigma = of.shift();
                gamma = of.d[of.m] - sigma;
                p = gamma * gamma;
            }
        }

        /** Rows from down to top. */
        private void run(int from, Carried at) {
            double sigma = at.sigma;
            double c = at.c;
            double s = at.s;
            double gamma = at.gamma;
            double p = at.p;
            for (int i = from; i >= top; i--) {
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
                p = p > LEAST ? gamma * gamma * (r / p) : before * square;
            }
            e[top] = s * p;
            d[top] = sigma + gamma;
        }

        /** One sweep of each, row beside row as far as both reach. */
        static void both(Sweeps a, Sweeps b) {
            Carried one = new Carried(a);
            Carried two = new Carried(b);
            double[] d1 = a.d;
            double[] e1 = a.e;
            double[] d2 = b.d;
            double[] e2 = b.e;
            double sigma1 = one.sigma;
            double c1 = 1;
            double s1 = 0;
            double gamma1 = one.gamma;
            double p1 = one.p;
            double sigma2 = two.sigma;
            double c2 = 1;
            double s2 = 0;
            double gamma2 = two.gamma;
            double p2 = two.p;
            int i = a.m - 1;
            int k = b.m - 1;
            // Written below the last row of a sweep, and overwritten after it: e[m] is 0 there.
            double keep1 = e1[a.m];
            double keep2 = e2[b.m];
            for (; i >= a.top && k >= b.top; i--, k--) {
                double square1 = e1[i];
                double square2 = e2[k];
                double r1 = p1 + square1;
                double r2 = p2 + square2;
                e1[i + 1] = s1 * r1;
                e2[k + 1] = s2 * r2;
                double inverse1 = 1 / r1;
                double inverse2 = 1 / r2;
                double turned1 = p1 > LEAST ? r1 / p1 : 0;
                double turned2 = p2 > LEAST ? r2 / p2 : 0;
                double before1 = c1;
                double before2 = c2;
                c1 = p1 * inverse1;
                c2 = p2 * inverse2;
                s1 = square1 * inverse1;
                s2 = square2 * inverse2;
                double last1 = gamma1;
                double last2 = gamma2;
                double here1 = d1[i];
                double here2 = d2[k];
                gamma1 = c1 * (here1 - sigma1) - s1 * last1;
                gamma2 = c2 * (here2 - sigma2) - s2 * last2;
                d1[i + 1] = last1 + (here1 - gamma1);
                d2[k + 1] = last2 + (here2 - gamma2);
                p1 = turned1 > 0 ? gamma1 * gamma1 * turned1 : before1 * square1;
                p2 = turned2 > 0 ? gamma2 * gamma2 * turned2 : before2 * square2;
            }
            e1[a.m] = keep1;
            e2[b.m] = keep2;
            one.c = c1;
            one.s = s1;
            one.gamma = gamma1;
            one.p = p1;
            two.c = c2;
            two.s = s2;
            two.gamma = gamma2;
            two.p = p2;
            a.run(i, one);
            b.run(k, two);
        }
    }
}
