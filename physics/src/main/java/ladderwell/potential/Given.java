package ladderwell.potential;

import ladderwell.formula.Amount;
import ladderwell.formula.Dimension;
import ladderwell.quantity.Constants;
import ladderwell.quantity.Frequency;
import ladderwell.quantity.Kind;
import ladderwell.quantity.Quantity;
import ladderwell.quantity.Scale;

/**
 * The mass a potential is declared with, which says whether all else is in lab or in natural units.
 *
 * @param mass kg, or 1
 * @param hbar J s, or 1
 */
record Given(double mass, double hbar) {

    static Given mass(Quantity mass) {
        if (mass.kind() == Kind.NUMBER) {
            if (mass.value() != 1) {
                throw new IllegalArgumentException(
                        "in natural units the mass is 1, not " + mass + "; give it a unit, such as 40 u");
            }
            return new Given(1, 1);
        }
        if (mass.kind() != Kind.MASS || !(mass.si() > 0)) {
            throw new IllegalArgumentException("the mass is '" + mass + "'; expected a mass above 0, such as 40 u");
        }
        return new Given(mass.si(), Constants.HBAR);
    }

    boolean isNatural() {
        return hbar == 1;
    }

    Scale scale(double length) {
        return isNatural() ? Scale.natural() : Scale.of(mass, length);
    }

    /** A positive value of a dimension (of none in natural units), SI. */
    double positive(String what, Amount amount, Dimension dimension) {
        Dimension wanted = isNatural() ? Dimension.NONE : dimension;
        if (!amount.dimension().equals(wanted)) {
            throw new IllegalArgumentException(
                    "the " + what + " is " + amount.dimension().word() + " (" + amount + "); expected " + wanted.word()
                            + (isNatural() ? " in natural units" : ""));
        }
        if (!(amount.value() > 0)) {
            throw new IllegalArgumentException("the " + what + " must be above 0, not " + amount);
        }
        return amount.value();
    }

    /** ω in rad/s of a frequency, a wavenumber or an energy; a plain number in natural units. */
    double omega(String what, Quantity quantity) {
        if (isNatural() != (quantity.kind() == Kind.NUMBER)) {
            throw new IllegalArgumentException("the " + what + " is '" + quantity + "'; expected "
                    + (isNatural() ? "a plain number in natural units" : "a frequency, a wavenumber or an energy"));
        }
        return anyOmega(what, quantity);
    }

    static double anyOmega(String what, Quantity quantity) {
        double omega = quantity.kind() == Kind.NUMBER
                ? quantity.value()
                : Frequency.of(quantity).omega();
        if (!(omega > 0)) {
            throw new IllegalArgumentException("the " + what + " must be above 0, not " + quantity);
        }
        return omega;
    }

    /** The length of c x^power: (ħ²/(mc))^(1/(power + 2)). */
    double length(double coefficient, int power) {
        return Math.pow(hbar / mass * (hbar / coefficient), 1.0 / (power + 2));
    }

    /** A coefficient of x^power in scaled units. */
    double scaled(double coefficient, int power, Scale scale) {
        double scaled = coefficient / scale.energy();
        for (int i = 0; i < power; i++) {
            scaled *= scale.length();
        }
        return scaled;
    }
}
