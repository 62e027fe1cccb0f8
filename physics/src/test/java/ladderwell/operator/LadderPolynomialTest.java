package ladderwell.operator;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.math.BigDecimal;
import java.math.BigInteger;
import java.math.MathContext;
import java.util.SplittableRandom;
import ladderwell.numeric.DoubleDouble;
import org.junit.jupiter.api.Test;

class LadderPolynomialTest {
    private static final LadderPolynomial A = LadderPolynomial.a();
    private static final LadderPolynomial AD = LadderPolynomial.adagger();
    private static final LadderPolynomial N = LadderPolynomial.number();
    private static final LadderPolynomial X = LadderPolynomial.position();
    private static final LadderPolynomial P = LadderPolynomial.momentum();
    private static final LadderPolynomial ONE = LadderPolynomial.constant(1, 0);

    /** Plain matrix products of some 40 levels lose a few hundred roundings. */
    private static final double DENSE = 1e-12;

    private static LadderPolynomial random(SplittableRandom random, int degree) {
        LadderPolynomial sum = LadderPolynomial.zero();
        for (int j = 0; j <= degree; j++) {
            for (int k = 0; j + k <= degree; k++) {
                if (random.nextInt(3) > 0) {
                    sum = sum.plus(LadderPolynomial.term(j, k, random.nextDouble(-1, 1), random.nextDouble(-1, 1)));
                }
            }
        }
        return sum;
    }

    @Test
    void commutatorOfLoweringAndRaisingIsOne() {
        assertEquals(ONE, A.commutator(AD));
        assertEquals(A.times(-1), N.commutator(A));
        assertEquals(AD.power(2).times(2), N.commutator(AD.power(2)));
    }

    @Test
    void positionAndMomentumAreWhatTheyAreWithoutATraceOfRounding() {
        LadderPolynomial commutator = X.commutator(P);
        assertEquals(0, commutator.re(0, 0));
        assertEquals(1, commutator.im(0, 0));
        LadderPolynomial energy = X.power(2).plus(P.power(2)).times(0.5);
        assertEquals(1, energy.re(1, 1));
        assertEquals(0.5, energy.re(0, 0));
        assertEquals(0, energy.re(2, 0), 1e-31);
        // x⁴ in normal order: (a† + a)⁴ = Σ with contractions, 1/4 of 1, 4, 6 and 6, 12, 3
        LadderPolynomial quartic = X.power(4);
        assertEquals(0.25, quartic.re(4, 0));
        assertEquals(1, quartic.re(3, 1));
        assertEquals(1.5, quartic.re(2, 2));
        assertEquals(1.5, quartic.re(2, 0));
        assertEquals(3, quartic.re(1, 1));
        assertEquals(0.75, quartic.re(0, 0));
        assertEquals(4, quartic.degree());
        assertEquals(4, quartic.bandwidth());
    }

    @Test
    void powersOfTheNumberOperatorAreStirlingNumbers() {
        // n^k = Σ S(k, j) a†^j a^j with the Stirling numbers of the second kind, here by their own recurrence in whole
        // numbers
        BigInteger[] stirling = {BigInteger.ONE};
        LadderPolynomial power = ONE;
        for (int k = 1; k <= 24; k++) {
            BigInteger[] next = new BigInteger[k + 1];
            for (int j = 0; j <= k; j++) {
                BigInteger sum = j < k ? stirling[j].multiply(BigInteger.valueOf(j)) : BigInteger.ZERO;
                next[j] = j > 0 ? sum.add(stirling[j - 1]) : sum;
            }
            stirling = next;
            power = power.times(N);
            for (int j = 0; j <= k; j++) {
                BigDecimal full = new BigDecimal(power.fullRe(j, j).hi())
                        .add(new BigDecimal(power.fullRe(j, j).lo()));
                assertEquals(0, full.compareTo(new BigDecimal(stirling[j])), "S(" + k + "," + j + ")");
            }
        }
    }

    @Test
    void normalOrderOfHighPowersKeepsWholeNumbers() {
        // a^12 a†^12 = Σ s! C(12,s)² a†^(12−s) a^(12−s)
        LadderPolynomial product = A.power(12).times(AD.power(12));
        BigInteger expected = BigInteger.ONE;
        for (int s = 0; s <= 12; s++) {
            assertEquals(expected.doubleValue(), product.re(12 - s, 12 - s));
            expected = expected.multiply(BigInteger.valueOf((long) (12 - s) * (12 - s)))
                    .divide(BigInteger.valueOf(s + 1));
        }
        // a^24 a†^24 on the vacuum: 24! lies far beyond 2^53 and is the nearest double
        BigInteger factorial = BigInteger.ONE;
        for (int i = 2; i <= 24; i++) {
            factorial = factorial.multiply(BigInteger.valueOf(i));
        }
        assertEquals(factorial.doubleValue(), A.power(24).times(AD.power(24)).re(0, 0));
    }

