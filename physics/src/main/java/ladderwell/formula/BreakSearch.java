package ladderwell.formula;

import java.util.ArrayList;
import java.util.IdentityHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeSet;
import java.util.concurrent.CancellationException;
import java.util.function.DoubleUnaryOperator;

/**
 * Finds where the switches of a tree (step, sign, abs, min, max, comparisons) turn over in x, innermost first. Between
 * those that are known the argument of the next switch is smooth: a polynomial is solved, anything else is sampled with
 * its turning points and bisected.
 */
final class BreakSearch {

    /** More breaks than this are refused. */
    private static final int MOST = 1000;

    static final int SAMPLES = 1024;

    private final double t;
    private final double left;
    private final double right;
    private final TreeSet<Double> found = new TreeSet<>();

    private BreakSearch(double t, double left, double right) {
        this.t = t;
        this.left = left;
        this.right = right;
    }

    /** All turn-overs in (left, right), ascending. */
    static double[] of(Node node, double t, double left, double right) {
        BreakSearch search = new BreakSearch(t, left, right);
        List<Node> arguments = new ArrayList<>();
        search.collect(node, arguments, new IdentityHashMap<>());
        for (Node argument : arguments) {
            if (Thread.interrupted()) {
                throw new CancellationException("the computation was interrupted");
            }
            search.solve(argument);
        }
        return search.found.stream().mapToDouble(Double::doubleValue).toArray();
    }

    /** Arguments of switches whose sign matters, those inside others first. */
    private void collect(Node node, List<Node> arguments, Map<Node, Boolean> seen) {
        if (!node.usesX() || seen.put(node, true) != null) {
            return;
        }
        for (Node arg : node.args) {
            collect(arg, arguments, seen);
        }
        switch (node.op) {
            case ABS, SIGN, STEP -> arguments.add(node.args[0]);
            case LESS, LESS_EQUAL -> arguments.add(Algebra.subtract(node.args[0], node.args[1]));
            case MIN, MAX -> {
                for (int i = 0; i < node.args.length; i++) {
                    for (int j = 0; j < i; j++) {
                        arguments.add(Algebra.subtract(node.args[j], node.args[i]));
                    }
                }
            }
            default -> {}
        }
    }

    private void solve(Node argument) {
        if (!argument.usesX()) {
            return;
        }
        List<Double> ends = new ArrayList<>(found);
        ends.add(right);
        int count = Math.max(16, 2 * SAMPLES / ends.size());
        double from = left;
        TreeSet<Double> more = new TreeSet<>();
        for (double to : ends) {
            Node smooth = settled(argument, inside(from, to), t, new IdentityHashMap<>());
            for (double root : signChanges(smooth, t, from, to, count)) {
                more.add(root);
            }
            from = to;
        }
        found.addAll(more);
        if (found.size() > MOST) {
            throw new IllegalArgumentException(
                    "the formula has more than " + MOST + " jumps or kinks; give a narrower range of x");
        }
    }

    /** Some point strictly inside an interval whose ends may be infinite. */
    static double inside(double from, double to) {
        if (Double.isInfinite(from) && Double.isInfinite(to)) {
            return 0;
        }
        if (Double.isInfinite(from)) {
            return to - Math.max(Math.abs(to), 1e-9);
        }
        return Double.isInfinite(to) ? from + Math.max(Math.abs(from), 1e-9) : 0.5 * from + 0.5 * to;
    }

    /** The tree with every switch set as it stands at x. */
    private static Node settled(Node node, double x, double t, Map<Node, Node> known) {
        if (!node.usesX()) {
            return node;
        }
        Node there = known.get(node);
        if (there == null) {
            there = settle(node, x, t, known);
            known.put(node, there);
        }
        return there;
    }

