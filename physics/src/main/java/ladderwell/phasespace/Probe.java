package ladderwell.phasespace;

import ladderwell.evidence.Bound;
import ladderwell.numeric.FourierTransform;

/** The distributions of a wave function in position and in momentum, from evenly spaced samples. */
final class Probe {
    private static final int FEWEST = 256;
    private static final int MOST = 1 << 20;

    private final double left;
    private final double step;
    private final double centre;
    private final double[] overX;
    private final double[] overP;

    private Probe(double left, double step, double centre, double[] overX, double[] overP) {
        this.left = left;
        this.centre = centre;
        this.step = step;
        this.overX = overX;
        this.overP = overP;
    }

    /**
     * With momenta over a range about a centre.
     *
     * @param momenta least width of that range
     */
    static Probe of(Sampler sampler, double left, double right, double centre, double momenta) {
        double wanted = Math.max(FEWEST, (right - left) * momenta / (2 * Math.PI) * 1.5);
        if (!(wanted <= MOST)) {
            throw new IllegalArgumentException("a wave function over a range of " + (float) (right - left)
                    + " with momenta over a range of " + (float) momenta + " needs more than " + MOST + " samples");
        }
        int n = Integer.highestOneBit((int) wanted - 1) << 1;
        double step = (right - left) / n;
        double[] x = new double[n];
        for (int i = 0; i < n; i++) {
            x[i] = left + (i + 0.5) * step;
        }
        double[] re = new double[n];
        double[] im = new double[n];
        sampler.sample(x, re, im);
        double[] overX = squares(re, im);
        if (centre != 0) {
            for (int i = 0; i < n; i++) {
                double angle = centre * ((i + 0.5) * step);
                double u = Math.cos(angle);
                double v = Math.sin(angle);
                double r = re[i];
                re[i] = r * u + im[i] * v;
                im[i] = im[i] * u - r * v;
            }
        }
        new FourierTransform(n).forward(re, im);
        double[] shifted = new double[n];
        double[] overP = squares(re, im);
        for (int k = 0; k < n; k++) {
            shifted[(k + n / 2) % n] = overP[k];
        }
        return new Probe(left, step, centre, share(overX), share(shifted));
    }

    private static double[] squares(double[] re, double[] im) {
        double[] squares = new double[re.length];
        for (int i = 0; i < squares.length; i++) {
            squares[i] = re[i] * re[i] + im[i] * im[i];
        }
        return squares;
    }

    static double[] share(double[] weights) {
        double sum = 0;
        for (double weight : weights) {
            sum += weight;
        }
        if (!(sum > 0) || Double.isInfinite(sum)) {
            throw new IllegalArgumentException("the wave function is nowhere or not finite in its range");
        }
        for (int i = 0; i < weights.length; i++) {
            weights[i] /= sum;
        }
        return weights;
    }

    int samples() {
        return overX.length;
    }

    /** The largest |p| that the samples tell apart. */
    double nyquist() {
        return Math.PI / step;
    }

    private double momentum(double place) {
        return centre + (place - overP.length / 2) * 2 * Math.PI / (overP.length * step);
    }

    /** Places between which all but the share lies, half of it left out on each side. */
    static int[] ends(double[] weights, double share) {
        int from = 0;
        int to = weights.length - 1;
        double before = weights[from];
        while (before <= share / 2 && from < to) {
            from++;
            before += weights[from];
        }
        double after = weights[to];
        while (after <= share / 2 && to > from) {
            to--;
            after += weights[to];
        }
        return new int[] {from, to};
    }

    /** Of a distribution with long tails this share is what one looks at; the box reaches no further than twice its range. */
    private static final double MAIN = 1e-3;

    /** The box that holds all but a share of each distribution; where momenta fall off slowly, all but about a thousandth. */
    Support box(double share) {
        int[] x = ends(overX, share);
        double[] p = momenta(share);
        double[] main = momenta(Math.max(share, MAIN));
        double middle = (main[0] + main[1]) / 2;
        double reach = main[1] - main[0];
        p[0] = Math.max(p[0], middle - reach);
        p[1] = Math.min(p[1], middle + reach);
        return new Support(left + x[0] * step, left + (x[1] + 1) * step, p[0], p[1], Bound.estimated(Math.sqrt(share)));
    }

    /** Momenta between which all but the share lies. */
    double[] momenta(double share) {
        int[] p = ends(overP, share);
        return new double[] {momentum(p[0] - 1), momentum(p[1] + 1)};
    }

    /** Weight of momenta outside a range. */
    double outside(double low, double high) {
        double sum = 0;
        for (int k = 0; k < overP.length; k++) {
            double p = momentum(k);
            if (p < low || p > high) {
                sum += overP[k];
            }
        }
        return sum;
    }

    /** Weight of the outermost two samples on either side, per sample. */
    double atTheEdges() {
        int n = overX.length;
        return Math.max(Math.max(overX[0], overX[1]), Math.max(overX[n - 1], overX[n - 2]));
    }
}
