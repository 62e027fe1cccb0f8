package ladderwell.quantity;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import org.junit.jupiter.api.Test;

/** Reference values from CODATA 2022, Mohr, Newell, Taylor and Tiesinga, Rev. Mod. Phys. 97 (2025) 025002. */
class ConstantsTest {

    @Test
    void hbarIsExactToSixteenDigits() {
        assertEquals(1.054571817646156e-34, Constants.HBAR, 5e-50);
        assertEquals(Constants.PLANCK / (2 * Math.PI), Constants.HBAR, Math.ulp(Constants.HBAR));
        assertEquals(Double.parseDouble("1.05457181764615639126242800330228e-34"), Constants.HBAR);
    }

    @Test
    void massesHaveThePublishedDigits() {
        assertEquals(1.66053906892e-27, Quantity.of(1, Units.ATOMIC_MASS).si(), 0);
        assertEquals(9.1093837139e-31, Quantity.of(1, Units.ELECTRON_MASS).si(), 0);
    }

    @Test
    void aWavenumberIsAnEnergyAndATemperature() {
        Frequency perCentimetre = Frequency.of(Quantity.of(1, Units.PER_CENTIMETRE));
        assertEquals(0.123984198433200, Units.MILLIELECTRONVOLT.fromSi(perCentimetre.energy()), 5e-16);
        assertEquals(1.43877687750393, perCentimetre.energy() / Constants.BOLTZMANN, 5e-15);
    }

    @Test
    void aMillielectronvoltIsATemperature() {
        assertEquals(11.6045181215501, Quantity.of(1, Units.MILLIELECTRONVOLT).si() / Constants.BOLTZMANN, 5e-14);
    }

    /**
     * Leibfried, Blatt, Monroe and Wineland, Rev. Mod. Phys. 75 (2003) 281, with the atomic mass of 40Ca of Wang et al.
     * (AME), 39.962590863 u, less one electron; the ionisation energy is neglected.
     */
    @Test
    void zeroPointLengthOfACalciumIonAtOneMegahertz() {
        double mass = Units.ATOMIC_MASS.toSi(39.962590863) - Constants.ELECTRON_REST_MASS;
        Scale scale = Scale.harmonic(mass, Frequency.ofNu(1e6).omega());
        assertEquals(11.2456552, Units.NANOMETRE.fromSi(scale.length()) / Math.sqrt(2), 5e-8);
    }

    @Test
    void standardUncertaintiesAreThePublishedOnes() {
        List<String> printed =
                Constants.all().stream().map(Constants.Constant::toString).toList();
        assertTrue(printed.contains("atomic mass constant m_u = 1.66053906892(52)e-27 kg"), printed.toString());
        assertTrue(printed.contains("electron mass m_e = 9.1093837139(28)e-31 kg"), printed.toString());
        assertTrue(printed.contains("Planck constant h = 6.62607015e-34 J s (exact)"), printed.toString());
        assertTrue(printed.contains("speed of light c = 2.99792458e8 m/s (exact)"), printed.toString());
        assertEquals(
                5, Constants.all().stream().filter(Constants.Constant::isExact).count());
    }
}
