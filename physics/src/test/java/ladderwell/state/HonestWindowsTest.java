package ladderwell.state;

import static org.junit.jupiter.api.Assertions.assertTrue;

import java.math.BigDecimal;
import java.math.MathContext;
import java.util.Arrays;
import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

/** Errors told by squeezed and displaced number states against amplitudes in 60 digits, from level 0 up. */
class HonestWindowsTest {
    private static final MathContext DIGITS = FiftyDigits.DIGITS;

    private static BigDecimal big(double x) {
        return new BigDecimal(x);
    }

    private static final BigDecimal[] ROOTS = new BigDecimal[1700];

    private static BigDecimal root(int n) {
        if (ROOTS[n] == null) {
            ROOTS[n] = BigDecimal.valueOf(n).sqrt(DIGITS);
        }
        return ROOTS[n];
    }

    /** Levels for the reference: twice as far as a window of tolerance 1e-13 reaches; what lies beyond is below 1e-20. */
    private static int reach(Amplitudes tight) {
        return (int) Math.min(1600, 2 * (tight.first(0) + tight.length(0)) + 60);
    }

    private static double distance(BigDecimal[][] exact, Amplitudes state) {
        BigDecimal sum = BigDecimal.ZERO;
        for (int n = 0; n < exact[0].length; n++) {
            int i = (int) (n - state.first(0));
            boolean kept = i >= 0 && i < state.length(0);
            BigDecimal re = exact[0][n].subtract(kept ? big(state.re(0, i)) : BigDecimal.ZERO, DIGITS);
            BigDecimal im = exact[1][n].subtract(kept ? big(state.im(0, i)) : BigDecimal.ZERO, DIGITS);
            sum = sum.add(re.multiply(re, DIGITS), DIGITS).add(im.multiply(im, DIGITS), DIGITS);
        }
        return Math.sqrt(sum.doubleValue());
    }

    /** μ √(n+1) c_{n+1} = β c_n − ν √n c_{n−1} from c_0 = e^{−(α² + α*² e^{iφ} tanh r)/2}/√cosh r (Yuen 1976), α = √mean > 0. */
    private static BigDecimal[][] squeezed(double mean, double r, double phi, int size) {
        BigDecimal up = FiftyDigits.exp(big(r));
        BigDecimal down = BigDecimal.ONE.divide(up, DIGITS);
        BigDecimal two = BigDecimal.valueOf(2);
        BigDecimal cosh = up.add(down).divide(two, DIGITS);
        BigDecimal sinh = up.subtract(down).divide(two, DIGITS);
        BigDecimal[] turn = FiftyDigits.cosSin(big(phi));
        BigDecimal nuRe = sinh.multiply(turn[0], DIGITS);
        BigDecimal nuIm = sinh.multiply(turn[1], DIGITS);
        BigDecimal alpha = big(mean).sqrt(DIGITS);
        BigDecimal betaRe = alpha.multiply(cosh.add(nuRe), DIGITS);
        BigDecimal betaIm = alpha.multiply(nuIm, DIGITS);
        BigDecimal tanh = sinh.divide(cosh, DIGITS);
        BigDecimal half = big(mean).divide(two, DIGITS);
        BigDecimal size0 = FiftyDigits.exp(half.add(half.multiply(tanh, DIGITS).multiply(turn[0], DIGITS))
                        .negate())
                .divide(cosh.sqrt(DIGITS), DIGITS);
        BigDecimal[] phase = FiftyDigits.cosSin(
                half.multiply(tanh, DIGITS).multiply(turn[1], DIGITS).negate());
        BigDecimal[][] c = new BigDecimal[2][size];
        c[0][0] = size0.multiply(phase[0], DIGITS);
        c[1][0] = size0.multiply(phase[1], DIGITS);
        BigDecimal beforeRe = BigDecimal.ZERO;
        BigDecimal beforeIm = BigDecimal.ZERO;
        for (int n = 0; n + 1 < size; n++) {
            BigDecimal s = root(n);
            BigDecimal divisor = cosh.multiply(root(n + 1), DIGITS);
            BigDecimal re = betaRe.multiply(c[0][n], DIGITS)
                    .subtract(betaIm.multiply(c[1][n], DIGITS))
                    .subtract(s.multiply(
                            nuRe.multiply(beforeRe, DIGITS).subtract(nuIm.multiply(beforeIm, DIGITS)), DIGITS));
            BigDecimal im = betaRe.multiply(c[1][n], DIGITS)
                    .add(betaIm.multiply(c[0][n], DIGITS))
                    .subtract(s.multiply(nuRe.multiply(beforeIm, DIGITS).add(nuIm.multiply(beforeRe, DIGITS)), DIGITS));
            beforeRe = c[0][n];
            beforeIm = c[1][n];
            c[0][n + 1] = re.divide(divisor, DIGITS);
            c[1][n + 1] = im.divide(divisor, DIGITS);
        }
        return c;
    }

