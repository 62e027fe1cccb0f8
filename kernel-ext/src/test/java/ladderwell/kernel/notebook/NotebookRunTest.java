package ladderwell.kernel.notebook;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.google.gson.JsonArray;
import com.google.gson.JsonObject;
import com.google.gson.JsonParser;
import java.time.Duration;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.function.BiFunction;
import ladderwell.kernel.cell.CellEnd;
import ladderwell.kernel.cell.CellOutput;
import ladderwell.kernel.cell.MimeBundle;
import org.junit.jupiter.api.Test;

class NotebookRunTest {
    private static final CellEnd NOTHING = new CellEnd.Done(Optional.empty());

    private final List<String> said = new ArrayList<>();

    /** A notebook of code cells; a source that starts with a tag in brackets gets that tag. */
    private static Notebook notebook(String... sources) throws NotebookException {
        JsonArray cells = new JsonArray();
        for (String source : sources) {
            JsonObject cell = new JsonObject();
            cell.addProperty("cell_type", source.startsWith("#") ? "markdown" : "code");
            JsonObject metadata = new JsonObject();
            if (source.startsWith("(")) {
                JsonArray tags = new JsonArray();
                tags.add(source.substring(1, source.indexOf(')')));
                metadata.add("tags", tags);
            }
            cell.add("metadata", metadata);
            cell.addProperty("source", source);
            if (!source.startsWith("#")) {
                cell.add(
                        "outputs",
                        JsonParser.parseString("[{\"output_type\": \"stream\", \"name\": \"stdout\","
                                + " \"text\": \"of an earlier run\"}]"));
                cell.addProperty("execution_count", 99);
            }
            cells.add(cell);
        }
        JsonObject json = new JsonObject();
        json.addProperty("nbformat", 4);
        json.addProperty("nbformat_minor", 5);
        json.add("cells", cells);
        return Notebook.parse(json.toString(), "n");
    }

    private NotebookRun run(Notebook notebook, BiFunction<String, CellOutput, CellEnd> cells) {
        CellRunner runner = new CellRunner() {
            @Override
            public CellEnd run(String code, int number, CellOutput output) {
                return cells.apply(code, output);
            }

            @Override
            public void interrupt() {
                said.add("interrupt");
            }
        };
        Progress progress = new Progress() {
            @Override
            public void starts(Cell cell, int number, int of) {
                said.add("starts " + number + "/" + of + " " + cell.firstLine());
            }

            @Override
            public void ended(Cell cell, int number, int of, CellEnd end, Duration taken) {
                said.add("ended " + number);
            }
        };
        return new NotebookRun(notebook, runner, progress);
    }

    private static JsonArray outputs(Notebook notebook, int cell) {
        return JsonParser.parseString(notebook.text())
                .getAsJsonObject()
                .getAsJsonArray("cells")
                .get(cell)
                .getAsJsonObject()
                .getAsJsonArray("outputs");
    }

    private static String text(JsonArray outputs, int output) {
        return String.valueOf(Lines.joined(outputs.get(output).getAsJsonObject().get("text")));
    }

    @Test
    void cellsRunInOrderAndBlankOnesTakeNoNumber() throws Exception {
        Notebook notebook = notebook("a", "# text", "  \n ", "b");
        RunEnd end = run(notebook, (code, output) -> NOTHING).run();
        assertEquals(new RunEnd.Finished(2), end);
        assertEquals(List.of("starts 1/2 a", "ended 1", "starts 2/2 b", "ended 2"), said);
        List<OptionalInt> counts =
                notebook.cells().stream().map(Cell::executionCount).toList();
        assertEquals(List.of(OptionalInt.of(1), OptionalInt.empty(), OptionalInt.empty(), OptionalInt.of(2)), counts);
        assertEquals(0, outputs(notebook, 2).size());
    }

