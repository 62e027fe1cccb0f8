package ladderwell.kernel.notebook;

import com.google.gson.JsonArray;
import com.google.gson.JsonElement;
import com.google.gson.JsonObject;
import com.google.gson.JsonPrimitive;
import java.util.Comparator;
import java.util.Iterator;
import java.util.List;
import java.util.function.Consumer;

/**
 * Prints JSON byte for byte as Jupyter writes notebooks: keys in the order of their code points, one blank of indent,
 * characters outside ASCII as they are. (Gson's writer escapes some of those and keeps the order of the input.)
 */
final class JsonPrinter {
    private static final Comparator<String> BY_CODE_POINTS = JsonPrinter::compareCodePoints;

    private final StringBuilder out = new StringBuilder();

    private JsonPrinter() {}

    static String print(JsonElement element) {
        JsonPrinter printer = new JsonPrinter();
        printer.print(element, 0);
        return printer.out.append('\n').toString();
    }

    private void print(JsonElement element, int depth) {
        if (element instanceof JsonObject object) {
            List<String> keys = object.keySet().stream().sorted(BY_CODE_POINTS).toList();
            printList(keys.iterator(), '{', '}', depth, key -> {
                string(key);
                out.append(": ");
                print(object.get(key), depth + 1);
            });
        } else if (element instanceof JsonArray array) {
            printList(array.iterator(), '[', ']', depth, item -> print(item, depth + 1));
        } else if (element instanceof JsonPrimitive primitive && primitive.isString()) {
            string(primitive.getAsString());
        } else if (element instanceof JsonPrimitive primitive
                && primitive.isNumber()
                && primitive.getAsNumber() instanceof Double number) {
            out.append(NumberText.of(number));
        } else {
            // A number that was read keeps the digits it was written with.
            out.append(element.isJsonNull() ? "null" : element.getAsString());
        }
    }

    private <T> void printList(Iterator<T> items, char open, char close, int depth, Consumer<T> printItem) {
        out.append(open);
        if (items.hasNext()) {
            while (items.hasNext()) {
                newLine(depth + 1);
                printItem.accept(items.next());
                if (items.hasNext()) {
                    out.append(',');
                }
            }
            newLine(depth);
        }
        out.append(close);
    }

    private void newLine(int depth) {
        out.append('\n').append(" ".repeat(depth));
    }

    private void string(String text) {
        out.append('"');
        for (int i = 0; i < text.length(); i++) {
            char c = text.charAt(i);
            switch (c) {
                case '"' -> out.append("\\\"");
                case '\\' -> out.append("\\\\");
                case '\n' -> out.append("\\n");
                case '\r' -> out.append("\\r");
                case '\t' -> out.append("\\t");
                case '\b' -> out.append("\\b");
                case '\f' -> out.append("\\f");
                default -> {
                    if (c < ' ' || isLoneSurrogate(text, i)) {
                        out.append(String.format("\\u%04x", (int) c));
                    } else {
                        out.append(c);
                    }
                }
            }
        }
        out.append('"');
    }

    /** Half a character has no UTF-8 form; only its escape survives in a file. */
    private static boolean isLoneSurrogate(String text, int i) {
        char c = text.charAt(i);
        if (Character.isHighSurrogate(c)) {
            return i + 1 == text.length() || !Character.isLowSurrogate(text.charAt(i + 1));
        }
        return Character.isLowSurrogate(c) && (i == 0 || !Character.isHighSurrogate(text.charAt(i - 1)));
    }

    private static int compareCodePoints(String a, String b) {
        int common = Math.min(a.length(), b.length());
        for (int i = 0; i < common; i++) {
            char ca = a.charAt(i);
            char cb = b.charAt(i);
            if (ca != cb) {
                // Surrogates stand for code points above every other char.
                boolean sa = Character.isSurrogate(ca);
                boolean sb = Character.isSurrogate(cb);
                return sa == sb ? Character.compare(ca, cb) : sa ? 1 : -1;
            }
        }
        return Integer.compare(a.length(), b.length());
    }
}
