package ladderwell.level;

import java.util.function.DoubleUnaryOperator;
import ladderwell.evidence.Bound;
import ladderwell.evidence.Certainty;
import org.jspecify.annotations.Nullable;

/**
 * Levels of a polynomial: an oscillator basis with proved bounds for the first {@value #BASIS}, shooting for the rest and for what needs the
 * wave function where it is tiny.
 */
final class PolynomialLevels implements Levels {
    /** Up to here the basis is quicker than shooting(). */
    static final int BASIS = 128;

    /** A basis serves 8, 16, 32, 64 or 128 levels; steeper walls begin with more, whose frequency suits them better. */
    private static final int SMALLEST = 3;

    private final Polynomial polynomial;
    private final @Nullable BasisBlock[] blocks = new BasisBlock[8];
    private @Nullable ShootingLevels shooting;
    /** The levels asked for last, of a potential that grows steadily; with vectors once those were asked for. */
    private @Nullable BasisBlock quick;

    private boolean quickHasVectors;

    PolynomialLevels(double[] coefficients) {
        polynomial = new Polynomial(coefficients);
    }

    private record Curve(Polynomial polynomial) implements PotentialCurve {
        @Override
        public double value(double x) {
            double value = polynomial.value(x);
            // Far out terms overflow with either sign; the highest decides.
            return Double.isNaN(value) ? Double.POSITIVE_INFINITY : value;
        }

        @Override
        public double left() {
            return Double.NEGATIVE_INFINITY;
        }

        @Override
        public double right() {
            return Double.POSITIVE_INFINITY;
        }

        @Override
        public double[] breaks() {
            return new double[0];
        }

        @Override
        public boolean isEven() {
            return polynomial.even();
        }
    }

    @Override
    public Kind kind() {
        return Kind.GENERAL;
    }

    @Override
    public boolean alternates() {
        return polynomial.even();
    }

    @Override
    public double[] extent(long n, double drop) {
        return polynomial.even() ? Levels.super.extent(n, drop) : shooting().extent(n, drop);
    }

    @Override
    public long count() {
        return Long.MAX_VALUE;
    }

    private synchronized ShootingLevels shooting() {
        ShootingLevels made = shooting;
        if (made == null) {
            made = new ShootingLevels(new Curve(polynomial));
            shooting = made;
        }
        return made;
    }

    private synchronized BasisBlock block(long n) {
        int steep = Math.min(2, Math.max(0, polynomial.degree() / 2 - 3));
        int power = Math.max(SMALLEST + steep, 64 - Long.numberOfLeadingZeros(n));
        BasisBlock block = blocks[power];
        if (block == null) {
            block = BasisBlock.of(polynomial, 1 << power, true);
            blocks[power] = block;
        }
        return block;
    }

    private synchronized BasisBlock quick(int count) {
        BasisBlock block = quick;
        if (block == null || block.count() < count) {
            block = BasisBlock.of(polynomial, count, false);
            quick = block;
            quickHasVectors = false;
        }
        return block;
    }

    private synchronized BasisBlock quickWithVectors(int count) {
        BasisBlock block = quick(count);
        if (!quickHasVectors) {
            block = block.withVectors();
            quick = block;
            quickHasVectors = true;
        }
        return block;
    }

    /** Whether the basis serves the levels up to n: few enough, and their bounds proved. */
    private boolean small(long n) {
        Points.checkLevel(n, Long.MAX_VALUE);
        return n < BASIS && block(n).isProved();
    }

    @Override
    public double energyHigh(long n) {
        return small(n) ? block(n).proved().quotient()[(int) n] : shooting().energyHigh(n);
    }

    @Override
    public double energyLow(long n) {
        Points.checkLevel(n, Long.MAX_VALUE);
        return 0;
    }

    @Override
    public double energyError(long n) {
        return energyBound(n).size();
    }

    @Override
    public Bound energyBound(long n) {
        if (!small(n)) {
            return shooting().energyBound(n);
        }
        return Bound.guaranteed(block(n).proved().error()[(int) n]);
    }

