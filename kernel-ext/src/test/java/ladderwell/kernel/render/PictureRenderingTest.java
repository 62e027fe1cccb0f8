package ladderwell.kernel.render;

import static ladderwell.quantity.Units.PERIOD;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.google.gson.JsonObject;
import com.google.gson.JsonParser;
import java.nio.charset.StandardCharsets;
import java.util.Base64;
import java.util.Map;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.LongStream;
import ladderwell.Density;
import ladderwell.Run;
import ladderwell.kernel.cell.MimeBundle;
import ladderwell.kernel.magic.Animation;
import ladderwell.kernel.magic.LevelTable;
import ladderwell.kernel.picture.PageLibrary;
import org.junit.jupiter.api.Test;
import org.w3c.dom.Document;
import org.w3c.dom.Element;
import tech.tablesaw.api.DoubleColumn;
import tech.tablesaw.api.Table;
import tech.tablesaw.plotly.api.LinePlot;
import tech.tablesaw.plotly.components.Figure;
import tech.tablesaw.plotly.components.Layout;
import tech.tablesaw.plotly.traces.Scatter3DTrace;

class PictureRenderingTest {
    private static final String HOSTILE = "</script><img src=x onerror=alert(1)>\"'&\u2028\u0000";
    private static final Pattern KEY = Pattern.compile("data-ladderwell=\"([^\"]+)\"");

    /** What a bundle weighs in a notebook file: all its forms. */
    private static int weight(MimeBundle bundle) {
        return bundle.data().values().stream()
                .mapToInt(text -> text.getBytes(StandardCharsets.UTF_8).length)
                .sum();
    }

    private static String html(MimeBundle bundle) {
        return bundle.data().get("text/html");
    }

    /** The data of the picture, as the player gets it. */
    private static JsonObject drawing(MimeBundle bundle) {
        String html = html(bundle);
        int from = html.lastIndexOf("})(window, ") + "})(window, ".length();
        return JsonParser.parseString(html.substring(from, html.lastIndexOf(");</script>")))
                .getAsJsonObject();
    }

    private static Element still(MimeBundle bundle) throws Exception {
        return (Element)
                WellFormed.html(html(bundle)).getElementsByTagName("img").item(0);
    }

    @Test
    void aHundredAndTwentyFramesOfFourHundredPointsStayUnder200Kilobytes() {
        Run run = Scenarios.ion();
        Density density = run.density();
        assertEquals(121, density.times());
        assertEquals(400, density.points());
        MimeBundle bundle = new Renderings(PageLibrary.inPage()).render(new Animation("run", run, density));
        assertTrue(weight(bundle) < 200_000, "the bundle weighs " + weight(bundle));
    }

    @Test
    void framesArriveToWithinHalfACount() {
        Run run = Scenarios.electron();
        Density density = run.density(101);
        JsonObject data = drawing(new Renderings(PageLibrary.inPage()).render(new Animation("hop", run, density)))
                .getAsJsonObject("data");
        JsonObject frames = data.getAsJsonObject("frames");
        byte[] counts = Base64.getDecoder().decode(frames.get("counts").getAsString());
        double high = frames.get("high").getAsDouble();
        double scale = high / density.peak();
        assertEquals(2 * density.times() * density.points(), counts.length);
        for (int j = 0; j < density.times(); j++) {
            for (int i = 0; i < density.points(); i++) {
                int at = 2 * (j * density.points() + i);
                int count = (counts[at] & 0xFF) | (counts[at + 1] & 0xFF) << 8;
                // half a count, and the rounding of a few operations
                assertEquals(density.value(j, i) * scale, high * count / 65535, high * (0.5 / 65535 + 1e-12));
            }
        }
    }

    @Test
    void animationsSayInTextWhatTheyShow() {
        Run run = Scenarios.ion();
        MimeBundle bundle = new Renderings().render(Scenarios.animation("run", run));
        String text = bundle.plainText();
        assertTrue(text.startsWith("Animation run: " + run.verdict()), text);
        assertTrue(text.contains("3 periods = 2.5 µs"), text);
        assertTrue(text.endsWith(run.errorLine()), text);
        assertTrue(((Map<?, ?>) bundle.metadata().get("ladderwell")).containsKey("record"));
    }

