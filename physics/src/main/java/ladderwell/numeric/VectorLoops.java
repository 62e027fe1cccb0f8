package ladderwell.numeric;

import jdk.incubator.vector.DoubleVector;
import jdk.incubator.vector.VectorOperators;
import jdk.incubator.vector.VectorShuffle;
import jdk.incubator.vector.VectorSpecies;

/**
 * Loops with the Vector API, for any preferred width. The block of the product is 4 rows by 2 vectors: its 8 sums keep two multiply-add
 * units of latency 4 busy and leave registers free on 256-bit machines (16 registers; with 12 sums the compiler spills and halves the
 * speed). Each method stays below about 60 vector operations; beyond, the compiler gives up on inlining and boxes every vector.
 */
final class VectorLoops implements Loops {
    private static final VectorSpecies<Double> SPECIES = DoubleVector.SPECIES_PREFERRED;
    static final int LANES = SPECIES.length();
    private static final VectorShuffle<Double> REVERSED = VectorShuffle.fromOp(SPECIES, i -> LANES - 1 - i);
    private static final int COLUMNS = 2 * LANES;

    @Override
    public int columns() {
        return COLUMNS;
    }

    @Override
    public void product(
            double[] a, int aAt, double[] b, int bAt, int depth, boolean add, double[] c, int cAt, int stride) {
        DoubleVector c00 = DoubleVector.zero(SPECIES);
        DoubleVector c01 = c00;
        DoubleVector c10 = c00;
        DoubleVector c11 = c00;
        DoubleVector c20 = c00;
        DoubleVector c21 = c00;
        DoubleVector c30 = c00;
        DoubleVector c31 = c00;
        if (add) {
            c00 = DoubleVector.fromArray(SPECIES, c, cAt);
            c01 = DoubleVector.fromArray(SPECIES, c, cAt + LANES);
            c10 = DoubleVector.fromArray(SPECIES, c, cAt + stride);
            c11 = DoubleVector.fromArray(SPECIES, c, cAt + stride + LANES);
            c20 = DoubleVector.fromArray(SPECIES, c, cAt + 2 * stride);
            c21 = DoubleVector.fromArray(SPECIES, c, cAt + 2 * stride + LANES);
            c30 = DoubleVector.fromArray(SPECIES, c, cAt + 3 * stride);
            c31 = DoubleVector.fromArray(SPECIES, c, cAt + 3 * stride + LANES);
        }
        for (int l = 0; l < depth; l++) {
            int row = bAt + COLUMNS * l;
            int at = aAt + ROWS * l;
            DoubleVector b0 = DoubleVector.fromArray(SPECIES, b, row);
            DoubleVector b1 = DoubleVector.fromArray(SPECIES, b, row + LANES);
            DoubleVector t = DoubleVector.broadcast(SPECIES, a[at]);
            c00 = t.fma(b0, c00);
            c01 = t.fma(b1, c01);
            t = DoubleVector.broadcast(SPECIES, a[at + 1]);
            c10 = t.fma(b0, c10);
            c11 = t.fma(b1, c11);
            t = DoubleVector.broadcast(SPECIES, a[at + 2]);
            c20 = t.fma(b0, c20);
            c21 = t.fma(b1, c21);
            t = DoubleVector.broadcast(SPECIES, a[at + 3]);
            c30 = t.fma(b0, c30);
            c31 = t.fma(b1, c31);
        }
        c00.intoArray(c, cAt);
        c01.intoArray(c, cAt + LANES);
        c10.intoArray(c, cAt + stride);
        c11.intoArray(c, cAt + stride + LANES);
        c20.intoArray(c, cAt + 2 * stride);
        c21.intoArray(c, cAt + 2 * stride + LANES);
        c30.intoArray(c, cAt + 3 * stride);
        c31.intoArray(c, cAt + 3 * stride + LANES);
    }

    @Override
    public void squares(
            double[] even, double[] odd, int row, boolean mirrored, double[] frame, int upper, int lower, int count) {
        int re = row * COLUMNS;
        int im = re + COLUMNS;
        int j = 0;
        if (mirrored) {
            for (; j <= count - LANES; j += LANES) {
                DoubleVector a = DoubleVector.fromArray(SPECIES, even, re + j);
                DoubleVector b = DoubleVector.fromArray(SPECIES, odd, re + j);
                DoubleVector c = DoubleVector.fromArray(SPECIES, even, im + j);
                DoubleVector d = DoubleVector.fromArray(SPECIES, odd, im + j);
                DoubleVector u = a.add(b);
                DoubleVector v = c.add(d);
                DoubleVector p = a.sub(b);
                DoubleVector q = c.sub(d);
                p.fma(p, q.mul(q)).rearrange(REVERSED).intoArray(frame, lower - j - (LANES - 1));
                u.fma(u, v.mul(v)).intoArray(frame, upper + j);
            }
        } else {
            for (; j <= count - LANES; j += LANES) {
                DoubleVector u = DoubleVector.fromArray(SPECIES, even, re + j);
                DoubleVector v = DoubleVector.fromArray(SPECIES, even, im + j);
                u.fma(u, v.mul(v)).intoArray(frame, upper + j);
            }
        }
        Loops.squaresOneByOne(COLUMNS, even, odd, row, mirrored, frame, upper, lower, j, count);
    }

