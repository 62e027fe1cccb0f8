package ladderwell.kernel.picture;

import com.google.gson.Gson;
import com.google.gson.GsonBuilder;
import com.google.gson.JsonElement;

/** Text made safe for the place where it is put: HTML or SVG, a script, the text of a plot. */
public final class Markup {
    // Escaping is done below, for exactly the characters that matter inside a script.
    private static final Gson SAFE_JSON =
            new GsonBuilder().disableHtmlEscaping().create();

    private Markup() {}

    /** Text as it stands inside an element or a quoted attribute of HTML or SVG. Characters that XML forbids become �. */
    public static String text(String text) {
        StringBuilder out = new StringBuilder(text.length() + 16);
        text.codePoints().forEach(c -> {
            switch (c) {
                case '&' -> out.append("&amp;");
                case '<' -> out.append("&lt;");
                case '>' -> out.append("&gt;");
                case '"' -> out.append("&quot;");
                case '\'' -> out.append("&#39;");
                default -> out.appendCodePoint(allowed(c) ? c : 0xFFFD);
            }
        });
        return out.toString();
    }

    private static boolean allowed(int c) {
        return c == '\t'
                || c == '\n'
                || (c >= 0x20
                        && !(c >= 0x7F && c < 0xA0)
                        && !(c >= 0xD800 && c < 0xE000)
                        && c != 0xFFFE
                        && c != 0xFFFF);
    }

    /** Data inside a script element: JSON in which nothing can end the script or open a comment. */
    static String script(JsonElement data) {
        String json = SAFE_JSON.toJson(data);
        StringBuilder out = new StringBuilder(json.length() + 64);
        for (int i = 0; i < json.length(); i++) {
            char c = json.charAt(i);
            if (c == '<' || c == '>' || c == '&' || c == '\u2028' || c == '\u2029') {
                out.append(String.format("\\u%04x", (int) c));
            } else {
                out.append(c);
            }
        }
        return out.toString();
    }

    /** Text of an axis title or label: the plotting library reads a few tags there, so none may be left. */
    static String plot(String text) {
        return text.replace("&", "&amp;").replace("<", "&lt;").replace(">", "&gt;");
    }
}
