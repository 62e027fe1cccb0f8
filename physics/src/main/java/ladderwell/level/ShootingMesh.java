package ladderwell.level;

import java.util.ArrayList;
import java.util.List;
import ladderwell.evidence.PhysicsException;
import ladderwell.numeric.Interruption;
import org.jspecify.annotations.Nullable;

/**
 * Cells over the well and as much of its flanks as the energies asked for need; it grows outwards and never changes what it has. A place
 * where no cell fits is a jump, a kink or a pole: it is located by bisection and becomes an end of cells.
 */
final class ShootingMesh {
    /** Where the integral of the decay constant beyond the turning point reaches this, φ² has fallen by e^−40. */
    static final double TAIL = 20;

    private static final double TOLERANCE = 1e-15;
    /** Where nothing better can be had. */
    private static final double ROUGH = 1e-13;

    private static final double THETA = 4;
    private static final int MOST_CELLS = 200_000;

    private final CurveSurvey survey;
    private final double eLow;
    private final List<Cell> rightward = new ArrayList<>();
    private final List<Cell> leftward = new ArrayList<>();
    private final double start;
    /** 0 for both. */
    private final int side;

    private final double leftEnd;
    final @Nullable SingularEdge edge;
    private double stepRight;
    private double stepLeft;
    private double smallest;
    private double reached = Double.NEGATIVE_INFINITY;
    private double reachedDepth;
    private Cell[] cells = {};

    /**
     * @param eLow energies asked for lie above this
     * @param eHigh and not far above this; only singular ends need it
     */
    ShootingMesh(CurveSurvey survey, double eLow, double eHigh) {
        this.survey = survey;
        this.eLow = eLow;
        side = 0;
        if (survey.singular) {
            edge = SingularEdge.at(survey, eHigh);
            start = survey.left + edge.width();
            leftEnd = start;
        } else {
            edge = null;
            start = survey.start;
            leftEnd = survey.even ? start : survey.left;
        }
        stepRight = survey.length;
        stepLeft = survey.length;
    }

    /** A mesh on one side only, from a place inside the well outwards. */
    ShootingMesh(CurveSurvey survey, double eLow, double start, int direction, double step) {
        this.survey = survey;
        this.eLow = eLow;
        this.start = start;
        edge = null;
        side = direction;
        leftEnd = survey.left;
        stepRight = step;
        stepLeft = step;
    }

    double eLow() {
        return eLow;
    }

    /** The highest energy covered. */
    double reached() {
        return reached;
    }

    Cell[] cells() {
        return cells;
    }

    /** A lower bound of v in all cells. */
    double lowest() {
        double lowest = Double.POSITIVE_INFINITY;
        for (Cell cell : cells) {
            lowest = Math.min(lowest, cell.low);
        }
        return lowest;
    }

    /** How many cells lie left of the start. */
    int startIndex() {
        return leftward.size();
    }

    /** Adds cells until the tail at e is deep enough on both sides. */
    void cover(double e, double depth) {
        if (e <= reached && depth <= reachedDepth) {
            return;
        }
        reached = Math.max(e, reached);
        reachedDepth = Math.max(depth, reachedDepth);
        boolean grown = side >= 0 && extend(reached, 1, rightward, survey.right);
        if (side < 0 || side == 0 && !survey.even && edge == null) {
            grown |= extend(reached, -1, leftward, leftEnd);
        }
        if (grown) {
            Cell[] all = new Cell[leftward.size() + rightward.size()];
            int i = 0;
            for (int j = leftward.size() - 1; j >= 0; j--) {
                all[i++] = leftward.get(j);
            }
            for (Cell cell : rightward) {
                all[i++] = cell;
            }
            cells = all;
        }
    }

    /** Whether v falls below e again farther out, by samples. */
    private boolean lower(double x, int direction, double e) {
        if (direction * (survey.bottomAt - x) > 0 && survey.bottom < e || survey.wellBeyond(x, direction, e)) {
            return true;
        }
        double end = direction > 0 ? survey.right : survey.left;
        double d = 0.05 * (Math.abs(x - start) + survey.length);
        for (int i = 0; i < 180; i++, d *= 1.1) {
            if (direction * (end - (x + direction * d)) <= 0) {
                break;
            }
            if (survey.v(x + direction * d) < e) {
                return true;
            }
        }
        for (double q : survey.breaks) {
            if (direction * (q - x) > 0 && survey.v(q + direction * 1e-9 * (1 + Math.abs(q))) < e) {
                return true;
            }
        }
        return false;
    }

