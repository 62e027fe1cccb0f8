package ladderwell.level;

import java.util.concurrent.ConcurrentHashMap;

/** Gauss–Legendre rules on [−1, 1], by Newton's iteration, kept once made. */
final class GaussRule {
    static final int MOST = 256;

    private static final ConcurrentHashMap<Integer, double[][]> KNOWN = new ConcurrentHashMap<>();

    private GaussRule() {}

    /** {nodes, weights} with n points. */
    static double[][] of(int n) {
        return KNOWN.computeIfAbsent(n, GaussRule::make);
    }

    private static double[][] make(int n) {
        double[] x = new double[n];
        double[] w = new double[n];
        for (int i = 0; i < n; i++) {
            double t = Math.cos(Math.PI * (i + 0.75) / (n + 0.5));
            double slope = 1;
            for (int step = 0; step < 8; step++) {
                double before = 1;
                double value = t;
                for (int k = 2; k <= n; k++) {
                    double next = ((2 * k - 1) * t * value - (k - 1) * before) / k;
                    before = value;
                    value = next;
                }
                slope = n * (t * value - before) / (t * t - 1);
                t -= value / slope;
            }
            x[i] = t;
            w[i] = 2 / ((1 - t * t) * slope * slope);
        }
        return new double[][] {x, w};
    }
}
