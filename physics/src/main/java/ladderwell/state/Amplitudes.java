package ladderwell.state;

import java.util.Locale;
import ladderwell.evidence.PhysicsException;
import ladderwell.level.Levels;
import ladderwell.numeric.DoubleDouble;

/**
 * A pure state on levels: complex amplitudes on sorted segments of consecutive levels, parts kept apart (re, im).
 *
 * <p>Between two segments lie at least two levels that are not kept, so a and a² never couple two segments. Immutable.
 * {@link #reals} and {@link #imaginaries} hand out the arrays themselves for hot loops: read only.
 */
public final class Amplitudes {
    /** Largest mean quanta of a coherent state; its window then holds about 1.5e7 levels. */
    public static final double LARGEST_MEAN = 1e12;

    /** Largest window of squeezed and displaced number states. */
    static final int MOST_LEVELS = 30_000_000;

    /** Vector error of amplitudes that were turned. */
    private static final double TURNED = ExactTurns.ERROR + 0x1p-52;

    /** Tail moments k = 0 … 4. */
    static final int MOMENTS = 5;

    private final long[] firsts;
    private final double[][] re;
    private final double[][] im;
    private final double normError;
    private final double[] tailMoments;
    private final double tailSum;
    private final double missingWeight;

    Amplitudes(
            long[] firsts,
            double[][] re,
            double[][] im,
            double normError,
            double[] tailMoments,
            double tailSum,
            double missingWeight) {
        this.firsts = firsts;
        this.re = re;
        this.im = im;
        this.normError = normError;
        this.tailMoments = tailMoments;
        this.tailSum = tailSum;
        this.missingWeight = missingWeight;
    }

    /**
     * The level n alone.
     *
     * @throws IllegalArgumentException if n is negative
     */
    public static Amplitudes level(long n) {
        if (n < 0) {
            throw new IllegalArgumentException("level " + n + " does not exist: levels count from 0");
        }
        return new Amplitudes(new long[] {n}, new double[][] {{1}}, new double[][] {{0}}, 0, new double[MOMENTS], 0, 0);
    }

    /**
     * Σ (re + i im) |level⟩, normalised. The weights may come in any order and of any size.
     *
     * @param levels distinct levels
     * @param re real parts, one for each level
     * @param im imaginary parts, one for each level
     * @accuracy norm error 4 · 2^−53
     * @throws IllegalArgumentException if the arrays differ in length, a level repeats or is negative, a weight is not
     *     finite, or all weights are zero
     */
    public static Amplitudes superposition(long[] levels, double[] re, double[] im) {
        return Superposition.of(levels, re, im);
    }

    /**
     * The coherent state c_n = e^{−n̄/2} √(n̄^n / n!) e^{inφ}, with n̄ = mean and φ = phase. The window grows as √n̄.
     *
     * @param mean mean quanta n̄, 0 … 1e12
     * @param phase φ in radians, taken exactly as stored: n φ is reduced without loss
     * @param tolerance norm error allowed, 1e-14 … 0.1
     * @accuracy normError() ≤ tolerance, guaranteed: half of it goes to the tail, rounding takes 1.2e-15
     * @source Glauber, Phys. Rev. 131 (1963) 2766
     * @throws IllegalArgumentException if an argument is outside its range
     */
    public static Amplitudes coherent(double mean, double phase, double tolerance) {
        if (!(mean >= 0)) {
            throw new IllegalArgumentException("mean quanta must be 0 or more, got " + mean);
        }
        if (mean > LARGEST_MEAN) {
            throw new IllegalArgumentException(String.format(
                    Locale.ROOT,
                    "mean quanta %.3g need about %.2g levels; a coherent state is carried up to %.0g mean quanta",
                    mean,
                    15 * Math.sqrt(mean),
                    LARGEST_MEAN));
        }
        if (!(Math.abs(phase) <= ExactTurns.LARGEST_ANGLE)) {
            throw new IllegalArgumentException("the phase must be an angle between -1e15 and 1e15 rad, got " + phase);
        }
        checkTolerance(tolerance);
        // Two sides of this weight each make a tail of norm tolerance / 2.
        PoissonWindow window = new PoissonWindow(mean, tolerance * tolerance / 8);
        double[] re = window.roots();
        double[] im = new double[re.length];
        double rounding = PoissonWindow.RELATIVE_ERROR;
        if (phase != 0) {
            ExactTurns turns = new ExactTurns(phase);
            turns.jumpTo(window.first());
            for (int i = 0; i < re.length; i++) {
                double root = re[i];
                re[i] = root * turns.cosine();
                im[i] = root * turns.sine();
                turns.next();
            }
            // One ulp for the two products.
            rounding += ExactTurns.ERROR + 0x1p-53;
        }
        double[] moments = window.tailMoments();
        return new Amplitudes(
                new long[] {window.first()},
                new double[][] {re},
                new double[][] {im},
                mean == 0 ? 0 : Math.nextUp(Math.sqrt(moments[0])) + rounding,
                moments,
                window.tailSum(),
                moments[0]);
    }

