package ladderwell.formula;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collections;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.Set;
import java.util.TreeSet;
import ladderwell.formula.Parser.Hazard;
import ladderwell.quantity.Digits;

/**
 * A function of position x and time t, read from text: V(x, t) or a drive f(t). Immutable and safe to share between
 * threads.
 *
 * @units x, t and values in SI, or plain numbers for a natural formula
 */
public final class Formula {

    /** What a formula may depend on. */
    public enum Variable {
        /** The position x. */
        POSITION(Node.USES_X),
        /** The time t. */
        TIME(Node.USES_T);

        private final int use;

        Variable(int use) {
            this.use = use;
        }
    }

    private final String text;
    private final Node node;
    private final Dimension dimension;
    private final boolean natural;
    private final List<Hazard> hazards;
    private final Set<String> parameters;
    private final Program program;

    private Formula(
            String text,
            Node node,
            Dimension dimension,
            boolean natural,
            List<Hazard> hazards,
            Set<String> parameters) {
        this.text = text;
        this.node = node;
        this.dimension = dimension;
        this.natural = natural;
        this.hazards = hazards;
        this.parameters = Collections.unmodifiableSet(parameters);
        program = Program.of(node);
    }

    /**
     * A potential in lab units: x is a length, t a time, the value an energy.
     *
     * @throws FormulaException if the text is no formula or no energy
     */
    public static Formula potential(String text, Parameters parameters) {
        return lab(text, parameters, Dimension.ENERGY);
    }

    /**
     * A formula in lab units whose value must have a dimension.
     *
     * @throws FormulaException if the text is no formula or measures something else
     */
    public static Formula lab(String text, Parameters parameters, Dimension wanted) {
        Formula formula = lab(text, parameters);
        if (!formula.dimension.fits(wanted)) {
            int start = text.length() - text.stripLeading().length();
            throw new FormulaException(
                    "the formula is " + formula.dimension.word() + "; expected " + wanted.word(),
                    text,
                    start,
                    text.stripTrailing().length());
        }
        return formula;
    }

    /**
     * A formula in lab units of any dimension.
     *
     * @throws FormulaException if the text is no formula
     */
    public static Formula lab(String text, Parameters parameters) {
        Parser.Result read = new Parser(text, parameters, false, Parser.LAB_COORDINATES).parse();
        return new Formula(text.strip(), read.node(), read.dimension(), false, read.hazards(), read.parameters());
    }

    /**
     * A formula in natural units: ħ = 1, numbers and parameters without units.
     *
     * @throws FormulaException if the text is no formula or has units
     * @throws IllegalArgumentException if a parameter has a unit
     */
    public static Formula natural(String text, Parameters parameters) {
        parameters.values().forEach((name, amount) -> {
            if (!amount.dimension().isNone()) {
                throw new IllegalArgumentException("in natural units parameters are plain numbers; '" + name + "' is "
                        + amount.dimension().word());
            }
        });
        Parser.Result read = new Parser(text, parameters, true, Parser.NATURAL_COORDINATES).parse();
        return new Formula(text.strip(), read.node(), Dimension.NONE, true, read.hazards(), read.parameters());
    }

    /** A function of t alone, made by the reader of operator formulas; what it measures is known of the whole formula only. */
    static Formula factor(Node node, boolean natural, List<Hazard> hazards, Set<String> parameters) {
        return new Formula(Writer.text(node), node, Dimension.NONE, natural, hazards, parameters);
    }

    /** The functions as they are written, such as "gauss(x, centre, width)"; for completion and help. */
    public static List<String> functions() {
        List<String> all = new ArrayList<>();
        for (Op op : Op.values()) {
            if (op.isFunction()) {
                all.add(Names.signature(op));
            }
        }
        return List.copyOf(all);
    }

    /** As typed; of a derivative or a scaled formula: written from its tree, numbers in SI. */
    public String text() {
        return text;
    }

    /** What its value measures; none in natural units. */
    public Dimension dimension() {
        return dimension.equals(Dimension.ANY) ? Dimension.NONE : dimension;
    }

    /** True in natural units. */
    public boolean isNatural() {
        return natural;
    }

    /** Names of the parameters that occur in the text, in order of the names. */
    public Set<String> parameters() {
        return parameters;
    }

    /** True if x occurs in what is left after simplification. */
    public boolean dependsOnPosition() {
        return node.usesX();
    }

