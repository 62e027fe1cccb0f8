package ladderwell.kernel.host;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Map;
import ladderwell.kernel.real.RealPrograms;
import ladderwell.kernel.real.RealPrograms.Outcome;
import org.junit.jupiter.api.BeforeEach;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** The kernel as Debian's Jupyter clients meet it. */
class RealClientTest {
    private static final Path PYTHON_TESTS = Path.of("src/test/python").toAbsolutePath();

    @TempDir
    private Path folder;

    private Map<String, String> environment;

    @BeforeEach
    void installKernel() throws Exception {
        RealPrograms.needPython("jupyter_client", "jupyter_kernel_test");
        environment = RealPrograms.installKernel(
                folder,
                "ladderwell-test",
                RealPrograms.java("ladderwell.kernel.host.SmallKernel", "{connection_file}"));
    }

    private Outcome python(String file) throws Exception {
        Outcome outcome = RealPrograms.run(
                environment,
                300,
                RealPrograms.PYTHON,
                PYTHON_TESTS.resolve(file).toString(),
                "-v");
        assertEquals(0, outcome.exitCode(), outcome.text());
        assertTrue(outcome.text().contains("\nOK"), outcome.text());
        return outcome;
    }

    @Test
    void debiansKernelTestPasses() throws Exception {
        Outcome outcome = python("test_ladderwell_kernel.py");
        // A pager is optional in the protocol; everything else must have run.
        assertTrue(outcome.text().contains("OK (skipped=1)"), outcome.text());
        assertTrue(outcome.text().contains("test_pager") && outcome.text().contains("skipped"), outcome.text());
    }

    @Test
    void whatTheProtocolAsksBesidesIsKept() throws Exception {
        Outcome outcome = python("test_protocol.py");
        outcome.text().lines().filter(line -> line.startsWith("measured:")).forEach(System.out::println);
    }

    @Test
    void theMainJobRunsInARealClient() throws Exception {
        environment = RealPrograms.installKernel(
                folder,
                "ladderwell-test",
                RealPrograms.java("ladderwell.kernel.command.Ladderwell", "kernel", "{connection_file}"));
        Outcome outcome = python("test_main_job.py");
        outcome.text().lines().filter(line -> line.startsWith("measured:")).forEach(System.out::println);
    }

    @Test
    void aWrongConnectionFileIsSaidInOneLine() throws Exception {
        Path broken = Files.writeString(folder.resolve("broken.json"), "{\"ip\": \"127.0.0.1\", ");
        Path empty = Files.writeString(folder.resolve("empty.json"), "{}");
        Path noPorts = Files.writeString(
                folder.resolve("no ports.json"),
                "{\"ip\": \"127.0.0.1\", \"transport\": \"tcp\", \"key\": \"k\", \"signature_scheme\": \"hmac-sha256\"}");
        for (Path file : new Path[] {broken, empty, noPorts, folder, folder.resolve("absent.json")}) {
            Outcome outcome = RealPrograms.run(
                    Map.of(),
                    60,
                    RealPrograms.java("ladderwell.kernel.host.SmallKernel", file.toString())
                            .toArray(String[]::new));
            assertEquals(2, outcome.exitCode(), outcome.text());
            assertEquals(1, outcome.text().lines().count(), outcome.text());
            assertTrue(outcome.text().startsWith("connection file " + file + ": "), outcome.text());
        }
    }

    @Test
    void aJavaWithoutShellIsSaidInOneLine() throws Exception {
        var command = RealPrograms.java("ladderwell.kernel.host.SmallKernel", "none.json");
        command.addAll(
                1,
                java.util.List.of(
                        "--limit-modules",
                        "java.base,java.logging,java.compiler,java.desktop,java.sql,jdk.unsupported"));
        Outcome outcome = RealPrograms.run(Map.of(), 60, command.toArray(String[]::new));
        assertEquals(2, outcome.exitCode(), outcome.text());
        assertEquals(1, outcome.text().lines().count(), outcome.text());
        assertTrue(outcome.text().contains("found Java " + Runtime.version()), outcome.text());
    }
}
