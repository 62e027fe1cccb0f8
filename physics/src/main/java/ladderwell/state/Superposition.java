package ladderwell.state;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;

/** Sorts, joins and normalises the terms of a superposition of levels. */
final class Superposition {
    /** Norm, quotient and the sum under the root, rounded once each, with room. */
    private static final double NORM_ERROR = 4 * 0x1p-53;

    /** Levels closer than this share a segment. */
    private static final int GAP = 3;

    private Superposition() {}

    static Amplitudes of(long[] levels, double[] re, double[] im) {
        if (levels.length != re.length || levels.length != im.length) {
            throw new IllegalArgumentException(
                    "a superposition needs one real and one imaginary weight for each level, got " + levels.length
                            + " levels, " + re.length + " real and " + im.length + " imaginary parts");
        }
        if (levels.length == 0) {
            throw new IllegalArgumentException("a superposition needs at least one level");
        }
        Integer[] order = new Integer[levels.length];
        Arrays.setAll(order, i -> i);
        Arrays.sort(order, Comparator.comparingLong(i -> levels[i]));
        double largest = 0;
        for (int i = 0; i < order.length; i++) {
            int term = order[i];
            if (levels[term] < 0) {
                throw new IllegalArgumentException("level " + levels[term] + " does not exist: levels count from 0");
            }
            if (i > 0 && levels[term] == levels[order[i - 1]]) {
                throw new IllegalArgumentException("level " + levels[term] + " appears twice in the superposition");
            }
            double size = Math.max(Math.abs(re[term]), Math.abs(im[term]));
            if (!(size <= Double.MAX_VALUE)) {
                throw new IllegalArgumentException("the weight of level " + levels[term] + " is not a finite number");
            }
            largest = Math.max(largest, size);
        }
        if (largest == 0) {
            throw new IllegalArgumentException("all weights of the superposition are zero, so it is no state");
        }
        int down = -Math.getExponent(largest);
        double norm = Math.sqrt(scaledSquareSum(re, im, down));
        return joined(levels, re, im, order, down, norm);
    }

    /** Σ |w|² of the weights scaled by 2^down, in double-double. */
    private static double scaledSquareSum(double[] re, double[] im, int down) {
        double high = 0;
        double low = 0;
        for (int i = 0; i < re.length; i++) {
            for (int part = 0; part < 2; part++) {
                double w = Math.scalb(part == 0 ? re[i] : im[i], down);
                double square = w * w;
                double sum = high + square;
                double back = sum - high;
                low += (high - (sum - back)) + (square - back) + Math.fma(w, w, -square);
                high = sum;
            }
        }
        return high + low;
    }

    private static Amplitudes joined(long[] levels, double[] re, double[] im, Integer[] order, int down, double norm) {
        List<Integer> starts = new ArrayList<>();
        for (int i = 0; i < order.length; i++) {
            if (i == 0 || levels[order[i]] - levels[order[i - 1]] >= GAP) {
                starts.add(i);
            }
        }
        int segments = starts.size();
        long[] firsts = new long[segments];
        double[][] reals = new double[segments][];
        double[][] imaginaries = new double[segments][];
        for (int s = 0; s < segments; s++) {
            int from = starts.get(s);
            int to = s + 1 < segments ? starts.get(s + 1) : order.length;
            firsts[s] = levels[order[from]];
            int length = (int) (levels[order[to - 1]] - firsts[s]) + 1;
            reals[s] = new double[length];
            imaginaries[s] = new double[length];
            for (int i = from; i < to; i++) {
                int at = (int) (levels[order[i]] - firsts[s]);
                reals[s][at] = Math.scalb(re[order[i]], down) / norm;
                imaginaries[s][at] = Math.scalb(im[order[i]], down) / norm;
            }
        }
        boolean exact = order.length == 1 && (re[0] == 0 || im[0] == 0);
        return new Amplitudes(firsts, reals, imaginaries, exact ? 0 : NORM_ERROR, new double[Amplitudes.MOMENTS], 0, 0);
    }
}
