package ladderwell.evidence;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import ladderwell.quantity.Quantity;
import org.erdtman.jcs.NumberToJSON;
import org.jspecify.annotations.Nullable;

/**
 * Trees of texts, Doubles, Booleans, lists and maps, and their canonical text.
 *
 * <p>Writing follows RFC 8785: keys in the order of their UTF-16 units, no white space, shortest escapes, numbers as
 * ECMAScript writes them. Double.toString would not do: before Java 19 it sometimes writes a digit too many.
 */
final class CanonicalJson {

    /** Above this a whole number would not survive as a double. */
    private static final long LARGEST_WHOLE = 1L << 53;

    private CanonicalJson() {}

    /** An unmodifiable tree of a value, checked; the path says in messages where the value stands. */
    static Object freeze(String path, @Nullable Object value) {
        if (value instanceof String text) {
            return text(path, text);
        }
        if (value instanceof Boolean) {
            return value;
        }
        if (value instanceof Long || value instanceof Integer || value instanceof Short || value instanceof Byte) {
            long whole = ((Number) value).longValue();
            if (whole > LARGEST_WHOLE || whole < -LARGEST_WHOLE) {
                throw new IllegalArgumentException(
                        "'" + path + "' is " + whole + "; a record holds whole numbers up to 2^53, give it as a text");
            }
            return (double) whole;
        }
        if (value instanceof Double || value instanceof Float) {
            double number = ((Number) value).doubleValue();
            if (!Double.isFinite(number)) {
                throw new IllegalArgumentException(
                        "'" + path + "' is " + number + "; a record holds finite numbers only");
            }
            return number;
        }
        if (value instanceof Quantity quantity) {
            return Map.of("value", quantity.value(), "unit", quantity.unit().plain());
        }
        if (value instanceof Bound bound) {
            return Map.of("kind", bound.kind().letter(), "size", bound.isKnown() ? (Object) bound.size() : "unknown");
        }
        if (value instanceof Tolerance tolerance) {
            return Map.of(
                    "kind", tolerance.measure().word(),
                    "name", text(path + ".name", tolerance.name()),
                    "unit", tolerance.unit().plain(),
                    "value", tolerance.value());
        }
        if (value instanceof List<?> list) {
            List<Object> items = new ArrayList<>();
            for (Object item : list) {
                items.add(freeze(path + "[" + items.size() + "]", item));
            }
            return List.copyOf(items);
        }
        if (value instanceof Map<?, ?> map) {
            Map<String, Object> entries = new TreeMap<>();
            map.forEach((key, item) -> {
                if (!(key instanceof String name)) {
                    throw new IllegalArgumentException("'" + path + "' has the key " + key + "; keys are texts");
                }
                entries.put(text(path, name), freeze(path + "." + name, item));
            });
            return Map.copyOf(entries);
        }
        throw new IllegalArgumentException("'" + path + "' is "
                + (value == null ? "null" : "a " + value.getClass().getSimpleName())
                + "; a record holds texts, booleans, numbers, quantities, bounds, tolerances, lists and maps");
    }

    /** Refuses a text that has no UTF-8 form. */
    static String text(String path, String text) {
        for (int i = 0; i < text.length(); i++) {
            char c = text.charAt(i);
            if (Character.isHighSurrogate(c) && i + 1 < text.length() && Character.isLowSurrogate(text.charAt(i + 1))) {
                i++;
            } else if (Character.isSurrogate(c)) {
                throw new IllegalArgumentException("'" + path + "' holds half a surrogate pair, which no text has");
            }
        }
        return text;
    }

    static String write(Object tree) {
        StringBuilder out = new StringBuilder();
        write(tree, out);
        return out.toString();
    }

    private static void write(Object tree, StringBuilder out) {
        if (tree instanceof String text) {
            quote(text, out);
        } else if (tree instanceof Double number) {
            out.append(number(number));
        } else if (tree instanceof Boolean) {
            out.append(tree);
        } else if (tree instanceof List<?> list) {
            out.append('[');
            String between = "";
            for (Object item : list) {
                out.append(between);
                write(item, out);
                between = ",";
            }
            out.append(']');
        } else if (tree instanceof Map<?, ?> map) {
            out.append('{');
            String between = "";
            for (Map.Entry<?, ?> entry : new TreeMap<>(map).entrySet()) {
                out.append(between);
                quote((String) entry.getKey(), out);
                out.append(':');
                write(entry.getValue(), out);
                between = ",";
            }
            out.append('}');
        } else {
            throw new IllegalStateException("not part of a frozen tree: " + tree.getClass());
        }
    }

    private static String number(double value) {
        try {
            return NumberToJSON.serializeNumber(value);
        } catch (IOException e) {
            throw new UncheckedIOException("not a finite number: " + value, e);
        }
    }

    private static void quote(String text, StringBuilder out) {
        out.append('"');
        for (int i = 0; i < text.length(); i++) {
            char c = text.charAt(i);
            switch (c) {
                case '"' -> out.append("\\\"");
                case '\\' -> out.append("\\\\");
                case '\b' -> out.append("\\b");
                case '\t' -> out.append("\\t");
                case '\n' -> out.append("\\n");
                case '\f' -> out.append("\\f");
                case '\r' -> out.append("\\r");
                default -> {
                    if (c < ' ') {
                        out.append("\\u00")
                                .append(Character.forDigit(c >> 4, 16))
                                .append(Character.forDigit(c & 15, 16));
                    } else {
                        out.append(c);
                    }
                }
            }
        }
        out.append('"');
    }

    /** Reads JSON (RFC 8259) strictly: no null, no key twice, numbers within the range of doubles. */
    static Object read(String json) {
        return new JsonText(json).tree();
    }
}
