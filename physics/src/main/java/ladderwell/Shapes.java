package ladderwell;

/** What shapes ask of an oscillator's potential. */
final class Shapes {
    private static final int SAMPLES = 256;

    private Shapes() {}

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
