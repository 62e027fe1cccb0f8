package ladderwell.phasespace;

import ladderwell.numeric.HermitianTransform;
import ladderwell.numeric.Interruption;

/**
 * Correlations folded with the ground state's: Σ_s w(x − s) f_k(s) e^{−(kd)²/w²}, w a normalised Gaussian, so that their Fourier sums are Husimi
 * values.
 */
final class Smoothed implements HermitianTransform.Rows {
    /** In units of the width: e^{−6.1²} = 7e-17. */
    static final double REACH = 6.1;

    private final Lattice lattice;
    private final int rowsBetween;
    private final int extra;
    private final int length;
    private final double[][] re;
    private final double[][] im;
    private final double[] weight;
    private final int[] lengths;

    Smoothed(Correlations sharp, double width) {
        lattice = sharp.lattice();
        double spacing = lattice.step() * lattice.rowStep();
        extra = lattice.extra();
        rowsBetween = lattice.between();
        length = (int) Math.ceil(REACH * width / lattice.step()) + 1;
        re = new double[lattice.rows()][length];
        im = new double[lattice.rows()][length];
        lengths = new int[lattice.rows()];
        for (int r = 0; r < lattice.rows(); r++) {
            lengths[r] = Math.min(length, sharp.length(r));
            if (lengths[r] > 0) {
                sharp.fill(r, 0, lengths[r], re[r], im[r]);
            }
            for (int k = 0; k < lengths[r]; k++) {
                double y = k * lattice.step() / width;
                double fall = Math.exp(-y * y);
                re[r][k] *= fall;
                im[r][k] *= fall;
            }
        }
        weight = new double[extra + 1];
        for (int i = 0; i <= extra; i++) {
            double s = i * spacing / width;
            weight[i] = spacing / (Math.sqrt(Math.PI) * width) * Math.exp(-s * s);
        }
    }

    @Override
    public int length(int row) {
        int longest = 0;
        int middle = extra + row * rowsBetween;
        for (int r = middle - extra; r <= middle + extra; r++) {
            longest = Math.max(longest, lengths[r]);
        }
        return longest;
    }

    @Override
    public void fill(int row, int from, int count, double[] outRe, double[] outIm) {
        Interruption.check();
        for (int k = 0; k < count; k++) {
            outRe[k] = 0;
            outIm[k] = 0;
        }
        int middle = extra + row * rowsBetween;
        for (int i = -extra; i <= extra; i++) {
            double w = weight[Math.abs(i)];
            double[] r = re[middle + i];
            double[] m = im[middle + i];
            for (int k = 0; k < count; k++) {
                outRe[k] = Math.fma(w, r[from + k], outRe[k]);
                outIm[k] = Math.fma(w, m[from + k], outIm[k]);
            }
        }
    }
}
