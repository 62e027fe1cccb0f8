package ladderwell.state;

import java.util.Locale;
import ladderwell.evidence.Certainty;
import ladderwell.evidence.PhysicsException;
import ladderwell.level.Levels;

/**
 * A pure state on levels: complex amplitudes on sorted segments of consecutive levels, parts kept apart (re, im).
 *
 * <p>Between two segments lie at least two levels that are not kept, so a and a² never couple two segments. Immutable.
 * {@link #reals} and {@link #imaginaries} hand out the arrays themselves for hot loops: read only.
 */
public final class Amplitudes {
    /** Largest mean quanta of a coherent state; its window then holds about 1.5e7 levels. */
    public static final double LARGEST_MEAN = 1e12;

    /** Tail moments k = 0 … 4. */
    static final int MOMENTS = 5;

    private final long[] firsts;
    private final double[][] re;
    private final double[][] im;
    private final double normError;
    private final double[] tailMoments;
    private final double tailSum;
    private final double missingWeight;
    private final Certainty certainty;

    Amplitudes(
            long[] firsts,
            double[][] re,
            double[][] im,
            double normError,
            double[] tailMoments,
            double tailSum,
            double missingWeight) {
        this(firsts, re, im, normError, tailMoments, tailSum, missingWeight, Certainty.GUARANTEED);
    }

    Amplitudes(
            long[] firsts,
            double[][] re,
            double[][] im,
            double normError,
            double[] tailMoments,
            double tailSum,
            double missingWeight,
            Certainty certainty) {
        this.firsts = firsts;
        this.re = re;
        this.im = im;
        this.normError = normError;
        this.tailMoments = tailMoments;
        this.tailSum = tailSum;
        this.missingWeight = missingWeight;
        this.certainty = certainty;
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
     * @throws IllegalArgumentException if an argument is outside its range, the levels are of another kind, or too much of the packet lies
     *     beyond the walls of a box
     * @throws ladderwell.evidence.PhysicsException.NotCarried if the bound levels of a well miss more than the tolerance
     */
    public static Amplitudes packet(Levels levels, double position, double momentum, double width, double tolerance) {
        checkTolerance(tolerance);
        PacketState state = new PacketState(levels, new GaussianPacket(position, momentum, width), tolerance);
        return switch (levels.kind()) {
            case BOX -> state.inBox();
            case FINITE_WELL -> state.inWell();
            case HARMONIC, GENERAL ->
                throw new IllegalArgumentException("a packet in " + levels + " is expanded as a shape, see expanded()");
        };
    }

    /**
     * Any state given as a function of position, on any levels. Errors and tails are estimated.
     *
     * @param tolerance norm error allowed, 1e-14 … 0.1
     * @throws ladderwell.evidence.PhysicsException.NotCarried if the bound levels miss more than the tolerance
     * @throws ladderwell.evidence.PhysicsException.TooLarge if it needs more than 2000 levels
     * @throws ladderwell.evidence.PhysicsException.NotConverged if the levels are not known well enough
     */
    public static Amplitudes expanded(Levels levels, Shape shape, double tolerance) {
        checkTolerance(tolerance);
        if (levels.count() == 0) {
            throw new PhysicsException.NotCarried(
                    "the state", 1, 0, "the potential binds nothing; expected one that confines");
        }
        return new ShapeState(levels, shape, tolerance).expand();
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

    /** How sure errors, tails and missing weight are. */
    public Certainty certainty() {
        return certainty;
    }

    /** ‖ψ − ψ̃‖ ≤ this: ψ the state meant, ψ̃ the amplitudes kept (discarded tail and rounding). */
    public double normError() {
        return normError;
    }

    /** Upper bound of Σ (n+1)^k |c_n|² over the discarded levels, k = 0 … 4. */
    public double tailMoment(int k) {
        if (k < 0 || k >= MOMENTS) {
            throw new IllegalArgumentException("tail moments are known for k = 0 … 4, got k = " + k);
        }
        return tailMoments[k];
    }

    /** Upper bound of Σ |c_n| over the discarded levels. */
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
