package ladderwell.formula;

import ladderwell.quantity.Kind;

/**
 * What a value measures: mass, length and time to rational powers. Exponents are kept in 1/840, so that roots up to the
 * eighth are exact.
 *
 * @param mass 840 × the exponent of the mass
 * @param length 840 × the exponent of the length
 * @param time 840 × the exponent of the time
 */
public record Dimension(int mass, int length, int time) {

    private static final int ONE = 840;
    private static final int MOST = 840 * 1000;

    /** A plain number. */
    public static final Dimension NONE = of(0, 0, 0);

    /** A mass. */
    public static final Dimension MASS = of(1, 0, 0);

    /** A length. */
    public static final Dimension LENGTH = of(0, 1, 0);

    /** A time. */
    public static final Dimension TIME = of(0, 0, 1);

    /** A rate or an angular frequency. */
    public static final Dimension RATE = of(0, 0, -1);

    /** An energy. */
    public static final Dimension ENERGY = of(1, 2, -2);

    /** A momentum. */
    public static final Dimension MOMENTUM = of(1, 1, -1);

    /** A force, the slope of an energy. */
    public static final Dimension FORCE = of(1, 1, -2);

    /** ħ, an energy times a time. */
    static final Dimension ACTION = of(1, 2, -1);

    /** The literal zero: fits beside anything. */
    static final Dimension ANY = new Dimension(Integer.MIN_VALUE, 0, 0);

    /** From whole exponents: energy is of(1, 2, −2). */
    public static Dimension of(int mass, int length, int time) {
        return new Dimension(ONE * mass, ONE * length, ONE * time);
    }

    /** What a kind of quantity is in a formula; temperatures and wavenumbers stand for energies there, see {@link Amount}. */
    static Dimension of(Kind kind) {
        return switch (kind) {
            case MASS -> MASS;
            case LENGTH -> LENGTH;
            case TIME -> TIME;
            case MOMENTUM -> MOMENTUM;
            case ENERGY, TEMPERATURE, WAVENUMBER -> ENERGY;
            case CYCLE_FREQUENCY, ANGULAR_FREQUENCY -> RATE;
            case ANGLE, NUMBER -> NONE;
            case SQUEEZING, PERIODS ->
                throw new IllegalArgumentException(kind.word() + " has no place in a formula; give a length, a time, an"
                        + " energy or another measured quantity");
        };
    }

    /** True for a plain number (and for the literal zero). */
    public boolean isNone() {
        return equals(NONE) || equals(ANY);
    }

    /** True where a value of one may be added to a value of the other. */
    boolean fits(Dimension other) {
        return equals(other) || equals(ANY) || other.equals(ANY);
    }

    /** Of two that fit, the one that says more. */
    Dimension or(Dimension other) {
        return equals(ANY) ? other : this;
    }

    /**
     * The dimension of a product.
     *
     * @throws IllegalArgumentException if an exponent passes 1000
     */
    public Dimension times(Dimension other) {
        return equals(ANY) || other.equals(ANY)
                ? ANY
                : checked((long) mass + other.mass, (long) length + other.length, (long) time + other.time);
    }

    /**
     * The dimension of a quotient.
     *
     * @throws IllegalArgumentException if an exponent passes 1000
     */
    public Dimension over(Dimension other) {
        if (equals(ANY)) {
            return ANY;
        }
        return other.equals(ANY)
                ? this
                : checked((long) mass - other.mass, (long) length - other.length, (long) time - other.time);
    }

    /**
     * The dimension of a power.
     *
     * @throws IllegalArgumentException if the power has no unit: an exponent passes 1000, or is no fraction with a small
     *     denominator
     */
    public Dimension power(double exponent) {
        if (equals(ANY)) {
            return exponent > 0 ? ANY : NONE;
        }
        return isNone() ? NONE : checked(scaled(mass, exponent), scaled(length, exponent), scaled(time, exponent));
    }

    private static long scaled(int value, double exponent) {
        double exact = value * exponent;
        if (!(Math.abs(exact) <= MOST) || Math.abs(exact - Math.rint(exact)) > 1e-9) {
            throw new IllegalArgumentException("has no unit");
        }
        return Math.round(exact);
    }

    private static Dimension checked(long mass, long length, long time) {
        if (Math.max(Math.abs(mass), Math.max(Math.abs(length), Math.abs(time))) > MOST) {
            throw new IllegalArgumentException("has no unit");
        }
        return new Dimension((int) mass, (int) length, (int) time);
    }

    /** In words with an article, for messages: "an energy", "a quantity in J/m^4". */
    public String word() {
        if (isNone()) {
            return "a plain number";
        }
        if (equals(MASS)) {
            return "a mass";
        }
        if (equals(LENGTH)) {
            return "a length";
        }
        if (equals(TIME)) {
            return "a time";
        }
        if (equals(ENERGY)) {
            return "an energy";
        }
        if (equals(MOMENTUM)) {
            return "a momentum";
        }
        if (equals(RATE)) {
            return "a rate";
        }
        if (equals(FORCE)) {
            return "a force";
        }
        return equals(ACTION) ? "an action" : "a quantity in " + unit();
    }

    /** The SI unit, typeable: "J", "J/m^4", "kg*m/s"; empty for a plain number. */
    public String unit() {
        if (isNone()) {
            return "";
        }
        StringBuilder above = new StringBuilder();
        StringBuilder below = new StringBuilder();
        if (mass == ONE && time == -2 * ONE) {
            above.append('J');
            append(above, below, "m", length - 2 * ONE);
        } else {
            append(above, below, "kg", mass);
            append(above, below, "m", length);
            append(above, below, "s", time);
        }
        return above + below.toString();
    }

    private static void append(StringBuilder above, StringBuilder below, String unit, int exponent) {
        if (exponent == 0) {
            return;
        }
        StringBuilder to = exponent > 0 ? above : below;
        if (exponent < 0) {
            to.append('/');
        } else if (to.length() > 0) {
            to.append('*');
        }
        to.append(unit);
        int size = Math.abs(exponent);
        if (size % ONE != 0) {
            int common = gcd(size, ONE);
            to.append("^(")
                    .append(size / common)
                    .append('/')
                    .append(ONE / common)
                    .append(')');
        } else if (size != ONE) {
            to.append('^').append(size / ONE);
        }
    }

    private static int gcd(int a, int b) {
        return b == 0 ? a : gcd(b, a % b);
    }

    /** {@link #word}. */
    @Override
    public String toString() {
        return word();
    }
}
