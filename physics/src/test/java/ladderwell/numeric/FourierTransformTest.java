package ladderwell.numeric;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;

import java.util.Random;
import org.junit.jupiter.api.Test;

class FourierTransformTest {

    @Test
    void everyLengthAgreesWithTheSumItStandsFor() {
        Random random = new Random(11);
        for (int size = 2; size <= 512; size *= 2) {
            double[] re = random.doubles(size, -1, 1).toArray();
            double[] im = random.doubles(size, -1, 1).toArray();
            double[] r = re.clone();
            double[] i = im.clone();
            new FourierTransform(size).forward(r, i);
            for (int k = 0; k < size; k++) {
                double sumRe = 0;
                double sumIm = 0;
                for (int j = 0; j < size; j++) {
                    double angle = -2 * Math.PI * ((long) j * k % size) / size;
                    sumRe += re[j] * Math.cos(angle) - im[j] * Math.sin(angle);
                    sumIm += re[j] * Math.sin(angle) + im[j] * Math.cos(angle);
                }
                // the plain sum rounds size times
                assertEquals(sumRe, r[k], 1e-15 * size, "size " + size);
                assertEquals(sumIm, i[k], 1e-15 * size, "size " + size);
            }
        }
    }

    @Test
    void thereAndBackIsTheSameTimesTheSize() {
        Random random = new Random(12);
        for (int size : new int[] {2, 8, 4096, 8192}) {
            double[] re = random.doubles(size, -1, 1).toArray();
            double[] im = random.doubles(size, -1, 1).toArray();
            double[] r = re.clone();
            double[] i = im.clone();
            FourierTransform transform = new FourierTransform(size);
            transform.forward(r, i);
            transform.backward(r, i);
            for (int j = 0; j < size; j++) {
                assertEquals(re[j], r[j] / size, 2e-15);
                assertEquals(im[j], i[j] / size, 2e-15);
            }
        }
    }

    @Test
    void onlyPowersOfTwoAreTransformed() {
        for (int size : new int[] {-4, 0, 1, 3, 6, 1000}) {
            assertThrows(IllegalArgumentException.class, () -> new FourierTransform(size));
        }
    }
}
