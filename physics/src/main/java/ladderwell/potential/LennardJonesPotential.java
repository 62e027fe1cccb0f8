package ladderwell.potential;

import ladderwell.quantity.Scale;

/**
 * V = C depth ((σ/x)^p − (σ/x)^q), C such that the least value is −depth; x &gt; 0.
 *
 * <p>Where p is above 2 the domain begins where a wave of no energy has fallen by e^{−{@value #FALL}} on its way in from σ: nothing that a double
 * can tell lies beyond.
 */
record LennardJonesPotential(double depth, double sigma, int p, int q, Scale scale, String text) implements Potential {

    LennardJonesPotential {
        if (q < 1 || p <= q || p > 64) {
            throw new IllegalArgumentException("the exponents " + p + " and " + q
                    + " bind nothing; expected a repulsion above the attraction, such as 12 and 6");
        }
        if (!(depth > 0 && sigma > 0 && Double.isFinite(depth) && Double.isFinite(sigma))) {
            throw new IllegalArgumentException("depth " + depth + " and sigma " + sigma + " must be above 0");
        }
    }

    private static final double FALL = 60;

    private double factor() {
        double ratio = (double) p / q;
        return p == 2 * q ? 4 : p / (double) (p - q) * Math.pow(ratio, q / (double) (p - q));
    }

    @Override
    public double value(double x) {
        if (x <= 0) {
            return Double.POSITIVE_INFINITY;
        }
        double u = sigma / x;
        double attraction = Math.pow(u, q);
        // by the difference of the powers: no ∞ − ∞ near the wall
        return factor() * depth * attraction * (Math.pow(u, p - q) - 1);
    }

    @Override
    public double slope(double x) {
        double u = sigma / x;
        return factor() * depth / sigma * Math.pow(u, q + 1) * (q - p * Math.pow(u, p - q));
    }

    @Override
    public double left() {
        if (p <= 2) {
            return 0;
        }
        double fall = 0;
        double x = sigma;
        while (fall < FALL) {
            double next = x * (1 - 1.0 / 128);
            fall += (x - next) * Math.sqrt(2 * Math.max(0, value((x + next) / 2)));
            x = next;
        }
        return x;
    }

    @Override
    public boolean isEven() {
        return false;
    }

    @Override
    public double minimum() {
        return sigma * Math.pow((double) p / q, 1.0 / (p - q));
    }

    @Override
    public double edge() {
        return 0;
    }
}
