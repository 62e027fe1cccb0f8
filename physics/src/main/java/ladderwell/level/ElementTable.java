package ladderwell.level;

/** Fills the four matrices of {@link Elements} by parity and books their errors. */
final class ElementTable {
    private final long[] levels;
    private final double[][] position;
    private final double[][] positionSquared;
    private final double[][] momentum;
    private final double[][] momentumSquared;

    ElementTable(long[] levels) {
        this.levels = levels;
        int size = levels.length;
        position = new double[size][size];
        positionSquared = new double[size][size];
        momentum = new double[size][size];
        momentumSquared = new double[size][size];
    }

    void diagonal(int i, double xx, double pp) {
        positionSquared[i][i] = xx;
        momentumSquared[i][i] = pp;
    }

    /** Opposite parity: ⟨i|x|j⟩ = x, ⟨i|p|j⟩ = i p. */
    void opposite(int i, int j, double x, double p) {
        position[i][j] = x;
        position[j][i] = x;
        momentum[i][j] = p;
        momentum[j][i] = -p;
    }

    /** Equal parity. */
    void equal(int i, int j, double xx, double pp) {
        positionSquared[i][j] = xx;
        positionSquared[j][i] = xx;
        momentumSquared[i][j] = pp;
        momentumSquared[j][i] = pp;
    }

    /**
     * @param relative guaranteed relative error of every element, the diagonals of x² and p² excepted
     * @param diagonal guaranteed absolute errors of the diagonals of x² and p²
     */
    Elements elements(double relative, double[] diagonal) {
        double[] errors = {
            relative * largest(position),
            Math.max(relative * largest(positionSquared), diagonal[0]),
            relative * largest(momentum),
            Math.max(relative * largest(momentumSquared), diagonal[1])
        };
        return new Elements(levels, position, positionSquared, momentum, momentumSquared, errors);
    }

    private static double largest(double[][] matrix) {
        double largest = 0;
        for (double[] row : matrix) {
            for (double value : row) {
                largest = Math.max(largest, Math.abs(value));
            }
        }
        return largest;
    }
}
