package ladderwell.gaussian;

import ladderwell.numeric.DoubleDouble;

/**
 * A Gaussian state of one mode: means and covariances of x and p.
 *
 * @param x ⟨x⟩
 * @param p ⟨p⟩
 * @param xx variance of x
 * @param xp symmetrised covariance of x and p
 * @param pp variance of p
 * @units x and p in units of √(ħ/mω) and ħ over it: the vacuum has xx = pp = 1/2
 */
public record GaussianState(double x, double p, double xx, double xp, double pp) {
    /** Rounding of the covariances may bring the determinant of a pure state this much below 1/4, in parts of xx · pp. */
    static final double ROUNDING = 1e-12;

    /** Largest squeezing r that is taken: e^{2r} = 1e13, beyond which doubles no longer tell the two variances. */
    public static final double LARGEST_SQUEEZING = 15;

    /**
     * Refuses NaN, infinities, and covariances below the uncertainty bound xx pp − xp² ≥ 1/4.
     *
     * @throws IllegalArgumentException for such values
     */
    public GaussianState {
        if (!Double.isFinite(x) || !Double.isFinite(p)) {
            throw new IllegalArgumentException(
                    "the means of a Gaussian state must be finite, got x = " + x + ", p = " + p);
        }
        if (!(xx > 0 && pp > 0 && xx < Double.POSITIVE_INFINITY && pp < Double.POSITIVE_INFINITY)
                || !Double.isFinite(xp)) {
            throw new IllegalArgumentException("the variances of a Gaussian state must be finite and above 0, got " + xx
                    + ", " + pp + " with covariance " + xp);
        }
        double determinant = determinant(xx, xp, pp);
        if (!(determinant >= 0.25 - ROUNDING * (1 + xx * pp))) {
            throw new IllegalArgumentException("the variances " + xx + " and " + pp + " with covariance " + xp
                    + " break the uncertainty bound: xx·pp − xp² is " + determinant + ", at least 1/4 is needed");
        }
    }

    /** xx pp − xp², rounded once. */
    static double determinant(double xx, double xp, double pp) {
        return DoubleDouble.product(xx, pp).minus(DoubleDouble.product(xp, xp)).value();
    }

    /** The ground state. */
    public static GaussianState vacuum() {
        return new GaussianState(0, 0, 0.5, 0, 0.5);
    }

    /** The coherent state of amplitude α. */
    public static GaussianState coherent(double alphaRe, double alphaIm) {
        return vacuum().displaced(alphaRe, alphaIm);
    }

    /** The thermal state of n̄ mean quanta. */
    public static GaussianState thermal(double quanta) {
        if (!(quanta >= 0) || Double.isInfinite(quanta)) {
            throw new IllegalArgumentException("mean quanta must be finite and 0 or more, got " + quanta);
        }
        return new GaussianState(0, 0, quanta + 0.5, 0, quanta + 0.5);
    }

    /** D(α) applied: the means move by √2 (Re α, Im α). */
    public GaussianState displaced(double alphaRe, double alphaIm) {
        return new GaussianState(x + Math.sqrt(2) * alphaRe, p + Math.sqrt(2) * alphaIm, xx, xp, pp);
    }

    /**
     * S(ξ) applied, S(ξ) = exp[(ξ* a² − ξ a†²)/2] with ξ = r e^{iφ}: r shrinks by e^{−r} along the direction φ/2 and grows by e^r across.
     * On a displaced state this squeezes the displacement too: coherent(α).squeezed(r, φ) is S D |0⟩, vacuum().squeezed(r, φ).displaced(α) is
     * D S |0⟩.
     *
     * @param r 0 … 15
     * @param phi φ, rad
     */
    public GaussianState squeezed(double r, double phi) {
        if (!(r >= 0 && r <= LARGEST_SQUEEZING)) {
            throw new IllegalArgumentException(
                    "the squeezing r must lie between 0 and " + LARGEST_SQUEEZING + ", got " + r);
        }
        if (!Double.isFinite(phi)) {
            throw new IllegalArgumentException("the squeezing angle must be finite, got " + phi);
        }
        // S† r S = M r with M = e^{−r} along u = (cos φ/2, sin φ/2) and e^r across
        double c = Math.cos(phi / 2);
        double s = Math.sin(phi / 2);
        double small = Math.exp(-r);
        double large = Math.exp(r);
        double a = small * c * c + large * s * s;
        double b = (small - large) * c * s;
        double d = small * s * s + large * c * c;
        if (xx == pp && xp == 0) {
            // a round state: written out, so that a pure state stays pure within rounding
            double least = xx * Math.exp(-2 * r);
            double most = xx * Math.exp(2 * r);
            return new GaussianState(
                    a * x + b * p,
                    b * x + d * p,
                    least * c * c + most * s * s,
                    (least - most) * c * s,
                    least * s * s + most * c * c);
        }
        return new GaussianState(
                a * x + b * p,
                b * x + d * p,
                a * a * xx + 2 * a * b * xp + b * b * pp,
                a * b * xx + (a * d + b * b) * xp + b * d * pp,
                b * b * xx + 2 * b * d * xp + d * d * pp);
    }

    /** xx pp − xp²; 1/4 for a pure state. */
    public double determinant() {
        return determinant(xx, xp, pp);
    }

    /** √(xx² + 2 xp² + pp²). */
    double size() {
        return Math.sqrt(xx * xx + 2 * xp * xp + pp * pp);
    }

    /** √(x² + p²). */
    double length() {
        return Math.hypot(x, p);
    }

    /** This as a point without error, for reading observables of a state that is known. */
    public GaussianPoint known() {
        return GaussianPoint.known(this);
    }
}
