package ladderwell.state;

import java.util.Arrays;
import ladderwell.numeric.DoubleDouble;

/**
 * Moments of cats in closed form. With the Poisson weights of the levels in the class c modulo K, Q_c = Σ_{n ≡ c} P_n, and the weights w_n of
 * {@link CatState}, which repeat with n,
 *
 * <p>⟨a†^j a^k⟩ = α*^j α^k Σ_c w_{c+j}* w_{c+k} Q_c / Σ_c |w_c|² Q_c.
 *
 * <p>All terms of a sum with j = k are positive, so that nothing cancels however few quanta are left.
 *
 * @source Buzek, Vidiella-Barranco and Knight, Phys. Rev. A 45 (1992) 6570, for two components
 */
public final class CatMoments {
    /** Up to this mean the classes are summed level by level, above as a finite Fourier series. */
    private static final double SUMMED_UP_TO = 600;

    private final double[] wRe;
    private final double[] wIm;
    /** Q_c less its common part, which drops out of differences. */
    private final double[] q;

    private final double common;
    private final double classError;
    private final double norm;

    private CatMoments(double mean, double[][] weights) {
        int k = weights[0].length;
        // parity needs an even number of classes
        int classes = k % 2 == 0 ? k : 2 * k;
        wRe = new double[classes];
        wIm = new double[classes];
        q = new double[classes];
        for (int c = 0; c < classes; c++) {
            wRe[c] = weights[0][c % k];
            wIm[c] = weights[1][c % k];
        }
        boolean summed = mean <= SUMMED_UP_TO;
        common = summed ? 0 : 1.0 / classes;
        if (summed) {
            sumClasses(mean);
            classError = 0;
        } else {
            classError = fourierClasses(mean);
        }
        double sum = 0;
        for (int c = 0; c < classes; c++) {
            sum += weight(c) * (common + q[c]);
        }
        norm = sum;
        if (!(norm > 1e-280)) {
            throw new IllegalArgumentException(
                    "at a mean of " + mean
                            + " quanta per component almost nothing is left of this cat; give it more quanta or another parity");
        }
    }

    /** Moments of {@link HarmonicStates#cat}. */
    public static CatMoments ofClass(double mean, int components, int residue) {
        return new CatMoments(mean, CatState.residue(components, residue));
    }

    /** Moments of {@link HarmonicStates#phasedCat}. */
    public static CatMoments phased(double mean, int components, double chi) {
        return new CatMoments(mean, CatState.phased(components, chi));
    }

    /** Q_c up to the common factor e^{mean}, to all digits of a double. */
    private void sumClasses(double mean) {
        DoubleDouble[] sums = new DoubleDouble[q.length];
        Arrays.fill(sums, DoubleDouble.ZERO);
        DoubleDouble term = DoubleDouble.ONE;
        double last = mean + 20 * Math.sqrt(mean) + 2 * q.length + 40;
        for (int n = 0; n <= last; n++) {
            sums[n % q.length] = sums[n % q.length].plus(term);
            term = term.times(mean).dividedBy(n + 1.0);
        }
        for (int c = 0; c < q.length; c++) {
            q[c] = sums[c].hi();
        }
    }

    /** Q_c − 1/K and its error; Q_c − 1/K = (1/K) Σ_{j≥1} e^{μ(cos θ_j − 1)} cos(μ sin θ_j − cθ_j), θ_j = 2πj/K. */
    private double fourierClasses(double mean) {
        double off = 0;
        for (int j = 1; j < q.length; j++) {
            double angle = 2 * Math.PI * j / q.length;
            double fall = 2 * mean * Math.sin(angle / 2) * Math.sin(angle / 2);
            double size = Math.exp(-fall) / q.length;
            double turn = mean * Math.sin(angle);
            for (int c = 0; c < q.length; c++) {
                q[c] += size * Math.cos(turn - angle * c);
            }
            // a few roundings in the exponent, in the phase and in the product
            off += size == 0 ? 0 : size * 0x1p-52 * (8 * fall + 8 * Math.abs(turn) + 8 * Math.PI * q.length + 8);
        }
        return off;
    }

    private double weight(int c) {
        return wRe[c] * wRe[c] + wIm[c] * wIm[c];
    }

    private int wrapped(int c) {
        return Math.floorMod(c, q.length);
    }

    /**
     * ⟨a†^j a^k⟩ / (α*^j α^k).
     *
     * @return real part, imaginary part
     */
    public double[] ratio(int j, int k) {
        double re = 0;
        double im = 0;
        for (int c = 0; c < q.length; c++) {
            int left = wrapped(c + j);
            int right = wrapped(c + k);
            double share = (common + q[c]) / norm;
            re += (wRe[left] * wRe[right] + wIm[left] * wIm[right]) * share;
            im += (wRe[left] * wIm[right] - wIm[left] * wRe[right]) * share;
        }
        return new double[] {re, im};
    }

    /** ⟨a†^k a^k⟩/|α|^{2k} − 1, without the difference of large numbers: 0 where the components no longer overlap. */
    public double excess(int k) {
        double sum = 0;
        for (int c = 0; c < q.length; c++) {
            sum += weight(c) * (q[wrapped(c - k)] - q[c]);
        }
        return sum / norm;
    }

    /** Error of {@link #excess}. */
    public double excessError(int k) {
        double size = 0;
        for (int c = 0; c < q.length; c++) {
            size += weight(c) * (Math.abs(q[wrapped(c - k)]) + Math.abs(q[c])) / norm;
        }
        return 0x1p-49 * size + 4 * spill() * (1 + size);
    }

    /** ⟨(−1)^n⟩. */
    public double parity() {
        double sum = 0;
        for (int c = 0; c < q.length; c++) {
            sum += (c % 2 == 0 ? 1 : -1) * weight(c) * (common + q[c]);
        }
        return sum / norm;
    }

    /** Error of {@link #parity} and of each {@link #ratio} whose size is about 1. */
    public double error() {
        return 0x1p-50 * q.length + 4 * spill();
    }

    private double spill() {
        double sum = 0;
        for (int c = 0; c < q.length; c++) {
            sum += weight(c);
        }
        return sum * classError / norm;
    }
}
