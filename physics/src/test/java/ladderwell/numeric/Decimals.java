package ladderwell.numeric;

import java.math.BigDecimal;
import java.math.BigInteger;
import java.math.MathContext;
import java.math.RoundingMode;

/** Reference arithmetic to 60 digits after the point; slow and simple, for tests only. */
public final class Decimals {
    /** Digits after the point that results are right to (arguments up to 1e20). */
    public static final int DIGITS = 60;

    private static final int GUARD = 90;
    private static final MathContext CONTEXT = new MathContext(120);

    /** π by Machin's formula, 16 arctan(1/5) - 4 arctan(1/239). */
    public static final BigDecimal PI = arctanOfInverse(5)
            .multiply(BigDecimal.valueOf(16))
            .subtract(arctanOfInverse(239).multiply(BigDecimal.valueOf(4)))
            .setScale(GUARD, RoundingMode.HALF_EVEN);

    private Decimals() {}

    private static BigDecimal arctanOfInverse(int n) {
        int scale = GUARD + 10;
        BigInteger unit = BigInteger.TEN.pow(scale);
        BigInteger power = unit.divide(BigInteger.valueOf(n));
        BigInteger square = BigInteger.valueOf((long) n * n);
        BigInteger sum = power;
        for (int k = 1; power.signum() != 0; k++) {
            power = power.divide(square);
            BigInteger term = power.divide(BigInteger.valueOf(2L * k + 1));
            sum = k % 2 == 1 ? sum.subtract(term) : sum.add(term);
        }
        return new BigDecimal(sum, scale);
    }

    /** The sum of numbers, each taken as the exact value of the double. */
    public static BigDecimal exact(double... parts) {
        BigDecimal sum = BigDecimal.ZERO;
        for (double part : parts) {
            sum = sum.add(new BigDecimal(part));
        }
        return sum;
    }

    /** x mod 2π in [-π, π]. */
    public static BigDecimal reduced(BigDecimal x) {
        BigDecimal turn = PI.multiply(BigDecimal.valueOf(2));
        BigDecimal turns = x.divide(turn, 0, RoundingMode.HALF_EVEN);
        return x.subtract(turns.multiply(turn));
    }

    /** sin x. */
    public static BigDecimal sin(BigDecimal x) {
        BigDecimal r = reduced(x);
        return series(r, r, 1);
    }

    /** cos x. */
    public static BigDecimal cos(BigDecimal x) {
        return series(reduced(x), BigDecimal.ONE, 0);
    }

    /** first · Σ_k (-r²)^k · start!/(start + 2k)!, |r| ≤ π. */
    private static BigDecimal series(BigDecimal r, BigDecimal first, int start) {
        BigDecimal square = r.multiply(r, CONTEXT);
        BigDecimal limit = BigDecimal.ONE.scaleByPowerOfTen(-GUARD);
        BigDecimal term = first;
        BigDecimal sum = term;
        for (int k = start; term.abs().compareTo(limit) > 0; k += 2) {
            term = term.multiply(square, CONTEXT)
                    .divide(BigDecimal.valueOf((k + 1L) * (k + 2L)), CONTEXT)
                    .negate();
            sum = sum.add(term, CONTEXT);
        }
        return sum;
    }

    /** √x, x ≥ 0. */
    public static BigDecimal sqrt(BigDecimal x) {
        return x.sqrt(CONTEXT);
    }

    /** |a - b| as a double. */
    public static double distance(BigDecimal a, BigDecimal b) {
        return a.subtract(b).abs().doubleValue();
    }
}