    @Override
    public void ladder(
            double[] re,
            double[] im,
            double[] up,
            double[] down,
            int weightAt,
            int count,
            double alphaRe,
            double alphaIm,
            double[] sums,
            int sumAt) {
        DoubleVector amplitudeRe = DoubleVector.zero(SPECIES);
        DoubleVector amplitudeIm = amplitudeRe;
        DoubleVector square = amplitudeRe;
        DoubleVector squeezeRe = amplitudeRe;
        DoubleVector squeezeIm = amplitudeRe;
        DoubleVector minusRe = DoubleVector.broadcast(SPECIES, -alphaRe);
        DoubleVector plusIm = DoubleVector.broadcast(SPECIES, alphaIm);
        int i = 0;
        for (; i <= count - LANES; i += LANES) {
            DoubleVector r = DoubleVector.fromArray(SPECIES, re, i + 1);
            DoubleVector m = DoubleVector.fromArray(SPECIES, im, i + 1);
            DoubleVector u = DoubleVector.fromArray(SPECIES, up, weightAt + i);
            DoubleVector d = DoubleVector.fromArray(SPECIES, down, weightAt + i);
            DoubleVector x = minusRe.mul(r);
            DoubleVector y = minusRe.mul(m);
            DoubleVector v = plusIm.mul(m);
            DoubleVector w = plusIm.mul(r);
            DoubleVector bRe = u.fma(DoubleVector.fromArray(SPECIES, re, i + 2), x.add(v));
            DoubleVector bIm = u.fma(DoubleVector.fromArray(SPECIES, im, i + 2), y.sub(w));
            DoubleVector gRe = d.fma(DoubleVector.fromArray(SPECIES, re, i), x.sub(v));
            DoubleVector gIm = d.fma(DoubleVector.fromArray(SPECIES, im, i), y.add(w));
            amplitudeRe = r.fma(bRe, m.fma(bIm, amplitudeRe));
            amplitudeIm = r.fma(bIm, amplitudeIm.sub(m.mul(bRe)));
            square = bRe.fma(bRe, bIm.fma(bIm, square));
            squeezeRe = gRe.fma(bRe, gIm.fma(bIm, squeezeRe));
            squeezeIm = gRe.fma(bIm, squeezeIm.sub(gIm.mul(bRe)));
        }
        sums[sumAt] += amplitudeRe.reduceLanes(VectorOperators.ADD);
        sums[sumAt + 1] += amplitudeIm.reduceLanes(VectorOperators.ADD);
        sums[sumAt + 2] += square.reduceLanes(VectorOperators.ADD);
        sums[sumAt + 3] += squeezeRe.reduceLanes(VectorOperators.ADD);
        sums[sumAt + 4] += squeezeIm.reduceLanes(VectorOperators.ADD);
        for (; i < count; i++) {
            double r = re[i + 1];
            double m = im[i + 1];
            double u = up[weightAt + i];
            double d = down[weightAt + i];
            double bRe = Math.fma(u, re[i + 2], Math.fma(alphaIm, m, -alphaRe * r));
            double bIm = Math.fma(u, im[i + 2], Math.fma(-alphaIm, r, -alphaRe * m));
            double gRe = Math.fma(d, re[i], Math.fma(-alphaIm, m, -alphaRe * r));
            double gIm = Math.fma(d, im[i], Math.fma(alphaIm, r, -alphaRe * m));
            sums[sumAt] += r * bRe + m * bIm;
            sums[sumAt + 1] += r * bIm - m * bRe;
            sums[sumAt + 2] += bRe * bRe + bIm * bIm;
            sums[sumAt + 3] += gRe * bRe + gIm * bIm;
            sums[sumAt + 4] += gRe * bIm - gIm * bRe;
        }
    }

    @Override
    public void mirrored(double[] re, double[] im, int centre, int from, int count, double[] outRe, double[] outIm) {
        int k = 0;
        for (; k <= count - LANES; k += LANES) {
            int right = centre + from + k;
            int left = centre - from - k - (LANES - 1);
            DoubleVector a = DoubleVector.fromArray(SPECIES, re, right);
            DoubleVector b = DoubleVector.fromArray(SPECIES, im, right);
            DoubleVector u = DoubleVector.fromArray(SPECIES, re, left).rearrange(REVERSED);
            DoubleVector v = DoubleVector.fromArray(SPECIES, im, left).rearrange(REVERSED);
            a.fma(u, b.mul(v)).intoArray(outRe, k);
            b.fma(u, a.mul(v).neg()).intoArray(outIm, k);
        }
        Loops.mirroredOneByOne(re, im, centre, from, k, count, outRe, outIm);
    }

    @Override
    public void turn(
            double[] cosine,
            double[] sine,
            int from,
            double[] byCosine,
            double[] bySine,
            int by,
            double[] toCosine,
            double[] toSine,
            int to,
            int count) {
        for (int half = 0; half < COLUMNS; half += LANES) {
            DoubleVector u = DoubleVector.fromArray(SPECIES, byCosine, by * COLUMNS + half);
            DoubleVector v = DoubleVector.fromArray(SPECIES, bySine, by * COLUMNS + half);
            for (int r = 0; r < count; r++) {
                int a = (from + r) * COLUMNS + half;
                int c = (to + r) * COLUMNS + half;
                DoubleVector x = DoubleVector.fromArray(SPECIES, cosine, a);
                DoubleVector y = DoubleVector.fromArray(SPECIES, sine, a);
                x.fma(u, y.mul(v).neg()).intoArray(toCosine, c);
                x.fma(v, y.mul(u)).intoArray(toSine, c);
            }
        }
    }
}
