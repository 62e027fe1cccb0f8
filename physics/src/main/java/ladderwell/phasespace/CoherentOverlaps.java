package ladderwell.phasespace;

import java.util.Arrays;
import ladderwell.numeric.HermitianTransform;

/**
 * Rows whose Fourier sums are the overlaps ⟨α|ψ⟩ of a wave function with coherent states about the middle of each row: their real parts, or their
 * imaginary parts. A row g_k of samples under the Gaussian is taken apart into Hermitian ones, (g_k + g*_{−k})/2 and (g_k − g*_{−k})/2i.
 */
final class CoherentOverlaps implements HermitianTransform.Rows {
    /** In units of the width: e^{−8.6²/2} is 9e-17. */
    static final double REACH = 8.6;

    private final Lattice lattice;
    private final double[] re;
    private final double[] im;
    private final double[] gaussian;
    private final boolean imaginary;

    private CoherentOverlaps(Lattice lattice, double[] re, double[] im, double[] gaussian, boolean imaginary) {
        this.lattice = lattice;
        this.re = re;
        this.im = im;
        this.gaussian = gaussian;
        this.imaginary = imaginary;
    }

    /** The rows of real parts. */
    static CoherentOverlaps of(WaveFunction wave, Lattice lattice, double width) {
        double[] re = new double[lattice.points()];
        double[] im = new double[lattice.points()];
        wave.sample(lattice.positions(), re, im);
        double[] gaussian = new double[(int) Math.ceil(REACH * width / lattice.step()) + 1];
        for (int k = 0; k < gaussian.length; k++) {
            double y = k * lattice.step() / width;
            gaussian[k] = Math.exp(-y * y / 2);
        }
        return new CoherentOverlaps(lattice, re, im, gaussian, false);
    }

    /** The rows of imaginary parts. */
    CoherentOverlaps imaginary() {
        return new CoherentOverlaps(lattice, re, im, gaussian, true);
    }

    @Override
    public int length(int row) {
        int middle = lattice.middle(row);
        if (middle + gaussian.length <= lattice.from() || middle - gaussian.length >= lattice.to()) {
            return 0;
        }
        return Math.min(gaussian.length, Math.max(middle - lattice.from(), lattice.to() - middle) + 1);
    }

    @Override
    public void fill(int row, int from, int count, double[] outRe, double[] outIm) {
        int middle = lattice.middle(row) - lattice.from();
        Arrays.fill(outRe, 0, count, 0);
        Arrays.fill(outIm, 0, count, 0);
        for (int k = 0; k < count; k++) {
            int right = middle + from + k;
            int left = middle - from - k;
            double half = gaussian[from + k] / 2;
            double a = 0;
            double b = 0;
            double c = 0;
            double d = 0;
            if (right >= 0 && right < re.length) {
                a = half * re[right];
                b = half * im[right];
            }
            if (left >= 0 && left < re.length) {
                c = half * re[left];
                d = half * im[left];
            }
            // g = a + ib, g*₋ = c − id
            outRe[k] = imaginary ? b + d : a + c;
            outIm[k] = imaginary ? c - a : b - d;
        }
    }
}