    @Test
    void theStillIsAnImageWithWordsThatAnyPageShows() throws Exception {
        MimeBundle bundle = new Renderings().render(Scenarios.animation("run", Scenarios.ion()));
        Element still = still(bundle);
        assertTrue(
                still.getAttribute("alt").startsWith("Density of run moving in the potential"),
                still.getAttribute("alt"));
        String source = still.getAttribute("src");
        String prefix = "data:image/svg+xml;base64,";
        assertTrue(source.startsWith(prefix));
        String svg = new String(Base64.getDecoder().decode(source.substring(prefix.length())), StandardCharsets.UTF_8);
        assertEquals(bundle.data().get("image/svg+xml"), svg);
        Document drawing = WellFormed.xml(svg);
        assertEquals(7, drawing.getElementsByTagName("circle").getLength(), "seven moments, each with its ring");
        assertFalse(svg.contains("NaN"));
    }

    @Test
    void stillsAndDataHoldForEveryKindOfMotion() throws Exception {
        Run[] runs = {
            Scenarios.natural(),
            Scenarios.electron(),
            Scenarios.BOX.superposition(0, 1).evolve(1, PERIOD).frames(1).run(),
            Scenarios.WELL.number(0).evolve(1, PERIOD).frames(3).run(),
            Scenarios.TRAP.coherent(0).evolve(1, PERIOD).frames(5).run(),
            Scenarios.TRAP.coherent(1e8).evolve(2, PERIOD).frames(40).run(),
            Scenarios.TRAP.coherent(4).evolve(300, PERIOD).frames(60).run()
        };
        for (Run run : runs) {
            MimeBundle bundle = new Renderings(PageLibrary.inPage()).render(Scenarios.animation("motion", run));
            String svg = bundle.data().get("image/svg+xml");
            WellFormed.xml(svg);
            WellFormed.html(html(bundle));
            assertFalse(svg.contains("NaN") || svg.contains("Infinity"), svg);
            String data = drawing(bundle).toString();
            assertFalse(data.contains("NaN") || data.contains("Infinity"));
        }
    }

    @Test
    void longRunsAreThinnedAndSaySo() {
        Run run = Scenarios.TRAP.coherent(2).evolve(5, PERIOD).frames(1000).run();
        MimeBundle bundle = new Renderings(PageLibrary.inPage()).render(new Animation("run", run, run.density(200)));
        assertTrue(html(bundle).contains("every 4th frame is shown"));
        byte[] counts = Base64.getDecoder()
                .decode(drawing(bundle)
                        .getAsJsonObject("data")
                        .getAsJsonObject("frames")
                        .get("counts")
                        .getAsString());
        assertEquals(251 * 200 * 2, counts.length);
    }

    @Test
    void oneFineGridIsThinnedAndSaysSo() {
        Run run = Scenarios.TRAP.coherent(2).evolve(1, PERIOD).frames(10).run();
        MimeBundle bundle = new Renderings(PageLibrary.inPage()).render(new Animation("run", run, run.density(2401)));
        assertTrue(html(bundle).contains("every 4th position is shown"), "2401 points thinned to 601");
    }

    @Test
    void theFirstPictureCarriesTheLibraryAndCarriesItAgain() {
        Renderings renderings = new Renderings();
        Animation first = Scenarios.animation("run", Scenarios.natural());
        Animation second = Scenarios.animation("other", Scenarios.natural());
        assertTrue(html(renderings.render(first)).contains("Plotly, Inc."));
        assertFalse(html(renderings.render(second)).contains("Plotly, Inc."));
        assertTrue(html(renderings.render(first)).contains("Plotly, Inc."), "its cell was run again");
        renderings.library().forget();
        assertTrue(html(renderings.render(second)).contains("Plotly, Inc."));
        assertFalse(html(new Renderings(PageLibrary.inPage()).render(first)).contains("Plotly, Inc."));
    }

    @Test
    void nothingPointsToTheNetwork() {
        Renderings renderings = new Renderings(PageLibrary.inPage());
        String all = html(renderings.render(Scenarios.animation("run", Scenarios.natural())))
                + html(renderings.render(Scenarios.levels("box", Scenarios.BOX, 0, 1)));
        assertFalse(Pattern.compile("(src|href)=\"(?!data:)").matcher(all).find());
        assertFalse(all.contains("https:"));
        assertFalse(PageLibrary.script().matches("(?s).*<script[^>]+src=.*"));
    }