    @Test
    void squeezedStatesAreWithinTheirErrors() {
        SplittableRandom random = new SplittableRandom(60);
        for (int trial = 0; trial < 60; trial++) {
            double mean = trial % 6 == 0 ? 0 : Math.pow(10, random.nextDouble(-3, 2.3));
            double r = random.nextDouble(0, 1.4);
            double phi = random.nextDouble(-3, 3);
            double tolerance = Math.pow(10, random.nextDouble(-13, -1.5));
            Amplitudes state = HarmonicStates.displacedSqueezed(mean, 0, r, phi, tolerance);
            Amplitudes tight = HarmonicStates.displacedSqueezed(mean, 0, r, phi, 1e-13);
            double gap = distance(squeezed(mean, r, phi, reach(tight)), state);
            assertTrue(
                    gap <= state.normError(),
                    "mean " + mean + ", r " + r + ", φ " + phi + ": off by " + gap + ", told " + state.normError());
            assertTrue(state.normError() <= tolerance);
        }
    }

    @Test
    void displacedNumberStatesAreWithinTheirErrors() {
        SplittableRandom random = new SplittableRandom(61);
        for (int trial = 0; trial < 40; trial++) {
            double mean = Math.pow(10, random.nextDouble(-4, 2.3));
            int level = random.nextInt(12);
            double tolerance = Math.pow(10, random.nextDouble(-13, -1.5));
            Amplitudes state = HarmonicStates.displacedNumber(level, mean, 0, tolerance);
            Amplitudes tight = HarmonicStates.displacedNumber(level, mean, 0, 1e-13);
            // coherent amplitudes, then (a† − α)/√m, m times
            BigDecimal alpha = big(mean).sqrt(DIGITS);
            BigDecimal[] c = new BigDecimal[reach(tight)];
            c[0] = FiftyDigits.exp(big(mean).divide(BigDecimal.valueOf(-2), DIGITS));
            for (int n = 1; n < c.length; n++) {
                c[n] = c[n - 1].multiply(alpha, DIGITS).divide(root(n), DIGITS);
            }
            for (int m = 1; m <= level; m++) {
                BigDecimal[] raised = new BigDecimal[c.length];
                for (int n = 0; n < c.length; n++) {
                    BigDecimal up = n == 0 ? BigDecimal.ZERO : root(n).multiply(c[n - 1], DIGITS);
                    raised[n] = up.subtract(alpha.multiply(c[n], DIGITS)).divide(root(m), DIGITS);
                }
                c = raised;
            }
            BigDecimal[] zero = new BigDecimal[c.length];
            Arrays.fill(zero, BigDecimal.ZERO);
            double gap = distance(new BigDecimal[][] {c, zero}, state);
            assertTrue(
                    gap <= state.normError(),
                    "level " + level + ", mean " + mean + ": off by " + gap + ", told " + state.normError());
            assertTrue(state.normError() <= tolerance);
        }
    }
}
