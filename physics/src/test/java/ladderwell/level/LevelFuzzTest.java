package ladderwell.level;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.Random;
import java.util.function.DoubleUnaryOperator;
import ladderwell.numeric.DoubleDouble;
import org.apache.commons.math3.linear.Array2DRowRealMatrix;
import org.apache.commons.math3.linear.EigenDecomposition;
import org.junit.jupiter.api.Test;

/**
 * Random potentials against solvers of another kind: every index right, every error within the one stated, nothing refused that has levels. The
 * properties {@code ladderwell.fuzz.seed} and {@code ladderwell.fuzz.times} (a factor on the number of cases) make other and longer runs.
 */
class LevelFuzzTest {
    private static final long SEED = Long.getLong("ladderwell.fuzz.seed", 1905);
    private static final int TIMES = Integer.getInteger("ladderwell.fuzz.times", 1);

    /** Energies of the lowest levels on a grid of sinc functions between −reach and reach. */
    private static double[] sinc(DoubleUnaryOperator v, double reach, int points, int wanted) {
        double h = 2 * reach / (points - 1);
        double[][] matrix = new double[points][points];
        for (int i = 0; i < points; i++) {
            for (int j = 0; j < points; j++) {
                int d = i - j;
                // Colbert and Miller, J. Chem. Phys. 96 (1992) 1982
                double t = d == 0 ? Math.PI * Math.PI / 3 : ((d & 1) == 0 ? 2.0 : -2.0) / ((double) d * d);
                matrix[i][j] = t / (2 * h * h);
            }
            matrix[i][i] += v.applyAsDouble(-reach + i * h);
        }
        double[] found = new EigenDecomposition(new Array2DRowRealMatrix(matrix, false)).getRealEigenvalues();
        Arrays.sort(found);
        return Arrays.copyOf(found, wanted);
    }

    @Test
    void smoothPotentialsHaveTheLevelsOfASincGrid() {
        Random random = new Random(SEED);
        int wanted = 10;
        int compared = 0;
        for (int trial = 0; trial < 24 * TIMES; trial++) {
            double square = random.nextDouble() * 2 - 0.6;
            double fourth = Math.pow(10, -2 + 2.5 * random.nextDouble());
            double linear = random.nextBoolean() ? 0 : random.nextGaussian();
            int bumps = random.nextInt(4);
            double[] size = new double[bumps];
            double[] at = new double[bumps];
            double[] width = new double[bumps];
            for (int i = 0; i < bumps; i++) {
                size[i] = random.nextGaussian() * 20;
                at[i] = random.nextGaussian() * 2;
                width[i] = 0.15 + random.nextDouble() * 1.5;
            }
            DoubleUnaryOperator v = x -> {
                double sum = ((fourth * x * x + square) * x + linear) * x;
                for (int i = 0; i < bumps; i++) {
                    double d = (x - at[i]) / width[i];
                    sum += size[i] * Math.exp(-d * d);
                }
                return sum;
            };
            String name = "seed " + SEED + ", trial " + trial;
            boolean even = linear == 0 && bumps == 0;
            Levels levels = Levels.of(even ? Curves.even(v) : Curves.open(v));
            double top = levels.energyHigh(wanted - 1);
            double reach = Math.max(reach(v, top), reach(x -> v.applyAsDouble(-x), top));
            double[] coarse = sinc(v, reach, 170, wanted);
            double[] fine = sinc(v, 1.05 * reach, 220, wanted);
            for (int n = 0; n < wanted; n++) {
                // What the grid itself leaves open: its change, and rounding of a matrix as large as its top.
                double open = 3 * Math.abs(fine[n] - coarse[n]) + 2e-12 * (Math.abs(fine[n]) + Math.abs(top) + 50);
                assertEquals(fine[n], levels.energyHigh(n), levels.energyError(n) + open, name + ", level " + n);
                if (open < 1e-8) {
                    compared++;
                }
            }
            assertEquals(4, levels.countBelow((levels.energyHigh(3) + levels.energyHigh(4)) / 2), name);
        }
        assertTrue(compared > 200 * TIMES, "only " + compared + " levels met a grid sure to 1e-8");
    }

    /** Where a wave of the energy has decayed to e^−20. */
    private static double reach(DoubleUnaryOperator v, double energy) {
        double step = 0.02;
        double depth = 0;
        double x = 0;
        while (depth < 20) {
            double above = v.applyAsDouble(x) - energy;
            depth = above > 0 ? depth + Math.sqrt(2 * above) * step : 0;
            x += step;
        }
        return x;
    }

    @Test
    void stepsHaveTheLevelsOfExactTransferWhetherDeclaredOrNot() {
        Random random = new Random(SEED + 1);
        for (int trial = 0; trial < 150 * TIMES; trial++) {
            int steps = 1 + random.nextInt(5);
            double[] edges = new double[steps + 1];
            edges[0] = -1 - random.nextDouble() * 3;
            for (int i = 1; i <= steps; i++) {
                edges[i] = edges[i - 1] + 0.15 + random.nextDouble() * 2;
            }
            double top = 5 + random.nextDouble() * 60;
            double[] heights = new double[steps + 2];
            heights[0] = top + (random.nextBoolean() ? 0 : random.nextDouble() * 20);
            heights[steps + 1] = top;
            for (int i = 1; i <= steps; i++) {
                heights[i] = random.nextDouble() * top * (random.nextInt(4) == 0 ? 1.5 : 0.8);
            }
            boolean declared = random.nextInt(3) > 0;
            StepWells exact = new StepWells(edges, heights);
            String name = "seed " + SEED + ", trial " + trial + (declared ? ", declared" : ", undeclared");
            if (exact.below(DoubleDouble.of(Math.nextDown(exact.threshold()))) == 0) {
                continue;
            }
            Levels levels = Levels.of(Curves.open(exact::value, declared ? edges : new double[0]));
            long count = levels.count();
            assertEquals(exact.below(DoubleDouble.of(Math.nextDown(exact.threshold()))), count, name);
            for (long n = 0; n < count; n++) {
                DoubleDouble energy = DoubleDouble.of(levels.energyHigh(n));
                double error = levels.energyError(n);
                assertTrue(error < 1e-9, name + ", level " + n + " has the wide error " + error);
                assertTrue(exact.below(energy.plus(-error)) <= n, name + ": level " + n + " lies lower");
                if (energy.value() + error < exact.threshold()) {
                    assertTrue(exact.below(energy.plus(error)) > n, name + ": level " + n + " lies higher");
                }
            }
        }
    }

