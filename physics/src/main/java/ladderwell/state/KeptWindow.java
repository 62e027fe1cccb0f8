package ladderwell.state;

import java.util.Arrays;

/**
 * Amplitudes on one window while they are being made: what is kept, how far it is from the state meant, and bounds of what is not kept.
 *
 * @param first first level kept
 * @param re real parts
 * @param im imaginary parts
 * @param error norm of the difference from the state meant
 * @param tailMoments bounds of Σ (n+1)^k |c_n|² over what is not kept
 * @param tailSum bound of Σ |c_n| over what is not kept
 */
record KeptWindow(long first, double[] re, double[] im, double error, double[] tailMoments, double tailSum) {

    /**
     * Without the outer levels whose weight fits into the tolerance. Of a level dropped the true amplitude is known to the error: the norm
     * of true amplitudes with weights (n+1)^k is at most that of the computed ones and (end)^(k/2) errors.
     */
    KeptWindow trimmed(double tolerance) {
        // half for the levels dropped, a quarter of the weight at each end: √2/4 of the tolerance together
        double allowed = Math.pow(Math.max(0, tolerance - error) / 2, 2) / 2;
        int from = 0;
        double below = 0;
        while (from < re.length - 1 && below + weight(from) <= allowed) {
            below += weight(from++);
        }
        int to = re.length;
        double above = 0;
        while (to > from + 1 && above + weight(to - 1) <= allowed) {
            above += weight(--to);
        }
        if (from == 0 && to == re.length) {
            return this;
        }
        double[] moments = new double[tailMoments.length];
        double sum = tailSum;
        double slack = 1 + 1e-9;
        for (int k = 0; k < moments.length; k++) {
            double dropped = 0;
            for (int i = 0; i < re.length; i++) {
                if (i == from) {
                    i = to - 1;
                    continue;
                }
                dropped += Math.pow(first + i + 1.0, k) * weight(i);
            }
            double root = Math.sqrt(dropped) + error * Math.pow(first + re.length, k / 2.0);
            moments[k] = (tailMoments[k] + root * root) * slack;
        }
        for (int i = 0; i < re.length; i++) {
            if (i == from) {
                i = to - 1;
                continue;
            }
            sum += Math.sqrt(weight(i));
        }
        sum = (sum + error * Math.sqrt(from + re.length - to)) * slack;
        return new KeptWindow(
                first + from,
                Arrays.copyOfRange(re, from, to),
                Arrays.copyOfRange(im, from, to),
                (error + Math.sqrt(below + above)) * slack,
                moments,
                sum);
    }

    private double weight(int i) {
        return re[i] * re[i] + im[i] * im[i];
    }

    /** As amplitudes; more is an error that has come since. */
    Amplitudes amplitudes(double more) {
        return new Amplitudes(
                new long[] {first},
                new double[][] {re},
                new double[][] {im},
                error + more,
                tailMoments,
                tailSum,
                tailMoments[0]);
    }
}