    @Test
    void productsSumsAndAdjointsAgreeWithDenseMatrices() {
        SplittableRandom random = new SplittableRandom(20261201);
        int size = 30;
        for (int trial = 0; trial < 40; trial++) {
            LadderPolynomial p = random(random, 1 + random.nextInt(4));
            LadderPolynomial q = random(random, 1 + random.nextInt(4));
            DenseOperators dp = DenseOperators.of(p, size);
            DenseOperators dq = DenseOperators.of(q, size);
            int corner = size - p.degree() - q.degree();
            assertTrue(dp.times(dq).distance(DenseOperators.of(p.times(q), size), corner) < DENSE);
            assertTrue(dp.plus(dq, -1, 0).distance(DenseOperators.of(p.minus(q), size), corner) < DENSE);
            assertTrue(dp.adjoint().distance(DenseOperators.of(p.adjoint(), size), corner) < DENSE);
            assertTrue(dp.times(dq).plus(dq.times(dp), -1, 0).distance(DenseOperators.of(p.commutator(q), size), corner)
                    < DENSE);
        }
    }

    @Test
    void matrixElementsAgreeWithDenseMatrices() {
        SplittableRandom random = new SplittableRandom(7);
        int size = 24;
        for (int trial = 0; trial < 20; trial++) {
            LadderPolynomial p = random(random, 5);
            DenseOperators dense = DenseOperators.of(p, size);
            DenseOperators elements = new DenseOperators(size);
            for (int m = 0; m < size; m++) {
                for (int n = 0; n < size; n++) {
                    elements.re[m][n] = p.elementRe(m, n);
                    elements.im[m][n] = p.elementIm(m, n);
                }
            }
            assertTrue(dense.distance(elements, size) < DENSE);
        }
    }

    @Test
    void bandsAreTheElementsOnTheirDiagonal() {
        LadderPolynomial p = random(new SplittableRandom(3), 6);
        for (int d = -7; d <= 7; d++) {
            double[] re = new double[9];
            double[] im = new double[9];
            p.band(d, 2, re, im);
            for (int i = 0; i < 9; i++) {
                int m = 2 + i + d;
                assertEquals(m < 0 ? 0 : p.elementRe(m, 2 + i), re[i]);
                assertEquals(m < 0 ? 0 : p.elementIm(m, 2 + i), im[i]);
            }
        }
    }

    @Test
    void differencesOfLargeTermsKeepTheirDigitsAtHighLevels() {
        long n0 = 10_000_000_000L;
        LadderPolynomial p = N.minus(LadderPolynomial.constant(n0, 0)).power(2);
        assertEquals(49, p.elementRe(n0 + 7, n0 + 7));
        // ⟨n+2|a†² (n − n₀)|n⟩ against exact arithmetic
        LadderPolynomial q = AD.power(2).times(N.minus(LadderPolynomial.constant(n0, 0)));
        long n = n0 + 3;
        double expected = new BigDecimal(n + 1)
                .multiply(new BigDecimal(n + 2))
                .sqrt(MathContext.DECIMAL64)
                .multiply(new BigDecimal(3))
                .doubleValue();
        assertEquals(expected, q.elementRe(n + 2, n), 3 * Math.ulp(expected));
    }

    @Test
    void shiftingAgreesWithSubstitution() {
        SplittableRandom random = new SplittableRandom(11);
        for (int trial = 0; trial < 30; trial++) {
            LadderPolynomial p = random(random, 4);
            double re = random.nextDouble(-3, 3);
            double im = random.nextDouble(-3, 3);
            LadderPolynomial lowering = A.plus(LadderPolynomial.constant(re, im));
            LadderPolynomial expected = substituted(p, lowering);
            LadderPolynomial gap = p.shifted(re, im).minus(expected);
            assertTrue(gap.norm() < 1e-28 * expected.norm(), () -> "gap " + gap);
        }
    }

    @Test
    void shiftingByALargeDisplacementKeepsTheSmallTerms() {
        // (K/2) a†² a² about α: the linear term is K |α|² α, the detuning 2 K |α|², the Kerr term K/2, at 1e10 quanta
        DoubleDouble alpha = DoubleDouble.sum(1e5, 1e-13);
        LadderPolynomial shifted = LadderPolynomial.term(2, 2, 0.5e-10, 0).shifted(alpha, DoubleDouble.ZERO);
        assertEquals(0.5e-10, shifted.re(2, 2));
        DoubleDouble detuning = DoubleDouble.of(0.5e-10).times(4).times(alpha).times(alpha);
        assertEquals(detuning.hi(), shifted.re(1, 1));
        assertEquals(detuning.lo(), shifted.fullRe(1, 1).lo(), 1e-30);
        assertTrue(shifted.isHermitian());
    }

