package ladderwell.numeric;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.math.BigDecimal;
import java.math.MathContext;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

class DoubleDoubleFunctionsTest {
    private static final MathContext DIGITS = new MathContext(80);

    private static BigDecimal exact(DoubleDouble x) {
        return new BigDecimal(x.hi()).add(new BigDecimal(x.lo()));
    }

    /** Σ x^k/k! with the signs of a cosine (every second term from 0) or a sine (from 1), or all terms. */
    private static BigDecimal series(BigDecimal x, int from, int step, boolean alternating) {
        BigDecimal sum = BigDecimal.ZERO;
        BigDecimal term = BigDecimal.ONE;
        for (int k = 0; k < 400; k++) {
            if (k >= from && (k - from) % step == 0) {
                boolean minus = alternating && (k - from) / step % 2 == 1;
                sum = minus ? sum.subtract(term, DIGITS) : sum.add(term, DIGITS);
            }
            term = term.multiply(x, DIGITS).divide(BigDecimal.valueOf(k + 1), DIGITS);
        }
        return sum;
    }

    private static void assertNear(BigDecimal expected, DoubleDouble actual, double relative) {
        double gap = expected.subtract(exact(actual)).abs().doubleValue();
        assertTrue(
                gap <= relative * Math.max(1e-300, Math.abs(expected.doubleValue())),
                "off by " + gap + " of " + actual);
    }

    @Test
    void functionsHaveThirtyDigits() {
        SplittableRandom random = new SplittableRandom(6);
        for (int trial = 0; trial < 200; trial++) {
            double x = random.nextDouble(-20, 20) * (trial % 3 == 0 ? 1e-3 : 1);
            BigDecimal big = new BigDecimal(x);
            assertNear(series(big, 0, 1, false), DoubleDoubleFunctions.exp(DoubleDouble.of(x)), 1e-29);
            DoubleDoubleFunctions.Pair hyperbolic = DoubleDoubleFunctions.coshSinh(x);
            assertNear(series(big, 0, 2, false), hyperbolic.first(), 1e-29);
            assertNear(series(big, 1, 2, false), hyperbolic.second(), 1e-29);
            DoubleDoubleFunctions.Pair round = DoubleDoubleFunctions.cosSin(DoubleDouble.of(x));
            assertEquals(
                    0, series(big, 0, 2, true).subtract(exact(round.first())).doubleValue(), 1e-30);
            assertEquals(
                    0, series(big, 1, 2, true).subtract(exact(round.second())).doubleValue(), 1e-30);
        }
        assertEquals(0, DoubleDoubleFunctions.coshSinh(0).second().value());
    }

    @Test
    void whatIsOutOfRangeIsRefused() {
        assertThrows(IllegalArgumentException.class, () -> DoubleDoubleFunctions.exp(DoubleDouble.of(701)));
        assertThrows(IllegalArgumentException.class, () -> DoubleDoubleFunctions.exp(DoubleDouble.of(Double.NaN)));
        assertThrows(IllegalArgumentException.class, () -> DoubleDoubleFunctions.cosSin(DoubleDouble.of(2e15)));
    }
}
