package ladderwell.kernel.command;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Map;
import ladderwell.kernel.real.RealPrograms;
import ladderwell.kernel.real.RealPrograms.Outcome;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** The installed kernel in the classic notebook, in a real browser: run all, play, reload, a later cell alone. */
class LiveNotebookJarTest {
    @TempDir
    private Path folder;

    @Test
    void theNotebookLivesInTheClassicNotebook() throws Exception {
        RealPrograms.needPython("notebook", "selenium");
        RealPrograms.needProgram("/usr/bin/chromium");
        RealPrograms.needProgram("/usr/bin/chromedriver");
        Path prefix = folder.resolve("prefix");
        Outcome installed = RealPrograms.run(
                Map.of(),
                300,
                Path.of(System.getProperty("java.home"), "bin", "java").toString(),
                "-jar",
                Path.of("target/ladderwell.jar").toAbsolutePath().toString(),
                "install",
                "--prefix",
                prefix.toString());
        assertEquals(0, installed.exitCode(), installed.text());
        Path pictures = Files.createDirectories(Path.of("target/pictures"));
        Outcome live = RealPrograms.run(
                Map.of("JUPYTER_PATH", prefix.resolve("share/jupyter").toString()),
                900,
                RealPrograms.PYTHON,
                Path.of("src/test/python/live_notebook.py").toAbsolutePath().toString(),
                Path.of("../notebooks/how-classical-is-it.ipynb")
                        .toAbsolutePath()
                        .normalize()
                        .toString(),
                pictures.toAbsolutePath().toString());
        assertEquals(0, live.exitCode(), live.text());
    }
}
