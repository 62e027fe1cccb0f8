package ladderwell;

import static ladderwell.quantity.Units.ATOMIC_MASS;
import static ladderwell.quantity.Units.ELECTRONVOLT;
import static ladderwell.quantity.Units.ELECTRON_MASS;
import static ladderwell.quantity.Units.HERTZ;
import static ladderwell.quantity.Units.JOULE;
import static ladderwell.quantity.Units.MEGAHERTZ;
import static ladderwell.quantity.Units.NANOMETRE;
import static ladderwell.quantity.Units.PER_CENTIMETRE;
import static ladderwell.quantity.Units.RADIAN_PER_SECOND;
import static ladderwell.quantity.Units.SECOND;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import ladderwell.quantity.Constants;
import org.junit.jupiter.api.Test;

class OscillatorTest {
    private static Fact fact(List<Fact> facts, String name) {
        return facts.stream().filter(f -> f.name().equals(name)).findFirst().orElseThrow();
    }

    @Test
    void hertzIsMultipliedByTwoPiAndRadiansPerSecondAreNot() {
        Harmonic byNu = Oscillator.harmonic().mass(40, ATOMIC_MASS).frequency(1.2, MEGAHERTZ);
        Harmonic byOmega = Oscillator.harmonic().mass(40, ATOMIC_MASS).frequency(1.2e6, RADIAN_PER_SECOND);
        assertEquals(2 * Math.PI, byNu.angularFrequency() / byOmega.angularFrequency(), 1e-15);
    }

    @Test
    void frequencyWavenumberAndSpacingOfTheSameModeAgree() {
        double nu = 3.7e12;
        double omega = 2 * Math.PI * nu;
        double byWavenumber = Oscillator.harmonic()
                .mass(1, ATOMIC_MASS)
                .wavenumber(nu / Constants.LIGHT_SPEED / 100, PER_CENTIMETRE)
                .angularFrequency();
        double bySpacing = Oscillator.harmonic()
                .mass(1, ATOMIC_MASS)
                .spacing(Constants.HBAR * omega, JOULE)
                .angularFrequency();
        // a handful of roundings each
        assertEquals(1, byWavenumber / omega, 1e-15);
        assertEquals(1, bySpacing / omega, 1e-15);
    }

    @Test
    void theCardShowsBothFrequenciesAndTheZeroPointLength() {
        // S-CON-09: 40Ca+ at 1 MHz, atom of 39.962590863 u (AME) less one electron, 11.2456552 nm; CODATA 2022
        // constants
        double electron = Constants.ELECTRON_REST_MASS / Constants.ATOMIC_MASS_CONSTANT;
        Harmonic trap =
                Oscillator.harmonic().mass(39.962590863 - electron, ATOMIC_MASS).frequency(1, MEGAHERTZ);
        Fact length = fact(trap.facts(), "zero-point length");
        assertEquals("nm", length.value().unit().symbol());
        assertEquals(11.2456552, length.value().value(), 5e-8);
        assertEquals(1e6, fact(trap.facts(), "frequency").value().si(), 1e-9);
        assertEquals(
                2e6 * Math.PI, fact(trap.facts(), "angular frequency").value().si(), 1e-8);
    }

    @Test
    void boxRevivalTimeOfAnElectronInOneNanometre() {
        // S-IW-01: T_rev = 4 m L²/(π ħ) = 10.9982340 fs; Robinett, Phys. Rep. 392 (2004) 1
        Box box = Oscillator.box().mass(1, ELECTRON_MASS).width(1, NANOMETRE);
        Fact revival = fact(box.facts(), "revival time");
        assertEquals("fs", revival.value().unit().symbol());
        assertEquals(10.9982340, revival.value().value(), 5e-8);
    }

    @Test
    void wellOfDepthEightHasTheThreeKnownLevels() {
        // S-FSW-01..03: textbook condition √ε π = nπ − 2 asin √(ε/v), v = 8; in units of π²ħ²/2mL². The rounded values
        // 0.663, 2.603, 5.609 are common practice, no source.
        double unit = Math.PI * Math.PI / 2;
        FiniteWell well = Oscillator.finiteWell().natural(8 * unit);
        assertEquals(3, well.levels().count());
        double[] published = {0.6628034136891765, 2.603461128122489, 5.608649434860538};
        for (int n = 0; n < 3; n++) {
            // depth itself is rounded: relative 1e-13 as promised
            assertEquals(published[n], well.levels().energyHigh(n) / unit, 1e-13 * published[n]);
        }
    }

    @Test
    void classicalPeriodsAreThoseOfTheTextbook() {
        assertEquals(2 * Math.PI, Oscillator.harmonic().natural().classicalPeriod(17.5), 0);
        // a particle of speed v takes 2L/v to and fro
        assertEquals(2 / 3.0, Oscillator.box().natural().classicalPeriod(4.5), 1e-15);
        FiniteWell well = Oscillator.finiteWell().natural(10);
        assertThrows(IllegalArgumentException.class, () -> well.classicalPeriod(10));
    }

    @Test
    void badDeclarationsAreRefusedInOneSentenceThatNamesTheInput() {
        assertTrue(
                message(() -> Oscillator.harmonic().mass(-3, ATOMIC_MASS)).contains("mass must be positive, not -3 u"));
        assertTrue(message(() -> Oscillator.harmonic().mass(0, ATOMIC_MASS)).contains("mass must be positive"));
        assertTrue(message(() -> Oscillator.harmonic().mass(Double.NaN, ATOMIC_MASS))
                .contains("finite"));
        assertTrue(message(() -> Oscillator.harmonic().mass(40, MEGAHERTZ)).contains("a mass such as 40 u"));
        assertTrue(message(() -> Oscillator.harmonic().mass(40, ATOMIC_MASS).frequency(2, SECOND))
                .contains("frequency must be a frequency"));
        assertTrue(message(() -> Oscillator.harmonic().mass(40, ATOMIC_MASS).frequency(0, HERTZ))
                .contains("frequency must be positive"));
        assertTrue(message(() -> Oscillator.box().mass(1, ELECTRON_MASS).width(-1, NANOMETRE))
                .contains("width must be positive"));
        assertTrue(message(() -> Oscillator.finiteWell()
                        .mass(1, ELECTRON_MASS)
                        .width(1, NANOMETRE)
                        .depth(-0.3, ELECTRONVOLT))
                .contains("depth must be positive"));
        assertTrue(message(() -> Oscillator.finiteWell().natural(Double.POSITIVE_INFINITY))
                .contains("finite"));
    }

    static String message(org.junit.jupiter.api.function.Executable action) {
        String message = String.valueOf(
                assertThrows(IllegalArgumentException.class, action).getMessage());
        assertTrue(message.lines().count() == 1, "one line: " + message);
        return message;
    }
}
