package ladderwell.numeric;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.math.BigDecimal;
import java.util.Random;
import org.junit.jupiter.api.Test;

class DecimalsTest {
    @Test
    void piHasItsKnownDigits() {
        // The first 50 digits after the point, common knowledge.
        assertTrue(Decimals.PI.toPlainString().startsWith("3.14159265358979323846264338327950288419716939937510"));
    }

    @Test
    void sineAndCosineKeepTheirIdentities() {
        Random random = new Random(11);
        for (int i = 0; i < 50; i++) {
            BigDecimal x = new BigDecimal((random.nextDouble() - 0.5) * Math.pow(10, random.nextInt(18)));
            BigDecimal s = Decimals.sin(x);
            BigDecimal c = Decimals.cos(x);
            assertEquals(0, Decimals.distance(s.multiply(s).add(c.multiply(c)), BigDecimal.ONE), 1e-60);
            BigDecimal twice = x.multiply(BigDecimal.valueOf(2));
            assertEquals(
                    0, Decimals.distance(Decimals.sin(twice), s.multiply(c).multiply(BigDecimal.valueOf(2))), 1e-60);
        }
    }

    @Test
    void agreesWithTheLibraryForSmallArguments() {
        for (double x = -3; x < 3; x += 0.37) {
            assertEquals(Math.sin(x), Decimals.sin(new BigDecimal(x)).doubleValue(), 2e-16);
            assertEquals(Math.cos(x), Decimals.cos(new BigDecimal(x)).doubleValue(), 2e-16);
        }
    }
}
