package ladderwell.numeric;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Random;
import java.util.concurrent.CancellationException;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import org.junit.jupiter.api.Test;

class MatrixProductTest {
    private static final int[][] SHAPES = {
        {1, 1, 1},
        {1, 5, 1},
        {2, 3, 4},
        {4, 8, 16},
        {5, 7, 9},
        {33, 17, 31},
        {64, 256, 24},
        {65, 257, 25},
        {37, 600, 131},
        {3, 0, 5}
    };

    static double[][] random(Random random, int rows, int columns) {
        double[][] matrix = new double[rows][columns];
        for (double[] row : matrix) {
            for (int j = 0; j < columns; j++) {
                row[j] = random.nextGaussian();
            }
        }
        return matrix;
    }

    @Test
    void vectorLoopsAreUsedWhereTheirModuleIsPresent() {
        // The tests run with the module; the plain loops are tested beside it.
        assertTrue(VectorSupport.available());
        assertInstanceOf(VectorLoops.class, Loops.chosen());
    }

    @Test
    void agreesWithTheDefinitionWithinItsBound() {
        Random random = new Random(5);
        for (int[] shape : SHAPES) {
            double[][] a = random(random, shape[0], shape[1]);
            double[][] b = random(random, shape[1], shape[2]);
            for (Loops loops : List.of(new PlainLoops(), new VectorLoops())) {
                double[][] c = new MatrixProduct(loops, b).of(a, Workers.CALLER);
                assertEquals(shape[0], c.length);
                for (int i = 0; i < shape[0]; i++) {
                    int columns = shape[1] == 0 ? 0 : shape[2];
                    assertEquals(columns, c[i].length);
                    for (int j = 0; j < columns; j++) {
                        double sum = 0;
                        double size = 0;
                        for (int l = 0; l < shape[1]; l++) {
                            sum += a[i][l] * b[l][j];
                            size += Math.abs(a[i][l] * b[l][j]);
                        }
                        // The bound of either way of summing.
                        assertEquals(sum, c[i][j], 2 * (shape[1] + 1) * 0x1p-53 * size);
                    }
                }
            }
        }
    }

    @Test
    void plainAndVectorLoopsGiveTheSameBits() {
        Random random = new Random(6);
        for (int[] shape : SHAPES) {
            double[][] a = random(random, shape[0], shape[1]);
            double[][] b = random(random, shape[1], shape[2]);
            assertArrayEquals(
                    new MatrixProduct(new PlainLoops(), b).of(a, Workers.CALLER),
                    new MatrixProduct(new VectorLoops(), b).of(a, Workers.CALLER));
        }
    }

    @Test
    void zerosAtTheEndsOfColumnsChangeNothing() {
        Random random = new Random(7);
        double[][] a = random(random, 9, 300);
        double[][] b = random(random, 300, 40);
        for (int l = 0; l < 300; l++) {
            for (int j = 0; j < 40; j++) {
                if (l < 5 * j || l > 290 - j) {
                    b[l][j] = 0;
                }
            }
        }
        double[][] c = MatrixProduct.by(b).of(a, Workers.CALLER);
        for (int i = 0; i < 9; i++) {
            for (int j = 0; j < 40; j++) {
                double sum = 0;
                for (int l = 0; l < 300; l++) {
                    sum = Math.fma(a[i][l], b[l][j], sum);
                }
                // Added in two blocks of rows, otherwise the same operations.
                assertEquals(sum, c[i][j], 1e-13 * Math.max(1, Math.abs(sum)));
            }
        }
    }

    @Test
    void threadsDoNotChangeBits() {
        Random random = new Random(8);
        double[][] a = random(random, 150, 70);
        MatrixProduct product = MatrixProduct.by(random(random, 70, 90));
        double[][] alone = product.of(a, Workers.CALLER);
        ExecutorService executor = Executors.newFixedThreadPool(4);
        try {
            for (int threads : new int[] {2, 3, 5}) {
                assertArrayEquals(alone, product.of(a, new Workers(executor, threads)));
            }
        } finally {
            executor.shutdownNow();
        }
    }

    @Test
    void refusesRowsOfTheWrongLength() {
        assertThrows(IllegalArgumentException.class, () -> MatrixProduct.by(new double[][] {{1, 2}, {3}}));
        MatrixProduct product = MatrixProduct.by(new double[][] {{1, 2}});
        assertThrows(IllegalArgumentException.class, () -> product.of(new double[][] {{1, 2}}, Workers.CALLER));
    }

    @Test
    void stopsWhenTheThreadIsInterrupted() {
        MatrixProduct product = MatrixProduct.by(new double[][] {{1, 2}});
        Thread.currentThread().interrupt();
        assertThrows(CancellationException.class, () -> product.of(new double[][] {{1}}, Workers.CALLER));
    }
}
