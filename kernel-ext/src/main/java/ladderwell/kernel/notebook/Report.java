package ladderwell.kernel.notebook;

import com.google.gson.JsonElement;
import com.google.gson.JsonObject;
import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.List;
import java.util.Objects;
import java.util.Optional;

/**
 * A notebook as one web page that stands alone: it fetches nothing (its own content policy forbids it), reads on a light
 * and a dark page and on paper, and keeps its animations.
 */
public final class Report {
    /** The line that every report ends with. */
    public static final String CAUTION =
            "Results are calculations from an idealised model. They are not a safety case for"
                    + " lasers, high voltage, vacuum or cryogenics, which local codes and licensed practice govern.";

    /** Scripts and styles of the page itself, pictures that are part of it, and nothing else. */
    private static final String POLICY = "default-src 'none'; style-src 'unsafe-inline'; script-src 'unsafe-inline';"
            + " img-src data: blob:; font-src data:; media-src data:; base-uri 'none'; form-action 'none'";

    private static final List<String> IMAGES = List.of("image/svg+xml", "image/png", "image/jpeg", "image/gif");

    private final Notebook notebook;
    private final Path folder;
    private final String name;
    private final String footer;

    /**
     * A report of a notebook.
     *
     * @param file where the notebook is: names the page if it has no heading, and pictures beside it are put in
     * @param footer what made the page, in one line of plain text
     */
    public Report(Notebook notebook, Path file, String footer) {
        this.notebook = notebook;
        Path whole = file.toAbsolutePath();
        this.folder = Objects.requireNonNull(whole.getParent(), "a file has a folder");
        this.name = String.valueOf(whole.getFileName()).replaceFirst("\\.ipynb$", "");
        this.footer = footer;
    }

    /** Writes the page; the file holds either its old content or the whole page at any moment. */
    public void write(Path file) throws IOException {
        NotebookFile.write(file, html());
    }

    /** The page. */
    public String html() {
        StringBuilder page = new StringBuilder(1 << 16);
        page.append("<!DOCTYPE html>\n<html lang=\"en\">\n<head>\n<meta charset=\"utf-8\">\n")
                .append("<meta http-equiv=\"Content-Security-Policy\" content=\"")
                .append(POLICY)
                .append("\">\n<meta name=\"viewport\" content=\"width=device-width, initial-scale=1\">\n")
                .append("<meta name=\"color-scheme\" content=\"light dark\">\n<title>")
                .append(Html.escaped(title()))
                .append("</title>\n<style>\n")
                .append(style())
                .append("</style>\n</head>\n<body>\n<main>\n");
        synchronized (notebook) {
            for (Cell cell : notebook.cells()) {
                switch (cell.kind()) {
                    case MARKDOWN -> text(page, cell);
                    case CODE -> code(page, cell);
                    case RAW ->
                        page.append("<pre class=\"raw\">")
                                .append(Html.escaped(cell.source()))
                                .append("</pre>\n");
                }
            }
        }
        return page.append("</main>\n<footer>\n<p>")
                .append(Html.escaped(footer))
                .append("</p>\n<p>")
                .append(CAUTION)
                .append("</p>\n</footer>\n</body>\n</html>\n")
                .toString();
    }

    /** The first heading of the notebook, or the name of its file. */
    String title() {
        return notebook.cells().stream()
                .filter(cell -> cell.kind() == Cell.Kind.MARKDOWN)
                .map(cell -> MarkdownText.heading(cell.source()))
                .flatMap(Optional::stream)
                .findFirst()
                .orElse(name);
    }

    private void text(StringBuilder page, Cell cell) {
        page.append("<section class=\"text\">\n")
                .append(new MarkdownText(new NotebookPictures(cell, folder)).html(cell.source()))
                .append("</section>\n");
    }

    private void code(StringBuilder page, Cell cell) {
        if (cell.source().isBlank() && cell.outputs().isEmpty()) {
            return;
        }
        String count = cell.executionCount().isPresent()
                ? String.valueOf(cell.executionCount().getAsInt())
                : " ";
        page.append("<section class=\"code\" id=\"")
                .append(Html.escaped("cell-" + cell.id()))
                .append("\">\n<div class=\"count\">[")
                .append(count)
                .append("]</div>\n<pre class=\"source\"><code>")
                .append(Highlight.html(cell.source()))
                .append("</code></pre>\n");
        if (!cell.outputs().isEmpty()) {
            page.append("<div class=\"outputs\">\n");
            for (JsonElement output : cell.outputs()) {
                if (output instanceof JsonObject object) {
                    page.append("<div class=\"output\">")
                            .append(output(object, cell))
                            .append("</div>\n");
                }
            }
            page.append("</div>\n");
        }
        page.append("</section>\n");
    }

    private String output(JsonObject output, Cell cell) {
        String type = string(output, "output_type");
        if (type.equals("stream")) {
            String text =
                    Optional.ofNullable(output.get("text")).map(Lines::joined).orElse("");
            return "<pre class=\"" + (string(output, "name").equals("stderr") ? "stderr" : "stdout") + "\">"
                    + Ansi.html(Overwriting.settled(text)) + "</pre>";
        }
        if (type.equals("error")) {
            String traceback = output.has("traceback")
                    ? lines(output.get("traceback"))
                    : string(output, "ename") + ": " + string(output, "evalue");
            return "<pre class=\"error\">" + Ansi.html(traceback) + "</pre>";
        }
        return output.get("data") instanceof JsonObject data ? bundle(data, cell) : "";
    }

    /** The best form that may be shown: HTML only from this run, pictures as images, in which no script runs. */
    private String bundle(JsonObject data, Cell cell) {
        Optional<String> html = text(data, "text/html").filter(text -> cell.ran());
        if (html.isPresent()) {
            return html.get();
        }
        for (String image : IMAGES) {
            if (data.has(image)) {
                Optional<String> address = NotebookPictures.data(image, data.get(image));
                if (address.isPresent()) {
                    return "<img src=\"" + address.get() + "\" alt=\""
                            + Html.escaped(text(data, "text/plain").orElse("picture")) + "\">";
                }
            }
        }
        Optional<String> markdown = text(data, "text/markdown");
        if (markdown.isPresent()) {
            return new MarkdownText(new NotebookPictures(cell, folder)).html(markdown.get());
        }
        return text(data, "text/plain")
                .map(text -> "<pre>" + Ansi.html(text) + "</pre>")
                .orElse("");
    }

    private static Optional<String> text(JsonObject data, String type) {
        return Optional.ofNullable(data.get(type)).map(Lines::joined);
    }

    private static String string(JsonObject object, String key) {
        JsonElement value = object.get(key);
        return value != null && Lines.isString(value) ? value.getAsString() : "";
    }

    private static String lines(JsonElement traceback) {
        StringBuilder text = new StringBuilder();
        if (traceback.isJsonArray()) {
            for (JsonElement line : traceback.getAsJsonArray()) {
                if (Lines.isString(line)) {
                    text.append(text.isEmpty() ? "" : "\n").append(line.getAsString());
                }
            }
        }
        return text.toString();
    }

    private static String style() {
        try (InputStream css = Report.class.getResourceAsStream("report.css")) {
            return new String(Objects.requireNonNull(css, "report.css").readAllBytes(), StandardCharsets.UTF_8);
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        }
    }
}
