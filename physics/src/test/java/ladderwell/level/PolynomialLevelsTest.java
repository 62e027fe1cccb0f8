package ladderwell.level;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Random;
import java.util.concurrent.CancellationException;
import org.junit.jupiter.api.Test;

class PolynomialLevelsTest {
    /** H = p² + V of the literature is twice our p²/2 + V/2. */
    private static Levels ofTwice(double... coefficients) {
        double[] half = coefficients.clone();
        for (int k = 0; k < half.length; k++) {
            half[k] /= 2;
        }
        return Levels.polynomial(half);
    }

    /** The bound must hold, apart from the last digit printed, and be as small as promised. */
    private static void assertTwice(double published, double lastDigit, Levels levels, int n) {
        double error = Math.abs(2 * levels.energyHigh(n) - published);
        double bound = 2 * levels.energyError(n);
        assertTrue(error <= bound + lastDigit, "level " + n + " off by " + error + ", bound " + bound);
        assertTrue(bound <= 1e-12 * Math.abs(published), "level " + n + " has the wide bound " + bound);
        assertTrue(levels.energyBound(n).isGuaranteed());
    }

    @Test
    void quarticLevelsArePublishedOnes() {
        // p² + x² + x⁴: Banerjee, Bhatnagar, Choudhry and Kanwal, Proc. R. Soc. Lond. A 360 (1978) 575; E₀ also Vinette
        // and Cizek,
        // J. Math. Phys. 32 (1991) 3392.
        Levels mixed = ofTwice(0, 0, 1, 0, 1);
        assertTwice(1.3923516415302918557, 2e-16, mixed, 0);
        assertTwice(4.6488127042120775364, 9e-16, mixed, 1);
        assertTwice(40.6903860821064447, 7e-15, mixed, 8);
        // p² + x² + 0.2 x⁴: Weniger, Ann. Phys. (NY) 246 (1996) 133.
        assertTwice(1.11829265436703915, 2e-16, ofTwice(0, 0, 1, 0, 0.2), 0);
        // p² + x² + 100 x⁴: Banerjee et al. 1978.
        assertTwice(4.99941754513758783, 9e-16, ofTwice(0, 0, 1, 0, 100), 0);
        // p² + x⁴: Banerjee et al. 1978; Okun and Burke, Int. J. Quantum Chem. e26554 (2020).
        Levels pure = ofTwice(0, 0, 0, 0, 1);
        assertTwice(1.0603620904841828996, 2e-16, pure, 0);
        assertTwice(3.7996730298013941688, 4e-16, pure, 1);
        // p²/2 + x²/2 + 0.1 x⁴: Hioe and Montroll, J. Math. Phys. 16 (1975) 1945.
        assertTwice(2 * 0.559146327183519577, 2e-16, Levels.polynomial(0, 0, 0.5, 0, 0.1), 0);
    }

    @Test
    void sexticLevelsArePublishedOnes() {
        // p² + x⁶: Okun and Burke 2020, arXiv:2007.04762.
        assertTwice(1.14480245379705276, 2e-16, ofTwice(0, 0, 0, 0, 0, 0, 1), 0);
        // p² + x⁶ − 7x²: ±2√2 exactly (Turbiner, Commun. Math. Phys. 118 (1988) 467).
        Levels exact = ofTwice(0, 0, -7, 0, 0, 0, 1);
        assertTwice(-2 * Math.sqrt(2), 4e-16, exact, 0);
        assertTwice(2 * Math.sqrt(2), 4e-16, exact, 2);
    }

    @Test
    void doubleWellsHavePublishedLevelsAndSplittings() {
        // p² − 5x² + x⁴ and p² − 10x² + x⁴: Banerjee and Bhatnagar, Phys. Rev. D 18 (1978) 4767; Balsa, Plo, Esteve and
        // Pacheco, Phys. Rev. D 28
        // (1983) 1945.
        Levels shallow = ofTwice(0, 0, -5, 0, 1);
        assertTwice(-3.41014276123982948, 4e-16, shallow, 0);
        assertEquals(0.159467398951, 2 * shallow.splitting(0), 5e-13);
        Levels deep = ofTwice(0, 0, -10, 0, 1);
        assertTwice(-20.6335767029477991, 4e-15, deep, 0);
        assertEquals(0.0000298185428881, 2 * deep.splitting(0), 5e-17);
        assertTrue(deep.splittingBound(0).size() <= 1e-10 * deep.splitting(0));
    }

    @Test
    void splittingFarBelowRoundingComesOutToTenDigits() {
        // p² − 25x² + x⁴: own recomputation with 60 digits in an oscillator basis (see splitting_reference.py).
        Levels levels = ofTwice(0, 0, -25, 0, 1);
        double splitting = 2 * levels.splitting(0);
        assertEquals(SPLITTING_25, splitting, 1e-10 * SPLITTING_25);
        assertTrue(2 * levels.splittingBound(0).size() >= Math.abs(splitting - SPLITTING_25));
    }

    private static final double SPLITTING_25 = 7.56380675527971e-24;

    @Test
    void levelsOneThousandAndFiftyAreOurOwnRecomputation() {
        // p²/2 + x⁴ in an oscillator basis with 64-bit mantissas: our own recomputation.
        Levels quartic = Levels.polynomial(0, 0, 0, 0, 1);
        assertEquals(13774.252002055304, quartic.energyHigh(1000), 4e-12 + quartic.energyError(1000));
        assertEquals(250.18335869707518736, quartic.energyHigh(49), quartic.energyError(49));
        double[] list = quartic.energies(0, 50);
        for (int n = 0; n < 50; n++) {
            assertEquals(quartic.energyHigh(n), list[n], 1e-13 * list[n]);
        }
    }

