package ladderwell.numeric;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.math.BigDecimal;
import java.util.Arrays;
import java.util.Random;
import java.util.concurrent.CancellationException;
import org.junit.jupiter.api.Test;

class ExactPhasesTest {
    private static final long SEED = 20_261_201;

    /** |computed - c e^{-iEt}| / |c| against 60 digits. */
    private static double error(
            double re, double im, double cRe, double cIm, double energyHigh, double energyLow, double time) {
        BigDecimal phase = Decimals.exact(energyHigh, energyLow).multiply(new BigDecimal(time));
        BigDecimal cosine = Decimals.cos(phase);
        BigDecimal sine = Decimals.sin(phase);
        BigDecimal a = new BigDecimal(cRe);
        BigDecimal b = new BigDecimal(cIm);
        double dRe = Decimals.distance(new BigDecimal(re), a.multiply(cosine).add(b.multiply(sine)));
        double dIm = Decimals.distance(new BigDecimal(im), b.multiply(cosine).subtract(a.multiply(sine)));
        return Math.hypot(dRe, dIm) / Math.hypot(cRe, cIm);
    }

    @Test
    void reducedPhaseKeepsItsBoundUpToTheLargestPhase() {
        Random random = new Random(SEED);
        for (int i = 0; i < 2000; i++) {
            double size = Math.pow(10, 16.8 * random.nextDouble() - 1);
            double time = (random.nextDouble() + 0.5) * Math.pow(10, 6 * random.nextDouble() - 3);
            double high = Math.min(size, 7e16) / time * (random.nextBoolean() ? 1 : -1);
            double low = high * 0x1p-54 * (2 * random.nextDouble() - 1);
            double value = ExactPhases.reduced(high, low, time);
            BigDecimal exact = Decimals.reduced(Decimals.exact(high, low).multiply(new BigDecimal(time)));
            double error = Decimals.distance(exact, new BigDecimal(value));
            // At the cut the sign of π is a matter of rounding.
            if (error > 3) {
                error = Math.abs(error - 2 * Math.PI);
            }
            double bound = 2.5e-16 + Math.abs(high * time) * 0x1p-100;
            assertTrue(error <= bound, "case " + i + ": E=" + high + "+" + low + " t=" + time + " error " + error);
            assertTrue(Math.abs(value) <= Math.PI + 1e-15);
        }
    }

    @Test
    void reducedPhaseIsRightNextToMultiplesOfHalfPi() {
        for (long k : new long[] {1, 2, 3, 4, 1001, 123_456_789L, 987_654_321_012L, 600_000_000_000_001L}) {
            double near = Decimals.PI
                    .multiply(BigDecimal.valueOf(k))
                    .divide(BigDecimal.valueOf(2), 100, java.math.RoundingMode.HALF_EVEN)
                    .doubleValue();
            for (double x : new double[] {Math.nextDown(near), near, Math.nextUp(near), -near}) {
                BigDecimal expected = Decimals.reduced(new BigDecimal(x));
                double error = Decimals.distance(expected, new BigDecimal(ExactPhases.reduced(x, 0, 1)));
                double wrapped = Math.min(error, Math.abs(error - 2 * Math.PI));
                assertTrue(wrapped <= 2.5e-16 + Math.abs(x) * 0x1p-100, "k=" + k + " error " + wrapped);
            }
        }
    }

    /** Levels and coefficients with phases of a given size at time 1. */
    private record Case(double[] high, double[] low, double[] re, double[] im) {
        static Case random(Random random, int levels, double largest) {
            Case made = new Case(new double[levels], new double[levels], new double[levels], new double[levels]);
            for (int k = 0; k < levels; k++) {
                made.high[k] = largest * (2 * random.nextDouble() - 1);
                made.low[k] = made.high[k] * 0x1p-54 * random.nextDouble();
                made.re[k] = random.nextGaussian() * Math.pow(10, -30 * random.nextDouble());
                made.im[k] = random.nextGaussian() * Math.pow(10, -30 * random.nextDouble());
            }
            return made;
        }

        ExactPhases at(double[] times) {
            return ExactPhases.of(high, low, re, im, times);
        }
    }

    private static void boundHolds(String name, Case c, double[] times, ExactPhases phases, Random random, int checks) {
        int levels = c.high.length;
        double[][] re = new double[times.length][levels];
        double[][] im = new double[times.length][levels];
        phases.fill(0, times.length, re, im);
        for (int i = 0; i < checks; i++) {
            int j = random.nextInt(times.length);
            int k = random.nextInt(levels);
            double error = error(re[j][k], im[j][k], c.re[k], c.im[k], c.high[k], c.low[k], times[j]);
            assertTrue(
                    error <= phases.errorBound(),
                    name + ": E=" + c.high[k] + "+" + c.low[k] + " t=" + times[j] + ": error " + error + " above "
                            + phases.errorBound());
        }
    }

