package ladderwell;

import ladderwell.evidence.PhysicsException;
import ladderwell.quantity.Kind;
import ladderwell.quantity.Quantity;

/**
 * What is to be computed: a state, a duration, how many steps to look at, and how far off the state may be. Nothing runs
 * before {@link #run()}.
 *
 * @param state the state at time 0
 * @param duration how long, in lab units (natural units: a plain number) or in classical periods at the mean energy
 * @param frames number of equal time steps; results have one row more, time 0
 * @param tolerance largest error of the state: ‖ψ − ψ̃‖ of a vector, ‖ρ − ρ̃‖₁ of a density operator
 */
public record Evolution(State state, Quantity duration, long frames, double tolerance) {

    /** Steps where none are asked for. */
    public static final int DEFAULT_FRAMES = 120;

    /** Tolerance where none is asked for. */
    public static final double DEFAULT_TOLERANCE = 1e-9;

    /** The same for density operators: the bound of their rounding grows with the run, and is far from 1e-9 after many decays. */
    public static final double DENSITY_TOLERANCE = 1e-6;

    public Evolution {
        boolean natural = state.oscillator().scale().isNatural();
        Checks.positive("duration", duration, natural ? Kind.NUMBER : Kind.TIME, Kind.PERIODS);
        if (frames < 1) {
            throw new IllegalArgumentException("frames must be at least 1, not " + frames);
        }
        if (!(tolerance >= 1e-13 && tolerance <= 0.1)) {
            throw new IllegalArgumentException(
                    "tolerance must lie between 1e-13 and 0.1, not " + Checks.number(tolerance));
        }
    }

    static Evolution of(State state, Quantity duration) {
        boolean jumps =
                state.oscillator() instanceof LadderMode mode && !mode.jumps().isEmpty();
        return new Evolution(state, duration, DEFAULT_FRAMES, jumps ? DENSITY_TOLERANCE : DEFAULT_TOLERANCE);
    }

    /** The same with this many equal time steps. */
    public Evolution frames(long frames) {
        return new Evolution(state, duration, frames, tolerance);
    }

    /** The same to this error of the state. */
    public Evolution tolerance(double tolerance) {
        return new Evolution(state, duration, frames, tolerance);
    }

    /** The duration in scaled time. */
    public double scaledDuration() {
        return duration.kind() == Kind.PERIODS
                ? duration.value() * state.period()
                : duration.si() / state.oscillator().scale().time();
    }

    /**
     * How it would be computed, before it runs: method, size, memory and time.
     *
     * @throws PhysicsException if it is known already that it cannot be
     */
    public Plan plan() {
        return Plan.of(this);
    }

    /**
     * Runs it.
     *
     * @throws PhysicsException.TooLarge before anything is allocated, if the run does not fit in memory
     * @throws PhysicsException.NotCarried if the bound levels cannot carry the state
     * @throws java.util.concurrent.CancellationException if the thread is interrupted
     */
    public Run run() {
        return Run.of(this);
    }
}
