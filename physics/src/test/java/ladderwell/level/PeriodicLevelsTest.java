package ladderwell.level;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;

class PeriodicLevelsTest {
    private static PeriodicLevels mathieu(double q, double phase) {
        return Levels.periodic(Curves.even(x -> q * Math.cos(2 * x)), Math.PI, phase);
    }

    /** y″ + (a − 2q cos 2x) y = 0 is p²/2 + q cos 2x with E = a/2. */
    private static void assertMathieu(double a, PeriodicLevels levels, int n) {
        double bound = 2 * levels.energyBound(n).size();
        assertEquals(a, 2 * levels.energy(n), bound);
        assertTrue(bound <= 2e-14 * (Math.abs(a) + 20), "bound " + bound);
    }

    @Test
    void mathieuCharacteristicValuesArePublishedOnes() {
        // Abramowitz and Stegun table 20.1; DLMF 28.2.
        PeriodicLevels periodic = mathieu(5, 0);
        PeriodicLevels turning = mathieu(5, Math.PI);
        assertMathieu(-5.80004602085150842, periodic, 0);
        assertMathieu(7.44910973952917781, periodic, 2);
        assertMathieu(100.126369216163315, periodic, 10);
        assertMathieu(-5.79008059863777104, turning, 0);
        assertMathieu(1.85818754154775089, turning, 1);
        assertMathieu(-2.38215823595695572, mathieu(10, 0), 1);
    }

    @Test
    void shiftingThePotentialChangesNoLevel() {
        for (double phase : new double[] {0, 1, Math.PI}) {
            PeriodicLevels even = mathieu(5, phase);
            PeriodicLevels shifted = Levels.periodic(Curves.open(x -> 5 * Math.cos(2 * (x - 0.3))), Math.PI, phase);
            for (int n = 0; n < 14; n++) {
                double sum = even.energyBound(n).size() + shifted.energyBound(n).size();
                assertEquals(even.energy(n), shifted.energy(n), sum, "phase " + phase + ", level " + n);
            }
            double[] a = even.momentum(0, 1);
            double[] b = shifted.momentum(0, 1);
            assertEquals(Math.hypot(a[0], a[1]), Math.hypot(b[0], b[1]), 1e-12);
        }
    }

    @Test
    void withoutAPotentialTheLevelsAreFree() {
        PeriodicLevels free = Levels.periodic(Curves.open(x -> 0), 2 * Math.PI, 0.5);
        double shift = 0.5 / (2 * Math.PI);
        assertEquals(shift * shift / 2, free.energy(0), 1e-14);
        assertEquals((1 - shift) * (1 - shift) / 2, free.energy(1), 1e-14);
    }

    @Test
    void waveFunctionsTurnByThePhaseOverAPeriod() {
        PeriodicLevels levels = mathieu(5, 1);
        double[][] wave = levels.waveFunction(2, new double[] {0.2, 0.2 + Math.PI});
        assertEquals(wave[0][0] * Math.cos(1) - wave[1][0] * Math.sin(1), wave[0][1], 1e-13);
        assertEquals(wave[0][0] * Math.sin(1) + wave[1][0] * Math.cos(1), wave[1][1], 1e-13);
        double[] norm = levels.element(2, 2, x -> 1);
        assertEquals(1, norm[0], 1e-13);
        assertEquals(0, levels.element(2, 3, x -> 1)[0], 1e-13);
    }

    @Test
    void offsetChargeOfOneTurnIsNone() {
        assertEquals(mathieu(5, 0).energy(3), mathieu(5, 2 * Math.PI).energy(3), 1e-13);
        assertEquals(mathieu(5, 0.7).energy(3), mathieu(5, -0.7).energy(3), 1e-13);
    }

    @Test
    void potentialsThatJumpOrAreNoNumberAreRefused() {
        assertThrows(IllegalArgumentException.class, () -> Levels.periodic(Curves.open(x -> x < 1 ? 0 : 1), 2, 0));
        assertThrows(IllegalArgumentException.class, () -> Levels.periodic(Curves.open(x -> Double.NaN), 2, 0));
        assertThrows(IllegalArgumentException.class, () -> Levels.periodic(Curves.open(x -> 0), 0, 0));
        assertThrows(IllegalArgumentException.class, () -> mathieu(5, 0).energy(-1));
    }
}