    private static Node settle(Node node, double x, double t, Map<Node, Node> known) {
        switch (node.op) {
            case STEP, SIGN, LESS, LESS_EQUAL, AND, OR:
                return Node.constant(node.value(x, t));
            case ABS:
                Node inner = settled(node.args[0], x, t, known);
                return node.args[0].value(x, t) < 0 ? Algebra.negate(inner) : inner;
            case MIN, MAX:
                double best = node.value(x, t);
                for (Node arg : node.args) {
                    if (arg.value(x, t) == best) {
                        return settled(arg, x, t, known);
                    }
                }
                return settled(node.args[0], x, t, known);
            case IF:
                return settled(node.args[node.args[0].value(x, t) != 0 ? 1 : 2], x, t, known);
            default:
                Node[] args = new Node[node.args.length];
                for (int i = 0; i < args.length; i++) {
                    args[i] = settled(node.args[i], x, t, known);
                }
                return switch (node.op) {
                    case ADD -> Algebra.add(args);
                    case MULTIPLY -> Algebra.multiply(args);
                    case DIVIDE -> Algebra.divide(args[0], args[1]);
                    case NEGATE -> Algebra.negate(args[0]);
                    case POWER -> Algebra.power(args[0], args[1]);
                    case X -> node;
                    default -> Algebra.call(node.op, args);
                };
        }
    }

    /** Sign changes of a smooth tree in (from, to). */
    private static double[] signChanges(Node node, double t, double from, double to, int count) {
        if (!node.usesX()) {
            return new double[0];
        }
        Optional<double[]> polynomial = Polynomial.of(Scaling.at(t, node)).flatMap(Polynomial::numbers);
        return polynomial.isPresent()
                ? Polynomial.signChanges(polynomial.orElseThrow(), from, to)
                : sampled(node, t, from, to, count);
    }

    private static double[] sampled(Node node, double t, double from, double to, int count) {
        Program value = Program.of(node);
        Program slope = Program.of(Derivative.of(node, Node.USES_X));
        DoubleUnaryOperator f = x -> value.value(x, t);
        DoubleUnaryOperator d = x -> slope.value(x, t);
        double[] x = samples(from, to, count);
        List<Double> roots = new ArrayList<>();
        for (int i = 1; i < x.length; i++) {
            double a = f.applyAsDouble(x[i - 1]);
            double b = f.applyAsDouble(x[i]);
            if (a * b <= 0) {
                Roots.between(f, x[i - 1], x[i]).ifPresent(roots::add);
            } else if (a * d.applyAsDouble(x[i - 1]) < 0 && b * d.applyAsDouble(x[i]) > 0) {
                // comes down to zero and goes up again: two roots may hide around the turning point
                double low = x[i - 1];
                double high = x[i];
                Roots.between(d, low, high).ifPresent(turn -> {
                    if (f.applyAsDouble(turn) * a < 0) {
                        Roots.between(f, low, turn).ifPresent(roots::add);
                        Roots.between(f, turn, high).ifPresent(roots::add);
                    }
                });
            }
        }
        return Roots.inside(roots, from, to);
    }

    /** Even points of a finite range; of an infinite one points of every decade from 1e-18 on, on either side. */
    static double[] samples(double from, double to, int count) {
        if (!Double.isInfinite(from) && !Double.isInfinite(to)) {
            double[] x = new double[count + 1];
            for (int i = 0; i <= count; i++) {
                double s = i / (double) count;
                x[i] = from * (1 - s) + to * s;
            }
            return x;
        }
        TreeSet<Double> x = new TreeSet<>();
        x.add(0.0);
        for (int k = -18 * 64; k <= 6 * 64; k++) {
            double size = Math.pow(10, k / 64.0);
            x.add(size);
            x.add(-size);
        }
        if (Double.isFinite(from)) {
            x.add(from);
            x.addAll(around(from, 1));
        }
        if (Double.isFinite(to)) {
            x.add(to);
            x.addAll(around(to, -1));
        }
        return x.stream()
                .mapToDouble(Double::doubleValue)
                .filter(p -> p >= from && p <= to)
                .toArray();
    }

    private static List<Double> around(double end, int side) {
        List<Double> x = new ArrayList<>();
        for (int k = -18 * 16; k <= 6 * 16; k++) {
            x.add(end + side * Math.pow(10, k / 16.0));
        }
        return x;
    }
}
