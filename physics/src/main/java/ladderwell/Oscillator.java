package ladderwell;

import java.util.List;
import ladderwell.classical.ClassicalOrbit;
import ladderwell.level.Levels;
import ladderwell.quantity.Scale;

/**
 * What the system is: one mode with its levels and its scale. Made by {@link #harmonic()}, {@link #box()} or
 * {@link #finiteWell()}; states are prepared in it by {@link #number}, {@link #coherent}, {@link #superposition} ….
 */
public sealed interface Oscillator permits Harmonic, Box, FiniteWell {

    /** A harmonic oscillator: give the mass and one of ν, ω, wavenumber or level spacing, or {@code natural()}. */
    static Harmonic.Declaring harmonic() {
        return new Harmonic.Declaring();
    }

    /** A box with infinite walls: give mass and width, or {@code natural()} (ħ = m = 1, width 1). */
    static Box.Declaring box() {
        return new Box.Declaring();
    }

    /** A finite square well: give mass, width and depth. */
    static FiniteWell.Declaring finiteWell() {
        return new FiniteWell.Declaring();
    }

    /** The trade's name of the kind: "harmonic", "box", "finite well". */
    String kind();

    /** What 1 means inside: ħ = 1 and the mass and length of this oscillator. */
    Scale scale();

    /** Energies, wave functions and transition elements of the bound levels, in scaled units. */
    Levels levels();

    /** Potential energy at scaled position x, in scaled units; infinite outside a box. */
    double potential(double x);

    /**
     * The classical period at scaled energy E, in scaled time.
     *
     * @throws IllegalArgumentException if the classical particle is not bound at that energy
     */
    double classicalPeriod(double energy);

    /**
     * The classical orbit through scaled position and momentum; in a well, where a mean momentum of 0 is no rest, with the
     * speed of the given energy and the direction of the momentum.
     */
    ClassicalOrbit orbit(double position, double momentum, double energy);

    /** The numbers that the trade asks for, in the order in which a card shows them. */
    List<Fact> facts();

    /** The inputs as they were given, for the record: key → value with unit, in declaration order. */
    List<Fact> given();

    /** Level n, counted from 0. */
    default NumberState number(long n) {
        return new NumberState(this, n);
    }

    /** A superposition of levels with equal weights and phases; {@link Superposition#weights} changes them. */
    default Superposition superposition(long... levels) {
        return Superposition.equal(this, levels);
    }
}
