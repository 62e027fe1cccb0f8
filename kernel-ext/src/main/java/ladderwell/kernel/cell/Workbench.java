package ladderwell.kernel.cell;

import java.util.List;
import java.util.Optional;
import java.util.concurrent.CompletableFuture;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.locks.ReentrantLock;
import java.util.function.Consumer;
import ladderwell.kernel.session.JavaEnd;
import ladderwell.kernel.session.JavaSession;
import ladderwell.kernel.session.Suggestions;
import ladderwell.kernel.session.WarmUp;
import org.jspecify.annotations.Nullable;

/**
 * The bench at which the cells of one notebook are worked: its declared names, its Java session, its sentences. It is
 * there at once; the Java session starts in the background or when first needed, and only what needs Java waits for it.
 *
 * <p>Cells run one at a time, on the thread that calls {@link #run}; {@link #interrupt} comes from any other thread.
 * While it is open, a workbench owns {@code System.out}, {@code System.err} and {@code System.in} of the process; input
 * is at its end from the start.
 */
public final class Workbench implements AutoCloseable {
    /** The streams of a process can serve one cell at a time, whatever the number of workbenches. */
    private static final ReentrantLock ONE_CELL = new ReentrantLock();

    private final Sentences sentences;
    private final Renderer renderer;
    private final List<String> imports;
    private final Streams streams = new Streams();
    private final SharedNames names = new SharedNames(this::startedJava);

    private final Object phaseLock = new Object();
    private @Nullable CompletableFuture<JavaSession> java;
    private @Nullable Thread runner;
    private boolean inJava;
    private boolean interruptRequested;

    private boolean cellAnnounced;

    private boolean interruptedBeforeItBegan;

    /** A workbench with the imports that every Ladderwell notebook starts with. */
    public Workbench(Sentences sentences, Renderer renderer) {
        this(sentences, renderer, standardImports());
    }

    /**
     * A workbench with other imports.
     *
     * @param imports as {@code java.util.*} or {@code static java.lang.Math.*}; unknown packages are passed over
     */
    public Workbench(Sentences sentences, Renderer renderer, List<String> imports) {
        this.sentences = sentences;
        this.renderer = renderer;
        this.imports = List.copyOf(imports);
    }

    /** The imports that every notebook starts with. */
    public static List<String> standardImports() {
        return List.of(
                "ladderwell.*",
                "ladderwell.Observable",
                "static ladderwell.Observable.*",
                "ladderwell.quantity.Quantity",
                "ladderwell.potential.Potential",
                "ladderwell.formula.Amount",
                "ladderwell.formula.Parameters",
                "ladderwell.evidence.PhysicsException",
                "static ladderwell.quantity.Units.*",
                "static ladderwell.kernel.cell.Show.*",
                "tech.tablesaw.api.*",
                "tech.tablesaw.plotly.*",
                "tech.tablesaw.plotly.components.*",
                "tech.tablesaw.plotly.traces.*",
                "java.util.*",
                "java.util.function.*",
                "java.util.stream.*",
                "static java.lang.Math.*");
    }

    /** Starts the Java session in the background, unless it has been started already. */
    public void startJava() {
        CompletableFuture<JavaSession> unused = java();
    }

    /** Makes Java quick in the background while no cell runs. For notebooks that people type in. */
    public void practiseJava() {
        CompletableFuture<Void> unused = java().thenRun(() -> {
            Thread thread = new Thread(this::practiseNow, "java practice");
            thread.setDaemon(true);
            thread.start();
        });
    }

    private void practiseNow() {
        try {
            WarmUp.practise(imports, this::isIdle);
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
        } catch (RuntimeException | LinkageError e) {
            // Cells will be slower for a while, that is all.
        }
    }

    /** Whether nobody waits for anything: no cell runs, and the Java session is not just being started. */
    public boolean isIdle() {
        synchronized (phaseLock) {
            return runner == null && !cellAnnounced && (java == null || java.isDone());
        }
    }

    private CompletableFuture<JavaSession> java() {
        synchronized (phaseLock) {
            CompletableFuture<JavaSession> starting = java;
            if (starting == null) {
                CompletableFuture<JavaSession> future = new CompletableFuture<>();
                Thread thread = new Thread(() -> start(future), "java session");
                thread.setDaemon(true);
                thread.start();
                java = future;
                return future;
            }
            return starting;
        }
    }

    private void start(CompletableFuture<JavaSession> future) {
        try {
            future.complete(new JavaSession(imports));
        } catch (Throwable e) {
            future.completeExceptionally(e);
        }
    }

