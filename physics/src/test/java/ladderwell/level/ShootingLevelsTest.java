package ladderwell.level;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Arrays;
import java.util.Random;
import java.util.concurrent.CancellationException;
import java.util.function.DoubleUnaryOperator;
import org.junit.jupiter.api.Test;

class ShootingLevelsTest {
    private static final double BOX = Math.PI * Math.PI / 2;

    private static void assertLevel(double expected, Levels levels, long n) {
        double error = levels.energyError(n);
        assertEquals(expected, levels.energyHigh(n), error + 4e-16 * Math.abs(expected), "level " + n);
        assertTrue(error <= 1e-12 * Math.abs(expected), "level " + n + " has the wide error " + error);
        assertFalse(levels.energyBound(n).isGuaranteed());
    }

    @Test
    void harmonicLevelsComeOutUpToOneThousand() {
        Levels levels = Levels.of(Curves.even(x -> x * x / 2));
        double[] all = levels.energies(0, 1001);
        for (int n = 0; n <= 1000; n++) {
            assertEquals(n + 0.5, all[n], 1e-14 * (n + 0.5));
        }
        for (int n : new int[] {0, 1, 10, 127, 128, 999}) {
            assertLevel(n + 0.5, levels, n);
        }
        assertEquals(37, levels.countBelow(37.2));
        assertEquals(700, levels.countBelow(700.4));
    }

    @Test
    void boxLevelsAreThoseOfTheClosedForm() {
        Levels closed = Levels.box();
        Levels shot = Levels.of(Curves.between(-0.5, 0.5, x -> 0));
        for (int n : new int[] {0, 1, 2, 30, 1000}) {
            assertLevel(closed.energyHigh(n), shot, n);
        }
        Elements a = closed.elements(new long[] {0, 1, 2, 3});
        Elements b = shot.elements(new long[] {0, 1, 2, 3});
        for (int i = 0; i < 4; i++) {
            for (int j = 0; j < 4; j++) {
                assertEquals(a.position(i, j), b.position(i, j), b.positionError() + a.positionError());
                assertEquals(a.momentum(i, j), b.momentum(i, j), b.momentumError() + a.momentumError());
                assertEquals(
                        a.positionSquared(i, j),
                        b.positionSquared(i, j),
                        b.positionSquaredError() + a.positionSquaredError());
                assertEquals(
                        a.momentumSquared(i, j),
                        b.momentumSquared(i, j),
                        b.momentumSquaredError() + a.momentumSquaredError());
            }
        }
    }

    @Test
    void morseLevelsAreThoseOfMorse() {
        // Morse, Phys. Rev. 34 (1929) 57: D = 10, a = 0.5.
        Levels levels = Levels.of(Curves.morse(10, 0.5));
        assertLevel(1.086783988749895, levels, 0);
        assertLevel(7.531055898749054, levels, 4);
        assertEquals(9, levels.count());
        for (int n = 0; n < 9; n++) {
            assertLevel(Curves.morseLevel(10, 0.5, n), levels, n);
        }
        // Gallas, Phys. Rev. A 21 (1980) 1829; Rosen, J. Chem. Phys. 1 (1933) 319.
        Elements table = levels.elements(new long[] {0, 1});
        assertEquals(0.17484584247752, table.position(0, 0), 5e-15 + table.positionError());
        assertEquals(0.48570437042776, Math.abs(table.position(0, 1)), 5e-15 + table.positionError());
        assertTrue(table.positionError() < 1e-11);
        assertFalse(table.positionBound().isGuaranteed());
        assertThrows(IllegalArgumentException.class, () -> levels.energyHigh(9));
    }

    @Test
    void hydrogenChlorideAsAMorseOscillatorHasTheSpectroscopicConstants() {
        // Huber and Herzberg, Constants of Diatomic Molecules (1979), NIST Chemistry WebBook SRD 69, as a pure Morse
        // curve: with energies in
        // cm⁻¹ and length 1/a, p²/2 + V in units of 2 ωₑxₑ has D = ωₑ²/(8 (ωₑxₑ)²), a = 1.
        double omega = 2990.9463;
        double anharmonic = 52.8186;
        double unit = 2 * anharmonic;
        Levels levels = Levels.of(Curves.morse(omega * omega / (4 * anharmonic) / unit, 1));
        assertEquals(1482.268500, unit * levels.energyHigh(0), 5e-7);
        assertEquals(2885.309100, unit * levels.splitting(0), 5e-7);
        assertEquals(42341.90119, unit * levels.threshold(), 5e-6);
        assertEquals(28, levels.count());
    }

