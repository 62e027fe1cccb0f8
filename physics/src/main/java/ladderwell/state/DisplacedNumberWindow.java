package ladderwell.state;

import java.util.Arrays;
import ladderwell.numeric.DoubleDouble;
import ladderwell.numeric.Interruption;

/**
 * Amplitudes of D(α) |m⟩ for α &gt; 0 real: the eigenvector of D n D† = (a† − α)(a − α), a tridiagonal matrix, to the eigenvalue m.
 *
 * <p>Below the levels it populates the amplitudes are the growing solution of the three-term recurrence, above them the one that grows
 * downwards; both are followed from outside in, in double-double, and joined in the middle. Neighbouring eigenvalues are 1 away, so a
 * normalised vector φ is at most ‖(D n D† − m) φ‖ from the ray: tails, joint and rounding in one number. Far above all amplitudes are
 * positive.
 *
 * @source de Oliveira, Kim, Knight and Buzek, Phys. Rev. A 41 (1990) 2645; Cahill and Glauber, Phys. Rev. 177 (1969) 1857
 */
final class DisplacedNumberWindow {
    private final long first;
    private final KeptWindow kept;
    private final double mean;
    private final long level;

    /**
     * The state.
     *
     * @param level m
     * @param mean α² &gt; 0
     * @param tolerance norm error wanted
     */
    DisplacedNumberWindow(long level, double mean, double tolerance) {
        this.level = level;
        this.mean = mean;
        // ⟨z^n⟩ = e^{(z−1)α²} z^m L_m(−α² (z−1)²/z), and L_m(−y) ≤ I_0(2 √(m y)) ≤ e^{2 √(m y)}
        double swing = 4 * Math.sqrt(mean * level);
        QuantaTail tail = new QuantaTail(
                w -> mean * Math.expm1(w) + level * w + swing * Math.abs(Math.sinh(w / 2)),
                Double.POSITIVE_INFINITY,
                mean + level);
        double lift = 4 * Math.sqrt(mean * (mean + level + 1)) + 1;
        double weight = Math.max(1e-70, Math.pow(tolerance / (8 * lift), 2));
        first = tail.below(weight);
        long end = tail.above(weight);
        if (end - first > HarmonicStates.MOST_LEVELS) {
            throw HarmonicStates.tooManyLevels("this displaced number state", end - first);
        }
        int size = Math.max(2, (int) (end - first));
        double[] values = new double[size];
        double[] low = new double[size];
        join(values, low);
        double norm = Math.sqrt(weight(values));
        double residual = residual(values, low) / norm * (1 + 1e-9);
        for (int i = 0; i < size; i++) {
            values[i] /= norm;
        }
        double error = residual < 0.2 ? 1.02 * residual + 0x1p-51 : 2;
        double[] moments = new double[Amplitudes.MOMENTS];
        double sum = tail.outside(first, first + size, moments);
        kept = new KeptWindow(first, values, new double[size], error, moments, sum).trimmed(tolerance);
    }

    KeptWindow kept() {
        return kept;
    }

    /** √(α² n), which couples n − 1 and n. */
    private DoubleDouble coupling(long n) {
        return DoubleDouble.product(mean, (double) n).sqrt();
    }

    /** n + α² − m. */
    private DoubleDouble diagonal(long n) {
        return DoubleDouble.sum((double) (n - level), mean);
    }

    private void join(double[] values, double[] low) {
        int size = values.length;
        int middle = (int) Math.max(0, Math.min(size - 2, Math.round(mean + level) - first));
        double[] upLow = new double[middle + 2];
        double[] up = walk(first, 1, upLow);
        double[] downLow = new double[size - middle];
        double[] down = walk(first + size - 1, -1, downLow);
        // level first + middle is up[middle] and down[size − 1 − middle]; of it and the next one take the larger
        int at = Math.abs(up[middle]) >= Math.abs(up[middle + 1]) ? middle : middle + 1;
        int mirrored = size - 1 - at;
        DoubleDouble factor =
                new DoubleDouble(down[mirrored], downLow[mirrored]).dividedBy(new DoubleDouble(up[at], upLow[at]));
        for (int i = 0; i < size; i++) {
            DoubleDouble value = i <= at
                    ? factor.times(new DoubleDouble(up[i], upLow[i]))
                    : new DoubleDouble(down[size - 1 - i], downLow[size - 1 - i]);
            values[i] = value.hi();
            low[i] = value.lo();
        }
        double most = Arrays.stream(values).map(Math::abs).max().orElse(1);
        double scale = Math.scalb(1.0, -Math.getExponent(most));
        for (int i = 0; i < size; i++) {
            values[i] *= scale;
            low[i] *= scale;
        }
    }

    /** The recurrence from a level on, upwards or downwards; as long as low, largest value near 1. */
    private double[] walk(long from, int direction, double[] low) {
        double[] high = new double[low.length];
        DoubleDouble before = DoubleDouble.ZERO;
        DoubleDouble here = DoubleDouble.of(0x1p-500);
        high[0] = here.hi();
        DoubleDouble back = DoubleDouble.ZERO;
        for (int i = 0; i + 1 < high.length; i++) {
            if ((i & 0xffff) == 0) {
                Interruption.check();
            }
            long n = from + (long) direction * i;
            DoubleDouble on = coupling(direction > 0 ? n + 1 : n);
            DoubleDouble next =
                    diagonal(n).times(here).minus(back.times(before)).dividedBy(on);
            back = on;
            before = here;
            here = next;
            if (Math.abs(here.hi()) > 0x1p400) {
                for (int j = 0; j <= i; j++) {
                    high[j] *= 0x1p-800;
                    low[j] *= 0x1p-800;
                }
                before = before.times(0x1p-800);
                here = here.times(0x1p-800);
            }
            high[i + 1] = here.hi();
            low[i + 1] = here.lo();
        }
        return high;
    }

    private static double weight(double[] values) {
        DoubleDouble sum = DoubleDouble.ZERO;
        for (double value : values) {
            sum = sum.plus(value * value);
        }
        return sum.hi();
    }

    private double residual(double[] values, double[] low) {
        double sum = 0;
        int size = values.length;
        for (int i = -1; i <= size; i++) {
            long n = first + i;
            if (n < 0) {
                continue;
            }
            DoubleDouble row = DoubleDouble.ZERO;
            if (i >= 0 && i < size) {
                row = diagonal(n).times(new DoubleDouble(values[i], low[i]));
            }
            if (i >= 1) {
                row = row.minus(coupling(n).times(new DoubleDouble(values[i - 1], low[i - 1])));
            }
            if (i + 1 < size) {
                row = row.minus(coupling(n + 1).times(new DoubleDouble(values[i + 1], low[i + 1])));
            }
            sum += row.hi() * row.hi();
        }
        // each row is right to 2^−98 of its largest term
        double rounding = 0x1p-98 * (first + size + mean + level) * Math.sqrt(weight(values));
        return Math.sqrt(sum) + 4 * rounding;
    }
}
