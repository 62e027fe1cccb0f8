package ladderwell.evidence;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.math.BigDecimal;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Random;
import ladderwell.quantity.Digits;
import ladderwell.quantity.Quantity;
import ladderwell.quantity.Units;
import org.erdtman.jcs.JsonCanonicalizer;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;

class RecordTest {

    private static Record.Builder ion() {
        return Record.builder()
                .asked(
                        "oscillator",
                        Map.of(
                                "kind", "harmonic",
                                "mass", Quantity.of(40, Units.ATOMIC_MASS),
                                "frequency", Quantity.of(1.2, Units.MEGAHERTZ)))
                .asked("state", Map.of("kind", "coherent", "mean", 9.5, "phase", Quantity.of(30, Units.DEGREE)))
                .asked("frames", 120)
                .asked("tolerance", Tolerance.STATE)
                .method("name", "exact phases on levels")
                .method("closed form", true)
                .size("levels", 41)
                .size("step", Quantity.of(0.5, Units.MICROSECOND))
                .bound("state", Bound.guaranteed(7.3e-10))
                .bound("position", Bound.estimated(Double.POSITIVE_INFINITY));
    }

    @Test
    void theTextIsCanonical() throws IOException {
        String version = Version.current().number();
        assertEquals(
                "{\"asked\":{\"frames\":120,\"oscillator\":{\"frequency\":{\"unit\":\"MHz\",\"value\":1.2},"
                        + "\"kind\":\"harmonic\",\"mass\":{\"unit\":\"u\",\"value\":40}},\"state\":{\"kind\":\"coherent\","
                        + "\"mean\":9.5,\"phase\":{\"unit\":\"deg\",\"value\":30}},\"tolerance\":{\"kind\":\"absolute\","
                        + "\"name\":\"state\",\"unit\":\"\",\"value\":1e-9}},"
                        + "\"bounds\":{\"position\":{\"kind\":\"e\",\"size\":\"unknown\"},\"state\":{\"kind\":\"g\",\"size\":7.3e-10}},"
                        + "\"method\":{\"closed form\":true,\"name\":\"exact phases on levels\"},"
                        + "\"sizes\":{\"levels\":41,\"step\":{\"unit\":\"us\",\"value\":0.5}},"
                        + "\"versions\":{\"constants\":\"CODATA 2022\",\"ladderwell\":\"" + version
                        + "\",\"record\":1}}",
                ion().build().json());
        assertEquals(
                new JsonCanonicalizer(ion().build().json()).getEncodedString(),
                ion().build().json());
    }

    /** SHA-256 of the asked part above, from coreutils' sha256sum: the same on every Java and machine. */
    @Test
    void theHashIsThatOfWhatWasAsked() {
        Record record = ion().build();
        assertEquals(ASKED_SHA256, record.hash());
        assertEquals(ASKED_SHA256.substring(0, 12), record.shortHash());
        assertEquals(record.hash(), ion().method("reason", "another").build().hash());
        assertNotEquals(record.hash(), ion().asked("more", 1).build().hash());
    }

    private static final String ASKED_SHA256 = "ce2b58b8baba2259557e281b878f10e629eb62c20f69c6a94f3f93bca4970f3b";

    @ParameterizedTest
    @ValueSource(strings = {"de-DE", "tr-TR", "ar-EG", "hi-IN-u-nu-deva"})
    void noLocaleChangesTheBytes(String tag) {
        byte[] bytes = ion().build().bytes();
        Locale before = Locale.getDefault();
        try {
            Locale.setDefault(Locale.forLanguageTag(tag));
            assertArrayEquals(bytes, ion().build().bytes());
        } finally {
            Locale.setDefault(before);
        }
    }

    @Test
    void theOrderOfCallsDoesNotMatter() {
        Record one = Record.builder().asked("a", 1).asked("b", "x").size("n", 3).build();
        Record other =
                Record.builder().size("n", 3).asked("b", "x").asked("a", 1.0).build();
        assertEquals(one, other);
        assertEquals(one.hashCode(), other.hashCode());
        assertArrayEquals(one.bytes(), other.bytes());
    }

    @Test
    void recordsReadBackFromAnyLayout() {
        Record record = ion().build();
        assertEquals(record, Record.parse(record.json()));
        assertEquals(record, Record.parse(record.json().replace(",", " ,\n\t").replace(":", " : ")));
        Record read = Record.parse(record.json());
        assertEquals(Bound.guaranteed(7.3e-10), read.bound("state"));
        assertEquals(Bound.estimated(Double.POSITIVE_INFINITY), read.bound("position"));
        assertEquals(120.0, read.asked().get("frames"));
        assertEquals(41.0, read.sizes().get("levels"));
        assertEquals("CODATA 2022", read.versions().get("constants"));
        assertEquals("exact phases on levels", read.method().get("name"));
        String message = assertThrows(IllegalArgumentException.class, () -> read.bound("energy"))
                .getMessage();
        assertEquals("the record has no bound 'energy'; it has [position, state]", message);
    }