    @Test
    void poschlTellerLevelsAreThoseOfTheClosedForm() {
        // Pöschl and Teller, Z. Phys. 83 (1933) 143; Landau and Lifshitz, Quantum Mechanics, section 23 problem 5: λ =
        // 3.
        Levels levels = Levels.of(Curves.even(x -> -6 * Curves.sech(x) * Curves.sech(x)));
        assertLevel(-4.5, levels, 0);
        assertLevel(-2, levels, 1);
        assertLevel(-0.5, levels, 2);
        assertEquals(3, levels.count());
        assertEquals(0, levels.threshold());
        assertEquals(3, levels.decay(0), 1e-12);
    }

    @Test
    void aJustBoundLevelIsFound() {
        // Landau and Lifshitz as above; E = −5e-5 in a well of depth 0.005.
        double lambda = 0.5 * (Math.sqrt(1 + 8 * 0.005) - 1);
        Levels levels = Levels.of(Curves.even(x -> -0.005 * Curves.sech(x) * Curves.sech(x)));
        double expected = -lambda * lambda / 2;
        // Two digits are lost with the weakness of the well, and said to be.
        assertEquals(expected, levels.energyHigh(0), levels.energyError(0));
        assertTrue(levels.energyError(0) < 1e-11 * -expected);
        assertEquals(1, levels.count());
    }

    @Test
    void finiteWellLevelsAreThoseOfTheClosedSolverWhetherJumpsAreDeclaredOrNot() {
        // Textbook condition (Schiff; Barker et al., Am. J. Phys. 59 (1991) 1038): depth 8 in units of the box's ground
        // level.
        double[] published = {0.6628034136891765, 2.603461128122489, 5.608649434860538};
        Levels closed = Levels.finiteWell(8 * BOX);
        Levels declared = Levels.of(Curves.even(x -> Math.abs(x) < 0.5 ? 0 : 8 * BOX, -0.5, 0.5));
        Levels found = Levels.of(Curves.even(x -> Math.abs(x) < 0.5 ? 0 : 8 * BOX));
        Levels shifted = Levels.of(Curves.open(x -> Math.abs(x - 0.3) < 0.5 ? 0 : 8 * BOX));
        assertEquals(3, declared.count());
        assertEquals(3, shifted.count());
        for (int n = 0; n < 3; n++) {
            assertLevel(published[n] * BOX, declared, n);
            assertLevel(closed.energyHigh(n), declared, n);
            assertLevel(closed.energyHigh(n), found, n);
            assertLevel(closed.energyHigh(n), shifted, n);
        }
        double[] x = {-0.9, -0.3, 0, 0.2, 0.7};
        double[][] a = closed.waveFunctions(0, 3, x);
        double[][] b = declared.waveFunctions(0, 3, x);
        for (int n = 0; n < 3; n++) {
            for (int i = 0; i < x.length; i++) {
                assertEquals(a[n][i], b[n][i], declared.waveFunctionError(2) + closed.waveFunctionError(2));
            }
        }
    }

    @Test
    void airyLevelsAreTheZerosOfTheAiryFunction() {
        // DLMF table 9.9.1: p²/2 + x with a wall at 0, E = −a_n / 2^(1/3).
        Levels wall = Levels.of(Curves.between(0, Double.POSITIVE_INFINITY, x -> x));
        assertLevel(1.855757081489238, wall, 0);
        assertLevel(3.244607624003160, wall, 1);
        assertLevel(2.33810741045976704 / Math.cbrt(2), wall, 0);
        // p² + |x| has E₀ = 1.01879297164747109, minus the first zero of Ai′; the kink is not declared and off the
        // origin.
        Levels kink = Levels.of(Curves.open(x -> Math.abs(x - 0.1) / 2));
        assertLevel(1.01879297164747109 / 2, kink, 0);
        assertLevel(1.01879297164747109 / 2, Levels.of(Curves.even(x -> Math.abs(x) / 2)), 0);
    }

