package ladderwell.kernel.magic;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import ladderwell.Oscillator;
import ladderwell.kernel.cell.SentenceFailure;
import ladderwell.quantity.Quantity;
import ladderwell.quantity.Units;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Each kind of mistake: the message, the place marked, the word suggested. */
class MistakesTest {
    private final Bench bench = new Bench();

    @BeforeEach
    void declareAFewThings() throws SentenceFailure {
        bench.run("%oscillator trap: harmonic, mass 40 u, frequency 1.2 MHz\n"
                + "%oscillator well: finite well, mass 0.067 me, width 10 nm, depth 0.3 eV\n"
                + "%oscillator unit: harmonic, natural\n"
                + "%state psi: coherent in trap, mean 9.5\n"
                + "%state chi: coherent in unit, mean 2\n"
                + "%evolve run: psi for 1 periods, frames 4\n");
    }

    /**
     * One slip: the sentence with the wrong place between « and », and the message. A place of no width is marked «».
     */
    @ParameterizedTest
    @CsvSource(
            delimiter = '|',
            quoteCharacter = '`',
            value = {
                // nouns and names
                "%«oscilator» x: box, natural | 'oscilator' is no noun; sentences start with oscillator, state, evolve, plan, table, animate, phasespace, levels or elements; did you mean 'oscillator'?",
                "%«xyz» x: box, natural | 'xyz' is no noun; sentences start with oscillator, state, evolve, plan, table, animate, phasespace, levels or elements",
                "%oscillator«» | a name is missing after 'oscillator', as in 'oscillator trap: harmonic, mass 40 u, frequency 1.2 MHz'",
                "%oscillator«» : box, natural | a name is missing after 'oscillator', as in 'oscillator trap: harmonic, mass 40 u, frequency 1.2 MHz'",
                "%oscillator my «trap»: box, natural | a name is one word; 'trap' is too much before the colon",
                "%oscillator «2nd»: box, natural | '2nd' cannot be a name; a name is made of letters, digits and _, starts with a letter, and has no blanks",
                "%oscillator «a-b»: box, natural | 'a-b' cannot be a name; a name is made of letters, digits and _, starts with a letter, and has no blanks",
                "%oscillator «class»: box, natural | 'class' cannot be a name, because it is a word of Java; take another",
                "%oscillator «psi»: box, natural | 'psi' is declared by 'state' already and cannot be declared by 'oscillator'; take another name",
                "%oscillator trap «harmonic», natural | a colon is missing after 'trap'; the form is 'oscillator NAME: KIND, KEY VALUE UNIT, …'",
                "%oscillator x«»| a colon is missing after 'x'; the form is 'oscillator NAME: KIND, KEY VALUE UNIT, …'",
                // kinds
                "%oscillator x:«»| a kind is missing after the colon; kinds of oscillator are harmonic, box, finite well, potential, quartic, sextic, double well, morse, poschl-teller, pendulum, lattice, junction, linear with wall, lennard-jones, tabulated, kerr, duffing and hamiltonian",
                "%oscillator x: «harmonik», mass 1 u | 'harmonik' is no kind of oscillator; did you mean 'harmonic'?",
                "%oscillator x: «finit well», mass 1 u | 'finit well' is no kind of oscillator; did you mean 'finite well'?",
                "%oscillator x: «icosagon», mass 1 u | 'icosagon' is no kind of oscillator; kinds of oscillator are harmonic, box, finite well, potential, quartic, sextic, double well, morse, poschl-teller, pendulum, lattice, junction, linear with wall, lennard-jones, tabulated, kerr, duffing and hamiltonian",
                // keys
                "%oscillator x: harmonic, «maas» 40 u, frequency 1 MHz | 'maas' is no key of a harmonic oscillator; expected mass, frequency, wavenumber, spacing or natural; did you mean 'mass'?",
                "%oscillator x: harmonic, mass 40 u, «width» 3 nm | 'width' is no key of a harmonic oscillator; expected mass, frequency, wavenumber, spacing or natural",
                "%oscillator x: harmonic, mass 40 u, «mass 41 u» | 'mass' is given twice; keep one of them",
                "%oscillator x: harmonic, mass 40 u, frequency 1 MHz, «spacing» 1 eV | 'spacing' does not go with 'frequency'; a harmonic oscillator takes mass with frequency, mass with wavenumber, mass with spacing or natural",
                "%oscillator x: harmonic, natural, «mass» 40 u | 'mass' does not go with 'natural'; a harmonic oscillator takes mass with frequency, mass with wavenumber, mass with spacing or natural",
                "%oscillator x: harmonic, mass 40 u«» | a harmonic oscillator needs 'frequency 1.2 MHz', 'wavenumber 2991 /cm' or 'spacing 0.3 eV' besides",
                "%oscillator x: harmonic«»| a harmonic oscillator needs 'mass 40 u' and 'frequency 1.2 MHz', 'mass 40 u' and 'wavenumber 2991 /cm', 'mass 40 u' and 'spacing 0.3 eV' or 'natural'",
                "%state x: number in trap«» | a number state needs 'level 3'",
                "%oscillator x: box, mass 40 u «width» 3 nm | a comma is missing before 'width'",
                "%oscillator x: box, mass «40» width 3 nm | the unit is missing after '40'; mass takes a mass such as 40 u",
                "%oscillator x: box «mass» 40 u, width 3 nm | a comma is missing before 'mass'",
                "%oscillator x: box«,», mass 40 u | nothing stands behind this comma; expected a key: mass, width or natural",
                "%oscillator x: box, mass 40 u«,» | nothing stands behind this comma; expected a key: mass, width or natural",
                "%oscillator x: box, mass 9,«5» u | expected a key after the comma, not '5'; decimals are written with a point, as in 9.5",
                "%oscillator x: box, natural «yes» | 'yes' is too much after 'natural'; expected a comma or the end of the sentence",
                "%oscillator x: box «deep», natural | 'deep' is too much here; expected a comma",
                // numbers and units
                "%oscillator x: box, mass«», width 3 nm | a value is missing after 'mass'; expected a mass such as 40 u",
                "%oscillator x: box, mass «heavy», width 3 nm | mass takes a mass such as 40 u, not 'heavy'",
                "%oscillator x: box, mass «NaN» u, width 3 nm | mass must be finite, not 'NaN'; expected a mass such as 40 u",
                "%oscillator x: box, mass «−Infinity» u, width 3 nm | mass must be finite, not '−Infinity'; expected a mass such as 40 u",
                "%oscillator x: box, mass «1e999» u, width 3 nm | '1e999' is too large for a number; the largest is about 1.8e308",
                "%oscillator x: box, mass «1e-999» u, width 3 nm | '1e-999' is too small for a number; the smallest is about 5e-324",
                "%oscillator x: box, mass 1«_000» u, width 3 nm | a number is written without separators, as in 1000",
                "%oscillator x: box, mass 1«/2» u, width 3 nm | a fraction is written as a decimal, such as 0.5",
                "%oscillator x: box, mass «40», width 3 nm | the unit is missing after '40'; mass takes a mass such as 40 u",
                "%oscillator x: box, mass 40 «amu», width 3 nm | 'amu' is no unit; mass takes a mass such as 40 u; did you mean 'u'?",
                "%oscillator x: box, mass 40 «bananas», width 3 nm | 'bananas' is no unit; mass takes a mass such as 40 u",
                "%oscillator x: harmonic, mass 40 u, frequency 1.2 «Mhz» | 'Mhz' is no unit; frequency takes a frequency such as 1.2 MHz or an angular frequency or rate such as 7.5 Mrad/s; did you mean 'MHz'?",
                "%oscillator x: harmonic, mass 40«MHz», frequency 1 MHz | '40 MHz' is a frequency; mass takes a mass such as 40 u",
                "%oscillator x: box, mass 40 «nm», width 3 nm | '40 nm' is a length; mass takes a mass such as 40 u",
                "%oscillator x: box, mass 40 u «extra», width 3 nm | 'extra' is too much after 'u'; expected a comma or the end of the sentence",
                "%state x: coherent in unit, displacement 3 «nm» | 'unit' is in natural units, so displacement is a plain number; leave out 'nm'",
                "%state x: coherent in trap, displacement «3» | the unit is missing after '3'; displacement takes a length such as 10 nm",
                "%state x: coherent in trap, mean 9 «u» | mean is a plain number; leave out the unit 'u'",
                "%state x: coherent in trap, alpha «1+2j» | alpha takes a complex number such as 1.5+0.5i, not '1+2j'",
                "%state x: coherent in trap, alpha «1+2» | alpha takes a complex number such as 1.5+0.5i, not '1+2'",
                "%state x: number in trap, level «1.5» | level takes a whole number such as 3, not '1.5'",
                "%state x: number in trap, level «-1» | level must be at least 0, not -1",
                "%state x: number in trap, level «1e30» | level '1e30' is too large; whole numbers reach to about 9.2e18",
                "%state x: superposition in trap, levels 0 «one» 2 | levels takes whole numbers such as 0 1 2, not 'one'",
                "%state x: superposition in trap, levels 0 1, weights «1 i 2» | there are 2 levels but 3 weights; expected one weight for each level, in the same order",
                // names spoken of
                "%state x: coherent in «trp», mean 2 | there is no oscillator 'trp'; did you mean 'trap'?",
                "%state x: coherent in «nowhere», mean 2 | there is no oscillator 'nowhere'",
                "%state x: coherent in «psi», mean 2 | 'psi' is a state; 'in' takes an oscillator, such as unit",
                "%oscillator x: kerr, frequency 5 GHz, kerr -200 kHz, thermal «0.1» | 'thermal' needs a loss: a bath heats through what it takes; give 'loss 12 kHz' or a 'gain' of its own",
                "%oscillator x: kerr, natural, kerr 0.1, loss 3, phase «20 deg» | 'phase' goes with 'drive', and that is not given; give 'drive 80 kHz'",
                "%oscillator x: kerr, natural, kerr 0.1, loss 3, quality «1e5» | 'quality' and 'loss' say the same thing twice; keep one of them",
                "%oscillator x: kerr, frequency 5 GHz, kerr -200 kHz, loss «3» | the unit is missing after '3'; loss takes a frequency such as 1.2 MHz or an angular frequency or rate such as 7.5 Mrad/s or a time such as 50 us",
                "%oscillator x: hamiltonian \"«w*n + f*a»\", w 5 GHz, f 1 MHz | the Hamiltonian is not Hermitian: the term 6283185.307179586 a needs its mirror 6283185.307179586 a†, found 0 (numbers in rad/s)",
                "%state x: coherent in «well», mean 2 | a coherent state lives in a harmonic oscillator, a Kerr mode, a Duffing mode or a Hamiltonian of its own; 'well' is a finite well",
                "%state x: level 2 of «trp» in trap | there is no oscillator 'trp'; did you mean 'trap'?",
                "%state x: coherent«», mean 2 | 'in' is missing after 'coherent', as in 'state psi: coherent in trap, mean 9.5, phase 30 deg'",
                "%state x: coherent in«», mean 2 | a value is missing after 'in'; expected the name of an oscillator",
                "%state x: coherent in «{trap}», mean 2 | in takes the name of an oscillator, not '{trap}'",
                "%state x: coherent «im» trap, mean 2 | 'im' is too much here; expected a comma or 'in trap'; did you mean 'in'?",
                "%evolve x:«» | the name of a state is missing after the colon",
                "%evolve x: «trap» for 3 periods | 'trap' is an oscillator; 'evolve' takes a state, such as chi",
                "%evolve x: psi«» | 'for' is missing after 'psi', as in 'evolve run: psi for 3 periods, frames 120'",
                "%evolve x: psi for 3 «nm» | '3 nm' is a length; for takes a number of periods such as 3 periods or a time such as 50 us",
                "%table «rum»: position | there is no run 'rum'; did you mean 'run'?",
                "%animate«» | the name of a run is missing after 'animate', as in 'animate run'",
                "%animate run«:» points 40 | animate takes no colon; the form is 'animate RUN, KEY VALUE'",
                "%animate run «points» 40 | a comma is missing before 'points'",
                "%animate run, points «1» | points must be at least 2, not 1",
                "%animate run, points «1e9» | points must be at most 100000, not 1000000000",
                "%levels well, count «1e4» | count must be at most 3, not 10000: 'well' has 3 bound levels",
                // observables
                "%table run: «positon» | 'positon' is no observable; did you mean 'position'?",
                "%table run: position, «spread» | 'spread' is no observable; did you mean 'spread of position'?",
                "%table run: position «energy» | a comma is missing before 'energy'",
                "%table run: position, «position» | 'position' is listed twice; once is enough",
                "%table run: population of«» | a number is missing after 'population of', as in 'population of 3'",
                "%table run: population of «x» | population of takes a whole number such as 3, not 'x'",
                "%table run«:» | nothing stands behind the colon; expected an observable such as position",
                "%table run: every 2«» | table lists nothing; expected observables, as in 'table run: position, spread of position, energy, return probability'",
                "%table run: position, as «psi» | 'psi' is declared by 'state' already and cannot be declared by 'table'; take another name",
                // marks
                "%state x: coherent in trap, mean «{»nbar | this brace is never closed; a Java expression ends with '}'",
                "%state x: coherent in trap, mean nbar«}» | this closing brace closes nothing; an expression starts with '{'",
                "%state x: coherent in trap, mean «{}» | these braces are empty; expected a Java expression, as in {nbar}",
                "%state x: coherent in trap, mean «\"»4 | this quote is never closed; a quotation ends with '\"' on the same line",
                // physics
                "%oscillator x: box, mass «-3» u, width 3 nm | mass must be positive, not -3 u",
                "%oscillator x: box, mass «0» u, width 3 nm | mass must be positive, not 0 u",
                "%state x: coherent in trap, mean «-1» | mean quanta must be a finite number of at least 0, not -1",
                "%state x: number in well, level «7» | level 7 is not bound: this finite well has 3 bound levels, 0 to 2",
                "%state x: superposition in well, levels 0 «7» 1 | level 7 is not bound: this finite well has 3 bound levels, 0 to 2",
                "%evolve x: psi for 3 periods, tolerance «1» | tolerance must lie between 1e-13 and 0.1, not 1",
                "%evolve x: psi for «-3» periods | duration must be positive, not -3 periods",
            })
    void aSlipIsNamedAndItsPlaceIsMarked(String marked, String message) {
        int open = marked.indexOf('«');
        int close = marked.indexOf('»');
        String cell = marked.replace("«", "").replace("»", "");
        SentenceFailure failure = assertThrows(SentenceFailure.class, () -> bench.run(cell));
        String expected = message.replace("sentences start with", "a sentence starts with");
        assertEquals(expected, failure.message());
        String label = "line 1: ";
        assertEquals(
                List.of(label + cell, " ".repeat(label.length() + open) + "^".repeat(Math.max(1, close - open - 1))),
                failure.lines());
    }

