package ladderwell.level;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.math.BigDecimal;
import java.math.MathContext;
import java.util.Random;
import ladderwell.state.FiftyDigits;
import org.junit.jupiter.api.Test;

class WellLevelsTest {
    private static final MathContext DIGITS = FiftyDigits.DIGITS;
    private static final BigDecimal TWO = BigDecimal.valueOf(2);

    /** Ground energy of the box of the same width. */
    private static final double BOX_GROUND = Math.PI * Math.PI / 2;

    @Test
    void levelsAreThePublishedOnes() {
        // Reference rows S-FSW-01 to S-FSW-03: depth 8 ground energies of the box; finite square well, Barker et al.,
        // Am. J. Phys. 59
        // (1991) 1038. The depth itself is rounded to double, which moves the ratio by less than an ulp.
        Levels well = Levels.finiteWell(8 * BOX_GROUND);
        assertEquals(3, well.count());
        double[] published = {0.6628034136891765, 2.603461128122489, 5.608649434860538};
        for (int n = 0; n < 3; n++) {
            assertEquals(published[n], well.energyHigh(n) / BOX_GROUND, 4e-16 * published[n]);
        }
        // Common practice, no source.
        assertEquals(0.663, well.energyHigh(0) / BOX_GROUND, 5e-4);
        assertEquals(2.603, well.energyHigh(1) / BOX_GROUND, 5e-4);
        assertEquals(5.609, well.energyHigh(2) / BOX_GROUND, 5e-4);
    }

    @Test
    void enclosuresHoldTheExactLevelOnRandomWells() {
        Random random = new Random(4711);
        double worst = 0;
        for (int trial = 0; trial < 1000; trial++) {
            double depth = Math.pow(10, -10 + 24 * random.nextDouble());
            if (trial % 4 == 0) {
                // Just above or below the depth at which one more level is bound.
                long m = 1 + random.nextInt(2000);
                double threshold = BOX_GROUND * m * m;
                depth = threshold * (1 + (random.nextBoolean() ? 1 : -1) * Math.pow(10, -15 + 6 * random.nextDouble()));
            }
            Levels well = Levels.finiteWell(depth);
            checkCount(depth, well.count());
            long top = well.count() - 1;
            long[] sampled = {top, (long) (random.nextDouble() * top)};
            for (long n : sampled) {
                worst = Math.max(worst, well.energyError(n) / well.energyHigh(n));
                checkEnclosure(depth, well, n);
            }
        }
        // What the class promises: double-double throughout.
        assertTrue(worst < 1e-28, "worst relative energy error " + worst);
    }

    /** Level n is there just when n² π²/2 is below the depth. */
    private static void checkCount(double depth, long count) {
        BigDecimal unit = FiftyDigits.PI.multiply(FiftyDigits.PI).divide(TWO);
        BigDecimal last = unit.multiply(BigDecimal.valueOf(count - 1).pow(2));
        BigDecimal next = unit.multiply(BigDecimal.valueOf(count).pow(2));
        BigDecimal exact = new BigDecimal(depth);
        assertTrue(last.compareTo(exact) < 0 && exact.compareTo(next) < 0, "depth " + depth + ", " + count + " levels");
    }

    private static void checkEnclosure(double depth, Levels well, long n) {
        String at = "depth " + depth + ", level " + n;
        BigDecimal rim = new BigDecimal(depth).divide(TWO).sqrt(DIGITS);
        BigDecimal energy = new BigDecimal(well.energyHigh(n)).add(new BigDecimal(well.energyLow(n)));
        BigDecimal error = new BigDecimal(well.energyError(n));
        assertTrue(phase(energy.subtract(error), rim, n).signum() < 0, at + " lies lower");
        BigDecimal above = energy.add(error);
        assertTrue(
                above.compareTo(new BigDecimal(depth)) > 0
                        || phase(above, rim, n).signum() > 0,
                at + " lies higher");
        BigDecimal decay = new BigDecimal(well.decay(n));
        BigDecimal slack = decay.multiply(new BigDecimal(well.decayError(n)));
        assertTrue(decayPhase(decay.subtract(slack), rim, n).signum() > 0, at + ": decays slower");
        assertTrue(decayPhase(decay.add(slack), rim, n).signum() < 0, at + ": decays faster");
        assertTrue(well.decayError(n) < 1e-13, at + ": decay error " + well.decayError(n));
    }

