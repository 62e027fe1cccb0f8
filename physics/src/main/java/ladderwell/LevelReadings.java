package ladderwell;

import java.util.Arrays;
import java.util.function.IntToDoubleFunction;
import ladderwell.evidence.Bound;
import ladderwell.evidence.Certainty;
import ladderwell.motion.Means;
import ladderwell.motion.PhasedState;
import ladderwell.motion.Populations;
import ladderwell.motion.Returns;
import ladderwell.numeric.Workers;
import org.jspecify.annotations.Nullable;

/** What each observable means for a state that moves by phases; every part is computed once, when first asked for. */
final class LevelReadings {
    private final Oscillator oscillator;
    private final PhasedState state;
    private @Nullable Means means;
    private @Nullable Returns returns;
    private @Nullable Populations populations;

    LevelReadings(Oscillator oscillator, PhasedState state) {
        this.oscillator = oscillator;
        this.state = state;
    }

    Series series(Observable o) {
        if (o.level() >= 0) {
            return constant(
                    o, populations().population(o.level()), populations().populationBound(o.level()));
        }
        if (o.equals(Observable.POSITION)) {
            Means m = means();
            return along(o, m::position, j -> m.positionError(), m.certainty());
        }
        if (o.equals(Observable.MOMENTUM)) {
            Means m = means();
            return along(o, m::momentum, j -> m.momentumError(), m.certainty());
        }
        if (o.equals(Observable.SPREAD_OF_POSITION)) {
            Means m = means();
            return along(o, m::positionSpread, m::positionSpreadError, m.certainty());
        }
        if (o.equals(Observable.SPREAD_OF_MOMENTUM)) {
            Means m = means();
            return along(o, m::momentumSpread, m::momentumSpreadError, m.certainty());
        }
        if (o.equals(Observable.UNCERTAINTY_PRODUCT)) {
            Means m = means();
            return along(
                    o,
                    j -> 2 * m.positionSpread(j) * m.momentumSpread(j),
                    j -> 2
                            * ((m.positionSpread(j) + m.positionSpreadError(j)) * m.momentumSpreadError(j)
                                    + m.positionSpreadError(j) * m.momentumSpread(j)),
                    m.certainty());
        }
        if (o.equals(Observable.SPREAD_OVER_SWING)) {
            return spreadOverSwing(o);
        }
        if (o.equals(Observable.ENERGY)) {
            return constant(o, populations().meanEnergy(), populations().meanEnergyBound());
        }
        if (o.equals(Observable.MEAN_QUANTA)) {
            requireHarmonic(o);
            return constant(o, populations().meanLevel(), populations().meanLevelBound());
        }
        if (o.equals(Observable.VARIANCE_OF_QUANTA)) {
            requireHarmonic(o);
            return constant(o, populations().levelVariance(), populations().levelVarianceBound());
        }
        if (o.equals(Observable.MANDEL_Q)) {
            return mandel(o);
        }
        if (o.equals(Observable.PURITY)) {
            // a vector stays a vector; its norm is off by no more than its error
            return constant(o, 1, Bound.guaranteed(0));
        }
        if (o.equals(Observable.RETURN_PROBABILITY)) {
            Returns r = returns();
            return along(o, r::probability, r::probabilityError, state.certainty());
        }
        if (o.equals(Observable.RETURN_AMPLITUDE_REAL)) {
            Returns r = returns();
            return along(o, r::re, j -> r.error(), state.certainty());
        }
        if (o.equals(Observable.RETURN_AMPLITUDE_IMAGINARY)) {
            Returns r = returns();
            return along(o, r::im, j -> r.error(), state.certainty());
        }
        throw new IllegalArgumentException("'" + o.name() + "' is no observable of a run; known are "
                + String.join(
                        ", ", Observable.all().stream().map(Observable::name).toList()));
    }

    private Series spreadOverSwing(Observable o) {
        requireHarmonic(o);
        Means m = means();
        double swing = Math.hypot(m.position(0), m.momentum(0));
        double swingError = m.positionError() + m.momentumError();
        if (swing <= 2 * swingError) {
            throw new IllegalArgumentException(
                    "spread over swing needs a swing: the mean position of this state does not move");
        }
        return along(
                o,
                j -> m.positionSpread(j) / swing,
                j -> (m.positionSpreadError(j) + m.positionSpread(j) / swing * swingError) / (swing - swingError),
                m.certainty());
    }

    private Series mandel(Observable o) {
        requireHarmonic(o);
        Populations p = populations();
        double mean = p.meanLevel();
        double meanError = p.meanLevelBound().size();
        if (mean <= 2 * meanError) {
            throw new IllegalArgumentException("Mandel Q needs quanta: the mean quanta of this state are 0");
        }
        double ratio = p.levelVariance() / mean;
        double error = (p.levelVarianceBound().size() + ratio * meanError) / (mean - meanError) + 4 * Math.ulp(ratio);
        return constant(o, ratio - 1, new Bound(p.levelVarianceBound().kind(), error));
    }

    private void requireHarmonic(Observable o) {
        if (!(oscillator instanceof Ladder)) {
            throw new IllegalArgumentException("'" + o.name() + "' is defined for a harmonic oscillator, not for a "
                    + oscillator.kind() + "; ask for energy or populations");
        }
    }

    private Series along(Observable o, IntToDoubleFunction value, IntToDoubleFunction error, Certainty certainty) {
        double[] values = new double[state.times()];
        double[] errors = new double[state.times()];
        Arrays.setAll(values, value);
        Arrays.setAll(errors, error);
        return new Series(o, values, errors, certainty);
    }

    private Series constant(Observable o, double value, Bound bound) {
        return along(o, j -> value, j -> bound.size(), bound.kind());
    }

    private synchronized Means means() {
        if (means == null) {
            means = oscillator instanceof Ladder ? Means.onLadder(state, Workers.CALLER) : Means.onElements(state);
        }
        return means;
    }

    private synchronized Returns returns() {
        if (returns == null) {
            returns = Returns.of(state);
        }
        return returns;
    }

    private synchronized Populations populations() {
        if (populations == null) {
            populations = Populations.of(state);
        }
        return populations;
    }
}
