package ladderwell.classical;

import java.util.Arrays;
import java.util.Optional;
import java.util.OptionalDouble;

/**
 * Motion at one energy between two turning points (or once around). With x = middle + half · sin θ the time element dx/√(2(E−V)) has no
 * singularity at the turning points; jumps and kinks of V end panels of the quadrature.
 *
 * @accuracy about 1e-9 of the period where V is smooth between its breaks
 */
final class Swing {
    private static final int PANELS = 192;
    private static final double[] NODE = {
        -0.9602898564975363,
        -0.7966664774136267,
        -0.525532409916329,
        -0.1834346424956498,
        0.1834346424956498,
        0.525532409916329,
        0.7966664774136267,
        0.9602898564975363
    };
    private static final double[] WEIGHT = {
        0.1012285362903763,
        0.2223810344533745,
        0.3137066458778873,
        0.362683783378362,
        0.362683783378362,
        0.3137066458778873,
        0.2223810344533745,
        0.1012285362903763
    };

    private final Landscape v;
    private final double energy;
    private final double left;
    private final double right;
    private final boolean around;
    /** Panel ends in θ (in x when going around) and the time from the left end to each. */
    private final double[] ends;

    private final double[] times;

    private Swing(Landscape v, double energy, double left, double right, boolean around) {
        this.v = v;
        this.energy = energy;
        this.left = left;
        this.right = right;
        this.around = around;
        ends = panels();
        times = new double[ends.length];
        for (int i = 1; i < ends.length; i++) {
            times[i] = times[i - 1] + time(ends[i - 1], ends[i]);
        }
    }

    /**
     * The motion through a position; empty if it leaves to an open side.
     *
     * @throws IllegalArgumentException if the energy lies below V there
     */
    static Optional<Swing> through(Landscape v, double position, double energy) {
        if (v.value(position) > energy) {
            throw new IllegalArgumentException("at this energy the classical particle cannot be at the given position");
        }
        OptionalDouble right = turn(v, position, energy, 1);
        OptionalDouble left = turn(v, position, energy, -1);
        if (right.isEmpty() || left.isEmpty()) {
            return Optional.empty();
        }
        boolean around = v.turns() && right.getAsDouble() >= v.right() && left.getAsDouble() <= v.left();
        return Optional.of(new Swing(v, energy, left.getAsDouble(), right.getAsDouble(), around));
    }

    /** The first place where V exceeds the energy, or the wall; empty where there is none. */
    private static OptionalDouble turn(Landscape v, double from, double energy, int side) {
        double end = side > 0 ? v.right() : v.left();
        double inside = from;
        double step = 1e-3;
        while (true) {
            double next = inside + side * step;
            for (double edge : v.breaks()) {
                // a spike or a step may hide between two samples
                if (side * (edge - inside) > 1e-9 * step && side * (next - edge) > 0) {
                    next = edge - side * 1e-9 * step;
                    double beyond = edge + side * 1e-9 * step;
                    if (v.value(next) <= energy && v.value(beyond) > energy) {
                        return OptionalDouble.of(edge);
                    }
                    if (v.value(next) <= energy) {
                        next = beyond;
                    }
                    break;
                }
            }
            if (side * (next - end) >= 0) {
                double last = end - side * 1e-12 * Math.max(1, Math.abs(end));
                return v.value(last) <= energy
                        ? OptionalDouble.of(end)
                        : OptionalDouble.of(cross(v, inside, last, energy));
            }
            if (v.value(next) > energy) {
                return OptionalDouble.of(cross(v, inside, next, energy));
            }
            inside = next;
            step *= 1.01;
            if (Math.abs(inside) > 1e9) {
                return OptionalDouble.empty();
            }
        }
    }

    private static double cross(Landscape v, double below, double above, double energy) {
        double a = below;
        double b = above;
        for (int i = 0; i < 200 && a != b; i++) {
            double middle = a + (b - a) / 2;
            if (middle == a || middle == b) {
                break;
            }
            if (v.value(middle) > energy) {
                b = middle;
            } else {
                a = middle;
            }
        }
        return a;
    }

    private double[] panels() {
        double[] breaks =
                Arrays.stream(v.breaks()).filter(b -> b > left && b < right).toArray();
        double from = around ? left : -Math.PI / 2;
        double to = around ? right : Math.PI / 2;
        double[] all = new double[PANELS + 1 + breaks.length];
        for (int i = 0; i <= PANELS; i++) {
            all[i] = from + (to - from) * i / PANELS;
        }
        for (int i = 0; i < breaks.length; i++) {
            all[PANELS + 1 + i] = around ? breaks[i] : angle(breaks[i]);
        }
        Arrays.sort(all);
        return all;
    }

    private double angle(double x) {
        double half = (right - left) / 2;
        return Math.asin(Math.max(-1, Math.min(1, (x - left - half) / half)));
    }

    private double at(double u) {
        if (around) {
            return u;
        }
        double half = (right - left) / 2;
        // from the nearer end, so that distances from a turning point keep their digits
        double s = Math.sin((Math.PI / 2 - Math.abs(u)) / 2);
        double in = 2 * half * s * s;
        return u < 0 ? left + in : right - in;
    }

    private double element(double u) {
        double x = at(u);
        double speed = Math.sqrt(2 * Math.max(energy - v.value(x), 0));
        if (around) {
            return 1 / speed;
        }
        double half = (right - left) / 2;
        double cosine = half * Math.sin(Math.PI / 2 - Math.abs(u));
        if (speed == 0) {
            // at a turning point: x − end = half u²/2, E − V = force (x − end)
            return Math.sqrt(half / Math.max(Math.abs(v.slope(x)), Double.MIN_NORMAL));
        }
        return cosine / speed;
    }

    private double time(double from, double to) {
        double half = (to - from) / 2;
        double sum = 0;
        for (int i = 0; i < NODE.length; i++) {
            sum += WEIGHT[i] * element(from + half * (1 + NODE[i]));
        }
        return sum * half;
    }

    /** Time for a full period: there and back, or once around. */
    double period() {
        return (around ? 1 : 2) * times[times.length - 1];
    }

    double left() {
        return left;
    }

    double right() {
        return right;
    }

    boolean goesAround() {
        return around;
    }

    double momentumAt(double x) {
        return Math.sqrt(2 * Math.max(energy - v.value(x), 0));
    }

    /** Time from the left end to a position, going right. */
    double timeTo(double x) {
        double u = around ? x : angle(x);
        int panel = Math.max(0, Math.min(ends.length - 2, search(ends, u)));
        return times[panel] + time(ends[panel], u);
    }

    /** Position at a time after the left end, going right; 0 ≤ time ≤ half a period (a period when going around). */
    double positionAfter(double time) {
        int panel = Math.max(0, Math.min(ends.length - 2, search(times, time)));
        double from = ends[panel];
        double low = from;
        double high = ends[panel + 1];
        double rest = time - times[panel];
        double whole = times[panel + 1] - times[panel];
        double u = whole > 0 ? low + (high - low) * rest / whole : low;
        for (int i = 0; i < 40; i++) {
            double off = time(from, u) - rest;
            if (off > 0) {
                high = u;
            } else {
                low = u;
            }
            double next = u - off / element(u);
            if (!(next > low && next < high)) {
                next = low + (high - low) / 2;
            }
            if (Math.abs(next - u) <= 1e-15 * (1 + Math.abs(u))) {
                break;
            }
            u = next;
        }
        return at(u);
    }

    private static int search(double[] sorted, double value) {
        int at = Arrays.binarySearch(sorted, value);
        return at >= 0 ? at : -at - 2;
    }
}
