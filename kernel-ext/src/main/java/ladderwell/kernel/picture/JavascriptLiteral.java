package ladderwell.kernel.picture;

import com.google.gson.JsonArray;
import com.google.gson.JsonElement;
import com.google.gson.JsonNull;
import com.google.gson.JsonObject;
import com.google.gson.JsonPrimitive;
import java.util.Set;

/**
 * Reads the object literals that tech.tablesaw.plotly writes (bare keys, single quotes, trailing commas) as data. Text
 * that is no literal is refused, so whatever stood in a title or a column name can become a value but never a program.
 */
final class JavascriptLiteral {
    private static final Set<String> REFUSED_KEYS = Set.of("__proto__", "constructor", "prototype");

    /** Deeper nesting than any figure has; keeps a made-up one from exhausting the stack. */
    private static final int DEEPEST = 100;

    private final String text;
    private int at;

    private JavascriptLiteral(String text, int at) {
        this.text = text;
        this.at = at;
    }

    /**
     * The object of a text such as {@code var layout = {…};}, or of the literal alone.
     *
     * @throws IllegalArgumentException if there is anything but one object literal
     */
    static JsonObject object(String text) {
        int brace = text.indexOf('{');
        if (brace < 0 || !text.substring(0, brace).matches("\\s*(var\\s+\\w+\\s*=\\s*)?")) {
            throw new IllegalArgumentException("expected an object literal");
        }
        JavascriptLiteral literal = new JavascriptLiteral(text, brace);
        JsonObject object = literal.object(0);
        literal.blanks();
        if (literal.at < text.length() && text.charAt(literal.at) == ';') {
            literal.at++;
            literal.blanks();
        }
        if (literal.at < text.length()) {
            throw literal.unexpected();
        }
        return object;
    }

    private JsonElement value(int depth) {
        if (depth > DEEPEST) {
            throw unexpected();
        }
        blanks();
        char c = peek();
        if (c == '{') {
            return object(depth + 1);
        }
        if (c == '[') {
            return array(depth + 1);
        }
        if (c == '\'' || c == '"') {
            return new JsonPrimitive(quoted());
        }
        String word = word();
        return switch (word) {
            case "true" -> new JsonPrimitive(true);
            case "false" -> new JsonPrimitive(false);
            case "null", "NaN", "undefined", "Infinity", "-Infinity" -> JsonNull.INSTANCE;
            default -> number(word);
        };
    }

    private JsonElement number(String word) {
        try {
            double value = Double.parseDouble(word);
            return value == Math.rint(value) && Math.abs(value) < 1e15
                    ? new JsonPrimitive((long) value)
                    : new JsonPrimitive(value);
        } catch (NumberFormatException e) {
            throw unexpected();
        }
    }

    private JsonObject object(int depth) {
        JsonObject object = new JsonObject();
        expect('{');
        while (!ended('}')) {
            char c = peek();
            String key = c == '\'' || c == '"' ? quoted() : word();
            blanks();
            expect(':');
            JsonElement value = value(depth);
            if (!REFUSED_KEYS.contains(key)) {
                object.add(key, value);
            }
            comma('}');
        }
        return object;
    }

    private JsonArray array(int depth) {
        JsonArray array = new JsonArray();
        expect('[');
        while (!ended(']')) {
            array.add(value(depth));
            comma(']');
        }
        return array;
    }

    private boolean ended(char close) {
        blanks();
        if (peek() == close) {
            at++;
            return true;
        }
        return false;
    }

    /** Between entries stands a comma; a last one before the end may be left out or stay. */
    private void comma(char close) {
        blanks();
        if (peek() != close) {
            expect(',');
        }
    }

    private String quoted() {
        char quote = text.charAt(at++);
        StringBuilder out = new StringBuilder();
        while (peek() != quote) {
            char c = text.charAt(at++);
            if (c != '\\') {
                out.append(c);
                continue;
            }
            char escaped = peek();
            at++;
            switch (escaped) {
                case 'n' -> out.append('\n');
                case 't' -> out.append('\t');
                case 'r' -> out.append('\r');
                case 'b' -> out.append('\b');
                case 'f' -> out.append('\f');
                case 'u' -> out.append(unicode());
                default -> out.append(escaped);
            }
        }
        at++;
        return out.toString();
    }

    private char unicode() {
        try {
            char c = (char) Integer.parseInt(text.substring(at, at + 4), 16);
            at += 4;
            return c;
        } catch (IndexOutOfBoundsException | NumberFormatException e) {
            throw unexpected();
        }
    }

    private String word() {
        int start = at;
        while (at < text.length()
                && (Character.isLetterOrDigit(text.charAt(at)) || "_$+-.".indexOf(text.charAt(at)) >= 0)) {
            at++;
        }
        if (start == at) {
            throw unexpected();
        }
        return text.substring(start, at);
    }

    private void blanks() {
        while (at < text.length() && Character.isWhitespace(text.charAt(at))) {
            at++;
        }
    }

    private char peek() {
        if (at >= text.length()) {
            throw unexpected();
        }
        return text.charAt(at);
    }

    private void expect(char c) {
        if (peek() != c) {
            throw unexpected();
        }
        at++;
    }

    private IllegalArgumentException unexpected() {
        String found = at < text.length() ? "'" + text.charAt(at) + "'" : "the end";
        return new IllegalArgumentException("expected an object literal; found " + found + " at character " + at);
    }
}
