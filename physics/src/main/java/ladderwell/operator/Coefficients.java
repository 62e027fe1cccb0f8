package ladderwell.operator;

import ladderwell.numeric.DoubleDouble;

/**
 * A table c[j][k] of complex double-double numbers that sums are gathered in. Arrays are split (re, im) × (hi, lo), row j, column k.
 */
final class Coefficients {
    final int rows;
    final int columns;
    final double[] re;
    final double[] reLow;
    final double[] im;
    final double[] imLow;

    Coefficients(int rows, int columns) {
        this.rows = rows;
        this.columns = columns;
        re = new double[rows * columns];
        reLow = new double[rows * columns];
        im = new double[rows * columns];
        imLow = new double[rows * columns];
    }

    int at(int j, int k) {
        return j * columns + k;
    }

    boolean isZero(int i) {
        return re[i] == 0 && im[i] == 0;
    }

    DoubleDouble re(int i) {
        return new DoubleDouble(re[i], reLow[i]);
    }

    DoubleDouble im(int i) {
        return new DoubleDouble(im[i], imLow[i]);
    }

    void set(int i, DoubleDouble real, DoubleDouble imaginary) {
        // + 0.0 turns −0 into 0
        re[i] = real.hi() + 0.0;
        reLow[i] = real.lo();
        im[i] = imaginary.hi() + 0.0;
        imLow[i] = imaginary.lo();
    }

    /** c[i] += (real + i imaginary). */
    void add(int i, DoubleDouble real, DoubleDouble imaginary) {
        set(i, re(i).plus(real), im(i).plus(imaginary));
    }

    /** A copy without the empty last rows and columns; at least one row and one column stay. */
    Coefficients trimmed() {
        int lastRow = 0;
        int lastColumn = 0;
        for (int j = 0; j < rows; j++) {
            for (int k = 0; k < columns; k++) {
                if (!isZero(at(j, k))) {
                    lastRow = j;
                    lastColumn = Math.max(lastColumn, k);
                }
            }
        }
        if (lastRow == rows - 1 && lastColumn == columns - 1) {
            return this;
        }
        Coefficients result = new Coefficients(lastRow + 1, lastColumn + 1);
        for (int j = 0; j <= lastRow; j++) {
            for (int k = 0; k <= lastColumn; k++) {
                result.set(result.at(j, k), re(at(j, k)), im(at(j, k)));
            }
        }
        return result;
    }
}
