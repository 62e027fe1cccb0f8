package ladderwell.window;

import java.util.ArrayList;
import java.util.List;
import ladderwell.operator.LadderPolynomial;

/**
 * A linear equation of motion on a window of levels: what one application of factor · (L − c) gives inside, and what it would push out.
 *
 * <p>Arrays keep a margin of zeros around the window, so that no loop asks where it is. After {@link #apply} the part that sticks out lies in the
 * inner half of the margin; {@link #border} measures it and {@link #tidy} wipes it off.
 */
abstract sealed class Equation permits VectorEquation, DensityEquation {
    /** Unit of rounding. */
    static final double U = 0x1p-53;

    /** Roundings of one product in units of U: its factor (an element with its square roots, scaled), and the complex product. */
    static final int ROUNDINGS = 12;

    final long first;
    final int levels;
    final int reach;
    /** First row that an application can reach: −reach, or 0 where the window starts at the ground level. */
    final int low;

    final double factor;
    final List<Bands> drift = new ArrayList<>();

    /** Operator norm of L's part of each order, times the factor: largest growth of the Frobenius or vector norm. */
    final double[] norms;

    Equation(Generator generator, long first, int levels, double factor) {
        this.first = first;
        this.levels = levels;
        this.factor = factor;
        reach = generator.reach();
        low = first == 0 ? 0 : -reach;
        int orders = generator.drift().size();
        for (LadderPolynomial k : generator.drift()) {
            drift.add(Bands.of(k, factor, first, levels, margin()));
        }
        norms = new double[orders];
    }

    /** Zeros around the window on each side. */
    final int margin() {
        return 2 * reach;
    }

    /** Zeros, with room for the window and its margin. */
    abstract Plane plane();

    /**
     * out += factor · Σ_j (L − c)_j c[order − j] inside the window and around it.
     *
     * @param most orders j of L above this are left out
     */
    abstract void apply(Plane[] c, int order, int most, Plane out);

    /** One stretch of the elements outside the window: its part of the border is {@code weight} times its vector norm. */
    record Outside(int from, int to, double weight, boolean below) {}

    /** The stretches of {@link #takeOutside}. */
    abstract List<Outside> outside();

    /** Copies the elements outside the window, those that stand for two grown by √2. */
    abstract void takeOutside(Plane y, double[] re, double[] im);

    /** Unit of rounding times the roundings of one element, for any order of L. */
    abstract double roundings();

    /** Wipes off what lies outside the window, and mirrors what needs it. */
    abstract void tidy(Plane y);

    /** Norm that stands behind bounds ≤ this · {@link #size}. */
    abstract double rank();

    /** Frobenius or vector norm of what lies in the window; {@link #rounding} then speaks of the same plane. */
    abstract double size(Plane y);

    /** Bound of a rounding error of one application of order 0 to the plane last measured, in the norm of {@link #size}. */
    abstract double rounding();

    /** Copies what lies in the window and its mirrored elements. */
    abstract void copy(Plane from, Plane to);

    /** Bounds of the norm of what sticks out: below the window, and above it. */
    abstract void border(Plane y, double[] belowAndAbove);

    /** out += c · y inside the window. */
    abstract void accumulate(Plane y, double c, Plane out);

    /** y · (re + i im) inside the window; density operators take re alone. */
    abstract void scale(Plane y, double re, double im);

    /** ⟨a^k⟩, k = 1 or 2: real part, imaginary part. */
    abstract double[] lowering(Plane y, int k);

    /** ⟨n⟩. */
    abstract double quanta(Plane y);

    /** e^{iθn} on a vector, from both sides on a density operator. */
    abstract void turn(Plane y, double theta);

    /** √((n + 1) … (n + k)) of the n-th level of the window. */
    final double root(int n, int k) {
        double product = 1;
        for (int i = 1; i <= k; i++) {
            product *= first + n + i;
        }
        return Math.sqrt(product);
    }

    /** Copies what is in this window into another window. */
    abstract void moveTo(Plane y, Equation other, Plane target);

    /** Bound of the norm of what lies in the lowest and in the highest {@code count} levels, rows and columns. */
    abstract double edge(Plane y, boolean below, int count);
}