    @Test
    void recordsDoNotChangeWithWhatTheyWereMadeFrom() {
        List<Object> list = new ArrayList<>(List.of(1, 2));
        Map<String, Object> map = new HashMap<>(Map.of("k", list));
        Record.Builder builder = Record.builder().asked("m", map);
        Record record = builder.build();
        String before = record.json();
        list.add(3);
        map.put("l", 4);
        builder.asked("later", true);
        assertEquals(before, record.json());
        record.bytes()[0] = 'x';
        assertEquals(before, record.json());
        assertThrows(UnsupportedOperationException.class, () -> record.asked().put("k", 1));
    }

    /** RFC 8785, appendix B: IEEE 754 bits and their text. */
    @ParameterizedTest
    @CsvSource({
        "0000000000000000, 0",
        "8000000000000000, 0",
        "0000000000000001, 5e-324",
        "8000000000000001, -5e-324",
        "7fefffffffffffff, 1.7976931348623157e+308",
        "ffefffffffffffff, -1.7976931348623157e+308",
        "4340000000000000, 9007199254740992",
        "c340000000000000, -9007199254740992",
        "4430000000000000, 295147905179352830000",
        "44b52d02c7e14af5, 9.999999999999997e+22",
        "44b52d02c7e14af6, 1e+23",
        "44b52d02c7e14af7, 1.0000000000000001e+23",
        "444b1ae4d6e2ef4e, 999999999999999700000",
        "444b1ae4d6e2ef4f, 999999999999999900000",
        "444b1ae4d6e2ef50, 1e+21",
        "3eb0c6f7a0b5ed8c, 9.999999999999997e-7",
        "3eb0c6f7a0b5ed8d, 0.000001",
        "41b3de4355555553, 333333333.3333332",
        "41b3de4355555554, 333333333.33333325",
        "41b3de4355555555, 333333333.3333333",
        "41b3de4355555556, 333333333.3333334",
        "41b3de4355555557, 333333333.33333343",
        "becbf647612f3696, -0.0000033333333333333333",
        "43143ff3c1cb0959, 1424953923781206.2"
    })
    void numbersAreWrittenAsTheStandardSays(String bits, String text) {
        double value = Double.longBitsToDouble(Long.parseUnsignedLong(bits, 16));
        String json = Record.builder().asked("x", value).build().json();
        assertTrue(json.startsWith("{\"asked\":{\"x\":" + text + "}"), json);
    }

    /** Against a second way to the shortest decimal: the least precision at which the exact value reads back. */
    @Test
    void numbersAreTheShortestThatReadBackOnEveryJava() {
        Random random = new Random(8785);
        for (int i = 0; i < 20_000; i++) {
            double value = i % 2 == 0
                    ? Double.longBitsToDouble(random.nextLong())
                    : random.nextInt(1000) * Math.pow(10, i % 40 - 20);
            if (Double.isFinite(value)) {
                String written = CanonicalJson.write(value);
                assertEquals(value, Double.parseDouble(written), 0);
                assertEquals(0, new BigDecimal(written).compareTo(new BigDecimal(Digits.shortest(value))), written);
            }
        }
    }

    @Test
    void powersOfTwoAreWrittenShortestToo() {
        for (int exponent = Double.MIN_EXPONENT - 52; exponent <= Double.MAX_EXPONENT; exponent++) {
            double power = Math.scalb(1.0, exponent);
            for (double value : new double[] {Math.nextDown(power), power, Math.nextUp(power)}) {
                BigDecimal written = new BigDecimal(CanonicalJson.write(value));
                assertEquals(0, written.compareTo(new BigDecimal(Digits.shortest(value))), written.toString());
            }
        }
    }

    /** The JCS reference implementation, as a second route to the same text. */
    @Test
    void textsAreEscapedAndSortedAsTheStandardSays() throws IOException {
        Random random = new Random(17);
        for (int i = 0; i < 500; i++) {
            Map<String, Object> map = new HashMap<>();
            for (int j = 0; j < 8; j++) {
                map.put(
                        text(random),
                        List.of(text(random), random.nextGaussian(), random.nextBoolean(), Map.of(text(random), 1)));
            }
            String json = Record.builder().asked("m", map).build().json();
            assertEquals(new JsonCanonicalizer(json).getEncodedString(), json);
            assertArrayEquals(
                    json.getBytes(StandardCharsets.UTF_8), Record.parse(json).bytes());
        }
    }

    private static String text(Random random) {
        StringBuilder text = new StringBuilder();
        for (int i = random.nextInt(6); i >= 0; i--) {
            int kind = random.nextInt(4);
            text.appendCodePoint(
                    kind == 0
                            ? random.nextInt(32)
                            : kind == 1
                                    ? 32 + random.nextInt(96)
                                    : kind == 2 ? 0xa0 + random.nextInt(0x3000) : 0x1f300 + random.nextInt(256));
        }
        return text.toString();
    }

