package ladderwell.level;

/**
 * The bound levels of one potential, in scaled units (ħ = m = 1; see the package page for the unit of length).
 *
 * <p>Levels are computed when asked for; making a {@code Levels} of a very deep well costs nothing per level.
 */
public sealed interface Levels permits HarmonicLevels, BoxLevels, WellLevels {

    /** Harmonic levels E_n = n + 1/2; x² / 2 is the potential. */
    static Levels harmonic() {
        return new HarmonicLevels();
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

    /** The potential the levels belong to. */
    enum Kind {
        /** x² / 2. */
        HARMONIC,
        /** 0 between hard walls. */
        BOX,
        /** 0 between steps of finite height. */
        FINITE_WELL
    }

    /** The potential the levels belong to. */
    Kind kind();

    /** How many bound levels there are; {@code Long.MAX_VALUE} where there is no last one. */
    long count();

    /** Energy of level n, leading double of a double-double value. */
    double energyHigh(long n);

    /** What {@link #energyHigh} leaves over: high + low is the energy within {@link #energyError}. */
    double energyLow(long n);

    /** Guaranteed absolute error of high + low. */
    double energyError(long n);

    /** Energy above which there is no bound level; infinite where there is none such. */
    double threshold();

    /** threshold − E_n, without cancellation; infinite where the threshold is. */
    double binding(long n);

    /**
     * Decay constant κ = √(2 (threshold − E_n)) of φ_n ∝ e^{−κ|x|} outside, without cancellation; infinite where the
     * threshold is.
     */
    double decay(long n);

    /** Guaranteed relative error of {@link #decay}; 0 where that is infinite. */
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
     * for the harmonic oscillator.
     */
    double waveFunctionError(long last);

    /** A distance beyond which |φ_n| stays below {@code drop} on both sides. */
    double reach(long n, double drop);

    /** Transition elements of x, x², p, p² between the given levels, in the order given. */
    Elements elements(long[] levels);
}
