package ladderwell.state;

import java.util.Locale;
import ladderwell.evidence.PhysicsException;
import ladderwell.numeric.DoubleDouble;

/**
 * States of a harmonic mode beyond the coherent ones, on its number levels: squeezed, displaced number, cats. Each keeps a window of levels
 * chosen from the tolerance and tells a guaranteed error. Coherent states: {@link Amplitudes#coherent}; mixed ones: {@link Mixture}.
 */
public final class HarmonicStates {
    /** Largest squeezing r, 43 dB. */
    public static final double LARGEST_SQUEEZING = SqueezedWindow.LARGEST_SQUEEZING;

    /** Largest window. */
    static final int MOST_LEVELS = 30_000_000;

    /** Vector error of amplitudes that were turned. */
    private static final double TURNED = ExactTurns.ERROR + 0x1p-52;

    private HarmonicStates() {}

    /**
     * The squeezed coherent state D(α) S(ξ) |0⟩, α = √mean e^{i phase}, ξ = r e^{iφ}: first squeezed, then displaced, so that α is its mean.
     * S(ξ) = exp[(ξ* a² − ξ a†²)/2] makes the variance of x cos(φ/2) + p sin(φ/2) smaller by e^{−2r}.
     *
     * @param mean |α|², 0 … 1e12
     * @param phase arg α in radians, taken exactly as stored
     * @param r squeezing, 0 … 5
     * @param phi φ in radians, taken exactly as stored
     * @param tolerance norm error allowed, 1e-14 … 0.1
     * @accuracy normError(), guaranteed: the residual of the state's own equation on the amplitudes kept
     * @source Yuen, Phys. Rev. A 13 (1976) 2226
     * @throws IllegalArgumentException if an argument is outside its range or more than 3e7 levels are needed
     * @throws PhysicsException.NotConverged if the tolerance is not met
     */
    public static Amplitudes displacedSqueezed(double mean, double phase, double r, double phi, double tolerance) {
        checkMean(mean);
        checkAngle("phase", phase);
        checkAngle("squeezing angle", phi);
        if (!(r >= 0 && r <= SqueezedWindow.LARGEST_SQUEEZING)) {
            throw new IllegalArgumentException(
                    "the squeezing r must lie between 0 and " + SqueezedWindow.LARGEST_SQUEEZING + ", got " + r);
        }
        Amplitudes.checkTolerance(tolerance);
        // D(α) S(ξ) is D(|α|) S(ξ e^{−2i arg α}) turned by arg α
        KeptWindow window = new SqueezedWindow(
                        DoubleDouble.of(mean).sqrt(), false, r, DoubleDouble.sum(phi, -2 * phase), tolerance)
                .kept();
        turn(window.first(), 0, phase, window.re(), window.im());
        return met("the squeezed state", tolerance, window.amplitudes(phase == 0 ? 0 : TURNED));
    }

    /**
     * The displaced squeezed state S(ξ) D(γ) |0⟩, γ = √mean e^{i phase}: first displaced, then squeezed together with its displacement. Equal to
     * {@link #displacedSqueezed} at α = γ cosh r − γ* e^{iφ} sinh r.
     *
     * @param mean |γ|²
     * @param phase arg γ in radians
     * @param r squeezing, 0 … 5
     * @param phi φ in radians
     * @param tolerance norm error allowed, 1e-14 … 0.1
     * @throws IllegalArgumentException as {@link #displacedSqueezed}
     */
    public static Amplitudes squeezedDisplaced(double mean, double phase, double r, double phi, double tolerance) {
        checkMean(mean);
        checkAngle("phase", phase);
        checkAngle("squeezing angle", phi);
        if (!(r >= 0 && r <= SqueezedWindow.LARGEST_SQUEEZING)) {
            throw new IllegalArgumentException(
                    "the squeezing r must lie between 0 and " + SqueezedWindow.LARGEST_SQUEEZING + ", got " + r);
        }
        Amplitudes.checkTolerance(tolerance);
        KeptWindow window = new SqueezedWindow(
                        DoubleDouble.of(mean).sqrt(), true, r, DoubleDouble.sum(phi, -2 * phase), tolerance)
                .kept();
        turn(window.first(), 0, phase, window.re(), window.im());
        return met("the squeezed state", tolerance, window.amplitudes(phase == 0 ? 0 : TURNED));
    }

    /**
     * The squeezed vacuum S(ξ) |0⟩, ξ = r e^{iφ}: even levels only.
     *
     * @param r squeezing, 0 … 5
     * @param phi φ in radians
     * @param tolerance norm error allowed, 1e-14 … 0.1
     */
    public static Amplitudes squeezedVacuum(double r, double phi, double tolerance) {
        return displacedSqueezed(0, 0, r, phi, tolerance);
    }

