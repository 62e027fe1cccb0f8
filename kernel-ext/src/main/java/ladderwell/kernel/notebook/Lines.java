package ladderwell.kernel.notebook;

import com.google.gson.JsonArray;
import com.google.gson.JsonElement;
import com.google.gson.JsonObject;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;

/**
 * Notebook files hold a text of several lines as a list of lines. Which texts are split, and at which characters, is
 * what Jupyter's own writer does, so that a file does not change by passing through here.
 */
final class Lines {
    private Lines() {}

    /** The text of a JSON value that is a string or a list of strings; null where it is neither. */
    static @org.jspecify.annotations.Nullable String joined(JsonElement value) {
        if (isString(value)) {
            return value.getAsString();
        }
        if (!(value instanceof JsonArray array)) {
            return null;
        }
        StringBuilder text = new StringBuilder();
        for (JsonElement line : array) {
            if (!isString(line)) {
                return null;
            }
            text.append(line.getAsString());
        }
        return text.toString();
    }

    static boolean isString(JsonElement value) {
        return value.isJsonPrimitive() && value.getAsJsonPrimitive().isString();
    }

    /** Splits every text of a notebook that Jupyter would split, in place. */
    static void splitAll(JsonObject notebook) {
        for (JsonElement element : notebook.getAsJsonArray("cells")) {
            JsonObject cell = element.getAsJsonObject();
            split(cell, "source");
            if (cell.get("attachments") instanceof JsonObject attachments) {
                for (Map.Entry<String, JsonElement> attachment : attachments.entrySet()) {
                    splitBundle(attachment.getValue());
                }
            }
            if (cell.get("outputs") instanceof JsonArray outputs) {
                for (JsonElement item : outputs) {
                    if (item instanceof JsonObject output) {
                        split(output, "text");
                        splitBundle(output.get("data"));
                    }
                }
            }
        }
    }

    private static void splitBundle(@org.jspecify.annotations.Nullable JsonElement bundle) {
        if (bundle instanceof JsonObject data) {
            for (String type : List.copyOf(data.keySet())) {
                if (type.startsWith("text/") || type.equals("application/javascript") || type.equals("image/svg+xml")) {
                    split(data, type);
                }
            }
        }
    }

    private static void split(JsonObject holder, String key) {
        JsonElement value = holder.get(key);
        if (value != null) {
            String text = joined(value);
            if (text != null) {
                JsonArray lines = new JsonArray();
                of(text).forEach(lines::add);
                holder.add(key, lines);
            }
        }
    }

    /** The lines of a text, each with its end; at every character that Unicode calls a line end. */
    static List<String> of(String text) {
        List<String> lines = new ArrayList<>();
        int start = 0;
        for (int i = 0; i < text.length(); i++) {
            if (endsLine(text.charAt(i))) {
                if (text.charAt(i) == '\r' && i + 1 < text.length() && text.charAt(i + 1) == '\n') {
                    i++;
                }
                lines.add(text.substring(start, i + 1));
                start = i + 1;
            }
        }
        if (start < text.length()) {
            lines.add(text.substring(start));
        }
        return lines;
    }

    private static boolean endsLine(char c) {
        return c >= '\n' && c <= '\r'
                || c >= '\u001c' && c <= '\u001e'
                || c == '\u0085'
                || c == '\u2028'
                || c == '\u2029';
    }
}
