package ladderwell.kernel.notebook;

import java.util.regex.Matcher;
import java.util.regex.Pattern;
import ladderwell.kernel.cell.CellText;

/** Code as HTML with the few colours that help reading: comments, strings, numbers, words of Java, nouns of sentences. */
final class Highlight {
    private static final Pattern JAVA = Pattern.compile("(?<comment>//[^\\n]*|/\\*(?s:.*?)(?:\\*/|\\z))"
            + "|(?<string>\"\"\"(?s:.*?)(?:\"\"\"|\\z)|\"[^\"\\\\\\n]*+(?:\\\\.[^\"\\\\\\n]*+){0,400}\"?"
            + "|'[^'\\\\\\n]*+(?:\\\\.[^'\\\\\\n]*+){0,4}'?)"
            + "|(?<number>(?<![\\w.])\\d[\\w.]*)"
            + "|(?<word>\\b(?:abstract|assert|boolean|break|byte|case|catch|char|class|continue|default|do|double|else"
            + "|enum|extends|final|finally|float|for|if|implements|import|instanceof|int|interface|long|native|new"
            + "|package|permits|private|protected|public|record|return|sealed|short|static|strictfp|super|switch"
            + "|synchronized|this|throw|throws|transient|try|var|void|volatile|while|yield|true|false|null)\\b)");

    private static final Pattern SENTENCE = Pattern.compile("(?<comment>#[^\\n]*)"
            + "|(?<string>\"[^\"\\n]*\"?|\\{[^}\\n]*}?)"
            + "|(?<number>(?<![\\w.])-?\\d[\\d.]*(?:[eE][-+]?\\d+)?)"
            + "|(?<word>(?m:^[ \\t]*%{0,2}\\p{L}+))");

    private static final String[] KINDS = {"comment", "string", "number", "word"};

    private Highlight() {}

    /** A cell, its sentences and its Java each in their own way. */
    static String html(String cell) {
        StringBuilder html = new StringBuilder();
        int at = 0;
        for (CellText.Part part : CellText.of(cell).parts()) {
            html.append(Html.escaped(cell.substring(at, part.start())));
            mark(html, part.text(), part.sentences() ? SENTENCE : JAVA);
            at = part.start() + part.text().length();
        }
        return html.append(Html.escaped(cell.substring(at))).toString();
    }

    private static void mark(StringBuilder html, String text, Pattern pattern) {
        Matcher token = pattern.matcher(text);
        int at = 0;
        while (token.find()) {
            html.append(Html.escaped(text.substring(at, token.start())));
            for (String kind : KINDS) {
                if (token.group(kind) != null) {
                    html.append("<span class=\"").append(kind).append("\">");
                }
            }
            html.append(Html.escaped(token.group())).append("</span>");
            at = token.end();
        }
        html.append(Html.escaped(text.substring(at)));
    }
}
