package ladderwell.formula;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;

/** Trees that are polynomials in x, and the real roots of polynomials. */
final class Polynomial {

    /** Degree up to which a tree is multiplied out. */
    static final int HIGHEST = 64;

    private Polynomial() {}

    /**
     * Coefficients of 1, x, x², … as trees that may depend on t; the last one is not literally zero.
     *
     * @return empty if the tree is no polynomial in x, or one of a degree above 64
     */
    static Optional<Node[]> of(Node node) {
        if (!node.usesX()) {
            return Optional.of(trimmed(new Node[] {node}));
        }
        switch (node.op) {
            case X:
                return Optional.of(new Node[] {Node.ZERO, Node.ONE});
            case NEGATE:
                return of(node.args[0]).map(p -> scaled(p, Node.constant(-1)));
            case ADD:
                Node[] sum = {Node.ZERO};
                for (Node arg : node.args) {
                    Optional<Node[]> p = of(arg);
                    if (p.isEmpty()) {
                        return Optional.empty();
                    }
                    sum = sum(sum, p.orElseThrow());
                }
                return Optional.of(sum);
            case MULTIPLY:
                Node[] product = {Node.ONE};
                for (Node arg : node.args) {
                    Optional<Node[]> p = of(arg);
                    if (p.isEmpty() || p.orElseThrow().length + product.length - 2 > HIGHEST) {
                        return Optional.empty();
                    }
                    product = product(product, p.orElseThrow());
                }
                return Optional.of(product);
            case DIVIDE:
                if (node.args[1].usesX()) {
                    return Optional.empty();
                }
                return of(node.args[0]).map(p -> {
                    Node[] quotient = new Node[p.length];
                    for (int i = 0; i < p.length; i++) {
                        quotient[i] = Algebra.divide(p[i], node.args[1]);
                    }
                    return quotient;
                });
            case POWER:
                return power(node);
            default:
                return Optional.empty();
        }
    }

    private static Optional<Node[]> power(Node node) {
        if (!node.args[1].isFixed()) {
            return Optional.empty();
        }
        double exponent = node.args[1].value(0, 0);
        if (exponent != Math.rint(exponent) || exponent < 0 || exponent > HIGHEST) {
            return Optional.empty();
        }
        Optional<Node[]> base = of(node.args[0]);
        if (base.isEmpty() || (base.orElseThrow().length - 1) * exponent > HIGHEST) {
            return Optional.empty();
        }
        Node[] result = {Node.ONE};
        for (int i = 0; i < exponent; i++) {
            result = product(result, base.orElseThrow());
        }
        return Optional.of(result);
    }

    private static Node[] scaled(Node[] p, Node factor) {
        Node[] result = new Node[p.length];
        for (int i = 0; i < p.length; i++) {
            result[i] = Algebra.multiply(factor, p[i]);
        }
        return result;
    }

    private static Node[] sum(Node[] a, Node[] b) {
        Node[] result = new Node[Math.max(a.length, b.length)];
        for (int i = 0; i < result.length; i++) {
            result[i] = Algebra.add(i < a.length ? a[i] : Node.ZERO, i < b.length ? b[i] : Node.ZERO);
        }
        return trimmed(result);
    }

    private static Node[] product(Node[] a, Node[] b) {
        Node[] result = new Node[a.length + b.length - 1];
        for (int k = 0; k < result.length; k++) {
            List<Node> terms = new ArrayList<>();
            for (int i = Math.max(0, k - b.length + 1); i <= Math.min(k, a.length - 1); i++) {
                terms.add(Algebra.multiply(a[i], b[k - i]));
            }
            result[k] = Algebra.add(terms.toArray(new Node[0]));
        }
        return trimmed(result);
    }

    private static Node[] trimmed(Node[] p) {
        int n = p.length;
        while (n > 1 && p[n - 1].is(0)) {
            n--;
        }
        // coefficients that do not vary become numbers at once: trees of products of sums would grow without end
        Node[] result = Arrays.copyOf(p, n);
        for (int i = 0; i < n; i++) {
            if (result[i].isFixed() && !result[i].isConstant()) {
                result[i] = Node.constant(result[i].value(0, 0));
            }
        }
        return result;
    }

    /** The numbers, where no coefficient depends on t; trailing zeros dropped. */
    static Optional<double[]> numbers(Node[] coefficients) {
        double[] numbers = new double[coefficients.length];
        for (int i = 0; i < numbers.length; i++) {
            if (!coefficients[i].isFixed()) {
                return Optional.empty();
            }
            numbers[i] = coefficients[i].value(0, 0);
            if (!Double.isFinite(numbers[i])) {
                return Optional.empty();
            }
        }
        int n = numbers.length;
        while (n > 1 && numbers[n - 1] == 0) {
            n--;
        }
        return Optional.of(Arrays.copyOf(numbers, n));
    }

    static double value(double[] p, double x) {
        double sum = 0;
        for (int i = p.length - 1; i >= 0; i--) {
            sum = sum * x + p[i];
        }
        return sum;
    }

    static double[] derivative(double[] p) {
        if (p.length < 2) {
            return new double[] {0};
        }
        double[] slope = new double[p.length - 1];
        for (int i = 1; i < p.length; i++) {
            slope[i - 1] = i * p[i];
        }
        return slope;
    }

    /**
     * The points in (left, right) where p changes its sign, ascending; the ends may be infinite. Between two neighbouring
     * sign changes of its derivative p is monotone and has at most one.
     */
    static double[] signChanges(double[] p, double left, double right) {
        int n = p.length - 1;
        while (n > 0 && p[n] == 0) {
            n--;
        }
        if (n == 0) {
            return new double[0];
        }
        if (n == 1) {
            double root = -p[0] / p[1];
            return root > left && root < right ? new double[] {root == 0 ? 0 : root} : new double[0];
        }
        // all roots lie within 2 max |p_(n−k)/p_n|^(1/k) of 0 (Fujiwara 1916)
        double bound = 0;
        for (int k = 1; k <= n; k++) {
            bound = Math.max(bound, Math.pow(Math.abs(p[n - k] / p[n]), 1.0 / k));
        }
        bound = 2.01 * bound;
        double lo = Math.max(left, -bound);
        double hi = Math.min(right, bound);
        if (!(lo < hi)) {
            return bound == 0 && n % 2 == 1 && left < 0 && right > 0 ? new double[] {0} : new double[0];
        }
        double[] turns = signChanges(derivative(Arrays.copyOf(p, n + 1)), lo, hi);
        // a zero at a turning point counts only where the sign differs on its two sides
        List<Double> roots = new ArrayList<>();
        double from = lo;
        double sign = Math.signum(value(p, lo));
        double zero = sign == 0 ? lo : Double.NaN;
        for (int i = 0; i <= turns.length; i++) {
            double to = i < turns.length ? turns[i] : hi;
            double next = Math.signum(value(p, to));
            if (next == 0) {
                zero = Double.isNaN(zero) ? to : zero;
                continue;
            }
            if (sign != 0 && next != sign) {
                if (Double.isNaN(zero)) {
                    Roots.between(x -> value(p, x), from, to).ifPresent(roots::add);
                } else {
                    roots.add(zero);
                }
            }
            sign = next;
            zero = Double.NaN;
            from = to;
        }
        return Roots.inside(roots, left, right);
    }
}
