package ladderwell.bench;

import java.util.concurrent.TimeUnit;
import ladderwell.numeric.MatrixProduct;
import ladderwell.numeric.Workers;
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

/** Density frames of 220 levels on 600 points at 400 times, and the bare matrix product of that size, one thread. */
@State(Scope.Thread)
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.MICROSECONDS)
@Warmup(iterations = 5, time = 1)
@Measurement(iterations = 5, time = 1)
@Fork(
        value = 1,
        jvmArgsAppend = {"--add-modules", "jdk.incubator.vector"})
public class DensityFramesBenchmark {
    private final RandomPacket packet = new RandomPacket();
    private final MatrixProduct functions = MatrixProduct.by(packet.functions);

    /** Checks the answer. */
    @Setup
    public void check() {
        packet.run(Workers.CALLER);
        Checked.below("densities", packet.error(), 1e-13);
        double[][] product = functions.of(packet.re, Workers.CALLER);
        double sum = 0;
        for (int k = 0; k < packet.functions.length; k++) {
            sum += packet.re[7][k] * packet.functions[k][300];
        }
        Checked.below("an entry of the product", Math.abs(product[7][300] - sum), 1e-13);
    }

    /** With parity. */
    @Benchmark
    public void frames() {
        packet.run(Workers.CALLER);
    }

    /** 400 × 220 by 220 × 600, half the arithmetic of frames without parity. */
    @Benchmark
    public double[][] product() {
        return functions.of(packet.re, Workers.CALLER);
    }
}