    @Test
    void mixingAgreesWithSubstitutionAndUndoesItself() {
        SplittableRandom random = new SplittableRandom(13);
        for (int trial = 0; trial < 30; trial++) {
            LadderPolynomial p = random(random, 4);
            double r = random.nextDouble(0, 1.5);
            double phi = random.nextDouble(0, 6);
            double theta = random.nextDouble(0, 6);
            double uRe = Math.cosh(r) * Math.cos(theta);
            double uIm = Math.cosh(r) * Math.sin(theta);
            double vRe = Math.sinh(r) * Math.cos(phi);
            double vIm = Math.sinh(r) * Math.sin(phi);
            LadderPolynomial mixed = p.mixed(uRe, uIm, vRe, vIm);
            LadderPolynomial lowering =
                    LadderPolynomial.term(0, 1, uRe, uIm).plus(LadderPolynomial.term(1, 0, vRe, vIm));
            assertTrue(mixed.minus(substituted(p, lowering)).norm() < 1e-28 * mixed.norm());
            // the inverse is a → u* a − v a†; u and v are rounded, which grows with the mixing
            LadderPolynomial back = mixed.mixed(uRe, -uIm, -vRe, -vIm);
            assertTrue(back.minus(p).norm() < 1e-13 * mixed.norm());
        }
    }

    private static LadderPolynomial substituted(LadderPolynomial p, LadderPolynomial lowering) {
        LadderPolynomial sum = LadderPolynomial.zero();
        for (int j = 0; j <= p.raisingDegree(); j++) {
            for (int k = 0; k <= p.loweringDegree(); k++) {
                LadderPolynomial term = lowering.adjoint().power(j).times(lowering.power(k));
                sum = sum.plus(term.times(p.re(j, k), p.im(j, k)));
            }
        }
        return sum;
    }

    @Test
    void hermiticityIsCheckedAndItsBreakNamed() {
        assertTrue(X.power(3).plus(P.power(4)).plus(N).isHermitian());
        assertTrue(X.times(P).plus(P.times(X)).isHermitian());
        assertFalse(X.times(P).isHermitian());
        assertEquals(
                "the term 0.5i needs a real factor",
                X.times(P).hermiticityBreak().orElseThrow());
        assertEquals(
                "the term 2 a needs its mirror 2 a†, found 0",
                N.plus(A.times(2)).hermiticityBreak().orElseThrow());
        assertEquals(
                "the term 0.5i a† a² needs its mirror −0.5i a†² a, found 0.25i a†² a",
                N.plus(LadderPolynomial.term(1, 2, 0, 0.5))
                        .plus(LadderPolynomial.term(2, 1, 0, 0.25))
                        .hermiticityBreak()
                        .orElseThrow());
        assertTrue(A.plus(N).hermitianPart().isHermitian());
    }

    @Test
    void degreesTellTheBand() {
        LadderPolynomial p = LadderPolynomial.term(3, 1, 1, 0).plus(LadderPolynomial.term(0, 1, 0, 1));
        assertEquals(4, p.degree());
        assertEquals(2, p.raises());
        assertEquals(1, p.lowers());
        assertEquals(2, p.bandwidth());
        assertEquals(3, p.raisingDegree());
        assertEquals(1, p.loweringDegree());
        assertEquals(0, p.minus(p).degree());
        assertTrue(p.minus(p).isZero());
    }

    @Test
    void readsAsOnTheBoard() {
        assertEquals("0", LadderPolynomial.zero().toString());
        assertEquals("a† a", N.toString());
        assertEquals(
                "0.5 a†² a² − 3 a† + (1 − 2i) a + i",
                LadderPolynomial.term(2, 2, 0.5, 0)
                        .plus(AD.times(-3))
                        .plus(A.times(1, -2))
                        .plus(LadderPolynomial.constant(0, 1))
                        .toString());
        assertEquals("a†¹² a", LadderPolynomial.term(12, 1, 1, 0).toString());
    }

    @Test
    void badNumbersAndExponentsAreRefused() {
        assertThrows(IllegalArgumentException.class, () -> LadderPolynomial.constant(Double.NaN, 0));
        assertThrows(IllegalArgumentException.class, () -> A.times(Double.POSITIVE_INFINITY));
        assertThrows(IllegalArgumentException.class, () -> LadderPolynomial.term(-1, 0, 1, 0));
        assertThrows(IllegalArgumentException.class, () -> A.power(-1));
        assertThrows(IllegalArgumentException.class, () -> N.mixed(2, 0, 1, 0));
        assertThrows(IllegalArgumentException.class, () -> N.elementRe(-1, 0));
        IllegalArgumentException tooHigh = assertThrows(IllegalArgumentException.class, () -> N.power(33));
        assertEquals("operators are carried up to degree 64 in a and a†, this one has degree 66", tooHigh.getMessage());
    }
}
