package ladderwell.level;

import ladderwell.numeric.DoubleDouble;

/** Levels of the infinite box, all in closed form; j = n + 1 below. */
final class BoxLevels implements Levels {
    /** Level numbers up to here keep k = π j and its phases at full precision. */
    private static final long LAST = 1_000_000_000_000_000L;

    private static final DoubleDouble HALF_PI_SQUARED =
            DoubleDouble.QUARTER_TURN.times(DoubleDouble.QUARTER_TURN).times(2);

    /** An eighth of a turn reduced (1.9 ulp), the sine (1), √2 and the product, times √2. */
    private static final double WAVE_ERROR = 8 * 0x1p-53;

    @Override
    public Kind kind() {
        return Kind.BOX;
    }

    @Override
    public boolean alternates() {
        return true;
    }

    @Override
    public long count() {
        return Long.MAX_VALUE;
    }

    private static double index(long n) {
        Points.checkLevel(n, Long.MAX_VALUE);
        if (n > LAST) {
            throw new IllegalArgumentException("box levels are computed up to n = 1e15, got " + n);
        }
        return n + 1;
    }

    private static DoubleDouble energy(long n) {
        double j = index(n);
        return HALF_PI_SQUARED.times(DoubleDouble.product(j, j));
    }

    @Override
    public double energyHigh(long n) {
        return energy(n).hi();
    }

    @Override
    public double energyLow(long n) {
        return energy(n).lo();
    }

    @Override
    public double energyError(long n) {
        return energyHigh(n) * 0x1p-100;
    }

    @Override
    public double threshold() {
        return Double.POSITIVE_INFINITY;
    }

    @Override
    public double binding(long n) {
        index(n);
        return Double.POSITIVE_INFINITY;
    }

    @Override
    public double decay(long n) {
        index(n);
        return Double.POSITIVE_INFINITY;
    }

    @Override
    public double decayError(long n) {
        index(n);
        return 0;
    }

    @Override
    public double[][] waveFunctions(long first, int count, double[] x) {
        Points.check(first, count, LAST + 1, x);
        double[][] table = new double[count][x.length];
        double amplitude = Math.sqrt(2);
        for (int row = 0; row < count; row++) {
            StandingWave wave = new StandingWave(first + row, (first + row + 1) / 2.0, 0);
            double[] values = table[row];
            for (int i = 0; i < x.length; i++) {
                values[i] = Math.abs(x[i]) < 0.5 ? amplitude * wave.sine(x[i]) : 0;
            }
        }
        return table;
    }

    @Override
    public double waveFunctionError(long last) {
        index(last);
        return WAVE_ERROR;
    }

    @Override
    public double reach(long n, double drop) {
        index(n);
        Points.checkDrop(drop);
        return 0.5;
    }

    /**
     * ⟨m|x|n⟩ = 8jl / (π² (j² − l²)²) for opposite parity, ⟨m|p|n⟩ = i (E_m − E_n) ⟨m|x|n⟩ = i 4jl / (j² − l²); for equal parity
     * ⟨m|x²|n⟩ = 8jl / (π² (j² − l²)²), ⟨n|x²|n⟩ = 1/12 − 1/(2π² j²). As a form p² is 2H: diagonal.
     */
    @Override
    public Elements elements(long[] levels) {
        Points.checkList(levels, LAST + 1);
        ElementTable table = new ElementTable(levels);
        double piSquared = Math.PI * Math.PI;
        double largest = 0;
        for (int i = 0; i < levels.length; i++) {
            double j = index(levels[i]);
            double kinetic = 2 * energyHigh(levels[i]);
            largest = Math.max(largest, kinetic);
            table.diagonal(i, 1.0 / 12 - 1 / (2 * piSquared * j * j), kinetic);
            for (int k = 0; k < i; k++) {
                double l = index(levels[k]);
                // Both factors are exact; their product is rounded.
                double difference = (j - l) * (j + l);
                double p = 4 * j * l / difference;
                double x = 2 * p / (piSquared * difference);
                if (((levels[i] ^ levels[k]) & 1) == 1) {
                    table.opposite(i, k, x, p);
                } else {
                    table.equal(i, k, x, 0);
                }
            }
        }
        return table.elements(10 * 0x1p-53, new double[] {2 * 0x1p-53 * 0.15, 0x1p-53 * largest});
    }

    @Override
    public String toString() {
        return "infinite box";
    }
}
