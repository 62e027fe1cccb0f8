package ladderwell.level;

import java.util.Arrays;
import java.util.TreeSet;
import java.util.function.DoubleUnaryOperator;

/**
 * What has to be known of a potential before it can be solved: where its well is, how wide, where the continuum begins, whether it is bounded
 * below. All energies here are e = 2E and all values v = 2V.
 */
final class CurveSurvey {
    private static final double[] FAR = {
        1e300, 1e200, 1e150, 1e100, 1e75, 1e50, 1e30, 1e20, 1e15, 1e12, 1e10, 1e8, 1e6, 1e5
    };
    private static final int PIECES = 256;
    private static final int MOST_WELLS = 256;
    /** For a second look. */
    private static final int FINER = 32;

    /** 32 places in each decade, from 1e-4 to 1e6. */
    private static final int DECADES = 321;

    private static final double TENTH_OF_TENTH = Math.pow(10, 1.0 / 32);
    private static final double GOLDEN = (3 - Math.sqrt(5)) / 2;

    final double left;
    final double right;
    final boolean even;
    final double[] breaks;
    /** Where the mesh begins; 0 for an even potential, the left end where that is singular. */
    final double start;
    /** A length over which a low level varies. */
    final double length;
    /** Lowest v met. */
    final double bottom;
    /** Where; on the right side for an even potential. */
    final double bottomAt;
    /** Where the continuum begins; infinite where it does not. */
    final double threshold;

    final boolean singular;

    private final PotentialCurve curve;
    private double[] seenAt = {};
    private double[] seen2V = {};
    private double[] wellsAt = {};
    private double[] wells2V = {};

    CurveSurvey(PotentialCurve curve) {
        this.curve = curve;
        left = curve.left();
        right = curve.right();
        even = curve.isEven();
        if (!(left < right) || left == Double.POSITIVE_INFINITY || right == Double.NEGATIVE_INFINITY) {
            throw new IllegalArgumentException(
                    "the left end of a potential must lie left of its right end, got " + left + " and " + right);
        }
        if (even && left != -right) {
            throw new IllegalArgumentException("an even potential has ends at ±x, got " + left + " and " + right);
        }
        TreeSet<Double> inside = new TreeSet<>();
        for (double b : curve.breaks()) {
            if (Double.isNaN(b)) {
                throw new IllegalArgumentException("a break point of the potential is not a number");
            }
            if (b > left && b < right && !(even && b <= 0)) {
                inside.add(b);
            }
            if (even && b < 0 && b > left) {
                inside.add(-b);
            }
        }
        breaks = inside.stream().mapToDouble(Double::doubleValue).toArray();
        threshold = Math.min(limit(1, right), even ? Double.POSITIVE_INFINITY : limit(-1, left));
        if (threshold == Double.NEGATIVE_INFINITY) {
            throw new IllegalArgumentException("the potential falls without limit towards "
                    + (limit(1, right) == Double.NEGATIVE_INFINITY ? "the right" : "the left")
                    + ": it has no lowest level");
        }
        singular = singularLeft();
        double[] found = lowest(1);
        if (!(found[1] < threshold)) {
            // Before saying that there is no well: one may hide between the places looked at.
            found = lowest(FINER);
        }
        bottom = found[1];
        bottomAt = found[0];
        length = naturalLength(found[0], found[1]);
        start = even ? 0 : singular ? left : awayFromWalls(onBreak(found[0]));
        if (!(bottom < threshold)) {
            throw new IllegalArgumentException(
                    "the potential has no well: nowhere does it lie below its value far out, " + threshold / 2);
        }
    }

    /** 2V(x). */
    double v(double x) {
        double value = curve.value(x);
        if (!(Math.abs(value) <= Double.MAX_VALUE)) {
            if (value == Double.POSITIVE_INFINITY) {
                // Overflow far up a flank, or a wall: no cell fits there.
                return value;
            }
            throw new IllegalArgumentException(
                    "the potential is " + (Double.isNaN(value) ? "not a number" : "minus infinity") + " at x = " + x);
        }
        return 2 * value;
    }

    private double limit(int direction, double end) {
        if (!Double.isInfinite(end)) {
            return Double.POSITIVE_INFINITY;
        }
        double last = Double.NaN;
        double before = Double.NaN;
        for (int i = 0; i < FAR.length && Double.isNaN(before); i++) {
            double value = curve.value(direction * FAR[i]);
            if (Double.isNaN(last)) {
                last = value;
            } else {
                before = value;
            }
        }
        if (Double.isNaN(last)) {
            throw new IllegalArgumentException("the potential is not a number far to the "
                    + (direction > 0 ? "right" : "left") + ", for example at x = " + direction * 1e10);
        }
        // Still growing at such distances means without limit: powers and logarithms do, what tends to a constant does
        // not.
        if (Math.abs(last) > 1.001 * Math.abs(before)) {
            return last > 0 ? Double.POSITIVE_INFINITY : Double.NEGATIVE_INFINITY;
        }
        return 2 * last + 0.0;
    }

