package ladderwell.state;

import java.math.BigDecimal;
import java.math.BigInteger;
import java.math.MathContext;
import java.math.RoundingMode;

/** Reference arithmetic for the tests of levels and states: 60 digits carried, 50 meant. */
public final class FiftyDigits {
    public static final MathContext DIGITS = new MathContext(60);

    // OEIS A000796 and A002162.
    public static final BigDecimal PI =
            new BigDecimal("3.14159265358979323846264338327950288419716939937510582097494459230781640628620899");
    public static final BigDecimal LN2 =
            new BigDecimal("0.69314718055994530941723212145817656807550013436025525412068000949339362196969471");

    private FiftyDigits() {}

    public static BigDecimal of(double x) {
        return new BigDecimal(x);
    }

    public static BigDecimal exp(BigDecimal x) {
        BigInteger twos =
                x.divide(LN2, DIGITS).setScale(0, RoundingMode.HALF_EVEN).toBigInteger();
        // Guard digits for the reduction of a large argument.
        BigDecimal r = x.subtract(LN2.multiply(new BigDecimal(twos)), new MathContext(80));
        r = r.divide(BigDecimal.valueOf(256), DIGITS);
        BigDecimal sum = BigDecimal.ONE;
        BigDecimal term = BigDecimal.ONE;
        for (int k = 1; k < 25; k++) {
            term = term.multiply(r, DIGITS).divide(BigDecimal.valueOf(k), DIGITS);
            sum = sum.add(term, DIGITS);
        }
        for (int i = 0; i < 8; i++) {
            sum = sum.multiply(sum, DIGITS);
        }
        int power = twos.intValueExact();
        BigDecimal scale = new BigDecimal(BigInteger.TWO.pow(Math.abs(power)));
        return power >= 0 ? sum.multiply(scale, DIGITS) : sum.divide(scale, DIGITS);
    }

    public static BigDecimal ln(BigDecimal x) {
        int exponent = (int) Math.round(Math.log(x.round(MathContext.DECIMAL32).doubleValue()) / Math.log(2));
        BigDecimal scale = new BigDecimal(BigInteger.TWO.pow(Math.abs(exponent)));
        BigDecimal m = exponent >= 0 ? x.divide(scale, DIGITS) : x.multiply(scale, DIGITS);
        BigDecimal y = BigDecimal.valueOf(Math.log(m.doubleValue()));
        for (int i = 0; i < 3; i++) {
            BigDecimal e = exp(y);
            BigDecimal difference = m.subtract(e, DIGITS);
            y = y.add(difference.multiply(BigDecimal.valueOf(2)).divide(m.add(e, DIGITS), DIGITS), DIGITS);
        }
        return y.add(LN2.multiply(BigDecimal.valueOf(exponent)), DIGITS);
    }

    /** ln n!, by the product below 200 and by Stirling's series (14 terms) above. */
    public static BigDecimal lnFactorial(long n) {
        if (n < 200) {
            BigInteger product = BigInteger.ONE;
            for (long k = 2; k <= n; k++) {
                product = product.multiply(BigInteger.valueOf(k));
            }
            BigDecimal x = new BigDecimal(product);
            int twos = Math.max(0, product.bitLength() - 60);
            return ln(x.divide(new BigDecimal(BigInteger.TWO.pow(twos)), DIGITS))
                    .add(LN2.multiply(BigDecimal.valueOf(twos)), DIGITS);
        }
        BigDecimal big = BigDecimal.valueOf(n);
        MathContext wide = new MathContext(75);
        BigDecimal sum = big.add(new BigDecimal("0.5"))
                .multiply(ln(big), wide)
                .subtract(big, wide)
                .add(ln(PI.multiply(BigDecimal.valueOf(2), DIGITS)).divide(BigDecimal.valueOf(2), DIGITS), wide);
        // B_2k / (2k (2k − 1) n^(2k − 1)); Bernoulli numbers B_2 … B_28.
        long[][] bernoulli = {
            {1, 6},
            {-1, 30},
            {1, 42},
            {-1, 30},
            {5, 66},
            {-691, 2730},
            {7, 6},
            {-3617, 510},
            {43867, 798},
            {-174611, 330},
            {854513, 138},
            {-236364091, 2730},
            {8553103, 6},
            {-23749461029L, 870}
        };
        for (int k = 1; k <= bernoulli.length; k++) {
            BigDecimal numerator = BigDecimal.valueOf(bernoulli[k - 1][0]);
            BigDecimal denominator = BigDecimal.valueOf(bernoulli[k - 1][1])
                    .multiply(BigDecimal.valueOf(2L * k * (2 * k - 1)))
                    .multiply(big.pow(2 * k - 1));
            sum = sum.add(numerator.divide(denominator, DIGITS), wide);
        }
        return sum;
    }

    /** Poisson weight e^{−μ} μ^n / n!. */
    public static BigDecimal poisson(double mean, long n) {
        BigDecimal mu = of(mean);
        MathContext wide = new MathContext(75);
        BigDecimal log =
                ln(mu).multiply(BigDecimal.valueOf(n), wide).subtract(mu, wide).subtract(lnFactorial(n), wide);
        return exp(log);
    }

    /** {cos x, sin x}. */
    public static BigDecimal[] cosSin(BigDecimal x) {
        BigDecimal half = PI.divide(BigDecimal.valueOf(2));
        BigInteger quarter = x.divide(half, new MathContext(80))
                .setScale(0, RoundingMode.HALF_EVEN)
                .toBigInteger();
        BigDecimal r = x.subtract(half.multiply(new BigDecimal(quarter)));
        BigDecimal c = BigDecimal.ZERO;
        BigDecimal s = BigDecimal.ZERO;
        BigDecimal term = BigDecimal.ONE;
        for (int k = 0; k < 60; k++) {
            int sign = (k / 2) % 2 == 0 ? 1 : -1;
            if (k % 2 == 0) {
                c = c.add(term.multiply(BigDecimal.valueOf(sign)), DIGITS);
            } else {
                s = s.add(term.multiply(BigDecimal.valueOf(sign)), DIGITS);
            }
            term = term.multiply(r, DIGITS).divide(BigDecimal.valueOf(k + 1), DIGITS);
        }
        return switch (quarter.mod(BigInteger.valueOf(4)).intValue()) {
            case 0 -> new BigDecimal[] {c, s};
            case 1 -> new BigDecimal[] {s.negate(), c};
            case 2 -> new BigDecimal[] {c.negate(), s.negate()};
            default -> new BigDecimal[] {s, c.negate()};
        };
    }

    /** asin y for 0 ≤ y ≤ 1, by Newton's iteration on sine (and cosine near 1). */
    public static BigDecimal asin(BigDecimal y) {
        if (y.compareTo(new BigDecimal("0.75")) > 0) {
            BigDecimal rest = BigDecimal.ONE.subtract(y).multiply(BigDecimal.ONE.add(y));
            return PI.divide(BigDecimal.valueOf(2)).subtract(asin(rest.sqrt(DIGITS)), DIGITS);
        }
        BigDecimal x = BigDecimal.valueOf(Math.asin(y.doubleValue()));
        for (int i = 0; i < 3; i++) {
            BigDecimal[] turn = cosSin(x);
            x = x.subtract(turn[1].subtract(y).divide(turn[0], DIGITS), DIGITS);
        }
        return x;
    }
}
