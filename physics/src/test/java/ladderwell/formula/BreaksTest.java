package ladderwell.formula;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.stream.Collectors;
import ladderwell.quantity.Digits;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class BreaksTest {

    private static final double INFINITE = Double.POSITIVE_INFINITY;

    private static Formula natural(String text) {
        return Formula.natural(text, Parameters.none());
    }

    private static String shown(List<Break> breaks) {
        return breaks.stream()
                .map(b -> Digits.significant(b.position(), 12) + " " + b.kind())
                .collect(Collectors.joining(", "));
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = '|',
            value = {
                "x^2 | ''",
                "step(x) | 0 VALUE",
                "5*step(2*x - 3) | 1.5 VALUE",
                "sign(x + 1)*x | -1 VALUE",
                "sign(x)*x | 0 SLOPE",
                "abs(x - 2) | 2 SLOPE",
                "abs(x)*x | 0 HIGHER",
                "x^2*abs(x) + step(x - 1) | 0 HIGHER, 1 VALUE",
                "abs(x)^2 + step(x - 1)*(x - 1) | 0 HIGHER, 1 SLOPE",
                "step(abs(x) - 1) | -1 VALUE, 0 HIGHER, 1 VALUE",
                "if(abs(x) < 2, 0, 8) | -2 VALUE, 0 HIGHER, 2 VALUE",
                "if(-1 < x < 3, x^2, 9) | -1 VALUE, 3 SLOPE",
                "min(x^2, 4) | -2 SLOPE, 2 SLOPE",
                "max(x, 0, x - 1) | 0 SLOPE, 1 HIGHER",
                "step((x - 1)*(x - 2)*(x + 3)) | -3 VALUE, 1 VALUE, 2 VALUE",
                "step((x - 1)^2) | ''",
                "abs(x^3) | 0 HIGHER",
                "step(x^3) | 0 VALUE",
                "abs(exp(x) - 2) | 0.69314718056 SLOPE",
                "if(x < 1, if(x < -1, 2, 1), 0) | -1 VALUE, 1 VALUE",
                "if(x < 1 or x > 1, 0, 5) | 1 HIGHER",
                "step(x - 1 - 1e-7) + step(x - 1) | 1 VALUE, 1.0000001 VALUE",
                "0.001*step(x) + 1000*x^2 | 0 VALUE",
                "1e-9*abs(x - 3) + x^2 | 3 SLOPE",
            })
    void breaksComeFromTheTree(String text, String expected) {
        assertEquals(expected, shown(natural(text).breaks(-INFINITE, INFINITE)));
        assertEquals(expected, shown(natural(text).breaks(-10, 10.5)));
    }

    @Test
    void linearArgumentsAreSolvedExactly() {
        assertEquals(0.1, natural("step(x - 0.1)").breaks(-1, 1).get(0).position(), 0.0);
        Formula lab = Formula.potential("0.3 eV*step(abs(x) - 5 nm)", Parameters.none());
        List<Break> breaks = lab.breaks(-INFINITE, INFINITE);
        assertEquals(5e-9, breaks.get(2).position(), 0.0);
        assertEquals(-5e-9, breaks.get(0).position(), 0.0);
        assertEquals(Break.Kind.VALUE, breaks.get(0).kind());
    }

    @Test
    void breaksMoveWithTime() {
        Formula formula = natural("step(x - sin(t))");
        assertEquals(Math.sin(1.2), formula.breaks(1.2, -5, 5).get(0).position(), 1e-16);
    }

    @Test
    void wavesAreSolvedOnTheRangeThatIsGiven() {
        List<Break> breaks = natural("step(sin(x))").breaks(0.5, 100);
        assertEquals(31, breaks.size());
        for (int k = 1; k <= 31; k++) {
            assertEquals(k * Math.PI, breaks.get(k - 1).position(), 2 * Math.ulp(k * Math.PI));
        }
        assertThrows(
                IllegalArgumentException.class,
                () -> natural("step(sin(10000*x))").breaks(0, 10));
    }

    @Test
    void twoCloseRootsAroundATurningPointAreFound() {
        // cosh(x − 0.1234) dips below 1 + 1e-8 for 2.8e-4 only, far less than a sample's distance
        List<Break> breaks = natural("step(cosh(x - 0.1234) - 1.00000001)").breaks(-7, 9);
        assertEquals(2, breaks.size());
        assertEquals(0.1234, 0.5 * (breaks.get(0).position() + breaks.get(1).position()), 1e-8);
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = '|',
            value = {
                "1/x | the divisor 'x' is 0 at x = 0",
                "1/x^2 | the divisor 'x^2' is 0 at x = 0",
                "x^-2 | the base of the power 'x' is 0 at x = 0",
                "1/(x^2 - 2) | the divisor '(x^2 - 2)' is 0 at x = -1.41421",
                "log(x) | the argument of log 'x' is negative at x = -3",
                "log(abs(x)) | the argument of log 'abs(x)' is 0 at x = 0",
                "sqrt(x - 1) | the argument of sqrt 'x - 1' is negative at x = -3",
                "exp(300*x) | the formula is too large for a number at x = 2.36621",
                "tan(x) | the cosine under tan 'x' is 0 at x = -1.5708",
                "sin(x)/x | the divisor 'x' is 0 at x = 0",
            })
    void valuesThatAreNotFiniteAreNamed(String text, String reason) {
        assertEquals(reason, natural(text).check(0, -3, 4).orElseThrow().reason());
    }

    @Test
    void guardedDivisorsAreNoFault() {
        assertTrue(natural("if(x > 1, 1/x, 1) + 1/(1 + x^2) + x^-0")
                .check(0, -3, 4)
                .isEmpty());
        assertTrue(natural("1/x").check(0, 0.5, 4).isEmpty());
        assertThrows(IllegalArgumentException.class, () -> natural("x").check(0, 0, INFINITE));
    }
}
