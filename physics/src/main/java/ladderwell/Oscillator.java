package ladderwell;

import java.util.List;
import ladderwell.classical.ClassicalOrbit;
import ladderwell.formula.Formula;
import ladderwell.level.Levels;
import ladderwell.mode.Mode;
import ladderwell.potential.Potential;
import ladderwell.quantity.Quantity;
import ladderwell.quantity.Scale;
import tech.tablesaw.api.Table;

/**
 * What the system is: one mode with its levels and its scale. Made by {@link #harmonic()}, {@link #box()}, {@link #finiteWell()} or
 * {@link #in}; states are prepared in it by {@link #number}, {@link #gaussian}, {@link #superposition} ….
 */
public sealed interface Oscillator permits Ladder, Box, FiniteWell, PotentialWell, MovingWell {

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

    /**
     * A particle in any potential: {@code Oscillator.in(Potential.morse(…))}, {@code Oscillator.in(Potential.of("a*x^4", …))}.
     *
     * @throws IllegalArgumentException if the potential binds nothing
     */
    static PotentialWell in(Potential potential) {
        return in(potential, 0);
    }

    /**
     * A particle in a potential that repeats, at a boundary phase in rad: 2π n_g for a junction with offset charge n_g.
     *
     * @throws IllegalArgumentException if the potential binds nothing
     */
    static PotentialWell in(Potential potential, double boundaryPhase) {
        return PotentialWell.of("potential", potential, boundaryPhase, List.of());
    }

    /**
     * A particle in the potential of a formula, which may depend on the time t: {@code Formula.potential("k*x^2/2 - F*x*cos(w*t)", …)}. Its
     * levels are those at time 0.
     *
     * @throws IllegalArgumentException if the potential binds nothing at time 0
     */
    static Oscillator in(Formula formula, Quantity mass) {
        Potential start = Potential.of(formula.at(0), mass);
        return formula.dependsOnTime() ? MovingWell.of("potential", in(start), formula, List.of()) : in(start);
    }

    /**
     * A particle in the potential of a formula that need not confine anything: free, falling, over a barrier. Levels are not asked for; packets
     * move on a grid.
     *
     * @param length what lengths and times are scaled by, such as the size of the packet
     */
    static Oscillator open(Formula formula, Quantity mass, Quantity length) {
        PotentialWell start = in(Potential.open(formula.at(0), mass, length));
        return formula.dependsOnTime() ? MovingWell.of("potential", start, formula, List.of()) : start;
    }

    /**
     * A nonlinear, driven or lossy mode.
     *
     * @param kind the trade's name: "kerr", "duffing", "hamiltonian"
     * @param given what was typed, for card and record
     */
    static LadderMode mode(String kind, Mode mode, List<Fact> given) {
        return LadderMode.of(kind, mode, given);
    }

    /** The trade's name of the kind: "harmonic", "box", "finite well", "morse" …. */
    String kind();

    /** What 1 means inside: ħ = 1 and the mass and length of this oscillator. */
    Scale scale();

    /** Energies, wave functions and transition elements of the bound levels, in scaled units. */
    Levels levels();

    /** Potential energy at scaled position x, in scaled units; infinite outside a box. */
    double potential(double x);

    /** Whether the potential depends on time; then levels and {@link #potential(double)} are those at time 0. */
    default boolean moves() {
        return false;
    }

    /** Potential energy at scaled position x and scaled time t. */
    default double potential(double x, double t) {
        return potential(x);
    }

    /** The potential in one line with its parameters, where the kind and {@link #given} do not say it all; else empty. */
    default String formula() {
        return "";
    }

    /** Scaled positions where the potential jumps or has a kink, ascending. */
    default double[] breaks() {
        return new double[0];
    }

    /** Scaled position of the wall on the left, −∞ where there is none. */
    default double left() {
        return Double.NEGATIVE_INFINITY;
    }

    /** Scaled position of the wall on the right, +∞ where there is none. */
    default double right() {
        return Double.POSITIVE_INFINITY;
    }

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

    /**
     * The lowest levels as a table: n, energy, spacing to the next, each with its error and how sure it is.
     *
     * @throws IllegalArgumentException if there are fewer bound levels
     */
    default Table levelTable(int count) {
        return LevelColumns.of(this, LevelColumns.lowest(count));
    }

    /** These levels as a table. */
    default Table levelTable(long... levels) {
        return LevelColumns.of(this, levels);
    }

    /**
     * Transition elements between these levels as a table: for every pair m ≤ n and every coupling ⟨m|A|n⟩ with its error; of the momentum the
     * imaginary part, its real part is 0.
     *
     * @throws IllegalArgumentException if a level is not bound or a function has no value somewhere
     */
    default Table elementTable(long[] levels, Coupling... couplings) {
        return ElementColumns.of(this, levels, List.of(couplings));
    }

    /** Level n, counted from 0. */
    default NumberState number(long n) {
        return new NumberState(this, n);
    }

    /** A Gaussian packet with mean position and momentum and spread Δx; refused if the bound levels cannot carry it. */
    default Packet gaussian(Quantity position, Quantity momentum, Quantity spread) {
        return new Packet(this, position, momentum, spread);
    }

    /** Level n of another oscillator of the same particle, found in this one after a sudden change. */
    default LevelOf levelOf(Oscillator source, long n) {
        return LevelOf.of(this, source, n);
    }

    /** The ground state of another oscillator of the same particle, found in this one after a sudden change. */
    default LevelOf groundOf(Oscillator source) {
        return LevelOf.of(this, source, 0);
    }

    /** A superposition of levels with equal weights and phases; {@link Superposition#weights} changes them. */
    default Superposition superposition(long... levels) {
        return Superposition.equal(this, levels);
    }
}
