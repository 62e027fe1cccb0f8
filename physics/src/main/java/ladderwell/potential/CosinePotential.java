package ladderwell.potential;

import java.util.OptionalDouble;
import ladderwell.quantity.Scale;

/** V = height (1 − cos kx) over one period; the levels are those of Mathieu's equation. */
record CosinePotential(double height, double k, Scale scale, String text) implements Potential {

    CosinePotential {
        if (!(height > 0 && k > 0 && Double.isFinite(height) && Double.isFinite(k))) {
            throw new IllegalArgumentException("height " + height + " and wave number " + k + " must be above 0");
        }
    }

    @Override
    public double value(double x) {
        double s = Math.sin(0.5 * k * x);
        return 2 * height * s * s;
    }

    @Override
    public double slope(double x) {
        return height * k * Math.sin(k * x);
    }

    @Override
    public double left() {
        return -Math.PI / k;
    }

    @Override
    public double right() {
        return Math.PI / k;
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
    public OptionalDouble period() {
        return OptionalDouble.of(2 * Math.PI / k);
    }
}
