package ladderwell.state;

import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Deque;
import java.util.List;
import ladderwell.evidence.Certainty;
import ladderwell.evidence.PhysicsException;
import ladderwell.level.Levels;
import ladderwell.numeric.Interruption;
import ladderwell.numeric.LegendreRule;

/**
 * Expands any {@link Shape} in any levels: overlaps by Gauss–Legendre panels, block by block away from the mean energy until what falls
 * off at both ends is too little to matter. The error is estimated: from the fall of the last blocks, a second quadrature, the errors of
 * the wave functions, and what Σ|c|² leaves of 1.
 */
final class ShapeState {
    private static final int NODES = 24;
    private static final int BLOCK = 16;
    private static final int LOOK_AHEAD = 48;

    /** The transition elements of as many levels still fit and are quick. */
    private static final int MOST = 2000;

    private static final double RADIANS = 6;

    /** Levels within as many spacings of a level count in full among those that its error mixes in. */
    private static final double MIXED = 4;

    /** Σ|c|² misses 1 by as much through rounding alone. */
    private static final double NOISE = 2e-14;

    private final Levels levels;
    private final Shape shape;
    private final double tolerance;
    private final long count;
    private final Deque<Block> blocks = new ArrayDeque<>();
    private final double allowed;
    private double difference;
    /** As many levels kept ask for a look ahead. */
    private long next = LOOK_AHEAD;

    /** Overlaps with consecutive levels. */
    private record Block(long first, double[] re, double[] im) {
        double weight() {
            double sum = 0;
            for (int i = 0; i < re.length; i++) {
                sum += re[i] * re[i] + im[i] * im[i];
            }
            return sum;
        }

        long end() {
            return first + re.length;
        }
    }

    ShapeState(Levels levels, Shape shape, double tolerance) {
        this.levels = levels;
        this.shape = shape;
        this.tolerance = tolerance;
        count = levels.count();
        allowed = tolerance * tolerance / 64;
    }

    Amplitudes expand() {
        long centre = Math.min(count, levels.countBelow(Math.min(shape.energy(), levels.threshold())));
        long start = Math.max(0, Math.min(centre - BLOCK / 2, count - BLOCK));
        blocks.add(block(start, (int) Math.min(BLOCK, count - start)));
        double low = tail(true);
        double high = tail(false);
        while (low > allowed || high > allowed) {
            boolean down = low > high;
            if (down) {
                int size = (int) Math.min(BLOCK, blocks.getFirst().first);
                blocks.addFirst(block(blocks.getFirst().first - size, size));
                low = tail(true);
            } else {
                long first = blocks.getLast().end();
                blocks.addLast(block(first, (int) Math.min(BLOCK, count - first)));
                high = tail(false);
            }
            if (kept() > MOST || kept() > next && Math.max(low, high) > allowed && tooWide(centre)) {
                throw new PhysicsException.TooLarge(
                        "a state on more than " + MOST + " levels",
                        4.0 * Double.BYTES * 4 * MOST * MOST,
                        4.0 * Double.BYTES * MOST * MOST,
                        "make it smoother or of less energy, or loosen the tolerance");
            }
        }
        return amplitudes(low, high);
    }

    /**
     * Whether the state still weighs too much at two places more than {@value #MOST} levels apart, one on each side of the centre. Looked for by
     * halving; levels below 0 and above the last are none. Not being found, it is asked again when ten times as many levels are kept.
     */
    private boolean tooWide(long centre) {
        next *= 10;
        if (count <= MOST) {
            return false;
        }
        long least = Math.max(0, MOST - (count - centre));
        long most = Math.min(MOST, centre);
        while (least <= most) {
            long down = (least + most) / 2;
            boolean below = weighs(centre - down);
            boolean above = weighs(centre + MOST - down);
            if (below && above) {
                return true;
            }
            if (!below && !above) {
                return false;
            }
            if (below) {
                least = down + BLOCK;
            } else {
                most = down - BLOCK;
            }
        }
        return false;
    }

    /** Whether the levels from this one on hold too much to be left out, beyond what the quadrature errs by. */
    private boolean weighs(long first) {
        if (first >= count) {
            return false;
        }
        int size = (int) Math.min(BLOCK, count - first);
        double[][] overlaps = overlaps(first, size, RADIANS);
        double weight = new Block(first, overlaps[0], overlaps[1]).weight();
        return weight > 4 * Math.max(allowed, 4 * size * difference * difference);
    }

