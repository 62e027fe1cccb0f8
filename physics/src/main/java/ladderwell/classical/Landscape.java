package ladderwell.classical;

/** A potential as a classical particle of mass 1 sees it. @units scaled */
public interface Landscape {
    /** V(x) between the ends. */
    double value(double x);

    /** dV/dx between the ends, away from breaks. */
    double slope(double x);

    /** Left end: a hard wall where finite, −∞ where open. */
    double left();

    /** Right end: a hard wall where finite, +∞ where open. */
    double right();

    /** Positions where V may jump or have a kink, ascending. */
    double[] breaks();

    /** Whether the ends are one and the same place: an angle, or a lattice. */
    boolean turns();
}
