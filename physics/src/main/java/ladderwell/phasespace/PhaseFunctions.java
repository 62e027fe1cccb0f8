package ladderwell.phasespace;

import ladderwell.evidence.Bound;
import ladderwell.numeric.HermitianTransform;
import org.jspecify.annotations.Nullable;

/**
 * Computes Wigner and Husimi functions. Tables of cosines are kept from one state to the next on the same grid, so a film costs less than its
 * frames one by one; not to be shared between threads.
 *
 * @accuracy the bound of each {@link PhaseField}: |W − W̃| ≤ ‖ρ − ρ̃‖₁/π for what the state leaves out, the state's parts outside its support, and
 *     rounding
 */
public final class PhaseFunctions {
    /** Times the norm outside the support, for both ends of the sum over y and for all images in momentum: see {@link Support#missed}. */
    private static final double OUTSIDE = 14;

    private @Nullable HermitianTransform transform;

    /** Nothing is computed before a function is asked for. */
    public PhaseFunctions() {}

    /** The Wigner function of a state. */
    public PhaseField wigner(PhaseState state, PhaseGrid grid) {
        if (state instanceof Displaced away) {
            return moved(wigner(away.state(), away.back(grid)), away, grid);
        }
        return state instanceof WaveFunction wave ? wigner(wave, grid) : wigner((NumberMatrix) state, grid);
    }

    /**
     * The Husimi function of a state.
     *
     * @param width that of the coherent states it is a mean over: |⟨x|α⟩|² ∝ e^{−(x−x₀)²/width²}; 1 for those of the harmonic oscillator
     */
    public PhaseField husimi(PhaseState state, PhaseGrid grid, double width) {
        if (state instanceof Displaced away) {
            return moved(husimi(away.state(), away.back(grid), width), away, grid);
        }
        return state instanceof WaveFunction wave
                ? husimi(wave, grid, width)
                : husimi((NumberMatrix) state, grid, width);
    }

    /**
     * ∫|W| dx dp − 1 of a state, from its Wigner function on a grid; of one harmonic level from its radial form, at any grid.
     *
     * @param grid one that covers the state and follows its fringes
     */
    public PhaseField.Reading negativity(PhaseState state, PhaseGrid grid) {
        if (state instanceof Displaced away) {
            return negativity(away.state(), away.back(grid));
        }
        if (state instanceof NumberWave wave
                && wave.singleLevel().orElse(Integer.MAX_VALUE) <= Negativity.HIGHEST_LEVEL) {
            return Negativity.ofLevel(wave.singleLevel().getAsInt());
        }
        return wigner(state, grid).negativity();
    }

    /** The Wigner function of a pure state. */
    public PhaseField wigner(WaveFunction wave, PhaseGrid grid) {
        Correlations correlations = new PureCorrelations(wave, lattice(grid, wave.support()));
        return wigner(correlations, grid, wave.sampleError(), missed(wave, grid));
    }

    /** The Wigner function of a mixed state. */
    public PhaseField wigner(NumberMatrix state, PhaseGrid grid) {
        Correlations correlations = new MixedCorrelations(state, lattice(grid, state.support()));
        return wigner(correlations, grid, Bound.estimated(0), missed(state, grid));
    }

    /**
     * The Husimi function of a pure state.
     *
     * @param width that of the coherent states it is a mean over: |⟨x|α⟩|² ∝ e^{−(x−x₀)²/width²}; 1 for those of the harmonic oscillator
     */
    public PhaseField husimi(WaveFunction wave, PhaseGrid grid, double width) {
        checkWidth(width);
        Support support = wave.support();
        Lattice lattice = Lattice.of(grid, support, 0, grid.stepX(), 2 * Math.PI, CoherentOverlaps.REACH / width);
        CoherentOverlaps real = CoherentOverlaps.of(wave, lattice, width);
        double factor = lattice.step() / Math.sqrt(Math.sqrt(Math.PI) * width);
        double[][] values = sums(real, lattice.step() / 2, factor, grid);
        double[][] imaginary = sums(real.imaginary(), lattice.step() / 2, factor, grid);
        for (int i = 0; i < grid.nx(); i++) {
            for (int j = 0; j < grid.np(); j++) {
                values[i][j] = (values[i][j] * values[i][j] + imaginary[i][j] * imaginary[i][j]) / (2 * Math.PI);
            }
        }
        return new PhaseField(PhaseField.Kind.HUSIMI, grid, values, overlapBound(wave, grid, lattice, width));
    }

    /** Of |⟨α|ψ⟩|²/2π, whose overlap is below 1: errors of the state count by their norm, those of samples by the Gaussian's area. */
    private static Bound overlapBound(WaveFunction wave, PhaseGrid grid, Lattice lattice, double width) {
        // ∫|g| over a Gaussian of norm 1, and by Cauchy and Schwarz for what is summed
        double area = Math.sqrt(2 * Math.sqrt(Math.PI) * width);
        int longest = (int) Math.ceil(CoherentOverlaps.REACH * width / lattice.step()) + 1;
        double rounding = area * wave.sampleError().size()
                + 1.5 * HermitianTransform.errorFactor(longest)
                + misplaced(grid, wave.support())
                + 2e-16;
        Bound overlap = wave.stateError()
                .plus(wave.support().missed().times(OUTSIDE))
                .plus(new Bound(wave.sampleError().kind(), rounding));
        double off = overlap.size();
        return new Bound(overlap.kind(), Math.nextUp((2 + off) * off / (2 * Math.PI)));
    }

