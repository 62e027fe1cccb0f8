package ladderwell.gaussian;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;

class GaussianStateTest {
    /** Sixteen published digits and the bound of the reading. */
    private static void assertReads(double expected, double digits, Measured measured) {
        assertEquals(expected, measured.value(), digits + measured.bound().size());
        assertTrue(
                measured.bound().isGuaranteed() && measured.bound().size() < 1e-12 * (1 + expected),
                measured.bound()::toString);
    }

    @Test
    void squeezedVacuumHasItsQuanta() {
        // S-SQ-03, S-SQ-04: Walls and Milburn, Quantum Optics, ch. 2; Yuen, Phys. Rev. A 13 (1976) 2226
        GaussianPoint squeezed = GaussianState.vacuum().squeezed(1, 0).known();
        assertReads(1.381097845541816, 5e-16, squeezed.quanta());
        assertEquals(
                4.762195691083631,
                squeezed.quantaVariance().value() / squeezed.quanta().value(),
                1e-14);
        assertReads(Math.exp(-2) / 2, 1e-16, squeezed.leastVariance());
        assertEquals(
                0,
                squeezed.leastVarianceAngle().value(),
                squeezed.leastVarianceAngle().bound().size());
        assertReads(Math.exp(-2) / 2, 1e-16, squeezed.positionVariance());
    }

    @Test
    void squeezedCoherentStateIsSubPoissonian() {
        // S-SC-01a: Loudon and Knight, J. Mod. Opt. 34 (1987) 709
        GaussianPoint point =
                GaussianState.vacuum().squeezed(0.5, 0).displaced(2, 0).known();
        double n = point.quanta().value();
        assertEquals(-0.493843783085530, (point.quantaVariance().value() - n) / n, 1e-14);
    }

    @Test
    void squeezedAndCoherentStatesOverlap() {
        // S-OV-02: Gaussian overlap; Scutaru, J. Phys. A 31 (1998) 3659
        GaussianState squeezed = GaussianState.vacuum().squeezed(0.8, 0).displaced(1, 0);
        assertReads(0.141594161545450, 5e-16, squeezed.known().fidelity(GaussianState.coherent(2, 0)));
        assertReads(
                0.141594161545450, 5e-16, GaussianState.coherent(2, 0).known().fidelity(squeezed));
        assertReads(1, 0, squeezed.known().fidelity(squeezed));
    }

    @Test
    void thermalFidelityIsThatOfTwoDistributions() {
        // diagonal states: (Σ √(p_n q_n))² = (1 − x)(1 − y)/(1 − √(xy))², x = n̄/(n̄ + 1)
        double x = 0.7 / 1.7;
        double y = 2.0 / 3.0;
        double expected = (1 - x) * (1 - y) / Math.pow(1 - Math.sqrt(x * y), 2);
        assertReads(expected, 1e-15, GaussianState.thermal(0.7).known().fidelity(GaussianState.thermal(2)));
    }

    @Test
    void entropyOfHeatIsThatOfHalfASqueezedPair() {
        // S-TMS-01: Barnett and Phoenix, Phys. Rev. A 40 (1989) 2404, n = sinh² 0.8
        double n = Math.sinh(0.8) * Math.sinh(0.8);
        assertReads(1.22734908167253, 5e-15, GaussianState.thermal(n).known().entropy());
        // squeezing and displacing change no entropy
        GaussianPoint moved =
                GaussianState.thermal(n).squeezed(0.6, 2).displaced(3, -1).known();
        assertReads(1.22734908167253, 5e-15, moved.entropy());
        assertReads(1 / (2 * n + 1), 1e-15, moved.purity());
    }

    @Test
    void parityOfHeatAndOfDisplacement() {
        // Σ (−1)^n n̄^n/(n̄ + 1)^{n+1} = 1/(2n̄ + 1); of a coherent state e^{−2|α|²}
        assertReads(1 / 5.0, 1e-16, GaussianState.thermal(2).known().parity());
        assertReads(
                Math.exp(-2 * 1.25),
                1e-15,
                GaussianState.coherent(1, -0.5).known().parity());
    }

    @Test
    void orderOfSqueezingAndDisplacingCounts() {
        // S† a S = a cosh r − a† e^{iφ} sinh r
        double r = 0.7;
        double phi = 0.9;
        GaussianState first = GaussianState.coherent(1.2, -0.4).squeezed(r, phi);
        // α* e^{iφ} = (1.2 + 0.4i)(cos φ + i sin φ)
        double re = 1.2 * Math.cosh(r) - (1.2 * Math.cos(phi) - 0.4 * Math.sin(phi)) * Math.sinh(r);
        double im = -0.4 * Math.cosh(r) - (1.2 * Math.sin(phi) + 0.4 * Math.cos(phi)) * Math.sinh(r);
        assertEquals(Math.sqrt(2) * re, first.x(), 1e-15);
        assertEquals(Math.sqrt(2) * im, first.p(), 1e-15);
        GaussianState second = GaussianState.vacuum().squeezed(r, phi).displaced(1.2, -0.4);
        assertEquals(1.2 * Math.sqrt(2), second.x());
        assertEquals(first.xx(), second.xx(), 1e-15);
        assertReads(1, 0, first.known().purity());
        // twice half of it is all of it
        GaussianState halves =
                GaussianState.coherent(1.2, -0.4).squeezed(r / 2, phi).squeezed(r / 2, phi);
        assertEquals(first.xp(), halves.xp(), 1e-15);
        assertEquals(first.x(), halves.x(), 1e-15);
    }

    @Test
    void statesBelowTheUncertaintyBoundAreRefused() {
        IllegalArgumentException below =
                assertThrows(IllegalArgumentException.class, () -> new GaussianState(0, 0, 0.4, 0, 0.5));
        assertEquals(
                "the variances 0.4 and 0.5 with covariance 0.0 break the uncertainty bound: xx·pp − xp² is 0.2, at least"
                        + " 1/4 is needed",
                below.getMessage());
        assertThrows(IllegalArgumentException.class, () -> new GaussianState(Double.NaN, 0, 1, 0, 1));
        assertThrows(IllegalArgumentException.class, () -> new GaussianState(0, 0, -1, 0, -1));
        assertThrows(IllegalArgumentException.class, () -> GaussianState.thermal(-0.1));
        assertThrows(
                IllegalArgumentException.class, () -> GaussianState.vacuum().squeezed(16, 0));
        assertThrows(
                IllegalArgumentException.class, () -> GaussianState.vacuum().squeezed(-1, 0));
    }
}
