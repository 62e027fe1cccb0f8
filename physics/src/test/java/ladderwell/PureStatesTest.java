package ladderwell;

import static ladderwell.quantity.Units.ATOMIC_MASS;
import static ladderwell.quantity.Units.DECIBEL;
import static ladderwell.quantity.Units.DEGREE;
import static ladderwell.quantity.Units.MEGAHERTZ;
import static ladderwell.quantity.Units.ONE;
import static ladderwell.quantity.Units.PERIOD;
import static ladderwell.quantity.Units.RADIAN;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import ladderwell.mode.Mode;
import ladderwell.mode.Part;
import org.junit.jupiter.api.Test;

/** Squeezed states, cats and displaced number states as nouns: closed forms against their own amplitudes. */
class PureStatesTest {
    private final Harmonic trap = Oscillator.harmonic().mass(40, ATOMIC_MASS).frequency(1.2, MEGAHERTZ);
    private final Harmonic unit = Oscillator.harmonic().natural();

    private static Fact fact(State state, String name) {
        return state.facts().stream()
                .filter(f -> f.name().equals(name))
                .findFirst()
                .orElseThrow(() -> new AssertionError(state.kind() + " has no " + name));
    }

    private static double value(State state, String name) {
        return fact(state, name).value().value();
    }

    private static List<State> assorted(Ladder oscillator) {
        Random random = new Random(20261201);
        List<State> all = new ArrayList<>();
        for (int i = 0; i < 12; i++) {
            double mean = i % 4 == 0 ? 0 : 12 * random.nextDouble();
            double turn = 360 * random.nextDouble();
            all.add(oscillator
                    .squeezed(1.2 * random.nextDouble(), ONE)
                    .angle(360 * random.nextDouble(), DEGREE)
                    .mean(mean)
                    .phase(turn, DEGREE));
            all.add(oscillator.displacedNumber(random.nextInt(8), mean).phase(turn, DEGREE));
            int components = 2 + random.nextInt(4);
            Cat cat = oscillator.cat(0.1 + mean).components(components).phase(turn, DEGREE);
            all.add(cat.residue(random.nextInt(components)));
            all.add(cat.relativePhase(360 * random.nextDouble(), DEGREE));
        }
        return all;
    }

    @Test
    void sixDecibelsAreTheirDefinition() {
        // 10 log₁₀ e^{2r} = 6: r = 6 ln 10 / 20
        Squeezed state = trap.squeezed(6, DECIBEL);
        assertEquals(6 * Math.log(10) / 20, state.r(), 4e-16);
        assertEquals(6, value(state, "squeezing"), 4e-15);
        assertEquals(0.5 * Math.pow(10, -0.6), value(state, "least variance (vacuum ½)"), 4e-16);
        assertEquals(0.5 * Math.pow(10, 0.6), value(state, "largest variance (vacuum ½)"), 1e-14);
        double ground = trap.scale().length() * Math.sqrt(0.5);
        Fact spread = fact(state, "spread of position");
        assertEquals(Math.pow(10, -0.3), spread.value().si() / ground, 1e-14);
        assertEquals(
                Math.pow(10, 0.3),
                fact(state.angle(90, DEGREE), "spread of position").value().si() / ground,
                1e-14);
    }

    @Test
    void squeezedStatesHaveThePublishedNumbers() {
        // S-SQ-01, S-SQ-03, S-SQ-04: Walls and Milburn, Quantum Optics, ch. 2; Yuen, Phys. Rev. A 13 (1976) 2226
        Squeezed vacuum = unit.squeezed(1, ONE);
        assertEquals(1.381097845541816, value(vacuum, "mean quanta"), 1e-15);
        assertEquals(4.762195691083631, value(vacuum, "variance of quanta") / value(vacuum, "mean quanta"), 3e-15);
        Run run = vacuum.evolve(1, PERIOD).frames(2).run();
        Series none = run.series(Observable.population(0));
        assertEquals(0.6480542736638854, none.value(0), none.error(0) + 1e-16);
        // S-SC-01a: Loudon and Knight, J. Mod. Opt. 34 (1987) 709
        Squeezed bright = unit.squeezed(0.5, ONE).mean(4);
        double quanta = value(bright, "mean quanta");
        assertEquals(-0.493843783085530, (value(bright, "variance of quanta") - quanta) / quanta, 2e-15);
        // S-SC-01c: Yuen 1976 eq. (3.23); Gong and Aravind, Am. J. Phys. 58 (1990) 1003
        Series five = bright.evolve(1, PERIOD).frames(2).run().series(Observable.population(5));
        assertEquals(0.246962001495588, five.value(0), five.error(0) + 1e-15);
    }

