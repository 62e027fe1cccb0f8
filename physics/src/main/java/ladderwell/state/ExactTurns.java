package ladderwell.state;

import java.math.BigDecimal;
import java.math.BigInteger;
import java.math.MathContext;
import java.math.RoundingMode;

/**
 * Multiples n·φ of one angle φ, reduced to a turn without loss.
 *
 * <p>φ / 2π modulo 1 is held as a 128-bit fraction, so n·φ / 2π is a product of integers modulo 2^128: its error is
 * n · 2^−129 turns, below 2^−66 for every n a {@code long} can hold. An angle of a whole number of eighths of a turn is met by
 * the octant, the rest (at most π/4) by sine and cosine.
 */
final class ExactTurns {
    /** Vector error of (cosine, sine): 2.4 ulp from the reduced angle at π/4 and 2 from the library's functions. */
    static final double ERROR = 5 * 0x1p-53;

    /** Largest |φ| for which 2π is known to enough digits here. */
    static final double LARGEST_ANGLE = 1e15;

    // OEIS A000796, 80 decimals.
    private static final BigDecimal TWO_PI = new BigDecimal(
                    "3.14159265358979323846264338327950288419716939937510582097494459230781640628620899")
            .multiply(BigDecimal.valueOf(2));

    private static final BigInteger ONE_TURN = BigInteger.ONE.shiftLeft(128);
    private static final double TURN_UNIT = 2 * Math.PI * 0x1p-64;

    private final BigInteger step;
    private final long stepHigh;
    private final long stepLow;
    private long high;
    private long low;

    private double cosine = 1;
    private double sine;

    /** Starts at 0·φ. */
    ExactTurns(double phase) {
        BigDecimal turns = new BigDecimal(phase).divide(TWO_PI, new MathContext(90));
        BigDecimal scaled = turns.multiply(new BigDecimal(ONE_TURN)).setScale(0, RoundingMode.HALF_EVEN);
        step = scaled.toBigInteger().mod(ONE_TURN);
        stepHigh = step.shiftRight(64).longValue();
        stepLow = step.longValue();
    }

    /** Goes to n·φ. */
    void jumpTo(long n) {
        BigInteger here = step.multiply(BigInteger.valueOf(n)).mod(ONE_TURN);
        high = here.shiftRight(64).longValue();
        low = here.longValue();
        evaluate();
    }

    /** Goes from n·φ to (n + 1)·φ. */
    void next() {
        long sum = low + stepLow;
        long carry = Long.compareUnsigned(sum, low) < 0 ? 1 : 0;
        low = sum;
        high = high + stepHigh + carry;
        evaluate();
    }

    double cosine() {
        return cosine;
    }

    double sine() {
        return sine;
    }

    private void evaluate() {
        // Nearest quarter turn, and the signed rest in units of 2^-64 turn, at most an eighth of a turn.
        long shifted = high + (1L << 61);
        int quarter = (int) (shifted >>> 62);
        long rest = high - ((long) quarter << 62);
        double angle = rest * TURN_UNIT;
        double c = Math.cos(angle);
        double s = Math.sin(angle);
        switch (quarter) {
            case 0 -> {
                cosine = c;
                sine = s;
            }
            case 1 -> {
                cosine = -s;
                sine = c;
            }
            case 2 -> {
                cosine = -c;
                sine = -s;
            }
            default -> {
                cosine = s;
                sine = -c;
            }
        }
    }
}
