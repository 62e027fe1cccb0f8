package ladderwell.evidence;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import ladderwell.quantity.Units;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class ToleranceTest {

    @Test
    void theDefaultStateToleranceIsOneBillionth() {
        assertEquals(1e-9, Tolerance.STATE.value());
        assertEquals("state tolerance 1e-9", Tolerance.STATE.toString());
        assertEquals(Tolerance.STATE, Tolerance.state(1e-9));
    }

    @Test
    void absoluteAndRelativeAdmitDifferently() {
        assertTrue(Tolerance.state(1e-9).admits(Bound.estimated(1e-9), 1e6));
        assertFalse(Tolerance.state(1e-9).admits(Bound.estimated(2e-9), 1e6));
        Tolerance level = Tolerance.relative("level", 1e-13);
        assertTrue(level.admits(Bound.guaranteed(9e-8), -1e6));
        assertFalse(level.admits(Bound.guaranteed(9e-8), 1));
        assertFalse(level.admits(Bound.guaranteed(Double.POSITIVE_INFINITY), 1e300));
    }

    @Test
    void printsItsNameMeasureAndUnit() {
        assertEquals(
                "level tolerance 1e-13 relative",
                Tolerance.relative("level", 1e-13).toString());
        assertEquals(
                "edge tolerance 0.5 nm",
                Tolerance.absolute("edge", 0.5, Units.NANOMETRE).toString());
    }

    @ParameterizedTest
    @ValueSource(doubles = {0, -1e-9, Double.NaN, Double.POSITIVE_INFINITY})
    void refusesValuesThatAreNone(double bad) {
        String message = assertThrows(IllegalArgumentException.class, () -> Tolerance.state(bad))
                .getMessage();
        assertEquals("tolerance 'state' is " + bad + "; expected a finite number above 0, such as 1e-9", message);
    }

    @Test
    void refusesAUnitOnARelativeToleranceAndABlankName() {
        assertThrows(
                IllegalArgumentException.class,
                () -> new Tolerance("level", Tolerance.Measure.RELATIVE, 1e-9, Units.NANOMETRE));
        assertThrows(IllegalArgumentException.class, () -> Tolerance.absolute(" ", 1));
    }
}
