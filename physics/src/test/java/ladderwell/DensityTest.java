package ladderwell;

import static ladderwell.quantity.Units.ONE;
import static ladderwell.quantity.Units.PERIOD;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import ladderwell.evidence.Certainty;
import ladderwell.quantity.Quantity;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class DensityTest {
    private final Harmonic mode = Oscillator.harmonic().natural();

    @ParameterizedTest
    @ValueSource(doubles = {0, 0.5, 9.5, 100, 2000, 9999})
    void theShapeOfACoherentDensityIsFixed(double mean) {
        // common practice, no source: |ψ|² = π^{-1/2} exp(−(x − ⟨x⟩)²) at all times
        Density density = mode.coherent(mean).evolve(1, PERIOD).frames(6).run().density(301);
        assertEquals("sum over levels", density.method());
        for (int j = 0; j < density.times(); j++) {
            double centre = Math.sqrt(2 * mean) * Math.cos(density.run().time(j));
            for (int i = 0; i < density.points(); i++) {
                double d = density.position(i) - centre;
                assertEquals(
                        Math.exp(-d * d) / Math.sqrt(Math.PI),
                        density.value(j, i),
                        density.bound().size() + 1e-15);
            }
        }
        assertTrue(density.bound().size() < 1e-6, () -> "bound " + density.bound());
    }

    @Test
    void farUpTheLadderTheClosedFormTakesOverAndKeepsTheWholeProbability() {
        for (double mean : new double[] {1.2e4, 1e8}) {
            Density density =
                    mode.coherent(mean).evolve(1, PERIOD).frames(7).run().density(400);
            assertTrue(density.method().startsWith("closed form"), density.method());
            double spacing = density.position(1) - density.position(0);
            for (int j = 0; j < density.times(); j++) {
                double total = 0;
                for (int i = 0; i < density.points(); i++) {
                    total += density.value(j, i) * spacing;
                }
                // what lies beyond the grid is below erfc(4.5)/2 = 1e-10
                assertEquals(1, total, 1e-9);
            }
        }
    }

    @Test
    void aDensityIsCalledGuaranteedOnlyWhereItsWaveFunctionsAndItsTailAreProved() {
        Box box = Oscillator.box().natural();
        assertEquals(
                Certainty.GUARANTEED,
                box.superposition(0, 3)
                        .evolve(1, PERIOD)
                        .frames(2)
                        .run()
                        .density(50)
                        .bound()
                        .kind());
        assertEquals(
                Certainty.ESTIMATED,
                mode.coherent(3)
                        .evolve(1, PERIOD)
                        .frames(2)
                        .run()
                        .density(50)
                        .bound()
                        .kind());
        Run packet = Oscillator.finiteWell()
                .natural(4000)
                .gaussian(Quantity.of(0, ONE), Quantity.of(5, ONE), Quantity.of(0.06, ONE))
                .evolve(1, PERIOD)
                .frames(2)
                .tolerance(1e-3)
                .run();
        assertEquals(Certainty.ESTIMATED, packet.density(50).bound().kind());
        assertEquals(Certainty.ESTIMATED, packet.series(Observable.MOMENTUM).certainty());
        assertEquals(Certainty.ESTIMATED, packet.series(Observable.ENERGY).certainty());
    }

    @Test
    void probabilityIsOneInEveryOscillator() {
        Box box = Oscillator.box().natural();
        FiniteWell well = Oscillator.finiteWell().natural(4000);
        State[] states = {
            mode.superposition(0, 1, 17),
            mode.number(40),
            box.superposition(0, 1, 2, 7),
            well.superposition(0, 2, 5),
            well.gaussian(Quantity.of(-0.1, ONE), Quantity.of(8, ONE), Quantity.of(0.06, ONE))
        };
        for (State state : states) {
            Density density =
                    state.evolve(0.7, PERIOD).frames(5).tolerance(1e-3).run().density(2001);
            double spacing = density.position(1) - density.position(0);
            for (int j = 0; j < density.times(); j++) {
                double total = 0;
                for (int i = 0; i < density.points(); i++) {
                    total += density.value(j, i) * spacing;
                }
                // trapezium rule on a smooth function (kinks of φ′ at the walls: second order in the spacing), state to
                // 1e-3
                assertEquals(
                        1,
                        total,
                        3e-3,
                        state.kind() + " in " + state.oscillator().kind());
            }
        }
    }
}
