package ladderwell.quantity;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.lang.reflect.Field;
import java.lang.reflect.Modifier;
import java.math.BigDecimal;
import java.math.MathContext;
import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Stream;
import javax.measure.IncommensurableException;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.EnumSource;
import org.junit.jupiter.params.provider.MethodSource;
import org.junit.jupiter.params.provider.ValueSource;

class UnitsTest {

    /** Exact factors to SI; u and m_e are CODATA 2022 (Rev. Mod. Phys. 97 (2025) 025002), π to 50 digits. */
    private static final Map<String, String> BASE_FACTORS = Map.of(
            "u", "1.66053906892e-27",
            "me", "9.1093837139e-31",
            "eV", "1.602176634e-19",
            "deg", "0.017453292519943295769236907684886127134428718885417");

    private static final String HBAR = "1.0545718176461563912624280033022807447228263300205e-34";

    static Stream<Unit> constants() throws IllegalAccessException {
        List<Unit> units = new ArrayList<>();
        for (Field field : Units.class.getDeclaredFields()) {
            if (field.getType() == Unit.class && Modifier.isPublic(field.getModifiers())) {
                units.add((Unit) field.get(null));
            }
        }
        return units.stream();
    }

    static Stream<String> usualSymbols() {
        return Stream.of(Kind.values()).flatMap(kind -> Units.symbols(kind).stream());
    }

    /** Every constant, every usual symbol, and every prefix on every unit that takes one. */
    static Stream<Unit> everyUnit() throws IllegalAccessException {
        List<Unit> units = new ArrayList<>(constants().toList());
        usualSymbols().map(symbol -> Units.parse(symbol).orElseThrow()).forEach(units::add);
        for (String prefix :
                List.of("y", "z", "a", "f", "p", "n", "µ", "m", "", "k", "M", "G", "T", "P", "E", "Z", "Y")) {
            for (String base : List.of("Hz", "eV", "g", "m", "s", "J", "K", "rad/s")) {
                units.add(Units.parse(prefix + base).orElseThrow(() -> new AssertionError(prefix + base)));
            }
            units.add(Units.parse("/" + prefix + "s").orElseThrow());
            units.add(Units.parse("ħ/" + prefix + "m").orElseThrow());
        }
        return units.stream().distinct();
    }

    @Test
    void theTestSeesAllConstants() throws IllegalAccessException {
        assertTrue(constants().count() > 45);
        assertTrue(everyUnit().count() > 150);
    }

    @ParameterizedTest
    @MethodSource("everyUnit")
    void symbolsReadBackAsTheSameUnit(Unit unit) {
        assertEquals(Optional.of(unit), Units.parse(unit.symbol()));
        assertEquals(Optional.of(unit), Units.parse(unit.plain()));
        assertTrue(unit.plain().chars().allMatch(c -> c < 128), unit.plain());
    }

    @ParameterizedTest
    @EnumSource(Kind.class)
    void usualSymbolsAreOfTheirKind(Kind kind) {
        for (String symbol : Units.symbols(kind)) {
            assertEquals(kind, Units.parse(symbol).orElseThrow().kind(), symbol);
        }
        assertEquals(kind == Kind.NUMBER, Units.symbols(kind).isEmpty());
        assertEquals(kind, Units.si(kind).kind());
        assertEquals(1.0, Units.si(kind).factor());
        assertEquals(kind, Units.natural(kind).kind());
        assertEquals("", Units.natural(kind).symbol());
    }

    @ParameterizedTest
    @EnumSource(Kind.class)
    void examplesOfKindsCanBeTyped(Kind kind) {
        String[] parts = kind.example().split(" ");
        assertTrue(Double.parseDouble(parts[0]) > 0);
        assertEquals(
                kind,
                Units.parse(parts.length > 1 ? parts[1] : "").orElseThrow().kind());
        assertTrue(kind.word().startsWith("a ") || kind.word().startsWith("an "));
    }

    /** Two units in the last place: the constant is a rounded double, and the prefix rounds once more. */
    @ParameterizedTest
    @MethodSource("everyUnit")
    void factorsAgreeWithExactDecimals(Unit unit) {
        BigDecimal base = new BigDecimal("1");
        String symbol = unit.symbol();
        if (unit.kind() == Kind.MOMENTUM && symbol.startsWith("ħ")) {
            base = new BigDecimal(HBAR);
        }
        for (Map.Entry<String, String> entry : BASE_FACTORS.entrySet()) {
            boolean prefixed = entry.getKey().equals("eV") ? symbol.endsWith("eV") : symbol.equals(entry.getKey());
            if (prefixed) {
                base = new BigDecimal(entry.getValue());
            }
        }
        double expected = base.scaleByPowerOfTen(unit.exponent()).doubleValue();
        assertEquals(expected, unit.factor(), 2 * Math.ulp(expected), unit.symbol());
    }

