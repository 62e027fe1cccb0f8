package ladderwell;

import static ladderwell.quantity.Units.ATOMIC_MASS;
import static ladderwell.quantity.Units.FEMTOSECOND;
import static ladderwell.quantity.Units.ONE;
import static ladderwell.quantity.Units.PER_CENTIMETRE;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import ladderwell.evidence.Certainty;
import ladderwell.evidence.PhysicsException;
import ladderwell.formula.Formula;
import ladderwell.formula.Parameters;
import ladderwell.potential.Potential;
import ladderwell.quantity.Quantity;
import ladderwell.quantity.Units;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import tech.tablesaw.api.Table;

class GridRunTest {
    private static final Quantity UNIT = Quantity.of(1, ONE);

    private static Quantity number(double value) {
        return Quantity.of(value, ONE);
    }

    private static Formula natural(String text) {
        return Formula.natural(text, Parameters.none());
    }

    @Test
    void aForcedOscillatorHasThePoissonianPopulationsOfItsClosedForm() {
        // V = x²/2 − F x sin(wt), F(0) = 0, from the ground state: |α(t)|² = |∫F e^{is} ds|²/2
        double f = 0.5;
        double w = 0.8;
        Oscillator driven = Oscillator.in(natural("x^2/2 - 0.5*x*sin(0.8*t)"), UNIT);
        Run run = driven.number(0).evolve(9, ONE).frames(3).run();
        assertEquals("split operator of order 4 on a grid", run.method());
        assertTrue(run.amplitudes().isEmpty());
        for (int j = 0; j <= 3; j++) {
            double t = 3.0 * j;
            // x'' = −x + F sin wt from rest: x = F (sin wt − w sin t)/(1 − w²)
            double x = f * (Math.sin(w * t) - w * Math.sin(t)) / (1 - w * w);
            double p = f * w * (Math.cos(w * t) - Math.cos(t)) / (1 - w * w);
            double mean = (x * x + p * p) / 2;
            Series position = run.series(Observable.POSITION);
            assertEquals(x, position.value(j), position.error(j));
            assertEquals(Certainty.ESTIMATED, position.certainty());
            double poisson = Math.exp(-mean);
            for (int n = 0; n < 4; n++) {
                Series population = run.series(Observable.population(n));
                assertEquals(poisson, population.value(j), population.error(j) + 1e-14, n + " at " + t);
                poisson *= mean / (n + 1);
            }
            Series spread = run.series(Observable.SPREAD_OF_POSITION);
            assertEquals(Math.sqrt(0.5), spread.value(j), spread.error(j));
            Series product = run.series(Observable.UNCERTAINTY_PRODUCT);
            assertEquals(1, product.value(j), product.error(j));
            Series energy = run.series(Observable.ENERGY);
            assertEquals(0.5 + mean - f * x * Math.sin(w * t), energy.value(j), energy.error(j));
        }
        assertTrue(run.errorLine().contains("estimated"));
        assertTrue(run.record().json().contains("the potential depends on time"));
    }

    @ParameterizedTest
    @ValueSource(doubles = {1e-4, 1e-5, 1e-8, 1e-10})
    void aForceThatSetsInAtOnceIsMetAtItsInstant(double tolerance) {
        assertSetsIn("x^2/2 - if(t > 3.3, 0.5*x, 0)", 3.3, tolerance);
        assertSetsIn("x^2/2 - 0.5*x*step(t - 3.01)", 3.01, tolerance);
    }

    /** A force 1/2 on the ground state from a time on: x = (1 − cos(t − from))/2, p = sin(t − from)/2. */
    private static void assertSetsIn(String potential, double from, double tolerance) {
        Run run = Oscillator.in(natural(potential), UNIT)
                .number(0)
                .evolve(8, ONE)
                .frames(1)
                .tolerance(tolerance)
                .run();
        double x = (1 - Math.cos(8 - from)) / 2;
        double p = Math.sin(8 - from) / 2;
        Series position = run.series(Observable.POSITION);
        assertEquals(x, position.value(1), position.error(1), potential + " at " + tolerance);
        Series momentum = run.series(Observable.MOMENTUM);
        assertEquals(p, momentum.value(1), momentum.error(1), potential + " at " + tolerance);
        Series ground = run.series(Observable.population(0));
        assertEquals(Math.exp(-(x * x + p * p) / 2), ground.value(1), ground.error(1) + 1e-14, potential);
        assertTrue(ground.error(1) < 4 * tolerance, ground.error(1) + " at " + tolerance);
    }

