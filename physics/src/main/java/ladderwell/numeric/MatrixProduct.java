package ladderwell.numeric;

/**
 * Real matrix products A B for one right factor B, packed once.
 *
 * <p>Rows of the product are computed in panels; each entry is summed in the same order whatever the number of threads.
 *
 * @accuracy each entry within (k+2) 2^-53 Σ_l |A_il B_lj|, k the number of rows of B
 */
public final class MatrixProduct {
    /**
     * Packs the right factor. The rows are copied.
     *
     * @shape right is [k][n], rows of equal length
     */
    public static MatrixProduct by(double[][] right) {
        throw new UnsupportedOperationException();
    }

    private MatrixProduct() {}

    /**
     * The product of left and the right factor.
     *
     * @shape left is [m][k]; the result is [m][n]
     */
    public double[][] of(double[][] left, Workers workers) {
        throw new UnsupportedOperationException();
    }
}
