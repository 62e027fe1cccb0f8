package ladderwell.kernel.command;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.attribute.FileTime;
import java.nio.file.attribute.PosixFilePermissions;
import java.time.Instant;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.concurrent.CompletableFuture;
import ladderwell.kernel.real.RealPrograms;
import ladderwell.kernel.real.RealPrograms.Outcome;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** {@code kernel-ext/bin/ladderwell} in a copy of the tree's outline, with stand-ins for Java and Maven. */
class ScriptTest {
    private static final String JAVA_17 = """
            #!/bin/sh
            if [ "$1" = -version ]; then
                echo 'openjdk version "17.0.9" 2023-10-17' >&2
            else
                printf '%s|' "$@"
                exit 7
            fi
            """;

    private static final String MAVEN = """
            #!/bin/sh
            echo "$@" >>"$BUILDS"
            sleep 1
            mkdir -p "$TREE/kernel-ext/target"
            echo jar >"$TREE/kernel-ext/target/ladderwell.jar"
            """;

    @TempDir
    private Path folder;

    private Path tree;
    private Path script;
    private Path programs;
    private final Map<String, String> environment = new HashMap<>();

    @BeforeEach
    void makeTree() throws Exception {
        tree = Files.createDirectories(folder.resolve("my cläne $tree"));
        for (String source : List.of("physics/src/main/java/A.java", "kernel-ext/src/main/java/B.java")) {
            Path file = tree.resolve(source);
            Files.createDirectories(file.getParent());
            Files.writeString(file, "class");
        }
        for (String pom : List.of("pom.xml", "physics/pom.xml", "kernel-ext/pom.xml")) {
            Files.writeString(tree.resolve(pom), "<project/>");
        }
        script = tree.resolve("kernel-ext/bin/ladderwell");
        Files.createDirectories(script.getParent());
        Files.copy(Path.of("bin/ladderwell"), script);
        programs = Files.createDirectories(folder.resolve("programs"));
        for (String tool : List.of(
                "sh",
                "sed",
                "head",
                "tail",
                "cat",
                "find",
                "mkdir",
                "mv",
                "rm",
                "touch",
                "dirname",
                "readlink",
                "sleep",
                "kill")) {
            for (String place : List.of("/bin/", "/usr/bin/")) {
                if (Files.exists(Path.of(place + tool))) {
                    program(tool, "#!/bin/sh\nexec " + place + tool + " \"$@\"\n");
                }
            }
        }
        program("java", JAVA_17);
        program("mvn", MAVEN);
        environment.put("PATH", programs.toString());
        environment.put("JAVA_HOME", "");
        environment.put("LADDERWELL_JAVA_OPTIONS", "");
        environment.put("TREE", tree.toString());
        environment.put("BUILDS", folder.resolve("builds").toString());
    }

    private void program(String name, String text) throws IOException {
        Path file = Files.writeString(programs.resolve(name), text);
        Files.setPosixFilePermissions(file, PosixFilePermissions.fromString("rwxr-xr-x"));
    }

    private Outcome run(Path command, String... arguments) throws Exception {
        String[] words = new String[arguments.length + 1];
        words[0] = command.toString();
        System.arraycopy(arguments, 0, words, 1, arguments.length);
        return RealPrograms.run(environment, 60, words);
    }

    private int builds() throws IOException {
        Path builds = folder.resolve("builds");
        return Files.exists(builds) ? Files.readAllLines(builds).size() : 0;
    }

    private void makeJar() throws IOException {
        Path jar = tree.resolve("kernel-ext/target/ladderwell.jar");
        Files.createDirectories(jar.getParent());
        Files.writeString(jar, "jar");
        Files.setLastModifiedTime(jar, FileTime.from(Instant.now().plusSeconds(60)));
    }

    @Test
    void aMissingJarIsBuiltAndTheArgumentsArriveAsTheyAre() throws Exception {
        Outcome outcome = run(script, "run", "a b.ipynb", "--html", "ü *.html");
        assertEquals(7, outcome.exitCode(), "the exit code is Java's");
        assertTrue(outcome.text().startsWith("ladderwell: building…\n"), outcome.text());
        assertTrue(
                outcome.text()
                        .endsWith("-jar|" + tree.resolve("kernel-ext/target/ladderwell.jar")
                                + "|run|a b.ipynb|--html|ü *.html|"),
                outcome.text());
        assertEquals(1, builds());
    }

    @Test
    void aJarThatIsNewerThanEverythingIsUsedAsItIs() throws Exception {
        makeJar();
        assertTrue(run(script).text().startsWith("-XX:"));
        assertEquals(0, builds());
    }

    @Test
    void aSecondStartBuildsNothing() throws Exception {
        run(script);
        run(script);
        assertEquals(1, builds());
    }

    @Test
    void anEditedAnAddedAndARemovedSourceAllMakeTheJarStale() throws Exception {
        Path edited = tree.resolve("physics/src/main/java/A.java");
        run(script);
        Files.writeString(edited, "class again");
        run(script);
        assertEquals(2, builds());
        Files.writeString(tree.resolve("kernel-ext/src/main/java/C.java"), "class");
        run(script);
        assertEquals(3, builds());
        Files.delete(tree.resolve("kernel-ext/src/main/java/C.java"));
        run(script);
        assertEquals(4, builds());
        Files.writeString(tree.resolve("physics/pom.xml"), "<project></project>");
        run(script);
        assertEquals(5, builds());
    }

