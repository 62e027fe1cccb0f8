package ladderwell.state;

import ladderwell.level.Levels;
import ladderwell.level.StandingWave;
import ladderwell.numeric.DoubleDouble;

/**
 * Overlaps of a packet with the waves A sin((n+1) π/2 − k x), taken over the whole line.
 *
 * <p>With α = (n+1) π/2 − k x₀, e∓ = e^{−σ²(p∓k)²} and G = (8πσ²)^{1/4}: c = (A G / 2) [ (e₋ + e₊) sin α − i (e₋ − e₊) cos α ].
 *
 * <p>In the box this is more than an approximation: the c_n are the exact coefficients of the packet with its tails folded back at the
 * walls with changed sign (method of images), a smooth state of the box whose distance from the packet is known.
 */
final class PacketOverlaps {
    /**
     * Relative rounding beside the exponent: exponential 2, G 2.3, A 4, wave 3, sum, products 4, and 2 for what is forgotten; both parts, so
     * times √2.
     */
    private static final double ROUNDING = 18 * 1.42 * 0x1p-53;

    /** Rounding of the exponent σ²(p−k)², relative: k and p − k once, σ once, squared. */
    private static final double EXPONENT_ROUNDING = 6 * 1.42 * 0x1p-53;

    final double[] re;
    final double[] im;

    /** Guaranteed norm of the rounding of all overlaps. */
    final double rounding;

    PacketOverlaps(Levels levels, GaussianPacket packet, long first, int count) {
        re = new double[count];
        im = new double[count];
        double squares = 0;
        for (int i = 0; i < count; i++) {
            long n = first + i;
            DoubleDouble waveNumber = new DoubleDouble(levels.energyHigh(n), levels.energyLow(n))
                    .times(2)
                    .sqrt();
            double decay = levels.decay(n);
            double amplitude = Math.sqrt(2 / (1 + 2 / decay));
            StandingWave wave = new StandingWave(n, waveNumber);
            double size = amplitude * packet.reach() / 2;
            double towards = exponent(packet, waveNumber.plus(-packet.momentum()));
            double against = exponent(packet, waveNumber.plus(packet.momentum()));
            double minus = size * Math.exp(-towards);
            double plus = size * Math.exp(-against);
            re[i] = (minus + plus) * wave.sine(packet.position());
            im[i] = (plus - minus) * wave.cosine(packet.position());
            double error = minus * (ROUNDING + EXPONENT_ROUNDING * towards)
                    + plus * (ROUNDING + EXPONENT_ROUNDING * against)
                    + Double.MIN_NORMAL;
            squares += error * error;
        }
        rounding = Math.sqrt(squares) * (1 + 1e-6);
    }

    private static double exponent(GaussianPacket packet, DoubleDouble difference) {
        double scaled = packet.width() * difference.hi();
        return scaled * scaled;
    }
}
