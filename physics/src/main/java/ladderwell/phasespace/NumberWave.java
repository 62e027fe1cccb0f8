package ladderwell.phasespace;

import java.util.OptionalInt;
import ladderwell.evidence.Bound;
import ladderwell.numeric.HermiteFunctions;
import ladderwell.numeric.Interruption;
import ladderwell.state.Amplitudes;

/**
 * A pure state on harmonic levels, given by its amplitudes on one or more windows of them. Immutable.
 *
 * <p>Only the levels of the windows are computed, so a window far up the ladder costs what its width and its orbit cost.
 */
public final class NumberWave implements WaveFunction {
    /** Points taken together: their table of functions stays in the second-level cache. */
    private static final int BLOCK = 128;

    private static final double ROUNDING = 1e-12;

    private final int[] first;
    private final double[][] re;
    private final double[][] im;
    private final Bound stateError;
    private final Bound sampleError;
    private final int last;

    /**
     * One window. The arrays are copied.
     *
     * @param first lowest level
     * @param re real parts of the amplitudes of first, first + 1, …
     * @param im imaginary parts
     * @param stateError ‖ψ − ψ̃‖, what the window leaves out
     */
    public NumberWave(long first, double[] re, double[] im, Bound stateError) {
        this(new long[] {first}, new double[][] {re}, new double[][] {im}, stateError);
    }

    /** The amplitudes of a state of the harmonic oscillator. */
    public static NumberWave of(Amplitudes amplitudes) {
        int count = amplitudes.segments();
        long[] first = new long[count];
        double[][] re = new double[count][];
        double[][] im = new double[count][];
        for (int s = 0; s < count; s++) {
            first[s] = amplitudes.first(s);
            re[s] = amplitudes.reals(s);
            im[s] = amplitudes.imaginaries(s);
        }
        return new NumberWave(first, re, im, new Bound(amplitudes.certainty(), amplitudes.normError()));
    }

    /** Several windows, ascending. @shape re and im are [window][level] */
    public NumberWave(long[] first, double[][] re, double[][] im, Bound stateError) {
        if (first.length == 0 || first.length != re.length || first.length != im.length) {
            throw new IllegalArgumentException(
                    "a state needs as many windows of real as of imaginary parts, at least one");
        }
        this.first = new int[first.length];
        this.re = new double[first.length][];
        this.im = new double[first.length][];
        double sum = 0;
        int count = 0;
        long end = 0;
        for (int s = 0; s < first.length; s++) {
            if (re[s].length == 0 || re[s].length != im[s].length || first[s] < end) {
                throw new IllegalArgumentException("window " + s + " of a state starts at level " + first[s] + " with "
                        + re[s].length + " real and " + im[s].length
                        + " imaginary parts; expected ascending windows with as many of each");
            }
            end = first[s] + re[s].length;
            if (end - 1 > HermiteFunctions.LAST_INDEX) {
                throw new IllegalArgumentException("level " + (end - 1) + " lies above " + HermiteFunctions.LAST_INDEX
                        + ", the highest whose function is computed");
            }
            this.first[s] = (int) first[s];
            this.re[s] = re[s].clone();
            this.im[s] = im[s].clone();
            for (int i = 0; i < re[s].length; i++) {
                double size = Math.hypot(re[s][i], im[s][i]);
                if (!Double.isFinite(size)) {
                    throw new IllegalArgumentException(
                            "the amplitude of level " + (first[s] + i) + " is not a finite number");
                }
                sum += size;
                count++;
            }
        }
        last = (int) end - 1;
        this.stateError = stateError;
        // Each function is off by the error of its table and below 1; the sum rounds once a level.
        sampleError = Bound.estimated(sum * (HermiteFunctions.errorBound(last) + (count + 2) * 0x1p-53));
    }

    /** The level, where the state is one level and nothing else but rounding. */
    public OptionalInt singleLevel() {
        return re.length == 1 && re[0].length == 1 && stateError.size() < ROUNDING
                ? OptionalInt.of(first[0])
                : OptionalInt.empty();
    }

    @Override
    public void sample(double[] x, double[] outRe, double[] outIm) {
        boolean mirrored = true;
        int n = x.length;
        for (int i = 0; i < n / 2 && mirrored; i++) {
            mirrored = x[i] == -x[n - 1 - i];
        }
        int from = mirrored ? n / 2 : 0;
        double[] points = new double[BLOCK];
        double[][] sums = new double[4][BLOCK];
        double[][][] tables = new double[first.length][][];
        for (int s = 0; s < first.length; s++) {
            tables[s] = new double[re[s].length][BLOCK + 8];
        }
        for (int begin = from; begin < n; begin += BLOCK) {
            Interruption.check();
            int count = Math.min(BLOCK, n - begin);
            if (count < points.length) {
                points = new double[count];
            }
            System.arraycopy(x, begin, points, 0, count);
            for (double[] sum : sums) {
                java.util.Arrays.fill(sum, 0, count, 0);
            }
            for (int s = 0; s < first.length; s++) {
                HermiteFunctions.window(first[s], points, tables[s]);
                add(s, tables[s], sums, count);
            }
            write(sums, count, begin, mirrored, outRe, outIm);
        }
    }

    /** Sums of the even levels first, then of the odd ones; four levels at a time. */
    private void add(int s, double[][] table, double[][] sums, int count) {
        int k = 0;
        for (; k + 3 < table.length; k += 4) {
            int odd = (first[s] + k) & 1;
            two(
                    table[k],
                    table[k + 2],
                    re[s][k],
                    re[s][k + 2],
                    im[s][k],
                    im[s][k + 2],
                    sums[2 * odd],
                    sums[2 * odd + 1],
                    count);
            two(
                    table[k + 1],
                    table[k + 3],
                    re[s][k + 1],
                    re[s][k + 3],
                    im[s][k + 1],
                    im[s][k + 3],
                    sums[2 - 2 * odd],
                    sums[3 - 2 * odd],
                    count);
        }
        for (; k < table.length; k++) {
            int odd = (first[s] + k) & 1;
            two(table[k], table[k], re[s][k], 0, im[s][k], 0, sums[2 * odd], sums[2 * odd + 1], count);
        }
    }

    private static void two(
            double[] f,
            double[] g,
            double fRe,
            double gRe,
            double fIm,
            double gIm,
            double[] sumRe,
            double[] sumIm,
            int count) {
        for (int j = 0; j < count; j++) {
            double u = f[j];
            double v = g[j];
            sumRe[j] = Math.fma(gRe, v, Math.fma(fRe, u, sumRe[j]));
            sumIm[j] = Math.fma(gIm, v, Math.fma(fIm, u, sumIm[j]));
        }
    }

    private static void write(double[][] sums, int count, int begin, boolean mirrored, double[] outRe, double[] outIm) {
        int end = outRe.length - 1;
        for (int j = 0; j < count; j++) {
            outRe[begin + j] = sums[0][j] + sums[2][j];
            outIm[begin + j] = sums[1][j] + sums[3][j];
        }
        if (mirrored) {
            for (int j = 0; j < count; j++) {
                if (2 * (begin + j) != end) {
                    outRe[end - begin - j] = sums[0][j] - sums[2][j];
                    outIm[end - begin - j] = sums[1][j] - sums[3][j];
                }
            }
        }
    }

    @Override
    public Support support() {
        return Support.ofLevels(last);
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
