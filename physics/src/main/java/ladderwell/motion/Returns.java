package ladderwell.motion;

import java.util.concurrent.CancellationException;
import ladderwell.numeric.ExactPhases;
import ladderwell.state.Amplitudes;

/** The return amplitude A(t) = ⟨ψ(0)|ψ(t)⟩ = Σ P_n e^{−iE_n t} at every time. */
public final class Returns {
    /** Rows of phases held at a time. */
    private static final int PANEL = 32;

    private final double[] re;
    private final double[] im;
    private final double error;

    private Returns(double[] re, double[] im, double error) {
        this.re = re;
        this.im = im;
        this.error = error;
    }

    /** Sums the amplitude of a state. */
    public static Returns of(PhasedState state) {
        double[] re = new double[state.times()];
        double[] im = new double[state.times()];
        Amplitudes amplitudes = state.amplitudes();
        double[] times = state.copyOfTimes();
        double rounding = 0;
        for (int s = 0; s < amplitudes.segments(); s++) {
            int count = amplitudes.length(s);
            double[] high = new double[count];
            double[] low = new double[count];
            double[] weight = new double[count];
            for (int i = 0; i < count; i++) {
                high[i] = state.levels().energyHigh(amplitudes.first(s) + i);
                low[i] = state.levels().energyLow(amplitudes.first(s) + i);
                weight[i] = amplitudes.re(s, i) * amplitudes.re(s, i) + amplitudes.im(s, i) * amplitudes.im(s, i);
            }
            ExactPhases phases = ExactPhases.of(high, low, weight, new double[count], times);
            rounding += phases.errorBound() + (count + 4) * 0x1p-52;
            double[][] rowsRe = new double[PANEL][count];
            double[][] rowsIm = new double[PANEL][count];
            for (int from = 0; from < times.length; from += PANEL) {
                if (Thread.interrupted()) {
                    throw new CancellationException("interrupted while summing the return amplitude");
                }
                int to = Math.min(from + PANEL, times.length);
                phases.fill(from, to, rowsRe, rowsIm);
                for (int j = from; j < to; j++) {
                    re[j] += sum(rowsRe[j - from], count);
                    im[j] += sum(rowsIm[j - from], count);
                }
            }
        }
        // ⟨ψ0|ψt⟩ against ⟨ψ̃0|ψ̃t⟩: each side is off by at most δ.
        double delta = state.error();
        return new Returns(re, im, 2 * delta + delta * delta + rounding);
    }

    private static double sum(double[] row, int count) {
        double sum = 0;
        for (int i = 0; i < count; i++) {
            sum += row[i];
        }
        return sum;
    }

    /** Re A at the j-th time. */
    public double re(int j) {
        return re[j];
    }

    /** Im A at the j-th time. */
    public double im(int j) {
        return im[j];
    }

    /** |A|² at the j-th time. */
    public double probability(int j) {
        return re[j] * re[j] + im[j] * im[j];
    }

    /** Error of A, as sure as the state's. */
    public double error() {
        return error;
    }

    /** Error of |A|² at the j-th time. */
    public double probabilityError(int j) {
        return (2 * Math.hypot(re[j], im[j]) + error) * error;
    }
}