    private Optional<JavaSession> startedJava() {
        synchronized (phaseLock) {
            CompletableFuture<JavaSession> starting = java;
            return starting != null && starting.isDone() && !starting.isCompletedExceptionally()
                    ? Optional.of(starting.join())
                    : Optional.empty();
        }
    }

    /** The session, when it has started. */
    private JavaSession session() throws InterruptedException {
        try {
            return java().get();
        } catch (ExecutionException e) {
            throw new IllegalStateException("Java " + Runtime.version() + " can run no cells: " + e.getCause(), e);
        }
    }

    /** The names declared so far. */
    public Names names() {
        return names;
    }

    Sentences sentences() {
        return sentences;
    }

    /**
     * Runs a cell and renders its result. Never throws for what the cell does.
     *
     * @param code the text of the cell
     * @param number the number of the cell in tracebacks, as in {@code cell [3], line 2}
     * @param output where the cell shows what it has to show while it runs
     */
    public CellEnd run(String code, int number, CellOutput output) {
        return work(number, output, run -> run.run(CellText.of(code).parts()));
    }

    /** The rendered value of one Java expression, with its side effects and without any output. */
    public CellEnd evaluate(String expression) {
        return work(0, new Silence(), run -> run.run(List.of(new CellText.Part(false, expression, 0, 1))));
    }

    /** Says that a cell is about to run, so that an interrupt that comes before its first step is not lost. */
    public void announceCell() {
        synchronized (phaseLock) {
            cellAnnounced = true;
        }
    }

    private CellEnd work(int number, CellOutput output, java.util.function.Function<CellRun, CellEnd> work) {
        ONE_CELL.lock();
        try {
            CellRun run = new CellRun(this, number);
            names.begin();
            synchronized (phaseLock) {
                runner = Thread.currentThread();
                interruptRequested = interruptedBeforeItBegan;
                interruptedBeforeItBegan = false;
                cellAnnounced = false;
                if (interruptRequested) {
                    runner.interrupt();
                }
            }
            streams.lead(output);
            Show.during(run);
            CellEnd end;
            try {
                end = work.apply(run);
            } catch (Throwable e) {
                end = CellRun.failed(e);
            }
            synchronized (phaseLock) {
                runner = null;
                // The flag must not reach whatever the caller does next, such as sending a message.
                Thread.interrupted();
            }
            if (end instanceof CellEnd.Failed) {
                names.undo();
            }
            streams.flush();
            return end;
        } finally {
            Show.ended();
            ONE_CELL.unlock();
        }
    }

    /** Runs Java with the declared names in reach. */
    JavaEnd runJava(String text, int number, int firstLine) {
        JavaSession session;
        try {
            session = session();
        } catch (InterruptedException e) {
            return new JavaEnd.Stopped(false);
        }
        names.enter(session, text);
        synchronized (phaseLock) {
            if (interruptRequested) {
                return new JavaEnd.Stopped(false);
            }
            session.ready();
            inJava = true;
        }
        JavaEnd end;
        try {
            end = session.run(text, number, firstLine);
        } finally {
            synchronized (phaseLock) {
                inJava = false;
            }
        }
        if (!(end instanceof JavaEnd.Failed)) {
            names.leave(session);
        }
        return end;
    }

    boolean interruptRequested() {
        synchronized (phaseLock) {
            return interruptRequested;
        }
    }

    void say(Consumer<CellOutput> call) {
        streams.say(call);
    }

    MimeBundle render(Object value) {
        try {
            return renderer.render(value);
        } catch (RuntimeException | LinkageError | StackOverflowError e) {
            return MimeBundle.plain(value.getClass().getName() + " (cannot be shown: " + e + ")");
        }
    }

    /** What could stand at the cursor. */
    public Completion complete(String code, int cursor) {
        Optional<CellText.Part> found = partAt(code, cursor);
        CellText.Part part = found.orElse(new CellText.Part(false, "", cursor, 1));
        int at = cursor - part.start();
        if (!part.sentences()) {
            return suggestions(part.text(), at).moved(part.start());
        }
        int brace = openBrace(part.text(), at);
        if (brace >= 0) {
            String expression = part.text().substring(brace + 1, at);
            return suggestions(expression, expression.length()).moved(part.start() + brace + 1);
        }
        return sentences.complete(part.text(), at, names).moved(part.start());
    }

    private Completion suggestions(String text, int cursor) {
        try {
            JavaSession session = session();
            names.enter(session, allNames());
            Suggestions found = session.suggestions(text, cursor);
            return new Completion(
                    found.start(),
                    cursor,
                    found.list().stream()
                            .map(suggestion -> new Completion.Candidate(suggestion.text(), suggestion.kind()))
                            .toList());
        } catch (InterruptedException e) {
            return Completion.none(cursor);
        }
    }

    private String allNames() {
        return String.join(" ", names.declared().stream().map(Names.Named::name).toList());
    }

