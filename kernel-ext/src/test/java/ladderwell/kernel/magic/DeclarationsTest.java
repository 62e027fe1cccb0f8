package ladderwell.kernel.magic;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertSame;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Optional;
import ladderwell.Box;
import ladderwell.Coherent;
import ladderwell.FiniteWell;
import ladderwell.Harmonic;
import ladderwell.NumberState;
import ladderwell.Oscillator;
import ladderwell.Packet;
import ladderwell.Run;
import ladderwell.Superposition;
import ladderwell.kernel.cell.SentenceFailure;
import ladderwell.quantity.Quantity;
import ladderwell.quantity.Units;
import org.junit.jupiter.api.Test;
import tech.tablesaw.api.Table;

class DeclarationsTest {
    private static final String TRAP = "%oscillator trap: harmonic, mass 40 u, frequency 1.2 MHz\n";
    private static final String WELL = "%oscillator well: finite well, mass 0.067 me, width 10 nm, depth 0.3 eV\n";
    private static final String PSI = "%state psi: coherent in trap, mean 9.5, phase 30 deg\n";

    private final Bench bench = new Bench();

    @Test
    void aDayAtTheBenchFromOscillatorToAnimation() throws SentenceFailure {
        bench.run(TRAP + PSI + "%evolve run: psi for 3 periods, frames 12, tolerance 1e-9\n"
                + "%table run: position, spread of position, energy, population of 3, return probability, as motion\n"
                + "%animate run, points 50");
        assertEquals(5, bench.emitted.size());
        Declared card = assertInstanceOf(Declared.class, bench.emitted.get(0));
        assertEquals("trap", card.name());
        assertEquals("oscillator", card.noun());
        assertSame(bench.value("trap"), card.value());
        Run run = assertInstanceOf(Run.class, bench.value("run"));
        assertEquals(13, run.times());
        TableRead read = assertInstanceOf(TableRead.class, bench.emitted.get(3));
        assertSame(run, read.run());
        assertEquals(13, read.table().rowCount());
        assertTrue(read.table().columnNames().stream().anyMatch(name -> name.startsWith("population of 3")));
        assertSame(read.table(), bench.value("motion"));
        assertEquals(Table.class, bench.find("motion").orElseThrow().type());
        Animation animation = assertInstanceOf(Animation.class, bench.emitted.get(4));
        assertEquals("run", animation.name());
        assertEquals(50, animation.density().points());
    }

    @Test
    void variablesHaveTheTypeThatCompletesInJava() throws SentenceFailure {
        bench.run(TRAP + WELL + "%oscillator hard: box, mass 1 me, width 5 nm\n" + PSI
                + "%state n: number in well, level 2\n%state mix: superposition in well, levels 0 1 2\n"
                + "%state thrown: gaussian in hard, position -1 nm, spread 0.4 nm");
        assertEquals(Harmonic.class, bench.find("trap").orElseThrow().type());
        assertEquals(FiniteWell.class, bench.find("well").orElseThrow().type());
        assertEquals(Box.class, bench.find("hard").orElseThrow().type());
        assertEquals(Coherent.class, bench.find("psi").orElseThrow().type());
        assertEquals(NumberState.class, bench.find("n").orElseThrow().type());
        assertEquals(Superposition.class, bench.find("mix").orElseThrow().type());
        assertEquals(Packet.class, bench.find("thrown").orElseThrow().type());
    }

    @Test
    void sentencesGiveWhatTheJavaApiGivesInTheSameWords() throws SentenceFailure {
        bench.run(TRAP + PSI);
        Harmonic trap = Oscillator.harmonic().mass(40, Units.ATOMIC_MASS).frequency(1.2, Units.MEGAHERTZ);
        assertEquals(trap, bench.value("trap"));
        assertEquals(trap.coherent(9.5).phase(30, Units.DEGREE), bench.value("psi"));
    }

