package ladderwell.packet;

/** V(x, t) on the whole axis as a packet sees it. @units scaled */
public interface PotentialField {
    /** V at all points at time t; +∞ is a wall that no packet passes. */
    void values(double[] x, double t, double[] out);

    /** Whether V depends on time. */
    boolean moves();

    /** Times between two times at which V jumps or bends, ascending: no step goes across one. */
    default double[] breaks(double from, double to) {
        return new double[0];
    }
}