    @Test
    void theLineOfTheCellIsNamed() {
        SentenceFailure failure = assertThrows(
                SentenceFailure.class, () -> bench.run("%%declare\n\noscillator x: box,\n  mass 40 q,\n  width 3 nm"));
        assertEquals(List.of("line 4:   mass 40 q,", " ".repeat(18) + "^"), failure.lines());
    }

    @Test
    void whatDoesNotFitInMemoryIsRefusedAtItsNumber() {
        SentenceFailure failure =
                assertThrows(SentenceFailure.class, () -> bench.run("%evolve x: psi for 3 periods, frames 1e9"));
        assertTrue(failure.message().startsWith("1000000000 frames ("), failure.message());
        assertEquals(" ".repeat(8 + 37) + "^^^", failure.lines().get(1));
    }

    @Test
    void observablesThatTheOscillatorDoesNotHaveAreMarked() throws SentenceFailure {
        bench.run("%state n: number in well, level 1\n%evolve still: n for 1 periods, frames 2");
        SentenceFailure failure =
                assertThrows(SentenceFailure.class, () -> bench.run("%table still: energy, mean quanta"));
        assertTrue(failure.message().contains("mean quanta"), failure.message());
        assertEquals(
                " ".repeat(8 + 22) + "^".repeat("mean quanta".length()),
                failure.lines().get(1));
    }

