package ladderwell.kernel.magic;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import ladderwell.kernel.cell.SentenceFailure;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;

/** Phase space in sentences. */
class PhaseSpaceSentencesTest {
    private final Bench bench = new Bench();

    @BeforeEach
    void declareARun() throws SentenceFailure {
        bench.run("""
                %%declare
                oscillator trap: harmonic, mass 40 u, frequency 1.2 MHz
                state psi: coherent in trap, mean 9.5
                evolve run: psi for 3 periods, frames 30
                """);
    }

    private Object last(String cell) throws SentenceFailure {
        bench.run(cell);
        return bench.emitted.get(bench.emitted.size() - 1);
    }

    @Test
    void anInstantIsAPortrait() throws SentenceFailure {
        PhasePortrait portrait = assertInstanceOf(PhasePortrait.class, last("%phasespace run at 1.5 periods"));
        assertEquals("run", portrait.name());
        assertFalse(portrait.husimi());
        assertEquals(1.5, portrait.space().periods().orElseThrow(), 1e-12);
        PhasePortrait other = assertInstanceOf(PhasePortrait.class, last("%phasespace run at 1 us, husimi"));
        assertTrue(other.husimi());
        assertEquals(1.2, other.space().periods().orElseThrow(), 1e-12);
    }

    @Test
    void withoutAnInstantItIsTheWholeRun() throws SentenceFailure {
        PhaseAnimation film = assertInstanceOf(PhaseAnimation.class, last("%phasespace run"));
        assertEquals(31, film.film().frames());
    }

    @Test
    void mistakesAreNamed() {
        SentenceFailure late = assertThrows(SentenceFailure.class, () -> bench.run("%phasespace run at 4 periods"));
        assertTrue(late.message().contains("lies outside the run"), late.message());
        SentenceFailure film = assertThrows(SentenceFailure.class, () -> bench.run("%phasespace run, husimi"));
        assertTrue(film.message().contains("'at'"), film.message());
        SentenceFailure unit = assertThrows(SentenceFailure.class, () -> bench.run("%phasespace run at 4 nm"));
        assertTrue(unit.message().contains("time"), unit.message());
        assertThrows(SentenceFailure.class, () -> bench.run("%phasespace psi at 1 periods"));
    }
}
