package ladderwell.packet;

import java.util.Arrays;
import ladderwell.numeric.FourierTransform;

/** A wave function on a grid. Parts are written to in place. */
final class Wave {
    /** A side of the grid, as a share of its points, on which hardly anything may lie. */
    static final int SIDE = 16;

    final Grid grid;
    final double[] re;
    final double[] im;

    Wave(Grid grid, double[] re, double[] im) {
        this.grid = grid;
        this.re = re;
        this.im = im;
    }

    Wave copy() {
        return new Wave(grid, re.clone(), im.clone());
    }

    /** Takes over the values of another wave on the same grid. */
    void take(Wave other) {
        System.arraycopy(other.re, 0, re, 0, re.length);
        System.arraycopy(other.im, 0, im, 0, im.length);
    }

    double weight(int from, int to) {
        double sum = 0;
        for (int j = from; j < to; j++) {
            sum += re[j] * re[j] + im[j] * im[j];
        }
        return sum * grid.spacing();
    }

    double norm() {
        return Math.sqrt(weight(0, re.length));
    }

    double weightOnTheLeft() {
        return weight(0, grid.points() / SIDE);
    }

    double weightOnTheRight() {
        return weight(grid.points() - grid.points() / SIDE, grid.points());
    }

    /** The same on a grid of the same spacing that contains this one. */
    Wave onto(Grid longer) {
        int at = (int) Math.rint((grid.left() - longer.left()) / grid.spacing());
        double[] r = new double[longer.points()];
        double[] i = new double[longer.points()];
        System.arraycopy(re, 0, r, at, re.length);
        System.arraycopy(im, 0, i, at, im.length);
        return new Wave(longer, r, i);
    }

    /** The same, with points between the points: the transform filled up with zeros. */
    Wave finer() {
        int n = grid.points();
        Grid fine = grid.finer();
        FourierTransform small = new FourierTransform(n);
        double[] r = re.clone();
        double[] i = im.clone();
        small.forward(r, i);
        double[] fineRe = new double[2 * n];
        double[] fineIm = new double[2 * n];
        System.arraycopy(r, 0, fineRe, 0, n / 2);
        System.arraycopy(i, 0, fineIm, 0, n / 2);
        System.arraycopy(r, n / 2, fineRe, 3 * n / 2, n / 2);
        System.arraycopy(i, n / 2, fineIm, 3 * n / 2, n / 2);
        new FourierTransform(2 * n).backward(fineRe, fineIm);
        Arrays.setAll(fineRe, j -> fineRe[j] / n);
        Arrays.setAll(fineIm, j -> fineIm[j] / n);
        return new Wave(fine, fineRe, fineIm);
    }

    /** ‖this − other‖ on the same grid. */
    double distance(Wave other) {
        double sum = 0;
        for (int j = 0; j < re.length; j++) {
            double a = re[j] - other.re[j];
            double b = im[j] - other.im[j];
            sum += a * a + b * b;
        }
        return Math.sqrt(sum * grid.spacing());
    }
}
