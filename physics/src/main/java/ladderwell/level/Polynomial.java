package ladderwell.level;

import java.util.Arrays;
import ladderwell.numeric.DoubleDouble;

/** A confining polynomial V(x) = Σ c_k x^k, and what a basis needs to know of it: turning points, phase-space area, shifts, bounds. */
final class Polynomial {
    private static final int HIGHEST = 16;
    private static final int SAMPLES = 32;

    private final double[] c;
    private final boolean even;
    /** Beyond this distance the leading term exceeds twice all others together. */
    private final double far;

    private final double bottom;
    private final double bottomAt;

    Polynomial(double[] coefficients) {
        int degree = coefficients.length - 1;
        while (degree > 0 && coefficients[degree] == 0) {
            degree--;
        }
        for (int k = 0; k <= degree; k++) {
            if (!(Math.abs(coefficients[k]) <= 1e100)) {
                throw new IllegalArgumentException("the coefficient of x^" + k
                        + " must be a finite number no larger than 1e100, got " + coefficients[k]);
            }
        }
        if (degree < 2 || degree % 2 == 1 || coefficients[degree] < 0) {
            throw new IllegalArgumentException(
                    "the polynomial does not confine: its highest power must be even with a positive coefficient, got "
                            + (degree < 1 ? "a constant" : coefficients[degree] + " x^" + degree));
        }
        if (degree > HIGHEST) {
            throw new IllegalArgumentException(
                    "polynomial potentials are solved up to x^" + HIGHEST + ", got x^" + degree);
        }
        c = Arrays.copyOf(coefficients, degree + 1);
        boolean symmetric = true;
        for (int k = 1; k <= degree; k += 2) {
            symmetric &= c[k] == 0;
        }
        even = symmetric;
        double reach = 0;
        for (int k = 0; k < degree; k++) {
            reach = Math.max(reach, Math.pow(2 * degree * Math.abs(c[k]) / c[degree], 1.0 / (degree - k)));
        }
        far = reach > 0 ? reach : 1;
        double[] lowest = lowest();
        bottomAt = lowest[0];
        bottom = lowest[1];
    }

    int degree() {
        return c.length - 1;
    }

    boolean even() {
        return even;
    }

    double coefficient(int k) {
        return c[k];
    }

    /** Smallest value met by sampling, good enough to choose a basis. */
    double bottom() {
        return bottom;
    }

    double value(double x) {
        double sum = 0;
        for (int k = c.length - 1; k >= 0; k--) {
            sum = sum * x + c[k];
        }
        return sum;
    }

    private double[] lowest() {
        double at = 0;
        double least = value(0);
        if (degree() > 2 || !even) {
            for (int i = -SAMPLES; i <= SAMPLES; i++) {
                double x = far * i / SAMPLES;
                double v = value(x);
                if (v < least) {
                    least = v;
                    at = x;
                }
            }
        }
        double step = far / SAMPLES;
        for (int i = 0; i < 40 && !monotone(); i++) {
            double v = value(at + step);
            double w = value(at - step);
            if (v < least) {
                least = v;
                at += step;
            } else if (w < least) {
                least = w;
                at -= step;
            } else {
                step /= 2;
            }
        }
        return new double[] {at, least};
    }

    /** Even with no negative coefficient: the minimum is at 0. */
    boolean monotone() {
        if (!even) {
            return false;
        }
        for (int k = 2; k < c.length; k++) {
            if (c[k] < 0) {
                return false;
            }
        }
        return true;
    }

    /** Outermost turning point at the energy on one side (direction ±1). */
    double turning(double energy, int direction) {
        double inside = bottomAt * direction;
        double outside = Math.max(far, Math.pow(2 * (Math.abs(energy) + Math.abs(c[0])) / c[degree()], 1.0 / degree()));
        outside = Math.max(2 * outside, inside + 1e-300);
        // From outside inwards, so that side wells are not missed.
        if (!monotone()) {
            int steps = 4 * SAMPLES;
            double step = (outside - inside) / steps;
            for (int i = 0; i < steps && value(direction * (outside - step)) > energy; i++) {
                outside -= step;
            }
            inside = Math.max(inside, outside - step);
        }
        for (int i = 0; i < 24; i++) {
            double middle = 0.5 * (inside + outside);
            if (value(direction * middle) > energy) {
                outside = middle;
            } else {
                inside = middle;
            }
        }
        return direction * outside;
    }

