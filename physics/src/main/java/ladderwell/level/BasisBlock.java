package ladderwell.level;

import java.util.Arrays;
import ladderwell.numeric.HermiteFunctions;
import ladderwell.numeric.Interruption;
import org.jspecify.annotations.Nullable;

/** The lowest levels of a polynomial in one oscillator basis, by parity where the polynomial is even; bounds when asked for. */
final class BasisBlock {
    /** Beyond this the bases grow without need: shooting is quicker. */
    private static final int LARGEST = 600;

    private final Polynomial polynomial;
    private final OscillatorBasis basis;
    private final int count;
    private final int parts;
    private final double[][][] rows;
    /** Values of each parity, one more than wanted. */
    private final double[][] values;

    private final double[][] vectors;
    private @Nullable Proved proved;

    /**
     * @param quotient energies with their proved bounds
     * @param error infinite where nothing is proved
     * @param vectorError estimated norm error of the vectors
     */
    record Proved(double[] quotient, double[] error, double[] vectorError) {}

    private BasisBlock(Polynomial polynomial, OscillatorBasis basis, int count, @Nullable BasisBlock known) {
        this.polynomial = polynomial;
        this.basis = basis;
        this.count = count;
        parts = polynomial.even() ? 2 : 1;
        vectors = new double[count][];
        rows = new double[parts][][];
        values = new double[parts][];
        for (int part = 0; part < parts; part++) {
            rows[part] = parts == 2 ? OscillatorBasis.parity(basis.rows(), basis.size(), part) : basis.rows();
        }
        if (known != null) {
            System.arraycopy(known.values, 0, values, 0, parts);
        } else if (parts == 1) {
            values[0] = BandSpectrum.lowest(rows[0], rows[0][0].length, oneMore(0));
        } else {
            double[][] both = BandSpectrum.lowest(rows[0], oneMore(0), rows[1], oneMore(1));
            System.arraycopy(both, 0, values, 0, 2);
        }
        Interruption.check();
    }

    /** The level after the last shows how far away the rest is. */
    private int oneMore(int part) {
        return Math.min(wanted(part) + 1, rows[part][0].length);
    }

    /**
     * Levels 0 … count − 1 in a basis large enough that what leaks out of it changes energies by less than rounding.
     *
     * @param vectors whether the vectors are to be as good: they are off by the leak, energies by its square
     */
    static BasisBlock of(Polynomial polynomial, int count, boolean vectors) {
        return of(polynomial, count, vectors, null);
    }

    /** The same levels, whose values are known, in a basis large enough for the vectors. */
    BasisBlock withVectors() {
        return of(polynomial, count, true, this);
    }

    /** How many levels it holds. */
    int count() {
        return count;
    }

    private static BasisBlock of(Polynomial polynomial, int count, boolean vectors, @Nullable BasisBlock known) {
        double energy = polynomial.energyOf(count);
        double left = polynomial.turning(energy, -1);
        double right = polynomial.turning(energy, 1);
        double centre = polynomial.even() ? 0 : rounded((left + right) / 2, right - left);
        double omega = Math.sqrt(2 * (energy - polynomial.bottom())) / ((right - left) / 2);
        // What was needed for x⁴ and x⁶; other polynomials may take a second try.
        int size = (int) (1.23 * count + 46 + 14 * Math.max(0, polynomial.degree() - 4));
        if (vectors) {
            size += 20 + size / 5;
        }
        if (polynomial.degree() == 2) {
            omega = Math.sqrt(2 * polynomial.coefficient(2));
            centre = -polynomial.coefficient(1) / (2 * polynomial.coefficient(2));
            size = count + 8;
        }
        while (true) {
            BasisBlock block =
                    new BasisBlock(polynomial, OscillatorBasis.of(polynomial, size, omega, centre), count, known);
            if (block.closed(vectors) || size > LARGEST) {
                return block;
            }
            size += 10 + size / 5;
        }
    }

    /** A few bits only, so that powers of the centre stay exact. */
    private static double rounded(double x, double width) {
        double unit = Math.scalb(1.0, Math.getExponent(width) - 6);
        return Math.rint(x / unit) * unit;
    }

