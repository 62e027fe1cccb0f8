package ladderwell.formula;

import java.util.Map;
import ladderwell.quantity.Constants;
import ladderwell.quantity.Digits;
import ladderwell.quantity.Kind;
import ladderwell.quantity.Quantity;

/**
 * A number with the dimension that it has in a formula; unlike a {@link Quantity} also of compound units: 2 eV/angstrom^4.
 *
 * <p>The meaning of a unit is the trade's: a frequency in Hz is a cycle frequency and stands for ω = 2πν; a wavenumber
 * (/cm, /m) stands for the energy hcν̃; a temperature stands for the energy kT; an angle is a plain number in radians. An
 * inverse length is written with another unit, such as 1.9 /angstrom, or as a quotient, 1/(2 cm).
 *
 * @param value in SI; finite
 * @param dimension what it measures
 */
public record Amount(double value, Dimension dimension) {

    /** Refuses NaN and infinities. */
    public Amount {
        if (!Double.isFinite(value)) {
            throw new IllegalArgumentException(dimension.word() + " must be a finite number, not " + value);
        }
    }

    /**
     * A quantity as it counts in a formula.
     *
     * @throws IllegalArgumentException for decibels and periods, which have no place in a formula
     */
    public static Amount of(Quantity quantity) {
        return new Amount(factor(quantity.kind()) * quantity.si(), Dimension.of(quantity.kind()));
    }

    /** A plain number, or anything in natural units. */
    public static Amount number(double value) {
        return new Amount(value, Dimension.NONE);
    }

    /**
     * Reads a number with a unit, or an expression of such: "2 eV/angstrom^4", "1.9 /angstrom", "0.5*(3 meV)/(2 nm)".
     *
     * @throws FormulaException if the text is no constant expression
     */
    public static Amount read(String text) {
        Parser.Result read = new Parser(text, Parameters.none(), false, Map.of()).parse();
        double value = read.node().value(0, 0);
        if (!Double.isFinite(value)) {
            throw new FormulaException("'" + text.strip() + "' is not a finite number", text, 0, text.length());
        }
        return new Amount(value, read.dimension().equals(Dimension.ANY) ? Dimension.NONE : read.dimension());
    }

    /** What the SI value of a kind is multiplied by in a formula. */
    static double factor(Kind kind) {
        return switch (kind) {
            case CYCLE_FREQUENCY -> 2 * Math.PI;
            case TEMPERATURE -> Constants.BOLTZMANN;
            case WAVENUMBER -> Constants.PLANCK * Constants.LIGHT_SPEED;
            default -> 1;
        };
    }

    /** In SI: "0.3 J/m^2". */
    @Override
    public String toString() {
        String unit = dimension.unit();
        return unit.isEmpty() ? Digits.shortest(value) : Digits.shortest(value) + " " + unit;
    }
}
