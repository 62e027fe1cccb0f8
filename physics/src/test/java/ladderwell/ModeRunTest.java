package ladderwell;

import static ladderwell.quantity.Units.ONE;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import ladderwell.evidence.Certainty;
import ladderwell.formula.Parameters;
import ladderwell.mode.Jump;
import ladderwell.mode.Mode;
import ladderwell.mode.Part;
import ladderwell.mode.Rate;
import ladderwell.operator.OperatorFormula;
import ladderwell.quantity.Quantity;
import ladderwell.quantity.Units;
import org.junit.jupiter.api.Test;

class ModeRunTest {
    private static Mode lossy(double omega, double kerr, double f, double kappa) {
        return Mode.natural(omega)
                .with(new Part.Kerr(kerr))
                .with(new Part.Given(OperatorFormula.naturalHamiltonian(f + "*(a + ad)", Parameters.none())))
                .with(Jump.loss(Rate.natural(kappa)));
    }

    @Test
    void aKerrModeWithoutLossRunsOnItsLevelsAndRevives() {
        // H = n + (K/2) n (n − 1): |⟨ψ(0)|ψ(2π/K)⟩| of a coherent state is 1 in the frame of the mode; K = 1/20 makes
        // 2π/K whole periods
        LadderMode kerr = Oscillator.mode("kerr", Mode.natural(1).with(new Part.Kerr(0.05)), List.of());
        Run run = kerr.coherent(9).evolve(2 * Math.PI / 0.05, ONE).frames(4).run();
        assertEquals("exact phases on levels", run.method());
        Series back = run.series(Observable.RETURN_PROBABILITY);
        assertEquals(1, back.value(4), back.error(4) + 1e-9);
        Series quanta = run.series(Observable.MEAN_QUANTA);
        assertEquals(9, quanta.value(2), quanta.error(2));
        assertEquals(5, kerr.levelTable(5).rowCount());
    }

    @Test
    void windowAndFrameAgreeWithinTheirErrors() {
        // 36 quanta, weakly nonlinear: small enough for a number window, and a frame pays
        LadderMode mode = Oscillator.mode("kerr", lossy(0.3, 0.005, 0.2, 0.1), List.of());
        Run framed = mode.coherent(36).evolve(1, ONE).frames(4).tolerance(1e-7).run();
        assertTrue(framed.method().contains("displaced"), framed.method());
        // the same state as a superposition goes to the number window
        long[] levels = new long[90];
        double[] weights = new double[90];
        double p = Math.exp(-18);
        for (int n = 0; n < 90; n++) {
            levels[n] = n;
            weights[n] = p;
            p *= 6 / Math.sqrt(n + 1.0);
        }
        Run window = mode.superposition(levels)
                .weights(weights)
                .evolve(1, ONE)
                .frames(4)
                .tolerance(1e-7)
                .run();
        assertTrue(window.method().contains("number states"), window.method());
        for (Observable o : List.of(
                Observable.POSITION,
                Observable.MOMENTUM,
                Observable.SPREAD_OF_POSITION,
                Observable.SPREAD_OF_MOMENTUM,
                Observable.MEAN_QUANTA,
                Observable.VARIANCE_OF_QUANTA,
                Observable.ENERGY,
                Observable.PURITY,
                Observable.RETURN_PROBABILITY,
                Observable.population(30))) {
            Series a = framed.series(o);
            Series b = window.series(o);
            for (int j = 0; j <= 4; j++) {
                assertEquals(a.value(j), b.value(j), a.error(j) + b.error(j), o.name() + " at " + j);
            }
        }
        Density a = framed.density(201);
        double sum = 0;
        for (int i = 0; i < 201; i++) {
            sum += a.value(4, i) * (a.position(1) - a.position(0));
        }
        assertEquals(1, sum, 1e-6);
        assertEquals(Certainty.GUARANTEED, framed.stateError().kind());
        assertEquals("‖ρ − ρ̃‖₁", framed.errorSymbol());
    }