    @Test
    void gridAndLevelsAgreeWithinTheirErrors() {
        Potential quartic = Potential.of("x^4/4", UNIT, Parameters.none());
        Oscillator still = Oscillator.in(quartic);
        // the same potential, written so that it depends on time in form only where the packet never is
        Oscillator moving = Oscillator.in(natural("x^4/4 + 0*t + if(t > 1e9, 1, 0)"), UNIT);
        assertTrue(moving.moves());
        Run levels = still.gaussian(number(1.2), number(0.4), number(0.6))
                .evolve(4, ONE)
                .frames(4)
                .run();
        Run grid = moving.gaussian(number(1.2), number(0.4), number(0.6))
                .evolve(4, ONE)
                .frames(4)
                .run();
        assertEquals("exact phases on levels", levels.method());
        for (Observable o : new Observable[] {
            Observable.POSITION,
            Observable.MOMENTUM,
            Observable.SPREAD_OF_POSITION,
            Observable.SPREAD_OF_MOMENTUM,
            Observable.RETURN_PROBABILITY,
            Observable.RETURN_AMPLITUDE_REAL,
            Observable.ENERGY,
            Observable.population(2)
        }) {
            Series a = levels.series(o);
            Series b = grid.series(o);
            for (int j = 0; j <= 4; j++) {
                assertEquals(a.value(j), b.value(j), a.error(j) + b.error(j), o.name() + " at " + j);
            }
        }
        Density onLevels = levels.density(1601);
        Density onGrid = grid.density(101);
        double spacing = onLevels.position(1) - onLevels.position(0);
        int compared = 0;
        for (int k = 0; k < 101; k++) {
            double place = (onGrid.position(k) - onLevels.position(0)) / spacing;
            int at = (int) Math.floor(place);
            if (at >= 1 && at + 2 < 1601) {
                double t = place - at;
                double a = onLevels.value(3, at - 1);
                double b = onLevels.value(3, at);
                double c = onLevels.value(3, at + 1);
                double d = onLevels.value(3, at + 2);
                double between = b
                        + t * (c - a) / 2
                        + t * t * (a - 2.5 * b + 2 * c - d / 2)
                        + t * t * t * (1.5 * (b - c) + (d - a) / 2);
                // Catmull and Rom's cubic is off by about spacing³/10 of a third derivative of some tens
                assertEquals(between, onGrid.value(3, k), 2e-6, "density at x = " + onGrid.position(k));
                compared++;
            }
        }
        assertTrue(compared > 40, "only " + compared + " places were compared");
        double sum = 0;
        for (int i = 0; i < 101; i++) {
            sum += onGrid.value(3, i) * (onGrid.position(1) - onGrid.position(0));
        }
        // the trapezoidal rule of a smooth function that ends at 1e-7 of its peak
        assertEquals(1, sum, 1e-4);
    }

    @Test
    void aFreePacketHasNoPeriodAndSpreads() {
        Oscillator free = Oscillator.open(natural("0"), UNIT, UNIT);
        Run run = free.gaussian(number(0), number(2), number(0.5))
                .evolve(3, ONE)
                .frames(3)
                .run();
        Table table = run.table(Observable.POSITION, Observable.SPREAD_OF_POSITION);
        assertFalse(table.columnNames().contains("time / periods"));
        Series spread = run.series(Observable.SPREAD_OF_POSITION);
        assertEquals(0.5 * Math.hypot(1, 3 / (2 * 0.25)), spread.value(3), spread.error(3));
        assertEquals(6, run.series(Observable.POSITION).value(3), 1e-8);
        assertTrue(run.record().json().contains("binds nothing"));
        assertTrue(run.verdict().contains("no levels carry"), run.verdict());
    }

    @Test
    void aPacketThatBreaksABondMovesOnAGrid() {
        // HCl, constants of Huber and Herzberg (1979); a kick that gives more than the bond's energy
        Oscillator hcl = Oscillator.in(Potential.morseFromLevels(
                Quantity.of(0.9796, ATOMIC_MASS),
                Quantity.of(2990.9463, PER_CENTIMETRE),
                Quantity.of(52.8186, PER_CENTIMETRE)));
        double kick =
                Math.sqrt(2 * 1.3 * 0.5 * hcl.potential(50.0)) * hcl.scale().momentum();
        State kicked = hcl.gaussian(
                Quantity.of(0, Units.METRE),
                Quantity.of(
                        kick / Units.parse("hbar/nm").orElseThrow().toSi(1),
                        Units.parse("hbar/nm").orElseThrow()),
                Quantity.of(0.1, Units.ANGSTROM));
        assertThrows(PhysicsException.NotCarried.class, () -> kicked.amplitudes(1e-8));
        Run run = kicked.evolve(30, FEMTOSECOND).frames(3).tolerance(1e-7).run();
        assertTrue(run.record().json().contains("the bound levels miss weight"));
        Series energy = run.series(Observable.ENERGY);
        assertEquals(energy.value(0), energy.value(3), energy.error(0) + energy.error(3));
        assertEquals(run.state().meanEnergy(), energy.value(0), 1e-6 * energy.value(0));
        // populations of bound levels do not change
        Series third = run.series(Observable.population(3));
        assertEquals(third.value(0), third.value(3), third.error(0) + third.error(3));
    }

    @Test
    void wallsAndJumpsStayWithTheLevelsAndWhatTheySay() {
        Oscillator well = Oscillator.in(natural("if(abs(x) < 2, 0, 3)"), UNIT);
        assertThrows(
                PhysicsException.NotCarried.class,
                () -> well.gaussian(number(0), number(4), number(0.3))
                        .evolve(1, ONE)
                        .run());
    }

    @Test
    void recordsOfGridRunsAreTheSameEveryTime() {
        Oscillator driven = Oscillator.in(natural("x^2/2 - 0.5*x*sin(0.8*t)"), UNIT);
        Evolution evolution = driven.number(1).evolve(2, ONE).frames(2);
        assertEquals(evolution.run().record().json(), evolution.run().record().json());
        assertTrue(evolution.run().record().json().contains("x^2/2 - 0.5*x*sin(0.8*t)"));
    }
}
