package ladderwell.level;

import ladderwell.numeric.DoubleDouble;

/**
 * Sine in double-double for angles of at most an eighth of a turn, by its power series.
 *
 * @accuracy relative error below 2^−100: 1/6 … 1/31! are within 2^−106 of themselves, each step of Horner's scheme adds about
 *     2^−103 of a term that the next multiplies by x² / 6 or less, and the first term left out is below 2^−116
 */
final class SmallAngle {
    /** (−1)^k / (2k+1)! for k = 0 … 14. */
    private static final DoubleDouble[] SERIES = series();

    private SmallAngle() {}

    private static DoubleDouble[] series() {
        DoubleDouble[] terms = new DoubleDouble[15];
        terms[0] = DoubleDouble.ONE;
        for (int k = 1; k < terms.length; k++) {
            terms[k] = terms[k - 1].dividedBy(-(2.0 * k) * (2 * k + 1));
        }
        return terms;
    }

    /** sin x, |x| ≤ 0.8. */
    static DoubleDouble sine(DoubleDouble x) {
        DoubleDouble square = x.times(x);
        DoubleDouble sum = SERIES[SERIES.length - 1];
        for (int k = SERIES.length - 2; k > 0; k--) {
            sum = sum.times(square).plus(SERIES[k]);
        }
        return x.plus(x.times(square).times(sum));
    }

    /** 1 − cos x = 2 sin²(x/2), |x| ≤ 0.8, with the same relative error but for the square. */
    static DoubleDouble versine(DoubleDouble x) {
        DoubleDouble half = sine(x.times(0.5));
        return half.times(half).times(2);
    }
}