    @Test
    void costAndErrorStayWhenTheQuantaGrow() {
        // the mean field of a driven damped mode scales: the fluctuation is the same for 1e4 and for 1e10 quanta
        int[] levels = new int[2];
        double[] spreads = new double[2];
        double[] quanta = {1e4, 1e10};
        for (int i = 0; i < 2; i++) {
            LadderMode mode =
                    Oscillator.mode("kerr", lossy(-0.5, 1 / quanta[i], 0.9 * Math.sqrt(quanta[i]), 1), List.of());
            Run run = mode.coherent(0).evolve(2, ONE).frames(2).tolerance(1e-5).run();
            assertTrue(run.method().contains("displaced"), run.method());
            Series spread = run.series(Observable.SPREAD_OF_POSITION);
            spreads[i] = spread.value(2);
            levels[i] = ((OnWindow) run.representation()).motion().work().mostLevels();
        }
        assertEquals(levels[0], levels[1], 20);
        assertTrue(levels[1] < 70, levels[1] + " levels");
        assertEquals(spreads[0], spreads[1], 1e-2);
    }

    @Test
    void aCrescentLeavesTheFrameAndTheRunSaysSo() {
        LadderMode mode = Oscillator.mode("kerr", lossy(0.3, 0.5, 0.2, 0.1), List.of());
        Run run = mode.coherent(36).evolve(0.5, ONE).frames(2).tolerance(1e-6).run();
        assertTrue(run.method().contains("number states"), run.method());
    }

    @Test
    void aModeInLabUnitsCountsInSecondsAndNamesItsFrame() {
        double omega = 2 * Math.PI * 5e6;
        Mode mode = Mode.lab(omega)
                .with(Jump.bath(Rate.of(Quantity.of(1e6, Units.parse("/s").orElseThrow())), 0.5))
                .rotating(omega);
        LadderMode lossy = Oscillator.mode("kerr", mode, List.of());
        Run run = lossy.number(2)
                .evolve(1, Units.parse("us").orElseThrow())
                .frames(2)
                .tolerance(1e-8)
                .run();
        Series quanta = run.series(Observable.MEAN_QUANTA);
        // ⟨n⟩ = n_th + (2 − n_th) e^{−κt}, κt = 1
        assertEquals(0.5 + 1.5 * Math.exp(-1), quanta.value(2), quanta.error(2));
        assertTrue(lossy.formula().contains("rotating"), lossy.formula());
        assertTrue(lossy.facts().stream().anyMatch(fact -> fact.name().equals("quality factor")));
        assertThrows(IllegalArgumentException.class, () -> lossy.levelTable(3));
    }

    @Test
    void aHamiltonianThatVariesIsEstimatedAndItsReadingsToo() {
        OperatorFormula h = OperatorFormula.naturalHamiltonian("n + 0.3*cos(0.9*t)*(a + ad)", Parameters.none());
        LadderMode mode = Oscillator.mode("hamiltonian", Mode.natural(0).with(new Part.Given(h)), List.of());
        Run run = mode.number(0).evolve(4, ONE).frames(2).run();
        assertEquals(Certainty.ESTIMATED, run.stateError().kind());
        assertEquals(Certainty.ESTIMATED, run.series(Observable.population(1)).certainty());
        assertEquals(1, run.series(Observable.PURITY).value(2), 1e-8);
        assertTrue(mode.moves());
    }

    @Test
    void runawayPumpsAndScalesThatDoNotFitAreRefused() {
        Mode pumped = Mode.natural(0)
                .with(new Part.Given(OperatorFormula.naturalHamiltonian("0.5*(a^2 + ad^2)", Parameters.none())))
                .with(Jump.loss(Rate.natural(0.1)));
        IllegalArgumentException refused =
                assertThrows(IllegalArgumentException.class, () -> Oscillator.mode("hamiltonian", pumped, List.of()));
        assertTrue(String.valueOf(refused.getMessage()).contains("runs away"), refused.getMessage());
        assertThrows(IllegalArgumentException.class, () -> Oscillator.mode("hamiltonian", Mode.lab(0), List.of()));
    }
}
