package ladderwell.quantity;

import static java.util.Objects.requireNonNull;

/**
 * A unit of one kind: 1 of it is {@code coefficient} × 10^{@code exponent} in the SI unit of the kind.
 *
 * <p>The power of ten of the prefix is kept apart so that a prefix is applied by one correctly rounded multiplication or
 * division: 5 ms is the double nearest to 0.005.
 *
 * @param symbol as printed, such as "µs" or "kHz"; empty for natural units
 * @param kind what it measures
 * @param coefficient SI value of the unit without its prefix, finite and positive
 * @param exponent power of ten of the prefix
 */
public record Unit(String symbol, Kind kind, double coefficient, int exponent) {

    private static final double[] TEN = {
        1e0, 1e1, 1e2, 1e3, 1e4, 1e5, 1e6, 1e7, 1e8, 1e9, 1e10, 1e11, 1e12, 1e13, 1e14, 1e15, 1e16, 1e17, 1e18, 1e19,
        1e20, 1e21, 1e22
    };

    /** Checks the coefficient and the exponent. */
    public Unit {
        requireNonNull(symbol, "symbol");
        requireNonNull(kind, "kind");
        if (!(coefficient > 0) || Double.isInfinite(coefficient)) {
            throw new IllegalArgumentException("the coefficient of unit '" + symbol + "' is " + coefficient
                    + "; expected a finite positive number");
        }
        if (Math.abs(exponent) > 60) {
            throw new IllegalArgumentException(
                    "the power of ten of unit '" + symbol + "' is " + exponent + "; expected -60 to 60");
        }
    }

    /**
     * Whether all four parts are the same. Written out: the method that a record gets by itself is assembled at run time,
     * which takes 20 ms of the first cell.
     */
    @Override
    public boolean equals(Object other) {
        return other instanceof Unit unit
                && symbol.equals(unit.symbol)
                && kind == unit.kind
                && Double.compare(coefficient, unit.coefficient) == 0
                && exponent == unit.exponent;
    }

    @Override
    public int hashCode() {
        return ((symbol.hashCode() * 31 + kind.hashCode()) * 31 + Double.hashCode(coefficient)) * 31 + exponent;
    }

    /** SI value of one such unit, to two units in the last place. */
    public double factor() {
        return toSi(1);
    }

    /**
     * A number of this unit in SI.
     *
     * @accuracy correctly rounded for a prefix up to 10^±22 on an SI unit, otherwise two units in the last place
     */
    public double toSi(double value) {
        return timesPowerOfTen(value * coefficient, exponent);
    }

    /**
     * An SI value as a number of this unit.
     *
     * @accuracy as {@link #toSi}
     */
    public double fromSi(double si) {
        return timesPowerOfTen(si, -exponent) / coefficient;
    }

    /** The symbol in ASCII, as it can be typed anywhere: "us", "angstrom", "hbar/nm"; read back by {@link Units#parse}. */
    public String plain() {
        return symbol.replace("µ", "u")
                .replace("Å", "angstrom")
                .replace("ħ", "hbar")
                .replace("·", "*");
    }

    /** True where there is no symbol to print: natural units and plain numbers. */
    public boolean isNatural() {
        return symbol.isEmpty();
    }

    /**
     * The JSR-385 unit of the same size, for exchange with other libraries. Hz, rad/s and /s all give units of dimension
     * 1/T here. Made on demand: the library behind it takes longer to load than a whole declaration.
     */
    public javax.measure.Unit<?> measure() {
        return Measures.of(this);
    }

    /** The symbol. */
    @Override
    public String toString() {
        return symbol;
    }

    /** Powers of ten up to 22 are exact doubles, so each step rounds once. */
    static double timesPowerOfTen(double value, int power) {
        double scaled = value;
        int left = power;
        while (left > 0) {
            int step = Math.min(left, 22);
            scaled *= TEN[step];
            left -= step;
        }
        while (left < 0) {
            int step = Math.min(-left, 22);
            scaled /= TEN[step];
            left += step;
        }
        return scaled;
    }
}
