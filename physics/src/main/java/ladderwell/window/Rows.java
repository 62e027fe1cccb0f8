package ladderwell.window;

import ladderwell.numeric.RowLoops;

/** Row loops on planes, the shorter ones where a factor is real or imaginary. */
final class Rows {
    private static final RowLoops LOOPS = RowLoops.chosen();

    private Rows() {}

    /** out += c · in with a complex number c. */
    static void add(Plane out, int o, Plane in, int x, int length, double re, double im) {
        if (im == 0) {
            LOOPS.add(out.re, o, in.re, x, length, re);
            LOOPS.add(out.im, o, in.im, x, length, re);
        } else if (re == 0) {
            LOOPS.add(out.re, o, in.im, x, length, -im);
            LOOPS.add(out.im, o, in.re, x, length, im);
        } else {
            LOOPS.add(out.re, out.im, o, in.re, in.im, x, length, re, im);
        }
    }

    /** out += c · in, c real. */
    static void real(double[] out, int o, double[] in, int x, int length, double c) {
        LOOPS.add(out, o, in, x, length, c);
    }

    /** out += (c + conj v) ∘ in, c a number. */
    static void diagonal(
            Plane out, int o, Plane in, int x, int length, double re, double im, double[] vRe, double[] vIm, int v) {
        LOOPS.diagonal(out.re, out.im, o, in.re, in.im, x, length, re, im, vRe, vIm, v);
    }

    /** out += c · conj(v) ∘ in, c a complex number. */
    static void times(Plane out, int o, Plane in, int x, int length, double re, double im, Bands.Band band, int v) {
        if (band.imaginaryIsZero() && im == 0) {
            LOOPS.product(out.re, o, in.re, x, length, re, band.re, v);
            LOOPS.product(out.im, o, in.im, x, length, re, band.re, v);
        } else if (band.realIsZero() && im == 0) {
            // conj(i w) = −i w
            LOOPS.product(out.re, o, in.im, x, length, re, band.im, v);
            LOOPS.product(out.im, o, in.re, x, length, -re, band.im, v);
        } else {
            LOOPS.product(out.re, out.im, o, in.re, in.im, x, length, re, im, band.re, band.im, v);
        }
    }

    /** Σ |in|². */
    static double squares(Plane in, int x, int length) {
        return LOOPS.squares(in.re, in.im, x, length);
    }
}
