package ladderwell.phasespace;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Random;
import java.util.function.DoubleBinaryOperator;
import ladderwell.evidence.Bound;
import ladderwell.operator.LadderPolynomial;
import ladderwell.operator.OperatorFormula;
import ladderwell.state.Amplitudes;
import ladderwell.state.HarmonicStates;
import ladderwell.state.Mixture;
import ladderwell.window.MixedWindow;
import ladderwell.window.WindowMotion;
import org.junit.jupiter.api.Test;

class PhaseFunctionsTest {
    /** Where the bound is for tolerance 1e-14 of the amplitudes and a few dozen levels. */
    private static final double TIGHT = 1e-11;

    private final PhaseFunctions functions = new PhaseFunctions();

    private static NumberWave number(int n) {
        return new NumberWave(n, new double[] {1}, new double[] {0}, Bound.exact());
    }

    /** L_n(y) e^{−y/2} by its recurrence upwards, with the fall shared out so that nothing overflows. */
    static double laguerre(int n, double y) {
        double before = 0;
        double now = 1;
        double scale = -y / 2;
        for (int k = 0; k < n; k++) {
            double next = ((2 * k + 1 - y) * now - k * before) / (k + 1);
            before = now;
            now = next;
            double size = Math.abs(now) + Math.abs(before);
            if (size > 1e100) {
                now /= size;
                before /= size;
                scale += Math.log(size);
            }
        }
        return now * Math.exp(scale);
    }

    /** W of level n: (−1)^n e^{−r²} L_n(2r²)/π; Cahill and Glauber 1969. */
    static double wignerOfLevel(int n, double x, double p) {
        return (n % 2 == 0 ? 1 : -1) / Math.PI * laguerre(n, 2 * (x * x + p * p));
    }

    private static void near(PhaseField field, DoubleBinaryOperator exact, double most) {
        assertTrue(field.bound().size() <= most, "bound " + field.bound());
        double worst = 0;
        for (int i = 0; i < field.grid().nx(); i++) {
            for (int j = 0; j < field.grid().np(); j++) {
                double there = exact.applyAsDouble(
                        field.grid().position(i), field.grid().momentum(j));
                worst = Math.max(worst, Math.abs(field.value(i, j) - there));
            }
        }
        assertTrue(worst <= field.bound().size(), "off by " + worst + ", bound " + field.bound());
    }

    @Test
    void numberStatesMeetTheLaguerreForm() {
        for (int n : new int[] {0, 1, 2, 3, 7, 30}) {
            near(functions.wigner(number(n), PhaseGrid.square(6, 41)), (x, p) -> wignerOfLevel(n, x, p), TIGHT);
        }
    }

    @Test
    void hundredsOfQuantaLoseNoDigits() {
        for (int n : new int[] {200, 777}) {
            near(
                    functions.wigner(number(n), new PhaseGrid(0.3, -0.2, 42, 41, 37, 44)),
                    (x, p) -> wignerOfLevel(n, x, p),
                    2 * TIGHT);
        }
    }

    @Test
    void aLevelFarUpTheLadderIsReadNearTheOriginAndOnItsRing() {
        // The Laguerre form with 40 digits, by its recurrence in mpmath; a recurrence in doubles would lose ten of
        // them.
        assertValue(number(20_000), 0.05, 0, 0.053160286856469015);
        assertValue(number(20_000), 0.05, -0.05, -0.033962697792489214);
        assertValue(number(20_000), 200, 1, 0.0033043740366607443);
        assertValue(number(20_000), 200.5, 0.8, 1.3769383156121565e-7);
    }

    @Test
    void publishedWignerValuesAreMet() {
        // S-WIG-01, S-WIG-02: Cahill and Glauber, Phys. Rev. 177 (1969) 1882
        assertValue(number(1), 0, 0, -0.3183098861837907);
        assertValue(number(3), 1.0, 0.5, -0.02469927126324590);
        // S-WIG-04: even cat, alpha = 2; Buzek, Vidiella-Barranco and Knight, Phys. Rev. A 45 (1992) 6570
        NumberWave cat = NumberWave.of(HarmonicStates.cat(4, 0, 2, 0, 1e-14));
        assertValue(cat, 0, 0.55536036726979578, -0.233674548832213);
    }

    private void assertValue(WaveFunction wave, double x, double p, double expected) {
        PhaseField field = functions.wigner(wave, new PhaseGrid(x, p, 0.5, 0.5, 3, 3));
        assertEquals(expected, field.value(1, 1), field.bound().size());
        assertTrue(field.bound().size() < 2 * TIGHT, "bound " + field.bound());
    }

