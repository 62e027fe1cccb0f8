package ladderwell.bench;

import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import ladderwell.bench.Partner.Variant;
import ladderwell.bench.Task.Ours;
import ladderwell.bench.Task.Script;
import ladderwell.bench.Task.Work;

/**
 * Runs each task here and at its partner in turn, several times, and prints ratios of times: machines differ, and on a shared one the
 * times themselves wander; ratios taken in turn do not.
 */
public final class SideBySide {
    private static final long PAUSE_MILLIS = 120;

    private final Path scripts;
    private final int rounds;
    private final List<String> notes = new ArrayList<>();

    private SideBySide(Path scripts, int rounds) {
        this.scripts = scripts;
        this.rounds = rounds;
    }

    /** Arguments: folder of the Python scripts, number of rounds, and words; only tasks whose name has one of the words run (all without). */
    public static void main(String[] arguments) throws IOException, InterruptedException {
        SideBySide sides = new SideBySide(Path.of(arguments[0]), Integer.parseInt(arguments[1]));
        List<String> words = List.of(arguments).subList(2, arguments.length);
        System.out.printf(
                Locale.ROOT,
                "Java %s, vectors %s, %d processors%n%n",
                System.getProperty("java.version"),
                ModuleLayer.boot().findModule("jdk.incubator.vector").isPresent() ? "used" : "not used",
                Runtime.getRuntime().availableProcessors());
        System.out.printf(
                "%-66s %7s  %-26s %-26s %-17s %-13s%n",
                "task", "threads", "ours / NumPy", "ours / tuned NumPy", "errors", "goal");
        boolean all = true;
        for (Task task : Tasks.all()) {
            if (words.isEmpty() || words.stream().anyMatch(task.name()::contains)) {
                all &= sides.run(task);
            }
        }
        System.out.println();
        sides.notes.forEach(System.out::println);
        System.out.println("""

                Ratios of times, each the shortest of a sample: median over %d rounds taken in turn, range in brackets. NumPy is the fastest of its variants whose error is
                no more than 1000 times ours or 1e-10; a tuned variant (*) goes beyond ordinary craft and is no part of the goal.
                Errors: ours, then NumPy's, as the task's script defines them.""".formatted(sides.rounds));
        System.exit(all ? 0 : 1);
    }

    /** Times of one variant over the rounds. */
    private record Times(List<Double> milliseconds, double error) {}

    private boolean run(Task task) throws IOException, InterruptedException {
        Work work = task.work().get();
        warm(work.run());
        double error = work.error().getAsDouble();
        Map<String, Times> others = new LinkedHashMap<>();
        double[] ours = new double[rounds];
        if (task.other() instanceof Script script) {
            try (Partner partner = new Partner(scripts, script.command(), task.threads())) {
                note("OpenBLAS kernel: " + partner.blas());
                partner.sample();
                for (int round = 0; round < rounds; round++) {
                    for (Variant variant : partner.sample()) {
                        others.computeIfAbsent(variant.name(), name -> new Times(new ArrayList<>(), variant.error()))
                                .milliseconds()
                                .add(variant.milliseconds());
                    }
                    // Idle OpenBLAS threads spin for a while.
                    Thread.sleep(PAUSE_MILLIS);
                    ours[round] = milliseconds(work.run());
                }
            }
        } else if (task.other() instanceof Ours other) {
            Work small = other.work().get();
            warm(small.run());
            Times times = new Times(new ArrayList<>(), small.error().getAsDouble());
            others.put("ours", times);
            for (int round = 0; round < rounds; round++) {
                times.milliseconds().add(milliseconds(small.run()));
                ours[round] = milliseconds(work.run());
            }
        }
        double allowed = Math.max(1e-10, 1000 * error);
        Times plain = fastest(others, allowed, false);
        Times tuned = fastest(others, allowed, true);
        double[] ratios = ratios(ours, plain);
        boolean met = ratios[rounds / 2] <= task.goal() && error <= task.errorGoal();
        System.out.printf(
                Locale.ROOT,
                "%-66s %7d  %-26s %-26s %-17s %-13s%n",
                task.name(),
                task.threads(),
                shown(ratios),
                tuned == plain ? "" : shown(ratios(ours, tuned)),
                String.format(Locale.ROOT, "%.1e %.1e", error, plain.error()),
                String.format(Locale.ROOT, "%.3g %s", task.goal(), met ? "met" : "MISSED"));
        StringBuilder times = new StringBuilder("shortest runs in ms, " + task.name() + ", threads " + task.threads());
        times.append(String.format(Locale.ROOT, ": ours %.3g", median(ours)));
        others.forEach((name, of) -> times.append(String.format(Locale.ROOT, "; %s %.3g", name, median(of))));
        note(times.toString());
        return met;
    }

    private static double median(double[] values) {
        double[] sorted = values.clone();
        Arrays.sort(sorted);
        return sorted[sorted.length / 2];
    }

    private void note(String text) {
        if (!notes.contains(text)) {
            notes.add(text);
        }
    }

    private static Times fastest(Map<String, Times> variants, double allowedError, boolean withTuned) {
        Times best = null;
        for (Map.Entry<String, Times> variant : variants.entrySet()) {
            Times times = variant.getValue();
            boolean counts = (withTuned || !variant.getKey().startsWith("*")) && times.error() <= allowedError;
            if (counts && (best == null || median(times) < median(best))) {
                best = times;
            }
        }
        if (best == null) {
            throw new IllegalStateException("no variant of the partner reaches an error of " + allowedError);
        }
        return best;
    }

    private static double median(Times times) {
        return median(times.milliseconds().stream().mapToDouble(t -> t).toArray());
    }

    /** The ratios of each round, sorted. */
    private static double[] ratios(double[] ours, Times other) {
        double[] ratios = new double[ours.length];
        Arrays.setAll(ratios, round -> ours[round] / other.milliseconds().get(round));
        Arrays.sort(ratios);
        return ratios;
    }

    private static String shown(double[] sorted) {
        return String.format(
                Locale.ROOT, "%.3g (%.3g to %.3g)", sorted[sorted.length / 2], sorted[0], sorted[sorted.length - 1]);
    }

    private static void warm(Runnable run) {
        long start = System.nanoTime();
        for (int i = 0; i < 5 || (System.nanoTime() - start < 3_000_000_000L && i < 50_000); i++) {
            run.run();
        }
    }

    /** Shortest time of one run in a sample of at least 300 ms or three runs, as in partner.py: what the machine can do undisturbed. */
    private static double milliseconds(Runnable run) {
        double shortest = Double.POSITIVE_INFINITY;
        long start = System.nanoTime();
        for (int i = 0; i < 3 || System.nanoTime() - start < 300_000_000L; i++) {
            long before = System.nanoTime();
            run.run();
            shortest = Math.min(shortest, (System.nanoTime() - before) * 1e-6);
        }
        return shortest;
    }
}
