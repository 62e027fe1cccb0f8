package ladderwell;

import java.util.ArrayList;
import java.util.List;
import ladderwell.evidence.Bound;
import ladderwell.numeric.Interruption;
import ladderwell.phasespace.PhaseField;
import ladderwell.phasespace.PhaseFunctions;
import ladderwell.phasespace.PhaseGrid;
import ladderwell.phasespace.PhaseState;
import ladderwell.phasespace.Support;

/** The Wigner function of a run at evenly chosen times, on one grid that covers the motion; scaled units. */
public final class PhaseFilm {
    /** Positions, and momenta, where none are asked for. */
    public static final int DEFAULT_POINTS = 81;

    /** More moments than this are thinned. */
    public static final int MOST_FRAMES = 61;

    private static final double SHARE = 1e-5;

    private final Run run;
    private final int stride;
    private final PhaseGrid grid;
    private final List<PhaseField> frames;

    private PhaseFilm(Run run, int stride, PhaseGrid grid, List<PhaseField> frames) {
        this.run = run;
        this.stride = stride;
        this.grid = grid;
        this.frames = frames;
    }

    static PhaseFilm of(Run run, int points) {
        if (points < 11 || points > 401) {
            throw new IllegalArgumentException(
                    "a film of Wigner functions has 11 to 401 points on a side, not " + points);
        }
        int stride = (run.times() - 2) / (MOST_FRAMES - 1) + 1;
        int count = (run.times() - 1) / stride + 1;
        Memory.require(
                "a film of " + count + " frames with " + points + " × " + points + " points",
                (double) Double.BYTES * count * points * points,
                "ask for fewer points");
        List<PhaseState> states = new ArrayList<>();
        for (int j = 0; j < count; j++) {
            Interruption.check();
            states.add(run.representation().phaseState(run.state(), run.time(j * stride)));
        }
        Support box = states.get(0).visible(SHARE);
        for (PhaseState state : states) {
            box = box.around(state.visible(SHARE));
        }
        PhaseGrid grid = PhaseGrid.covering(box, points, points);
        PhaseFunctions functions = new PhaseFunctions();
        List<PhaseField> frames = new ArrayList<>();
        for (PhaseState state : states) {
            frames.add(functions.wigner(state, grid));
        }
        return new PhaseFilm(run, stride, grid, List.copyOf(frames));
    }

    /** The run it was read from. */
    public Run run() {
        return run;
    }

    /** How many of the run's times lie from one frame to the next. */
    public int stride() {
        return stride;
    }

    /** Number of frames. */
    public int frames() {
        return frames.size();
    }

    /** The scaled time of a frame. */
    public double time(int frame) {
        return run.time(frame * stride);
    }

    /** The grid, the same for all frames. */
    public PhaseGrid grid() {
        return grid;
    }

    /** The Wigner function of a frame. */
    public PhaseField frame(int frame) {
        return frames.get(frame);
    }

    /** How far any value can be off. */
    public Bound bound() {
        Bound bound = frames.get(0).bound();
        for (PhaseField frame : frames) {
            bound = bound.widest(frame.bound());
        }
        return bound;
    }

    /** The largest |W| of all frames, for a scale that stays fixed. */
    public double peak() {
        double peak = 0;
        for (PhaseField frame : frames) {
            peak = Math.max(peak, frame.peak());
        }
        return peak;
    }
}
