package ladderwell.numeric;

import jdk.incubator.vector.DoubleVector;
import jdk.incubator.vector.VectorOperators;
import jdk.incubator.vector.VectorSpecies;

/** Row loops with the Vector API; what is left of a row is done plainly. */
final class VectorRowLoops implements RowLoops {
    private static final VectorSpecies<Double> SPECIES = DoubleVector.SPECIES_PREFERRED;
    private static final int LANES = SPECIES.length();

    @Override
    public void add(double[] out, int o, double[] in, int x, int length, double c) {
        DoubleVector factor = DoubleVector.broadcast(SPECIES, c);
        int i = 0;
        for (; i <= length - LANES; i += LANES) {
            DoubleVector.fromArray(SPECIES, in, x + i)
                    .fma(factor, DoubleVector.fromArray(SPECIES, out, o + i))
                    .intoArray(out, o + i);
        }
        PlainRowLoops.add(out, o, in, x, i, length, c);
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
        DoubleVector c = DoubleVector.broadcast(SPECIES, re);
        DoubleVector d = DoubleVector.broadcast(SPECIES, im);
        int i = 0;
        for (; i <= length - LANES; i += LANES) {
            DoubleVector a = DoubleVector.fromArray(SPECIES, inRe, x + i);
            DoubleVector b = DoubleVector.fromArray(SPECIES, inIm, x + i);
            a.fma(c, DoubleVector.fromArray(SPECIES, outRe, o + i))
                    .sub(d.mul(b))
                    .intoArray(outRe, o + i);
            b.fma(c, DoubleVector.fromArray(SPECIES, outIm, o + i))
                    .add(d.mul(a))
                    .intoArray(outIm, o + i);
        }
        PlainRowLoops.add(outRe, outIm, o, inRe, inIm, x, i, length, re, im);
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
        DoubleVector realPart = DoubleVector.broadcast(SPECIES, re);
        DoubleVector imaginaryPart = DoubleVector.broadcast(SPECIES, im);
        int i = 0;
        for (; i <= length - LANES; i += LANES) {
            DoubleVector a = DoubleVector.fromArray(SPECIES, inRe, x + i);
            DoubleVector b = DoubleVector.fromArray(SPECIES, inIm, x + i);
            DoubleVector c = realPart.add(DoubleVector.fromArray(SPECIES, vRe, v + i));
            DoubleVector d = imaginaryPart.sub(DoubleVector.fromArray(SPECIES, vIm, v + i));
            a.fma(c, DoubleVector.fromArray(SPECIES, outRe, o + i))
                    .sub(d.mul(b))
                    .intoArray(outRe, o + i);
            b.fma(c, DoubleVector.fromArray(SPECIES, outIm, o + i))
                    .add(d.mul(a))
                    .intoArray(outIm, o + i);
        }
        PlainRowLoops.diagonal(outRe, outIm, o, inRe, inIm, x, i, length, re, im, vRe, vIm, v);
    }

    @Override
    public void product(double[] out, int o, double[] in, int x, int length, double c, double[] factor, int v) {
        DoubleVector all = DoubleVector.broadcast(SPECIES, c);
        int i = 0;
        for (; i <= length - LANES; i += LANES) {
            DoubleVector.fromArray(SPECIES, in, x + i)
                    .fma(
                            all.mul(DoubleVector.fromArray(SPECIES, factor, v + i)),
                            DoubleVector.fromArray(SPECIES, out, o + i))
                    .intoArray(out, o + i);
        }
        PlainRowLoops.product(out, o, in, x, i, length, c, factor, v);
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
        DoubleVector realPart = DoubleVector.broadcast(SPECIES, re);
        DoubleVector imaginaryPart = DoubleVector.broadcast(SPECIES, im);
        int i = 0;
        for (; i <= length - LANES; i += LANES) {
            DoubleVector p = DoubleVector.fromArray(SPECIES, vRe, v + i);
            DoubleVector q = DoubleVector.fromArray(SPECIES, vIm, v + i);
            DoubleVector c = realPart.mul(p).add(imaginaryPart.mul(q));
            DoubleVector d = imaginaryPart.mul(p).sub(realPart.mul(q));
            DoubleVector a = DoubleVector.fromArray(SPECIES, inRe, x + i);
            DoubleVector b = DoubleVector.fromArray(SPECIES, inIm, x + i);
            a.fma(c, DoubleVector.fromArray(SPECIES, outRe, o + i))
                    .sub(d.mul(b))
                    .intoArray(outRe, o + i);
            b.fma(c, DoubleVector.fromArray(SPECIES, outIm, o + i))
                    .add(d.mul(a))
                    .intoArray(outIm, o + i);
        }
        PlainRowLoops.product(outRe, outIm, o, inRe, inIm, x, i, length, re, im, vRe, vIm, v);
    }

    @Override
    public double squares(double[] re, double[] im, int x, int length) {
        DoubleVector a = DoubleVector.zero(SPECIES);
        DoubleVector b = a;
        int i = 0;
        for (; i <= length - LANES; i += LANES) {
            DoubleVector p = DoubleVector.fromArray(SPECIES, re, x + i);
            DoubleVector q = DoubleVector.fromArray(SPECIES, im, x + i);
            a = p.fma(p, a);
            b = q.fma(q, b);
        }
        double sum = i > 0 ? a.add(b).reduceLanes(VectorOperators.ADD) : 0;
        return sum + PlainRowLoops.squares(re, im, x, i, length);
    }
}
