package ladderwell.quantity;

import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * The units that declarations and Java cells know, by name and by symbol.
 *
 * <p>Symbols take every SI prefix from yocto to yotta in steps of a thousand, with u or µ for micro. {@code u} alone is the atomic mass
 * unit and {@code me} the electron mass. {@code A} is the ampere and is refused for a length; write {@code Å} or
 * {@code angstrom}. Rates may be written {@code /s}, {@code 1/s} or {@code s^-1}.
 */
public final class Units {

    // Mass
    public static final Unit KILOGRAM = new Unit("kg", Kind.MASS, 1, 0);
    public static final Unit GRAM = new Unit("g", Kind.MASS, 1, -3);
    public static final Unit ATOMIC_MASS = new Unit("u", Kind.MASS, Constants.ATOMIC_MASS_CONSTANT, 0);
    public static final Unit ELECTRON_MASS = new Unit("me", Kind.MASS, Constants.ELECTRON_REST_MASS, 0);

    // Length
    public static final Unit METRE = new Unit("m", Kind.LENGTH, 1, 0);
    public static final Unit CENTIMETRE = new Unit("cm", Kind.LENGTH, 1, -2);
    public static final Unit MILLIMETRE = Prefixes.prefixed(-3, METRE);
    public static final Unit MICROMETRE = Prefixes.prefixed(-6, METRE);
    public static final Unit NANOMETRE = Prefixes.prefixed(-9, METRE);
    public static final Unit PICOMETRE = Prefixes.prefixed(-12, METRE);
    public static final Unit FEMTOMETRE = Prefixes.prefixed(-15, METRE);
    public static final Unit ANGSTROM = new Unit("Å", Kind.LENGTH, 1, -10);

    // Time
    public static final Unit SECOND = new Unit("s", Kind.TIME, 1, 0);
    public static final Unit MILLISECOND = Prefixes.prefixed(-3, SECOND);
    public static final Unit MICROSECOND = Prefixes.prefixed(-6, SECOND);
    public static final Unit NANOSECOND = Prefixes.prefixed(-9, SECOND);
    public static final Unit PICOSECOND = Prefixes.prefixed(-12, SECOND);
    public static final Unit FEMTOSECOND = Prefixes.prefixed(-15, SECOND);
    public static final Unit ATTOSECOND = Prefixes.prefixed(-18, SECOND);
    /** Periods of the oscillator at hand. */
    public static final Unit PERIOD = new Unit("periods", Kind.PERIODS, 1, 0);

    // Momentum
    public static final Unit KILOGRAM_METRE_PER_SECOND = new Unit("kg·m/s", Kind.MOMENTUM, 1, 0);
    public static final Unit HBAR_PER_NANOMETRE = Prefixes.momentum(-9);
    public static final Unit HBAR_PER_MICROMETRE = Prefixes.momentum(-6);

    // Cycle frequency: multiplied by 2π to give ω
    public static final Unit HERTZ = new Unit("Hz", Kind.CYCLE_FREQUENCY, 1, 0);
    public static final Unit KILOHERTZ = Prefixes.prefixed(3, HERTZ);
    public static final Unit MEGAHERTZ = Prefixes.prefixed(6, HERTZ);
    public static final Unit GIGAHERTZ = Prefixes.prefixed(9, HERTZ);
    public static final Unit TERAHERTZ = Prefixes.prefixed(12, HERTZ);

    // Angular frequency and rate: taken as they stand
    public static final Unit RADIAN_PER_SECOND = new Unit("rad/s", Kind.ANGULAR_FREQUENCY, 1, 0);
    public static final Unit PER_SECOND = new Unit("/s", Kind.ANGULAR_FREQUENCY, 1, 0);
    public static final Unit PER_MILLISECOND = new Unit("/ms", Kind.ANGULAR_FREQUENCY, 1, 3);
    public static final Unit PER_MICROSECOND = new Unit("/µs", Kind.ANGULAR_FREQUENCY, 1, 6);

