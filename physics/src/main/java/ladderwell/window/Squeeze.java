package ladderwell.window;

import java.util.List;
import ladderwell.operator.LadderPolynomial;

/**
 * A frame's squeezing: operators are seen as a → u a + v a†, |u|² − |v|² = 1. Changing it is a motion under a quadratic Hamiltonian for a time 1,
 * followed with the same computed bound as any other.
 *
 * @param uRe real part of u
 * @param uIm imaginary part of u
 * @param vRe real part of v
 * @param vIm imaginary part of v
 */
record Squeeze(double uRe, double uIm, double vRe, double vIm) {
    private static final double LEAST_TOLERANCE = 1e-10;

    static final Squeeze NONE = new Squeeze(1, 0, 0, 0);

    boolean isNone() {
        return equals(NONE);
    }

    LadderPolynomial seen(LadderPolynomial operator) {
        return isNone() ? operator : operator.mixed(uRe, uIm, vRe, vIm);
    }

    /** A state with its equation and what the change of frame may be off. */
    record Changed(Equation equation, Plane state, double spent) {}

    /**
     * R†σR with R = exp((ζ* a² − ζ a†²)/2), ζ = r e^{iφ}.
     *
     * @param tolerance error allowed
     */
    static Changed turn(
            boolean pure, Equation equation, Plane state, double r, double phi, double tolerance, double allowedBytes) {
        // −iH = −X/2 with X = ζ* a² − ζ a†², so H = −iX/2
        double re = r * Math.cos(phi);
        double im = r * Math.sin(phi);
        LadderPolynomial x = LadderPolynomial.term(0, 2, re, -im).minus(LadderPolynomial.term(2, 0, re, im));
        Generator generator = Generator.constant(x.times(0, -0.5), List.of());
        Equation start = Propagation.plain(generator, pure, equation.first, equation.levels);
        Plane plane = start.plane();
        equation.moveTo(state, start, plane);
        Budget budget = new Budget(tolerance, 0, 1);
        SteadyPropagation motion = new SteadyPropagation(generator, pure, start, plane, budget, allowedBytes);
        motion.go(new double[] {1}, j -> {});
        return new Changed(motion.equation, motion.state, budget.spent());
    }

    /** The frame whose state is R†σR where this one's is σ: R†aR = a cosh r − a† e^{iφ} sinh r. */
    Squeeze after(double r, double phi) {
        double c = Math.cosh(r);
        double s = Math.sinh(r);
        double cos = Math.cos(phi);
        double sin = Math.sin(phi);
        double nextURe = uRe * c - (vRe * cos + vIm * sin) * s;
        double nextUIm = uIm * c - (vIm * cos - vRe * sin) * s;
        double nextVRe = vRe * c - (uRe * cos - uIm * sin) * s;
        double nextVIm = vIm * c - (uIm * cos + uRe * sin) * s;
        // rounding of a product of many such frames is taken out again
        double size = Math.sqrt(nextURe * nextURe + nextUIm * nextUIm - nextVRe * nextVRe - nextVIm * nextVIm);
        return new Squeeze(nextURe / size, nextUIm / size, nextVRe / size, nextVIm / size);
    }

    /** A state without this squeezing: ρ = S σ S†. */
    WindowState takenOut(WindowState state, double allowedBytes) {
        boolean pure = state instanceof PureWindow;
        Equation equation = Propagation.plain(
                Generator.constant(LadderPolynomial.number(), List.of()), pure, state.first(), state.levels());
        Plane plane = equation.plane();
        if (state instanceof MixedWindow mixed) {
            ((DensityEquation) equation).load(mixed.lowerRe(), mixed.lowerIm(), plane);
        } else if (state instanceof PureWindow vector) {
            System.arraycopy(vector.reals(), 0, plane.re, equation.margin(), vector.levels());
            System.arraycopy(vector.imaginaries(), 0, plane.im, equation.margin(), vector.levels());
        }
        double size = Math.hypot(vRe, vIm) / Math.hypot(uRe, uIm);
        double r = 0.5 * Math.log((1 + size) / (1 - size));
        double phi = Math.atan2(vIm, vRe) - Math.atan2(uIm, uRe);
        double tolerance = Math.max(LEAST_TOLERANCE, state.error().size() / 4);
        Changed changed = turn(pure, equation, plane, r, phi, tolerance, allowedBytes);
        // what is left is a turn, a → a e^{iθ}
        Squeeze left = after(r, phi);
        changed.equation().turn(changed.state(), Math.atan2(left.uIm, left.uRe));
        return Propagation.state(
                pure, changed.equation(), changed.state(), state.error().plus(changed.spent()));
    }
}
