package ladderwell.numeric;

/** Row loops in plain Java. */
final class PlainRowLoops implements RowLoops {
    @Override
    public void add(double[] out, int o, double[] in, int x, int length, double c) {
        add(out, o, in, x, 0, length, c);
    }

    static void add(double[] out, int o, double[] in, int x, int from, int length, double c) {
        for (int i = from; i < length; i++) {
            out[o + i] += c * in[x + i];
        }
    }

    @Override
    public void add(
            double[] outRe,
            double[] outIm,
            int o,
            double[] inRe,
            double[] inIm,
            int x,
            int length,
            double re,
            double im) {
        add(outRe, outIm, o, inRe, inIm, x, 0, length, re, im);
    }

    static void add(
            double[] outRe,
            double[] outIm,
            int o,
            double[] inRe,
            double[] inIm,
            int x,
            int from,
            int length,
            double re,
            double im) {
        for (int i = from; i < length; i++) {
            double a = inRe[x + i];
            double b = inIm[x + i];
            outRe[o + i] += re * a - im * b;
            outIm[o + i] += re * b + im * a;
        }
    }

    @Override
    public void diagonal(
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
        diagonal(outRe, outIm, o, inRe, inIm, x, 0, length, re, im, vRe, vIm, v);
    }

    static void diagonal(
            double[] outRe,
            double[] outIm,
            int o,
            double[] inRe,
            double[] inIm,
            int x,
            int from,
            int length,
            double re,
            double im,
            double[] vRe,
            double[] vIm,
            int v) {
        for (int i = from; i < length; i++) {
            double a = inRe[x + i];
            double b = inIm[x + i];
            double c = re + vRe[v + i];
            double d = im - vIm[v + i];
            outRe[o + i] += c * a - d * b;
            outIm[o + i] += c * b + d * a;
        }
    }

    @Override
    public void product(double[] out, int o, double[] in, int x, int length, double c, double[] factor, int v) {
        product(out, o, in, x, 0, length, c, factor, v);
    }

    static void product(
            double[] out, int o, double[] in, int x, int from, int length, double c, double[] factor, int v) {
        for (int i = from; i < length; i++) {
            out[o + i] += c * factor[v + i] * in[x + i];
        }
    }

    @Override
    public void product(
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
        product(outRe, outIm, o, inRe, inIm, x, 0, length, re, im, vRe, vIm, v);
    }

    static void product(
            double[] outRe,
            double[] outIm,
            int o,
            double[] inRe,
            double[] inIm,
            int x,
            int from,
            int length,
            double re,
            double im,
            double[] vRe,
            double[] vIm,
            int v) {
        for (int i = from; i < length; i++) {
            double c = re * vRe[v + i] + im * vIm[v + i];
            double d = im * vRe[v + i] - re * vIm[v + i];
            double a = inRe[x + i];
            double b = inIm[x + i];
            outRe[o + i] += c * a - d * b;
            outIm[o + i] += c * b + d * a;
        }
    }

    @Override
    public double squares(double[] re, double[] im, int x, int length) {
        return squares(re, im, x, 0, length);
    }

    static double squares(double[] re, double[] im, int x, int from, int length) {
        double a = 0;
        double b = 0;
        for (int i = from; i < length; i++) {
            a += re[x + i] * re[x + i];
            b += im[x + i] * im[x + i];
        }
        return a + b;
    }
}
