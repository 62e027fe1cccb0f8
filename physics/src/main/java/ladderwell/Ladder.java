package ladderwell;

import ladderwell.quantity.Quantity;

/** An oscillator whose states stand on the number states of a harmonic mode: the harmonic one itself, and modes that are nonlinear, driven or lossy. */
public sealed interface Ladder extends Oscillator permits Harmonic, LadderMode {

    /** ⟨α|H|α⟩ at time 0, α = re + i·im, in scaled units. */
    double coherentEnergy(double re, double im);

    /** ⟨n|H|n⟩ at time 0 in scaled units. */
    double numberEnergy(long n);

    /** A coherent state of the given mean quanta n̄ = |α|², at phase 0; {@link Coherent#phase} turns it. */
    default Coherent coherent(double mean) {
        return Coherent.mean(this, mean);
    }

    /** The coherent state |α⟩, α = re + i·im. */
    default Coherent coherentAlpha(double re, double im) {
        return Coherent.alpha(this, re, im);
    }

    /** The coherent state with these mean position and momentum; quadratures, plain numbers, where the mode has no mass. */
    default Coherent coherentAt(Quantity displacement, Quantity momentum) {
        return Coherent.at(this, displacement, momentum);
    }
}
