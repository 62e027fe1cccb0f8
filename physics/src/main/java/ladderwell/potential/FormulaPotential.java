package ladderwell.potential;

import java.util.Optional;
import java.util.function.DoublePredicate;
import java.util.function.DoubleUnaryOperator;
import ladderwell.formula.Break;
import ladderwell.formula.Fault;
import ladderwell.formula.Formula;
import ladderwell.quantity.Digits;
import ladderwell.quantity.Scale;

/** A formula in scaled units, with what was found out about it. */
final class FormulaPotential implements Potential {

    private final Formula formula;
    private final Formula slope;
    private final double left;
    private final double right;
    private final double minimum;
    private final double edge;
    private final double[] breaks;
    private final boolean even;
    private final boolean confines;
    private final Scale scale;
    private final String text;

    private FormulaPotential(
            Formula source, Scale scale, double left, double right, double minimum, double edge, boolean confines) {
        this.confines = confines;
        double l = scale.length();
        formula = scale.isNatural() ? source : source.scaled(l, scale.time(), scale.energy());
        slope = formula.slope();
        this.left = left / l;
        this.right = right / l;
        this.minimum = minimum / l;
        this.edge = edge / scale.energy();
        this.scale = scale;
        text = source.text();
        breaks = formula.breaks(this.left, this.right).stream()
                .mapToDouble(Break::position)
                .toArray();
        even = this.left == -this.right && looksEven();
    }

    static FormulaPotential open(Formula formula, Given given, Scale scale) {
        requireStatic(formula, given);
        double far = 1e3 * scale.length();
        requireValues(formula, -far, far);
        return new FormulaPotential(
                formula, scale, Double.NEGATIVE_INFINITY, Double.POSITIVE_INFINITY, 0, Double.POSITIVE_INFINITY, false);
    }

    static FormulaPotential of(Formula formula, Given given, double left, double right) {
        requireStatic(formula, given);
        if (!(left < right)) {
            throw new IllegalArgumentException(
                    "the range of x runs from " + left + " to " + right + "; expected a left end below the right end");
        }
        Optional<double[]> polynomial = formula.polynomial();
        if (polynomial.isPresent() && polynomial.orElseThrow().length > 1) {
            Survey.requireBounded(polynomial.orElseThrow(), left, right);
        }
        double[] hints = formula.breaks(left, right).stream()
                .mapToDouble(Break::position)
                .toArray();
        DoubleUnaryOperator v = formula::value;
        Survey survey = new Survey(v, left, right, hints);
        if (survey.mostlyMissing()) {
            double around = survey.minimum() == 0 ? 1 : Math.abs(survey.minimum());
            formula.check(
                            0,
                            Math.max(left, survey.minimum() - 3 * around),
                            Math.min(right, survey.minimum() + 3 * around))
                    .ifPresent(FormulaPotential::refuse);
            throw new IllegalArgumentException(
                    "the potential has no value at most places of its range; expected one everywhere");
        }
        double edge = Double.POSITIVE_INFINITY;
        for (int side = -1; side <= 1; side += 2) {
            if (Double.isInfinite(side < 0 ? left : right)) {
                double limit = survey.limit(side);
                if (limit == Double.NEGATIVE_INFINITY) {
                    throw Survey.unbounded(side);
                }
                edge = Math.min(edge, limit);
            }
        }
        double kinetic = given.hbar() / given.mass() * given.hbar();
        Scale scale = given.scale(given.isNatural() ? 1 : survey.length(kinetic));
        double length = given.isNatural() ? survey.length(kinetic) : scale.length();
        requireValues(formula, survey, left, right, length);
        requireStable(v, left, right, length, kinetic);
        return new FormulaPotential(formula, scale, left, right, survey.minimum(), edge, true);
    }

    private static void requireStatic(Formula formula, Given given) {
        if (formula.isNatural() != given.isNatural()) {
            throw new IllegalArgumentException("formula and mass must both be in lab units or both in natural units");
        }
        if (formula.dependsOnTime()) {
            throw new IllegalArgumentException(
                    "the potential '" + formula.text() + "' depends on time and has no levels; expected one without t");
        }
    }

