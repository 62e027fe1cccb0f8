package ladderwell.potential;

import java.util.OptionalDouble;
import java.util.OptionalInt;
import ladderwell.quantity.Scale;

/**
 * V = depth (1 − exp(−ax))². E_n = a√(2 depth)(n + ½) − a²(n + ½)²/2 for n + ½ &lt; √(2 depth)/a.
 *
 * @source P. M. Morse, Phys. Rev. 34 (1929) 57
 */
record MorsePotential(double depth, double a, Scale scale, String text) implements Potential {

    MorsePotential {
        if (!(depth > 0 && a > 0 && Double.isFinite(depth) && Double.isFinite(a))) {
            throw new IllegalArgumentException(
                    "depth " + depth + " and range " + a + " of a Morse potential must be above 0");
        }
    }

    @Override
    public double value(double x) {
        double u = -Math.expm1(-a * x);
        return depth * u * u;
    }

    @Override
    public double slope(double x) {
        return -2 * depth * a * Math.expm1(-a * x) * Math.exp(-a * x);
    }

    @Override
    public boolean isEven() {
        return false;
    }

    @Override
    public double minimum() {
        return 0;
    }

    @Override
    public double edge() {
        return depth;
    }

    @Override
    public OptionalInt levels() {
        double most = Math.ceil(Math.sqrt(2 * depth) / a - 0.5);
        return OptionalInt.of((int) Math.min(Integer.MAX_VALUE, Math.max(0, most)));
    }

    @Override
    public OptionalDouble closedForm(int n) {
        if (n < 0 || n >= levels().orElseThrow()) {
            return OptionalDouble.empty();
        }
        double k = a * (n + 0.5);
        return OptionalDouble.of(k * (Math.sqrt(2 * depth) - k / 2));
    }
}
