package ladderwell.packet;

import ladderwell.evidence.PhysicsException;
import ladderwell.numeric.Interruption;

/** One packet moved twice on one grid, with a step and with half of it; what they differ by is what the steps leave open. */
final class Pair {
    /** Grids do not grow beyond. */
    static final int MOST_POINTS = 1 << 17;

    private final PotentialField field;
    private final double still;
    private Wave coarse;
    private Wave fine;
    private SplitStep whole;
    private SplitStep half;
    private double high;
    private double side;
    private double leaked;
    private long steps;

    /**
     * @param start the packet at time 0, not modified
     * @param still weight that may lie at an edge of the grid, in position and in momentum
     */
    Pair(PotentialField field, Wave start, double h, double still) {
        this.field = field;
        this.still = still;
        coarse = start.copy();
        fine = start.copy();
        whole = new SplitStep(start.grid, field, h);
        half = new SplitStep(start.grid, field, h / 2);
    }

    /** The wave of the half steps. */
    Wave wave() {
        return fine;
    }

    double difference() {
        return coarse.distance(fine);
    }

    /** What the edges of all grids so far may have taken or turned back. */
    double leaked() {
        return leaked + Math.sqrt(high) + Math.sqrt(side);
    }

    /** Half steps taken. */
    long steps() {
        return steps;
    }

    /** Moves both over a time in equal steps. A step that comes too near an edge is taken back and done again on a larger grid. */
    void move(double from, int wholeSteps, double h) {
        // equal steps of a run differ in their last bits
        if (Math.abs(h - whole.h()) > 1e-12 * h) {
            steps(h);
        }
        Wave coarseBefore = coarse.copy();
        Wave fineBefore = fine.copy();
        for (int s = 0; s < wholeSteps; s++) {
            double t = from + s * h;
            while (true) {
                Interruption.check();
                double waves = whole.step(coarse, t);
                waves = Math.max(waves, Math.max(half.step(fine, t), half.step(fine, t + h / 2)));
                steps += 2;
                double left = fine.weightOnTheLeft();
                double right = fine.weightOnTheRight();
                if (Math.max(waves, Math.max(left, right)) <= still) {
                    high = Math.max(high, waves);
                    side = Math.max(side, left + right);
                    break;
                }
                coarse = coarseBefore;
                fine = fineBefore;
                grow(waves > still, left > still, right > still);
                coarseBefore = coarse.copy();
                fineBefore = fine.copy();
            }
            coarseBefore.take(coarse);
            fineBefore.take(fine);
        }
    }

    private void steps(double h) {
        whole = new SplitStep(fine.grid, field, h);
        half = new SplitStep(fine.grid, field, h / 2);
    }

    private void grow(boolean waves, boolean left, boolean right) {
        leaked = leaked();
        high = 0;
        side = 0;
        if (waves) {
            requireRoom();
            coarse = coarse.finer();
            fine = fine.finer();
        }
        if (left || right) {
            requireRoom();
            Grid longer = fine.grid.longer(left, right);
            coarse = coarse.onto(longer);
            fine = fine.onto(longer);
        }
        steps(whole.h());
    }

    private void requireRoom() {
        double points = 2.0 * fine.grid.points();
        if (points > MOST_POINTS) {
            throw new PhysicsException.TooLarge(
                    "a packet on a grid of more than " + MOST_POINTS + " points",
                    points * 24 * Double.BYTES,
                    MOST_POINTS * 24.0 * Double.BYTES,
                    "ask for a shorter time, a looser tolerance or a smoother potential");
        }
    }
}