    @Test
    void anOscillatorWhoseScaleLeavesTheRangeOfNumbersIsRefusedWhenItIsDeclared() throws SentenceFailure {
        assertRefused("outside the range of numbers", "%oscillator x: box, mass 1e-300 kg, width 1e-300 m");
        assertRefused("the length of a scale", "%oscillator x: harmonic, mass 1e300 kg, frequency 1e300 Hz");
    }

    @Test
    void aPacketThatTheBoundLevelsCannotCarryIsRefusedWithTheMissingWeight() {
        SentenceFailure failure =
                assertThrows(SentenceFailure.class, () -> bench.run("%state x: gaussian in well, spread 50 nm"));
        assertTrue(failure.message().contains("needs weight 0."), failure.message());
        assertEquals(
                " ".repeat(8 + 35) + "^".repeat("50".length()), failure.lines().get(1));
    }

    @Test
    void aDurationBeyondTheRangeOfNumbersIsRefused() {
        assertRefused("a duration of 1e300 s is too long", "%evolve x: psi for 1e300 s");
    }

    private void assertRefused(String part, String cell) {
        String message =
                assertThrows(SentenceFailure.class, () -> bench.run(cell)).message();
        assertTrue(message.contains(part), message);
    }

    @Test
    void nothingDeclaredYetIsSaidWithAnExample() {
        Bench empty = new Bench();
        SentenceFailure failure =
                assertThrows(SentenceFailure.class, () -> empty.run("%state x: coherent in trap, mean 2"));
        assertEquals(
                "there is no oscillator 'trap'; none is declared yet, as in 'oscillator trap: harmonic, mass 40 u,"
                        + " frequency 1.2 MHz'",
                failure.message());
    }

