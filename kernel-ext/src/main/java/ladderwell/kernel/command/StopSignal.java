package ladderwell.kernel.command;

import java.io.IOException;
import java.io.UncheckedIOException;
import java.util.concurrent.CountDownLatch;
import java.util.concurrent.TimeUnit;
import ladderwell.kernel.notebook.NotebookRun;
import ladderwell.kernel.notebook.RunEnd;

/**
 * Ctrl-C (or a request to terminate) during a run ends the running cell, and what there is gets written before the
 * process ends with the exit code of the signal. A shutdown hook does this on every system alike.
 */
final class StopSignal {
    /** How long a cell may take to end; one that never does must not keep the process. */
    private static final long PATIENCE_SECONDS = 5;

    private StopSignal() {}

    /** Runs, then writes, whatever happens meanwhile. */
    static RunEnd guard(NotebookRun run, Writing writing) throws IOException {
        CountDownLatch written = new CountDownLatch(1);
        Thread stop = new Thread(() -> stop(run, writing, written), "stop");
        Runtime.getRuntime().addShutdownHook(stop);
        try {
            RunEnd end = run.run();
            writing.write();
            return end;
        } finally {
            written.countDown();
            try {
                Runtime.getRuntime().removeShutdownHook(stop);
            } catch (IllegalStateException e) {
                // The signal has come: the hook is waiting for the write and will let the process end.
            }
        }
    }

    private static void stop(NotebookRun run, Writing writing, CountDownLatch written) {
        run.stop();
        try {
            if (!written.await(PATIENCE_SECONDS, TimeUnit.SECONDS)) {
                writing.write();
            }
        } catch (IOException e) {
            throw new UncheckedIOException(e);
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
        }
    }
}