    @Test
    void publishedHusimiValueIsMet() {
        // S-HUS-01: Q(alpha) of level 3 at 1.2 + 0.7i, per area of alpha; K. Husimi 1940. An area of alpha is half one
        // of x and p.
        PhaseField field =
                functions.husimi(number(3), new PhaseGrid(1.2 * Math.sqrt(2), 0.7 * Math.sqrt(2), 1, 1, 3, 3), 1);
        assertEquals(
                0.0553582629049492, 2 * field.value(1, 1), 2 * field.bound().size());
        assertTrue(field.bound().size() < TIGHT);
    }

    @Test
    void coherentSqueezedAndDisplacedStatesMeetTheirClosedForms() {
        double root = Math.sqrt(2);
        Amplitudes coherent = Amplitudes.coherent(9, 0.6, 1e-13);
        double x0 = root * 3 * Math.cos(0.6);
        double p0 = root * 3 * Math.sin(0.6);
        near(
                functions.wigner(NumberWave.of(coherent), new PhaseGrid(3, 2, 5, 5, 31, 32)),
                (x, p) -> Math.exp(-(x - x0) * (x - x0) - (p - p0) * (p - p0)) / Math.PI,
                TIGHT);
        near(
                functions.husimi(NumberWave.of(coherent), new PhaseGrid(3, 2, 5, 5, 31, 32), 1),
                (x, p) -> Math.exp(-((x - x0) * (x - x0) + (p - p0) * (p - p0)) / 2) / (2 * Math.PI),
                TIGHT);
        near(
                functions.wigner(
                        NumberWave.of(HarmonicStates.displacedNumber(4, 9, 0.6, 1e-13)), PhaseGrid.square(8, 33)),
                (x, p) -> wignerOfLevel(4, x - x0, p - p0),
                TIGHT);
        double r = 0.8;
        near(
                functions.wigner(NumberWave.of(HarmonicStates.squeezedVacuum(r, 0, 1e-13)), PhaseGrid.square(5, 33)),
                (x, p) -> Math.exp(-Math.exp(2 * r) * x * x - Math.exp(-2 * r) * p * p) / Math.PI,
                TIGHT);
    }

    @Test
    void oddCatMeetsItsClosedForm() {
        // |a> - |-a>: two Gaussians and fringes between them; Buzek, Vidiella-Barranco and Knight 1992
        double a = 1.7 * Math.sqrt(2);
        double norm = 2 * Math.PI * (1 - Math.exp(-a * a));
        near(
                functions.wigner(NumberWave.of(HarmonicStates.cat(1.7 * 1.7, 0, 2, 1, 1e-13)), PhaseGrid.square(6, 45)),
                (x, p) -> (Math.exp(-(x - a) * (x - a) - p * p)
                                + Math.exp(-(x + a) * (x + a) - p * p)
                                - 2 * Math.exp(-x * x - p * p) * Math.cos(2 * a * p))
                        / norm,
                TIGHT);
    }

    @Test
    void thermalStatesMeetTheirClosedForms() {
        double quanta = 1.5;
        NumberMatrix thermal = NumberMatrix.of(Mixture.thermal(quanta, 1e-12).density(1e9));
        double s = 2 * quanta + 1;
        near(
                functions.wigner(thermal, PhaseGrid.square(7, 40)),
                (x, p) -> Math.exp(-(x * x + p * p) / s) / (Math.PI * s),
                1e-10);
        near(
                functions.husimi(thermal, PhaseGrid.square(7, 40), 1),
                (x, p) -> Math.exp(-(x * x + p * p) / (s + 1)) / (Math.PI * (s + 1)),
                1e-10);
        NumberMatrix displaced =
                NumberMatrix.of(Mixture.displacedThermal(0.5, 4, 1, 1e-12).density(1e9));
        double x0 = Math.sqrt(8) * Math.cos(1);
        double p0 = Math.sqrt(8) * Math.sin(1);
        near(
                functions.wigner(displaced, new PhaseGrid(1, 2, 5, 6, 31, 36)),
                (x, p) -> Math.exp(-((x - x0) * (x - x0) + (p - p0) * (p - p0)) / 2) / (Math.PI * 2),
                1e-10);
    }

