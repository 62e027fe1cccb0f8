package ladderwell.kernel.picture;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;

import com.google.gson.JsonObject;
import com.google.gson.JsonParser;
import org.junit.jupiter.api.Test;

class MarkupTest {
    @Test
    void textCannotOpenATagOrEndAnAttribute() {
        assertEquals("&lt;b title=&quot;a&#39;&amp;&quot;&gt;", Markup.text("<b title=\"a'&\">"));
        assertEquals("ħω\uFFFD", Markup.text("ħω\u0000"));
    }

    @Test
    void dataCannotEndAScriptAndComesBackWhole() {
        String hostile = "</script><!--\u2028\u2029'\"\\&";
        JsonObject data = new JsonObject();
        data.addProperty("t", hostile);
        String script = Markup.script(data);
        assertFalse(
                script.contains("<") || script.contains(">") || script.contains("\u2028") || script.contains("\u2029"));
        assertEquals(
                hostile,
                JsonParser.parseString(script).getAsJsonObject().get("t").getAsString());
    }

    @Test
    void theLibraryCannotEndItsOwnScript() {
        String program = PageLibrary.javascript();
        assertFalse(program.contains("</script"));
        assertFalse(program.contains("<!--"));
    }
}
