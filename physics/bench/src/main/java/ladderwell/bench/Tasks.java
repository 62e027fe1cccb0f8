package ladderwell.bench;

import java.util.List;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import java.util.function.Consumer;
import ladderwell.bench.Task.Ours;
import ladderwell.bench.Task.Script;
import ladderwell.bench.Task.Work;
import ladderwell.numeric.Workers;

/** The tasks of the side-by-side table. A new task is one entry here and, against NumPy, one script that ends in {@code serve}. */
final class Tasks {
    private Tasks() {}

    static List<Task> all() {
        return List.of(
                new Task(
                        "coefficients at 1000 times and means, 100 quanta, 220 levels",
                        1,
                        0.08,
                        1e-13,
                        Script.of("coefficients_and_means.py"),
                        () -> {
                            CoherentKerr kerr = new CoherentKerr();
                            return new Work(kerr::run, kerr::error);
                        }),
                densityFrames(1),
                densityFrames(2),
                new Task(
                        "oscillator functions 0 to 219 at 600 points",
                        1,
                        0.05,
                        1e-13,
                        Script.of("hermite_functions.py", "table"),
                        () -> {
                            OscillatorFunctions functions = new OscillatorFunctions();
                            return new Work(functions::table, functions::tableError);
                        }),
                new Task(
                        "oscillator function 20000 at 1000 points",
                        1,
                        0.03,
                        1e-13,
                        Script.of("hermite_functions.py", "single"),
                        () -> {
                            OscillatorFunctions functions = new OscillatorFunctions();
                            return new Work(functions::single, functions::singleError);
                        }),
                farUpTheLadder(),
                quartic("50 levels of p²/2 + x⁴", 0.10, "values", PotentialLevels::fifty),
                quartic(
                        "50 levels of p²/2 + x⁴ with vectors, ours with proofs",
                        0.20,
                        "vectors",
                        PotentialLevels::fiftyWithVectors),
                quartic("1000 levels of p²/2 + x⁴", 0.05, "thousand", PotentialLevels::thousand),
                new Task("all levels of a piecewise well", 1, 0.20, 1e-12, Script.of("piecewise_well.py"), () -> {
                    PotentialLevels levels = new PotentialLevels();
                    return new Work(levels::well, levels::wellError);
                }),
                farUpTheQuartic(),
                wigner("Wigner function, 201 × 201, pure state of 200 levels", 0.20, "pure", 200, 1),
                wigner("Wigner function, 201 × 201, density operator of 120 levels", 0.30, "mixed", 120, 6));
    }

    private static Task densityFrames(int threads) {
        return new Task(
                "density frames, 220 levels, 600 points, 400 times",
                threads,
                0.50,
                1e-13,
                Script.of("density_frames.py"),
                () -> {
                    RandomPacket packet = new RandomPacket();
                    Workers workers = threads == 1 ? Workers.CALLER : new Workers(pool(threads - 1), threads);
                    return new Work(() -> packet.run(workers), packet::error);
                });
    }

    /** The goal is the ratio of the windows; the partner is the same work at 100 quanta. */
    private static Task farUpTheLadder() {
        HarmonicLadder low = new HarmonicLadder(1e2);
        HarmonicLadder high = new HarmonicLadder(1e8);
        return new Task(
                "means at 1000 times, 1e8 quanta (" + high.levels + " levels) against 1e2 (" + low.levels + ")",
                1,
                (double) high.levels / low.levels,
                // The window ends 7 spreads from the mean, as stated: its tail is about 1e-12.
                1e-10,
                new Ours(() -> new Work(low::run, low::error)),
                () -> new Work(high::run, high::error));
    }

    private static Task quartic(String name, double goal, String variant, Consumer<PotentialLevels> run) {
        return new Task(name, 1, goal, 1e-12, Script.of("quartic_levels.py", variant), () -> {
            PotentialLevels levels = new PotentialLevels();
            return new Work(() -> run.accept(levels), levels::quarticError);
        });
    }

    /** One level alone, the partner is a low one. */
    private static Task farUpTheQuartic() {
        PotentialLevels low = new PotentialLevels();
        PotentialLevels high = new PotentialLevels();
        return new Task(
                "level 100000 of p²/2 + x⁴ alone, against level 100",
                1,
                5,
                // What the semiclassical series it is held against leaves open, with the scale taken from level 1000.
                1e-11,
                new Ours(() -> new Work(() -> low.alone(100), () -> low.aloneError(100))),
                () -> new Work(() -> high.alone(100_000), () -> high.aloneError(100_000)));
    }

    private static Task wigner(String name, double goal, String variant, int size, int rank) {
        return new Task(name, 1, goal, 1e-13, Script.of("wigner.py", variant), () -> {
            WignerGrid wigner = new WignerGrid(size, rank);
            return new Work(wigner::run, wigner::error);
        });
    }

    private static ExecutorService pool(int threads) {
        return Executors.newFixedThreadPool(threads, task -> {
            Thread thread = new Thread(task, "side-by-side worker");
            thread.setDaemon(true);
            return thread;
        });
    }
}
