package ladderwell.numeric;

/**
 * A right factor of matrix products, packed in panels of columns as {@link Loops#product} reads it, and in blocks of rows that fit the
 * first-level cache. Rows at the ends of a panel whose entries are all negligible are left out: functions of low levels vanish far from
 * the middle of the grid.
 */
final class PackedColumns {
    /** Rows per block: 256 rows of an 8-column panel are 16 kB. */
    private static final int DEPTH = 256;

    private final Loops loops;
    private final int depth;
    private final int panels;
    private final int blocks;
    private final double[][] data;
    private final int[] begin;
    private final double droppedNorm;

    /**
     * Packs entries rows[firstRow + l · rowStep][fromColumn + j] for j = 0 … columns-1 and all l.
     *
     * @param negligible entries up to this size may be left out at either end of a panel
     */
    PackedColumns(
            Loops loops, double[][] rows, int firstRow, int rowStep, int fromColumn, int columns, double negligible) {
        this.loops = loops;
        depth = rows.length <= firstRow ? 0 : (rows.length - firstRow + rowStep - 1) / rowStep;
        int width = loops.columns();
        panels = (columns + width - 1) / width;
        blocks = Math.max(1, (depth + DEPTH - 1) / DEPTH);
        data = new double[panels * blocks][];
        begin = new int[panels * blocks];
        double[] dropped = new double[columns];
        for (int panel = 0; panel < panels; panel++) {
            Interruption.check();
            int from = panel * width;
            int count = Math.min(width, columns - from);
            for (int block = 0; block < blocks; block++) {
                int low = block * DEPTH;
                int high = Math.min(depth, low + DEPTH);
                int keepFrom = low;
                while (keepFrom < high
                        && negligible(rows[firstRow + keepFrom * rowStep], fromColumn + from, count, negligible)) {
                    keepFrom++;
                }
                int keepTo = high;
                while (keepTo > keepFrom
                        && negligible(rows[firstRow + (keepTo - 1) * rowStep], fromColumn + from, count, negligible)) {
                    keepTo--;
                }
                double[] packed = new double[(keepTo - keepFrom) * width];
                for (int l = low; l < high; l++) {
                    double[] row = rows[firstRow + l * rowStep];
                    if (l >= keepFrom && l < keepTo) {
                        System.arraycopy(row, fromColumn + from, packed, (l - keepFrom) * width, count);
                    } else {
                        for (int j = 0; j < count; j++) {
                            double value = row[fromColumn + from + j];
                            dropped[from + j] += value * value;
                        }
                    }
                }
                data[panel * blocks + block] = packed;
                begin[panel * blocks + block] = keepFrom;
            }
        }
        double largest = 0;
        for (double square : dropped) {
            largest = Math.max(largest, square);
        }
        droppedNorm = Math.sqrt(largest) * (1 + 0x1p-40);
    }

    private static boolean negligible(double[] row, int from, int count, double bound) {
        for (int j = from; j < from + count; j++) {
            if (Math.abs(row[j]) > bound) {
                return false;
            }
        }
        return true;
    }

    /** The number of rows, those left out included. */
    int depth() {
        return depth;
    }

    int panels() {
        return panels;
    }

    /** The number of columns of all panels, padding included. */
    int paddedColumns() {
        return panels * loops.columns();
    }

    /** Bound on the 2-norm, over rows, of what was left out of any column. */
    double droppedNorm() {
        return droppedNorm;
    }

    /**
     * The product of {@link Loops#ROWS} rows and one panel.
     *
     * @shape left is [depth][ROWS] from leftAt; c is rows of {@code stride} from cAt, written over {@link Loops#columns} columns
     */
    void multiply(double[] left, int leftAt, int panel, double[] c, int cAt, int stride) {
        for (int block = 0; block < blocks; block++) {
            int index = panel * blocks + block;
            double[] packed = data[index];
            loops.product(
                    left,
                    leftAt + Loops.ROWS * begin[index],
                    packed,
                    0,
                    packed.length / loops.columns(),
                    block > 0,
                    c,
                    cAt,
                    stride);
        }
    }
}
