package ladderwell.bench;

import java.util.Arrays;
import ladderwell.numeric.ExactPhases;
import ladderwell.numeric.LadderSums;
import ladderwell.numeric.Workers;

/** A coherent state of 100 quanta in H = n(n-1)/2 on 220 levels, over one period 2π at 1000 times. */
final class CoherentKerr {
    private static final double MEAN = 100;
    private static final int LEVELS = 220;
    private static final int TIMES = 1000;

    final double[] energy = new double[LEVELS];
    final double[] zero = new double[LEVELS];
    final double[] coefficients = coherent(MEAN, 0, LEVELS);
    final double[] times = new double[TIMES];
    final double[][] re = new double[TIMES][LEVELS];
    final double[][] im = new double[TIMES][LEVELS];
    private final double[] x = new double[TIMES];
    private final double[] p = new double[TIMES];
    private final double[] varianceX = new double[TIMES];
    private final double[] varianceP = new double[TIMES];

    CoherentKerr() {
        Arrays.setAll(energy, n -> 0.5 * n * (n - 1.0));
        Arrays.setAll(times, j -> j * (2 * Math.PI / TIMES));
    }

    /** Coefficients of a coherent state from the ratio of neighbours, normalised. */
    static double[] coherent(double mean, int first, int levels) {
        double[] c = new double[levels];
        int top = (int) mean - first;
        c[top] = 1;
        for (int k = top + 1; k < levels; k++) {
            c[k] = c[k - 1] * Math.sqrt(mean / ((double) first + k));
        }
        for (int k = top - 1; k >= 0; k--) {
            c[k] = c[k + 1] * Math.sqrt(((double) first + k + 1) / mean);
        }
        double norm = Math.sqrt(Arrays.stream(c).map(v -> v * v).sum());
        return Arrays.stream(c).map(v -> v / norm).toArray();
    }

    /** The whole task: coefficients at all times, means and variances of x and p. */
    void run() {
        ExactPhases phases = ExactPhases.of(energy, zero, coefficients, zero, times);
        LadderSums sums = LadderSums.of(phases, 0, re, im, Workers.CALLER);
        double root = Math.sqrt(2);
        for (int j = 0; j < TIMES; j++) {
            x[j] = root * sums.amplitudeRe(j);
            p[j] = root * sums.amplitudeIm(j);
            varianceX[j] = 0.5 + sums.fluctuation(j) + sums.squeezingRe(j);
            varianceP[j] = 0.5 + sums.fluctuation(j) - sums.squeezingRe(j);
        }
    }

    /**
     * Largest error of x and p over the amplitude √(2 mean), against ⟨a⟩ = √mean exp(mean (e^{-it} - 1)) (exact theory); the closed form
     * itself is right to about 2e-14 in double arithmetic.
     */
    double error() {
        double largest = 0;
        double size = Math.sqrt(2 * MEAN);
        for (int j = 0; j < TIMES; j++) {
            double half = Math.sin(times[j] / 2);
            double modulus = size * Math.exp(-2 * MEAN * half * half);
            double phase = -MEAN * Math.sin(times[j]);
            largest = Math.max(largest, Math.abs(x[j] - modulus * Math.cos(phase)));
            largest = Math.max(largest, Math.abs(p[j] - modulus * Math.sin(phase)));
            if (!(varianceX[j] > 0 && varianceP[j] > 0)) {
                throw new IllegalStateException("variance not positive at time " + j);
            }
        }
        return largest / size;
    }
}