    /** z + asin(z/z₀) − (n+1) π/2 at E = 2z²: negative below level n, positive above. */
    private static BigDecimal phase(BigDecimal energy, BigDecimal rim, long n) {
        BigDecimal z = energy.divide(TWO).sqrt(DIGITS);
        BigDecimal target = FiftyDigits.PI.multiply(BigDecimal.valueOf(n + 1)).divide(TWO);
        return z.add(FiftyDigits.asin(z.divide(rim, DIGITS))).subtract(target);
    }

    /** z₀ cos β − β − nπ/2 at κ = 2 z₀ sin β: falls with κ. */
    private static BigDecimal decayPhase(BigDecimal decay, BigDecimal rim, long n) {
        BigDecimal sine = decay.divide(TWO.multiply(rim), DIGITS);
        BigDecimal beta = FiftyDigits.asin(sine);
        BigDecimal cosine = BigDecimal.ONE.subtract(sine.multiply(sine)).sqrt(DIGITS);
        BigDecimal below = FiftyDigits.PI.multiply(BigDecimal.valueOf(n)).divide(TWO);
        return rim.multiply(cosine).subtract(beta).subtract(below);
    }

    @Test
    void aVeryShallowWellHoldsOneLevelBoundByHalfTheSquareOfItsDepth() {
        Levels well = Levels.finiteWell(1e-10);
        assertEquals(1, well.count());
        // κ = V₀ (1 − 2V₀/3·… ): the weak-binding limit κ → V₀ L; corrections are of relative order V₀.
        assertEquals(1e-10, well.decay(0), 1e-19);
        assertEquals(5e-21, well.binding(0), 1e-30);
        assertEquals(1e-10, well.energyHigh(0), 1e-19);
        Levels faintest = Levels.finiteWell(1e-100);
        assertEquals(1, faintest.decay(0) * 1e100, 1e-15);
    }

    @Test
    void aVeryDeepWellIsLazyAndTendsToTheBox() {
        Levels well = Levels.finiteWell(1e24);
        Levels box = Levels.box();
        assertTrue(well.count() > 450_000_000_000L);
        // E = E_box / (1 + 2/k₀)² up to k²/k₀³: 2/k₀ = 1.4e-12.
        for (long n = 0; n < 4; n++) {
            assertEquals(1 - 4 / Math.sqrt(2e24), well.energyHigh(n) / box.energyHigh(n), 1e-15);
        }
        assertTrue(well.energyHigh(well.count() - 1) < 1e24);
    }

    @Test
    void levelsRiseAndStayBelowTheRim() {
        Levels well = Levels.finiteWell(5e5);
        double before = 0;
        for (long n = 0; n < well.count(); n++) {
            assertTrue(well.energyHigh(n) > before && well.energyHigh(n) < well.threshold());
            assertTrue(well.energyHigh(n) < Levels.box().energyHigh(n));
            assertEquals(well.threshold() - well.energyHigh(n), well.binding(n), 2e-10);
            before = well.energyHigh(n);
        }
    }

    @Test
    void waveFunctionsKeepTheirBoundOnRandomCases() {
        Random random = new Random(12);
        for (int trial = 0; trial < 300; trial++) {
            double depth = Math.pow(10, -3 + 12 * random.nextDouble());
            Levels well = Levels.finiteWell(depth);
            long n = (long) (random.nextDouble() * well.count());
            double x = (random.nextDouble() - 0.5) * (random.nextInt(4) == 0 ? 1.1 : 1);
            double value = well.waveFunctions(n, 1, new double[] {x})[0][0];
            BigDecimal exact = exactWave(depth, well, n, x);
            double off = new BigDecimal(value).subtract(exact).abs().doubleValue();
            assertTrue(off <= well.waveFunctionError(n), "depth " + depth + ", n " + n + ", x " + x + ": off " + off);
        }
    }

