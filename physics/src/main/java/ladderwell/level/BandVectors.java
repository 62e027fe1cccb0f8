package ladderwell.level;

/**
 * Eigenvectors of a real symmetric band matrix by inverse iteration: the shifted matrix is factored with row exchanges, which leaves
 * 2·width diagonals above the main one. One object serves one matrix and keeps its work space.
 */
final class BandVectors {
    private static final int ROUNDS = 3;

    private final double[][] rows;
    private final int size;
    private final int width;
    private final int span;
    private final double[] upper;
    private final double[] lower;
    private final int[] exchanged;
    private final double tiny;
    /** A solution that grew by so much has a residual at the level of rounding. */
    private final double enough;

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
        enough = 0x1p44 / Math.max(largest, 0x1p-900);
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
        double grown = 0;
        for (int round = 0; round < ROUNDS && grown < enough; round++) {
            forward(x);
            back(x);
            grown = normalize(x);
        }
        return x;
    }

    private void factor(double value) {
        if (width == 2) {
            factorTwo(value);
            return;
        }
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

    /** Width two, the commonest: the three rows that a column meets are kept in local variables. */
    private void factorTwo(double value) {
        double[] d = rows[0];
        double[] e = rows[1];
        double[] f = rows[2];
        double a0 = d[0] - value;
        double a1 = e[0];
        double a2 = f[0];
        double a3 = 0;
        double a4 = 0;
        double b0 = e[0];
        double b1 = d[1] - value;
        double b2 = size > 2 ? e[1] : 0;
        double b3 = size > 3 ? f[1] : 0;
        double b4 = 0;
        for (int k = 0; k < size; k++) {
            double c0 = 0;
            double c1 = 0;
            double c2 = 0;
            double c3 = 0;
            double c4 = 0;
            if (k + 2 < size) {
                c0 = f[k];
                c1 = e[k + 1];
                c2 = d[k + 2] - value;
                c3 = k + 3 < size ? e[k + 2] : 0;
                c4 = k + 4 < size ? f[k + 2] : 0;
            }
            double sizeB = Math.abs(b0);
            double sizeC = Math.abs(c0);
            int best = k;
            double largest = Math.abs(a0);
            if (sizeB > largest && k + 1 < size) {
                largest = sizeB;
                best = k + 1;
            }
            if (sizeC > largest) {
                best = k + 2;
            }
            double keep;
            if (best == k + 1) {
                keep = a0;
                a0 = b0;
                b0 = keep;
                keep = a1;
                a1 = b1;
                b1 = keep;
                keep = a2;
                a2 = b2;
                b2 = keep;
                keep = a3;
                a3 = b3;
                b3 = keep;
                keep = a4;
                a4 = b4;
                b4 = keep;
            } else if (best == k + 2) {
                keep = a0;
                a0 = c0;
                c0 = keep;
                keep = a1;
                a1 = c1;
                c1 = keep;
                keep = a2;
                a2 = c2;
                c2 = keep;
                keep = a3;
                a3 = c3;
                c3 = keep;
                keep = a4;
                a4 = c4;
                c4 = keep;
            }
            exchanged[k] = best;
            if (Math.abs(a0) < tiny) {
                a0 = tiny;
            }
            double inverse = 1 / a0;
            int at = k * 5;
            upper[at] = inverse;
            upper[at + 1] = a1;
            upper[at + 2] = a2;
            upper[at + 3] = a3;
            upper[at + 4] = a4;
            double l1 = b0 * inverse;
            double l2 = c0 * inverse;
            lower[2 * k] = l1;
            lower[2 * k + 1] = l2;
            double p1 = a1;
            double p2 = a2;
            double p3 = a3;
            double p4 = a4;
            a0 = b1 - l1 * p1;
            a1 = b2 - l1 * p2;
            a2 = b3 - l1 * p3;
            a3 = b4 - l1 * p4;
            a4 = 0;
            b0 = c1 - l2 * p1;
            b1 = c2 - l2 * p2;
            b2 = c3 - l2 * p3;
            b3 = c4 - l2 * p4;
            b4 = 0;
        }
    }

    private void forward(double[] x) {
        if (width == 2) {
            forwardTwo(x);
            return;
        }
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

    private void forwardTwo(double[] x) {
        int last = size - 2;
        for (int k = 0; k < last; k++) {
            int other = exchanged[k];
            double value = x[other];
            x[other] = x[k];
            x[k] = value;
            x[k + 1] -= lower[2 * k] * value;
            x[k + 2] -= lower[2 * k + 1] * value;
        }
        if (last >= 0) {
            int other = exchanged[last];
            double value = x[other];
            x[other] = x[last];
            x[last] = value;
            x[last + 1] -= lower[2 * last] * value;
        }
    }

    private void backTwo(double[] x) {
        double x1 = 0;
        double x2 = 0;
        double x3 = 0;
        double x4 = 0;
        for (int k = size - 1; k >= 0; k--) {
            int at = k * 5;
            double value = x[k] - upper[at + 4] * x4 - upper[at + 3] * x3 - upper[at + 2] * x2 - upper[at + 1] * x1;
            x4 = x3;
            x3 = x2;
            x2 = x1;
            x1 = value * upper[at];
            x[k] = x1;
        }
    }

    private void back(double[] x) {
        if (width == 2) {
            backTwo(x);
            return;
        }
        for (int k = size - 1; k >= 0; k--) {
            double value = x[k];
            int end = Math.min(span, size - k);
            for (int c = 1; c < end; c++) {
                value -= upper[k * span + c] * x[k + c];
            }
            x[k] = value * upper[k * span];
        }
    }

    /** Makes the norm 1 and gives what it was. */
    private static double normalize(double[] x) {
        double sum = squares(x);
        double before = 1;
        if (!(sum > 0x1p-900 && sum < 0x1p900)) {
            before = 0;
            for (double value : x) {
                before = Math.max(before, Math.abs(value));
            }
            double scale = 1 / before;
            for (int i = 0; i < x.length; i++) {
                x[i] *= scale;
            }
            sum = squares(x);
        }
        double norm = Math.sqrt(sum);
        double inverse = 1 / norm;
        for (int i = 0; i < x.length; i++) {
            x[i] *= inverse;
        }
        return before * norm;
    }

    /** Four sums side by side: none waits for the addition before it. */
    private static double squares(double[] x) {
        double a = 0;
        double b = 0;
        double c = 0;
        double d = 0;
        int i = 0;
        for (; i + 3 < x.length; i += 4) {
            a += x[i] * x[i];
            b += x[i + 1] * x[i + 1];
            c += x[i + 2] * x[i + 2];
            d += x[i + 3] * x[i + 3];
        }
        for (; i < x.length; i++) {
            a += x[i] * x[i];
        }
        return (a + b) + (c + d);
    }
}
