package ladderwell.packet;

/**
 * Evenly spaced positions, a power of two of them.
 *
 * @param left the first position
 * @param spacing distance of neighbours
 * @param points how many
 */
public record Grid(double left, double spacing, int points) {

    public Grid {
        if (!(spacing > 0) || !Double.isFinite(left) || !Double.isFinite(spacing * points)) {
            throw new IllegalArgumentException("a grid from " + left + " in steps of " + spacing + " is none");
        }
        if (points < 8 || Integer.bitCount(points) != 1) {
            throw new IllegalArgumentException("a grid has a power of two of points, not " + points);
        }
    }

    /** A grid that covers a range and waves up to a wave number. */
    static Grid covering(double left, double right, double wave) {
        double points = Math.max(64, (right - left) * wave / Math.PI);
        int size = Integer.highestOneBit((int) Math.min(points, 1 << 28) - 1) << 1;
        double middle = left + (right - left) / 2;
        double spacing = (right - left) / size;
        return new Grid(middle - size / 2 * spacing, spacing, size);
    }

    /** The positions. */
    public double[] positions() {
        double[] x = new double[points];
        for (int j = 0; j < points; j++) {
            x[j] = left + j * spacing;
        }
        return x;
    }

    /** The last position. */
    public double right() {
        return left + (points - 1) * spacing;
    }

    /** The wave number that belongs to place k of a transform. */
    double wave(int k) {
        int signed = k < points / 2 ? k : k - points;
        return 2 * Math.PI * signed / (points * spacing);
    }

    /** Twice as long, by as much on each side as asked for. */
    Grid longer(boolean onTheLeft, boolean onTheRight) {
        int before = onTheLeft && onTheRight ? points / 2 : onTheLeft ? points : 0;
        return new Grid(left - before * spacing, spacing, 2 * points);
    }

    /** Twice as fine. */
    Grid finer() {
        return new Grid(left, spacing / 2, 2 * points);
    }
}
