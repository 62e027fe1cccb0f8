package ladderwell;

import java.util.Arrays;
import ladderwell.level.Levels;
import ladderwell.state.Shape;

/**
 * A normalised sum of levels as a function of position.
 *
 * @param oscillator whose levels
 * @param numbers the levels
 * @param re real parts of their weights
 * @param im imaginary parts
 */
record LevelSum(Oscillator oscillator, long[] numbers, double[] re, double[] im) implements Shape {
    private static final double DROP = 1e-15;

    LevelSum {
        double norm = 0;
        for (int i = 0; i < re.length; i++) {
            norm = Math.hypot(norm, Math.hypot(re[i], im[i]));
        }
        re = re.clone();
        im = im.clone();
        for (int i = 0; i < re.length; i++) {
            re[i] /= norm;
            im[i] /= norm;
        }
    }

    static LevelSum level(Oscillator oscillator, long n) {
        return new LevelSum(oscillator, new long[] {n}, new double[] {1}, new double[] {0});
    }

    private long highest() {
        long highest = 0;
        for (long n : numbers) {
            highest = Math.max(highest, n);
        }
        return highest;
    }

    @Override
    public void sample(double[] x, double[] outRe, double[] outIm) {
        for (int i = 0; i < numbers.length; i++) {
            double[] wave = oscillator.levels().waveFunctions(numbers[i], 1, x)[0];
            for (int j = 0; j < x.length; j++) {
                outRe[j] += re[i] * wave[j];
                outIm[j] += im[i] * wave[j];
            }
        }
    }

    private double[] extent() {
        return oscillator.levels().extent(highest(), DROP);
    }

    @Override
    public double left() {
        return Math.max(oscillator.left(), extent()[0]);
    }

    @Override
    public double right() {
        return Math.min(oscillator.right(), extent()[1]);
    }

    @Override
    public double[] breaks() {
        double left = left();
        double right = right();
        return Arrays.stream(oscillator.breaks())
                .filter(b -> b > left && b < right)
                .toArray();
    }

    @Override
    public double wave() {
        double kinetic = Math.max(oscillator.levels().energyHigh(highest()) - bottom(), 0);
        return 2 * Math.sqrt(2 * kinetic) + 12 / (right() - left());
    }

    @Override
    public double energy() {
        Levels levels = oscillator.levels();
        double energy = 0;
        for (int i = 0; i < numbers.length; i++) {
            energy += (re[i] * re[i] + im[i] * im[i]) * levels.energyHigh(numbers[i]);
        }
        return energy;
    }

    @Override
    public double bottom() {
        return Shapes.bottom(oscillator, left(), right());
    }
}
