package ladderwell.kernel.host;

import com.google.gson.JsonParseException;
import io.github.spencerpark.jupyter.channels.JupyterConnection;
import io.github.spencerpark.jupyter.channels.Loop;
import io.github.spencerpark.jupyter.channels.ShellChannel;
import io.github.spencerpark.jupyter.kernel.KernelConnectionProperties;
import java.io.IOException;
import java.lang.reflect.Field;
import java.nio.file.Files;
import java.nio.file.NoSuchFileException;
import java.nio.file.Path;
import java.security.GeneralSecurityException;
import java.security.NoSuchAlgorithmException;
import java.util.List;
import java.util.Optional;
import java.util.concurrent.CountDownLatch;
import java.util.function.BooleanSupplier;
import java.util.function.Consumer;
import java.util.logging.Level;
import java.util.logging.Logger;
import javax.crypto.Mac;
import ladderwell.kernel.cell.Renderer;
import ladderwell.kernel.cell.Sentences;
import ladderwell.kernel.cell.Workbench;
import org.zeromq.ZMQException;

/** Starts a kernel on a connection file and stays until it is shut down. */
public final class KernelMain {
    /** How often a channel looks for requests; the base library's 50 ms would be felt at every keystroke. */
    private static final long POLL_MILLIS = 2;

    private KernelMain() {}

    /** What the process ends with when the kernel could not be started. */
    private static final int NOT_STARTED = 2;

    /**
     * Serves a kernel until a client shuts it down or the process that started it ends. Why a kernel could not be
     * started is said in one line on standard error.
     *
     * @param connectionFile the file that names ports and key, as a Jupyter client writes it
     * @param sentences the declarations language
     * @param renderer shows what cells return
     * @param onceKnown called once, when a client has been told what kernel this is: then it usually takes a breath before
     *     its first cell; it is given what tells whether nobody waits for anything
     * @return the exit code for the process; threads of cells may still be there, so exit with it
     */
    public static int serve(
            Path connectionFile, Sentences sentences, Renderer renderer, Consumer<BooleanSupplier> onceKnown) {
        Optional<String> unfit = unfitJava();
        if (unfit.isPresent()) {
            return refuse(unfit.get());
        }
        prepareSignatures();
        // The base library logs every message; nothing of it may reach a cell's streams.
        Logger.getLogger("").setLevel(Level.OFF);
        JupyterConnection connection;
        try {
            connection = new JupyterConnection(read(connectionFile));
        } catch (IllegalArgumentException | GeneralSecurityException e) {
            return refuse("connection file " + connectionFile + ": " + e.getMessage());
        }
        Workbench workbench = new Workbench(sentences, renderer);
        CountDownLatch ended = new CountDownLatch(1);
        CellKernel kernel = new CellKernel(workbench, ended::countDown, () -> onceKnown.accept(workbench::isIdle));
        kernel.becomeHandlerForConnection(connection);
        try {
            pollFast(connection);
            connection.connect();
            surviveBadMessages(connection);
        } catch (ZMQException | ReflectiveOperationException e) {
            workbench.close();
            return refuse(
                    "connection file " + connectionFile + ": its ports cannot be opened (" + e.getMessage() + ")");
        }
        workbench.practiseJava();
        endWithParent(ended);
        interruptOnSignal(workbench);
        try {
            ended.await();
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
        }
        // The sockets stay open: a cell that heeds no interrupt may still hold them, and the process ends anyway.
        kernel.drain();
        return 0;
    }

    /** Looking for what signs messages loads every provider of security there is; meanwhile the rest can start. */
    private static void prepareSignatures() {
        Thread thread = new Thread(
                () -> {
                    try {
                        Mac unused = Mac.getInstance("HmacSHA256");
                    } catch (NoSuchAlgorithmException e) {
                        throw new IllegalStateException("every Java has HmacSHA256", e);
                    }
                },
                "signatures");
        thread.setDaemon(true);
        thread.start();
    }

