package ladderwell;

import java.util.Optional;
import ladderwell.evidence.Bound;
import ladderwell.evidence.PhysicsException;
import ladderwell.evidence.Record;
import ladderwell.operator.OperatorFormula;
import ladderwell.phasespace.Displaced;
import ladderwell.phasespace.NumberMatrix;
import ladderwell.phasespace.NumberWave;
import ladderwell.phasespace.PhaseState;
import ladderwell.state.Amplitudes;
import ladderwell.state.Mixture;
import ladderwell.window.MixedWindow;
import ladderwell.window.PureWindow;
import ladderwell.window.WindowMotion;
import ladderwell.window.WindowState;

/** A run of a mode in a window of number states that follows it: a vector where nothing jumps, else a density operator. */
final class OnWindow implements Representation {
    /** Share of the tolerance that the start may take. */
    private static final double START = 0.1;
    /** A density operator of so many quanta fits in a number window. */
    private static final double WINDOW_QUANTA = 1e4;

    private final WindowMotion motion;
    private final boolean pure;
    private final boolean varies;
    private final String remark;
    private final WindowReadings readings;

    private OnWindow(LadderMode mode, Amplitudes start, WindowMotion motion, boolean pure, String remark) {
        this.remark = remark;
        varies = mode.moves();
        this.motion = motion;
        this.pure = pure;
        readings = new WindowReadings(mode, start, motion);
    }

    static OnWindow of(Evolution evolution, LadderMode mode, double[] times) {
        double tolerance = evolution.tolerance();
        OperatorFormula h = mode.hamiltonian();
        boolean pure = mode.jumps().isEmpty();
        double memory = Memory.allowed();
        Optional<FrameChoice> choice = FrameChoice.of(evolution, mode);
        if (choice.isPresent()) {
            Optional<WindowMotion> framed = framed(
                    mode,
                    (Coherent) evolution.state(),
                    times,
                    tolerance,
                    choice.get().mostLevels());
            if (framed.isPresent()) {
                return new OnWindow(mode, Amplitudes.level(0), framed.get(), pure, "");
            }
        }
        Amplitudes start = evolution.state().amplitudes(Math.max(1e-13, START * tolerance / 2));
        WindowMotion motion = pure
                ? WindowMotion.pure(h, start, times, tolerance, memory)
                : WindowMotion.mixed(h, mode.jumps(), Mixture.pure(start).density(memory), times, tolerance, memory);
        return new OnWindow(mode, start, motion, pure, choice.isPresent() ? "; the state left a displaced frame" : "");
    }

    /** Empty if the fluctuation outgrew the frame, or the frame's own bound did not hold: the number window may do better. */
    private static Optional<WindowMotion> framed(
            LadderMode mode, Coherent start, double[] times, double tolerance, int mostLevels) {
        double swing = Math.sqrt(start.mean());
        try {
            return WindowMotion.framed(
                    mode.hamiltonian(),
                    mode.jumps(),
                    swing * Math.cos(start.phaseAngle()),
                    swing * Math.sin(start.phaseAngle()),
                    times,
                    tolerance,
                    mostLevels,
                    Memory.allowed());
        } catch (PhysicsException failed) {
            if (start.mean() > WINDOW_QUANTA) {
                throw failed;
            }
            return Optional.empty();
        }
    }

    boolean isPure() {
        return pure;
    }

    WindowMotion motion() {
        return motion;
    }

    @Override
    public int times() {
        return motion.size();
    }

    @Override
    public double time(int j) {
        return motion.time(j);
    }

    @Override
    public Bound stateError() {
        return motion.state(motion.size() - 1).error();
    }

    @Override
    public String method() {
        if (motion.framed()) {
            return "Taylor series of the " + (pure ? "vector" : "density operator")
                    + " in a frame displaced along the mean-field path";
        }
        return (varies ? "Taylor" : "Chebyshev") + " series of the " + (pure ? "vector" : "density operator")
                + " in a window of number states";
    }

    @Override
    public String reason() {
        return (pure ? "nothing jumps" : "the mode jumps") + " and the Hamiltonian "
                + (varies ? "varies with time" : "does not vary")
                + (motion.framed() ? "; the fluctuation is small beside the displacement" : remark);
    }

    @Override
    public String size() {
        return "up to " + motion.work().mostLevels() + " levels, "
                + motion.work().steps() + " steps";
    }

    @Override
    public void describe(Record.Builder record) {
        record.size("most levels", motion.work().mostLevels())
                .size("steps", motion.work().steps())
                .size("applications", motion.work().applications());
    }

    @Override
    public Series series(Observable observable) {
        return readings.series(observable);
    }

    @Override
    public Density density(Run run, int points) {
        return WindowDensity.of(run, motion, points);
    }

    @Override
    public double instant(double time) {
        return time(Representation.nearest(this, time));
    }

    @Override
    public PhaseState phaseState(State state, double time) {
        int j = Representation.nearest(this, time);
        WindowState at = motion.displaced(j);
        PhaseState seen = at instanceof PureWindow vector
                ? new NumberWave(vector.first(), vector.reals(), vector.imaginaries(), vector.error())
                : mixed((MixedWindow) at);
        if (!motion.framed()) {
            return seen;
        }
        double x = Math.sqrt(2) * motion.displacementRe(j).value();
        double p = Math.sqrt(2) * motion.displacementIm(j).value();
        return new Displaced(seen, x, p, 2 * Math.ulp(Math.max(Math.abs(x), Math.abs(p))));
    }

    private static PhaseState mixed(MixedWindow at) {
        return new NumberMatrix(at.first(), at.levels(), at.lowerRe(), at.lowerIm(), at.traceNormError());
    }

    @Override
    public String verdict(Run run) {
        return Verdict.inWindow(run);
    }
}
