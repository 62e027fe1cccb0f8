package ladderwell.level;

import java.util.function.LongFunction;
import ladderwell.numeric.DoubleDouble;

/** Number states of a harmonic mode with energies of another law. */
final class DiagonalLevels implements Levels {
    private final HarmonicLevels harmonic = new HarmonicLevels();
    private final LongFunction<DoubleDouble> energies;
    private final double relativeError;

    DiagonalLevels(LongFunction<DoubleDouble> energies, double relativeError) {
        this.energies = energies;
        this.relativeError = relativeError;
    }

    @Override
    public Kind kind() {
        return Kind.GENERAL;
    }

    @Override
    public boolean alternates() {
        return true;
    }

    @Override
    public long count() {
        return harmonic.count();
    }

    @Override
    public double energyHigh(long n) {
        return energies.apply(n).hi();
    }

    @Override
    public double energyLow(long n) {
        return energies.apply(n).lo();
    }

    @Override
    public double energyError(long n) {
        return relativeError * Math.abs(energyHigh(n));
    }

    @Override
    public double threshold() {
        return harmonic.threshold();
    }

    @Override
    public double binding(long n) {
        return harmonic.binding(n);
    }

    @Override
    public double decay(long n) {
        return harmonic.decay(n);
    }

    @Override
    public double decayError(long n) {
        return harmonic.decayError(n);
    }

    @Override
    public double[][] waveFunctions(long first, int count, double[] x) {
        return harmonic.waveFunctions(first, count, x);
    }

    @Override
    public double waveFunctionError(long last) {
        return harmonic.waveFunctionError(last);
    }

    @Override
    public double reach(long n, double drop) {
        return harmonic.reach(n, drop);
    }

    @Override
    public Elements elements(long[] levels) {
        return harmonic.elements(levels);
    }
}
