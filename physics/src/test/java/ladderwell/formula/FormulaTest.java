package ladderwell.formula;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Map;
import java.util.Random;
import java.util.Set;
import ladderwell.quantity.Constants;
import ladderwell.quantity.Quantity;
import ladderwell.quantity.Units;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class FormulaTest {

    /** Two or three roundings of numbers of order one. */
    private static final double ROUNDING = 1e-15;

    private static final double EV = Constants.ELEMENTARY_CHARGE;

    private static Formula natural(String text) {
        return Formula.natural(
                text, Parameters.none().with("a", Amount.number(3)).with("b", Amount.number(0.5)));
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = '|',
            value = {
                "1 + 2*3 | 7",
                "2 - 3 - 4 | -5",
                "24/4/3 | 2",
                "24/4*3 | 18",
                "2^3^2 | 512",
                "-2^2 | -4",
                "2^-1 | 0.5",
                "(-2)^2 | 4",
                "-x^2 | -2.25",
                "2*-x | -3",
                "--x | 1.5",
                "-x*-x | 2.25",
                "1.5e2 + .5 | 150.5",
                "a*x^2 - b | 6.25",
                "exp(log(2)) | 2",
                "sqrt(16) | 4",
                "abs(-3) | 3",
                "sign(-3) + sign(0) + sign(5) | 0",
                "step(-1) + step(0) + step(1) | 2",
                "min(3, 1, 2) + max(3, 1, 2) | 4",
                "gauss(x, x, 2) | 1",
                "gauss(x, 0.5, 1) | 0.6065306597126334",
                "if(x < 1, 10, 20) | 20",
                "if(1 < x < 2, 10, 20) | 10",
                "if(x < 1 or x > 1.4 and x >= 1.5, 10, 20) | 10",
                "if((x < 1 or x > 1.4) and x > 1.5, 10, 20) | 20",
                "if(1.5 <= x, if(x <= 1.5, 1, 2), 3) | 1",
                "sin(pi/6) | 0.5",
                "cos(0) + tan(0) + sinh(0) + cosh(0) + tanh(0) | 2",
                "hbar | 1",
                "2·x × 2 − 1 | 5",
                "t + x | 1.75",
                "if(x≤2, 1, 0) | 1",
            })
    void operatorsBindAsOnTheBoard(String text, double value) {
        assertEquals(value, natural(text).value(1.5, 0.25), Math.abs(value) * ROUNDING + ROUNDING);
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = '|',
            quoteCharacter = '"',
            value = {
                // the place is between « and »
                "2«x» | two factors stand side by side; write * between them",
                "2*(x + 1)«(»x) | two factors stand side by side; write * between them",
                "x «3» | two factors stand side by side; write * between them",
                "«x(»2 + x) | 'x' is no function; write x*(…) for a product",
                "x + «» | the formula ends where a number, a name or a bracket is expected",
                "x + «*» 2 | '*' stands where a number, a name or a bracket is expected",
                "«(»x + 1 | this bracket is never closed",
                "x + 1«)» | this bracket closes nothing",
                "«()» | these brackets are empty",
                "x*«*»2 | a power is written with ^, not with **",
                "x«²» | a power is written with ^, such as x^2",
                "x «=» 2 | conditions compare with <, <=, > or >=, not with =",
                "x + «$»2 | '$' has no place in a formula",
                "«1.2.»3 | a number has one decimal point",
                "«1e999» | the number '1e999' is too large; the largest is about 1.8e308",
                "«sinn»(x) | there is no function 'sinn'; functions are exp, log, sin, cos, tan, sinh, cosh, tanh, sqrt, abs, sign, step, min, max, gauss, if; did you mean 'sin'?",
                "x*«alpa» | 'alpa' has no value; names here are alpha, k, x, t, pi, hbar; did you mean 'alpha'?",
                "«sin» + x | 'sin' is a function; write sin(…)",
                "«gauss(x, 2)» | gauss takes 3 values, not 2: gauss(x, centre, width)",
                "«min(x)» | min takes two or more values, not 1: min(a, b)",
                "«x < 2» | this is a condition, which has a place only in if(condition, value, value)",
                "if(«x», 1, 2) | the first place of if needs a condition such as x < 0",
                "if(x < 1 and «x», 1, 2) | 'and' needs a condition such as x < 0",
                "«(x < 1)» + 2 | this is a condition, which has a place only in if(condition, value, value)",
                "x + 3 «eV» | in natural units a number has no unit; leave out 'eV'",
                "1/«(2 - 2)» | the divisor '(2 - 2)' is 0",
                "sqrt(«-4») | the argument of sqrt '-4' is negative",
                "gauss(x, 0, «0») | the width of gauss '0' is 0",
                "[x] | ",
                "exp(x, 2 | ",
            })
    void mistakesArePointedAt(String marked, String reason) {
        String text = marked.replace("«", "").replace("»", "");
        Parameters parameters =
                Parameters.none().with("alpha", Amount.number(1)).with("k", Amount.number(1));
        FormulaException e = assertThrows(FormulaException.class, () -> Formula.natural(text, parameters));
        if (reason != null) {
            assertEquals(reason, e.reason());
            assertEquals(marked.indexOf('«'), e.start());
            assertEquals(marked.indexOf('»') - 1, e.end());
            assertTrue(e.getMessage().startsWith(reason), e.getMessage());
        }
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = '|',
            value = {
                "x + «3 eV» | a length cannot be added to an energy",
                "3 eV - «x» | a length cannot be subtracted from an energy",
                "3 eV*exp(«x») | exp needs a plain number, and this is a length",
                "3 eV*(x/1 nm)^«x» | an exponent needs a plain number, and this is a length",
                "3 eV*2^«(x)» | an exponent needs a plain number, and this is a length",
                "max(3 eV, «x») | max needs values of one kind; this one is a length, the one before it an energy",
                "if(x < 1 nm, 1 eV, «x») | if needs values of one kind; this one is a length, the one before it an energy",
                "if(«x < 1 eV», 1 eV, 2 eV) | a length cannot be compared with an energy",
                "gauss(x, 0, «1 eV»)*1 eV | gauss needs values of one kind; this one is an energy, the one before it a length",
                "«x^2» | the formula is a quantity in m^2; expected an energy",
                "«3 eV/nm» | the formula is a force; expected an energy",
                "x^«0.1234567» | a length to the power 0.1234567 has no unit; expected a whole power or a small fraction",
                "x^«(t/1 s)» | a length cannot be raised to a power that varies; divide it by its unit first",
                "3 «Ev» | a name behind a number is its unit, and 'Ev' is none; write * for a product; did you mean the unit 'eV'?",
                "3 «dB» | 'dB' has no place in a formula; give a length, a time, an energy or another measured quantity",
                "3 «m» | 'm' is a unit and a declared name; write * before it for the name, or rename it",
                "3*«nm» | 'nm' is a unit, and no parameter of this name is given; a unit stands behind a number, such as 1 nm",
                "3 eV*(x/2 nm«^»x) | a power behind a unit belongs to the unit and is a whole number; write (2 nm)^… for another power",
            })
    void dimensionsAreCheckedWhereTheyMeet(String marked, String reason) {
        String text = marked.replace("«", "").replace("»", "");
        Parameters parameters = Parameters.of(Map.of("m", Quantity.of(1, Units.ATOMIC_MASS)));
        FormulaException e = assertThrows(FormulaException.class, () -> Formula.potential(text, parameters));
        assertEquals(reason, e.reason());
        assertEquals(marked.indexOf('«'), e.start());
        if (!reason.startsWith("a power behind")) {
            assertEquals(marked.indexOf('»') - 1, e.end());
        }
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = '|',
            value = {
                "3 eV | 3",
                "3eV*(x/2nm)^2 | 3",
                "2 eV/nm*x | 4",
                "2 eV/nm^2*x^2 | 8",
                "x^2/2 nm^2*1 eV | 2",
                "x^2/(2 nm)^2*1 eV | 1",
                "x*1/nm*1 eV | 2",
                "3 eV*x/2/(1 nm) | 3",
                "0.5*m*w^2*x^2 | 0.01637303",
                "2991 /cm | 0.37083674",
                "2991 cm^-1 | 0.37083674",
                "10 K | 0.000861733",
                "hbar*1 MHz | 4.135668e-9",
                "hbar*1 rad/s*1e6 | 6.58212e-10",
                "1 eV*cos(90 deg + x/1 um) | -2e-3",
                "if(x < 0, 0, 3 eV) | 3",
                "max(0, 1 eV - 1 meV) | 0.999",
                "0.5 hbar/nm*x/(1 s)*6.241509e18 | 6.241509e18",
                "sqrt(4 eV*1 eV)*step(x) | 2",
                "D*(1 - exp(-k*x))^2 | 3.8205",
            })
    void labUnitsAreComputedInSi(String text, double electronvolts) {
        Parameters parameters = Parameters.of(
                        Map.of("m", Quantity.of(1, Units.ATOMIC_MASS), "w", Quantity.of(1, Units.TERAHERTZ)))
                .with("D", "5.12 eV")
                .with("k", "1 /nm");
        double expected = electronvolts > 1e10 ? Constants.HBAR * 6.241509e18 : electronvolts * EV;
        Formula formula = text.startsWith("0.5 hbar")
                ? Formula.lab(text, parameters)
                : text.startsWith("D")
                        ? Formula.potential(text, parameters)
                        : Formula.lab(text, parameters, Dimension.ENERGY);
        double want = text.startsWith("0.5 hbar")
                ? Constants.HBAR * 6.241509e18
                : text.startsWith("D") ? 5.12 * EV * Math.pow(1 - Math.exp(-2), 2) : expected;
        if (text.startsWith("0.5*m")) {
            double w = 2 * Math.PI * 1e12;
            want = 0.5 * Constants.ATOMIC_MASS_CONSTANT * w * w * 4e-18;
        }
        // the figures above are rounded to six digits
        assertEquals(want, formula.value(2e-9, 0), 2e-6 * Math.abs(want));
    }

    @Test
    void amountsOfCompoundUnitsAreRead() {
        Amount amount = Amount.read("2 eV/angstrom^4");
        assertEquals(2 * EV / 1e-40, amount.value(), 1e-15 * amount.value());
        assertEquals("J/m^4", amount.dimension().unit());
        assertEquals(Dimension.of(0, -1, 0), Amount.read("1.9 /angstrom").dimension());
        assertEquals(Dimension.ENERGY, Amount.read("300 /cm").dimension());
        assertEquals(Dimension.of(0, -1, 0), Amount.read("1/(2 cm)").dimension());
        assertThrows(FormulaException.class, () -> Amount.read("x"));
        assertThrows(FormulaException.class, () -> Amount.read("1/0"));
    }

    @Test
    void rootsOfDimensionsAreDimensions() {
        Formula formula = Formula.lab("sqrt(x)*x^(1/2)*x^0.25*x^(3/4)", Parameters.none());
        assertEquals(Dimension.LENGTH.power(2), formula.dimension());
        assertEquals(
                "m^(1/2)", Formula.lab("sqrt(x)", Parameters.none()).dimension().unit());
    }

    @Test
    void parametersCannotTakeNamesOfTheLanguage() {
        for (String name : new String[] {"x", "t", "pi", "hbar", "exp", "and", "if", "2a", "", "a b"}) {
            assertThrows(IllegalArgumentException.class, () -> Parameters.none().with(name, Amount.number(1)), name);
        }
    }

    @Test
    void usedParametersAreNamed() {
        assertEquals(Set.of("a"), natural("a*x + 0").parameters());
        assertFalse(natural("a").dependsOnPosition());
        assertTrue(natural("x*cos(2*t)").dependsOnTime());
        assertFalse(natural("x*0*t + x").dependsOnTime());
    }

    @Test
    void blocksOfPointsGiveTheSameBitsAsSinglePoints() {
        Formula formula = natural(
                "a*x^4 - b*x^3 + gauss(x, b, 2)/cosh(x) + if(x < b or x > 2, sin(x), tanh(x)*x^-2)"
                        + " + min(x, 1, x^2) - abs(x)*step(t - 1) + exp(-x^2)*exp(-x^2)*x^20 + cos(2*t)*x*sin(cos(2*t)) + t^2 + sqrt(abs(x) + t)");
        Random random = new Random(3);
        double[] x = random.doubles(1000, -3, 3).toArray();
        double[] out = formula.values(x, 2, new double[1000]);
        for (int i = 0; i < x.length; i++) {
            assertEquals(formula.value(x[i], 2), out[i], 0.0);
        }
        double[] same = x.clone();
        assertArrayEquals(out, formula.values(same, 2, same));
        assertEquals(0, formula.values(new double[0], 0, new double[0]).length);
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = '|',
            value = {
                "x^4 | 4*x^3",
                "x^2/2 | x",
                "a*x^2 - b*x + 7 | 2*a*x - b",
                "exp(-a*x) | -(a*exp(-(a*x)))",
                "sin(x)*x | cos(x)*x + sin(x)",
                "1/x | -(1/x^2)",
                "abs(x) | sign(x)",
                "step(x)*x | step(x)",
                "t^2 | 0",
            })
    void derivativesReadAsOnTheBoard(String text, String derivative) {
        assertEquals(derivative, natural(text).slope().text());
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = '|',
            value = {
                "exp(sin(x)^2)/(1 + x^2)",
                "log(2 + cos(x))*tan(x/3)",
                "sinh(x)*cosh(x)/tanh(1 + x^2)",
                "sqrt(1 + x^4)^3",
                "gauss(x, 0.3*x^2, 1 + x^2/9)",
                "(1 + x^2)^(b*x)",
                "a^x + x^3.5",
                "abs(x - 5)*min(x^2, 100)*max(x, -100, 0.01*x^2)",
                "if(x < 0, x, x^3) + step(x)*x^2 + sign(x)*x",
                "x^-3/(x - 7)^20",
                "(x - 1)^2*(x + 1)^2*(x - a)",
            })
    void derivativesAgreeWithDifferences(String text) {
        Formula formula = natural(text);
        Formula slope = formula.slope();
        Formula curvature = slope.slope();
        for (double x : new double[] {0.37, 0.81, 1.43, 2.2}) {
            // fifth-order central difference: error h^4 times a fifth derivative, rounding 1e-16/h
            double h = 1e-3;
            assertEquals(difference(formula, x, h), slope.value(x), 1e-8 * (1 + Math.abs(slope.value(x))));
            assertEquals(difference(slope, x, h), curvature.value(x), 1e-8 * (1 + Math.abs(curvature.value(x))));
        }
    }

    private static double difference(Formula f, double x, double h) {
        return (8 * (f.value(x + h) - f.value(x - h)) - (f.value(x + 2 * h) - f.value(x - 2 * h))) / (12 * h);
    }

    @Test
    void derivativesByTimeAndTheirDimensions() {
        Formula f = Formula.potential("1 eV*cos(2 MHz*t)*x/1 nm", Parameters.none());
        double w = 4e6 * Math.PI;
        Formula rate = f.derivative(Formula.Variable.TIME);
        assertEquals(-EV * w * Math.sin(w * 1e-7) * 2, rate.value(2e-9, 1e-7), 1e-12 * EV * w);
        assertEquals(Dimension.ENERGY.over(Dimension.TIME), rate.dimension());
        assertEquals(Dimension.FORCE, f.slope().dimension());
    }

    @Test
    void writtenDerivativesReadBackAsTheSameFunction() {
        String[] texts = {
            "a*x^4 - b*x^2",
            "exp(-(x - 1)^2/2)*-3",
            "x/(1 + x)/(2*x)",
            "if(x < 1 and x > 0 or x <= -1, x, -x^2)",
            "(-x)^2",
            "-(x + 1)*(x - -2)",
            "2^-x",
            "(x^2)^b",
            "min(x, 2)-max(x, 1, a)",
            "x - (x - (1 - x))"
        };
        for (String text : texts) {
            Formula slope = natural(text).slope();
            Formula again = natural(slope.text());
            for (double x : new double[] {-1.7, -0.4, 0.3, 2.6}) {
                double value = slope.value(x);
                assertEquals(value, again.value(x), 4 * Math.ulp(value), text + " → " + slope.text());
            }
        }
    }

    @Test
    void polynomialsAreMultipliedOut() {
        assertArrayEquals(
                new double[] {9, 0, -6, 0, 1},
                natural("(x^2 - a)^2").polynomial().orElseThrow());
        assertArrayEquals(
                new double[] {0, 1, 0.25},
                natural("x*(1 + b*x/2) + 0*t").polynomial().orElseThrow());
        assertArrayEquals(new double[] {1}, natural("x - x + 1").polynomial().orElseThrow());
        assertFalse(natural("x^0.5").isPolynomial());
        assertFalse(natural("x*sin(t)").isPolynomial());
        assertFalse(natural("exp(x)").isPolynomial());
        assertFalse(natural("(x^40)^2").isPolynomial());
        assertTrue(natural("exp(a)*x^2").isPolynomial());
        assertEquals(
                "sin(t)",
                natural("x*sin(t) + x^3").coefficients().orElseThrow().get(1).text());
    }

    @Test
    void scalingPutsLabUnitsAside() {
        Formula lab = Formula.potential("2 eV/angstrom^2*x^2*cos(t/1 fs)", Parameters.none());
        Formula scaled = lab.scaled(1e-10, 1e-15, EV);
        assertEquals(2 * 9 * Math.cos(0.5), scaled.value(3, 0.5), 1e-13);
        assertTrue(scaled.isNatural());
    }

    @Test
    void functionsAreListedAsTheyAreWritten() {
        assertEquals(16, Formula.functions().size());
        assertTrue(Formula.functions().contains("gauss(x, centre, width)"));
        assertTrue(Formula.functions().contains("exp(…)"));
    }

    @Test
    void coefficientsThatVaryWithTimeRebuildTheFormula() {
        Formula formula = natural("(x + sin(t))^12 - x^3*cos(t)/(1 + t)");
        double x = 0.8;
        double t = 0.4;
        double sum = 0;
        List<Formula> coefficients = formula.coefficients().orElseThrow();
        for (int k = coefficients.size() - 1; k >= 0; k--) {
            sum = sum * x + coefficients.get(k).value(0, t);
        }
        assertEquals(13, coefficients.size());
        // all terms of the power are positive: a few dozen roundings
        assertEquals(formula.value(x, t), sum, 1e-14 * Math.pow(x + Math.sin(t), 12));
        assertEquals(61, natural("(x + sin(t))^60").coefficients().orElseThrow().size());
    }

    @Test
    void breaksInTimeAreFoundAsInPosition() {
        Formula pulse = natural("step(t - 1) - step(t - 1.5) + abs(sin(t))");
        double[] times = pulse.breakTimes(0.5, 4);
        assertEquals(3, times.length);
        assertEquals(1, times[0], 1e-15);
        assertEquals(1.5, times[1], 1e-15);
        assertEquals(Math.PI, times[2], 1e-14);
        assertEquals(0, natural("x + cos(t)").breakTimes(0, 10).length);
        assertThrows(IllegalArgumentException.class, () -> pulse.breakTimes(1, 1));
    }

    @Test
    void productsAndSamenessGoByTheTree() {
        Parameters two = Parameters.none().with("w", "2");
        Parameters three = Parameters.none().with("w", "3");
        Formula a = Formula.natural("cos(w*t)", two);
        Formula b = Formula.natural("cos(w*t)", three);
        assertTrue(a.isSame(Formula.natural(" cos(w * t) ", two)));
        assertTrue(!a.isSame(b));
        assertEquals(Math.cos(2 * 0.4) * Math.cos(3 * 0.4), a.times(b).value(0, 0.4), 1e-16);
        Formula rate = Formula.lab("3 MHz", Parameters.none());
        Formula time = Formula.lab("t", Parameters.none());
        assertEquals(Dimension.NONE, rate.times(time).dimension());
        assertThrows(IllegalArgumentException.class, () -> a.times(rate));
    }

    @Test
    void prefixedAnglesPerTimeAreUnits() {
        assertEquals(
                7e6, Formula.lab("7 Mrad/s", Parameters.none(), Dimension.RATE).value(0), 1e-9);
        assertEquals(7e6, Amount.read("7 Mrad/s").value(), 1e-9);
        assertEquals(
                14,
                Formula.lab("7 Mrad/s*(2 us)", Parameters.none(), Dimension.NONE)
                        .value(0),
                1e-14);
    }
}