    @Test
    void itWorksThroughLinksAndFromAnywhere() throws Exception {
        makeJar();
        Path far = Files.createDirectories(folder.resolve("far/bin"));
        Files.createSymbolicLink(far.resolve("one"), far.relativize(script));
        Path two = Files.createSymbolicLink(folder.resolve("two words"), far.resolve("one"));
        Outcome outcome = run(two, "--version");
        assertTrue(
                outcome.text().contains("-jar|" + tree.resolve("kernel-ext/target/ladderwell.jar") + "|--version|"),
                outcome.text());
    }

    @Test
    void concurrentFirstStartsBuildOnce() throws Exception {
        CompletableFuture<?>[] starts = new CompletableFuture<?>[4];
        for (int i = 0; i < starts.length; i++) {
            starts[i] = CompletableFuture.runAsync(() -> {
                try {
                    Outcome outcome = run(script, "--version");
                    assertEquals(7, outcome.exitCode(), outcome.text());
                } catch (Exception e) {
                    throw new IllegalStateException(e);
                }
            });
        }
        CompletableFuture.allOf(starts).join();
        assertEquals(1, builds());
    }

    @Test
    void theLockOfABuildThatDiedIsTakenOver() throws Exception {
        Process gone = new ProcessBuilder("true").start();
        gone.waitFor();
        Path lock = Files.createDirectories(tree.resolve("kernel-ext/target/.ladderwell-building"));
        Files.writeString(lock.resolve("owner"), gone.pid() + "\n");
        assertEquals(7, run(script).exitCode());
        assertEquals(1, builds());
        assertTrue(!Files.exists(lock));
    }

    private void assertRefused(String message) throws Exception {
        Outcome outcome = run(script, "--version");
        assertEquals("ladderwell: " + message + "\n", outcome.text());
        assertEquals(3, outcome.exitCode());
    }

    @Test
    void aMissingJavaIsSaidInOneLine() throws Exception {
        Files.delete(programs.resolve("java"));
        assertRefused("there is no java; install a JDK of version 17 or newer, or set JAVA_HOME");
    }

    @Test
    void aWrongJavaHomeIsSaidInOneLine() throws Exception {
        environment.put("JAVA_HOME", "/nowhere at all");
        assertRefused("JAVA_HOME is /nowhere at all, but there is no bin/java in it");
    }

    @Test
    void javaHomeComesBeforeThePath() throws Exception {
        makeJar();
        Path home = Files.createDirectories(folder.resolve("jdk home/bin"));
        Files.copy(programs.resolve("java"), home.resolve("java"));
        program("java", "#!/bin/sh\nexit 9\n");
        environment.put("JAVA_HOME", home.getParent().toString());
        assertEquals(7, run(script).exitCode());
    }

    @Test
    void anOldJavaIsSaidInOneLine() throws Exception {
        program("java", "#!/bin/sh\necho 'java version \"1.8.0_392\"' >&2\n");
        assertRefused("Java 17 or newer is needed; " + programs.resolve("java") + " is Java 1.8.0_392");
        program("java", "#!/bin/sh\necho 'openjdk version \"11\" 2018-09-25' >&2\n");
        assertRefused("Java 17 or newer is needed; " + programs.resolve("java") + " is Java 11");
    }

    @Test
    void aProgramThatIsNoJavaIsSaidInOneLine() throws Exception {
        program("java", "#!/bin/sh\necho nonsense\n");
        assertRefused(programs.resolve("java") + " does not say which version of Java it is");
    }

    @Test
    void aNewJavaOfAnyFormIsTaken() throws Exception {
        makeJar();
        for (String version : List.of("17", "21-ea", "25.0.1+8", "26")) {
            program("java", JAVA_17.replace("17.0.9", version));
            assertEquals(7, run(script).exitCode(), version);
        }
    }

    @Test
    void aMissingMavenIsSaidInOneLine() throws Exception {
        Files.delete(programs.resolve("mvn"));
        assertRefused("there is no mvn; install Maven 3.8 or newer to build "
                + tree.resolve("kernel-ext/target/ladderwell.jar"));
    }

    @Test
    void aFailedBuildShowsItsEndAndLeavesNoLock() throws Exception {
        program("mvn", "#!/bin/sh\necho it went wrong here\nexit 1\n");
        Outcome outcome = run(script);
        assertEquals(3, outcome.exitCode());
        assertTrue(outcome.text().contains("it went wrong here\n"), outcome.text());
        assertTrue(outcome.text().contains("the build failed; all of its output is in "), outcome.text());
        assertTrue(!Files.exists(tree.resolve("kernel-ext/target/.ladderwell-building")));
    }

    @Test
    void moreOptionsForJavaAreTaken() throws Exception {
        makeJar();
        environment.put("LADDERWELL_JAVA_OPTIONS", "-Xmx8g -Da=b");
        assertTrue(run(script).text().contains("|-Xmx8g|-Da=b|-jar|"));
    }
}
