package ladderwell.level;

import java.util.Locale;
import org.jspecify.annotations.Nullable;

/** Levels of the finite well, solved one at a time when asked for. */
final class WellLevels implements Levels {
    /** An eighth of a turn reduced (1.9 ulp), the sine (1), the amplitude (4) and the product, times √2. */
    private static final double WAVE_ERROR = 14 * 0x1p-53;

    private final double depth;
    private final WellEquation equation;

    /** Solved levels kept, a power of two; level n has place n modulo this and is solved again when another took it. */
    private static final int REMEMBERED = 1024;

    /** Solved levels; racing writers only repeat work, since the records are immutable. */
    private final @Nullable Solved[] recent = new Solved[REMEMBERED];

    private record Solved(long n, WellLevel level) {}

    WellLevels(double depth) {
        this.depth = depth;
        equation = new WellEquation(depth);
    }

    @Override
    public Kind kind() {
        return Kind.FINITE_WELL;
    }

    @Override
    public boolean alternates() {
        return true;
    }

    @Override
    public long count() {
        return equation.count();
    }

    WellLevel level(long n) {
        if (n < 0 || n >= count()) {
            throw new IllegalArgumentException(
                    "the finite well has no level " + n + ": its bound levels are 0 to " + (count() - 1));
        }
        int place = (int) (n & (REMEMBERED - 1));
        Solved known = recent[place];
        if (known != null && known.n == n) {
            return known.level;
        }
        WellLevel solved = equation.solve(n);
        recent[place] = new Solved(n, solved);
        return solved;
    }

    @Override
    public double energyHigh(long n) {
        return level(n).energy().hi();
    }

    @Override
    public double energyLow(long n) {
        return level(n).energy().lo();
    }

    @Override
    public double energyError(long n) {
        return level(n).energyError();
    }

    @Override
    public double threshold() {
        return depth;
    }

    @Override
    public double binding(long n) {
        double decay = level(n).decay();
        return decay * decay / 2;
    }

    @Override
    public double decay(long n) {
        return level(n).decay();
    }

    @Override
    public double decayError(long n) {
        return level(n).decayError();
    }

    @Override
    public double[][] waveFunctions(long first, int count, double[] x) {
        Points.check(first, count, count(), x);
        double[][] table = new double[count][x.length];
        for (int row = 0; row < count; row++) {
            WellLevel level = level(first + row);
            double amplitude = level.amplitude();
            double edge = amplitude * level.wallSine();
            StandingWave wave = new StandingWave(first + row, level.waveNumber());
            double leftEdge = wave.even() ? edge : -edge;
            double[] values = table[row];
            for (int i = 0; i < x.length; i++) {
                double out = Math.abs(x[i]) - 0.5;
                if (out <= 0) {
                    values[i] = amplitude * wave.sine(x[i]);
                } else {
                    values[i] = (x[i] > 0 ? edge : leftEdge) * Math.exp(-level.decay() * out);
                }
            }
        }
        return table;
    }

    @Override
    public double waveFunctionError(long last) {
        Points.checkLevel(last, count());
        return WAVE_ERROR;
    }

    @Override
    public double reach(long n, double drop) {
        Points.checkDrop(drop);
        WellLevel level = level(n);
        double edge = level.amplitude() * level.wallSine();
        // A few ulp outwards cover the rounding.
        return edge <= drop ? 0.5 : (0.5 + Math.log(edge / drop) / level.decay()) * (1 + 0x1p-40) + 0x1p-40;
    }

    /**
     * Closed forms without cancellation. With w = A_m A_n √(E_m E_n) = V₀ φ_m(1/2) φ_n(1/2), the force of the two walls and the
     * double commutators of H with x and x² give ⟨m|x|n⟩ = 2w / (E_m − E_n)² for opposite parity and, for equal parity, m ≠ n,
     * ⟨m|p²|n⟩ = −4w / (κ_m + κ_n), ⟨m|x²|n⟩ = 2w (1 + 4/(κ_m + κ_n)) / (E_m − E_n)²; ⟨m|p|n⟩ = i (E_m − E_n) ⟨m|x|n⟩; ⟨n|p²|n⟩ =
     * 2E_n κ_n / (κ_n + 2).
     */
    @Override
    public Elements elements(long[] levels) {
        Points.checkList(levels, count());
        int size = levels.length;
        WellLevel[] solved = new WellLevel[size];
        for (int i = 0; i < size; i++) {
            solved[i] = level(levels[i]);
        }
        ElementTable table = new ElementTable(levels);
        for (int i = 0; i < size; i++) {
            WellLevel m = solved[i];
            double root = Math.sqrt(m.energy().hi()) * m.amplitude();
            table.diagonal(i, positionSquared(m), 2 * m.energy().hi() * m.decay() / (m.decay() + 2));
            for (int j = 0; j < i; j++) {
                WellLevel n = solved[j];
                double w = root * n.amplitude() * Math.sqrt(n.energy().hi());
                double gap = m.energy().minus(n.energy()).hi();
                if (((levels[i] ^ levels[j]) & 1) == 1) {
                    table.opposite(i, j, 2 * w / gap / gap, 2 * w / gap);
                } else {
                    double tails = 4 / (m.decay() + n.decay());
                    table.equal(i, j, 2 * w * (1 + tails) / gap / gap, -w * tails);
                }
            }
        }
        // Roundings: w 12 (each amplitude 4, each root 2), quotients and sums 6, inputs below 2^-52 in all.
        return table.elements(24 * 0x1p-53, diagonalError(solved));
    }

    /**
     * ⟨n|x²|n⟩ = A² (1/24 + (sin 2θ)/(8k) − (cos 2θ)/(4k²) − (sin 2θ)/(4k³)) inside, plus A² sin²θ (1/(4κ) + 1/(2κ²) + 1/(2κ³))
     * outside.
     */
    private static double positionSquared(WellLevel n) {
        double[] terms = positionSquaredTerms(n);
        double sum = 0;
        for (double term : terms) {
            sum += term;
        }
        return sum;
    }

    private static double[] positionSquaredTerms(WellLevel n) {
        double square = n.amplitude() * n.amplitude();
        double s = n.wallSine();
        double c = n.wallCosine();
        double k = n.waveNumber().hi();
        double outside = square * s * s / n.decay();
        return new double[] {
            outside / (2 * n.decay()) / n.decay(),
            outside / (2 * n.decay()),
            outside / 4,
            square / 24,
            square * s * c / (4 * k),
            -square * (c - s) * (c + s) / (4 * k * k),
            -square * s * c / (2 * k * k * k)
        };
    }

    /** Sizes of the terms of ⟨x²⟩, 24 roundings each, and of ⟨p²⟩. */
    private static double[] diagonalError(WellLevel[] solved) {
        double position = 0;
        double momentum = 0;
        for (WellLevel level : solved) {
            double sizes = 0;
            for (double term : positionSquaredTerms(level)) {
                sizes += Math.abs(term);
            }
            // cos 2θ may vanish by cancellation; its error does not.
            double waveNumber = level.waveNumber().hi();
            sizes += level.amplitude() * level.amplitude() / (4 * waveNumber * waveNumber);
            position = Math.max(position, sizes);
            momentum = Math.max(momentum, 2 * level.energy().hi());
        }
        return new double[] {24 * 0x1p-53 * position, 24 * 0x1p-53 * momentum};
    }

    @Override
    public String toString() {
        return String.format(Locale.ROOT, "finite well of depth %s with %d bound levels", depth, count());
    }
}