    private static void requireValues(Formula formula, Survey survey, double left, double right, double length) {
        double far = 1e3 * length;
        double from = Double.isInfinite(left) ? Math.min(survey.minimum(), right) - far : left + 1e-9 * length;
        double to = Double.isInfinite(right) ? Math.max(survey.minimum(), left) + far : right - 1e-9 * length;
        requireValues(formula, from, to);
    }

    private static void requireValues(Formula formula, double from, double to) {
        Optional<Fault> fault = formula.check(0, from, to);
        if (fault.isPresent()) {
            // a steep rise beyond the largest number is a wall like any other
            boolean wall = formula.value(fault.orElseThrow().position()) == Double.POSITIVE_INFINITY
                    && fault.orElseThrow().reason().contains("too large");
            if (!wall) {
                refuse(fault.orElseThrow());
            }
            for (double x : new double[] {from, to}) {
                if (Double.isNaN(formula.value(x))) {
                    throw new IllegalArgumentException("the potential has no value at x = " + Digits.significant(x, 6)
                            + "; expected one everywhere");
                }
            }
        }
    }

    private static void refuse(Fault fault) {
        throw new IllegalArgumentException("in the potential " + fault.reason()
                + "; give a range of x that ends before that point or change the formula there");
    }

    /** At a singular end nothing is bound below if V falls faster than −ħ²/(8mx²). */
    private static void requireStable(DoubleUnaryOperator v, double left, double right, double length, double kinetic) {
        for (int side = -1; side <= 1; side += 2) {
            double end = side < 0 ? left : right;
            double step = 1e-6 * length;
            if (Double.isFinite(end) && end + step != end && end - step != end) {
                double value = v.applyAsDouble(end - side * step);
                if (value * step * step / kinetic < -0.125 * (1 + 1e-5)) {
                    throw new IllegalArgumentException("the potential falls to −∞ at x = " + Digits.significant(end, 6)
                            + " faster than −ħ²/(8mx²), so there is no lowest level; expected a weaker attraction");
                }
            }
        }
    }

    private boolean looksEven() {
        Optional<double[]> p = formula.polynomial();
        if (p.isPresent()) {
            for (int i = 1; i < p.orElseThrow().length; i += 2) {
                if (p.orElseThrow()[i] != 0) {
                    return false;
                }
            }
            return true;
        }
        // A small odd term can hide in the rounding of a large even one.
        Formula odd = formula.oddTerms();
        Formula others = formula.otherTerms();
        boolean tilted = sampled(x -> odd.value(x) != 0) && !sampled(x -> differs(others, x));
        return !tilted && !sampled(x -> differs(formula, x));
    }

    private static boolean differs(Formula formula, double x) {
        double a = formula.value(x);
        double b = formula.value(-x);
        return a != b && !(Math.abs(a - b) <= 4e-15 * (Math.abs(a) + Math.abs(b)));
    }

    /** Whether it holds anywhere among irregular points from 1e-4 of the end on, which no period fits. */
    private boolean sampled(DoublePredicate what) {
        double end = Double.isInfinite(right) ? 1e3 : right;
        for (int k = 0; k <= 400; k++) {
            if (what.test(end * Math.pow(10, -k / 100.0) * (1 - 0.01 * Math.abs(Math.sin(k))))) {
                return true;
            }
        }
        return false;
    }

    @Override
    public double value(double x) {
        return x < left || x > right ? Double.POSITIVE_INFINITY : formula.value(x);
    }

    @Override
    public void values(double[] x, double[] out) {
        boolean open = left == Double.NEGATIVE_INFINITY && right == Double.POSITIVE_INFINITY;
        double[] at = x == out && !open ? x.clone() : x;
        formula.values(x, 0, out);
        if (!open) {
            for (int i = 0; i < at.length; i++) {
                if (at[i] < left || at[i] > right) {
                    out[i] = Double.POSITIVE_INFINITY;
                }
            }
        }
    }

    @Override
    public double slope(double x) {
        return slope.value(x);
    }

    @Override
    public double[] breaks() {
        return breaks.clone();
    }

    @Override
    public double left() {
        return left;
    }

    @Override
    public double right() {
        return right;
    }

    @Override
    public Optional<double[]> polynomial() {
        return formula.polynomial();
    }

    @Override
    public boolean isEven() {
        return even;
    }

    @Override
    public double minimum() {
        return minimum;
    }

    @Override
    public double edge() {
        return edge;
    }

    @Override
    public boolean confines() {
        return confines;
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
