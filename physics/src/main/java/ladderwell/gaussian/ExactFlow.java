package ladderwell.gaussian;

import ladderwell.evidence.Bound;
import ladderwell.numeric.DoubleDouble;

/**
 * The flow of constant A, b and D over one time: E = e^{At}, q = ∫ e^{As} ds b, N = ∫ e^{As} D e^{Aᵀs} ds, by Taylor series over t/2^k and k
 * doublings (E → E E, q → q + E q, N → N + E N Eᵀ) in double-double arithmetic.
 *
 * <p>Error. A doubling keeps what came before and adds roundings of 2^−100; what is wrong at step j is carried on by products of two true
 * flows over times up to t, each at most {@code growth} in norm. Together below (8 ‖A‖ t + 64) · 2^−95 times a power of that growth, far
 * below the one rounding of the result to doubles unless the flow grows beyond 1e3 or ‖A‖ t beyond 1e12, which the bound then shows.
 */
final class ExactFlow {
    /** (1/4)^25/25! is 6e-41. */
    private static final int TERMS = 26;

    private static final double LONGEST = 1e18;

    private final double time;
    private final Matrix2 flow;
    private final Matrix2 force;
    private final Matrix2 noise;
    private final double flowError;
    private final double forceError;
    private final double noiseError;

    ExactFlow(Drift drift, double time) {
        this.time = time;
        double[] at = new double[Drift.SIZE];
        drift.at(0, at);
        DoubleDouble half = DoubleDouble.of(drift.damping).times(-0.5);
        Matrix2 a = new Matrix2(half.plus(at[0]), DoubleDouble.of(at[1]), DoubleDouble.of(at[2]), half.plus(-at[0]));
        double size = a.norm();
        if (!(size * time <= LONGEST)) {
            throw new IllegalArgumentException("a time of " + time + " is " + size * time
                    + " of the mode's own times; Gaussian motion is followed up to " + LONGEST);
        }
        int doublings = Math.max(0, Math.getExponent(Math.max(size * time, 1e-300)) + 4);
        double step = Math.scalb(time, -doublings);

        Matrix2 e = Matrix2.UNIT;
        Matrix2 phi = Matrix2.ZERO;
        Matrix2 n = Matrix2.ZERO;
        Matrix2 d = Matrix2.of(drift.noiseXx, drift.noiseXp, drift.noiseXp, drift.noisePp);
        Matrix2 power = Matrix2.UNIT;
        Matrix2 lifted = d;
        DoubleDouble factor = DoubleDouble.ONE;
        for (int j = 0; j < TERMS; j++) {
            // factor = h^j/j!
            if (j > 0) {
                e = e.plus(power.times(factor));
            }
            factor = factor.times(step).dividedBy(j + 1);
            phi = phi.plus(power.times(factor));
            n = n.plus(lifted.times(factor));
            power = power.times(a);
            Matrix2 left = a.times(lifted);
            lifted = left.plus(left.transposed());
        }
        Matrix2 b = new Matrix2(DoubleDouble.of(at[3]), DoubleDouble.ZERO, DoubleDouble.of(at[4]), DoubleDouble.ZERO);
        Matrix2 q = phi.times(b);
        for (int k = 0; k < doublings; k++) {
            q = q.plus(e.times(q));
            n = n.plus(e.times(n).times(e.transposed()));
            e = e.times(e);
        }
        flow = e;
        force = q;
        noise = n;

        double growth = growth(at, drift.damping, time);
        double unit = (8 * size * time + 64) * 0x1p-95;
        flowError = unit * growth * growth;
        forceError = unit * growth * growth * growth * time * Math.hypot(at[3], at[4]);
        noiseError = unit * growth * growth * growth * growth * time * d.norm();
        if (!Double.isFinite(flow.norm() + force.norm() + noise.norm() + growth)) {
            throw new IllegalArgumentException(
                    "the mode runs away: at t = " + time + " its means or variances are beyond the largest numbers");
        }
    }

    /** Upper bound of ‖e^{As}‖ for 0 ≤ s ≤ t, from e^{As} = e^{−Γs/2}(c + S B), c and S the cosine and sine of √(−det B) s over it. */
    private static double growth(double[] at, double damping, double t) {
        double square = at[0] * at[0] + at[1] * at[2];
        double root = Math.sqrt(Math.abs(square));
        double norm = Math.hypot(Math.hypot(at[0], at[0]), Math.hypot(at[1], at[2]));
        double rate = -damping / 2 + (square > 0 ? root : 0);
        double sine = root * t > 1 ? 1 / root : t;
        return 1.01 * (Math.sqrt(2) + norm * sine) * Math.max(1, Math.exp(rate * t));
    }

    GaussianPoint of(GaussianState s) {
        Matrix2 mean = flow.times(
                new Matrix2(DoubleDouble.of(s.x()), DoubleDouble.ZERO, DoubleDouble.of(s.p()), DoubleDouble.ZERO));
        mean = mean.plus(force);
        Matrix2 start = Matrix2.of(s.xx(), s.xp(), s.xp(), s.pp());
        Matrix2 v = flow.times(start).times(flow.transposed()).plus(noise);
        double norm = flow.norm();
        // one rounding of the result; two of what was given, carried along
        double meanError = flowError * s.length() + forceError + 0x1p-51 * (norm * s.length() + mean.norm());
        double covarianceError = (2 * norm + flowError) * flowError * s.size()
                + noiseError
                + 0x1p-51 * (norm * norm * s.size() + v.norm());
        return GaussianPoint.of(
                time,
                mean.a().value(),
                mean.c().value(),
                v.a().value(),
                v.b().value(),
                v.d().value(),
                Bound.guaranteed(meanError),
                Bound.guaranteed(covarianceError));
    }
}