    private long kept() {
        return blocks.getLast().end() - blocks.getFirst().first;
    }

    /**
     * Weight expected beyond the blocks on one side: 0 where no level is left, else what a geometric series with the ratio of the last two
     * blocks would still bring, times four.
     */
    private double tail(boolean below) {
        Block last = below ? blocks.getFirst() : blocks.getLast();
        if (below ? last.first == 0 : last.end() == count) {
            return 0;
        }
        if (blocks.size() < 2) {
            return 1;
        }
        List<Block> ordered = new ArrayList<>(blocks);
        Block before = ordered.get(below ? 1 : ordered.size() - 2);
        double weight = last.weight();
        double ratio = weight / Math.max(before.weight(), Double.MIN_NORMAL);
        if (ratio < 0.5) {
            return 4 * weight * ratio / (1 - ratio) + 1e-3 * weight;
        }
        // Both at the level of rounding, which falls no further.
        return Math.max(weight, before.weight()) <= allowed / 16 ? 16 * weight : 1;
    }

    private Block block(long first, int size) {
        Interruption.check();
        double[][] fine = overlaps(first, size, RADIANS);
        if (blocks.size() < 2 || blocks.size() % 8 == 0) {
            double[][] coarse = overlaps(first, size, 1.5 * RADIANS);
            double square = 0;
            for (int i = 0; i < size; i++) {
                square += (fine[0][i] - coarse[0][i]) * (fine[0][i] - coarse[0][i])
                        + (fine[1][i] - coarse[1][i]) * (fine[1][i] - coarse[1][i]);
            }
            difference = Math.max(difference, Math.sqrt(square / size));
        }
        return new Block(first, fine[0], fine[1]);
    }

    private double[][] overlaps(long first, int size, double radians) {
        double top = levels.energyHigh(first + size - 1);
        double wave = shape.wave() + Math.sqrt(2 * Math.max(0, top - shape.bottom()));
        double[][] rule = LegendreRule.of(NODES);
        double[] breaks = shape.breaks();
        double[] re = new double[size];
        double[] im = new double[size];
        for (int i = 0; i <= breaks.length; i++) {
            double from = i == 0 ? shape.left() : breaks[i - 1];
            double to = i == breaks.length ? shape.right() : breaks[i];
            int panels = 1 + (int) ((to - from) * wave / radians);
            if (panels > 1_000_000 / NODES) {
                throw new PhysicsException.TooLarge(
                        "the overlaps of a state with " + (long) (panels * radians) + " radians of waves",
                        (double) panels * NODES * size * Double.BYTES,
                        1e6 * size * Double.BYTES,
                        "give it less momentum or a smaller extent");
            }
            double half = (to - from) / (2 * panels);
            double[] x = new double[panels * NODES];
            for (int panel = 0; panel < panels; panel++) {
                for (int j = 0; j < NODES; j++) {
                    x[panel * NODES + j] = from + half * (2 * panel + 1 + rule[0][j]);
                }
            }
            double[] a = new double[x.length];
            double[] b = new double[x.length];
            shape.sample(x, a, b);
            for (int j = 0; j < x.length; j++) {
                a[j] *= half * rule[1][j % NODES];
                b[j] *= half * rule[1][j % NODES];
            }
            double[][] functions = levels.waveFunctions(first, size, x);
            for (int n = 0; n < size; n++) {
                double[] f = functions[n];
                for (int j = 0; j < x.length; j++) {
                    re[n] += f[j] * a[j];
                    im[n] += f[j] * b[j];
                }
            }
        }
        return new double[][] {re, im};
    }

    /**
     * What errors of the wave functions do to the overlaps. A wrong function is its right one with a little of the others in it; by first-order
     * perturbation theory a level k takes part in it as gap / |E_n − E_k|, so that the overlap errs by the sum of what these levels hold.
     */
    private double functionErrors() {
        double extent = Math.sqrt(shape.right() - shape.left());
        int size = (int) kept();
        double[] weight = weights();
        long first = blocks.getFirst().first;
        double[] energy = levels.energies(first, size);
        double square = 0;
        for (int n = 0; n < size; n++) {
            double gap = Math.max(n > 0 ? energy[n] - energy[n - 1] : 0, n + 1 < size ? energy[n + 1] - energy[n] : 0);
            double around = 0;
            for (int k = 0; k < size; k++) {
                double part = k == n ? 1 : Math.min(1, MIXED * gap / Math.abs(energy[k] - energy[n]));
                around += part * part * weight[k];
            }
            double share = 2 * extent * levels.waveFunctionError(first + n);
            square += share * share * around;
        }
        return Math.sqrt(square);
    }

