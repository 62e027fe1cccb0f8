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
        growInPosition();
    }

    /** The wave of the half steps. */
    Wave wave() {
        return fine;
    }

    double difference() {
        return coarse.distance(fine);
    }

    /** Half steps taken. */
    long steps() {
        return steps;
    }

    /** Moves both over a time in equal steps. */
    void move(double from, int wholeSteps, double h) {
        // equal steps of a run differ in their last bits
        if (Math.abs(h - whole.h()) > 1e-12 * h) {
            steps(h);
        }
        for (int s = 0; s < wholeSteps; s++) {
            Interruption.check();
            double t = from + s * h;
            whole.step(coarse, t);
            double high = half.step(fine, t);
            high = Math.max(high, half.step(fine, t + h / 2));
            steps += 2;
            if (high > still) {
                leaked += Math.sqrt(high);
                refine();
            }
            growInPosition();
        }
    }

    private void steps(double h) {
        whole = new SplitStep(fine.grid, field, h);
        half = new SplitStep(fine.grid, field, h / 2);
    }

    private void growInPosition() {
        double left = fine.weightOnTheLeft();
        double right = fine.weightOnTheRight();
        if (left <= still && right <= still) {
            return;
        }
        leaked += Math.sqrt(Math.max(left, right));
        requireRoom();
        Grid longer = fine.grid.longer(left > still, right > still);
        coarse = coarse.onto(longer);
        fine = fine.onto(longer);
        steps(whole.h());
    }

    /** What may have passed the edges by now, those of this moment included. */
    double leakedSoFar() {
        return leaked + Math.sqrt(fine.weightOnTheLeft() + fine.weightOnTheRight());
    }

    private void refine() {
        requireRoom();
        coarse = coarse.finer();
        fine = fine.finer();
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
