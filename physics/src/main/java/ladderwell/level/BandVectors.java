package ladderwell.level;

/**
 * Eigenvectors of a real symmetric band matrix by inverse iteration: the shifted matrix is factored with row exchanges, which leaves
 * 2·width diagonals above the main one. One object serves one matrix and keeps its work space.
 */
final class BandVectors {
    private final double[][] rows;
    private final int size;
    private final int width;
    private final int span;
    private final double[] upper;
    private final double[] lower;
    private final int[] exchanged;
    private final double tiny;

    /** @param rows rows[q][j] = A(j, j + q) */
    BandVectors(double[][] rows, int size) {
        this.rows = rows;
        this.size = size;
        width = Math.min(rows.length - 1, size - 1);
        span = 2 * width + 1;
        upper = new double[size * span];
        lower = new double[size * Math.max(1, width)];
        exchanged = new int[size];
        double largest = 0;
        for (int j = 0; j < size; j++) {
            largest = Math.max(largest, Math.abs(rows[0][j]));
        }
        tiny = Math.max(largest, 0x1p-900) * 0x1p-60;
    }

    /** Unit vector belonging to the eigenvalue nearest to value. */
    double[] at(double value) {
        factor(value);
        double[] x = new double[size];
        for (int i = 0; i < size; i++) {
            // A start without symmetry, so that it is orthogonal to no eigenvector.
            x[i] = 1 + 0.25 * ((i * 7) % 11) / 11.0;
        }
        back(x);
        normalize(x);
        for (int round = 0; round < 2; round++) {
            forward(x);
            back(x);
            normalize(x);
        }
        return x;
    }

    private void factor(double value) {
        for (int i = 0; i < size; i++) {
            int first = Math.max(0, i - width);
            int at = i * span;
            for (int c = 0; c < span; c++) {
                int column = first + c;
                int q = Math.abs(column - i);
                upper[at + c] = q <= width && column < size ? rows[q][Math.min(i, column)] : 0;
            }
            upper[at + i - first] -= value;
        }
        for (int k = 0; k < size; k++) {
            int end = Math.min(size, k + width + 1);
            int best = k;
            double pivot = upper[k * span];
            for (int i = k + 1; i < end; i++) {
                if (Math.abs(upper[i * span]) > Math.abs(pivot)) {
                    pivot = upper[i * span];
                    best = i;
                }
            }
            exchanged[k] = best;
            int own = k * span;
            if (best != k) {
                int other = best * span;
                for (int c = 0; c < span; c++) {
                    double keep = upper[own + c];
                    upper[own + c] = upper[other + c];
                    upper[other + c] = keep;
                }
            }
            if (Math.abs(pivot) < tiny) {
                pivot = tiny;
                upper[own] = tiny;
            }
            double inverse = 1 / pivot;
            for (int i = k + 1; i < end; i++) {
                int at = i * span;
                double factor = upper[at] * inverse;
                lower[k * width + i - k - 1] = factor;
                for (int c = 1; c < span; c++) {
                    upper[at + c - 1] = upper[at + c] - factor * upper[own + c];
                }
                upper[at + span - 1] = 0;
            }
            upper[own] = inverse;
        }
    }

    private void forward(double[] x) {
        for (int k = 0; k < size; k++) {
            int other = exchanged[k];
            double value = x[other];
            x[other] = x[k];
            x[k] = value;
            int end = Math.min(size, k + width + 1);
            for (int i = k + 1; i < end; i++) {
                x[i] -= lower[k * width + i - k - 1] * value;
            }
        }
    }

    private void back(double[] x) {
        for (int k = size - 1; k >= 0; k--) {
            double value = x[k];
            int end = Math.min(span, size - k);
            for (int c = 1; c < end; c++) {
                value -= upper[k * span + c] * x[k + c];
            }
            x[k] = value * upper[k * span];
        }
    }

    private static void normalize(double[] x) {
        double largest = 0;
        for (double value : x) {
            largest = Math.max(largest, Math.abs(value));
        }
        double sum = 0;
        double scale = 1 / largest;
        for (int i = 0; i < x.length; i++) {
            x[i] *= scale;
            sum += x[i] * x[i];
        }
        double inverse = 1 / Math.sqrt(sum);
        for (int i = 0; i < x.length; i++) {
            x[i] *= inverse;
        }
    }
}
