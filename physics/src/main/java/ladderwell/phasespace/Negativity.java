package ladderwell.phasespace;

import ladderwell.evidence.Bound;

/**
 * The integral of |W| over a grid. Along momenta, cell by cell: the cubic through four neighbours, cut at its zeros; over positions, the trapezoid
 * rule.
 */
final class Negativity {
    private static final int HALVINGS = 40;

    private Negativity() {}

    static PhaseField.Reading of(PhaseField field) {
        PhaseGrid grid = field.grid();
        if (grid.np() < 4 || grid.nx() < 5) {
            throw new IllegalArgumentException(
                    "negativity needs at least 5 positions and 4 momenta, not " + grid.nx() + " and " + grid.np());
        }
        double all = 0;
        double even = 0;
        double odd = 0;
        double coarse = 0;
        for (int i = 0; i < grid.nx(); i++) {
            double line = line(field.row(i), 1) * grid.stepP();
            all += line;
            coarse += line(field.row(i), 2) * grid.stepP();
            if (i % 2 == 0) {
                even += line;
            } else {
                odd += line;
            }
        }
        double h = grid.stepX();
        double spread = Math.abs(even - odd) * h + Math.abs(all - coarse) * h;
        // What lies beyond the grid: W integrates to 1 over everything, and what is missing there is missing from |W|.
        double lost = Math.abs(1 - field.total());
        double area = 4 * grid.halfX() * grid.halfP();
        double size = spread + 2 * lost + area * field.bound().size() + 1e-14;
        return new PhaseField.Reading(all * h - 1, Bound.estimated(size));
    }

    /** ∫|f| over a row in units of its spacing, from every n-th of its values. */
    private static double line(double[] row, int every) {
        int n = (row.length - 1) / every;
        double sum = 0;
        for (int cell = 0; cell < n; cell++) {
            int start = Math.max(0, Math.min(cell - 1, n - 3));
            double a = row[start * every];
            double b = row[(start + 1) * every];
            double c = row[(start + 2) * every];
            double d = row[(start + 3) * every];
            sum += cell(a, b, c, d, cell - start);
        }
        return sum * every;
    }

    /** ∫|cubic| from place at to at + 1, the cubic through values at 0, 1, 2, 3. */
    private static double cell(double a, double b, double c, double d, int at) {
        // f = c0 + c1 t + c2 t² + c3 t³
        double c3 = (d - 3 * c + 3 * b - a) / 6;
        double c2 = (c - 2 * b + a) / 2 - 3 * c3;
        double c1 = b - a - c2 - c3;
        double left = value(a, c1, c2, c3, at);
        double right = value(a, c1, c2, c3, at + 1);
        double whole = primitive(a, c1, c2, c3, at + 1) - primitive(a, c1, c2, c3, at);
        if ((left >= 0) == (right >= 0)) {
            return Math.abs(whole);
        }
        double low = at;
        double high = at + 1;
        for (int i = 0; i < HALVINGS; i++) {
            double middle = (low + high) / 2;
            if ((value(a, c1, c2, c3, middle) >= 0) == (left >= 0)) {
                low = middle;
            } else {
                high = middle;
            }
        }
        double first = primitive(a, c1, c2, c3, low) - primitive(a, c1, c2, c3, at);
        return Math.abs(first) + Math.abs(whole - first);
    }

    private static double value(double c0, double c1, double c2, double c3, double t) {
        return c0 + t * (c1 + t * (c2 + t * c3));
    }

    private static double primitive(double c0, double c1, double c2, double c3, double t) {
        return t * (c0 + t * (c1 / 2 + t * (c2 / 3 + t * c3 / 4)));
    }

    /** The highest level whose Laguerre function is integrated by itself. */
    static final int HIGHEST_LEVEL = 1000;

    /**
     * Of one level of the harmonic oscillator, ½ ∫ |L_n(y)| e^{−y/2} dy − 1, in u = √y, where zeros lie almost evenly; cut at every zero.
     *
     * @return error estimated from half as many cells
     */
    static PhaseField.Reading ofLevel(int n) {
        double fine = radial(n, 16);
        double coarse = radial(n, 8);
        // The recurrence rounds once a level.
        double size = Math.abs(fine - coarse) + 1e-14 * (n + 10) * (fine + 1);
        return new PhaseField.Reading(fine, Bound.estimated(size));
    }

    private static double radial(int n, int cells) {
        double end = Math.sqrt(4.0 * n + 2) + 9;
        double width = Math.PI / (2 * Math.sqrt(n + 0.5)) / cells;
        int count = (int) Math.ceil(end / width);
        double sum = 0;
        double left = value(n, 0);
        for (int i = 0; i < count; i++) {
            double from = i * width;
            double right = value(n, from + width);
            if ((left >= 0) == (right >= 0)) {
                sum += Math.abs(part(n, from, from + width));
            } else {
                double zero = zero(n, from, from + width, left);
                sum += Math.abs(part(n, from, zero)) + Math.abs(part(n, zero, from + width));
            }
            left = right;
        }
        return sum - 1;
    }

    private static double zero(int n, double from, double to, double left) {
        double low = from;
        double high = to;
        for (int i = 0; i < HALVINGS; i++) {
            double middle = (low + high) / 2;
            if ((value(n, middle) >= 0) == (left >= 0)) {
                low = middle;
            } else {
                high = middle;
            }
        }
        return low;
    }

    /** Three points of Gauss. */
    private static double part(int n, double from, double to) {
        double middle = (from + to) / 2;
        double half = (to - from) / 2;
        double off = half * Math.sqrt(0.6);
        return half / 9 * (5 * weighted(n, middle - off) + 8 * weighted(n, middle) + 5 * weighted(n, middle + off));
    }

    private static double weighted(int n, double u) {
        return u * value(n, u);
    }

    /** L_n(u²) e^{−u²/2} by the recurrence upwards, its fall kept apart so that nothing overflows. */
    private static double value(int n, double u) {
        double y = u * u;
        double before = 0;
        double now = 1;
        double fall = -y / 2;
        for (int k = 0; k < n; k++) {
            double next = ((2 * k + 1 - y) * now - k * before) / (k + 1);
            before = now;
            now = next;
            if (Math.abs(now) > 1e150) {
                now *= 1e-150;
                before *= 1e-150;
                fall += 150 * Math.log(10);
            }
        }
        return now * Math.exp(fall);
    }
}
