package ladderwell.kernel.command;

import java.io.PrintWriter;
import picocli.CommandLine;
import picocli.CommandLine.Command;
import picocli.CommandLine.Model.CommandSpec;
import picocli.CommandLine.ParameterException;
import picocli.CommandLine.Spec;
import picocli.CommandLine.UnmatchedArgumentException;

/** The commands and what they have in common: version, help, and mistakes said in one sentence. */
@Command(
        name = "ladderwell",
        description = "A Java notebook kernel for oscillator physics.",
        mixinStandardHelpOptions = true,
        versionProvider = CommandTable.Version.class,
        subcommands = {RunCommand.class, InstallCommand.class, KernelCommand.class, TrainCommand.class},
        footerHeading = "%n",
        footer = "Exit codes: 0 done, 1 a cell failed, 2 the command or a file is wrong, 130 interrupted.")
final class CommandTable implements Runnable {
    /** The command or a file it names is wrong. */
    static final int WRONG = CommandLine.ExitCode.USAGE;

    @Spec
    @SuppressWarnings("NullAway.Init") // set by picocli before anything runs
    private CommandSpec spec;

    private CommandTable() {}

    static int run(String... arguments) {
        return line().execute(arguments);
    }

    /** The parser of the command line. */
    static CommandLine line() {
        CommandLine line = new CommandLine(new CommandTable());
        line.setParameterExceptionHandler(CommandTable::mistyped);
        line.setExecutionExceptionHandler((error, command, parsed) -> {
            if (error instanceof CommandException) {
                command.getErr().println("ladderwell: " + error.getMessage());
                return WRONG;
            }
            throw error;
        });
        return line;
    }

    private static int mistyped(ParameterException mistake, String[] arguments) {
        CommandLine command = mistake.getCommandLine();
        PrintWriter err = command.getErr();
        boolean unknownCommand = mistake instanceof UnmatchedArgumentException && command.getParent() == null;
        String message = unknownCommand
                ? "there is no command " + String.join(" ", arguments) + "; expected run, install or kernel"
                : String.valueOf(mistake.getMessage());
        err.println(
                "ladderwell: " + message + " (see '" + command.getCommandSpec().qualifiedName() + " --help')");
        return WRONG;
    }

    @Override
    public void run() {
        throw new ParameterException(spec.commandLine(), "a command is missing: run, install or kernel");
    }

    /** The line that {@code --version} prints. */
    static final class Version implements CommandLine.IVersionProvider {
        @Override
        public String[] getVersion() {
            return new String[] {line()};
        }

        static String line() {
            String version = CommandTable.class.getPackage().getImplementationVersion();
            return "Ladderwell " + (version == null ? "(unpackaged)" : version) + " on Java "
                    + System.getProperty("java.version");
        }
    }
}