    /**
     * The displaced number state D(α) |m⟩, α = √mean e^{i phase}.
     *
     * @param level m, 0 … 1e9
     * @param mean |α|², 0 … 1e12
     * @param phase arg α in radians, taken exactly as stored
     * @param tolerance norm error allowed, 1e-14 … 0.1
     * @accuracy normError(), guaranteed: the residual of the state's own equation on the amplitudes kept
     * @source de Oliveira, Kim, Knight and Buzek, Phys. Rev. A 41 (1990) 2645
     * @throws IllegalArgumentException if an argument is outside its range or more than 3e7 levels are needed
     * @throws PhysicsException.NotConverged if the tolerance is not met
     */
    public static Amplitudes displacedNumber(long level, double mean, double phase, double tolerance) {
        if (level < 0 || level > 1_000_000_000) {
            throw new IllegalArgumentException("a displaced level must lie between 0 and 1e9, got " + level);
        }
        checkMean(mean);
        checkAngle("phase", phase);
        Amplitudes.checkTolerance(tolerance);
        if (mean == 0) {
            return Amplitudes.level(level);
        }
        KeptWindow window = new DisplacedNumberWindow(level, mean, tolerance).kept();
        turn(window.first(), level, phase, window.re(), window.im());
        return met("the displaced number state", tolerance, window.amplitudes(phase == 0 ? 0 : TURNED));
    }

    /**
     * A cat of k coherent components on a circle with the levels n ≡ residue modulo k alone; for k = 2 the even (0) or odd (1) cat.
     *
     * @param mean |α|² of each component, 0 … 1e12
     * @param phase arg α in radians of the first component
     * @param components k, 2 … 64
     * @param residue 0 … k − 1
     * @param tolerance norm error allowed, 1e-14 … 0.1
     * @throws IllegalArgumentException if an argument is outside its range, or almost nothing is left
     */
    public static Amplitudes cat(double mean, double phase, int components, int residue, double tolerance) {
        checkCat(mean, phase, components, tolerance);
        if (residue < 0 || residue >= components) {
            throw new IllegalArgumentException("the parity class of a cat of " + components
                    + " components lies between 0 and " + (components - 1) + ", got " + residue);
        }
        return CatState.of(mean, phase, CatState.residue(components, residue), tolerance);
    }

    /**
     * A cat of k coherent components with a phase from each to the next, Σ_j e^{ijχ} |α e^{2πij/k}⟩, normalised; |α⟩ + e^{iχ} |−α⟩ for k = 2.
     *
     * @param mean |α|² of each component, 0 … 1e12
     * @param phase arg α in radians of the first component
     * @param components k, 2 … 64
     * @param chi χ in radians
     * @param tolerance norm error allowed, 1e-14 … 0.1
     * @throws IllegalArgumentException if an argument is outside its range, or almost nothing is left
     */
    public static Amplitudes phasedCat(double mean, double phase, int components, double chi, double tolerance) {
        checkCat(mean, phase, components, tolerance);
        checkAngle("phase between components", chi);
        return CatState.of(mean, phase, CatState.phased(components, chi), tolerance);
    }

    private static void checkCat(double mean, double phase, int components, double tolerance) {
        checkMean(mean);
        checkAngle("phase", phase);
        Amplitudes.checkTolerance(tolerance);
        if (components < 2 || components > 64) {
            throw new IllegalArgumentException("a cat has 2 to 64 components, got " + components);
        }
    }

    /** Multiplies the amplitude of level first + i by e^{i phase (first + i − origin)}. */
    private static void turn(long first, long origin, double phase, double[] re, double[] im) {
        if (phase == 0) {
            return;
        }
        ExactTurns turns = new ExactTurns(phase);
        turns.jumpTo(first - origin);
        for (int i = 0; i < re.length; i++) {
            double x = re[i];
            re[i] = x * turns.cosine() - im[i] * turns.sine();
            im[i] = x * turns.sine() + im[i] * turns.cosine();
            turns.next();
        }
    }

    private static Amplitudes met(String what, double tolerance, Amplitudes state) {
        // rounding of a double is 1e-16: below this no tolerance can be held
        if (state.normError() > Math.max(tolerance, 1e-13)) {
            throw new PhysicsException.NotConverged(what, state.levels(), state.normError(), tolerance);
        }
        return state;
    }

    static IllegalArgumentException tooManyLevels(String what, double levels) {
        return new IllegalArgumentException(String.format(
                Locale.ROOT, "%s needs about %.2g levels; states are carried on up to %.0g", what, levels, (double)
                        MOST_LEVELS));
    }

    private static void checkMean(double mean) {
        if (!(mean >= 0 && mean <= Amplitudes.LARGEST_MEAN)) {
            throw new IllegalArgumentException(
                    "mean quanta of a displacement must lie between 0 and 1e12, got " + mean);
        }
    }

    private static void checkAngle(String what, double angle) {
        if (!(Math.abs(angle) <= ExactTurns.LARGEST_ANGLE / 4)) {
            throw new IllegalArgumentException(
                    "the " + what + " must be an angle between -2.5e14 and 2.5e14 rad, got " + angle);
        }
    }
}
