package ladderwell.quantity;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.math.BigDecimal;
import java.util.Random;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class DigitsTest {

    @ParameterizedTest
    @CsvSource({
        "0, 0",
        "-0.0, 0",
        "1, 1",
        "1.2, 1.2",
        "-3e-9, -3e-9",
        "0.1, 0.1",
        "1200000, 1200000",
        "12000000, 1.2e7",
        "123456.789, 123456.789",
        "0.0001, 0.0001",
        "0.00001, 1e-5",
        "1e8, 1e8",
        "4.9e-324, 5e-324",
        "1.7976931348623157e308, 1.7976931348623157e308",
        "0.30000000000000004, 0.30000000000000004",
        "2e23, 2e23"
    })
    void shortestReadsBack(double value, String text) {
        assertEquals(text, Digits.shortest(value));
        assertEquals(value, Double.parseDouble(text), 0);
    }

    @Test
    void shortestReadsBackForAnyDouble() {
        Random random = new Random(3);
        for (int i = 0; i < 20_000; i++) {
            double value = Double.longBitsToDouble(random.nextLong());
            if (Double.isFinite(value)) {
                assertEquals(value, Double.parseDouble(Digits.shortest(value)));
            }
        }
    }

    @ParameterizedTest
    @CsvSource({
        "0.12345, 3, 0.123", "1.20004, 4, 1.2", "123456, 3, 1.23e5", "123000, 3, 123000", "99.96, 3, 100",
        "999999.6, 6, 1e6", "2.5, 1, 2", "3.5, 1, 4", "-0.00012344, 4, -0.0001234", "-0.000012344, 4, -1.234e-5",
        "6.62607015e-34, 3, 6.63e-34", "0, 5, 0"
    })
    void significantDigitsAreRoundedAndNotPadded(double value, int digits, String text) {
        assertEquals(text, Digits.significant(value, digits));
    }

    @ParameterizedTest
    @CsvSource({
        "2e-10, 2, 2e-10",
        "2.04e-10, 2, 2.1e-10",
        "0.0999, 2, 0.1",
        "1e-9, 1, 1e-9",
        "1.01e-9, 1, 2e-9",
        "0, 2, 0"
    })
    void sizesOfErrorsAreRoundedUp(double value, int digits, String text) {
        assertEquals(text, Digits.upward(value, digits));
    }

    @ParameterizedTest
    @CsvSource({
        "0.15821138830084, 1e-10, 0.1582113883(2)",
        "1.2, 0.25, 1.2(3)",
        "123456, 300, 1.235(4)e5",
        "1e8, 2, 1.00000000(2)e8",
        "-3.14159, 0.01, -3.14(2)",
        "1e-17, 3e-16, 0(4)e-16",
        "0.5, 3, 0(4)",
        "0, 0.02, 0.00(3)",
        "0.5, 0, 0.5",
        "1e-12, 1e-15, 1.000(2)e-12",
        "12.7, 9.5, 1(2)e1",
        "99.95, 0.99, 100(2)",
        "5, 1e-300, 5.0000000000000000(1)"
    })
    void onlyDigitsThatTheBoundSupports(double value, double bound, String text) {
        assertEquals(text, Digits.withBound(value, bound));
    }

    private static final Pattern PRINTED = Pattern.compile("(-?[0-9.]+)\\(([0-9])\\)(e-?[0-9]+)?");

    @Test
    void printedIntervalContainsTheTrueOne() {
        Random random = new Random(5);
        for (int i = 0; i < 20_000; i++) {
            double value = (random.nextDouble() - 0.5) * Math.pow(10, random.nextInt(40) - 20);
            double bound = random.nextDouble() * Math.pow(10, random.nextInt(40) - 25);
            String text = Digits.withBound(value, bound);
            Matcher matcher = PRINTED.matcher(text);
            assertTrue(matcher.matches(), text);
            String exponent = matcher.group(3) == null ? "" : matcher.group(3);
            BigDecimal centre = new BigDecimal(matcher.group(1) + exponent);
            BigDecimal place = BigDecimal.ONE.scaleByPowerOfTen(-centre.scale());
            BigDecimal width = place.multiply(new BigDecimal(matcher.group(2)));
            BigDecimal need = new BigDecimal(value).subtract(centre).abs().add(new BigDecimal(bound));
            assertTrue(width.compareTo(need) >= 0, value + " ± " + bound + " printed as " + text);
            // No more than twelve times too wide: a digit is dropped only when it must be.
            boolean finerThanADouble = bound < Math.ulp(value);
            assertTrue(
                    finerThanADouble || width.compareTo(new BigDecimal(bound).multiply(new BigDecimal("12"))) <= 0,
                    value + " ± " + bound + " printed as " + text);
        }
    }

    @Test
    void anUnknownBoundIsShownAsSuch() {
        assertEquals("0.158(?)", Digits.withBound(0.15821138830084, Double.POSITIVE_INFINITY));
        assertEquals("1.58(?)e-9", Digits.withBound(1.5821138830084e-9, Double.POSITIVE_INFINITY));
    }

    @ParameterizedTest
    @CsvSource({
        "-1.2e-9, −1.2×10⁻⁹",
        "1e8, 10⁸",
        "-1e8, −10⁸",
        "1.235(4)e5, 1.235(4)×10⁵",
        "0.5, 0.5",
        "-3, −3",
        "1.1e123, 1.1×10¹²³"
    })
    void prettyIsForPeople(String plain, String pretty) {
        assertEquals(pretty, Digits.pretty(plain));
    }

    @ParameterizedTest
    @ValueSource(doubles = {Double.NaN, Double.POSITIVE_INFINITY, Double.NEGATIVE_INFINITY})
    void refusesWhatIsNoNumber(double bad) {
        assertThrows(IllegalArgumentException.class, () -> Digits.shortest(bad));
        assertThrows(IllegalArgumentException.class, () -> Digits.significant(bad, 3));
        assertThrows(IllegalArgumentException.class, () -> Digits.upward(bad, 3));
        assertThrows(IllegalArgumentException.class, () -> Digits.withBound(bad, 1));
    }

    @Test
    void refusesBoundsAndDigitCountsThatAreNone() {
        assertThrows(IllegalArgumentException.class, () -> Digits.withBound(1, -1));
        assertThrows(IllegalArgumentException.class, () -> Digits.withBound(1, Double.NaN));
        assertThrows(IllegalArgumentException.class, () -> Digits.significant(1, 0));
        assertThrows(IllegalArgumentException.class, () -> Digits.significant(1, 18));
    }
}
