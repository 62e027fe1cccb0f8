package ladderwell.numeric;

import java.util.concurrent.CancellationException;

/** The interrupt flag, looked at from long loops. */
public final class Interruption {
    private Interruption() {}

    /**
     * Clears the flag and throws if the calling thread was interrupted.
     *
     * @throws CancellationException if it was
     */
    public static void check() {
        if (Thread.interrupted()) {
            throw new CancellationException("the computation was interrupted");
        }
    }
}
