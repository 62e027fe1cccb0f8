package ladderwell.kernel.render;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Map;
import ladderwell.Run;
import ladderwell.evidence.Bound;
import ladderwell.kernel.cell.MimeBundle;
import ladderwell.kernel.magic.Declared;
import org.junit.jupiter.api.Test;
import org.w3c.dom.Document;
import org.w3c.dom.NodeList;

class CardRenderingTest {
    private static final String HOSTILE = "</td><script>alert(1)</script>\"'&";
    private final Renderings renderings = new Renderings();

    @Test
    void cardOfAnOscillatorShowsEveryFactUnderOneBoldLine() throws Exception {
        MimeBundle card = renderings.render(new Declared("trap", "oscillator", Scenarios.TRAP));
        Document html = WellFormed.html(card.data().get("text/html"));
        assertEquals(
                Scenarios.TRAP.facts().size(), html.getElementsByTagName("tr").getLength());
        assertTrue(card.plainText().startsWith("oscillator trap: harmonic\n"), card.plainText());
        Scenarios.TRAP.facts().forEach(fact -> assertTrue(card.plainText().contains(fact.name()), fact.name()));
    }

    @Test
    void javaValuesGetTheSameCardWithoutAName() {
        assertTrue(renderings.render(Scenarios.TRAP).plainText().startsWith("oscillator: harmonic\n"));
        assertTrue(renderings.render(Scenarios.TRAP.coherent(2)).plainText().startsWith("state: coherent\n"));
        assertTrue(renderings.render(Scenarios.ion()).plainText().startsWith("run: coherent for 3 periods\n"));
    }

    @Test
    void cardOfARunSaysVerdictDurationFramesMethodAndError() throws Exception {
        Run run = Scenarios.ion();
        MimeBundle card = renderings.render(new Declared("run", "evolve", run));
        String text = card.plainText();
        assertTrue(text.contains(run.verdict()), text);
        assertTrue(text.contains("3 periods = 2.5 µs"), text);
        assertTrue(text.contains("120"), text);
        assertTrue(text.contains(run.method()), text);
        assertTrue(text.endsWith(run.errorLine()), text);
        WellFormed.html(card.data().get("text/html"));
    }

    @Test
    void recordOfTheRunTravelsAsMetadata() {
        Run run = Scenarios.ion();
        Map<?, ?> ladderwell = (Map<?, ?>) renderings.render(run).metadata().get("ladderwell");
        Map<?, ?> record = (Map<?, ?>) ladderwell.get("record");
        assertEquals(run.record().asked().keySet(), ((Map<?, ?>) record.get("asked")).keySet());
    }

    @Test
    void hostileNamesStayText() throws Exception {
        MimeBundle card = renderings.render(new Declared(HOSTILE, "oscillator", Scenarios.TRAP));
        Document html = WellFormed.html(card.data().get("text/html"));
        assertEquals(0, html.getElementsByTagName("script").getLength());
        assertTrue(html.getDocumentElement().getTextContent().contains(HOSTILE));
    }

    @Test
    void digitsEndWhereTheBoundBegins() {
        assertEquals("0.15821(2) nm g", new SupportedDigits(0.158213, Bound.guaranteed(1e-5), "nm").plain());
        assertEquals("0.15821(2) nm e", new SupportedDigits(0.158213, Bound.estimated(1e-5), "nm").plain());
    }

    @Test
    void exactNumbersHaveNoBoundAndNoLetter() {
        assertEquals("40 u", new SupportedDigits(40, Bound.exact(), "u").plain());
        assertFalse(new SupportedDigits(40, Bound.exact(), "u").html().contains("lw-sure"));
    }

    @Test
    void cardsShowTenDigitsAndTellTheRestOnHovering() {
        SupportedDigits digits = new SupportedDigits(Math.PI, Bound.guaranteed(1e-15), "rad");
        assertEquals("3.141592654(1) rad g", digits.plain());
        assertTrue(digits.html().contains("title=\"3.141592653589793 ± 10⁻¹⁵ rad, guaranteed\""), digits.html());
    }

    @Test
    void tenDigitsKeepTheirZerosAndTheirPowerOfTen() {
        assertEquals("1.200000000(1) MHz g", new SupportedDigits(1.2, Bound.guaranteed(1e-15), "MHz").plain());
        assertEquals(
                "5.759091688(1)×10⁻⁵ K s", new SupportedDigits(5.7590916879e-5, Bound.statistical(1e-18), "K").plain());
        assertEquals("−4.000000000(1)×10⁸ g", new SupportedDigits(-4e8, Bound.guaranteed(1e-7), "").plain());
    }

    @Test
    void unknownErrorsSaySo() {
        assertEquals(
                "1.5(?) s",
                new SupportedDigits(1.5, Bound.estimated(Double.POSITIVE_INFINITY), "s")
                        .plain()
                        .replace(" e", ""));
    }

    @Test
    void certaintyIsALetterWithItsWord() throws Exception {
        Document html = WellFormed.html(renderings.render(Scenarios.TRAP).data().get("text/html"));
        NodeList spans = html.getElementsByTagName("span");
        boolean explained = false;
        for (int i = 0; i < spans.getLength(); i++) {
            var attributes = spans.item(i).getAttributes();
            if ("lw-sure"
                    .equals(
                            attributes.getNamedItem("class") == null
                                    ? ""
                                    : attributes.getNamedItem("class").getNodeValue())) {
                assertTrue(spans.item(i).getTextContent().matches("[ges]"));
                assertTrue(attributes
                        .getNamedItem("title")
                        .getNodeValue()
                        .startsWith(spans.item(i).getTextContent()));
                explained = true;
            }
        }
        assertTrue(explained);
    }

    @Test
    void anythingElseIsItsOwnText() {
        assertEquals(Map.of("text/plain", "42"), renderings.render(42).data());
        assertEquals("<b>", renderings.render("<b>").plainText());
    }
}
