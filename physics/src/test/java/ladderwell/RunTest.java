package ladderwell;

import static ladderwell.Observable.ENERGY;
import static ladderwell.Observable.MANDEL_Q;
import static ladderwell.Observable.MEAN_QUANTA;
import static ladderwell.Observable.MOMENTUM;
import static ladderwell.Observable.POSITION;
import static ladderwell.Observable.RETURN_PROBABILITY;
import static ladderwell.Observable.SPREAD_OF_MOMENTUM;
import static ladderwell.Observable.SPREAD_OF_POSITION;
import static ladderwell.Observable.SPREAD_OVER_SWING;
import static ladderwell.Observable.UNCERTAINTY_PRODUCT;
import static ladderwell.Observable.VARIANCE_OF_QUANTA;
import static ladderwell.Observable.population;
import static ladderwell.quantity.Units.ATOMIC_MASS;
import static ladderwell.quantity.Units.ELECTRONVOLT;
import static ladderwell.quantity.Units.ELECTRON_MASS;
import static ladderwell.quantity.Units.FEMTOSECOND;
import static ladderwell.quantity.Units.MEGAHERTZ;
import static ladderwell.quantity.Units.NANOMETRE;
import static ladderwell.quantity.Units.ONE;
import static ladderwell.quantity.Units.PERIOD;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Random;
import java.util.stream.Stream;
import ladderwell.classical.ClassicalOrbit;
import ladderwell.evidence.Certainty;
import ladderwell.evidence.PhysicsException;
import ladderwell.quantity.Quantity;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import tech.tablesaw.api.Table;

class RunTest {
    private final Harmonic mode = Oscillator.harmonic().natural();

    private static void within(String what, double expected, Series series, int j) {
        // 4 ulp: the closed form on the left is itself a double
        double allowed = series.error(j) + 4 * Math.ulp(expected);
        assertTrue(
                Math.abs(series.value(j) - expected) <= allowed,
                () -> what + " at time " + j + ": " + series.value(j) + " ± " + series.error(j) + ", closed form "
                        + expected);
    }

    @ParameterizedTest
    @ValueSource(doubles = {0, 1e-6, 0.3, 1, 9.5, 100, 1e4, 1e6, 1e8})
    void aCoherentStateMovesClassicallyWithItsShapeUnchanged(double mean) {
        // Glauber, Phys. Rev. 131 (1963) 2766: ⟨x⟩ on the classical orbit, Δx = Δp = √½, Poisson quanta; exact period
        Run run = mode.coherent(mean).evolve(3, PERIOD).frames(24).run();
        double swing = Math.sqrt(2 * mean);
        ClassicalOrbit orbit = ClassicalOrbit.harmonic(swing, 0);
        for (int j = 0; j < run.times(); j++) {
            double t = run.time(j);
            // the angle's own rounding moves the closed form by swing × ulp(t)
            double slack = swing * Math.ulp(t);
            Series x = run.series(POSITION);
            assertEquals(orbit.position(t), x.value(j), x.error(j) + slack + 1e-15);
            Series p = run.series(MOMENTUM);
            assertEquals(orbit.momentum(t), p.value(j), p.error(j) + slack + 1e-15);
            within("Δx", Math.sqrt(0.5), run.series(SPREAD_OF_POSITION), j);
            within("Δp", Math.sqrt(0.5), run.series(SPREAD_OF_MOMENTUM), j);
            within("2ΔxΔp/ħ", 1, run.series(UNCERTAINTY_PRODUCT), j);
            within("⟨E⟩", mean + 0.5, run.series(ENERGY), j);
            within("⟨n⟩", mean, run.series(MEAN_QUANTA), j);
            within("Var n", mean, run.series(VARIANCE_OF_QUANTA), j);
            within("|A|²", Math.exp(-4 * mean * Math.pow(Math.sin(t / 2), 2)), run.series(RETURN_PROBABILITY), j);
        }
        // errors are small enough to be of use: far below what they belong to
        assertTrue(
                run.series(SPREAD_OF_POSITION).error(5) < 1e-3,
                () -> "Δx ± " + run.series(SPREAD_OF_POSITION).error(5));
        assertTrue(run.series(POSITION).error(5) <= 1e-7 * (1 + swing));
        assertTrue(run.stateError().size() <= 1e-9);
        assertEquals(Certainty.GUARANTEED, run.series(POSITION).certainty());
        if (mean > 1e-3) {
            within("Δx/A", 1 / (2 * Math.sqrt(mean)), run.series(SPREAD_OVER_SWING), 7);
            within("Q", 0, run.series(MANDEL_Q), 7);
        }
    }