    /** The Husimi function of a mixed state. */
    public PhaseField husimi(NumberMatrix state, PhaseGrid grid, double width) {
        Correlations correlations = new MixedCorrelations(state, smoothedLattice(grid, state.support(), width));
        return husimi(correlations, grid, width, Bound.estimated(0), missed(state, grid));
    }

    /** Values found at the points seen from a displaced state, put back where they belong. */
    private static PhaseField moved(PhaseField field, Displaced away, PhaseGrid grid) {
        Support box = away.support();
        // D(δ) moves a state by at most |δx| √⟨p²⟩ + |δp| √⟨x²⟩, seen from the state itself.
        double reach = box.right() - box.left() + box.high() - box.low();
        double off = 2 * away.uncertainty() * reach + misplaced(grid, box);
        return field.on(grid, field.bound().plus(off / Math.PI));
    }

    private static Lattice lattice(PhaseGrid grid, Support support) {
        return Lattice.of(grid, support, 0, grid.stepX(), Math.PI, 0);
    }

    private static void checkWidth(double width) {
        if (!(width > 0) || Double.isInfinite(width)) {
            throw new IllegalArgumentException("the width of coherent states is positive and finite, not " + width);
        }
    }

    private static Lattice smoothedLattice(PhaseGrid grid, Support support, double width) {
        checkWidth(width);
        // Correlations swing in s at up to the difference of the state's momenta; a sum with this spacing folds them
        // with the Gaussian as the integral does, within e^{−6.1²}.
        double spacing = 2 * Math.PI / (support.high() - support.low() + 2 * Smoothed.REACH / width);
        return Lattice.of(grid, support, Smoothed.REACH * width, spacing, Math.PI, Smoothed.REACH / width);
    }

    private static Bound missed(WaveFunction wave, PhaseGrid grid) {
        Bound state = wave.stateError();
        Support support = wave.support();
        return new Bound(state.kind(), (2 + state.size()) * state.size())
                .plus(support.missed().times(OUTSIDE))
                .plus(misplaced(grid, support));
    }

    private static Bound missed(NumberMatrix state, PhaseGrid grid) {
        Support support = state.support();
        return state.traceNormError().plus(support.missed().times(OUTSIDE)).plus(misplaced(grid, support));
    }

    private PhaseField wigner(Correlations correlations, PhaseGrid grid, Bound rounding, Bound missed) {
        double step = correlations.lattice().step();
        double[][] values = sums(correlations, step, step / Math.PI, grid);
        return new PhaseField(PhaseField.Kind.WIGNER, grid, values, bound(correlations, rounding, missed));
    }

    /**
     * What the rounding of the points themselves can do: W changes by at most 2/π times a shift in x times the root of ⟨(p̂ − p)²⟩, and likewise
     * in p.
     */
    private static double misplaced(PhaseGrid grid, Support support) {
        double x = 1.5 * Math.ulp(Math.abs(grid.x()) + grid.halfX());
        double p = 1.5 * Math.ulp(Math.abs(grid.p()) + grid.halfP());
        double momenta = Math.max(support.high() - grid.p(), grid.p() - support.low()) + grid.halfP();
        double positions = Math.max(support.right() - grid.x(), grid.x() - support.left()) + grid.halfX();
        return 2 * (x * momenta + p * positions);
    }

    private PhaseField husimi(Correlations correlations, PhaseGrid grid, double width, Bound rounding, Bound missed) {
        double step = correlations.lattice().step();
        double[][] values = sums(new Smoothed(correlations, width), step, step / Math.PI, grid);
        Bound bound = bound(correlations, rounding, missed).plus(1e-16);
        return new PhaseField(PhaseField.Kind.HUSIMI, grid, values, bound);
    }

    private double[][] sums(HermitianTransform.Rows rows, double step, double factor, PhaseGrid grid) {
        HermitianTransform table = transform;
        if (table == null || !table.isFor(step, grid.stepP(), grid.p(), grid.np())) {
            table = new HermitianTransform(step, grid.stepP(), grid.p(), grid.np());
            transform = table;
        }
        double[][] values = new double[grid.nx()][grid.np()];
        table.transform(rows, grid.nx(), factor, values);
        return values;
    }

    private static Bound bound(Correlations correlations, Bound rounding, Bound missed) {
        Lattice lattice = correlations.lattice();
        double sums = correlations.rowError()
                + correlations.rowSize() * HermitianTransform.errorFactor(lattice.points() / 2 + 1);
        return missed.plus(new Bound(rounding.kind(), sums)).times(1 / Math.PI);
    }
}
