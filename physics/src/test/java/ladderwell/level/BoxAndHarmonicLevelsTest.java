package ladderwell.level;

import static ladderwell.level.WellLevelsTest.says;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.math.BigDecimal;
import java.util.Random;
import ladderwell.state.FiftyDigits;
import org.junit.jupiter.api.Test;

class BoxAndHarmonicLevelsTest {
    @Test
    void boxEnergiesKeepTheirBound() {
        Random random = new Random(5);
        Levels box = Levels.box();
        BigDecimal unit = FiftyDigits.PI.multiply(FiftyDigits.PI).divide(BigDecimal.valueOf(2));
        for (int trial = 0; trial < 1000; trial++) {
            long n = trial < 10 ? trial : (long) Math.pow(10, 15 * random.nextDouble());
            BigDecimal exact = unit.multiply(BigDecimal.valueOf(n + 1).pow(2));
            BigDecimal value = new BigDecimal(box.energyHigh(n)).add(new BigDecimal(box.energyLow(n)));
            assertTrue(
                    value.subtract(exact).abs().compareTo(new BigDecimal(box.energyError(n))) <= 0,
                    "level " + n + " by " + value.subtract(exact).doubleValue());
        }
    }

    @Test
    void harmonicEnergiesAreExact() {
        Levels harmonic = Levels.harmonic();
        Random random = new Random(6);
        for (int trial = 0; trial < 1000; trial++) {
            long n = random.nextLong() >>> (2 + random.nextInt(62));
            BigDecimal value = new BigDecimal(harmonic.energyHigh(n)).add(new BigDecimal(harmonic.energyLow(n)));
            assertEquals(0, value.compareTo(BigDecimal.valueOf(n).add(new BigDecimal("0.5"))), "level " + n);
            assertEquals(0, harmonic.energyError(n));
        }
        assertEquals(Long.MAX_VALUE, harmonic.count());
    }

    @Test
    void boxWaveFunctionsKeepTheirBound() {
        Random random = new Random(7);
        Levels box = Levels.box();
        for (int trial = 0; trial < 1000; trial++) {
            long n = (long) Math.pow(10, 14 * random.nextDouble()) - 1;
            double x = random.nextDouble() - 0.5;
            double value = box.waveFunctions(n, 1, new double[] {x})[0][0];
            BigDecimal angle = FiftyDigits.PI
                    .multiply(BigDecimal.valueOf(n + 1))
                    .multiply(new BigDecimal(0.5).subtract(new BigDecimal(x)));
            BigDecimal exact =
                    FiftyDigits.cosSin(angle)[1].multiply(BigDecimal.valueOf(2).sqrt(FiftyDigits.DIGITS));
            double off = exact.subtract(new BigDecimal(value)).abs().doubleValue();
            assertTrue(off <= box.waveFunctionError(n), "level " + n + ", x " + x + ": off " + off);
        }
    }

    @Test
    void boxWaveFunctionsVanishFromTheWallsOutward() {
        double[][] table = Levels.box().waveFunctions(0, 3, new double[] {-0.5, 0.5, 0.7, -3, 0.4999});
        for (double[] row : table) {
            for (int i = 0; i < 4; i++) {
                assertEquals(0, row[i]);
            }
            assertTrue(row[4] > 0);
        }
    }

    @Test
    void harmonicWaveFunctionsAreTheHermiteFunctions() {
        double[][] table = Levels.harmonic().waveFunctions(0, 3, new double[] {0, 1.5});
        double quarter = Math.pow(Math.PI, -0.25);
        assertEquals(quarter, table[0][0], 1e-14);
        assertEquals(Math.sqrt(2) * 1.5 * quarter * Math.exp(-1.125), table[1][1], 1e-14);
        assertEquals((2 * 2.25 - 1) / Math.sqrt(2) * quarter * Math.exp(-1.125), table[2][1], 1e-14);
    }

    @Test
    void harmonicReachBoundsTheTail() {
        Levels harmonic = Levels.harmonic();
        for (long n : new long[] {0, 1, 2, 10, 100, 5000, 1_000_000}) {
            for (double drop : new double[] {1, 0.1, 1e-4, 1e-9, 1e-12}) {
                double reach = harmonic.reach(n, drop);
                double[] beyond = {reach, 1.001 * reach, -reach, 1.1 * reach};
                for (double value : harmonic.waveFunctions(n, 1, beyond)[0]) {
                    assertTrue(
                            Math.abs(value) <= drop + harmonic.waveFunctionError(n), "level " + n + ", drop " + drop);
                }
                // Of use: an Airy tail of 1e-12 ends within 9 n^(−1/6) of the turning point, the ground state's within
                // 8.
                assertTrue(reach <= Math.sqrt(2 * n + 1) + 9, "level " + n + " reaches " + reach);
            }
        }
    }

    @Test
    void unboundedLevelsHaveNoThreshold() {
        for (Levels levels : new Levels[] {Levels.box(), Levels.harmonic()}) {
            assertEquals(Double.POSITIVE_INFINITY, levels.threshold());
            assertEquals(Double.POSITIVE_INFINITY, levels.binding(3));
            assertEquals(Double.POSITIVE_INFINITY, levels.decay(3));
            assertEquals(0, levels.decayError(3));
        }
        assertEquals(0.5, Levels.box().reach(4, 1e-9));
    }

    @Test
    void badArgumentsAreNamed() {
        says("levels count from 0", () -> Levels.box().energyHigh(-1));
        says("up to n = 1e15", () -> Levels.box().energyHigh(2_000_000_000_000_000L));
        says("levels count from 0", () -> Levels.harmonic().energyHigh(-5));
        says("up to n = 1000000, got 1000001", () -> Levels.harmonic().waveFunctions(1_000_000, 2, new double[1]));
        says("finite positions", () -> Levels.harmonic().waveFunctions(0, 1, new double[] {Double.POSITIVE_INFINITY}));
        says("must be positive and finite", () -> Levels.harmonic().reach(0, -1));
    }
}
