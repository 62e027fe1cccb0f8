package ladderwell.phasespace;

import ladderwell.numeric.MirroredProducts;

/** ψ(s + kd) ψ*(s − kd). */
final class PureCorrelations implements Correlations {
    private final Lattice lattice;
    private final double[] re;
    private final double[] im;
    private final double square;
    private final double sampleError;

    PureCorrelations(WaveFunction wave, Lattice lattice) {
        this.lattice = lattice;
        double[] x = lattice.positions();
        re = new double[x.length];
        im = new double[x.length];
        wave.sample(x, re, im);
        double sum = 0;
        for (int j = 0; j < re.length; j++) {
            sum += re[j] * re[j] + im[j] * im[j];
        }
        square = sum * lattice.step();
        sampleError = wave.sampleError().size();
    }

    @Override
    public Lattice lattice() {
        return lattice;
    }

    @Override
    public int length(int row) {
        return lattice.length(row);
    }

    @Override
    public void fill(int row, int from, int count, double[] outRe, double[] outIm) {
        MirroredProducts.of(re, im, lattice.middle(row) - lattice.from(), from, count, outRe, outIm);
    }

    @Override
    public double rowError() {
        // By the inequality of Cauchy and Schwarz, over samples that are each off by no more than the error.
        double off = sampleError * Math.sqrt(lattice.points() * lattice.step());
        return (2 * Math.sqrt(square) + off) * off + 3 * 0x1p-53 * square;
    }

    @Override
    public double rowSize() {
        return square;
    }
}
