package ladderwell.level;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import ladderwell.numeric.Interruption;
import org.jspecify.annotations.Nullable;

/**
 * A well at energies far above its bottom: phase functions over all of it but the neighbourhood of the turning points, where the shooting mesh takes
 * over. The work hardly depends on the number of levels. Energies are e = 2E.
 *
 * <p>{@link #excess} is the Prüfer angle of both ends in the frame of the phase function, (θ_left + ∫w + θ_right)/π − 1 − n; it rises through 0 at
 * level n as any such angle does, and unlike others it is smooth in e and n.
 */
final class PhaseWell {
    /** The phase function serves where |v′| q^{−3/2} is below this: 25 lengths of the Airy function from a turning point. */
    private static final double STEEP = 0.008;

    private static final int MOST_CELLS = 64;
    private static final double AIRY_LENGTHS = 25;

    private final CurveSurvey survey;
    private final double eLow;
    private final double left;
    private final double right;
    private final PhaseCell[] cells;
    private final @Nullable ShootingMesh leftMesh;
    private final @Nullable Shot leftShot;
    private final @Nullable ShootingMesh rightMesh;
    private final @Nullable Shot rightShot;
    private final double[][] room = PhaseCell.room();
    private final double allowed;

    /** Of the last energy asked for: what rounding and the iteration leave open in {@link #excess}. */
    double noise;
    /** Error of e by the fit of the cells. */
    double fit;
    /** How far the two parities of an even well, or the frames at kinks, keep {@link #excess} from being one smooth function. */
    double apart;
    /** Roughly the derivative of {@link #excess} by e. */
    double slope;

    private PhaseWell(
            CurveSurvey survey,
            double eLow,
            double left,
            double right,
            PhaseCell[] cells,
            double[] steps,
            double allowed) {
        this.survey = survey;
        this.eLow = eLow;
        this.left = left;
        this.right = right;
        this.cells = cells;
        this.allowed = allowed;
        leftMesh = survey.even || left == survey.left ? null : new ShootingMesh(survey, eLow, left, -1, steps[0]);
        leftShot = leftMesh == null ? null : new Shot(leftMesh, survey);
        rightMesh = right == survey.right ? null : new ShootingMesh(survey, eLow, right, 1, steps[1]);
        rightShot = rightMesh == null ? null : new Shot(rightMesh, survey);
    }

    /**
     * The well for energies from eLow on; null where it is not of the kind: a barrier inside, a singular end, turning points too near to each
     * other.
     *
     * @param levels about how many levels lie below eLow
     */
    static @Nullable PhaseWell of(CurveSurvey survey, double eLow, double levels) {
        if (survey.singular || !(eLow < survey.threshold)) {
            return null;
        }
        double[] steps = new double[2];
        double right = end(survey, eLow, 1, steps);
        double left = survey.even ? 0 : end(survey, eLow, -1, steps);
        if (!(left < right)) {
            return null;
        }
        // What a level can be resolved to by its own rounding, in radians.
        double allowed = 2e-15 * levels + 2e-14;
        List<PhaseCell> cells = new ArrayList<>();
        double from = left;
        for (double b : survey.breaks) {
            if (b > left && b < right) {
                if (!split(survey, eLow, from, b, allowed, cells)) {
                    return null;
                }
                from = b;
            }
        }
        if (!split(survey, eLow, from, right, allowed, cells)) {
            return null;
        }
        return new PhaseWell(survey, eLow, left, right, cells.toArray(new PhaseCell[0]), steps, allowed);
    }

    /** Where the phase function has to end on one side: at a wall, or so many Airy lengths inside the turning point; NaN where neither is. */
    private static double end(CurveSurvey survey, double e, int direction, double[] steps) {
        double wall = direction > 0 ? survey.right : survey.left;
        if (!Double.isInfinite(wall)) {
            double before = wall - direction * 1e-9 * survey.length;
            return steep(survey, e, before, 1e-3 * survey.length) <= STEEP ? wall : Double.NaN;
        }
        double turning = survey.turning(e, direction);
        double width = Math.abs(turning - survey.start);
        if (!(width < 1e15)) {
            return Double.NaN;
        }
        double h = 1e-3 * width;
        double rise = Math.abs(survey.v(turning) - survey.v(turning - direction * h)) / h;
        double airy = 1 / Math.cbrt(rise);
        if (!(airy * AIRY_LENGTHS < 0.8 * width)) {
            return Double.NaN;
        }
        steps[direction > 0 ? 1 : 0] = 2 * airy;
        for (double lengths = AIRY_LENGTHS; airy * lengths < 0.8 * width; lengths *= 1.25) {
            double x = turning - direction * airy * lengths;
            if (steep(survey, e, x, 0.1 * airy) <= STEEP) {
                return x;
            }
        }
        return Double.NaN;
    }

