package ladderwell;

import java.util.List;
import ladderwell.classical.ClassicalOrbit;
import ladderwell.evidence.Bound;
import ladderwell.evidence.Record;
import ladderwell.state.Amplitudes;
import tech.tablesaw.api.Table;

/** A state that has been evolved: times, amplitudes, how sure they are, and the record of how they were made. Immutable. */
public final class Run {
    private Run() {}

    static Run of(Evolution evolution) {
        throw new UnsupportedOperationException();
    }

    /** What was asked. */
    public Evolution evolution() {
        throw new UnsupportedOperationException();
    }

    /** The state at time 0. */
    public State state() {
        return evolution().state();
    }

    /** Number of times: frames + 1. */
    public int times() {
        throw new UnsupportedOperationException();
    }

    /** The j-th time in scaled units; the result speaks of exactly this double. */
    public double time(int j) {
        throw new UnsupportedOperationException();
    }

    /** The amplitudes at time 0. */
    public Amplitudes amplitudes() {
        throw new UnsupportedOperationException();
    }

    /** Largest ‖ψ − ψ̃‖ over the run. */
    public Bound stateError() {
        throw new UnsupportedOperationException();
    }

    /** What was asked, what ran, how sure it is. */
    public Record record() {
        throw new UnsupportedOperationException();
    }

    /** The method in a few words, such as "exact phases on levels". */
    public String method() {
        throw new UnsupportedOperationException();
    }

    /** Wall-clock time that the run took, in seconds; not part of the record. */
    public double secondsTaken() {
        throw new UnsupportedOperationException();
    }

    /**
     * The observables at every time, as a table: first the time (in lab units, and in periods), then for each observable
     * its value with the unit in the head and its ± column, headed "± (guaranteed)" or "± (estimated)".
     */
    public Table table(Observable... observables) {
        throw new UnsupportedOperationException();
    }

    /** Values of one observable at every time, in scaled units. */
    public Series series(Observable observable) {
        throw new UnsupportedOperationException();
    }

    /** The classical orbit of the same oscillator through the state's mean position and momentum, or at its mean energy. */
    public ClassicalOrbit classical() {
        throw new UnsupportedOperationException();
    }

    /** |ψ(x, t)|² at every time on a grid that covers the motion. */
    public Density density() {
        return density(Density.DEFAULT_POINTS);
    }

    /** |ψ(x, t)|² at every time on a grid of this many points that covers the motion. */
    public Density density(int points) {
        throw new UnsupportedOperationException();
    }

    /** What the motion does, in one line, each number with its error. */
    public String verdict() {
        throw new UnsupportedOperationException();
    }

    /** Method, size, error and time taken, in one line. */
    public String errorLine() {
        throw new UnsupportedOperationException();
    }
}
