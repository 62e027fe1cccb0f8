package ladderwell.bench;

import java.math.BigDecimal;
import java.math.MathContext;
import java.util.Arrays;
import ladderwell.numeric.HermiteFunctions;

/** Oscillator functions: a table of the lowest 220 at 600 points, and number 20000 at 1000 points. */
final class OscillatorFunctions {
    private static final int INDEX = 20_000;
    private static final MathContext DIGITS = new MathContext(50);

    private final double[] grid = RandomPacket.grid();
    private final double[] points = new double[1000];
    private double[][] table = {};
    private double[] single = {};

    OscillatorFunctions() {
        Arrays.setAll(points, i -> 215.0 * i / 999);
    }

    void table() {
        table = HermiteFunctions.window(0, RandomPacket.LEVELS, grid);
    }

    void single() {
        single = HermiteFunctions.single(INDEX, points);
    }

    /** Distance from orthonormal of the lowest 200, which the grid integrates to rounding. */
    double tableError() {
        double step = grid[1] - grid[0];
        double largest = 0;
        for (int m = 0; m < 200; m++) {
            for (int n = 0; n <= m; n++) {
                double sum = 0;
                for (int i = 0; i < grid.length; i++) {
                    sum += table[m][i] * table[n][i];
                }
                largest = Math.max(largest, Math.abs(sum * step - (m == n ? 1 : 0)));
            }
        }
        return largest;
    }

    /** Largest error at ten points, against the recurrence with 50 digits. */
    double singleError() {
        BigDecimal[] before = new BigDecimal[10];
        BigDecimal[] now = new BigDecimal[10];
        BigDecimal[] x = new BigDecimal[10];
        Arrays.setAll(x, i -> new BigDecimal(points[111 * i]));
        Arrays.fill(before, BigDecimal.ZERO);
        Arrays.fill(now, BigDecimal.ONE);
        // With φ_n = f_n exp(-x²/2)/π^¼ and g_n = f_n √(n!) 2^{-n/2}: no roots but one at the end: g_{n+1} = x g_n -
        // n/2 g_{n-1}.
        for (int n = 0; n < INDEX; n++) {
            BigDecimal half = BigDecimal.valueOf(n).divide(BigDecimal.valueOf(2));
            for (int i = 0; i < 10; i++) {
                BigDecimal next = x[i].multiply(now[i], DIGITS).subtract(half.multiply(before[i], DIGITS), DIGITS);
                before[i] = now[i];
                now[i] = next;
            }
        }
        BigDecimal square = BigDecimal.ONE;
        for (int n = 1; n <= INDEX; n++) {
            square = square.multiply(BigDecimal.valueOf(n), DIGITS).divide(BigDecimal.valueOf(2), DIGITS);
        }
        BigDecimal norm = square.sqrt(DIGITS);
        double largest = 0;
        for (int i = 0; i < 10; i++) {
            BigDecimal f = now[i].divide(norm, DIGITS);
            BigDecimal gauss = exponential(x[i].multiply(x[i]).divide(BigDecimal.valueOf(-2), DIGITS));
            double exact = f.multiply(gauss, DIGITS).doubleValue() * Math.pow(Math.PI, -0.25);
            largest = Math.max(largest, Math.abs(single[111 * i] - exact));
        }
        return largest;
    }

    private static BigDecimal exponential(BigDecimal y) {
        // e^y = (e^{y/2^20})^{2^20}; |y| is below 25 000.
        BigDecimal small = y.divide(BigDecimal.valueOf(1 << 20), new MathContext(70));
        BigDecimal term = BigDecimal.ONE;
        BigDecimal sum = BigDecimal.ONE;
        for (int k = 1; k < 40; k++) {
            term = term.multiply(small).divide(BigDecimal.valueOf(k), new MathContext(70));
            sum = sum.add(term, new MathContext(70));
        }
        for (int k = 0; k < 20; k++) {
            sum = sum.multiply(sum, new MathContext(70));
        }
        return sum;
    }
}