    private int wanted(int part) {
        return parts == 1 ? count : (count - part + 1) / 2;
    }

    private int part(int n) {
        return parts == 1 ? 0 : n & 1;
    }

    private int place(int n) {
        return n / parts;
    }

    double value(int n) {
        return values[part(n)][place(n)];
    }

    /** Whether the highest level, and the lowest where the potential has side wells, leak out of the basis by less than rounding. */
    private boolean closed(boolean strict) {
        return closed(count - 1, strict) && (count == 1 || closed(0, strict));
    }

    private boolean closed(int n, boolean strict) {
        int part = part(n);
        double[][] band = rows[part];
        int size = band[0].length;
        int width = band.length - 1;
        int place = place(n);
        if (place + 1 >= values[part].length) {
            return false;
        }
        double value = values[part][place];
        double[] v = new BandVectors(band, size).at(value);
        double square = 0;
        for (int c = size; c < size + width; c++) {
            double sum = 0;
            for (int j = Math.max(0, c - width); j < size; j++) {
                sum += band[c - j][j] * v[j];
            }
            square += sum * sum;
        }
        double gap = values[part][place + 1] - value;
        return square <= (strict ? 0x1p-94 * gap * gap : 0x1p-54 * gap * Math.max(gap, Math.abs(value)));
    }

    synchronized Proved proved() {
        Proved done = proved;
        if (done == null) {
            done = prove();
            proved = done;
        }
        return done;
    }

    /** Whether all bounds are proved, to better than shooting would estimate. */
    boolean isProved() {
        if (basis.size() > LARGEST) {
            return false;
        }
        for (double error : proved().error) {
            if (!(error < Double.POSITIVE_INFINITY)) {
                return false;
            }
        }
        return true;
    }

    private Proved prove() {
        double[] quotient = new double[count];
        double[] error = new double[count];
        double[] vectorError = new double[count];
        double[][] all = vectors(count - 1);
        double[][] sizes = basis.sizes();
        for (int part = 0; part < parts; part++) {
            int wanted = wanted(part);
            if (wanted == 0) {
                continue;
            }
            Interruption.check();
            int side = parts == 2 ? part : -1;
            double[][] big = parts == 2 ? OscillatorBasis.parity(sizes, basis.size(), part) : sizes;
            double[][] own = new double[wanted][];
            for (int i = 0; i < wanted; i++) {
                own[i] = gathered(all[parts * i + part], part);
            }
            BasisProof proof =
                    new BasisProof(rows[part], big, basis.rounding(), Arrays.copyOf(values[part], wanted), own);
            double top = proof.quotient[wanted - 1];
            double next = 0.5 * (top + values[part][Math.min(wanted, values[part].length - 1)]);
            double[] errors = proof.errors(next, () -> LevelCount.below(next, basis, side));
            for (int i = 0; i < wanted; i++) {
                int n = parts * i + part;
                quotient[n] = proof.quotient[i];
                error[n] = errors.length == 0 ? Double.POSITIVE_INFINITY : errors[i];
                double gap = proof.gap(i, next);
                // Davis and Kahan: sin θ ≤ r / gap, and √2 from the sine to the norm.
                vectorError[n] = gap > 0 ? Math.min(2, 1.5 * proof.residual(i) / gap) : 2;
            }
        }
        return new Proved(quotient, error, vectorError);
    }

    /** Vectors of levels 0 … last over the whole basis, positive at the right turning point; the arrays themselves. */
    private synchronized double[][] vectors(int last) {
        Ladder ladder = new Ladder(basis.size());
        for (int part = 0; part < parts; part++) {
            BandVectors solver = null;
            for (int n = part; n <= last; n += parts) {
                if (vectors[n] != null) {
                    continue;
                }
                if (solver == null) {
                    solver = new BandVectors(rows[part], rows[part][0].length);
                }
                double[] v = spread(solver.at(value(n)), part);
                if (negative(v, n, ladder)) {
                    for (int j = 0; j < v.length; j++) {
                        v[j] = -v[j];
                    }
                }
                vectors[n] = v;
            }
            Interruption.check();
        }
        return vectors;
    }

