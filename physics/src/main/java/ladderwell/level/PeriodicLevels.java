package ladderwell.level;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.function.DoubleUnaryOperator;
import ladderwell.evidence.Bound;
import ladderwell.numeric.Interruption;

/**
 * Bloch levels of a smooth potential that repeats with a period L: p²/2 + V(x), φ(x + L) = e^{iθ} φ(x), in plane waves. An even potential at θ
 * = 0 or π is split by parity, so that nearly degenerate pairs stay apart. Levels count from 0 in order of energy; errors are estimated from
 * residuals.
 *
 * <p>A pendulum is this with θ = 0; a superconducting junction with offset charge n_g has θ = 2π n_g over one turn of the phase.
 */
public final class PeriodicLevels {
    private static final int MOST_SAMPLES = 4096;
    static final int MOST_LEVELS = 2000;

    private final double period;
    private final double phase;
    private final boolean even;
    /** V̂_q for q ≥ 0, e^{2πiqx/L} V̂_q + c.c. */
    private final double[] re;

    private final double[] im;
    private final double dropped;
    private final double size;
    private Solution solution = new Solution(new double[0], new double[0], new double[0][], new double[0][], 0);

    /** Levels with the plane-wave coefficients j = −reach … reach. */
    private record Solution(double[] energy, double[] error, double[][] re, double[][] im, int reach) {}

    private record Level(double energy, double error, double[] re, double[] im) {}

    PeriodicLevels(PotentialCurve curve, double period, double phase) {
        if (!(period > 0 && period <= Double.MAX_VALUE)) {
            throw new IllegalArgumentException("the period must be positive and finite, got " + period);
        }
        if (!(Math.abs(phase) <= 1e15)) {
            throw new IllegalArgumentException("the boundary phase must be a finite number, got " + phase);
        }
        this.period = period;
        double turned = Math.IEEEremainder(phase, 2 * Math.PI);
        this.phase = Math.abs(Math.abs(turned) - Math.PI) < 1e-15 ? Math.PI : turned;
        even = curve.isEven();
        double[][] found = fourier(curve);
        re = found[0];
        im = found[1];
        dropped = found[2][0];
        double sum = 0;
        for (int q = 0; q < re.length; q++) {
            sum += 2 * Math.hypot(re[q], im[q]);
        }
        size = sum;
    }

    /** Trapezoidal sums with more and more points until what they alias into is rounding. */
    private double[][] fourier(PotentialCurve curve) {
        for (int m = 64; m <= MOST_SAMPLES; m *= 2) {
            Interruption.check();
            double[] v = new double[m];
            double largest = 1e-300;
            for (int i = 0; i < m; i++) {
                double x = period * i / m;
                v[i] = curve.value(x);
                if (!(Math.abs(v[i]) <= Double.MAX_VALUE)) {
                    throw new IllegalArgumentException(
                            "the potential is " + (Double.isNaN(v[i]) ? "not a number" : "infinite") + " at x = " + x);
                }
                largest = Math.max(largest, Math.abs(v[i]));
            }
            double[] cosine = new double[m];
            for (int i = 0; i < m; i++) {
                cosine[i] = Math.cos(2 * Math.PI * i / m);
            }
            double[] a = new double[m / 2];
            double[] b = new double[m / 2];
            for (int q = 0; q < m / 2; q++) {
                for (int i = 0; i < m; i++) {
                    int turn = (int) ((long) q * i % m);
                    a[q] += v[i] * cosine[turn] / m;
                    // sin t = cos(t − π/2)
                    b[q] -= even ? 0 : v[i] * cosine[(turn + 3 * m / 4) % m] / m;
                }
            }
            int last = m / 2 - 1;
            while (last > 0 && Math.hypot(a[last], b[last]) <= 4e-16 * largest) {
                last--;
            }
            if (last < m / 4) {
                double rest = 0;
                for (int q = last + 1; q < m / 4; q++) {
                    rest += 2 * Math.hypot(a[q], b[q]);
                }
                return new double[][] {
                    Arrays.copyOf(a, last + 1), Arrays.copyOf(b, last + 1), {Math.min(rest, 1e-15 * largest)}
                };
            }
        }
        throw new IllegalArgumentException(
                "the potential is not smooth over its period of " + period + ": plane waves do not reach rounding");
    }

    /** The boundary phase, between −π and π. */
    public double phase() {
        return phase;
    }

    /** The period. */
    public double period() {
        return period;
    }

    /** Energy of level n. */
    public double energy(int n) {
        return solved(n).energy[n];
    }

    /** How far {@link #energy} can be off. */
    public Bound energyBound(int n) {
        return Bound.estimated(solved(n).error[n]);
    }

