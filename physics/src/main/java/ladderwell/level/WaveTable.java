package ladderwell.level;

import java.util.TreeSet;
import ladderwell.evidence.Certainty;
import ladderwell.numeric.Interruption;

/** Several wave functions and their slopes at the nodes of Gauss rules over the cells they live on: matrix elements are sums over it. */
final class WaveTable {
    final double[] x;
    final double[] weight;
    final double[][] value;
    final double[][] slope;

    WaveTable(Wave[] waves) {
        TreeSet<Double> edges = new TreeSet<>();
        double largest = Double.NEGATIVE_INFINITY;
        for (Wave wave : waves) {
            if (wave.edge() != null && wave.from() == 0) {
                edges.add(wave.left() - wave.edge().width());
            }
            for (int i = wave.from(); i < wave.to(); i++) {
                edges.add(wave.cells()[i].a);
                edges.add(wave.cells()[i].b);
            }
            largest = Math.max(largest, wave.e());
        }
        double[] edge = edges.stream().mapToDouble(Double::doubleValue).toArray();
        int[] nodes = new int[edge.length - 1];
        int[] pieces = new int[edge.length - 1];
        int total = 0;
        Wave top = waves[0];
        for (Wave wave : waves) {
            if (wave.e() > top.e()) {
                top = wave;
            }
        }
        for (int i = 0; i < nodes.length; i++) {
            double r = (edge[i + 1] - edge[i]) / 2;
            double phase = r * Math.sqrt(Math.abs(largest - top.mean((edge[i] + edge[i + 1]) / 2)));
            int wanted = 18 + (int) (1.5 * phase);
            pieces[i] = (wanted + GaussRule.MOST - 1) / GaussRule.MOST;
            nodes[i] = Math.min(wanted, GaussRule.MOST);
            total += pieces[i] * nodes[i];
        }
        x = new double[total];
        weight = new double[total];
        int at = 0;
        for (int i = 0; i < nodes.length; i++) {
            double[][] rule = GaussRule.of(nodes[i]);
            double r = (edge[i + 1] - edge[i]) / (2 * pieces[i]);
            for (int piece = 0; piece < pieces[i]; piece++) {
                double centre = edge[i] + (2 * piece + 1) * r;
                for (int j = 0; j < nodes[i]; j++) {
                    x[at] = centre + r * rule[0][j];
                    weight[at++] = r * rule[1][j];
                }
            }
        }
        value = new double[waves.length][total];
        slope = new double[waves.length][total];
        double[] g = EtaSeries.room();
        double[] out = new double[2];
        for (int k = 0; k < waves.length; k++) {
            Interruption.check();
            for (int j = 0; j < total; j++) {
                waves[k].at(x[j], g, out);
                value[k][j] = out[0];
                slope[k][j] = out[1];
            }
        }
    }

    /** Σ w a b c. */
    double sum(double[] a, double[] b, double[] c) {
        double sum = 0;
        for (int j = 0; j < x.length; j++) {
            sum += weight[j] * a[j] * b[j] * c[j];
        }
        return sum;
    }

    /**
     * Elements of x, x², p and p² between levels.
     *
     * @param off estimated norm errors of the waves
     * @param even whether the waves are those of a half line
     */
    static Elements elements(long[] levels, Wave[] waves, double[] off, boolean even) {
        int size = levels.length;
        double[][][] m = new double[4][size][size];
        double[] errors = new double[4];
        if (size > 0) {
            new WaveTable(waves).fill(levels, m, off, errors, even);
        }
        return new Elements(levels, m[0], m[1], m[2], m[3], errors, Certainty.ESTIMATED);
    }

    private void fill(long[] levels, double[][][] m, double[] off, double[] errors, boolean even) {
        int size = levels.length;
        double[] ones = new double[x.length];
        double[] square = new double[x.length];
        for (int j = 0; j < ones.length; j++) {
            ones[j] = 1;
            square[j] = x[j] * x[j];
        }
        for (int i = 0; i < size; i++) {
            Interruption.check();
            for (int j = 0; j <= i; j++) {
                boolean same = ((levels[i] ^ levels[j]) & 1) == 0;
                if (!even || !same) {
                    m[0][i][j] = sum(value[i], value[j], x);
                    m[0][j][i] = m[0][i][j];
                    // ⟨i|p|j⟩ = −i ∫ φ_i φ_j′, made antisymmetric.
                    double p = i == j ? 0 : 0.5 * (sum(slope[i], value[j], ones) - sum(value[i], slope[j], ones));
                    m[2][i][j] = p;
                    m[2][j][i] = i == j ? 0 : -p;
                }
                if (!even || same) {
                    m[1][i][j] = sum(value[i], value[j], square);
                    m[1][j][i] = m[1][i][j];
                    m[3][i][j] = sum(slope[i], slope[j], ones);
                    m[3][j][i] = m[3][i][j];
                }
            }
        }
        for (int i = 0; i < size; i++) {
            double xx = sum(value[i], value[i], square);
            double pp = sum(slope[i], slope[i], ones);
            double part = 2 * off[i] + 4e-15;
            errors[0] = Math.max(errors[0], part * Math.sqrt(xx));
            errors[1] = Math.max(errors[1], 2 * part * xx);
            errors[2] = Math.max(errors[2], part * Math.sqrt(pp));
            errors[3] = Math.max(errors[3], 2 * part * pp);
        }
    }
}