    @Test
    void keysSortByTheirUtf16Units() {
        // RFC 8785, 3.2.3: an astral character's surrogates come before U+FB33.
        String json = Record.builder()
                .asked("\ufb33", 1)
                .asked("\ud83d\ude02", 2)
                .asked("\u20ac", 3)
                .asked("1", 4)
                .build()
                .json();
        assertTrue(json.startsWith("{\"asked\":{\"1\":4,\"\u20ac\":3,\"\ud83d\ude02\":2,\"\ufb33\":1}"), json);
    }

    @Test
    void refusesWhatNoRecordCanHold() {
        refused("'asked.x' is NaN; a record holds finite numbers only", Double.NaN);
        refused("'asked.x' is Infinity; a record holds finite numbers only", Double.POSITIVE_INFINITY);
        refused(
                "'asked.x' is 9007199254740993; a record holds whole numbers up to 2^53, give it as a text",
                (1L << 53) + 1);
        refused(
                "'asked.x[1].y' is null; a record holds texts, booleans, numbers, quantities, bounds, tolerances, lists"
                        + " and maps",
                Arrays.asList(1, new HashMap<>() {
                    {
                        put("y", null);
                    }
                }));
        refused(
                "'asked.x' is a Locale; a record holds texts, booleans, numbers, quantities, bounds, tolerances, lists and"
                        + " maps",
                Locale.ROOT);
        refused("'asked.x' has the key 1; keys are texts", Map.of(1, 2));
        refused("'asked.x' holds half a surrogate pair, which no text has", "a\ud83d");
        refused("'asked.x' holds half a surrogate pair, which no text has", "\ude02b");
        String twice = assertThrows(
                        IllegalArgumentException.class,
                        () -> Record.builder().asked("x", 1).asked("x", 1))
                .getMessage();
        assertEquals("'asked.x' is already in the record", twice);
    }

    private static void refused(String message, Object value) {
        assertEquals(
                message,
                assertThrows(
                                IllegalArgumentException.class,
                                () -> Record.builder().asked("x", value))
                        .getMessage());
    }

    @ParameterizedTest
    @ValueSource(
            strings = {
                "",
                "{",
                "[]",
                "null",
                "{}",
                "1",
                "{\"asked\":{}}",
                "{\"asked\":1,\"bounds\":{},\"method\":{},\"sizes\":{},\"versions\":{}}",
                "{\"asked\":{},\"bounds\":{},\"method\":{},\"sizes\":{},\"versions\":{}}",
                "{\"asked\":{},\"bounds\":{},\"method\":{},\"sizes\":{},\"versions\":{\"record\":2}}",
                "{\"asked\":{},\"bounds\":{},\"method\":{},\"sizes\":{},\"versions\":{\"record\":\"1\"}}",
                "{\"asked\":{},\"bounds\":{},\"method\":{},\"sizes\":{},\"versions\":{\"record\":1},\"more\":{}}"
            })
    void refusesTextsThatAreNoRecord(String json) {
        String message = assertThrows(IllegalArgumentException.class, () -> Record.parse(json))
                .getMessage();
        assertTrue(message.contains("record") || message.startsWith("JSON at character "), message);
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = ';',
            quoteCharacter = '`',
            value = {
                "[1,]; JSON at character 3: found ']', expected an object, an array, a text, a number, true or false",
                "[1 2]; JSON at character 3: found '2]', expected ','",
                "{\"a\":1,\"a\":2}; JSON at character 7: found '\"a\":2}', expected each key once, not 'a' again",
                "[01]; JSON at character 2: found '1]', expected ','",
                "[1e999]; JSON at character 1: found '1e999]', expected a number within the range of doubles",
                "[NaN]; JSON at character 1: found 'NaN]', expected an object, an array, a text, a number, true or false",
                "[\"\\x\"]; JSON at character 3: found 'x\"]', expected one of the escapes \\\" \\\\ \\/ \\b \\f \\n \\r \\t \\u",
                "[\"\\u12g4\"]; JSON at character 6: found 'g4\"]', expected four hexadecimal digits",
                "[\"a; JSON at character 3: found the end, expected more text",
                "[1]x; JSON at character 3: found 'x', expected the end of the text",
                "{1:2}; JSON at character 1: found '1:2}', expected '\"'"
            })
    void brokenJsonIsPlacedAndExplained(String json, String message) {
        assertEquals(
                message,
                assertThrows(IllegalArgumentException.class, () -> CanonicalJson.read(json))
                        .getMessage());
    }

    @Test
    void deepNestingIsRefusedAndDoesNotOverflowTheStack() {
        String deep = "[".repeat(100_000);
        assertTrue(assertThrows(IllegalArgumentException.class, () -> CanonicalJson.read(deep))
                .getMessage()
                .contains("at most 100 nested levels"));
    }

    @Test
    void theVersionIsThatOfTheBuild() {
        assertTrue(
                Version.current().number().matches("[0-9]+\\.[0-9]+\\.[0-9]+.*"),
                Version.current().number());
        assertEquals(Version.current().number(), ion().build().versions().get("ladderwell"));
        assertThrows(IllegalArgumentException.class, () -> new Version(" "));
    }
}
