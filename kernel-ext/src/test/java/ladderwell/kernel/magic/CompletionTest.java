package ladderwell.kernel.magic;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import ladderwell.kernel.cell.Completion;
import ladderwell.kernel.cell.SentenceFailure;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;

class CompletionTest {
    private final Bench bench = new Bench();

    @BeforeEach
    void declareAFewThings() throws SentenceFailure {
        bench.run("%oscillator trap: harmonic, mass 40 u, frequency 1.2 MHz\n%oscillator well: box, natural\n"
                + "%state psi: coherent in trap, mean 9.5\n%state n: number in well, level 1\n"
                + "%evolve run: psi for 1 periods, frames 4");
    }

    /** What is offered at the bar, and what the text becomes with the first of it. */
    private List<String> offered(String text) {
        return completion(text).candidates().stream()
                .map(Completion.Candidate::text)
                .toList();
    }

    private Completion completion(String text) {
        int cursor = text.indexOf('|');
        return bench.declarations.complete(text.replace("|", ""), cursor, bench);
    }

    private String completed(String text) {
        Completion completion = completion(text);
        String plain = text.replace("|", "");
        return plain.substring(0, completion.start())
                + completion.candidates().get(0).text()
                + plain.substring(completion.end());
    }

    private List<String> kinds(String text) {
        return completion(text).candidates().stream()
                .map(Completion.Candidate::kind)
                .distinct()
                .toList();
    }

    @Test
    void nounsFollowThePercentSign() {
        assertEquals(
                List.of(
                        "oscillator",
                        "state",
                        "evolve",
                        "plan",
                        "table",
                        "animate",
                        "phasespace",
                        "levels",
                        "elements"),
                offered("%|"));
        assertEquals(List.of("oscillator"), offered("%os|"));
        assertEquals("%oscillator", completed("%OSC|"));
        assertEquals(List.of("noun"), kinds("%|"));
        assertEquals(List.of("evolve"), offered("%%declare\noscillator x: box, natural\nev|"));
        assertEquals("%%declare", completed("%%dec|"));
    }

    @Test
    void kindsFollowTheColon() {
        List<String> kinds = List.of(
                "harmonic",
                "box",
                "finite well",
                "potential",
                "quartic",
                "sextic",
                "double well",
                "morse",
                "poschl-teller",
                "pendulum",
                "lattice",
                "junction",
                "linear with wall",
                "lennard-jones",
                "tabulated",
                "kerr",
                "duffing",
                "hamiltonian");
        assertEquals(kinds, offered("%oscillator x: |"));
        assertEquals(kinds, offered("%oscillator x:|"));
        assertEquals("%oscillator x: finite well", completed("%oscillator x: finite w|"));
        assertEquals("%oscillator x: finite well", completed("%oscillator x: finite |"));
        assertEquals(List.of("kind"), kinds("%oscillator x: |"));
        assertEquals(List.of("coherent"), offered("%state x: co|"));
    }

    @Test
    void namesOfTheRightNounFollowInForAndTable() {
        assertEquals(List.of("in"), offered("%state x: number |"));
        assertEquals(List.of("trap", "well"), offered("%state x: number in |"));
        assertEquals(List.of("trap"), offered("%state x: coherent in |"));
        assertEquals(List.of("well"), offered("%state x: gaussian in w|"));
        assertEquals(List.of("oscillator"), kinds("%state x: number in |"));
        assertEquals(List.of("psi", "n"), offered("%evolve x: |"));
        assertEquals(List.of("state"), kinds("%evolve x: |"));
        assertEquals(List.of("for"), offered("%evolve x: psi |"));
        assertEquals(List.of("run"), offered("%table |"));
        assertEquals(List.of("run"), offered("%animate r|"));
        assertEquals(List.of("run"), kinds("%animate r|"));
        assertEquals(List.of("trap", "well"), offered("%levels |"));
    }

    @Test
    void keysThatAreNotYetUsedAndGoWithTheOthersFollowAComma() {
        assertEquals(
                List.of("mass", "frequency", "wavenumber", "spacing", "natural"),
                offered("%oscillator x: harmonic, |"));
        assertEquals(List.of("frequency", "wavenumber", "spacing"), offered("%oscillator x: harmonic, mass 4 u, |"));
        assertEquals(List.of("mass"), offered("%oscillator x: harmonic, |, frequency 1 MHz"));
        assertEquals(List.of(), offered("%oscillator x: harmonic, mass 4 u, frequency 1 MHz, |"));
        assertEquals("%oscillator x: box, mass", completed("%oscillator x: box, ma|"));
        assertEquals(List.of("key"), kinds("%oscillator x: box, |"));
        assertEquals(List.of("frames", "tolerance"), offered("%evolve x: psi for 3 periods, |"));
        assertEquals(List.of("points"), offered("%animate run, |"));
    }

    @Test
    void unitsOfTheKeyFollowANumber() {
        assertEquals(List.of("u", "me", "kg", "g"), offered("%oscillator x: box, mass 40 |"));
        assertEquals("%oscillator x: box, mass 40 me", completed("%oscillator x: box, mass 40 m|"));
        assertEquals("%oscillator x: box, mass 40me", completed("%oscillator x: box, mass 40m|"));
        assertEquals(List.of("unit"), kinds("%oscillator x: box, mass {m} |"));
        assertEquals(List.of(), offered("%oscillator x: box, mass 40|"));
        assertEquals(List.of(), offered("%oscillator x: box, mass 40 u |"));
        assertEquals(
                List.of("period", "periods"),
                offered("%evolve x: psi for 3 per|").stream().sorted().toList());
        assertTrue(offered("%evolve x: psi for 3 |").contains("us"));
        assertEquals(List.of("periods", "period"), offered("%evolve x: n for 3 |"));
    }

    @Test
    void observablesAndOptionsFollowInATable() {
        assertTrue(
                offered("%table run: |").containsAll(List.of("position", "Mandel Q", "population of ", "every", "as")));
        assertEquals(
                List.of("spread of position", "spread of momentum", "spread over swing"),
                offered("%table run: energy, spr|"));
        assertEquals("%table run: spread of position", completed("%table run: spread of p|"));
        assertEquals(List.of("observable"), kinds("%table run: p|"));
    }

    @Test
    void nothingIsOfferedWhereNothingIsKnown() {
        assertEquals(List.of(), offered("%oscillator |"));
        assertEquals(List.of(), offered("%oscillator x |"));
        assertEquals(List.of(), offered("%nonsense x: |"));
        assertEquals(List.of(), offered("%oscillator x: box, mass {4|} u"));
        assertEquals(List.of(), offered("%oscillator x: box # mass |"));
        assertEquals(List.of(), offered("%state x: coherent in trap, mean 9 |"));
    }

    @Test
    void aSentenceThatGoesOnInTheNextLineIsStillTheSame() {
        assertEquals(List.of("frequency"), offered("%%declare\noscillator x: harmonic,\n  mass 4 u,\n  fr|"));
        assertEquals(List.of("mass", "width", "natural"), offered("%%declare\noscillator x: box,\n  |"));
        assertEquals(9, offered("%%declare\noscillator x: box,\n|").size());
    }
}
