package ladderwell.phasespace;

import ladderwell.numeric.HermitianTransform;

/** The correlations f_k = ρ(s + kd, s − kd) of a state, s the middle of a row of a {@link Lattice}. */
interface Correlations extends HermitianTransform.Rows {
    /** The lattice they were taken on. */
    Lattice lattice();

    /** Bound on Σ_k |f̃_k − f_k| d over all k of both signs, of any row: by errors of the samples and their rounding. */
    double rowError();

    /** Bound on Σ_k |f_k| d over all k of both signs, of any row. */
    double rowSize();
}
