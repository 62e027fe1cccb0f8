package ladderwell.numeric;

/**
 * Loops over rows that start anywhere in their arrays: {@code o} is where the output starts, {@code x} where the input starts, {@code v} where the
 * factors start. Plain ones are right for every machine; with the Vector API they are several times quicker.
 */
public sealed interface RowLoops permits PlainRowLoops, VectorRowLoops {

    /** The quicker ones of this machine. */
    static RowLoops chosen() {
        return Chosen.LOOPS;
    }

    /** out += c · in. */
    void add(double[] out, int o, double[] in, int x, int length, double c);

    /** out += (re + i im) · in. */
    void add(
            double[] outRe,
            double[] outIm,
            int o,
            double[] inRe,
            double[] inIm,
            int x,
            int length,
            double re,
            double im);

    /** out += (re + i im + conj v) ∘ in. */
    void diagonal(
            double[] outRe,
            double[] outIm,
            int o,
            double[] inRe,
            double[] inIm,
            int x,
            int length,
            double re,
            double im,
            double[] vRe,
            double[] vIm,
            int v);

    /** out += c · v ∘ in. */
    void product(double[] out, int o, double[] in, int x, int length, double c, double[] factor, int v);

    /** out += (re + i im) · conj v ∘ in. */
    void product(
            double[] outRe,
            double[] outIm,
            int o,
            double[] inRe,
            double[] inIm,
            int x,
            int length,
            double re,
            double im,
            double[] vRe,
            double[] vIm,
            int v);

    /** Σ re² + im². */
    double squares(double[] re, double[] im, int x, int length);

    /** Holds the choice, made when first asked for. */
    final class Chosen {
        private static final RowLoops LOOPS = VectorSupport.available() ? new VectorRowLoops() : new PlainRowLoops();

        private Chosen() {}
    }
}
