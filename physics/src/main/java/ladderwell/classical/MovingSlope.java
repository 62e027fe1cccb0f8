package ladderwell.classical;

/** dV/dx of a potential that moves. @units scaled */
@FunctionalInterface
public interface MovingSlope {
    /** dV/dx at a position and a time. */
    double at(double position, double time);
}
