package ladderwell;

import static ladderwell.quantity.Units.ONE;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import ladderwell.classical.ClassicalOrbit;
import ladderwell.evidence.PhysicsException;
import ladderwell.formula.Formula;
import ladderwell.formula.Parameters;
import ladderwell.quantity.Quantity;
import ladderwell.quantity.Units;
import org.junit.jupiter.api.Test;

class MovingWellTest {
    private static final Quantity UNIT = Quantity.of(1, ONE);

    private static Oscillator natural(String text) {
        return Oscillator.in(Formula.natural(text, Parameters.none()), UNIT);
    }

    @Test
    void aPotentialWithoutTimeIsAnOrdinaryWell() {
        assertTrue(natural("x^4") instanceof PotentialWell);
        assertFalse(natural("x^4").moves());
    }

    @Test
    void theLevelsOfAMovingWellAreThoseAtTimeZero() {
        Oscillator driven = natural("x^2/2 - 0.3*x*cos(2*t)");
        assertTrue(driven.moves());
        // a shifted harmonic oscillator: E₀ = 1/2 − 0.3²/2
        assertEquals(0.5 - 0.045, driven.levels().energyHigh(0), 1e-14);
        assertEquals(0.5 - 0.3 * Math.cos(2), driven.potential(1, 1), 1e-15);
    }

    @Test
    void theClassicalOrbitOfADrivenOscillatorIsItsClosedForm() {
        // x'' = −x + F cos wt from rest at 0: x = F (cos wt − cos t)/(1 − w²)
        ClassicalOrbit orbit = natural("x^2/2 - 0.3*x*cos(2*t)").orbit(0, 0, 0);
        for (double t : new double[] {0.3, 2, 17.2}) {
            double expected = 0.3 * (Math.cos(2 * t) - Math.cos(t)) / (1 - 4);
            // order 4 with steps of 5e-3
            assertEquals(expected, orbit.position(t), 1e-9, "t = " + t);
        }
    }

    @Test
    void labUnitsAreScaledInTimeToo() {
        Formula formula = Formula.potential(
                "m*w^2*x^2/2*(1 + 0.1*sin(w*t))",
                Parameters.none().with("m", "40 u").with("w", "2 MHz"));
        MovingWell trap = (MovingWell) Oscillator.in(formula, Quantity.of(40, Units.ATOMIC_MASS));
        double omega = 2 * Math.PI * 2e6;
        double t = 0.8 / omega / trap.scale().time();
        double unit = trap.scale().length();
        double expected = 40
                * ladderwell.quantity.Constants.ATOMIC_MASS_CONSTANT
                * Math.pow(omega * 1.5 * unit, 2)
                / 2
                * (1 + 0.1 * Math.sin(0.8))
                / trap.scale().energy();
        assertEquals(expected, trap.potential(1.5, t), 1e-13 * expected);
        assertEquals(Math.PI, trap.classicalPeriod(1) * trap.scale().time() * omega / 2, 1e-9);
    }

    @Test
    void whatBindsNothingHasNoLevelsAndSaysSo() {
        Oscillator free = Oscillator.open(Formula.natural("0", Parameters.none()), UNIT, UNIT);
        assertEquals(0, free.levels().count());
        assertTrue(free.facts().isEmpty());
        String message = assertThrows(IllegalArgumentException.class, () -> free.number(0))
                .getMessage();
        assertTrue(message.contains("level"), message);
        String carried = assertThrows(
                        PhysicsException.NotCarried.class,
                        () -> free.gaussian(Quantity.of(0, ONE), Quantity.of(1, ONE), UNIT)
                                .amplitudes(1e-9))
                .getMessage();
        assertTrue(carried.contains("there are none"), carried);
    }
}
