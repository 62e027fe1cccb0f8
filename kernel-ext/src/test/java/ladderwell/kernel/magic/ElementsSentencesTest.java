package ladderwell.kernel.magic;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import ladderwell.MovingWell;
import ladderwell.Oscillator;
import ladderwell.PotentialWell;
import ladderwell.kernel.cell.SentenceFailure;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import tech.tablesaw.api.Table;

/** Transition elements, potentials that move and potentials that bind nothing, in sentences. */
class ElementsSentencesTest {
    private final Bench bench = new Bench();

    @BeforeEach
    void declareAFewThings() throws SentenceFailure {
        bench.run("""
                %%declare
                oscillator mo: morse, natural, depth 10, range 0.5
                oscillator trap: harmonic, mass 40 u, frequency 1.2 MHz
                oscillator free: potential "0*x", mass 1 me, scale 1 nm
                """);
    }

    private Table table(String cell) throws SentenceFailure {
        bench.run(cell);
        return assertInstanceOf(Table.class, bench.emitted.get(bench.emitted.size() - 1));
    }

    @Test
    void elementsOfPositionAreThePublishedOnes() throws SentenceFailure {
        Table table = table("%elements mo: position, levels 0 1");
        assertEquals(
                List.of("level m", "level n", "⟨m|x|n⟩", "± ⟨m|x|n⟩ (estimated)"),
                table.columnNames(),
                "natural units have no symbol");
        // rows S-MOR-03, S-MOR-04: Gallas, Phys. Rev. A 21 (1980) 1829
        double error = table.doubleColumn(3).get(0);
        assertTrue(error < 1e-9, "error " + error);
        assertEquals(0.17484584247752, table.doubleColumn(2).get(0), error + 1e-14);
        assertEquals(0.48570437042776, Math.abs(table.doubleColumn(2).get(1)), error + 1e-14);
    }

    @Test
    void aFunctionStandsInQuotesAndAStretchOfLevelsIsWrittenWithTwoPoints() throws SentenceFailure {
        Table table = table("%elements trap: \"x^2\", momentum, levels 0..3, as pairs");
        assertEquals(10, table.rowCount());
        assertTrue(
                table.column(2).name().startsWith("⟨m|x^2|n⟩"),
                table.columnNames().toString());
        assertTrue(
                table.column(4).name().startsWith("Im ⟨m|p|n⟩"),
                table.columnNames().toString());
        // ⟨0|x²|2⟩ / ⟨0|x²|0⟩ = √2, common practice, no source
        assertEquals(
                Math.sqrt(2),
                table.doubleColumn(2).get(2) / table.doubleColumn(2).get(0),
                1e-12);
        assertEquals(table, bench.value("pairs"));
    }

    @Test
    void withoutLevelsTheLowestFiveAreTaken() throws SentenceFailure {
        assertEquals(15, table("%elements mo: momentum").rowCount());
        bench.run("%oscillator shallow: finite well, natural, depth 12");
        assertEquals(2, ((Oscillator) bench.value("shallow")).levels().count());
        assertEquals(3, table("%elements shallow: position").rowCount());
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = '|',
            quoteCharacter = '`',
            value = {
                "%elements mo: «positon» | 'positon' is no coupling; did you mean 'position'?",
                "%elements mo: «energy» | 'energy' is no coupling; expected one of position; momentum; \"…\", a function of x",
                "%elements mo«:» | nothing stands behind the colon; expected a coupling such as position",
                "%elements mo: levels 0..2«» | elements lists nothing; expected couplings, as in 'elements well: position, momentum, \"x^2\", levels 0..4'",
                "%elements mo: «position, position» | ~",
                "%elements mo: \"x^2 + «q»\" | 'q' has no value; names here are x, t, pi, hbar",
                "%elements mo: position, \"  1/«(»x\" | this bracket is never closed",
                "%elements mo: «\"x*t\"» | ~",
                "%elements mo: position «\"x\"» | a comma is missing before '\"x\"'",
                "%elements mo: position, levels «3..1» | '3..1' runs downward; expected the lower number first, as in 0..5",
                "%elements mo: position, levels «0..999999999» | '0..999999999' holds more than 100000 numbers",
                "%elements mo: position, levels 0«..» | ~",
                "%elements mo: position, levels «7..70» | level 9 is not bound: this morse has 9 bound levels, 0 to 8",
                "%elements mo: position, levels «1 1» | ~",
                "%elements «nobody»: position | there is no oscillator 'nobody'",
                "%elements «free»: position | 'free' has no bound level",
                "%levels «free» | 'free' has no bound level",
                "%oscillator w: potential \"k*x^2/2 + c*x*t\", natural, k 1, c 0.1, «left» -3 | ~",
                "%oscillator w: potential \"k*x^2/2 + c*x*«T»\", natural, k 1, c 0.1 | ~",
            })
    void aSlipIsNamedAndItsPlaceIsMarked(String marked, String message) {
        String cell = marked.replace("«", "").replace("»", "");
        SentenceFailure failure = assertThrows(SentenceFailure.class, () -> bench.run(cell), cell);
        if (!message.equals("~")) {
            assertEquals(message, failure.message());
        }
        assertTrue(failure.message().length() > 15, failure.message());
        assertTrue(String.join("\n", failure.lines()).contains("^"), "its place is marked");
    }

    @Test
    void aPotentialThatMovesIsDeclaredByItsFormula() throws SentenceFailure {
        bench.run("%oscillator shaken: potential \"k*x^2/2 - F*x*cos(w*t)\", mass 40 u, k 3.7 ueV/um^2, F 1 peV/nm,"
                + " w 7 MHz");
        MovingWell shaken = assertInstanceOf(MovingWell.class, bench.value("shaken"));
        assertTrue(shaken.moves());
        assertTrue(shaken.formula().contains("F = 1 peV/nm"), shaken.formula());
        bench.run("%state psi: gaussian in shaken, spread 20 nm");
        bench.run("%levels shaken, count 3");
    }

    @Test
    void aParameterWhoseNameHoldsAtDoesNotMakeAPotentialMove() throws SentenceFailure {
        bench.run("%oscillator still: potential \"kt*x^2 + tanh(x)\", natural, kt 1");
        assertInstanceOf(PotentialWell.class, bench.value("still"));
    }
}
