package ladderwell.potential;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Random;
import ladderwell.formula.Amount;
import ladderwell.formula.Formula;
import ladderwell.formula.Parameters;
import ladderwell.quantity.Constants;
import ladderwell.quantity.Quantity;
import ladderwell.quantity.Scale;
import ladderwell.quantity.Units;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class PotentialTest {

    /** A few roundings. */
    private static final double ROUNDING = 2e-15;

    private static final Quantity ONE = Quantity.number(1);
    private static final Quantity ATOM = Quantity.of(1, Units.ATOMIC_MASS);
    private static final Quantity ELECTRON = Quantity.of(0.067, Units.ELECTRON_MASS);
    private static final double INFINITE = Double.POSITIVE_INFINITY;

    private static Potential natural(String text) {
        return Potential.of(text, ONE, Parameters.none());
    }

    private static void near(double expected, double actual, double relative) {
        assertEquals(expected, actual, relative * Math.abs(expected));
    }

    @Test
    void morseLevelsInNaturalUnits() {
        // S-MOR-01, S-MOR-02: Morse 1929, D = 10, a = 0.5
        Potential morse = Potential.morse(ONE, Quantity.number(10), Amount.number(0.5));
        near(1.086783988749895, morse.closedForm(0).orElseThrow(), ROUNDING);
        near(7.531055898749054, morse.closedForm(4).orElseThrow(), ROUNDING);
        assertEquals(9, morse.levels().orElseThrow());
        assertTrue(morse.closedForm(9).isEmpty());
        near(10 * Math.pow(1 - Math.exp(-0.35), 2), morse.value(0.7), ROUNDING);
        assertEquals(10, morse.edge());
    }

    @Test
    void morseFromSpectroscopicConstants() {
        // S-MOR-05 to S-MOR-08: constants of Huber and Herzberg 1979 for 1H35Cl; the reduced mass drops out of the
        // levels
        Potential hcl = Potential.morseFromLevels(
                Quantity.of(0.9796, Units.ATOMIC_MASS),
                Quantity.of(2990.9463, Units.PER_CENTIMETRE),
                Quantity.of(52.8186, Units.PER_CENTIMETRE));
        double cm = Constants.PLANCK * Constants.LIGHT_SPEED * 100 / hcl.scale().energy();
        double e0 = hcl.closedForm(0).orElseThrow() / cm;
        // published to ten digits
        near(1482.268500, e0, 5e-10);
        near(2885.309100, hcl.closedForm(1).orElseThrow() / cm - e0, 5e-10);
        near(42341.90119, hcl.edge() / cm, 5e-10);
        assertEquals(28, hcl.levels().orElseThrow());
        Potential same = Potential.morse(
                Quantity.of(0.9796, Units.ATOMIC_MASS),
                Quantity.of(42341.90119, Units.PER_CENTIMETRE),
                new Amount(1 / hcl.scale().length(), Amount.read("1 /angstrom").dimension()));
        near(hcl.closedForm(7).orElseThrow(), same.closedForm(7).orElseThrow(), 5e-10);
        Potential plain = Potential.morseFromLevels(ONE, Quantity.number(5), Quantity.number(0.1));
        near(2.5 - 0.025, plain.closedForm(0).orElseThrow(), ROUNDING);
    }

    @Test
    void poschlTellerLevels() {
        // S-PT-01, S-PT-02: λ = 3, depth λ(λ + 1)/2
        Potential well = Potential.poschlTeller(ONE, Quantity.number(6), Quantity.number(1));
        near(-4.5, well.closedForm(0).orElseThrow(), ROUNDING);
        near(-2, well.closedForm(1).orElseThrow(), ROUNDING);
        assertEquals(3, well.levels().orElseThrow());
        Potential lab =
                Potential.poschlTeller(ELECTRON, Quantity.of(0.3, Units.ELECTRONVOLT), Quantity.of(5, Units.NANOMETRE));
        double d = 0.3 * Constants.ELEMENTARY_CHARGE / lab.scale().energy();
        near(-d, lab.value(0), ROUNDING);
        near(-d / Math.pow(Math.cosh(1), 2), lab.value(1), ROUNDING);
        // a well too weak for cancellation: E = −depth²/2 to first order, 1e-8 of it beyond
        Potential weak = Potential.poschlTeller(ONE, Quantity.number(1e-9), Quantity.number(1));
        near(-2e-18, weak.closedForm(0).orElseThrow(), 1e-8);
    }

    @Test
    void slopesOfAllKindsAgreeWithDifferences() {
        List<Potential> all = List.of(
                Potential.polynomial(1, -2, 0.5, 0, 1),
                Potential.quartic(ONE, ONE, Amount.number(0.1)),
                Potential.sextic(ONE, Amount.number(0.3)),
                Potential.doubleWell(ONE, Quantity.number(4), Quantity.number(5)),
                Potential.linearWithWall(ONE, Amount.number(2)),
                Potential.morse(ONE, Quantity.number(10), Amount.number(0.5)),
                Potential.poschlTeller(ONE, Quantity.number(6), Quantity.number(1.5)),
                Potential.pendulum(ONE, ONE, Quantity.number(3)),
                Potential.lattice(ONE, Quantity.number(20), Quantity.number(7)),
                Potential.junction(Quantity.of(250, Units.MEGAHERTZ), Quantity.of(12, Units.GIGAHERTZ)),
                Potential.lennardJones(ONE, Quantity.number(100), Quantity.number(0.8)),
                Potential.lennardJones(ONE, Quantity.number(100), Quantity.number(0.8), 9, 4),
                natural("x^4 - exp(-x^2)"),
                Potential.tabulated(
                        ONE,
                        Units.ONE,
                        new double[] {-1, 0, 0.5, 1.1, 1.6, 3},
                        Units.ONE,
                        new double[] {4, 1, 0.5, 2, 2.1, 7},
                        new double[0]));
        for (Potential v : all) {
            for (double x : new double[] {0.23, 0.94, 1.35, 1.93}) {
                double h = 1e-5;
                if (x >= v.left() && x <= v.right()) {
                    // difference: h² times a third derivative, rounding 1e-16/h
                    double difference = (v.value(x + h) - v.value(x - h)) / (2 * h);
                    double size = Math.abs(v.slope(x)) + Math.abs(v.value(x)) + 1;
                    assertEquals(difference, v.slope(x), 1e-6 * size, v.text() + " at " + x);
                }
            }
            double[] x = {0.1, 0.7, 1.3, -50, 1e5};
            double[] out = new double[5];
            v.values(x, out);
            for (int i = 0; i < 5; i++) {
                assertEquals(v.value(x[i]), out[i], v.text());
            }
            double low = v.value(v.minimum());
            for (double y = -3; y < 4; y += 0.01) {
                assertTrue(v.value(y) >= low - 1e-12 * Math.abs(low), v.text());
            }
            assertFalse(v.text().isBlank());
        }
    }

    @Test
    void evennessIsKnown() {
        assertTrue(Potential.polynomial(0, 0, 1, 0, 2).isEven());
        assertFalse(Potential.polynomial(0, 1e-30, 1, 0, 2).isEven());
        assertFalse(Potential.linearWithWall(ONE, Amount.number(2)).isEven());
        assertTrue(natural("cosh(x) - 3*gauss(x, 1, 0.3) - 3*gauss(x, -1, 0.3)").isEven());
        assertFalse(natural("cosh(x) - 3*gauss(x, 1, 0.3) - 3.0000001*gauss(x, -1, 0.3)")
                .isEven());
        assertTrue(natural("if(abs(x) < 2, 0, 8)").isEven());
        assertFalse(natural("if(-2 < x < 2.5, 0, 8)").isEven());
    }

    @Test
    void naturalKindsAreTheirFormulas() {
        assertArrayEquals(
                new double[] {0, 0, 0.5, 0, 0.1},
                Potential.quartic(ONE, ONE, Amount.number(0.1)).polynomial().orElseThrow());
        assertArrayEquals(
                new double[] {5, 0, -2.5, 0, 0.3125},
                Potential.doubleWell(ONE, Quantity.number(4), Quantity.number(5))
                        .polynomial()
                        .orElseThrow());
        Potential mie = Potential.lennardJones(ONE, Quantity.number(100), Quantity.number(0.8), 9, 4);
        near(-100, mie.value(mie.minimum()), 1e-13);
        assertEquals(INFINITE, mie.value(0));
        Potential lj = Potential.lennardJones(ONE, Quantity.number(7), Quantity.number(2));
        near(-7, lj.value(2 * Math.pow(2, 1.0 / 6)), 1e-14);
        near(2 * Math.pow(2, 1.0 / 6), lj.minimum(), ROUNDING);
    }

    @Test
    void labScalesAreThoseOfThePhysics() {
        Potential duffing = Potential.quartic(ATOM, Quantity.of(10, Units.TERAHERTZ), Amount.read("0.1 eV/angstrom^4"));
        Scale scale = Scale.harmonic(ATOM.si(), 2 * Math.PI * 10e12);
        assertEquals(scale, duffing.scale());
        double b = 0.1 * Constants.ELEMENTARY_CHARGE * 1e40 * Math.pow(scale.length(), 4) / scale.energy();
        near(b, duffing.polynomial().orElseThrow()[4], ROUNDING);
        // pure powers have the coefficient 1 in their own length, a falling body as well
        near(1, Potential.quartic(ATOM, Amount.read("0.1 eV/angstrom^4")).value(1), 1e-14);
        near(1, Potential.sextic(ATOM, Amount.read("0.1 eV/angstrom^6")).value(1), 1e-14);
        near(1, Potential.linearWithWall(ATOM, Amount.read("5 meV/nm")).value(1), 1e-14);
        Potential lattice = Potential.lattice(
                Quantity.of(87, Units.ATOMIC_MASS),
                Quantity.of(20, Units.MICROKELVIN),
                Quantity.of(800, Units.NANOMETRE));
        near(Math.PI, lattice.period().orElseThrow(), ROUNDING);
        near(20e-6 * Constants.BOLTZMANN / lattice.scale().energy(), lattice.value(Math.PI / 2), ROUNDING);
        // 4 E_C n² = p²/2 in units of 8 E_C; E_J/E_C = 48
        Potential junction = Potential.junction(Quantity.of(250, Units.MEGAHERTZ), Quantity.of(12, Units.GIGAHERTZ));
        near(2 * 48 / 8.0, junction.value(Math.PI), ROUNDING);
        near(8 * 250e6 * Constants.PLANCK, junction.scale().energy(), ROUNDING);
        near(2 * Math.PI, junction.period().orElseThrow(), ROUNDING);
        Potential pendulum = Potential.pendulum(ATOM, Quantity.of(1, Units.NANOMETRE), Quantity.of(1, Units.GIGAHERTZ));
        // small swings: V = inertia ω² x²/2
        near(
                0.5
                        * ATOM.si()
                        * 1e-18
                        * Math.pow(2 * Math.PI * 1e9, 2)
                        * 1e-6
                        / pendulum.scale().energy(),
                pendulum.value(1e-3),
                1e-6);
    }

    @Test
    void aFormulaIsScaledByTheSizeOfItsLowestState() {
        Parameters w = Parameters.none().with("w", Quantity.of(10, Units.TERAHERTZ));
        Potential harmonic = Potential.of("m*w^2*x^2/2", ATOM, w);
        near(
                Scale.harmonic(ATOM.si(), 2 * Math.PI * 10e12).length(),
                harmonic.scale().length(),
                1e-12);
        near(0.5, harmonic.polynomial().orElseThrow()[2], 1e-12);
        assertTrue(harmonic.isEven());
        // displaced: the minimum is found to the square root of the rounding
        Potential away = Potential.of("m*w^2*(x - 1.27 angstrom)^2/2", ATOM, w);
        near(1.27e-10, away.minimum() * away.scale().length(), 1e-6);
        near(harmonic.scale().length(), away.scale().length(), 1e-6);
        Potential well = Potential.of("0.3 eV*step(abs(x) - 5 nm)", ELECTRON, Parameters.none());
        near(5e-9, well.scale().length(), 1e-6);
        double[] breaks = well.breaks();
        near(5e-9 / well.scale().length(), breaks[breaks.length - 1], ROUNDING);
        near(0.3 * Constants.ELEMENTARY_CHARGE / well.scale().energy(), well.edge(), ROUNDING);
        assertEquals(INFINITE, harmonic.edge());
        Potential morse = Potential.of("5 eV*(1 - exp(-x*1.9 /angstrom))^2", ATOM, Parameters.none());
        near(5 * Constants.ELEMENTARY_CHARGE / morse.scale().energy(), morse.edge(), 1e-9);
        assertEquals(0, morse.minimum(), 1e-6);
    }

    @Test
    void singularEndsAndTailsAreTaken() {
        Potential coulomb = Potential.of(Formula.natural("-1/x", Parameters.none()), ONE, 0, INFINITE);
        assertEquals(0, coulomb.minimum());
        assertEquals(0, coulomb.edge(), 1e-90);
        assertEquals(INFINITE, coulomb.value(-1));
        double[] out = new double[2];
        coulomb.values(new double[] {-1, 2}, out);
        assertArrayEquals(new double[] {INFINITE, -0.5}, out);
        Potential box = Potential.of(Formula.natural("0", Parameters.none()), ONE, -1, 1);
        assertEquals(INFINITE, box.edge());
        assertEquals(INFINITE, natural("log(1 + x^2)").edge());
        assertEquals(2, natural("2*tanh(abs(x))").edge(), 1e-12);
        assertEquals(1, natural("if(x < 0, 1, if(x < 3, 0, 2))").edge());
    }

    @ParameterizedTest
    @CsvSource(
            delimiter = '|',
            value = {
                "x^3 | falls without bound for x → −∞",
                "-x^4 + x^2 | falls without bound for x → +∞",
                "x | falls without bound for x → −∞",
                "-x^2*exp(x) | falls without bound for x → +∞",
                "-log(1 + x^2) | falls without bound for x → −∞",
                "abs(x)*x | falls without bound for x → −∞",
                "x^2*cos(t) | depends on time",
                "x^2 + 1/x | the divisor 'x' is 0 at x = 0; give a range",
                "x^2 + 1/x^2 | the divisor 'x^2' is 0 at x = 0; give a range",
                "x^2 + log(x - 1) | the argument of log 'x - 1'",
                "x^2 + sqrt(x) | the argument of sqrt 'x' is negative",
                "1 | confines nothing",
                "0*x + 3 | confines nothing",
                "x^2 + (-2)^x | has no value",
            })
    void whatHasNoLevelsIsRefusedInASentence(String text, String part) {
        IllegalArgumentException e = assertThrows(IllegalArgumentException.class, () -> natural(text));
        assertTrue(e.getMessage().contains(part), e.getMessage());
    }

    @Test
    void strongSingularAttractionIsRefused() {
        Formula strong = Formula.natural("-0.2/x^2 + x^2", Parameters.none());
        assertTrue(assertThrows(IllegalArgumentException.class, () -> Potential.of(strong, ONE, 0, INFINITE))
                .getMessage()
                .contains("no lowest level"));
        Potential.of(Formula.natural("-0.12/x^2 + x^2", Parameters.none()), ONE, 0, INFINITE);
        Potential.of(Formula.natural("1/x^2 + x^2", Parameters.none()), ONE, 0, INFINITE);
    }

    @Test
    void packetsMayMoveWhereNothingIsBound() {
        Potential inverted = Potential.open(Formula.natural("-x^2/2", Parameters.none()), ONE, Quantity.number(1));
        assertEquals(-2, inverted.value(2));
        Potential free =
                Potential.open(Formula.potential("0", Parameters.none()), ATOM, Quantity.of(1, Units.NANOMETRE));
        assertEquals(0, free.value(7));
        assertEquals(1e-9, free.scale().length());
    }

    @Test
    void declarationsAreCheckedWithASentence() {
        Quantity nm = Quantity.of(3, Units.NANOMETRE);
        String[] messages = {
            message(() -> Potential.morse(ATOM, nm, Amount.read("1 /angstrom"))),
            message(() -> Potential.morse(ATOM, Quantity.of(3, Units.ELECTRONVOLT), Amount.number(2))),
            message(() -> Potential.morse(nm, Quantity.of(3, Units.ELECTRONVOLT), Amount.read("1 /angstrom"))),
            message(() -> Potential.quartic(Quantity.number(2), ONE, Amount.number(1))),
            message(() -> Potential.quartic(ONE, ONE, Amount.number(-1))),
            message(() -> Potential.polynomial(1, 0, Double.NaN)),
            message(() -> Potential.polynomial(3)),
            message(() -> Potential.lennardJones(ONE, ONE, ONE, 6, 12)),
            message(() -> Potential.of(Formula.natural("x^2", Parameters.none()), ATOM)),
            message(() -> Potential.of(Formula.natural("x^2", Parameters.none()), ONE, 2, 1)),
        };
        String[] parts = {
            "the depth is a length",
            "the range parameter is a plain number",
            "the mass is '3 nm'",
            "the mass is 1, not 2",
            "must be above 0, not -1",
            "finite numbers",
            "confines nothing",
            "exponents 6 and 12",
            "both be in lab units or both in natural units",
            "a left end below the right end",
        };
        for (int i = 0; i < parts.length; i++) {
            assertTrue(messages[i].contains(parts[i]), messages[i]);
        }
    }

    private static String message(org.junit.jupiter.api.function.Executable call) {
        return assertThrows(IllegalArgumentException.class, call).getMessage();
    }

    @Test
    void tablesPassThroughTheirPointsAndNeverOvershoot() {
        double[] x = {0, 1, 2, 3, 4, 5, 6};
        double[] v = {10, 3, 0.5, 0, 0.1, 0.1, 8};
        Potential table = Potential.tabulated(ONE, Units.ONE, x, Units.ONE, v, new double[] {0, 0, 0.1, 0, 0, 0.2, 0});
        for (int i = 0; i < x.length; i++) {
            assertEquals(v[i], table.value(x[i]), 1e-14);
        }
        for (int i = 0; i + 1 < x.length; i++) {
            double before = v[i];
            for (int k = 1; k <= 50; k++) {
                double value = table.value(x[i] + k / 50.0);
                assertTrue((value - before) * (v[i + 1] - v[i]) >= -1e-14, "cell " + i);
                before = value;
            }
        }
        assertEquals(0.2, table.uncertainty());
        assertEquals(3, table.minimum());
        assertEquals(8, table.edge());
        assertArrayEquals(new double[] {1, 2, 3, 4, 5}, table.breaks());
        assertEquals(INFINITE, table.value(6.1));
    }

    @Test
    void tablesOfASmoothCurveConvergeToIt() {
        double[] errors = new double[2];
        for (int r = 0; r < 2; r++) {
            int n = r == 0 ? 41 : 81;
            double[] x = new double[n];
            double[] v = new double[n];
            for (int i = 0; i < n; i++) {
                x[i] = 1 + 2.0 * i / (n - 1);
                v[i] = Math.exp(-x[i]);
            }
            Potential table = Potential.tabulated(ONE, Units.ONE, x, Units.ONE, v, new double[0]);
            for (double at = 1.3; at < 2.7; at += 0.0137) {
                errors[r] = Math.max(errors[r], Math.abs(table.value(at) - Math.exp(-at)));
            }
        }
        // harmonic slopes are of second order, the curve of third: an eighth or less, with some room for where the
        // points fall
        assertTrue(errors[1] < errors[0] / 6, errors[0] + " " + errors[1]);
    }

    @Test
    void tablesInLabUnitsAreScaledWithTheirUncertainty() {
        double[] x = {0.8, 1.0, 1.2, 1.3, 1.5, 2, 3};
        double[] v = {30000, 9000, 500, 0, 3000, 15000, 32000};
        double[] error = {100, 50, 10, 10, 10, 50, 100};
        Potential table = Potential.tabulated(ATOM, Units.ANGSTROM, x, Units.PER_CENTIMETRE, v, error);
        double cm =
                Constants.PLANCK * Constants.LIGHT_SPEED * 100 / table.scale().energy();
        near(100 * cm, table.uncertainty(), ROUNDING);
        near(9000 * cm, table.value(1e-10 / table.scale().length()), 1e-11);
        assertThrows(
                IllegalArgumentException.class,
                () -> Potential.tabulated(ATOM, Units.ELECTRONVOLT, x, Units.PER_CENTIMETRE, v, error));
        double[] mixed = {0.8, 1.0, 0.9, 1.3, 1.5, 2, 3};
        assertTrue(message(() -> Potential.tabulated(ATOM, Units.ANGSTROM, mixed, Units.PER_CENTIMETRE, v, error))
                .contains("row 3 has 0.9 after 1.0"));
    }

    @Test
    void scaledValuesAreThoseOfTheFormula() {
        Parameters parameters = Parameters.none()
                .with("a", "2 eV/angstrom^4")
                .with("b", "1 eV/angstrom^2")
                .with("c", Quantity.of(0.2, Units.ANGSTROM));
        String text = "a*x^4 - b*x^2 + 0.1 eV*gauss(x, c, 0.1 angstrom) + if(x > c, 3 meV, 0)";
        Formula lab = Formula.potential(text, parameters);
        Potential v = Potential.of(lab, ATOM);
        assertEquals(1, v.breaks().length);
        double l = v.scale().length();
        double e = v.scale().energy();
        for (double x = -1.13e-10; x < 1.2e-10; x += 0.0371e-10) {
            double size = Math.abs(lab.value(x)) + 0.1 * Constants.ELEMENTARY_CHARGE;
            assertEquals(lab.value(x), v.value(x / l) * e, 1e-14 * size);
            assertEquals(lab.slope().value(x) * l, v.slope(x / l) * e, 1e-13 * size * (1 + l / 1e-11));
        }
        // minima of a x⁴ − b x² lie at ±√(b/2a) = ±0.5 angstrom; the left one is lower by what is added on the right
        assertEquals(-0.5e-10, v.minimum() * l, 1e-13);
    }

    @Test
    void everyRandomFormulaGivesAPotentialOrASentence() {
        Random random = new Random(77);
        int taken = 0;
        for (int i = 0; i < 600; i++) {
            String text = i % 2 == 0 ? term(random, 4) : "x^4 + " + term(random, 3);
            try {
                Potential v = natural(text);
                taken++;
                assertTrue(v.minimum() >= v.left() && v.minimum() <= v.right(), text);
                double low = v.value(v.minimum());
                assertTrue(Double.isFinite(low), text);
                for (double x : new double[] {-3.7, -1.1, -0.2, 0.45, 0.9, 2.6}) {
                    assertTrue(v.value(x) >= low - 1e-9 * (1 + Math.abs(low)), text + " at " + x);
                }
                double before = Double.NEGATIVE_INFINITY;
                for (double at : v.breaks()) {
                    assertTrue(at > before, text);
                    before = at;
                }
            } catch (IllegalArgumentException e) {
                assertTrue(e.getMessage().length() > 20, text + ": " + e);
            } catch (RuntimeException e) {
                throw new AssertionError(text + " gave " + e, e);
            }
        }
        // the generator must reach both outcomes
        assertTrue(taken > 100 && taken < 550, "taken: " + taken);
    }

    private static String term(Random random, int depth) {
        String a = depth == 0 ? "x" : term(random, depth - 1);
        String b = depth == 0 ? "1.5" : term(random, depth - 1);
        return switch (random.nextInt(depth == 0 ? 4 : 16)) {
            case 0, 1, 2 -> "x";
            case 3 -> String.valueOf(random.nextInt(9) / 2.0);
            case 4 -> "(" + a + " + " + b + ")";
            case 5 -> "(" + a + " - " + b + ")";
            case 6 -> a + "*" + b;
            case 7 -> "(" + a + ")^" + (1 + random.nextInt(4));
            case 8 -> "(" + a + ")/(1 + (" + b + ")^2)";
            case 9 -> "abs(" + a + ")";
            case 10 -> "step(" + a + ")";
            case 11 -> "min(" + a + ", " + b + ")";
            case 12 -> "if(" + a + " < " + b + ", " + a + ", x^2)";
            case 13 -> "gauss(" + a + ", 1, 0.5)";
            case 14 -> "sin(" + a + ")";
            default -> "sqrt(abs(" + a + "))";
        };
    }

    @Test
    void aSmallTiltIsNotLostInTheRoundingOfALargeEvenPotential() {
        for (String even : new String[] {
            "cosh(x) + x^2", "min(50*(x-4)^2, 50*(x+4)^2)", "(x-4)^2*(x+4)^2 + tanh(x)^2", "abs(x)^1.5"
        }) {
            assertTrue(natural(even).isEven(), even);
            assertFalse(natural(even + " + 1e-17*x").isEven(), even);
            assertFalse(natural(even + " - 1e-17*sin(x)^3").isEven(), even);
        }
        assertTrue(natural("(x-4)^2 + 8*x + cosh(x)").isEven(), "an odd term that another one takes away");
    }
}
