package ladderwell.motion;

import ladderwell.evidence.Bound;
import ladderwell.evidence.Certainty;
import ladderwell.level.Levels;
import ladderwell.numeric.ExactPhases;
import ladderwell.state.Amplitudes;

/** A state on levels with the times at which it is looked at: c_n e^{−iE_n t}, segment by segment. Immutable. */
public final class PhasedState {
    private final Levels levels;
    private final Amplitudes amplitudes;
    private final double[] times;
    private final ExactPhases[] phases;
    private final double error;
    private final Certainty certainty;

    private PhasedState(
            Levels levels,
            Amplitudes amplitudes,
            double[] times,
            ExactPhases[] phases,
            double error,
            Certainty certainty) {
        this.levels = levels;
        this.amplitudes = amplitudes;
        this.times = times;
        this.phases = phases;
        this.error = error;
        this.certainty = certainty;
    }

    /** The state at the given scaled times; the array is copied. */
    public static PhasedState of(Levels levels, Amplitudes amplitudes, double[] times) {
        double latest = 0;
        for (double t : times) {
            latest = Math.max(latest, Math.abs(t));
        }
        ExactPhases[] phases = new ExactPhases[amplitudes.segments()];
        double rounding = 0;
        double energyDrift = 0;
        Certainty certainty = amplitudes.certainty();
        for (int s = 0; s < phases.length; s++) {
            int count = amplitudes.length(s);
            double[] high = new double[count];
            double[] low = new double[count];
            for (int i = 0; i < count; i++) {
                long n = amplitudes.first(s) + i;
                high[i] = levels.energyHigh(n);
                low[i] = levels.energyLow(n);
                Bound off = levels.energyBound(n);
                certainty = certainty.weaker(off.kind());
                double drift = off.size() * latest;
                double weight = amplitudes.re(s, i) * amplitudes.re(s, i) + amplitudes.im(s, i) * amplitudes.im(s, i);
                energyDrift += weight * drift * drift;
            }
            phases[s] = ExactPhases.of(high, low, amplitudes.reals(s), amplitudes.imaginaries(s), times);
            rounding = Math.max(rounding, phases[s].errorBound());
        }
        // What was left out at time 0, the rounding of every phase, and the levels' own errors acting for the whole
        // time.
        double error = (amplitudes.normError() + rounding + Math.sqrt(energyDrift)) * (1 + 1e-12);
        return new PhasedState(levels, amplitudes, times.clone(), phases, error, certainty);
    }

    /** The levels. */
    public Levels levels() {
        return levels;
    }

    /** The amplitudes at time 0. */
    public Amplitudes amplitudes() {
        return amplitudes;
    }

    /** Number of times. */
    public int times() {
        return times.length;
    }

    /** The j-th time. */
    public double time(int j) {
        return times[j];
    }

    /** The phases of one segment. */
    public ExactPhases phases(int segment) {
        return phases[segment];
    }

    /** δ ≥ ‖ψ − ψ̃‖ at every time, as sure as {@link #certainty}. */
    public double error() {
        return error;
    }

    /** How sure the error is: as sure as the amplitudes and the levels. */
    public Certainty certainty() {
        return certainty;
    }

    /** The last kept level. */
    public long lastLevel() {
        int s = amplitudes.segments() - 1;
        return amplitudes.first(s) + amplitudes.length(s) - 1;
    }

    /** Whether nothing was discarded, so that the error lies within the kept levels. */
    boolean complete() {
        // a packet may keep every bound level and still miss what lies above them
        return amplitudes.tailMoment(0) == 0 && amplitudes.missingWeight() == 0;
    }

    double[] copyOfTimes() {
        return times.clone();
    }
}
