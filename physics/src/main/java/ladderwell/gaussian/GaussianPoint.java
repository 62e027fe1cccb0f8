package ladderwell.gaussian;

import static java.util.Objects.requireNonNull;

import ladderwell.evidence.Bound;
import ladderwell.evidence.Certainty;
import ladderwell.evidence.PhysicsException;

/**
 * A Gaussian state at one time with its error, and everything that is read from it. Every bound follows from the two errors below by
 * inequalities that hold for errors of any size.
 *
 * @param time t
 * @param state means and covariances
 * @param meanError bound of the length of the error of (x, p)
 * @param covarianceError bound of the Frobenius norm of the error of the covariance matrix
 */
public record GaussianPoint(double time, GaussianState state, Bound meanError, Bound covarianceError) {
    /** Roundings of one formula, in parts of the sizes that enter it; each formula takes fewer than 16. */
    private static final double U = 0x1p-48;

    /** Refuses nulls. */
    public GaussianPoint {
        requireNonNull(state, "state");
        requireNonNull(meanError, "meanError");
        requireNonNull(covarianceError, "covarianceError");
    }

    /**
     * A computed point. Error may bring the covariances of a pure state below the uncertainty bound; they are widened to it, and the step
     * is booked.
     *
     * @throws PhysicsException.NotConverged if more than a fifth is missing
     */
    static GaussianPoint of(
            double time, double x, double p, double xx, double xp, double pp, Bound meanError, Bound covarianceError) {
        double determinant = GaussianState.determinant(xx, xp, pp);
        double widen = 1;
        if (determinant < 0.25 && determinant > 0.2) {
            widen = Math.sqrt(0.25 / determinant);
        } else if (!(determinant >= 0.25 - GaussianState.ROUNDING * (1 + xx * pp)) && determinant < 0.25) {
            throw new PhysicsException.NotConverged(
                    "the covariances at t = " + time, 1, covarianceError.size(), 0.25 - determinant);
        }
        double size = Math.sqrt(xx * xx + 2 * xp * xp + pp * pp);
        return new GaussianPoint(
                time,
                new GaussianState(x, p, widen * xx, widen * xp, widen * pp),
                meanError,
                covarianceError.plus((widen - 1) * size * (1 + U)));
    }

    static GaussianPoint known(GaussianState state) {
        return new GaussianPoint(0, state, Bound.exact(), Bound.exact());
    }

    private Certainty certainty() {
        return meanError.kind().weaker(covarianceError.kind());
    }

    private double dm() {
        return meanError.size();
    }

    private double dv() {
        return covarianceError.size();
    }

    private Measured measured(double value, double error) {
        return new Measured(value, new Bound(certainty(), error));
    }

    private Measured between(double value, double low, double high) {
        return measured(value, Math.nextUp(Math.max(high - value, value - low)) + Math.abs(value) * U);
    }

    /** ⟨x⟩. */
    public Measured position() {
        return new Measured(state.x(), meanError);
    }

    /** ⟨p⟩. */
    public Measured momentum() {
        return new Measured(state.p(), meanError);
    }

    /** Variance of x. */
    public Measured positionVariance() {
        return new Measured(state.xx(), covarianceError);
    }

    /** Covariance of x and p. */
    public Measured covariance() {
        return new Measured(state.xp(), covarianceError);
    }

    /** Variance of p. */
    public Measured momentumVariance() {
        return new Measured(state.pp(), covarianceError);
    }

    /** ⟨n⟩ = (xx + pp + x² + p² − 1)/2. */
    public Measured quanta() {
        double m = state.length();
        double value = (state.xx() + state.pp() - 1 + m * m) / 2;
        double error = Math.sqrt(0.5) * dv() + m * dm() + dm() * dm() / 2;
        return measured(Math.max(0, value), error + U * (state.xx() + state.pp() + m * m));
    }

    /** Var n = ½ tr V² − ¼ + r̄ᵀ V r̄. */
    public Measured quantaVariance() {
        double v = state.size();
        double m = state.length();
        double along = state.x() * state.x() * state.xx()
                + 2 * state.x() * state.p() * state.xp()
                + state.p() * state.p() * state.pp();
        double value = 0.5 * v * v - 0.25 + along;
        double w = v + dv();
        double l = m + dm();
        double error = w * dv() + l * l * dv() + 2 * l * w * dm();
        return measured(Math.max(0, value), error + U * (w * w + l * l * w));
    }

    /** Error of the determinant: the adjugate has the norm of V. */
    private double determinantError() {
        return (state.size() + dv()) * dv() + U * (state.xx() * state.pp() + state.xp() * state.xp());
    }

    private double leastDeterminant() {
        return Math.max(0.25, state.determinant() - determinantError());
    }

    private double mostDeterminant() {
        return Math.max(0.25, state.determinant() + determinantError());
    }

    /** tr ρ² = 1/(2 √det V). */
    public Measured purity() {
        double value = 0.5 / Math.sqrt(Math.max(0.25, state.determinant()));
        return between(value, 0.5 / Math.sqrt(mostDeterminant()), 0.5 / Math.sqrt(leastDeterminant()));
    }

    /** −tr ρ ln ρ, in nats. */
    public Measured entropy() {
        double value = entropy(Math.max(0.25, state.determinant()));
        return between(value, entropy(leastDeterminant()), entropy(mostDeterminant()));
    }

