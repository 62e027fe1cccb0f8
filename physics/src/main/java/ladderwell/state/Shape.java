package ladderwell.state;

/**
 * A state as a function ψ(x), to be expanded in levels. Between {@link #left} and {@link #right} it is analytic but for {@link #breaks};
 * what lies outside is lost.
 *
 * @units scaled, those of the levels
 */
public interface Shape {
    /** ψ at ascending points. */
    void sample(double[] x, double[] re, double[] im);

    /** Where ψ begins to matter, or the wall before it; finite. */
    double left();

    /** Where ψ ceases to matter, or the wall before it; finite. */
    double right();

    /** Positions inside where ψ or the levels' wave functions have a kink in some derivative, ascending. */
    double[] breaks();

    /** Largest wave number that matters in ψ; 1/wave is also the shortest length over which |ψ| changes. */
    double wave();

    /** Mean energy, roughly: the search for populated levels begins there. */
    double energy();

    /** Least value of the potential between left and right. */
    double bottom();
}
