package ladderwell.kernel.real;

import static org.junit.jupiter.api.Assertions.fail;
import static org.junit.jupiter.api.Assumptions.abort;

import java.io.File;
import java.io.IOException;
import java.io.InputStream;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.concurrent.TimeUnit;

/**
 * Programs from outside that some tests drive: Debian's Python with Jupyter, a browser. Where one is missing, the test
 * is skipped and says so; with LADDERWELL_REAL_CLIENTS=required (environment, or a system property of that name) it
 * fails instead.
 */
public final class RealPrograms {
    /** Debian's Python; another one may come first on the path. */
    public static final String PYTHON = "/usr/bin/python3";

    private RealPrograms() {}

    /** Skips or fails the test unless Debian's Python can import all these modules. */
    public static void needPython(String... modules) throws IOException, InterruptedException {
        if (!Files.isExecutable(Path.of(PYTHON))) {
            missing(PYTHON + " is missing");
        }
        Outcome outcome = run(Map.of(), 60, PYTHON, "-c", "import " + String.join(", ", modules));
        if (outcome.exitCode() != 0) {
            missing(PYTHON + " lacks one of " + String.join(", ", modules));
        }
    }

    /** Skips or fails the test unless the program exists at that path. */
    public static void needProgram(String path) {
        if (!Files.isExecutable(Path.of(path))) {
            missing(path + " is missing");
        }
    }

    private static void missing(String what) {
        String wanted = System.getProperty("LADDERWELL_REAL_CLIENTS", System.getenv("LADDERWELL_REAL_CLIENTS"));
        String message = "real client not tested: " + what;
        if ("required".equals(wanted)) {
            fail(message);
        }
        System.out.println("SKIPPED: " + message);
        abort(message);
    }

    /**
     * What a program left behind.
     *
     * @param exitCode its exit code
     * @param text what it printed, both streams together
     */
    public record Outcome(int exitCode, String text) {}

    /** Runs a program to its end; one that takes longer is ended, with what it started, and the test fails. */
    public static Outcome run(Map<String, String> environment, int seconds, String... command)
            throws IOException, InterruptedException {
        ProcessBuilder builder = new ProcessBuilder(command).redirectErrorStream(true);
        builder.environment().putAll(environment);
        File printed = File.createTempFile("ladderwell", ".txt");
        try {
            Process process = builder.redirectOutput(printed).start();
            process.getOutputStream().close();
            if (!process.waitFor(seconds, TimeUnit.SECONDS)) {
                process.descendants().forEach(ProcessHandle::destroyForcibly);
                process.destroyForcibly().waitFor();
                fail(command[0] + " took over " + seconds + " s:\n" + read(printed));
            }
            return new Outcome(process.exitValue(), read(printed));
        } finally {
            Files.deleteIfExists(printed.toPath());
        }
    }

    private static String read(File file) throws IOException {
        try (InputStream in = Files.newInputStream(file.toPath())) {
            return new String(in.readAllBytes(), StandardCharsets.UTF_8);
        }
    }

    /** The command that starts a class of the test class path with the Java that runs the tests. */
    public static List<String> java(String mainClass, String... arguments) {
        List<String> command = new ArrayList<>(List.of(
                Path.of(System.getProperty("java.home"), "bin", "java").toString(),
                "-XX:+UseSerialGC",
                "-cp",
                System.getProperty("surefire.test.class.path", System.getProperty("java.class.path")),
                mainClass));
        command.addAll(List.of(arguments));
        return command;
    }

    /**
     * Puts a kernel where clients find it.
     *
     * @param folder an empty folder
     * @param name the kernel's name
     * @param command what starts it; {@code {connection_file}} stands for the connection file
     * @return the environment to give to clients
     */
    public static Map<String, String> installKernel(Path folder, String name, List<String> command) throws IOException {
        Path kernel = Files.createDirectories(folder.resolve("kernels").resolve(name));
        StringBuilder argv = new StringBuilder();
        for (String word : command) {
            argv.append(argv.length() == 0 ? "" : ", ")
                    .append('"')
                    .append(word.replace("\\", "\\\\").replace("\"", "\\\""))
                    .append('"');
        }
        Files.writeString(
                kernel.resolve("kernel.json"),
                "{\"argv\": [" + argv + "], \"display_name\": \"" + name
                        + "\", \"language\": \"java\", \"interrupt_mode\": \"message\"}");
        return Map.of("JUPYTER_PATH", folder.toString(), "PYTHONDONTWRITEBYTECODE", "1");
    }
}
