package ladderwell;

import java.util.concurrent.CancellationException;
import ladderwell.evidence.Bound;
import ladderwell.level.Levels;
import ladderwell.motion.PhasedState;
import ladderwell.numeric.DensityFrames;
import ladderwell.numeric.Workers;
import ladderwell.state.Amplitudes;
import org.apache.commons.math3.special.Erf;

/** Chooses a grid that covers the motion and fills it with |ψ(x, t)|². */
final class DensityReading {
    /** Above this many quanta a coherent density is its closed form: its sum would only cost more. */
    private static final double CLOSED_FORM_ABOVE = 1e4;

    /** Spreads that the grid reaches beyond a turning point: the density there is below e^{−20} of its peak. */
    private static final double MARGIN = 4.5;

    /** Height of the last wave function at the edge of the grid. */
    private static final double DROP = 1e-4;

    /** The same in any potential, whose tails can be long: its square is no more than a picture can show. */
    private static final double SHOWN = 3e-3;

    /** Less of a state than this cannot be seen beside the rest. */
    private static final double INVISIBLE = 1e-4;

    private DensityReading() {}

    static Density of(Run run, PhasedState state, int points) {
        if (points < 2) {
            throw new IllegalArgumentException("a density needs at least 2 points, not " + points);
        }
        boolean closed = run.state() instanceof Coherent coherent && coherent.mean() > CLOSED_FORM_ABOVE;
        double levels = closed ? 0 : state.amplitudes().levels();
        Memory.require(
                "a density of " + run.times() + " times and " + points + " points",
                Double.BYTES * (run.times() * (points + 2 * levels) + levels * points),
                "ask for fewer frames or fewer points");
        double[] x = grid(run, state, points);
        return closed ? closedForm(run, (Coherent) run.state(), x) : sumOverLevels(run, state, x);
    }

    /** Mirror symmetric, bit by bit, where the levels are. */
    private static double[] grid(Run run, PhasedState state, int points) {
        double[] ends = extent(run, state);
        double middle = ends[0] == -ends[1] ? 0 : (ends[0] + ends[1]) / 2;
        double half = (ends[1] - ends[0]) / 2;
        double[] x = new double[points];
        for (int i = 0; i < points; i++) {
            x[i] = middle + half * (2 * i - (points - 1)) / (points - 1);
        }
        return x;
    }

    private static double[] extent(Run run, PhasedState state) {
        if (run.state() instanceof Coherent coherent) {
            double half = Math.sqrt(2 * coherent.mean()) + MARGIN;
            return new double[] {-half, half};
        }
        Oscillator oscillator = run.state().oscillator();
        double[] extent = oscillator
                .levels()
                .extent(highestThatShows(run, state), oscillator instanceof PotentialWell ? SHOWN : DROP);
        if (oscillator instanceof Box || oscillator instanceof FiniteWell) {
            double half = Math.max(0.55, Math.min(extent[1], 2));
            return new double[] {-half, half};
        }
        return extent;
    }

    /** The level above which less of the state lies than a picture could show; the last one of a harmonic oscillator. */
    private static long highestThatShows(Run run, PhasedState state) {
        Amplitudes amplitudes = state.amplitudes();
        if (run.state().oscillator() instanceof Harmonic) {
            return state.lastLevel();
        }
        double above = 0;
        for (int s = amplitudes.segments() - 1; s >= 0; s--) {
            for (int i = amplitudes.length(s) - 1; i >= 0; i--) {
                above += amplitudes.re(s, i) * amplitudes.re(s, i) + amplitudes.im(s, i) * amplitudes.im(s, i);
                if (above > INVISIBLE) {
                    return amplitudes.first(s) + i;
                }
            }
        }
        return state.lastLevel();
    }

    /** π^{−1/2} e^{−(x−x₀)²} at each point; on a grid coarser than the packet, its mean over one grid spacing. */
    private static Density closedForm(Run run, Coherent coherent, double[] x) {
        double spacing = x[1] - x[0];
        boolean average = spacing > 0.25;
        double[][] values = new double[run.times()][x.length];
        for (int j = 0; j < values.length; j++) {
            if (Thread.interrupted()) {
                throw new CancellationException("interrupted while computing the density");
            }
            double centre = Math.sqrt(2 * coherent.mean()) * Math.cos(coherent.phaseAngle() - run.time(j));
            for (int i = 0; i < x.length; i++) {
                double d = x[i] - centre;
                values[j][i] = average
                        ? Erf.erf(d - spacing / 2, d + spacing / 2) / (2 * spacing)
                        : Math.exp(-d * d) / Math.sqrt(Math.PI);
            }
        }
        // The centre is off by its rounding (amplitude × 4 ulp of the angle); the slope of the density is at most 0.49.
        double swing = Math.sqrt(2 * coherent.mean());
        double last = Math.abs(run.time(run.times() - 1)) + Math.abs(coherent.phaseAngle());
        double error = 0.49 * swing * (4 * Math.ulp(1.0) + 2 * Math.ulp(last)) + 1e-14;
        return new Density(
                run,
                x,
                values,
                Bound.guaranteed(error),
                average
                        ? "closed form of a coherent state, mean over a grid spacing"
                        : "closed form of a coherent state");
    }

