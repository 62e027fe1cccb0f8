package ladderwell.kernel.session;

import org.jspecify.annotations.Nullable;

/** Where a snippet leaves the value of its expression. Snippets are made to call this; nothing else should. */
public final class Result {
    static final ThreadLocal<SnippetControl.@Nullable Run> RUN = new ThreadLocal<>();

    private Result() {}

    /** Keeps a value as that of the snippet running on this thread. */
    public static void of(@Nullable Object value) {
        SnippetControl.Run run = RUN.get();
        if (run != null) {
            run.value = value;
        }
    }
}
