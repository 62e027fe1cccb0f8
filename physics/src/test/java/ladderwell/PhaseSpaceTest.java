package ladderwell;

import static ladderwell.quantity.Units.ONE;
import static ladderwell.quantity.Units.PERIOD;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import ladderwell.formula.Formula;
import ladderwell.formula.Parameters;
import ladderwell.mode.Jump;
import ladderwell.mode.Mode;
import ladderwell.mode.Part;
import ladderwell.mode.Rate;
import ladderwell.phasespace.PhaseField;
import ladderwell.phasespace.PhaseGrid;
import ladderwell.potential.Potential;
import ladderwell.quantity.Quantity;
import org.junit.jupiter.api.Test;

class PhaseSpaceTest {
    private static final Quantity UNIT = Quantity.of(1, ONE);

    private final Harmonic mode = Oscillator.harmonic().natural();

    private static Quantity number(double value) {
        return Quantity.of(value, ONE);
    }

    private static Oscillator natural(String text) {
        return Oscillator.in(Formula.natural(text, Parameters.none()), UNIT);
    }

    private static void isGaussianAt(PhaseField field, double x0, double p0) {
        for (int i = 0; i < field.grid().nx(); i += 7) {
            for (int j = 0; j < field.grid().np(); j += 7) {
                double x = field.grid().position(i) - x0;
                double p = field.grid().momentum(j) - p0;
                assertEquals(
                        Math.exp(-x * x - p * p) / Math.PI,
                        field.value(i, j),
                        field.bound().size(),
                        "at " + x + ", " + p);
            }
        }
    }

    @Test
    void aCoherentStateKeepsItsShapeAndGoesRound() {
        for (double mean : new double[] {0, 9.5, 3000, 1e8}) {
            Run run = mode.coherent(mean).evolve(2, PERIOD).frames(4).run();
            PhaseSpace space = run.phaseSpace(1.15, PERIOD);
            double angle = -0.3 * Math.PI;
            double swing = Math.sqrt(2 * mean);
            PhaseField field = space.wigner();
            assertTrue(field.bound().size() < 1e-6, mean + ": " + field.bound());
            assertEquals(1, field.total(), 1e-6, "at " + mean);
            isGaussianAt(field, swing * Math.cos(angle), swing * Math.sin(angle));
            assertEquals(
                    0, space.negativity().value(), space.negativity().bound().size());
            assertTrue(space.verdict().contains("nowhere negative"), space.verdict());
        }
    }

    @Test
    void theSamePotentialByItsFormulaGivesTheSameField() {
        Oscillator well = natural("x^2/2");
        Run general = well.superposition(0, 1, 5).evolve(3, ONE).frames(3).run();
        Run own = mode.superposition(0, 1, 5).evolve(3, ONE).frames(3).run();
        PhaseGrid grid = new PhaseGrid(0.2, 0.1, 5, 5, 41, 40);
        PhaseField a = general.phaseSpace(2.2, ONE).wigner(grid);
        PhaseField b = own.phaseSpace(2.2, ONE).wigner(grid);
        assertTrue(a.bound().size() < 1e-6, "bound " + a.bound());
        for (int i = 0; i < 41; i++) {
            for (int j = 0; j < 40; j++) {
                assertEquals(
                        b.value(i, j),
                        a.value(i, j),
                        a.bound().size() + b.bound().size());
            }
        }
    }

    @Test
    void aPacketOnAGridIsReadAtTheRunsNearestTime() {
        // a driven oscillator moves its ground state as a whole: x'' = −x + 0.5 sin 0.8t from rest
        Run run = natural("x^2/2 - 0.5*x*sin(0.8*t)")
                .number(0)
                .evolve(9, ONE)
                .frames(9)
                .run();
        PhaseSpace space = run.phaseSpace(5.9, ONE);
        assertEquals(6, space.time(), 1e-12);
        double x = 0.5 * (Math.sin(4.8) - 0.8 * Math.sin(6)) / 0.36;
        double p = 0.5 * 0.8 * (Math.cos(4.8) - Math.cos(6)) / 0.36;
        isGaussianAt(space.wigner(), x, p);
        assertTrue(
                space.wigner().bound().size() < 1e-7, "bound " + space.wigner().bound());
    }

