package ladderwell.phasespace;

/**
 * Evenly spaced points of phase space: nx positions by np momenta about a centre.
 *
 * @param x position of the centre
 * @param p momentum of the centre
 * @param halfX distance of the outermost positions from the centre
 * @param halfP distance of the outermost momenta from the centre
 * @param nx number of positions, at least 2
 * @param np number of momenta, at least 2
 * @units scaled
 */
public record PhaseGrid(double x, double p, double halfX, double halfP, int nx, int np) {
    /** More points than this on a side are no picture any more. */
    public static final int MOST = 20_001;

    public PhaseGrid {
        if (!Double.isFinite(x) || !Double.isFinite(p)) {
            throw new IllegalArgumentException("the centre of a phase-space grid must be finite, not " + x + ", " + p);
        }
        if (!(halfX > 0 && halfP > 0) || Double.isInfinite(halfX) || Double.isInfinite(halfP)) {
            throw new IllegalArgumentException(
                    "a phase-space grid reaches by positive, finite distances, not by " + halfX + " and " + halfP);
        }
        if (nx < 2 || np < 2 || nx > MOST || np > MOST) {
            throw new IllegalArgumentException(
                    "a phase-space grid has 2 to " + MOST + " points on a side, not " + nx + " and " + np);
        }
    }

    /** The square grid about the origin that reaches to ±half on both axes. */
    public static PhaseGrid square(double half, int points) {
        return new PhaseGrid(0, 0, half, half, points, points);
    }

    /**
     * A grid over a box with a margin of a twentieth around it, so fine that fringes between its opposite ends show as far as {@code most} points on a
     * side allow, and with at least {@code least}; an odd number of points.
     */
    public static PhaseGrid covering(Support box, int least, int most) {
        double halfX = 0.55 * (box.right() - box.left());
        double halfP = 0.55 * (box.high() - box.low());
        // Fringes between ends of the box are π over its width apart: four points to each.
        double wanted = 1 + 4 * (2 * halfX) * (2 * halfP) / Math.PI / 1.21;
        int points = (int) Math.max(least, Math.min(most, wanted)) | 1;
        return new PhaseGrid(
                box.left() + (box.right() - box.left()) / 2,
                box.low() + (box.high() - box.low()) / 2,
                halfX,
                halfP,
                points,
                points);
    }

    /** Whether the fringes of a state that fills a box are seen: two points at least to each. */
    public boolean resolves(Support box) {
        return stepX() * (box.high() - box.low()) <= Math.PI / 2 * 1.01
                && stepP() * (box.right() - box.left()) <= Math.PI / 2 * 1.01;
    }

    /** Distance of neighbouring positions. */
    public double stepX() {
        return 2 * halfX / (nx - 1);
    }

    /** Distance of neighbouring momenta. */
    public double stepP() {
        return 2 * halfP / (np - 1);
    }

    /** The i-th position. */
    public double position(int i) {
        return x + halfX * (2 * i - (nx - 1)) / (nx - 1);
    }

    /** The j-th momentum. */
    public double momentum(int j) {
        return p + halfP * (2 * j - (np - 1)) / (np - 1);
    }

    /** Area of one cell. */
    public double cell() {
        return stepX() * stepP();
    }
}