    private static int refuse(String why) {
        System.err.println(why);
        return NOT_STARTED;
    }

    /** Why this Java cannot run cells, if it cannot. */
    static Optional<String> unfitJava() {
        boolean hasShell = ModuleLayer.boot().findModule("jdk.jshell").isPresent();
        boolean hasCompiler = ModuleLayer.boot().findModule("jdk.compiler").isPresent();
        if (hasShell && hasCompiler) {
            return Optional.empty();
        }
        return Optional.of("Ladderwell needs a JDK of version 17 or later with the module jdk.jshell; found Java "
                + Runtime.version() + " in " + System.getProperty("java.home") + " without it");
    }

    private static KernelConnectionProperties read(Path file) {
        String text;
        try {
            text = Files.readString(file);
        } catch (NoSuchFileException e) {
            throw new IllegalArgumentException("there is no such file", e);
        } catch (IOException e) {
            throw new IllegalArgumentException("cannot be read (" + e.getMessage() + ")", e);
        }
        KernelConnectionProperties properties;
        try {
            properties = KernelConnectionProperties.parse(text);
        } catch (JsonParseException e) {
            throw new IllegalArgumentException("is not JSON; expected what a Jupyter client writes", e);
        }
        if (properties == null || properties.getIp() == null || properties.getTransport() == null) {
            throw new IllegalArgumentException("names no ip and transport; expected what a Jupyter client writes");
        }
        if (properties.getKey() == null || properties.getSignatureScheme() == null) {
            throw new IllegalArgumentException(
                    "names no key and signature_scheme; expected what a Jupyter client writes");
        }
        List<Integer> ports = List.of(
                properties.getShellPort(),
                properties.getControlPort(),
                properties.getIopubPort(),
                properties.getStdinPort(),
                properties.getHbPort());
        for (int port : ports) {
            if (port < 1 || port > 65535) {
                throw new IllegalArgumentException("names port " + port + "; expected five ports from 1 to 65535");
            }
        }
        return properties;
    }

    /** The base library offers no way to set these; its fields are stable since 2019. */
    private static void pollFast(JupyterConnection connection) throws ReflectiveOperationException {
        Field sleep = ShellChannel.class.getDeclaredField("sleep");
        sleep.setAccessible(true);
        for (ShellChannel channel : channels(connection)) {
            sleep.setLong(channel, POLL_MILLIS);
        }
    }

    /** A message that cannot be read, or whose signature is wrong, is ignored; by itself it would end the channel. */
    private static void surviveBadMessages(JupyterConnection connection) throws ReflectiveOperationException {
        Field loop = ShellChannel.class.getDeclaredField("ioloop");
        loop.setAccessible(true);
        for (ShellChannel channel : channels(connection)) {
            ((Loop) loop.get(channel)).onError(e -> POLL_MILLIS);
        }
    }

    private static List<ShellChannel> channels(JupyterConnection connection) throws ReflectiveOperationException {
        Field shell = JupyterConnection.class.getDeclaredField("shell");
        Field control = JupyterConnection.class.getDeclaredField("control");
        shell.setAccessible(true);
        control.setAccessible(true);
        return List.of((ShellChannel) shell.get(connection), (ShellChannel) control.get(connection));
    }

    /** A client that dies without a word must not leave a kernel behind. */
    private static void endWithParent(CountDownLatch ended) {
        String parent = System.getenv("JPY_PARENT_PID");
        if (parent == null || !parent.matches("\\d{1,18}") || Long.parseLong(parent) <= 1) {
            return;
        }
        Optional<ProcessHandle> process = ProcessHandle.of(Long.parseLong(parent));
        if (process.isPresent()) {
            process.get().onExit().thenRun(ended::countDown);
        }
    }

    /** Clients that interrupt by a signal instead of a message would otherwise end the process. */
    private static void interruptOnSignal(Workbench workbench) {
        sun.misc.Signal.handle(new sun.misc.Signal("INT"), signal -> workbench.interrupt());
    }
}
