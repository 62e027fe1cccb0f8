package ladderwell;

import ladderwell.state.Shape;

/** States as functions of position, and what such functions ask of an oscillator's potential. */
final class Shapes {
    private static final int SAMPLES = 256;

    private Shapes() {}

    /** The state at time 0 as a function of position. */
    static Shape of(State state) {
        Oscillator oscillator = state.oscillator();
        if (state instanceof Packet packet) {
            return packet.shape();
        }
        if (state instanceof LevelOf level) {
            return level.shape();
        }
        if (state instanceof NumberState number) {
            return LevelSum.level(oscillator, number.n());
        }
        if (state instanceof Superposition sum) {
            return new LevelSum(
                    oscillator,
                    sum.levels().stream().mapToLong(Long::longValue).toArray(),
                    sum.re().stream().mapToDouble(Double::doubleValue).toArray(),
                    sum.im().stream().mapToDouble(Double::doubleValue).toArray());
        }
        throw new IllegalArgumentException(
                "a " + state.kind() + " state is not put on a grid; expected a packet, a level or a superposition");
    }

    /** The least of the potential between two positions, at a few hundred places. */
    static double bottom(Oscillator oscillator, double left, double right) {
        double least = Double.POSITIVE_INFINITY;
        for (int i = 0; i <= SAMPLES; i++) {
            double v = oscillator.potential(left + (right - left) * ((i + 0.5) / (SAMPLES + 1)));
            least = Math.min(least, v);
        }
        return least;
    }
}
