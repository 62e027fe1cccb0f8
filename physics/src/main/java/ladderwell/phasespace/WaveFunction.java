package ladderwell.phasespace;

import ladderwell.evidence.Bound;

/** A pure state as this room reads it: a function of position that can be sampled anywhere. @units scaled */
public interface WaveFunction {
    /** Writes ψ at ascending, evenly spaced positions. */
    void sample(double[] x, double[] re, double[] im);

    /** Where it lives. */
    Support support();

    /** ‖ψ − ψ̃‖: what is meant against what {@link #sample} would give without rounding. */
    Bound stateError();

    /** How far any sample can be off by rounding, or by the errors of functions it is made from. */
    Bound sampleError();
}
