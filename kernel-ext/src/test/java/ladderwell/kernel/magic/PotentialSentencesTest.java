package ladderwell.kernel.magic;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import ladderwell.LevelOf;
import ladderwell.Oscillator;
import ladderwell.PotentialWell;
import ladderwell.Run;
import ladderwell.evidence.Certainty;
import ladderwell.kernel.cell.SentenceFailure;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** Oscillators in any potential, declared in sentences. */
class PotentialSentencesTest {
    private final Bench bench = new Bench();

    @Test
    void everyKindIsDeclaredInLabUnitsInOneCell() throws SentenceFailure {
        bench.run("""
                %%declare
                oscillator own: potential "a*x^4 - b*x^2", mass 1 u, a 2 eV/angstrom^4, b 1 eV/angstrom^2
                oscillator hill: potential "c/x^2 + k*x", mass 1 me, left 0 nm, c 1 meV*nm^2, k 2 meV/nm
                oscillator q: quartic, mass 1 u, frequency 1 THz, coefficient 0.01 eV/angstrom^4
                oscillator pure: quartic, mass 1 u, coefficient 1 eV/angstrom^4
                oscillator s: sextic, mass 1 u, coefficient 3 eV/angstrom^6
                oscillator dw: double well, mass 1 u, separation 1 angstrom, barrier 30 meV
                oscillator mo: morse, mass 0.9796 u, wavenumber 2990.95 /cm, anharmonicity 52.82 /cm
                oscillator mf: morse, mass 0.9796 u, frequency 90 THz, anharmonicity 1.5 THz
                oscillator md: morse, mass 0.9796 u, depth 4 eV, range 1.9 /angstrom
                oscillator pt: poschl-teller, mass 1 me, depth 1 eV, width 1 nm
                oscillator pu: Pöschl-Teller, mass 1 me, depth 1 eV, width 1 nm
                oscillator pe: pendulum, mass 1 u, arm 1 angstrom, frequency 1 THz
                oscillator la: lattice, mass 87 u, depth 2 uK, wavelength 1064 nm
                oscillator ju: junction, charging 200 MHz, josephson 10 GHz, charge 0.5
                oscillator li: linear with wall, mass 1 me, force 5 meV/nm
                oscillator lj: lennard-jones, mass 20 u, depth 10 meV, sigma 3 angstrom, repulsion 9
                """);
        assertEquals(16, bench.emitted.size());
        for (Object each : bench.emitted) {
            PotentialWell well = assertInstanceOf(PotentialWell.class, ((Declared) each).value());
            assertTrue(well.levels().energyHigh(1) > well.levels().energyHigh(0), well.kind());
        }
        PotentialWell own = (PotentialWell) bench.value("own");
        assertEquals("potential", own.kind());
        assertEquals("a*x^4 - b*x^2, a = 2 eV/angstrom^4, b = 1 eV/angstrom^2", own.formula());
    }

    @Test
    void everyKindIsDeclaredInNaturalUnits() throws SentenceFailure {
        bench.run("""
                %%declare
                oscillator own: potential "x^4 - b*x^2", natural, b 3
                oscillator q: quartic, natural, frequency 1, coefficient 0.5
                oscillator s: sextic, natural, coefficient 1
                oscillator dw: double well, natural, separation 4, barrier 2
                oscillator md: morse, natural, depth 10, range 0.5
                oscillator pt: poschl-teller, natural, depth 10, width 1
                oscillator pe: pendulum, natural, frequency 5
                oscillator la: lattice, natural, depth 10, wavelength 6
                oscillator ju: junction, natural, charging 1, josephson 40
                oscillator li: linear with wall, natural, force 1
                oscillator lj: lennard-jones, natural, depth 40, sigma 1
                """);
        PotentialWell quartic = (PotentialWell) bench.value("q");
        // p²/2 + x²/2 + x⁴/2 is half of p² + x² + x⁴, whose ground energy is 1.392351641530291855658 (row S-AHO of
        // Banerjee et al. 1978)
        assertEquals(1.392351641530291855658 / 2, quartic.levels().energyHigh(0), 1e-13);
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = '|',
            value = {
                "%oscillator o: potential \"a*x^4 - «b»*x^2\", natural, a 1 | 'b' has no value; names here are a, m, x, t, pi, hbar",
                "%oscillator o: potential \"k*x^2\", mass 1 u, k 2 eV/angstrom^2, kk «3» | the formula does not use 'kk', and it is no key of a potential; a formula's parameters are the names that stand in it, here k",
                "%oscillator o: potential «\"x^3\"», natural | ~",
                "%oscillator o: potential «\"-x^4\"», natural | ~",
                "%oscillator o: potential «\"1/x\"», natural | ~",
                "%oscillator o: potential \"x^2 +«\"», natural | ~",
                "%oscillator o: potential«» | a value is missing after 'potential'; expected a text in quotes such as \"a*x^4 - b*x^2\"",
                "%oscillator o: potential «x^2», natural | formula takes a text in quotes such as \"a*x^4 - b*x^2\", not 'x^2'",
                "%oscillator o: morse, mass 1 u, depth 4 eV, range «2 eV» | ~",
                "%oscillator o: quartic, mass 1 u, coefficient «2 evs» | ~",
                "%oscillator o: tabulated «\"nowhere.csv\"», natural | there is no file 'nowhere.csv' in the notebook's folder; expected one of comma separated values",
                "%oscillator o: lennard-jones, natural, depth 1, sigma 1, repulsion «6», attraction 6 | ~",
            })
    void aSlipIsNamedAndItsPlaceIsMarked(String marked, String message) {
        String cell = marked.replace("«", "").replace("»", "");
        SentenceFailure failure = assertThrows(SentenceFailure.class, () -> bench.run(cell), cell);
        if (!message.equals("~")) {
            assertEquals(message, failure.message());
        }
        assertTrue(failure.message().length() > 15, failure.message());
        assertTrue(bench.declared().isEmpty());
        assertTrue(String.join("\n", failure.lines()).contains("^"), "its place is marked");
    }

