package ladderwell.kernel.notebook;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.AccessDeniedException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.attribute.PosixFilePermissions;
import java.util.HashSet;
import java.util.List;
import java.util.Objects;
import java.util.Set;
import org.junit.jupiter.api.Assumptions;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class NotebookTest {
    /** Written by Jupyter's own library, nbformat 5.7 (Debian 12), with every kind of line end and character order. */
    private static final String JUPYTER_S = "written-by-jupyter.ipynb";

    @TempDir
    Path folder;

    static String resource(String name) throws IOException {
        try (InputStream in = Objects.requireNonNull(NotebookTest.class.getResourceAsStream(name), name)) {
            return new String(in.readAllBytes(), StandardCharsets.UTF_8);
        }
    }

    @Test
    void whatJupyterWroteComesBackByteForByte() throws Exception {
        String text = resource(JUPYTER_S);
        assertEquals(text, Notebook.parse(text, "n").text());
    }

    @Test
    void aFileIsReadAndWrittenByteForByte() throws Exception {
        byte[] bytes = resource(JUPYTER_S).getBytes(StandardCharsets.UTF_8);
        Path file = folder.resolve("näme with blanks.ipynb");
        Files.write(file, bytes);
        Path copy = folder.resolve("copy.ipynb");
        Notebook.read(file).write(copy);
        assertEquals(-1, Files.mismatch(file, copy));
    }

    @Test
    void aByteOrderMarkIsPassedOver() throws Exception {
        Path file = folder.resolve("n.ipynb");
        Files.writeString(file, "\ufeff" + resource(JUPYTER_S));
        assertEquals(resource(JUPYTER_S), Notebook.read(file).text());
    }

    @Test
    void kindsSourcesAndTagsAreRead() throws Exception {
        List<Cell> cells = Notebook.parse(resource(JUPYTER_S), "n").cells();
        assertEquals(
                List.of(Cell.Kind.MARKDOWN, Cell.Kind.CODE, Cell.Kind.CODE, Cell.Kind.CODE, Cell.Kind.RAW),
                cells.stream().map(Cell::kind).toList());
        assertEquals(
                "%%declare\noscillator trap: harmonic, mass 40 u, frequency 1.2 MHz\n",
                cells.get(1).source());
        assertEquals("%%declare", cells.get(1).firstLine());
        assertEquals(Set.of("raises-exception", "x"), cells.get(2).tags());
        assertEquals("", cells.get(3).source());
    }

    @Test
    void anOlderMinorNumberGetsIdsThatAreTheSameEveryTime() throws Exception {
        String old = """
                {"nbformat": 4, "nbformat_minor": 2, "metadata": {}, "cells": [
                 {"cell_type": "code", "source": "a", "metadata": {}, "outputs": [], "execution_count": null},
                 {"cell_type": "code", "source": "a", "metadata": {}, "outputs": [], "execution_count": null},
                 {"cell_type": "markdown", "source": ["b\\n", "c"], "metadata": {}}]}
                """;
        Notebook notebook = Notebook.parse(old, "n");
        assertTrue(notebook.text().contains("\"nbformat_minor\": 5"));
        List<String> ids = notebook.cells().stream().map(Cell::id).toList();
        assertEquals(3, new HashSet<>(ids).size());
        assertEquals(
                ids, Notebook.parse(old, "n").cells().stream().map(Cell::id).toList());
        assertEquals(notebook.text(), Notebook.parse(notebook.text(), "n").text());
    }

    @Test
    void idsThatAreTwiceOrAgainstTheRulesAreReplacedAndOthersKept() throws Exception {
        Notebook notebook = Notebook.parse("""
                {"nbformat": 4, "nbformat_minor": 5, "metadata": {}, "cells": [
                 {"cell_type": "raw", "source": "a", "metadata": {}, "id": "same"},
                 {"cell_type": "raw", "source": "b", "metadata": {}, "id": "same"},
                 {"cell_type": "raw", "source": "c", "metadata": {}, "id": "has blanks"},
                 {"cell_type": "raw", "source": "d", "metadata": {}, "id": 7}]}
                """, "n");
        List<String> ids = notebook.cells().stream().map(Cell::id).toList();
        assertEquals("same", ids.get(0));
        assertEquals(4, new HashSet<>(ids).size());
        ids.forEach(id -> assertTrue(id.matches("[a-zA-Z0-9_-]{1,64}"), id));
    }

    @Test
    void aLaterMinorNumberAndUnknownFieldsAreKept() throws Exception {
        String text = Notebook.parse("""
                        {"nbformat": 4, "nbformat_minor": 9, "later": {"x": 1.50}, "cells": [
                         {"cell_type": "code", "source": "", "id": "a", "later": [1e400]}]}
                        """, "n").text();
        assertTrue(text.contains("\"nbformat_minor\": 9"));
        assertTrue(text.contains("\"later\": {\n  \"x\": 1.50\n }"), text);
        assertTrue(text.contains("1e400"));
        assertTrue(text.contains("\"outputs\": []"));
        assertTrue(text.contains("\"execution_count\": null"));
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = '|',
            quoteCharacter = '`',
            value = {
                "`` | n is empty; expected a notebook",
                "`{` | n is not valid JSON (line 1, column 2)",
                "`{'cells': []}` | n is not valid JSON (line 1, column 3)",
                "`{\"cells\": [NaN]}` | n is not valid JSON (line 1, column 12)",
                "`[]` | n holds JSON but no notebook; expected an object with cells",
                "`{} {}` | n is not valid JSON (line 1, column 5)",
                "`{}` | n has no nbformat number, so it is no notebook",
                "`{\"nbformat\": 3}` | n is of nbformat 3; expected nbformat 4, which Jupyter can convert it to",
                "`{\"nbformat\": 5}` | n is of nbformat 5; expected nbformat 4, which Jupyter can convert it to",
                "`{\"nbformat\": 4}` | n has no list of cells",
                "`{\"nbformat\": 4, \"cells\": [7]}` | n: cell 1 is no JSON object",
                "`{\"nbformat\": 4, \"cells\": [{}]}` |"
                        + " n: cell 1 is of the kind null; expected \"code\", \"markdown\" or \"raw\"",
                "`{\"nbformat\": 4, \"cells\": [{\"cell_type\": \"code\"}]}` |"
                        + " n: cell 1 has no source; expected a string or a list of strings",
                "`{\"nbformat\": 4, \"cells\": [{\"cell_type\": \"code\", \"source\": [1]}]}` |"
                        + " n: cell 1 has no source; expected a string or a list of strings",
            })
    void brokenNotebooksAreRefusedInOneSentence(String text, String message) {
        NotebookException e = assertThrows(NotebookException.class, () -> Notebook.parse(text, "n"));
        assertEquals(message, e.getMessage());
    }

    @Test
    void textNestedDeeperThanAnyNotebookIsRefused() {
        String text = "{\"nbformat\": 4, \"cells\": " + "[".repeat(100_000) + "]".repeat(100_000) + "}";
        NotebookException e = assertThrows(NotebookException.class, () -> Notebook.parse(text, "n"));
        assertEquals("n is nested deeper than 500 brackets", e.getMessage());
    }

    @Test
    void filesThatCannotBeReadAreNamed() throws Exception {
        Path absent = folder.resolve("absent.ipynb");
        assertEquals("there is no file " + absent, message(absent));
        assertEquals(folder + " is a folder; expected a notebook file", message(folder));
        Path latin = folder.resolve("latin.ipynb");
        Files.write(latin, new byte[] {'{', (byte) 0xe4, '}'});
        assertEquals(latin + " is not UTF-8 text, so it is no notebook", message(latin));
    }

    @Test
    void aFileWithoutPermissionIsNamed() throws Exception {
        Path closed = folder.resolve("closed.ipynb");
        Files.writeString(closed, "{}");
        Files.setPosixFilePermissions(closed, Set.of());
        Assumptions.assumeFalse(Files.isReadable(closed), "the superuser reads everything");
        assertEquals(closed + " cannot be read: access is denied", message(closed));
    }

    private static String message(Path file) {
        return assertThrows(NotebookException.class, () -> Notebook.read(file)).getMessage();
    }

    @Test
    void writingFollowsALinkKeepsPermissionsAndLeavesNothingElse() throws Exception {
        Path file = folder.resolve("n.ipynb");
        Files.writeString(file, "old");
        Files.setPosixFilePermissions(file, PosixFilePermissions.fromString("rw-r-----"));
        Path link = Files.createSymbolicLink(folder.resolve("link.ipynb"), file);
        Notebook.parse(resource(JUPYTER_S), "n").write(link);
        assertTrue(Files.isSymbolicLink(link));
        assertEquals(resource(JUPYTER_S), Files.readString(file));
        assertEquals("rw-r-----", PosixFilePermissions.toString(Files.getPosixFilePermissions(file)));
        try (var files = Files.list(folder)) {
            assertEquals(2, files.count());
        }
    }

    @Test
    void aFileThatMustNotBeWrittenStaysAsItIs() throws Exception {
        Path file = folder.resolve("n.ipynb");
        Files.writeString(file, "old");
        Files.setPosixFilePermissions(file, PosixFilePermissions.fromString("r--r--r--"));
        Assumptions.assumeFalse(Files.isWritable(file), "the superuser writes everything");
        Notebook notebook = Notebook.parse(resource(JUPYTER_S), "n");
        assertThrows(AccessDeniedException.class, () -> notebook.write(file));
        assertEquals("old", Files.readString(file));
    }

    @Test
    void theLanguageIsTakenFromTheKernelOrTheLanguage() throws Exception {
        assertEquals("java", Notebook.parse(resource(JUPYTER_S), "n").language().orElseThrow());
        assertEquals(
                "python",
                Notebook.parse(
                                "{\"nbformat\": 4, \"cells\": [], \"metadata\": {\"language_info\": {\"name\": \"Python\"}}}",
                                "n")
                        .language()
                        .orElseThrow());
        assertFalse(Notebook.parse("{\"nbformat\": 4, \"cells\": []}", "n")
                .language()
                .isPresent());
    }
}
