package ladderwell.numeric;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.math.BigDecimal;
import java.util.Arrays;
import java.util.List;
import java.util.Random;
import java.util.concurrent.CancellationException;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import org.junit.jupiter.api.Test;

class DensityFramesTest {
    private static final int[][] SHAPES = {
        {1, 1, 1},
        {1, 2, 3},
        {2, 1, 1},
        {3, 7, 5},
        {8, 16, 16},
        {17, 33, 17},
        {60, 131, 40},
        {61, 130, 33},
        {301, 40, 5}
    };

    /** Sine functions of a box over its width: even and odd in turn about the middle. */
    private static double[][] box(int levels, int points) {
        double[][] table = new double[levels][points];
        for (int k = 0; k < levels; k++) {
            for (int i = 0; i < points; i++) {
                table[k][i] = Math.sqrt(2) * Math.sin(Math.PI * (k + 1) * (i + 0.5) / points);
            }
        }
        return table;
    }

    private static double density(double[] re, double[] im, double[][] table, int point) {
        double u = 0;
        double v = 0;
        for (int k = 0; k < table.length; k++) {
            u += re[k] * table[k][point];
            v += im[k] * table[k][point];
        }
        return u * u + v * v;
    }

    private static double norm(double[] re, double[] im) {
        double sum = 0;
        for (int k = 0; k < re.length; k++) {
            sum += re[k] * re[k] + im[k] * im[k];
        }
        return Math.sqrt(sum);
    }

    @Test
    void agreesWithTheDefinitionWithAndWithoutParity() {
        Random random = new Random(21);
        for (int[] shape : SHAPES) {
            double[][] table = box(shape[0], shape[1]);
            double[][] re = MatrixProductTest.random(random, shape[2], shape[0]);
            double[][] im = MatrixProductTest.random(random, shape[2], shape[0]);
            for (Loops loops : List.of(new PlainLoops(), new VectorLoops())) {
                for (boolean alternating : new boolean[] {false, true}) {
                    DensityFrames frames = new DensityFrames(loops, table, alternating);
                    double[][] density = frames.of(re, im, Workers.CALLER);
                    assertEquals(shape[2], density.length);
                    for (int j = 0; j < shape[2]; j++) {
                        assertEquals(shape[1], density[j].length);
                        double norm = norm(re[j], im[j]);
                        // Sines and their mirror images differ by rounding of the argument, about 1e-15 k.
                        double bound = frames.errorBound(0, 0, norm) + frames.errorBound(0, 2e-15 * shape[0], norm);
                        for (int i = 0; i < shape[1]; i++) {
                            assertEquals(density(re[j], im[j], table, i), density[j][i], bound);
                        }
                    }
                }
            }
        }
    }

    @Test
    void boundHoldsAgainstExactSums() {
        Random random = new Random(22);
        double[][] table = MatrixProductTest.random(random, 90, 50);
        // Functions that vanish towards one side, so that strips are left out there.
        for (int k = 0; k < 90; k++) {
            for (int i = 0; i < 50; i++) {
                table[k][i] *= Math.exp(-Math.pow(Math.max(0, i - 0.4 * k), 2) / 4);
            }
        }
        double[][] re = MatrixProductTest.random(random, 20, 90);
        double[][] im = MatrixProductTest.random(random, 20, 90);
        DensityFrames frames = DensityFrames.of(table);
        double[][] density = frames.of(re, im, Workers.CALLER);
        for (int check = 0; check < 300; check++) {
            int j = random.nextInt(20);
            int i = random.nextInt(50);
            BigDecimal u = BigDecimal.ZERO;
            BigDecimal v = BigDecimal.ZERO;
            for (int k = 0; k < 90; k++) {
                BigDecimal value = new BigDecimal(table[k][i]);
                u = u.add(new BigDecimal(re[j][k]).multiply(value));
                v = v.add(new BigDecimal(im[j][k]).multiply(value));
            }
            double error = Decimals.distance(u.multiply(u).add(v.multiply(v)), new BigDecimal(density[j][i]));
            assertTrue(error <= frames.errorBound(0, 0, norm(re[j], im[j])), "error " + error);
        }
    }

    @Test
    void plainAndVectorLoopsGiveTheSameBits() {
        Random random = new Random(23);
        double[][] re = MatrixProductTest.random(random, 35, 60);
        double[][] im = MatrixProductTest.random(random, 35, 60);
        for (boolean alternating : new boolean[] {false, true}) {
            assertArrayEquals(
                    new DensityFrames(new PlainLoops(), box(60, 101), alternating).of(re, im, Workers.CALLER),
                    new DensityFrames(new VectorLoops(), box(60, 101), alternating).of(re, im, Workers.CALLER));
        }
    }

    @Test
    void threadsDoNotChangeBits() {
        Random random = new Random(24);
        double[][] re = MatrixProductTest.random(random, 150, 40);
        double[][] im = MatrixProductTest.random(random, 150, 40);
        DensityFrames frames = DensityFrames.alternating(box(40, 77));
        double[][] alone = frames.of(re, im, Workers.CALLER);
        ExecutorService executor = Executors.newFixedThreadPool(4);
        try {
            for (int threads : new int[] {2, 3, 5}) {
                assertArrayEquals(alone, frames.of(re, im, new Workers(executor, threads)));
            }
        } finally {
            executor.shutdownNow();
        }
    }

    @Test
    void framesOfPhasesAreFramesOfTheirCoefficients() {
        Random random = new Random(25);
        double[] energy = random.doubles(30).map(e -> 100 * e).toArray();
        double[] re = random.doubles(30).toArray();
        double[] im = random.doubles(30).toArray();
        double[] times = new double[50];
        Arrays.setAll(times, j -> 0.1 * j);
        ExactPhases phases = ExactPhases.of(energy, new double[30], re, im, times);
        double[][] rowsRe = new double[50][30];
        double[][] rowsIm = new double[50][30];
        phases.fill(0, 50, rowsRe, rowsIm);
        DensityFrames frames = DensityFrames.of(box(30, 44));
        assertArrayEquals(frames.of(rowsRe, rowsIm, Workers.CALLER), frames.of(phases, Workers.CALLER));
    }

    @Test
    void refusesWhatDoesNotFit() {
        assertThrows(IllegalArgumentException.class, () -> DensityFrames.of(new double[][] {{1, 2}, {1}}));
        assertThrows(IllegalArgumentException.class, () -> DensityFrames.of(new double[][] {{1, Double.NaN}}));
        DensityFrames frames = DensityFrames.of(box(3, 5));
        assertThrows(
                IllegalArgumentException.class, () -> frames.of(new double[1][2], new double[1][3], Workers.CALLER));
        assertThrows(
                IllegalArgumentException.class, () -> frames.of(new double[1][3], new double[2][3], Workers.CALLER));
        double[][] none = {};
        double[][] wrong = {{0, 0}};
        assertThrows(
                IllegalArgumentException.class,
                () -> frames.fill(new double[1][3], new double[1][3], none, Workers.CALLER));
        assertThrows(
                IllegalArgumentException.class,
                () -> frames.fill(new double[1][3], new double[1][3], wrong, Workers.CALLER));
        double[] two = {1, 2};
        assertThrows(
                IllegalArgumentException.class,
                () -> frames.of(ExactPhases.of(two, two, two, two, two), Workers.CALLER));
    }

    @Test
    void stopsWhenTheThreadIsInterrupted() {
        DensityFrames frames = DensityFrames.of(box(3, 5));
        Thread.currentThread().interrupt();
        assertThrows(CancellationException.class, () -> frames.of(new double[1][3], new double[1][3], Workers.CALLER));
    }
}
