package ladderwell.level;

import ladderwell.numeric.DoubleDouble;

/**
 * Number of levels below an energy in a potential made of steps, by exact transfer through each step with 32 digits: cosines and sines, or their
 * hyperbolic partners, and the zeros in between. Shares nothing with the solvers.
 */
final class StepWells {
    private static final DoubleDouble HALF = DoubleDouble.of(0.5);

    private final double[] edges;
    private final double[] heights;

    /**
     * @param edges where V jumps, rising
     * @param heights V left of the first edge, between, and right of the last
     */
    StepWells(double[] edges, double[] heights) {
        this.edges = edges;
        this.heights = heights;
    }

    double threshold() {
        return Math.min(heights[0], heights[heights.length - 1]);
    }

    double value(double x) {
        int i = 0;
        while (i < edges.length && x >= edges[i]) {
            i++;
        }
        return heights[i];
    }

    long below(DoubleDouble energy) {
        int last = heights.length - 1;
        DoubleDouble y = DoubleDouble.ONE;
        DoubleDouble slope = wave(0, energy);
        long zeros = 0;
        for (int i = 1; i < last; i++) {
            DoubleDouble k = wave(i, energy);
            DoubleDouble width = DoubleDouble.of(edges[i]).minus(DoubleDouble.of(edges[i - 1]));
            DoubleDouble phase = k.times(width);
            DoubleDouble[] f;
            if (above(i, energy)) {
                f = hyperbolic(phase);
            } else {
                f = circular(phase);
                // y = A sin(k x + t): as many zeros as multiples of pi are passed.
                double start = Math.atan2(y.times(k).value(), slope.value());
                double end = start + phase.value();
                zeros += (long) (Math.floor(end / Math.PI) - Math.floor(start / Math.PI));
            }
            DoubleDouble next = y.times(f[0]).plus(slope.times(f[1]).dividedBy(k));
            DoubleDouble bent = y.times(k).times(f[1]);
            slope = slope.times(f[0]).plus(above(i, energy) ? bent : bent.negated());
            if (above(i, energy) && next.hi() * y.hi() < 0) {
                zeros++;
            }
            y = next;
            double size = Math.scalb(1.0, -Math.getExponent(Math.hypot(y.hi(), slope.hi())));
            y = y.times(size);
            slope = slope.times(size);
        }
        // Beyond the last edge: the growing part has the other sign than y where one more zero follows.
        DoubleDouble growing = y.plus(slope.dividedBy(wave(last, energy)));
        return y.hi() * growing.hi() < 0 ? zeros + 1 : zeros;
    }

    private boolean above(int i, DoubleDouble energy) {
        return DoubleDouble.of(heights[i]).minus(energy).hi() > 0;
    }

    private DoubleDouble wave(int i, DoubleDouble energy) {
        DoubleDouble square = DoubleDouble.of(heights[i]).minus(energy).times(2);
        return (square.hi() > 0 ? square : square.negated()).sqrt();
    }

    /** {cos x, sin x}. */
    private static DoubleDouble[] circular(DoubleDouble x) {
        long quarters = Math.round(x.hi() / (Math.PI / 2));
        DoubleDouble rest = x.minus(DoubleDouble.QUARTER_TURN.times((double) quarters));
        DoubleDouble square = rest.times(rest).negated();
        DoubleDouble cos = series(square, 0);
        DoubleDouble sin = series(square, 1).times(rest);
        return switch ((int) Math.floorMod(quarters, 4L)) {
            case 0 -> new DoubleDouble[] {cos, sin};
            case 1 -> new DoubleDouble[] {sin.negated(), cos};
            case 2 -> new DoubleDouble[] {cos.negated(), sin.negated()};
            default -> new DoubleDouble[] {sin, cos.negated()};
        };
    }

    /** {cosh x, sinh x}, x &gt; 0. */
    private static DoubleDouble[] hyperbolic(DoubleDouble x) {
        if (x.hi() < 1) {
            DoubleDouble square = x.times(x);
            return new DoubleDouble[] {series(square, 0), series(square, 1).times(x)};
        }
        int twos = (int) Math.round(x.hi() / DoubleDouble.LN_2.hi());
        DoubleDouble rest = x.minus(DoubleDouble.LN_2.times(twos));
        DoubleDouble square = rest.times(rest);
        DoubleDouble grown =
                series(square, 0).plus(series(square, 1).times(rest)).times(Math.scalb(1.0, twos));
        DoubleDouble fallen = DoubleDouble.ONE.dividedBy(grown);
        return new DoubleDouble[] {
            grown.plus(fallen).times(HALF), grown.minus(fallen).times(HALF)
        };
    }

    /** Σ s^k / (2k + odd)!. */
    private static DoubleDouble series(DoubleDouble s, int odd) {
        DoubleDouble sum = DoubleDouble.ONE;
        for (int k = 16; k >= 1; k--) {
            double factor = (2.0 * k + odd) * (2 * k + odd - 1);
            sum = sum.times(s).dividedBy(factor).plus(DoubleDouble.ONE);
        }
        return sum;
    }
}
