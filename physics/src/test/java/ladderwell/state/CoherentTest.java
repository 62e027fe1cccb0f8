package ladderwell.state;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.math.BigDecimal;
import java.util.Random;
import org.junit.jupiter.api.Test;

class CoherentTest {
    /** Rounding of one amplitude, relative to its size: what coherent() books in normError. */
    private static final double AMPLITUDE = PoissonWindow.RELATIVE_ERROR + ExactTurns.ERROR + 0x1p-53;

    @Test
    void amplitudesAndTailsKeepTheirBoundsOnRandomCases() {
        Random random = new Random(20260611);
        for (int trial = 0; trial < 1000; trial++) {
            double mean = Math.pow(10, -6 + 14 * random.nextDouble());
            double tolerance = Math.pow(10, -4 - 9 * random.nextDouble());
            double phase = (random.nextDouble() - 0.5) * 20;
            String at = "trial " + trial + ": mean " + mean + ", tolerance " + tolerance + ", phase " + phase;
            Amplitudes state = Amplitudes.coherent(mean, phase, tolerance);
            assertTrue(state.normError() <= tolerance, at);
            long first = state.first(0);
            long last = first + state.length(0) - 1;
            long peak = Math.max(first, Math.min(last, (long) mean));
            long[] sampled = {first, last, peak, first + (long) (random.nextDouble() * (last - first + 1))};
            for (long n : sampled) {
                BigDecimal root = FiftyDigits.poisson(mean, n).sqrt(FiftyDigits.DIGITS);
                BigDecimal[] turn = FiftyDigits.cosSin(FiftyDigits.of(phase).multiply(BigDecimal.valueOf(n)));
                double offRe = off(state.re(0, (int) (n - first)), root.multiply(turn[0]));
                double offIm = off(state.im(0, (int) (n - first)), root.multiply(turn[1]));
                assertTrue(
                        Math.hypot(offRe, offIm) <= AMPLITUDE * root.doubleValue(),
                        () -> at + ", level " + n + ": " + Math.hypot(offRe, offIm) / root.doubleValue());
            }
            checkTails(state, mean, first, last, at);
        }
    }

    private static double off(double value, BigDecimal exact) {
        return FiftyDigits.of(value).subtract(exact).abs().doubleValue();
    }

    /** Sums the discarded terms themselves, from the exact first one, until what follows is below 1e-12 of the sum. */
    private static void checkTails(Amplitudes state, double mean, long first, long last, String at) {
        double[] sums = new double[6];
        double weight = FiftyDigits.poisson(mean, last + 1).doubleValue();
        for (long n = last + 1; !spent(sums, weight, n, mean / (n + 1)); n++) {
            weight *= mean / (n + 1);
        }
        weight = first > 0 ? FiftyDigits.poisson(mean, first - 1).doubleValue() : 0;
        for (long n = first - 1; n >= 0 && !spent(sums, weight, n, n / mean); n--) {
            weight *= n / mean;
        }
        // The recurrence in double: at most 1e5 steps of 2 ulp.
        double sure = 1 - 1e-10;
        for (int k = 0; k < 5; k++) {
            assertTrue(sums[k] * sure <= state.tailMoment(k), at + ", moment " + k + ": " + sums[k]);
            // The bound is of use: within a factor of the truth (the geometric series at an edge 4 to 8 widths out).
            assertTrue(state.tailMoment(k) <= 4 * sums[k], at + ", moment " + k + " is loose");
        }
        assertTrue(sums[5] * sure <= state.tailSum(), at + ", sum " + sums[5] + " > " + state.tailSum());
        assertTrue(Math.sqrt(sums[0]) * sure <= state.normError(), at);
    }

    private static boolean spent(double[] sums, double weight, long n, double ratio) {
        double power = weight;
        for (int k = 0; k < 5; k++) {
            sums[k] += power;
            power *= n + 1;
        }
        double root = Math.sqrt(weight);
        sums[5] += root;
        return root <= 1e-12 * sums[5] * (1 - Math.sqrt(ratio));
    }

    @Test
    void distanceFromTheStateStaysBelowTheNormError() {
        Random random = new Random(8);
        for (int trial = 0; trial < 60; trial++) {
            double mean = Math.pow(10, -3 + 5 * random.nextDouble());
            double phase = 7 * random.nextDouble();
            Amplitudes state = Amplitudes.coherent(mean, phase, 1e-14);
            BigDecimal mu = FiftyDigits.of(mean);
            BigDecimal p = FiftyDigits.exp(mu.negate());
            double square = state.tailMoment(0);
            for (long n = 0; n < state.first(0) + state.length(0); n++) {
                if (n >= state.first(0)) {
                    int i = (int) (n - state.first(0));
                    BigDecimal root = p.sqrt(FiftyDigits.DIGITS);
                    BigDecimal[] turn = FiftyDigits.cosSin(FiftyDigits.of(phase).multiply(BigDecimal.valueOf(n)));
                    double offRe = off(state.re(0, i), root.multiply(turn[0]));
                    double offIm = off(state.im(0, i), root.multiply(turn[1]));
                    square += offRe * offRe + offIm * offIm;
                }
                p = p.multiply(mu, FiftyDigits.DIGITS).divide(BigDecimal.valueOf(n + 1), FiftyDigits.DIGITS);
            }
            assertTrue(Math.sqrt(square) <= state.normError(), "mean " + mean + ", phase " + phase);
        }
    }

