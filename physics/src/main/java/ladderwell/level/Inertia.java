package ladderwell.level;

/** Sylvester's law: as many eigenvalues of a symmetric band matrix lie below x as the pivots of A − x that are negative. */
final class Inertia {
    private Inertia() {}

    /**
     * @param rows rows[q][j] = A(j, j + q)
     * @return {number of negative pivots, distance of the matrix they belong to exactly from A − x}
     */
    static double[] negative(double[][] rows, int size, double x) {
        int width = rows.length - 1;
        double[][] work = new double[width + 1][];
        for (int q = 0; q <= width; q++) {
            work[q] = rows[q].clone();
        }
        double[] grown = new double[size];
        int count = 0;
        double largest = 0;
        for (int j = 0; j < size; j++) {
            double pivot = work[0][j] - x;
            largest = Math.max(largest, Math.abs(work[0][j]) + Math.abs(x));
            if (pivot == 0) {
                return new double[] {count, Double.POSITIVE_INFINITY};
            }
            if (pivot < 0) {
                count++;
            }
            int last = Math.min(width, size - 1 - j);
            for (int q = 1; q <= last; q++) {
                double factor = work[q][j] / pivot;
                double column = Math.abs(work[q][j]);
                for (int r = q; r <= last; r++) {
                    double change = factor * work[r][j];
                    work[r - q][j + q] -= change;
                    grown[j + q] += Math.abs(change);
                    if (r > q) {
                        grown[j + r] += Math.abs(change);
                    }
                }
                grown[j + q] += column;
                grown[j] += column;
            }
        }
        for (double row : grown) {
            largest = Math.max(largest, row);
        }
        // Each element is made by at most width updates of three roundings; their sizes are in the row sums.
        return new double[] {count, (3 * width + 6) * 0x1p-53 * 2 * largest};
    }
}