    @Test
    void razavyLevelsAreExact() {
        // p² + (½ cosh 2x − 2)²: Razavy, Am. J. Phys. 48 (1980) 285; Finkel, González-López and Rodríguez, J. Phys. A
        // 32 (1999) 6821.
        Levels levels = Levels.of(Curves.even(x -> Math.pow(0.5 * Math.cosh(2 * x) - 2, 2) / 2));
        assertLevel(2.25 / 2, levels, 0);
        assertLevel(4.25 / 2, levels, 1);
    }

    @Test
    void coulombLevelsComeOutWithTheirEndlessTail() {
        // −1/x with a wall at 0, and with l = 3: −1/(2n²), common practice, no source.
        Levels levels = Levels.of(Curves.between(0, Double.POSITIVE_INFINITY, x -> -1 / x));
        for (int n : new int[] {0, 3, 40}) {
            assertLevel(-0.5 / ((n + 1.0) * (n + 1)), levels, n);
        }
        assertEquals(Long.MAX_VALUE, levels.count());
        Levels turning = Levels.of(Curves.between(0, Double.POSITIVE_INFINITY, x -> -1 / x + 6 / (x * x)));
        assertLevel(-0.5 / 36, turning, 2);
        // ⟨x⟩ = 3/2 and ⟨x²⟩ = 3 in the lowest state e^{−x} x · 2.
        assertEquals(1.5, levels.element(0, 0, x -> x).value(), 1e-11);
        assertEquals(3, levels.elements(new long[] {0}).positionSquared(0, 0), 1e-11);
    }

    @Test
    void levelsTooCloseAreReportedAsOneCluster() {
        Levels levels = Levels.of(Curves.open(x -> (x * x * x * x - 50 * x * x) / 2));
        Levels.Cluster cluster = levels.cluster(1);
        assertEquals(0, cluster.first());
        assertEquals(1, cluster.last());
        Levels even = Levels.of(Curves.even(x -> (x * x * x * x - 50 * x * x) / 2));
        assertTrue(cluster.spread().size() >= even.splitting(0));
        assertTrue(even.splitting(0) > 0);
        assertTrue(even.cluster(0).single());
        assertEquals(even.energyHigh(0), levels.energyHigh(0), even.energyError(0) + levels.energyError(0));
    }

    @Test
    void asymmetricTreatmentOfADoubleWellGivesTheSameSplitting() {
        // Banerjee and Bhatnagar 1978: 2.98185428881e-5 in p² + V.
        Levels levels = Levels.of(Curves.open(x -> (x * x * x * x - 10 * x * x) / 2));
        assertEquals(
                0.0000298185428881,
                2 * levels.splitting(0),
                4 * levels.splittingBound(0).size());
        assertTrue(levels.cluster(0).single());
    }

    @Test
    void farApartAndVeryDeepWellsAreFoundFromTheMiddle() {
        // Wells of depth 1e8 at ±10.6 with nothing at 0 but a hump: harmonic to first order around the minimum.
        DoubleUnaryOperator v = x -> {
            double s = x * x;
            return ((0.83 * s - 156.8) * s + 31.9) * s * s + 92.3 * s;
        };
        Levels levels = Levels.of(Curves.even(v));
        double at = 10.6;
        for (int i = 0; i < 40; i++) {
            double h = 1e-3;
            double slope = (v.applyAsDouble(at + h) - v.applyAsDouble(at - h)) / (2 * h);
            double bend = (v.applyAsDouble(at + h) - 2 * v.applyAsDouble(at) + v.applyAsDouble(at - h)) / (h * h);
            at -= slope / bend;
        }
        double bend = (v.applyAsDouble(at + 1e-3) - 2 * v.applyAsDouble(at) + v.applyAsDouble(at - 1e-3)) / 1e-6;
        double bottom = v.applyAsDouble(at);
        double frequency = Math.sqrt(bend);
        assertEquals(0.5, (levels.energyHigh(0) - bottom) / frequency, 0.01);
        assertEquals(0.5, (levels.energyHigh(1) - bottom) / frequency, 0.01);
        assertEquals(1.5, (levels.energyHigh(2) - bottom) / frequency, 0.02);
        assertEquals(2, levels.countBelow(bottom + frequency));
    }

