package ladderwell.kernel.magic;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertSame;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Optional;
import ladderwell.Coherent;
import ladderwell.kernel.cell.CellEnd;
import ladderwell.kernel.cell.CellOutput;
import ladderwell.kernel.cell.MimeBundle;
import ladderwell.kernel.cell.Workbench;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.Test;

/** The declarations at the real workbench, beside real Java. */
class AtTheWorkbenchTest {
    private final Workbench bench = new Workbench(
            new Declarations(), value -> MimeBundle.plain(value.getClass().getSimpleName() + " " + value));
    private int cell;

    @AfterEach
    void close() {
        bench.close();
    }

    private CellEnd run(String code) {
        return bench.run(code, ++cell, new CellOutput() {
            @Override
            public void stdout(String text) {}

            @Override
            public void stderr(String text) {}

            @Override
            public void display(MimeBundle bundle, Optional<String> displayId) {}

            @Override
            public void update(MimeBundle bundle, String displayId) {}

            @Override
            public void clear(boolean wait) {}
        });
    }

    private String result(String code) {
        CellEnd end = run(code);
        return assertInstanceOf(CellEnd.Done.class, end, () -> end.toString())
                .result()
                .orElseThrow()
                .plainText();
    }

    private Object value(String name) {
        return bench.names().find(name).orElseThrow().value();
    }

    @Test
    void sentencesAndJavaShareTheirNames() {
        assertTrue(result("%oscillator trap: harmonic, mass 40 u, frequency 1.2 MHz")
                .startsWith("Declared"));
        assertEquals("Double 9.5", result("double nbar = trap.coherent(9.5).mean();\nnbar"));
        assertTrue(result("%state psi: coherent in trap, mean {nbar / 2}, phase {30}deg")
                .startsWith("Declared"));
        assertEquals(4.75, ((Coherent) value("psi")).mean());
        assertEquals("Double 4.75", result("psi.mean()"));
        assertTrue(result("State chi = psi.phase(10, DEGREE);\n%evolve run: chi for 1 periods, frames 6\n"
                        + "%table run: position, energy, as motion")
                .startsWith("TableRead"));
        assertEquals("Integer 7", result("motion.rowCount()"));
        assertEquals("Integer 7", result("run.times()"));
    }

    @Test
    void aFailedCellKeepsNothingOfItselfAndLosesNothing() {
        run("%oscillator trap: harmonic, natural");
        Object trap = value("trap");
        CellEnd end = run(
                "%oscillator trap: harmonic, mass 1 u, frequency 1 MHz\n\n%state psi: coherent in trap, mean {1/0}");
        CellEnd.Failed failed = assertInstanceOf(CellEnd.Failed.class, end);
        assertTrue(failed.message().contains("/ by zero"), failed.message());
        assertEquals(
                "line 3: %state psi: coherent in trap, mean {1/0}",
                failed.traceback().get(0));
        assertEquals(" ".repeat(8 + 35) + "^^^^^", failed.traceback().get(1));
        assertSame(trap, value("trap"));
        assertEquals(Optional.empty(), bench.names().find("psi"));
    }

    @Test
    void aNameOfAnotherTypeIsRefusedNamingBoth() {
        run("%oscillator trap: harmonic, natural");
        run("int n = 3;");
        CellEnd.Failed failed = assertInstanceOf(CellEnd.Failed.class, run("%state trap: coherent in trap, mean 2"));
        assertTrue(failed.message().contains("oscillator") && failed.message().contains("state"), failed.message());
        failed = assertInstanceOf(CellEnd.Failed.class, run("%state n: coherent in trap, mean 2"));
        assertTrue(failed.message().contains("int"), failed.message());
        assertEquals("Integer 3", result("n"));
    }

    @Test
    void completionAndInspectionReachTheSentences() {
        run("%oscillator trap: harmonic, natural");
        String code = "int n = 3;\n%state psi: coherent in tr";
        assertEquals(
                List.of("trap"),
                bench.complete(code, code.length()).candidates().stream()
                        .map(candidate -> candidate.text())
                        .toList());
        assertTrue(bench.inspect(code, code.indexOf("coherent") + 2, 0)
                .orElseThrow()
                .plainText()
                .startsWith("coherent: a kind of state"));
    }
}
