package ladderwell.window;

import java.util.ArrayList;
import java.util.List;

/**
 * The slow way, for comparison: matrices from products of the matrix of a on more levels than are needed, and a Taylor series in short steps. Shares no code
 * with what it checks.
 */
final class PlainMotion {
    /** A polynomial in a and a†: each term {j, k, re, im} is (re + i im) a†^j a^k. */
    record Terms(List<double[]> terms) {
        double[][][] matrix(int levels) {
            int wide = levels + 16;
            double[][] lower = new double[wide][wide];
            for (int n = 1; n < wide; n++) {
                lower[n - 1][n] = Math.sqrt(n);
            }
            double[][] re = new double[levels][levels];
            double[][] im = new double[levels][levels];
            for (double[] term : terms) {
                double[][] product = identity(wide);
                for (int i = 0; i < term[1]; i++) {
                    product = times(product, lower);
                }
                for (int i = 0; i < term[0]; i++) {
                    product = times(transposed(lower), product);
                }
                for (int m = 0; m < levels; m++) {
                    for (int n = 0; n < levels; n++) {
                        re[m][n] += term[2] * product[m][n];
                        im[m][n] += term[3] * product[m][n];
                    }
                }
            }
            return new double[][][] {re, im};
        }
    }

    private static double[][] identity(int size) {
        double[][] one = new double[size][size];
        for (int i = 0; i < size; i++) {
            one[i][i] = 1;
        }
        return one;
    }

    private static double[][] transposed(double[][] a) {
        double[][] t = new double[a.length][a.length];
        for (int i = 0; i < a.length; i++) {
            for (int j = 0; j < a.length; j++) {
                t[j][i] = a[i][j];
            }
        }
        return t;
    }

    private static double[][] times(double[][] a, double[][] b) {
        int size = a.length;
        double[][] c = new double[size][size];
        for (int i = 0; i < size; i++) {
            for (int k = 0; k < size; k++) {
                if (a[i][k] != 0) {
                    for (int j = 0; j < size; j++) {
                        c[i][j] += a[i][k] * b[k][j];
                    }
                }
            }
        }
        return c;
    }

    /** Entries that are not zero: {row, column, re, im}. */
    private static List<double[]> entries(double[][][] matrix) {
        List<double[]> all = new ArrayList<>();
        for (int m = 0; m < matrix[0].length; m++) {
            for (int n = 0; n < matrix[0].length; n++) {
                if (matrix[0][m][n] != 0 || matrix[1][m][n] != 0) {
                    all.add(new double[] {m, n, matrix[0][m][n], matrix[1][m][n]});
                }
            }
        }
        return all;
    }

    private final int levels;
    private final List<double[]> drift;
    private final List<List<double[]>> jumps = new ArrayList<>();
    private double size;

    PlainMotion(int levels, Terms hamiltonian, List<Terms> operators) {
        this.levels = levels;
        double[][][] h = hamiltonian.matrix(levels);
        double[][][] k = {h[1], new double[levels][levels]};
        for (int m = 0; m < levels; m++) {
            for (int n = 0; n < levels; n++) {
                k[1][m][n] = -h[0][m][n];
            }
        }
        for (Terms operator : operators) {
            double[][][] g = operator.matrix(levels + 8);
            for (int m = 0; m < levels; m++) {
                for (int n = 0; n < levels; n++) {
                    for (int i = 0; i < levels + 8; i++) {
                        // −½ G†G
                        k[0][m][n] -= 0.5 * (g[0][i][m] * g[0][i][n] + g[1][i][m] * g[1][i][n]);
                        k[1][m][n] -= 0.5 * (g[0][i][m] * g[1][i][n] - g[1][i][m] * g[0][i][n]);
                    }
                }
            }
            List<double[]> inside = new ArrayList<>();
            for (double[] e : entries(g)) {
                if (e[0] < levels && e[1] < levels) {
                    inside.add(e);
                }
            }
            jumps.add(inside);
        }
        drift = entries(k);
        double[] rows = new double[levels];
        for (double[] e : drift) {
            rows[(int) e[0]] += Math.hypot(e[2], e[3]);
        }
        for (double row : rows) {
            size = Math.max(size, 4 * row);
        }
    }

    /** ρ after a time; matrices are full. */
    double[][][] after(double[][][] start, double time) {
        double[][][] y = {copy(start[0]), copy(start[1])};
        int steps = Math.max(1, (int) Math.ceil(time * size / 8));
        double h = time / steps;
        for (int s = 0; s < steps; s++) {
            double[][][] term = y;
            double[][][] sum = {copy(y[0]), copy(y[1])};
            for (int k = 1; k <= 44; k++) {
                term = apply(term);
                for (int m = 0; m < levels; m++) {
                    for (int n = 0; n < levels; n++) {
                        term[0][m][n] *= h / k;
                        term[1][m][n] *= h / k;
                        sum[0][m][n] += term[0][m][n];
                        sum[1][m][n] += term[1][m][n];
                    }
                }
            }
            y = sum;
        }
        return y;
    }

    private double[][][] apply(double[][][] y) {
        double[][] re = new double[levels][levels];
        double[][] im = new double[levels][levels];
        for (double[] e : drift) {
            int m = (int) e[0];
            int k = (int) e[1];
            for (int n = 0; n < levels; n++) {
                re[m][n] += e[2] * y[0][k][n] - e[3] * y[1][k][n];
                im[m][n] += e[2] * y[1][k][n] + e[3] * y[0][k][n];
            }
        }
        // + adjoint
        double[][] bothRe = new double[levels][levels];
        double[][] bothIm = new double[levels][levels];
        for (int m = 0; m < levels; m++) {
            for (int n = 0; n < levels; n++) {
                bothRe[m][n] = re[m][n] + re[n][m];
                bothIm[m][n] = im[m][n] - im[n][m];
            }
        }
        for (List<double[]> g : jumps) {
            double[][] leftRe = new double[levels][levels];
            double[][] leftIm = new double[levels][levels];
            for (double[] e : g) {
                int m = (int) e[0];
                int k = (int) e[1];
                for (int n = 0; n < levels; n++) {
                    leftRe[m][n] += e[2] * y[0][k][n] - e[3] * y[1][k][n];
                    leftIm[m][n] += e[2] * y[1][k][n] + e[3] * y[0][k][n];
                }
            }
            for (double[] e : g) {
                int n = (int) e[0];
                int k = (int) e[1];
                for (int m = 0; m < levels; m++) {
                    bothRe[m][n] += leftRe[m][k] * e[2] + leftIm[m][k] * e[3];
                    bothIm[m][n] += leftIm[m][k] * e[2] - leftRe[m][k] * e[3];
                }
            }
        }
        return new double[][][] {bothRe, bothIm};
    }

    private static double[][] copy(double[][] a) {
        double[][] b = new double[a.length][];
        for (int i = 0; i < a.length; i++) {
            b[i] = a[i].clone();
        }
        return b;
    }

    /** Norm of the highest rows: a reference is good only if next to nothing is there. */
    static double top(double[][][] y) {
        double sum = 0;
        for (int m = y[0].length - 6; m < y[0].length; m++) {
            for (int n = 0; n < y[0].length; n++) {
                sum += y[0][m][n] * y[0][m][n] + y[1][m][n] * y[1][m][n];
            }
        }
        return Math.sqrt(sum);
    }
}
