package ladderwell.level;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotNull;
import static org.junit.jupiter.api.Assertions.assertNull;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Random;
import java.util.function.DoubleUnaryOperator;
import org.junit.jupiter.api.Test;

class HighLevelsTest {
    private static final double OPEN = Double.POSITIVE_INFINITY;

    private static double error(LevelSearch.Found found) {
        return found.rounding() + found.fit();
    }

    /** Level n alone and from a table, against e = 2E. */
    private static void assertLevel(double expected, PotentialCurve curve, long n) {
        HighLevels levels = new HighLevels(new CurveSurvey(curve));
        LevelSearch.Found alone = levels.one(n);
        HighLevels.Table table = levels.table(n - n / 8, n + n / 8);
        assertNotNull(alone, "level " + n + " alone");
        assertNotNull(table, "level " + n + " from a table");
        for (LevelSearch.Found found : new LevelSearch.Found[] {alone, table.level(n)}) {
            assertEquals(expected, found.e(), error(found), "level " + n);
            assertTrue(
                    error(found) <= 1e-13 * Math.abs(expected), "level " + n + " has the wide error " + error(found));
        }
        assertEquals(n, levels.below(expected * (1 - 1e-10), n));
        assertEquals(n + 1, levels.below(expected * (1 + 1e-10), n));
    }

    @Test
    void closedFormsAreMetAtAnyHeight() {
        for (long n : new long[] {150, 1000, 100_001, 10_000_000}) {
            assertLevel(2 * n + 1, Curves.even(x -> x * x / 2), n);
            assertLevel(2 * n + 1, Curves.open(x -> (x - 1) * (x - 1) / 2), n);
            double wave = Math.PI * (n + 1);
            assertLevel(wave * wave, Curves.between(-0.5, 0.5, x -> 0), n);
        }
        // Morse, Phys. Rev. 34 (1929) 57
        assertLevel(2 * Curves.morseLevel(1e5, 0.5, 300), Curves.morse(1e5, 0.5), 300);
    }

    @Test
    void aWallAndAKinkGiveTheZerosOfTheAiryFunction() {
        // DLMF 9.9.6 and 9.9.18: a_k = −T(3π(4k − 1)/8), T(t) ~ t^(2/3) (1 + 5/(48 t²) − 5/(36 t⁴) …).
        long n = 5000;
        double t = 3 * Math.PI * (4 * (n + 1) - 1) / 8;
        double zero = Math.pow(t, 2.0 / 3) * (1 + 5 / (48 * t * t));
        assertLevel(2 * zero / Math.cbrt(2), Curves.between(0, OPEN, x -> x), n);
        // Odd levels of |x| are those of the wall; a kink splits the parities, so only one alone is offered.
        HighLevels kink = new HighLevels(new CurveSurvey(Curves.even(Math::abs, 0)));
        LevelSearch.Found found = kink.one(2 * n + 1);
        assertNotNull(found);
        assertEquals(2 * zero / Math.cbrt(2), found.e(), error(found));
        assertNull(kink.table(5000, 6000));
    }

    @Test
    void theQuarticGoesOverIntoItsSemiclassicalSeries() {
        // E = c (n + ½)^(4/3) (1 + 1/(9π (n + ½)²) + …), c from level 1000 of our own recomputation with 64-bit
        // mantissas.
        double scale = 13774.252002055304 / (Math.pow(1000.5, 4.0 / 3) * (1 + 1 / (9 * Math.PI * 1000.5 * 1000.5)));
        for (long n : new long[] {20_000, 1_000_000}) {
            HighLevels levels = new HighLevels(new CurveSurvey(Curves.even(x -> x * x * x * x)));
            LevelSearch.Found found = levels.one(n);
            assertNotNull(found);
            double half = n + 0.5;
            double series = scale * Math.pow(half, 4.0 / 3) * (1 + 1 / (9 * Math.PI * half * half));
            // What the series itself leaves open at level 1000, of order n^−4.
            assertEquals(series, found.e() / 2, 2e-12 * series);
        }
    }

