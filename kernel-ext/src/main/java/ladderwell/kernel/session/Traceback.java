package ladderwell.kernel.session;

import java.util.ArrayList;
import java.util.Collection;
import java.util.List;
import java.util.Locale;
import jdk.jshell.Diag;
import jdk.jshell.EvalException;
import jdk.jshell.JShellException;

/** What the user reads when Java refuses a text or a text throws. */
final class Traceback {
    private static final String RED = "\u001b[31m";
    private static final String BOLD = "\u001b[1m";
    private static final String PLAIN = "\u001b[0m";

    /** Frames printed of one exception: enough to see a recursion, not so many as to bury the message. */
    private static final int FIRST_FRAMES = 12;

    private static final int LAST_FRAMES = 4;

    private Traceback() {}

    /** Names the place of a line of a cell; the number 0 stands for an expression outside all cells. */
    static String place(int cell, int line) {
        return cell == 0 ? "the expression" : "cell [" + cell + "], line " + line;
    }

    static String headline(String name, String message) {
        return RED + BOLD + name + PLAIN + (message.isEmpty() ? "" : ": " + message);
    }

    static JavaEnd.Failed of(EvalException e) {
        List<String> lines = new ArrayList<>();
        lines.add(headline(e.getExceptionClassName(), text(e)));
        addFrames(e, lines);
        Throwable cause = e.getCause();
        for (int depth = 0; cause != null && depth < 8; depth++, cause = cause.getCause()) {
            String name = cause instanceof EvalException thrown
                    ? thrown.getExceptionClassName()
                    : cause.getClass().getName();
            lines.add("Caused by: " + name + (text(cause).isEmpty() ? "" : ": " + text(cause)));
            addFrames(cause, lines);
        }
        return new JavaEnd.Failed(e.getExceptionClassName(), text(e), lines);
    }

    static JavaEnd.Failed unresolved(JShellException e, String message) {
        List<String> lines = new ArrayList<>();
        lines.add(headline("CompilationError", message));
        addFrames(e, lines);
        return new JavaEnd.Failed("CompilationError", message, lines);
    }

    private static String text(Throwable e) {
        String message = e.getMessage();
        return message == null ? "" : message;
    }

    private static void addFrames(Throwable e, List<String> lines) {
        List<String> frames = new ArrayList<>();
        for (StackTraceElement frame : e.getStackTrace()) {
            if (frame.getClassName().startsWith("ladderwell.kernel.session.")
                    || frame.getClassName().startsWith("jdk.jshell.")) {
                break;
            }
            frames.add("    at " + describe(frame));
        }
        // Reflection calls the cell; nothing of it concerns the user.
        while (!frames.isEmpty() && isReflection(frames.get(frames.size() - 1))) {
            frames.remove(frames.size() - 1);
        }
        int hidden = frames.size() - FIRST_FRAMES - LAST_FRAMES;
        if (hidden <= 1) {
            lines.addAll(frames);
            return;
        }
        lines.addAll(frames.subList(0, FIRST_FRAMES));
        lines.add("    … " + hidden + " more");
        lines.addAll(frames.subList(frames.size() - LAST_FRAMES, frames.size()));
    }

    private static boolean isReflection(String line) {
        return line.contains("java.lang.reflect.") || line.contains("jdk.internal.reflect.");
    }

    private static String describe(StackTraceElement frame) {
        String file = frame.getFileName();
        if (file == null || !file.startsWith("#")) {
            return frame.toString();
        }
        SnippetId id = SnippetId.parse(file.substring(1));
        String place = place(id.cell(), id.line() + frame.getLineNumber() - 1);
        String method = frame.getMethodName().startsWith("lambda$do_it") ? "" : frame.getMethodName();
        String owner = frame.getClassName().isEmpty() || frame.getClassName().startsWith("REPL.")
                ? ""
                : frame.getClassName() + ".";
        return method.isEmpty() ? place : owner + method + " (" + place + ")";
    }

    /**
     * The compiler's complaints about a snippet.
     *
     * @param text the text that the snippet is in
     * @param offset where the snippet begins in the text
     * @param cell the number of the cell
     * @param firstLine the line of the cell at which the text begins
     */
    static JavaEnd.Failed refused(Collection<Diag> problems, String text, int offset, int cell, int firstLine) {
        List<String> lines = new ArrayList<>();
        String first = "";
        for (Diag problem : problems) {
            if (!problem.isError()) {
                continue;
            }
            String message = oneLine(problem.getMessage(Locale.ROOT));
            int at = (int) Math.min(text.length(), offset + Math.max(0, problem.getPosition()));
            int start = (int) Math.min(text.length(), offset + Math.max(0, problem.getStartPosition()));
            int end = (int) Math.min(text.length(), offset + Math.max(0, problem.getEndPosition()));
            int from = text.lastIndexOf('\n', at - 1) + 1;
            int to = text.indexOf('\n', at) < 0 ? text.length() : text.indexOf('\n', at);
            int line = firstLine
                    + (int) text.substring(0, from)
                            .chars()
                            .filter(c -> c == '\n')
                            .count();
            first = first.isEmpty() ? message : first;
            lines.add(headline(place(cell, line), message));
            lines.add("    " + text.substring(from, to));
            int left = Math.max(from, Math.min(start, at));
            int right = Math.max(left + 1, Math.min(to, end));
            lines.add("    " + blanksLike(text.substring(from, left)) + RED + "^".repeat(right - left) + PLAIN);
        }
        if (lines.isEmpty()) {
            first = "Java cannot make sense of this";
            lines.add(headline(place(cell, firstLine), first));
        }
        return new JavaEnd.Failed("CompilationError", first, lines);
    }

    /** The compiler speaks in several lines, one of which names a class that the user never wrote. */
    private static String oneLine(String message) {
        return message.strip()
                .replaceAll("\\s*\\R\\s*location: class\\s*$", "")
                .replaceAll("\\s*\\R\\s*symbol:\\s*", ": ")
                .replaceAll("\\s*\\R\\s*", "; ");
    }

    private static String blanksLike(String text) {
        return text.replaceAll("[^\t]", " ");
    }
}