    /**
     * The size of v that a fit at x may refer to. At the bottom of a well v may vanish by cancellation, and its rounding does not: there it is
     * at least the energy of the well's own length.
     */
    private double scale(double x, double size) {
        double usual = survey.length;
        boolean near = edge == null && Math.min(Math.abs(x - start), Math.abs(x - survey.bottomAt)) < 6 * usual;
        double least = near ? 1 / (usual * usual) : 0;
        // High levels feel no error of the potential that is small beside their own height.
        double high = eLow > survey.bottom ? 0.1 * (eLow - survey.bottom) : 0;
        return Math.max(Math.max(least, high), Math.max(0.1 * size, smallest));
    }

    private static double fall(Cell cell, double e) {
        return 2 * cell.r * Math.sqrt(Math.max(0, cell.low - e));
    }

    private boolean extend(double e, int direction, List<Cell> list, double end) {
        double depth = 0;
        for (Cell cell : list) {
            depth = cell.low > e ? depth + fall(cell, e) : 0;
        }
        boolean grown = false;
        double x = list.isEmpty() ? start : direction > 0 ? list.get(list.size() - 1).b : list.get(list.size() - 1).a;
        double size = list.isEmpty() ? 0 : list.get(list.size() - 1).size;
        double h = direction > 0 ? stepRight : stepLeft;
        double wanted = h;
        boolean refused = false;
        boolean shortened = false;
        while (direction * (end - x) > 0
                && Math.abs(x) < 1e15
                && (depth < reachedDepth || !Double.isInfinite(end) || lower(x, direction, e))) {
            Interruption.check();
            double stop = end;
            for (double q : survey.breaks) {
                if (direction * (q - x) > 1e-13 * Math.abs(q) && direction * (stop - q) > 0) {
                    stop = q;
                }
            }
            double y = x + direction * h;
            // A cell that nearly reaches the stop goes there; but not again once that was refused as too long.
            if (direction * (y - stop) > (refused ? 0 : -0.2 * h)) {
                y = stop;
            }
            Cell.Attempt attempt = attempt(x, y, size);
            Cell cell = attempt.cell();
            boolean trouble = false;
            if (cell == null) {
                h = attempt.shorter() * Math.abs(y - x);
                if (h < wanted / 200 || h < 1e-10 * Math.abs(x)) {
                    cell = upToTrouble(x, direction, h, Math.abs(y - x), size);
                    trouble = true;
                    if (cell == null) {
                        // Trouble at x itself: step over it.
                        cell = past(x, direction, wanted, size);
                    }
                } else {
                    refused = true;
                    shortened |= attempt.misfit();
                    continue;
                }
            }
            refused = false;
            list.add(cell);
            if (list.size() > MOST_CELLS) {
                throw new PhysicsException.NotConverged(
                        "the mesh of the potential around x = " + x, list.size(), Double.POSITIVE_INFINITY, TOLERANCE);
            }
            grown = true;
            size = cell.size;
            if (smallest == 0) {
                smallest = 1e-25 * size;
            }
            boolean cut = (direction > 0 ? cell.b : cell.a) == stop;
            x = direction > 0 ? cell.b : cell.a;
            double grow = 0.97 * Math.cbrt(THETA / (cell.theta + 1e-3));
            h = cut ? Math.max(h, 2 * cell.r) * 1.2 : 2 * cell.r * Math.max(1.02, Math.min(2, grow));
            h = Math.max(trouble ? wanted : h, 1e-12 * Math.abs(x));
            // Cells that shrink one after the other approach a jump: the length in use before tells it from a steep
            // place.
            wanted = shortened && !trouble ? Math.max(h, wanted / 3) : h;
            shortened = false;
            depth = cell.low > e ? depth + fall(cell, e) : 0;
        }
        if (direction > 0) {
            stepRight = h;
        } else {
            stepLeft = h;
        }
        return grown;
    }

