package ladderwell.level;

import ladderwell.evidence.Bound;
import ladderwell.evidence.Certainty;

/**
 * Transition elements between a list of levels, as real matrices [i][j] over the list.
 *
 * <p>⟨i|x|j⟩, ⟨i|x²|j⟩ and ⟨i|p²|j⟩ are real and symmetric; ⟨i|p|j⟩ = i · momentum(i, j) with momentum real and
 * antisymmetric. p² is the quadratic form ⟨φ_i′|φ_j′⟩. Scaled units, ħ = 1.
 *
 * <p>Rows from {@code …Rows()} are the arrays themselves, for hot loops: read only.
 */
public final class Elements {
    private final long[] levels;
    private final double[][] position;
    private final double[][] positionSquared;
    private final double[][] momentum;
    private final double[][] momentumSquared;
    private final Bound positionBound;
    private final Bound positionSquaredBound;
    private final Bound momentumBound;
    private final Bound momentumSquaredBound;

    Elements(
            long[] levels,
            double[][] position,
            double[][] positionSquared,
            double[][] momentum,
            double[][] momentumSquared,
            double[] errors) {
        this(levels, position, positionSquared, momentum, momentumSquared, errors, Certainty.GUARANTEED);
    }

    Elements(
            long[] levels,
            double[][] position,
            double[][] positionSquared,
            double[][] momentum,
            double[][] momentumSquared,
            double[] errors,
            Certainty certainty) {
        this.levels = levels.clone();
        this.position = position;
        this.positionSquared = positionSquared;
        this.momentum = momentum;
        this.momentumSquared = momentumSquared;
        positionBound = new Bound(certainty, errors[0]);
        positionSquaredBound = new Bound(certainty, errors[1]);
        momentumBound = new Bound(certainty, errors[2]);
        momentumSquaredBound = new Bound(certainty, errors[3]);
    }

    /** The same with every element off by this much more of the largest of its kind; statistical. */
    Elements loosened(double relative) {
        double[][][] all = {position, positionSquared, momentum, momentumSquared};
        double[] errors = {
            positionBound.size(), positionSquaredBound.size(), momentumBound.size(), momentumSquaredBound.size()
        };
        for (int k = 0; k < all.length; k++) {
            double largest = 0;
            for (double[] row : all[k]) {
                for (double element : row) {
                    largest = Math.max(largest, Math.abs(element));
                }
            }
            errors[k] += relative * largest;
        }
        return new Elements(
                levels, position, positionSquared, momentum, momentumSquared, errors, Certainty.STATISTICAL);
    }

    /** Number of levels in the list. */
    public int size() {
        return levels.length;
    }

    /** The i-th level of the list. */
    public long level(int i) {
        return levels[i];
    }

    /** ⟨i|x|j⟩. */
    public double position(int i, int j) {
        return position[i][j];
    }

    /** ⟨i|x²|j⟩. */
    public double positionSquared(int i, int j) {
        return positionSquared[i][j];
    }

    /** The real number A of ⟨i|p|j⟩ = i·A (first i the imaginary unit). */
    public double momentum(int i, int j) {
        return momentum[i][j];
    }

    /** ⟨i|p²|j⟩. */
    public double momentumSquared(int i, int j) {
        return momentumSquared[i][j];
    }

    /** Rows of ⟨i|x|j⟩, the arrays themselves; read only. */
    public double[][] positionRows() {
        return position;
    }

    /** Rows of ⟨i|x²|j⟩, the arrays themselves; read only. */
    public double[][] positionSquaredRows() {
        return positionSquared;
    }

    /** Rows of {@link #momentum}, the arrays themselves; read only. */
    public double[][] momentumRows() {
        return momentum;
    }

    /** Rows of ⟨i|p²|j⟩, the arrays themselves; read only. */
    public double[][] momentumSquaredRows() {
        return momentumSquared;
    }

    /** How far any ⟨i|x|j⟩ can be off. */
    public Bound positionBound() {
        return positionBound;
    }

    /** How far any ⟨i|x²|j⟩ can be off. */
    public Bound positionSquaredBound() {
        return positionSquaredBound;
    }

    /** How far any ⟨i|p|j⟩ can be off. */
    public Bound momentumBound() {
        return momentumBound;
    }

    /** How far any ⟨i|p²|j⟩ can be off. */
    public Bound momentumSquaredBound() {
        return momentumSquaredBound;
    }

    /** Size of {@link #positionBound}. */
    public double positionError() {
        return positionBound.size();
    }

    /** Size of {@link #positionSquaredBound}. */
    public double positionSquaredError() {
        return positionSquaredBound.size();
    }

    /** Size of {@link #momentumBound}. */
    public double momentumError() {
        return momentumBound.size();
    }

    /** Size of {@link #momentumSquaredBound}. */
    public double momentumSquaredError() {
        return momentumSquaredBound.size();
    }

    /** Whether all four bounds are guaranteed. */
    public boolean proved() {
        return positionBound.isGuaranteed()
                && positionSquaredBound.isGuaranteed()
                && momentumBound.isGuaranteed()
                && momentumSquaredBound.isGuaranteed();
    }
}
