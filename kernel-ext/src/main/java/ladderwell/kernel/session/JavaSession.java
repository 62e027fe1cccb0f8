package ladderwell.kernel.session;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Collectors;
import jdk.jshell.DeclarationSnippet;
import jdk.jshell.EvalException;
import jdk.jshell.JShell;
import jdk.jshell.JShellException;
import jdk.jshell.Snippet;
import jdk.jshell.Snippet.Status;
import jdk.jshell.SnippetEvent;
import jdk.jshell.SourceCodeAnalysis;
import jdk.jshell.SourceCodeAnalysis.Completeness;
import jdk.jshell.UnresolvedReferenceException;
import jdk.jshell.execution.LocalExecutionControl;
import jdk.jshell.spi.ExecutionControl;
import jdk.jshell.spi.ExecutionControlProvider;
import jdk.jshell.spi.ExecutionEnv;
import ladderwell.kernel.session.Pieces.Piece;

/**
 * A session of Java snippets in this process. Texts run one at a time; {@link #stop} comes from any thread. Starting one
 * takes a good part of a second, so start it in the background.
 */
public final class JavaSession implements AutoCloseable {
    private static final String CALL = "{ladderwell.kernel.session.Result.of(";
    /** On a line of its own, behind whatever remark ends the expression. */
    private static final String CALL_END = "\n);}";

    private final SnippetControl control = new SnippetControl();
    private final JShell shell;
    private final Variables variables;
    private final CodeReading reading;
    private final Imports imports;
    private SnippetId place = new SnippetId(0, 1, 0);

    /**
     * Starts a session.
     *
     * @param imports what is imported from the start, as {@code java.util.*} or {@code static java.lang.Math.*};
     *     packages that do not exist are passed over
     * @throws IllegalStateException when this Java has no JShell
     */
    public JavaSession(List<String> imports) {
        shell = JShell.builder()
                .executionEngine(new InProcess(control), Map.of())
                .idGenerator((snippet, index) -> nextId())
                .build();
        variables = new Variables(shell, control);
        reading = new CodeReading(shell);
        this.imports = new Imports(imports);
        // The compiler's own start takes most of a session's start.
        shell.eval(CALL + "0" + CALL_END);
        control.forget();
    }

    private void bringIn(List<String> names) {
        place = new SnippetId(0, 1, place.count());
        for (String name : names) {
            shell.eval("import " + name + ";");
        }
    }

    private record InProcess(LocalExecutionControl control) implements ExecutionControlProvider {
        @Override
        public String name() {
            return "ladderwell";
        }

        @Override
        public ExecutionControl generate(ExecutionEnv env, Map<String, String> parameters) {
            return control;
        }
    }

    private String nextId() {
        place = new SnippetId(place.cell(), place.line(), place.count() + 1);
        return place.toString();
    }

    /**
     * Runs a text snippet by snippet until one fails. A text that does not parse is refused as a whole before anything
     * runs.
     *
     * @param text Java
     * @param cell the number of the cell, for tracebacks; 0 for an expression outside all cells
     * @param firstLine the line of the cell at which the text begins
     */
    public synchronized JavaEnd run(String text, int cell, int firstLine) {
        bringIn(imports.neededBy(text));
        SourceCodeAnalysis analysis = shell.sourceCodeAnalysis();
        List<Piece> pieces = Pieces.of(text, analysis);
        for (Piece piece : pieces) {
            if (piece.doubtful() && pieces.size() > 1 && isErroneous(piece, analysis)) {
                pieces = List.of(piece);
                break;
            }
        }
        if (pieces.isEmpty()) {
            return new JavaEnd.Done(Optional.empty(), false);
        }
        List<Snippet> defined = new ArrayList<>();
        boolean gaveValue = false;
        Optional<Object> value = Optional.empty();
        for (int i = 0; i < pieces.size(); i++) {
            Piece piece = pieces.get(i);
            if (i == pieces.size() - 1 && isVariable(piece)) {
                value = variables.find(name(piece)).flatMap(Variable::value);
                gaveValue = true;
                break;
            }
            place = new SnippetId(cell, firstLine + piece.line(), place.count());
            boolean wanted = i == pieces.size() - 1 && piece.openEnded();
            List<SnippetEvent> events = wanted ? evaluate(piece) : shell.eval(piece.source());
            Optional<JavaEnd> end = judge(events, text, piece, cell, firstLine);
            if (end.isPresent()) {
                control.forget();
                return end.get();
            }
            events.forEach(event -> defined.add(event.snippet()));
            value = control.value();
            gaveValue = wanted && events.stream().anyMatch(JavaSession::gaveValue);
            control.forget();
        }
        for (Snippet snippet : defined) {
            if (shell.status(snippet) == Status.RECOVERABLE_NOT_DEFINED) {
                return missing(snippet, cell, firstLine);
            }
            if (shell.status(snippet) == Status.RECOVERABLE_DEFINED && snippet instanceof DeclarationSnippet early) {
                System.err.println(early.name() + " can be used once " + needs(early) + " is defined");
            }
        }
        return new JavaEnd.Done(gaveValue ? value : Optional.empty(), gaveValue && value.isEmpty());
    }

