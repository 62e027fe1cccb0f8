package ladderwell.packet;

import ladderwell.numeric.FourierTransform;

/**
 * One step of the split-operator method of order 4 with small constants: seven kicks of the potential, six drifts, each at its own time.
 *
 * @source coefficients: S. Blanes and P. C. Moan, J. Comput. Appl. Math. 142 (2002) 313, method S6; Fourier split operator: M. D. Feit, J. A.
 *     Fleck and A. Steiger, J. Comput. Phys. 47 (1982) 412
 */
final class SplitStep {
    static final int ORDER = 4;

    private static final double A1 = 0.0792036964311957;
    private static final double A2 = 0.353172906049774;
    private static final double A3 = -0.0420650803577195;
    private static final double B1 = 0.209515106613362;
    private static final double B2 = -0.143851773179818;
    private static final double[] KICKS = {A1, A2, A3, 1 - 2 * (A1 + A2 + A3), A3, A2, A1};
    private static final double[] DRIFTS = {B1, B2, 0.5 - (B1 + B2), 0.5 - (B1 + B2), B2, B1};

    /** The kick and drift of each place of the tables below. */
    private static final int[] KICK_AT = {0, 1, 2, 3, 2, 1, 0};

    private static final int[] DRIFT_AT = {0, 1, 2, 2, 1, 0};

    /** Beyond it a potential is cut: nothing of a packet is there. */
    private static final double HIGHEST = 1e12;

    /** How far inside a step, as a share of it, its first and last kick look at the potential; the two shifts cancel where V is smooth. */
    private static final double INSIDE = 1e-8;

    private final Grid grid;
    private final PotentialField field;
    private final double h;
    private final FourierTransform transform;
    private final double[] x;
    private final double[] v;
    private final double[][] driftRe;
    private final double[][] driftIm;
    private final double[][] kickRe;
    private final double[][] kickIm;

    SplitStep(Grid grid, PotentialField field, double h) {
        this.grid = grid;
        this.field = field;
        this.h = h;
        int n = grid.points();
        transform = new FourierTransform(n);
        x = grid.positions();
        v = new double[n];
        driftRe = new double[3][n];
        driftIm = new double[3][n];
        for (int s = 0; s < 3; s++) {
            for (int k = 0; k < n; k++) {
                double wave = grid.wave(k);
                double angle = -h * DRIFTS[s] * wave * wave / 2;
                // the factor 1/N of there and back is taken here
                driftRe[s][k] = Math.cos(angle) / n;
                driftIm[s][k] = Math.sin(angle) / n;
            }
        }
        kickRe = new double[field.moves() ? 1 : 4][n];
        kickIm = new double[field.moves() ? 1 : 4][n];
        if (!field.moves()) {
            potential(0);
            for (int s = 0; s < 4; s++) {
                turns(s, KICKS[s]);
            }
        }
    }

    private void potential(double time) {
        field.values(x, time, v);
        for (int j = 0; j < v.length; j++) {
            if (Double.isNaN(v[j])) {
                throw new IllegalArgumentException("the potential has no value at x = " + x[j]
                        + " in scaled units; expected one wherever the packet goes");
            }
            v[j] = Math.max(-HIGHEST, Math.min(HIGHEST, v[j]));
        }
    }

    private void turns(int place, double share) {
        for (int j = 0; j < v.length; j++) {
            double angle = -h * share * v[j];
            kickRe[place][j] = Math.cos(angle);
            kickIm[place][j] = Math.sin(angle);
        }
    }

    /**
     * Moves a wave from a time to that time + h.
     *
     * @return weight that was found in the highest waves, as a share of 1
     */
    double step(Wave wave, double time) {
        double t = time;
        double high = 0;
        for (int s = 0; s < KICKS.length; s++) {
            if (field.moves()) {
                // where V jumps at an end of the step, the value inside counts
                potential(Math.max(time + INSIDE * h, Math.min(time + h - INSIDE * h, t)));
                turns(0, KICKS[s]);
                times(wave, kickRe[0], kickIm[0]);
            } else {
                times(wave, kickRe[KICK_AT[s]], kickIm[KICK_AT[s]]);
            }
            if (s < DRIFTS.length) {
                transform.forward(wave.re, wave.im);
                if (s == 0) {
                    high = high(wave);
                }
                times(wave, driftRe[DRIFT_AT[s]], driftIm[DRIFT_AT[s]]);
                transform.backward(wave.re, wave.im);
                t += DRIFTS[s] * h;
            }
        }
        return high;
    }

    private static void times(Wave wave, double[] re, double[] im) {
        double[] a = wave.re;
        double[] b = wave.im;
        for (int j = 0; j < a.length; j++) {
            double r = a[j] * re[j] - b[j] * im[j];
            b[j] = a[j] * im[j] + b[j] * re[j];
            a[j] = r;
        }
    }

    /** The weight of the waves near the largest that the grid knows, either way. */
    private double high(Wave wave) {
        int n = grid.points();
        int side = n / Wave.SIDE;
        double sum = 0;
        for (int k = n / 2 - side; k < n / 2 + side; k++) {
            sum += wave.re[k] * wave.re[k] + wave.im[k] * wave.im[k];
        }
        return sum * grid.spacing() / n;
    }

    double h() {
        return h;
    }
}
