package ladderwell.level;

import java.util.function.DoubleUnaryOperator;
import ladderwell.evidence.Bound;
import ladderwell.evidence.Certainty;

/**
 * Levels of a potential that is itself known only within ±off everywhere: no level moves by more than that (Weyl), and wave functions mix by at most
 * as much over the distance to the next level.
 */
final class UncertainLevels implements Levels {
    private final Levels levels;
    private final double off;

    UncertainLevels(Levels levels, double off) {
        if (!(off > 0 && off <= Double.MAX_VALUE)) {
            throw new IllegalArgumentException(
                    "the uncertainty of a potential must be positive and finite, got " + off);
        }
        this.levels = levels;
        this.off = off;
    }

    @Override
    public Kind kind() {
        return Kind.GENERAL;
    }

    @Override
    public boolean alternates() {
        return levels.alternates();
    }

    @Override
    public boolean hasWaveFunctions() {
        return levels.hasWaveFunctions();
    }

    @Override
    public long count() {
        return levels.count();
    }

    @Override
    public double energyHigh(long n) {
        return levels.energyHigh(n);
    }

    @Override
    public double energyLow(long n) {
        return levels.energyLow(n);
    }

    @Override
    public double energyError(long n) {
        return levels.energyError(n) + off;
    }

    @Override
    public Bound energyBound(long n) {
        return new Bound(Certainty.STATISTICAL, energyError(n));
    }

    @Override
    public double[] energies(long first, int count) {
        return levels.energies(first, count);
    }

    @Override
    public long countBelow(double energy) {
        return levels.countBelow(energy);
    }

    @Override
    public double threshold() {
        return levels.threshold();
    }

    @Override
    public double binding(long n) {
        return levels.binding(n);
    }

    @Override
    public double decay(long n) {
        return levels.decay(n);
    }

    @Override
    public double decayError(long n) {
        double binding = binding(n);
        return Double.isInfinite(binding) ? 0 : levels.decayError(n) + off / binding;
    }

    @Override
    public double[][] waveFunctions(long first, int count, double[] x) {
        return levels.waveFunctions(first, count, x);
    }

    /** Share of other levels that the uncertainty can mix in. */
    private double mixed(long n) {
        double gap = n + 1 < count() ? levels.energyHigh(n + 1) - levels.energyHigh(n) : binding(n);
        if (n > 0) {
            gap = Math.min(gap, levels.energyHigh(n) - levels.energyHigh(n - 1));
        }
        return gap > 0 ? Math.min(2, 2 * off / gap) : 2;
    }

    @Override
    public double waveFunctionError(long last) {
        double worst = 0;
        for (long n = Math.max(0, last - 3); n <= last; n++) {
            worst = Math.max(worst, mixed(n));
        }
        double wide = 2 * reach(last, 1e-3);
        // a function of norm f that changes over a wavelength is at most about f √(waves per length)
        return levels.waveFunctionError(last) + worst * Math.sqrt(2 * (last + 2) / wide);
    }

    @Override
    public double reach(long n, double drop) {
        return levels.reach(n, drop);
    }

    @Override
    public double[] extent(long n, double drop) {
        return levels.extent(n, drop);
    }

    @Override
    public Elements elements(long[] list) {
        double worst = 0;
        for (long n : list) {
            worst = Math.max(worst, mixed(n));
        }
        return levels.elements(list).loosened(4 * worst);
    }

    @Override
    public Element element(long m, long n, DoubleUnaryOperator f) {
        Element element = levels.element(m, n, f);
        double size = Math.sqrt(Math.abs(
                        levels.element(m, m, x -> Math.abs(f.applyAsDouble(x))).value())
                * Math.abs(
                        levels.element(n, n, x -> Math.abs(f.applyAsDouble(x))).value()));
        return new Element(
                element.value(),
                new Bound(Certainty.STATISTICAL, element.bound().size() + 2 * size * (mixed(m) + mixed(n))));
    }

    @Override
    public String toString() {
        return levels + " known within " + off;
    }
}
