package ladderwell.kernel.notebook;

import com.google.gson.JsonArray;
import com.google.gson.JsonElement;
import com.google.gson.JsonNull;
import com.google.gson.JsonObject;
import com.google.gson.JsonPrimitive;
import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/**
 * A notebook file of nbformat 4. Reading keeps every field and all metadata, known or not; writing gives nbformat 4.5
 * (cells without a valid id of their own get one) in the form in which Jupyter writes, so that a file that Jupyter wrote
 * changes only where something changed.
 *
 * @source nbformat 4.5, nbformat.readthedocs.io/en/latest/format_description.html
 */
public final class Notebook {
    private static final int MINOR_WRITTEN = 5;

    private final JsonObject json;
    private final List<Cell> cells;

    private Notebook(JsonObject json, List<Cell> cells) {
        this.json = json;
        this.cells = List.copyOf(cells);
    }

    /**
     * Reads a notebook file.
     *
     * @throws NotebookException in one sentence, when there is no file, it cannot be read, or it holds no notebook of
     *     nbformat 4
     */
    public static Notebook read(Path file) throws NotebookException {
        return parse(NotebookFile.text(file), String.valueOf(file));
    }

    /**
     * The notebook of a text.
     *
     * @param name what to call it in messages
     */
    static Notebook parse(String text, String name) throws NotebookException {
        JsonObject json = NotebookFile.object(text, name);
        int major = number(json, "nbformat");
        if (major != 4) {
            throw new NotebookException(name
                    + (major < 0
                            ? " has no nbformat number, so it is no notebook"
                            : " is of nbformat " + major + "; expected nbformat 4, which Jupyter can convert it to"));
        }
        if (!(json.get("cells") instanceof JsonArray array)) {
            throw new NotebookException(name + " has no list of cells");
        }
        if (!(json.get("metadata") instanceof JsonObject)) {
            json.add("metadata", new JsonObject());
        }
        List<Cell> cells = new ArrayList<>();
        for (JsonElement element : array) {
            cells.add(cell(element, name + ": cell " + (cells.size() + 1)));
        }
        CellIds.complete(array);
        json.addProperty("nbformat_minor", Math.max(MINOR_WRITTEN, number(json, "nbformat_minor")));
        dropTransient(json);
        return new Notebook(json, cells);
    }

    private static Cell cell(JsonElement element, String place) throws NotebookException {
        if (!(element instanceof JsonObject cell)) {
            throw new NotebookException(place + " is no JSON object");
        }
        JsonElement type = cell.get("cell_type");
        Cell.Kind kind;
        try {
            kind = Cell.Kind.valueOf(
                    type instanceof JsonPrimitive ? type.getAsString().toUpperCase(Locale.ROOT) : "");
        } catch (IllegalArgumentException e) {
            throw new NotebookException(
                    place + " is of the kind " + type + "; expected \"code\", \"markdown\" or \"raw\"", e);
        }
        JsonElement stored = cell.get("source");
        String source = stored == null ? null : Lines.joined(stored);
        if (source == null) {
            throw new NotebookException(place + " has no source; expected a string or a list of strings");
        }
        if (!(cell.get("metadata") instanceof JsonObject)) {
            cell.add("metadata", new JsonObject());
        }
        if (kind == Cell.Kind.CODE) {
            if (!(cell.get("outputs") instanceof JsonArray)) {
                cell.add("outputs", new JsonArray());
            }
            if (!cell.has("execution_count")) {
                cell.add("execution_count", JsonNull.INSTANCE);
            }
        }
        return new Cell(cell, kind, source);
    }

    /** Jupyter never stores these, on reading or writing. */
    private static void dropTransient(JsonObject json) {
        JsonObject metadata = json.getAsJsonObject("metadata");
        List.of("orig_nbformat", "orig_nbformat_minor", "signature").forEach(metadata::remove);
        for (JsonElement cell : json.getAsJsonArray("cells")) {
            cell.getAsJsonObject().getAsJsonObject("metadata").remove("trusted");
        }
    }

    private static int number(JsonObject json, String key) {
        if (json.get(key) instanceof JsonPrimitive value && value.isNumber()) {
            try {
                return Integer.parseInt(value.getAsString());
            } catch (NumberFormatException e) {
                return -1;
            }
        }
        return -1;
    }

    /** Its cells, in order. */
    public List<Cell> cells() {
        return cells;
    }

    /** The language it says it is written in, in lower case, if it says. */
    public Optional<String> language() {
        JsonObject metadata = metadata();
        for (String[] place : new String[][] {{"kernelspec", "language"}, {"language_info", "name"}}) {
            if (metadata.get(place[0]) instanceof JsonObject holder
                    && holder.get(place[1]) instanceof JsonPrimitive language
                    && language.isString()) {
                return Optional.of(language.getAsString().toLowerCase(Locale.ROOT));
            }
        }
        return Optional.empty();
    }

    /** The metadata of the whole notebook, the object itself. */
    JsonObject metadata() {
        return json.getAsJsonObject("metadata");
    }

    /** The notebook as a file holds it. */
    public synchronized String text() {
        JsonObject copy = json.deepCopy();
        Lines.splitAll(copy);
        return JsonPrinter.print(copy);
    }

    /** Writes it; the file holds either the old content or the whole new one at any moment. */
    public void write(Path file) throws IOException {
        NotebookFile.write(file, text());
    }
}
