package ladderwell.classical;

/** Where a classical mode moves in phase space. */
@FunctionalInterface
public interface PhaseVelocity {
    /** Puts dx/dt and dp/dt at a time and place. */
    void at(double time, double position, double momentum, double[] velocity);
}
