package ladderwell.potential;

import java.util.Arrays;
import java.util.TreeSet;
import java.util.function.DoubleUnaryOperator;

/**
 * A look over a potential in any units: its least value, the length over which it rises, what it does far out. Open
 * sides are sampled in every decade.
 */
final class Survey {

    private final DoubleUnaryOperator v;
    private final double left;
    private final double right;
    private final double minimum;
    private final double least;
    private final boolean mostlyMissing;

    Survey(DoubleUnaryOperator v, double left, double right, double... hints) {
        this.v = v;
        this.left = left;
        this.right = right;
        double[] x = points(hints);
        int best = -1;
        double low = Double.POSITIVE_INFINITY;
        int missing = 0;
        for (int i = 0; i < x.length; i++) {
            double value = v.applyAsDouble(x[i]);
            missing += Double.isNaN(value) ? 1 : 0;
            // among equal ones the nearest to the origin
            if (value < low || value == low && best >= 0 && Math.abs(x[i]) < Math.abs(x[best])) {
                low = value;
                best = i;
            }
        }
        if (best < 0) {
            throw new IllegalArgumentException("the potential has no value anywhere on its range");
        }
        mostlyMissing = 2 * missing > x.length;
        double refined = refine(x, best);
        minimum = v.applyAsDouble(refined) <= low ? refined : x[best];
        least = Math.min(low, v.applyAsDouble(minimum));
    }

    private double[] points(double[] hints) {
        TreeSet<Double> points = new TreeSet<>();
        if (Double.isFinite(left) && Double.isFinite(right)) {
            for (int i = 0; i <= 4096; i++) {
                points.add(left + (right - left) * (i / 4096.0));
            }
        }
        double[] origins = Double.isFinite(left)
                ? Double.isFinite(right) ? new double[] {left, right} : new double[] {left, 0}
                : Double.isFinite(right) ? new double[] {right, 0} : new double[] {0};
        for (double origin : origins) {
            points.add(origin);
            for (int k = -18 * 48; k <= 6 * 48; k++) {
                double size = Math.pow(10, k / 48.0);
                points.add(origin + size);
                points.add(origin - size);
            }
        }
        for (double hint : hints) {
            points.add(hint);
            points.add(hint + 1e-9 * Math.abs(hint));
            points.add(hint - 1e-9 * Math.abs(hint));
        }
        return points.stream()
                .mapToDouble(p -> p == 0 ? 0.0 : p)
                .filter(p -> p >= left && p <= right)
                .toArray();
    }

    /** Golden sections between the neighbours of the best sample. */
    private double refine(double[] x, int best) {
        double a = x[Math.max(0, best - 1)];
        double b = x[Math.min(x.length - 1, best + 1)];
        double ratio = (Math.sqrt(5) - 1) / 2;
        double c = b - ratio * (b - a);
        double d = a + ratio * (b - a);
        double fc = v.applyAsDouble(c);
        double fd = v.applyAsDouble(d);
        for (int i = 0; i < 80; i++) {
            if (fc <= fd) {
                b = d;
                d = c;
                fd = fc;
                c = b - ratio * (b - a);
                fc = v.applyAsDouble(c);
            } else {
                a = c;
                c = d;
                fc = fd;
                d = a + ratio * (b - a);
                fd = v.applyAsDouble(d);
            }
        }
        return fc <= fd ? c : d;
    }

    /** Position of the least value found. */
    double minimum() {
        return minimum;
    }

    /** True where more than half of all points looked at have no value. */
    boolean mostlyMissing() {
        return mostlyMissing;
    }

    /** The least value found; −∞ at a singular end. */
    double least() {
        return least;
    }