    /**
     * Weight expected above the edge of a well that ends: the weight per energy goes through the edge without a jump, and falls on as it fell
     * over the last levels below it. Times four; infinite where there are too few levels to tell.
     */
    private double beyondTheEdge() {
        double edge = levels.threshold();
        if (blocks.getLast().end() < count || Double.isInfinite(edge)) {
            return 0;
        }
        int size = (int) kept();
        int group = Math.min(6, size / 2);
        if (group == 0) {
            return Double.POSITIVE_INFINITY;
        }
        double[] weights = weights();
        double[] energy = levels.energies(blocks.getFirst().first, size);
        double[] density = new double[2];
        double[] centre = new double[2];
        for (int g = 0; g < 2; g++) {
            int from = size - (2 - g) * group;
            double low = from == 0 ? shape.bottom() : (energy[from - 1] + energy[from]) / 2;
            double high = g == 0 ? (energy[from + group - 1] + energy[from + group]) / 2 : edge;
            for (int n = from; n < from + group; n++) {
                density[g] += weights[n] / (high - low);
            }
            centre[g] = (low + high) / 2;
        }
        double fall = Math.log(density[0] / Math.max(density[1], Double.MIN_NORMAL)) / (centre[1] - centre[0]);
        double length = fall > 0 ? Math.min(1 / fall, edge - centre[0]) : edge - centre[0];
        // Overlaps that change their sign near the edge may be small there by chance: not below the mean of the two, as
        // they fall.
        return 4 * Math.max(density[1], Math.sqrt(density[0] * density[1])) * length;
    }

    /** |c|² of the levels kept. */
    private double[] weights() {
        double[] weight = new double[(int) kept()];
        int at = 0;
        for (Block block : blocks) {
            for (int i = 0; i < block.re.length; i++) {
                weight[at++] = block.re[i] * block.re[i] + block.im[i] * block.im[i];
            }
        }
        return weight;
    }

    private Amplitudes amplitudes(double low, double high) {
        int size = (int) kept();
        double[] re = new double[size];
        double[] im = new double[size];
        long first = blocks.getFirst().first;
        double sum = 0;
        for (Block block : blocks) {
            System.arraycopy(block.re, 0, re, (int) (block.first - first), block.re.length);
            System.arraycopy(block.im, 0, im, (int) (block.first - first), block.im.length);
            sum += block.weight();
        }
        double inside = functionErrors() + 2 * Math.sqrt(size) * difference + 1e-15;
        double missing = 1 - sum;
        double noise = NOISE + 4 * inside;
        // What the sum of the weights cannot show is taken from their fall towards the edge.
        double lost = missing > noise ? missing : Math.min(noise, beyondTheEdge());
        double error = Math.sqrt(low + high + lost) + inside;
        if (error > tolerance && lost > 0) {
            throw new PhysicsException.NotCarried(
                    "the state, wanted to a norm error of " + tolerance + ",",
                    lost,
                    (int) Math.min(Integer.MAX_VALUE, count),
                    "give it less energy, move it off walls and edges, or loosen the tolerance");
        }
        if (error > tolerance) {
            throw new PhysicsException.NotConverged("the expansion of the state in levels", 1, error, tolerance);
        }
        double[] moments = new double[Amplitudes.MOMENTS];
        double above = first + size + 4.0 * BLOCK;
        double below = first + 1.0;
        for (int k = 0; k < moments.length; k++) {
            moments[k] = low * Math.pow(below, k) + high * Math.pow(above, k);
        }
        return new Amplitudes(
                new long[] {first},
                new double[][] {re},
                new double[][] {im},
                error,
                moments,
                Math.sqrt((low + high) * 8 * BLOCK),
                low + high + lost,
                Certainty.ESTIMATED);
    }
}