    @Test
    void catsAndDisplacedNumberStatesHaveThePublishedNumbers() {
        // S-CAT-01a, S-CAT-01b, S-CAT-02a: Buzek, Vidiella-Barranco and Knight, Phys. Rev. A 45 (1992) 6570; Gerry 1993
        assertEquals(0.7615941559557649, value(unit.cat(1), "mean quanta"), 2e-16);
        assertEquals(0.55144112954357, value(unit.cat(1), "Mandel Q"), 1e-14);
        assertEquals(1.313035285499331, value(unit.cat(1).odd(), "mean quanta"), 1e-15);
        // S-DF-01: de Oliveira, Kim, Knight and Buzek, Phys. Rev. A 41 (1990) 2645
        assertEquals(2.4, value(unit.displacedNumber(1, 4), "Fano factor"), 1e-15);
    }

    @Test
    void factsAgreeWithTheLevelsWithinTheSumOfTheirErrors() {
        for (State state : assorted(unit)) {
            Run run = state.evolve(1, PERIOD).frames(1).tolerance(1e-12).run();
            for (Observable o : List.of(Observable.MEAN_QUANTA, Observable.VARIANCE_OF_QUANTA)) {
                Series series = run.series(o);
                Fact fact = fact(state, o.name());
                assertTrue(
                        Math.abs(series.value(0) - fact.value().value())
                                <= series.error(0) + fact.bound().size(),
                        state + " " + o.name() + ": " + fact + " against " + series.value(0) + " ± " + series.error(0));
            }
            Series energy = run.series(Observable.ENERGY);
            assertEquals(
                    energy.value(0), state.meanEnergy(), energy.error(0) + 1e-13 * state.meanEnergy(), state::toString);
        }
    }

    @Test
    void spreadsAgreeWithTheLevels() {
        for (State state : assorted(unit)) {
            if (state instanceof Cat) {
                continue;
            }
            Run run = state.evolve(1, PERIOD).frames(1).tolerance(1e-12).run();
            for (Observable o : List.of(Observable.SPREAD_OF_POSITION, Observable.SPREAD_OF_MOMENTUM)) {
                Series series = run.series(o);
                Fact fact = fact(state, o.name());
                assertTrue(
                        Math.abs(series.value(0) - fact.value().value())
                                <= series.error(0) + fact.bound().size(),
                        state + " " + o.name() + ": " + fact + " against " + series.value(0));
            }
        }
    }

    @Test
    void energiesInANonlinearDrivenModeAreThoseOfItsHamiltonian() {
        LadderMode mode = Oscillator.mode(
                "hamiltonian", Mode.natural(1).with(new Part.Kerr(0.07)).with(new Part.Duffing(0.02)), List.of());
        for (State state : assorted(mode)) {
            Run run = state.evolve(1e-3, ONE).frames(1).tolerance(1e-9).run();
            Series energy = run.series(Observable.ENERGY);
            assertEquals(energy.value(0), state.meanEnergy(), energy.error(0) + 1e-12, state::toString);
        }
    }

    @Test
    void theMomentsOfFarCatsDoNotCancel() {
        // the components of 10^8 quanta do not overlap: Poissonian, whatever the sign between them
        Cat far = unit.cat(1e8).odd();
        assertEquals(1e8, value(far, "mean quanta"), 0);
        assertEquals(1e8, value(far, "variance of quanta"), 0);
        assertEquals(0, value(far, "Mandel Q"), 0);
        // an odd cat of hardly any quanta is one quantum, with few more: ⟨n⟩ = μ coth μ
        Cat faint = unit.cat(1e-6).odd();
        assertEquals(1 + 1e-12 / 3, value(faint, "mean quanta"), 4e-16);
        assertEquals(-1, value(faint, "parity"), 0);
    }