    /** Whether v grows without bound, as 1/x or 1/x², at a finite left end. */
    private boolean singularLeft() {
        if (even || Double.isInfinite(left)) {
            return false;
        }
        double unit = Double.isInfinite(right) ? 1 : Math.min(1, right - left);
        double near = Math.abs(curve.value(left + 1e-9 * unit));
        double farther = Math.abs(curve.value(left + 1e-6 * unit));
        // NaN and infinity count as singular too.
        return !(near <= 100 * farther) && !(near <= 1e4);
    }

    /** @param finer how many times as many places to look at as usual */
    private double[] lowest(int finer) {
        double from = even ? 0 : left;
        double[] points = points(from, finer);
        double least = Double.POSITIVE_INFINITY;
        double at = Double.NaN;
        int wells = 0;
        double[] x = new double[points.length];
        double[] value = new double[points.length];
        int many = 0;
        for (double point : points) {
            if (!(point > from && point < right) || Arrays.binarySearch(breaks, point) >= 0) {
                continue;
            }
            double here = curve.value(point);
            if (Double.isNaN(here)) {
                throw new IllegalArgumentException("the potential is not a number at x = " + point);
            }
            if (here == Double.NEGATIVE_INFINITY) {
                throw new IllegalArgumentException("the potential is minus infinity at x = " + point);
            }
            x[many] = point;
            value[many] = here;
            if (2 * here < least) {
                least = 2 * here;
                at = point;
            }
            many++;
        }
        seenAt = Arrays.copyOf(x, many);
        seen2V = new double[many];
        for (int i = 0; i < many; i++) {
            seen2V[i] = 2 * value[i];
        }
        wellsAt = new double[MOST_WELLS];
        wells2V = new double[MOST_WELLS];
        for (int i = 1; i + 1 < many && wells < MOST_WELLS; i++) {
            if (value[i] < value[i - 1] && value[i] <= value[i + 1]) {
                double well = refined(x[i - 1], x[i], x[i + 1]);
                wellsAt[wells] = well;
                wells2V[wells] = 2 * curve.value(well);
                if (wells2V[wells] < least) {
                    least = wells2V[wells];
                    at = well;
                }
                wells++;
            }
        }
        wellsAt = Arrays.copyOf(wellsAt, wells);
        wells2V = Arrays.copyOf(wells2V, wells);
        if (Double.isNaN(at)) {
            throw new IllegalArgumentException(
                    "the potential is infinite everywhere between " + from + " and " + right);
        }
        if (even && 2 * curve.value(0) <= least) {
            least = 2 * curve.value(0);
            at = 0;
        }
        if (singular) {
            return new double[] {at, least};
        }
        // Walk downhill from the best sample.
        double step = 0.1 * Math.max(Math.abs(at), 0.1);
        for (int i = 0; i < 60; i++) {
            double up = at + step < right ? 2 * curve.value(at + step) : Double.POSITIVE_INFINITY;
            double down = at - step > from ? 2 * curve.value(at - step) : Double.POSITIVE_INFINITY;
            if (up < least && up <= down) {
                least = up;
                at += step;
            } else if (down < least) {
                least = down;
                at -= step;
            } else {
                step /= 2;
                if (step < 1e-6 * (Math.abs(at) + 1e-6)) {
                    break;
                }
            }
        }
        return new double[] {at, least};
    }

    /** Where to look: every few per cent of the distance from the origin, or evenly between two walls; beside breaks and between them. */
    private double[] points(double from, int finer) {
        int pieces = 4 * finer * PIECES;
        double[] points = new double[pieces + 2 * finer * DECADES + 1 + 3 * breaks.length];
        int many = 0;
        if (!Double.isInfinite(from) && !Double.isInfinite(right)) {
            for (int i = 1; i < pieces; i++) {
                points[many++] = from + (right - from) * i / pieces;
            }
        } else {
            double origin = !Double.isInfinite(from) ? from : !Double.isInfinite(right) ? right : 0;
            double d = 1e-4;
            double next = finer == 1 ? TENTH_OF_TENTH : Math.pow(TENTH_OF_TENTH, 1.0 / finer);
            for (int j = 0; j < finer * DECADES; j++, d *= next) {
                points[many++] = origin + d;
                points[many++] = origin - d;
            }
            points[many++] = origin;
        }
        double before = Double.NaN;
        for (double b : breaks) {
            points[many++] = b + 1e-9 * (1 + Math.abs(b));
            points[many++] = b - 1e-9 * (1 + Math.abs(b));
            if (!Double.isNaN(before)) {
                points[many++] = (before + b) / 2;
            }
            before = b;
        }
        double[] sorted = Arrays.copyOf(points, many);
        Arrays.sort(sorted);
        return sorted;
    }

