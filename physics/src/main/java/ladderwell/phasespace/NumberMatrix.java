package ladderwell.phasespace;

import java.util.Arrays;
import ladderwell.evidence.Bound;
import ladderwell.numeric.HermiteFunctions;
import ladderwell.numeric.HermitianForm;
import ladderwell.numeric.Interruption;
import ladderwell.state.DensityOperator;

/** A mixed state on a window of harmonic levels, given by its density operator. Not to be shared between threads: it keeps work arrays. */
public final class NumberMatrix implements PhaseState {
    /** More levels than this are not summed only to size a picture. */
    private static final int MOST_FOR_DENSITIES = 300;

    private static final int FEWEST_PLACES = 256;

    private final int first;
    private final int size;
    private final HermitianForm form;
    private final double trace;
    private final double frobenius;
    private final Bound traceNormError;
    private final double[] populations;
    private final double[] lowerRe;
    private final double[] lowerIm;

    /** A density operator on harmonic levels. */
    public static NumberMatrix of(DensityOperator density) {
        return new NumberMatrix(
                density.first(),
                density.size(),
                density.lowerRe(),
                density.lowerIm(),
                Bound.guaranteed(density.traceNormError()));
    }

    /**
     * A density operator by its lower triangle; the arrays are copied.
     *
     * @param first lowest level
     * @param size number of levels
     * @param lowerRe real parts of ρ_mn, m ≥ n counted from the first level, at m (m + 1)/2 + n
     * @param lowerIm imaginary parts
     * @param traceNormError ‖ρ − ρ̃‖₁, what the window leaves out
     */
    public NumberMatrix(long first, int size, double[] lowerRe, double[] lowerIm, Bound traceNormError) {
        if (first < 0 || first + size - 1 > HermiteFunctions.LAST_INDEX) {
            throw new IllegalArgumentException("a window of " + size + " levels from " + first
                    + " leaves the levels 0 … " + HermiteFunctions.LAST_INDEX + " whose functions are computed");
        }
        this.first = (int) first;
        this.size = size;
        form = HermitianForm.of(size, lowerRe, lowerIm);
        this.traceNormError = traceNormError;
        this.lowerRe = lowerRe.clone();
        this.lowerIm = lowerIm.clone();
        populations = new double[size];
        double sum = 0;
        double squares = 0;
        for (int m = 0; m < size; m++) {
            for (int n = 0; n <= m; n++) {
                int at = m * (m + 1) / 2 + n;
                double square = lowerRe[at] * lowerRe[at] + (m == n ? 0 : lowerIm[at] * lowerIm[at]);
                squares += (m == n ? 1 : 2) * square;
            }
            populations[m] = lowerRe[m * (m + 3) / 2];
            sum += populations[m];
        }
        if (!Double.isFinite(squares)) {
            throw new IllegalArgumentException("a density operator has finite entries only");
        }
        trace = sum;
        frobenius = Math.sqrt(squares);
    }

    @Override
    public Support support() {
        return Support.ofLevels(first + size - 1L);
    }

    /** ‖ρ − ρ̃‖₁. */
    public Bound traceNormError() {
        return traceNormError;
    }

    int first() {
        return first;
    }

    HermitianForm form() {
        return form;
    }

    double trace() {
        return trace;
    }

    double frobenius() {
        return frobenius;
    }

    /** Of many levels a square about the orbit of the level above which less than the share lies. */
    @Override
    public Support visible(double share) {
        double above = 0;
        int m = size - 1;
        while (m > 0 && above + Math.abs(populations[m]) <= share / 2) {
            above += Math.abs(populations[m]);
            m--;
        }
        double reach = Math.sqrt(2.0 * (first + m) + 1) + 3;
        Bound missed = Bound.estimated(Math.sqrt(share));
        if (m + 1 > MOST_FOR_DENSITIES || first > MOST_FOR_DENSITIES) {
            return new Support(-reach, reach, -reach, reach, missed);
        }
        int n = Math.max(FEWEST_PLACES, (int) (1.5 * reach * reach));
        double[] x = new double[n];
        for (int i = 0; i < n; i++) {
            x[i] = reach * (2 * i + 1 - n) / n;
        }
        double[][] functions = HermiteFunctions.window(first, m + 1, x);
        int[] inX = Probe.ends(Probe.share(density(functions, n, false)), share / 2);
        int[] inP = Probe.ends(Probe.share(density(functions, n, true)), share / 2);
        double step = 2 * reach / n;
        return new Support(x[inX[0]] - step, x[inX[1]] + step, x[inP[0]] - step, x[inP[1]] + step, missed);
    }

    /** The density in position, or in momentum, where φ_n is (−i)^n times the same function. */
    private double[] density(double[][] functions, int places, boolean momentum) {
        double[] density = new double[places];
        double[] row = new double[places];
        for (int m = 0; m < functions.length; m++) {
            Interruption.check();
            Arrays.fill(row, 0);
            for (int n = 0; n <= m; n++) {
                int at = m * (m + 1) / 2 + n;
                double weight = momentum ? turned(m - n, at) : lowerRe[at];
                double twice = n == m ? weight : 2 * weight;
                double[] f = functions[n];
                for (int i = 0; i < places; i++) {
                    row[i] = Math.fma(twice, f[i], row[i]);
                }
            }
            double[] f = functions[m];
            for (int i = 0; i < places; i++) {
                density[i] = Math.fma(row[i], f[i], density[i]);
            }
        }
        for (int i = 0; i < places; i++) {
            density[i] = Math.max(0, density[i]);
        }
        return density;
    }

    /** Real part of (−i)^k ρ. */
    private double turned(int k, int at) {
        return switch (k % 4) {
            case 0 -> lowerRe[at];
            case 1 -> lowerIm[at];
            case 2 -> -lowerRe[at];
            default -> -lowerIm[at];
        };
    }
}
