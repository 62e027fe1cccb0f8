package ladderwell.quantity;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class QuantityTest {

    @Test
    void printsAsItWasTyped() {
        assertEquals("1.2 MHz", Quantity.of(1.2, Units.MEGAHERTZ).toString());
        assertEquals("40 u", Quantity.of(40, Units.ATOMIC_MASS).toString());
        assertEquals("50 µs", Quantity.of(50, Units.MICROSECOND).toString());
        assertEquals("50 us", Quantity.of(50, Units.MICROSECOND).plain());
        assertEquals("-210 kHz", Quantity.of(-210, Units.KILOHERTZ).toString());
        assertEquals("9.5", Quantity.number(9.5).toString());
        assertEquals("1 period", Quantity.of(1, Units.PERIOD).toString());
        assertEquals("3 periods", Quantity.of(3, Units.PERIOD).toString());
        assertEquals("2991 /cm", Quantity.of(2991, Units.PER_CENTIMETRE).toString());
    }

    @Test
    void convertsWithinItsKind() {
        assertEquals(1.2e6, Quantity.of(1.2, Units.MEGAHERTZ).si());
        assertEquals(0.005, Quantity.of(5, Units.MILLISECOND).si());
        assertEquals(1.0, Quantity.of(1000, Units.NANOMETRE).in(Units.MICROMETRE));
        assertEquals(833.0, Quantity.of(0.833, Units.MICROSECOND).in(Units.NANOSECOND));
        assertEquals(10.0, Quantity.of(1, Units.NANOMETRE).in(Units.ANGSTROM));
        assertEquals(
                "0.3 eV",
                Quantity.of(300, Units.MILLIELECTRONVOLT).to(Units.ELECTRONVOLT).toString());
        assertEquals(Kind.ENERGY, Quantity.of(1, Units.JOULE).kind());
        assertEquals(Math.PI / 6, Quantity.of(30, Units.DEGREE).si(), Math.ulp(0.5));
        assertEquals(1 / 1.602176634e-19, Quantity.of(1, Units.JOULE).in(Units.ELECTRONVOLT), 2e3);
    }

    @Test
    void cycleAndAngularFrequencyAreNotMixedSilently() {
        String message = assertThrows(
                        IllegalArgumentException.class,
                        () -> Quantity.of(1.2, Units.MEGAHERTZ).in(Units.RADIAN_PER_SECOND))
                .getMessage();
        assertEquals(
                "'1.2 MHz' is a frequency and cannot be given in 'rad/s', the unit of an angular frequency or rate",
                message);
    }

    @ParameterizedTest
    @ValueSource(doubles = {Double.NaN, Double.POSITIVE_INFINITY, Double.NEGATIVE_INFINITY})
    void refusesWhatIsNoNumber(double bad) {
        String message = assertThrows(IllegalArgumentException.class, () -> Quantity.of(bad, Units.ATOMIC_MASS))
                .getMessage();
        assertEquals("a mass must be a finite number, not " + bad + "; for example 40 u", message);
    }

    @Test
    void refusesWhatOverflowsOnTheWayToSi() {
        String message = assertThrows(IllegalArgumentException.class, () -> Quantity.of(1e305, Units.MEGAHERTZ))
                .getMessage();
        assertTrue(message.contains("1e305 MHz"), message);
    }

    @Test
    void crossesToJsr385WithItsValue() {
        javax.measure.Quantity<?> measure = Quantity.of(1.5, Units.KILOHERTZ).measure();
        assertEquals(1.5, measure.getValue().doubleValue());
        assertEquals(1500.0, measure.toSystemUnit().getValue().doubleValue());
    }
}
