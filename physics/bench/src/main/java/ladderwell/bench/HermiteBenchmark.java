package ladderwell.bench;

import java.util.Arrays;
import java.util.concurrent.TimeUnit;
import ladderwell.numeric.HermiteFunctions;
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

/** Oscillator wave functions: a table of low levels, one high level, a window of very high ones. */
@State(Scope.Thread)
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.MICROSECONDS)
@Warmup(iterations = 5, time = 1)
@Measurement(iterations = 5, time = 1)
@Fork(2)
public class HermiteBenchmark {
    private static final int LEVELS = 220;
    private static final int FAR = HermiteFunctions.LAST_INDEX - LEVELS + 1;

    private final double[] lowPoints = new double[600];
    private final double[] highPoints = new double[1000];
    private final double[] farPoints = new double[600];
    private final double[][] table = new double[LEVELS][lowPoints.length];

    @Setup
    public void pointsAndCheck() {
        double step = 48.0 / lowPoints.length;
        Arrays.setAll(lowPoints, j -> -24.0 + step / 2 + step * j);
        Arrays.setAll(highPoints, j -> 215.0 * j / (highPoints.length - 1));
        double edge = 1.002 * Math.sqrt(2.0 * HermiteFunctions.LAST_INDEX + 1.0);
        Arrays.setAll(farPoints, j -> edge * (2.0 * j / (farPoints.length - 1) - 1.0));

        // Levels below 200 end inside the box, and the trapezium rule is exact for them.
        double[][] low = tableOfLowLevels();
        HermiteFunctions.window(0, lowPoints, table);
        for (int m = 0; m < 200; m += 7) {
            for (int n = 0; n < 200; n++) {
                double overlap = 0.0;
                for (int j = 0; j < lowPoints.length; j++) {
                    overlap += low[m][j] * table[n][j] * step;
                }
                check(overlap, m == n ? 1.0 : 0.0, 1e-13, "overlap of levels " + m + " and " + n);
            }
        }
        double[] below = HermiteFunctions.single(19_999, highPoints);
        double[] at = oneHighLevel();
        double[] above = HermiteFunctions.single(20_001, highPoints);
        for (int j = 0; j < at.length; j++) {
            double stepped = Math.sqrt(2.0 / 20_001) * highPoints[j] * at[j] - Math.sqrt(20_000.0 / 20_001) * below[j];
            check(above[j], stepped, 1e-15, "level 20001 at " + highPoints[j]);
        }
        double[][] far = windowBelowOneMillion();
        double[] top = HermiteFunctions.single(HermiteFunctions.LAST_INDEX, farPoints);
        for (int j = 0; j < top.length; j++) {
            check(
                    far[LEVELS - 1][j],
                    top[j],
                    HermiteFunctions.errorBound(HermiteFunctions.LAST_INDEX),
                    "level 1000000 at " + farPoints[j]);
        }
    }

    private static void check(double found, double expected, double allowed, String what) {
        if (!(Math.abs(found - expected) <= allowed)) {
            throw new IllegalStateException(what + " is " + found + ", expected " + expected + " to " + allowed);
        }
    }

    /** 220 levels at 600 points, into a new table. */
    @Benchmark
    public double[][] tableOfLowLevels() {
        return HermiteFunctions.window(0, LEVELS, lowPoints);
    }

    /** The same into a table that is there: what an allocator that hands back the block just freed amounts to. */
    @Benchmark
    public double[][] tableOfLowLevelsReused() {
        HermiteFunctions.window(0, lowPoints, table);
        return table;
    }

    /** phi_20000 at 1000 points. */
    @Benchmark
    public double[] oneHighLevel() {
        return HermiteFunctions.single(20_000, highPoints);
    }

    /** The 220 levels up to 1000000 at 600 points. */
    @Benchmark
    public double[][] windowBelowOneMillion() {
        return HermiteFunctions.window(FAR, LEVELS, farPoints);
    }
}
