package ladderwell.kernel.cell;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.Consumer;
import ladderwell.kernel.session.JavaEnd;
import org.jspecify.annotations.Nullable;

/** One run of one cell. */
final class CellRun implements SentenceContext {
    private static final int FRAMES = 8;

    private final Workbench bench;
    private final int number;
    private int firstLine = 1;
    private @Nullable MimeBundle last;

    CellRun(Workbench bench, int number) {
        this.bench = bench;
        this.number = number;
    }

    /** Runs the parts in order, up to the first that fails. */
    CellEnd run(List<CellText.Part> parts) {
        boolean abandoned = false;
        for (CellText.Part part : parts) {
            firstLine = part.firstLine();
            Optional<CellEnd> failure;
            if (part.sentences()) {
                failure = runSentences(part.text());
            } else {
                JavaEnd end = bench.runJava(part.text(), number, firstLine);
                abandoned = end instanceof JavaEnd.Stopped stopped && stopped.abandoned();
                failure = afterJava(end);
            }
            if (bench.interruptRequested()) {
                showLast();
                return interrupted(abandoned);
            }
            if (failure.isPresent()) {
                showLast();
                return failure.get();
            }
        }
        return new CellEnd.Done(Optional.ofNullable(last));
    }

    private Optional<CellEnd> afterJava(JavaEnd end) {
        if (end instanceof JavaEnd.Failed failed) {
            return Optional.of(new CellEnd.Failed(failed.name(), failed.message(), failed.traceback()));
        }
        if (end instanceof JavaEnd.Done done) {
            done.value().ifPresent(this::emit);
            if (done.isNull()) {
                add(MimeBundle.plain("null"));
            }
        }
        return Optional.empty();
    }

    private Optional<CellEnd> runSentences(String text) {
        try {
            bench.sentences().run(text, this);
            return Optional.empty();
        } catch (SentenceFailure e) {
            List<String> lines = new ArrayList<>(e.lines());
            lines.add(Ansi.bad(e.message()));
            return Optional.of(new CellEnd.Failed("Declaration", e.message(), lines));
        } catch (Throwable e) {
            return Optional.of(failed(e));
        }
    }

    /** An error that was not foreseen, with its first frames for a report. */
    static CellEnd.Failed failed(Throwable e) {
        String name = e.getClass().getName();
        String message = e.getMessage() == null ? "" : e.getMessage();
        List<String> lines = new ArrayList<>();
        lines.add(Ansi.bad(name) + (message.isEmpty() ? "" : ": " + message));
        StackTraceElement[] frames = e.getStackTrace();
        for (int i = 0; i < Math.min(FRAMES, frames.length); i++) {
            lines.add("    at " + frames[i]);
        }
        return new CellEnd.Failed(name, message, lines);
    }

    private static CellEnd.Interrupted interrupted(boolean abandoned) {
        String more = abandoned ? ": its code heeds no interrupt and runs on in the background" : "";
        return new CellEnd.Interrupted(List.of(Ansi.bad("Interrupted") + more));
    }

    @Override
    public Names names() {
        return bench.names();
    }

    @Override
    public int firstLine() {
        return firstLine;
    }

    @Override
    public Object evaluate(String expression) throws SentenceFailure {
        JavaEnd end = bench.runJava(expression, 0, 1);
        if (end instanceof JavaEnd.Failed failed) {
            String message = failed.message().isEmpty() ? failed.name() : failed.message();
            throw new SentenceFailure("Java cannot evaluate {" + expression + "}: " + message, List.of());
        }
        if (end instanceof JavaEnd.Done done && done.value().isPresent()) {
            return done.value().get();
        }
        throw new SentenceFailure("{" + expression + "} has no value", List.of());
    }

    @Override
    public void emit(Object result) {
        add(render(result));
    }

    private void add(MimeBundle bundle) {
        showLast();
        last = bundle;
    }

    private void showLast() {
        MimeBundle bundle = last;
        if (bundle != null) {
            say(output -> output.display(bundle, Optional.empty()));
            last = null;
        }
    }

    @Override
    public CellOutput output() {
        return new OutputOfRun();
    }

    void say(Consumer<CellOutput> call) {
        bench.say(call);
    }

    MimeBundle render(Object value) {
        return bench.render(value);
    }

    /** What a sentence shows comes after the results it emitted, and in order with what is printed. */
    private final class OutputOfRun implements CellOutput {
        @Override
        public void stdout(String text) {
            say(output -> output.stdout(text));
        }

        @Override
        public void stderr(String text) {
            say(output -> output.stderr(text));
        }

        @Override
        public void display(MimeBundle bundle, Optional<String> displayId) {
            showLast();
            say(output -> output.display(bundle, displayId));
        }

        @Override
        public void update(MimeBundle bundle, String displayId) {
            say(output -> output.update(bundle, displayId));
        }

        @Override
        public void clear(boolean wait) {
            say(output -> output.clear(wait));
        }
    }
}
