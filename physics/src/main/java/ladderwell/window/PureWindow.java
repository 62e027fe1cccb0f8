package ladderwell.window;

import ladderwell.evidence.Bound;

/** Amplitudes on consecutive levels. Immutable; the arrays are handed out themselves for hot loops: read only. */
public final class PureWindow implements WindowState {
    private final long first;
    private final double[] re;
    private final double[] im;
    private final Bound error;

    PureWindow(long first, double[] re, double[] im, Bound error) {
        this.first = first;
        this.re = re;
        this.im = im;
        this.error = error;
    }

    @Override
    public long first() {
        return first;
    }

    @Override
    public int levels() {
        return re.length;
    }

    /** Real parts of the amplitudes, the array itself. */
    public double[] reals() {
        return re;
    }

    /** Imaginary parts of the amplitudes, the array itself. */
    public double[] imaginaries() {
        return im;
    }

    @Override
    public Bound error() {
        return error;
    }

    @Override
    public Bound traceNormError() {
        // ‖ |φ⟩⟨φ| − |ψ⟩⟨ψ| ‖₁ ≤ (‖φ‖ + ‖ψ‖) ‖φ − ψ‖
        return error.times(2 + error.size());
    }

    @Override
    public double population(int i) {
        return re[i] * re[i] + im[i] * im[i];
    }

    @Override
    public double[] lowering(int k) {
        double sumRe = 0;
        double sumIm = 0;
        for (int i = 0; i + k < re.length; i++) {
            double root = Roots.of(first + i, k);
            sumRe += root * (re[i] * re[i + k] + im[i] * im[i + k]);
            sumIm += root * (re[i] * im[i + k] - im[i] * re[i + k]);
        }
        return new double[] {sumRe, sumIm};
    }

    @Override
    public double trace() {
        double sum = 0;
        for (int i = 0; i < re.length; i++) {
            sum += population(i);
        }
        return sum;
    }

    @Override
    public double purity() {
        double trace = trace();
        return trace * trace;
    }
}
