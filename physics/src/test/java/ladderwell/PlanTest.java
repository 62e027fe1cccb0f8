package ladderwell;

import static ladderwell.quantity.Units.ONE;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import ladderwell.formula.Formula;
import ladderwell.formula.Parameters;
import ladderwell.mode.Jump;
import ladderwell.mode.Mode;
import ladderwell.mode.Part;
import ladderwell.mode.Rate;
import ladderwell.operator.OperatorFormula;
import ladderwell.quantity.Quantity;
import org.junit.jupiter.api.Test;

class PlanTest {
    private static LadderMode mode(String hamiltonian, double kappa) {
        OperatorFormula h = OperatorFormula.naturalHamiltonian(hamiltonian, Parameters.none());
        Mode mode = Mode.natural(0).with(new Part.Given(h));
        return Oscillator.mode("hamiltonian", kappa > 0 ? mode.with(Jump.loss(Rate.natural(kappa))) : mode, List.of());
    }

    @Test
    void aPlanNamesTheMethodThatThenRuns() {
        List<Evolution> all = List.of(
                Oscillator.harmonic().natural().coherent(9).evolve(3, ONE).frames(4),
                Oscillator.in(Formula.natural("x^2/2 - 0.5*x*sin(0.8*t)", Parameters.none()), Quantity.of(1, ONE))
                        .number(0)
                        .evolve(2, ONE)
                        .frames(2),
                mode("n + 0.05*n^2", 0).coherent(4).evolve(2, ONE).frames(2),
                mode("0.1*n*(n-1) + 0.4*(a + ad)", 0).number(0).evolve(2, ONE).frames(2),
                mode("0.1*n*(n-1) + 0.4*(a + ad)", 0.3)
                        .coherent(2)
                        .evolve(2, ONE)
                        .frames(2)
                        .tolerance(1e-7),
                mode("n + 0.2*cos(t)*(a + ad)", 0).number(1).evolve(2, ONE).frames(2),
                mode("1e-5*n*(n-1) + 20*(a + ad)", 1)
                        .coherent(900)
                        .evolve(1, ONE)
                        .frames(2)
                        .tolerance(1e-6));
        for (Evolution evolution : all) {
            Plan plan = evolution.plan();
            assertEquals(plan.method(), evolution.run().method());
            assertTrue(plan.table().rowCount() >= 3);
        }
    }

    @Test
    void theWindowOfARunIsForeseenWithinAFactorOfAFew() {
        Evolution evolution = mode("0.1*n*(n-1) - n + 3*(a + ad)", 1)
                .coherent(4)
                .evolve(5, ONE)
                .frames(5)
                .tolerance(1e-7);
        Plan plan = evolution.plan();
        OnWindow run = (OnWindow) evolution.run().representation();
        int levels = run.motion().work().mostLevels();
        int foreseen = Integer.parseInt(plan.size().replaceAll("about (\\d+) levels.*", "$1"));
        assertTrue(foreseen > levels / 3 && foreseen < 3 * levels, foreseen + " foreseen, " + levels + " used");
        assertTrue(plan.seconds() > 0 && plan.bytes() > 0);
    }
}
