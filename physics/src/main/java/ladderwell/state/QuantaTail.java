package ladderwell.state;

import java.util.function.DoubleUnaryOperator;

/**
 * Guaranteed bounds of the tails of a distribution of quanta from its generating function: Σ_{n≥N} P_n ≤ e^{−wN} G(w) for every w &gt; 0, with
 * G(w) = Σ P_n e^{wn}, and likewise below for w &lt; 0 (Chernoff 1952). The best w is searched; any w gives a bound.
 */
final class QuantaTail {
    /** Exponents are differences of numbers up to 1e8, right to 1e-16 of them. */
    private static final double OUTWARD = 1 + 1e-6;

    private final DoubleUnaryOperator logGenerating;
    private final double largest;
    private final double mean;

    /**
     * A tail.
     *
     * @param logGenerating ln G(w), or an upper bound of it
     * @param largest G is finite for w below this
     * @param mean mean quanta
     */
    QuantaTail(DoubleUnaryOperator logGenerating, double largest, double mean) {
        this.logGenerating = logGenerating;
        this.largest = largest;
        this.mean = mean;
    }

    /** The first level N above the mean with Σ_{n≥N} P_n at most the weight. */
    long above(double weight) {
        double goal = Math.log(weight);
        long low = (long) Math.ceil(mean);
        long step = 1;
        while (exponent(low + step, upper(low + step)) > goal) {
            step *= 2;
        }
        long high = low + step;
        low += step / 2;
        while (high - low > 1) {
            long middle = low + (high - low) / 2;
            if (exponent(middle, upper(middle)) > goal) {
                low = middle;
            } else {
                high = middle;
            }
        }
        return high;
    }

    /** The largest level N ≤ mean with Σ_{n<N} P_n at most the weight; 0 if there is none. */
    long below(double weight) {
        double goal = Math.log(weight);
        long high = (long) Math.floor(mean) + 1;
        long low = 0;
        while (high - low > 1) {
            long middle = low + (high - low) / 2;
            if (exponent(middle - 1, lower(middle - 1)) > goal) {
                high = middle;
            } else {
                low = middle;
            }
        }
        return low;
    }

    /**
     * What is outside [first, end): upper bounds of Σ (n+1)^k P_n for k = 0 … moments.length − 1 are added to moments, of Σ √P_n returned.
     */
    double outside(long first, long end, double[] moments) {
        double w = upper(end);
        // (n+1)^k e^{−wn} falls from n + 1 = k/w on
        double fall = Math.max(w, Math.min((moments.length - 1.0) / (end + 1), 0.5 * (w + largest)));
        double weight = Math.exp(exponent(end, fall)) * OUTWARD;
        for (int k = 0; k < moments.length; k++) {
            double peak = Math.max(end + 1.0, k / fall);
            moments[k] += weight * Math.pow(peak, k) * OUTWARD;
        }
        double sum = Math.sqrt(weight / -Math.expm1(-fall)) * OUTWARD;
        if (first > 0) {
            double under = Math.exp(exponent(first - 1, lower(first - 1))) * OUTWARD;
            for (int k = 0; k < moments.length; k++) {
                moments[k] += under * Math.pow(first, k) * OUTWARD;
            }
            sum += Math.sqrt(under * first) * OUTWARD;
        }
        return sum;
    }

    private double exponent(long n, double w) {
        return logGenerating.applyAsDouble(w) - w * n;
    }

    /** The w &gt; 0 of the least exponent at n ≥ mean. */
    private double upper(long n) {
        double most = Math.min(largest, 60);
        double low = 0;
        double high = most == largest ? most * (1 - 1e-9) : most;
        return least(n, low, high);
    }

    /** The w &lt; 0 of the least exponent at n ≤ mean. */
    private double lower(long n) {
        return least(n, -60, 0);
    }

    /** Golden section on ln|w|: the exponent is convex in w, and w may be as small as 1e-12. */
    private double least(long n, double low, double high) {
        double sign = high > 0 ? 1 : -1;
        double a = Math.log(1e-14);
        double b = Math.log(Math.max(Math.abs(low), Math.abs(high)));
        double ratio = (Math.sqrt(5) - 1) / 2;
        double c = b - ratio * (b - a);
        double d = a + ratio * (b - a);
        double fc = exponent(n, sign * Math.exp(c));
        double fd = exponent(n, sign * Math.exp(d));
        for (int i = 0; i < 60; i++) {
            if (fc <= fd) {
                b = d;
                d = c;
                fd = fc;
                c = b - ratio * (b - a);
                fc = exponent(n, sign * Math.exp(c));
            } else {
                a = c;
                c = d;
                fc = fd;
                d = a + ratio * (b - a);
                fd = exponent(n, sign * Math.exp(d));
            }
        }
        return sign * Math.exp((a + b) / 2);
    }
}
