package ladderwell;

import ladderwell.operator.LadderPolynomial;
import ladderwell.quantity.Quantity;
import ladderwell.quantity.Unit;

/** An oscillator whose states stand on the number states of a harmonic mode: the harmonic one itself, and modes that are nonlinear, driven or lossy. */
public sealed interface Ladder extends Oscillator permits Harmonic, LadderMode {

    /** ⟨α|H|α⟩ at time 0, α = re + i·im, in scaled units. */
    double coherentEnergy(double re, double im);

    /** ⟨n|H|n⟩ at time 0 in scaled units. */
    double numberEnergy(long n);

    /** H at time 0 in scaled units. */
    LadderPolynomial energyOperator();

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

    /**
     * The squeezed vacuum whose position is the less uncertain; {@link Squeezed#angle} turns it, {@link Squeezed#mean} displaces it.
     *
     * @param squeezing how far the least variance lies below that of the vacuum, in dB; or r as a plain number
     */
    default Squeezed squeezed(double squeezing, Unit unit) {
        return Squeezed.of(this, Quantity.of(squeezing, unit));
    }

    /**
     * An even cat of two coherent components |α⟩ and |−α⟩; {@link Cat#odd}, {@link Cat#components} and {@link Cat#relativePhase} make others.
     *
     * @param mean quanta |α|² of each component
     */
    default Cat cat(double mean) {
        return Cat.mean(this, mean);
    }

    /** The number state |level⟩, displaced to the right by the mean quanta |α|²; {@link DisplacedNumber#phase} turns it. */
    default DisplacedNumber displacedNumber(long level, double mean) {
        return DisplacedNumber.mean(this, level, mean);
    }

    /** The number state |level⟩ displaced by α = re + i·im. */
    default DisplacedNumber displacedNumberAlpha(long level, double re, double im) {
        return DisplacedNumber.alpha(this, level, re, im);
    }
}
