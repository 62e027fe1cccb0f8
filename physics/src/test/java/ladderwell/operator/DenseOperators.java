package ladderwell.operator;

/** Dense matrices of operators on levels 0 … size − 1, by plain matrix products: an independent route for tests. */
final class DenseOperators {
    final int size;
    final double[][] re;
    final double[][] im;

    DenseOperators(int size) {
        this.size = size;
        re = new double[size][size];
        im = new double[size][size];
    }

    static DenseOperators lowering(int size) {
        DenseOperators a = new DenseOperators(size);
        for (int n = 1; n < size; n++) {
            a.re[n - 1][n] = Math.sqrt(n);
        }
        return a;
    }

    static DenseOperators unit(int size) {
        DenseOperators one = new DenseOperators(size);
        for (int n = 0; n < size; n++) {
            one.re[n][n] = 1;
        }
        return one;
    }

    DenseOperators times(DenseOperators other) {
        DenseOperators product = new DenseOperators(size);
        for (int i = 0; i < size; i++) {
            for (int k = 0; k < size; k++) {
                if (re[i][k] == 0 && im[i][k] == 0) {
                    continue;
                }
                for (int j = 0; j < size; j++) {
                    product.re[i][j] += re[i][k] * other.re[k][j] - im[i][k] * other.im[k][j];
                    product.im[i][j] += re[i][k] * other.im[k][j] + im[i][k] * other.re[k][j];
                }
            }
        }
        return product;
    }

    DenseOperators plus(DenseOperators other, double factorRe, double factorIm) {
        DenseOperators sum = new DenseOperators(size);
        for (int i = 0; i < size; i++) {
            for (int j = 0; j < size; j++) {
                sum.re[i][j] = re[i][j] + factorRe * other.re[i][j] - factorIm * other.im[i][j];
                sum.im[i][j] = im[i][j] + factorRe * other.im[i][j] + factorIm * other.re[i][j];
            }
        }
        return sum;
    }

    DenseOperators adjoint() {
        DenseOperators adjoint = new DenseOperators(size);
        for (int i = 0; i < size; i++) {
            for (int j = 0; j < size; j++) {
                adjoint.re[j][i] = re[i][j];
                adjoint.im[j][i] = -im[i][j];
            }
        }
        return adjoint;
    }

    DenseOperators power(int exponent) {
        DenseOperators result = unit(size);
        for (int i = 0; i < exponent; i++) {
            result = result.times(this);
        }
        return result;
    }

    /** The matrix of a polynomial, term by term from powers of a and a†. */
    static DenseOperators of(LadderPolynomial p, int size) {
        DenseOperators a = lowering(size);
        DenseOperators sum = new DenseOperators(size);
        for (int j = 0; j <= p.raisingDegree(); j++) {
            for (int k = 0; k <= p.loweringDegree(); k++) {
                if (p.re(j, k) != 0 || p.im(j, k) != 0) {
                    sum = sum.plus(a.adjoint().power(j).times(a.power(k)), p.re(j, k), p.im(j, k));
                }
            }
        }
        return sum;
    }

    /** Largest difference of elements in the rows and columns below corner, in parts of the largest element there. */
    double distance(DenseOperators other, int corner) {
        double gap = 0;
        double largest = 1e-300;
        for (int i = 0; i < corner; i++) {
            for (int j = 0; j < corner; j++) {
                gap = Math.max(gap, Math.hypot(re[i][j] - other.re[i][j], im[i][j] - other.im[i][j]));
                largest = Math.max(largest, Math.hypot(re[i][j], im[i][j]));
            }
        }
        return gap / largest;
    }
}