    @Test
    void aSlipInTheLastSentenceIsFoundBeforeTheFirstRuns() {
        SentenceFailure failure = assertThrows(
                SentenceFailure.class,
                () -> bench.run("%evolve longer: psi for 1 periods, frames 1e9\n%table longr: position"));
        assertEquals("there is no run 'longr'; did you mean 'longer'?", failure.message());
    }

    @Test
    void oneCellDoesNotDeclareANameTwiceWithDifferentNouns() {
        SentenceFailure failure = assertThrows(
                SentenceFailure.class, () -> bench.run("%oscillator x: box, natural\n%state x: number in x, level 1"));
        assertEquals(
                "'x' is declared by 'oscillator' above and cannot be declared by 'state' too; take another name",
                failure.message());
    }

    @Test
    void aJavaVariableOfAnotherTypeIsNotOverwritten() {
        bench.javaVariable("x", "text");
        SentenceFailure failure = assertThrows(SentenceFailure.class, () -> bench.run("%oscillator x: box, natural"));
        assertEquals("'x' is a Java variable of type String already, not Box", failure.message());
        failure = assertThrows(SentenceFailure.class, () -> bench.run("%state y: number in x, level 1"));
        assertEquals("'x' is a Java value of another type; 'in' takes an oscillator, such as unit", failure.message());
    }