    @Test
    void weightsAreThePublishedPoissonWeights() {
        // Reference rows S-COH-01 and S-COH-02: Poisson distribution; Glauber, Phys. Rev. 131 (1963) 2766. The rows
        // carry 16 digits.
        assertEquals(0.1953668148131646, weight(Amplitudes.coherent(4, 0.3, 1e-12), 4), 4e-16);
        assertEquals(0.3678794411714423, weight(Amplitudes.coherent(1, 0, 1e-12), 0), 8e-16);
    }

    private static double weight(Amplitudes state, long n) {
        int i = (int) (n - state.first(0));
        return state.re(0, i) * state.re(0, i) + state.im(0, i) * state.im(0, i);
    }

    @Test
    void normMeanAndVarianceAreThoseOfACoherentState() {
        for (double mean : new double[] {1e-6, 0.3, 1, 17.25, 64, 63.999, 1000.5, 1e5, 1e7}) {
            Amplitudes state = Amplitudes.coherent(mean, 1.25, 1e-13);
            double norm = 0;
            double offset = 0;
            double square = 0;
            for (int i = 0; i < state.length(0); i++) {
                double p = weight(state, state.first(0) + i);
                double d = state.first(0) + i - mean;
                norm += p;
                offset += p * d;
                square += p * d * d;
            }
            // Plain sums of up to 6e4 terms: a few 1e-15 relative, and the spread √mean as the scale of the offset.
            assertEquals(1, norm, 2e-14, "norm at " + mean);
            assertEquals(0, offset / Math.sqrt(mean), 2e-14, "mean at " + mean);
            assertEquals(1, square / mean, 5e-14, "variance at " + mean);
        }
    }

    @Test
    void windowGrowsAsTheRootOfTheMean() {
        long hundred = Amplitudes.coherent(1e2, 0, 1e-10).levels();
        long hundredMillion = Amplitudes.coherent(1e8, 0, 1e-10).levels();
        // √(1e8 / 1e2) = 1000; skewness moves the edges of the small window by a level or two of 188.
        assertTrue(
                Math.abs(hundredMillion - 1000 * hundred) <= 20 * hundred,
                hundredMillion + " levels against " + hundred);
    }

    @Test
    void vacuumIsOneLevelWithoutError() {
        Amplitudes state = Amplitudes.coherent(0, 2, 1e-10);
        assertEquals(1, state.levels());
        assertEquals(1, state.re(0, 0));
        assertEquals(0, state.im(0, 0));
        assertEquals(0, state.normError());
        assertEquals(0, state.tailMoment(4));
    }

    @Test
    void sameAmplitudesAtAnyTolerance() {
        Amplitudes wide = Amplitudes.coherent(250.5, 0.7, 1e-13);
        Amplitudes narrow = Amplitudes.coherent(250.5, 0.7, 1e-3);
        assertTrue(narrow.levels() < wide.levels());
        int shift = (int) (narrow.first(0) - wide.first(0));
        for (int i = 0; i < narrow.length(0); i++) {
            assertEquals(wide.re(0, i + shift), narrow.re(0, i));
        }
    }

    @Test
    void extremeArgumentsAreCarried() {
        assertEquals(2, Amplitudes.coherent(1e-3, 0, 1e-2).levels(), 1);
        Amplitudes tiny = Amplitudes.coherent(Double.MIN_VALUE, 1, 1e-12);
        assertEquals(1, tiny.levels());
        assertTrue(tiny.tailMoment(0) >= Double.MIN_VALUE);
        Amplitudes turned = Amplitudes.coherent(3, 1e15, 1e-12);
        assertTrue(turned.normError() <= 1e-12);
    }

    @Test
    void badArgumentsAreNamed() {
        says("mean quanta must be 0 or more, got -1.0", () -> Amplitudes.coherent(-1, 0, 1e-9));
        says("mean quanta must be 0 or more, got NaN", () -> Amplitudes.coherent(Double.NaN, 0, 1e-9));
        says("need about", () -> Amplitudes.coherent(1e13, 0, 1e-9));
        says("need about", () -> Amplitudes.coherent(Double.POSITIVE_INFINITY, 0, 1e-9));
        says("the phase must be an angle", () -> Amplitudes.coherent(1, Double.NaN, 1e-9));
        says("the phase must be an angle", () -> Amplitudes.coherent(1, Double.NEGATIVE_INFINITY, 1e-9));
        says("between 1e-14 and 0.1, got 0.0", () -> Amplitudes.coherent(1, 0, 0));
        says("between 1e-14 and 0.1, got NaN", () -> Amplitudes.coherent(1, 0, Double.NaN));
    }

    static void says(String part, org.junit.jupiter.api.function.Executable call) {
        String message = assertThrows(IllegalArgumentException.class, call).getMessage();
        assertTrue(message.contains(part), message);
    }
}
