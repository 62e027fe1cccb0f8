package ladderwell.quantity;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.EnumSource;
import org.junit.jupiter.params.provider.ValueSource;

class ScaleTest {

    private static final Scale ION =
            Scale.harmonic(Units.ATOMIC_MASS.toSi(40), Frequency.ofNu(1.2e6).omega());

    @Test
    void harmonicScaleHasTheOscillatorsTimeAndQuantum() {
        double omega = Frequency.ofNu(1.2e6).omega();
        // A square root and four roundings: 1e-15 relative.
        assertEquals(1, ION.angularFrequency() / omega, 1e-15);
        assertEquals(1, ION.time() * omega, 1e-15);
        assertEquals(1, ION.energy() / (Constants.HBAR * omega), 1e-15);
        assertEquals(1, ION.length() * ION.momentum() / Constants.HBAR, 1e-15);
        assertFalse(ION.isNatural());
    }

    @Test
    void scalesKeepTheirRelationsWhateverTheirSize() {
        Random random = new Random(7);
        for (int i = 0; i < 1000; i++) {
            Scale scale = Scale.of(
                    Math.pow(10, -32 + 30 * random.nextDouble()), Math.pow(10, -15 + 12 * random.nextDouble()));
            assertEquals(1, scale.momentum() * scale.momentum() / scale.mass() / scale.energy(), 2e-15);
            assertEquals(1, scale.energy() * scale.time() / Constants.HBAR, 2e-15);
            assertEquals(1, scale.angularFrequency() * scale.time(), 2e-15);
        }
    }

    @Test
    void everythingIsOneInNaturalUnits() {
        Scale natural = Scale.natural();
        assertTrue(natural.isNatural());
        for (Kind kind : Kind.values()) {
            assertEquals(1.0, natural.of(kind));
            assertEquals(1.0, natural.display(kind, 123).factor());
        }
        assertEquals("", natural.display(Kind.LENGTH, 1e-9).symbol());
        assertEquals("periods", natural.display(Kind.PERIODS, 3).symbol());
    }

    @ParameterizedTest
    @CsvSource({
        "TIME, 8.3e-7, ns",
        "LENGTH, 11e-9, nm",
        "LENGTH, 0.9e-9, pm",
        "LENGTH, 1.5e-6, µm",
        "LENGTH, 2, m",
        "LENGTH, 5e4, km",
        "TIME, 1e-3, ms",
        "TIME, 7200, s",
        "TIME, 2.5e-17, as",
        "ENERGY, 8e-28, neV",
        "ENERGY, 4.8e-20, meV",
        "ENERGY, 1.7e-19, eV",
        "TEMPERATURE, 5.8e-5, µK",
        "TEMPERATURE, 3000, K",
        "CYCLE_FREQUENCY, 1.2e6, MHz",
        "CYCLE_FREQUENCY, 999, Hz",
        "CYCLE_FREQUENCY, 1000, kHz",
        "CYCLE_FREQUENCY, 0.02, mHz",
        "ANGULAR_FREQUENCY, 7.54e6, Mrad/s",
        "WAVENUMBER, 299095, /cm",
        "ANGLE, 1, rad",
        "SQUEEZING, 6, dB",
        "PERIODS, 3, periods",
        "NUMBER, 1e8, ''",
        "MASS, 6.1e-32, me",
        "MASS, 6.6e-26, u",
        "MASS, 1e-12, ng",
        "MASS, 3, kg",
        "MOMENTUM, 2e-25, ħ/nm",
        "MOMENTUM, 9e-27, ħ/µm",
        "MOMENTUM, 1e-3, ħ/ym"
    })
    void displayUnitMakesTheMagnitudeReadable(Kind kind, double magnitude, String symbol) {
        assertEquals(symbol, ION.display(kind, magnitude).symbol());
        assertEquals(symbol, ION.display(kind, -magnitude).symbol());
    }

    @ParameterizedTest
    @EnumSource(names = {"LENGTH", "TIME", "ENERGY", "TEMPERATURE", "CYCLE_FREQUENCY", "ANGULAR_FREQUENCY", "MOMENTUM"})
    void displayedNumbersLieBetweenOneAndAThousand(Kind kind) {
        Random random = new Random(11);
        double centre = ION.of(kind) == 1 ? 1 : ION.of(kind);
        for (int i = 0; i < 1000; i++) {
            double magnitude = centre * Math.pow(10, -6 + 8 * random.nextDouble());
            double shown = ION.display(kind, magnitude).fromSi(magnitude);
            boolean capped = kind == Kind.TIME || kind == Kind.TEMPERATURE;
            assertTrue(
                    shown >= 1 && (shown < 1000 || capped && magnitude >= 1000),
                    kind + " " + magnitude + " as " + shown);
        }
    }

    @ParameterizedTest
    @EnumSource(Kind.class)
    void displayUnitsCanBeTypedAndHaveTheirKind(Kind kind) {
        for (double magnitude : new double[] {0, 1e-300, 1e-30, 1e-12, 1, 1e12, 1e30, 1e300}) {
            Unit unit = ION.display(kind, magnitude);
            assertEquals(kind, unit.kind());
            assertEquals(unit, Units.parse(unit.plain()).orElseThrow());
        }
    }

    @Test
    void anEmptyColumnTakesTheOscillatorsOwnSize() {
        assertEquals("nm", ION.display(Kind.LENGTH, 0).symbol());
        assertEquals("ns", ION.display(Kind.TIME, 0).symbol());
        assertEquals("neV", ION.display(Kind.ENERGY, 0).symbol());
    }

    @ParameterizedTest
    @ValueSource(doubles = {0, -1, Double.NaN, Double.POSITIVE_INFINITY})
    void refusesMassesLengthsAndFrequenciesThatAreNone(double bad) {
        String mass = assertThrows(IllegalArgumentException.class, () -> Scale.of(bad, 1))
                .getMessage();
        assertTrue(mass.startsWith("the mass of a scale must be finite and above 0, not "), mass);
        assertThrows(IllegalArgumentException.class, () -> Scale.of(1, bad));
        assertThrows(IllegalArgumentException.class, () -> Scale.harmonic(bad, 1));
        assertThrows(IllegalArgumentException.class, () -> Scale.harmonic(1, bad));
        assertThrows(IllegalArgumentException.class, () -> new Scale(1, 1, bad, Scale.Coordinate.LENGTH));
    }

    @Test
    void refusesScalesOutsideTheRangeOfNumbers() {
        assertThrows(IllegalArgumentException.class, () -> Scale.of(1e300, 1e-300));
        assertThrows(IllegalArgumentException.class, () -> Scale.of(1, 1e200));
        assertThrows(IllegalArgumentException.class, () -> ION.display(Kind.LENGTH, Double.NaN));
    }
}