    @Test
    void resultsOfExpressionsAreChecked() {
        bench.expressions.put("nan", Double.NaN);
        bench.expressions.put("osc", Oscillator.box().natural());
        bench.expressions.put("none", new int[0]);
        bench.expressions.put("text", "nine");
        bench.expressions.put("list", "1, 2");
        bench.expressions.put("len", Quantity.of(3, Units.METRE));
        assertMessage("mean must be a finite number; '{nan}' is NaN", "%state x: coherent in trap, mean {nan}");
        assertMessage(
                "'{osc}' gives a Box; mean takes a plain number such as 9.5", "%state x: coherent in trap, mean {osc}");
        assertMessage(
                "the expression gives no numbers; levels takes whole numbers such as 0 1 2",
                "%state x: superposition in trap, levels {none}");
        assertMessage("mean takes a plain number such as 9.5, not 'nine'", "%state x: coherent in trap, mean {text}");
        assertMessage(
                "'{list}' gives the text '1, 2'; expected a number, a quantity, or words without commas and braces",
                "%state x: coherent in trap, mean {list}");
        assertMessage("'3 m' is a length; mass takes a mass such as 40 u", "%oscillator x: box, mass {len}, width 1 m");
        assertMessage(
                "'{len}' gives a length, 3 m; mean takes a plain number such as 9.5",
                "%state x: coherent in trap, mean {len}");
        assertMessage(
                "'m' is too much after '{len}'; expected a comma or the end of the sentence",
                "%oscillator x: box, mass 1 u, width {len} m");
    }

    @Test
    void onlyDeclareOpensACellOfSentences() {
        assertMessage("'%%declair' is unknown; a cell of sentences starts with %%declare", "%%declair\nstate x");
        assertMessage("a word is missing after '%%'; a cell of sentences starts with %%declare", "%%\n");
        assertMessage(
                "nothing may follow %%declare on its line; the sentences start on the next one",
                "%%declare oscillator x: box, natural");
    }

    @Test
    void whateverCannotBeShownIsReplaced() {
        String key = "\u0000\u0007\ud800" + "k".repeat(90_000);
        SentenceFailure failure =
                assertThrows(SentenceFailure.class, () -> bench.run("%oscillator x: box, " + key + " 3 nm"));
        assertTrue(failure.message().startsWith("'\uFFFD\uFFFD\uFFFDkkkk"), failure.message());
        assertTrue(failure.message().length() < 200);
        assertTrue(failure.lines().stream().allMatch(line -> line.length() < 250));
    }

    private void assertMessage(String message, String cell) {
        assertEquals(
                message,
                assertThrows(SentenceFailure.class, () -> bench.run(cell)).message());
    }
}
