package ladderwell.kernel.host;

import io.github.spencerpark.jupyter.channels.JupyterSocket;
import io.github.spencerpark.jupyter.messages.Message;
import java.util.concurrent.ArrayBlockingQueue;
import java.util.concurrent.BlockingQueue;
import java.util.concurrent.CountDownLatch;
import java.util.concurrent.TimeUnit;

/**
 * Sends broadcasts from one thread of its own, in the order in which they were given. The threads of cells must not
 * touch a socket themselves: an interrupt in the middle of sending would break it.
 */
final class Publisher {
    /** A cell that says more than can be sent waits, instead of filling the memory. */
    private static final int WAITING = 512;

    private final JupyterSocket socket;
    private final BlockingQueue<Runnable> queue = new ArrayBlockingQueue<>(WAITING);

    Publisher(JupyterSocket socket) {
        this.socket = socket;
        Thread thread = new Thread(this::sendAll, "publisher");
        thread.setDaemon(true);
        thread.start();
    }

    private void sendAll() {
        while (true) {
            try {
                queue.take().run();
            } catch (InterruptedException e) {
                return;
            } catch (RuntimeException | LinkageError e) {
                // A message that cannot be sent is lost; the next one may fare better.
            }
        }
    }

    void send(Message<?> message) {
        put(() -> socket.sendMessage(message));
    }

    /** Waits until all that was given so far has been sent, or the time is over. */
    void drain(long millis) {
        CountDownLatch sent = new CountDownLatch(1);
        put(sent::countDown);
        try {
            boolean unused = sent.await(millis, TimeUnit.MILLISECONDS);
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
        }
    }

    private void put(Runnable sending) {
        boolean interrupted = false;
        while (true) {
            try {
                queue.put(sending);
                break;
            } catch (InterruptedException e) {
                interrupted = true;
            }
        }
        if (interrupted) {
            Thread.currentThread().interrupt();
        }
    }
}
