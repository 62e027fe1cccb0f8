package ladderwell.motion;

import java.util.concurrent.CancellationException;
import ladderwell.evidence.Certainty;
import ladderwell.level.Elements;
import ladderwell.numeric.LadderSums;
import ladderwell.numeric.Workers;
import ladderwell.state.Amplitudes;

/** Means and variances of position and momentum at every time, with their errors. @units scaled */
public final class Means {
    private final double[] position;
    private final double[] momentum;
    private final double[] positionVariance;
    private final double[] momentumVariance;
    private final double[] positionVarianceError;
    private final double[] momentumVarianceError;
    private final double positionError;
    private final double momentumError;
    private final Certainty certainty;

    private Means(int times, double positionError, double momentumError, Certainty certainty) {
        position = new double[times];
        momentum = new double[times];
        positionVariance = new double[times];
        momentumVariance = new double[times];
        positionVarianceError = new double[times];
        momentumVarianceError = new double[times];
        this.positionError = positionError;
        this.momentumError = momentumError;
        this.certainty = certainty;
    }

    /** Means for equally spaced levels n + ½, from a, a² and a†a. */
    public static Means onLadder(PhasedState state, Workers workers) {
        Amplitudes amplitudes = state.amplitudes();
        int segments = amplitudes.segments();
        LadderSums[] sums = new LadderSums[segments];
        double sumError = 0;
        for (int s = 0; s < segments; s++) {
            sums[s] = LadderSums.of(state.phases(s), Math.toIntExact(amplitudes.first(s)), workers);
            sumError += sums[s].amplitudeError();
        }
        // ‖aδψ‖ and ‖a†δψ‖: at most √(last+1)·δ on the kept levels, √(Σ (n+1)P_n) on the discarded ones.
        double delta = state.error();
        double top = Math.sqrt(state.lastLevel() + 2.0);
        double tail = Math.sqrt(amplitudes.tailMoment(1));
        double push = top * delta + tail;
        double amplitudeError = sumError + push * (1 + top + tail);
        Means means = new Means(
                state.times(), Math.sqrt(2) * amplitudeError, Math.sqrt(2) * amplitudeError, Certainty.GUARANTEED);
        for (int j = 0; j < state.times(); j++) {
            means.ladderRow(j, sums, push, delta, amplitudeError);
        }
        return means;
    }

    private void ladderRow(int j, LadderSums[] sums, double push, double delta, double amplitudeError) {
        double re = 0;
        double im = 0;
        double norm = 0;
        double fluctuation = 0;
        double squeezing = 0;
        double rounding = 0;
        double offCentre = 0;
        for (LadderSums sum : sums) {
            double ar = sum.amplitudeRe(j);
            double ai = sum.amplitudeIm(j);
            re += ar;
            im += ai;
            norm += sum.norm(j);
            fluctuation += sum.fluctuation(j);
            squeezing += sum.squeezingRe(j);
            rounding += sum.fluctuationError(j);
            if (sums.length > 1) {
                // each segment was summed about its own A_s: undo it, ⟨a†a⟩_s = F_s + (2 − N_s)|A_s|², and likewise for a²
                fluctuation += (2 - sum.norm(j)) * (ar * ar + ai * ai);
                squeezing += (2 - sum.norm(j)) * (ar * ar - ai * ai);
                offCentre += ar * ar + ai * ai;
            }
        }
        if (sums.length > 1) {
            fluctuation -= (2 - norm) * (re * re + im * im);
            squeezing -= (2 - norm) * (re * re - im * im);
            offCentre += re * re + im * im;
        }
        position[j] = Math.sqrt(2) * re;
        momentum[j] = Math.sqrt(2) * im;
        positionVariance[j] = 0.5 + fluctuation + squeezing;
        momentumVariance[j] = 0.5 + fluctuation - squeezing;
        // With b = a − ⟨a⟩~: ‖bδψ‖, ‖b†δψ‖ ≤ drift, ‖bψ̃‖² = ⟨b†b⟩, ‖b†ψ̃‖² ≤ ⟨b†b⟩ + 1; then the mean's own error, squared.
        double drift = push + Math.hypot(re, im) * delta;
        double lowered = Math.sqrt(Math.max(fluctuation, 0));
        double raised = Math.sqrt(Math.max(fluctuation, 0) + 1);
        double error = drift * (2 * lowered + drift)
                + drift * (lowered + raised + drift)
                + 2 * amplitudeError * amplitudeError
                + 2 * rounding
                + 0x1p-50 * (1 + Math.abs(fluctuation) + 16 * offCentre);
        positionVarianceError[j] = error;
        momentumVarianceError[j] = error;
    }