    /** Whether a vector is negative beyond all its zeros. */
    private boolean negative(double[] v, int n, Ladder ladder) {
        if (!polynomial.monotone()) {
            return ladder.sum(v, scaled(polynomial.turning(value(n), 1))) < 0;
        }
        // In a single even well half the zeros lie on the right of 0: the sign there, or that of the slope, tells.
        double sum = ladder.middle(v, n & 1);
        return (n / 2 & 1) == 0 ? sum < 0 : sum > 0;
    }

    /** Sums of oscillator functions at one point, good enough for a sign. */
    private static final class Ladder {
        private final double[] up;
        private final double[] down;
        /** h_k(0) over h_0(0) for even k, h_k′(0) over √2 h_0(0) for odd k. */
        private final double[] middle;

        Ladder(int size) {
            middle = new double[size + 2];
            middle[0] = 1;
            middle[1] = 1;
            up = new double[size];
            down = new double[size];
            for (int k = 0; k < size; k++) {
                up[k] = Math.sqrt(2.0 / (k + 1));
                down[k] = Math.sqrt(k / (k + 1.0));
            }
            for (int k = 0; k < size; k += 2) {
                middle[k + 2] = -Math.sqrt((k + 1.0) / (k + 2)) * middle[k];
            }
            for (int k = 1; k < size; k += 2) {
                middle[k] = middle[k - 1] * Math.sqrt(k);
            }
        }

        /** Σ v_k h_k, or h_k′, at 0, over one factor. */
        double middle(double[] v, int parity) {
            double a = 0;
            double b = 0;
            int k = parity;
            for (; k + 2 < v.length; k += 4) {
                a += v[k] * middle[k];
                b += v[k + 2] * middle[k + 2];
            }
            if (k < v.length) {
                a += v[k] * middle[k];
            }
            return a + b;
        }

        /** Σ v_k h_k(y) e^{y²/2}, h_k the oscillator functions: the factor does not change the sign. */
        double sum(double[] v, double y) {
            double before = 0;
            double here = 1;
            double sum = 0;
            for (int k = 0; k < v.length; k++) {
                sum += v[k] * here;
                double next = up[k] * y * here - down[k] * before;
                before = here;
                here = next;
            }
            return sum;
        }
    }

    private double[] spread(double[] v, int part) {
        if (parts == 1) {
            return v;
        }
        double[] all = new double[basis.size()];
        for (int j = 0; j < v.length; j++) {
            all[2 * j + part] = v[j];
        }
        return all;
    }

    private double[] gathered(double[] all, int part) {
        if (parts == 1) {
            return all;
        }
        double[] v = new double[rows[part][0].length];
        for (int j = 0; j < v.length; j++) {
            v[j] = all[2 * j + part];
        }
        return v;
    }

    private double scaled(double x) {
        return Math.sqrt(basis.omega()) * (x - basis.centre());
    }

    /** Wave functions first … first + rows − 1 at the points. */
    double[][] waves(int first, int rows, double[] x) {
        double[] points = new double[x.length];
        for (int i = 0; i < x.length; i++) {
            points[i] = scaled(x[i]);
        }
        double[][] functions = HermiteFunctions.window(0, basis.size(), points);
        double[][] vectors = vectors(first + rows - 1);
        double scale = Math.sqrt(Math.sqrt(basis.omega()));
        double[][] table = new double[rows][x.length];
        for (int row = 0; row < rows; row++) {
            Interruption.check();
            double[] v = vectors[first + row];
            double[] out = table[row];
            for (int j = 0; j < v.length; j++) {
                double c = v[j] * scale;
                if (c != 0) {
                    double[] f = functions[j];
                    for (int i = 0; i < x.length; i++) {
                        out[i] += c * f[i];
                    }
                }
            }
        }
        return table;
    }

