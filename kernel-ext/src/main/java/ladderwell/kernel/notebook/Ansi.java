package ladderwell.kernel.notebook;

import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** Text for a terminal: escape sequences taken out, or colours and weight turned into HTML. */
final class Ansi {
    private static final Pattern SEQUENCE =
            Pattern.compile("\u001b(?:\\[([0-9;?]*)[ -/]*([@-~])|\\][^\u0007\u001b]*(?:\u0007|\u001b\\\\)?|[@-Z^_])");

    private static final String[] COLOURS = {"black", "red", "green", "yellow", "blue", "magenta", "cyan", "white"};

    private Ansi() {}

    /** The text without any sequence. */
    static String plain(String text) {
        return SEQUENCE.matcher(text).replaceAll("");
    }

    /** The text as HTML: foreground colours and bold as spans, everything else of a terminal dropped. */
    static String html(String text) {
        StringBuilder html = new StringBuilder();
        String colour = "";
        boolean bold = false;
        Matcher sequence = SEQUENCE.matcher(text);
        int at = 0;
        while (sequence.find()) {
            span(html, text.substring(at, sequence.start()), colour, bold);
            at = sequence.end();
            if ("m".equals(sequence.group(2))) {
                for (String code : sequence.group(1).split(";", -1)) {
                    int number = code.isEmpty() ? 0 : code.length() > 3 || code.startsWith("?") ? -1 : number(code);
                    if (number == 0) {
                        colour = "";
                        bold = false;
                    } else if (number == 1) {
                        bold = true;
                    } else if (number == 22) {
                        bold = false;
                    } else if (number == 38 || number == 48) {
                        // What follows are parts of a colour of many, not codes.
                        break;
                    } else if (number == 39) {
                        colour = "";
                    } else if (number >= 30 && number < 38) {
                        colour = COLOURS[number - 30];
                    } else if (number >= 90 && number < 98) {
                        colour = COLOURS[number - 90];
                    }
                }
            }
        }
        span(html, text.substring(at), colour, bold);
        return html.toString();
    }

    private static int number(String digits) {
        try {
            return Integer.parseInt(digits);
        } catch (NumberFormatException e) {
            return -1;
        }
    }

    private static void span(StringBuilder html, String text, String colour, boolean bold) {
        if (text.isEmpty()) {
            return;
        }
        if (colour.isEmpty() && !bold) {
            html.append(Html.escaped(text));
            return;
        }
        String classes = (colour.isEmpty() ? "" : "ansi-" + colour) + (bold ? " ansi-bold" : "");
        html.append("<span class=\"")
                .append(classes.strip())
                .append("\">")
                .append(Html.escaped(text))
                .append("</span>");
    }
}
