package ladderwell.bench;

import java.util.Arrays;
import java.util.Random;
import ladderwell.numeric.DensityFrames;
import ladderwell.numeric.HermiteFunctions;
import ladderwell.numeric.Workers;

/** Random coefficients on 220 oscillator levels, 600 points from -24 to 24, 400 times; the table of functions is given. */
final class RandomPacket {
    static final int LEVELS = 220;
    static final int POINTS = 600;
    private static final int TIMES = 400;

    final double[] x = grid();
    final double[][] functions = HermiteFunctions.window(0, LEVELS, x);
    final double[][] re = new double[TIMES][LEVELS];
    final double[][] im = new double[TIMES][LEVELS];
    private final DensityFrames frames = DensityFrames.alternating(functions);
    private final double[][] density = new double[TIMES][POINTS];

    RandomPacket() {
        Random random = new Random(3);
        for (int j = 0; j < TIMES; j++) {
            double square = 0;
            for (int k = 0; k < LEVELS; k++) {
                re[j][k] = random.nextGaussian();
                im[j][k] = random.nextGaussian();
                square += re[j][k] * re[j][k] + im[j][k] * im[j][k];
            }
            double norm = Math.sqrt(square);
            for (int k = 0; k < LEVELS; k++) {
                re[j][k] /= norm;
                im[j][k] /= norm;
            }
        }
    }

    static double[] grid() {
        double step = 48.0 / POINTS;
        double[] x = new double[POINTS];
        Arrays.setAll(x, i -> -24 + step / 2 + step * i);
        return x;
    }

    void run(Workers workers) {
        frames.fill(re, im, density, workers);
    }

    /** Largest error at every 40th time, against compensated sums (exact products, error carried along). */
    double error() {
        double largest = 0;
        for (int j = 0; j < TIMES; j += 40) {
            for (int i = 0; i < POINTS; i++) {
                double u = sum(re[j], i);
                double v = sum(im[j], i);
                largest = Math.max(largest, Math.abs(density[j][i] - (u * u + v * v)));
            }
        }
        return largest;
    }

    /** Σ c_k φ_k(x_i) as if in twice the precision (Ogita, Rump and Oishi 2005). */
    private double sum(double[] c, int i) {
        double sum = 0;
        double carry = 0;
        for (int k = 0; k < LEVELS; k++) {
            double product = c[k] * functions[k][i];
            double productError = Math.fma(c[k], functions[k][i], -product);
            double next = sum + product;
            double part = next - sum;
            carry += (sum - (next - part)) + (product - part) + productError;
            sum = next;
        }
        return sum + carry;
    }
}
