package ladderwell.packet;

import ladderwell.numeric.FourierTransform;
import ladderwell.state.Shape;

/** A wave function at one time, and what is read from it. Immutable. @units scaled */
public final class GridFrame {
    /** Neighbours that a value between points is taken from, on a grid eight times as fine. */
    private static final int NEIGHBOURS = 10;

    /** Share of the largest density below which a density is rounding. */
    private static final double ROUNDED_AWAY = 1e-20;

    private final Wave wave;
    private final double time;

    GridFrame(Wave wave, double time) {
        this.wave = wave;
        this.time = time;
    }

    /**
     * A distribution's mean, variance, and the standard deviation of the squared distance from the mean.
     *
     * @param mean mean
     * @param variance variance
     * @param curl standard deviation of (· − mean)²
     */
    public record Moments(double mean, double variance, double curl) {
        static Moments of(double[] value, double[] weight) {
            double total = 0;
            double first = 0;
            for (int j = 0; j < value.length; j++) {
                total += weight[j];
                first += weight[j] * value[j];
            }
            double mean = first / total;
            double second = 0;
            double fourth = 0;
            for (int j = 0; j < value.length; j++) {
                double square = (value[j] - mean) * (value[j] - mean);
                second += weight[j] * square;
                fourth += weight[j] * square * square;
            }
            double variance = second / total;
            return new Moments(mean, variance, Math.sqrt(Math.max(0, fourth / total - variance * variance)));
        }
    }

    Wave wave() {
        return wave;
    }

    /** Its grid. */
    public Grid grid() {
        return wave.grid;
    }

    /** Its time. */
    public double time() {
        return time;
    }

    /** Real parts at the positions of the grid, a copy. */
    public double[] re() {
        return wave.re.clone();
    }

    /** Imaginary parts at the positions of the grid, a copy. */
    public double[] im() {
        return wave.im.clone();
    }

    /** ‖ψ‖. */
    public double norm() {
        return wave.norm();
    }

    /** Moments of the position. */
    public Moments position() {
        return Moments.of(wave.grid.positions(), squares(wave.re, wave.im));
    }

    /** Moments of the momentum. */
    public Moments momentum() {
        double[] re = wave.re.clone();
        double[] im = wave.im.clone();
        new FourierTransform(re.length).forward(re, im);
        double[] p = new double[re.length];
        for (int k = 0; k < p.length; k++) {
            p[k] = wave.grid.wave(k);
        }
        return Moments.of(p, squares(re, im));
    }

    private static double[] squares(double[] re, double[] im) {
        double[] squares = new double[re.length];
        for (int j = 0; j < squares.length; j++) {
            squares[j] = re[j] * re[j] + im[j] * im[j];
        }
        return squares;
    }

    /**
     * Mean of p²/2 + V(x, t) and its standard deviation.
     *
     * @param error ‖ψ − ψ̃‖: where the density is below its square times the peak, nothing of the packet can be told
     * @shape {mean, deviation}
     */
    public double[] energy(PotentialField field, double error) {
        double least = Math.max(ROUNDED_AWAY, error * error);
        int n = wave.re.length;
        double[] re = wave.re.clone();
        double[] im = wave.im.clone();
        FourierTransform transform = new FourierTransform(n);
        transform.forward(re, im);
        for (int k = 0; k < n; k++) {
            double kinetic = wave.grid.wave(k) * wave.grid.wave(k) / 2 / n;
            re[k] *= kinetic;
            im[k] *= kinetic;
        }
        transform.backward(re, im);
        double[] v = new double[n];
        field.values(wave.grid.positions(), time, v);
        double norm = 0;
        double mean = 0;
        double square = 0;
        double peak = 0;
        for (int j = 0; j < n; j++) {
            peak = Math.max(peak, wave.re[j] * wave.re[j] + wave.im[j] * wave.im[j]);
        }
        for (int j = 0; j < n; j++) {
            double weight = wave.re[j] * wave.re[j] + wave.im[j] * wave.im[j];
            // There a wall counts for nothing, however high.
            double here = weight < least * peak || !Double.isFinite(v[j]) ? 0 : v[j];
            re[j] += here * wave.re[j];
            im[j] += here * wave.im[j];
            norm += weight;
            mean += wave.re[j] * re[j] + wave.im[j] * im[j];
            square += re[j] * re[j] + im[j] * im[j];
        }
        mean /= norm;
        return new double[] {mean, Math.sqrt(Math.max(0, square / norm - mean * mean))};
    }

