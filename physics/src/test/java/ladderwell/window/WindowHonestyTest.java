package ladderwell.window;

import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.SplittableRandom;
import java.util.stream.IntStream;
import ladderwell.operator.LadderPolynomial;
import ladderwell.operator.OperatorFormula;
import ladderwell.state.Amplitudes;
import ladderwell.state.DensityOperator;
import ladderwell.state.Mixture;
import org.apache.commons.math3.exception.MaxCountExceededException;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.EigenDecomposition;
import org.apache.commons.math3.linear.RealMatrix;
import org.apache.commons.math3.linear.SingularValueDecomposition;
import org.junit.jupiter.api.Test;

/** Guaranteed bounds of runs of random systems against {@link PlainMotion}. */
class WindowHonestyTest {
    /** How many systems: a third of them spreads beyond the reference. The environment asks for more where time is no matter. */
    private static final int SYSTEMS = System.getenv("CI") == null ? 450 : 3100;

    /** What the reference itself may be off, as a share of the tolerance: what its highest levels hold, and rounding. */
    private static final double REFERENCE = 2e-3;

    private static final int LEVELS = 28;

    private static final double[] TOLERANCES = {1e-4, 1e-6, 1e-8};

    @Test
    void boundsOfRandomSystemsAreNeverBelowTheTrueErrorAndSeldomFarAbove() {
        double[] ratios = IntStream.range(0, SYSTEMS)
                .parallel()
                .mapToDouble(WindowHonestyTest::check)
                .filter(ratio -> !Double.isNaN(ratio))
                .sorted()
                .toArray();
        assertTrue(ratios.length > 0.6 * SYSTEMS, ratios.length + " systems were compared");
        double median = ratios[ratios.length / 2];
        assertTrue(median < 100, "median of bound over error: " + median);
    }

    /** Bound over error of one system; NaN where the reference does not hold it. */
    private static double check(int seed) {
        SplittableRandom random = new SplittableRandom(seed);
        boolean pure = random.nextInt(4) == 0;
        List<double[]> h = new ArrayList<>();
        int degree = 2 + random.nextInt(5);
        for (int j = 0; j <= degree; j++) {
            for (int k = 0; k <= j && j + k <= degree; k++) {
                if (j + k == 0 || random.nextInt(3) == 0) {
                    continue;
                }
                double size = 0.8 * Math.pow(0.15, j + k - 1.0) * (2 * random.nextDouble() - 1);
                double angle = j == k ? 0 : 2 * Math.PI * random.nextDouble();
                h.add(new double[] {j, k, size * Math.cos(angle), size * Math.sin(angle)});
                if (j != k) {
                    h.add(new double[] {k, j, size * Math.cos(angle), -size * Math.sin(angle)});
                }
            }
        }
        confine(h, degree);
        List<PlainMotion.Terms> jumps = new ArrayList<>();
        if (!pure) {
            double[][][] kinds = {
                {{0, 1, 0.8, 0}},
                {{1, 0, 0.3, 0}},
                {{1, 1, 0.5, 0}},
                {{0, 2, 0.2, 0}},
                {{1, 0, 0.1, 0.1}, {0, 1, 0, 0.7}}
            };
            jumps.add(new PlainMotion.Terms(List.of(kinds[0][0])));
            for (int kind = 1; kind < kinds.length; kind++) {
                if (random.nextInt(3) == 0) {
                    jumps.add(new PlainMotion.Terms(List.of(kinds[kind])));
                }
            }
        }
        double time = 0.1 + 0.5 * random.nextDouble();
        double tolerance = TOLERANCES[random.nextInt(TOLERANCES.length)];
        Amplitudes start = random.nextInt(3) == 0
                ? Amplitudes.level(random.nextInt(3))
                : Amplitudes.coherent(0.5 * random.nextDouble(), 6 * random.nextDouble(), 1e-13);
        PlainMotion.Terms terms = new PlainMotion.Terms(h);
        double[][][] exact = new PlainMotion(LEVELS, terms, jumps).after(full(start, LEVELS), time);
        double reference = REFERENCE * tolerance;
        if (PlainMotion.top(exact) > reference / 8) {
            return Double.NaN;
        }
        double[] times = {0, 0.37 * time, time};
        WindowState state;
        if (pure) {
            WindowMotion motion =
                    WindowMotion.pure(OperatorFormula.of(polynomial(terms)), start, times, tolerance, 1e9);
            state = motion.state(2);
        } else {
            DensityOperator density = Mixture.pure(start).density(1e9);
            WindowMotion motion = WindowMotion.mixed(
                    OperatorFormula.of(polynomial(terms)),
                    jumps.stream().map(WindowHonestyTest::polynomial).toList(),
                    density,
                    times,
                    tolerance,
                    1e9);
            state = motion.state(2);
        }
        double error = traceNorm(state, exact);
        double bound = state.traceNormError().size();
        assertTrue(
                error <= bound + reference,
                "system " + seed + (pure ? " (pure)" : "") + ": error " + error + ", bound " + bound + " at tolerance "
                        + tolerance);
        assertTrue(state.error().size() <= tolerance, "system " + seed);
        return bound / Math.max(error, reference);
    }