    /**
     * The wave function of level n, normed to 1 over a period; its overall phase is free.
     *
     * @shape result is {real parts, imaginary parts}, each [x.length]
     */
    public double[][] waveFunction(int n, double[] x) {
        Solution s = solved(n);
        double[][] wave = new double[2][x.length];
        double scale = 1 / Math.sqrt(period);
        for (int i = 0; i < x.length; i++) {
            for (int j = -s.reach; j <= s.reach; j++) {
                double angle = wave(j) * x[i];
                double c = Math.cos(angle) * scale;
                double d = Math.sin(angle) * scale;
                double a = s.re[n][j + s.reach];
                double b = s.im[n][j + s.reach];
                wave[0][i] += a * c - b * d;
                wave[1][i] += a * d + b * c;
            }
        }
        return wave;
    }

    /** Slope of the real (0) or imaginary (1) part of {@link #waveFunction}. */
    double[] slope(int n, double[] x, int part) {
        Solution s = solved(n);
        double[] slope = new double[x.length];
        double scale = 1 / Math.sqrt(period);
        for (int i = 0; i < x.length; i++) {
            for (int j = -s.reach; j <= s.reach; j++) {
                double k = wave(j);
                double c = Math.cos(k * x[i]) * k * scale;
                double d = Math.sin(k * x[i]) * k * scale;
                double a = s.re[n][j + s.reach];
                double b = s.im[n][j + s.reach];
                slope[i] += part == 0 ? -a * d - b * c : a * c - b * d;
            }
        }
        return slope;
    }

    /** ⟨m|p|n⟩ as {real part, imaginary part}. */
    public double[] momentum(int m, int n) {
        Solution s = solved(Math.max(m, n));
        double[] sum = new double[2];
        for (int j = -s.reach; j <= s.reach; j++) {
            int at = j + s.reach;
            double k = wave(j);
            sum[0] += k * (s.re[m][at] * s.re[n][at] + s.im[m][at] * s.im[n][at]);
            sum[1] += k * (s.re[m][at] * s.im[n][at] - s.im[m][at] * s.re[n][at]);
        }
        return sum;
    }

    /** ⟨m|f(x)|n⟩ over one period, f of the same period, as {real part, imaginary part}. */
    public double[] element(int m, int n, DoubleUnaryOperator f) {
        int points = 8 * solved(Math.max(m, n)).reach + 64;
        double[] x = new double[points];
        for (int i = 0; i < points; i++) {
            x[i] = period * i / points;
        }
        double[][] a = waveFunction(m, x);
        double[][] b = waveFunction(n, x);
        double[] sum = new double[2];
        for (int i = 0; i < points; i++) {
            double value = f.applyAsDouble(x[i]) * period / points;
            if (Double.isNaN(value)) {
                throw new IllegalArgumentException("the function is not a number at x = " + x[i]);
            }
            sum[0] += value * (a[0][i] * b[0][i] + a[1][i] * b[1][i]);
            sum[1] += value * (a[0][i] * b[1][i] - a[1][i] * b[0][i]);
        }
        return sum;
    }

    private double wave(int j) {
        return (2 * Math.PI * j + phase) / period;
    }

    private synchronized Solution solved(int n) {
        if (n < 0 || n >= MOST_LEVELS) {
            throw new IllegalArgumentException(
                    "levels of a periodic potential are computed for n = 0 … " + (MOST_LEVELS - 1) + ", got " + n);
        }
        if (n < solution.energy.length) {
            return solution;
        }
        int count = Math.max(16, Integer.highestOneBit(n) * 2);
        double unit = 2 * Math.PI / period;
        int reach = (int)
                (count / 2 + 1.5 * Math.sqrt(2 * size) / unit + 2 * Math.sqrt(Math.sqrt(size) / unit) + 12 + re.length);
        List<Level> levels = new ArrayList<>();
        boolean split = even && (phase == 0 || Math.abs(phase) == Math.PI);
        for (int parity = 0; parity < (split ? 2 : 1); parity++) {
            Interruption.check();
            double[][] rows = split ? parityRows(parity, reach) : allRows(reach);
            int wanted = Math.min(rows[0].length, split ? count / 2 + 2 : even ? count + 1 : 2 * count + 2);
            double[] values = BandSpectrum.lowest(rows, rows[0].length, wanted);
            BandVectors solver = new BandVectors(rows, rows[0].length);
            for (int i = 0; i < wanted; i += split || even ? 1 : 2) {
                levels.add(level(rows, values[i], solver.at(values[i]), split ? parity : -1, reach));
            }
        }
        levels.sort(Comparator.comparingDouble(Level::energy));
        double[] energy = new double[count];
        double[] error = new double[count];
        double[][] a = new double[count][];
        double[][] b = new double[count][];
        for (int i = 0; i < count; i++) {
            Level level = levels.get(i);
            energy[i] = level.energy;
            error[i] = level.error;
            a[i] = level.re;
            b[i] = level.im;
        }
        solution = new Solution(energy, error, a, b, reach);
        return solution;
    }