    private Cell.Attempt attempt(double x, double y, double size) {
        return Cell.build(survey::v, Math.min(x, y), Math.max(x, y), scale(x, size), TOLERANCE, THETA, eLow, survey);
    }

    /** The longest cell from x that fits: up to a jump or kink; null where there is none longer than rounding. */
    private @Nullable Cell upToTrouble(double x, int direction, double first, double refused, double size) {
        double low = 0;
        double high = refused;
        double least = 4e-16 * Math.abs(x) + 1e-13 * survey.length;
        Cell best = null;
        double h = first;
        // A start that fits, then halving between what fits and what does not.
        while (h > least) {
            Cell cell = attempt(x, x + direction * h, size).cell();
            if (cell != null) {
                low = h;
                best = cell;
                break;
            }
            high = h;
            h /= 4;
        }
        if (best == null) {
            return null;
        }
        while (high - low > 4e-16 * Math.abs(x + direction * low)) {
            double middle = 0.5 * (low + high);
            if (middle <= low || middle >= high) {
                break;
            }
            Cell cell = attempt(x, x + direction * middle, size).cell();
            if (cell != null) {
                low = middle;
                best = cell;
            } else {
                high = middle;
            }
        }
        return best;
    }

    /** The short cell from x to a jump somewhere before x + reach, found by its values; null where there is none. */
    private @Nullable Cell upToJump(double x, int direction, double reach, double size) {
        double near = direction > 0 ? Math.nextUp(x) : Math.nextDown(x);
        double far = x + direction * reach;
        double before = survey.v(near);
        double beyond = survey.v(far);
        if (!(beyond <= Double.MAX_VALUE)) {
            return null;
        }
        while (true) {
            double middle = 0.5 * (near + far);
            if (middle == near || middle == far) {
                break;
            }
            double value = survey.v(middle);
            if (Math.abs(value - before) < Math.abs(value - beyond)) {
                near = middle;
            } else {
                far = middle;
            }
        }
        return attempt(x, direction > 0 ? Math.max(near, far) : Math.min(near, far), size)
                .cell();
    }

    /** A cell from x that looks at the potential beyond a trouble at x itself: its first sliver continues the rest. */
    private Cell past(double x, int direction, double wanted, double size) {
        double least = 1e-13 * survey.length + 1e-15 * Math.abs(x);
        // A kink may lie a little ahead of x, where cells up to it are too short to tell; skipping it costs slope ·
        // sliver².
        for (double sliver = least; sliver < 1e-8 * survey.length; sliver *= 8) {
            double from = x + direction * sliver;
            double step = Math.abs(survey.v(from) - survey.v(direction > 0 ? Math.nextUp(x) : Math.nextDown(x)));
            if (sliver > least && !(step * sliver <= 1e-15 * (size + step) * survey.length)) {
                Cell cell = upToJump(x, direction, sliver, size);
                if (cell != null) {
                    return cell;
                }
                break;
            }
            double value = survey.v(from);
            double next = from + direction * Math.max(1e-5 * wanted, 10 * sliver);
            double slope = (survey.v(next) - value) / (next - from);
            double h = wanted;
            for (int i = 0; i < 200 && h > 1e3 * sliver; i++) {
                double to = x + direction * h;
                Cell.Attempt attempt = Cell.build(
                        t -> direction * (t - from) < 0 ? value + (t - from) * slope : survey.v(t),
                        Math.min(x, to),
                        Math.max(x, to),
                        scale(x, size),
                        TOLERANCE,
                        THETA,
                        eLow,
                        survey);
                Cell cell = attempt.cell();
                if (cell != null) {
                    return cell;
                }
                h *= attempt.shorter();
            }
        }
        // Values that are rough by the rounding of large terms that cancel: the cell's fit says by how much.
        for (double h = wanted; h > 1e-3 * wanted; h *= 0.6) {
            double to = x + direction * h;
            Cell cell = Cell.build(
                            survey::v, Math.min(x, to), Math.max(x, to), scale(x, size), ROUGH, THETA, eLow, survey)
                    .cell();
            if (cell != null) {
                return cell;
            }
        }
        throw new IllegalArgumentException("the potential cannot be followed at x = " + x
                + ": it is singular there; declare a wall or keep to one side of it");
    }
}