    private static BigDecimal exactWave(double depth, Levels well, long n, double x) {
        // The energy is known to 1e-28, far below what is tested here.
        BigDecimal energy = new BigDecimal(well.energyHigh(n)).add(new BigDecimal(well.energyLow(n)));
        BigDecimal k = energy.multiply(TWO).sqrt(DIGITS);
        BigDecimal kappa = new BigDecimal(depth).subtract(energy).multiply(TWO).sqrt(DIGITS);
        BigDecimal amplitude =
                TWO.multiply(kappa).divide(kappa.add(TWO), DIGITS).sqrt(DIGITS);
        BigDecimal at = new BigDecimal(Math.max(-0.5, Math.min(0.5, x)));
        BigDecimal angle =
                FiftyDigits.PI.multiply(BigDecimal.valueOf(n + 1)).divide(TWO).subtract(k.multiply(at));
        BigDecimal inside = amplitude.multiply(FiftyDigits.cosSin(angle)[1]);
        BigDecimal out = new BigDecimal(x).abs().subtract(new BigDecimal("0.5")).max(BigDecimal.ZERO);
        BigDecimal exponent = kappa.multiply(out);
        return exponent.doubleValue() > 600 ? BigDecimal.ZERO : inside.multiply(FiftyDigits.exp(exponent.negate()));
    }

    @Test
    void waveFunctionsHaveTheirParityAndArePositiveBeyondTheLastZero() {
        Levels well = Levels.finiteWell(300);
        double[] x = {-0.7, -0.5, -0.31, 0.31, 0.5, 0.7};
        double[][] table = well.waveFunctions(0, (int) well.count(), x);
        for (int n = 0; n < table.length; n++) {
            for (int i = 0; i < 3; i++) {
                assertEquals(n % 2 == 0 ? table[n][i] : -table[n][i], table[n][5 - i]);
            }
            assertTrue(table[n][4] > 0 && table[n][5] > 0);
        }
    }

    @Test
    void reachBoundsTheTail() {
        Levels well = Levels.finiteWell(300);
        for (long n = 0; n < well.count(); n++) {
            for (double drop : new double[] {1e-3, 1e-8, 1e-15}) {
                double reach = well.reach(n, drop);
                assertTrue(Math.abs(well.waveFunctions(n, 1, new double[] {reach})[0][0]) <= drop);
                assertTrue(Math.abs(well.waveFunctions(n, 1, new double[] {-reach * 1.01})[0][0]) <= drop);
            }
        }
    }

    @Test
    void badArgumentsAreNamed() {
        says("the depth of a finite well must be between", () -> Levels.finiteWell(0));
        says("got NaN", () -> Levels.finiteWell(Double.NaN));
        says("got -3.0", () -> Levels.finiteWell(-3));
        says("got Infinity", () -> Levels.finiteWell(Double.POSITIVE_INFINITY));
        Levels well = Levels.finiteWell(8 * BOX_GROUND);
        says("no level 3: its bound levels are 0 to 2", () -> well.energyHigh(3));
        says("no level -1", () -> well.decay(-1));
        says("the last level is 2", () -> well.waveFunctions(1, 3, new double[1]));
        says("levels count from 0", () -> well.waveFunctions(-1, 1, new double[1]));
        says("at least one level", () -> well.waveFunctions(0, 0, new double[1]));
        says("finite positions, got NaN", () -> well.waveFunctions(0, 1, new double[] {Double.NaN}));
        says("must be positive and finite, got 0.0", () -> well.reach(0, 0));
        says("level 1 appears twice", () -> well.elements(new long[] {1, 0, 1}));
        says("the last level is 2", () -> well.elements(new long[] {0, 3}));
    }

    static void says(String part, org.junit.jupiter.api.function.Executable call) {
        String message = assertThrows(IllegalArgumentException.class, call).getMessage();
        assertTrue(message.contains(part), message);
    }
}
