package ladderwell.numeric;

/** Loops without the Vector API: long unit-stride loops that the compiler vectorises, four sums at a time where it does not. */
final class PlainLoops implements Loops {
    /** Long enough for the compiler's unrolled loop, short enough for the first-level cache. */
    private static final int COLUMNS = 128;

    @Override
    public int columns() {
        return COLUMNS;
    }

    @Override
    public void product(
            double[] a, int aAt, double[] b, int bAt, int depth, boolean add, double[] c, int cAt, int stride) {
        // Rows of their own, all read at the same index: the compiler vectorises no loop over one array at two offsets.
        double[] c0 = new double[COLUMNS];
        double[] c1 = new double[COLUMNS];
        double[] c2 = new double[COLUMNS];
        double[] c3 = new double[COLUMNS];
        double[] b0 = new double[COLUMNS];
        double[] b1 = new double[COLUMNS];
        if (add) {
            System.arraycopy(c, cAt, c0, 0, COLUMNS);
            System.arraycopy(c, cAt + stride, c1, 0, COLUMNS);
            System.arraycopy(c, cAt + 2 * stride, c2, 0, COLUMNS);
            System.arraycopy(c, cAt + 3 * stride, c3, 0, COLUMNS);
        }
        int l = 0;
        for (; l + 1 < depth; l += 2) {
            int at = aAt + ROWS * l;
            System.arraycopy(b, bAt + COLUMNS * l, b0, 0, COLUMNS);
            System.arraycopy(b, bAt + COLUMNS * (l + 1), b1, 0, COLUMNS);
            twoByTwo(c0, c1, b0, b1, a[at], a[at + 4], a[at + 1], a[at + 5]);
            twoByTwo(c2, c3, b0, b1, a[at + 2], a[at + 6], a[at + 3], a[at + 7]);
        }
        if (l < depth) {
            int at = aAt + ROWS * l;
            System.arraycopy(b, bAt + COLUMNS * l, b0, 0, COLUMNS);
            one(c0, b0, a[at]);
            one(c1, b0, a[at + 1]);
            one(c2, b0, a[at + 2]);
            one(c3, b0, a[at + 3]);
        }
        System.arraycopy(c0, 0, c, cAt, COLUMNS);
        System.arraycopy(c1, 0, c, cAt + stride, COLUMNS);
        System.arraycopy(c2, 0, c, cAt + 2 * stride, COLUMNS);
        System.arraycopy(c3, 0, c, cAt + 3 * stride, COLUMNS);
    }

    /** Two rows of c, two terms each. */
    private static void twoByTwo(
            double[] c0, double[] c1, double[] b0, double[] b1, double p, double q, double s, double t) {
        for (int j = 0; j < COLUMNS; j++) {
            double x = b0[j];
            double y = b1[j];
            c0[j] = Math.fma(q, y, Math.fma(p, x, c0[j]));
            c1[j] = Math.fma(t, y, Math.fma(s, x, c1[j]));
        }
    }

    private static void one(double[] c, double[] b, double p) {
        for (int j = 0; j < COLUMNS; j++) {
            c[j] = Math.fma(p, b[j], c[j]);
        }
    }

    @Override
    public void squares(
            double[] even, double[] odd, int row, boolean mirrored, double[] frame, int upper, int lower, int count) {
        Loops.squaresOneByOne(COLUMNS, even, odd, row, mirrored, frame, upper, lower, 0, count);
    }

    @Override
    public void ladder(
            double[] re,
            double[] im,
            double[] up,
            double[] down,
            int weightAt,
            int count,
            double alphaRe,
            double alphaIm,
            double[] sums,
            int sumAt) {
        double amplitudeRe = 0;
        double amplitudeIm = 0;
        double square = 0;
        double squeezeRe = 0;
        double squeezeIm = 0;
        for (int i = 0; i < count; i++) {
            double r = re[i + 1];
            double m = im[i + 1];
            double u = up[weightAt + i];
            double d = down[weightAt + i];
            double bRe = Math.fma(u, re[i + 2], Math.fma(alphaIm, m, -alphaRe * r));
            double bIm = Math.fma(u, im[i + 2], Math.fma(-alphaIm, r, -alphaRe * m));
            double gRe = Math.fma(d, re[i], Math.fma(-alphaIm, m, -alphaRe * r));
            double gIm = Math.fma(d, im[i], Math.fma(alphaIm, r, -alphaRe * m));
            amplitudeRe += r * bRe + m * bIm;
            amplitudeIm += r * bIm - m * bRe;
            square += bRe * bRe + bIm * bIm;
            squeezeRe += gRe * bRe + gIm * bIm;
            squeezeIm += gRe * bIm - gIm * bRe;
        }
        sums[sumAt] += amplitudeRe;
        sums[sumAt + 1] += amplitudeIm;
        sums[sumAt + 2] += square;
        sums[sumAt + 3] += squeezeRe;
        sums[sumAt + 4] += squeezeIm;
    }

    @Override
    public void mirrored(double[] re, double[] im, int centre, int from, int count, double[] outRe, double[] outIm) {
        Loops.mirroredOneByOne(re, im, centre, from, 0, count, outRe, outIm);
    }

    @Override
    public void turn(
            double[] cosine,
            double[] sine,
            int from,
            double[] byCosine,
            double[] bySine,
            int by,
            double[] toCosine,
            double[] toSine,
            int to,
            int count) {
        for (int r = 0; r < count; r++) {
            int a = (from + r) * COLUMNS;
            int b = by * COLUMNS;
            int c = (to + r) * COLUMNS;
            for (int j = 0; j < COLUMNS; j++) {
                double x = cosine[a + j];
                double y = sine[a + j];
                double u = byCosine[b + j];
                double v = bySine[b + j];
                toCosine[c + j] = Math.fma(x, u, -(y * v));
                toSine[c + j] = Math.fma(x, v, y * u);
            }
        }
    }
}
