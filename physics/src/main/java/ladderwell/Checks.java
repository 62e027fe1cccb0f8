package ladderwell;

import java.util.Arrays;
import java.util.stream.Collectors;
import ladderwell.quantity.Constants;
import ladderwell.quantity.Digits;
import ladderwell.quantity.Kind;
import ladderwell.quantity.Quantity;
import ladderwell.quantity.Units;

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
}
