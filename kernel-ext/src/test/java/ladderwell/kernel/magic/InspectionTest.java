package ladderwell.kernel.magic;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Optional;
import ladderwell.kernel.cell.MimeBundle;
import ladderwell.kernel.cell.SentenceFailure;
import org.junit.jupiter.api.Test;

class InspectionTest {
    private final Bench bench = new Bench();

    private String inspected(String text, int detail) {
        int cursor = text.indexOf('|');
        return bench.declarations
                .inspect(text.replace("|", ""), cursor, detail, bench)
                .map(MimeBundle::plainText)
                .orElse("");
    }

    private void assertSays(String text, String... parts) {
        String said = inspected(text, 0);
        for (String part : parts) {
            assertTrue(said.contains(part), () -> "expected '" + part + "' in:\n" + said);
        }
    }

    @Test
    void aNounSaysItsForm() {
        assertSays("%sta|te psi: coherent in trap", "state: a noun", "form: state NAME: KIND in OSCILLATOR");
        assertTrue(inspected("%state| psi", 1).contains("superposition: several levels at once"));
    }

    @Test
    void aKindSaysItsFormulaAndItsKeys() {
        assertSays(
                "%oscillator x: finite we|ll, mass",
                "finite well: a kind of oscillator",
                "formula: V = 0 for |x| < L/2",
                "keys: mass, width, depth; natural, depth");
    }

    @Test
    void aKeySaysMeaningUnitDefaultAndFormula() {
        assertSays(
                "%oscillator x: harmonic, frequ|ency 1.2 MHz",
                "frequency: a key of a harmonic oscillator",
                "unit: a frequency (MHz, kHz",
                "default: none",
                "formula: ω = 2πν");
        assertSays("%evolve x: psi for 3 periods, fram|es 5", "frames: a key of evolve", "default: 120");
        assertSays("%state x: coherent i|n trap", "the oscillator that the state is prepared in");
    }

    @Test
    void aUnitSaysItsSize() {
        assertSays("%oscillator x: box, mass 40 |u", "u: a unit of mass", "1 u = 1.66053906892×10⁻²⁷ kg (CODATA 2022)");
        assertSays("%oscillator x: harmonic, frequency 1.2M|Hz", "MHz: a unit of frequency", "ω = 2πν");
        assertSays("%oscillator x: harmonic, frequency 7 rad|/s", "no factor 2π");
    }

    @Test
    void anObservableSaysItsSymbol() {
        assertSays(
                "%table run: energy, spread of po|sition",
                "spread of position: an observable", "Δx: standard deviation");
        assertSays("%table run: population o|f 3", "P_n");
        assertSays("%table run: return amplitude, real p|art", "return amplitude, real part: an observable");
    }

    @Test
    void aDeclaredNameSaysWhatItIs() throws SentenceFailure {
        bench.run("%oscillator trap: harmonic, mass 40 u, frequency 1.2 MHz\n%state psi: coherent in trap, mean 9.5\n"
                + "%evolve run: psi for 2 periods, frames 3");
        assertSays("%state x: coherent in tr|ap", "trap: oscillator, harmonic", "mass m = 40 u", "frequency = 1.2 MHz");
        assertTrue(inspected("%levels |trap", 1).contains("zero-point length"));
        assertSays("%evolve x: ps|i for", "psi: state, coherent in harmonic", "mean n̄ = 9.5");
        assertSays("%table ru|n: position", "run: run, 2 periods", "guaranteed");
    }

    @Test
    void theOpeningOfACellSaysHowSentencesAreWritten() {
        assertSays("%%decl|are\n", "a cell of sentences");
    }

    @Test
    void whatMeansNothingSaysNothing() {
        assertEquals(Optional.empty(), bench.declarations.inspect("%oscillator x: box", 12, 0, bench));
        assertEquals("", inspected("%nonsen|se x", 0));
        assertEquals("", inspected("|", 0));
        assertEquals("", inspected("%oscillator x: box, mass {m|} u", 0));
    }
}
