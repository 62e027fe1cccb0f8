package ladderwell;

import java.util.List;
import ladderwell.classical.ClassicalOrbit;
import ladderwell.evidence.Bound;
import ladderwell.evidence.PhysicsException;
import ladderwell.evidence.Record;
import ladderwell.motion.PhasedState;
import ladderwell.quantity.Digits;
import ladderwell.quantity.Kind;
import ladderwell.quantity.Quantity;
import ladderwell.quantity.Unit;
import ladderwell.state.Amplitudes;
import tech.tablesaw.api.Table;

/**
 * A state that has been evolved: times, amplitudes, how sure they are, and the record of how they were made. Immutable;
 * what is read from it ({@link #table}, {@link #density}) is computed when asked for, position and momentum once.
 */
public final class Run {
    /** Doubles a time may cost in the tables that are read from a run; used to refuse what cannot fit. */
    private static final int DOUBLES_PER_TIME = 24;

    private final Evolution evolution;
    private final PhasedState phased;
    private final Readings readings;
    private final double secondsTaken;

    private Run(Evolution evolution, PhasedState phased, double secondsTaken) {
        this.evolution = evolution;
        this.phased = phased;
        this.readings = new Readings(evolution.state().oscillator(), phased);
        this.secondsTaken = secondsTaken;
    }

    static Run of(Evolution evolution) {
        long start = System.nanoTime();
        Memory.require(
                evolution.frames() + " frames",
                (evolution.frames() + 1.0) * DOUBLES_PER_TIME * Double.BYTES,
                "ask for fewer frames, or for a shorter time");
        State state = evolution.state();
        // Half the tolerance for what is left out of the state, the other half for phases and level errors.
        Amplitudes amplitudes = state.amplitudes(evolution.tolerance() / 2);
        double end = evolution.scaledDuration();
        int frames = (int) evolution.frames();
        double[] times = new double[frames + 1];
        for (int j = 0; j <= frames; j++) {
            times[j] = end * j / frames;
        }
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
        return new Run(evolution, phased, (System.nanoTime() - start) * 1e-9);
    }

    /** What was asked. */
    public Evolution evolution() {
        return evolution;
    }

    /** The state at time 0. */
    public State state() {
        return evolution.state();
    }

    /** Number of times: frames + 1. */
    public int times() {
        return phased.times();
    }

    /** The j-th time in scaled units; the result speaks of exactly this double. */
    public double time(int j) {
        return phased.time(j);
    }

    /** The amplitudes at time 0. */
    public Amplitudes amplitudes() {
        return phased.amplitudes();
    }

    PhasedState phased() {
        return phased;
    }

    /** Largest ‖ψ − ψ̃‖ over the run: discarded tail, rounding, and the errors of the levels acting all the time. */
    public Bound stateError() {
        return new Bound(phased.certainty(), phased.error());
    }

    /** The method in a few words. */
    public String method() {
        return "exact phases on levels";
    }

    /** Wall-clock time that the run took, in seconds; not part of the record. */
    public double secondsTaken() {
        return secondsTaken;
    }

    /** What was asked, what ran, how sure it is. */
    public Record record() {
        Record.Builder record = Record.builder()
                .asked("oscillator", state().oscillator().kind())
                .asked("state", state().kind())
                .asked("duration", evolution.duration())
                .asked("frames", evolution.frames())
                .asked("tolerance", evolution.tolerance())
                .method("name", method())
                .method("reason", "the Hamiltonian does not depend on time and its levels are known")
                .size("levels", amplitudes().levels())
                .size("first level", amplitudes().first(0))
                .size("last level", phased.lastLevel())
                .size("times", times())
                .bound("state", stateError());
        askWords(record, "oscillator.formula", state().oscillator().formula());
        askWords(record, "state.origin", state().origin());
        ask(record, "oscillator.", state().oscillator().given());
        ask(record, "state.", state().given());
        return record.build();
    }

    private static void askWords(Record.Builder record, String key, String words) {
        if (!words.isEmpty()) {
            record.asked(key, words);
        }
    }

    private static void ask(Record.Builder record, String prefix, List<Fact> given) {
        for (int i = 0; i < given.size(); i++) {
            record.asked(
                    prefix + (i + 1) + "." + given.get(i).name(), given.get(i).value());
        }
    }

    /**
     * The observables at every time, as a table: first the time (in lab units, and in periods where the state has one),
     * then for each observable its value with the unit in the head, and beside it its error, headed
     * {@code ± NAME (guaranteed)} or {@code ± NAME (estimated)}.
     */
    public Table table(Observable... observables) {
        return RunTable.of(this, List.of(observables));
    }

    /** Values of one observable at every time, in scaled units. */
    public Series series(Observable observable) {
        return readings.series(observable);
    }

    /** The classical orbit of the same oscillator through the state's mean position and momentum, or at its mean energy. */
    public ClassicalOrbit classical() {
        return state().oscillator()
                .orbit(
                        series(Observable.POSITION).value(0),
                        series(Observable.MOMENTUM).value(0),
                        state().meanEnergy());
    }

    /** |ψ(x, t)|² at every time on a grid that covers the motion. */
    public Density density() {
        return density(Density.DEFAULT_POINTS);
    }

    /**
     * |ψ(x, t)|² at every time on a grid of this many points that covers the motion.
     *
     * @throws PhysicsException.TooLarge before anything is allocated, if the frames do not fit in memory
     */
    public Density density(int points) {
        return DensityReading.of(this, points);
    }

    /** What the motion does, in one line, each number with its error. */
    public String verdict() {
        return Verdict.of(this);
    }

    /** Method, size, error and time taken, in one line. */
    public String errorLine() {
        long first = amplitudes().first(0);
        String levels = first == phased.lastLevel() ? "level " + first : "levels " + first + "–" + phased.lastLevel();
        return levels + " · " + method() + " · error of the state ≤ "
                + Digits.pretty(Digits.significant(Math.nextUp(phased.error() * 1.05), 2))
                + ", " + phased.certainty().word() + " · "
                + milliseconds()
                + " ms";
    }

    private String milliseconds() {
        double taken = secondsTaken * 1e3;
        return taken >= 100 ? String.valueOf(Math.round(taken)) : Digits.significant(Math.max(taken, 0.1), 2);
    }

    /** A scaled time in the readable unit of the run: "1.04 µs". */
    Quantity labTime(double scaled) {
        double si = scaled * state().oscillator().scale().time();
        Unit unit = state().oscillator().scale().display(Kind.TIME, Math.abs(si));
        return Quantity.of(unit.fromSi(si), unit);
    }
}
