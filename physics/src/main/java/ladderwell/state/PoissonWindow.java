package ladderwell.state;

import java.util.Arrays;

/**
 * The square roots of Poisson weights √P_n, P_n = e^{−μ} μ^n / n!, on the window that holds all but a proved tail.
 *
 * <p>One weight is evaluated outright: P_0 = e^{−μ} for small μ, else the weight at the nearest integer to μ in the
 * saddle-point form (C. Loader, Fast and accurate computation of binomial probabilities, 2000)
 * P_n = e^{−δ(n) − D} / √(2πn), with δ(n) = ln n! − ln(√(2πn) (n/e)^n) and D = μ − n − n ln(μ/n). All others follow by
 * P_{n+1} = P_n μ / (n+1) and P_{n−1} = P_n n / μ in double-double, so an edge 10⁵ steps away has lost nothing.
 *
 * <p>Tails: beyond the window's upper edge the terms (n+1)^k P_n fall faster than a geometric series, as do the terms P_n
 * below its lower edge; the geometric sums are the bounds.
 */
final class PoissonWindow {
    /** Above this the saddle-point form starts at the peak; below, the walk starts at P_0. */
    private static final double SADDLE_FROM = 64;

    /**
     * Relative error of every root: 2.35 ulp from the start (π rounded .35, product 1, both halved twice by root and root;
     * root 1, exponential 2, quotient 1, halved), 1.5 from the final root, and the walk, at 2^−99 a step, not a tenth.
     */
    static final double RELATIVE_ERROR = 4 * 0x1p-53;

    /** Raises a bound over its rounding: a few ulp, divided by 1 − ratio, which stays above 1e-7. */
    private static final double OUTWARD = 1 + 0x1p-20;

    private final double mean;
    private final double weightAllowed;

    private long first;
    private double[] roots = new double[0];
    private final double[] tailMoments = new double[5];
    private double tailSum;

    /**
     * @param mean μ ≥ 0
     * @param weightAllowed discarded weight allowed at each side
     */
    PoissonWindow(double mean, double weightAllowed) {
        this.mean = mean;
        this.weightAllowed = weightAllowed;
        if (mean == 0) {
            roots = new double[] {1};
            return;
        }
        boolean saddle = mean >= SADDLE_FROM;
        long start = saddle ? Math.round(mean) : 0;
        double weight = saddle ? saddlePoint(start) : Math.exp(-mean);
        double[] upper = walkUp(start, weight);
        double[] lower = walkDown(start, weight);
        join(upper, lower);
    }

    long first() {
        return first;
    }

    /** √P_n for n = first(), first() + 1, … */
    double[] roots() {
        return roots;
    }

    double[] tailMoments() {
        return tailMoments;
    }

    double tailSum() {
        return tailSum;
    }

    /** P_n at n = nearest integer to μ ≥ 64. */
    private double saddlePoint(long n) {
        // Exact: both are within a factor two of each other.
        double off = mean - n;
        double h = off / n;
        // h − ln(1 + h) = h² (1/2 − h/3 + h²/4 − …), |h| ≤ 1/128: nine terms leave 1e-20 of it.
        double series = 0;
        for (int k = 10; k >= 2; k--) {
            series = 1.0 / k - h * series;
        }
        double deviance = off * h * series;
        double inverse = 1.0 / n;
        double square = inverse * inverse;
        // Stirling's series, n ≥ 64: the first term left out, 1/(1188 n^9), is below 1e-19.
        double stirling = inverse * (1.0 / 12 - square * (1.0 / 360 - square * (1.0 / 1260 - square * (1.0 / 1680))));
        return Math.exp(-(stirling + deviance)) / Math.sqrt(2 * Math.PI * n);
    }

    private double[] walkUp(long start, double weight) {
        double[] kept = new double[1024];
        int count = 0;
        double high = weight;
        double low = 0;
        for (long n = start; ; n++) {
            // Invariant: high + low is P_n, levels below n are kept (or lie below the start).
            if (n > start && n + 1 > mean && tailAbove(n, high)) {
                return Arrays.copyOf(kept, count);
            }
            if (count == kept.length) {
                kept = Arrays.copyOf(kept, 2 * count);
            }
            kept[count++] = Math.sqrt(high);
            // (high + low) · μ / (n + 1)
            double product = high * mean;
            double rest = Math.fma(low, mean, Math.fma(high, mean, -product));
            double divisor = n + 1;
            double quotient = product / divisor;
            double correction = (Math.fma(-quotient, divisor, product) + rest) / divisor;
            high = quotient + correction;
            low = (quotient - high) + correction;
        }
    }

    /** Bounds the tail that starts at level n of weight p; true when it is small enough and every ratio is below one. */
    private boolean tailAbove(long n, double p) {
        double ratio = mean / (n + 1);
        double growth = 1 + 1.0 / (n + 1);
        double fourth = growth * growth * growth * growth * ratio;
        if (p > weightAllowed * (1 - ratio) || fourth > 1 - 1e-7) {
            return false;
        }
        double term = p;
        for (int k = 0; k <= 4; k++) {
            tailMoments[k] += term / (1 - ratio) * OUTWARD;
            term *= n + 1;
            ratio *= growth;
        }
        tailSum += Math.sqrt(p) / (1 - Math.sqrt(mean / (n + 1))) * OUTWARD;
        return true;
    }

    /** Roots of P_{start−1}, P_{start−2}, … as far down as they are kept. */
    private double[] walkDown(long start, double weight) {
        double[] kept = new double[1024];
        int count = 0;
        double high = weight;
        double low = 0;
        for (long n = start; n > 0; n--) {
            // (high + low) · n / μ is the weight of level n − 1
            double product = high * n;
            double rest = Math.fma(low, n, Math.fma(high, n, -product));
            double quotient = product / mean;
            double correction = (Math.fma(-quotient, mean, product) + rest) / mean;
            high = quotient + correction;
            low = (quotient - high) + correction;
            long below = n - 1;
            if (below < mean && tailBelow(below, high)) {
                break;
            }
            if (count == kept.length) {
                kept = Arrays.copyOf(kept, 2 * count);
            }
            kept[count++] = Math.sqrt(high);
        }
        return Arrays.copyOf(kept, count);
    }

    /** Bounds the tail from level n of weight p down to 0. */
    private boolean tailBelow(long n, double p) {
        double ratio = n / mean;
        if (p > weightAllowed * (1 - ratio) || ratio > 1 - 1e-7) {
            return false;
        }
        double sum = p / (1 - ratio) * OUTWARD;
        for (int k = 0; k <= 4; k++) {
            tailMoments[k] += sum;
            sum *= (n + 1) * OUTWARD;
        }
        tailSum += Math.sqrt(p) / (1 - Math.sqrt(ratio)) * OUTWARD;
        return true;
    }

    private void join(double[] upper, double[] lower) {
        roots = new double[lower.length + upper.length];
        for (int i = 0; i < lower.length; i++) {
            roots[i] = lower[lower.length - 1 - i];
        }
        System.arraycopy(upper, 0, roots, lower.length, upper.length);
        long start = mean >= SADDLE_FROM ? Math.round(mean) : 0;
        first = start - lower.length;
    }
}
