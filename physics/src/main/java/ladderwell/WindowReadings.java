package ladderwell;

import java.util.function.ToDoubleFunction;
import ladderwell.evidence.Certainty;
import ladderwell.numeric.DoubleDouble;
import ladderwell.operator.LadderPolynomial;
import ladderwell.operator.OperatorFormula;
import ladderwell.state.Amplitudes;
import ladderwell.state.HarmonicStates;
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
    private static final double FRAME_TOLERANCE = 1e-12;
    /** A coherent state with so many quanta for each level of a window has next to nothing in it. */
    private static final double FAR = 8;

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
            return along(o, Certainty.GUARANTEED, (s, j) -> population(o.level(), s, j));
        }
        if (o.equals(Observable.POSITION)) {
            return along(o, Certainty.ESTIMATED, (s, j) -> linear(s, j, 0));
        }
        if (o.equals(Observable.MOMENTUM)) {
            return along(o, Certainty.ESTIMATED, (s, j) -> linear(s, j, 1));
        }
        if (o.equals(Observable.SPREAD_OF_POSITION)) {
            return along(o, Certainty.ESTIMATED, (s, j) -> variance(s, j, 0).root());
        }
        if (o.equals(Observable.SPREAD_OF_MOMENTUM)) {
            return along(o, Certainty.ESTIMATED, (s, j) -> variance(s, j, 1).root());
        }
        if (o.equals(Observable.UNCERTAINTY_PRODUCT)) {
            return along(o, Certainty.ESTIMATED, (s, j) -> {
                Reading x = variance(s, j, 0).root();
                Reading p = variance(s, j, 1).root();
                return new Reading(2 * x.value * p.value, 2 * ((x.value + x.error) * p.error + x.error * p.value));
            });
        }
        if (o.equals(Observable.ENERGY)) {
            OperatorFormula h = mode.hamiltonian();
            return along(o, Certainty.ESTIMATED, (s, j) -> moment(s, j, h.at(motion.time(j)), 0));
        }
        if (o.equals(Observable.MEAN_QUANTA)) {
            return along(o, Certainty.ESTIMATED, (s, j) -> moment(s, j, QUANTA, 0));
        }
        if (o.equals(Observable.VARIANCE_OF_QUANTA)) {
            return along(o, Certainty.ESTIMATED, (s, j) -> quantaVariance(s, j));
        }
        if (o.equals(Observable.MANDEL_Q)) {
            return along(o, Certainty.ESTIMATED, (s, j) -> {
                Reading n = moment(s, j, QUANTA, 0);
                Reading v = quantaVariance(s, j);
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
            return along(o, Certainty.GUARANTEED, this::returned);
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
            if (motion.framed()) {
                throw new IllegalArgumentException(
                        "the phase of a state in a displaced frame is not carried; ask for the return probability");
            }
            PureWindow pure = (PureWindow) s;
            return new Reading(pure.overlap(start)[part], pure.error().size() + start.normError() + 4 * Math.ulp(1.0));
        });
    }

    private Series bounded(Observable o, ToDoubleFunction<WindowState> value, double norm) {
        return along(
                o,
                Certainty.GUARANTEED,
                (s, j) -> new Reading(
                        value.applyAsDouble(s), norm * s.traceNormError().size() + s.levels() * Math.ulp(1.0)));
    }

    private Series along(Observable o, Certainty certainty, Reader reader) {
        double[] values = new double[motion.size()];
        double[] errors = new double[motion.size()];
        for (int j = 0; j < values.length; j++) {
            Reading reading = reader.at(motion.state(j), j);
            values[j] = reading.value;
            errors[j] = reading.error;
        }
        // no reading is surer than the run that it is read from
        Certainty run = motion.state(values.length - 1).error().kind();
        return new Series(o, values, errors, certainty.weaker(run));
    }

    private Reading population(long level, WindowState s, int j) {
        double error = s.traceNormError().size() + s.levels() * Math.ulp(1.0);
        if (motion.framed()) {
            // ⟨n|D(α) σ D(α)†|n⟩ with D(α)†|n⟩ = D(−α)|n⟩
            Amplitudes seen = displaced(level, -re(j), -im(j));
            WindowState plain = motion.displaced(j);
            return new Reading(
                    plain.fidelity(seen),
                    plain.traceNormError().size() + plain.levels() * Math.ulp(1.0) + 3 * seen.normError());
        }
        long i = level - s.first();
        return new Reading(i >= 0 && i < s.levels() ? s.population((int) i) : 0, error);
    }

    private static Amplitudes displaced(long level, double re, double im) {
        return HarmonicStates.displacedNumber(level, re * re + im * im, Math.atan2(im, re), FRAME_TOLERANCE);
    }

    /** ⟨ψ(0)|ρ|ψ(0)⟩. */
    private Reading returned(WindowState s, int j) {
        double error = s.traceNormError().size() + s.levels() * Math.ulp(1.0);
        if (!motion.framed()) {
            double first = start.normError();
            return new Reading(s.fidelity(start), error + first * (2 + first));
        }
        // a coherent state seen from the frame is coherent about the difference
        double re = motion.displacementRe(0).minus(motion.displacementRe(j)).value();
        double im = motion.displacementIm(0).minus(motion.displacementIm(j)).value();
        if (re * re + im * im > FAR * (s.levels() + 100.0)) {
            return new Reading(0, error + Math.exp(-s.levels()));
        }
        Amplitudes seen = Amplitudes.coherent(re * re + im * im, Math.atan2(im, re), FRAME_TOLERANCE);
        WindowState plain = motion.displaced(j);
        return new Reading(
                plain.fidelity(seen),
                plain.traceNormError().size() + plain.levels() * Math.ulp(1.0) + 3 * seen.normError());
    }

    private double re(int j) {
        return motion.displacementRe(j).value();
    }

    private double im(int j) {
        return motion.displacementIm(j).value();
    }

    /**
     * One part of tr(Pρ), with an error that holds if the part of the state beyond half as many levels more does not matter. The constant of P counts
     * in full, since the exact trace is 1.
     */
    private Reading moment(WindowState state, int j, LadderPolynomial operator, int part) {
        LadderPolynomial seen = motion.seen(j, operator);
        LadderPolynomial constant = LadderPolynomial.term(0, 0, seen.fullRe(0, 0), seen.fullIm(0, 0));
        LadderPolynomial rest = seen.minus(constant);
        double still = part == 0 ? seen.re(0, 0) : seen.im(0, 0);
        double value = state.mean(rest)[part];
        double size = size(state, rest);
        return new Reading(
                still + value,
                size * (state.traceNormError().size() + state.levels() * Math.ulp(1.0)) + 2 * Math.ulp(still));
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

    private Reading linear(WindowState state, int j, int part) {
        Reading a = moment(state, j, A, part);
        return new Reading(Math.sqrt(2) * a.value, Math.sqrt(2) * a.error);
    }

    /** Variance of x (0) or p (1), taken about the mean: what is large drops out. */
    private Reading variance(WindowState state, int j, int part) {
        LadderPolynomial lowering = motion.fluctuation(j, A);
        double[] alpha = state.mean(lowering);
        LadderPolynomial off = lowering.minus(LadderPolynomial.constant(alpha[0], alpha[1]));
        LadderPolynomial quadrature =
                part == 0 ? off.plus(off.adjoint()) : off.minus(off.adjoint()).times(0, -1);
        Reading reading = fluctuation(state, quadrature.power(2).times(0.5));
        Reading mean = fluctuation(state, off);
        // a wrong mean widens by its square
        return new Reading(reading.value, reading.error + 2 * mean.error * mean.error);
    }

    /** A moment of what the window carries, in its own frame. */
    private static Reading fluctuation(WindowState state, LadderPolynomial operator) {
        double value = state.mean(operator)[0];
        double trace = state.trace();
        return new Reading(
                value / trace,
                size(state, operator) * (state.traceNormError().size() + state.levels() * Math.ulp(1.0))
                        + Math.abs(trace - 1) * Math.abs(value));
    }

    private Reading quantaVariance(WindowState state, int j) {
        double[] frame = {re(j), im(j)};
        LadderPolynomial n = motion.seen(j, QUANTA);
        LadderPolynomial rest = n.minus(LadderPolynomial.term(0, 0, n.fullRe(0, 0), DoubleDouble.ZERO));
        double mean = state.mean(rest)[0] / state.trace();
        LadderPolynomial off = rest.minus(LadderPolynomial.constant(mean, 0));
        Reading reading = fluctuation(state, off.power(2));
        double scale = frame[0] * frame[0] + frame[1] * frame[1];
        return new Reading(reading.value, reading.error + 4 * Math.ulp(scale));
    }
}
