package ladderwell.numeric;

import java.util.concurrent.CancellationException;
import java.util.concurrent.Executor;
import java.util.concurrent.RejectedExecutionException;
import java.util.concurrent.atomic.AtomicInteger;
import java.util.function.IntConsumer;
import org.jspecify.annotations.Nullable;

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

    /**
     * Does parts 0 … count-1, each once, in any order and on any of the threads. Returns when all are done. If a part throws, or the
     * calling thread is interrupted, no further part begins, and the first exception is thrown here once the parts under way have ended.
     *
     * @throws CancellationException if the calling thread is interrupted; its interrupt flag is cleared
     */
    void forEach(int count, IntConsumer part) {
        int helpers = Math.min(threads, count) - 1;
        if (helpers <= 0) {
            for (int i = 0; i < count; i++) {
                Interruption.check();
                part.accept(i);
            }
            return;
        }
        Parts parts = new Parts(count, part);
        for (int i = 0; i < helpers; i++) {
            try {
                executor.execute(parts::help);
            } catch (RejectedExecutionException full) {
                break; // the calling thread does the rest
            }
        }
        parts.finish();
    }

    /** The parts of one call: claimed by a counter, so that a helper that comes late finds nothing to do. */
    private static final class Parts {
        private final int count;
        private final IntConsumer part;
        private final AtomicInteger next = new AtomicInteger();
        private int helping; // guarded by this
        private @Nullable Throwable failure; // guarded by this

        Parts(int count, IntConsumer part) {
            this.count = count;
            this.part = part;
        }

        void help() {
            synchronized (this) {
                if (next.get() >= count) {
                    return;
                }
                helping++;
            }
            work();
            synchronized (this) {
                helping--;
                notifyAll();
            }
        }

        private void work() {
            try {
                for (int i = next.getAndIncrement(); i < count; i = next.getAndIncrement()) {
                    Interruption.check();
                    part.accept(i);
                }
            } catch (Throwable thrown) {
                fail(thrown);
            }
        }

        private synchronized void fail(Throwable thrown) {
            // A set counter near the end of the int range would overflow; the count itself is enough.
            next.set(count);
            if (failure == null) {
                failure = thrown;
            }
        }

        void finish() {
            work();
            synchronized (this) {
                while (helping > 0) {
                    try {
                        wait();
                    } catch (InterruptedException interrupt) {
                        fail(new CancellationException("the computation was interrupted"));
                    }
                }
                if (failure instanceof Error error) {
                    throw error;
                }
                if (failure instanceof RuntimeException exception) {
                    throw exception;
                }
            }
        }
    }
}
