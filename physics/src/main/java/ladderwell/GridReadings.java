package ladderwell;

import java.util.Arrays;
import java.util.function.IntToDoubleFunction;
import ladderwell.evidence.Certainty;
import ladderwell.packet.GridFrame;
import ladderwell.packet.GridFrame.Moments;
import ladderwell.packet.GridMotion;
import ladderwell.state.Shape;
import org.jspecify.annotations.Nullable;

/**
 * What each observable means for a wave function on a grid. A state off by δ moves ⟨A⟩ by at most 2 ΔA δ + ‖A − ⟨A⟩‖ δ², on the grid; all is
 * estimated as δ is.
 */
final class GridReadings {
    private final Oscillator oscillator;
    private final GridMotion motion;
    private final Shape start;
    private final double delta;
    private Moments @Nullable [] positions;
    private Moments @Nullable [] momenta;
    private double @Nullable [][] returns;

    GridReadings(Oscillator oscillator, GridMotion motion, Shape start) {
        this.oscillator = oscillator;
        this.motion = motion;
        this.start = start;
        // sampling a state at evenly spaced points rounds by far less than this
        delta = motion.error().size() + 1e-14;
    }

    Series series(Observable o) {
        if (o.level() >= 0) {
            return population(o);
        }
        if (o.equals(Observable.POSITION)) {
            return along(o, j -> positions()[j].mean(), j -> meanError(positions()[j], length(j)));
        }
        if (o.equals(Observable.MOMENTUM)) {
            return along(o, j -> momenta()[j].mean(), j -> meanError(momenta()[j], waves(j)));
        }
        if (o.equals(Observable.SPREAD_OF_POSITION)) {
            return along(o, j -> spread(positions()[j]), j -> spreadError(positions()[j], length(j)));
        }
        if (o.equals(Observable.SPREAD_OF_MOMENTUM)) {
            return along(o, j -> spread(momenta()[j]), j -> spreadError(momenta()[j], waves(j)));
        }
        if (o.equals(Observable.UNCERTAINTY_PRODUCT)) {
            return product(o);
        }
        if (o.equals(Observable.ENERGY)) {
            return energy(o);
        }
        if (o.equals(Observable.RETURN_PROBABILITY)) {
            return along(o, j -> probability(returns()[j]), j -> probabilityError(returns()[j], delta));
        }
        if (o.equals(Observable.RETURN_AMPLITUDE_REAL)) {
            return along(o, j -> returns()[j][0], j -> delta);
        }
        if (o.equals(Observable.RETURN_AMPLITUDE_IMAGINARY)) {
            return along(o, j -> returns()[j][1], j -> delta);
        }
        throw new IllegalArgumentException("'" + o.name() + "' is not read from a packet in a " + oscillator.kind()
                + "; ask for position, momentum, their spreads, energy, returns or populations");
    }

    private double length(int j) {
        return motion.frame(j).grid().spacing() * motion.frame(j).grid().points();
    }

    private double waves(int j) {
        return Math.PI / motion.frame(j).grid().spacing();
    }

    private double meanError(Moments moments, double range) {
        return 2 * spread(moments) * delta + range * delta * delta + 1e-14 * (Math.abs(moments.mean()) + 1);
    }

    private static double spread(Moments moments) {
        return Math.sqrt(moments.variance());
    }

    private double spreadError(Moments moments, double range) {
        double mean = meanError(moments, range);
        double error = 2 * moments.curl() * delta + range * range * delta * delta + mean * mean;
        double least = Math.sqrt(Math.max(0, moments.variance() - error));
        return error / (spread(moments) + least) + 1e-14 * spread(moments);
    }

    private Series product(Observable o) {
        Series x = series(Observable.SPREAD_OF_POSITION);
        Series p = series(Observable.SPREAD_OF_MOMENTUM);
        return along(
                o,
                j -> 2 * x.value(j) * p.value(j),
                j -> 2 * ((x.value(j) + x.error(j)) * p.error(j) + x.error(j) * p.value(j)));
    }

    private Series energy(Observable o) {
        double[][] energies = new double[motion.times()][];
        Arrays.setAll(energies, j -> motion.frame(j).energy(motion.field(), delta));
        return along(
                o,
                j -> energies[j][0],
                j -> 2 * energies[j][1] * delta
                        + waves(j) * waves(j) / 2 * delta * delta
                        + 1e-14 * (Math.abs(energies[j][0]) + energies[j][1]));
    }

    /** Of level n as it is at time 0. */
    private Series population(Observable o) {
        Superposition.checkLevel(oscillator, o.level());
        Shape level = LevelSum.level(oscillator, o.level());
        double off = delta + oscillator.levels().waveFunctionError(o.level()) * Math.sqrt(level.right() - level.left());
        double[][] amplitudes = motion.overlaps(level);
        return along(o, j -> probability(amplitudes[j]), j -> probabilityError(amplitudes[j], off));
    }

    private static double probability(double[] amplitude) {
        return amplitude[0] * amplitude[0] + amplitude[1] * amplitude[1];
    }

    private static double probabilityError(double[] amplitude, double off) {
        return (2 * Math.hypot(amplitude[0], amplitude[1]) + off) * off;
    }

    private Series along(Observable o, IntToDoubleFunction value, IntToDoubleFunction error) {
        double[] values = new double[motion.times()];
        double[] errors = new double[motion.times()];
        Arrays.setAll(values, value);
        Arrays.setAll(errors, error);
        return new Series(o, values, errors, Certainty.ESTIMATED);
    }

    private synchronized Moments[] positions() {
        if (positions == null) {
            positions = new Moments[motion.times()];
            Arrays.setAll(positions, j -> motion.frame(j).position());
        }
        return positions;
    }

    private synchronized Moments[] momenta() {
        if (momenta == null) {
            momenta = new Moments[motion.times()];
            Arrays.setAll(momenta, j -> motion.frame(j).momentum());
        }
        return momenta;
    }

    private synchronized double[][] returns() {
        if (returns == null) {
            returns = motion.overlaps(start);
            GridFrame first = motion.frame(0);
            returns[0] = new double[] {first.norm() * first.norm(), 0};
        }
        return returns;
    }
}
