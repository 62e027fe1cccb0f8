package ladderwell.kernel.picture;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;

import com.google.gson.JsonParser;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class JavascriptLiteralTest {
    @Test
    void readsWhatTheBuildersWrite() {
        assertEquals(
                JsonParser.parseString("{\"a\":'it''s'.length,\"b\":0}"
                        .replace("'it''s'.length", "\"it's\"")
                        .replace("\"b\":0", "\"b\":[1,-2.5,null,\"x\"]")),
                JavascriptLiteral.object("var layout = {\n a: 'it\\'s',\n b: [1, -2.5, NaN, \"x\",],\n};"));
    }

    @Test
    void readsEscapes() {
        assertEquals(
                "\n\u2028\"",
                JavascriptLiteral.object("{t: '\\n\\u2028\\\"'}").get("t").getAsString());
    }

    @ParameterizedTest
    @ValueSource(
            strings = {
                "",
                "alert(1)",
                "{a: alert(1)}",
                "{a: 1}; alert(1)",
                "{a: function(){}}",
                "{a: '",
                "{a: 'x\\",
                "{a: '\\u12'}",
                "{a 1}",
                "{a: 1 b: 2}",
                "[1]",
                "window.x = {a: 1}"
            })
    void refusesEverythingElse(String text) {
        assertThrows(IllegalArgumentException.class, () -> JavascriptLiteral.object(text));
    }

    @Test
    void dropsKeysThatReachBehindAnObject() {
        assertFalse(
                JavascriptLiteral.object("{__proto__: {polluted: true}, a: 1}").has("__proto__"));
    }

    @Test
    void refusesNestingWithoutEnd() {
        assertThrows(IllegalArgumentException.class, () -> JavascriptLiteral.object("{a: " + "[".repeat(100_000)));
    }
}