    @Test
    void keysStandInAnyOrderAndUnitsNeedNoBlank() throws SentenceFailure {
        bench.run("%oscillator a: Harmonic, frequency 1.2MHz, mass 40u\n" + TRAP);
        assertEquals(bench.value("trap"), bench.value("a"));
    }

    @Test
    void frequencyMayBeGivenAsAngularFrequencyWavenumberOrSpacing() throws SentenceFailure {
        bench.run("%oscillator a: harmonic, mass 1 u, frequency 7.5 Mrad/s\n"
                + "%oscillator b: harmonic, mass 1 u, wavenumber 2991 /cm\n"
                + "%oscillator c: harmonic, mass 1 u, spacing 0.3 eV");
        assertEquals(7.5e6, ((Harmonic) bench.value("a")).angularFrequency());
        assertEquals(
                Oscillator.harmonic().mass(1, Units.ATOMIC_MASS).wavenumber(2991, Units.PER_CENTIMETRE),
                bench.value("b"));
        assertEquals(
                Oscillator.harmonic().mass(1, Units.ATOMIC_MASS).spacing(0.3, Units.ELECTRONVOLT), bench.value("c"));
    }

    @Test
    void naturalUnitsNeedNoUnits() throws SentenceFailure {
        bench.run("%oscillator o: harmonic, natural\n%oscillator b: box, natural\n"
                + "%oscillator w: finite well, depth 39.5, natural\n"
                + "%state s: coherent in o, displacement 3, momentum −1\n%state p: coherent in o, mean 2, phase 1.5\n"
                + "%state g: gaussian in b, position 0.1, momentum 20, spread 0.05\n"
                + "%evolve r: s for 12.5, frames 5\n%evolve q: s for 2 periods, frames 5");
        assertEquals(Oscillator.harmonic().natural(), bench.value("o"));
        assertEquals(39.5, ((FiniteWell) bench.value("w")).scaledDepth());
        assertEquals(3, ((Coherent) bench.value("s")).position(), 1e-14);
        assertEquals(-1, ((Coherent) bench.value("s")).momentum(), 1e-14);
        assertEquals(1.5, ((Coherent) bench.value("p")).phaseAngle());
        assertEquals(12.5, ((Run) bench.value("r")).time(5));
    }

    @Test
    void anAmplitudeOrADisplacementMakesACoherentStateToo() throws SentenceFailure {
        bench.run(TRAP + "%state a: coherent in trap, alpha 1.5+0.5i\n%state b: coherent in trap, alpha -i\n"
                + "%state c: coherent in trap, displacement 20 nm\n%state d: coherent in trap, alpha 1.5 + 0.5i\n"
                + "%state e: coherent in trap, momentum 0.1 hbar/nm");
        assertEquals(2.5, ((Coherent) bench.value("a")).mean(), 1e-15);
        assertEquals(-Math.PI / 2, ((Coherent) bench.value("b")).phaseAngle(), 1e-15);
        assertEquals(0, ((Coherent) bench.value("c")).phaseAngle());
        assertEquals(bench.value("a"), bench.value("d"));
        assertEquals(Math.PI / 2, ((Coherent) bench.value("e")).phaseAngle(), 1e-15);
    }

    @Test
    void superpositionsTakeComplexWeights() throws SentenceFailure {
        bench.run(WELL + "%state mix: superposition in well, levels 0 1 2, weights 1 1i 0.5-0.2i");
        Superposition mix = (Superposition) bench.value("mix");
        assertEquals(List.of(0L, 1L, 2L), mix.levels());
        assertEquals(List.of(1.0, 0.0, 0.5), mix.re());
        assertEquals(List.of(0.0, 1.0, -0.2), mix.im());
    }