    @Test
    void powersOfTenAreThoseOfThePrefixes() {
        assertEquals(1e-24, Units.parse("ys").orElseThrow().factor(), Math.ulp(1e-24)); // two steps beyond 10^22
        assertEquals(1e-6, Units.MICROMETRE.factor());
        assertEquals(1e-10, Units.ANGSTROM.factor());
        assertEquals(1e-3, Units.GRAM.factor());
        assertEquals(1e-6, Units.parse("mg").orElseThrow().factor());
        assertEquals(1e24, Units.parse("YHz").orElseThrow().factor(), Math.ulp(1e24));
        assertEquals(1e6, Units.PER_MICROSECOND.factor());
        assertEquals(100.0, Units.PER_CENTIMETRE.factor());
        assertEquals(1e6, Units.parse("krad/ms").orElseThrow().factor());
    }

    /** A second route: the JSR-385 library composes exact ratios; only its last rounding differs. */
    @ParameterizedTest
    @MethodSource("everyUnit")
    void factorsAgreeWithTheJsr385Library(Unit unit) throws IncommensurableException {
        javax.measure.Unit<?> measure = unit.measure();
        double theirs = measure.getConverterToAny(measure.getSystemUnit()).convert(1.0);
        assertEquals(theirs, unit.factor(), 2 * Math.ulp(theirs), unit.symbol());
        assertTrue(measure.isCompatible(Units.si(unit.kind()).measure()));
    }

    @ParameterizedTest
    @CsvSource({
        "u, MASS",
        "um, LENGTH",
        "us, TIME",
        "uHz, CYCLE_FREQUENCY",
        "m, LENGTH",
        "mm, LENGTH",
        "Mm, LENGTH",
        "ms, TIME",
        "Ms, TIME",
        "me, MASS",
        "meV, ENERGY",
        "MeV, ENERGY",
        "as, TIME",
        "mK, TEMPERATURE",
        "rad, ANGLE",
        "rad/s, ANGULAR_FREQUENCY",
        "/s, ANGULAR_FREQUENCY",
        "/cm, WAVENUMBER",
        "/m, WAVENUMBER",
        "/ms, ANGULAR_FREQUENCY",
        "Pm, LENGTH",
        "PHz, CYCLE_FREQUENCY",
        "g, MASS",
        "Gs, TIME",
        "K, TEMPERATURE",
        "dB, SQUEEZING",
        "cm, LENGTH",
        "J, ENERGY"
    })
    void prefixesAndUnitsOfOneLetterDoNotMix(String symbol, Kind kind) {
        assertEquals(kind, Units.parse(symbol).orElseThrow().kind());
    }

    @Test
    void micromAndAtomicMassAreTwoThings() {
        assertEquals(Units.ATOMIC_MASS, Units.parse("u").orElseThrow());
        assertEquals(Units.MICROMETRE, Units.parse("um").orElseThrow());
        assertNotEquals(Units.parse("mHz"), Units.parse("MHz"));
    }

    @ParameterizedTest
    @CsvSource({
        "1/s, /s",
        "s^-1, /s",
        "s⁻¹, /s",
        "s-1, /s",
        "s^−1, /s",
        "1/ms, /ms",
        "ms^-1, /ms",
        "us^-1, /µs",
        "cm^-1, /cm",
        "1/cm, /cm",
        "cm⁻¹, /cm",
        "cm-1, /cm",
        "angstrom, Å",
        "period, periods",
        "°, deg",
        "degrees, deg",
        "radians, rad",
        "kg m/s, kg·m/s",
        "kg*m/s, kg·m/s",
        "hbar/nm, ħ/nm",
        "ℏ/um, ħ/µm",
        "hbar/angstrom, ħ/Å",
        "urad/s, µrad/s",
        "m_e, me"
    })
    void otherSpellingsGiveTheSameUnit(String typed, String symbol) {
        Unit unit = Units.parse(typed).orElseThrow(() -> new AssertionError(typed));
        assertEquals(symbol, unit.symbol());
        assertEquals(unit, Units.parse(symbol).orElseThrow());
        assertEquals(unit, Units.parse("  " + typed + " ").orElseThrow());
    }

    @Test
    void twoCodePointsOfOneLetterAreOneLetter() {
        assertEquals(Units.MICROSECOND, Units.parse("\u03bcs").orElseThrow());
        assertEquals(Units.MICROSECOND, Units.parse("\u00b5s").orElseThrow());
        assertEquals(Units.ANGSTROM, Units.parse("\u212b").orElseThrow());
        assertEquals(Units.ANGSTROM, Units.parse("\u00c5").orElseThrow());
        assertEquals(Units.ANGSTROM, Units.parse("A\u030a").orElseThrow());
    }

