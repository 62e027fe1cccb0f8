package ladderwell.window;

import java.util.Arrays;

/** Real and imaginary parts of a vector or of the rows of a matrix; the {@link Equation} that made it knows the layout. */
final class Plane {
    final double[] re;
    final double[] im;

    Plane(int size) {
        re = new double[size];
        im = new double[size];
    }

    void clear() {
        Arrays.fill(re, 0);
        Arrays.fill(im, 0);
    }

    void clear(int from, int to) {
        Arrays.fill(re, from, to, 0);
        Arrays.fill(im, from, to, 0);
    }

    void copyFrom(Plane other) {
        System.arraycopy(other.re, 0, re, 0, re.length);
        System.arraycopy(other.im, 0, im, 0, im.length);
    }
}
