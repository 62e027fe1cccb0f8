package ladderwell.operator;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import ladderwell.formula.Parameters;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class BoundednessTest {

    private static LadderPolynomial read(String text) {
        return OperatorFormula.naturalHamiltonian(text, Parameters.none()).constant();
    }

    @ParameterizedTest
    @CsvSource({
        "3, BOTH, false",
        "n, BELOW, false",
        "-n + x, ABOVE, false",
        "p^2/2 + x^2/2 + 0.1*x^4, BELOW, false",
        "p^2/2 + x^2/2 - 1e-9*x^4, NEITHER, true",
        "p^2/2 + x^2/2 + 1e-9*x^4, BELOW, false",
        "p^2/2 - x^2/2 + 0.1*x^4, BELOW, false",
        "p^2/2 + x^2/2 + 0.1*x^3, NEITHER, true",
        "p^2/2 + x^6 - 5*x^4 + x^3, BELOW, false",
        "p^2/2 - x^2/2, NEITHER, false",
        "p^2/2, BELOW, false",
        "p^2/2 + x, NEITHER, false",
        "x^2, BELOW, false",
        "x^4 + 2*x, BELOW, false",
        "n*(n-1)/2 - 4*(a^2 + ad^2), BELOW, false",
        "-0.3*n*(n-1) + 7*x, ABOVE, false",
        "n*(n-1)/2 + (a^4 + ad^4)/3, NEITHER, true",
        "n*(n-1)/2 + (a^4 + ad^4)/5, BELOW, false",
        "n^2 + x^5, NEITHER, true",
        "0.5*i*(a^2 - ad^2) + x, NEITHER, false",
        "x^2*p^2 + p^2*x^2, NOT_DECIDED, false"
    })
    void boundsAreReadFromTheSymbolFarOut(String text, Boundedness.Kind kind, boolean refused) {
        assertEquals(kind, Boundedness.of(read(text)).kind(), () -> text + ": " + Boundedness.of(read(text)));
        assertEquals(refused, Boundedness.isRefused(read(text)));
    }

    @Test
    void onlyHermitianOperatorsAreAsked() {
        assertThrows(IllegalArgumentException.class, () -> Boundedness.of(LadderPolynomial.a()));
    }
}
