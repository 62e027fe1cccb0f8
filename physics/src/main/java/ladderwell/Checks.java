package ladderwell;

import java.util.Arrays;
import java.util.stream.Collectors;
import ladderwell.quantity.Constants;
import ladderwell.quantity.Digits;
import ladderwell.quantity.Kind;
import ladderwell.quantity.Quantity;
import ladderwell.quantity.Units;
import ladderwell.state.Amplitudes;

/** The checks that declarations share; each failure is one sentence that names the input, its value and what was expected. */
final class Checks {
    private Checks() {}

    static Quantity positive(String what, Quantity value, Kind... kinds) {
        kind(what, value, kinds);
        if (!(value.si() > 0)) {
            throw new IllegalArgumentException(what + " must be positive, not " + value);
        }
        return value;
    }

    static Quantity kind(String what, Quantity value, Kind... kinds) {
        if (!Arrays.asList(kinds).contains(value.kind())) {
            String wanted = Arrays.stream(kinds)
                    .map(k -> k.word() + " such as " + k.example())
                    .collect(Collectors.joining(" or "));
            throw new IllegalArgumentException(
                    what + " must be " + wanted + ", not " + value.kind().word() + " (" + value + ")");
        }
        return value;
    }

    /** A double as a person would write it: -1 and not -1.0. */
    static String number(double value) {
        return Double.isFinite(value) ? Digits.shortest(value) : String.valueOf(value);
    }

    static double finite(String what, double value) {
        if (!Double.isFinite(value)) {
            throw new IllegalArgumentException(what + " must be a finite number, not " + number(value));
        }
        return value;
    }

    /** Relative standard uncertainty that a mass inherits from the constant its unit stands for; 0 for kg. */
    static double relativeUncertainty(Quantity mass) {
        if (mass.unit().equals(Units.ATOMIC_MASS)) {
            return Constants.ATOMIC_MASS_CONSTANT_UNCERTAINTY / Constants.ATOMIC_MASS_CONSTANT;
        }
        if (mass.unit().equals(Units.ELECTRON_MASS)) {
            return Constants.ELECTRON_REST_MASS_UNCERTAINTY / Constants.ELECTRON_REST_MASS;
        }
        return 0;
    }

    /** Refuses mean quanta of a coherent state or a displacement that are negative, not finite, or more than is carried. */
    static void meanQuanta(double mean) {
        if (!(mean >= 0) || Double.isInfinite(mean)) {
            throw new IllegalArgumentException(
                    "mean quanta must be a finite number of at least 0, not " + number(mean));
        }
        if (mean > Amplitudes.LARGEST_MEAN) {
            throw new IllegalArgumentException("mean quanta of " + number(mean) + " need about "
                    + number(Math.rint(14 * Math.sqrt(mean) / 1e6) * 1e6)
                    + " levels; at most " + number(Amplitudes.LARGEST_MEAN) + " quanta are carried");
        }
    }

    /** Relative standard uncertainty of lengths and momenta in the oscillator's scale, from its mass. */
    static double lengthUncertainty(Ladder oscillator) {
        return oscillator instanceof Harmonic harmonic
                ? harmonic.mass().map(Checks::relativeUncertainty).orElse(0.0) / 2
                : 0;
    }
}