    private static Optional<CellText.Part> partAt(String code, int cursor) {
        return CellText.of(code).parts().stream()
                .filter(part -> part.start() <= cursor
                        && cursor <= part.start() + part.text().length())
                // At a seam the cursor belongs to the line it stands in, which is the later part's.
                .reduce((first, second) -> second);
    }

    /** The position of the brace that is open at the cursor in its line, or -1. */
    private static int openBrace(String text, int cursor) {
        int line = text.lastIndexOf('\n', cursor - 1) + 1;
        int open = text.lastIndexOf('{', cursor - 1);
        return open >= line && text.lastIndexOf('}', cursor - 1) < open ? open : -1;
    }

    /**
     * What the word at the cursor means.
     *
     * @param detail 0 for the short form, 1 for the long one
     */
    public Optional<MimeBundle> inspect(String code, int cursor, int detail) {
        Optional<CellText.Part> found = partAt(code, cursor);
        if (found.isEmpty()) {
            return Optional.empty();
        }
        CellText.Part part = found.get();
        int at = cursor - part.start();
        int brace = part.sentences() ? openBrace(part.text(), at) : -1;
        if (part.sentences() && brace < 0) {
            return sentences.inspect(part.text(), at, detail, names);
        }
        String java = part.text().substring(brace + 1);
        return inspectJava(java, at - brace - 1, detail);
    }

    private Optional<MimeBundle> inspectJava(String text, int cursor, int detail) {
        Optional<MimeBundle> value = names.find(wordAt(text, cursor)).map(this::describe);
        if (value.isPresent()) {
            return value;
        }
        try {
            JavaSession session = session();
            names.enter(session, allNames());
            List<String> about = session.documentation(text, cursor, detail > 0);
            return about.isEmpty() ? Optional.empty() : Optional.of(MimeBundle.plain(String.join("\n\n", about)));
        } catch (InterruptedException e) {
            return Optional.empty();
        }
    }

    private MimeBundle describe(Names.Named named) {
        MimeBundle value = render(named.value());
        return value.with(
                MimeBundle.PLAIN, named.type().getSimpleName() + " " + named.name() + "\n" + value.plainText());
    }

    /** The identifier at the cursor; empty when it is a member of something or there is none. */
    private static String wordAt(String text, int cursor) {
        int from = cursor;
        int to = cursor;
        while (from > 0 && Character.isJavaIdentifierPart(text.charAt(from - 1))) {
            from--;
        }
        while (to < text.length() && Character.isJavaIdentifierPart(text.charAt(to))) {
            to++;
        }
        boolean member = from > 0 && text.charAt(from - 1) == '.';
        boolean call = to < text.length() && text.charAt(to) == '(';
        return member || call ? "" : text.substring(from, to);
    }

    /** Whether the text can be run as it stands. */
    public Completeness completeness(String code) {
        if (code.stripLeading().startsWith("%%")) {
            // Consoles run such a cell at the first blank line.
            boolean hasBody = code.strip().contains("\n");
            return hasBody && code.stripTrailing().length() < code.lastIndexOf('\n') + 1
                    ? Completeness.COMPLETE
                    : Completeness.INCOMPLETE;
        }
        List<CellText.Part> parts = CellText.of(code).parts();
        if (parts.isEmpty() || parts.get(parts.size() - 1).sentences()) {
            return Completeness.COMPLETE;
        }
        try {
            return session()
                    .parses(parts.get(parts.size() - 1).text())
                    .map(parses -> parses ? Completeness.COMPLETE : Completeness.INVALID)
                    .orElse(Completeness.INCOMPLETE);
        } catch (InterruptedException e) {
            return Completeness.COMPLETE;
        }
    }

    /** Ends the running cell, if one is running, within a fraction of a second; returns at once. */
    public void interrupt() {
        synchronized (phaseLock) {
            Thread running = runner;
            if (running == null) {
                interruptedBeforeItBegan = cellAnnounced;
                return;
            }
            interruptRequested = true;
            if (inJava) {
                startedJava().ifPresent(JavaSession::stop);
            } else {
                running.interrupt();
            }
        }
    }

    /** Ends the Java session and gives the standard streams back. */
    @Override
    public void close() {
        streams.close();
        startedJava().ifPresent(JavaSession::close);
    }

    /** Hears everything and says nothing. */
    private record Silence() implements CellOutput {
        @Override
        public void stdout(String text) {}

        @Override
        public void stderr(String text) {}

        @Override
        public void display(MimeBundle bundle, Optional<String> displayId) {}

        @Override
        public void update(MimeBundle bundle, String displayId) {}

        @Override
        public void clear(boolean wait) {}
    }
}