    @Test
    void aDampedCatHasThePublishedParityAtTheOrigin() {
        // S-DC-01a: even cat, alpha = 2, zero temperature, kappa t = 0.1; Walls and Milburn, Phys. Rev. A 31 (1985)
        // 2403
        Mixture start = Mixture.pure(HarmonicStates.cat(4, 0, 2, 0, 1e-13));
        MixedWindow end = (MixedWindow) WindowMotion.mixed(
                        OperatorFormula.of(LadderPolynomial.number().times(0.5)),
                        List.of(LadderPolynomial.a()),
                        start.density(1e9),
                        new double[] {0, 0.1},
                        1e-10,
                        1e9)
                .state(1);
        NumberMatrix state =
                new NumberMatrix(end.first(), end.levels(), end.lowerRe(), end.lowerIm(), end.traceNormError());
        PhaseField field = functions.wigner(state, PhaseGrid.square(1, 3));
        assertEquals(
                0.46761992573919,
                Math.PI * field.value(1, 1),
                Math.PI * field.bound().size());
        assertTrue(field.bound().size() < 1e-9, "bound " + field.bound());
    }

    @Test
    void aMixedStateIsFramedWhereItLies() {
        NumberMatrix displaced =
                NumberMatrix.of(Mixture.displacedThermal(0.5, 16, 1, 1e-12).density(1e9));
        Support box = displaced.visible(1e-6);
        // Gaussian of variance 1 about √32 (cos 1, sin 1): a share of 1e-6 lies beyond 4.9 spreads
        assertEquals(Math.sqrt(32) * Math.cos(1), (box.left() + box.right()) / 2, 0.2);
        assertEquals(Math.sqrt(32) * Math.sin(1), (box.low() + box.high()) / 2, 0.2);
        assertEquals(4.9, (box.right() - box.left()) / 2, 0.5);
        assertEquals(4.9, (box.high() - box.low()) / 2, 0.5);
    }

    /** ⟨n|D(−α)|ψ⟩ by the rows of D, on so many levels that nothing is lost; W = (1/π) Σ (−1)^n |⟨n|D(−α)|ψ⟩|². */
    private static double displacedParity(double[] re, double[] im, double x, double p) {
        int levels = 220;
        double bRe = -x / Math.sqrt(2);
        double bIm = -p / Math.sqrt(2);
        double[][][] d = new double[levels][re.length][2];
        d[0][0][0] = Math.exp(-(bRe * bRe + bIm * bIm) / 2);
        for (int n = 1; n < re.length; n++) {
            // D_0n = (−β*)^n e^{−|β|²/2}/√n!
            double[] before = d[0][n - 1];
            d[0][n][0] = (-bRe * before[0] - bIm * before[1]) / Math.sqrt(n);
            d[0][n][1] = (-bRe * before[1] + bIm * before[0]) / Math.sqrt(n);
        }
        double sum = 0;
        for (int m = 0; m < levels; m++) {
            double a = 0;
            double b = 0;
            for (int n = 0; n < re.length; n++) {
                double[] here = d[m][n];
                a += here[0] * re[n] - here[1] * im[n];
                b += here[0] * im[n] + here[1] * re[n];
                if (m + 1 < levels) {
                    double left = n > 0 ? Math.sqrt(n) : 0;
                    double[] beside = n > 0 ? d[m][n - 1] : here;
                    d[m + 1][n][0] = (bRe * here[0] - bIm * here[1] + left * beside[0]) / Math.sqrt(m + 1);
                    d[m + 1][n][1] = (bRe * here[1] + bIm * here[0] + left * beside[1]) / Math.sqrt(m + 1);
                }
            }
            sum += (m % 2 == 0 ? 1 : -1) * (a * a + b * b);
        }
        return sum / Math.PI;
    }

    @Test
    void randomStatesAreTheParitiesOfTheirDisplacements() {
        Random random = new Random(21);
        for (int trial = 0; trial < 8; trial++) {
            int size = 1 + random.nextInt(40);
            double[] re = new double[size];
            double[] im = new double[size];
            double norm = 0;
            for (int n = 0; n < size; n++) {
                re[n] = random.nextGaussian();
                im[n] = random.nextGaussian();
                norm = Math.hypot(norm, Math.hypot(re[n], im[n]));
            }
            for (int n = 0; n < size; n++) {
                re[n] /= norm;
                im[n] /= norm;
            }
            // the rows of D lose some units of rounding a level
            double rounding = 1e-13;
            PhaseField field =
                    functions.wigner(new NumberWave(0, re, im, Bound.exact()), new PhaseGrid(0.4, -0.3, 6, 5, 13, 12));
            for (int i = 0; i < 13; i++) {
                for (int j = 0; j < 12; j++) {
                    double x = field.grid().position(i);
                    double p = field.grid().momentum(j);
                    assertEquals(
                            displacedParity(re, im, x, p),
                            field.value(i, j),
                            field.bound().size() + rounding,
                            "trial " + trial + " at " + x + ", " + p);
                }
            }
        }
    }

