package ladderwell.numeric;

/**
 * Real matrix products A B for one right factor B, packed once.
 *
 * <p>Each entry is summed in the same order, in ascending l, whatever the number of threads.
 *
 * @accuracy each entry within (k+1) 2^-53 Σ_l |A_il B_lj| (1 + 1e-12), k the number of rows of B
 */
public final class MatrixProduct {
    /** Rows of a panel: with them a packed right factor is read from the second-level cache eight times less often. */
    private static final int PANEL_ROWS = 8 * Loops.ROWS;

    private final int columns;
    private final PackedColumns right;

    /**
     * Packs the right factor. The rows are copied.
     *
     * @shape right is [k][n]
     * @throws IllegalArgumentException if rows differ in length
     */
    public static MatrixProduct by(double[][] right) {
        return new MatrixProduct(Loops.chosen(), right);
    }

    MatrixProduct(Loops loops, double[][] right) {
        columns = right.length == 0 ? 0 : right[0].length;
        for (int l = 0; l < right.length; l++) {
            if (right[l].length != columns) {
                throw new IllegalArgumentException(
                        "row " + l + " of the right factor has " + right[l].length + " entries, expected " + columns);
            }
        }
        // Nothing but exact zeros is left out.
        this.right = new PackedColumns(loops, right, 0, 1, 0, columns, 0);
    }

    /**
     * The product of left and the right factor.
     *
     * @shape left is [m][k]; the result is [m][n]
     * @throws IllegalArgumentException if a row of left does not have k entries
     * @throws java.util.concurrent.CancellationException if the thread is interrupted
     */
    public double[][] of(double[][] left, Workers workers) {
        int depth = right.depth();
        for (int i = 0; i < left.length; i++) {
            if (left[i].length != depth) {
                throw new IllegalArgumentException("row " + i + " of the left factor has " + left[i].length
                        + " entries, expected " + depth + " (the rows of the right factor)");
            }
        }
        double[][] result = new double[left.length][columns];
        int panels = (left.length + PANEL_ROWS - 1) / PANEL_ROWS;
        workers.forEach(panels, panel -> {
            int from = panel * PANEL_ROWS;
            panel(left, from, Math.min(left.length, from + PANEL_ROWS), result);
        });
        return result;
    }

    private void panel(double[][] left, int from, int to, double[][] result) {
        int depth = right.depth();
        int strips = (to - from + Loops.ROWS - 1) / Loops.ROWS;
        double[] packed = new double[strips * Loops.ROWS * depth];
        for (int i = from; i < to; i++) {
            double[] row = left[i];
            int at = (i - from) / Loops.ROWS * Loops.ROWS * depth + (i - from) % Loops.ROWS;
            for (int l = 0; l < depth; l++) {
                packed[at + Loops.ROWS * l] = row[l];
            }
        }
        int stride = right.paddedColumns();
        int width = stride / Math.max(1, right.panels());
        double[] c = new double[strips * Loops.ROWS * stride];
        for (int p = 0; p < right.panels(); p++) {
            Interruption.check();
            for (int s = 0; s < strips; s++) {
                right.multiply(packed, s * Loops.ROWS * depth, p, c, s * Loops.ROWS * stride + p * width, stride);
            }
        }
        for (int i = from; i < to; i++) {
            System.arraycopy(c, (i - from) * stride, result[i], 0, columns);
        }
    }
}