    /** Two parabolas that meet in a kink far above: each well has its own ladder. */
    @Test
    void farDoubleWellsHaveBothLadders() {
        Random random = new Random(SEED + 2);
        for (int trial = 0; trial < 30 * TIMES; trial++) {
            double s = 8 + random.nextDouble() * 15;
            double w = 0.6 + random.nextDouble();
            double up = random.nextDouble() * 3;
            boolean declared = random.nextBoolean();
            DoubleUnaryOperator left = x -> (x + s) * (x + s) / 2;
            DoubleUnaryOperator right = x -> w * w * (x - s) * (x - s) / 2 + up;
            double low = -s;
            double high = s;
            for (int i = 0; i < 100; i++) {
                double middle = (low + high) / 2;
                if (left.applyAsDouble(middle) < right.applyAsDouble(middle)) {
                    low = middle;
                } else {
                    high = middle;
                }
            }
            double[] expected = new double[12];
            for (int k = 0; k < 6; k++) {
                expected[k] = k + 0.5;
                expected[6 + k] = w * (k + 0.5) + up;
            }
            Arrays.sort(expected);
            Levels levels = Levels.of(Curves.open(
                    x -> Math.min(left.applyAsDouble(x), right.applyAsDouble(x)),
                    declared ? new double[] {low} : new double[0]));
            for (int n = 0; n < 6; n++) {
                // The barrier is above 20 and 10 wide: tunnelling is below any rounding, that of these numbers is
                // 1e-13.
                assertEquals(
                        expected[n],
                        levels.energyHigh(n),
                        levels.energyError(n) + 1e-13,
                        "seed " + SEED + ", trial " + trial + ", level " + n + (declared ? "" : ", kink undeclared"));
            }
        }
    }

    private static void assertClosed(double expected, Levels levels, long n, String name) {
        double error = levels.energyError(n);
        // The closed form itself is rounded.
        assertEquals(expected, levels.energyHigh(n), error + 4e-16 * Math.abs(expected), name + ", level " + n);
        assertTrue(error <= 1e-9 * Math.abs(expected) + 1e-12, name + ", level " + n + " has the wide error " + error);
    }

    /** Morse 1929; Pöschl and Teller 1933; Kratzer, Z. Phys. 3 (1920) 289; the oscillator with a centrifugal term; all textbook forms. */
    @Test
    void singularEndsAndTailsHaveTheLevelsOfClosedForms() {
        Random random = new Random(SEED + 3);
        double open = Double.POSITIVE_INFINITY;
        for (int trial = 0; trial < 12 * TIMES; trial++) {
            String name = "seed " + SEED + ", trial " + trial;
            double charge = Math.pow(10, -1 + 2 * random.nextDouble());
            int l = random.nextInt(4);
            Levels coulomb =
                    Levels.of(Curves.between(0, open, x -> -charge / x + (l == 0 ? 0 : l * (l + 1) / (2 * x * x))));
            for (int n : new int[] {0, 1, 5, 20}) {
                double whole = n + l + 1;
                assertClosed(
                        -charge * charge / (2 * whole * whole), coulomb, n, name + ", Coulomb " + charge + ", l " + l);
            }

            double g = 1.2 + random.nextDouble() * 6;
            Levels ring = Levels.of(Curves.between(0, open, x -> g * (g - 1) / (2 * x * x) + x * x / 2));
            for (int n : new int[] {0, 1, 7, 40}) {
                assertClosed(2 * n + g + 0.5, ring, n, name + ", centrifugal " + g);
            }

            double depth = Math.pow(10, -1 + 4 * random.nextDouble());
            double a = Math.pow(10, -1 + 1.5 * random.nextDouble());
            double top = Math.sqrt(2 * depth) / a - 0.5;
            if (top > 0.05 && Math.abs(top - Math.rint(top)) > 0.02) {
                Levels morse = Levels.of(Curves.morse(depth, a));
                assertEquals((long) Math.floor(top) + 1, morse.count(), name + ", Morse " + depth + ", " + a);
                for (long n = 0; n <= top; n += 1 + n / 3) {
                    assertClosed(Curves.morseLevel(depth, a, (int) n), morse, n, name + ", Morse " + depth + ", " + a);
                }
            }

            double lambda = 0.3 + random.nextDouble() * 8;
            double shift = random.nextGaussian();
            Levels hole = Levels.of(
                    Curves.open(x -> -lambda * (lambda + 1) / 2 * Curves.sech(x - shift) * Curves.sech(x - shift)));
            if (Math.abs(lambda - Math.rint(lambda)) > 0.02) {
                assertEquals((long) Math.ceil(lambda), hole.count(), name + ", sech² " + lambda);
                for (int n = 0; n < lambda; n++) {
                    assertClosed(-(lambda - n) * (lambda - n) / 2, hole, n, name + ", sech² " + lambda);
                }
            }
        }
    }
}
