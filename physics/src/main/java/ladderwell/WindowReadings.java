package ladderwell;

import java.util.function.ToDoubleFunction;
import ladderwell.evidence.Certainty;
import ladderwell.operator.LadderPolynomial;
import ladderwell.operator.OperatorFormula;
import ladderwell.state.Amplitudes;
import ladderwell.window.MixedWindow;
import ladderwell.window.PureWindow;
import ladderwell.window.WindowMotion;
import ladderwell.window.WindowState;

/**
 * What each observable means for a state in a window. Bounded observables have guaranteed errors, |tr(Aδ)| ≤ ‖A‖ ‖δ‖₁; moments have estimated ones, since
 * the trace norm does not bound them: ‖A‖ is taken on the window and half as many levels more.
 */
final class WindowReadings {
    private static final LadderPolynomial A = LadderPolynomial.a();
    private static final LadderPolynomial QUANTA = LadderPolynomial.number();

    private final LadderMode mode;
    private final Amplitudes start;
    private final WindowMotion motion;

    WindowReadings(LadderMode mode, Amplitudes start, WindowMotion motion) {
        this.mode = mode;
        this.start = start;
        this.motion = motion;
    }

    /** A value with its error. */
    private record Reading(double value, double error) {
        Reading root() {
            double root = Math.sqrt(Math.max(0, value));
            // |√a − √b| ≤ |a − b|/(√a + √b), and never above √|a − b|
            return new Reading(root, root > 0 ? Math.min(error / root, Math.sqrt(error)) : Math.sqrt(error));
        }
    }

    private interface Reader {
        Reading at(WindowState state, int j);
    }

    Series series(Observable o) {
        if (o.level() >= 0) {
            return along(o, Certainty.GUARANTEED, (s, j) -> {
                long i = o.level() - s.first();
                double value = i >= 0 && i < s.levels() ? s.population((int) i) : 0;
                return new Reading(value, s.traceNormError().size() + Math.ulp(1.0));
            });
        }
        if (o.equals(Observable.POSITION)) {
            return along(o, Certainty.ESTIMATED, (s, j) -> linear(s, 0));
        }
        if (o.equals(Observable.MOMENTUM)) {
            return along(o, Certainty.ESTIMATED, (s, j) -> linear(s, 1));
        }
        if (o.equals(Observable.SPREAD_OF_POSITION)) {
            return along(o, Certainty.ESTIMATED, (s, j) -> variance(s, 0).root());
        }
        if (o.equals(Observable.SPREAD_OF_MOMENTUM)) {
            return along(o, Certainty.ESTIMATED, (s, j) -> variance(s, 1).root());
        }
        if (o.equals(Observable.UNCERTAINTY_PRODUCT)) {
            return along(o, Certainty.ESTIMATED, (s, j) -> {
                Reading x = variance(s, 0).root();
                Reading p = variance(s, 1).root();
                return new Reading(2 * x.value * p.value, 2 * ((x.value + x.error) * p.error + x.error * p.value));
            });
        }
        if (o.equals(Observable.ENERGY)) {
            OperatorFormula h = mode.hamiltonian();
            return along(o, Certainty.ESTIMATED, (s, j) -> moment(s, h.at(motion.time(j)), 0));
        }
        if (o.equals(Observable.MEAN_QUANTA)) {
            return along(o, Certainty.ESTIMATED, (s, j) -> moment(s, QUANTA, 0));
        }
        if (o.equals(Observable.VARIANCE_OF_QUANTA)) {
            return along(o, Certainty.ESTIMATED, (s, j) -> quantaVariance(s));
        }
        if (o.equals(Observable.MANDEL_Q)) {
            return along(o, Certainty.ESTIMATED, (s, j) -> {
                Reading n = moment(s, QUANTA, 0);
                Reading v = quantaVariance(s);
                if (n.value <= 2 * n.error) {
                    throw new IllegalArgumentException(
                            "Mandel Q needs quanta: the mean quanta of this state are 0 at time " + motion.time(j));
                }
                double ratio = v.value / n.value;
                return new Reading(ratio - 1, (v.error + Math.abs(ratio) * n.error) / (n.value - n.error));
            });
        }
        if (o.equals(Observable.PURITY)) {
            return bounded(o, WindowState::purity, 2);
        }
        if (o.equals(Observable.NORM)) {
            return bounded(o, s -> s instanceof PureWindow ? Math.sqrt(s.trace()) : s.trace(), 1);
        }
        if (o.equals(Observable.RETURN_PROBABILITY)) {
            double first = start.normError();
            return bounded(o, s -> s.fidelity(start), 1, first * (2 + first));
        }
        if (o.equals(Observable.RETURN_AMPLITUDE_REAL)) {
            return overlap(o, 0);
        }
        if (o.equals(Observable.RETURN_AMPLITUDE_IMAGINARY)) {
            return overlap(o, 1);
        }
        throw new IllegalArgumentException("'" + o.name() + "' cannot be read from a " + mode.kind() + "; known are "
                + String.join(
                        ", ", Observable.all().stream().map(Observable::name).toList()));
    }

