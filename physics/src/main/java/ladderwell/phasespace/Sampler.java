package ladderwell.phasespace;

/** Values of a wave function. */
@FunctionalInterface
public interface Sampler {
    /** Writes ψ at ascending, evenly spaced positions. */
    void sample(double[] x, double[] re, double[] im);
}
