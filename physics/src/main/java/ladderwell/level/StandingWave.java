package ladderwell.level;

import ladderwell.numeric.DoubleDouble;

/**
 * The wave sin((n+1) π/2 − k x) of level n between the walls of a box or well, and its quadrature cos((n+1) π/2 − k x), with k x reduced
 * to an eighth of a turn without loss.
 *
 * <p>The wave is ± cos(k x) for even n and ± sin(k x) for odd n, so parity holds to the bit.
 *
 * @accuracy absolute error 3 · 2^−53, as long as |k x| stays below 1e13: the angle rounded (1.9) and the library's function (1)
 */
public final class StandingWave {
    private static final DoubleDouble TURN = DoubleDouble.QUARTER_TURN.times(4);

    private final double turnsHigh;
    private final double turnsLow;

    /** Quarter turns to add to −k x, so that the sine of the sum is the wave. */
    private final long quarters;

    /**
     * @param n level
     * @param waveNumber k
     */
    public StandingWave(long n, DoubleDouble waveNumber) {
        this(n, waveNumber.dividedBy(TURN).hi(), waveNumber.dividedBy(TURN).lo());
    }

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

    /** sin((n+1) π/2 − k x). */
    public double sine(double x) {
        return at(x, quarters);
    }

    /** cos((n+1) π/2 − k x). */
    public double cosine(double x) {
        return at(x, quarters + 1);
    }

    private double at(double x, long quarterTurns) {
        double product = turnsHigh * x;
        double rest = Math.fma(turnsHigh, x, -product) + turnsLow * x;
        double fraction = product - Math.rint(product);
        double nearest = Math.rint(4 * fraction);
        double angle = ((fraction - nearest / 4) + rest) * (2 * Math.PI);
        // sin(quarterTurns π/2 − (nearest π/2 + angle))
        return switch ((int) ((quarterTurns - (long) nearest) & 3)) {
            case 0 -> -Math.sin(angle);
            case 1 -> Math.cos(angle);
            case 2 -> Math.sin(angle);
            default -> -Math.cos(angle);
        };
    }
}
