package ladderwell.state;

/**
 * The Gaussian g(x) = (2πσ²)^{−1/4} e^{−(x−x₀)²/4σ² + i p (x−x₀)} and bounds of what of it lies beyond the walls at ±1/2.
 *
 * @param position x₀
 * @param momentum p
 * @param width σ = Δx
 */
record GaussianPacket(double position, double momentum, double width) {
    /** Raises a bound over the rounding of its evaluation; exponents stay below 750, so 1e-12 is far above it. */
    private static final double OUTWARD = 1 + 1e-12;

    private static final double LARGEST_MOMENTUM = 1e9;
    private static final double LEAST_WIDTH = 1e-6;
    private static final double LARGEST_WIDTH = 1000;

    GaussianPacket {
        if (!(Math.abs(position) < 0.5)) {
            throw new IllegalArgumentException(
                    "the position of a packet must lie between the walls at -0.5 and 0.5 widths, got " + position);
        }
        if (!(Math.abs(momentum) <= LARGEST_MOMENTUM)) {
            throw new IllegalArgumentException(
                    "the momentum of a packet must be between -1e9 and 1e9 ħ/L, got " + momentum);
        }
        if (!(width >= LEAST_WIDTH && width <= LARGEST_WIDTH)) {
            throw new IllegalArgumentException(
                    "the spread of a packet must be between 1e-6 and 1000 widths of the box or well, got " + width);
        }
    }

    /** ∫ |g| = (8πσ²)^{1/4}: the size of its Fourier transform. */
    double reach() {
        return Math.sqrt(Math.sqrt(8 * Math.PI * width * width));
    }

    /** Upper bound of the weight beyond the walls. */
    double weightBeyond() {
        return tail(0.5 - position) + tail(0.5 + position);
    }

    /** Upper bound of the weight beyond a distance to one side: erfc(d/√2σ) / 2. */
    private double tail(double distance) {
        return erfcAbove(distance / (Math.sqrt(2) * width)) / 2;
    }

    /** Upper bound of ∫ |g| beyond the walls. */
    double integralBeyond() {
        double scale = reach() / 2;
        return scale
                * (erfcAbove((0.5 - position) / (2 * width)) + erfcAbove((0.5 + position) / (2 * width)))
                * OUTWARD;
    }

    /**
     * Upper bound of the norm of what lies beyond the walls when it is folded into the box: the norms of the pieces of one width each
     * add.
     */
    double foldedNorm() {
        double sum = 0;
        for (int side = -1; side <= 1; side += 2) {
            double distance = 0.5 - side * position;
            double piece = Math.sqrt(tail(distance));
            // Below 1e-150 each further piece is less than half the last.
            while (piece > 1e-150) {
                sum += piece;
                distance += 1;
                piece = Math.sqrt(tail(distance));
            }
            sum += 1e-149;
        }
        return sum * OUTWARD;
    }

    /** erfc from above: e^{−y²} min(1, 1/(y√π)) for y ≥ 0 (DLMF 7.8.2 and 7.8.3). */
    private static double erfcAbove(double y) {
        return Math.exp(-y * y) * Math.min(1, 1 / (y * Math.sqrt(Math.PI))) * OUTWARD + Double.MIN_NORMAL;
    }
}