    /** True if t occurs in what is left after simplification. */
    public boolean dependsOnTime() {
        return node.usesT();
    }

    /** The value; NaN or an infinity where there is none, see {@link #check}. */
    public double value(double x, double t) {
        return program.value(x, t);
    }

    /** The value at t = 0. */
    public double value(double x) {
        return program.value(x, 0);
    }

    /**
     * The values at many points, the same bits as {@link #value(double, double)}; nothing is allocated for a point.
     *
     * @param x positions, not modified unless it is {@code out}
     * @param out as long as {@code x}; may be {@code x}
     * @return {@code out}
     */
    public double[] values(double[] x, double t, double[] out) {
        if (out.length != x.length) {
            throw new IllegalArgumentException(
                    "the result needs " + x.length + " places, one for each point, not " + out.length);
        }
        program.values(x, t, out);
        return out;
    }

    /** The exact derivative, away from jumps (which contribute nothing to it). */
    public Formula derivative(Variable variable) {
        Node derived = Derivative.of(node, variable.use);
        Dimension by = natural ? Dimension.NONE : variable == Variable.POSITION ? Dimension.LENGTH : Dimension.TIME;
        return new Formula(Writer.text(derived), derived, dimension.over(by), natural, hazards, parameters);
    }

    /** True if both are the same function, written the same way with the same numbers; very long formulas never are. */
    public boolean isSame(Formula other) {
        return natural == other.natural && Node.same(node, other.node, new int[] {4000});
    }

    /**
     * The product of two formulas.
     *
     * @throws IllegalArgumentException if only one of them is natural
     */
    public Formula times(Formula other) {
        if (natural != other.natural) {
            throw new IllegalArgumentException("a formula in lab units and one in natural units have no product: '"
                    + text + "' and '" + other.text + "'");
        }
        Node product = Algebra.multiply(node, other.node);
        List<Hazard> both = new ArrayList<>(hazards);
        both.addAll(other.hazards);
        Set<String> all = new TreeSet<>(parameters);
        all.addAll(other.parameters);
        return new Formula(
                Writer.text(product), product, dimension.times(other.dimension), natural, List.copyOf(both), all);
    }

    /** dV/dx; the classical force is its negative. */
    public Formula slope() {
        return derivative(Variable.POSITION);
    }

    /**
     * V(length·x, time·t)/unit as a natural formula: from lab to scaled units.
     *
     * @param length m
     * @param time s
     * @param unit unit of the value, in SI (for a potential, J)
     */
    public Formula scaled(double length, double time, double unit) {
        Scaling scaling = new Scaling(length, time);
        Node scaled = Algebra.divide(scaling.of(node), Node.constant(unit));
        List<Hazard> moved = new ArrayList<>();
        for (Hazard hazard : hazards) {
            moved.add(new Hazard(scaling.of(hazard.argument()), hazard.words(), hazard.start(), hazard.end()));
        }
        return new Formula(Writer.text(scaled), scaled, Dimension.NONE, true, List.copyOf(moved), parameters);
    }

    /** The formula at one time, as a function of x alone. */
    public Formula at(double time) {
        if (!dependsOnTime()) {
            return this;
        }
        List<Hazard> then = new ArrayList<>();
        for (Hazard hazard : hazards) {
            then.add(new Hazard(Scaling.at(time, hazard.argument()), hazard.words(), hazard.start(), hazard.end()));
        }
        return new Formula(text, Scaling.at(time, node), dimension, natural, List.copyOf(then), parameters);
    }

    /** The terms of the outermost sum that are odd in x by their form, whatever their size; 0 where there is none. */
    public Formula oddTerms() {
        return part(new Parity().parts(node).odd());
    }

    /** What {@link #oddTerms} leaves. */
    public Formula otherTerms() {
        return part(new Parity().parts(node).rest());
    }

    private Formula part(Node terms) {
        return new Formula(Writer.text(terms), terms, dimension, natural, hazards, parameters);
    }

    /** True for a polynomial in x with coefficients that do not depend on t. */
    public boolean isPolynomial() {
        return polynomial().isPresent();
    }

    /** Coefficients of 1, x, x², … (the last one not 0), where the formula is a polynomial in x of degree up to 64 without t. */
    public Optional<double[]> polynomial() {
        return Polynomial.of(node).flatMap(Polynomial::numbers);
    }

