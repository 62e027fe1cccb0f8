package ladderwell.numeric;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.SplittableRandom;
import org.junit.jupiter.api.Test;

class RowLoopsTest {
    /** Numbers of order 1 and a few products each: a dozen roundings. */
    private static final double ROUNDING = 1e-14;

    private final SplittableRandom random = new SplittableRandom(5);

    private double[] numbers() {
        return random.doubles(64, -2, 2).toArray();
    }

    @Test
    void chosenLoopsGiveWhatPlainOnesGiveForAnyLengthAndStart() {
        RowLoops chosen = RowLoops.chosen();
        RowLoops plain = new PlainRowLoops();
        for (int length = 0; length < 40; length++) {
            int o = random.nextInt(12);
            int x = random.nextInt(12);
            int v = random.nextInt(12);
            double re = random.nextDouble() - 0.5;
            double im = random.nextDouble() - 0.5;
            double[] a = numbers();
            double[] b = numbers();
            double[] p = numbers();
            double[] q = numbers();
            double[] startRe = numbers();
            double[] startIm = numbers();
            double[][] results = new double[2][];
            for (int way = 0; way < 2; way++) {
                RowLoops loops = way == 0 ? chosen : plain;
                double[] outRe = startRe.clone();
                double[] outIm = startIm.clone();
                loops.add(outRe, o, a, x, length, re);
                loops.add(outRe, outIm, o, a, b, x, length, re, im);
                loops.diagonal(outRe, outIm, o, a, b, x, length, re, im, p, q, v);
                loops.product(outIm, o, a, x, length, im, p, v);
                loops.product(outRe, outIm, o, a, b, x, length, re, im, p, q, v);
                double[] both = new double[129];
                System.arraycopy(outRe, 0, both, 0, 64);
                System.arraycopy(outIm, 0, both, 64, 64);
                both[128] = loops.squares(outRe, outIm, o, length);
                results[way] = both;
            }
            assertArrayEquals(results[1], results[0], 40 * ROUNDING, "length " + length);
            // nothing beside the row is touched
            for (int i = 0; i < 64; i++) {
                if (i < o || i >= o + length) {
                    assertEquals(startRe[i], results[0][i]);
                    assertEquals(startIm[i], results[0][64 + i]);
                }
            }
        }
    }
}