    @Override
    public double[] energies(long first, int count) {
        Points.check(first, count, Long.MAX_VALUE, new double[0]);
        double[] energies = new double[count];
        // The quick values are as good only where the matrix grows steadily from its lowest element on.
        boolean quick = polynomial.monotone();
        int few = (int) Math.max(0, Math.min(count, BASIS - first));
        if (few > 0 && !quick && !small(first + few - 1)) {
            few = 0;
        }
        if (few > 0) {
            BasisBlock block = quick ? quick((int) first + few) : block(first + few - 1);
            for (int i = 0; i < few; i++) {
                int n = (int) first + i;
                energies[i] = quick ? block.value(n) : block.proved().quotient()[n];
            }
        }
        if (few < count) {
            System.arraycopy(shooting().energies(first + few, count - few), 0, energies, few, count - few);
        }
        return energies;
    }

    @Override
    public long countBelow(double energy) {
        return shooting().countBelow(energy);
    }

    @Override
    public double threshold() {
        return Double.POSITIVE_INFINITY;
    }

    @Override
    public double binding(long n) {
        Points.checkLevel(n, Long.MAX_VALUE);
        return Double.POSITIVE_INFINITY;
    }

    @Override
    public double decay(long n) {
        Points.checkLevel(n, Long.MAX_VALUE);
        return Double.POSITIVE_INFINITY;
    }

    @Override
    public double decayError(long n) {
        Points.checkLevel(n, Long.MAX_VALUE);
        return 0;
    }

    @Override
    public double splitting(long n) {
        if (small(n + 1)) {
            double simple = energyHigh(n + 1) - energyHigh(n);
            if (Levels.super.splittingBound(n).size() <= 1e-12 * simple) {
                return simple;
            }
        }
        return shooting().splitting(n);
    }

    @Override
    public Bound splittingBound(long n) {
        if (small(n + 1)) {
            Bound simple = Levels.super.splittingBound(n);
            if (simple.size() <= 1e-12 * (energyHigh(n + 1) - energyHigh(n))) {
                return simple;
            }
        }
        return shooting().splittingBound(n);
    }

    @Override
    public Cluster cluster(long n) {
        return small(n) ? Levels.super.cluster(n) : shooting().cluster(n);
    }

    @Override
    public double[][] waveFunctions(long first, int count, double[] x) {
        Points.check(first, count, Long.MAX_VALUE, x);
        long last = first + count - 1;
        // Where the matrix grows steadily, index and vectors need no proof; their error asks for it.
        if (last < BASIS && polynomial.monotone()) {
            return quickWithVectors((int) last + 1).waves((int) first, count, x);
        }
        return small(last)
                ? block(last).waves((int) first, count, x)
                : shooting().waveFunctions(first, count, x);
    }

    @Override
    public double waveFunctionError(long last) {
        return small(last) ? block(last).waveError((int) last) : shooting().waveFunctionError(last);
    }

    @Override
    public double reach(long n, double drop) {
        return shooting().reach(n, drop);
    }

    @Override
    public Elements elements(long[] levels) {
        Points.checkList(levels, Long.MAX_VALUE);
        long last = 0;
        for (long n : levels) {
            last = Math.max(last, n);
        }
        if (!small(last)) {
            return shooting().elements(levels);
        }
        int[] list = new int[levels.length];
        for (int i = 0; i < list.length; i++) {
            list[i] = (int) levels[i];
        }
        double[] errors = new double[4];
        double[][][] m = block(last).elements(list, errors);
        return new Elements(levels, m[0], m[1], m[2], m[3], errors, Certainty.ESTIMATED);
    }

    @Override
    public Element element(long m, long n, DoubleUnaryOperator f) {
        return shooting().element(m, n, f);
    }

    @Override
    public String toString() {
        StringBuilder text = new StringBuilder("levels of p²/2");
        for (int k = 0; k <= polynomial.degree(); k++) {
            if (polynomial.coefficient(k) != 0) {
                text.append(" + ")
                        .append(polynomial.coefficient(k))
                        .append(" x^")
                        .append(k);
            }
        }
        return text.toString();
    }
}
