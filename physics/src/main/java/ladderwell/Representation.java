package ladderwell;

import ladderwell.evidence.Bound;
import ladderwell.evidence.PhysicsException;
import ladderwell.evidence.Record;
import ladderwell.phasespace.PhaseState;
import ladderwell.quantity.Digits;

/** In what a run carries its state from time 0 on: amplitudes on levels, a state in a window of number states, or values on a grid of positions. */
sealed interface Representation permits OnLevels, OnGrid, OnWindow {

    /**
     * Levels where the potential stands still and they carry the state; else a grid, where the potential allows one.
     *
     * @throws PhysicsException what the levels said, if a grid cannot do better
     */
    static Representation of(Evolution evolution, double[] times) {
        Oscillator oscillator = evolution.state().oscillator();
        if (oscillator instanceof LadderMode mode && !mode.isDiagonal()) {
            return OnWindow.of(evolution, mode, times);
        }
        if (oscillator.moves()) {
            return OnGrid.of(evolution, times, "the potential depends on time");
        }
        if (oscillator.levels().count() == 0) {
            return OnGrid.of(evolution, times, "the potential binds nothing");
        }
        try {
            return OnLevels.of(evolution, times);
        } catch (PhysicsException levels) {
            if (!OnGrid.fits(evolution.state())) {
                throw levels;
            }
            return instead(evolution, times, levels);
        }
    }

    private static Representation instead(Evolution evolution, double[] times, PhysicsException levels) {
        String reason = levels instanceof PhysicsException.NotCarried missed
                ? "the bound levels miss weight " + Digits.significant(missed.missingWeight(), 2) + " of the state"
                : levels instanceof PhysicsException.NotConverged
                        ? "the levels are not known well enough for this time and tolerance"
                        : "the state spreads over too many levels";
        try {
            return OnGrid.of(evolution, times, reason);
        } catch (PhysicsException grid) {
            levels.addSuppressed(grid);
            throw levels;
        }
    }

    /** Number of times. */
    int times();

    /** The j-th time in scaled units. */
    double time(int j);

    /** Largest ‖ψ − ψ̃‖ at any of the times. */
    Bound stateError();

    /** The method in a few words. */
    String method();

    /** Why this method, in a few words. */
    String reason();

    /** What was kept, as one reads it: "levels 0–40". */
    String size();

    /** Adds what was kept to a record. */
    void describe(Record.Builder record);

    /** One observable at every time, in scaled units. */
    Series series(Observable observable);

    /** |ψ|² at every time on so many points that cover the motion. */
    Density density(Run run, int points);

    /** The number of the time nearest to this one. */
    static int nearest(Representation run, double time) {
        int nearest = 0;
        for (int j = 1; j < run.times(); j++) {
            if (Math.abs(run.time(j) - time) < Math.abs(run.time(nearest) - time)) {
                nearest = j;
            }
        }
        return nearest;
    }

    /** The time nearest to this one at which the state can be had: the same on levels, else one of the run's times. */
    double instant(double time);

    /** The state at such a time, as phase-space functions are made of it. */
    PhaseState phaseState(State state, double time);

    /** What the motion does, in one line. */
    String verdict(Run run);
}
