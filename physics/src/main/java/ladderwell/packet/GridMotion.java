package ladderwell.packet;

import ladderwell.evidence.Bound;
import ladderwell.evidence.PhysicsException;
import ladderwell.state.Shape;

/**
 * A wave packet in a potential, moved on a grid by the split-operator method. The grid grows in position and in momentum before the packet
 * reaches its edge; the step is chosen from the tolerance. The error is estimated: from the same motion with twice the step, from what
 * came near the edges, and from rounding.
 */
public final class GridMotion {
    /** Of the error of the larger step, order 4 leaves a fifteenth; a fifth is taken. */
    private static final double SHARE = 5;

    /** Allowance for the rounding of one step: 13 turns and 12 transforms, each off by a few 1e-16 that do not all add up. */
    private static final double ROUNDING = 2e-15;

    private static final int TRIALS = 12;

    /** Steps of a trial. */
    private static final int TRIAL_STEPS = 4;

    private static final long MOST_STEPS = 20_000_000;

    private final PotentialField field;
    private final GridFrame[] frames;
    private final long steps;
    private final double error;

    private GridMotion(PotentialField field, GridFrame[] frames, long steps, double error) {
        this.field = field;
        this.frames = frames;
        this.steps = steps;
        this.error = error;
    }

    /**
     * Moves a packet.
     *
     * @param field the potential
     * @param shape the packet at time 0
     * @param times ascending, the first 0
     * @param tolerance largest ‖ψ − ψ̃‖ allowed
     * @throws PhysicsException.NotConverged if no step reaches the tolerance
     * @throws PhysicsException.TooLarge if the grid or the frames would not fit
     */
    public static GridMotion of(PotentialField field, Shape shape, double[] times, double tolerance) {
        double still = tolerance / 100 * (tolerance / 100);
        Wave start = start(shape, still);
        double end = times[times.length - 1];
        double h = firstStep(field, shape, start, end, tolerance, still);
        PhysicsException.NotConverged last = null;
        for (int attempt = 0; attempt < TRIALS; attempt++) {
            Attempt result = new Attempt(field, start, times, h, tolerance, still);
            if (result.error <= tolerance) {
                return new GridMotion(field, result.frames, result.steps, result.error);
            }
            last = new PhysicsException.NotConverged(
                    "the packet on a grid (what its edges and rounding leave open sets this floor; ask for a looser "
                            + "tolerance or a shorter time)",
                    attempt + 1,
                    result.error,
                    tolerance);
            if (result.floor > tolerance / 2) {
                throw last;
            }
            h *= Math.max(0.2, Math.min(0.7, Math.pow(tolerance / 3 / result.error, 1.0 / SplitStep.ORDER)));
        }
        throw last == null ? new IllegalStateException("no attempt was made") : last;
    }

    private static Wave start(Shape shape, double still) {
        double margin = (shape.right() - shape.left()) / 4;
        Grid grid = Grid.covering(shape.left() - margin, shape.right() + margin, 1.5 * shape.wave());
        if (grid.points() > Pair.MOST_POINTS) {
            throw new PhysicsException.TooLarge(
                    "a packet on a grid of " + grid.points() + " points",
                    grid.points() * 24.0 * Double.BYTES,
                    Pair.MOST_POINTS * 24.0 * Double.BYTES,
                    "make it slower or smoother");
        }
        Wave wave = GridFrame.sampled(shape, grid);
        double norm = wave.norm();
        for (int j = 0; j < wave.re.length; j++) {
            wave.re[j] /= norm;
            wave.im[j] /= norm;
        }
        if (!(Math.abs(norm - 1) <= 1e-3)) {
            throw new IllegalArgumentException("the packet lies to a part of " + Math.abs(1 - norm)
                    + " where the potential is infinite; expected one inside");
        }
        return wave;
    }

