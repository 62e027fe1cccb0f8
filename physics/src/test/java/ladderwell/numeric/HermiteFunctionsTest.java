package ladderwell.numeric;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.BufferedReader;
import java.io.IOException;
import java.io.InputStreamReader;
import java.io.UncheckedIOException;
import java.math.BigDecimal;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Objects;
import java.util.Random;
import org.junit.jupiter.api.Test;

/** References: hermite_reference.csv (40 digits, made by hermite_reference.py beside the tests) and 60-digit decimals made here. */
class HermiteFunctionsTest {
    /** Values that come straight from the phase function; the worst seen is 1e-16. */
    private static final double PHASE_ERROR = 3e-16;

    private record Reference(int n, double x, BigDecimal phi) {}

    @Test
    void singleFunctionsMeetTheReferences() {
        List<Reference> references = references();
        assertTrue(references.size() > 1500, "only " + references.size() + " references read");
        for (Reference r : references) {
            double found = HermiteFunctions.single(r.n, new double[] {r.x})[0];
            double allowed = r.n < PhaseFunction.FIRST_INDEX ? HermiteFunctions.errorBound(r.n) : PHASE_ERROR;
            assertWithin(allowed, r.phi, found, "n " + r.n + " x " + r.x);
        }
    }

    @Test
    void tailsKeepTheirRelativeErrorAndAreZeroOnlyBelowTheSmallest() {
        int deep = 0;
        for (Reference r : references()) {
            if (Math.abs(r.x) < Math.sqrt(2.0 * r.n + 1.0) || r.phi.abs().compareTo(new BigDecimal("1e-300")) < 0) {
                continue;
            }
            double found = HermiteFunctions.single(r.n, new double[] {r.x})[0];
            // Below 512 the recurrence rounds n times; above, the exponent of the tail is kept to 1e-16 whatever its
            // size.
            double allowed = r.n < PhaseFunction.FIRST_INDEX ? 1e-14 : 2e-15;
            assertWithin(allowed * Math.abs(r.phi.doubleValue()), r.phi, found, "n " + r.n + " x " + r.x);
            if (Math.abs(found) < 1e-100) {
                deep++;
            }
        }
        assertTrue(deep > 20, "only " + deep + " deep points");
    }

    @Test
    void windowsMeetTheReferencesOnBothSides() {
        List<Reference> references = references();
        int i = 0;
        while (i < references.size()) {
            int j = i;
            while (j + 1 < references.size()
                    && references.get(j + 1).x == references.get(i).x
                    && references.get(j + 1).n > references.get(j).n) {
                j++;
            }
            int first = references.get(i).n;
            int last = references.get(j).n;
            double x = references.get(i).x;
            double[][] table = HermiteFunctions.window(first, last - first + 1, new double[] {x, -x});
            for (Reference r : references.subList(i, j + 1)) {
                String place = "window " + first + ".." + last + " n " + r.n + " x " + x;
                double bound = HermiteFunctions.errorBound(r.n);
                assertWithin(bound, r.phi, table[r.n - first][0], place);
                assertWithin(bound, r.n % 2 == 0 ? r.phi : r.phi.negate(), table[r.n - first][1], place + " mirrored");
            }
            i = j + 1;
        }
    }

    @Test
    void boundHoldsOnSeededCasesAgainstSixtyDigits() {
        Random random = new Random(20260711);
        int cases = 0;
        for (int trial = 0; trial < 90; trial++) {
            int highest = trial % 10 == 9 ? 4000 + random.nextInt(4000) : 40 + random.nextInt(1200);
            double reach = Math.sqrt(2.0 * highest + 1.0) + 3.0;
            double x = reach * (2.0 * random.nextDouble() - 1.0);
            int lowest = random.nextInt(highest);
            double[][] table = HermiteFunctions.window(lowest, highest - lowest + 1, new double[] {x});
            SixtyDigitLadder ladder = new SixtyDigitLadder(x);
            int n = lowest;
            while (n <= highest) {
                BigDecimal exact = ladder.at(n);
                String place = "trial " + trial + " window " + lowest + ".." + highest + " n " + n + " x " + x;
                assertWithin(HermiteFunctions.errorBound(highest), exact, table[n - lowest][0], place);
                double alone = HermiteFunctions.single(n, new double[] {x})[0];
                assertWithin(
                        n < PhaseFunction.FIRST_INDEX ? HermiteFunctions.errorBound(n) : PHASE_ERROR,
                        exact,
                        alone,
                        place + " alone");
                cases++;
                n += 1 + random.nextInt(Math.max(1, (highest - lowest) / 10));
            }
        }
        assertTrue(cases >= 1000, "only " + cases + " cases");
    }