    /** Estimated error of any wave function value up to the level: |f|² ≤ ‖f‖ ‖f′‖ for the error f. */
    double waveError(int last) {
        Proved all = proved();
        double worst = 0;
        for (int n = 0; n <= last; n++) {
            double momentum = Math.sqrt(2 * Math.max(0, value(n) - polynomial.bottom())) + Math.sqrt(basis.omega());
            worst = Math.max(worst, all.vectorError[n] * Math.sqrt(momentum));
        }
        return 2 * worst + Math.sqrt(Math.sqrt(basis.omega())) * HermiteFunctions.errorBound(basis.size());
    }

    /** Elements of x, x², p (over i), p² between listed levels: {x, x², p, p²} matrices and their four estimated errors. */
    double[][][] elements(int[] list, double[] errors) {
        Proved all = proved();
        double[][] vectors = vectors(count - 1);
        int k = list.length;
        double[][][] result = new double[4][k][k];
        double[][] moved = new double[k][];
        double[][] turned = new double[k][];
        double[] ownX = new double[k];
        double[] ownP = new double[k];
        for (int i = 0; i < k; i++) {
            moved[i] = ladder(vectors[list[i]], 1);
            turned[i] = ladder(vectors[list[i]], -1);
            ownX[i] = Math.sqrt(dot(moved[i], moved[i]));
            ownP[i] = Math.sqrt(dot(turned[i], turned[i]));
        }
        double x0 = basis.centre();
        for (int i = 0; i < k; i++) {
            for (int j = 0; j <= i; j++) {
                boolean same = part(list[i]) == part(list[j]);
                boolean mixed = parts == 1;
                double delta = i == j ? 1 : 0;
                double x = mixed || !same ? dot(vectors[list[i]], moved[j]) : 0;
                double p = i != j && (mixed || !same) ? dot(vectors[list[i]], turned[j]) : 0;
                double xx = mixed || same ? dot(moved[i], moved[j]) : 0;
                double pp = mixed || same ? dot(turned[i], turned[j]) : 0;
                put(result[1], i, j, xx + 2 * x0 * x + x0 * x0 * delta, 1);
                put(result[0], i, j, x + x0 * delta, 1);
                put(result[2], i, j, p, -1);
                put(result[3], i, j, pp, 1);
                double off = all.vectorError[list[i]] + all.vectorError[list[j]];
                double u = 0x1p-53 * (basis.size() + 20);
                errors[0] = Math.max(errors[0], (off + u) * Math.max(ownX[i], ownX[j]) + u * Math.abs(x0));
                errors[2] = Math.max(errors[2], (off + u) * Math.max(ownP[i], ownP[j]));
                double wide = Math.max(ownX[i], ownX[j]) + Math.abs(x0);
                errors[1] = Math.max(errors[1], (off + u) * wide * wide * 2);
                errors[3] =
                        Math.max(errors[3], (off + u) * Math.max(ownP[i], ownP[j]) * Math.max(ownP[i], ownP[j]) * 2);
            }
        }
        return result;
    }

    private static void put(double[][] matrix, int i, int j, double value, int sign) {
        matrix[j][i] = sign * value;
        matrix[i][j] = value;
    }

    /** (a + sign a†)/√2 on the vector, times √(1/Ω) or √Ω: y v, or i p v = −i² … = (a − a†) v √(Ω/2) without the factor −i. */
    private double[] ladder(double[] v, int sign) {
        double scale = Math.sqrt((sign > 0 ? 1 / basis.omega() : basis.omega()) / 2);
        double[] out = new double[v.length + 1];
        for (int j = 0; j < v.length; j++) {
            if (j > 0) {
                out[j - 1] += scale * Math.sqrt(j) * v[j];
            }
            // p = −i √(Ω/2) (a − a†) = i √(Ω/2) (a† − a)
            out[j + 1] += sign * scale * Math.sqrt(j + 1.0) * v[j];
        }
        if (sign < 0) {
            for (int j = 0; j < out.length; j++) {
                out[j] = -out[j];
            }
        }
        return out;
    }

    private static double dot(double[] a, double[] b) {
        double sum = 0;
        int n = Math.min(a.length, b.length);
        for (int i = 0; i < n; i++) {
            sum += a[i] * b[i];
        }
        return sum;
    }
}