    /** Means for any levels, from the transition elements between the kept ones. */
    public static Means onElements(PhasedState state) {
        int segments = state.amplitudes().segments();
        int size = Math.toIntExact(state.amplitudes().levels());
        long[] kept = new long[size];
        int at = 0;
        for (int s = 0; s < segments; s++) {
            for (int i = 0; i < state.amplitudes().length(s); i++) {
                kept[at++] = state.amplitudes().first(s) + i;
            }
        }
        Elements elements = state.levels().elements(kept);
        // Inside the kept levels an operator is a matrix: |δ⟨A⟩| ≤ 2‖A‖δ, and an element off by ε moves ⟨A⟩ by at most Kε.
        double delta = state.error();
        double x = size * elements.positionError() + 2.01 * norm(elements.positionRows()) * delta;
        double p = size * elements.momentumError() + 2.01 * norm(elements.momentumRows()) * delta;
        double xx = size * elements.positionSquaredError() + 2.01 * norm(elements.positionSquaredRows()) * delta;
        double pp = size * elements.momentumSquaredError() + 2.01 * norm(elements.momentumSquaredRows()) * delta;
        boolean proved = elements.proved() && state.complete();
        Means means = new Means(
                state.times(),
                x + size * 0x1p-51 * norm(elements.positionRows()),
                p + size * 0x1p-51 * norm(elements.momentumRows()),
                proved ? Certainty.GUARANTEED : Certainty.ESTIMATED);
        double[] re = new double[size];
        double[] im = new double[size];
        double[][] rowRe = new double[1][];
        double[][] rowIm = new double[1][];
        for (int j = 0; j < state.times(); j++) {
            if (Thread.interrupted()) {
                throw new CancellationException("interrupted while reading position and momentum");
            }
            at = 0;
            for (int s = 0; s < segments; s++) {
                int count = state.amplitudes().length(s);
                rowRe[0] = new double[count];
                rowIm[0] = new double[count];
                state.phases(s).fill(j, j + 1, rowRe, rowIm);
                System.arraycopy(rowRe[0], 0, re, at, count);
                System.arraycopy(rowIm[0], 0, im, at, count);
                at += count;
            }
            double meanX = form(elements.positionRows(), re, re) + form(elements.positionRows(), im, im);
            // ⟨i|p|j⟩ = i·A with A antisymmetric: Σ c_i* (iA_ij) c_j = −2 Σ re_i A_ij im_j
            double meanP = -2 * form(elements.momentumRows(), re, im);
            double squareX = form(elements.positionSquaredRows(), re, re) + form(elements.positionSquaredRows(), im, im);
            double squareP = form(elements.momentumSquaredRows(), re, re) + form(elements.momentumSquaredRows(), im, im);
            means.position[j] = meanX;
            means.momentum[j] = meanP;
            means.positionVariance[j] = squareX - meanX * meanX;
            means.momentumVariance[j] = squareP - meanP * meanP;
            means.positionVarianceError[j] = xx
                    + (2 * Math.abs(meanX) + means.positionError) * means.positionError
                    + size * 0x1p-51 * norm(elements.positionSquaredRows());
            means.momentumVarianceError[j] = pp
                    + (2 * Math.abs(meanP) + means.momentumError) * means.momentumError
                    + size * 0x1p-51 * norm(elements.momentumSquaredRows());
        }
        return means;
    }

    private static double form(double[][] matrix, double[] left, double[] right) {
        double sum = 0;
        for (int i = 0; i < left.length; i++) {
            double[] row = matrix[i];
            double dot = 0;
            for (int k = 0; k < right.length; k++) {
                dot += row[k] * right[k];
            }
            sum += left[i] * dot;
        }
        return sum;
    }

    /** ‖A‖₂ ≤ the largest row sum of |A_ij|, for a symmetric or antisymmetric matrix. */
    private static double norm(double[][] matrix) {
        double largest = 0;
        for (double[] row : matrix) {
            double sum = 0;
            for (double element : row) {
                sum += Math.abs(element);
            }
            largest = Math.max(largest, sum);
        }
        return largest;
    }

    /** ⟨x⟩ at the j-th time. */
    public double position(int j) {
        return position[j];
    }

    /** ⟨p⟩ at the j-th time. */
    public double momentum(int j) {
        return momentum[j];
    }

    /** Largest error of any ⟨x⟩. */
    public double positionError() {
        return positionError;
    }

    /** Largest error of any ⟨p⟩. */
    public double momentumError() {
        return momentumError;
    }

    /** Δx at the j-th time. */
    public double positionSpread(int j) {
        return Math.sqrt(Math.max(positionVariance[j], 0));
    }

    /** Δp at the j-th time. */
    public double momentumSpread(int j) {
        return Math.sqrt(Math.max(momentumVariance[j], 0));
    }

    /** Error of Δx at the j-th time. */
    public double positionSpreadError(int j) {
        return rootError(positionVariance[j], positionVarianceError[j]);
    }

    /** Error of Δp at the j-th time. */
    public double momentumSpreadError(int j) {
        return rootError(momentumVariance[j], momentumVarianceError[j]);
    }

    /** What the errors are: guaranteed, or estimated where part of the state was discarded and no moment bound is proved. */
    public Certainty certainty() {
        return certainty;
    }

    /** |√a − √b| for |a − b| ≤ error: error/√a, or √error where the value is within its own error. */
    static double rootError(double value, double error) {
        if (value <= error) {
            return Math.sqrt(Math.max(value, 0) + error);
        }
        return error / (Math.sqrt(value) + Math.sqrt(value - error)) * (1 + 1e-12) + Math.ulp(Math.sqrt(value));
    }
}
