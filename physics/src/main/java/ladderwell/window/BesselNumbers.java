package ladderwell.window;

/**
 * J_k(z) for k = 0, 1, … at one z, their sums that are integrals, and bounds over the stretch from 0 to z.
 *
 * @accuracy each J_k to {@value #ERROR}: Miller's recurrence downwards, scaled by J_0 + 2 Σ J_2k = 1
 * @source DLMF 10.12.4, 10.22.9 (∫₀ᶻ J_k = 2 Σ_{i≥0} J_{k+1+2i}); Landau, J. London Math. Soc. 61 (2000) 197 (|J_k| ≤ 0.675 k^{−1/3});
 *     Watson, Theory of Bessel Functions, 13.74 ((x² − k²)^{1/2} J_k² ≤ 2/π beyond k)
 */
final class BesselNumbers {
    static final double ERROR = 1e-15;

    private final double z;
    private final double[] j;
    private final double[] tail;

    BesselNumbers(double z) {
        this.z = z;
        // beyond this J_k is below 1e-40
        int count = (int) Math.ceil(1.2 * z + 12 * Math.cbrt(z)) + 60;
        j = new double[count + 2];
        j[count] = 1e-300;
        for (int k = count; k > 0; k--) {
            j[k - 1] = z == 0 ? 0 : 2 * k / z * j[k] - j[k + 1];
            if (Math.abs(j[k - 1]) > 1e200) {
                for (int i = k - 1; i <= count; i++) {
                    j[i] *= 1e-250;
                }
            }
        }
        if (z == 0) {
            j[0] = 1;
        }
        double sum = j[0];
        for (int k = 2; k <= count; k += 2) {
            sum += 2 * j[k];
        }
        for (int k = 0; k <= count; k++) {
            j[k] /= sum;
        }
        tail = new double[count + 4];
        for (int k = count; k >= 0; k--) {
            tail[k] = tail[k + 2] + Math.abs(j[k]);
        }
    }

    int count() {
        return j.length - 2;
    }

    double value(int k) {
        return k < j.length ? j[k] : 0;
    }

    /** ∫₀ᶻ J_k for k ≥ z, where J_k is positive throughout. */
    double integral(int k) {
        return k + 1 < tail.length ? 2 * tail[k + 1] : 0;
    }

    /** Bound of |J_k| on 0 … z. */
    double most(int k) {
        return k >= z ? value(k) + ERROR : k == 0 ? 1 : Math.min(1, 0.675 / Math.cbrt(k));
    }

    /**
     * Bound of ∫₀ᶻ |J_k|: below k the integral of a positive function that ends at about 1/3 (Watson 8.1 and 15.3), beyond k that of √(2/π) (x² −
     * k²)^(−1/4).
     */
    double weight(int k) {
        if (k >= z) {
            return integral(k) + ERROR * z;
        }
        double beyond = z - k;
        double far = 2 * Math.sqrt(beyond);
        double near = k == 0 ? far : 4.0 / 3 * Math.sqrt(beyond * Math.sqrt(beyond) / Math.sqrt(2.0 * k));
        return (k == 0 ? 0 : 0.5) + Math.sqrt(2 / Math.PI) * Math.min(far, near);
    }
}
