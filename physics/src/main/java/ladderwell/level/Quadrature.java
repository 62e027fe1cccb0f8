package ladderwell.level;

import java.util.function.DoubleUnaryOperator;
import ladderwell.evidence.Bound;

/** ⟨m|f|n⟩ from tables of wave functions, for levels that have nothing better. */
final class Quadrature {
    private static final int NODES = 24;

    private Quadrature() {}

    static Levels.Element element(Levels levels, long m, long n, DoubleUnaryOperator f) {
        double reach = Math.max(levels.reach(m, 1e-17), levels.reach(n, 1e-17));
        double wave = Math.sqrt(2 * Math.max(levels.energyHigh(Math.max(m, n)), 0)) + 1 / reach;
        if (!(wave * reach < 1e5)) {
            throw new IllegalArgumentException("elements of a function between levels " + m + " and " + n
                    + " are computed as long as they have fewer than 100000 radians, got " + wave * reach);
        }
        // Edges at the walls of box and well, panels of about six radians each.
        double[] edges = reach > 0.5 ? new double[] {-reach, -0.5, 0, 0.5, reach} : new double[] {-reach, 0, reach};
        double fine = sum(levels, m, n, f, edges, wave, 6);
        double coarse = sum(levels, m, n, f, edges, wave, 9);
        double size = sumOfSizes(levels, m, n, f, edges, wave);
        double error = levels.waveFunctionError(Math.max(m, n));
        return new Levels.Element(fine, Bound.estimated(Math.abs(fine - coarse) + size * (1e-15 + 2 * error)));
    }

    private static double sumOfSizes(
            Levels levels, long m, long n, DoubleUnaryOperator f, double[] edges, double wave) {
        return sum(levels, m, m, x -> Math.abs(f.applyAsDouble(x)), edges, wave, 6)
                + sum(levels, n, n, x -> Math.abs(f.applyAsDouble(x)), edges, wave, 6);
    }

    private static double sum(
            Levels levels, long m, long n, DoubleUnaryOperator f, double[] edges, double wave, double radians) {
        double[][] rule = GaussRule.of(NODES);
        double total = 0;
        for (int i = 0; i + 1 < edges.length; i++) {
            double length = edges[i + 1] - edges[i];
            int panels = 1 + (int) (length * wave / radians);
            double r = length / (2 * panels);
            double[] x = new double[panels * NODES];
            for (int panel = 0; panel < panels; panel++) {
                for (int j = 0; j < NODES; j++) {
                    x[panel * NODES + j] = edges[i] + r * (2 * panel + 1 + rule[0][j]);
                }
            }
            double[] a = levels.waveFunctions(m, 1, x)[0];
            double[] b = m == n ? a : levels.waveFunctions(n, 1, x)[0];
            double sum = 0;
            for (int j = 0; j < x.length; j++) {
                double value = f.applyAsDouble(x[j]);
                if (Double.isNaN(value)) {
                    throw new IllegalArgumentException("the function is not a number at x = " + x[j]);
                }
                sum += rule[1][j % NODES] * a[j] * b[j] * value;
            }
            total += sum * r;
        }
        return total;
    }
}
