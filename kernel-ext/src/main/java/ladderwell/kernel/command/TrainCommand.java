package ladderwell.kernel.command;

import java.util.List;
import java.util.concurrent.Callable;
import picocli.CommandLine.Command;

/**
 * Starts a kernel in this process, works with it over its sockets as a client would; {@code install}
 * runs this to learn which classes a start needs.
 */
@Command(name = "train", hidden = true, description = "Start a kernel once and let it work; install does this.")
final class TrainCommand implements Callable<Integer> {
    /** A little of everything that a first cell may do. */
    private static final List<String> CELLS = List.of(
            """
            %%declare
            oscillator trap: harmonic, mass 40 u, frequency 1.2 MHz
            state psi: coherent in trap, mean 9.5, phase 30 deg
            evolve run: psi for 2 periods, frames 20
            table run: position, spread of position
            animate run
            """,
            "int one = 1; System.out.println(one); one + 1",
            "trap.coherent(4)",
            "%oscillator wrong: harmonic, mass -1 u");

    @Override
    public Integer call() throws Exception {
        try (TrainingClient client = TrainingClient.ofNewKernel()) {
            for (String cell : CELLS) {
                client.execute(cell);
            }
        }
        return 0;
    }
}
