package ladderwell.window;

import java.util.ArrayList;
import java.util.List;
import ladderwell.operator.LadderPolynomial;

/**
 * The diagonals of an operator on the columns of a window: P|n⟩ = Σ_b w_b(n) |n + b⟩.
 *
 * @param all the diagonals that are not zero
 */
record Bands(List<Band> all) {

    /** One diagonal. Elements are at {@code margin + n}, n counted from the first level of the window; zeros around. */
    static final class Band {
        final int shift;
        final double[] re;
        final double[] im;
        private final boolean realIsZero;
        private final boolean imaginaryIsZero;

        Band(int shift, double[] re, double[] im) {
            this.shift = shift;
            this.re = re;
            this.im = im;
            realIsZero = isZero(re);
            imaginaryIsZero = isZero(im);
        }

        boolean realIsZero() {
            return realIsZero;
        }

        boolean imaginaryIsZero() {
            return imaginaryIsZero;
        }

        double size(int i) {
            return Math.abs(re[i]) + Math.abs(im[i]);
        }

        private static boolean isZero(double[] values) {
            for (double value : values) {
                if (value != 0) {
                    return false;
                }
            }
            return true;
        }
    }

    /**
     * The diagonals of factor · operator.
     *
     * @param first first level of the window
     * @param levels how many levels
     * @param margin zeros on either side
     */
    static Bands of(LadderPolynomial operator, double factor, long first, int levels, int margin) {
        List<Band> all = new ArrayList<>();
        for (int b = -operator.lowers(); b <= operator.raises(); b++) {
            double[] re = new double[levels];
            double[] im = new double[levels];
            operator.band(b, first, re, im);
            double[] wideRe = new double[levels + 2 * margin];
            double[] wideIm = new double[levels + 2 * margin];
            for (int n = 0; n < levels; n++) {
                wideRe[margin + n] = factor * re[n];
                wideIm[margin + n] = factor * im[n];
            }
            Band band = new Band(b, wideRe, wideIm);
            if (b == 0 || !band.realIsZero() || !band.imaginaryIsZero()) {
                all.add(band);
            }
        }
        return new Bands(all);
    }

    /** Σ_b of the largest |w_b|: bounds the operator norm on the window. */
    double norm() {
        double sum = 0;
        for (Band band : all) {
            double most = 0;
            for (int i = 0; i < band.re.length; i++) {
                most = Math.max(most, Math.hypot(band.re[i], band.im[i]));
            }
            sum += most;
        }
        return sum;
    }

    /** The main diagonal. */
    Band diagonal() {
        for (Band band : all) {
            if (band.shift == 0) {
                return band;
            }
        }
        throw new IllegalStateException("the main diagonal is always kept");
    }
}
