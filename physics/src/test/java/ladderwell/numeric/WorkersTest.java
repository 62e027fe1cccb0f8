package ladderwell.numeric;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertSame;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.concurrent.CancellationException;
import java.util.concurrent.CountDownLatch;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.concurrent.RejectedExecutionException;
import java.util.concurrent.atomic.AtomicIntegerArray;
import org.junit.jupiter.api.AfterEach;
import org.junit.jupiter.api.Test;

class WorkersTest {
    private final ExecutorService executor = Executors.newFixedThreadPool(3);

    @AfterEach
    void stop() {
        executor.shutdownNow();
    }

    @Test
    void eachPartIsDoneOnce() {
        for (int threads : new int[] {1, 2, 4, 9}) {
            for (int count : new int[] {0, 1, 2, 100}) {
                AtomicIntegerArray done = new AtomicIntegerArray(count);
                new Workers(executor, threads).forEach(count, done::incrementAndGet);
                int[] times = new int[count];
                Arrays.setAll(times, done::get);
                int[] once = new int[count];
                Arrays.fill(once, 1);
                assertArrayEquals(once, times);
            }
        }
    }

    @Test
    void aFailureInAnyPartReachesTheCaller() {
        IllegalStateException failure = new IllegalStateException("part 7");
        Workers workers = new Workers(executor, 3);
        IllegalStateException thrown = assertThrows(
                IllegalStateException.class,
                () -> workers.forEach(50, part -> {
                    if (part == 7) {
                        throw failure;
                    }
                }));
        assertSame(failure, thrown);
    }

    @Test
    void anExecutorThatRunsNothingDoesNotStopTheWork() {
        AtomicIntegerArray done = new AtomicIntegerArray(20);
        new Workers(task -> {}, 4).forEach(20, done::incrementAndGet);
        new Workers(
                        task -> {
                            throw new RejectedExecutionException("full");
                        },
                        4)
                .forEach(20, done::incrementAndGet);
        for (int i = 0; i < 20; i++) {
            assertEquals(2, done.get(i));
        }
    }

    @Test
    void anInterruptStopsAllThreads() throws InterruptedException {
        Workers workers = new Workers(executor, 2);
        CountDownLatch begun = new CountDownLatch(1);
        CountDownLatch ended = new CountDownLatch(1);
        boolean[] cancelled = new boolean[1];
        Thread caller = new Thread(() -> {
            try {
                // Would take 10 000 s.
                workers.forEach(2_000_000, part -> {
                    begun.countDown();
                    pause(10);
                });
            } catch (CancellationException expected) {
                cancelled[0] = !Thread.currentThread().isInterrupted();
            }
            ended.countDown();
        });
        caller.start();
        begun.await();
        caller.interrupt();
        ended.await();
        assertTrue(cancelled[0]);
    }

    private static void pause(long millis) {
        long end = System.nanoTime() + millis * 1_000_000;
        while (System.nanoTime() < end) {
            Thread.onSpinWait();
        }
    }

    @Test
    void theCallerAloneStopsToo() {
        Thread.currentThread().interrupt();
        assertThrows(CancellationException.class, () -> Workers.CALLER.forEach(3, part -> {}));
        assertFalse(Thread.currentThread().isInterrupted());
    }

    @Test
    void refusesZeroThreads() {
        assertThrows(IllegalArgumentException.class, () -> new Workers(executor, 0));
    }
}
