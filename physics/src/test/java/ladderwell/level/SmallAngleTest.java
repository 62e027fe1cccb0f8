package ladderwell.level;

import static org.junit.jupiter.api.Assertions.assertTrue;

import java.math.BigDecimal;
import java.util.Random;
import ladderwell.numeric.DoubleDouble;
import ladderwell.state.FiftyDigits;
import org.junit.jupiter.api.Test;

class SmallAngleTest {
    @Test
    void sineAndVersineAreRightToTheClaimedDigits() {
        Random random = new Random(3);
        for (int trial = 0; trial < 1000; trial++) {
            double high = 0.8 * (trial % 2 == 0 ? random.nextDouble() : Math.pow(10, -8 * random.nextDouble()));
            DoubleDouble x = DoubleDouble.sum(high, high * 0x1p-54 * (2 * random.nextDouble() - 1));
            BigDecimal[] turn = FiftyDigits.cosSin(exact(x));
            close(SmallAngle.sine(x), turn[1], 0x1p-100, x);
            // Twice the relative error of the sine of half the angle, and its square.
            close(SmallAngle.versine(x), BigDecimal.ONE.subtract(turn[0]), 0x1p-98, x);
        }
    }

    private static BigDecimal exact(DoubleDouble x) {
        return new BigDecimal(x.hi()).add(new BigDecimal(x.lo()));
    }

    private static void close(DoubleDouble value, BigDecimal exact, double relative, DoubleDouble x) {
        double off =
                exact(value).subtract(exact).divide(exact, FiftyDigits.DIGITS).doubleValue();
        assertTrue(Math.abs(off) <= relative, x + ": relative error " + off);
    }
}