    @Test
    void theMarginalIsTheDensityInAnyWell() {
        for (Oscillator oscillator :
                new Oscillator[] {natural("x^4/4"), Oscillator.box().natural(), natural("x^4 - 6*x^2")}) {
            Run run = oscillator.superposition(0, 1, 3).evolve(1, ONE).frames(5).run();
            PhaseSpace space = run.phaseSpace(0.4, ONE);
            // behind hard walls momenta fall off as the fourth power: a grid of its own follows them far enough
            PhaseField field = oscillator instanceof Box
                    ? space.wigner(new PhaseGrid(0, 0, 0.55, 800, 101, 1601))
                    : space.wigner();
            double[] marginal = field.overMomenta();
            Density density = run.density(801);
            double peak = density.peak();
            for (int i = 0; i < marginal.length; i++) {
                double x = field.grid().position(i);
                double place = (x - density.position(0)) / (density.position(1) - density.position(0));
                int k = (int) Math.floor(place);
                double there = k < 0 || k >= 800
                        ? 0
                        : density.value(2, k) + (place - k) * (density.value(2, k + 1) - density.value(2, k));
                // straight lines between 801 points, and the momenta left out
                assertEquals(there, marginal[i], 3e-3 * peak, oscillator.kind() + " at " + x);
            }
            assertEquals(1, field.total(), 1e-4, oscillator.kind());
            assertTrue(space.negativity().value() > space.negativity().bound().size());
        }
    }

    @Test
    void aKerrModeMakesACat() {
        // H = n² from alpha = 2 at t = π/2: (e^{−iπ/4}|α⟩ + e^{iπ/4}|−α⟩)/√2; row S-KER-03, Yurke and Stoler, Phys.
        // Rev.
        // Lett. 57 (1986) 13
        LadderMode kerr = Oscillator.mode("kerr", Mode.natural(1).with(new Part.Kerr(2)), List.of());
        PhaseField field = kerr.coherent(4)
                .evolve(2, ONE)
                .run()
                .phaseSpace(Math.PI / 2, ONE)
                .wigner(new PhaseGrid(0, 0, 5, 3, 61, 62));
        double a = Math.sqrt(8);
        for (int i = 0; i < 61; i++) {
            for (int j = 0; j < 62; j++) {
                double x = field.grid().position(i);
                double p = field.grid().momentum(j);
                double exact = (Math.exp(-(x - a) * (x - a) - p * p) / 2
                                + Math.exp(-(x + a) * (x + a) - p * p) / 2
                                - Math.exp(-x * x - p * p) * Math.sin(2 * a * p))
                        / Math.PI;
                assertEquals(exact, field.value(i, j), field.bound().size(), x + ", " + p);
            }
        }
        assertTrue(field.bound().size() < 2e-9, "bound " + field.bound());
    }

    @Test
    void aLossyModeIsReadAsADensityOperatorAtTheRunsNearestTime() {
        // α e^{−(i ω + κ/2) t}: a coherent state stays coherent under loss at zero temperature
        LadderMode lossy =
                Oscillator.mode("hamiltonian", Mode.natural(1).with(Jump.loss(Rate.natural(0.3))), List.of());
        PhaseSpace space =
                lossy.coherent(4).evolve(2, ONE).frames(4).tolerance(1e-9).run().phaseSpace(1.6, ONE);
        assertEquals(1.5, space.time(), 1e-12);
        double size = Math.sqrt(8) * Math.exp(-0.15 * 1.5);
        isGaussianAt(space.wigner(), size * Math.cos(1.5), -size * Math.sin(1.5));
        assertTrue(
                space.wigner().bound().size() < 1e-7, "bound " + space.wigner().bound());
    }

    @Test
    void aRunInADisplacedFrameIsReadWhereItIs() {
        // the same loss at a million quanta; damped so little that the packet is still far out
        LadderMode lossy =
                Oscillator.mode("hamiltonian", Mode.natural(1).with(Jump.loss(Rate.natural(0.01))), List.of());
        Run run = lossy.coherent(1e6).evolve(2, ONE).frames(4).run();
        assertTrue(run.method().contains("displaced"), run.method());
        PhaseSpace space = run.phaseSpace(1.5, ONE);
        double size = Math.sqrt(2e6) * Math.exp(-0.005 * 1.5);
        isGaussianAt(space.wigner(), size * Math.cos(1.5), -size * Math.sin(1.5));
        assertTrue(
                space.wigner().bound().size() < 1e-6, "bound " + space.wigner().bound());
        assertEquals(1, space.wigner().total(), 1e-6);
    }

