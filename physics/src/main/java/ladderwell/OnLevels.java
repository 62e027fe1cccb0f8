package ladderwell;

import ladderwell.evidence.Bound;
import ladderwell.evidence.PhysicsException;
import ladderwell.evidence.Record;
import ladderwell.motion.PhasedState;
import ladderwell.phasespace.PhaseState;
import ladderwell.state.Amplitudes;

/** A run on levels: every amplitude turns by the phase of its level. */
final class OnLevels implements Representation {
    private final PhasedState phased;
    private final LevelReadings readings;

    private OnLevels(State state, PhasedState phased) {
        this.phased = phased;
        readings = new LevelReadings(state.oscillator(), phased);
    }

    /**
     * The state of an evolution at these times.
     *
     * @throws PhysicsException.NotCarried if the levels miss part of it
     * @throws PhysicsException.NotConverged if the levels are not known well enough for so long a time
     */
    static OnLevels of(Evolution evolution, double[] times) {
        State state = evolution.state();
        if (state.oscillator().moves()) {
            throw new IllegalArgumentException("levels carry a state only where the potential stands still");
        }
        // Half the tolerance for what is left out of the state, the other half for phases and level errors.
        Amplitudes amplitudes = state.amplitudes(evolution.tolerance() / 2);
        PhasedState phased = PhasedState.of(state.oscillator().levels(), amplitudes, times);
        if (phased.error() > evolution.tolerance()) {
            throw new PhysicsException.NotConverged(
                    "the state after " + evolution.duration()
                            + " (rounding and the errors of the levels set this floor; "
                            + "ask for a looser tolerance or a shorter time)",
                    1,
                    phased.error(),
                    evolution.tolerance());
        }
        return new OnLevels(state, phased);
    }

    PhasedState phased() {
        return phased;
    }

    Amplitudes amplitudes() {
        return phased.amplitudes();
    }

    @Override
    public int times() {
        return phased.times();
    }

    @Override
    public double time(int j) {
        return phased.time(j);
    }

    @Override
    public Bound stateError() {
        return new Bound(phased.certainty(), phased.error());
    }

    @Override
    public String method() {
        return "exact phases on levels";
    }

    @Override
    public String reason() {
        return "the Hamiltonian does not depend on time and its levels are known";
    }

    @Override
    public String size() {
        long first = amplitudes().first(0);
        return first == phased.lastLevel() ? "level " + first : "levels " + first + "–" + phased.lastLevel();
    }

    @Override
    public void describe(Record.Builder record) {
        record.size("levels", amplitudes().levels())
                .size("first level", amplitudes().first(0))
                .size("last level", phased.lastLevel());
    }

    @Override
    public Series series(Observable observable) {
        return readings.series(observable);
    }

    @Override
    public Density density(Run run, int points) {
        return DensityReading.of(run, phased, points);
    }

    @Override
    public double instant(double time) {
        return time;
    }

    @Override
    public PhaseState phaseState(State state, double time) {
        return LevelWaves.of(state, phased, time);
    }

    @Override
    public String verdict(Run run) {
        return Verdict.of(run, phased);
    }
}
