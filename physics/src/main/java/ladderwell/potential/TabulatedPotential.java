package ladderwell.potential;

import java.util.Arrays;
import ladderwell.formula.Amount;
import ladderwell.formula.Dimension;
import ladderwell.quantity.Quantity;
import ladderwell.quantity.Scale;
import ladderwell.quantity.Unit;

/** Points joined by a monotone cubic spline; see {@link Potential#tabulated}. */
final class TabulatedPotential implements Potential {

    private final double[] x;
    private final double[] v;
    private final double[] slopes;
    private final double uncertainty;
    private final double minimum;
    private final Scale scale;
    private final String text;

    private TabulatedPotential(double[] x, double[] v, double uncertainty, Scale scale, String text) {
        this.x = x;
        this.v = v;
        this.uncertainty = uncertainty;
        this.scale = scale;
        this.text = text;
        slopes = slopes(x, v);
        // a monotone spline is nowhere below its points
        int best = 0;
        for (int i = 1; i < v.length; i++) {
            best = v[i] < v[best] ? i : best;
        }
        minimum = x[best];
    }

    static TabulatedPotential of(
            Given given, Unit lengthUnit, double[] x, Unit energyUnit, double[] v, double[] uncertainty) {
        int n = x.length;
        if (n < 4 || v.length != n || uncertainty.length != 0 && uncertainty.length != n) {
            throw new IllegalArgumentException(
                    "a tabulated potential needs at least 4 points, each with a value; found " + n + " positions, "
                            + v.length + " values and " + uncertainty.length + " uncertainties");
        }
        double[] at = converted("position", x, lengthUnit, given, Dimension.LENGTH);
        double[] value = converted("value", v, energyUnit, given, Dimension.ENERGY);
        double[] error = converted("uncertainty", uncertainty, energyUnit, given, Dimension.ENERGY);
        double most = 0;
        for (int i = 0; i < n; i++) {
            if (i > 0 && !(at[i] > at[i - 1])) {
                throw new IllegalArgumentException("the positions of a tabulated potential must ascend; row " + (i + 1)
                        + " has " + x[i] + " after " + x[i - 1]);
            }
            if (error.length > 0) {
                if (error[i] < 0) {
                    throw new IllegalArgumentException(
                            "an uncertainty must be at least 0; row " + (i + 1) + " has " + uncertainty[i]);
                }
                most = Math.max(most, error[i]);
            }
        }
        String text = n + " points from " + Quantity.of(x[0], lengthUnit).plain() + " to "
                + Quantity.of(x[n - 1], lengthUnit).plain() + ", monotone cubic spline";
        TabulatedPotential raw = new TabulatedPotential(at, value, most, Scale.natural(), text);
        if (given.isNatural()) {
            return raw;
        }
        double kinetic = given.hbar() / given.mass() * given.hbar();
        Scale scale = given.scale(new Survey(raw::value, at[0], at[n - 1]).length(kinetic));
        for (int i = 0; i < n; i++) {
            at[i] /= scale.length();
            value[i] /= scale.energy();
        }
        return new TabulatedPotential(at, value, most / scale.energy(), scale, text);
    }

    private static double[] converted(String what, double[] values, Unit unit, Given given, Dimension dimension) {
        Dimension wanted = given.isNatural() ? Dimension.NONE : dimension;
        double[] converted = new double[values.length];
        for (int i = 0; i < values.length; i++) {
            if (!Double.isFinite(values[i])) {
                throw new IllegalArgumentException("the " + what + " in row " + (i + 1)
                        + " of a tabulated potential is " + values[i] + "; expected a finite number");
            }
            Amount amount = Amount.of(Quantity.of(values[i], unit));
            if (!amount.dimension().equals(wanted)) {
                throw new IllegalArgumentException("the " + what + "s of a tabulated potential are in '" + unit.plain()
                        + "', the unit of " + unit.kind().word() + "; expected " + wanted.word());
            }
            converted[i] = amount.value();
        }
        return converted;
    }

    /** Weighted harmonic means of the slopes beside a point, 0 at a turn; three-point slopes at the ends, kept monotone. */
    private static double[] slopes(double[] x, double[] v) {
        int n = x.length;
        double[] h = new double[n - 1];
        double[] d = new double[n - 1];
        for (int i = 0; i < n - 1; i++) {
            h[i] = x[i + 1] - x[i];
            d[i] = (v[i + 1] - v[i]) / h[i];
        }
        double[] m = new double[n];
        for (int i = 1; i < n - 1; i++) {
            if (Math.signum(d[i - 1]) * Math.signum(d[i]) > 0) {
                double w1 = 2 * h[i] + h[i - 1];
                double w2 = h[i] + 2 * h[i - 1];
                m[i] = (w1 + w2) / (w1 / d[i - 1] + w2 / d[i]);
            }
        }
        m[0] = end(h[0], h[1], d[0], d[1]);
        m[n - 1] = end(h[n - 2], h[n - 3], d[n - 2], d[n - 3]);
        return m;
    }

    private static double end(double h0, double h1, double d0, double d1) {
        double slope = ((2 * h0 + h1) * d0 - h0 * d1) / (h0 + h1);
        if (Math.signum(slope) != Math.signum(d0)) {
            return 0;
        }
        return Math.signum(d0) != Math.signum(d1) && Math.abs(slope) > 3 * Math.abs(d0) ? 3 * d0 : slope;
    }

    private int cell(double at) {
        int i = Arrays.binarySearch(x, at);
        int cell = i >= 0 ? i : -i - 2;
        return Math.max(0, Math.min(x.length - 2, cell));
    }

    @Override
    public double value(double at) {
        if (at < left() || at > right()) {
            return Double.POSITIVE_INFINITY;
        }
        int i = cell(at);
        double h = x[i + 1] - x[i];
        double s = (at - x[i]) / h;
        double r = 1 - s;
        return v[i] * r * r * (1 + 2 * s)
                + v[i + 1] * s * s * (3 - 2 * s)
                + h * s * r * (slopes[i] * r - slopes[i + 1] * s);
    }

    @Override
    public double slope(double at) {
        int i = cell(at);
        double h = x[i + 1] - x[i];
        double s = (at - x[i]) / h;
        double r = 1 - s;
        return 6 * s * r * (v[i + 1] - v[i]) / h + slopes[i] * r * (1 - 3 * s) + slopes[i + 1] * s * (3 * s - 2);
    }

    @Override
    public double[] breaks() {
        return Arrays.copyOfRange(x, 1, x.length - 1);
    }

    @Override
    public double left() {
        return x[0];
    }

    @Override
    public double right() {
        return x[x.length - 1];
    }

    @Override
    public boolean isEven() {
        int n = x.length;
        for (int i = 0; i < n; i++) {
            if (x[i] != -x[n - 1 - i] || v[i] != v[n - 1 - i]) {
                return false;
            }
        }
        return true;
    }

    @Override
    public double minimum() {
        return minimum;
    }

    /** The lower of the two end values: above it the table says nothing of what confines. */
    @Override
    public double edge() {
        return Math.min(v[0], v[v.length - 1]);
    }

    @Override
    public double uncertainty() {
        return uncertainty;
    }

    @Override
    public Scale scale() {
        return scale;
    }

    @Override
    public String text() {
        return text;
    }
}
