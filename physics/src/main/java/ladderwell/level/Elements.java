package ladderwell.level;

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
    private final double positionError;
    private final double positionSquaredError;
    private final double momentumError;
    private final double momentumSquaredError;
    private final boolean proved;

    Elements(
            long[] levels,
            double[][] position,
            double[][] positionSquared,
            double[][] momentum,
            double[][] momentumSquared,
            double[] errors,
            boolean proved) {
        this.levels = levels.clone();
        this.position = position;
        this.positionSquared = positionSquared;
        this.momentum = momentum;
        this.momentumSquared = momentumSquared;
        this.positionError = errors[0];
        this.positionSquaredError = errors[1];
        this.momentumError = errors[2];
        this.momentumSquaredError = errors[3];
        this.proved = proved;
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

    /** Largest absolute error of any ⟨i|x|j⟩. */
    public double positionError() {
        return positionError;
    }

    /** Largest absolute error of any ⟨i|x²|j⟩. */
    public double positionSquaredError() {
        return positionSquaredError;
    }

    /** Largest absolute error of any ⟨i|p|j⟩. */
    public double momentumError() {
        return momentumError;
    }

    /** Largest absolute error of any ⟨i|p²|j⟩. */
    public double momentumSquaredError() {
        return momentumSquaredError;
    }

    /** Whether the four errors are guaranteed (true) or estimated (false). */
    public boolean proved() {
        return proved;
    }
}