    @Test
    void harmonicPolynomialHasHarmonicLevels() {
        Levels levels = Levels.polynomial(3, 1, 0.5);
        for (int n = 0; n < 20; n++) {
            assertEquals(n + 3.0, levels.energyHigh(n), levels.energyError(n));
        }
    }

    @Test
    void boundsStayTrueWhenTheWellIsMoved() {
        // (x − 10)⁴ written out.
        Levels moved = Levels.polynomial(1e4, -4e3, 600, -40, 1);
        Levels still = Levels.polynomial(0, 0, 0, 0, 1);
        for (int n = 0; n < 16; n++) {
            assertEquals(still.energyHigh(n), moved.energyHigh(n), still.energyError(n) + moved.energyError(n));
            assertTrue(moved.energyBound(n).isGuaranteed());
        }
    }

    @Test
    void basisAndShootingAgreeWithinTheSumOfTheirBoundsOnRandomPolynomials() {
        Random random = new Random(20);
        for (int trial = 0; trial < 12; trial++) {
            int degree = 4 + 2 * random.nextInt(3);
            double[] c = new double[degree + 1];
            boolean even = trial % 2 == 0;
            for (int k = 1; k < degree; k++) {
                c[k] = even && k % 2 == 1 ? 0 : random.nextGaussian();
            }
            c[degree] = 0.1 + random.nextDouble();
            Polynomial polynomial = new Polynomial(c);
            Levels basis = Levels.polynomial(c);
            Levels shot = Levels.of(
                    even
                            ? Curves.even(polynomial::value)
                            : Curves.open(x -> {
                                double v = polynomial.value(x);
                                return Double.isNaN(v) ? Double.POSITIVE_INFINITY : v;
                            }));
            for (int n = 0; n < 20; n += 1 + n / 4) {
                double sum = basis.energyError(n) + shot.energyError(n);
                assertEquals(basis.energyHigh(n), shot.energyHigh(n), sum, "trial " + trial + ", level " + n);
                assertTrue(basis.energyBound(n).isGuaranteed(), "trial " + trial + ", level " + n);
            }
        }
    }

    @Test
    void elementsObeyTheCommutatorAndTheEquationOfMotion() {
        Levels levels = Levels.polynomial(0, 0.3, -1, 0.2, 0.5);
        long[] list = new long[40];
        for (int i = 0; i < list.length; i++) {
            list[i] = i;
        }
        Elements table = levels.elements(list);
        for (int i = 0; i < 6; i++) {
            double commutator = 0;
            for (int k = 0; k < 40; k++) {
                commutator += 2 * table.position(i, k) * table.momentum(k, i);
            }
            // x p − p x = i: −i (i A) summed; the sum over 40 levels is complete to 1e-12 for the lowest six.
            assertEquals(1, commutator, 1e-10);
            for (int j = 0; j < i; j++) {
                double moved = (levels.energyHigh(i) - levels.energyHigh(j)) * table.position(i, j);
                assertEquals(moved, table.momentum(i, j), 20 * table.positionError() + table.momentumError());
            }
        }
    }

    @Test
    void elementsAndWavesOfTheBasisAgreeWithThoseOfShooting() {
        Levels basis = Levels.polynomial(0, 0.1, 0.2, 0, 1);
        Levels shot = Levels.of(Curves.open(x -> 0.1 * x + 0.2 * x * x + x * x * x * x));
        long[] list = {0, 1, 2, 5, 9};
        Elements a = basis.elements(list);
        Elements b = shot.elements(list);
        for (int i = 0; i < list.length; i++) {
            for (int j = 0; j < list.length; j++) {
                assertEquals(a.position(i, j), b.position(i, j), a.positionError() + b.positionError());
                assertEquals(a.momentum(i, j), b.momentum(i, j), a.momentumError() + b.momentumError());
                assertEquals(
                        a.positionSquared(i, j),
                        b.positionSquared(i, j),
                        a.positionSquaredError() + b.positionSquaredError());
                assertEquals(
                        a.momentumSquared(i, j),
                        b.momentumSquared(i, j),
                        a.momentumSquaredError() + b.momentumSquaredError());
            }
        }
        double[] x = {-2.5, -1, -0.2, 0, 0.7, 1.9};
        double[][] one = basis.waveFunctions(0, 10, x);
        double[][] two = shot.waveFunctions(0, 10, x);
        double error = basis.waveFunctionError(9) + shot.waveFunctionError(9);
        assertTrue(error < 1e-10);
        for (int n = 0; n < 10; n++) {
            for (int i = 0; i < x.length; i++) {
                assertEquals(one[n][i], two[n][i], error);
            }
        }
    }

    @Test
    void polynomialsThatDoNotConfineAreRefused() {
        assertThrows(IllegalArgumentException.class, () -> Levels.polynomial(0, 0, 0, 1));
        assertThrows(IllegalArgumentException.class, () -> Levels.polynomial(0, 0, 0, 0, -1));
        assertThrows(IllegalArgumentException.class, () -> Levels.polynomial(1, 1));
        assertThrows(IllegalArgumentException.class, () -> Levels.polynomial(0, 0, Double.NaN));
    }

    @Test
    void anInterruptEndsTheWork() {
        Thread.currentThread().interrupt();
        assertThrows(
                CancellationException.class,
                () -> Levels.polynomial(0, 0, 0, 0, 1).energies(0, 120));
    }
}
