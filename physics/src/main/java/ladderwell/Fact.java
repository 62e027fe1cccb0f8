package ladderwell;

import java.util.ArrayList;
import java.util.List;
import ladderwell.evidence.Bound;
import ladderwell.quantity.Quantity;
import ladderwell.quantity.Unit;
import ladderwell.quantity.Units;

/**
 * One line of a card: what it is, how the trade writes it, its value with a unit, and how far the value can be off.
 *
 * @param name the quantity in words, such as "zero-point length"
 * @param symbol the trade's letter for it, such as "x₀"; may be empty
 * @param value value and unit
 * @param bound half-width of the error, in the value's unit
 */
public record Fact(String name, String symbol, Quantity value, Bound bound) {

    /** A value that the user typed or that is exact by definition. */
    static Fact exact(String name, String symbol, double value, Unit unit) {
        return new Fact(name, symbol, Quantity.of(value, unit), Bound.exact());
    }

    static Fact exact(String name, String symbol, Quantity value) {
        return new Fact(name, symbol, value, Bound.exact());
    }

    /** An angle in rad, as good as a double is. */
    static Fact angle(String name, String symbol, double radians) {
        return new Fact(name, symbol, Quantity.of(radians, Units.RADIAN), Bound.guaranteed(Math.ulp(radians)));
    }

    /** The facts with this one in place of the one of its name, or behind them. */
    static List<Fact> with(List<Fact> facts, Fact fact) {
        List<Fact> all = new ArrayList<>(facts);
        all.removeIf(f -> f.name().equals(fact.name()));
        all.add(fact);
        return all;
    }

    /** A value computed in closed form: off by rounding and by the relative uncertainty of what went in. */
    static Fact closedForm(String name, String symbol, double value, Unit unit, double relativeUncertainty) {
        // 8 ulp cover the few operations of a closed form; constants carry the rest as a standard uncertainty.
        double rounding = 8 * Math.ulp(value);
        Bound bound = relativeUncertainty == 0
                ? Bound.guaranteed(rounding)
                : Bound.statistical(rounding + Math.abs(value) * relativeUncertainty);
        return new Fact(name, symbol, Quantity.of(value, unit), bound);
    }
}
