package ladderwell.numeric;

/**
 * Nodes and weights of the Gauss–Legendre rule on [−1, 1], by Newton's iteration on the Legendre polynomial in double-double: each is
 * right to its last place.
 */
public final class LegendreRule {
    private LegendreRule() {}

    /** {nodes, weights} of the rule with n nodes, n even; a new pair each time. */
    public static double[][] of(int n) {
        double[] nodes = new double[n];
        double[] weights = new double[n];
        for (int i = 0; i < n / 2; i++) {
            // Tricomi's start, a few digits; Newton doubles them.
            DoubleDouble x = DoubleDouble.of(-Math.cos(Math.PI * (i + 0.75) / (n + 0.5)));
            DoubleDouble slope = DoubleDouble.ONE;
            for (int step = 0; step < 6; step++) {
                DoubleDouble before = DoubleDouble.ONE;
                DoubleDouble value = x;
                for (int k = 2; k <= n; k++) {
                    DoubleDouble next = x.times(value)
                            .times(2 * k - 1)
                            .minus(before.times(k - 1))
                            .dividedBy(k);
                    before = value;
                    value = next;
                }
                // (x² − 1) P_n′ = n (x P_n − P_{n−1})
                slope = x.times(value)
                        .minus(before)
                        .times(n)
                        .dividedBy(x.times(x).minus(DoubleDouble.ONE));
                x = x.minus(value.dividedBy(slope));
            }
            DoubleDouble weight = DoubleDouble.of(2)
                    .dividedBy(DoubleDouble.ONE.minus(x.times(x)).times(slope).times(slope));
            nodes[i] = x.value();
            weights[i] = weight.value();
            nodes[n - 1 - i] = -nodes[i];
            weights[n - 1 - i] = weights[i];
        }
        return new double[][] {nodes, weights};
    }
}
