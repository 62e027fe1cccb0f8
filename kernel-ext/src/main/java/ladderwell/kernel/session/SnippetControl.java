package ladderwell.kernel.session;

import java.lang.reflect.Field;
import java.lang.reflect.InvocationTargetException;
import java.lang.reflect.Method;
import java.util.Optional;
import jdk.jshell.execution.LocalExecutionControl;
import jdk.jshell.spi.ExecutionControl;
import org.jspecify.annotations.Nullable;

/**
 * Runs snippets in this process, keeps their values as objects, and stops them.
 *
 * <p>The JDK's class prepares what stops user code (a check woven into loops on newer versions) and then calls {@link
 * #bounce()} in place of the snippet; that runs the snippet on a thread of ours. The second thread is what lets a stop
 * return although the code heeds no interrupt, and lets uncaught exceptions of a cell's own threads reach its standard
 * error, where the JDK's thread group would swallow them.
 */
final class SnippetControl extends LocalExecutionControl {
    /** How long stopped code gets to end by itself; with the next one it stays below 0.2 s. */
    private static final long GRACE_MILLIS = 100;

    private static final long FINAL_MILLIS = 50;
    private static final long RETRY_MILLIS = 5;

    private static final InheritableThreadLocal<@Nullable SnippetControl> CALLER = new InheritableThreadLocal<>();
    private static final Method BOUNCE;

    static {
        try {
            BOUNCE = SnippetControl.class.getDeclaredMethod("bounce");
            BOUNCE.setAccessible(true);
        } catch (NoSuchMethodException e) {
            throw new ExceptionInInitializerError(e);
        }
    }

    private final ThreadGroup cellThreads = new CellThreads();
    private final Object threadLock = new Object();
    private @Nullable Thread waiting;
    private @Nullable Run run;
    private volatile boolean stopRequested;
    private @Nullable Field lastField;

    /** A snippet, and what came of it. */
    static final class Run {
        private final Method method;
        volatile @Nullable Object value;
        volatile @Nullable Throwable thrown;
        volatile boolean stopped;
        volatile boolean abandoned;

        Run(Method method) {
            this.method = method;
        }

        void call() {
            Result.RUN.set(this);
            try {
                method.invoke(null);
            } catch (InvocationTargetException e) {
                thrown = e.getCause();
            } catch (Throwable e) {
                thrown = e;
            } finally {
                Result.RUN.remove();
            }
        }
    }

    private static final class CellThreads extends ThreadGroup {
        CellThreads() {
            super("cells");
        }

        @Override
        public void uncaughtException(Thread thread, Throwable e) {
            if (!isDeath(e)) {
                System.err.print("Exception in thread \"" + thread.getName() + "\" ");
                e.printStackTrace();
            }
        }
    }

    @Override
    public void load(ClassBytecodes[] classes)
            throws ClassInstallException, NotImplementedException, EngineTerminationException {
        ClassBytecodes[] safe = new ClassBytecodes[classes.length];
        for (int i = 0; i < classes.length; i++) {
            safe[i] = new ClassBytecodes(classes[i].name(), Exit.replaced(classes[i].bytecodes()));
        }
        super.load(safe);
    }

    @Override
    protected String invoke(Method method) throws Exception {
        Run now = new Run(method);
        run = now;
        CALLER.set(this);
        try {
            super.invoke(BOUNCE);
        } finally {
            CALLER.remove();
        }
        Throwable thrown = now.thrown;
        if (now.abandoned || isDeath(thrown) || (stopRequested && thrown != null)) {
            now.stopped = true;
        }
        if (now.stopped) {
            throw new ExecutionControl.StoppedException();
        }
        if (thrown != null) {
            throw new InvocationTargetException(thrown);
        }
        return "";
    }

    /** Stands in for the snippet's method on the thread that the JDK's class starts. */
    private static void bounce() {
        SnippetControl control = CALLER.get();
        CALLER.remove();
        if (control != null) {
            control.runOnOwnThread();
        }
    }

