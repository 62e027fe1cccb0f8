package ladderwell.level;

import ladderwell.numeric.Interruption;

/**
 * A proved upper bound of the number of levels below an energy.
 *
 * <p>With J₁ = cos φ(n), J₂ = sin φ(n) on the oscillator states n, φ rising from 0 at n = N to π/2 at n = N + m, any matrix obeys H = J₁HJ₁ +
 * J₂HJ₂ + L, L_ij = 2 sin²((φ_i − φ_j)/2) H_ij (the localization formula of Ismagilov, Morgan, Simon and Sigal). L is at least minus its row
 * sums e, so no more levels lie below λ than eigenvalues of the finite H_{N+m} − e, as long as H − e exceeds λ on all states from N on. That
 * holds where Ω(N + 1/2) − max(Ω² y²/2 − V) − max e does. The rise of φ makes the row sums about equal.
 */
final class LevelCount {
    private static final int LARGEST = 12_000;

    private LevelCount() {}

    /**
     * @param part 0 or 1 for one parity of an even polynomial, −1 for all levels
     * @return the bound, or {@code Integer.MAX_VALUE} where the argument does not reach
     */
    static int below(double energy, OscillatorBasis like, int part) {
        double floor = like.omega() * 0.5 - like.excess();
        int first = (int)
                Math.max(4, Math.ceil((energy + 0.05 * Math.abs(energy) + 2 * like.omega() - floor) / like.omega()));
        for (int attempt = 0; attempt < 4 && first < LARGEST / 4; attempt++) {
            Interruption.check();
            int found = attempt(energy, like, part, first, 3 * first + 40);
            if (found < Integer.MAX_VALUE) {
                return found;
            }
            first += first / 2 + 4;
        }
        return Integer.MAX_VALUE;
    }

    private static int attempt(double energy, OscillatorBasis like, int part, int first, int rise) {
        int size = first + rise;
        int degree = like.degree();
        OscillatorBasis basis = OscillatorBasis.of(like.polynomial(), size, like.omega(), like.centre());
        double[][] rows = basis.rows();
        double[][] sizes = basis.sizes();
        double[] angle = new double[size + degree + 1];
        double total = 0;
        for (int n = first; n < size; n++) {
            total += Math.pow(n, -degree / 4.0);
            angle[n + 1] = total;
        }
        for (int n = 0; n < angle.length; n++) {
            angle[n] = n >= size ? Math.PI / 2 : Math.PI / 2 * angle[n] / total;
        }
        // Row sums of |L|, sizes of the rows for the rounding; the border rows beyond the basis have their largest sums
        // inside.
        double[] lost = new double[size + degree];
        double largest = 0;
        for (int q = 0; q <= degree; q++) {
            for (int n = 0; n < size; n++) {
                double sine = Math.sin((angle[n + q] - angle[n]) / 2);
                double share = 2 * sine * sine * sizes[q][n];
                lost[n] += share;
                if (q > 0) {
                    lost[n + q] += share;
                }
            }
        }
        double worst = 0;
        for (double e : lost) {
            worst = Math.max(worst, e);
        }
        worst *= 1 + 0x1p-40;
        if (!(basis.omega() * (first + 0.5) - like.excess() - worst > energy)) {
            return Integer.MAX_VALUE;
        }
        for (int n = 0; n < size; n++) {
            rows[0][n] -= lost[n] * (1 + 0x1p-40);
        }
        double[][] a = part < 0 ? rows : OscillatorBasis.parity(rows, size, part);
        double[][] b = part < 0 ? sizes : OscillatorBasis.parity(sizes, size, part);
        // Roundings of the elements move no eigenvalue by more than the largest row of them (Gershgorin).
        int count = a[0].length;
        for (int n = 0; n < count; n++) {
            double row = b[0][n] + lost[part < 0 ? n : 2 * n + part];
            for (int q = 1; q < b.length; q++) {
                row += (n + q < count ? b[q][n] : 0) + (n >= q ? b[q][n - q] : 0);
            }
            largest = Math.max(largest, row);
        }
        double shift = (basis.rounding() + 0x1p-50) * largest;
        double above = energy + 2 * shift;
        for (int round = 0; round < 3; round++) {
            double[] found = Inertia.negative(a, count, above);
            if (above - found[1] - shift >= energy) {
                return (int) found[0];
            }
            above = energy + 2 * shift + 2 * found[1];
        }
        return Integer.MAX_VALUE;
    }
}
