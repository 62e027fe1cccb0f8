package ladderwell.numeric;

import java.util.Arrays;

/**
 * The three-term recurrence phi_n = sqrt(2/n) x phi_(n-1) - sqrt((n-1)/n) phi_(n-2), climbed through a window in stages.
 *
 * <p>A stage starts at the ground state or at two neighbours from {@link PhaseFunction} and is cut after {@link #STAGE} levels, before its
 * rounding has grown. Within it the points are taken in blocks small enough that the three rows at work stay in the first-level cache.
 *
 * <p>A point so far outside that its start would underflow may still be reached by a higher level of the same stage. Such points climb
 * apart, each with its own binary exponent.
 */
final class HermiteLadder {
    /** Levels from one start to the next. */
    static final int STAGE = 1024;

    private static final int BLOCK = 640;

    private static final int GUARD = 300;
    private static final double TOO_BIG = 0x1p300;
    private static final double DOWN = 0x1p-300;
    private static final int GUARD_EVERY = 8;

    private static final double GROUND_AMPLITUDE = Math.pow(Math.PI, -0.25);

    private HermiteLadder() {}

    /** Fills the first x.length columns of every row; row 0 is level first. */
    static void fill(double[][] rows, int first, double[] x) {
        int last = first + rows.length - 1;
        int start = first < PhaseFunction.FIRST_INDEX ? 0 : first;
        while (start <= last) {
            int end = Math.min(last, start + STAGE - 1);
            if (start == 0) {
                fromGround(rows, first, end, x);
            } else {
                fromPhase(rows, first, start, end, x);
            }
            start = end + 1;
        }
    }

    private static void fromGround(double[][] rows, int first, int end, double[] x) {
        double[] below = new double[x.length];
        double[] ground = first == 0 ? rows[0] : new double[x.length];
        Tail tail = new Tail(x);
        double reach = reach(end);
        for (int j = 0; j < x.length; j++) {
            double distance = Math.abs(x[j]);
            ground[j] = 0.0;
            if (distance >= reach) {
                continue;
            }
            double half = 0.5 * x[j] * x[j];
            double halfLo = 0.5 * DoubleDouble.productError(x[j], x[j], x[j] * x[j]);
            if (half < 450.0) {
                ground[j] = GROUND_AMPLITUDE * (Math.exp(-half) * (1.0 - halfLo));
            } else {
                double powers = Math.rint(half / DoubleDouble.LN_2.hi());
                double rest = Math.fma(-powers, DoubleDouble.LN_2.hi(), half)
                        + Math.fma(-powers, DoubleDouble.LN_2.lo(), halfLo);
                tail.add(j, 0.0, GROUND_AMPLITUDE * Math.exp(-rest), (int) -powers);
            }
        }
        climb(rows, first, 0, end, below, ground, x);
        tail.climb(rows, first, 0, end);
    }

    private static void fromPhase(double[][] rows, int first, int start, int end, double[] x) {
        PhaseFunction lower = new PhaseFunction(start);
        double[] a = rows[start - first];
        double reach = reach(end);
        if (start == end) {
            for (int j = 0; j < x.length; j++) {
                a[j] = Math.abs(x[j]) < reach ? lower.at(x[j]) : 0.0;
            }
            return;
        }
        PhaseFunction upper = new PhaseFunction(start + 1);
        double[] b = rows[start + 1 - first];
        Tail tail = new Tail(x);
        for (int j = 0; j < x.length; j++) {
            a[j] = 0.0;
            b[j] = 0.0;
            if (Math.abs(x[j]) >= reach) {
                continue;
            }
            int shift = lower.tailShift(x[j]);
            if (shift < 650) {
                a[j] = lower.at(x[j]);
                b[j] = upper.at(x[j]);
            } else {
                tail.add(j, lower.scaled(x[j], shift), upper.scaled(x[j], shift), -shift);
            }
        }
        climb(rows, first, start + 1, end, a, b, x);
        tail.climb(rows, first, start + 1, end);
    }

    /** Beyond this every level up to n is below 1e-340: the exponent there is above (x - mu)^2/2. */
    private static double reach(int n) {
        return Math.sqrt(2.0 * n + 1.0) + 40.0;
    }

