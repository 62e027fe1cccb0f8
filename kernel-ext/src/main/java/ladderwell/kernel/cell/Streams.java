package ladderwell.kernel.cell;

import java.io.InputStream;
import java.io.OutputStream;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.util.function.Consumer;
import org.jspecify.annotations.Nullable;

/**
 * The standard streams of the process, led to the running cell. Text is collected and passed on when 8 KB have come
 * together or 50 ms have passed, so that a loop of prints makes few messages; a flush by the cell does not change that.
 */
final class Streams implements AutoCloseable {
    private static final int SIZE = 8192;
    private static final int DELAY_MILLIS = 50;

    private final PrintStream formerOut = System.out;
    private final PrintStream formerErr = System.err;
    private final InputStream formerIn = System.in;
    private final PrintStream out;
    private final PrintStream err;
    private final Object lock = new Object();
    private final Buffer outBuffer = new Buffer(false);
    private final Buffer errBuffer = new Buffer(true);
    private @Nullable CellOutput target;
    private boolean closed;

    Streams() {
        out = new PrintStream(outBuffer, false, StandardCharsets.UTF_8);
        err = new PrintStream(errBuffer, false, StandardCharsets.UTF_8);
        System.setOut(out);
        System.setErr(err);
        System.setIn(InputStream.nullInputStream());
        Thread flusher = new Thread(this::flushNowAndThen, "cell output");
        flusher.setDaemon(true);
        flusher.start();
    }

    /** Leads the streams to another cell; what came before goes where it was meant to. */
    void lead(CellOutput output) {
        synchronized (lock) {
            flush();
            target = output;
        }
    }

    /** Passes on what has come together and then lets {@code call} speak to the cell's output. */
    void say(Consumer<CellOutput> call) {
        synchronized (lock) {
            flush();
            if (target != null) {
                call.accept(target);
            }
        }
    }

    void flush() {
        synchronized (lock) {
            outBuffer.pass(true);
            errBuffer.pass(true);
        }
    }

    private void flushNowAndThen() {
        try {
            synchronized (lock) {
                while (!closed) {
                    if (outBuffer.length == 0 && errBuffer.length == 0) {
                        lock.wait();
                    } else {
                        lock.wait(DELAY_MILLIS);
                        outBuffer.pass(false);
                        errBuffer.pass(false);
                    }
                }
            }
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
        }
    }

    @Override
    public void close() {
        synchronized (lock) {
            flush();
            closed = true;
            lock.notifyAll();
            if (System.out == out) {
                System.setOut(formerOut);
                System.setErr(formerErr);
                System.setIn(formerIn);
            }
        }
    }

    private final class Buffer extends OutputStream {
        private final boolean error;
        private final byte[] bytes = new byte[SIZE];
        private int length;

        Buffer(boolean error) {
            this.error = error;
        }

        @Override
        public void write(int b) {
            write(new byte[] {(byte) b}, 0, 1);
        }

        @Override
        public void write(byte[] from, int start, int count) {
            synchronized (lock) {
                (error ? outBuffer : errBuffer).pass(true);
                for (int done = 0; done < count; ) {
                    if (length == SIZE) {
                        pass(false);
                    }
                    int now = Math.min(SIZE - length, count - done);
                    System.arraycopy(from, start + done, bytes, length, now);
                    if (length == 0) {
                        lock.notifyAll();
                    }
                    length += now;
                    done += now;
                }
            }
        }

        /** Passes the text on, but keeps the beginning of a character whose end is still to come. */
        private void pass(boolean all) {
            int whole = all ? length : wholeCharacters();
            if (whole == 0) {
                return;
            }
            String text = new String(bytes, 0, whole, StandardCharsets.UTF_8);
            System.arraycopy(bytes, whole, bytes, 0, length - whole);
            length -= whole;
            if (target == null || closed) {
                (error ? formerErr : formerOut).print(text);
            } else if (error) {
                target.stderr(text);
            } else {
                target.stdout(text);
            }
        }

        private int wholeCharacters() {
            int lead = length - 1;
            while (lead >= 0 && length - lead < 4 && (bytes[lead] & 0xC0) == 0x80) {
                lead--;
            }
            if (lead < 0) {
                return length;
            }
            int b = bytes[lead] & 0xFF;
            int wanted = b >= 0xF0 ? 4 : b >= 0xE0 ? 3 : b >= 0xC0 ? 2 : 1;
            return length - lead < wanted ? lead : length;
        }
    }
}