    @Test
    void climbingAWindowAgreesWithTheLevelsItPasses() {
        Random random = new Random(7);
        for (int first : new int[] {0, 511, 512, 3000, 60_000, 998_500}) {
            int count = 1501;
            double low = Math.sqrt(2.0 * first + 1.0);
            double high = Math.sqrt(2.0 * (first + count) + 1.0);
            double[] x = random.doubles(300)
                    .map(u -> low - 3.0 + (high - low + 4.0) * u)
                    .toArray();
            double[][] table = HermiteFunctions.window(first, count, x);
            for (int n = Math.max(512, first); n < first + count; n += 37) {
                double[] alone = HermiteFunctions.single(n, x);
                for (int j = 0; j < x.length; j++) {
                    double bound = HermiteFunctions.errorBound(n);
                    assertEquals(
                            alone[j],
                            table[n - first][j],
                            bound,
                            "window from " + first + " n " + n + " x " + x[j] + " seed 7");
                }
            }
        }
    }

    @Test
    void aStartThatUnderflowsIsReachedByHigherLevels() {
        // phi_0(45) is 1e-440; phi_900 oscillates there. phi_512(52) is 1e-217 and phi_1400 oscillates.
        double[] x = {45.0, -52.0};
        double[][] table = HermiteFunctions.window(0, 1401, x);
        assertEquals(0.0, table[0][0]);
        for (int j = 0; j < x.length; j++) {
            SixtyDigitLadder ladder = new SixtyDigitLadder(x[j]);
            for (int n = 100; n <= 1400; n += 50) {
                BigDecimal exact = ladder.at(n);
                double size = Math.abs(exact.doubleValue());
                double allowed = size > 1e-6 ? HermiteFunctions.errorBound(n) : size > 1e-300 ? 1e-13 * size : 1e-300;
                assertWithin(allowed, exact, table[n][j], "n " + n + " x " + x[j]);
            }
        }
        double[][] later = HermiteFunctions.window(512, 1000, x);
        assertWithin(
                HermiteFunctions.errorBound(1400),
                new SixtyDigitLadder(-52.0).at(1400),
                later[1400 - 512][1],
                "later start");
    }

    @Test
    void levelsAreOrthonormal() {
        for (int first : new int[] {0, 505, 20_000}) {
            int count = 16;
            double top = Math.sqrt(2.0 * (first + count) + 1.0);
            // Products of two levels hold no wave number above 2 top but for a tail exp(-(k - 2 top)^2/4); the
            // trapezium rule is exact for
            // wave numbers below 2 pi/step = 2 top + 12.
            double step = Math.PI / (top + 6.0);
            double[] x = grid(step, top + 10.0);
            double[][] phi = HermiteFunctions.window(first, count, x);
            for (int m = 0; m < count; m++) {
                for (int n = 0; n <= m; n++) {
                    double overlap = 0.0;
                    for (int j = 0; j < x.length; j++) {
                        overlap += phi[m][j] * phi[n][j] * step;
                    }
                    // Each value may be off by the bound, the other factor has a mean square of 1 over 2 top.
                    double allowed = 2.0 * HermiteFunctions.errorBound(first + count) * Math.sqrt(2.0 * top);
                    assertEquals(m == n ? 1.0 : 0.0, overlap, allowed, "levels " + (first + m) + ", " + (first + n));
                }
            }
        }
    }

