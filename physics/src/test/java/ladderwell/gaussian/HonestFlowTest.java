package ladderwell.gaussian;

import static org.junit.jupiter.api.Assertions.assertTrue;

import java.math.BigDecimal;
import java.math.MathContext;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.SplittableRandom;
import ladderwell.mode.Jump;
import ladderwell.mode.Rate;
import ladderwell.operator.LadderPolynomial;
import ladderwell.operator.OperatorFormula;
import org.junit.jupiter.api.Test;

/** Guaranteed bounds of the flow of constant systems against block exponentials in 70 digits (Van Loan 1978). */
class HonestFlowTest {
    private static final MathContext DIGITS = new MathContext(70);

    private static BigDecimal[][] matrix(int size) {
        BigDecimal[][] m = new BigDecimal[size][size];
        for (BigDecimal[] row : m) {
            Arrays.fill(row, BigDecimal.ZERO);
        }
        return m;
    }

    private static BigDecimal[][] times(BigDecimal[][] a, BigDecimal[][] b) {
        BigDecimal[][] c = matrix(a.length);
        for (int i = 0; i < a.length; i++) {
            for (int j = 0; j < a.length; j++) {
                for (int k = 0; k < a.length; k++) {
                    c[i][j] = c[i][j].add(a[i][k].multiply(b[k][j], DIGITS), DIGITS);
                }
            }
        }
        return c;
    }

    private static BigDecimal[][] exponential(BigDecimal[][] a, double t) {
        int halvings = 12;
        BigDecimal scale = new BigDecimal(t).divide(new BigDecimal(1 << halvings), DIGITS);
        BigDecimal[][] sum = matrix(a.length);
        BigDecimal[][] term = matrix(a.length);
        for (int i = 0; i < a.length; i++) {
            sum[i][i] = BigDecimal.ONE;
            term[i][i] = BigDecimal.ONE;
        }
        for (int k = 1; k < 40; k++) {
            term = times(term, a);
            for (BigDecimal[] row : term) {
                for (int j = 0; j < row.length; j++) {
                    row[j] = row[j].multiply(scale, DIGITS).divide(BigDecimal.valueOf(k), DIGITS);
                }
            }
            for (int i = 0; i < a.length; i++) {
                for (int j = 0; j < a.length; j++) {
                    sum[i][j] = sum[i][j].add(term[i][j], DIGITS);
                }
            }
        }
        for (int k = 0; k < halvings; k++) {
            sum = times(sum, sum);
        }
        return sum;
    }

    private static double gap(BigDecimal exact, double value) {
        return exact.subtract(new BigDecimal(value)).doubleValue();
    }

