package ladderwell.potential;

import java.util.Arrays;
import java.util.Optional;
import ladderwell.quantity.Digits;
import ladderwell.quantity.Scale;

/** V = Σ c_k x^k on a domain. */
final class PolynomialPotential implements Potential {

    private final double[] coefficients;
    private final double left;
    private final double right;
    private final Scale scale;
    private final String text;
    private final double minimum;

    PolynomialPotential(double[] coefficients, double left, double right, Scale scale, String text) {
        for (double c : coefficients) {
            if (!Double.isFinite(c)) {
                throw new IllegalArgumentException("the coefficients of a potential must be finite numbers, not " + c);
            }
        }
        int n = coefficients.length;
        while (n > 1 && coefficients[n - 1] == 0) {
            n--;
        }
        if (n < 2) {
            throw new IllegalArgumentException("a constant potential confines nothing; expected a power of x in it");
        }
        this.coefficients = Arrays.copyOf(coefficients, n);
        this.left = left;
        this.right = right;
        this.scale = scale;
        this.text = text;
        requireBounded();
        minimum = new Survey(this::inner, left, right).minimum();
    }

    static PolynomialPotential of(Scale scale, double[] coefficients, String name) {
        String text = name.equals("polynomial") ? written(coefficients) : name;
        return new PolynomialPotential(coefficients, Double.NEGATIVE_INFINITY, Double.POSITIVE_INFINITY, scale, text);
    }

    private static String written(double[] coefficients) {
        StringBuilder text = new StringBuilder();
        for (int k = 0; k < coefficients.length; k++) {
            if (coefficients[k] != 0 && Double.isFinite(coefficients[k])) {
                text.append(text.length() == 0 ? "" : coefficients[k] < 0 ? " - " : " + ")
                        .append(Digits.shortest(text.length() == 0 ? coefficients[k] : Math.abs(coefficients[k])))
                        .append(k == 0 ? "" : k == 1 ? " x" : " x^" + k);
            }
        }
        return text.toString();
    }

    private void requireBounded() {
        Survey.requireBounded(coefficients, left, right);
    }

    private double inner(double x) {
        double sum = 0;
        for (int i = coefficients.length - 1; i >= 0; i--) {
            sum = sum * x + coefficients[i];
        }
        return sum;
    }

    @Override
    public double value(double x) {
        return x < left || x > right ? Double.POSITIVE_INFINITY : inner(x);
    }

    @Override
    public double slope(double x) {
        double sum = 0;
        for (int i = coefficients.length - 1; i >= 1; i--) {
            sum = sum * x + i * coefficients[i];
        }
        return sum;
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
        return Optional.of(coefficients.clone());
    }

    @Override
    public boolean isEven() {
        for (int i = 1; i < coefficients.length; i += 2) {
            if (coefficients[i] != 0) {
                return false;
            }
        }
        return left == -right;
    }

    @Override
    public double minimum() {
        return minimum;
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