    @Test
    void piecesOfOneStreamBecomeOneOutputAndTheOrderIsKept() throws Exception {
        Notebook notebook = notebook("a");
        run(notebook, (code, output) -> {
                    output.stdout("one\ntw");
                    output.stdout("o\n");
                    output.stderr("three");
                    output.stdout("");
                    output.stderr("\n");
                    output.stdout("four");
                    return NOTHING;
                })
                .run();
        JsonArray outputs = outputs(notebook, 0);
        assertEquals(3, outputs.size());
        assertEquals("one\ntwo\n", text(outputs, 0));
        assertEquals("three\n", text(outputs, 1));
        assertEquals("stderr", outputs.get(1).getAsJsonObject().get("name").getAsString());
        assertEquals("four", text(outputs, 2));
    }

    @Test
    void displaysAndResultsAreStoredAsNbformatWants() throws Exception {
        Notebook notebook = notebook("a");
        MimeBundle bundle = new MimeBundle(
                Map.of("text/plain", "p\nq", "image/png", "AAA=", "application/json", "{\"x\": [1]}"),
                Map.of("needs_background", "light"));
        run(notebook, (code, output) -> {
                    output.display(bundle, Optional.empty());
                    return new CellEnd.Done(Optional.of(MimeBundle.plain("42")));
                })
                .run();
        assertEquals(JsonParser.parseString("""
                        [{"output_type": "display_data", "metadata": {"needs_background": "light"}, "data": {
                           "text/plain": ["p\\n", "q"], "image/png": "AAA=", "application/json": {"x": [1]}}},
                         {"output_type": "execute_result", "execution_count": 1, "metadata": {},
                           "data": {"text/plain": ["42"]}}]
                        """), outputs(notebook, 0));
    }

    @Test
    void anUpdateReplacesWhateverWasShownUnderItsNameInAnyCell() throws Exception {
        Notebook notebook = notebook("first", "second");
        run(notebook, (code, output) -> {
                    if (code.equals("first")) {
                        output.display(MimeBundle.plain("0 %"), Optional.of("bar"));
                        output.display(MimeBundle.plain("other"), Optional.of("other"));
                    } else {
                        output.display(MimeBundle.plain("50 %"), Optional.of("bar"));
                        output.update(MimeBundle.plain("100 %"), "bar");
                        output.update(MimeBundle.plain("lost"), "never shown");
                    }
                    return NOTHING;
                })
                .run();
        assertTrue(outputs(notebook, 0).toString().contains("100 %"));
        assertTrue(outputs(notebook, 0).toString().contains("other"));
        assertTrue(outputs(notebook, 1).toString().contains("100 %"));
        assertEquals(1, outputs(notebook, 1).size());
        assertFalse(notebook.text().contains("lost"));
    }

    @Test
    void clearingIsDoneAtOnceOrWaitsForTheNextOutput() throws Exception {
        Notebook notebook = notebook("now", "wait", "wait for nothing");
        run(notebook, (code, output) -> {
                    output.stdout("old");
                    output.clear(!code.equals("now"));
                    if (code.equals("wait")) {
                        output.stdout("new");
                    }
                    return NOTHING;
                })
                .run();
        assertEquals(0, outputs(notebook, 0).size());
        assertEquals("new", text(outputs(notebook, 1), 0));
        assertEquals("old", text(outputs(notebook, 2), 0));
    }

    @Test
    void aClearThatWaitsTakesPlaceBeforeTheResult() throws Exception {
        Notebook notebook = notebook("a");
        run(notebook, (code, output) -> {
                    output.stdout("old");
                    output.clear(true);
                    return new CellEnd.Done(Optional.of(MimeBundle.plain("7")));
                })
                .run();
        assertEquals(1, outputs(notebook, 0).size());
        assertEquals(
                "execute_result",
                outputs(notebook, 0).get(0).getAsJsonObject().get("output_type").getAsString());
    }

    private static CellEnd failure(String code) {
        return code.contains("bad")
                ? new CellEnd.Failed(
                        "java.lang.ArithmeticException",
                        "/ by zero",
                        List.of(
                                "\u001b[31mArithmeticException\u001b[0m: / by zero",
                                "  at cell [\u001b[1m2\u001b[0m], line 4"))
                : NOTHING;
    }

