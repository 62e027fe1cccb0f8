package ladderwell.kernel.notebook;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.google.gson.JsonArray;
import com.google.gson.JsonObject;
import java.nio.file.Files;
import java.nio.file.Path;
import java.time.Duration;
import java.util.Base64;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import ladderwell.kernel.cell.CellEnd;
import ladderwell.kernel.cell.CellOutput;
import ladderwell.kernel.cell.MimeBundle;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class ReportTest {
    private static final byte[] DOT = Base64.getDecoder()
            .decode("iVBORw0KGgoAAAANSUhEUgAAAAEAAAABCAYAAAAfFcSJAAAADUlEQVR42mNk+M9QDwADhgGAWjR9awAAAABJRU5ErkJggg==");

    @TempDir
    Path folder;

    private String page(Notebook notebook) {
        return new Report(notebook, folder.resolve("my notes.ipynb"), "made by <us>").html();
    }

    private String markdown(String text) throws NotebookException {
        JsonObject cell = new JsonObject();
        cell.addProperty("cell_type", "markdown");
        cell.addProperty("source", text);
        return body(page(notebook(cell)));
    }

    private static Notebook notebook(JsonObject... cells) throws NotebookException {
        JsonObject json = new JsonObject();
        json.addProperty("nbformat", 4);
        JsonArray list = new JsonArray();
        List.of(cells).forEach(list::add);
        json.add("cells", list);
        return Notebook.parse(json.toString(), "n");
    }

    private static JsonObject code(String source) {
        JsonObject cell = new JsonObject();
        cell.addProperty("cell_type", "code");
        cell.addProperty("source", source);
        return cell;
    }

    private static String body(String page) {
        return page.substring(page.indexOf("<main>"), page.indexOf("</main>"));
    }

    /** The page of a cell that shows these bundles when it runs. */
    private String ran(MimeBundle... bundles) throws NotebookException {
        Notebook notebook = notebook(code("x"));
        CellRunner runner = new CellRunner() {
            @Override
            public CellEnd run(String code, int number, CellOutput output) {
                for (MimeBundle bundle : bundles) {
                    output.display(bundle, Optional.empty());
                }
                return new CellEnd.Done(Optional.empty());
            }

            @Override
            public void interrupt() {}
        };
        Progress silent = new Progress() {
            @Override
            public void starts(Cell cell, int number, int of) {}

            @Override
            public void ended(Cell cell, int number, int of, CellEnd end, Duration taken) {}
        };
        new NotebookRun(notebook, runner, silent).run();
        return body(page(notebook));
    }

    @Test
    void thePageIsWholeAndSaysWhatItIs() throws Exception {
        String page = page(notebook());
        assertTrue(page.startsWith("<!DOCTYPE html>\n"));
        assertTrue(page.contains("<title>my notes</title>"));
        assertTrue(page.contains("made by &lt;us&gt;"));
        assertTrue(page.contains(Report.CAUTION));
        assertTrue(page.contains("default-src 'none'"));
        assertFalse(page.matches("(?s).*https?:.*"), "nothing in the page itself names an address");
    }

    @Test
    void theTitleIsTheFirstHeading() throws Exception {
        JsonObject text = new JsonObject();
        text.addProperty("cell_type", "markdown");
        text.addProperty("source", "words\n\n## small\n\n# How *classical* `is` it?");
        assertEquals("How classical is it?", new Report(notebook(text), folder.resolve("n"), "").title());
    }

    @Test
    void markdownHasTablesAndCode() throws Exception {
        assertTrue(markdown("| a | b |\n|--:|---|\n| 1 | 2 |").contains("<td align=\"right\">1</td>"));
        assertTrue(markdown("```\na < b\n```").contains("<pre><code>a &lt; b\n</code></pre>"));
    }

    @ParameterizedTest
    @ValueSource(
            strings = {
                "<script>alert(1)</script>",
                "text <img src=x onerror=alert(1)> more",
                "<div onclick='alert(1)'>\n\n<iframe src='//example.org'></iframe>",
                "<svg/onload=alert(1)>",
                "<b onmouseover=alert(1)>b</b>",
                "<style>@import '//example.org'</style>",
                "[x](javascript:alert(1))",
                "[x](JaVaScRiPt:alert(1))",
                "[x](data:text/html,<script>alert(1)</script>)",
                "![x](javascript:alert(1))",
                "![x](data:text/html;base64,PHNjcmlwdD4=)",
                "<javascript:alert(1)>",
                "![\"onerror=alert(1) x=\"](a.png)",
                "$<script>alert(1)</script>$",
                "`<script>alert(1)</script>`",
                "| <script>alert(1)</script> |\n|---|\n| <img src=x onerror=alert(1)> |",
            })
    void hostileMarkdownStaysText(String text) throws Exception {
        String html = markdown(text);
        String tags = html.replaceAll("(?s)>[^<]*", ">").toLowerCase(java.util.Locale.ROOT);
        for (String bad : List.of(
                "<script",
                "<img",
                "<iframe",
                "<svg",
                "<style",
                "<div",
                "onerror",
                "onclick",
                "onload",
                "onmouseover",
                "javascript:",
                "data:text")) {
            assertFalse(tags.contains(bad), () -> bad + " in " + html);
        }
    }

    @Test
    void aFewTagsWithoutAttributesAreKept() throws Exception {
        assertTrue(markdown("x<sub>2</sub><br>y <script>").contains("x<sub>2</sub><br>y &lt;script&gt;"));
        assertFalse(markdown("<!-- hidden --> seen").contains("hidden"));
    }

    @Test
    void formulasStayAsTheyWereTyped() throws Exception {
        assertTrue(markdown("so $a_1 < b_2$ and $$c*d*e$$.")
                .contains("so <span class=\"formula\">$a_1 &lt; b_2$</span> and"
                        + " <span class=\"formula\">$$c*d*e$$</span>."));
        assertTrue(markdown("$5 and *six* for $6").contains("$5 and <em>six</em> for $6"));
        assertTrue(markdown("$x$5").contains("$x$5"));
        assertTrue(markdown("lone $ sign, $open").contains("lone $ sign, $open"));
    }

    @Test
    void linksStayAndNothingIsFetched() throws Exception {
        assertTrue(markdown("[a](https://example.org/x)")
                .contains("<a rel=\"noopener noreferrer\" href=\"https://example.org/x\">a</a>"));
        String html = markdown("![far](https://example.org/x.png)");
        assertFalse(html.contains("<img"));
        assertTrue(html.contains("[picture not in this page: far]"));
    }

    @Test
    void picturesBesideTheNotebookAreInThePageAndOthersAreNot() throws Exception {
        Path notes = Files.createDirectory(folder.resolve("notes"));
        Files.write(notes.resolve("dot ä.png"), DOT);
        Files.write(folder.resolve("outside.png"), DOT);
        Files.writeString(notes.resolve("secret.png"), "no image");
        Files.createSymbolicLink(notes.resolve("link.png"), folder.resolve("outside.png"));
        JsonObject cell = new JsonObject();
        cell.addProperty("cell_type", "markdown");
        cell.addProperty("source", "![in](dot%20ä.png) ![out](../outside.png) ![secret](secret.png) ![link](link.png)");
        String html = body(new Report(notebook(cell), notes.resolve("n.ipynb"), "").html());
        assertTrue(html.contains("base64," + Base64.getEncoder().encodeToString(DOT)));
        assertEquals(1, html.split("<img", -1).length - 1, html);
        for (String absent : List.of("out", "secret", "link")) {
            assertTrue(html.contains("[picture not in this page: " + absent + "]"), html);
        }
    }

    @Test
    void attachmentsAreInThePage() throws Exception {
        Notebook notebook = Notebook.parse(NotebookTest.resource("written-by-jupyter.ipynb"), "n");
        assertEquals("Ein Titel mit Umlauten: äöü, ħω, a†", new Report(notebook, folder.resolve("n"), "").title());
        JsonObject cell = new JsonObject();
        cell.addProperty("cell_type", "markdown");
        cell.addProperty("source", "![a](attachment:dot.png) ![b](attachment:none.png)");
        JsonObject bundle = new JsonObject();
        bundle.addProperty("image/png", "AAAA");
        JsonObject attachments = new JsonObject();
        attachments.add("dot.png", bundle);
        cell.add("attachments", attachments);
        String html = body(page(notebook(cell)));
        assertTrue(html.contains("src=\"data:image/png;base64,AAAA\""), html);
        assertTrue(html.contains("[picture not in this page: b]"));
    }

    @Test
    void outputsOfThisRunAreShownInTheirBestForm() throws Exception {
        MimeBundle plain = MimeBundle.plain("a < b");
        assertTrue(ran(plain).contains("<pre>a &lt; b</pre>"));
        assertTrue(ran(plain.with("text/html", "<b>x</b><script>1</script>")).contains("<b>x</b><script>1</script>"));
        assertTrue(ran(plain.with("image/png", "AAA\nA"))
                .contains("<img src=\"data:image/png;base64,AAAA\" alt=\"a &lt; b\">"));
        assertTrue(
                ran(plain.with("image/svg+xml", "<svg/>")).contains("<img src=\"data:image/svg+xml;base64,PHN2Zy8+\""));
        assertTrue(ran(new MimeBundle(Map.of("text/plain", "p", "text/markdown", "*m*"), Map.of()))
                .contains("<em>m</em>"));
    }

    @Test
    void outputsThatSomeoneElseStoredRunNoScript() throws Exception {
        JsonObject cell = code("x");
        cell.add("outputs", com.google.gson.JsonParser.parseString("""
                        [{"output_type": "display_data", "metadata": {}, "data": {
                           "text/html": "<script>alert(1)</script>", "text/plain": "plain <b>"}},
                         {"output_type": "display_data", "metadata": {}, "data": {
                           "image/png": "A\\" onerror=\\"alert(1)", "text/plain": "p\\" onerror=\\"x"}},
                         {"output_type": "stream", "name": "x\\"><script>", "text": "<script>"},
                         {"output_type": "error", "ename": "<i>", "evalue": "<u>", "traceback": ["<script>"]},
                         {"output_type": "error", "ename": "<i>", "evalue": "<u>"},
                         {"output_type": "nonsense"}, 7]
                        """));
        String html = body(page(notebook(cell)));
        assertFalse(html.contains("<script"), html);
        assertTrue(html.contains("<pre>plain &lt;b&gt;</pre>"));
        assertTrue(html.contains("src=\"data:image/png;base64,Aonerror=alert1\""), html);
        assertTrue(html.contains("<pre class=\"error\">&lt;i&gt;: &lt;u&gt;</pre>"));
    }

    @Test
    void coloursOfErrorsAreKeptAndOtherSequencesDropped() {
        assertEquals(
                "a<span class=\"ansi-red ansi-bold\">b&lt;</span>c",
                Ansi.html("a\u001b[1;31mb<\u001b[0mc\u001b[2K\u001b]8;;x\u0007"));
        assertEquals("plain", Ansi.plain("\u001b[38;5;1mpl\u001b[mai\u001b[?25hn"));
        assertEquals("x", Ansi.html("\u001b[38;5;1mx"));
    }

    @Test
    void aLineThatOverwritesItselfShowsWhatItEndedAs() {
        assertEquals("done\n next", Overwriting.settled("10 %\r50 %\rdone\n next"));
        assertEquals("ab\ncd", Overwriting.settled("ab\r\ncd"));
        assertEquals("xbc", Overwriting.settled("abc\rx"));
    }

    @Test
    void codeIsMarkedByLanguage() {
        assertEquals(
                "<span class=\"word\">int</span> a = <span class=\"number\">1_0</span>; <span class=\"comment\">// &lt;int&gt;</span>",
                Highlight.html("int a = 1_0; // <int>"));
        assertEquals(
                "f(<span class=\"string\">&quot;int \\&quot; 1&quot;</span>)", Highlight.html("f(\"int \\\" 1\")"));
        assertEquals(
                "<span class=\"word\">%state</span> psi: coherent in trap, mean <span class=\"number\">9.5</span>",
                Highlight.html("%state psi: coherent in trap, mean 9.5"));
        assertEquals(
                "<span class=\"word\">%%declare</span>\n<span class=\"comment\"># int</span>",
                Highlight.html("%%declare\n# int"));
    }

    @Test
    void aVeryLongLineOfCodeIsShownWhole() {
        String line = "String s = \"" + "\\\"x".repeat(200_000) + "\";";
        assertEquals(Html.escaped(line), Highlight.html(line).replaceAll("</?span[^>]*>", ""));
    }
}
