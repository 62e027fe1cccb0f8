package ladderwell.window;

import ladderwell.evidence.Bound;
import ladderwell.state.Amplitudes;

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
    public double re(int m, int n) {
        return re[m] * re[n] + im[m] * im[n];
    }

    @Override
    public double im(int m, int n) {
        return im[m] * re[n] - re[m] * im[n];
    }

    /**
     * ⟨φ|ψ⟩ as computed.
     *
     * @return real part, imaginary part
     */
    public double[] overlap(Amplitudes phi) {
        double sumRe = 0;
        double sumIm = 0;
        for (int s = 0; s < phi.segments(); s++) {
            for (int i = 0; i < phi.length(s); i++) {
                long n = phi.first(s) + i - first;
                if (n >= 0 && n < re.length) {
                    double a = phi.re(s, i);
                    double b = phi.im(s, i);
                    sumRe += a * re[(int) n] + b * im[(int) n];
                    sumIm += a * im[(int) n] - b * re[(int) n];
                }
            }
        }
        return new double[] {sumRe, sumIm};
    }

    @Override
    public double fidelity(Amplitudes phi) {
        double[] overlap = overlap(phi);
        return overlap[0] * overlap[0] + overlap[1] * overlap[1];
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
