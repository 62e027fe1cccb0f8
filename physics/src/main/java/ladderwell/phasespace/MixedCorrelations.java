package ladderwell.phasespace;

import ladderwell.numeric.HermiteFunctions;
import ladderwell.numeric.HermitianForm;

/** ρ(s + kd, s − kd) = Σ φ_m(s + kd) ρ_mn φ_n(s − kd) on harmonic levels. */
final class MixedCorrelations implements Correlations {
    private static final double U = 0x1p-53;
    /** A position where every function is 0. */
    private static final double FAR = 1e6;

    private final NumberMatrix state;
    private final Lattice lattice;

    MixedCorrelations(NumberMatrix state, Lattice lattice) {
        this.state = state;
        this.lattice = lattice;
        int modulus = 2 * lattice.rowStep();
        int leastSum = 2 * (lattice.middle(0) - lattice.from());
        int greatestSum = 2 * (lattice.middle(lattice.rows() - 1) - lattice.from());
        HermitianForm.Functions functions = (places, table) -> {
            double[] x = new double[places.length];
            for (int i = 0; i < x.length; i++) {
                x[i] = places[i] < 0 ? FAR : lattice.origin() + (lattice.from() + places[i]) * lattice.step();
            }
            HermiteFunctions.window(state.first(), x, table);
        };
        state.form().pairs(functions, lattice.points(), modulus, leastSum, leastSum, greatestSum);
    }

    @Override
    public Lattice lattice() {
        return lattice;
    }

    @Override
    public int length(int row) {
        return lattice.length(row);
    }

    @Override
    public void fill(int row, int from, int count, double[] re, double[] im) {
        state.form().fill(lattice.middle(row) - lattice.from(), from, count, re, im);
    }

    @Override
    public double rowError() {
        int size = state.form().size();
        // Σ_m φ_m² integrates to the number of levels; both products round once a level; and each function is off by
        // its table's error, on either side.
        double range = lattice.points() * lattice.step();
        double rounding = 2.0 * (size + 3) * U * size;
        double tables = 2 * Math.sqrt(range) * size * HermiteFunctions.errorBound(state.first() + size - 1);
        return 1.01 * state.frobenius() * (rounding + tables);
    }

    @Override
    public double rowSize() {
        return 1.01 * (state.trace() + state.traceNormError().size());
    }
}
