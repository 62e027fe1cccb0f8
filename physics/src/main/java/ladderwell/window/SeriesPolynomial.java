package ladderwell.window;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import ladderwell.numeric.DoubleDouble;
import ladderwell.operator.LadderPolynomial;

/** A polynomial in a† and a whose coefficients are polynomials in the time of a step, with all digits of double-double numbers. */
final class SeriesPolynomial {
    /** Complex polynomial in s. */
    record Series(DoubleDouble[] re, DoubleDouble[] im) {
        static Series zero(int length) {
            DoubleDouble[] re = new DoubleDouble[length];
            DoubleDouble[] im = new DoubleDouble[length];
            Arrays.fill(re, DoubleDouble.ZERO);
            Arrays.fill(im, DoubleDouble.ZERO);
            return new Series(re, im);
        }

        static Series one() {
            Series one = zero(1);
            one.re[0] = DoubleDouble.ONE;
            return one;
        }

        int length() {
            return re.length;
        }

        Series conjugate() {
            DoubleDouble[] negated = new DoubleDouble[im.length];
            for (int i = 0; i < im.length; i++) {
                negated[i] = im[i].negated();
            }
            return new Series(re, negated);
        }

        Series times(Series other) {
            Series product = zero(length() + other.length() - 1);
            for (int i = 0; i < length(); i++) {
                for (int j = 0; j < other.length(); j++) {
                    product.re[i + j] =
                            product.re[i + j].plus(re[i].times(other.re[j])).minus(im[i].times(other.im[j]));
                    product.im[i + j] =
                            product.im[i + j].plus(re[i].times(other.im[j])).plus(im[i].times(other.re[j]));
                }
            }
            return product;
        }

        Series times(double factor) {
            Series product = zero(length());
            for (int i = 0; i < length(); i++) {
                product.re[i] = re[i].times(factor);
                product.im[i] = im[i].times(factor);
            }
            return product;
        }

        /** i times this. */
        Series turned() {
            DoubleDouble[] negated = new DoubleDouble[im.length];
            for (int i = 0; i < im.length; i++) {
                negated[i] = im[i].negated();
            }
            return new Series(negated, re);
        }

        Series derivative() {
            Series slope = zero(Math.max(1, length() - 1));
            for (int i = 1; i < length(); i++) {
                slope.re[i - 1] = re[i].times(i);
                slope.im[i - 1] = im[i].times(i);
            }
            return slope;
        }

        Series plus(Series other) {
            Series sum = zero(Math.max(length(), other.length()));
            for (int i = 0; i < length(); i++) {
                sum.re[i] = re[i];
                sum.im[i] = im[i];
            }
            for (int i = 0; i < other.length(); i++) {
                sum.re[i] = sum.re[i].plus(other.re[i]);
                sum.im[i] = sum.im[i].plus(other.im[i]);
            }
            return sum;
        }

        boolean isZero() {
            for (int i = 0; i < length(); i++) {
                if (re[i].hi() != 0 || im[i].hi() != 0) {
                    return false;
                }
            }
            return true;
        }
    }

    private final Series[][] c;

    private SeriesPolynomial(int rows, int columns) {
        c = new Series[rows][columns];
        for (Series[] row : c) {
            Arrays.fill(row, Series.zero(1));
        }
    }

    /** Of operators by orders of s. */
    static SeriesPolynomial of(List<LadderPolynomial> orders) {
        int rows = 1;
        int columns = 1;
        for (LadderPolynomial p : orders) {
            rows = Math.max(rows, p.raisingDegree() + 1);
            columns = Math.max(columns, p.loweringDegree() + 1);
        }
        SeriesPolynomial all = new SeriesPolynomial(rows, columns);
        for (int j = 0; j < rows; j++) {
            for (int k = 0; k < columns; k++) {
                Series series = Series.zero(orders.size());
                for (int i = 0; i < orders.size(); i++) {
                    series.re[i] = orders.get(i).fullRe(j, k);
                    series.im[i] = orders.get(i).fullIm(j, k);
                }
                all.c[j][k] = series;
            }
        }
        return all;
    }

    /** This with a replaced by a + β(s). */
    SeriesPolynomial shifted(Series beta) {
        int most = Math.max(c.length, c[0].length);
        Series[] powers = new Series[most];
        Series[] conjugates = new Series[most];
        powers[0] = Series.one();
        for (int i = 1; i < most; i++) {
            powers[i] = powers[i - 1].times(beta);
        }
        for (int i = 0; i < most; i++) {
            conjugates[i] = powers[i].conjugate();
        }
        SeriesPolynomial result = new SeriesPolynomial(c.length, c[0].length);
        for (int j = 0; j < c.length; j++) {
            for (int k = 0; k < c[0].length; k++) {
                if (c[j][k].isZero()) {
                    continue;
                }
                double chooseP = 1;
                for (int p = j; p >= 0; p--) {
                    Series left = c[j][k].times(conjugates[j - p]).times(chooseP);
                    double chooseQ = 1;
                    for (int q = k; q >= 0; q--) {
                        result.add(p, q, left.times(powers[k - q]).times(chooseQ));
                        chooseQ = chooseQ * q / (k - q + 1);
                    }
                    chooseP = chooseP * p / (j - p + 1);
                }
            }
        }
        return result;
    }

    /** This, or the same with room for powers up to {@code most} on both sides. */
    SeriesPolynomial withRoom(int most) {
        int rows = Math.max(c.length, most + 1);
        int columns = Math.max(c[0].length, most + 1);
        if (rows == c.length && columns == c[0].length) {
            return this;
        }
        SeriesPolynomial wide = new SeriesPolynomial(rows, columns);
        for (int j = 0; j < c.length; j++) {
            System.arraycopy(c[j], 0, wide.c[j], 0, c[j].length);
        }
        return wide;
    }

    /** Adds to the coefficient of a†^j a^k. */
    void add(int j, int k, Series more) {
        c[j][k] = c[j][k].plus(more);
    }

    int rows() {
        return c.length;
    }

    int columns() {
        return c[0].length;
    }

    Series at(int j, int k) {
        return c[j][k];
    }

    /** Takes the constant out. */
    Series takeConstant() {
        Series constant = c[0][0];
        c[0][0] = Series.zero(1);
        return constant;
    }

    /** The operators by orders of s, at least one. */
    List<LadderPolynomial> orders() {
        int length = 1;
        for (Series[] row : c) {
            for (Series series : row) {
                length = Math.max(length, series.length());
            }
        }
        List<LadderPolynomial> all = new ArrayList<>();
        for (int i = 0; i < length; i++) {
            LadderPolynomial sum = LadderPolynomial.zero();
            for (int j = 0; j < c.length; j++) {
                for (int k = 0; k < c[0].length; k++) {
                    Series series = c[j][k];
                    if (i < series.length() && (series.re[i].hi() != 0 || series.im[i].hi() != 0)) {
                        sum = sum.plus(LadderPolynomial.term(j, k, series.re[i], series.im[i]));
                    }
                }
            }
            all.add(sum);
        }
        while (all.size() > 1 && all.get(all.size() - 1).isZero()) {
            all.remove(all.size() - 1);
        }
        return all;
    }
}