    @Test
    void exactFlowsAreWithinTheirGuaranteedBounds() {
        SplittableRandom random = new SplittableRandom(70);
        double tightest = 0;
        for (int trial = 0; trial < 150; trial++) {
            LadderPolynomial half = LadderPolynomial.term(
                            2, 0, random.nextDouble(-0.4, 0.4), random.nextDouble(-0.4, 0.4))
                    .plus(LadderPolynomial.term(1, 0, random.nextDouble(-2, 2), random.nextDouble(-2, 2)));
            // some of them free particles, where nothing turns back
            LadderPolynomial h = trial % 10 == 0
                    ? LadderPolynomial.momentum().power(2).times(0.5)
                    : LadderPolynomial.number()
                            .times(random.nextDouble(-2, 2))
                            .plus(half)
                            .plus(half.adjoint());
            List<Jump> jumps = new ArrayList<>();
            if (trial % 3 > 0) {
                jumps.addAll(Jump.bath(Rate.natural(random.nextDouble(0, 1)), random.nextDouble(0, 2)));
            }
            if (trial % 4 == 0) {
                jumps.add(Jump.gain(Rate.natural(random.nextDouble(0, 0.3))));
            }
            double t = Math.pow(10, random.nextDouble(-3, 1.3));
            GaussianState start = GaussianState.thermal(random.nextDouble(0, 2))
                    .squeezed(random.nextDouble(0, 1), random.nextDouble(-3, 3))
                    .displaced(random.nextDouble(-5, 5), random.nextDouble(-5, 5));
            OperatorFormula formula = OperatorFormula.of(h);
            GaussianPoint point = GaussianFlow.of(formula, jumps).at(start, t, 1e-12);

            Drift drift = new Drift(formula, jumps);
            double[] at = new double[Drift.SIZE];
            drift.at(0, at);
            BigDecimal g = new BigDecimal(drift.damping).divide(BigDecimal.valueOf(2), DIGITS);
            BigDecimal[][] a = matrix(2);
            a[0][0] = new BigDecimal(at[0]).subtract(g, DIGITS);
            a[0][1] = new BigDecimal(at[1]);
            a[1][0] = new BigDecimal(at[2]);
            a[1][1] = new BigDecimal(at[0]).negate().subtract(g, DIGITS);
            // exp [[A, b], [0, 0]] t
            BigDecimal[][] mean = matrix(3);
            // exp [[−A, D], [0, Aᵀ]] t = [[·, G], [0, F]], N = Fᵀ G
            BigDecimal[][] block = matrix(4);
            double[][] noise = {{drift.noiseXx, drift.noiseXp}, {drift.noiseXp, drift.noisePp}};
            for (int i = 0; i < 2; i++) {
                mean[i][2] = new BigDecimal(at[3 + i]);
                for (int j = 0; j < 2; j++) {
                    mean[i][j] = a[i][j];
                    block[i][j] = a[i][j].negate();
                    block[i][2 + j] = new BigDecimal(noise[i][j]);
                    block[2 + i][2 + j] = a[j][i];
                }
            }
            BigDecimal[][] flow = exponential(mean, t);
            BigDecimal[][] blocks = exponential(block, t);
            double[] r = {start.x(), start.p()};
            double[][] v = {{start.xx(), start.xp()}, {start.xp(), start.pp()}};
            double[] got = {point.state().x(), point.state().p()};
            double[][] gotV = {
                {point.state().xx(), point.state().xp()},
                {point.state().xp(), point.state().pp()}
            };
            double meanGap = 0;
            double covarianceGap = 0;
            for (int i = 0; i < 2; i++) {
                BigDecimal x = flow[i][2];
                for (int k = 0; k < 2; k++) {
                    x = x.add(flow[i][k].multiply(new BigDecimal(r[k]), DIGITS), DIGITS);
                }
                meanGap = Math.hypot(meanGap, gap(x, got[i]));
                for (int j = 0; j < 2; j++) {
                    BigDecimal sum = BigDecimal.ZERO;
                    for (int k = 0; k < 2; k++) {
                        sum = sum.add(blocks[2 + k][2 + i].multiply(blocks[k][2 + j], DIGITS), DIGITS);
                        for (int l = 0; l < 2; l++) {
                            sum = sum.add(
                                    flow[i][k]
                                            .multiply(new BigDecimal(v[k][l]), DIGITS)
                                            .multiply(flow[j][l], DIGITS),
                                    DIGITS);
                        }
                    }
                    covarianceGap = Math.hypot(covarianceGap, gap(sum, gotV[i][j]));
                }
            }
            assertTrue(
                    point.meanError().isGuaranteed() && point.covarianceError().isGuaranteed());
            double meanBound = point.meanError().size();
            double covarianceBound = point.covarianceError().size();
            assertTrue(meanGap <= meanBound, "trial " + trial + ": mean off by " + meanGap + ", bound " + meanBound);
            assertTrue(
                    covarianceGap <= covarianceBound,
                    "trial " + trial + ": covariance off by " + covarianceGap + ", bound " + covarianceBound);
            tightest = Math.max(tightest, covarianceGap / covarianceBound);
        }
        // bounds within two orders of the worst case: not so wide that they say nothing
        assertTrue(tightest > 0.01, "at best " + tightest);
    }
}