    /** Coefficients of 1, x, x², … as functions of t, where the formula is a polynomial in x of degree up to 64. */
    public Optional<List<Formula>> coefficients() {
        return Polynomial.of(node).map(nodes -> {
            List<Formula> all = new ArrayList<>();
            Dimension each = dimension;
            for (Node coefficient : nodes) {
                all.add(new Formula(Writer.text(coefficient), coefficient, each, natural, List.of(), parameters));
                each = natural ? each : each.over(Dimension.LENGTH);
            }
            return List.copyOf(all);
        });
    }

    /** The breaks at t = 0; see {@link #breaks(double, double, double)}. */
    public List<Break> breaks(double left, double right) {
        return breaks(0, left, right);
    }

    /**
     * Points in (left, right) where the value, the slope or a higher derivative may jump, found from step, sign, abs, min,
     * max and if in the tree, ascending. Arguments that are polynomials between the breaks inside them are solved; any
     * other argument is sampled, at 16 to 2048 points between known breaks (in every decade towards an infinite end), and
     * its turning points are looked at, so that sign changes closer than that can be missed. A point where a switch turns
     * over without a trace is listed as HIGHER.
     *
     * @throws IllegalArgumentException for more than 1000 breaks or an empty range
     */
    public List<Break> breaks(double t, double left, double right) {
        requireRange(left, right);
        double[] at = BreakSearch.of(node, t, left, right);
        if (at.length == 0) {
            return List.of();
        }
        Program slope = Program.of(Derivative.of(node, Node.USES_X));
        List<Break> breaks = new ArrayList<>();
        for (int i = 0; i < at.length; i++) {
            double gap = Math.min(
                    i > 0 ? at[i] - at[i - 1] : at[i] - left, i < at.length - 1 ? at[i + 1] - at[i] : right - at[i]);
            breaks.add(new Break(at[i], kind(slope, at[i], gap, t)));
        }
        return List.copyOf(breaks);
    }

    /**
     * Times in (from, to) where the formula at x = 0, its rate of change or a higher derivative may jump; found as in
     * {@link #breaks(double, double, double)}. For factors f(t).
     *
     * @throws IllegalArgumentException for more than 1000 breaks or an empty range
     */
    public double[] breakTimes(double from, double to) {
        requireRange(from, to);
        return BreakSearch.of(Scaling.alongTime(node), 0, from, to);
    }

    /**
     * Compares limits from both sides, extrapolated over a small step d: the value along its slope, the slope along its
     * differences. What is left over is of second order in d and is measured beside it.
     */
    private Break.Kind kind(Program slope, double at, double gap, double t) {
        double size = Math.abs(at) > 0 ? Math.abs(at) : natural ? 1 : 1e-9;
        double d = Math.max(1e-6 * Math.min(size, gap), 16 * Math.ulp(at));
        double[] low = new double[3];
        double[] high = new double[3];
        for (int i = 0; i < 3; i++) {
            low[i] = slope.value(at - (i + 1) * d, t);
            high[i] = slope.value(at + (i + 1) * d, t);
        }
        double v0 = program.value(at - d, t);
        double v1 = program.value(at + d, t);
        double jump = Math.abs((v1 - high[0] * d) - (v0 + low[0] * d));
        double bend = Math.abs(high[1] - high[0]) + Math.abs(low[1] - low[0]);
        // rounding of the values, of the position, and the second order
        double steep = (Math.abs(low[0]) + Math.abs(high[0])) * Math.ulp(at);
        if (!(jump <= 1e-14 * (Math.abs(v0) + Math.abs(v1)) + 8 * steep + bend * d)) {
            return Break.Kind.VALUE;
        }
        double kink = Math.abs((2 * high[0] - high[1]) - (2 * low[0] - low[1]));
        double twist = Math.abs(high[2] - 2 * high[1] + high[0]) + Math.abs(low[2] - 2 * low[1] + low[0]);
        double rounding = 1e-13 * (Math.abs(high[0]) + Math.abs(low[0]) + bend) + 8 * bend / d * Math.ulp(at);
        return kink > rounding + 2 * twist ? Break.Kind.SLOPE : Break.Kind.HIGHER;
    }

