package ladderwell.state;

import ladderwell.numeric.DoubleDouble;
import ladderwell.numeric.DoubleDoubleFunctions;

/**
 * Superpositions of k coherent states on a circle, Σ_j e^{ijχ} |α e^{2πij/k}⟩, j = 0 … k − 1: amplitudes w_n √P_n e^{inφ} with w_n = Σ_j
 * e^{ij(χ + 2πn/k)}, which depends on n modulo k only.
 *
 * @source Yurke and Stoler, Phys. Rev. Lett. 57 (1986) 13; Buzek, Vidiella-Barranco and Knight, Phys. Rev. A 45 (1992) 6570
 */
final class CatState {
    private CatState() {}

    /** w_n k of a class of levels alone: n ≡ residue modulo k. */
    static double[][] residue(int components, int residue) {
        double[] re = new double[components];
        re[residue] = 1;
        return new double[][] {re, new double[components]};
    }

    /** w_n/k for n = 0 … k − 1. */
    static double[][] phased(int components, double chi) {
        double[] re = new double[components];
        double[] im = new double[components];
        DoubleDouble turn = DoubleDouble.QUARTER_TURN.times(4.0);
        for (int n = 0; n < components; n++) {
            DoubleDouble angle = turn.times(n).dividedBy(components).plus(chi);
            DoubleDouble sumRe = DoubleDouble.ZERO;
            DoubleDouble sumIm = DoubleDouble.ZERO;
            for (int j = 0; j < components; j++) {
                DoubleDoubleFunctions.Pair turned = DoubleDoubleFunctions.cosSin(angle.times(j));
                sumRe = sumRe.plus(turned.first());
                sumIm = sumIm.plus(turned.second());
            }
            re[n] = sumRe.hi() / components;
            im[n] = sumIm.hi() / components;
        }
        return new double[][] {re, im};
    }

    static Amplitudes of(double mean, double phase, double[][] weights, double tolerance) {
        int k = weights[0].length;
        if (mean == 0) {
            return vacuum(weights);
        }
        double norm2 = norm2(mean, weights, 1e-4);
        // tails are allowed relative to what is left of the norm, which for far residues is little
        double most = 0;
        for (int n = 0; n < k; n++) {
            most = Math.max(most, weights[0][n] * weights[0][n] + weights[1][n] * weights[1][n]);
        }
        double allowed = tolerance * tolerance / 8 * norm2 / most;
        if (!(allowed > 1e-280)) {
            throw new IllegalArgumentException("at a mean of " + mean
                    + " quanta per component almost nothing is left of this cat (weight " + norm2
                    + "); give it more quanta or another parity");
        }
        PoissonWindow window = new PoissonWindow(mean, allowed);
        double[] re = window.roots();
        double[] im = new double[re.length];
        ExactTurns turns = new ExactTurns(phase);
        turns.jumpTo(window.first());
        DoubleDouble sum = DoubleDouble.ZERO;
        for (int i = 0; i < re.length; i++) {
            int n = (int) ((window.first() + i) % k);
            double wRe = weights[0][n] * re[i];
            double wIm = weights[1][n] * re[i];
            re[i] = wRe * turns.cosine() - wIm * turns.sine();
            im[i] = wRe * turns.sine() + wIm * turns.cosine();
            sum = sum.plus(re[i] * re[i] + im[i] * im[i]);
            turns.next();
        }
        double norm = Math.sqrt(sum.hi());
        for (int i = 0; i < re.length; i++) {
            re[i] /= norm;
            im[i] /= norm;
        }
        double scale = most / sum.hi();
        double[] moments = window.tailMoments().clone();
        for (int i = 0; i < moments.length; i++) {
            moments[i] *= scale * (1 + 1e-9);
        }
        // the kept part is scaled to norm 1: off by half the weight left out, besides that weight itself
        double error = Math.nextUp(Math.sqrt(moments[0]))
                + moments[0]
                + PoissonWindow.RELATIVE_ERROR
                + ExactTurns.ERROR
                + 0x1p-50;
        return new Amplitudes(
                new long[] {window.first()},
                new double[][] {re},
                new double[][] {im},
                error,
                moments,
                window.tailSum() * Math.sqrt(scale) * (1 + 1e-9),
                moments[0]);
    }

    /** Σ P_n |w_n|², to a factor: enough to place the tails. */
    private static double norm2(double mean, double[][] weights, double smallest) {
        int k = weights[0].length;
        double[] classes = new double[k];
        PoissonWindow window = new PoissonWindow(mean, smallest);
        for (int i = 0; i < window.roots().length; i++) {
            classes[(int) ((window.first() + i) % k)] += window.roots()[i] * window.roots()[i];
        }
        double sum = 0;
        for (int n = 0; n < k; n++) {
            // the first level of a class that the window does not reach
            double p = classes[n] > 0 ? classes[n] : poisson(mean, n);
            sum += p * (weights[0][n] * weights[0][n] + weights[1][n] * weights[1][n]);
        }
        return sum;
    }

    private static double poisson(double mean, int n) {
        double log = -mean + n * Math.log(mean);
        for (int j = 2; j <= n; j++) {
            log -= Math.log(j);
        }
        return Math.exp(log);
    }

    private static Amplitudes vacuum(double[][] weights) {
        double size = Math.hypot(weights[0][0], weights[1][0]);
        if (!(size > 1e-14)) {
            throw new IllegalArgumentException(
                    "at 0 quanta per component nothing is left of this cat; give it some quanta or another parity");
        }
        return Amplitudes.level(0);
    }
}
