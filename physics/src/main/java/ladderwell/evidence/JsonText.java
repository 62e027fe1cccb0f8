package ladderwell.evidence;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** A strict reader of JSON (RFC 8259) for records: no null, no key twice, numbers within the range of doubles. */
final class JsonText {

    private static final Pattern NUMBER = Pattern.compile("-?(0|[1-9][0-9]*)(\\.[0-9]+)?([eE][+-]?[0-9]+)?");
    private static final int DEEPEST = 100;

    private final String json;
    private int at;

    JsonText(String json) {
        this.json = json;
    }

    Object tree() {
        Object tree = value(0);
        space();
        if (at < json.length()) {
            throw wrong("the end of the text");
        }
        return tree;
    }

    private Object value(int depth) {
        if (depth > DEEPEST) {
            throw wrong("at most " + DEEPEST + " nested levels");
        }
        space();
        char c = peek();
        if (c == '{') {
            return object(depth);
        }
        if (c == '[') {
            return array(depth);
        }
        if (c == '"') {
            return string();
        }
        if (json.startsWith("true", at)) {
            at += 4;
            return true;
        }
        if (json.startsWith("false", at)) {
            at += 5;
            return false;
        }
        return number();
    }

    private Map<String, Object> object(int depth) {
        Map<String, Object> entries = new TreeMap<>();
        take('{');
        space();
        while (peek() != '}') {
            if (!entries.isEmpty()) {
                take(',');
                space();
            }
            int start = at;
            String key = string();
            space();
            take(':');
            if (entries.put(key, value(depth + 1)) != null) {
                at = start;
                throw wrong("each key once, not '" + key + "' again");
            }
            space();
        }
        take('}');
        return Map.copyOf(entries);
    }

    private List<Object> array(int depth) {
        List<Object> items = new ArrayList<>();
        take('[');
        space();
        while (peek() != ']') {
            if (!items.isEmpty()) {
                take(',');
            }
            items.add(value(depth + 1));
            space();
        }
        take(']');
        return List.copyOf(items);
    }

    private String string() {
        StringBuilder text = new StringBuilder();
        int start = at;
        take('"');
        while (peek() != '"') {
            char c = peek();
            at++;
            if (c < ' ') {
                at--;
                throw wrong("no control character in a text");
            }
            text.append(c == '\\' ? escaped() : c);
        }
        take('"');
        return CanonicalJson.text("character " + start, text.toString());
    }

    private char escaped() {
        char c = peek();
        at++;
        return switch (c) {
            case '"', '\\', '/' -> c;
            case 'b' -> '\b';
            case 'f' -> '\f';
            case 'n' -> '\n';
            case 'r' -> '\r';
            case 't' -> '\t';
            case 'u' -> {
                int code = 0;
                for (int i = 0; i < 4; i++) {
                    int digit = peek() < 128 ? Character.digit(peek(), 16) : -1;
                    if (digit < 0) {
                        throw wrong("four hexadecimal digits");
                    }
                    code = 16 * code + digit;
                    at++;
                }
                yield (char) code;
            }
            default -> {
                at--;
                throw wrong("one of the escapes \\\" \\\\ \\/ \\b \\f \\n \\r \\t \\u");
            }
        };
    }

    private Double number() {
        Matcher matcher = NUMBER.matcher(json).region(at, json.length());
        if (!matcher.lookingAt()) {
            throw wrong("an object, an array, a text, a number, true or false");
        }
        double number = Double.parseDouble(matcher.group());
        if (Double.isInfinite(number)) {
            throw wrong("a number within the range of doubles");
        }
        at = matcher.end();
        return number;
    }

    private void space() {
        while (at < json.length() && " \t\n\r".indexOf(json.charAt(at)) >= 0) {
            at++;
        }
    }

    private char peek() {
        if (at >= json.length()) {
            throw wrong("more text");
        }
        return json.charAt(at);
    }

    private void take(char c) {
        if (peek() != c) {
            throw wrong("'" + c + "'");
        }
        at++;
    }

    private IllegalArgumentException wrong(String expected) {
        String found =
                at < json.length() ? "'" + json.substring(at, Math.min(json.length(), at + 12)) + "'" : "the end";
        return new IllegalArgumentException("JSON at character " + at + ": found " + found + ", expected " + expected);
    }
}