    private void runOnOwnThread() {
        Run now = run;
        if (now == null) {
            return;
        }
        Thread worker = new Thread(cellThreads, now::call, "cell");
        worker.setDaemon(true);
        synchronized (threadLock) {
            if (stopRequested) {
                now.stopped = true;
                return;
            }
            waiting = Thread.currentThread();
            worker.start();
        }
        try {
            worker.join();
        } catch (InterruptedException stop) {
            now.abandoned = !end(worker);
        } finally {
            synchronized (threadLock) {
                waiting = null;
            }
            Thread.interrupted();
        }
    }

    /** Whether the worker could be made to end. */
    private static boolean end(Thread worker) {
        worker.interrupt();
        if (endsWithin(worker, GRACE_MILLIS)) {
            return true;
        }
        // Code that catches everything catches the stop as well, unless it comes between two turns of its loop.
        for (long spent = 0; worker.isAlive() && spent < FINAL_MILLIS; spent += RETRY_MILLIS) {
            stopByForce(worker);
            endsWithin(worker, RETRY_MILLIS);
        }
        return !worker.isAlive();
    }

    private static boolean endsWithin(Thread worker, long millis) {
        long end = System.nanoTime() + millis * 1_000_000;
        for (long left = millis; left > 0 && worker.isAlive(); left = (end - System.nanoTime()) / 1_000_000) {
            try {
                worker.join(left);
            } catch (InterruptedException again) {
                worker.interrupt();
            }
        }
        return !worker.isAlive();
    }

    /**
     * Up to Java 19 a thread can be stopped anywhere, and a busy loop in a cell cannot be stopped otherwise. Later
     * versions weave a check into the cell's loops instead and took the method away, hence the reflection.
     */
    private static void stopByForce(Thread worker) {
        if (Runtime.version().feature() < 20) {
            try {
                Thread.class.getMethod("stop").invoke(worker);
            } catch (ReflectiveOperationException e) {
                // Then it cannot be stopped; the caller sees that it lives on.
            }
        }
    }

    /** Stops the running snippet; the next ones run only after {@link #ready()}. */
    @Override
    public void stop() {
        stopRequested = true;
        if (Runtime.version().feature() >= 20) {
            try {
                super.stop();
            } catch (ExecutionControlException | RuntimeException e) {
                // Nothing was running yet; the request stands.
            }
        }
        synchronized (threadLock) {
            Thread thread = waiting;
            if (thread != null) {
                thread.interrupt();
            }
        }
    }

    /** Forgets an earlier stop. */
    void ready() {
        stopRequested = false;
        run = null;
    }

    boolean stopRequested() {
        return stopRequested;
    }

    /** Whether code of the last snippet was left running. */
    boolean abandoned() {
        Run now = run;
        return now != null && now.abandoned;
    }

    /** Whether the last snippet was stopped before its end. */
    boolean stopped() {
        Run now = run;
        return now != null && now.stopped;
    }

    /** The value that the last snippet left, empty for null and for statements. */
    Optional<Object> value() {
        Run now = run;
        return now == null ? Optional.empty() : Optional.ofNullable(now.value);
    }

    /** Lets go of the last value, so that it is not kept from collection. */
    void forget() {
        run = null;
    }

    @Override
    public String varValue(String className, String name) throws RunException, InternalException {
        try {
            Field field = findClass(className).getDeclaredField(name);
            field.setAccessible(true);
            lastField = field;
        } catch (ReflectiveOperationException | LinkageError e) {
            throw new InternalException(e.toString());
        }
        return "";
    }

    /** The field that JShell asked for last; it asks when it is asked for a variable's value. */
    Optional<Field> lastField() {
        Optional<Field> field = Optional.ofNullable(lastField);
        lastField = null;
        return field;
    }

    /** ThreadDeath by name: the class is marked for removal. */
    private static boolean isDeath(@Nullable Throwable e) {
        return e != null && e.getClass().getName().equals("java.lang.ThreadDeath");
    }
}
