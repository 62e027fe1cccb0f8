package ladderwell.quantity;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;

/** Reads unit symbols, and finds the one that a mistyped symbol was meant to be. */
final class Symbols {

    /** Spellings that no rule covers. */
    private static final Map<String, Unit> AS_THEY_STAND = Map.ofEntries(
            Map.entry("", Units.ONE),
            Map.entry("u", Units.ATOMIC_MASS),
            Map.entry("me", Units.ELECTRON_MASS),
            Map.entry("m_e", Units.ELECTRON_MASS),
            Map.entry("cm", Units.CENTIMETRE),
            Map.entry("Å", Units.ANGSTROM),
            Map.entry("angstrom", Units.ANGSTROM),
            Map.entry("angstroms", Units.ANGSTROM),
            Map.entry("deg", Units.DEGREE),
            Map.entry("°", Units.DEGREE),
            Map.entry("degree", Units.DEGREE),
            Map.entry("degrees", Units.DEGREE),
            Map.entry("rad", Units.RADIAN),
            Map.entry("mrad", Prefixes.prefixed(-3, Units.RADIAN)),
            Map.entry("radian", Units.RADIAN),
            Map.entry("radians", Units.RADIAN),
            Map.entry("dB", Units.DECIBEL),
            Map.entry("period", Units.PERIOD),
            Map.entry("periods", Units.PERIOD),
            Map.entry("kg·m/s", Units.KILOGRAM_METRE_PER_SECOND),
            Map.entry("kg*m/s", Units.KILOGRAM_METRE_PER_SECOND),
            Map.entry("kg m/s", Units.KILOGRAM_METRE_PER_SECOND));

    /** Units that take a prefix. */
    private static final List<Unit> PREFIXED =
            List.of(Units.HERTZ, Units.ELECTRONVOLT, Units.GRAM, Units.METRE, Units.SECOND, Units.JOULE, Units.KELVIN);

    private static final Map<Kind, List<String>> USUAL = Map.ofEntries(
            Map.entry(Kind.MASS, List.of("u", "me", "kg", "g")),
            Map.entry(Kind.LENGTH, List.of("nm", "um", "angstrom", "pm", "mm", "cm", "m", "fm")),
            Map.entry(Kind.TIME, List.of("us", "ns", "ms", "ps", "fs", "s", "as")),
            Map.entry(Kind.MOMENTUM, List.of("hbar/nm", "hbar/um", "hbar/angstrom", "kg*m/s")),
            Map.entry(Kind.ENERGY, List.of("eV", "meV", "ueV", "neV", "keV", "J")),
            Map.entry(Kind.TEMPERATURE, List.of("K", "mK", "uK", "nK")),
            Map.entry(Kind.CYCLE_FREQUENCY, List.of("MHz", "kHz", "GHz", "Hz", "THz", "mHz")),
            Map.entry(
                    Kind.ANGULAR_FREQUENCY, List.of("rad/s", "/s", "Mrad/s", "krad/s", "Grad/s", "/ms", "/us", "/ns")),
            Map.entry(Kind.WAVENUMBER, List.of("/cm", "/m")),
            Map.entry(Kind.ANGLE, List.of("deg", "rad", "mrad")),
            Map.entry(Kind.SQUEEZING, List.of("dB")),
            Map.entry(Kind.PERIODS, List.of("periods", "period")),
            Map.entry(Kind.NUMBER, List.of()));

    /** Names that people write where a symbol is wanted. */
    private static final Map<String, String> NAMES = Map.ofEntries(
            Map.entry("a", "angstrom"),
            Map.entry("amu", "u"),
            Map.entry("da", "u"),
            Map.entry("dalton", "u"),
            Map.entry("m0", "me"),
            Map.entry("gram", "g"),
            Map.entry("kilogram", "kg"),
            Map.entry("metre", "m"),
            Map.entry("meter", "m"),
            Map.entry("micron", "um"),
            Map.entry("micrometre", "um"),
            Map.entry("micrometer", "um"),
            Map.entry("nanometre", "nm"),
            Map.entry("nanometer", "nm"),
            Map.entry("sec", "s"),
            Map.entry("second", "s"),
            Map.entry("millisecond", "ms"),
            Map.entry("microsecond", "us"),
            Map.entry("nanosecond", "ns"),
            Map.entry("hertz", "Hz"),
            Map.entry("kilohertz", "kHz"),
            Map.entry("megahertz", "MHz"),
            Map.entry("gigahertz", "GHz"),
            Map.entry("joule", "J"),
            Map.entry("electronvolt", "eV"),
            Map.entry("kelvin", "K"),
            Map.entry("decibel", "dB"),
            Map.entry("cycle", "periods"),
            Map.entry("wavenumber", "/cm"));

    private Symbols() {}

    static List<String> usual(Kind kind) {
        return USUAL.getOrDefault(kind, List.of());
    }

    static Optional<Unit> parse(String typed) {
        String symbol = oneSpelling(typed);
        Unit known = AS_THEY_STAND.get(symbol);
        if (known != null) {
            return Optional.of(known);
        }
        Optional<String> below = reciprocal(symbol);
        if (below.isPresent()) {
            return perLengthOrTime(below.get());
        }
        int slash = symbol.indexOf('/');
        if (slash > 0) {
            return ratio(symbol.substring(0, slash), symbol.substring(slash + 1));
        }
        for (Unit base : PREFIXED) {
            Optional<Integer> exponent = prefix(symbol, base.symbol());
            if (exponent.isPresent()) {
                return Optional.of(Prefixes.prefixed(exponent.get(), base));
            }
        }
        return Optional.empty();
    }

