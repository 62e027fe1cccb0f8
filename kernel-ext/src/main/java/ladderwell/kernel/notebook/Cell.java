package ladderwell.kernel.notebook;

import com.google.gson.JsonArray;
import com.google.gson.JsonElement;
import com.google.gson.JsonNull;
import com.google.gson.JsonObject;
import com.google.gson.JsonPrimitive;
import java.util.LinkedHashSet;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.Set;

/** One cell of a {@link Notebook}: a view of its part of the file, unknown fields included. */
public final class Cell {
    /** What a cell holds. */
    public enum Kind {
        /** Code to run. */
        CODE,
        /** Text in Markdown. */
        MARKDOWN,
        /** Text for some other program. */
        RAW
    }

    private final JsonObject json;
    private final Kind kind;
    private final String source;
    private boolean ran;

    Cell(JsonObject json, Kind kind, String source) {
        this.json = json;
        this.kind = kind;
        this.source = source;
    }

    /** What it holds. */
    public Kind kind() {
        return kind;
    }

    /** Its name in the file. */
    public String id() {
        return json.get("id").getAsString();
    }

    /** Its text. */
    public String source() {
        return source;
    }

    /** The first line that is not blank, to name the cell by; empty for a blank cell. */
    public String firstLine() {
        return source.lines()
                .filter(line -> !line.isBlank())
                .findFirst()
                .orElse("")
                .strip();
    }

    /** Its tags, such as {@code raises-exception}. */
    public Set<String> tags() {
        Set<String> tags = new LinkedHashSet<>();
        if (json.get("metadata") instanceof JsonObject metadata && metadata.get("tags") instanceof JsonArray list) {
            for (JsonElement tag : list) {
                if (Lines.isString(tag)) {
                    tags.add(tag.getAsString());
                }
            }
        }
        return tags;
    }

    /** The number it ran under, where it has run. */
    public OptionalInt executionCount() {
        return json.get("execution_count") instanceof JsonPrimitive count && count.isNumber()
                ? OptionalInt.of(count.getAsInt())
                : OptionalInt.empty();
    }

    /** The file attached to the cell under this name, by MIME type. */
    Optional<JsonObject> attachment(String name) {
        return json.get("attachments") instanceof JsonObject attachments
                        && attachments.get(name) instanceof JsonObject bundle
                ? Optional.of(bundle)
                : Optional.empty();
    }

    /** The stored outputs of a code cell, the list itself. */
    JsonArray outputs() {
        return json.getAsJsonArray("outputs");
    }

    /** Whether its outputs come from this very run. */
    boolean ran() {
        return ran;
    }

    /** Forgets the outputs and the count of an earlier run. */
    void clear() {
        json.add("outputs", new JsonArray());
        json.add("execution_count", JsonNull.INSTANCE);
    }

    void startsAs(int count) {
        ran = true;
        json.addProperty("execution_count", count);
    }
}
