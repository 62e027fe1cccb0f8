package ladderwell.window;

import java.util.function.LongToDoubleFunction;
import ladderwell.evidence.Bound;
import ladderwell.operator.LadderPolynomial;
import ladderwell.state.Amplitudes;

/** A state on a window of number levels at one time. */
public sealed interface WindowState permits PureWindow, MixedWindow {

    /** First level of the window. */
    long first();

    /** Number of levels. */
    int levels();

    /** Error of the state: ‖ψ − ψ̃‖ of a vector, ‖ρ − ρ̃‖₁ of a density operator. */
    Bound error();

    /** ‖ρ − ρ̃‖₁ of the state as a density operator. */
    Bound traceNormError();

    /** Probability of level first() + i as computed. */
    double population(int i);

    /** Real part of ⟨first() + m|ρ|first() + n⟩ as computed. */
    double re(int m, int n);

    /** Imaginary part of it. */
    double im(int m, int n);

    /**
     * tr(P ρ) as computed.
     *
     * @return real part, imaginary part
     */
    default double[] mean(LadderPolynomial operator) {
        double sumRe = 0;
        double sumIm = 0;
        int size = levels();
        for (int b = -Math.min(operator.lowers(), size - 1); b <= Math.min(operator.raises(), size - 1); b++) {
            int count = size - Math.abs(b);
            int from = Math.max(0, -b);
            double[] re = new double[count];
            double[] im = new double[count];
            operator.band(b, first() + from, re, im);
            for (int i = 0; i < count; i++) {
                // ⟨n + b|P|n⟩ ⟨n|ρ|n + b⟩
                double rhoRe = re(from + i, from + i + b);
                double rhoIm = im(from + i, from + i + b);
                sumRe += re[i] * rhoRe - im[i] * rhoIm;
                sumIm += re[i] * rhoIm + im[i] * rhoRe;
            }
        }
        return new double[] {sumRe, sumIm};
    }

    /** ⟨φ|ρ|φ⟩ as computed. */
    double fidelity(Amplitudes phi);

    /** tr ρ as computed. */
    double trace();

    /** tr ρ² as computed. */
    double purity();

    /** Σ f(n) p_n over the window as computed. */
    default double diagonalMean(LongToDoubleFunction f) {
        double sum = 0;
        for (int i = 0; i < levels(); i++) {
            sum += f.applyAsDouble(first() + i) * population(i);
        }
        return sum;
    }
}
