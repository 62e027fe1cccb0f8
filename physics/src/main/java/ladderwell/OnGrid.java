package ladderwell;

import ladderwell.evidence.Bound;
import ladderwell.evidence.Record;
import ladderwell.numeric.Interruption;
import ladderwell.packet.Grid;
import ladderwell.packet.GridFrame;
import ladderwell.packet.GridMotion;
import ladderwell.packet.PotentialField;
import ladderwell.phasespace.PhaseState;
import ladderwell.phasespace.SampledWave;
import ladderwell.state.Shape;

/** A run on a grid of positions: where the potential moves, or the levels do not carry the state. */
final class OnGrid implements Representation {
    /** The density covers what is above this share of a frame's peak. */
    private static final double SHARE = 1e-7;

    /** Density between points of a grid, relative to the peak: see {@link GridFrame#density}. */
    private static final double BETWEEN = 1e-8;

    /** A wall that lies as high above the packet's energy as this many times what it is turns every wave back before it. */
    private static final double STEEP = 1e3;

    private final GridMotion motion;
    private final String reason;
    private final GridReadings readings;

    private OnGrid(State state, GridMotion motion, Shape shape, String reason) {
        this.motion = motion;
        this.reason = reason;
        readings = new GridReadings(state.oscillator(), motion, shape);
    }

    /** V(x, t) of an oscillator. */
    private record Field(Oscillator oscillator) implements PotentialField {
        @Override
        public void values(double[] x, double t, double[] out) {
            if (oscillator instanceof MovingWell moving) {
                moving.motion().values(x, t, out);
            } else if (oscillator instanceof PotentialWell well) {
                well.potential().values(x, out);
            } else {
                for (int i = 0; i < x.length; i++) {
                    out[i] = oscillator.potential(x[i]);
                }
            }
        }

        @Override
        public boolean moves() {
            return oscillator.moves();
        }

        @Override
        public double[] breaks(double from, double to) {
            return oscillator instanceof MovingWell moving ? moving.motion().breakTimes(from, to) : new double[0];
        }
    }

    /** Whether a grid is worth trying: a potential without jumps and kinks on the whole axis, or with ends that are no sudden walls. */
    static boolean fits(State state) {
        Oscillator oscillator = state.oscillator();
        if (!(oscillator instanceof PotentialWell well)
                || well.potential().period().isPresent()) {
            return oscillator.moves();
        }
        if (oscillator.breaks().length > 0) {
            return false;
        }
        double high = STEEP * (1 + Math.abs(state.meanEnergy()));
        double inside = 1e-9;
        double left = oscillator.left();
        double right = oscillator.right();
        return (Double.isInfinite(left) || oscillator.potential(left + inside * Math.abs(left)) > high)
                && (Double.isInfinite(right) || oscillator.potential(right - inside * Math.abs(right)) > high);
    }

    static OnGrid of(Evolution evolution, double[] times, String reason) {
        State state = evolution.state();
        Shape shape = Shapes.of(state);
        GridMotion motion = GridMotion.of(new Field(state.oscillator()), shape, times, evolution.tolerance());
        return new OnGrid(state, motion, shape, reason);
    }

    @Override
    public int times() {
        return motion.times();
    }

    @Override
    public double time(int j) {
        return motion.frame(j).time();
    }

    @Override
    public Bound stateError() {
        return motion.error();
    }

    @Override
    public String method() {
        return "split operator of order 4 on a grid";
    }

    @Override
    public String reason() {
        return reason;
    }

    @Override
    public String size() {
        return motion.grid().points() + " points, " + motion.steps() + " steps";
    }

    @Override
    public void describe(Record.Builder record) {
        Grid grid = motion.grid();
        record.size("points", grid.points()).size("steps", motion.steps());
    }

    @Override
    public Series series(Observable observable) {
        return readings.series(observable);
    }

    @Override
    public Density density(Run run, int points) {
        if (points < 2) {
            throw new IllegalArgumentException("a density needs at least 2 points, not " + points);
        }
        Memory.require(
                "a density of " + times() + " times and " + points + " points",
                (double) Double.BYTES * times() * points,
                "ask for fewer frames or fewer points");
        double left = Double.POSITIVE_INFINITY;
        double right = Double.NEGATIVE_INFINITY;
        for (int j = 0; j < times(); j++) {
            double[] extent = motion.frame(j).extent(SHARE);
            left = Math.min(left, extent[0]);
            right = Math.max(right, extent[1]);
        }
        double[] x = new double[points];
        for (int i = 0; i < points; i++) {
            x[i] = left + (right - left) * i / (points - 1);
        }
        double[][] values = new double[times()][];
        double peak = 0;
        for (int j = 0; j < times(); j++) {
            Interruption.check();
            values[j] = motion.frame(j).density(x);
            for (double value : values[j]) {
                peak = Math.max(peak, value);
            }
        }
        // a wave of norm δ without waves beyond those of the grid is nowhere above δ/√spacing
        double off = motion.error().size() / Math.sqrt(motion.grid().spacing());
        double error = (2 * Math.sqrt(peak) + off) * off + BETWEEN * peak;
        return new Density(run, x, values, Bound.estimated(error), "values on a grid");
    }

    @Override
    public double instant(double time) {
        return time(Representation.nearest(this, time));
    }

    @Override
    public PhaseState phaseState(State state, double time) {
        GridFrame frame = motion.frame(Representation.nearest(this, time));
        return SampledWave.onGrid(frame.grid().left(), frame.grid().spacing(), frame.re(), frame.im(), motion.error());
    }

    @Override
    public String verdict(Run run) {
        return Verdict.onGrid(run);
    }
}