    /** The least of v between two places that lie higher than the one between them, by golden sections. */
    private double refined(double low, double middle, double high) {
        double a = low;
        double b = high;
        double best = middle;
        double least = curve.value(middle);
        for (int i = 0; i < 40; i++) {
            boolean right = b - best > best - a;
            double next = right ? best + GOLDEN * (b - best) : best - GOLDEN * (best - a);
            double value = curve.value(next);
            if (value < least) {
                if (right) {
                    a = best;
                } else {
                    b = best;
                }
                best = next;
                least = value;
            } else if (right) {
                b = next;
            } else {
                a = next;
            }
        }
        return best;
    }

    /** Whether a function agrees with v within so much at all places between a and b that were looked at: what a coarse cell would miss. */
    boolean agrees(double a, double b, double within, DoubleUnaryOperator function) {
        int i = Arrays.binarySearch(seenAt, a);
        for (i = i < 0 ? -i - 1 : i + 1; i < seenAt.length && seenAt[i] < b; i++) {
            if (!(Math.abs(function.applyAsDouble(seenAt[i]) - seen2V[i]) <= within)) {
                return false;
            }
        }
        return true;
    }

    /** The break within rounding of x, else x: an edge next to a break would leave no room between them. */
    private double onBreak(double x) {
        for (double b : breaks) {
            if (Math.abs(b - x) < 1e-6 * length) {
                return b;
            }
        }
        return x;
    }

    /** Whether some well beyond x, that way, lies below e. */
    boolean wellBeyond(double x, int direction, double e) {
        for (int i = 0; i < wellsAt.length; i++) {
            if (direction * (wellsAt[i] - x) > 0 && wells2V[i] < e) {
                return true;
            }
        }
        return false;
    }

    /** A wall itself where the lowest place is close to it: an edge just inside would resolve nothing. */
    private double awayFromWalls(double at) {
        if (at - left < 0.2 * length) {
            return left;
        }
        return right - at < 0.2 * length ? right : at;
    }

    /** The distance d at which v has risen by 1/d², to a quarter of a decade. */
    private double naturalLength(double at, double least) {
        double width = right - left;
        if (singular) {
            return Math.min(1, width / 4);
        }
        for (double d = 1e-9; d < 1e9 && d < width / 2; d *= 1.3) {
            double rise = 0;
            if (at + d < right) {
                rise = Math.max(rise, 2 * curve.value(at + d) - least);
            }
            if (at - d > left) {
                rise = Math.max(rise, 2 * curve.value(at - d) - least);
            }
            if (rise * d * d >= 1) {
                return d;
            }
        }
        return Double.isInfinite(width) ? 1 : width / 2;
    }

    /** Number of levels below e by the semiclassical rule, roughly; infinite where the allowed region has no end. */
    double action(double e) {
        double sum = 0;
        double origin = even ? 0 : start;
        for (int direction = 1; direction >= (even ? 1 : -1); direction -= 2) {
            double end = direction > 0 ? right : left;
            double far = Double.isInfinite(end) ? turning(e, direction) : end;
            if (Double.isInfinite(far)) {
                return Double.POSITIVE_INFINITY;
            }
            double width = Math.abs(far - origin);
            for (int i = 0; i < PIECES && width > 0; i++) {
                double x = origin + direction * width * (i + 0.5) / PIECES;
                double value = 2 * curve.value(x);
                if (value < e) {
                    sum += Math.sqrt(e - value) * width / PIECES;
                }
            }
        }
        return sum * (even ? 2 : 1) / Math.PI;
    }

    /** The outermost place on one side where v reaches e, to 1e-4 of its distance; infinite where there is none. */
    double turning(double e, int direction) {
        double d = Math.max(length, direction * (bottomAt - start));
        int above = 0;
        double last = d;
        // The last sample below e, as long as none of the next ten is.
        while (above < 10 && d < 1e12) {
            if (2 * curve.value(start + direction * d) < e) {
                above = 0;
                last = d;
            } else {
                above++;
            }
            d *= 1.25;
        }
        if (above < 10) {
            return Double.POSITIVE_INFINITY;
        }
        double high = 1.25 * last;
        double low = last;
        for (int i = 0; i < 12; i++) {
            double middle = 0.5 * (low + high);
            if (2 * curve.value(start + direction * middle) < e) {
                low = middle;
            } else {
                high = middle;
            }
        }
        return start + direction * high;
    }

    /** About the energy below which there are so many levels; the threshold where there are not. */
    double energyOf(double levels) {
        double above = 1 / (length * length);
        double low = 0;
        double high = threshold - bottom;
        for (int i = 0; i < 80; i++) {
            if (!(above < high)) {
                above = 0.5 * (low + high);
            }
            double found = action(bottom + above);
            if (Math.abs(found - levels) <= 0.02 * levels) {
                return bottom + above;
            }
            if (found < levels) {
                low = above;
                above = high < Double.POSITIVE_INFINITY ? 0.5 * (low + high) : 2 * above;
            } else {
                high = above;
                above = 0.5 * (low + high);
            }
        }
        return bottom + low;
    }
}
