package ladderwell.bench;

import java.util.concurrent.TimeUnit;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Fork;
import org.openjdk.jmh.annotations.Measurement;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Param;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;
import org.openjdk.jmh.annotations.Warmup;

/** Means of a coherent state at 1000 times for several mean quanta; the work is 14 √mean levels. */
@State(Scope.Thread)
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.MICROSECONDS)
@Warmup(iterations = 5, time = 1)
@Measurement(iterations = 5, time = 1)
@Fork(
        value = 1,
        jvmArgsAppend = {"--add-modules", "jdk.incubator.vector"})
public class LadderSumsBenchmark {
    /** Mean quanta. */
    @Param({"1e2", "1e5", "1e8"})
    public double mean;

    private HarmonicLadder ladder = new HarmonicLadder(1e2);

    /** Checks the answer. */
    @Setup
    public void check() {
        ladder = new HarmonicLadder(mean);
        ladder.run();
        // The window ends 7 spreads from the mean, as stated: at 100 quanta its upper tail is about 1e-10.
        Checked.below("means of the coherent state", ladder.error(), 1e-9);
    }

    /** All times. */
    @Benchmark
    public double means() {
        ladder.run();
        return ladder.error();
    }
}
