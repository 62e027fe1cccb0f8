package ladderwell.phasespace;

import ladderwell.evidence.Bound;
import ladderwell.numeric.FourierTransform;
import ladderwell.numeric.Interruption;

/**
 * A pure state given by any function that can be sampled: a sum of levels of any potential, or a packet on a grid. Where it lives in momentum is measured
 * from samples, so its bounds are estimated. Immutable.
 */
public final class SampledWave implements WaveFunction {
    /** Norm that may lie at momenta left out of a smooth state. */
    private static final double WANTED = 1e-12;

    /** Where a state with kinks falls off too slowly for that, its momenta are followed until this many samples would cover it. */
    private static final double SAMPLES = 12_000;

    private static final int FINEST = 1 << 16;

    private final Sampler sampler;
    private final Support support;
    private final Bound stateError;
    private final Bound sampleError;

    private SampledWave(Sampler sampler, Support support, Bound stateError, Bound sampleError) {
        this.sampler = sampler;
        this.support = support;
        this.stateError = stateError;
        this.sampleError = sampleError;
    }

    /**
     * A function that lives between two positions and may be asked for nowhere else.
     *
     * @param wave about its largest wave number
     * @param stateError ‖ψ − ψ̃‖
     * @param sampleError how far any sample can be off
     */
    public static SampledWave of(
            Sampler sampler, double left, double right, double wave, Bound stateError, Bound sampleError) {
        Probe probe = Probe.of(sampler, left, right, 0, 2.5 * wave);
        while (probe.samples() < FINEST
                && probe.outside(-probe.nyquist() / 2, probe.nyquist() / 2) > WANTED * WANTED / 4) {
            Interruption.check();
            probe = Probe.of(sampler, left, right, 0, 1.4 * 2 * probe.nyquist());
        }
        double[] momenta = probe.momenta(WANTED * WANTED);
        double most = SAMPLES * Math.PI / (right - left);
        double low = Math.max(momenta[0], -Math.max(most, 2 * wave));
        double high = Math.min(momenta[1], Math.max(most, 2 * wave));
        // What the samples fold back from beyond their own range counts once more.
        double missed = 2 * Math.sqrt(probe.outside(low, high)) + WANTED;
        double edges = Math.sqrt(probe.atTheEdges() * probe.samples() / (right - left));
        Support support =
                new Support(left, right, low, high, Bound.estimated(missed).plus(edges / Math.max(1, wave)));
        return new SampledWave(sampler, support, stateError, sampleError);
    }

    /**
     * A packet on an even grid of positions, as the sum of the waves of that grid.
     *
     * @param left first position
     * @param spacing distance of neighbours
     * @param re real parts at a power of two of positions; copied
     * @param im imaginary parts
     */
    public static SampledWave onGrid(double left, double spacing, double[] re, double[] im, Bound stateError) {
        Waves waves = new Waves(left, spacing, re, im);
        return of(
                waves::sample,
                left,
                left + spacing * re.length,
                waves.largest(),
                stateError,
                Bound.estimated(waves.rounding()));
    }

    /** Σ_k a_k e^{i p_k (x − left)} over the waves of a grid that matter. */
    private static final class Waves {
        private static final double NEGLIGIBLE = 1e-18;

        /** After so many turns the waves are computed anew. */
        private static final int ANEW = 256;

        private final double left;
        private final double[] p;
        private final double[] re;
        private final double[] im;

        Waves(double left, double spacing, double[] givenRe, double[] givenIm) {
            this.left = left;
            int n = givenRe.length;
            double[] r = givenRe.clone();
            double[] i = givenIm.clone();
            new FourierTransform(n).forward(r, i);
            double peak = 0;
            for (int k = 0; k < n; k++) {
                peak = Math.max(peak, Math.hypot(r[k], i[k]));
            }
            int kept = 0;
            int[] places = new int[n];
            for (int k = 0; k < n; k++) {
                if (Math.hypot(r[k], i[k]) > NEGLIGIBLE * peak) {
                    places[kept++] = k;
                }
            }
            p = new double[kept];
            re = new double[kept];
            im = new double[kept];
            for (int j = 0; j < kept; j++) {
                int k = places[j];
                p[j] = 2 * Math.PI * (k < n / 2 ? k : k - n) / (n * spacing);
                re[j] = r[k] / n;
                im[j] = i[k] / n;
            }
        }

        double largest() {
            double largest = 0;
            double weight = 0;
            for (int j = 0; j < p.length; j++) {
                weight += re[j] * re[j] + im[j] * im[j];
            }
            for (int j = 0; j < p.length; j++) {
                if (re[j] * re[j] + im[j] * im[j] > 1e-12 * weight) {
                    largest = Math.max(largest, Math.abs(p[j]));
                }
            }
            return Math.max(largest, 1e-3);
        }

        double rounding() {
            double sum = 0;
            for (int j = 0; j < p.length; j++) {
                sum += Math.hypot(re[j], im[j]);
            }
            return 1e-13 * sum;
        }

        void sample(double[] x, double[] outRe, double[] outIm) {
            int n = p.length;
            double step = x.length > 1 ? (x[x.length - 1] - x[0]) / (x.length - 1) : 0;
            double[] a = new double[n];
            double[] b = new double[n];
            double[] c = new double[n];
            double[] s = new double[n];
            for (int j = 0; j < n; j++) {
                c[j] = Math.cos(p[j] * step);
                s[j] = Math.sin(p[j] * step);
            }
            for (int i = 0; i < x.length; i++) {
                if (i % ANEW == 0) {
                    Interruption.check();
                    for (int j = 0; j < n; j++) {
                        double angle = p[j] * (x[i] - left);
                        double u = Math.cos(angle);
                        double v = Math.sin(angle);
                        a[j] = re[j] * u - im[j] * v;
                        b[j] = re[j] * v + im[j] * u;
                    }
                }
                double sumRe = 0;
                double sumIm = 0;
                for (int j = 0; j < n; j++) {
                    sumRe += a[j];
                    sumIm += b[j];
                }
                outRe[i] = sumRe;
                outIm[i] = sumIm;
                turn(a, b, c, s);
            }
        }

        private static void turn(double[] a, double[] b, double[] c, double[] s) {
            for (int j = 0; j < a.length; j++) {
                double x = a[j];
                double y = b[j];
                a[j] = Math.fma(x, c[j], -(y * s[j]));
                b[j] = Math.fma(x, s[j], y * c[j]);
            }
        }
    }

    @Override
    public void sample(double[] x, double[] re, double[] im) {
        sampler.sample(x, re, im);
    }

    @Override
    public Support support() {
        return support;
    }

    @Override
    public Bound stateError() {
        return stateError;
    }

    @Override
    public Bound sampleError() {
        return sampleError;
    }
}