    @Test
    void randomWellsHaveTheLevelsOfTheShootingMesh() {
        Random random = new Random(Long.getLong("ladderwell.fuzz.seed", 1926));
        int offered = 0;
        int tables = 0;
        int cases = Integer.getInteger("ladderwell.fuzz.times", 1) * 40;
        for (int trial = 0; trial < cases; trial++) {
            double square = random.nextDouble() * 20 - 6;
            double fourth = Math.pow(10, -2 + 2.5 * random.nextDouble());
            double linear = random.nextGaussian();
            double wiggle = 5 * random.nextDouble();
            double bump = random.nextGaussian() * 30;
            double at = random.nextGaussian() * 2;
            double width = 0.15 + random.nextDouble();
            DoubleUnaryOperator v = x -> ((fourth * x * x + square) * x + linear) * x
                    + wiggle * Math.sin(3 * x)
                    + bump * Math.exp(-(x - at) * (x - at) / (width * width));
            CurveSurvey survey = new CurveSurvey(Curves.open(v));
            long n = (long) (130 * Math.pow(20, random.nextDouble()));
            HighLevels high = new HighLevels(survey);
            LevelSearch.Found found = high.one(n);
            HighLevels.Table table = high.table(n, 2 * n);
            LevelSearch search = new LevelSearch(survey, survey.energyOf(0.8 * n), 0);
            LevelSearch.Found expected = search.solve(n, survey.energyOf(n + 0.5), Double.NaN);
            double open = expected.rounding() + search.wave(n, expected).fitError();
            if (found != null) {
                offered++;
                assertEquals(expected.e(), found.e(), error(found) + open, "trial " + trial + ", level " + n);
            }
            if (table != null) {
                tables++;
                LevelSearch.Found listed = table.level(n);
                assertEquals(expected.e(), listed.e(), error(listed) + open, "trial " + trial + ", level " + n);
            }
        }
        // Where the potential changes within a wavelength there is no slow phase, and nothing is offered.
        assertTrue(offered > 0.5 * cases, "only " + offered + " levels were offered");
        assertTrue(tables > 0.4 * cases, "only " + tables + " tables were offered");
    }

    @Test
    void whatIsNoSingleWellIsLeftToTheMesh() {
        // Below the barrier, at a jump that is not declared, and at a singular end.
        HighLevels below = new HighLevels(new CurveSurvey(Curves.even(x -> x * x * x * x - 200 * x * x)));
        assertNull(below.one(150));
        HighLevels jump = new HighLevels(new CurveSurvey(Curves.open(x -> x * x + (x > 0.3 ? 5 : 0))));
        assertNull(jump.one(500));
        HighLevels singular = new HighLevels(new CurveSurvey(Curves.between(0, OPEN, x -> x * x + 1 / x)));
        assertNull(singular.one(500));
        Levels levels = Levels.of(Curves.open(x -> x * x + (x > 0.3 ? 5 : 0)));
        Levels declared = Levels.of(Curves.open(x -> x * x + (x > 0.3 ? 5 : 0), 0.3));
        for (long n : new long[] {200, 511, 512, 3000}) {
            double sum = levels.energyError(n) + declared.energyError(n);
            assertEquals(declared.energyHigh(n), levels.energyHigh(n), sum);
            assertTrue(sum < 1e-11 * levels.energyHigh(n));
        }
    }

    @Test
    void listsAndSinglesAgreeAcrossBands() {
        PotentialCurve curve = Curves.open(x -> Math.cosh(x) + x);
        double[] list = Levels.of(curve).energies(100, 500);
        Levels single = Levels.of(curve);
        for (int n = 100; n < 600; n += 37) {
            assertEquals(single.energyHigh(n), list[n - 100], 2 * single.energyError(n));
        }
        assertEquals(384, single.countBelow((list[283] + list[284]) / 2));
        for (int i = 1; i < list.length; i++) {
            assertTrue(list[i] > list[i - 1]);
        }
    }
}
