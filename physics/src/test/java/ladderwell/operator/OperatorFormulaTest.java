package ladderwell.operator;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.SplittableRandom;
import ladderwell.formula.FormulaException;
import ladderwell.formula.Parameters;
import ladderwell.quantity.Constants;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class OperatorFormulaTest {
    private static final LadderPolynomial A = LadderPolynomial.a();
    private static final LadderPolynomial AD = LadderPolynomial.adagger();
    private static final LadderPolynomial N = LadderPolynomial.number();

    /** A few roundings of the coefficients. */
    private static final double ROUNDING = 1e-14;

    private static void assertSame(LadderPolynomial expected, LadderPolynomial actual) {
        assertTrue(
                actual.minus(expected).norm() <= ROUNDING * expected.norm(),
                () -> "expected " + expected + ", got " + actual);
    }

    private static LadderPolynomial natural(String text) {
        OperatorFormula read = OperatorFormula.naturalOperator(text, Parameters.none());
        assertFalse(read.dependsOnTime());
        return read.constant();
    }

    @Test
    void readsADrivenKerrModeInLabUnits() {
        Parameters parameters = Parameters.none()
                .with("w", "5 GHz")
                .with("k", "300 kHz")
                .with("f", "2 MHz")
                .with("wd", "4.99 GHz");
        OperatorFormula h = OperatorFormula.hamiltonian("w*n + k/2*n*(n-1) + f*cos(wd*t)*(a + a†)", parameters);
        double w = 2 * Math.PI * 5e9;
        double k = 2 * Math.PI * 3e5;
        double f = 2 * Math.PI * 2e6;
        double wd = 2 * Math.PI * 4.99e9;
        assertSame(N.times(w).plus(LadderPolynomial.term(2, 2, k / 2, 0)), h.constant());
        assertEquals(1, h.terms().size());
        double t = 0.37e-9;
        assertSame(h.constant().plus(A.plus(AD).times(f * Math.cos(wd * t))), h.at(t));
        // scaled to a unit of rates: H/k as a function of k t
        assertSame(h.at(t).times(1 / k), h.scaled(k).at(k * t));
        assertSame(A.plus(AD).times(-f * wd * Math.sin(wd * t)), h.derivative().at(t));
        assertEquals(4, h.degree());
        assertEquals(1, h.bandwidth());
    }

    @ParameterizedTest
    @CsvSource({
        "x*p - p*x, i",
        "a*ad, n + 1",
        "a†*a, n",
        "(x^2 + p^2)/2, n + 1/2",
        "n^2 - n, ad^2*a^2",
        "a^3*ad, ad*a^3 + 3*a^2",
        "-i*(a - ad)/sqrt(2), p",
        "exp(i*pi/2)*a, i*a",
        "(2*i)^2*a, -4*a",
        "exp(-i*0.7)*ad, (cos(0.7) - i*sin(0.7))*ad",
        "(a + ad)^2*(a + ad)^0, a^2 + ad^2 + 2*n + 1",
        "pi*hbar*n, pi*n",
        "2*(3 + n) - 6, 2*n",
        "x·p − i/2, (x*p + p*x)/2"
    })
    void orderOfOperatorsIsKept(String left, String right) {
        LadderPolynomial expected = natural(right);
        assertTrue(natural(left).minus(expected).norm() <= ROUNDING, () -> natural(left) + " is not " + expected);
    }

    @Test
    void randomProductsAgreeWithDenseMatrices() {
        SplittableRandom random = new SplittableRandom(5);
        int size = 24;
        DenseOperators a = DenseOperators.lowering(size);
        DenseOperators ad = a.adjoint();
        DenseOperators zero = new DenseOperators(size);
        double root = Math.sqrt(0.5);
        for (int trial = 0; trial < 60; trial++) {
            StringBuilder text = new StringBuilder();
            DenseOperators sum = zero;
            for (int term = 0; term < 3; term++) {
                double factor = Math.rint(random.nextDouble(-50, 50)) / 10;
                text.append(term == 0 ? "" : " + ").append("(").append(factor).append(")");
                DenseOperators product = DenseOperators.unit(size);
                for (int i = 0; i < 1 + random.nextInt(3); i++) {
                    int power = 1 + random.nextInt(2);
                    int letter = random.nextInt(5);
                    text.append("*")
                            .append(new String[] {"a", "ad", "n", "x", "p"}[letter])
                            .append("^")
                            .append(power);
                    DenseOperators one = switch (letter) {
                        case 0 -> a;
                        case 1 -> ad;
                        case 2 -> ad.times(a);
                        case 3 -> zero.plus(a, root, 0).plus(ad, root, 0);
                        default -> zero.plus(a, 0, -root).plus(ad, 0, root);
                    };
                    product = product.times(one.power(power));
                }
                sum = sum.plus(product, factor, 0);
            }
            DenseOperators read = DenseOperators.of(natural(text.toString()), size);
            // the matrices are cut off: only the corner far from the edge counts
            assertTrue(sum.distance(read, 10) < 1e-12, text::toString);
        }
    }

    @Test
    void energiesAreDividedByPlancksConstant() {
        OperatorFormula h = OperatorFormula.hamiltonian("0.3 eV*n", Parameters.none());
        assertEquals(
                0.3 * Constants.ELEMENTARY_CHARGE / Constants.HBAR, h.constant().re(1, 1), 1);
        OperatorFormula same =
                OperatorFormula.hamiltonian("hbar*w*n", Parameters.none().with("w", "7 Mrad/s"));
        assertEquals(7e6, same.constant().re(1, 1), 1e-8);
    }

    @Test
    void labCoordinatesBelongToAnOscillator() {
        double mass = 40 * Constants.ATOMIC_MASS_CONSTANT;
        double omega = 2 * Math.PI * 1.2e6;
        Parameters parameters = Parameters.none().with("m", "40 u").with("nu", "1.2 MHz");
        OperatorFormula h = OperatorFormula.hamiltonian("p^2/(2*m) + m*nu^2*x^2/2", parameters, mass, omega);
        assertSame(N.plus(LadderPolynomial.constant(0.5, 0)).times(omega), h.constant());
        FormulaException mixed = assertThrows(
                FormulaException.class, () -> OperatorFormula.hamiltonian("p^2/(2*m) + nu*n", parameters, mass, omega));
        assertEquals("an energy cannot be added to a rate", mixed.reason());
    }

    @Test
    void rotatingPairsAreHermitianTogether() {
        Parameters parameters = Parameters.none().with("f", "3").with("d", "0.4");
        OperatorFormula h = OperatorFormula.naturalHamiltonian("f*(a*exp(i*d*t) + ad*exp(-i*d*t))", parameters);
        assertEquals(2, h.terms().size());
        double t = 1.3;
        assertEquals(3 * Math.cos(0.4 * t), h.at(t).re(0, 1), ROUNDING);
        assertEquals(3 * Math.sin(0.4 * t), h.at(t).im(0, 1), ROUNDING);
        // two ways to write one factor
        assertTrue(
                OperatorFormula.naturalHamiltonian("sin(2*t)*a + 2*sin(t)*cos(t)*ad", Parameters.none())
                        .terms()
                        .stream()
                        .allMatch(term -> term.operator().isHermitian()));
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = '|',
            value = {
                "n + 2*a | the Hamiltonian is not Hermitian: the term 2 a needs its mirror 2 a†, found 0 | 1",
                "x*p | the Hamiltonian is not Hermitian: the term 0.5i needs a real factor | 1",
                "n + cos(t)*a | the Hamiltonian is not Hermitian: the term a needs its mirror a†, found 0 beside the"
                        + " factor cos(t) | 1",
                "sin(x) | sin takes real numbers, parameters and t, and 'x' holds an operator | 5",
                "n/a | a divisor takes real numbers, parameters and t, and 'a' holds an operator | 3",
                "cos(i*t)*n | cos takes real numbers, parameters and t, and 'i*t' is not real | 5",
                "n^0.5 | an operator is raised to a whole power from 0 to 64 | 3",
                "n^(-1) | an operator is raised to a whole power from 0 to 64 | 3",
                "n^t | an operator is raised to a whole power from 0 to 64, one that does not vary | 3",
                "2^n | an exponent takes real numbers, parameters and t, and 'n' holds an operator | 3",
                "if(n < 2, 1, 0) | a comparison takes real numbers, parameters and t, and 'n' holds an operator | 4",
                "n^40 | operators are carried up to degree 64 in a and a†, this one has degree 66 | 1",
                "n + b | 'b' has no value; names here are a, ad, n, x, p, i, a†, t, pi, hbar | 5",
                "2 n | two factors stand side by side; write * between them | 3",
                "a(n) | 'a' is no function; write a*(…) for a product | 1",
                "a ad | two factors stand side by side; write * between them | 3"
            })
    void mistakesAreToldAtTheirCharacter(String text, String reason, int character) {
        FormulaException error =
                assertThrows(FormulaException.class, () -> OperatorFormula.naturalHamiltonian(text, Parameters.none()));
        assertEquals(reason, error.reason());
        assertEquals(character, error.start() + 1);
    }

    @Test
    void unitsAreChecked() {
        FormulaException none =
                assertThrows(FormulaException.class, () -> OperatorFormula.hamiltonian("3*n", Parameters.none()));
        assertEquals(
                "a Hamiltonian is a frequency, such as 2 MHz*n, or an energy, and this is a plain number",
                none.reason());
        FormulaException mixed = assertThrows(
                FormulaException.class, () -> OperatorFormula.hamiltonian("3 MHz*n + 2 meV*a*ad", Parameters.none()));
        assertEquals("a rate cannot be added to an energy", mixed.reason());
        FormulaException jump =
                assertThrows(FormulaException.class, () -> OperatorFormula.operator("2 kHz*a", Parameters.none()));
        assertEquals(
                "this operator is a rate; expected an operator without a unit, its rate is given beside it",
                jump.reason());
        FormulaException taken = assertThrows(
                FormulaException.class,
                () -> OperatorFormula.naturalHamiltonian("n", Parameters.none().with("n", "3")));
        assertEquals("'n' is an operator here and also a parameter; give the parameter another name", taken.reason());
        FormulaException broken =
                assertThrows(FormulaException.class, () -> OperatorFormula.hamiltonian("1 rad/s*a", Parameters.none()));
        assertEquals(
                "the Hamiltonian is not Hermitian: the term a needs its mirror a†, found 0 (numbers in rad/s)",
                broken.reason());
    }

    @Test
    void aFactorWithoutValueIsNamed() {
        OperatorFormula h = OperatorFormula.naturalHamiltonian("n/(t - 1)", Parameters.none());
        IllegalArgumentException error = assertThrows(IllegalArgumentException.class, () -> h.at(1));
        assertTrue(error.getMessage().contains("has no finite value at t = 1"), error.getMessage());
    }

    @Test
    void productsOfVaryingFactorsAreKept() {
        OperatorFormula product = OperatorFormula.naturalOperator("(cos(t)*a + 1)*(sin(t)*ad + n)", Parameters.none());
        double t = 0.8;
        LadderPolynomial expected = A.times(Math.cos(t))
                .plus(LadderPolynomial.constant(1, 0))
                .times(AD.times(Math.sin(t)).plus(N));
        assertSame(expected, product.at(t));
    }

    @Test
    void brokenFormulasAreRefusedInOneSentence() {
        String[] pieces = {
            "a", "ad", "a†", "n", "x", "p", "i", "t", "w", "2", "0.5", "(", ")", "+", "-", "*", "/", "^", "^2", ",",
            "cos(", "exp(", "exp(i*", "sqrt(", "if(", " < ", "pi", "hbar", "0", "min("
        };
        Parameters parameters = Parameters.none().with("w", "0.7");
        SplittableRandom random = new SplittableRandom(99);
        int taken = 0;
        for (int trial = 0; trial < 20_000; trial++) {
            StringBuilder text = new StringBuilder();
            for (int i = 0; i < 1 + random.nextInt(9); i++) {
                text.append(pieces[random.nextInt(pieces.length)]);
            }
            try {
                OperatorFormula.naturalHamiltonian(text.toString(), parameters);
                taken++;
            } catch (FormulaException e) {
                assertTrue(e.reason().length() > 10 && !e.reason().contains("\n"), text::toString);
            }
        }
        assertTrue(taken > 100, "only " + taken + " were taken");
    }
}
