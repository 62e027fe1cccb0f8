package ladderwell.level;

import java.util.function.IntSupplier;

/**
 * Proved errors of the lowest eigenvalues of a band matrix that is cut out of an infinite one.
 *
 * <p>For a unit vector v in the basis, ‖(H − ρ)v‖ = r is computed exactly, border included: there is an eigenvalue within r of ρ
 * (Weinstein). Where {@link LevelCount} shows that only as many eigenvalues lie below some energy as there are disjoint such intervals, each
 * interval holds one and the index is proved; then the bounds of Kato and Temple, r²/gap, hold. Rounding is booked in
 * every step.
 */
final class BasisProof {
    private static final double UNIT = 0x1p-53;

    private final double[][] rows;
    private final double[][] sizes;
    private final int size;
    private final int width;
    private final double rounding;

    /** Rayleigh quotients, what rounding leaves open in them, and residuals of the levels added so far. */
    final double[] quotient;

    private final double[] slack;
    private final double[] residual;
    private final double[][] vectors;

    /** @param vectors any vectors near the eigenvectors: the nearer, the smaller the errors */
    BasisProof(double[][] rows, double[][] sizes, double elementRounding, double[] values, double[][] vectors) {
        this.rows = rows;
        this.sizes = sizes;
        size = rows[0].length;
        width = rows.length - 1;
        // Element, product, sums of the row and of its share in the quotient.
        rounding = elementRounding + (2 * width + 6) * UNIT;
        quotient = new double[values.length];
        slack = new double[values.length];
        residual = new double[values.length];
        this.vectors = vectors;
        for (int i = 0; i < values.length; i++) {
            measure(i, values[i]);
        }
    }

    private void measure(int i, double value) {
        double[] v = vectors[i];
        int all = size + width;
        double[] t = new double[all];
        double[] a = new double[all];
        for (int j = 0; j < size; j++) {
            t[j] = (rows[0][j] - value) * v[j];
            a[j] = (sizes[0][j] + Math.abs(value)) * Math.abs(v[j]);
        }
        for (int q = 1; q <= width; q++) {
            double[] row = rows[q];
            double[] big = sizes[q];
            for (int j = 0; j < size; j++) {
                t[j + q] += row[j] * v[j];
                a[j + q] += big[j] * Math.abs(v[j]);
            }
            for (int j = 0; j + q < size; j++) {
                t[j] += row[j] * v[j + q];
                a[j] += big[j] * Math.abs(v[j + q]);
            }
        }
        double norm = 0;
        double product = 0;
        double open = 0;
        double squares = 0;
        for (int j = 0; j < all; j++) {
            double error = rounding * a[j];
            double bound = Math.abs(t[j]) + error;
            squares += bound * bound;
            if (j < size) {
                norm += v[j] * v[j];
                product += v[j] * t[j];
                open += Math.abs(v[j]) * (error + (size + 4) * UNIT * Math.abs(t[j]));
            }
        }
        double low = norm * (1 - (size + 8) * UNIT);
        quotient[i] = value + product / norm;
        slack[i] = open / low * (1 + 0x1p-40) + 2 * UNIT * Math.abs(quotient[i]);
        residual[i] = Math.sqrt(squares / low) * (1 + (all + 8) * UNIT);
    }

    private double lower(int i) {
        return quotient[i] - residual[i] - slack[i];
    }

    private double upper(int i) {
        return quotient[i] + residual[i] + slack[i];
    }

    /** ‖Hv − ρv‖ of level i, an upper bound. */
    double residual(int i) {
        return residual[i];
    }

    /** Distance from level i to the nearest other one, from below. */
    double gap(int i, double next) {
        double above = (i + 1 < quotient.length ? lower(i + 1) : next) - quotient[i];
        return i > 0 ? Math.min(above, quotient[i] - upper(i - 1)) : above;
    }

    /**
     * Errors of the quotients, or an empty array where the index cannot be proved.
     *
     * @param next an energy below the first level left out, above all taken in
     * @param below proved bound of the number of levels below that energy
     */
    double[] errors(double next, IntSupplier below) {
        int count = quotient.length;
        for (int i = 0; i < count; i++) {
            boolean apart = i + 1 == count ? upper(i) < next : upper(i) < lower(i + 1);
            if (!apart) {
                return new double[0];
            }
        }
        if (below.getAsInt() > count) {
            return new double[0];
        }
        double[] errors = new double[count];
        for (int i = 0; i < count; i++) {
            double square = residual[i] * residual[i];
            double above = i + 1 < count ? lower(i + 1) : next;
            double down = square / (above - quotient[i] - slack[i]);
            // The lowest quotient is above its level without any gap.
            double up = i == 0 ? 0 : square / (quotient[i] - slack[i] - upper(i - 1));
            double simple = residual[i];
            errors[i] = (Math.min(Math.max(down, up), simple) + slack[i]) * (1 + 0x1p-40);
        }
        return errors;
    }
}