    private static Density sumOverLevels(Run run, PhasedState state, double[] x) {
        Amplitudes amplitudes = state.amplitudes();
        Levels levels = state.levels();
        double coefficientError = state.error();
        double functionError = levels.waveFunctionError(state.lastLevel());
        double[][] values;
        double sumError;
        if (amplitudes.segments() == 1) {
            double[][] functions = levels.waveFunctions(amplitudes.first(0), amplitudes.length(0), x);
            DensityFrames frames =
                    levels.alternates() ? DensityFrames.alternating(functions) : DensityFrames.of(functions);
            values = frames.of(state.phases(0), workers());
            sumError = frames.errorBound(coefficientError, functionError, 1 + coefficientError);
        } else {
            int size = Math.toIntExact(amplitudes.levels());
            double[][] functions = new double[size][];
            double[][] re = new double[state.times()][size];
            double[][] im = new double[state.times()][size];
            int at = 0;
            for (int s = 0; s < amplitudes.segments(); s++) {
                int count = amplitudes.length(s);
                double[][] part = levels.waveFunctions(amplitudes.first(s), count, x);
                System.arraycopy(part, 0, functions, at, count);
                double[][] rowsRe = new double[state.times()][count];
                double[][] rowsIm = new double[state.times()][count];
                state.phases(s).fill(0, state.times(), rowsRe, rowsIm);
                for (int j = 0; j < state.times(); j++) {
                    System.arraycopy(rowsRe[j], 0, re[j], at, count);
                    System.arraycopy(rowsIm[j], 0, im[j], at, count);
                }
                at += count;
            }
            DensityFrames frames = DensityFrames.of(functions);
            values = frames.of(re, im, workers());
            sumError = frames.errorBound(coefficientError, functionError, 1 + coefficientError);
        }
        return new Density(run, x, values, bound(run, state, values, sumError), "sum over levels");
    }

    /**
     * Adds what the discarded levels could do at one point: at most tail sum × the largest wave function. Guaranteed where the
     * wave functions' own error is (box and well) and nothing lies above the bound levels; estimated for all other
     * functions and for packets.
     */
    private static Bound bound(Run run, PhasedState state, double[][] values, double sumError) {
        Oscillator oscillator = run.state().oscillator();
        double largest = 0;
        if (state.amplitudes().tailSum() > 0) {
            largest = switch (oscillator.levels().kind()) {
                case HARMONIC -> Math.pow(Math.PI, -0.25);
                case BOX, FINITE_WELL -> Math.sqrt(2);
                case GENERAL -> largest(oscillator.levels(), state.lastLevel());
            };
        }
        double off = state.amplitudes().tailSum() * largest;
        double peak = 0;
        for (double[] frame : values) {
            for (double value : frame) {
                peak = Math.max(peak, value);
            }
        }
        double size = sumError + (2 * Math.sqrt(peak + sumError) + off) * off;
        boolean proved =
                (oscillator instanceof Box || oscillator instanceof FiniteWell) && !(run.state() instanceof Packet);
        return proved ? new Bound(state.certainty(), size) : Bound.estimated(size);
    }

    /** Twice the largest value of the last kept function: those above are larger only near the turning points, and little. */
    private static double largest(Levels levels, long last) {
        double reach = levels.reach(last, DROP);
        double[] x = new double[4001];
        for (int i = 0; i < x.length; i++) {
            x[i] = reach * (i - 2000) / 2000.0;
        }
        double largest = 0;
        for (double value : levels.waveFunctions(last, 1, x)[0]) {
            largest = Math.max(largest, Math.abs(value));
        }
        return 2 * largest;
    }

    /** All cores: the frames are the same whatever their number. */
    private static Workers workers() {
        return new Workers(
                java.util.concurrent.ForkJoinPool.commonPool(),
                Math.max(1, Runtime.getRuntime().availableProcessors()));
    }
}