    @Test
    void aShearedPacketHasTheSpreadsOfItsRun() {
        // a weak Kerr mode shears a packet of 10⁴ quanta: K n̄ t = 0.4 turns its circle into an ellipse
        LadderMode kerr = Oscillator.mode(
                "kerr", Mode.natural(1).with(new Part.Kerr(4e-5)).with(Jump.loss(Rate.natural(1e-3))), List.of());
        Run run = kerr.coherent(1e4).evolve(1, ONE).frames(4).run();
        assertTrue(run.method().contains("displaced"), run.method());
        PhaseField field = run.phaseSpace(1, ONE).wigner();
        double[] density = field.overMomenta();
        double mean = 0;
        double square = 0;
        for (int i = 0; i < density.length; i++) {
            mean += density[i] * field.grid().position(i) * field.grid().stepX();
        }
        for (int i = 0; i < density.length; i++) {
            double d = field.grid().position(i) - mean;
            square += density[i] * d * d * field.grid().stepX();
        }
        // the grid leaves a ten-millionth of the state out, at five spreads
        assertEquals(run.series(Observable.POSITION).value(4), mean, 1e-4);
        assertEquals(run.series(Observable.SPREAD_OF_POSITION).value(4), Math.sqrt(square), 1e-4);
        assertTrue(Math.abs(Math.sqrt(square) - Math.sqrt(0.5)) > 0.02, "no shear: " + Math.sqrt(square));
    }

    @Test
    void husimiIsNowhereNegativeAndWiderThanWigner() {
        PhaseSpace space = mode.number(3).evolve(1, PERIOD).run().phaseSpace(0.5, PERIOD);
        assertTrue(space.husimi().least() >= -space.husimi().bound().size());
        assertTrue(space.husimi().peak() < space.wigner().peak());
        assertEquals(1, space.width(), 0);
    }

    @Test
    void levelThreeIsAsNegativeAsPublished() {
        // recomputed after Kenfack and Zyczkowski, J. Opt. B 6 (2004) 396: levels 1 to 4
        double[] published = {0, 0.42612264, 0.72898926, 0.97667338, 1.19134248};
        for (int n = 1; n <= 4; n++) {
            PhaseField.Reading reading = mode.number(n)
                    .evolve(1, PERIOD)
                    .run()
                    .phaseSpace(0.25, PERIOD)
                    .negativity();
            assertEquals(published[n], reading.value(), reading.bound().size() + 5e-9);
            assertTrue(reading.bound().size() < 1e-5, "level " + n + ": " + reading.bound());
        }
    }

    @Test
    void negativityOfAHighLevelAgreesWithItsGrid() {
        PhaseSpace space = mode.number(40).evolve(1, PERIOD).run().phaseSpace(0.25, PERIOD);
        PhaseField.Reading grid = space.wigner(PhaseGrid.square(11.5, 801)).negativity();
        assertEquals(grid.value(), space.negativity().value(), grid.bound().size());
        assertTrue(space.negativity().bound().size() < 1e-5);
    }

    @Test
    void positionsThatGoRoundAreRefusedInWords() {
        Oscillator pendulum = Oscillator.in(Potential.pendulum(UNIT, UNIT, number(3)));
        Run run = pendulum.superposition(0, 1).evolve(1, ONE).frames(2).run();
        IllegalArgumentException round = assertThrows(IllegalArgumentException.class, () -> run.phaseSpace(0.5, ONE));
        assertTrue(round.getMessage().contains("go round"), round.getMessage());
    }

    @Test
    void anInstantOutsideTheRunIsRefusedByName() {
        Run run = mode.coherent(4).evolve(2, PERIOD).run();
        IllegalArgumentException late = assertThrows(IllegalArgumentException.class, () -> run.phaseSpace(2.5, PERIOD));
        assertTrue(late.getMessage().contains("2.5 periods"), late.getMessage());
        assertThrows(IllegalArgumentException.class, () -> run.phaseSpace(-0.1, PERIOD));
        assertThrows(IllegalArgumentException.class, () -> run.phaseFilm(5));
    }

    @Test
    void aFilmHasOneGridThatCoversTheMotion() {
        Run run = mode.coherent(8).evolve(1, PERIOD).frames(120).run();
        PhaseFilm film = run.phaseFilm(61);
        assertEquals(61, film.frames());
        assertEquals(2, film.stride());
        for (int k = 0; k < film.frames(); k += 10) {
            isGaussianAt(film.frame(k), 4 * Math.cos(film.time(k)), -4 * Math.sin(film.time(k)));
            assertEquals(1, film.frame(k).total(), 1e-4);
        }
        assertEquals(1 / Math.PI, film.peak(), 0.02);
    }
}
