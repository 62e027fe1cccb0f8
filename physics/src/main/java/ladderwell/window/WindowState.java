package ladderwell.window;

import java.util.function.LongToDoubleFunction;
import ladderwell.evidence.Bound;

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

    /** ⟨a^k⟩ as computed: real part, then imaginary part. */
    double[] lowering(int k);

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