    /** ⟨φ|ψ⟩ with another state, given as a function of position. @shape {real, imaginary part} */
    public double[] overlap(Shape other) {
        return overlap(sampled(other, wave.grid));
    }

    /** The same at several times, the other state sampled once for each grid. @shape [time]{real, imaginary part} */
    static double[][] overlaps(GridFrame[] frames, Shape other) {
        double[][] overlaps = new double[frames.length][];
        Wave there = null;
        for (int j = 0; j < frames.length; j++) {
            if (there == null || !there.grid.equals(frames[j].grid())) {
                there = sampled(other, frames[j].grid());
            }
            overlaps[j] = frames[j].overlap(there);
        }
        return overlaps;
    }

    private double[] overlap(Wave there) {
        double re = 0;
        double im = 0;
        for (int j = 0; j < wave.re.length; j++) {
            re += there.re[j] * wave.re[j] + there.im[j] * wave.im[j];
            im += there.re[j] * wave.im[j] - there.im[j] * wave.re[j];
        }
        return new double[] {re * wave.grid.spacing(), im * wave.grid.spacing()};
    }

    /** A state on a grid; 0 beyond its ends. */
    static Wave sampled(Shape shape, Grid grid) {
        double[] x = grid.positions();
        int from = 0;
        while (from < x.length && x[from] < shape.left()) {
            from++;
        }
        int to = x.length;
        while (to > from && x[to - 1] > shape.right()) {
            to--;
        }
        double[] inside = java.util.Arrays.copyOfRange(x, from, to);
        double[] re = new double[inside.length];
        double[] im = new double[inside.length];
        shape.sample(inside, re, im);
        double[] allRe = new double[x.length];
        double[] allIm = new double[x.length];
        System.arraycopy(re, 0, allRe, from, re.length);
        System.arraycopy(im, 0, allIm, from, im.length);
        return new Wave(grid, allRe, allIm);
    }

    /** Ends of the region outside of which |ψ|² stays below a share of its peak. @shape {left, right} */
    public double[] extent(double share) {
        double[] squares = squares(wave.re, wave.im);
        double peak = 0;
        for (double s : squares) {
            peak = Math.max(peak, s);
        }
        int from = 0;
        while (squares[from] < share * peak) {
            from++;
        }
        int to = squares.length - 1;
        while (squares[to] < share * peak) {
            to--;
        }
        return new double[] {wave.grid.left() + from * wave.grid.spacing(), wave.grid.left() + to * wave.grid.spacing()
        };
    }

    /**
     * |ψ|² at any positions, by the transform filled up to an eighth of the spacing and a polynomial through ten neighbours.
     *
     * @return relative to the peak exact to about 1e-8 for the highest waves of the grid, and to rounding for most
     */
    public double[] density(double[] x) {
        Wave fine = wave.finer().finer().finer();
        double h = fine.grid.spacing();
        double[] density = new double[x.length];
        double[] weight = new double[NEIGHBOURS];
        for (int i = 0; i < x.length; i++) {
            double place = (x[i] - fine.grid.left()) / h;
            int first = (int) Math.floor(place) - NEIGHBOURS / 2 + 1;
            if (first < 0 || first + NEIGHBOURS > fine.re.length) {
                continue;
            }
            weights(place - first, weight);
            double re = 0;
            double im = 0;
            for (int k = 0; k < NEIGHBOURS; k++) {
                re += weight[k] * fine.re[first + k];
                im += weight[k] * fine.im[first + k];
            }
            density[i] = re * re + im * im;
        }
        return density;
    }

    /** Lagrange's weights at a place between 0 and NEIGHBOURS − 1. */
    private static void weights(double place, double[] weight) {
        for (int k = 0; k < weight.length; k++) {
            double product = 1;
            for (int m = 0; m < weight.length; m++) {
                if (m != k) {
                    product *= (place - m) / (k - m);
                }
            }
            weight[k] = product;
        }
    }
}