    /** Cosines (0) or sines (1) of whole multiples of 2π x/L at phase 0, of half-odd ones at phase π. */
    private double[][] parityRows(int parity, int reach) {
        int width = re.length - 1;
        boolean whole = phase == 0;
        int first = whole && parity == 1 ? 1 : 0;
        int n = reach + 1 - first;
        double[][] rows = new double[Math.min(width, n - 1) + 1][n];
        int sign = parity == 0 ? 1 : -1;
        for (int q = 0; q < rows.length; q++) {
            for (int i = 0; i + q < n; i++) {
                int a = i + first;
                int b = a + q;
                int sum = whole ? a + b : a + b + 1;
                double v = re[q] + (sum <= width ? sign * re[sum] : 0);
                if (whole && a == 0) {
                    // The constant has norm 1 where cosines have 1/√2.
                    v = b == 0 ? re[0] : Math.sqrt(2) * re[q];
                }
                double k = 2 * Math.PI / period * (whole ? a : a + 0.5);
                rows[q][i] = v + (q == 0 ? k * k / 2 : 0);
            }
        }
        return rows;
    }

    /** Plane waves −reach … reach; for a potential that is not even real and imaginary parts in turn, which doubles every level. */
    private double[][] allRows(int reach) {
        int width = re.length - 1;
        int n = 2 * reach + 1;
        if (even) {
            double[][] rows = new double[width + 1][n];
            for (int q = 0; q <= width; q++) {
                for (int i = 0; i + q < n; i++) {
                    double k = wave(i - reach);
                    rows[q][i] = re[q] + (q == 0 ? k * k / 2 : 0);
                }
            }
            return rows;
        }
        double[][] rows = new double[2 * width + 2][2 * n];
        for (int q = 0; q <= width; q++) {
            for (int i = 0; i + q < n; i++) {
                double k = wave(i - reach);
                double own = re[q] + (q == 0 ? k * k / 2 : 0);
                rows[2 * q][2 * i] = own;
                rows[2 * q][2 * i + 1] = own;
                if (q > 0) {
                    // H(i, i+q) = V̂_{−q} = a − i b: the real part couples to the imaginary one with +b, the other way
                    // with −b.
                    rows[2 * q + 1][2 * i] = im[q];
                    rows[2 * q - 1][2 * i + 1] = -im[q];
                }
            }
        }
        return rows;
    }

    private Level level(double[][] rows, double value, double[] v, int parity, int reach) {
        int n = v.length;
        double residual = 0;
        double product = 0;
        for (int i = 0; i < n + rows.length - 1; i++) {
            double sum = i < n ? (rows[0][i] - value) * v[i] : 0;
            for (int q = 1; q < rows.length; q++) {
                if (i - q >= 0 && i - q < n) {
                    // Beyond the basis the border repeats the last row.
                    double element = i < n ? rows[q][i - q] : rows[q][Math.max(0, n - 1 - q)];
                    sum += element * v[i - q];
                }
                if (i + q < n) {
                    sum += rows[q][i] * v[i + q];
                }
            }
            residual += sum * sum;
            product += i < n ? sum * v[i] : 0;
        }
        double energy = value + product;
        double error = Math.min(Math.sqrt(residual), residual * 1e3) + 1e-15 * (Math.abs(energy) + size) + dropped;
        double[] a = new double[2 * reach + 1];
        double[] b = new double[2 * reach + 1];
        if (parity < 0) {
            for (int j = 0; j < a.length; j++) {
                a[j] = even ? v[j] : v[2 * j];
                b[j] = even ? 0 : v[2 * j + 1];
            }
            return new Level(energy, error, a, b);
        }
        boolean whole = phase == 0;
        int first = whole && parity == 1 ? 1 : 0;
        for (int i = 0; i < n; i++) {
            int up = i + first;
            int down = whole ? -up : -up - 1;
            double c = whole && up == 0 ? v[i] : v[i] / Math.sqrt(2);
            if (parity == 0) {
                a[up + reach] = c;
                if (down + reach >= 0) {
                    a[down + reach] = c;
                }
            } else {
                b[up + reach] = -c;
                if (down + reach >= 0) {
                    b[down + reach] = c;
                }
            }
        }
        return new Level(energy, error, a, b);
    }

    @Override
    public String toString() {
        return "levels of a potential of period " + period + " at phase " + phase;
    }
}
