package ladderwell.state;

import static ladderwell.state.CoherentTest.says;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.math.BigDecimal;
import java.util.Random;
import org.junit.jupiter.api.Test;

class SuperpositionTest {
    @Test
    void levelsThreeApartMakeTwoSegmentsAndTwoApartMakeOne() {
        Amplitudes state = Amplitudes.superposition(
                new long[] {10, 0, 2, 7}, new double[] {1, 1, 0, 2}, new double[] {0, 0, 1, 0});
        assertEquals(3, state.segments());
        assertEquals(0, state.first(0));
        assertEquals(3, state.length(0));
        assertEquals(0, state.re(0, 1));
        assertEquals(7, state.first(1));
        assertEquals(10, state.first(2));
        assertEquals(5, state.levels());
        assertEquals(1 / Math.sqrt(7), state.im(0, 2), 2e-16);
        assertEquals(2 / Math.sqrt(7), state.re(1, 0), 2e-16);
    }

    @Test
    void oneLevelIsExact() {
        Amplitudes state = Amplitudes.superposition(new long[] {3}, new double[] {0}, new double[] {-0.7});
        assertEquals(-1, state.im(0, 0));
        assertEquals(0, state.normError());
        assertEquals(1, Amplitudes.level(Long.MAX_VALUE).re(0, 0));
    }

    @Test
    void distanceFromTheNormalisedStateStaysBelowTheNormError() {
        Random random = new Random(77);
        for (int trial = 0; trial < 1000; trial++) {
            int terms = 1 + random.nextInt(40);
            long[] levels = new long[terms];
            double[] re = new double[terms];
            double[] im = new double[terms];
            double scale = Math.pow(10, -300 + 600 * random.nextDouble());
            BigDecimal sum = BigDecimal.ZERO;
            for (int i = 0; i < terms; i++) {
                levels[i] = (i == 0 ? 0 : levels[i - 1] + 1) + random.nextInt(4);
                re[i] = scale * random.nextGaussian() * Math.pow(10, -5 * random.nextDouble());
                im[i] = scale * random.nextGaussian();
                sum = sum.add(square(re[i])).add(square(im[i]));
            }
            Amplitudes state = Amplitudes.superposition(levels, re, im);
            BigDecimal norm = sum.sqrt(FiftyDigits.DIGITS);
            double distance = 0;
            for (int s = 0, i = 0; s < state.segments(); s++) {
                for (int j = 0; j < state.length(s); j++) {
                    boolean term = i < terms && levels[i] == state.first(s) + j;
                    double offRe = term ? off(state.re(s, j), re[i], norm) : state.re(s, j);
                    double offIm = term ? off(state.im(s, j), im[i], norm) : state.im(s, j);
                    distance += offRe * offRe + offIm * offIm;
                    i += term ? 1 : 0;
                }
            }
            assertTrue(Math.sqrt(distance) <= state.normError(), "trial " + trial + ": " + Math.sqrt(distance));
        }
    }

    private static BigDecimal square(double w) {
        return FiftyDigits.of(w).multiply(FiftyDigits.of(w));
    }

    private static double off(double value, double weight, BigDecimal norm) {
        return FiftyDigits.of(value)
                .subtract(FiftyDigits.of(weight).divide(norm, FiftyDigits.DIGITS))
                .doubleValue();
    }

    @Test
    void badSuperpositionsAreNamed() {
        says(
                "level 4 appears twice",
                () -> Amplitudes.superposition(new long[] {4, 4}, new double[2], new double[] {1, 1}));
        says(
                "all weights of the superposition are zero",
                () -> Amplitudes.superposition(new long[] {4}, new double[1], new double[1]));
        says(
                "level -2 does not exist",
                () -> Amplitudes.superposition(new long[] {-2}, new double[] {1}, new double[1]));
        says("level -1 does not exist", () -> Amplitudes.level(-1));
        says("got 2 levels, 1 real", () -> Amplitudes.superposition(new long[] {1, 2}, new double[1], new double[2]));
        says("at least one level", () -> Amplitudes.superposition(new long[0], new double[0], new double[0]));
        says(
                "weight of level 1 is not a finite number",
                () -> Amplitudes.superposition(new long[] {1}, new double[] {Double.NaN}, new double[1]));
    }
}
