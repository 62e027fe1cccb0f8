package ladderwell.level;

/** A potential that binds nothing: every level is refused. */
final class NoLevels implements Levels {
    @Override
    public Kind kind() {
        return Kind.GENERAL;
    }

    @Override
    public long count() {
        return 0;
    }

    private static IllegalArgumentException none() {
        return new IllegalArgumentException("this potential has no bound level; expected one that binds");
    }

    @Override
    public double energyHigh(long n) {
        throw none();
    }

    @Override
    public double energyLow(long n) {
        throw none();
    }

    @Override
    public double energyError(long n) {
        throw none();
    }

    @Override
    public long countBelow(double energy) {
        Points.checkEnergy(energy);
        return 0;
    }

    @Override
    public double threshold() {
        return Double.POSITIVE_INFINITY;
    }

    @Override
    public double binding(long n) {
        throw none();
    }

    @Override
    public double decay(long n) {
        throw none();
    }

    @Override
    public double decayError(long n) {
        throw none();
    }

    @Override
    public double[][] waveFunctions(long first, int count, double[] x) {
        throw none();
    }

    @Override
    public double waveFunctionError(long last) {
        throw none();
    }

    @Override
    public double reach(long n, double drop) {
        throw none();
    }

    @Override
    public Elements elements(long[] levels) {
        throw none();
    }

    @Override
    public String toString() {
        return "no levels";
    }
}
