package ladderwell.evidence;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.math.BigDecimal;
import java.util.Random;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class BoundTest {

    @Test
    void sumsTakeTheWeakestCertainty() {
        assertEquals(
                Certainty.GUARANTEED,
                Bound.guaranteed(1).plus(Bound.guaranteed(1)).kind());
        assertEquals(
                Certainty.ESTIMATED,
                Bound.guaranteed(1).plus(Bound.estimated(1)).kind());
        assertEquals(
                Certainty.STATISTICAL,
                Bound.statistical(1).plus(Bound.estimated(1)).kind());
        assertEquals(Certainty.ESTIMATED, Bound.exact().plus(Bound.estimated(0)).kind());
        assertEquals(
                Certainty.STATISTICAL,
                Bound.estimated(2).widest(Bound.statistical(1)).kind());
        assertEquals(2.0, Bound.estimated(2).widest(Bound.statistical(1)).size());
    }

    @Test
    void sumsAndMultiplesAreRoundedOutward() {
        Random random = new Random(13);
        for (int i = 0; i < 20_000; i++) {
            double a = random.nextDouble() * Math.pow(10, random.nextInt(30) - 20);
            double b = random.nextDouble() * Math.pow(10, random.nextInt(30) - 20);
            double sum = Bound.guaranteed(a).plus(Bound.guaranteed(b)).size();
            double multiple = Bound.guaranteed(a).times(-b).size();
            assertTrue(new BigDecimal(sum).compareTo(new BigDecimal(a).add(new BigDecimal(b))) >= 0);
            assertTrue(new BigDecimal(multiple).compareTo(new BigDecimal(a).multiply(new BigDecimal(b))) >= 0);
            assertTrue(sum <= (a + b) * (1 + 4e-16) && multiple <= a * b * (1 + 4e-16));
        }
    }

    @Test
    void exactAddsNothingAndTimesOneIsItself() {
        Bound bound = Bound.estimated(0.1);
        assertEquals(bound, bound.plus(Bound.exact()));
        assertEquals(bound, bound.times(-1));
        assertEquals(Bound.exact(), Bound.exact().times(1e300));
        assertEquals(Bound.exact(), Bound.guaranteed(-0.0));
        assertTrue(Bound.exact().isExact() && Bound.exact().isGuaranteed());
    }

    @Test
    void underflowDoesNotNarrowToZero() {
        assertEquals(Double.MIN_VALUE, Bound.guaranteed(1e-200).times(1e-200).size());
    }

    @Test
    void whatIsUnknownStaysUnknown() {
        Bound unknown = Bound.guaranteed(Double.POSITIVE_INFINITY);
        assertFalse(unknown.isKnown());
        assertFalse(unknown.times(0).isKnown());
        assertFalse(unknown.plus(Bound.exact()).isKnown());
        assertFalse(Bound.guaranteed(Double.MAX_VALUE)
                .plus(Bound.guaranteed(Double.MAX_VALUE))
                .isKnown());
        assertEquals("unknown guaranteed", unknown.toString());
        assertEquals("0.158(?)", unknown.beside(0.15821138830084));
    }

    @Test
    void certaintyIsNeverPromoted() {
        assertEquals(
                Certainty.ESTIMATED,
                Bound.guaranteed(1).atMost(Certainty.ESTIMATED).kind());
        assertEquals(
                Certainty.STATISTICAL,
                Bound.statistical(1).atMost(Certainty.GUARANTEED).kind());
    }

    @ParameterizedTest
    @ValueSource(doubles = {-1, -1e-300, Double.NaN, Double.NEGATIVE_INFINITY})
    void refusesSizesThatAreNone(double bad) {
        String message = assertThrows(IllegalArgumentException.class, () -> Bound.guaranteed(bad))
                .getMessage();
        assertEquals("a bound must be at least 0, not " + bad, message);
        assertThrows(IllegalArgumentException.class, () -> Bound.exact().plus(bad));
    }

    @ParameterizedTest
    @ValueSource(doubles = {Double.NaN, Double.POSITIVE_INFINITY})
    void refusesFactorsThatAreNone(double bad) {
        assertThrows(IllegalArgumentException.class, () -> Bound.guaranteed(1).times(bad));
    }

    @Test
    void printsItsCertainty() {
        assertEquals("2e-10 guaranteed", Bound.guaranteed(2e-10).toString());
        assertEquals("1.3e-5 estimated", Bound.estimated(1.234e-5).toString());
        assertEquals("exact", Bound.exact().toString());
        assertEquals("0 statistical", Bound.statistical(0).toString());
        assertEquals("0.1582113883(2)", Bound.guaranteed(1e-10).beside(0.15821138830084));
        assertEquals("g", Certainty.GUARANTEED.letter());
        assertEquals("e", Certainty.ESTIMATED.letter());
        assertEquals("s", Certainty.STATISTICAL.letter());
    }
}