    /** A step whose error over the whole time should be the tolerance, from short trials. */
    private static double firstStep(
            PotentialField field, Shape shape, Wave start, double end, double tolerance, double still) {
        double length = start.grid.spacing() * start.grid.points();
        // no more than a side of the grid in one step
        double most = Math.min(end, length / Wave.SIDE / shape.wave());
        double h = Math.min(most, 0.05);
        for (int trial = 0; trial < TRIALS; trial++) {
            Pair pair = new Pair(field, start, h, still);
            pair.move(0, TRIAL_STEPS, h);
            double projected = pair.difference() / SHARE * (end / (TRIAL_STEPS * h));
            double wanted = tolerance / 4;
            double ratio = Math.pow(wanted / Math.max(projected, 1e-300), 1.0 / SplitStep.ORDER);
            double next = Math.min(most, h * Math.max(0.05, Math.min(4, ratio)));
            boolean close = next > 0.7 * h && next < 1.5 * h;
            h = next;
            if (close) {
                break;
            }
        }
        return h;
    }

    /** One run with one step; given up as soon as its error is beyond repair. */
    private static final class Attempt {
        final GridFrame[] frames;
        double error;
        double floor;
        long steps;

        Attempt(PotentialField field, Wave start, double[] times, double h, double tolerance, double still) {
            frames = new GridFrame[times.length];
            frames[0] = new GridFrame(start, times[0]);
            double interval = times.length > 1 ? times[1] - times[0] : h;
            double first = Math.min(h, interval);
            Pair pair = new Pair(field, start, first, still);
            double bytes = 0;
            for (int j = 1; j < times.length; j++) {
                double from = times[j - 1];
                double[] breaks = field.moves() ? field.breaks(from, times[j]) : new double[0];
                for (int leg = 0; leg <= breaks.length; leg++) {
                    double to = leg < breaks.length ? breaks[leg] : times[j];
                    if (!(to > from)) {
                        continue;
                    }
                    double wanted = Math.ceil((to - from) / h);
                    if (wanted * (times.length - 1) > MOST_STEPS) {
                        throw new PhysicsException.TooLarge(
                                "a motion of " + (long) (wanted * (times.length - 1)) + " steps",
                                wanted * (times.length - 1),
                                MOST_STEPS,
                                "ask for a shorter time or a looser tolerance");
                    }
                    int whole = Math.max(1, (int) wanted);
                    pair.move(from, whole, (to - from) / whole);
                    from = to;
                }
                steps = pair.steps();
                floor = pair.leaked() + ROUNDING * steps;
                error = Math.max(error, pair.difference() / SHARE + floor);
                if (error > tolerance) {
                    // what it would have become
                    error = Math.max(error, pair.difference() / SHARE * (times[times.length - 1] / times[j]) + floor);
                    return;
                }
                frames[j] = new GridFrame(pair.wave().copy(), times[j]);
                bytes += 2.0 * Double.BYTES * pair.wave().grid.points();
                requireRoom(bytes / j * times.length);
            }
        }

        private static void requireRoom(double bytes) {
            double allowed = Runtime.getRuntime().maxMemory() / 4.0;
            if (bytes > allowed) {
                throw new PhysicsException.TooLarge(
                        "the frames of a packet on a grid", bytes, allowed, "ask for fewer frames");
            }
        }
    }

    /** The potential. */
    public PotentialField field() {
        return field;
    }

    /** Number of times. */
    public int times() {
        return frames.length;
    }

    /** The wave function at the j-th time. */
    public GridFrame frame(int j) {
        return frames[j];
    }

    /** ⟨φ|ψ⟩ at every time with another state, given as a function of position. @shape [time]{real, imaginary part} */
    public double[][] overlaps(Shape other) {
        return GridFrame.overlaps(frames, other);
    }

    /** Steps taken in all. */
    public long steps() {
        return steps;
    }

    /** The largest grid of the motion, which is its last. */
    public Grid grid() {
        return frames[frames.length - 1].grid();
    }

    /** δ ≥ ‖ψ − ψ̃‖ at every time, estimated. */
    public Bound error() {
        return Bound.estimated(error);
    }
}
