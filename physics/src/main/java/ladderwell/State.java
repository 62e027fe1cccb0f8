package ladderwell;

import java.util.List;
import ladderwell.quantity.Quantity;
import ladderwell.quantity.Unit;
import ladderwell.state.Amplitudes;

/** What the motion starts in: a pure state of one oscillator. */
public sealed interface State
        permits NumberState, Coherent, Squeezed, Cat, DisplacedNumber, Superposition, Packet, LevelOf {

    /** The oscillator it is prepared in. */
    Oscillator oscillator();

    /** The trade's name of the kind: "number", "coherent", "squeezed", "cat", "displaced number", "superposition", "gaussian", "level". */
    String kind();

    /**
     * The amplitudes on the levels, to the given error of the norm.
     *
     * @param tolerance largest ‖ψ − ψ̃‖ allowed, between 1e-13 and 0.1
     * @throws ladderwell.evidence.PhysicsException if the bound levels cannot carry the state, or it is too large
     */
    Amplitudes amplitudes(double tolerance);

    /** Mean energy in scaled units. */
    double meanEnergy();

    /** The numbers that the trade asks for, in the order in which a card shows them. */
    List<Fact> facts();

    /** The inputs as they were given, for the record. */
    List<Fact> given();

    /** What it is made from, in words, where {@link #given} does not say it all; else empty. */
    default String origin() {
        return "";
    }

    /**
     * The classical period at the mean energy, in scaled time: what "1 period" means for this state.
     *
     * @throws IllegalArgumentException where no classical period exists
     */
    default double period() {
        return oscillator().classicalPeriod(meanEnergy());
    }

    /** The evolution of this state for a time, in lab units or in periods; nothing runs yet. */
    default Evolution evolve(double duration, Unit unit) {
        return Evolution.of(this, Quantity.of(duration, unit));
    }
}
