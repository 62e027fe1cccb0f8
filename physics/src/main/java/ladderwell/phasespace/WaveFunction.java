package ladderwell.phasespace;

import ladderwell.evidence.Bound;

/** A pure state as this room reads it: a function of position that can be sampled anywhere. @units scaled */
public non-sealed interface WaveFunction extends PhaseState {
    /** Writes ψ at ascending, evenly spaced positions. */
    void sample(double[] x, double[] re, double[] im);

    /** ‖ψ − ψ̃‖: what is meant against what {@link #sample} would give without rounding. */
    Bound stateError();

    /** How far any sample can be off by rounding, or by the errors of functions it is made from. */
    Bound sampleError();

    @Override
    default Support visible(double share) {
        Support all = support();
        return Probe.of(this::sample, all.left(), all.right(), (all.low() + all.high()) / 2, all.high() - all.low())
                .box(share);
    }
}
