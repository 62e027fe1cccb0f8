package ladderwell.kernel.command;

import java.nio.file.Path;
import ladderwell.kernel.host.KernelMain;

/** The main class. Starting a kernel goes straight to it, without the parser of the command line. */
public final class Ladderwell {
    private Ladderwell() {}

    /** Runs a command and exits with its code. */
    public static void main(String[] arguments) {
        if (arguments.length == 2 && arguments[0].equals("kernel") && !arguments[1].startsWith("-")) {
            System.exit(KernelMain.serve(Path.of(arguments[1])));
        }
        System.exit(CommandTable.run(arguments));
    }
}
