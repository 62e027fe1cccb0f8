package ladderwell;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import ladderwell.classical.ClassicalOrbit;
import ladderwell.evidence.PhysicsException;
import ladderwell.quantity.Digits;
import ladderwell.state.Amplitudes;
import ladderwell.window.Forecast;
import tech.tablesaw.api.StringColumn;
import tech.tablesaw.api.Table;

/**
 * How an evolution would be computed, before it runs: sizes, memory and time are forecasts, right within a factor of a few where they are given.
 *
 * @param method the method that would be tried first
 * @param reason why
 * @param size what would be kept, in words
 * @param bytes memory for what is kept at all times; NaN where it shows only on the way
 * @param seconds time on a slow core; NaN where it shows only on the way
 */
public record Plan(String method, String reason, String size, double bytes, double seconds) {
    /** One amplitude at one time: its phase, and its share of the readings. */
    private static final double SECONDS_PER_PHASE = 2e-8;

    private static final int LOOKS = 400;
    /** Norm error of a look at which levels a state fills. */
    private static final double ROUGH = 1e-3;
    /** Levels of a fluctuation in a frame, mostly fewer. */
    private static final int FRAME_LEVELS = 40;
    /** A number window reaches so many spreads of a coherent state beyond the mean quanta on each side. */
    private static final double SPREADS = 7;

    static Plan of(Evolution evolution) {
        Oscillator oscillator = evolution.state().oscillator();
        if (oscillator instanceof LadderMode mode && !mode.isDiagonal()) {
            return ofMode(evolution, mode);
        }
        if (oscillator.moves()) {
            return onGrid("the potential depends on time");
        }
        if (oscillator.levels().count() == 0) {
            return onGrid("the potential binds nothing");
        }
        try {
            double levels =
                    evolution.state().amplitudes(evolution.tolerance() / 2).levels();
            double times = evolution.frames() + 1.0;
            return new Plan(
                    "exact phases on levels",
                    "the Hamiltonian does not depend on time and its levels are known",
                    Digits.shortest(levels) + " levels, " + Digits.shortest(times) + " times",
                    Double.BYTES * (4 * levels + 24 * times),
                    SECONDS_PER_PHASE * levels * times);
        } catch (PhysicsException levels) {
            if (!OnGrid.fits(evolution.state())) {
                throw levels;
            }
            return onGrid("the levels do not carry the state to this tolerance");
        }
    }

    private static Plan onGrid(String reason) {
        return new Plan(
                "split operator of order 4 on a grid",
                reason,
                "grid and step are found as it runs",
                Double.NaN,
                Double.NaN);
    }

    private static Plan ofMode(Evolution evolution, LadderMode mode) {
        double time = evolution.scaledDuration();
        double times = evolution.frames() + 1.0;
        boolean pure = mode.jumps().isEmpty();
        Optional<FrameChoice> frame = FrameChoice.of(evolution, mode);
        boolean framed = frame.isPresent();
        double[] range = framed ? new double[] {0, 0} : quanta(evolution, mode, time);
        double low = Math.max(0, range[0] - SPREADS * Math.sqrt(range[0]) - 10);
        double high = range[1] + SPREADS * Math.sqrt(range[1]) + 10;
        int levels = framed ? FRAME_LEVELS : (int) Math.min(1e6, high - low);
        Forecast forecast = Forecast.of(
                framed
                        ? mode.hamiltonian().at(0).diagonalPart().times(0)
                        : mode.hamiltonian().at(0),
                mode.jumps(),
                framed ? 0 : (long) low,
                levels,
                time);
        String form = pure ? "vector" : "density operator";
        double kept = pure ? 16.0 * levels : 8.0 * levels * (levels + 1.0);
        if (framed) {
            return new Plan(
                    "Taylor series of the " + form + " in a frame displaced along the mean-field path",
                    "the fluctuation is expected to stay small beside the displacement",
                    "some " + levels + " levels; a number window if the state leaves the frame",
                    kept * times,
                    Double.NaN);
        }
        boolean varies = mode.moves();
        return new Plan(
                (varies ? "Taylor" : "Chebyshev") + " series of the " + form + " in a window of number states",
                (pure ? "nothing jumps" : "the mode jumps") + " and the Hamiltonian "
                        + (varies ? "varies with time" : "does not vary"),
                "about " + levels + " levels, " + Digits.significant(forecast.applications(), 1)
                        + " applications of the generator",
                forecast.bytes() + kept * times,
                (varies ? 4 : 1) * forecast.seconds());
    }

    /** Least and most mean quanta on the mean-field orbit; where the state is no swing, what it starts with. */
    private static double[] quanta(Evolution evolution, LadderMode mode, double time) {
        State state = evolution.state();
        double x = 0;
        double p = 0;
        double more = 0;
        if (state instanceof Coherent coherent) {
            x = coherent.position();
            p = coherent.momentum();
        } else {
            Amplitudes rough = state.amplitudes(ROUGH);
            int last = rough.segments() - 1;
            more = rough.first(last) + rough.length(last) - 1.0;
        }
        ClassicalOrbit orbit = mode.orbit(x, p, 0);
        double least = Double.POSITIVE_INFINITY;
        double most = 0;
        for (int i = 0; i <= LOOKS; i++) {
            double t = time * i / LOOKS;
            double n = (Math.pow(orbit.position(t), 2) + Math.pow(orbit.momentum(t), 2)) / 2;
            least = Math.min(least, n);
            most = Math.max(most, n);
        }
        return new double[] {more > 0 ? 0 : least, most + more};
    }

    /** The plan as a table of two columns. */
    public Table table() {
        List<String> what = new ArrayList<>(List.of("method", "reason", "size"));
        List<String> value = new ArrayList<>(List.of(method, reason, size));
        if (Double.isFinite(bytes)) {
            what.add("memory");
            value.add("about " + Digits.significant(Math.max(bytes, 1e3) / 1e6, 2) + " MB");
        }
        if (Double.isFinite(seconds)) {
            what.add("time");
            value.add(seconds < 1 ? "under a second" : "about " + Digits.significant(seconds, 1) + " s");
        }
        return Table.create("plan", StringColumn.create("plan", what), StringColumn.create("expected", value));
    }
}