    @Test
    void shiftingAnEvenPotentialChangesNoLevel() {
        Random random = new Random(3);
        for (int trial = 0; trial < 8; trial++) {
            double shift = random.nextDouble() * 3;
            double dip = 1 + 3 * random.nextDouble();
            DoubleUnaryOperator v = x -> Math.abs(x) + dip * Math.cos(2 * x) + (Math.abs(x) < 0.7 ? -dip : 0);
            Levels even = Levels.of(Curves.even(v, -0.7, 0, 0.7));
            Levels moved = Levels.of(Curves.open(x -> v.applyAsDouble(x - shift)));
            for (int n = 0; n < 12; n++) {
                double sum = even.energyError(n) + moved.energyError(n);
                assertEquals(even.energyHigh(n), moved.energyHigh(n), sum, "trial " + trial + ", level " + n);
                assertTrue(sum < 1e-11, "trial " + trial + ", level " + n + " has " + sum);
            }
        }
    }

    @Test
    void functionsOfPositionHaveElements() {
        Levels general = Levels.of(Curves.even(x -> x * x / 2));
        Levels closed = Levels.harmonic();
        for (long n = 0; n < 3; n++) {
            // ⟨0|cos x|0⟩ = e^{−1/4}
            Levels.Element a = general.element(0, n, Math::cos);
            Levels.Element b = closed.element(0, n, Math::cos);
            assertEquals(a.value(), b.value(), a.bound().size() + b.bound().size());
            assertTrue(a.bound().size() < 1e-11);
        }
        assertEquals(Math.exp(-0.25), general.element(0, 0, Math::cos).value(), 1e-13);
        assertEquals(Math.sqrt(0.5), closed.element(0, 1, x -> x).value(), 1e-12);
    }

    @Test
    void hopelessPotentialsAreRefusedByName() {
        assertTrue(refusal(Curves.open(x -> x * x * x)).contains("without limit towards the left"));
        assertTrue(refusal(Curves.even(x -> -x * x * x * x)).contains("without limit"));
        assertTrue(refusal(Curves.even(x -> 1)).contains("no well"));
        assertTrue(refusal(Curves.even(x -> Curves.sech(x))).contains("no well"));
        assertTrue(refusal(Curves.open(x -> x > 3 ? Double.NaN : x * x)).contains("not a number"));
        assertTrue(refusal(Curves.open(x -> Math.abs(x - 1.25) < 0.1 ? Double.NaN : x * x))
                .contains("x = 1."));
        assertTrue(refusal(Curves.open(x -> 1 / ((x - 0.3) * (x - 0.3)) + x * x))
                .contains("singular"));
        assertTrue(refusal(Curves.between(1, 1, x -> 0)).contains("left of"));
    }

    private static String refusal(PotentialCurve curve) {
        return assertThrows(
                        IllegalArgumentException.class, () -> Levels.of(curve).energyHigh(0))
                .getMessage();
    }

    @Test
    void anInterruptEndsTheWork() {
        Levels levels = Levels.of(Curves.even(x -> x * x / 2));
        Thread.currentThread().interrupt();
        assertThrows(CancellationException.class, () -> levels.energies(0, 1000));
    }

    private static PotentialCurve open(DoubleUnaryOperator v, double... breaks) {
        return new PotentialCurve() {
            @Override
            public double value(double x) {
                return v.applyAsDouble(x);
            }

            @Override
            public double left() {
                return Double.NEGATIVE_INFINITY;
            }

            @Override
            public double right() {
                return Double.POSITIVE_INFINITY;
            }

            @Override
            public double[] breaks() {
                return breaks.clone();
            }

            @Override
            public boolean isEven() {
                return false;
            }
        };
    }