    @Test
    void aNumberStateStandsStill() {
        Run run = mode.number(1_000_000).evolve(1, PERIOD).frames(8).run();
        for (int j = 0; j < run.times(); j++) {
            within("⟨x⟩", 0, run.series(POSITION), j);
            within("Δx²", Math.sqrt(1_000_000.5), run.series(SPREAD_OF_POSITION), j);
            within("|A|²", 1, run.series(RETURN_PROBABILITY), j);
            within("P", 1, run.series(population(1_000_000)), j);
        }
        within("Q", -1, run.series(MANDEL_Q), 0);
        assertEquals("stationary: one level, nothing moves", run.verdict());
    }

    @Test
    void sparseSuperpositionsFollowTheTwoLevelFormulas() {
        // (|0⟩+|1⟩)/√2: ⟨x⟩ = cos t/√2; levels 0 and 1000 never meet in x: ⟨x⟩ = 0, ⟨x²⟩ = ⟨n⟩ + ½
        Run near = mode.superposition(0, 1).evolve(2, PERIOD).frames(16).run();
        Run far = mode.superposition(0, 1000).evolve(2, PERIOD).frames(16).run();
        Run both =
                mode.superposition(0, 1, 500, 501).evolve(2, PERIOD).frames(16).run();
        for (int j = 0; j < near.times(); j++) {
            double t = near.time(j);
            within("near", Math.cos(t) * Math.sqrt(0.5), near.series(POSITION), j);
            within("far", 0, far.series(POSITION), j);
            within("far spread", Math.sqrt(500.5), far.series(SPREAD_OF_POSITION), j);
            // pairs (0,1) and (500,501), each of weight ½: ⟨a⟩ = (1 + √501)/4 e^{-it}, and ⟨n⟩ = 250.5, ⟨a²⟩ = 0
            double a = (1 + Math.sqrt(501)) / 4;
            within("both", Math.sqrt(2) * a * Math.cos(t), both.series(POSITION), j);
            double variance = 250.5 + 0.5 - 2 * a * a * Math.cos(t) * Math.cos(t);
            within("both spread", Math.sqrt(variance), both.series(SPREAD_OF_POSITION), j);
        }
    }

    @Test
    void everythingInTheBoxReturnsAfterTheRevivalTimeAndIsMirroredAtHalfOfIt() {
        // Robinett, Phys. Rep. 392 (2004) 1: T_rev = 4mL²/πħ, ψ(x, T_rev/2) = −ψ(−x, 0) up to a phase
        Box box = Oscillator.box().natural();
        Run run = box.superposition(0, 1, 2, 5, 11)
                .weights(new double[] {1, 0.5, -0.3, 0.8, 0.1}, new double[] {0, 0.4, 0.2, 0, -1})
                .evolve(Box.REVIVAL_TIME, ONE)
                .frames(2)
                .run();
        Series back = run.series(RETURN_PROBABILITY);
        within("revival", 1, back, 2);
        assertTrue(back.value(1) < 0.99);
        Series x = run.series(POSITION);
        assertEquals(x.value(0), x.value(2), x.error(0) + x.error(2));
        assertEquals(-x.value(0), x.value(1), x.error(0) + x.error(1));
        assertTrue(Math.abs(x.value(0)) > 0.01);
    }

    @Test
    void anElectronInAFiniteWellDoesNotRepeat() {
        FiniteWell well = Oscillator.finiteWell()
                .mass(0.067, ELECTRON_MASS)
                .width(12, NANOMETRE)
                .depth(0.42, ELECTRONVOLT);
        Run run = well.superposition(0, 1, 2)
                .evolve(2000, FEMTOSECOND)
                .frames(4000)
                .run();
        Series back = run.series(RETURN_PROBABILITY);
        boolean away = false;
        for (int j = 0; j < back.size(); j++) {
            away |= back.value(j) < 0.5;
            // three incommensurate levels: no return to within 1e-4 in this time (found by the dense sampling itself)
            assertTrue(!away || back.value(j) < 1 - 1e-4, "returned at step " + j);
        }
        assertTrue(away);
        assertTrue(run.verdict().startsWith("no common period is claimed"), run.verdict());
        Series energy = run.series(ENERGY);
        assertEquals(energy.value(0), energy.value(4000), 0);
    }

    @Test
    void meansOnElementsAndOnTheLadderAgree() {
        Random random = new Random(5);
        for (int round = 0; round < 40; round++) {
            int size = 2 + random.nextInt(6);
            long[] levels = random.longs(0, 40).distinct().limit(size).sorted().toArray();
            double[] re = random.doubles(size, -1, 1).toArray();
            double[] im = random.doubles(size, -1, 1).toArray();
            Run run = mode.superposition(levels)
                    .weights(re, im)
                    .evolve(1 + random.nextInt(50), ONE)
                    .frames(7)
                    .run();
            var elements = ladderwell.motion.Means.onElements(((OnLevels) run.representation()).phased());
            for (int j = 0; j < run.times(); j++) {
                assertEquals(
                        run.series(POSITION).value(j),
                        elements.position(j),
                        run.series(POSITION).error(j) + elements.positionError());
                assertEquals(
                        run.series(MOMENTUM).value(j),
                        elements.momentum(j),
                        run.series(MOMENTUM).error(j) + elements.momentumError());
                assertEquals(
                        run.series(SPREAD_OF_POSITION).value(j),
                        elements.positionSpread(j),
                        run.series(SPREAD_OF_POSITION).error(j) + elements.positionSpreadError(j));
                assertEquals(
                        run.series(SPREAD_OF_MOMENTUM).value(j),
                        elements.momentumSpread(j),
                        run.series(SPREAD_OF_MOMENTUM).error(j) + elements.momentumSpreadError(j));
            }
        }
    }

