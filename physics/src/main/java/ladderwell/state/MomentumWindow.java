package ladderwell.state;

/**
 * The levels of a box or well whose wave numbers lie about the momentum of a packet, and proved bounds of the rest.
 *
 * <p>A packet inside the walls has |c_n|² ≤ 2 G² e^{−2σ²(k_n − |p|)²}, G = (8πσ²)^{1/4}. Wave numbers obey nπ ≤ k_n ≤ (n+1)π, with the upper
 * end taken in the box. Above the window the terms (n+1)^j e^{…} fall faster than a geometric series, below it the e^{…} do.
 */
final class MomentumWindow {
    private static final double OUTWARD = 1 + 1e-9;

    /** Windows above this size are refused: two arrays of 160 MB. */
    private static final double LARGEST = 2e7;

    private final double sigma;
    private final double momentum;

    /** 2 G². */
    private final double weight;

    /** k_n ≥ nπ + offset. */
    private final double offset;

    private long first;
    private long last;
    private final double[] moments = new double[Amplitudes.MOMENTS];
    private double sum;

    /**
     * @param levels number of levels there are
     * @param offset k_n ≥ nπ + offset
     * @param weightAllowed discarded weight allowed at each side
     */
    MomentumWindow(GaussianPacket packet, long levels, double offset, double weightAllowed) {
        sigma = packet.width();
        momentum = Math.abs(packet.momentum());
        double reach = packet.reach();
        weight = 2 * reach * reach;
        this.offset = offset;
        double spread = Math.sqrt(Math.log(weight / Math.min(weightAllowed, weight / 4)) / 2) / sigma;
        if (2 * spread / Math.PI > LARGEST) {
            throw new IllegalArgumentException("a packet of spread " + sigma + " needs about "
                    + Math.round(2 * spread / Math.PI) + " levels, at most 20000000 are carried");
        }
        last = (long) ((momentum + spread) / Math.PI) + 1;
        long step = Math.max(1, (long) (spread / 100));
        while (last < levels - 1 && !above(last + 1, weightAllowed)) {
            last += step;
        }
        last = Math.min(last, levels - 1);
        first = Math.min(last, (long) Math.max(0, (momentum - spread) / Math.PI - 1));
        while (first > 0 && !below(first - 1, weightAllowed)) {
            first = Math.max(0, first - step);
        }
    }

    private MomentumWindow(long levels) {
        sigma = 0;
        momentum = 0;
        weight = 0;
        offset = 0;
        last = levels - 1;
    }

    /** All levels there are. */
    static MomentumWindow all(long levels) {
        return new MomentumWindow(levels);
    }

    int size() {
        return Math.toIntExact(last - first + 1);
    }

    long first() {
        return first;
    }

    /** Bounds of Σ (n+1)^j |c_n|² over the levels outside. */
    double[] moments() {
        return moments;
    }

    /** Bound of Σ |c_n| over the levels outside. */
    double sum() {
        return sum;
    }

    /** Bounds the levels from n up; true when their weight is small enough. */
    private boolean above(long n, double allowed) {
        double wave = n * Math.PI + offset;
        double distance = wave - momentum - 4e-16 * (wave + momentum);
        if (distance <= 0) {
            return false;
        }
        double fall = 2 * sigma * sigma * Math.PI * (2 * distance + Math.PI);
        double growth = Math.log1p(1.0 / (n + 1));
        double term = weight * Math.exp(-2 * sigma * sigma * distance * distance);
        if (term > -Math.expm1(-fall) * allowed || 4 * growth > fall / 2) {
            return false;
        }
        double half = Math.sqrt(weight) * Math.exp(-sigma * sigma * distance * distance) / -Math.expm1(-fall / 2);
        for (int j = 0; j < moments.length; j++) {
            moments[j] += term / -Math.expm1(j * growth - fall) * OUTWARD + Double.MIN_NORMAL;
            term *= n + 1;
        }
        sum += half * OUTWARD + Double.MIN_NORMAL;
        return true;
    }

    /** Bounds the levels from n down to 0. */
    private boolean below(long n, double allowed) {
        double wave = (n + 1) * Math.PI;
        double distance = momentum - wave - 4e-16 * (wave + momentum);
        if (distance <= 0) {
            return false;
        }
        double fall = 2 * sigma * sigma * Math.PI * (2 * distance + Math.PI);
        double moment = weight * Math.exp(-2 * sigma * sigma * distance * distance) / -Math.expm1(-fall);
        if (moment > allowed) {
            return false;
        }
        for (int j = 0; j < moments.length; j++) {
            moments[j] += moment * OUTWARD + Double.MIN_NORMAL;
            moment *= n + 1;
        }
        sum += Math.sqrt(weight) * Math.exp(-sigma * sigma * distance * distance) / -Math.expm1(-fall / 2) * OUTWARD
                + Double.MIN_NORMAL;
        return true;
    }
}
