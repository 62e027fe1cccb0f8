package ladderwell.window;

/**
 * Loops over rows, split in real and imaginary parts, plain enough for the compiler to vectorise. {@code o} is where the output starts,
 * {@code x} where the input starts, {@code v} where the factors start.
 */
final class Rows {
    private Rows() {}

    /** out += c · in with a complex number c. */
    static void add(Plane out, int o, Plane in, int x, int length, double re, double im) {
        if (im == 0) {
            real(out.re, o, in.re, x, length, re);
            real(out.im, o, in.im, x, length, re);
        } else if (re == 0) {
            real(out.re, o, in.im, x, length, -im);
            real(out.im, o, in.re, x, length, im);
        } else {
            complex(out.re, out.im, o, in.re, in.im, x, length, re, im);
        }
    }

    static void real(double[] out, int o, double[] in, int x, int length, double c) {
        for (int i = 0; i < length; i++) {
            out[o + i] += c * in[x + i];
        }
    }

    private static void complex(
            double[] outRe,
            double[] outIm,
            int o,
            double[] inRe,
            double[] inIm,
            int x,
            int length,
            double re,
            double im) {
        for (int i = 0; i < length; i++) {
            double a = inRe[x + i];
            double b = inIm[x + i];
            outRe[o + i] += re * a - im * b;
            outIm[o + i] += re * b + im * a;
        }
    }

    /** out += (c + conj v) ∘ in, c a number. */
    static void diagonal(
            Plane out, int o, Plane in, int x, int length, double re, double im, double[] vRe, double[] vIm, int v) {
        diagonal(out.re, out.im, o, in.re, in.im, x, length, re, im, vRe, vIm, v);
    }

    private static void diagonal(
            double[] outRe,
            double[] outIm,
            int o,
            double[] inRe,
            double[] inIm,
            int x,
            int length,
            double re,
            double im,
            double[] vRe,
            double[] vIm,
            int v) {
        for (int i = 0; i < length; i++) {
            double a = inRe[x + i];
            double b = inIm[x + i];
            double c = re + vRe[v + i];
            double d = im - vIm[v + i];
            outRe[o + i] += c * a - d * b;
            outIm[o + i] += c * b + d * a;
        }
    }

    /** out += c · conj(v) ∘ in, c a complex number. */
    static void times(Plane out, int o, Plane in, int x, int length, double re, double im, Bands.Band band, int v) {
        if (band.imaginaryIsZero() && im == 0) {
            product(out.re, o, in.re, x, length, re, band.re, v);
            product(out.im, o, in.im, x, length, re, band.re, v);
        } else if (band.realIsZero() && im == 0) {
            // conj(i w) = −i w
            product(out.re, o, in.im, x, length, re, band.im, v);
            product(out.im, o, in.re, x, length, -re, band.im, v);
        } else {
            product(out.re, out.im, o, in.re, in.im, x, length, re, im, band.re, band.im, v);
        }
    }

    private static void product(double[] out, int o, double[] in, int x, int length, double c, double[] factor, int v) {
        for (int i = 0; i < length; i++) {
            out[o + i] += c * factor[v + i] * in[x + i];
        }
    }

    private static void product(
            double[] outRe,
            double[] outIm,
            int o,
            double[] inRe,
            double[] inIm,
            int x,
            int length,
            double re,
            double im,
            double[] vRe,
            double[] vIm,
            int v) {
        for (int i = 0; i < length; i++) {
            double c = re * vRe[v + i] + im * vIm[v + i];
            double d = im * vRe[v + i] - re * vIm[v + i];
            double a = inRe[x + i];
            double b = inIm[x + i];
            outRe[o + i] += c * a - d * b;
            outIm[o + i] += c * b + d * a;
        }
    }

    /** Σ |in|². */
    static double squares(Plane in, int x, int length) {
        return squares(in.re, x, length) + squares(in.im, x, length);
    }

    private static double squares(double[] in, int x, int length) {
        double a = 0;
        double b = 0;
        double c = 0;
        double d = 0;
        int i = 0;
        for (; i + 3 < length; i += 4) {
            a += in[x + i] * in[x + i];
            b += in[x + i + 1] * in[x + i + 1];
            c += in[x + i + 2] * in[x + i + 2];
            d += in[x + i + 3] * in[x + i + 3];
        }
        for (; i < length; i++) {
            a += in[x + i] * in[x + i];
        }
        return a + b + (c + d);
    }
}