    /** From level (values in current, those of level-1 in previous) to end; levels of the window are stored, lower ones pass through. */
    private static void climb(
            double[][] rows, int first, int level, int end, double[] previous, double[] current, double[] x) {
        for (int from = 0; from < x.length; from += BLOCK) {
            int to = Math.min(from + BLOCK, x.length);
            double[] a = previous;
            double[] b = current;
            int n = level + 1;
            while (n < end) {
                double[] next = n < first ? a : rows[n - first];
                double[] afterNext = n + 1 < first ? b : rows[n + 1 - first];
                twoSteps(next, afterNext, b, a, x, from, to, up(n), down(n), up(n + 1), down(n + 1));
                a = next;
                b = afterNext;
                n += 2;
            }
            if (n == end) {
                step(n < first ? a : rows[n - first], b, a, x, from, to, up(n), down(n));
            }
        }
    }

    private static double up(int n) {
        return Math.sqrt(2.0 / n);
    }

    private static double down(int n) {
        return -Math.sqrt((n - 1.0) / n);
    }

    private static void step(
            double[] next, double[] current, double[] previous, double[] x, int from, int to, double up, double down) {
        for (int j = from; j < to; j++) {
            next[j] = Math.fma(up * x[j], current[j], down * previous[j]);
        }
    }

    // Two levels a pass: the loads of x and of the lower levels serve both. Each target may be the array it follows by
    // two levels.
    private static void twoSteps(
            double[] next,
            double[] afterNext,
            double[] current,
            double[] previous,
            double[] x,
            int from,
            int to,
            double up,
            double down,
            double secondUp,
            double secondDown) {
        for (int j = from; j < to; j++) {
            double middle = current[j];
            double above = Math.fma(up * x[j], middle, down * previous[j]);
            next[j] = above;
            afterNext[j] = Math.fma(secondUp * x[j], above, secondDown * middle);
        }
    }

    /** Points whose start underflows: mantissas and a binary exponent each. */
    private static final class Tail {
        private final double[] x;
        private int size;
        private int[] column = new int[0];
        private double[] position = new double[0];
        private double[] previous = new double[0];
        private double[] current = new double[0];
        // 2^exponent as two factors: a mantissa of 2^300 may belong to a value that 2^exponent alone would already
        // lose.
        private double[] scale = new double[0];
        private double[] secondScale = new double[0];
        private int[] exponent = new int[0];

        Tail(double[] x) {
            this.x = x;
        }

        void add(int j, double before, double now, int binaryExponent) {
            if (size == column.length) {
                int larger = Math.max(16, 2 * size);
                column = Arrays.copyOf(column, larger);
                position = Arrays.copyOf(position, larger);
                previous = Arrays.copyOf(previous, larger);
                current = Arrays.copyOf(current, larger);
                scale = Arrays.copyOf(scale, larger);
                secondScale = Arrays.copyOf(secondScale, larger);
                exponent = Arrays.copyOf(exponent, larger);
            }
            column[size] = j;
            position[size] = x[j];
            previous[size] = before;
            current[size] = now;
            exponent[size] = binaryExponent;
            size++;
        }

        void climb(double[][] rows, int first, int level, int end) {
            if (size == 0) {
                return;
            }
            for (int i = 0; i < size; i++) {
                rescale(i);
            }
            if (level - 1 >= first) {
                store(rows[level - 1 - first], previous);
            }
            if (level >= first) {
                store(rows[level - first], current);
            }
            double[] a = previous;
            double[] b = current;
            for (int n = level + 1; n <= end; n++) {
                step(a, b, a, position, 0, size, up(n), down(n));
                double[] next = a;
                a = b;
                b = next;
                if (n % GUARD_EVERY == 0) {
                    guard(a, b);
                }
                if (n >= first) {
                    store(rows[n - first], b);
                }
            }
        }

        private void guard(double[] a, double[] b) {
            for (int i = 0; i < size; i++) {
                if (Math.abs(b[i]) > TOO_BIG) {
                    a[i] *= DOWN;
                    b[i] *= DOWN;
                    exponent[i] += GUARD;
                    rescale(i);
                }
            }
        }

        private void rescale(int i) {
            int half = exponent[i] / 2;
            scale[i] = Math.scalb(1.0, half);
            secondScale[i] = Math.scalb(1.0, exponent[i] - half);
        }

        private void store(double[] row, double[] mantissa) {
            for (int i = 0; i < size; i++) {
                row[column[i]] = mantissa[i] * scale[i] * secondScale[i];
            }
        }
    }
}