    @Test
    void theTwoWaysToSumTheClassesOfACatAgree() {
        for (int components : new int[] {2, 5, 40, 63}) {
            Cat below = unit.cat(600).components(components).residue(1);
            Cat above = unit.cat(Math.nextUp(600.0)).components(components).residue(1);
            for (String name : new String[] {"mean quanta", "variance of quanta", "parity"}) {
                Fact one = fact(below, name);
                Fact other = fact(above, name);
                assertEquals(
                        one.value().value(),
                        other.value().value(),
                        one.bound().size() + other.bound().size() + 1e-12,
                        name + " of " + components);
            }
        }
    }

    @Test
    void parityIsThatOfTheKeptLevels() {
        assertEquals(1, value(unit.cat(2), "parity"), 1e-15);
        assertEquals(-1, value(unit.cat(2).odd(), "parity"), 1e-15);
        assertEquals(1, value(unit.squeezed(6, DECIBEL), "parity"), 1e-15);
        // |α⟩ + e^{iχ}|−α⟩ at χ = 90 deg: the parity is that of |α⟩ alone, e^{−2μ}
        assertEquals(Math.exp(-4), value(unit.cat(2).relativePhase(90, DEGREE), "parity"), 1e-15);
        // squeezing leaves the Wigner function at the origin of a state displaced along its wide axis e^{−2|α|²
        // e^{−2r}}
        Squeezed moved = unit.squeezed(1, ONE).mean(3).phase(90, DEGREE);
        assertEquals(Math.exp(-6 * Math.exp(-2)), value(moved, "parity"), 1e-15);
    }

    @Test
    void aSqueezedSpreadComesBackTwiceInAPeriod() {
        Squeezed state = unit.squeezed(6, DECIBEL).mean(4);
        Run run = state.evolve(1, PERIOD).frames(4).run();
        Series spread = run.series(Observable.SPREAD_OF_POSITION);
        for (int j = 0; j <= 4; j++) {
            double expected = Math.sqrt(0.5 * Math.pow(10, j % 2 == 0 ? -0.6 : 0.6));
            assertEquals(expected, spread.value(j), spread.error(j) + 1e-15);
        }
    }

    @Test
    void declarationsAreKeptForTheRecordEachOnce() {
        Cat cat = trap.cat(4).odd().components(3).residue(2).phase(10, DEGREE).phase(20, DEGREE);
        assertEquals(
                List.of("mean", "components", "residue", "phase"),
                cat.given().stream().map(Fact::name).toList());
        assertEquals("3 coherent components, levels 2 modulo 3", cat.origin());
        Run run = trap.squeezed(6, DECIBEL)
                .angle(0.5, RADIAN)
                .evolve(1, PERIOD)
                .frames(1)
                .run();
        assertTrue(
                run.record().toString().contains("squeezing"),
                () -> run.record().toString());
    }

    @Test
    void badStatesAreRefusedInOneSentence() {
        assertTrue(OscillatorTest.message(() -> trap.squeezed(-1, DECIBEL)).contains("0 and 43 dB"));
        assertTrue(OscillatorTest.message(() -> trap.squeezed(60, DECIBEL)).contains("not 60 dB"));
        assertTrue(OscillatorTest.message(() -> trap.squeezed(Double.NaN, ONE)).contains("NaN"));
        assertTrue(OscillatorTest.message(() -> trap.squeezed(6, DEGREE)).contains("a squeezing such as 6 dB"));
        assertTrue(OscillatorTest.message(() -> trap.cat(-4)).contains("at least 0, not -4"));
        assertTrue(OscillatorTest.message(() -> trap.cat(4).components(1)).contains("2 to 64, not 1"));
        assertTrue(OscillatorTest.message(() -> trap.cat(4).components(3).odd()).contains("residue"));
        assertTrue(OscillatorTest.message(() -> trap.cat(4).residue(2)).contains("between 0 and 1, not 2"));
        assertTrue(OscillatorTest.message(() -> trap.cat(0).odd().meanQuanta()).contains("almost nothing is left"));
        assertTrue(OscillatorTest.message(() -> trap.displacedNumber(-1, 4)).contains("not -1"));
        assertTrue(OscillatorTest.message(() -> trap.displacedNumber(1, 1e13)).contains("are carried"));
    }
}