    @Test
    void equalPicturesOfASessionHaveTheirOwnKeysAndSessionsRepeatThemselves() {
        Run run = Scenarios.natural();
        Animation animation = Scenarios.animation("run", run);
        Renderings one = new Renderings(PageLibrary.inPage());
        String first = html(one.render(animation));
        String second = html(one.render(animation));
        assertNotEquals(key(first), key(second));
        assertEquals(first, html(new Renderings(PageLibrary.inPage()).render(animation)));
    }

    private static String key(String html) {
        Matcher matcher = KEY.matcher(html);
        assertTrue(matcher.find());
        return matcher.group(1);
    }

    @Test
    void hostileNamesStayText() throws Exception {
        Renderings renderings = new Renderings(PageLibrary.inPage());
        for (MimeBundle bundle : new MimeBundle[] {
            renderings.render(Scenarios.animation(HOSTILE, Scenarios.natural())),
            renderings.render(Scenarios.levels(HOSTILE, Scenarios.BOX, 0, 1))
        }) {
            Document page = WellFormed.html(html(bundle));
            assertEquals(1, page.getElementsByTagName("img").getLength());
            assertEquals(1, page.getElementsByTagName("script").getLength());
            WellFormed.xml(bundle.data().get("image/svg+xml"));
            drawing(bundle);
        }
    }

    @Test
    void levelsComeAsTableAndPicture() throws Exception {
        MimeBundle bundle = new Renderings().render(Scenarios.levels("well", Scenarios.WELL, 0, 1, 2, 3));
        Document page = WellFormed.html(html(bundle));
        assertEquals(5, page.getElementsByTagName("tr").getLength());
        assertTrue(bundle.plainText().contains("Levels 0 to 3 of well (finite well)"), bundle.plainText());
        Document svg = WellFormed.xml(bundle.data().get("image/svg+xml"));
        assertEquals(4, classCount(svg, "line"), "one curve a level");
        assertEquals(4, classCount(svg, "dash"), "one line a level");
        assertEquals(
                4,
                drawing(bundle).getAsJsonObject("data").getAsJsonArray("labels").size());
    }

    private static int classCount(Document svg, String name) {
        int count = 0;
        var paths = svg.getElementsByTagName("path");
        for (int i = 0; i < paths.getLength(); i++) {
            count += ((Element) paths.item(i)).getAttribute("class").equals(name) ? 1 : 0;
        }
        return count;
    }

    @Test
    void ofManyLevelsThePictureShowsTheLowest() throws Exception {
        LevelTable many =
                Scenarios.levels("trap", Scenarios.TRAP, LongStream.range(0, 40).toArray());
        MimeBundle bundle = new Renderings().render(many);
        assertEquals(12, classCount(WellFormed.xml(bundle.data().get("image/svg+xml")), "line"));
        assertTrue(bundle.plainText().contains("the lowest 12 of 40"), bundle.plainText());
    }

    @Test
    void noLevelsAreATableAlone() {
        LevelTable none = new LevelTable("trap", Scenarios.TRAP, Table.create("levels"), new long[0]);
        assertFalse(html(new Renderings().render(none)).contains("<img"));
    }

    @Test
    void figuresOfJavaCellsAreShownInThePage() throws Exception {
        Table table =
                Table.create("t", DoubleColumn.create("it's </script>", 1, 2, 3), DoubleColumn.create("y", 1, 4, 9));
        Figure figure = LinePlot.create("squares' </script> \u2028", table, "it's </script>", "y");
        MimeBundle bundle = new Renderings(PageLibrary.inPage()).render(figure);
        WellFormed.html(html(bundle));
        JsonObject drawing = drawing(bundle);
        assertEquals(1, drawing.getAsJsonArray("traces").size());
        assertEquals(
                "scatter",
                drawing.getAsJsonArray("traces")
                        .get(0)
                        .getAsJsonObject()
                        .get("type")
                        .getAsString());
        assertTrue(bundle.plainText().startsWith("Figure"), bundle.plainText());
        assertFalse(html(bundle).contains("cdn"));
    }

    @Test
    void figuresThatCannotBeDrawnSayWhy() {
        DoubleColumn n = DoubleColumn.create("n", 1, 2);
        Figure figure = new Figure(
                Layout.builder("space").build(), Scatter3DTrace.builder(n, n, n).build());
        MimeBundle bundle = new Renderings().render(figure);
        assertTrue(bundle.plainText().contains("scatter3d"), bundle.plainText());
        assertFalse(html(bundle).contains("<script"));
    }
}
