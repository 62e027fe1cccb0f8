package ladderwell.kernel.command;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.concurrent.TimeUnit;
import java.util.stream.Stream;
import ladderwell.kernel.real.RealPrograms;
import ladderwell.kernel.real.RealPrograms.Outcome;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

/** {@code ladderwell run} in a process of its own, with the real sentences and renderers. */
class RunCommandTest {
    private static final Path SHIPPED = Path.of("../notebooks").toAbsolutePath().normalize();

    @TempDir
    private Path folder;

    private static Outcome run(String... arguments) throws Exception {
        List<String> words = new ArrayList<>(List.of("run"));
        words.addAll(List.of(arguments));
        return RealPrograms.run(
                Map.of(),
                180,
                RealPrograms.java("ladderwell.kernel.command.Ladderwell", words.toArray(String[]::new))
                        .toArray(String[]::new));
    }

    private Path notebook(String... cells) throws Exception {
        StringBuilder text =
                new StringBuilder("{\"nbformat\": 4, \"nbformat_minor\": 2, \"metadata\": {}, \"cells\": [");
        for (int i = 0; i < cells.length; i++) {
            text.append(i == 0 ? "" : ",")
                    .append("{\"cell_type\": \"code\", \"metadata\": {}, \"outputs\": [], \"execution_count\": null,")
                    .append(" \"source\": \"")
                    .append(cells[i].replace("\\", "\\\\").replace("\"", "\\\"").replace("\n", "\\n"))
                    .append("\"}");
        }
        return Files.writeString(folder.resolve("nöte book.ipynb"), text + "]}");
    }

    private List<String> files() throws Exception {
        try (Stream<Path> files = Files.list(folder)) {
            return files.map(file -> file.getFileName().toString()).sorted().toList();
        }
    }

    private static void assertValid(Path notebook) throws Exception {
        RealPrograms.needPython("nbformat");
        Outcome outcome = RealPrograms.run(
                Map.of(),
                60,
                RealPrograms.PYTHON,
                "-c",
                "import nbformat, sys\nt = open(sys.argv[1], encoding='utf8').read()\nn = nbformat.reads(t, as_version=4)\n"
                        + "nbformat.validate(n)\nassert nbformat.writes(n) + '\\n' == t, 'Jupyter would write it otherwise'",
                notebook.toString());
        assertEquals(0, outcome.exitCode(), outcome.text());
    }

    @Test
    void aNotebookIsExecutedInPlaceWithAPageBesideIt() throws Exception {
        Path file = notebook(
                "%oscillator trap: harmonic, mass 31 u, frequency 0.9 MHz",
                "System.out.println(\"ä\");\nSystem.err.println(\"b\");\ntrap.coherent(4)",
                "%%declare\nevolve run: one for 1 period\nanimate run".replace("one", "psi"),
                "");
        String source = Files.readString(file);
        Files.writeString(file, source.replace("trap.coherent(4)", "Coherent psi = trap.coherent(4);\\npsi"));
        Outcome outcome = run(file.toString());
        // A state made in Java is no sentence's, but it can be evolved by one.
        assertEquals(0, outcome.exitCode(), outcome.text());
        assertEquals(List.of("nöte book.html", "nöte book.ipynb"), files());
        String text = Files.readString(file);
        assertTrue(text.contains("\"ä\\n\""), text);
        assertTrue(text.contains("\"execution_count\": 3"));
        assertTrue(text.contains("\"nbformat_minor\": 5"));
        assertTrue(outcome.text().contains("[2/3] System.out.println"), outcome.text());
        assertTrue(Files.readString(folder.resolve("nöte book.html")).contains("ladderwellPlayer"));
        assertValid(file);
    }

