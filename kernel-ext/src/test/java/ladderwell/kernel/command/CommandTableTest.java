package ladderwell.kernel.command;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.PrintWriter;
import java.io.StringWriter;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import picocli.CommandLine;

class CommandTableTest {
    @TempDir
    private Path folder;

    private final StringWriter out = new StringWriter();
    private final StringWriter err = new StringWriter();

    private int run(String... arguments) {
        CommandLine line = CommandTable.line();
        line.setOut(new PrintWriter(out, true));
        line.setErr(new PrintWriter(err, true));
        return line.execute(arguments);
    }

    /** Runs a command that must be refused in one line, with nothing written. */
    private String refusal(String... arguments) throws Exception {
        List<Path> before = files();
        assertEquals(2, run(arguments), err::toString);
        assertEquals(before, files());
        assertEquals("", out.toString());
        String said = err.toString();
        assertEquals(1, said.lines().count(), said);
        assertTrue(said.startsWith("ladderwell: "), said);
        return said.strip().substring("ladderwell: ".length());
    }

    private List<Path> files() throws Exception {
        try (Stream<Path> files = Files.walk(folder)) {
            return files.sorted().toList();
        }
    }

    @Test
    void versionAndHelpAreGiven() {
        assertEquals(0, run("--version"));
        assertTrue(out.toString().matches("Ladderwell \\S+ on Java \\S+\\R"), out.toString());
        assertEquals(0, run("--help"));
        for (String word : new String[] {"run", "install", "kernel", "130"}) {
            assertTrue(out.toString().contains(word), word);
        }
        assertTrue(!out.toString().contains("train"), "a command of our own is not offered");
    }

    @Test
    void aMistypedCommandIsRefusedWithThoseThereAre() throws Exception {
        assertEquals(
                "there is no command rin x; expected run, install or kernel (see 'ladderwell --help')",
                refusal("rin", "x"));
        err.getBuffer().setLength(0);
        assertEquals("Unknown option: '--htm' (see 'ladderwell run --help')", refusal("run", "a.ipynb", "--htm"));
    }

    @Test
    void aMissingCommandOrArgumentIsNamed() throws Exception {
        assertEquals("a command is missing: run, install or kernel (see 'ladderwell --help')", refusal());
        err.getBuffer().setLength(0);
        assertEquals("Missing required parameter: 'NOTEBOOK' (see 'ladderwell run --help')", refusal("run"));
    }

    @ParameterizedTest
    @ValueSource(
            strings = {"", "{", "[]", "{\"nbformat\": 3}", "{\"nbformat\": 4}", "{\"nbformat\": 4, \"cells\": [{}]}"})
    void brokenNotebooksAreRefusedAndNothingIsWritten(String text) throws Exception {
        Path file = Files.writeString(folder.resolve("broken.ipynb"), text);
        String said = refusal("run", file.toString());
        assertTrue(said.startsWith(file.toString()), said);
        assertEquals(text, Files.readString(file));
    }

    @Test
    void aMissingNotebookAndAFolderAreRefused() throws Exception {
        Path absent = folder.resolve("absent.ipynb");
        assertEquals("there is no file " + absent, refusal("run", absent.toString()));
        err.getBuffer().setLength(0);
        assertEquals(folder + " is a folder; expected a notebook file", refusal("run", folder.toString()));
    }

    private Path notebook(String metadata) throws Exception {
        return Files.writeString(
                folder.resolve("n.ipynb"), "{\"nbformat\": 4, \"metadata\": {" + metadata + "}, \"cells\": []}");
    }

    @Test
    void aNotebookInAnotherLanguageIsRefused() throws Exception {
        Path file = notebook("\"kernelspec\": {\"language\": \"python\"}");
        assertEquals(
                file + " is written in python; Ladderwell runs notebooks in Java", refusal("run", file.toString()));
    }

    @Test
    void placesThatCannotBeWrittenAreRefusedBeforeTheWork() throws Exception {
        Path file = notebook("");
        Path nowhere = folder.resolve("nowhere");
        assertEquals(
                "there is no folder " + nowhere + " to write o.ipynb to",
                refusal(
                        "run",
                        file.toString(),
                        "--output",
                        nowhere.resolve("o.ipynb").toString()));
        err.getBuffer().setLength(0);
        assertEquals(folder + " cannot be written", refusal("run", file.toString(), "--html", folder.toString()));
        err.getBuffer().setLength(0);
        assertEquals(
                "the notebook and the page would be the same file " + file,
                refusal("run", file.toString(), "--html", file.toString()));
    }

    @Test
    void aNameThatNoKernelMayHaveIsRefused() throws Exception {
        assertEquals(
                "'../x' is no name for a kernel; expected letters, digits, dots, '-' and '_'",
                refusal("install", "--prefix", folder.toString(), "--name", "../x"));
    }

    @Test
    void installingFromClassesIsRefused() throws Exception {
        assertTrue(refusal("install", "--prefix", folder.toString()).startsWith("install works from the built jar"));
    }
}
