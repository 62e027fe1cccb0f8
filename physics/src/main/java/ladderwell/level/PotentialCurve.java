package ladderwell.level;

/**
 * A potential V(x) as the level solvers see it, in scaled units (ħ = m = 1): H = p²/2 + V(x) between {@code left} and {@code right}.
 *
 * <p>A finite end is a hard wall. At a declared break the potential may jump or have a kink; it must not be sampled there, and is smooth
 * in between. Jumps that are not declared are located, which costs time.
 */
public interface PotentialCurve {
    /** V(x) for x strictly between the ends and off the breaks; NaN is refused with the position named. */
    double value(double x);

    /** Left end: a hard wall where finite, −∞ where open. */
    double left();

    /** Right end: a hard wall where finite, +∞ where open. */
    double right();

    /** Positions of declared jumps and kinks, in any order; empty where there are none. */
    double[] breaks();

    /** Whether V(−x) = V(x) for all x, exactly. */
    boolean isEven();
}
