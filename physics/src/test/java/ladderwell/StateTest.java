package ladderwell;

import static ladderwell.quantity.Units.ATOMIC_MASS;
import static ladderwell.quantity.Units.DEGREE;
import static ladderwell.quantity.Units.MEGAHERTZ;
import static ladderwell.quantity.Units.NANOMETRE;
import static ladderwell.quantity.Units.ONE;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import ladderwell.evidence.PhysicsException;
import ladderwell.quantity.Quantity;
import ladderwell.quantity.Units;
import org.junit.jupiter.api.Test;

class StateTest {
    private final Harmonic trap = Oscillator.harmonic().mass(40, ATOMIC_MASS).frequency(1.2, MEGAHERTZ);

    @Test
    void theThreeWaysToNameACoherentStateAgree() {
        Coherent byMean = trap.coherent(9.5).phase(30, DEGREE);
        double root = Math.sqrt(9.5);
        Coherent byAlpha = trap.coherentAlpha(root * Math.cos(Math.PI / 6), root * Math.sin(Math.PI / 6));
        double length = trap.scale().length();
        double momentum = trap.scale().momentum();
        Coherent byPlace = trap.coherentAt(
                Quantity.of(byMean.position() * length * 1e9, NANOMETRE),
                Quantity.of(byMean.momentum() * momentum, Units.KILOGRAM_METRE_PER_SECOND));
        for (Coherent other : new Coherent[] {byAlpha, byPlace}) {
            assertEquals(byMean.mean(), other.mean(), 1e-13);
            assertEquals(byMean.phaseAngle(), other.phaseAngle(), 1e-14);
        }
    }

    @Test
    void spreadOverSwingIsOneOverTwiceTheRootOfTheMeanQuanta() {
        // common practice, no source
        for (double mean : new double[] {0.25, 9.5, 1e4, 1e8}) {
            Fact ratio = trap.coherent(mean).facts().stream()
                    .filter(f -> f.name().equals("spread over swing"))
                    .findFirst()
                    .orElseThrow();
            assertEquals(1 / (2 * Math.sqrt(mean)), ratio.value().value(), 1e-15);
        }
    }

    @Test
    void poissonPopulationsOfACoherentState() {
        // S-COH-01, S-COH-02: Poisson distribution; Glauber, Phys. Rev. 131 (1963) 2766
        Run four = trap.coherent(4).evolve(1, Units.PERIOD).frames(4).run();
        Series p4 = four.series(Observable.population(4));
        assertEquals(0.1953668148131646, p4.value(0), p4.error(0) + 1e-16);
        Run one = trap.coherent(1).evolve(1, Units.PERIOD).frames(4).run();
        assertEquals(
                0.3678794411714423,
                one.series(Observable.population(0)).value(0),
                one.series(Observable.population(0)).error(0) + 1e-16);
    }

    @Test
    void aLevelThatIsNotBoundIsNamedWithTheLastOneThatIs() {
        FiniteWell well = Oscillator.finiteWell().natural(8 * Math.PI * Math.PI / 2);
        String message = OscillatorTest.message(() -> well.superposition(0, 1, 3));
        assertTrue(message.contains("level 3 is not bound") && message.contains("0 to 2"), message);
        assertTrue(OscillatorTest.message(() -> well.number(-1)).contains("counted from 0"));
    }

    @Test
    void aPacketThatTheBoundLevelsCannotCarryIsRefusedWithTheMissingWeight() {
        FiniteWell well = Oscillator.finiteWell().natural(8 * Math.PI * Math.PI / 2);
        Packet fast = well.gaussian(Quantity.of(0, ONE), Quantity.of(12, ONE), Quantity.of(0.1, ONE));
        PhysicsException.NotCarried refused =
                assertThrows(PhysicsException.NotCarried.class, () -> fast.amplitudes(1e-6));
        assertTrue(refused.missingWeight() > 0.1 && refused.missingWeight() < 1, refused.getMessage());
        assertTrue(String.valueOf(refused.getMessage()).lines().count() == 1);
    }

    @Test
    void badStatesAreRefusedInOneSentence() {
        assertTrue(OscillatorTest.message(() -> trap.coherent(-1)).contains("at least 0, not -1"));
        assertTrue(OscillatorTest.message(() -> trap.coherent(Double.NaN)).contains("finite"));
        assertTrue(OscillatorTest.message(() -> trap.coherent(4).phase(3, MEGAHERTZ))
                .contains("an angle such as 30 deg"));
        assertTrue(OscillatorTest.message(() -> trap.superposition()).contains("at least one level"));
        assertTrue(OscillatorTest.message(() -> trap.superposition(1, 1)).contains("each level once"));
        assertTrue(OscillatorTest.message(() -> trap.superposition(1, 2).weights(1))
                .contains("as many weights"));
        assertTrue(OscillatorTest.message(() -> trap.superposition(1, 2).weights(0, 0))
                .contains("differ from 0"));
    }
}