    private static boolean isErroneous(Piece piece, SourceCodeAnalysis analysis) {
        return piece.completeness() == Completeness.DEFINITELY_INCOMPLETE
                || analysis.sourceToSnippets(piece.source()).stream()
                        .anyMatch(snippet -> snippet.kind() == Snippet.Kind.ERRONEOUS);
    }

    private static String name(Piece piece) {
        return piece.source().replace(";", "").strip();
    }

    private boolean isVariable(Piece piece) {
        return piece.openEnded() && variables.find(name(piece)).isPresent();
    }

    /**
     * Evaluates what may be an expression whose value is wanted. JShell by itself would make a variable of it, which
     * costs twice the time, slows every later snippet and keeps the value for ever; as the argument of a call it is an
     * ordinary statement. What cannot be an argument, such as a declaration or a call without a value, is refused by the
     * compiler before anything runs, and is then taken as it stands.
     */
    private List<SnippetEvent> evaluate(Piece piece) {
        List<SnippetEvent> events = shell.eval(CALL + piece.written() + CALL_END);
        boolean refused = events.stream().anyMatch(event -> event.status() == Status.REJECTED);
        return refused && !control.stopRequested() ? shell.eval(piece.source()) : events;
    }

    private static boolean gaveValue(SnippetEvent event) {
        return event.causeSnippet() == null && event.snippet().source().startsWith(CALL);
    }

    /** What ended the text at this snippet, if anything did; follows the variables on the way. */
    private Optional<JavaEnd> judge(List<SnippetEvent> events, String text, Piece piece, int cell, int firstLine) {
        Optional<JavaEnd> end = Optional.empty();
        for (SnippetEvent event : events) {
            JShellException thrown = event.exception();
            boolean failed = thrown != null || control.stopped();
            variables.note(event, !failed);
            if (end.isEmpty() && event.status() == Status.REJECTED) {
                end = Optional.of(Traceback.refused(
                        shell.diagnostics(event.snippet()).toList(), text, piece.start(), cell, firstLine));
            } else if (end.isEmpty() && thrown instanceof EvalException e) {
                end = Optional.of(Traceback.of(e));
            } else if (end.isEmpty() && thrown instanceof UnresolvedReferenceException e) {
                String message = e.getSnippet().name() + " needs " + needs(e.getSnippet()) + ", which is not defined";
                end = Optional.of(Traceback.unresolved(e, message));
            }
        }
        if (control.stopRequested()) {
            return Optional.of(new JavaEnd.Stopped(control.abandoned()));
        }
        return end;
    }

    private JavaEnd missing(Snippet snippet, int cell, int firstLine) {
        String name = snippet instanceof DeclarationSnippet declaration ? declaration.name() : "this";
        String need = snippet instanceof DeclarationSnippet declaration ? needs(declaration) : "something";
        SnippetId id = SnippetId.parse(snippet.id());
        String message = name + " needs " + need + ", which is not defined";
        int line = id.cell() == cell ? id.line() : firstLine;
        return new JavaEnd.Failed(
                "CompilationError", message, List.of(Traceback.headline(Traceback.place(cell, line), message)));
    }

    private String needs(DeclarationSnippet snippet) {
        return shell.unresolvedDependencies(snippet).collect(Collectors.joining(", "));
    }

    /**
     * Stops the running text within a fraction of a second, or the next one if none runs: a stop that comes just before
     * a text starts must not be lost. It stands until {@link #ready}.
     */
    public void stop() {
        control.stop();
    }

    /** Forgets an earlier {@link #stop}. */
    public void ready() {
        control.ready();
    }

    /** The variable of that name. */
    public Optional<Variable> variable(String name) {
        return variables.find(name);
    }

    /** The names of all variables, in the order of their first definition. */
    public List<String> variableNames() {
        return variables.names();
    }

    /**
     * Makes a variable of a public type, or gives the one of that name and type another value.
     *
     * @throws IllegalArgumentException when Java takes no such name or type
     */
    public synchronized void define(String name, Class<?> type, Object value) {
        place = new SnippetId(0, 1, place.count());
        variables.define(name, type, value);
    }

    /** Takes a variable away, if there is one of that name. */
    public synchronized void drop(String name) {
        variables.drop(name);
    }

    /** The ways to go on at the cursor. */
    public synchronized Suggestions suggestions(String text, int cursor) {
        bringIn(imports.rest());
        return reading.suggestions(text, cursor, variables.names());
    }

    /** Signatures and, if wanted, the documentation of what stands at the cursor; empty if Java knows nothing of it. */
    public synchronized List<String> documentation(String text, int cursor, boolean full) {
        bringIn(imports.neededBy(text));
        return reading.documentation(text, cursor, full);
    }

    /** Whether the text parses: true, more must follow: empty, or it never will: false. */
    public synchronized Optional<Boolean> parses(String text) {
        return reading.parses(text);
    }

    /** Ends the session and lets go of every value. */
    @Override
    public void close() {
        control.stop();
        synchronized (this) {
            shell.close();
        }
    }
}