    @ParameterizedTest
    @ValueSource(
            strings = {
                "A",
                "Mhz",
                "mhz",
                "hz",
                "ku",
                "kme",
                "kdB",
                "kdeg",
                "kperiods",
                "parsec",
                "ev",
                "EV",
                "k",
                "M",
                "/",
                "1/",
                "^-1",
                "//s",
                "/kg",
                "/nm",
                "1/Hz",
                "Hz/s",
                "rad/m",
                "rad/",
                "/s/s",
                "s^-2",
                "mmm",
                "uu",
                "kkHz",
                "qs",
                "Rs",
                "dm",
                "hbar",
                "hbar/s",
                "hbar omega",
                "1 MHz",
                "NaN",
                "-1",
                "grad",
                "Grad",
                "µ",
                "s^-1^-1",
                "1/s^-1"
            })
    void unknownSymbolsAreNoUnit(String typed) {
        assertEquals(Optional.empty(), Units.parse(typed));
    }

    @ParameterizedTest
    @CsvSource({
        "Mhz, MHz",
        "MHZ, MHz",
        "mhz, MHz",
        "hz, Hz",
        "GHZ, GHz",
        "khz, kHz",
        "ev, eV",
        "EV, eV",
        "mev, meV",
        "A, angstrom",
        "Angstrom, angstrom",
        "angstroem, angstrom",
        "amu, u",
        "dalton, u",
        "micron, um",
        "microns, um",
        "seconds, s",
        "hertz, Hz",
        "db, dB",
        "DB, dB",
        "k, K",
        "degs, deg",
        "rads/s, rad/s",
        "Mrads/s, Mrad/s",
        "perids, periods",
        "cycles, periods",
        "kelvin, K",
        "nanometers, nm",
        "/Cm, /cm"
    })
    void nearestIsWhatWasMeant(String typed, String meant) {
        assertEquals(Optional.of(meant), Units.nearest(typed));
        assertTrue(Units.parse(meant).isPresent());
    }

    @ParameterizedTest
    @ValueSource(strings = {"", "furlong", "bananas", "!", "%%%%", "parsecs"})
    void nothingIsNearToNonsense(String typed) {
        assertEquals(Optional.empty(), Units.nearest(typed));
    }

    @ParameterizedTest
    @ValueSource(strings = {"de-DE", "tr-TR", "ar-EG", "en-US"})
    void noLocaleChangesAnything(String tag) {
        Locale before = Locale.getDefault();
        try {
            Locale.setDefault(Locale.forLanguageTag(tag));
            assertEquals(Optional.of("MHz"), Units.nearest("MHZ"));
            assertEquals(Optional.of("periods"), Units.nearest("PERIODS"));
            assertEquals("1.2 MHz", Quantity.of(1.2, Units.MEGAHERTZ).toString());
            assertEquals("ν = 1.2 MHz, ω = 7.5398 Mrad/s", Frequency.ofNu(1.2e6).both());
            assertEquals("0.1582113883(3)", Digits.withBound(0.15821138830, 2e-10));
            assertEquals("−1.2×10⁻⁹", Digits.pretty(Digits.shortest(-1.2e-9)));
        } finally {
            Locale.setDefault(before);
        }
    }

    @Test
    void aUnitWithoutASizeIsRefused() {
        for (double bad : new double[] {0, -1, Double.NaN, Double.POSITIVE_INFINITY}) {
            String message = assertThrows(IllegalArgumentException.class, () -> new Unit("x", Kind.LENGTH, bad, 0))
                    .getMessage();
            assertTrue(message.contains("'x'") && message.contains(String.valueOf(bad)), message);
        }
        assertThrows(IllegalArgumentException.class, () -> new Unit("x", Kind.LENGTH, 1, 61));
    }

    @Test
    void prefixesRoundOnce() {
        // A decimal that is typed with a prefix is the double nearest to (double typed) × 10^n.
        java.util.Random random = new java.util.Random(20_250_002);
        for (int i = 0; i < 2000; i++) {
            double value = random.nextDouble() * 1000;
            for (Unit unit :
                    List.of(Units.MEGAHERTZ, Units.NANOMETRE, Units.FEMTOSECOND, Units.GRAM, Units.PER_CENTIMETRE)) {
                double expected = new BigDecimal(value)
                        .scaleByPowerOfTen(unit.exponent())
                        .round(new MathContext(60))
                        .doubleValue();
                assertEquals(expected, unit.toSi(value), value + " " + unit);
            }
        }
    }
}
