package ladderwell.numeric;

import java.util.concurrent.Executor;

/**
 * The threads a long computation may use: the calling thread and up to {@code threads - 1} tasks run by {@code executor}.
 *
 * <p>The calling thread works too and never waits for a task that has not begun, so a busy executor costs speed, not progress.
 *
 * @param executor runs the extra tasks; not used when {@code threads} is 1
 * @param threads how many threads work at most, the calling one included; at least 1
 */
public record Workers(Executor executor, int threads) {
    /** The calling thread alone. */
    public static final Workers CALLER = new Workers(Runnable::run, 1);

    public Workers {
        if (threads < 1) {
            throw new IllegalArgumentException("threads is " + threads + ", expected at least 1");
        }
    }
}
