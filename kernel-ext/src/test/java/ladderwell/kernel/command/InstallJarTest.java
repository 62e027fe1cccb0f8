package ladderwell.kernel.command;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.google.gson.JsonArray;
import com.google.gson.JsonElement;
import com.google.gson.JsonObject;
import com.google.gson.JsonParser;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.stream.Stream;
import ladderwell.kernel.real.RealPrograms;
import ladderwell.kernel.real.RealPrograms.Outcome;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** The packaged jar, away from the source tree: it installs itself, and Jupyter's clients run what it installed. */
class InstallJarTest {
    private static final String JAVA =
            Path.of(System.getProperty("java.home"), "bin", "java").toString();

    private static final Path NOTEBOOK =
            Path.of("../notebooks/how-classical-is-it.ipynb").toAbsolutePath().normalize();

    @TempDir
    private static Path folder;

    private static Path jar;
    private static Path prefix;
    private static Path kernel;

    @BeforeAll
    static void installFromACopyElsewhere() throws Exception {
        Path built = Path.of("target/ladderwell.jar").toAbsolutePath();
        assertTrue(Files.exists(built), "these tests need the packaged jar: mvn verify");
        jar = Files.createDirectories(folder.resolve("else where ä")).resolve("lädderwell copy.jar");
        Files.copy(built, jar);
        prefix = folder.resolve("pre fix é");
        kernel = prefix.resolve("share/jupyter/kernels/ladderwell");
        Outcome outcome = java("-jar", jar.toString(), "install", "--prefix", prefix.toString());
        assertEquals(0, outcome.exitCode(), outcome.text());
        assertTrue(outcome.text().contains("installed kernel 'ladderwell' in " + kernel), outcome.text());
        // The kernel must live without the place it came from.
        Files.delete(jar);
    }

    private static Outcome java(String... arguments) throws Exception {
        List<String> command = new ArrayList<>(List.of(JAVA));
        command.addAll(List.of(arguments));
        return RealPrograms.run(Map.of(), 300, command.toArray(String[]::new));
    }

    private static List<String> argv() throws Exception {
        return argv(kernel);
    }

    private static List<String> argv(Path kernel) throws Exception {
        JsonObject spec = JsonParser.parseString(Files.readString(kernel.resolve("kernel.json")))
                .getAsJsonObject();
        List<String> argv = new ArrayList<>();
        for (JsonElement word : spec.getAsJsonArray("argv")) {
            argv.add(word.getAsString());
        }
        return argv;
    }

    private static Map<String, String> jupyter(Path data) {
        return Map.of("JUPYTER_PATH", data.toString(), "PYTHONDONTWRITEBYTECODE", "1");
    }

    @Test
    void theFolderHoldsAllThatJupyterNeeds() throws Exception {
        try (Stream<Path> files = Files.list(kernel)) {
            assertEquals(
                    List.of(
                            "kernel.json",
                            "ladderwell.jar",
                            "ladderwell.jsa",
                            "logo-32x32.png",
                            "logo-64x64.png",
                            "logo-svg.svg"),
                    files.map(file -> file.getFileName().toString()).sorted().toList());
        }
        JsonObject spec = JsonParser.parseString(Files.readString(kernel.resolve("kernel.json")))
                .getAsJsonObject();
        assertEquals("Ladderwell", spec.get("display_name").getAsString());
        assertEquals("java", spec.get("language").getAsString());
        assertEquals("message", spec.get("interrupt_mode").getAsString());
        List<String> argv = argv();
        assertEquals(JAVA, argv.get(0));
        assertEquals(
                List.of("-jar", kernel.resolve("ladderwell.jar").toString(), "kernel", "{connection_file}"),
                argv.subList(argv.size() - 4, argv.size()));
    }

    /** The start command, with the log of loaded classes, on a connection file that is not there. */
    private static Outcome startInVain(String... more) throws Exception {
        List<String> command = new ArrayList<>(argv());
        command.addAll(1, List.of(more));
        command.set(command.size() - 1, folder.resolve("absent.json").toString());
        return RealPrograms.run(Map.of(), 60, command.toArray(String[]::new));
    }

    @Test
    void theArchiveIsUsed() throws Exception {
        // Java 17 passes over archived classes of a jar whose path holds blanks or letters outside ASCII.
        Path plain = folder.resolve("plain");
        Outcome installed =
                java("-jar", kernel.resolve("ladderwell.jar").toString(), "install", "--prefix", plain.toString());
        assertEquals(0, installed.exitCode(), installed.text());
        Path log = folder.resolve("classes.log");
        List<String> command = argv(plain.resolve("share/jupyter/kernels/ladderwell"));
        command.set(command.size() - 1, folder.resolve("absent.json").toString());
        // -Xlog:disable must come first, or it would take back this log.
        command.add(command.indexOf("-jar"), "-Xlog:class+load=info:file=" + log);
        Outcome outcome = RealPrograms.run(Map.of(), 60, command.toArray(String[]::new));
        assertEquals(2, outcome.exitCode(), outcome.text());
        List<String> own = Files.readAllLines(log).stream()
                .filter(line -> line.contains(" ladderwell.kernel.host.KernelMain source:"))
                .toList();
        assertEquals(1, own.size());
        assertTrue(own.get(0).contains("shared objects file (top)"), own.get(0));
    }