    @Test
    void normAndSpreadOfLevelOneMillionAreRight() {
        int n = 1_000_000;
        double top = Math.sqrt(2.0 * n + 1.0);
        double step = 2.1e-3;
        double[] x = grid(step, top + 1.0);
        double[] phi = HermiteFunctions.single(n, x);
        double norm = 0.0;
        double square = 0.0;
        for (int j = 0; j < x.length; j++) {
            norm += phi[j] * phi[j] * step;
            square += x[j] * x[j] * phi[j] * phi[j] * step;
        }
        // 2.7 million terms summed plainly: rounding about 1e-16 sqrt(2.7e6), with room.
        assertEquals(1.0, norm, 2e-12);
        assertEquals(n + 0.5, square, 2e-12 * n);
    }

    @Test
    void mirroredPointsHaveTheParityOfTheLevel() {
        double[] x = new Random(3).doubles(200, 0.0, 60.0).toArray();
        double[] mirrored = Arrays.stream(x).map(v -> -v).toArray();
        for (int n : new int[] {0, 1, 30, 511, 512, 513, 1500}) {
            double[] right = HermiteFunctions.single(n, x);
            double[] left = HermiteFunctions.single(n, mirrored);
            for (int j = 0; j < x.length; j++) {
                assertEquals(n % 2 == 0 ? right[j] : -right[j], left[j], "n " + n + " x " + x[j]);
            }
        }
        assertEquals(0.0, HermiteFunctions.single(999_999, new double[] {0.0})[0]);
    }

    @Test
    void recurrenceHoldsAtOneMillion() {
        int n = 999_999;
        double mu = Math.sqrt(2.0 * n + 1.0);
        double[] x = new Random(11).doubles(3000, -mu - 0.5, mu + 0.5).toArray();
        double[] below = HermiteFunctions.single(n - 1, x);
        double[] at = HermiteFunctions.single(n, x);
        double[] above = HermiteFunctions.single(n + 1, x);
        for (int j = 0; j < x.length; j++) {
            double residual = Math.sqrt(n + 1.0) * above[j] - Math.sqrt(2.0) * x[j] * at[j] + Math.sqrt(n) * below[j];
            // Three values good to PHASE_ERROR and three products rounded once or twice, all times 1000 to 2000.
            assertEquals(0.0, residual / 2000.0, 2.0 * PHASE_ERROR, "x " + x[j]);
        }
    }

    @Test
    void slopeAtTheCentreFollowsFromTheLevelBelow() {
        // phi_n(0)^2 for even n is the central binomial weight C(n, n/2)/2^n over sqrt(pi), built here as a product.
        double weight = 1.0 / Math.sqrt(Math.PI);
        double[] centre = {0.0};
        for (int n = 2; n <= 5000; n += 2) {
            weight *= (n - 1.0) / n;
            double phi = HermiteFunctions.single(n, centre)[0];
            // The product rounds n times.
            assertEquals(weight, phi * phi, 1e-16 * n * weight + 1e-15, "n " + n);
            assertEquals(n % 4 == 0, phi > 0, "sign at n " + n);
        }
    }

    @Test
    void aPointDoesNotFeelItsNeighbours() {
        double[] x = new Random(5).doubles(1500, -70.0, 70.0).toArray();
        for (int first : new int[] {0, 300, 700}) {
            double[][] all = HermiteFunctions.window(first, 1200, x);
            for (int j = 0; j < x.length; j += 97) {
                double[][] alone = HermiteFunctions.window(first, 1200, new double[] {x[j]});
                for (int k = 0; k < 1200; k += 13) {
                    assertEquals(alone[k][0], all[k][j], "level " + (first + k) + " x " + x[j]);
                }
            }
        }
    }

