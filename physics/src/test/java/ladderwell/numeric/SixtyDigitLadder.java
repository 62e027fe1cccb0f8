package ladderwell.numeric;

import java.math.BigDecimal;
import java.math.MathContext;
import java.math.RoundingMode;

/**
 * phi_n(x) to some fifty digits by the three-term recurrence in 60-digit decimals. With phi_n = s_n p_n and s_{n+1} = sqrt(n/(n+1)) s_{n-1}
 * the recurrence is p_{n+1} = a_n x p_n - p_{n-1}, a_0 = a_1 = sqrt 2, a_{n+1} = n/(n+1) a_{n-1}, s_n = sqrt(a_n/sqrt 2): one square root
 * for each value asked for, none in the loop.
 */
final class SixtyDigitLadder {
    static final MathContext DIGITS = new MathContext(60, RoundingMode.HALF_EVEN);
    /** pi to 64 digits (common knowledge). */
    private static final BigDecimal PI =
            new BigDecimal("3.141592653589793238462643383279502884197169399375105820974944592");

    private static final BigDecimal ROOT_2 = BigDecimal.valueOf(2).sqrt(DIGITS);

    private final BigDecimal x;
    private final BigDecimal ground;
    private final BigDecimal[] factor = {ROOT_2, ROOT_2};
    private BigDecimal previous = BigDecimal.ZERO;
    private BigDecimal current = BigDecimal.ONE;
    private int n = 0;

    SixtyDigitLadder(double position) {
        x = new BigDecimal(position);
        BigDecimal gauss = exponential(x.multiply(x).divide(BigDecimal.valueOf(-2)));
        ground = gauss.divide(PI.sqrt(DIGITS).sqrt(DIGITS), DIGITS);
    }

    /** phi at a level not below the last one asked for. */
    BigDecimal at(int level) {
        while (n < level) {
            BigDecimal a = factor[n & 1];
            BigDecimal next = a.multiply(x, DIGITS).multiply(current, DIGITS).subtract(previous, DIGITS);
            previous = current;
            current = next;
            factor[n & 1] = a.multiply(BigDecimal.valueOf(n + 1L)).divide(BigDecimal.valueOf(n + 2L), DIGITS);
            n++;
        }
        BigDecimal scale = factor[n & 1].divide(ROOT_2, DIGITS).sqrt(DIGITS);
        return current.multiply(scale, DIGITS).multiply(ground, DIGITS);
    }

    private static BigDecimal exponential(BigDecimal y) {
        // exp(y) = exp(y/2^k)^(2^k) by the power series; guard digits for the squarings.
        MathContext wide = new MathContext(90);
        int halvings = Math.max(0, y.precision() - y.scale()) * 4 + 8;
        BigDecimal small = y.divide(BigDecimal.valueOf(2).pow(halvings), wide);
        BigDecimal sum = BigDecimal.ONE;
        BigDecimal term = BigDecimal.ONE;
        for (int k = 1; k < 60; k++) {
            term = term.multiply(small, wide).divide(BigDecimal.valueOf(k), wide);
            sum = sum.add(term, wide);
        }
        for (int k = 0; k < halvings; k++) {
            sum = sum.multiply(sum, wide);
        }
        return sum;
    }
}