    /**
     * The Gaussian packet of spread Δx = width about a position, with a mean momentum, on the levels of a box or a finite
     * well.
     *
     * <p>The packet is g(x) = (2π Δx²)^{−1/4} e^{−(x−x₀)²/4Δx² + i p₀ (x−x₀)} on the whole line, and {@link #normError} is the distance
     * from it. What the levels do not carry is missing weight; it is never scaled away, so the norm is below 1 by that much.
     *
     * <p>In a box the amplitudes are those of g with its tails folded back at the walls (method of images), a smooth state of the
     * box: moments of the tail belong to it, while g cut off at a wall would have infinite energy. In a well moments and sums of the
     * tail count bound levels only; what lies above the rim enters normError and missingWeight.
     *
     * @param levels box or finite well
     * @param position x₀, inside the walls
     * @param momentum p₀
     * @param width Δx
     * @param tolerance norm error allowed, 1e-14 … 0.1
     * @units scaled: lengths in the full width L, momentum in ħ/L
     * @throws IllegalArgumentException if an argument is outside its range, the levels are harmonic, or too much of the packet lies
     *     beyond the walls of a box
     * @throws ladderwell.evidence.PhysicsException.NotCarried if the bound levels of a well miss more than the tolerance
     */
    public static Amplitudes packet(Levels levels, double position, double momentum, double width, double tolerance) {
        checkTolerance(tolerance);
        PacketState state = new PacketState(levels, new GaussianPacket(position, momentum, width), tolerance);
        return switch (levels.kind()) {
            case HARMONIC ->
                throw new IllegalArgumentException(
                        "a packet is expanded in the levels of a box or a finite well, not in harmonic levels");
            case BOX -> state.inBox();
            case FINITE_WELL -> state.inWell();
            case GENERAL ->
                throw new IllegalArgumentException(
                        "a packet is expanded in the levels of a box or a finite well, not in " + levels);
        };
    }

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
        checkTolerance(tolerance);
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
        checkTolerance(tolerance);
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
        checkTolerance(tolerance);
        if (mean == 0) {
            return level(level);
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
        checkTolerance(tolerance);
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
        if (state.normError > Math.max(tolerance, 1e-13)) {
            throw new PhysicsException.NotConverged(what, state.levels(), state.normError, tolerance);
        }
        return state;
    }

    static IllegalArgumentException tooManyLevels(String what, double levels) {
        return new IllegalArgumentException(String.format(
                Locale.ROOT, "%s needs about %.2g levels; states are carried on up to %.0g", what, levels, (double)
                        MOST_LEVELS));
    }

    private static void checkMean(double mean) {
        if (!(mean >= 0 && mean <= LARGEST_MEAN)) {
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

    static void checkTolerance(double tolerance) {
        if (!(tolerance >= 1e-14 && tolerance <= 0.1)) {
            throw new IllegalArgumentException("the tolerance is a norm error between 1e-14 and 0.1, got " + tolerance);
        }
    }

    /** Number of segments. */
    public int segments() {
        return firsts.length;
    }

    /** First level of a segment. */
    public long first(int segment) {
        return firsts[segment];
    }

    /** Number of levels in a segment. */
    public int length(int segment) {
        return re[segment].length;
    }

    /** Real part of the amplitude of level first(segment) + i. */
    public double re(int segment, int i) {
        return re[segment][i];
    }

    /** Imaginary part of the amplitude of level first(segment) + i. */
    public double im(int segment, int i) {
        return im[segment][i];
    }

    /** All real parts of a segment, the array itself; read only. */
    public double[] reals(int segment) {
        return re[segment];
    }

    /** All imaginary parts of a segment, the array itself; read only. */
    public double[] imaginaries(int segment) {
        return im[segment];
    }

    /** ‖ψ − ψ̃‖ ≤ this, guaranteed: ψ the state meant, ψ̃ the amplitudes kept (discarded tail and rounding). */
    public double normError() {
        return normError;
    }

    /** Guaranteed upper bound of Σ (n+1)^k |c_n|² over the discarded levels, k = 0 … 4. */
    public double tailMoment(int k) {
        if (k < 0 || k >= MOMENTS) {
            throw new IllegalArgumentException("tail moments are known for k = 0 … 4, got k = " + k);
        }
        return tailMoments[k];
    }

    /** Guaranteed upper bound of Σ |c_n| over the discarded levels. */
    public double tailSum() {
        return tailSum;
    }

    /** Upper bound of the weight the state meant has outside the kept levels. */
    public double missingWeight() {
        return missingWeight;
    }

    /** How many levels are kept, over all segments. */
    public long levels() {
        long sum = 0;
        for (double[] part : re) {
            sum += part.length;
        }
        return sum;
    }
}
