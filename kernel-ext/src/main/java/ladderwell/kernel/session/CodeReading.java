package ladderwell.kernel.session;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import javax.lang.model.SourceVersion;
import jdk.jshell.JShell;
import jdk.jshell.Snippet;
import jdk.jshell.SourceCodeAnalysis;
import jdk.jshell.SourceCodeAnalysis.Completeness;
import jdk.jshell.SourceCodeAnalysis.Documentation;
import ladderwell.kernel.session.Pieces.Piece;

/** What can be said of Java text without running it. */
final class CodeReading {
    private final SourceCodeAnalysis analysis;

    CodeReading(JShell shell) {
        analysis = shell.sourceCodeAnalysis();
    }

    Optional<Boolean> parses(String text) {
        for (Piece piece : Pieces.of(text, analysis)) {
            if (piece.completeness() == Completeness.UNKNOWN) {
                return Optional.of(false);
            }
            if (piece.doubtful()) {
                return Optional.empty();
            }
        }
        return Optional.of(true);
    }

    Suggestions suggestions(String text, int cursor, List<String> variables) {
        Snippets typed = Snippets.before(text.substring(0, cursor), analysis);
        Suggestions found = suggestions(typed.context + typed.last, typed.context.length(), typed.start, variables);
        if (found.list().isEmpty() && !typed.context.isEmpty()) {
            return suggestions(typed.last, 0, typed.start, variables);
        }
        return found;
    }

    private Suggestions suggestions(String code, int contextLength, int start, List<String> variables) {
        int[] anchor = {code.length()};
        Map<String, Boolean> fitting = new LinkedHashMap<>();
        for (SourceCodeAnalysis.Suggestion found : analysis.completionSuggestions(code, code.length(), anchor)) {
            fitting.merge(found.continuation(), found.matchesType(), Boolean::logicalOr);
        }
        boolean inImport = code.startsWith("import");
        List<Suggestion> list = fitting.entrySet().stream()
                .sorted(Map.Entry.<String, Boolean>comparingByValue(Comparator.reverseOrder())
                        .thenComparing(Map.Entry.comparingByKey()))
                .map(entry -> new Suggestion(entry.getKey(), kind(entry.getKey(), variables, inImport)))
                .toList();
        return new Suggestions(Math.max(0, anchor[0] - contextLength) + start, list);
    }

    /** JShell does not say what a continuation is; its spelling does, as far as Java's habits are kept. */
    private static String kind(String text, List<String> variables, boolean inImport) {
        if (text.endsWith("(") || text.endsWith("()")) {
            return "function";
        }
        if (SourceVersion.isKeyword(text.strip())) {
            return "keyword";
        }
        if (!variables.contains(text) && Character.isUpperCase(text.codePointAt(0))) {
            return text.length() > 1 && text.equals(text.toUpperCase(java.util.Locale.ROOT)) ? "instance" : "class";
        }
        return inImport || text.endsWith(".") ? "module" : "instance";
    }

    List<String> documentation(String text, int cursor, boolean full) {
        int end = cursor;
        while (end < text.length() && Character.isJavaIdentifierPart(text.charAt(end))) {
            end++;
        }
        boolean call = end < text.length() && text.charAt(end) == '(';
        Snippets typed = Snippets.before(text.substring(0, call ? end + 1 : end), analysis);
        for (String context : typed.context.isEmpty() ? List.of("") : List.of(typed.context, "")) {
            for (String tail : call ? List.of("") : List.of("", "(")) {
                String code = context + typed.last + tail;
                List<String> found = new ArrayList<>();
                for (Documentation about : analysis.documentation(code, code.length(), full)) {
                    String javadoc = full && about.javadoc() != null ? "\n" + plain(about.javadoc()) : "";
                    found.add(about.signature() + javadoc);
                }
                if (!found.isEmpty()) {
                    return found.stream().distinct().toList();
                }
            }
        }
        return List.of();
    }

    /** Javadoc's HTML and tags as plain lines. */
    private static String plain(String javadoc) {
        return javadoc.replaceAll("\\{@(?:code|literal|link|linkplain|value)\\s+#?([^{}]*)}", "$1")
                .replaceAll("(?i)<(p|br|li|pre|/ul|/pre)>\\s*", "\n")
                .replaceAll("<[^>]+>", "")
                .replace("&lt;", "<")
                .replace("&gt;", ">")
                .replace("&nbsp;", " ")
                .replace("&amp;", "&")
                .replaceAll("(?m)^[ \\t]+", "")
                .replaceAll("\n{3,}", "\n\n")
                .strip();
    }

    /**
     * Code up to a cursor: the snippet being typed, and the earlier ones of the same cell as a block around it, so that
     * variables which the cell defines above are known before it has run. Imports and methods cannot stand in a block
     * and are left out.
     */
    private record Snippets(String context, String last, int start) {
        static Snippets before(String head, SourceCodeAnalysis analysis) {
            List<Piece> pieces = Pieces.of(head, analysis);
            int start = head.length();
            if (!pieces.isEmpty()) {
                Piece last = pieces.get(pieces.size() - 1);
                if (last.doubtful() || (last.openEnded() && !last.source().endsWith("}"))) {
                    start = last.start();
                    pieces = pieces.subList(0, pieces.size() - 1);
                }
            }
            StringBuilder context = new StringBuilder();
            for (Piece piece : pieces) {
                boolean inBlock = analysis.sourceToSnippets(piece.source()).stream()
                        .noneMatch(snippet -> snippet.kind() == Snippet.Kind.IMPORT
                                || snippet.kind() == Snippet.Kind.METHOD
                                || snippet.kind() == Snippet.Kind.ERRONEOUS);
                if (inBlock) {
                    context.append(piece.source()).append('\n');
                }
            }
            String last = head.substring(start);
            boolean outside = context.length() == 0 || last.startsWith("import");
            return new Snippets(outside ? "" : "{\n" + context, last, start);
        }
    }
}