    @Test
    void anArchiveThatDoesNotFitIsPassedOverInSilence() throws Exception {
        Path junk = Files.writeString(folder.resolve("junk.jsa"), "junk");
        Outcome good = startInVain();
        List<String> command = new ArrayList<>(argv());
        command.replaceAll(word -> word.startsWith("-XX:SharedArchiveFile=") ? "-XX:SharedArchiveFile=" + junk : word);
        command.set(command.size() - 1, folder.resolve("absent.json").toString());
        Outcome junked = RealPrograms.run(Map.of(), 60, command.toArray(String[]::new));
        assertEquals(good.text(), junked.text());
        assertEquals(good.exitCode(), junked.exitCode());
    }

    @Test
    void nbconvertExecutesTheShippedNotebook() throws Exception {
        RealPrograms.needPython("nbconvert", "nbclient");
        Path output = folder.resolve("converted.ipynb");
        Outcome outcome = RealPrograms.run(
                jupyter(prefix.resolve("share/jupyter")),
                300,
                RealPrograms.PYTHON,
                "-m",
                "nbconvert",
                "--to",
                "notebook",
                "--execute",
                "--output",
                output.toString(),
                NOTEBOOK.toString());
        assertEquals(0, outcome.exitCode(), outcome.text());
        // The same cells give the same kinds of outputs as our own runner stores.
        Path own = folder.resolve("own.ipynb");
        Outcome run = java(
                "-jar",
                kernel.resolve("ladderwell.jar").toString(),
                "run",
                NOTEBOOK.toString(),
                "--output",
                own.toString());
        assertEquals(0, run.exitCode(), run.text());
        assertEquals(shape(output), shape(own));
    }

    /** Of every cell its count, and of every output its type, its MIME types and its plain text but for times taken. */
    private static List<String> shape(Path notebook) throws Exception {
        List<String> shape = new ArrayList<>();
        JsonObject json = JsonParser.parseString(Files.readString(notebook)).getAsJsonObject();
        for (JsonElement cell : json.getAsJsonArray("cells")) {
            JsonObject object = cell.getAsJsonObject();
            shape.add(object.get("id").getAsString() + " " + object.get("execution_count"));
            JsonArray outputs = object.has("outputs") ? object.getAsJsonArray("outputs") : new JsonArray();
            for (JsonElement output : outputs) {
                JsonObject data = output.getAsJsonObject().getAsJsonObject("data");
                shape.add(output.getAsJsonObject().get("output_type").getAsString() + " " + data.keySet() + " "
                        + String.valueOf(data.get("text/plain")).replaceAll("[\\d.]+ (?:ms|s|µs)\\b", "…"));
            }
        }
        return shape;
    }

    @Test
    void aSecondInstallUnderAnotherNameLeavesTheFirst() throws Exception {
        Path own = kernel.resolve("ladderwell.jar");
        Outcome outcome =
                java("-jar", own.toString(), "install", "--prefix", prefix.toString(), "--name", "ladderwell-two");
        assertEquals(0, outcome.exitCode(), outcome.text());
        Outcome again =
                java("-jar", own.toString(), "install", "--prefix", prefix.toString(), "--name", "ladderwell-two");
        assertEquals(0, again.exitCode(), again.text());
        RealPrograms.needPython("jupyter_client");
        Outcome list = RealPrograms.run(
                jupyter(prefix.resolve("share/jupyter")),
                60,
                RealPrograms.PYTHON,
                "-m",
                "jupyter_client.kernelspecapp",
                "list");
        assertTrue(list.text().contains("ladderwell-two"), list.text());
        assertTrue(list.text().matches("(?s).*ladderwell\\s.*"), list.text());
    }

    @Test
    void aJavaWithoutItsShellIsSaidInOneLine() throws Exception {
        Outcome outcome = java(
                "--limit-modules",
                "java.base,java.logging,java.desktop",
                "-jar",
                kernel.resolve("ladderwell.jar").toString(),
                "--version");
        assertEquals(3, outcome.exitCode());
        assertEquals(1, outcome.text().lines().count(), outcome.text());
        assertTrue(
                outcome.text()
                        .startsWith("ladderwell: a full JDK is needed, with the module jdk.jshell; this is Java "),
                outcome.text());
    }

    @Test
    void theVersionIsThatOfTheJar() throws Exception {
        Outcome outcome = java("-jar", kernel.resolve("ladderwell.jar").toString(), "--version");
        assertEquals(0, outcome.exitCode());
        assertTrue(outcome.text().matches("Ladderwell \\d+\\.\\d+\\.\\d+ on Java \\S+\\R"), outcome.text());
        assertFalse(outcome.text().contains("unpackaged"));
    }

    @Test
    void anInstallToAPlaceThatIsNoFolderIsRefused() throws Exception {
        Path file = Files.writeString(folder.resolve("a file"), "");
        Outcome outcome =
                java("-jar", kernel.resolve("ladderwell.jar").toString(), "install", "--prefix", file.toString());
        assertEquals(2, outcome.exitCode());
        assertEquals(1, outcome.text().lines().count(), outcome.text());
        assertTrue(outcome.text().startsWith("ladderwell: cannot install into "), outcome.text());
    }
}
