package ladderwell.gaussian;

import static java.util.Objects.requireNonNull;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import ladderwell.mode.Jump;
import ladderwell.mode.Mode;
import ladderwell.operator.OperatorFormula;

/**
 * The motion of Gaussian states under a quadratic Hamiltonian, constant or not, with linear jumps: loss, gain, thermal and squeezed baths.
 * The cost does not depend on the number of quanta.
 *
 * <p>A constant Hamiltonian is followed exactly, with guaranteed bounds. One that varies is followed by Gauss collocation in steps; the
 * residual of the steps, measured between the nodes, gives the bound, which is an estimate because the factors are known at points only.
 *
 * @source Weedbrook et al., Rev. Mod. Phys. 84 (2012) 621; Simon, Sudarshan and Mukunda, Phys. Rev. A 36 (1987) 3868
 */
public final class GaussianFlow {
    private final Drift drift;

    private GaussianFlow(Drift drift) {
        this.drift = drift;
    }

    /**
     * The flow of H and jumps.
     *
     * @throws IllegalArgumentException if H is not quadratic and Hermitian or a jump not linear
     */
    public static GaussianFlow of(OperatorFormula h, List<Jump> jumps) {
        return new GaussianFlow(new Drift(h, jumps));
    }

    /** The flow of a mode, in its frame; see {@link #of(OperatorFormula, List)}. */
    public static GaussianFlow of(Mode mode) {
        return of(mode.hamiltonian(), mode.jumps());
    }

    /** True if nothing varies with time. */
    public boolean isConstant() {
        return drift.isConstant();
    }

    /**
     * States at many times, starting at time 0.
     *
     * @param times 0 or more, ascending
     * @param tolerance error aimed at where H varies, in units of x and of the covariances, above 0; constant motion is followed as exactly
     *     as doubles allow whatever it is
     */
    public List<GaussianPoint> path(GaussianState start, double[] times, double tolerance) {
        requireNonNull(start, "start");
        double before = 0;
        for (double t : times) {
            if (!(t >= before) || Double.isInfinite(t)) {
                throw new IllegalArgumentException(
                        "times must be finite, 0 or more and ascending, got " + t + " after " + before);
            }
            before = t;
        }
        if (!(tolerance > 0) || Double.isInfinite(tolerance)) {
            throw new IllegalArgumentException("the tolerance must be finite and above 0, got " + tolerance);
        }
        if (!drift.isConstant()) {
            return new SteppedFlow(drift, start, tolerance).path(times);
        }
        List<GaussianPoint> points = new ArrayList<>();
        for (double t : times) {
            points.add(new ExactFlow(drift, t).of(start));
        }
        return List.copyOf(points);
    }

    /** The state at one time; see {@link #path}. */
    public GaussianPoint at(GaussianState start, double time, double tolerance) {
        return path(start, new double[] {time}, tolerance).get(0);
    }

    /**
     * The state that every state goes to, if H is constant and all motion decays.
     *
     * @accuracy a few roundings over the slowest decay
     */
    public Optional<GaussianState> steady() {
        if (!drift.isConstant() || !(drift.damping > 0)) {
            return Optional.empty();
        }
        double[] at = new double[Drift.SIZE];
        drift.at(0, at);
        double g = drift.damping / 2;
        double determinant = g * g - at[0] * at[0] - at[1] * at[2];
        if (!(determinant > 0)) {
            return Optional.empty();
        }
        double a = at[0] - g;
        double b = at[1];
        double c = at[2];
        double d = -at[0] - g;
        double x = (-d * at[3] + b * at[4]) / determinant;
        double p = (c * at[3] - a * at[4]) / determinant;
        // A V + V Aᵀ = −D is solved by V = −(D det A + (A − tr A) D (A − tr A)ᵀ)/(2 tr A det A)
        double trace = a + d;
        double e = a - trace;
        double h = d - trace;
        double xx = e * e * drift.noiseXx + 2 * e * b * drift.noiseXp + b * b * drift.noisePp;
        double xp = e * c * drift.noiseXx + (e * h + b * c) * drift.noiseXp + b * h * drift.noisePp;
        double pp = c * c * drift.noiseXx + 2 * c * h * drift.noiseXp + h * h * drift.noisePp;
        double scale = -1 / (2 * trace * determinant);
        return Optional.of(new GaussianState(
                x,
                p,
                scale * (drift.noiseXx * determinant + xx),
                scale * (drift.noiseXp * determinant + xp),
                scale * (drift.noisePp * determinant + pp)));
    }
}