    /**
     * Looks for a point of [left, right] where the formula has no finite value: at the zeros of divisors and of arguments
     * of log, sqrt and tan, at the breaks and at 1024 points between.
     *
     * @return empty if none was found
     * @throws IllegalArgumentException if the range is not finite
     */
    public Optional<Fault> check(double t, double left, double right) {
        requireRange(left, right);
        if (Double.isInfinite(left) || Double.isInfinite(right)) {
            throw new IllegalArgumentException(
                    "a formula is checked on a finite range, not from " + left + " to " + right);
        }
        for (Hazard hazard : hazards) {
            for (double zero : zeros(hazard, t, left, right)) {
                OptionalDouble bad = singular(zero, t, left, right);
                if (bad.isPresent()) {
                    return Optional.of(fault(hazard, bad.orElseThrow(), t));
                }
            }
        }
        TreeSet<Double> points = new TreeSet<>();
        Arrays.stream(BreakSearch.samples(left, right, BreakSearch.SAMPLES)).forEach(points::add);
        Arrays.stream(BreakSearch.of(node, t, left, right)).forEach(points::add);
        for (double x : points) {
            double value = value(x, t);
            if (!Double.isFinite(value)) {
                return Optional.of(fault(x, t, value));
            }
        }
        return Optional.empty();
    }

    private static double[] zeros(Hazard hazard, double t, double left, double right) {
        TreeSet<Double> zeros = new TreeSet<>();
        Arrays.stream(BreakSearch.of(Node.of(Op.ABS, hazard.argument()), t, left, right))
                .forEach(zeros::add);
        // touching zeros, such as that of x^2, change no sign; the slope does there
        Node slope = Derivative.of(hazard.argument(), Node.USES_X);
        Arrays.stream(BreakSearch.of(Node.of(Op.ABS, slope), t, left, right)).forEach(zeros::add);
        zeros.add(left);
        zeros.add(right);
        return zeros.stream().mapToDouble(Double::doubleValue).toArray();
    }

    /** Whether the formula has no value at a point, or grows beyond all bounds there. */
    private OptionalDouble singular(double x, double t, double left, double right) {
        double[] near = {x, Math.nextUp(x), Math.nextDown(x)};
        for (double p : near) {
            if (p >= left && p <= right && !Double.isFinite(value(p, t))) {
                return OptionalDouble.of(p);
            }
        }
        // a zero known only to rounding: 1/d grows tenfold for every tenth of the distance
        double width = right - left;
        double far = Math.abs(value(inRange(x + 1e-3 * width, left, right), t))
                + Math.abs(value(inRange(x - 1e-3 * width, left, right), t));
        double close = Math.abs(value(x, t));
        double middle = Math.abs(value(inRange(x + 1e-8 * width, left, right), t));
        return x > left && x < right && close > 1e6 * middle && middle > 10 * far
                ? OptionalDouble.of(x)
                : OptionalDouble.empty();
    }

    private static double inRange(double x, double left, double right) {
        return Math.max(left, Math.min(right, x));
    }

    private Fault fault(Hazard hazard, double x, double t) {
        double argument = hazard.argument().value(x, t);
        String found = Double.isNaN(argument) ? "has no value" : argument < -1e-6 ? "is negative" : "is 0";
        return new Fault(x, hazard.words() + " " + found + " at x = " + place(x), hazard.start(), hazard.end());
    }

    private Fault fault(double x, double t, double value) {
        for (Hazard hazard : hazards) {
            double argument = hazard.argument().value(x, t);
            boolean rooted = hazard.words().startsWith("the argument of");
            if (Double.isNaN(value) && (argument == 0 || rooted && argument < 0)) {
                return new Fault(
                        x,
                        hazard.words() + (argument < 0 ? " is negative" : " is 0") + " at x = " + place(x),
                        hazard.start(),
                        hazard.end());
            }
        }
        String reason = Double.isNaN(value) ? "the formula has no value" : "the formula is too large for a number";
        return new Fault(x, reason + " at x = " + place(x), 0, text.length());
    }

    private String place(double x) {
        return Digits.significant(x, 6) + (natural ? "" : " m");
    }

    private static void requireRange(double left, double right) {
        if (!(left < right)) {
            throw new IllegalArgumentException(
                    "the range of x runs from " + left + " to " + right + "; expected a left end below the right end");
        }
    }

    /** {@link #text}. */
    @Override
    public String toString() {
        return text;
    }
}