    @Test
    void aLevelOfOneOscillatorIsAStateOfAnother() throws SentenceFailure {
        bench.run("""
                %%declare
                oscillator soft: harmonic, mass 1 u, frequency 1 THz
                oscillator hard: quartic, mass 1 u, frequency 2 THz, coefficient 0.001 eV/angstrom^4
                state cold: ground of soft in hard
                state warm: level 3 of soft in hard, shift 0.1 angstrom
                state thrown: gaussian in hard, position 0.3 angstrom, spread 0.2 angstrom
                evolve run: warm for 1 period, frames 10
                """);
        LevelOf warm = (LevelOf) bench.value("warm");
        assertEquals(3, warm.n());
        assertEquals(0.1e-10, warm.shift().si(), 1e-25);
        assertEquals(0, ((LevelOf) bench.value("cold")).n());
        assertEquals(
                Certainty.ESTIMATED, ((Run) bench.value("run")).stateError().kind());
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = '|',
            value = {
                "%state x: level of soft in hard | a value is missing after 'level'; expected a whole number such as 3",
                "%state x: ground in hard | 'of' is missing after 'ground', as in 'of cold'",
                "%state x: ground of soft | 'in' is missing after 'ground', as in 'state psi: coherent in trap, mean 9.5, phase 30 deg'",
                "%state x: ground of nothing in hard | there is no oscillator 'nothing'",
                "%state x: level 2 of heavy in hard | ~",
            })
    void anIncompleteLevelOfAnotherIsNamed(String cell, String message) throws SentenceFailure {
        bench.run("""
                %%declare
                oscillator soft: harmonic, mass 1 u, frequency 1 THz
                oscillator heavy: harmonic, mass 2 u, frequency 1 THz
                oscillator hard: harmonic, mass 1 u, frequency 2 THz
                """);
        SentenceFailure failure = assertThrows(SentenceFailure.class, () -> bench.run(cell));
        if (!message.equals("~")) {
            assertEquals(message, failure.message());
        }
    }

    @Test
    void aTableOfPointsIsReadWithItsUncertainty(@TempDir Path folder) throws IOException, SentenceFailure {
        StringBuilder csv = new StringBuilder("x / nm,V / meV,± V / meV\n");
        for (int i = -20; i <= 20; i++) {
            csv.append(0.4 * i).append(',').append(0.8 * 0.16 * i * i).append(",0.02\n");
        }
        Path file = Files.writeString(folder.resolve("points.csv"), csv);
        bench.run("%oscillator tab: tabulated \"" + file + "\", mass 1 me");
        Oscillator tab = (Oscillator) bench.value("tab");
        double off = tab.levels().energyError(0) * tab.scale().energy();
        assertTrue(off >= 0.02e-3 * 1.602e-19 && off < 0.03e-3 * 1.603e-19, "off " + off);
        assertEquals(Certainty.STATISTICAL, tab.levels().energyBound(0).kind());
    }

    @Test
    void aBrokenTableOfPointsIsNamed(@TempDir Path folder) throws IOException {
        for (List<String> broken : List.of(
                List.of("x / nm,V / meV\n1,2\n2,oops\n3,4\n4,5\n", "oops"),
                List.of("x,V\n1,2\n2,1\n3,4\n4,5\n", "names no unit"),
                List.of("x / nm,V / parsec\n1,2\n2,1\n3,4\n4,5\n", "is no unit"),
                List.of("x / nm,V / meV\n1,2\n3,1\n2,4\n4,5\n", "must ascend"),
                List.of("x / nm\n1\n2\n3\n", "columns"),
                List.of("x / nm,V / meV\n1,2\n2,\n3,4\n4,5\n", "row 2"),
                List.of("", "tabulated"))) {
            Path file = Files.writeString(folder.resolve("broken.csv"), broken.get(0));
            SentenceFailure failure = assertThrows(
                    SentenceFailure.class, () -> bench.run("%oscillator t: tabulated \"" + file + "\", mass 1 me"));
            if (!broken.get(0).isEmpty()) {
                assertTrue(failure.message().contains(broken.get(1)), failure.message());
            }
        }
    }

    @Test
    void levelsOfAnyPotentialAreTabulated() throws SentenceFailure {
        bench.run("%oscillator mo: morse, natural, depth 10, range 0.5");
        bench.run("%levels mo, count 4");
        LevelTable levels = (LevelTable) bench.emitted.get(0);
        // row S-MOR-01: Morse, Phys. Rev. 34 (1929) 57
        assertEquals(1.086783988749895, levels.table().doubleColumn(1).get(0), 1e-12);
        assertThrows(SentenceFailure.class, () -> bench.run("%levels mo, count 40"));
    }
}
