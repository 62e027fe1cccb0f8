package ladderwell.evidence;

import static java.util.Objects.requireNonNull;

import ladderwell.quantity.Digits;
import ladderwell.quantity.Unit;
import ladderwell.quantity.Units;

/**
 * How large an error is allowed, with the name under which it is stated and reported.
 *
 * @param name what it limits, such as "state"
 * @param measure absolute or relative
 * @param value above 0, finite; in {@code unit} if absolute
 * @param unit unit of an absolute value; {@link Units#ONE} for a relative one
 */
public record Tolerance(String name, Measure measure, double value, Unit unit) {

    /** Against what an error is measured. */
    public enum Measure {
        /** The error itself. */
        ABSOLUTE("absolute"),
        /** The error over the magnitude of the number. */
        RELATIVE("relative");

        private final String word;

        Measure(String word) {
            this.word = word;
        }

        /** The word in sentences and records. */
        public String word() {
            return word;
        }
    }

    /** The default for states: ‖ψ − ψ exact‖ at most 1e-9 at every time asked for. */
    public static final Tolerance STATE = absolute("state", 1e-9);

    /** Refuses a value that is not finite and above 0, a blank name, and a unit on a relative tolerance. */
    public Tolerance {
        requireNonNull(measure, "measure");
        requireNonNull(unit, "unit");
        if (name.isBlank()) {
            throw new IllegalArgumentException("a tolerance needs a name that says what it limits, such as state");
        }
        if (!(value > 0) || Double.isInfinite(value)) {
            throw new IllegalArgumentException(
                    "tolerance '" + name + "' is " + value + "; expected a finite number above 0, such as 1e-9");
        }
        if (measure == Measure.RELATIVE && !unit.equals(Units.ONE)) {
            throw new IllegalArgumentException(
                    "tolerance '" + name + "' is relative and has no unit, but was given in '" + unit.plain() + "'");
        }
    }

    /** A dimensionless absolute tolerance. */
    public static Tolerance absolute(String name, double value) {
        return new Tolerance(name, Measure.ABSOLUTE, value, Units.ONE);
    }

    /** An absolute tolerance in a unit. */
    public static Tolerance absolute(String name, double value, Unit unit) {
        return new Tolerance(name, Measure.ABSOLUTE, value, unit);
    }

    /** A relative tolerance. */
    public static Tolerance relative(String name, double value) {
        return new Tolerance(name, Measure.RELATIVE, value, Units.ONE);
    }

    /** The default {@link #STATE} with another value. */
    public static Tolerance state(double value) {
        return absolute(STATE.name(), value);
    }

    /**
     * The largest error allowed on a number of this magnitude.
     *
     * @param magnitude of the number, in {@code unit} if absolute (where it plays no part)
     */
    public double allowed(double magnitude) {
        return measure == Measure.ABSOLUTE ? value : value * Math.abs(magnitude);
    }

    /** True if the bound of a number of this magnitude keeps the tolerance. */
    public boolean admits(Bound bound, double magnitude) {
        return bound.size() <= allowed(magnitude);
    }

    /** For instance "state tolerance 1e-9", "level tolerance 1e-13 relative". */
    @Override
    public String toString() {
        String size = Digits.shortest(value) + (unit.isNatural() ? "" : " " + unit.plain());
        return name + " tolerance " + size + (measure == Measure.RELATIVE ? " relative" : "");
    }
}
