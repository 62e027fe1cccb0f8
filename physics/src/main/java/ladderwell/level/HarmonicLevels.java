package ladderwell.level;

final class HarmonicLevels implements Levels {

    @Override public long count() { throw new UnsupportedOperationException(); }
    @Override public double energyHigh(long n) { throw new UnsupportedOperationException(); }
    @Override public double energyLow(long n) { throw new UnsupportedOperationException(); }
    @Override public double energyError(long n) { throw new UnsupportedOperationException(); }
    @Override public double threshold() { throw new UnsupportedOperationException(); }
    @Override public double binding(long n) { throw new UnsupportedOperationException(); }
    @Override public double decay(long n) { throw new UnsupportedOperationException(); }
    @Override public double decayError(long n) { throw new UnsupportedOperationException(); }
    @Override public double[][] waveFunctions(long first, int count, double[] x) { throw new UnsupportedOperationException(); }
    @Override public double waveFunctionError(long last) { throw new UnsupportedOperationException(); }
    @Override public double reach(long n, double drop) { throw new UnsupportedOperationException(); }
    @Override public Elements elements(long[] levels) { throw new UnsupportedOperationException(); }
}