    @Test
    void coefficientsKeepTheirBoundAtIrregularTimes() {
        Random random = new Random(SEED + 1);
        for (double largest : new double[] {1, 1e4, 1e9, 2e14, 1e15, 6e16}) {
            for (int round = 0; round < 4; round++) {
                Case c = Case.random(random, 1 + random.nextInt(600), largest);
                double[] times = random.doubles(30).map(t -> 2 * t - 1).toArray();
                ExactPhases phases = c.at(times);
                assertFalse(phases.onUniformGrid());
                boundHolds("up to " + largest, c, times, phases, random, 60);
            }
        }
    }

    @Test
    void coefficientsKeepTheirBoundOnUniformGrids() {
        Random random = new Random(SEED + 2);
        // To 1e11 or so the rounding of a stored time is corrected by series; beyond, each factor is made alone.
        for (double largest : new double[] {1e-3, 1e3, 1e5, 1e8, 1e10, 1e12, 1e15}) {
            for (int round = 0; round < 4; round++) {
                Case c = Case.random(random, 1 + random.nextInt(600), largest);
                int count = 12 + random.nextInt(1500);
                double start = round == 0 ? 0 : 0.4 * random.nextDouble();
                double step = (round == 3 ? -0.5 : 0.5) * (random.nextDouble() + 0.1) / count;
                double[] times = new double[count];
                Arrays.setAll(times, j -> start + j * step);
                ExactPhases phases = c.at(times);
                // Near 1e12 it depends on how the times happen to round.
                if (largest != 1e12) {
                    assertEquals(largest < 1e12, phases.onUniformGrid(), "up to " + largest);
                }
                boundHolds("uniform up to " + largest, c, times, phases, random, 60);
            }
        }
    }

    @Test
    void manyLevelsTakeTheirTablesInBlocks() {
        Random random = new Random(SEED + 3);
        Case c = Case.random(random, 5000, 1e4);
        double[] times = new double[100];
        Arrays.setAll(times, j -> j / 100.0);
        ExactPhases phases = c.at(times);
        assertTrue(phases.onUniformGrid());
        boundHolds("5000 levels", c, times, phases, random, 300);
    }

    @Test
    void rowsDoNotDependOnTheRangeAskedFor() {
        Random random = new Random(SEED + 4);
        Case c = Case.random(random, 300, 1e4);
        double[] times = new double[200];
        Arrays.setAll(times, j -> 0.01 * j);
        ExactPhases phases = c.at(times);
        double[][] re = new double[200][300];
        double[][] im = new double[200][300];
        phases.fill(0, 200, re, im);
        double[][] oneRe = new double[1][300];
        double[][] oneIm = new double[1][300];
        for (int j : new int[] {0, 1, 13, 14, 57, 199}) {
            phases.fill(j, j + 1, oneRe, oneIm);
            assertArrayEquals(re[j], oneRe[0]);
            assertArrayEquals(im[j], oneIm[0]);
        }
    }

    @Test
    void noLevelsAndNoTimesAreAllowed() {
        double[] none = {};
        ExactPhases phases = ExactPhases.of(none, none, none, none, new double[] {1, 2});
        phases.fill(0, 2, new double[2][0], new double[2][0]);
        assertEquals(0, phases.levels());
        double[] one = {1};
        assertEquals(0, ExactPhases.of(one, one, one, one, none).times());
    }

    @Test
    void refusesWhatItCannotReduce() {
        double[] one = {1};
        double[] zero = {0};
        double[] nan = {Double.NaN};
        assertThrows(IllegalArgumentException.class, () -> ExactPhases.of(nan, zero, one, zero, one));
        assertThrows(IllegalArgumentException.class, () -> ExactPhases.of(one, zero, nan, zero, one));
        assertThrows(IllegalArgumentException.class, () -> ExactPhases.of(one, zero, one, zero, nan));
        assertThrows(IllegalArgumentException.class, () -> ExactPhases.of(one, zero, one, new double[2], one));
        assertThrows(IllegalArgumentException.class, () -> ExactPhases.reduced(1, 0, Double.POSITIVE_INFINITY));
        String message = assertThrows(IllegalArgumentException.class, () -> ExactPhases.reduced(1e10, 0, 1e10))
                .getMessage();
        assertTrue(message.contains("1.0E20") && message.contains("shorten the time"), message);
        assertThrows(
                IllegalArgumentException.class,
                () -> ExactPhases.of(one, zero, one, zero, one).fill(0, 2, new double[2][1], new double[2][1]));
    }

    @Test
    void stopsWhenTheThreadIsInterrupted() {
        double[] one = {1};
        double[] zero = {0};
        ExactPhases phases = ExactPhases.of(one, zero, one, zero, one);
        Thread.currentThread().interrupt();
        assertThrows(CancellationException.class, () -> phases.fill(0, 1, new double[1][1], new double[1][1]));
        assertFalse(Thread.currentThread().isInterrupted());
    }
}
