package ladderwell.kernel.render;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.math.BigDecimal;
import java.util.Random;
import ladderwell.Run;
import ladderwell.kernel.cell.MimeBundle;
import ladderwell.kernel.magic.TableRead;
import org.junit.jupiter.api.Test;
import org.w3c.dom.Document;
import tech.tablesaw.api.BooleanColumn;
import tech.tablesaw.api.DoubleColumn;
import tech.tablesaw.api.IntColumn;
import tech.tablesaw.api.StringColumn;
import tech.tablesaw.api.Table;

class TableRenderingTest {
    private final Renderings renderings = new Renderings();

    private static Table measured(double value, double error) {
        return Table.create(
                "", DoubleColumn.create("x / nm", value), DoubleColumn.create("± x / nm (guaranteed)", error));
    }

    @Test
    void twentyRowsAreShownAndTheRestIsCounted() throws Exception {
        Run run = Scenarios.ion();
        MimeBundle bundle = renderings.render(Scenarios.table(run));
        Document html = WellFormed.html(bundle.data().get("text/html"));
        assertEquals(21, html.getElementsByTagName("tr").getLength());
        assertTrue(bundle.data().get("text/html").contains("… 101 more rows"));
        assertTrue(bundle.plainText().contains("… 101 more rows"));
        assertTrue(bundle.plainText().endsWith(run.errorLine()));
        assertTrue(bundle.metadata().containsKey("ladderwell"));
    }

    @Test
    void aTableOfTwentyRowsCountsNothing() {
        Table table = Table.create("", IntColumn.indexColumn("n", 20, 0));
        assertFalse(renderings.render(table).plainText().contains("more"));
        Table longer = Table.create("", IntColumn.indexColumn("n", 21, 0));
        assertTrue(renderings.render(longer).plainText().endsWith("… 1 more row"));
    }

    @Test
    void valuesEndWhereTheirErrorBegins() {
        String[] values = RoundedColumn.cells(measured(10.26095967412, 3.4e-5), 0, 1);
        String[] errors = RoundedColumn.cells(measured(10.26095967412, 3.4e-5), 1, 1);
        assertEquals("10.260960", values[0]);
        assertEquals("3.5×10⁻⁵", errors[0]);
    }

    @Test
    void theShownErrorCoversTheShownValue() {
        Random random = new Random(7);
        for (int i = 0; i < 2000; i++) {
            double value = random.nextGaussian() * Math.pow(10, random.nextInt(-12, 12));
            double error = Math.abs(value) * Math.pow(10, -random.nextDouble() * 15);
            Table table = measured(value, error);
            BigDecimal shown = number(RoundedColumn.cells(table, 0, 1)[0]);
            BigDecimal plusMinus = number(RoundedColumn.cells(table, 1, 1)[0]);
            BigDecimal exact = new BigDecimal(value);
            BigDecimal off = exact.subtract(shown).abs().add(new BigDecimal(error));
            assertTrue(off.compareTo(plusMinus) <= 0, value + " ± " + error + " shown as " + shown + " ± " + plusMinus);
        }
    }

    private static BigDecimal number(String pretty) {
        StringBuilder plain = new StringBuilder();
        String text = pretty.startsWith("10") && pretty.length() > 2 && "⁻⁰¹²³⁴⁵⁶⁷⁸⁹".indexOf(pretty.charAt(2)) >= 0
                ? "1×" + pretty
                : pretty;
        for (char c : text.replace("×10", "e").replace('−', '-').toCharArray()) {
            int raised = "⁰¹²³⁴⁵⁶⁷⁸⁹".indexOf(c);
            plain.append(raised >= 0 ? (char) ('0' + raised) : c == '⁻' ? '-' : c);
        }
        return new BigDecimal(plain.toString());
    }

    @Test
    void aColumnHasItsPointsUnderEachOther() {
        Table table = Table.create(
                "",
                DoubleColumn.create("x", 1.0, -22.25, 0.125),
                DoubleColumn.create("± x (estimated)", 0.001, 0.01, 0.002));
        String[] values = RoundedColumn.cells(table, 0, 3);
        assertEquals("1.000", values[0]);
        assertEquals("−22.250", values[1]);
        assertEquals("0.125", values[2]);
    }

    @Test
    void textStandsInColumns() {
        Table table = Table.create(
                "bag", StringColumn.create("what", "ball", "a long stick"), IntColumn.create("count", 3, 1000));
        assertEquals("""
                bag
                what          count
                ball              3
                a long stick   1000""", renderings.render(table).plainText());
    }

    @Test
    void hostileCellsAndHeadsStayText() throws Exception {
        String hostile = "</td></table><script>alert('x')</script>&amp;\u0000\u2028";
        Table table = Table.create(
                hostile, StringColumn.create(hostile, hostile, ""), BooleanColumn.create("b", true, false));
        Document html = WellFormed.html(renderings.render(table).data().get("text/html"));
        assertEquals(0, html.getElementsByTagName("script").getLength());
        assertEquals(1, html.getElementsByTagName("table").getLength());
        assertTrue(html.getDocumentElement().getTextContent().contains("alert('x')"));
    }

    @Test
    void missingAndEndlessNumbersAreShownAsSuch() throws Exception {
        Table table = Table.create(
                "",
                DoubleColumn.create("x", 1.5, Double.NaN, Double.POSITIVE_INFINITY),
                DoubleColumn.create("± x (estimated)", 0.1, Double.NaN, Double.POSITIVE_INFINITY));
        String[] values = RoundedColumn.cells(table, 0, 3);
        assertEquals("1.50", values[0]);
        assertEquals("", values[1]);
        assertEquals("Infinity", values[2]);
        assertEquals("unknown", RoundedColumn.cells(table, 1, 3)[2]);
        WellFormed.html(renderings.render(table).data().get("text/html"));
    }

    @Test
    void emptyTablesHaveTheirHeads() throws Exception {
        assertTrue(renderings
                .render(Table.create("", DoubleColumn.create("x")))
                .plainText()
                .contains("x"));
        WellFormed.html(renderings.render(Table.create()).data().get("text/html"));
    }

    @Test
    void wideTablesAreCutAndCounted() {
        Table table = Table.create("wide");
        for (int c = 0; c < 45; c++) {
            table.addColumns(IntColumn.create("c" + c, new int[] {c}));
        }
        assertTrue(renderings.render(table).plainText().endsWith("… 5 more columns"));
    }

    @Test
    void anErrorInTheFirstColumnBelongsToNothing() {
        Table table = Table.create("", DoubleColumn.create("± x", 0.25));
        assertEquals("0.25", RoundedColumn.cells(table, 0, 1)[0]);
        assertEquals(
                "0.25",
                renderings
                        .render(new TableRead(Scenarios.ion(), table))
                        .plainText()
                        .split("\n")[1]
                        .strip());
    }
}