    /** (n + 1) ln(n + 1) − n ln n with n + ½ = √det. */
    private static double entropy(double determinant) {
        // √d − ½ without cancellation
        double n = (determinant - 0.25) / (Math.sqrt(determinant) + 0.5);
        return n <= 0 ? 0 : Math.log1p(n) + n * Math.log1p(1 / n);
    }

    /** Parity ⟨(−1)^n⟩ = exp(−½ r̄ᵀ V⁻¹ r̄)/(2 √det V). */
    public Measured parity() {
        double[] q = exponent(
                state.x(),
                state.p(),
                state.xx(),
                state.xp(),
                state.pp(),
                Math.max(0.25, state.determinant()),
                dm(),
                dv());
        Measured purity = purity();
        double value = purity.value() * Math.exp(-q[0]);
        double high = Math.min(1, purity.value() + purity.bound().size()) * Math.exp(-Math.max(0, q[0] - q[1]));
        double low = Math.max(0, purity.value() - purity.bound().size()) * Math.exp(-q[0] - q[1]);
        return between(value, low, high);
    }

    /** ½ dᵀ W⁻¹ d and a bound of its error, infinite where W is not known to be positive. */
    private static double[] exponent(
            double x, double p, double xx, double xp, double pp, double determinant, double dm, double dv) {
        double value = Math.max(0, (pp * x * x - 2 * xp * x * p + xx * p * p) / (2 * determinant));
        double least = determinant / most(xx, xp, pp) * (1 - U) - dv - U * (xx + pp);
        double length = Math.hypot(x, p);
        if (!(least > 0)) {
            return new double[] {value, length == 0 && dm == 0 ? 0 : Double.POSITIVE_INFINITY};
        }
        double inside = (length * dm + dm * dm / 2) / least;
        double outside = length * length * (dv + 8 * U * (xx + pp)) / (2 * least * least);
        return new double[] {value, inside + outside + U * value};
    }

    /** Larger eigenvalue of a symmetric matrix. */
    private static double most(double xx, double xp, double pp) {
        return (xx + pp + Math.hypot(xx - pp, 2 * xp)) / 2;
    }

    /** The least variance of any quadrature x cos θ + p sin θ; ½ is the vacuum's. */
    public Measured leastVariance() {
        double most = most(state.xx(), state.xp(), state.pp());
        double value = Math.max(0, state.determinant() / most);
        return measured(value, dv() + U * most);
    }

    /** The largest variance of any quadrature. */
    public Measured mostVariance() {
        double most = most(state.xx(), state.xp(), state.pp());
        return measured(most, dv() + U * most);
    }

    /** The angle θ of the quadrature of least variance, −π/2 … π/2; anything for a round state, which its bound tells. */
    public Measured leastVarianceAngle() {
        // the largest variance lies at ½ atan2(2 xp, xx − pp)
        double widest = 0.5 * Math.atan2(2 * state.xp(), state.xx() - state.pp());
        double angle = widest > 0 ? widest - Math.PI / 2 : widest + Math.PI / 2;
        double gap = Math.hypot(state.xx() - state.pp(), 2 * state.xp());
        double off = 2 * dv() + U * (state.xx() + state.pp());
        double error = off < gap ? 0.5 * Math.asin(off / gap) + U : Math.PI / 2;
        return measured(angle, error);
    }

    /** Variance of x cos θ + p sin θ. */
    public Measured variance(double angle) {
        double c = Math.cos(angle);
        double s = Math.sin(angle);
        double value = c * c * state.xx() + 2 * c * s * state.xp() + s * s * state.pp();
        return measured(Math.max(0, value), dv() + U * (state.xx() + state.pp()));
    }

    /**
     * Fidelity with another Gaussian state, (tr √(√ρ σ √ρ))²; |⟨φ|ψ⟩|² for pure ones.
     *
     * @param other known without error
     * @source Scutaru, J. Phys. A 31 (1998) 3659
     */
    public Measured fidelity(GaussianState other) {
        double xx = state.xx() + other.xx();
        double xp = state.xp() + other.xp();
        double pp = state.pp() + other.pp();
        double sum = Math.max(1, xx * pp - xp * xp);
        double sumError = (Math.sqrt(xx * xx + 2 * xp * xp + pp * pp) + dv()) * dv() + U * (xx * pp + xp * xp);
        double mine = Math.max(0.25, state.determinant());
        double its = Math.max(0.25, other.determinant());
        double itsError = U * (other.xx() * other.pp() + other.xp() * other.xp());
        double mixed = 4 * (mine - 0.25) * (its - 0.25);
        double mixedLow = 4 * (leastDeterminant() - 0.25) * Math.max(0, its - itsError - 0.25);
        double mixedHigh = 4 * (mostDeterminant() - 0.25) * (its + itsError - 0.25);
        double[] q = exponent(
                state.x() - other.x(),
                state.p() - other.p(),
                xx,
                xp,
                pp,
                sum,
                dm() + U * (state.length() + other.length()),
                dv());
        double value = Math.min(1, overlap(sum, mixed) * Math.exp(-q[0]));
        double high = overlap(Math.max(1, sum - sumError), mixedHigh) * Math.exp(-Math.max(0, q[0] - q[1]));
        double low = overlap(sum + sumError, mixedLow) * Math.exp(-q[0] - q[1]);
        return between(value, Math.max(0, low), Math.min(1, high));
    }

    /** 1/(√(D + Λ) − √Λ), falling in D and rising in Λ. */
    private static double overlap(double sum, double mixed) {
        return (Math.sqrt(sum + mixed) + Math.sqrt(mixed)) / sum;
    }
}