    @Test
    void tableMayBePaddedOrReused() {
        double[] x = {-3.0, 0.5, 41.0, 12.0};
        for (int first : new int[] {0, 40, 600}) {
            double[][] plain = HermiteFunctions.window(first, 700, x);
            double[][] padded = HermiteFunctions.window(first, 700, x, 6);
            double[][] reused = new double[700][5];
            for (double[] row : reused) {
                Arrays.fill(row, 99.0);
            }
            HermiteFunctions.window(first, x, reused);
            for (int k = 0; k < 700; k++) {
                assertArrayEquals(Arrays.copyOf(plain[k], 6), padded[k]);
                assertArrayEquals(plain[k], Arrays.copyOf(reused[k], 4));
                assertEquals(99.0, reused[k][4]);
            }
        }
        assertEquals(0, HermiteFunctions.window(3, 2, new double[0])[1].length);
    }

    @Test
    void infinitelyFarPointsGiveZero() {
        double[] x = {Double.POSITIVE_INFINITY, Double.NEGATIVE_INFINITY, 1e300, -1e9, 1460.0};
        for (int n : new int[] {0, 7, 511, 512, 1_000_000}) {
            for (double value : HermiteFunctions.single(n, x)) {
                assertEquals(0.0, Math.abs(value), "n " + n);
            }
        }
        assertEquals(0.0, HermiteFunctions.window(0, 1100, x)[1099][0]);
        assertNotEquals(0.0, HermiteFunctions.single(1_000_000, new double[] {1414.9})[0]);
    }

    @Test
    void badInputIsRefusedInOneSentence() {
        double[] x = {0.0, Double.NaN, 1.0};
        double[] good = {0.0};
        assertRefused("-1", () -> HermiteFunctions.single(-1, good));
        assertRefused("1000001", () -> HermiteFunctions.single(1_000_001, good));
        assertRefused("1000000", () -> HermiteFunctions.window(999_999, 3, good));
        assertRefused("at least 1 level", () -> HermiteFunctions.window(5, 0, good));
        assertRefused("1000000", () -> HermiteFunctions.window(5, Integer.MAX_VALUE, good));
        assertRefused("point 1 of 3", () -> HermiteFunctions.window(5, 2, x));
        assertRefused("row length 2", () -> HermiteFunctions.window(0, 2, new double[3], 2));
        assertRefused("row length 2", () -> HermiteFunctions.window(0, new double[3], new double[2][2]));
        assertRefused("at least 1 level", () -> HermiteFunctions.window(0, good, new double[0][]));
        assertRefused("-3", () -> HermiteFunctions.errorBound(-3));
    }

    private static void assertRefused(String named, Runnable call) {
        String message = assertThrows(IllegalArgumentException.class, call::run).getMessage();
        assertTrue(message.contains(named), message);
        assertTrue(!message.contains("\n") && message.length() < 140, message);
    }

    private static void assertWithin(double allowed, BigDecimal exact, double found, String place) {
        double error = new BigDecimal(found).subtract(exact).abs().doubleValue();
        if (!(error <= allowed)) {
            throw new AssertionError(
                    place + ": found " + found + ", exact " + exact + ", error " + error + " above " + allowed);
        }
    }

    private static double[] grid(double step, double end) {
        int half = (int) Math.ceil(end / step);
        double[] x = new double[2 * half + 1];
        Arrays.setAll(x, j -> step * (j - half));
        return x;
    }

    private static List<Reference> references() {
        List<Reference> references = new ArrayList<>();
        try (BufferedReader reader = new BufferedReader(new InputStreamReader(
                Objects.requireNonNull(HermiteFunctionsTest.class.getResourceAsStream("hermite_reference.csv")),
                StandardCharsets.UTF_8))) {
            String line = reader.readLine();
            while (line != null) {
                if (!line.startsWith("#")) {
                    String[] field = line.split(",");
                    references.add(new Reference(
                            Integer.parseInt(field[0]), Double.parseDouble(field[1]), new BigDecimal(field[2])));
                }
                line = reader.readLine();
            }
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
        return references;
    }
}
