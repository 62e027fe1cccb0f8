package ladderwell.level;

import java.util.function.DoubleUnaryOperator;
import java.util.function.LongFunction;
import ladderwell.evidence.Bound;
import ladderwell.numeric.DoubleDouble;

/**
 * The bound levels of one potential, in scaled units (ħ = m = 1; see the package page for the unit of length).
 *
 * <p>Levels are computed when asked for; making a {@code Levels} of a very deep well costs nothing per level.
 */
public sealed interface Levels
        permits HarmonicLevels,
                BoxLevels,
                WellLevels,
                PolynomialLevels,
                ShootingLevels,
                CircleLevels,
                UncertainLevels,
                DiagonalLevels,
                NoLevels {

    /** Harmonic levels E_n = n + 1/2; x² / 2 is the potential. */
    static Levels harmonic() {
        return new HarmonicLevels();
    }

    /**
     * Number states with any energies: a mode whose Hamiltonian is diagonal in the number of quanta, such as Kerr's. Wave functions are those of
     * the harmonic oscillator; energies need not rise.
     *
     * @param energies E_n, right within {@code relativeError} of the largest that is asked for
     * @param relativeError relative error of every energy
     */
    static Levels ofNumberStates(LongFunction<DoubleDouble> energies, double relativeError) {
        return new DiagonalLevels(energies, relativeError);
    }

    /** Infinite box with walls at ±1/2: E_n = π² (n + 1)² / 2. */
    static Levels box() {
        return new BoxLevels();
    }

    /**
     * All bound levels of the finite well: V = 0 for |x| &lt; 1/2, V = depth elsewhere.
     *
     * @param depth depth V₀ in ħ²/(m L²), positive and finite
     */
    static Levels finiteWell(double depth) {
        return new WellLevels(depth);
    }

    /**
     * Levels of p²/2 + Σ c_k x^k, in an oscillator basis with proved bounds as long as that is small (to level 127), by shooting beyond.
     *
     * @param coefficients c₀, c₁, …; the highest power even, with a positive coefficient
     * @throws IllegalArgumentException if the polynomial does not confine
     */
    static Levels polynomial(double... coefficients) {
        return new PolynomialLevels(coefficients);
    }

    /**
     * Bound levels of any potential in one dimension, by shooting with certain node counts; errors are estimated.
     *
     * @throws IllegalArgumentException if the potential is unbounded below, has no well, or is not a number somewhere (named)
     */
    static Levels of(PotentialCurve curve) {
        return new ShootingLevels(curve);
    }

    /** No levels at all: of a potential that binds nothing. */
    static Levels none() {
        return new NoLevels();
    }

    /**
     * Bloch levels of a potential that repeats: φ(x + period) = e^{i phase} φ(x).
     *
     * @param curve its values from 0 to the period are used
     * @param period length after which it repeats, positive
     * @param phase boundary phase; 0 for a pendulum, 2π n_g for a junction with offset charge n_g
     */
    static PeriodicLevels periodic(PotentialCurve curve, double period, double phase) {
        return new PeriodicLevels(curve, period, phase);
    }

    /**
     * The same levels of a potential that is known only within ±off at every place; errors are then statistical.
     *
     * @param off as large as the potential can be wrong anywhere, positive
     */
    default Levels within(double off) {
        return new UncertainLevels(this, off);
    }

    /**
     * Levels on a circle: a potential that repeats, φ(x + period) = e^{i phase} φ(x), seen over one turn from −period/2 to period/2. Where the
     * potential is even and the phase 0 or π the wave functions are real; else there are energies only.
     *
     * @param period length of one turn, positive
     * @param phase boundary phase, as in {@link #periodic}
     */
    static Levels onCircle(PotentialCurve curve, double period, double phase) {
        return new CircleLevels(periodic(curve, period, phase), curve);
    }

    /** The potential the levels belong to. */
    enum Kind {
        /** x² / 2. */
        HARMONIC,
        /** 0 between hard walls. */
        BOX,
        /** 0 between steps of finite height. */
        FINITE_WELL,
        /** Anything else. */
        GENERAL
    }

    /** The potential the levels belong to. */
    Kind kind();

    /** Whether φ_n(−x) = (−1)^n φ_n(x) for all n. */
    default boolean alternates() {
        return false;
    }

    /** Whether wave functions are real and given; if not there are energies only. */
    default boolean hasWaveFunctions() {
        return true;
    }

    /** How many bound levels there are; {@code Long.MAX_VALUE} where there is no last one. */
    long count();

    /** Energy of level n, leading double of a double-double value. */
    double energyHigh(long n);

    /** What {@link #energyHigh} leaves over: high + low is the energy within {@link #energyError}. */
    double energyLow(long n);

    /** Absolute error of high + low, as sure as {@link #energyBound} says. */
    double energyError(long n);

    /** The error of {@link #energyHigh} + {@link #energyLow} with its certainty. */
    default Bound energyBound(long n) {
        return Bound.guaranteed(energyError(n));
    }

    /**
     * Energies of the levels first … first + count − 1, quicker than one by one; each within twice {@link #energyError} of the exact one.
     *
     * @shape result is [count]
     */
    default double[] energies(long first, int count) {
        Points.check(first, count, count(), new double[0]);
        double[] energies = new double[count];
        for (int i = 0; i < count; i++) {
            energies[i] = energyHigh(first + i);
        }
        return energies;
    }

    /**
     * Number of levels below an energy; {@code Long.MAX_VALUE} where there is no last one.
     *
     * @param energy finite
     */
    default long countBelow(double energy) {
        Points.checkEnergy(energy);
        long low = -1;
        long high = 1;
        long last = count();
        while (high < last && high < (1L << 48) && energyHigh(high) < energy) {
            low = high;
            high *= 2;
        }
        high = Math.min(high, last);
        // Level low lies below, level high does not.
        while (high - low > 1) {
            long middle = low + (high - low) / 2;
            if (energyHigh(middle) < energy) {
                low = middle;
            } else {
                high = middle;
            }
        }
        return high;
    }

    /**
     * E_{n+1} − E_n, to its own relative accuracy where parity is known, however small it is beside the energies.
     *
     * @param n level below the gap
     */
    default double splitting(long n) {
        return (energyHigh(n + 1) - energyHigh(n)) + (energyLow(n + 1) - energyLow(n));
    }

    /** How far {@link #splitting} can be off. */
    default Bound splittingBound(long n) {
        return energyBound(n).plus(energyBound(n + 1)).plus(0x1p-52 * Math.abs(energyHigh(n + 1)));
    }

    /** The levels around n that cannot be told apart at this precision; n alone where it can. */
    default Cluster cluster(long n) {
        Points.checkLevel(n, count());
        return new Cluster(n, n, Bound.exact());
    }

    /**
     * ⟨m|f(x)|n⟩ by quadrature.
     *
     * @param f bounded on the region of the levels and as smooth as the wave functions
     */
    default Element element(long m, long n, DoubleUnaryOperator f) {
        return Quadrature.element(this, m, n, f);
    }

    /**
     * A number with its bound.
     *
     * @param value the matrix element, real
     * @param bound how far it can be off
     */
    record Element(double value, Bound bound) {}

    /**
     * Levels too close to be separated.
     *
     * @param first lowest of them
     * @param last highest of them
     * @param spread their distances are at most this
     */
    record Cluster(long first, long last, Bound spread) {
        /** Whether it is one level only. */
        public boolean single() {
            return first == last;
        }
    }

    /** Energy above which there is no bound level; infinite where there is none such. */
    double threshold();

    /** threshold − E_n, without cancellation; infinite where the threshold is. */
    double binding(long n);

    /**
     * Decay constant κ = √(2 (threshold − E_n)) of φ_n ∝ e^{−κ|x|} outside, without cancellation; infinite where the
     * threshold is.
     */
    double decay(long n);

    /** Relative error of {@link #decay}, as sure as {@link #energyBound}; 0 where that is infinite. */
    double decayError(long n);

    /**
     * Table of the wave functions φ_first … φ_{first+count−1} at the points x.
     *
     * @shape result is [count][x.length]
     * @units x in the unit of length, result in its inverse square root
     */
    double[][] waveFunctions(long first, int count, double[] x);

    /**
     * Largest absolute error of any value in a table of wave functions up to level {@code last}: guaranteed for box and well, estimated
     * for all others.
     */
    double waveFunctionError(long last);

    /** A distance beyond which |φ_n| stays below {@code drop} on both sides. */
    double reach(long n, double drop);

    /** Left and right end of what {@link #reach} covers: {−reach, reach} where the two sides are alike. */
    default double[] extent(long n, double drop) {
        double reach = reach(n, drop);
        return new double[] {-reach, reach};
    }

    /** Transition elements of x, x², p, p² between the given levels, in the order given. */
    Elements elements(long[] levels);
}
