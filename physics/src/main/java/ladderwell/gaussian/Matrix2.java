package ladderwell.gaussian;

import ladderwell.numeric.DoubleDouble;

/** A real 2 × 2 matrix [[a, b], [c, d]] in double-double arithmetic. */
record Matrix2(DoubleDouble a, DoubleDouble b, DoubleDouble c, DoubleDouble d) {
    static final Matrix2 ZERO = of(0, 0, 0, 0);
    static final Matrix2 UNIT = of(1, 0, 0, 1);

    static Matrix2 of(double a, double b, double c, double d) {
        return new Matrix2(DoubleDouble.of(a), DoubleDouble.of(b), DoubleDouble.of(c), DoubleDouble.of(d));
    }

    Matrix2 plus(Matrix2 other) {
        return new Matrix2(a.plus(other.a), b.plus(other.b), c.plus(other.c), d.plus(other.d));
    }

    Matrix2 times(Matrix2 other) {
        return new Matrix2(
                a.times(other.a).plus(b.times(other.c)),
                a.times(other.b).plus(b.times(other.d)),
                c.times(other.a).plus(d.times(other.c)),
                c.times(other.b).plus(d.times(other.d)));
    }

    Matrix2 times(DoubleDouble factor) {
        return new Matrix2(a.times(factor), b.times(factor), c.times(factor), d.times(factor));
    }

    Matrix2 transposed() {
        return new Matrix2(a, c, b, d);
    }

    /** Frobenius norm. */
    double norm() {
        return Math.hypot(Math.hypot(a.hi(), b.hi()), Math.hypot(c.hi(), d.hi()));
    }
}
