package ladderwell;

import java.util.List;
import java.util.Optional;
import ladderwell.classical.ClassicalOrbit;
import ladderwell.evidence.Bound;
import ladderwell.evidence.PhysicsException;
import ladderwell.evidence.Record;
import ladderwell.quantity.Digits;
import ladderwell.quantity.Kind;
import ladderwell.quantity.Quantity;
import ladderwell.quantity.Unit;
import ladderwell.state.Amplitudes;
import tech.tablesaw.api.Table;

/**
 * A state that has been evolved: times, amplitudes on levels or values on a grid, how sure they are, and the record of how they were made. Immutable;
 * what is read from it ({@link #table}, {@link #density}) is computed when asked for, position and momentum once.
 */
public final class Run {
    /** Doubles a time may cost in the tables that are read from a run; used to refuse what cannot fit. */
    private static final int DOUBLES_PER_TIME = 24;

    private final Evolution evolution;
    private final Representation representation;
    private final double secondsTaken;

    private Run(Evolution evolution, Representation representation, double secondsTaken) {
        this.evolution = evolution;
        this.representation = representation;
        this.secondsTaken = secondsTaken;
    }

    static Run of(Evolution evolution) {
        long start = System.nanoTime();
        Memory.require(
                evolution.frames() + " frames",
                (evolution.frames() + 1.0) * DOUBLES_PER_TIME * Double.BYTES,
                "ask for fewer frames, or for a shorter time");
        double end = evolution.scaledDuration();
        int frames = (int) evolution.frames();
        double[] times = new double[frames + 1];
        for (int j = 0; j <= frames; j++) {
            times[j] = end * j / frames;
        }
        return new Run(evolution, Representation.of(evolution, times), (System.nanoTime() - start) * 1e-9);
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
        return representation.times();
    }

    /** The j-th time in scaled units; the result speaks of exactly this double. */
    public double time(int j) {
        return representation.time(j);
    }

    /** The amplitudes at time 0, where the run is on levels; empty where it is on a grid. */
    public Optional<Amplitudes> amplitudes() {
        return representation instanceof OnLevels levels ? Optional.of(levels.amplitudes()) : Optional.empty();
    }

    Representation representation() {
        return representation;
    }

    /** Largest ‖ψ − ψ̃‖ over the run: what was left out or cut off, rounding, and the errors of levels or steps. */
    public Bound stateError() {
        return representation.stateError();
    }

    /** What {@link #stateError} is the size of: the error of a vector, or that of a density operator in trace norm. */
    public String errorSymbol() {
        return representation instanceof OnWindow window && !window.isPure() ? "‖ρ − ρ̃‖₁" : "‖ψ − ψ̃‖";
    }

    /** The method in a few words. */
    public String method() {
        return representation.method();
    }

    /** What was kept, in a few words: "levels 0–40". */
    public String size() {
        return representation.size();
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
                .method("reason", representation.reason())
                .size("times", times())
                .bound("state", stateError());
        representation.describe(record);
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
        return representation.series(observable);
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
        return representation.density(this, points);
    }

    /**
     * The state at one instant in phase space: on levels at any instant of the run, else at the run's nearest time.
     *
     * @param value the instant, in lab units (natural units: a plain number) or in classical periods
     * @throws IllegalArgumentException if it lies outside the run
     */
    public PhaseSpace phaseSpace(double value, Unit unit) {
        return PhaseSpace.at(this, Quantity.of(value, unit));
    }

    /** The Wigner function at every time, or at as many evenly chosen ones as a film shows. */
    public PhaseFilm phaseFilm() {
        return PhaseFilm.of(this, PhaseFilm.DEFAULT_POINTS);
    }

    /** The same with this many positions and momenta. */
    public PhaseFilm phaseFilm(int points) {
        return PhaseFilm.of(this, points);
    }

    /** What the motion does, in one line, each number with its error. */
    public String verdict() {
        return representation.verdict(this);
    }

    /** Method, size, error and time taken, in one line. */
    public String errorLine() {
        return size() + " · " + method() + " · error of the state ≤ "
                + Digits.pretty(Digits.significant(Math.nextUp(stateError().size() * 1.05), 2))
                + ", " + stateError().kind().word() + " · "
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
