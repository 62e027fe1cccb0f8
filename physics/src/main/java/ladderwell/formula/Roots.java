package ladderwell.formula;

import java.util.List;
import java.util.OptionalDouble;
import java.util.TreeSet;
import java.util.function.DoubleUnaryOperator;

/** Sign changes of a function, to the last bit of x. */
final class Roots {

    private Roots() {}

    /**
     * A sign change between two points, by halving until two neighbouring numbers are left. A zero at an end counts; the
     * bracket may span many decades.
     */
    static OptionalDouble between(DoubleUnaryOperator f, double from, double to) {
        double a = from;
        double b = to;
        double fa = Math.signum(f.applyAsDouble(a));
        double fb = Math.signum(f.applyAsDouble(b));
        if (fa == 0) {
            return OptionalDouble.of(a);
        }
        if (fb == 0) {
            return OptionalDouble.of(b);
        }
        if (!(fa * fb < 0)) {
            return OptionalDouble.empty();
        }
        for (int i = 0; i < 2200; i++) {
            double middle = 0.5 * a + 0.5 * b;
            if (middle <= a || middle >= b) {
                break;
            }
            double f0 = Math.signum(f.applyAsDouble(middle));
            if (f0 == 0) {
                return OptionalDouble.of(middle);
            }
            if (f0 == fa) {
                a = middle;
            } else if (f0 == fb) {
                b = middle;
            } else {
                return OptionalDouble.empty();
            }
        }
        return OptionalDouble.of(Math.abs(f.applyAsDouble(a)) <= Math.abs(f.applyAsDouble(b)) ? a : b);
    }

    /** Those strictly inside, ascending, each once. */
    static double[] inside(List<Double> roots, double left, double right) {
        TreeSet<Double> sorted = new TreeSet<>();
        for (double root : roots) {
            if (root > left && root < right) {
                sorted.add(root == 0 ? 0.0 : root);
            }
        }
        return sorted.stream().mapToDouble(Double::doubleValue).toArray();
    }
}
