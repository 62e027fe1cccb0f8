package ladderwell.numeric;

/** Products f(c + k) f*(c − k) of samples that mirror one another about a place. */
public final class MirroredProducts {
    private MirroredProducts() {}

    /**
     * Writes f(centre + k) f*(centre − k) for k = from … from + count − 1 to entries 0 … count − 1.
     *
     * @throws IndexOutOfBoundsException if a place lies outside the samples
     */
    public static void of(double[] re, double[] im, int centre, int from, int count, double[] outRe, double[] outIm) {
        Loops.chosen().mirrored(re, im, centre, from, count, outRe, outIm);
    }
}
