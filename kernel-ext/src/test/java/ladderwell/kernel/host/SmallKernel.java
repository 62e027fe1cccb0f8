package ladderwell.kernel.host;

import java.nio.file.Path;
import ladderwell.kernel.cell.SmallRenderer;
import ladderwell.kernel.cell.SmallSentences;

/** The kernel with a small language in place of the declarations, for tests with real clients. */
public final class SmallKernel {
    private SmallKernel() {}

    /** Serves the connection file named by the only argument. */
    public static void main(String[] arguments) {
        System.exit(KernelMain.serve(Path.of(arguments[0]), new SmallSentences(), new SmallRenderer(), idle -> {}));
    }
}
