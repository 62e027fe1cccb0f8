package ladderwell.level;

import java.util.function.DoubleUnaryOperator;

/** Potentials for tests. */
final class Curves {
    private static final double OPEN = Double.POSITIVE_INFINITY;

    private Curves() {}

    private record Curve(DoubleUnaryOperator function, double left, double right, boolean isEven, double[] breaks)
            implements PotentialCurve {
        @Override
        public double value(double x) {
            return function.applyAsDouble(x);
        }
    }

    static PotentialCurve even(DoubleUnaryOperator v, double... breaks) {
        return new Curve(v, -OPEN, OPEN, true, breaks);
    }

    static PotentialCurve open(DoubleUnaryOperator v, double... breaks) {
        return new Curve(v, -OPEN, OPEN, false, breaks);
    }

    static PotentialCurve between(double left, double right, DoubleUnaryOperator v, double... breaks) {
        return new Curve(v, left, right, false, breaks);
    }

    static PotentialCurve morse(double depth, double a) {
        return open(x -> {
            double rest = 1 - Math.exp(-a * x);
            return depth * rest * rest;
        });
    }

    static double morseLevel(double depth, double a, int n) {
        double half = n + 0.5;
        return a * Math.sqrt(2 * depth) * half - a * a / 2 * half * half;
    }

    static double sech(double x) {
        return 1 / Math.cosh(x);
    }
}
