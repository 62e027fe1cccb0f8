package ladderwell.quantity;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;

class FrequencyTest {

    @Test
    void hertzTakeTwoPiAndRatesDoNot() {
        assertEquals(
                2 * Math.PI * 1.2e6,
                Frequency.of(Quantity.of(1.2, Units.MEGAHERTZ)).omega());
        assertEquals(
                7.5e6,
                Frequency.of(Quantity.of(7.5, Units.parse("Mrad/s").orElseThrow()))
                        .omega());
        assertEquals(3e3, Frequency.of(Quantity.of(3, Units.PER_MILLISECOND)).omega());
    }

    @Test
    void wavenumbersAndEnergiesFixAFrequency() {
        double omega = Frequency.of(Quantity.of(1, Units.PER_CENTIMETRE)).omega();
        // c exact: 1/cm is 29.9792458 GHz; two roundings, tolerance 4 ulp.
        assertEquals(2 * Math.PI * 29.9792458e9, omega, 4 * Math.ulp(omega));
        Frequency spacing = Frequency.of(Quantity.of(1, Units.MILLIELECTRONVOLT));
        // h exact: ν = E/h.
        assertEquals(1.602176634e-22 / 6.62607015e-34, spacing.nu(), 4 * Math.ulp(spacing.nu()));
        assertEquals(1.602176634e-22, spacing.energy(), 4 * Math.ulp(1.6e-22));
        assertEquals(100.0, Frequency.of(Quantity.of(1, Units.PER_CENTIMETRE)).wavenumber(), 4 * Math.ulp(100.0));
    }

    @Test
    void otherKindsFixNone() {
        String message = assertThrows(
                        IllegalArgumentException.class, () -> Frequency.of(Quantity.of(10, Units.NANOMETRE)))
                .getMessage();
        assertTrue(message.startsWith("'10 nm' is a length and fixes no frequency; expected a frequency"), message);
        assertThrows(IllegalArgumentException.class, () -> new Frequency(Double.NaN));
    }

    @Test
    void bothFacesArePrinted() {
        assertEquals("ν = 1.2 MHz, ω = 7.5398 Mrad/s", Frequency.ofNu(1.2e6).both());
        assertEquals(
                "nu = 1.2 MHz, omega = 7.5398 Mrad/s", Frequency.ofNu(1.2e6).bothPlain());
        assertEquals("ν = 1.1937 MHz, ω = 7.5 Mrad/s", new Frequency(7.5e6).both());
        assertEquals("ν = −210 kHz, ω = −1.3195 Mrad/s", Frequency.ofNu(-210e3).both());
        assertEquals("ν = 0 Hz, ω = 0 rad/s", new Frequency(0).both());
        assertEquals(
                "ν = 1.2345678 GHz, ω = 7.757 Grad/s",
                Frequency.ofNu(1.2345678e9).both());
        assertEquals("ν = 999 kHz, ω = 6.2769 Mrad/s", Frequency.ofNu(999e3).both());
        assertEquals("ν = 3 µHz, ω = 18.85 µrad/s", Frequency.ofNu(3e-6).both());
    }

    @Test
    void periodIsTheInverseOfNu() {
        assertEquals(1 / 1.2e6, Frequency.ofNu(1.2e6).period(), 4 * Math.ulp(1 / 1.2e6));
        assertEquals(1 / 1.2e6, Frequency.ofNu(-1.2e6).period(), 4 * Math.ulp(1 / 1.2e6));
        assertEquals(Double.POSITIVE_INFINITY, new Frequency(0).period());
    }
}