    private static double steep(CurveSurvey survey, double e, double x, double h) {
        double q = e - survey.v(x);
        if (!(q > 0)) {
            return Double.POSITIVE_INFINITY;
        }
        double inside = Math.max(x - h, survey.left);
        double outside = Math.min(x + h, survey.right);
        double a = inside == survey.left ? survey.v(Math.nextUp(inside)) : survey.v(inside);
        double b = outside == survey.right ? survey.v(Math.nextDown(outside)) : survey.v(outside);
        return Math.abs(b - a) / (outside - inside) / (q * Math.sqrt(q));
    }

    /** Adds cells for [from, to], halving until they fit. */
    private static boolean split(
            CurveSurvey survey, double e, double from, double to, double allowed, List<PhaseCell> cells) {
        double[][] room = PhaseCell.room();
        double a = from;
        double b = to;
        double size = e - survey.bottom;
        while (a < to) {
            Interruption.check();
            PhaseCell cell = PhaseCell.build(survey, a, b, size);
            if (cell != null && cell.at(e, allowed, room)) {
                cells.add(cell);
                if (cells.size() > MOST_CELLS) {
                    return false;
                }
                a = b;
                b = to;
            } else {
                b = a + 0.5 * (b - a);
                if (b - a < 1e-6 * (to - from) || e - survey.v(b) <= 0) {
                    return false;
                }
            }
        }
        return true;
    }

    double eLow() {
        return eLow;
    }

    /** What an angle gains where one phase function gives way to another: next to nothing but at a kink, where it is not smooth in e. */
    private static double turned(double angle, double w, double bend, double wNext, double bendNext) {
        double y = Math.sin(angle);
        double p = w * Math.cos(angle) - bend * y;
        double next = Math.atan2(wNext * y, p + bendNext * y);
        return Math.IEEEremainder(next - angle, 2 * Math.PI);
    }

    /**
     * (θ_left + ∫w + θ_right)/π − 1 − n over the line at level n; NaN where a phase function or mesh fails.
     *
     * @param n level, of which an even potential needs the parity
     */
    double excess(double e, long n) {
        if (!(e >= eLow && e < survey.threshold)) {
            return Double.NaN;
        }
        apart = 0;
        double open = 0;
        double stay = 0;
        double wrong = 0;
        double worst = 0;
        for (PhaseCell cell : cells) {
            if (!cell.at(e, allowed, room)) {
                return Double.NaN;
            }
            open += cell.open;
            stay += cell.stay;
            wrong += cell.stay * cell.fit;
        }
        PhaseCell last = cells[cells.length - 1];
        double angle;
        int steps = 0;
        if (survey.even) {
            PhaseCell first = cells[0];
            double flat = Math.atan2(first.wa, first.bendA);
            angle = (n & 1) == 1 ? 0 : flat;
            apart = 2 * Math.abs(flat - Math.PI / 2) / Math.PI;
        } else if (leftMesh == null || leftShot == null) {
            angle = 0;
        } else {
            leftMesh.cover(e, ShootingMesh.TAIL);
            int zeros = leftShot.inwards(e, -1);
            PhaseCell first = cells[0];
            angle = zeros * Math.PI + half(first.wa * leftShot.rightY, leftShot.rightP + first.bendA * leftShot.rightY);
            steps += leftMesh.cells().length;
            worst = Math.max(worst, fit(leftMesh));
        }
        for (int i = 0; i < cells.length; i++) {
            angle += cells[i].phase;
            if (i + 1 < cells.length) {
                PhaseCell here = cells[i];
                PhaseCell next = cells[i + 1];
                double more = turned(angle, here.wb, here.bendB, next.wa, next.bendA);
                angle += more;
                apart = Math.max(apart, Math.abs(more));
            }
        }
        if (rightMesh != null && rightShot != null) {
            rightMesh.cover(e, ShootingMesh.TAIL);
            int zeros = rightShot.inwards(e, 1);
            angle += zeros * Math.PI
                    + half(last.wb * rightShot.rightY, -rightShot.rightP - last.bendB * rightShot.rightY);
            steps += rightMesh.cells().length;
            worst = Math.max(worst, fit(rightMesh));
        }
        noise = (open + 2e-16 * (8 + steps + 4 * cells.length)) / Math.PI + 2e-16 * angle / Math.PI;
        // Outside the phase cells a level stays less than a quarter of its time.
        fit = wrong / stay + 0.5 * worst;
        slope = stay / (2 * Math.PI);
        return survey.even ? 2 * (angle / Math.PI - 1 - n / 2) : angle / Math.PI - 1 - n;
    }

    private static double fit(ShootingMesh mesh) {
        double worst = 0;
        for (Cell cell : mesh.cells()) {
            if (cell.mean < mesh.reached()) {
                worst = Math.max(worst, cell.fit);
            }
        }
        return worst;
    }

    /** In [0, π). */
    private static double half(double sine, double cosine) {
        double t = Math.atan2(sine, cosine);
        return t < 0 ? t + Math.PI : t == Math.PI ? 0 : t;
    }

    @Override
    public String toString() {
        return cells.length + " phase cells from " + left + " to " + right + ", "
                + Arrays.toString(new int[] {
                    leftMesh == null ? 0 : leftMesh.cells().length, rightMesh == null ? 0 : rightMesh.cells().length
                });
    }
}
