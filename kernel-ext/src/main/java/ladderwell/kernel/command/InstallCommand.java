package ladderwell.kernel.command;

import java.io.IOException;
import java.io.PrintStream;
import java.net.URISyntaxException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.concurrent.Callable;
import org.jspecify.annotations.Nullable;
import picocli.CommandLine.Command;
import picocli.CommandLine.Option;

/** {@code ladderwell install}: makes the kernel known to Jupyter. */
@Command(
        name = "install",
        description = {
            "Register the kernel with Jupyter; the jar is copied, so the place it came from may go.",
            "To remove it again: jupyter kernelspec remove ladderwell"
        },
        mixinStandardHelpOptions = true)
final class InstallCommand implements Callable<Integer> {
    @Option(
            names = "--prefix",
            paramLabel = "DIR",
            description = "install into DIR/share/jupyter/kernels (default: the user's own Jupyter folder)")
    private @Nullable Path prefix;

    @Option(
            names = "--name",
            paramLabel = "NAME",
            defaultValue = "ladderwell",
            description = "the name of the kernel (default: ${DEFAULT-VALUE})")
    @SuppressWarnings("NullAway.Init")
    private String name;

    @Override
    public Integer call() throws CommandException {
        PrintStream say = System.err;
        if (!name.matches("[A-Za-z0-9._-]+")) {
            throw new CommandException(
                    "'" + name + "' is no name for a kernel; expected letters, digits, dots, '-' and '_'");
        }
        Path data = prefix == null
                ? JupyterFolder.ofUser(System.getenv(), System.getProperties())
                : prefix.resolve("share").resolve("jupyter");
        Path folder = data.toAbsolutePath().normalize().resolve("kernels").resolve(name);
        KernelSpec spec = KernelSpec.of(folder, name);
        try {
            spec.copyJar(ownJar());
            say.println("preparing a fast start…");
            boolean archived = StartupArchive.make(spec);
            spec.write(archived);
            say.println("installed kernel '" + name + "' in " + folder);
            if (!archived) {
                say.println("this Java made no class-data archive; the kernel works and starts about a second later");
            }
            return 0;
        } catch (IOException e) {
            throw new CommandException("cannot install into " + folder + ": " + RunCommand.reason(e), e);
        }
    }

    /** The jar that this very class came from. */
    static Path ownJar() throws CommandException {
        try {
            Path jar = Path.of(InstallCommand.class
                    .getProtectionDomain()
                    .getCodeSource()
                    .getLocation()
                    .toURI());
            if (Files.isRegularFile(jar)) {
                return jar;
            }
            throw new CommandException("install works from the built jar, not from classes in " + jar);
        } catch (URISyntaxException e) {
            throw new CommandException("the jar that is running cannot be found", e);
        }
    }
}