    @Test
    void anErrorEndsTheRunWithCode1AndNamesCellAndLine() throws Exception {
        Path file = notebook("int a = 1;", "int b = 2;\n\nint c = b / 0;", "\"never\" + \" run\"");
        Path output = folder.resolve("out.ipynb");
        String before = Files.readString(file);
        Outcome outcome = run(file.toString(), "--output", output.toString());
        assertEquals(1, outcome.exitCode(), outcome.text());
        assertTrue(
                outcome.text().contains("cell [2], line 3: java.lang.ArithmeticException: / by zero"), outcome.text());
        assertEquals(List.of("nöte book.ipynb", "out.html", "out.ipynb"), files());
        assertEquals(before, Files.readString(file));
        assertTrue(Files.readString(output).contains("ArithmeticException"));
        assertFalse(Files.readString(output).contains("never run"));
        assertValid(output);
    }

    @Test
    void aWrongSentenceEndsTheRunWithItsLine() throws Exception {
        Path file = notebook("%%declare\noscillator trap: harmonic, mass -3 u, frequency 1 MHz");
        Outcome outcome = run(file.toString());
        assertEquals(1, outcome.exitCode(), outcome.text());
        assertTrue(outcome.text().contains("cell [1], line 2: "), outcome.text());
    }

    @Test
    void ctrlCEndsTheCellAndWritesWhatThereIs() throws Exception {
        RealPrograms.needProgram("/usr/bin/env");
        Path file = notebook("\"do\" + \"ne\"", "while (true) {\n    Thread.onSpinWait();\n}", "3");
        // A shell without job control may have told its children to ignore the signal.
        List<String> command = new ArrayList<>(List.of("/usr/bin/env", "--default-signal=INT"));
        command.addAll(RealPrograms.java("ladderwell.kernel.command.Ladderwell", "run", file.toString()));
        Path said = folder.resolve("said.txt");
        Process process = new ProcessBuilder(command)
                .redirectErrorStream(true)
                .redirectOutput(said.toFile())
                .start();
        try {
            long end = System.nanoTime() + TimeUnit.SECONDS.toNanos(90);
            while (!Files.readString(said).contains("[2/3] while") && process.isAlive() && System.nanoTime() < end) {
                Thread.sleep(50);
            }
            Thread.sleep(500);
            new ProcessBuilder("kill", "-INT", String.valueOf(process.pid()))
                    .start()
                    .waitFor();
            assertTrue(process.waitFor(60, TimeUnit.SECONDS), Files.readString(said));
            assertEquals(130, process.exitValue(), Files.readString(said));
        } finally {
            process.destroyForcibly();
        }
        String text = Files.readString(file);
        assertTrue(text.contains("done"), text);
        assertTrue(text.contains("\"output_type\": \"error\""), text);
        assertEquals(List.of("nöte book.html", "nöte book.ipynb", "said.txt"), files());
        assertValid(file);
    }

    @ParameterizedTest
    @CsvSource({"how-classical-is-it,How classical is it?,3", "potentials-from-the-board,Potentials from the board,9"})
    void aShippedNotebookRunsAndItsPageStandsAlone(String name, String title, int plots) throws Exception {
        Path shipped = SHIPPED.resolve(name + ".ipynb");
        assertFalse(Files.readString(shipped).contains("\"output_type\""), "the notebook is kept without outputs");
        Path output = folder.resolve("done.ipynb");
        Path page = folder.resolve("page.html");
        Outcome outcome = run(shipped.toString(), "--output", output.toString(), "--html", page.toString());
        assertEquals(0, outcome.exitCode(), outcome.text());
        assertTrue(outcome.text().contains("wrote " + output + " and " + page), outcome.text());
        assertValid(output);
        RealPrograms.needPython("selenium");
        RealPrograms.needProgram("/usr/bin/chromium");
        RealPrograms.needProgram("/usr/bin/chromedriver");
        Outcome seen = RealPrograms.run(
                Map.of(),
                120,
                RealPrograms.PYTHON,
                "src/test/python/page_stands_alone.py",
                page.toString(),
                title,
                String.valueOf(plots));
        assertEquals(0, seen.exitCode(), seen.text());
    }
}