    private Series overlap(Observable o, int part) {
        return along(o, Certainty.GUARANTEED, (s, j) -> {
            if (s instanceof MixedWindow) {
                throw new IllegalArgumentException(
                        "a state that jumps has no return amplitude; ask for the return probability");
            }
            PureWindow pure = (PureWindow) s;
            return new Reading(pure.overlap(start)[part], pure.error().size() + start.normError() + 4 * Math.ulp(1.0));
        });
    }

    private Series bounded(Observable o, ToDoubleFunction<WindowState> value, double norm) {
        return bounded(o, value, norm, 0);
    }

    private Series bounded(Observable o, ToDoubleFunction<WindowState> value, double norm, double more) {
        return along(
                o,
                Certainty.GUARANTEED,
                (s, j) -> new Reading(
                        value.applyAsDouble(s), norm * s.traceNormError().size() + more + s.levels() * Math.ulp(1.0)));
    }

    private Series along(Observable o, Certainty certainty, Reader reader) {
        double[] values = new double[motion.size()];
        double[] errors = new double[motion.size()];
        for (int j = 0; j < values.length; j++) {
            Reading reading = reader.at(motion.state(j), j);
            values[j] = reading.value;
            errors[j] = reading.error;
        }
        return new Series(o, values, errors, certainty);
    }

    /** One part of tr(Pρ), with an error that holds if the part of the state beyond half as many levels more does not matter. */
    private static Reading moment(WindowState state, LadderPolynomial operator, int part) {
        double value = state.mean(operator)[part];
        return new Reading(
                value,
                size(state, operator) * state.traceNormError().size() + state.levels() * Math.ulp(Math.abs(value)));
    }

    /** Σ of the largest elements of each diagonal, up to half as many levels above the window. */
    private static double size(WindowState state, LadderPolynomial operator) {
        long top = state.first() + state.levels() + state.levels() / 2 + 4;
        double sum = 0;
        double[] re = new double[1];
        double[] im = new double[1];
        for (int b = -operator.lowers(); b <= operator.raises(); b++) {
            double most = 0;
            for (long n : new long[] {state.first() + Math.max(0, -b), top}) {
                operator.band(b, n, re, im);
                most = Math.max(most, Math.hypot(re[0], im[0]));
            }
            sum += most;
        }
        return sum;
    }

    private static Reading linear(WindowState state, int part) {
        Reading a = moment(state, A, part);
        return new Reading(Math.sqrt(2) * a.value, Math.sqrt(2) * a.error);
    }

    /** Variance of x (0) or p (1): ½ + ⟨n⟩ ± Re⟨a²⟩ − 2 (Re or Im ⟨a⟩)². */
    private static Reading variance(WindowState state, int part) {
        // about the mean: what is large drops out
        double[] alpha = state.mean(A);
        LadderPolynomial shifted = A.minus(LadderPolynomial.constant(alpha[0], alpha[1]));
        LadderPolynomial quadrature = part == 0
                ? shifted.plus(shifted.adjoint())
                : shifted.minus(shifted.adjoint()).times(0, -1);
        LadderPolynomial square = quadrature.power(2).times(0.5);
        Reading reading = moment(state, square, 0);
        double trace = state.trace();
        return new Reading(reading.value / trace, reading.error + Math.abs(trace - 1) * reading.value);
    }

    private static Reading quantaVariance(WindowState state) {
        double mean = moment(state, QUANTA, 0).value / state.trace();
        LadderPolynomial off = QUANTA.minus(LadderPolynomial.constant(mean, 0));
        return moment(state, off.power(2), 0);
    }
}
