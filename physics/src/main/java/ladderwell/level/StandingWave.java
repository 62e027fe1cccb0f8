package ladderwell.level;

/**
 * The wave sin((n+1) π/2 − k x) of level n between the walls, with k x reduced to an eighth of a turn without loss.
 *
 * <p>It is ± cos(k x) for even n and ± sin(k x) for odd n, so parity holds to the bit.
 */
final class StandingWave {
    private final double turnsHigh;
    private final double turnsLow;

    /** Quarter turns to add to −k x, so that the sine of the sum is the wave. */
    private final long quarters;

    /**
     * @param n level
     * @param turnsHigh k / 2π, leading part
     * @param turnsLow what is left of it
     */
    StandingWave(long n, double turnsHigh, double turnsLow) {
        this.turnsHigh = turnsHigh;
        this.turnsLow = turnsLow;
        quarters = (n + 1) & 3;
    }

    boolean even() {
        return (quarters & 1) == 1;
    }

    double at(double x) {
        double product = turnsHigh * x;
        double rest = Math.fma(turnsHigh, x, -product) + turnsLow * x;
        double fraction = product - Math.rint(product);
        double nearest = Math.rint(4 * fraction);
        double angle = ((fraction - nearest / 4) + rest) * (2 * Math.PI);
        // sin(quarters π/2 − (nearest π/2 + angle))
        return switch ((int) ((quarters - (long) nearest) & 3)) {
            case 0 -> -Math.sin(angle);
            case 1 -> Math.cos(angle);
            case 2 -> Math.sin(angle);
            default -> -Math.cos(angle);
        };
    }
}
