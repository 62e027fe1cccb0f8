package ladderwell.numeric;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.Random;
import org.junit.jupiter.api.Test;

class HermitianTransformTest {

    private record Given(double[][] re, double[][] im) implements HermitianTransform.Rows {
        static Given random(Random random, int... lengths) {
            double[][] re = new double[lengths.length][];
            double[][] im = new double[lengths.length][];
            for (int i = 0; i < lengths.length; i++) {
                re[i] = random.doubles(lengths[i], -1, 1).toArray();
                im[i] = random.doubles(lengths[i], -1, 1).toArray();
                if (lengths[i] > 0) {
                    im[i][0] = 0;
                }
            }
            return new Given(re, im);
        }

        @Override
        public int length(int row) {
            return re[row].length;
        }

        @Override
        public void fill(int row, int from, int count, double[] outRe, double[] outIm) {
            System.arraycopy(re[row], from, outRe, 0, count);
            System.arraycopy(im[row], from, outIm, 0, count);
        }
    }

    /** All kinds of loops, odd and even numbers of angles, sums of one and of several pieces. */
    @Test
    void sumsAreTheOnesWrittenOut() {
        Random random = new Random(4);
        for (Loops loops : new Loops[] {Loops.chosen(), new PlainLoops()}) {
            for (int columns : new int[] {1, 2, 37, 40}) {
                for (double centre : new double[] {0, 1.7}) {
                    Given given = Given.random(random, 5, 0, 1, 200, 2500, 3, 64);
                    double step = 0.031;
                    double spacing = 0.43;
                    double[][] out = new double[7][columns];
                    new HermitianTransform(loops, step, spacing, centre, columns).transform(given, 7, 0.5, out);
                    for (int i = 0; i < 7; i++) {
                        check(given, i, step, spacing, centre, out[i]);
                    }
                }
            }
        }
    }

    private static void check(Given given, int row, double step, double spacing, double centre, double[] out) {
        for (int j = 0; j < out.length; j++) {
            double angle = 2 * step * (centre + spacing * (j - (out.length - 1) / 2.0));
            double sum = 0;
            double size = 0;
            for (int k = 0; k < given.length(row); k++) {
                double twice = k == 0 ? 1 : 2;
                double re = given.re[row][k];
                double im = given.im[row][k];
                sum += twice * (re * Math.cos(k * angle) + im * Math.sin(k * angle));
                size += twice * Math.hypot(re, im);
            }
            // The plain sum is no better: its angles are off by some units of rounding of up to 5000 radians.
            double allowed = 0.5 * size * (HermitianTransform.errorFactor(given.length(row)) + 1e-12);
            assertEquals(0.5 * sum, out[j], allowed, "row " + row + ", angle " + j);
        }
    }

    @Test
    void formIsTheOneWrittenOut() {
        Random random = new Random(8);
        for (Loops loops : new Loops[] {Loops.chosen(), new PlainLoops()}) {
            for (int size : new int[] {1, 5, 18}) {
                for (int[] rule : new int[][] {{2, 0}, {2, 1}, {6, 3}, {10, 4}}) {
                    int points = 61;
                    double[] re = random.doubles(size * (size + 1) / 2, -1, 1).toArray();
                    double[] im = random.doubles(re.length, -1, 1).toArray();
                    double[][] f = new double[size][];
                    for (int m = 0; m < size; m++) {
                        f[m] = random.doubles(points, -1, 1).toArray();
                    }
                    HermitianForm form = new HermitianForm(loops, size, re, im);
                    form.pairs(
                            (places, table) -> {
                                for (int m = 0; m < size; m++) {
                                    for (int i = 0; i < places.length; i++) {
                                        table[m][i] = places[i] < 0 ? 0 : f[m][places[i]];
                                    }
                                }
                            },
                            points,
                            rule[0],
                            rule[1],
                            0,
                            2 * points);
                    checkForm(form, f, re, im, rule);
                }
            }
        }
    }

    private static void checkForm(HermitianForm form, double[][] f, double[] re, double[] im, int[] rule) {
        int points = f[0].length;
        double[] outRe = new double[points];
        double[] outIm = new double[points];
        for (int middle = 0; middle < points; middle++) {
            if (Math.floorMod(2 * middle - rule[1], rule[0]) != 0) {
                continue;
            }
            int count = Math.min(middle, points - 1 - middle) + 1;
            form.fill(middle, 0, count, outRe, outIm);
            for (int k = 0; k < count; k++) {
                double sumRe = 0;
                double sumIm = 0;
                for (int m = 0; m < f.length; m++) {
                    for (int n = 0; n < f.length; n++) {
                        int at = m >= n ? m * (m + 1) / 2 + n : n * (n + 1) / 2 + m;
                        double weight = f[m][middle + k] * f[n][middle - k];
                        sumRe += weight * re[at];
                        sumIm += weight * (m > n ? im[at] : m == n ? 0 : -im[at]);
                    }
                }
                // 18² terms below 1
                assertEquals(sumRe, outRe[k], 1e-13, "middle " + middle + ", distance " + k);
                assertEquals(sumIm, outIm[k], 1e-13, "middle " + middle + ", distance " + k);
            }
        }
    }
}
