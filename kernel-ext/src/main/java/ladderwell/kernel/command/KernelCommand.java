package ladderwell.kernel.command;

import java.nio.file.Path;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Parameters;

/** {@code ladderwell kernel FILE}, where it was not typed the way in which Jupyter types it. */
@Command(name = "kernel", description = "Start a kernel; Jupyter does this.", mixinStandardHelpOptions = true)
final class KernelCommand implements Callable<Integer> {
    @Parameters(paramLabel = "CONNECTION_FILE", description = "the file in which the client says where to connect")
    @SuppressWarnings("NullAway.Init")
    private Path connectionFile;

    @Override
    public Integer call() {
        return Ladderwell.serve(connectionFile);
    }
}