    /** Phase-space area over 2π at the energy: about the number of levels below it. */
    double action(double energy, double left, double right) {
        double sum = 0;
        for (int i = 0; i < SAMPLES; i++) {
            double x = left + (right - left) * (i + 0.5) / SAMPLES;
            double square = energy - value(x);
            if (square > 0) {
                sum += Math.sqrt(2 * square);
            }
        }
        return sum * (right - left) / (SAMPLES * Math.PI);
    }

    /** About the energy below which there are so many levels. */
    double energyOf(double levels) {
        double above = 1;
        double low = 0;
        double high = Double.POSITIVE_INFINITY;
        // N ∝ (E − bottom)^((d+2)/(2d)) for a pure power.
        double power = 2.0 * degree() / (degree() + 2.0);
        for (int i = 0; i < 60; i++) {
            double energy = bottom + above;
            double found = action(energy, turning(energy, -1), turning(energy, 1));
            if (Math.abs(found - levels) <= 0.03 * levels) {
                break;
            }
            if (found < levels) {
                low = above;
            } else {
                high = above;
            }
            double next = found > 0 ? above * Math.pow(levels / found, power) : 16 * above;
            above = next > low && next < high ? next : high < Double.POSITIVE_INFINITY ? 0.5 * (low + high) : 4 * above;
        }
        return bottom + above;
    }

    /** Coefficients about another origin: {values, sizes whose 2^−45 part covers what rounding to double-double left over}. */
    double[][] about(double origin) {
        int degree = degree();
        double[] values = new double[degree + 1];
        double[] sizes = new double[degree + 1];
        if (origin == 0) {
            return new double[][] {c, sizes};
        }
        DoubleDouble[] work = new DoubleDouble[degree + 1];
        for (int k = 0; k <= degree; k++) {
            work[k] = DoubleDouble.of(c[k]);
            sizes[k] = Math.abs(c[k]);
        }
        for (int low = 0; low < degree; low++) {
            for (int k = degree - 1; k >= low; k--) {
                work[k] = work[k].plus(work[k + 1].times(origin));
                sizes[k] += sizes[k + 1] * Math.abs(origin);
            }
        }
        for (int k = 0; k <= degree; k++) {
            values[k] = work[k].value();
        }
        return new double[][] {values, sizes};
    }

    /** An upper bound of Ω² y²/2 − Σ b_k y^k over all y, by bisection with Taylor bounds. */
    static double excess(double[] b, double omega) {
        int degree = b.length - 1;
        double[] q = new double[degree + 1];
        for (int k = 0; k <= degree; k++) {
            q[k] = -b[k];
        }
        q[2] += 0.5 * omega * omega;
        if (degree == 2) {
            // Ω²/2 − b₂ must be negative, or 0 without a linear term.
            if (q[2] == 0 && q[1] == 0) {
                return q[0];
            }
            return q[2] < 0
                    ? (q[0] - q[1] * q[1] / (4 * q[2])) + 0x1p-40 * (Math.abs(q[0]) + 1)
                    : Double.POSITIVE_INFINITY;
        }
        double reach = 0;
        for (int k = 0; k < degree; k++) {
            reach = Math.max(reach, Math.pow(2 * degree * Math.abs(q[k]) / b[degree], 1.0 / (degree - k)));
        }
        // Beyond reach q is below 0; the bound is at least q(0) or 0 then.
        double[] best = {Math.max(q[0], 0)};
        double found = bisect(q, -reach, reach, best, 0);
        return found + 1e-9 * (Math.abs(found) + 1);
    }

    private static double bisect(double[] q, double from, double to, double[] best, int depth) {
        double centre = 0.5 * (from + to);
        double half = 0.5 * (to - from);
        double[] t = q.clone();
        for (int low = 0; low < t.length - 1; low++) {
            for (int k = t.length - 2; k >= low; k--) {
                t[k] += t[k + 1] * centre;
            }
        }
        double spread = 0;
        for (int k = t.length - 1; k >= 1; k--) {
            spread = (spread + Math.abs(t[k])) * half;
        }
        best[0] = Math.max(best[0], t[0]);
        double above = t[0] + spread;
        if (above <= best[0] * 1.05 + 0.01 || depth > 40) {
            return Math.max(above, best[0]);
        }
        return Math.max(bisect(q, from, centre, best, depth + 1), bisect(q, centre, to, best, depth + 1));
    }
}
