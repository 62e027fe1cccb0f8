package ladderwell.phasespace;

/** A state that this room makes phase-space functions of: pure, or mixed, or either of them displaced. */
public sealed interface PhaseState permits WaveFunction, NumberMatrix, Displaced {
    /** Where it lives. */
    Support support();

    /**
     * A box that holds all of it but about this share of its weight in position and as much in momentum: what a picture need show. Where momenta fall off
     * slowly, as behind a hard wall, it holds all but about a thousandth.
     *
     * @param share between 1e-12 and 0.1
     */
    Support visible(double share);
}