    /** One code point each for micro (Greek mu), ångström (the sign, or A and ring) and ħ; one spelling of the raised −1. */
    private static String oneSpelling(String typed) {
        String symbol = typed.strip()
                .replace('\u03bc', '\u00b5')
                .replace('\u212b', '\u00c5')
                .replace("A\u030a", "\u00c5")
                .replace("hbar", "\u0127")
                .replace('\u210f', '\u0127')
                .replace("⁻¹", "^-1")
                .replace("^−1", "^-1");
        return symbol.endsWith("-1") && !symbol.endsWith("^-1")
                ? symbol.substring(0, symbol.length() - 2) + "^-1"
                : symbol;
    }

    /** What stands below the line in "/s", "1/s" and "s^-1". */
    private static Optional<String> reciprocal(String symbol) {
        if (symbol.startsWith("1/")) {
            return Optional.of(symbol.substring(2));
        }
        if (symbol.startsWith("/")) {
            return Optional.of(symbol.substring(1));
        }
        return symbol.endsWith("^-1") && symbol.indexOf('/') < 0
                ? Optional.of(symbol.substring(0, symbol.length() - 3))
                : Optional.empty();
    }

    /** Wavenumbers only in the two units where nobody reads 2π/λ. */
    private static Optional<Unit> perLengthOrTime(String below) {
        if (below.equals("cm")) {
            return Optional.of(Units.PER_CENTIMETRE);
        }
        if (below.equals("m")) {
            return Optional.of(Units.PER_METRE);
        }
        return prefix(below, "s")
                .map(exponent -> new Unit("/" + Prefixes.symbol(exponent) + "s", Kind.ANGULAR_FREQUENCY, 1, -exponent));
    }

    private static Optional<Unit> ratio(String above, String below) {
        if (above.equals("ħ")) {
            if (below.equals("Å") || below.equals("angstrom")) {
                return Optional.of(new Unit("ħ/Å", Kind.MOMENTUM, Constants.HBAR, 10));
            }
            return prefix(below, "m").map(Prefixes::momentum);
        }
        Optional<Integer> radians = prefix(above, "rad");
        Optional<Integer> seconds = prefix(below, "s");
        if (radians.isEmpty() || seconds.isEmpty()) {
            return Optional.empty();
        }
        String symbol = Prefixes.symbol(radians.get()) + "rad/" + Prefixes.symbol(seconds.get()) + "s";
        return Optional.of(new Unit(symbol, Kind.ANGULAR_FREQUENCY, 1, radians.get() - seconds.get()));
    }

    private static Optional<Integer> prefix(String symbol, String base) {
        return symbol.endsWith(base)
                ? Prefixes.exponent(symbol.substring(0, symbol.length() - base.length()))
                : Optional.empty();
    }

    static Optional<String> nearest(String typed) {
        String text = typed.strip();
        String lower = text.toLowerCase(Locale.ROOT);
        String singular = lower.length() > 3 && lower.endsWith("s") ? lower.substring(0, lower.length() - 1) : lower;
        String named = NAMES.getOrDefault(lower, NAMES.get(singular));
        if (named != null) {
            return Optional.of(named);
        }
        for (String symbol : everyUsual()) {
            if (symbol.equalsIgnoreCase(text)) {
                return Optional.of(symbol);
            }
        }
        String best = "";
        double least = Math.min(2, 0.5 * text.length()) + 1e-9;
        for (String symbol : everyUsual()) {
            double distance = distance(text, symbol);
            if (distance < least) {
                least = distance;
                best = symbol;
            }
        }
        return best.isEmpty() ? Optional.empty() : Optional.of(best);
    }

    private static List<String> everyUsual() {
        List<String> all = new ArrayList<>();
        for (Kind kind : Kind.values()) {
            all.addAll(usual(kind));
        }
        return all;
    }

    /** Edit distance with swaps of neighbours (Damerau 1964, restricted); a wrong case costs little. */
    private static double distance(String a, String b) {
        double[][] d = new double[a.length() + 1][b.length() + 1];
        for (int i = 0; i <= a.length(); i++) {
            d[i][0] = i;
        }
        for (int j = 0; j <= b.length(); j++) {
            d[0][j] = j;
        }
        for (int i = 1; i <= a.length(); i++) {
            for (int j = 1; j <= b.length(); j++) {
                double change = cost(a.charAt(i - 1), b.charAt(j - 1));
                d[i][j] = Math.min(Math.min(d[i - 1][j], d[i][j - 1]) + 1, d[i - 1][j - 1] + change);
                if (i > 1 && j > 1 && a.charAt(i - 1) == b.charAt(j - 2) && a.charAt(i - 2) == b.charAt(j - 1)) {
                    d[i][j] = Math.min(d[i][j], d[i - 2][j - 2] + 1);
                }
            }
        }
        return d[a.length()][b.length()];
    }

    private static double cost(char x, char y) {
        if (x == y) {
            return 0;
        }
        return Character.toLowerCase(x) == Character.toLowerCase(y) ? 0.2 : 1;
    }
}
