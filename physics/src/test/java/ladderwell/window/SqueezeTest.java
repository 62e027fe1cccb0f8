package ladderwell.window;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import ladderwell.evidence.Bound;
import ladderwell.operator.LadderPolynomial;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class SqueezeTest {
    private static final LadderPolynomial PAIR = LadderPolynomial.a().power(2);

    @ParameterizedTest
    @ValueSource(booleans = {true, false})
    void theVacuumIsSqueezedSeenUnchangedAndTakenBack(boolean pure) {
        Equation equation = Propagation.plain(Generator.constant(LadderPolynomial.number(), List.of()), pure, 0, 8);
        Plane vacuum = equation.plane();
        if (equation instanceof DensityEquation density) {
            double[] ground = new double[36];
            ground[0] = 1;
            density.load(ground, new double[36], vacuum);
        } else {
            vacuum.re[equation.margin()] = 1;
        }
        double r = 0.5;
        double phi = 0.7;
        Squeeze.Changed changed = Squeeze.turn(pure, equation, vacuum, r, phi, 1e-9, 1e9);
        Squeeze squeeze = Squeeze.NONE.after(r, phi);
        WindowState state =
                Propagation.state(pure, changed.equation(), changed.state(), Bound.guaranteed(changed.spent()));
        // ⟨n⟩ = sinh² r, |⟨a²⟩| = sinh r cosh r of a squeezed vacuum; an error ε in N levels is below 2 ε N
        double allowed = 2 * state.traceNormError().size() * state.levels();
        assertEquals(Math.sinh(r) * Math.sinh(r), state.mean(LadderPolynomial.number())[0], allowed);
        double[] pair = state.mean(PAIR);
        assertEquals(Math.sinh(r) * Math.cosh(r), Math.hypot(pair[0], pair[1]), allowed);
        // seen through the frame it is the vacuum still
        assertEquals(0, state.mean(squeeze.seen(LadderPolynomial.number()))[0], 8 * allowed);
        WindowState back = squeeze.takenOut(state, 1e9);
        assertEquals(1, back.population(0), back.traceNormError().size());
        assertTrue(back.traceNormError().size() >= state.traceNormError().size());
    }
}
