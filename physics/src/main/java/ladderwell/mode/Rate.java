package ladderwell.mode;

import static java.util.Objects.requireNonNull;

import ladderwell.quantity.Digits;
import ladderwell.quantity.Frequency;
import ladderwell.quantity.Kind;
import ladderwell.quantity.Quantity;

/**
 * How often a jump happens: the decay rate of quanta, of coherence, or of whatever the jump takes.
 *
 * @param perSecond /s (rad/s), at least 0; a plain number in natural units
 * @param given as it was typed, for records
 */
public record Rate(double perSecond, String given) {

    /** Refuses negative, infinite and NaN rates. */
    public Rate {
        requireNonNull(given, "given");
        if (perSecond < 0) {
            throw new IllegalArgumentException(
                    "the rate " + given + " is negative; a rate is 0 or more, and what adds quanta is a gain");
        }
        if (!(perSecond < Double.POSITIVE_INFINITY)) {
            throw new IllegalArgumentException("the rate " + given + " is not a finite number");
        }
    }

    /**
     * From a quantity: /s and rad/s stand as they are, a frequency in Hz is a full linewidth and counts 2π, a time is a lifetime 1/γ, a
     * wavenumber or an energy E counts E/ħ.
     *
     * @throws IllegalArgumentException for a number without a unit, any other kind, a negative rate or a lifetime of 0 or less
     */
    public static Rate of(Quantity quantity) {
        if (quantity.kind() == Kind.TIME) {
            if (!(quantity.si() > 0)) {
                throw new IllegalArgumentException("the lifetime " + quantity + " must be above 0");
            }
            return new Rate(1 / quantity.si(), quantity.plain());
        }
        if (quantity.kind() == Kind.NUMBER) {
            throw new IllegalArgumentException(
                    "the rate " + quantity.plain()
                            + " has no unit; expected one such as 20 kHz (a linewidth, counts 2π), 1e5 /s or 8 us (a lifetime)");
        }
        try {
            return new Rate(Frequency.of(quantity).omega(), quantity.plain());
        } catch (IllegalArgumentException e) {
            if (quantity.si() < 0) {
                throw e;
            }
            throw new IllegalArgumentException(
                    "'" + quantity.plain() + "' is " + quantity.kind().word()
                            + " and no rate; expected one such as 20 kHz (a linewidth, counts 2π), 1e5 /s or 8 us (a lifetime)",
                    e);
        }
    }

    /**
     * From a quality factor: γ = ω/Q.
     *
     * @param quality Q, above 0
     * @param omega ω of the mode, rad/s or plain in natural units; above 0
     */
    public static Rate quality(double quality, double omega) {
        if (!(quality > 0) || Double.isInfinite(quality)) {
            throw new IllegalArgumentException("a quality factor must be finite and above 0, got " + quality);
        }
        if (!(omega > 0) || Double.isInfinite(omega)) {
            throw new IllegalArgumentException(
                    "a quality factor needs the frequency of the mode, above 0 and in the lab; got " + omega);
        }
        return new Rate(omega / quality, "Q = " + Digits.shortest(quality));
    }

    /** A plain number in natural units. */
    public static Rate natural(double value) {
        return new Rate(value, Double.isFinite(value) ? Digits.shortest(value) : String.valueOf(value));
    }

    /** This times a number that is 0 or more. */
    Rate times(double factor, String words) {
        return new Rate(perSecond * factor, given + words);
    }
}