    /** Adds a†^k a^k that outweighs the terms of the highest degree: without it states may escape in finite time. */
    private static void confine(List<double[]> h, int degree) {
        int half = (degree + 1) / 2;
        double most = 0.2 * Math.pow(0.15, 2 * half - 1.0);
        for (double[] term : h) {
            if (term[0] + term[1] >= 2 * half - 1) {
                most += Math.hypot(term[2], term[3]);
            }
        }
        h.add(new double[] {half, half, most, 0});
    }

    private static LadderPolynomial polynomial(PlainMotion.Terms terms) {
        LadderPolynomial sum = LadderPolynomial.zero();
        for (double[] term : terms.terms()) {
            sum = sum.plus(LadderPolynomial.term((int) term[0], (int) term[1], term[2], term[3]));
        }
        return sum;
    }

    private static double[][][] full(Amplitudes start, int levels) {
        double[] re = new double[levels];
        double[] im = new double[levels];
        int first = (int) start.first(0);
        for (int i = 0; i < start.length(0) && first + i < levels; i++) {
            re[first + i] = start.re(0, i);
            im[first + i] = start.im(0, i);
        }
        double[][][] rho = new double[2][levels][levels];
        for (int m = 0; m < levels; m++) {
            for (int n = 0; n < levels; n++) {
                rho[0][m][n] = re[m] * re[n] + im[m] * im[n];
                rho[1][m][n] = im[m] * re[n] - re[m] * im[n];
            }
        }
        return rho;
    }

    /** ‖ρ − ρ̃‖₁ through the real symmetric matrix [[Re, −Im], [Im, Re]], whose eigenvalues are those of ρ − ρ̃ twice. */
    static double traceNorm(WindowState state, double[][][] exact) {
        int levels = Math.max(exact[0].length, (int) state.first() + state.levels());
        double[][] re = new double[levels][levels];
        double[][] im = new double[levels][levels];
        for (int m = 0; m < exact[0].length; m++) {
            for (int n = 0; n < exact[0].length; n++) {
                re[m][n] = -exact[0][m][n];
                im[m][n] = -exact[1][m][n];
            }
        }
        int first = (int) state.first();
        for (int m = 0; m < state.levels(); m++) {
            for (int n = 0; n <= m; n++) {
                double a;
                double b;
                if (state instanceof MixedWindow mixed) {
                    a = mixed.lowerRe()[m * (m + 1) / 2 + n];
                    b = mixed.lowerIm()[m * (m + 1) / 2 + n];
                } else {
                    PureWindow pure = (PureWindow) state;
                    a = pure.reals()[m] * pure.reals()[n] + pure.imaginaries()[m] * pure.imaginaries()[n];
                    b = pure.imaginaries()[m] * pure.reals()[n] - pure.reals()[m] * pure.imaginaries()[n];
                }
                re[first + m][first + n] += a;
                im[first + m][first + n] += b;
                if (m != n) {
                    re[first + n][first + m] += a;
                    im[first + n][first + m] -= b;
                }
            }
        }
        RealMatrix both = new Array2DRowRealMatrix(2 * levels, 2 * levels);
        for (int m = 0; m < levels; m++) {
            for (int n = 0; n < levels; n++) {
                double a = (re[m][n] + re[n][m]) / 2;
                double b = (im[m][n] - im[n][m]) / 2;
                both.setEntry(m, n, a);
                both.setEntry(levels + m, levels + n, a);
                both.setEntry(m, levels + n, -b);
                both.setEntry(levels + m, n, b);
            }
        }
        return traceNorm(both) / 2;
    }

    /** Σ |eigenvalue|; where the quick way does not converge, the sum of the singular values, which is the same. */
    private static double traceNorm(RealMatrix symmetric) {
        double largest = 0;
        for (double[] row : symmetric.getData()) {
            for (double value : row) {
                largest = Math.max(largest, Math.abs(value));
            }
        }
        if (largest == 0) {
            return 0;
        }
        RealMatrix scaled = symmetric.scalarMultiply(1 / largest);
        try {
            return largest
                    * Arrays.stream(new EigenDecomposition(scaled).getRealEigenvalues())
                            .map(Math::abs)
                            .sum();
        } catch (MaxCountExceededException slow) {
            return largest
                    * Arrays.stream(new SingularValueDecomposition(scaled).getSingularValues())
                            .sum();
        }
    }
}