    @Test
    void expressionsStandWhereverAValueCan() throws SentenceFailure {
        bench.expressions.put("nbar", 4);
        bench.expressions.put("m(\"a}\")", Quantity.of(40, Units.ATOMIC_MASS));
        bench.expressions.put("levels", new long[] {0, 2});
        bench.expressions.put("w", List.of(1, 0.5));
        bench.expressions.put("what", "spread of position");
        bench.expressions.put("new int[] {1}[0]", 1);
        bench.run("%oscillator trap: harmonic, mass {m(\"a}\")}, frequency {nbar} MHz\n"
                + "%state psi: coherent in trap, mean {nbar}, phase {nbar}deg\n"
                + "%state mix: superposition in trap, levels {levels} 5, weights {w} 1i\n"
                + "%evolve run: psi for {nbar} periods, frames {nbar}\n"
                + "%table run: {what}, population of {new int[] {1}[0]}");
        assertEquals(4, ((Coherent) bench.value("psi")).mean());
        assertEquals(Math.toRadians(4), ((Coherent) bench.value("psi")).phaseAngle(), 1e-16);
        assertEquals(List.of(0L, 2L, 5L), ((Superposition) bench.value("mix")).levels());
        List<String> columns = ((TableRead) bench.emitted.get(4)).table().columnNames();
        assertTrue(columns.stream().anyMatch(name -> name.startsWith("spread of position")));
        assertTrue(columns.stream().anyMatch(name -> name.startsWith("population of 1")));
        assertEquals(1, bench.evaluated.stream().filter("what"::equals).count());
    }

    @Test
    void anExpressionIsNotEvaluatedBeforeTheWholeCellHasBeenChecked() {
        bench.expressions.put("nbar", 4);
        assertThrows(
                SentenceFailure.class,
                () -> bench.run(TRAP + "%state psi: coherent in trap, mean {nbar}\n%evolve run: psy for 3 periods"));
        assertEquals(List.of(), bench.evaluated);
    }

    @Test
    void aCellOfSentencesHasCommentsBlankLinesAndSentencesOverSeveralLines() throws SentenceFailure {
        bench.run("\n%%declare  # our trap\r\n# one ion\n\noscillator trap: harmonic,   # kind\n    mass 40 u,\n"
                + "    # the axial mode\n    frequency 1.2 MHz\n  state psi: coherent\n      in trap, mean 9.5\n"
                + "  state chi: number in trap, level 3\n%state phi: number in trap, level 4\n");
        assertEquals(4, bench.emitted.size());
        assertEquals(9.5, ((Coherent) bench.value("psi")).mean());
    }

    @Test
    void emptyCellsDoNothing() throws SentenceFailure {
        bench.run("");
        bench.run("%%declare");
        bench.run("%%declare\n\n   # nothing\n");
        assertEquals(List.of(), bench.emitted);
    }

    @Test
    void everyKeepsTheFirstRowAndEveryNthAfterIt() throws SentenceFailure {
        bench.run(TRAP + PSI + "%evolve run: psi for 1 periods, frames 12\n%table run: position, every 5, as t");
        Table table = (Table) bench.value("t");
        assertEquals(3, table.rowCount());
        assertEquals(10.0 / 12, table.doubleColumn("time / periods").get(2), 1e-12);
        bench.run("%table run: energy, every 1e9");
        assertEquals(1, ((TableRead) bench.emitted.get(0)).table().rowCount());
    }

    @Test
    void anObservableMayHaveACommaInItsName() throws SentenceFailure {
        bench.run(TRAP + PSI + "%evolve run: psi for 1 periods, frames 4\n"
                + "%table run: Return Amplitude, real part, energy, return amplitude,imaginary part");
        List<String> columns = ((TableRead) bench.emitted.get(3)).table().columnNames();
        assertTrue(columns.contains("return amplitude, real part"));
        assertTrue(columns.contains("return amplitude, imaginary part"));
    }

