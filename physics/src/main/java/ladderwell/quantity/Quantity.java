package ladderwell.quantity;

import static java.util.Objects.requireNonNull;

/**
 * A finite number with its unit, as it was typed.
 *
 * @param value in {@code unit}; finite
 * @param unit the unit
 */
public record Quantity(double value, Unit unit) {

    /** Refuses NaN and infinities, also those that appear on the way to SI. */
    public Quantity {
        requireNonNull(unit, "unit");
        if (!Double.isFinite(value)) {
            throw new IllegalArgumentException(unit.kind().word() + " must be a finite number, not " + value
                    + "; for example " + unit.kind().example());
        }
        if (!Double.isFinite(unit.toSi(value))) {
            throw new IllegalArgumentException(unit.kind().word() + " of " + Digits.shortest(value) + " " + unit.plain()
                    + " is too large to compute with; for example "
                    + unit.kind().example());
        }
    }

    /**
     * {@code value} of {@code unit}.
     *
     * @throws IllegalArgumentException if the value is not finite, or is not in SI
     */
    public static Quantity of(double value, Unit unit) {
        return new Quantity(value, unit);
    }

    /** A dimensionless number, or a quantity in natural units. */
    public static Quantity number(double value) {
        return new Quantity(value, Units.ONE);
    }

    /** The value in the SI unit of its kind (dB, periods and numbers as they stand). */
    public double si() {
        return unit.toSi(value);
    }

    /** What it measures. */
    public Kind kind() {
        return unit.kind();
    }

    /**
     * The value in another unit of the same kind.
     *
     * @throws IllegalArgumentException if the other unit measures something else; Hz and rad/s are different kinds, see
     *     {@link Frequency}
     */
    public double in(Unit other) {
        if (other.kind() != unit.kind()) {
            throw new IllegalArgumentException(
                    "'" + this + "' is " + unit.kind().word() + " and cannot be given in '" + other.symbol()
                            + "', the unit of " + other.kind().word());
        }
        return other.coefficient() == unit.coefficient()
                ? Unit.timesPowerOfTen(value, unit.exponent() - other.exponent())
                : other.fromSi(unit.toSi(value));
    }

    /** The same quantity in another unit of the same kind; see {@link #in}. */
    public Quantity to(Unit other) {
        return new Quantity(in(other), other);
    }

    /** The JSR-385 quantity of the same value and unit, for exchange with other libraries. */
    public javax.measure.Quantity<?> measure() {
        return Measures.of(this);
    }

    /** The shortest decimal that reads back as the same value, and the symbol: "1.2 MHz". */
    @Override
    public String toString() {
        return text(unit.symbol());
    }

    /** As {@link #toString}, in ASCII: "50 us". */
    public String plain() {
        return text(unit.plain());
    }

    private String text(String symbol) {
        String number = Digits.shortest(value);
        if (symbol.isEmpty()) {
            return number;
        }
        return number + " " + (unit.kind() == Kind.PERIODS && value == 1 ? "period" : symbol);
    }
}