    /**
     * The length ℓ at which the mean rise to both sides of the minimum reaches the kinetic energy ħ²/(2mℓ²); in a well
     * too weak for that, where the rise is half of its most.
     *
     * @param kinetic ħ²/m
     */
    double length(double kinetic) {
        double most = 0;
        double before = 0;
        for (int k = -18 * 16; k <= 6 * 16; k++) {
            double l = Math.pow(10, k / 16.0);
            double rise = rise(l, kinetic);
            if (rise >= kinetic / (2 * l * l)) {
                double low = before == 0 ? l / 2 : before;
                double high = l;
                for (int i = 0; i < 60; i++) {
                    double middle = Math.sqrt(low * high);
                    if (rise(middle, kinetic) >= kinetic / (2 * middle * middle)) {
                        high = middle;
                    } else {
                        low = middle;
                    }
                }
                return high;
            }
            most = Math.max(most, Double.isFinite(rise) ? rise : 0);
            before = l;
        }
        if (Double.isFinite(left) && Double.isFinite(right)) {
            return (right - left) / Math.PI;
        }
        for (int k = -18 * 16; k <= 6 * 16 && most > 0; k++) {
            double l = Math.pow(10, k / 16.0);
            if (rise(l, kinetic) >= most / 2) {
                return l;
            }
        }
        throw new IllegalArgumentException("the potential confines nothing: it is nowhere above its value at x = "
                + (float) minimum + "; expected a well");
    }

    private double rise(double l, double kinetic) {
        if (least == Double.NEGATIVE_INFINITY) {
            // at a singular end: where the attraction reaches the kinetic energy
            double inward = minimum <= left ? minimum + l : minimum - l;
            return inward > left && inward < right ? -v.applyAsDouble(inward) : 0;
        }
        double low = minimum - l;
        double high = minimum + l;
        boolean lowIn = low >= left;
        boolean highIn = high <= right;
        double down = lowIn ? v.applyAsDouble(low) - least : 0;
        double up = highIn ? v.applyAsDouble(high) - least : 0;
        if (Double.isNaN(down) || Double.isNaN(up)) {
            return Double.isNaN(down) ? Double.isNaN(up) ? 0 : up : down;
        }
        return lowIn && highIn ? 0.5 * (down + up) : down + up;
    }

    /** The limit of V at an open side, +∞ where it keeps rising, −∞ where it falls without bound. */
    double limit(int side) {
        double last = Double.NaN;
        double[] seen = new double[0];
        for (int k = -12; k <= 100; k++) {
            double value = v.applyAsDouble(minimum + side * Math.pow(10, k));
            if (Double.isNaN(value)) {
                continue;
            }
            if (Double.isInfinite(value)) {
                return value;
            }
            seen = Arrays.copyOf(seen, seen.length + 1);
            seen[seen.length - 1] = value;
            last = value;
        }
        if (seen.length < 30) {
            return last;
        }
        double earlier = seen[seen.length - 11];
        double change = last - earlier;
        double size = Math.abs(last) + (Double.isFinite(least) ? Math.abs(least) : 0);
        // towards a limit every ten decades change less than those before; a logarithm changes as much, a power more
        if (Math.abs(change) <= 1e-9 * size || Math.abs(change) < 0.85 * Math.abs(earlier - seen[seen.length - 21])) {
            return last;
        }
        double[] before = Arrays.copyOf(seen, seen.length - 10);
        if (change < 0) {
            return last < least - 1e-3 * Math.abs(least) ? Double.NEGATIVE_INFINITY : last;
        }
        // what swings to and fro for ever, a wave, is open at its least
        return last > Arrays.stream(before).max().orElse(last) ? Double.POSITIVE_INFINITY : least;
    }

    static void requireBounded(double[] coefficients, double left, double right) {
        int degree = coefficients.length - 1;
        double leading = coefficients[degree];
        if (right == Double.POSITIVE_INFINITY && leading < 0) {
            throw unbounded(1);
        }
        if (left == Double.NEGATIVE_INFINITY && (degree % 2 == 0 ? leading < 0 : leading > 0)) {
            throw unbounded(-1);
        }
    }

    static IllegalArgumentException unbounded(int side) {
        return new IllegalArgumentException("the potential falls without bound for x → " + (side > 0 ? "+∞" : "−∞")
                + ", so there are no levels; expected one that rises there, or a range of x that ends in a wall");
    }
}
