package ladderwell.kernel.command;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.TimeUnit;

/**
 * The class-data archive of an installed kernel. It is made by starting the kernel once as Jupyter would and letting it
 * work ({@link TrainCommand}); a Java that it does not fit ignores it. Java 17 finds in it only the classes of the JDK
 * where the path of the jar holds blanks or letters outside ASCII; 25 finds all.
 */
final class StartupArchive {
    private static final long LONGEST_SECONDS = 180;

    private static final int ATTEMPTS = 2;

    private StartupArchive() {}

    /** The flags of a start that uses the archive; silent where it does not fit. */
    static List<String> use(Path archive) {
        return List.of("-Xshare:auto", "-XX:SharedArchiveFile=" + archive, "-Xlog:disable");
    }

    /** Makes the archive; false where this Java cannot, or ends abnormally while it writes it, twice. */
    static boolean make(KernelSpec spec) throws IOException {
        for (int attempt = 0; attempt < ATTEMPTS; attempt++) {
            if (attempt(spec)) {
                return true;
            }
        }
        return false;
    }

    private static boolean attempt(KernelSpec spec) throws IOException {
        Path part = spec.folder().resolve("ladderwell.jsa.part");
        Path log = Files.createTempFile("ladderwell-install", ".log");
        try {
            Files.deleteIfExists(part);
            List<String> command =
                    new ArrayList<>(spec.start(List.of("-Xshare:auto", "-XX:ArchiveClassesAtExit=" + part)));
            command.add("train");
            Process process = new ProcessBuilder(command)
                    .redirectErrorStream(true)
                    .redirectOutput(log.toFile())
                    .start();
            process.getOutputStream().close();
            if (!process.waitFor(LONGEST_SECONDS, TimeUnit.SECONDS)) {
                process.destroyForcibly();
                throw new IOException("the kernel did not end its first run within " + LONGEST_SECONDS + " s");
            }
            if (process.exitValue() > 128) {
                // killed by a signal: a crash of the virtual machine while it dumped, not of the kernel
                return false;
            }
            if (process.exitValue() != 0) {
                throw new IOException("the kernel failed its first run: "
                        + Files.readString(log)
                                .strip()
                                .lines()
                                .reduce((a, b) -> b)
                                .orElse("no message"));
            }
            if (!Files.exists(part)) {
                return false;
            }
            Files.move(part, spec.archive(), StandardCopyOption.REPLACE_EXISTING);
            return true;
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
            throw new IOException("interrupted", e);
        } finally {
            Files.deleteIfExists(log);
            Files.deleteIfExists(part);
        }
    }
}
