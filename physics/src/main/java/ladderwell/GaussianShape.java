package ladderwell;

import java.util.Arrays;
import ladderwell.state.Shape;

/**
 * A Gaussian packet as a function of scaled position; cut off at the oscillator's walls.
 *
 * @param oscillator whose potential it lies in
 * @param position x₀
 * @param momentum p₀
 * @param width Δx
 */
record GaussianShape(Oscillator oscillator, double position, double momentum, double width) implements Shape {
    /** Widths beyond which less than 1e-28 of the weight lies, in position and in momentum. */
    private static final double REACH = 11.5;

    private static final int SAMPLES = 512;

    @Override
    public void sample(double[] x, double[] re, double[] im) {
        double peak = Math.pow(2 * Math.PI * width * width, -0.25);
        for (int i = 0; i < x.length; i++) {
            double d = x[i] - position;
            double size = peak * Math.exp(-d * d / (4 * width * width));
            re[i] = size * Math.cos(momentum * d);
            im[i] = size * Math.sin(momentum * d);
        }
    }

    @Override
    public double left() {
        return Math.max(oscillator.left(), position - REACH * width);
    }

    @Override
    public double right() {
        return Math.min(oscillator.right(), position + REACH * width);
    }

    @Override
    public double[] breaks() {
        return Arrays.stream(oscillator.breaks())
                .filter(b -> b > left() && b < right())
                .toArray();
    }

    @Override
    public double wave() {
        return Math.abs(momentum) + REACH / (2 * width);
    }

    @Override
    public double energy() {
        double spread = 0.5 / width;
        return (momentum * momentum + spread * spread) / 2 + meanPotential();
    }

    /** ⟨V⟩ by the trapezoidal rule, which for a Gaussian on so wide a range is exact but for kinks of V. */
    private double meanPotential() {
        double sum = 0;
        double weight = 0;
        double step = (right() - left()) / SAMPLES;
        for (int i = 1; i < SAMPLES; i++) {
            double x = left() + i * step;
            double d = (x - position) / width;
            double v = oscillator.potential(x);
            double density = Math.exp(-d * d / 2);
            if (density > 1e-20 && Double.isFinite(v)) {
                sum += density * v;
                weight += density;
            }
        }
        if (weight == 0) {
            throw new IllegalArgumentException("the packet lies where the potential is infinite");
        }
        return sum / weight;
    }

    @Override
    public double bottom() {
        return Shapes.bottom(oscillator, left(), right());
    }
}
