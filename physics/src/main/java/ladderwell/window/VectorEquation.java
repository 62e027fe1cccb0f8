package ladderwell.window;

import java.util.List;

/** dψ/ds = factor · (K − c) ψ. */
final class VectorEquation extends Equation {
    private final double[] weights;
    private final double terms;
    private double weighted;

    /** @param shift c = i · shift, subtracted from K */
    VectorEquation(Generator generator, long first, int levels, double factor, double shift) {
        super(generator, first, levels, factor);
        double[] diagonal = drift.get(0).diagonal().im;
        for (int n = 0; n < levels; n++) {
            diagonal[margin() + n] -= factor * shift;
        }
        weights = new double[levels];
        for (int j = 0; j < norms.length; j++) {
            norms[j] = drift.get(j).norm();
        }
        for (Bands.Band band : drift.get(0).all()) {
            for (int n = 0; n < levels; n++) {
                double size = band.size(margin() + n);
                weights[n] += size * size;
            }
        }
        int count = drift.get(0).all().size();
        terms = U * (count + ROUNDINGS) * Math.sqrt(count);
    }

    @Override
    Plane plane() {
        return new Plane(levels + 2 * margin());
    }

    @Override
    void apply(Plane[] c, int order, int most, Plane out) {
        int length = levels + 2 * reach;
        for (int j = 0; j <= Math.min(Math.min(order, most), drift.size() - 1); j++) {
            Plane y = c[order - j];
            for (Bands.Band band : drift.get(j).all()) {
                // row n of the output takes w_b(n − b) y(n − b)
                int at = margin() - reach - band.shift;
                product(out, margin() - reach, y, at, length, band);
            }
        }
    }

    private static void product(Plane out, int o, Plane in, int x, int length, Bands.Band band) {
        double[] outRe = out.re;
        double[] outIm = out.im;
        double[] inRe = in.re;
        double[] inIm = in.im;
        double[] re = band.re;
        double[] im = band.im;
        if (band.realIsZero()) {
            for (int i = 0; i < length; i++) {
                outRe[o + i] -= im[x + i] * inIm[x + i];
                outIm[o + i] += im[x + i] * inRe[x + i];
            }
        } else {
            for (int i = 0; i < length; i++) {
                double a = inRe[x + i];
                double b = inIm[x + i];
                outRe[o + i] += re[x + i] * a - im[x + i] * b;
                outIm[o + i] += re[x + i] * b + im[x + i] * a;
            }
        }
    }

    @Override
    void tidy(Plane y) {
        y.clear(0, margin());
        y.clear(margin() + levels, levels + 2 * margin());
    }

    @Override
    double rank() {
        return 1;
    }

    @Override
    double size(Plane y) {
        double sum = 0;
        double heavy = 0;
        for (int n = 0; n < levels; n++) {
            double re = y.re[margin() + n];
            double im = y.im[margin() + n];
            double square = re * re + im * im;
            sum += square;
            heavy += weights[n] * square;
        }
        weighted = heavy;
        return Math.sqrt(sum);
    }

    @Override
    double rounding() {
        return terms * Math.sqrt(weighted);
    }

    @Override
    void copy(Plane from, Plane to) {
        to.copyFrom(from);
    }

    @Override
    void border(Plane y, double[] belowAndAbove) {
        belowAndAbove[0] = Math.sqrt(Rows.squares(y, margin() - reach, reach));
        belowAndAbove[1] = Math.sqrt(Rows.squares(y, margin() + levels, reach));
    }

    @Override
    List<Outside> outside() {
        return List.of(new Outside(0, reach, 1, true), new Outside(reach, 2 * reach, 1, false));
    }

    @Override
    void takeOutside(Plane y, double[] re, double[] im) {
        System.arraycopy(y.re, margin() - reach, re, 0, reach);
        System.arraycopy(y.im, margin() - reach, im, 0, reach);
        System.arraycopy(y.re, margin() + levels, re, reach, reach);
        System.arraycopy(y.im, margin() + levels, im, reach, reach);
    }

    @Override
    double roundings() {
        return terms;
    }

    @Override
    void accumulate(Plane y, double c, Plane out) {
        Rows.add(out, margin(), y, margin(), levels, c, 0);
    }

    @Override
    void scale(Plane y, double re, double im) {
        for (int n = margin(); n < margin() + levels; n++) {
            double a = y.re[n];
            double b = y.im[n];
            y.re[n] = re * a - im * b;
            y.im[n] = re * b + im * a;
        }
    }

    @Override
    double[] lowering(Plane y, int k) {
        double re = 0;
        double im = 0;
        for (int n = 0; n + k < levels; n++) {
            int i = margin() + n;
            re += root(n, k) * (y.re[i] * y.re[i + k] + y.im[i] * y.im[i + k]);
            im += root(n, k) * (y.re[i] * y.im[i + k] - y.im[i] * y.re[i + k]);
        }
        return new double[] {re, im};
    }

    @Override
    void turn(Plane y, double theta) {
        for (int n = 0; n < levels; n++) {
            double c = Math.cos(theta * (first + n));
            double s = Math.sin(theta * (first + n));
            int i = margin() + n;
            double re = y.re[i];
            y.re[i] = c * re - s * y.im[i];
            y.im[i] = c * y.im[i] + s * re;
        }
    }

    @Override
    double quanta(Plane y) {
        double sum = 0;
        for (int n = 0; n < levels; n++) {
            int i = margin() + n;
            sum += (first + n) * (y.re[i] * y.re[i] + y.im[i] * y.im[i]);
        }
        return sum;
    }

    @Override
    void moveTo(Plane y, Equation other, Plane target) {
        long from = Math.max(first, other.first);
        long to = Math.min(first + levels, other.first + other.levels);
        int length = (int) (to - from);
        System.arraycopy(y.re, at(from), target.re, (int) (from - other.first) + other.margin(), length);
        System.arraycopy(y.im, at(from), target.im, (int) (from - other.first) + other.margin(), length);
    }

    private int at(long level) {
        return (int) (level - first) + margin();
    }

    @Override
    double edge(Plane y, boolean below, int count) {
        return Math.sqrt(Rows.squares(y, below ? margin() : margin() + levels - count, count));
    }
}