    @Test
    void theFirstErrorEndsTheRunAndIsNamedByCellAndLine() throws Exception {
        Notebook notebook = notebook("a", "bad", "c");
        RunEnd end = run(notebook, (code, output) -> failure(code)).run();
        assertEquals(new RunEnd.Failed(2, OptionalInt.of(4), "java.lang.ArithmeticException", "/ by zero"), end);
        JsonObject error = outputs(notebook, 1).get(0).getAsJsonObject();
        assertEquals("error", error.get("output_type").getAsString());
        assertEquals("java.lang.ArithmeticException", error.get("ename").getAsString());
        assertEquals("/ by zero", error.get("evalue").getAsString());
        assertEquals(2, error.getAsJsonArray("traceback").size());
        assertEquals(0, outputs(notebook, 2).size());
        assertFalse(notebook.cells().get(2).executionCount().isPresent());
        assertFalse(notebook.text().contains("of an earlier run"));
    }

    @Test
    void theLineOfASentenceIsNamedToo() throws Exception {
        CellEnd end = new CellEnd.Failed("Declaration", "no such unit", List.of("line 12: state x: …", "  ^"));
        assertEquals(
                new RunEnd.Failed(1, OptionalInt.of(12), "Declaration", "no such unit"),
                run(notebook("a"), (code, output) -> end).run());
    }

    @Test
    void aCellThatMayFailDoesNotEndTheRun() throws Exception {
        Notebook notebook = notebook("(raises-exception) bad", "c");
        assertEquals(
                new RunEnd.Finished(2),
                run(notebook, (code, output) -> failure(code)).run());
        assertEquals(1, outputs(notebook, 0).size());
    }

    @Test
    void aCellToSkipKeepsItsOutputs() throws Exception {
        Notebook notebook = notebook("(skip-execution) bad", "c");
        assertEquals(
                new RunEnd.Finished(1),
                run(notebook, (code, output) -> failure(code)).run());
        assertEquals("of an earlier run", text(outputs(notebook, 0), 0));
    }

    @Test
    void stoppingInterruptsTheCellAndRunsNoOther() throws Exception {
        Notebook notebook = notebook("a", "b");
        NotebookRun[] run = new NotebookRun[1];
        run[0] = run(notebook, (code, output) -> {
            output.stdout("so far");
            run[0].stop();
            return new CellEnd.Interrupted(List.of("interrupted"));
        });
        assertEquals(new RunEnd.Stopped(1), run[0].run());
        assertEquals(List.of("starts 1/2 a", "interrupt", "ended 1"), said);
        assertEquals("so far", text(outputs(notebook, 0), 0));
        assertEquals(2, outputs(notebook, 0).size());
    }

    @Test
    void aStopBetweenCellsIsKeptToo() throws Exception {
        Notebook notebook = notebook("a", "b");
        NotebookRun[] run = new NotebookRun[1];
        run[0] = run(notebook, (code, output) -> {
            run[0].stop();
            return NOTHING;
        });
        assertEquals(new RunEnd.Stopped(2), run[0].run());
    }

    @Test
    void aNotebookWithoutAKernelGetsOurs() throws Exception {
        Notebook notebook = notebook("a");
        run(notebook, (code, output) -> NOTHING).run();
        assertEquals("java", notebook.language().orElseThrow());
    }

    @Test
    void onlyOutputsAndCountsOfAJupyterNotebookChange() throws Exception {
        String before = NotebookTest.resource("written-by-jupyter.ipynb");
        Notebook notebook = Notebook.parse(before, "n");
        run(notebook, (code, output) -> {
                    output.stdout("x\n");
                    return NOTHING;
                })
                .run();
        String stored = """
                   "outputs": [
                    {
                     "name": "stdout",
                     "output_type": "stream",
                     "text": [
                      "x\\n"
                     ]
                    }
                   ],
                """;
        String undone = notebook.text()
                .replaceAll("\"execution_count\": \\d+", "\"execution_count\": null")
                .replace(stored, "   \"outputs\": [],\n");
        assertEquals(before, undone);
    }
}
