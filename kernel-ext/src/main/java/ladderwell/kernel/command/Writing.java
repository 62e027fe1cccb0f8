package ladderwell.kernel.command;

import java.io.IOException;

/** Writes what a run has given so far. */
@FunctionalInterface
interface Writing {
    void write() throws IOException;
}
