package ladderwell.kernel.render;

import static ladderwell.quantity.Units.PERIOD;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Base64;
import java.util.regex.Pattern;
import ladderwell.PhaseSpace;
import ladderwell.Run;
import ladderwell.kernel.cell.MimeBundle;
import ladderwell.kernel.magic.PhaseAnimation;
import ladderwell.kernel.magic.PhasePortrait;
import ladderwell.kernel.picture.PageLibrary;
import ladderwell.phasespace.PhaseField;
import org.junit.jupiter.api.Test;
import org.w3c.dom.Document;
import org.w3c.dom.Element;

/** Pictures of Wigner and Husimi functions: what they say, and that the numbers arrive. */
class PhasePictureTest {
    /** Packed numbers and images, in which any letters may stand. */
    private static final Pattern PACKED = Pattern.compile("[A-Za-z0-9+/]{300,}");

    private static final String HOSTILE = "</script><img src=x>\"&";

    private static MimeBundle picture(String name, Run run, boolean husimi) {
        PhaseSpace space = run.phaseSpace(0.3, PERIOD);
        return new Renderings(PageLibrary.inPage()).render(new PhasePortrait(name, space, husimi));
    }

    private static String html(MimeBundle bundle) {
        return bundle.data().get("text/html");
    }

    @Test
    void theSignAndTheOrbitAreSaidInWords() throws Exception {
        MimeBundle bundle = picture("run", Scenarios.natural(), false);
        String text = bundle.plainText();
        assertTrue(text.startsWith("phasespace run at 0.3 periods"), text);
        assertTrue(text.contains("Wigner function of run at 0.3 periods"), text);
        assertTrue(text.contains("negativity ∫|W| − 1 = "), text);
        assertTrue(text.contains("the ring the classical particle"), text);
        Document page = WellFormed.html(html(bundle));
        String alternative = ((Element) page.getElementsByTagName("img").item(0)).getAttribute("alt");
        assertTrue(text.contains(alternative), alternative);
    }

    @Test
    void theFieldArrivesToWithinHalfACount() {
        PhaseSpace space = Scenarios.natural().phaseSpace(0.3, PERIOD);
        String page = html(new Renderings(PageLibrary.inPage()).render(new PhasePortrait("run", space, false)));
        int from = page.indexOf("\"field\":\"") + 9;
        byte[] counts = Base64.getDecoder()
                .decode(page.substring(from, page.indexOf('"', from)).replace("\\u003d", "="));
        PhaseField field = space.wigner();
        int nx = field.grid().nx();
        assertEquals(nx * field.grid().np(), counts.length);
        for (int i = 0; i < nx; i += 5) {
            for (int j = 0; j < field.grid().np(); j += 5) {
                double there = field.peak() * ((counts[j * nx + i] & 0xFF) - 128) / 127;
                assertEquals(field.value(i, j), there, field.peak() * (0.5 / 127 + 1e-12));
            }
        }
    }

    @Test
    void stillsHoldForEveryKindOfMotion() throws Exception {
        Run[] runs = {
            Scenarios.ion(),
            Scenarios.electron(),
            Scenarios.BOX.superposition(0, 1).evolve(1, PERIOD).frames(4).run(),
            Scenarios.TRAP.number(3).evolve(1, PERIOD).frames(3).run(),
            Scenarios.TRAP.coherent(1e8).evolve(2, PERIOD).frames(40).run()
        };
        for (Run run : runs) {
            for (boolean husimi : new boolean[] {false, true}) {
                MimeBundle bundle = picture("motion", run, husimi);
                String svg = bundle.data().get("image/svg+xml");
                Document still = WellFormed.xml(svg);
                assertEquals(1, still.getElementsByTagName("image").getLength());
                WellFormed.html(html(bundle));
                assertFalse(PACKED.matcher(svg).replaceAll("").matches("(?s).*(NaN|Infinity).*"), bundle.plainText());
                assertFalse(PACKED.matcher(html(bundle)).replaceAll("").matches("(?s).*(NaN|Infinity).*"));
            }
        }
    }

    @Test
    void aLevelHasAnOrbitAtItsEnergyAndNoRing() throws Exception {
        MimeBundle bundle =
                picture("run", Scenarios.TRAP.number(3).evolve(1, PERIOD).run(), false);
        assertTrue(bundle.plainText().contains("classical orbit at the mean energy"), bundle.plainText());
        Document still = WellFormed.xml(bundle.data().get("image/svg+xml"));
        assertEquals(0, still.getElementsByTagName("circle").getLength());
    }

    @Test
    void hostileNamesStayText() throws Exception {
        MimeBundle bundle = picture(HOSTILE, Scenarios.natural(), false);
        Document page = WellFormed.html(html(bundle));
        assertEquals(1, page.getElementsByTagName("img").getLength());
        assertEquals(1, page.getElementsByTagName("script").getLength());
    }

    @Test
    void theFilmMovesBelowTheDensityOnTheSameScale() throws Exception {
        Run run = Scenarios.natural();
        MimeBundle bundle = new Renderings(PageLibrary.inPage())
                .render(new PhaseAnimation("run", run, run.density(), run.phaseFilm(41)));
        String text = bundle.plainText();
        assertTrue(text.startsWith("phasespace run: " + run.verdict()), text);
        assertTrue(text.contains("below it the Wigner function moving"), text);
        Document still = WellFormed.xml(bundle.data().get("image/svg+xml"));
        assertEquals(5, still.getElementsByTagName("image").getLength(), "five moments");
        assertEquals(7 + 5, still.getElementsByTagName("circle").getLength(), "the ring in each");
        Document page = WellFormed.html(html(bundle));
        assertEquals(1, page.getElementsByTagName("script").getLength());
        assertTrue(
                html(bundle).length() < 600_000,
                "the film weighs " + html(bundle).length());
    }
}
