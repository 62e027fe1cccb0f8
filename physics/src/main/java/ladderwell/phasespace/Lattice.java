package ladderwell.phasespace;

/**
 * Evenly spaced positions: {@code origin + j · step} for j = from … to, and rows whose middles are the positions with j = firstRow +
 * r · rowStep, r = 0 … rows − 1.
 *
 * @param origin position of j = 0
 * @param step d
 * @param from least j
 * @param to greatest j
 * @param firstRow j of the middle of the first row
 * @param rowStep how many steps from row to row
 * @param rows how many rows
 * @param between how many rows from one position of the grid to the next
 * @param extra how many rows lie before the first position of the grid, and after the last
 */
record Lattice(
        double origin, double step, int from, int to, int firstRow, int rowStep, int rows, int between, int extra) {
    /** More samples than this are refused. */
    private static final double MOST = 2e7;

    private static final double FARTHEST = 5e8;

    /**
     * For a state within a support, with rows at the positions of a grid and {@code between} − 1 rows between neighbours, and further rows to
     * {@code margin} beyond its ends; so fine that no image of the momenta up to {@code blur} beyond the support falls on the grid.
     *
     * @param turn images lie this angle over d apart: π for sums over y, 2π for sums over x
     *
     * @throws IllegalArgumentException if that takes too many samples
     */
    static Lattice of(PhaseGrid grid, Support support, double margin, double rowSpacing, double turn, double blur) {
        double highest = Math.max(support.high() - grid.p(), grid.p() - support.low()) + blur;
        double wanted = turn / (grid.halfP() + highest);
        double h = grid.stepX();
        int between = (int) Math.ceil(Math.max(1, h / rowSpacing));
        double ratio = Math.ceil(h / between / wanted);
        // An even number of positions lies half a step beside the centre.
        double even = grid.nx() % 2 == 0 && (between % 2 == 1) ? 2 * Math.ceil(ratio / 2) : ratio;
        double samples = (support.right() - support.left()) / h * between * Math.max(1, even);
        if (!(samples < MOST)) {
            throw new IllegalArgumentException("a phase-space picture of a state that reaches over positions "
                    + (float) support.left() + " … " + (float) support.right() + " and momenta "
                    + (float) support.low() + " … " + (float) support.high() + " needs " + (long) samples
                    + " samples, at most " + (long) MOST + " are taken");
        }
        int each = (int) Math.max(1, even);
        int perGridStep = between * each;
        double d = h / perGridStep;
        int extra = (int) Math.ceil(margin / (h / between));
        int first = -(grid.nx() - 1) * perGridStep / 2 - extra * each;
        int rows = (grid.nx() - 1) * between + 1 + 2 * extra;
        double far =
                Math.max(Math.abs(support.left() - grid.x()), Math.abs(support.right() - grid.x())) + 2 * grid.halfX();
        if (!(far / d < FARTHEST)) {
            throw new IllegalArgumentException("the state lies too far beside the phase-space grid about position "
                    + (float) grid.x() + ": between " + (float) support.left() + " and " + (float) support.right());
        }
        int from = (int) Math.ceil((support.left() - grid.x()) / d);
        int to = (int) Math.floor((support.right() - grid.x()) / d);
        return new Lattice(grid.x(), d, from, Math.max(from, to), first, each, rows, between, extra);
    }

    /** Number of positions. */
    int points() {
        return to - from + 1;
    }

    /** The positions. */
    double[] positions() {
        double[] x = new double[points()];
        for (int j = from; j <= to; j++) {
            x[j - from] = origin + j * step;
        }
        return x;
    }

    /** j of the middle of a row. */
    int middle(int row) {
        return firstRow + row * rowStep;
    }

    /** How many k ≥ 0 have both positions of a row within the lattice. */
    int length(int row) {
        int middle = middle(row);
        return Math.max(0, Math.min(middle - from, to - middle) + 1);
    }
}
