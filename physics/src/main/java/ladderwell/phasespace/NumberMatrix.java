package ladderwell.phasespace;

import ladderwell.evidence.Bound;
import ladderwell.numeric.HermiteFunctions;
import ladderwell.numeric.HermitianForm;
import ladderwell.state.DensityOperator;

/** A mixed state on a window of harmonic levels, given by its density operator. Not to be shared between threads: it keeps work arrays. */
public final class NumberMatrix implements PhaseState {
    private final int first;
    private final int size;
    private final HermitianForm form;
    private final double trace;
    private final double frobenius;
    private final Bound traceNormError;
    private final double[] populations;

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

    /** A square about the orbit of the level above which less than the share lies. */
    @Override
    public Support visible(double share) {
        double above = 0;
        int m = size - 1;
        while (m > 0 && above + Math.abs(populations[m]) <= share) {
            above += Math.abs(populations[m]);
            m--;
        }
        double reach = Math.sqrt(2.0 * (first + m) + 1) + 3;
        return new Support(-reach, reach, -reach, reach, Bound.estimated(Math.sqrt(share)));
    }
}
