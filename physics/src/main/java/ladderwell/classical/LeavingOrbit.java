package ladderwell.classical;

import java.util.ArrayList;
import java.util.List;

/**
 * Motion that leaves to an open side, or in a potential that moves: a symplectic integrator of order 4 with fixed steps, kept as far as it was asked for; a wall
 * reflects. Beyond {@value #MOST} steps the particle is taken to be free.
 *
 * @source E. Forest and R. D. Ruth, Physica D 43 (1990) 105
 */
final class LeavingOrbit implements ClassicalOrbit {
    static final int MOST = 200_000;
    private static final double STEP = 5e-3;
    private static final double ROOT = 1 / (2 - Math.cbrt(2));

    private final MovingSlope slope;
    private final double left;
    private final double right;
    private final List<double[]> points = new ArrayList<>();

    LeavingOrbit(Landscape v, double position, double momentum) {
        this((x, t) -> v.slope(x), v.left(), v.right(), position, momentum);
    }

    LeavingOrbit(MovingSlope slope, double left, double right, double position, double momentum) {
        this.slope = slope;
        this.left = left;
        this.right = right;
        points.add(new double[] {position, momentum, 0});
    }

    private synchronized double[] at(double time) {
        double sign = time < 0 ? -1 : 1;
        int whole = (int) Math.min(MOST, Math.abs(time) / STEP);
        if (sign < 0) {
            double[] point = points.get(0).clone();
            for (int i = 0; i < whole; i++) {
                step(point, -STEP);
            }
            step(point, time + whole * STEP);
            return point;
        }
        while (points.size() <= whole) {
            double[] next = points.get(points.size() - 1).clone();
            step(next, STEP);
            points.add(next);
        }
        double[] point = points.get(whole).clone();
        double rest = time - whole * STEP;
        if (whole == MOST) {
            point[0] += rest * point[1];
        } else {
            step(point, rest);
        }
        return point;
    }

    private void step(double[] point, double h) {
        drift(point, ROOT * h / 2);
        kick(point, ROOT * h);
        drift(point, (1 - ROOT) * h / 2);
        kick(point, (1 - 2 * ROOT) * h);
        drift(point, (1 - ROOT) * h / 2);
        kick(point, ROOT * h);
        drift(point, ROOT * h / 2);
    }

    private void drift(double[] point, double h) {
        point[0] += h * point[1];
        point[2] += h;
        if (point[0] < left) {
            point[0] = 2 * left - point[0];
            point[1] = -point[1];
        } else if (point[0] > right) {
            point[0] = 2 * right - point[0];
            point[1] = -point[1];
        }
    }

    private void kick(double[] point, double h) {
        point[1] -= h * slope.at(point[0], point[2]);
    }

    @Override
    public double position(double time) {
        return at(time)[0];
    }

    @Override
    public double momentum(double time) {
        return at(time)[1];
    }

    @Override
    public double turningPoint() {
        return Math.min(right, Double.MAX_VALUE);
    }

    @Override
    public double leftTurningPoint() {
        return Math.max(left, -Double.MAX_VALUE);
    }
}