    /** Two parabolas that meet in a kink far above: each well has its own ladder, and the levels are those of both, sorted. */
    @Test
    void noLevelOfAFarWellIsMissedAndNoMeshTurnsInCircles() {
        double[][] wells = {
            {22.904902859914593, 1.2602165754142414, 1.7801926211623225},
            {20.01824911122496, 1.4293172087346866, 2.2032967163357338},
            {15.714109137958562, 0.968874891141933, 0.4258260460573826},
            {14.771992279914592, 0.6342484332754376, 2.1953042953997923}
        };
        for (double[] well : wells) {
            double s = well[0];
            double w = well[1];
            double up = well[2];
            double low = -s;
            double high = s;
            for (int i = 0; i < 100; i++) {
                double middle = (low + high) / 2;
                if ((middle + s) * (middle + s) < w * w * (middle - s) * (middle - s) + 2 * up) {
                    low = middle;
                } else {
                    high = middle;
                }
            }
            double[] expected = new double[12];
            for (int k = 0; k < 6; k++) {
                expected[k] = k + 0.5;
                expected[6 + k] = w * (k + 0.5) + up;
            }
            Arrays.sort(expected);
            DoubleUnaryOperator v = x -> Math.min((x + s) * (x + s) / 2, w * w * (x - s) * (x - s) / 2 + up);
            for (Levels levels : new Levels[] {Levels.of(open(v, low)), Levels.of(open(v))}) {
                for (int n = 0; n < 6; n++) {
                    // the barrier is above 100 and 30 wide: tunnelling is below any rounding
                    assertEquals(
                            expected[n],
                            levels.energyHigh(n),
                            levels.energyError(n) + 1e-13,
                            "level " + n + " at " + s);
                }
            }
        }
    }

    /** A well a quarter wide on the far slope of a barrier: found although the survey's first look is coarse. Reference: sinc functions, 900 points. */
    @Test
    void aNarrowWellBehindABarrierHoldsTheLowestLevel() {
        double[] size = {8.615487677290135, -30.129593694610143, 20.516317849165127};
        double[] at = {2.2521724198041095, 3.9229891948391113, 2.752656475335371};
        double[] width = {0.37826093482012624, 0.24990375277370744, 1.3833551735746035};
        Levels levels = Levels.of(open(x -> {
            double v = -0.49076356159781753 * x * x + 0.03448459708108077 * x * x * x * x;
            for (int i = 0; i < 3; i++) {
                double d = (x - at[i]) / width[i];
                v += size[i] * Math.exp(-d * d);
            }
            return v;
        }));
        assertEquals(-6.907138377685854, levels.energyHigh(0), 2e-10);
        assertEquals(-1.0839682142408464, levels.energyHigh(1), 1e-9);
    }

    @Test
    void aShallowSquareWellHasOneLevelHoweverNearTheThresholdOneLooks() {
        double left = -1.5909565721702377;
        double right = -1.3078330267717948;
        Levels levels =
                Levels.of(open(x -> x < left || x >= right ? 36.62866713326563 : 22.92333193509699, left, right));
        assertEquals(1, levels.count());
    }

    /** A jump met by ever shorter cells, a level about which Newton's iteration went to and fro, a well between the survey's places. */
    @Test
    void wellsWithUndeclaredJumpsAreSolvedAsThoseWithDeclaredOnes() {
        double[][] edges = {
            {-2.0456512948707646, -0.6392134682682731, 0.031075218373401436},
            {-2.5280463241878524, -1.2012290076428862, 0.7684045912225206},
            {-3.90849720836411, -3.690338437838754, -2.9258504795050255, -2.665428941407704}
        };
        double[][] heights = {
            {51.72815644792082, 25.494682016115952, 25.8398787184041, 51.72815644792082},
            {32.22972305746549, 16.542021678655278, 0.03808667312960821, 32.22972305746549},
            {16.637855887228206, 1.9985690629034083, 20.469174469744296, 19.59620634929557, 16.637855887228206}
        };
        for (int i = 0; i < edges.length; i++) {
            StepWells wells = new StepWells(edges[i], heights[i]);
            Levels found = Levels.of(open(wells::value));
            Levels declared = Levels.of(open(wells::value, edges[i]));
            assertEquals(declared.count(), found.count());
            for (long n = 0; n < found.count(); n++) {
                double sum = found.energyError(n) + declared.energyError(n);
                assertEquals(declared.energyHigh(n), found.energyHigh(n), sum, "wells " + i + ", level " + n);
                assertTrue(sum < 1e-11);
            }
        }
    }
}
