package ladderwell.bench;

import java.util.Arrays;
import ladderwell.numeric.ExactPhases;
import ladderwell.numeric.LadderSums;
import ladderwell.numeric.Workers;

/** A coherent state of any mean in H = n + 1/2, in a window of 14 √mean levels, at 1000 times of three periods. */
final class HarmonicLadder {
    private static final int TIMES = 1000;

    final double mean;
    final int first;
    final int levels;
    private final double[] energy;
    private final double[] zero;
    private final double[] coefficients;
    private final double[] times = new double[TIMES];
    private double error;

    HarmonicLadder(double mean) {
        this.mean = mean;
        levels = (int) Math.round(14 * Math.sqrt(mean));
        first = (int) Math.max(0, Math.round(mean - levels / 2.0));
        energy = new double[levels];
        zero = new double[levels];
        Arrays.setAll(energy, k -> first + k + 0.5);
        coefficients = CoherentKerr.coherent(mean, first, levels);
        Arrays.setAll(times, j -> j * (6 * Math.PI / TIMES));
    }

    /** Means of x and p at all times. */
    void run() {
        LadderSums sums = LadderSums.of(ExactPhases.of(energy, zero, coefficients, zero, times), first, Workers.CALLER);
        double amplitude = Math.sqrt(mean);
        error = 0;
        for (int j = 0; j < TIMES; j++) {
            error = Math.max(error, Math.abs(sums.amplitudeRe(j) / amplitude - Math.cos(times[j])));
            error = Math.max(error, Math.abs(sums.amplitudeIm(j) / amplitude + Math.sin(times[j])));
        }
    }

    /** Largest error of ⟨a⟩ over √mean, against √mean e^{-it}; the cut at 7 spreads leaves about 1e-11. */
    double error() {
        return error;
    }
}