    @Test
    void heisenbergsBoundHoldsForEveryKindOfState() {
        Box box = Oscillator.box().natural();
        FiniteWell well = Oscillator.finiteWell().natural(4000);
        Stream<State> states = Stream.of(
                mode.number(3),
                mode.superposition(2, 3, 9),
                box.number(0),
                box.superposition(0, 1, 2),
                well.number(0),
                well.superposition(1, 4),
                well.gaussian(Quantity.of(0.05, ONE), Quantity.of(6, ONE), Quantity.of(0.06, ONE)));
        for (State state : states.toList()) {
            Run run = state.evolve(1.7, PERIOD).frames(50).tolerance(1e-3).run();
            Series product = run.series(UNCERTAINTY_PRODUCT);
            for (int j = 0; j < product.size(); j++) {
                assertTrue(product.value(j) + product.error(j) >= 1, state + ": " + product.value(j));
            }
        }
    }

    @Test
    void theTableHasUnitsInItsHeadsAndErrorsBesideItsValues() {
        Harmonic trap = Oscillator.harmonic().mass(40, ATOMIC_MASS).frequency(1.2, MEGAHERTZ);
        Table table = trap.coherent(9.5)
                .evolve(3, PERIOD)
                .frames(120)
                .run()
                .table(POSITION, SPREAD_OF_POSITION, ENERGY, RETURN_PROBABILITY);
        assertEquals(
                List.of(
                        "time / µs",
                        "time / periods",
                        "position / nm",
                        "± position / nm (guaranteed)",
                        "spread of position / nm",
                        "± spread of position / nm (guaranteed)",
                        "energy / neV",
                        "± energy / neV (guaranteed)",
                        "return probability",
                        "± return probability (guaranteed)"),
                table.columnNames());
        assertEquals(121, table.rowCount());
        assertEquals(2.5, table.doubleColumn("time / µs").get(120), 1e-12);
        assertEquals(3, table.doubleColumn("time / periods").get(120), 1e-14);
        // ħω(9.5 + ½) with ħω = h·1.2 MHz
        assertEquals(
                10 * 6.62607015e-34 * 1.2e6 / 1.602176634e-19 * 1e9,
                table.doubleColumn("energy / neV").get(60),
                table.doubleColumn("± energy / neV (guaranteed)").get(60) + 1e-13);
    }

    @Test
    void whatDoesNotFitIsRefusedBeforeItIsAllocated() {
        Evolution huge = mode.coherent(9.5).evolve(3, PERIOD).frames(1_000_000_000L);
        PhysicsException.TooLarge refused = assertThrows(PhysicsException.TooLarge.class, huge::run);
        assertTrue(refused.estimate() > 1e11, refused.getMessage());
        Run run = mode.coherent(9.5).evolve(3, PERIOD).frames(100_000).run();
        assertThrows(PhysicsException.TooLarge.class, () -> run.density(1_000_000));
    }

    @Test
    void badRequestsAreRefusedInOneSentence() {
        State psi = mode.coherent(1);
        assertTrue(OscillatorTest.message(() -> psi.evolve(-1, PERIOD)).contains("duration must be positive"));
        assertTrue(OscillatorTest.message(() -> psi.evolve(1, MEGAHERTZ)).contains("duration must be"));
        assertTrue(OscillatorTest.message(() -> psi.evolve(1, PERIOD).frames(0)).contains("at least 1"));
        assertTrue(OscillatorTest.message(() -> psi.evolve(1, PERIOD).tolerance(1e-20))
                .contains("between 1e-13"));
        Run run =
                Oscillator.box().natural().superposition(0, 1).evolve(1, PERIOD).run();
        assertTrue(OscillatorTest.message(() -> run.series(MEAN_QUANTA)).contains("defined for a harmonic oscillator"));
        assertTrue(OscillatorTest.message(run::table).contains("at least one observable"));
    }

    @Test
    void theRecordIsTheSameForTheSameRequest() {
        Evolution evolution = mode.coherent(9.5).evolve(3, PERIOD).frames(12);
        assertEquals(evolution.run().record().json(), evolution.run().record().json());
        assertTrue(evolution.run().record().json().contains("exact phases on levels"));
    }
}
