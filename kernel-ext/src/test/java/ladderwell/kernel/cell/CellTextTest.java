package ladderwell.kernel.cell;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import ladderwell.kernel.cell.CellText.Part;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class CellTextTest {
    @Test
    void aCellThatStartsWithTwoPercentSignsIsAllSentences() {
        String cell = "\n  %%declare\noscillator trap: harmonic\nint i = 1;\n";
        assertEquals(List.of(new Part(true, cell, 0, 1)), CellText.of(cell).parts());
        assertFalse(CellText.of(cell).hasJava());
    }

    @Test
    void sentencesAndJavaAlternate() {
        String cell = "%count a: 1\n\n%count b: 2\nint c = a + b;\nc\n  %count d: 3\n";
        assertEquals(
                List.of(
                        new Part(true, "%count a: 1\n\n%count b: 2\n", 0, 1),
                        new Part(false, "int c = a + b;\nc\n", cell.indexOf("int"), 4),
                        new Part(true, "  %count d: 3\n", cell.indexOf("  %count d"), 6)),
                CellText.of(cell).parts());
        assertTrue(CellText.of(cell).hasJava());
    }

    @ParameterizedTest
    @ValueSource(
            strings = {
                "int r = 7\n    % 3;",
                "int r = (7\n%count);",
                "String s = \"\"\"\n%count a: 1\n\\\"\"\"\n%count b: 1\n\"\"\";",
                "/* remark\n%count a: 1\n*/",
                "void f() {\n%count a: 1\n}",
                "int[] a = {\n'{', '\\'', // }\n%count a: 1\n};"
            })
    void aPercentSignInsideJavaIsJava(String cell) {
        assertEquals(List.of(new Part(false, cell, 0, 1)), CellText.of(cell).parts());
    }

    @Test
    void bracketsInStringsAndRemarksDoNotHideSentences() {
        String java = "String s = \"{(\\\"[\"; // {{{\nchar c = '{'; /* ( */\n";
        List<Part> parts = CellText.of(java + "%count a: 1").parts();
        assertEquals(new Part(true, "%count a: 1", java.length(), 3), parts.get(1));
    }

    @Test
    void blankCellsHaveNoParts() {
        assertEquals(List.of(), CellText.of("").parts());
        assertEquals(List.of(), CellText.of(" \n\n").parts());
    }
}
