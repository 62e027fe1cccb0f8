package ladderwell.bench;

import java.util.concurrent.TimeUnit;
import ladderwell.numeric.ExactPhases;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Fork;
import org.openjdk.jmh.annotations.Measurement;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;
import org.openjdk.jmh.annotations.Warmup;

/** Coefficients of a coherent state in H = n(n-1)/2 at 1000 times: on a uniform grid, at irregular times, and with their means. */
@State(Scope.Thread)
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.MICROSECONDS)
@Warmup(iterations = 5, time = 1)
@Measurement(iterations = 5, time = 1)
@Fork(
        value = 1,
        jvmArgsAppend = {"--add-modules", "jdk.incubator.vector"})
public class ExactPhasesBenchmark {
    private final CoherentKerr kerr = new CoherentKerr();
    private final double[] irregular = kerr.times.clone();

    /** Checks the answer. */
    @Setup
    public void check() {
        irregular[500] += 1e-3;
        kerr.run();
        Checked.below("means of the coherent state", kerr.error(), 1e-13);
        boolean grid = phases(kerr.times).onUniformGrid();
        if (!grid || phases(irregular).onUniformGrid()) {
            throw new IllegalStateException("the grids are not what the benchmark is named after");
        }
    }

    private ExactPhases phases(double[] times) {
        return ExactPhases.of(kerr.energy, kerr.zero, kerr.coefficients, kerr.zero, times);
    }

    /** By the two-level table. */
    @Benchmark
    public double[][] uniformGrid() {
        phases(kerr.times).fill(0, kerr.times.length, kerr.re, kerr.im);
        return kerr.re;
    }

    /** One sine and cosine for each level and time. */
    @Benchmark
    public double[][] irregularTimes() {
        phases(irregular).fill(0, irregular.length, kerr.re, kerr.im);
        return kerr.re;
    }

    /** With ⟨x⟩, ⟨p⟩ and their variances. */
    @Benchmark
    public double[][] coefficientsAndMeans() {
        kerr.run();
        return kerr.re;
    }
}
