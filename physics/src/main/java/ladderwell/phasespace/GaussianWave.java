package ladderwell.phasespace;

import ladderwell.evidence.Bound;

/**
 * A coherent state by its closed form, π^{−1/4} e^{−(x−x₀)²/2 + i p₀ (x−x₀)}: at any number of quanta, where a sum over levels would only cost more.
 *
 * @param position x₀
 * @param momentum p₀
 * @param displacement bound on the error of either
 */
public record GaussianWave(double position, double momentum, double displacement) implements WaveFunction {
    /** e^{−REACH²/2} is 3e-18. */
    private static final double REACH = 9;

    public GaussianWave {
        if (!Double.isFinite(position) || !Double.isFinite(momentum) || !(displacement >= 0)) {
            throw new IllegalArgumentException(
                    "a coherent state is centred on finite numbers, not on " + position + ", " + momentum);
        }
    }

    boolean isAtOrigin() {
        return position == 0 && momentum == 0;
    }

    GaussianWave atOrigin() {
        return new GaussianWave(0, 0, displacement);
    }

    @Override
    public void sample(double[] x, double[] re, double[] im) {
        double peak = Math.pow(Math.PI, -0.25);
        for (int i = 0; i < x.length; i++) {
            double d = x[i] - position;
            double size = peak * Math.exp(-d * d / 2);
            re[i] = size * Math.cos(momentum * d);
            im[i] = size * Math.sin(momentum * d);
        }
    }

    @Override
    public Support support() {
        return new Support(
                position - REACH, position + REACH, momentum - REACH, momentum + REACH, Bound.guaranteed(1e-17));
    }

    /** A shift of either changes the state by at most the shift, for two quadratures of spread √½. */
    @Override
    public Bound stateError() {
        return Bound.guaranteed(Math.sqrt(2) * displacement);
    }

    @Override
    public Bound sampleError() {
        // Phases p₀ d are rounded, and so are the positions themselves.
        return Bound.estimated(4e-16 + Math.abs(momentum) * (REACH * 0x1p-53 + Math.ulp(position)));
    }
}