    @Test
    void levelsShowEnergiesAndSpacings() throws SentenceFailure {
        // A well of depth 8 in units of the ground energy of the box of its width has levels near 0.663, 2.603, 5.609
        // in
        // that unit: common practice, no source.
        double unit = Math.PI * Math.PI / 2;
        bench.expressions.put("depth", 8 * unit);
        bench.run("%oscillator well: finite well, natural, depth {depth}\n%levels well");
        LevelTable shown = (LevelTable) bench.emitted.get(1);
        assertArrayEquals(new long[] {0, 1, 2}, shown.levels());
        Table table = shown.table();
        assertEquals(
                List.of(
                        "level n",
                        "energy",
                        "± energy (guaranteed)",
                        "spacing to the next",
                        "± spacing to the next (guaranteed)"),
                table.columnNames());
        assertEquals(0.663, table.doubleColumn("energy").get(0) / unit, 5e-4);
        assertEquals(2.603, table.doubleColumn("energy").get(1) / unit, 5e-4);
        assertEquals(5.609, table.doubleColumn("energy").get(2) / unit, 5e-4);
        assertEquals(
                table.doubleColumn("energy").get(1)
                        - table.doubleColumn("energy").get(0),
                table.doubleColumn("spacing to the next").get(0),
                1e-13);
        assertTrue(table.doubleColumn("spacing to the next").isMissing(2));
    }

    @Test
    void levelsOfTheTrapAreEvenlySpacedAndGuaranteed() throws SentenceFailure {
        bench.run(TRAP + "%levels trap, count 4");
        Table table = ((LevelTable) bench.emitted.get(1)).table();
        assertEquals(4, table.rowCount());
        assertTrue(
                table.columnNames().contains("energy / neV"),
                table.columnNames().toString());
        double spacing = table.doubleColumn("spacing to the next / neV").get(3);
        // h·1.2 MHz in neV, from the exact constants h and e.
        assertEquals(6.62607015e-34 * 1.2e6 / 1.602176634e-19 * 1e9, spacing, 1e-14 * spacing);
    }

    @Test
    void massesInUnitsThatWereMeasuredMakeLevelsStatistical() throws SentenceFailure {
        bench.run(WELL + "%levels well, count 1");
        Table table = ((LevelTable) bench.emitted.get(1)).table();
        assertTrue(table.columnNames().get(2).endsWith("(statistical)"));
    }

    @Test
    void aNameMayBeDeclaredAnewByTheSameNounAndThenItsKindMayChange() throws SentenceFailure {
        bench.run(TRAP);
        bench.run("%oscillator trap: box, mass 1 me, width 5 nm");
        assertEquals(Box.class, bench.find("trap").orElseThrow().type());
    }

    @Test
    void aVariableOfJavaServesAsIfASentenceHadDeclaredIt() throws SentenceFailure {
        bench.javaVariable("mine", Oscillator.harmonic().natural());
        bench.run("%state psi: coherent in mine, mean 2");
        assertEquals(2, ((Coherent) bench.value("psi")).mean());
    }

    @Test
    void aFailedCellLosesAndChangesNothing() throws SentenceFailure {
        bench.run(TRAP + PSI);
        Object trap = bench.value("trap");
        assertThrows(
                SentenceFailure.class,
                () -> bench.run("%oscillator trap: harmonic, mass 9 u, frequency 1 MHz\n"
                        + "%state phi: coherent in trap, mean -1"));
        assertSame(trap, bench.value("trap"));
        assertEquals(Optional.empty(), bench.find("phi"));
    }

    @Test
    void expressionsKeepTheirPlaceWhenTheyFail() {
        SentenceFailure failure = assertThrows(
                SentenceFailure.class, () -> bench.run("%oscillator trap: harmonic, mass {m} u, frequency 1 MHz"));
        assertEquals("Java does not know 'm'", failure.message());
        assertEquals(
                List.of("line 1: %oscillator trap: harmonic, mass {m} u, frequency 1 MHz", " ".repeat(41) + "^^^"),
                failure.lines());
    }
}