    @Test
    void pureAndMixedFormsOfRandomStatesAgreeWithinTheirBounds() {
        Random random = new Random(11);
        for (int trial = 0; trial < 6; trial++) {
            int size = 1 + random.nextInt(60);
            int first = trial % 2 == 0 ? 0 : random.nextInt(300);
            double[] re = new double[size];
            double[] im = new double[size];
            double norm = 0;
            for (int n = 0; n < size; n++) {
                re[n] = random.nextGaussian();
                im[n] = random.nextGaussian();
                norm = Math.hypot(norm, Math.hypot(re[n], im[n]));
            }
            double[] lowerRe = new double[size * (size + 1) / 2];
            double[] lowerIm = new double[lowerRe.length];
            for (int m = 0; m < size; m++) {
                re[m] /= norm;
                im[m] /= norm;
                for (int n = 0; n <= m; n++) {
                    lowerRe[m * (m + 1) / 2 + n] = re[m] * re[n] + im[m] * im[n];
                    lowerIm[m * (m + 1) / 2 + n] = im[m] * re[n] - re[m] * im[n];
                }
            }
            NumberWave pure = new NumberWave(first, re, im, Bound.exact());
            NumberMatrix mixed = new NumberMatrix(first, size, lowerRe, lowerIm, Bound.exact());
            double reach = Math.sqrt(2.0 * (first + size)) + 1;
            PhaseGrid grid = new PhaseGrid(
                    random.nextDouble() * 3,
                    random.nextDouble() * 3,
                    reach,
                    reach * 0.9,
                    20 + random.nextInt(30),
                    20 + random.nextInt(30));
            agree(functions.wigner(pure, grid), functions.wigner(mixed, grid), "Wigner, trial " + trial);
            agree(functions.husimi(pure, grid, 0.8), functions.husimi(mixed, grid, 0.8), "Husimi, trial " + trial);
        }
    }

    private static void agree(PhaseField a, PhaseField b, String what) {
        double allowed = a.bound().size() + b.bound().size();
        for (int i = 0; i < a.grid().nx(); i++) {
            for (int j = 0; j < a.grid().np(); j++) {
                assertEquals(a.value(i, j), b.value(i, j), allowed, what + " at " + i + ", " + j);
            }
        }
    }

    @Test
    void wignerIntegratesToOneAndItsMarginalIsTheDensity() {
        NumberWave wave =
                new NumberWave(0, new double[] {0.6, 0, 0.48, 0.64}, new double[] {0, 0, 0, 0}, Bound.exact());
        PhaseField field = functions.wigner(wave, PhaseGrid.square(8, 121));
        assertEquals(1, field.total(), 1e-12);
        double[] x = new double[121];
        for (int i = 0; i < 121; i++) {
            x[i] = field.grid().position(i);
        }
        double[] re = new double[121];
        double[] im = new double[121];
        wave.sample(x, re, im);
        double[] density = field.overMomenta();
        for (int i = 0; i < 121; i++) {
            // 16 momenta of width: the marginal's error is the values' own times the range
            assertEquals(
                    re[i] * re[i] + im[i] * im[i],
                    density[i],
                    16 * field.bound().size(),
                    "at " + x[i]);
        }
    }

    @Test
    void negativityOfNumberStatesIsThePublishedOne() {
        // S-NEG-01, S-NEG-02: Kenfack and Zyczkowski, J. Opt. B 6 (2004) 396
        double[] published = {0, 0.42612263885053, 0.72898925778713};
        for (int n = 0; n <= 2; n++) {
            PhaseField.Reading reading =
                    functions.wigner(number(n), PhaseGrid.square(7, 401)).negativity();
            assertEquals(published[n], reading.value(), reading.bound().size(), "level " + n);
            assertTrue(reading.bound().size() < 2e-3, "level " + n + ": " + reading.bound());
        }
    }

    @Test
    void valuesStayWithinOneOverPi() {
        PhaseField field = functions.wigner(number(9), PhaseGrid.square(6, 61));
        assertEquals(1 / Math.PI, field.peak(), field.bound().size());
        assertEquals(-1 / Math.PI, field.least(), field.bound().size());
    }

    @Test
    void refusalsNameWhatIsWrong() {
        assertThrows(IllegalArgumentException.class, () -> PhaseGrid.square(0, 10));
        assertThrows(IllegalArgumentException.class, () -> PhaseGrid.square(1, 1));
        IllegalArgumentException notANumber = assertThrows(
                IllegalArgumentException.class,
                () -> new NumberWave(5, new double[] {Double.NaN}, new double[] {0}, Bound.exact()));
        assertTrue(notANumber.getMessage().contains("level 5"), notANumber.getMessage());
        assertThrows(IllegalArgumentException.class, () -> functions.husimi(number(1), PhaseGrid.square(1, 3), 0));
    }
}
