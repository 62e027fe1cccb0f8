package ladderwell.potential;

import java.util.OptionalDouble;
import java.util.OptionalInt;
import ladderwell.quantity.Scale;

/**
 * V = −depth/cosh²(ax), depth = a²λ(λ + 1)/2. E_n = −a²(λ − n)²/2 for n &lt; λ.
 *
 * @source G. Pöschl and E. Teller, Z. Phys. 83 (1933) 143
 */
record PoschlTellerPotential(double depth, double a, Scale scale, String text) implements Potential {

    PoschlTellerPotential {
        if (!(depth > 0 && a > 0 && Double.isFinite(depth) && Double.isFinite(a))) {
            throw new IllegalArgumentException("depth " + depth + " and 1/width " + a + " must be above 0");
        }
    }

    private double lambda() {
        double q = 8 * (depth / a / a);
        // (√(1 + q) − 1)/2 without cancellation in a weak well
        return 0.5 * q / (Math.sqrt(1 + q) + 1);
    }

    @Override
    public double value(double x) {
        double c = Math.cosh(a * x);
        return -depth / c / c;
    }

    @Override
    public double slope(double x) {
        double c = Math.cosh(a * x);
        return 2 * depth * a * Math.tanh(a * x) / c / c;
    }

    @Override
    public boolean isEven() {
        return true;
    }

    @Override
    public double minimum() {
        return 0;
    }

    @Override
    public double edge() {
        return 0;
    }

    @Override
    public OptionalInt levels() {
        return OptionalInt.of((int) Math.min(Integer.MAX_VALUE, Math.ceil(lambda())));
    }

    @Override
    public OptionalDouble closedForm(int n) {
        if (n < 0 || n >= levels().orElseThrow()) {
            return OptionalDouble.empty();
        }
        double k = a * (lambda() - n);
        return OptionalDouble.of(-k * k / 2);
    }
}