    // Wavenumber 1/λ
    public static final Unit PER_CENTIMETRE = new Unit("/cm", Kind.WAVENUMBER, 1, 2);
    public static final Unit PER_METRE = new Unit("/m", Kind.WAVENUMBER, 1, 0);

    // Energy and temperature
    public static final Unit JOULE = new Unit("J", Kind.ENERGY, 1, 0);
    public static final Unit ELECTRONVOLT = new Unit("eV", Kind.ENERGY, Constants.ELEMENTARY_CHARGE, 0);
    public static final Unit MILLIELECTRONVOLT = Prefixes.prefixed(-3, ELECTRONVOLT);
    public static final Unit MICROELECTRONVOLT = Prefixes.prefixed(-6, ELECTRONVOLT);
    public static final Unit NANOELECTRONVOLT = Prefixes.prefixed(-9, ELECTRONVOLT);
    public static final Unit KELVIN = new Unit("K", Kind.TEMPERATURE, 1, 0);
    public static final Unit MILLIKELVIN = Prefixes.prefixed(-3, KELVIN);
    public static final Unit MICROKELVIN = Prefixes.prefixed(-6, KELVIN);
    public static final Unit NANOKELVIN = Prefixes.prefixed(-9, KELVIN);

    // Angle, squeezing, plain numbers
    public static final Unit RADIAN = new Unit("rad", Kind.ANGLE, 1, 0);
    public static final Unit DEGREE = new Unit("deg", Kind.ANGLE, Math.PI / 180, 0);
    public static final Unit DECIBEL = new Unit("dB", Kind.SQUEEZING, 1, 0);
    /** A dimensionless number. */
    public static final Unit ONE = new Unit("", Kind.NUMBER, 1, 0);

    private static final Map<Kind, Unit> NATURAL = new EnumMap<>(Kind.class);

    static {
        for (Kind kind : Kind.values()) {
            NATURAL.put(kind, new Unit("", kind, 1, 0));
        }
    }

    private Units() {}

    /**
     * The unit that a symbol stands for; ASCII and Unicode spellings of one unit give the same unit. An empty text is
     * {@link #ONE}.
     *
     * @return empty if no unit has this symbol
     */
    public static Optional<Unit> parse(String symbol) {
        return Symbols.parse(symbol);
    }

    /**
     * The usual symbol nearest to a text that is none, for "did you mean": "Mhz" gives "MHz".
     *
     * @return typeable (ASCII) symbol; empty if nothing is near
     */
    public static Optional<String> nearest(String text) {
        return Symbols.nearest(text);
    }

    /** Usual symbols of a kind, typeable (ASCII), most usual first; for completion. Empty for plain numbers. */
    public static List<String> symbols(Kind kind) {
        return Symbols.usual(kind);
    }

    /** The unit whose factor is 1: kg, m, s, kg·m/s, J, K, Hz, rad/s, /m, rad, dB, periods, 1. */
    public static Unit si(Kind kind) {
        return switch (kind) {
            case MASS -> KILOGRAM;
            case LENGTH -> METRE;
            case TIME -> SECOND;
            case MOMENTUM -> KILOGRAM_METRE_PER_SECOND;
            case ENERGY -> JOULE;
            case TEMPERATURE -> KELVIN;
            case CYCLE_FREQUENCY -> HERTZ;
            case ANGULAR_FREQUENCY -> RADIAN_PER_SECOND;
            case WAVENUMBER -> PER_METRE;
            case ANGLE -> RADIAN;
            case SQUEEZING -> DECIBEL;
            case PERIODS -> PERIOD;
            case NUMBER -> ONE;
        };
    }

    /** The unit of a kind in natural units, ħ = m = ω = 1: factor 1, no symbol. */
    public static Unit natural(Kind kind) {
        Unit unit = NATURAL.get(kind);
        return unit == null ? ONE : unit;
    }
}
