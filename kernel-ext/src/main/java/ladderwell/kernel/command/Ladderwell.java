package ladderwell.kernel.command;

import java.nio.file.Path;
import ladderwell.kernel.host.KernelMain;
import ladderwell.kernel.magic.Declarations;
import ladderwell.kernel.render.Renderings;

/** The main class. Starting a kernel goes straight to it, without the parser of the command line. */
public final class Ladderwell {
    private Ladderwell() {}

    /** Runs a command and exits with its code. */
    public static void main(String[] arguments) {
        if (arguments.length == 2 && arguments[0].equals("kernel") && !arguments[1].startsWith("-")) {
            System.exit(serve(Path.of(arguments[1])));
        }
        System.exit(CommandTable.run(arguments));
    }

    /** Serves a kernel until it is shut down; why it could not be started is said on standard error. */
    static int serve(Path connectionFile) {
        return KernelMain.serve(connectionFile, new Declarations(), new Renderings(), Practice::startInBackground);
    }
}
