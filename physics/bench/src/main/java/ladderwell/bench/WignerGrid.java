package ladderwell.bench;

import java.util.Random;
import ladderwell.evidence.Bound;
import ladderwell.numeric.DoubleDouble;
import ladderwell.phasespace.NumberMatrix;
import ladderwell.phasespace.NumberWave;
import ladderwell.phasespace.PhaseField;
import ladderwell.phasespace.PhaseFunctions;
import ladderwell.phasespace.PhaseGrid;
import org.jspecify.annotations.Nullable;

/** The Wigner function of a random state at 201 × 201 points to ±22; nothing is kept from run to run. */
final class WignerGrid {
    private static final int[][] PROBES = {{100, 100}, {100, 103}, {60, 100}, {120, 88}, {31, 140}, {90, 95}};
    private static final double FINER = 0.045;

    private final PhaseGrid grid = PhaseGrid.square(22, 201);
    private final int size;
    private final double[][] re;
    private final double[][] im;
    private final double[] lowerRe;
    private final double[] lowerIm;
    private final boolean pure;
    private final DoubleDouble[] up;
    private final DoubleDouble[] down;
    private @Nullable PhaseField field;

    /**
     * A state of so many levels.
     *
     * @param rank 1 for a pure state, else the number of random states that are mixed
     */
    WignerGrid(int size, int rank) {
        this.size = size;
        pure = rank == 1;
        Random random = new Random(5);
        re = new double[rank][size];
        im = new double[rank][size];
        double square = 0;
        for (int r = 0; r < rank; r++) {
            for (int n = 0; n < size; n++) {
                re[r][n] = random.nextGaussian();
                im[r][n] = random.nextGaussian();
                square += re[r][n] * re[r][n] + im[r][n] * im[r][n];
            }
        }
        up = new DoubleDouble[size];
        down = new DoubleDouble[size];
        for (int n = 1; n < size; n++) {
            up[n] = DoubleDouble.of(2).dividedBy(n).sqrt();
            down[n] = DoubleDouble.of(n - 1).dividedBy(n).sqrt();
        }
        double norm = Math.sqrt(square);
        lowerRe = new double[size * (size + 1) / 2];
        lowerIm = new double[lowerRe.length];
        for (int r = 0; r < rank; r++) {
            for (int m = 0; m < size; m++) {
                re[r][m] /= norm;
                im[r][m] /= norm;
                for (int n = 0; n <= m; n++) {
                    lowerRe[m * (m + 1) / 2 + n] += re[r][m] * re[r][n] + im[r][m] * im[r][n];
                    lowerIm[m * (m + 1) / 2 + n] += im[r][m] * re[r][n] - re[r][m] * im[r][n];
                }
            }
        }
    }

    void run() {
        PhaseFunctions functions = new PhaseFunctions();
        field = pure
                ? functions.wigner(new NumberWave(0, re[0], im[0], Bound.exact()), grid)
                : functions.wigner(new NumberMatrix(0, size, lowerRe, lowerIm, Bound.exact()), grid);
    }

    /** Largest error at a few points, against a sum over a finer lattice with wave functions of 32 digits. */
    double error() {
        if (field == null) {
            throw new IllegalStateException("nothing has run yet");
        }
        double largest = 0;
        for (int[] probe : PROBES) {
            double exact = exact(grid.position(probe[0]), grid.momentum(probe[1]));
            largest = Math.max(largest, Math.abs(field.value(probe[0], probe[1]) - exact));
        }
        return largest;
    }

    private double exact(double x, double p) {
        DoubleDouble sum = DoubleDouble.ZERO;
        for (int k = -560; k <= 560; k++) {
            DoubleDouble[] right = functions(DoubleDouble.sum(x, k * FINER));
            DoubleDouble[] left = functions(DoubleDouble.sum(x, -k * FINER));
            double angle = 2 * k * FINER * p;
            double cosine = Math.cos(angle);
            double sine = Math.sin(angle);
            for (int r = 0; r < re.length; r++) {
                DoubleDouble a = sum(re[r], right);
                DoubleDouble b = sum(im[r], right);
                DoubleDouble u = sum(re[r], left);
                DoubleDouble v = sum(im[r], left);
                DoubleDouble real = a.times(u).plus(b.times(v));
                DoubleDouble imaginary = b.times(u).minus(a.times(v));
                sum = sum.plus(real.times(cosine)).plus(imaginary.times(sine));
            }
        }
        return sum.hi() * FINER / Math.PI;
    }

    private static DoubleDouble sum(double[] c, DoubleDouble[] f) {
        DoubleDouble sum = DoubleDouble.ZERO;
        for (int n = 0; n < c.length; n++) {
            sum = sum.plus(f[n].times(c[n]));
        }
        return sum;
    }

    private DoubleDouble[] functions(DoubleDouble x) {
        DoubleDouble[] f = new DoubleDouble[size];
        // The ground state in one double: a common factor that is off by a unit of rounding.
        double ground = Math.pow(Math.PI, -0.25) * Math.exp(-x.hi() * x.hi() / 2) * (1 - x.hi() * x.lo());
        f[0] = DoubleDouble.of(ground);
        for (int n = 1; n < size; n++) {
            f[n] = x.times(up[n]).times(f[n - 1]);
            if (n > 1) {
                f[n] = f[n].minus(down[n].times(f[n - 2]));
            }
        }
        return f;
    }
}
