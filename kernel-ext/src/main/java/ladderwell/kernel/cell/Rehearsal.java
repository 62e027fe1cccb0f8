package ladderwell.kernel.cell;

import java.util.Optional;

/**
 * Sentences that are run aside, before any cell: what they declare and show is thrown away. The first cell of a notebook
 * then finds the parser, the physics and the renderers loaded, which takes half of its time off.
 */
public final class Rehearsal implements SentenceContext {
    private final Names names = new SharedNames(Optional::empty);
    private final Renderer renderer;

    private Rehearsal(Renderer renderer) {
        this.renderer = renderer;
    }

    /**
     * Runs a text of sentences.
     *
     * @param renderer one of its own: what it has shown is on no page
     * @throws IllegalStateException if a sentence is wrong
     */
    public static void run(String text, Sentences sentences, Renderer renderer) {
        try {
            sentences.run(text, new Rehearsal(renderer));
        } catch (SentenceFailure e) {
            throw new IllegalStateException(e.message(), e);
        }
    }

    @Override
    public Names names() {
        return names;
    }

    @Override
    public int firstLine() {
        return 1;
    }

    @Override
    public Object evaluate(String expression) throws SentenceFailure {
        throw new IllegalStateException("a rehearsal has no Java session");
    }

    @Override
    public void emit(Object result) {
        MimeBundle unused = renderer.render(result);
    }

    @Override
    public CellOutput output() {
        throw new IllegalStateException("a rehearsal has no output");
    }
}
