package ladderwell.numeric;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.math.BigDecimal;
import java.math.MathContext;
import java.util.Random;
import org.junit.jupiter.api.Test;

class DoubleDoubleTest {
    /** Sums and products carry 104 bits or more, the quotient and the root a few units less: 2^-102. */
    private static final BigDecimal RELATIVE = new BigDecimal("2e-31");

    private static final MathContext WIDE = new MathContext(45);

    @Test
    void arithmeticIsRightToThirtyOneDigits() {
        Random random = new Random(1);
        for (int i = 0; i < 1_000; i++) {
            DoubleDouble a = any(random);
            DoubleDouble b = any(random);
            BigDecimal x = exact(a);
            BigDecimal y = exact(b);
            String place = "seed 1, case " + i + ": " + a + ", " + b;
            // A sum that cancels is right to 32 digits of its terms, not of itself.
            assertClose(x.add(y), a.plus(b), x.abs().add(y.abs()), place);
            assertClose(x.subtract(y), a.minus(b), x.abs().add(y.abs()), place);
            assertClose(x.multiply(y), a.times(b), x.multiply(y).abs(), place);
            assertClose(x.divide(y, WIDE), a.dividedBy(b), x.divide(y, WIDE).abs(), place);
            assertClose(
                    x.multiply(new BigDecimal(b.hi())),
                    a.times(b.hi()),
                    x.multiply(y).abs(),
                    place);
            assertClose(x.add(new BigDecimal(b.hi())), a.plus(b.hi()), x.abs().add(y.abs()), place);
            BigDecimal root = x.abs().sqrt(WIDE);
            assertClose(root, (a.hi() < 0 ? a.negated() : a).sqrt(), root, place);
        }
    }

    @Test
    void sumsAndProductsOfTwoDoublesAreExact() {
        Random random = new Random(2);
        for (int i = 0; i < 1_000; i++) {
            double a = any(random).hi();
            double b = any(random).hi();
            assertEquals(
                    0,
                    exact(DoubleDouble.sum(a, b)).compareTo(new BigDecimal(a).add(new BigDecimal(b))),
                    a + " + " + b);
            assertEquals(
                    0,
                    exact(DoubleDouble.product(a, b)).compareTo(new BigDecimal(a).multiply(new BigDecimal(b))),
                    a + " * " + b);
        }
    }

    @Test
    void constantsHaveThirtyTwoDigits() {
        // pi/2 and log 2 to 40 digits: common knowledge, checked with mpmath 1.2.1.
        assertClose(
                new BigDecimal("1.570796326794896619231321691639751442099"),
                DoubleDouble.QUARTER_TURN,
                BigDecimal.ONE,
                "quarter turn");
        assertClose(
                new BigDecimal("0.6931471805599453094172321214581765680755"),
                DoubleDouble.LN_2,
                BigDecimal.ONE,
                "log 2");
        assertEquals(0.0, DoubleDouble.ZERO.sqrt().value());
    }

    private static DoubleDouble any(Random random) {
        double hi = (random.nextDouble() - 0.5) * Math.scalb(1.0, random.nextInt(80) - 40);
        return DoubleDouble.sum(hi, hi * (random.nextDouble() - 0.5) * 0x1p-53);
    }

    private static BigDecimal exact(DoubleDouble value) {
        return new BigDecimal(value.hi()).add(new BigDecimal(value.lo()));
    }

    private static void assertClose(BigDecimal expected, DoubleDouble found, BigDecimal size, String place) {
        BigDecimal error = exact(found).subtract(expected).abs();
        assertTrue(error.compareTo(size.multiply(RELATIVE)) <= 0, place + ": error " + error.doubleValue());
        assertTrue(Math.abs(found.lo()) <= 0.5 * Math.ulp(found.hi()), place + ": not in order, " + found);
    }
}
