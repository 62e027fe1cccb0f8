package ladderwell.numeric;

/**
 * The discrete Fourier transform of one length, a power of two: X_k = Σ_j x_j e^{−2πi jk/N}, real and imaginary parts apart. Not to be shared
 * between threads: it holds its own work arrays.
 *
 * @source T. G. Stockham, AFIPS Conf. Proc. 28 (1966) 229: sorted by itself, no bit reversal; here four points at a time
 */
public final class FourierTransform {
    private final int size;
    private final double[] cosine;
    private final double[] sine;
    private final double[] workRe;
    private final double[] workIm;

    /**
     * For arrays of this size.
     *
     * @param size a power of two, 2 … 2^26
     */
    public FourierTransform(int size) {
        if (size < 2 || size > 1 << 26 || Integer.bitCount(size) != 1) {
            throw new IllegalArgumentException("a Fourier transform has a power of two of points, not " + size);
        }
        this.size = size;
        cosine = new double[size];
        sine = new double[size];
        for (int j = 0; j < size; j++) {
            // each angle by itself from the first eighth of a turn: no error is handed on
            int eighth = size / 8;
            if (eighth == 0) {
                cosine[j] = j == 0 ? 1 : j == 2 || size == 2 ? -1 : 0;
                sine[j] = size == 4 && j == 1 ? 1 : size == 4 && j == 3 ? -1 : 0;
                continue;
            }
            int octant = j / eighth;
            int rest = j % eighth;
            boolean back = (octant & 1) == 1;
            double angle = 2 * Math.PI * (back ? eighth - rest : rest) / size;
            double c = Math.cos(angle);
            double s = Math.sin(angle);
            boolean swap = ((octant + 1) & 2) != 0;
            double u = swap ? s : c;
            double v = swap ? c : s;
            cosine[j] = octant >= 2 && octant < 6 ? -u : u;
            sine[j] = octant >= 4 ? -v : v;
        }
        workRe = new double[size];
        workIm = new double[size];
    }

    /** Number of points. */
    public int size() {
        return size;
    }

    /** Transforms in place. @shape both are [size] */
    public void forward(double[] re, double[] im) {
        double[] fromRe = re;
        double[] fromIm = im;
        double[] toRe = workRe;
        double[] toIm = workIm;
        int length = size;
        int stride = 1;
        while (length > 1) {
            if (length % 4 == 0) {
                four(length, stride, fromRe, fromIm, toRe, toIm);
                length /= 4;
                stride *= 4;
            } else {
                two(length, stride, fromRe, fromIm, toRe, toIm);
                length /= 2;
                stride *= 2;
            }
            double[] r = fromRe;
            double[] i = fromIm;
            fromRe = toRe;
            fromIm = toIm;
            toRe = r;
            toIm = i;
        }
        if (fromRe != re) {
            System.arraycopy(fromRe, 0, re, 0, size);
            System.arraycopy(fromIm, 0, im, 0, size);
        }
    }

    /** Σ_k X_k e^{+2πi jk/N}, in place: {@link #size} times the inverse. */
    public void backward(double[] re, double[] im) {
        // the transform of swapped parts is the swapped conjugate transform
        forward(im, re);
    }

    private void two(int length, int stride, double[] xr, double[] xi, double[] yr, double[] yi) {
        int half = length / 2;
        int step = size / length;
        for (int p = 0; p < half; p++) {
            double c = cosine[p * step];
            double s = -sine[p * step];
            int a = stride * p;
            int b = stride * (p + half);
            int u = stride * 2 * p;
            int v = u + stride;
            for (int q = 0; q < stride; q++) {
                double ar = xr[a + q];
                double ai = xi[a + q];
                double br = xr[b + q];
                double bi = xi[b + q];
                yr[u + q] = ar + br;
                yi[u + q] = ai + bi;
                double dr = ar - br;
                double di = ai - bi;
                yr[v + q] = c * dr - s * di;
                yi[v + q] = c * di + s * dr;
            }
        }
    }

    private void four(int length, int stride, double[] xr, double[] xi, double[] yr, double[] yi) {
        int quarter = length / 4;
        int step = size / length;
        for (int p = 0; p < quarter; p++) {
            double c1 = cosine[p * step];
            double s1 = -sine[p * step];
            double c2 = cosine[2 * p * step];
            double s2 = -sine[2 * p * step];
            double c3 = cosine[3 * p * step];
            double s3 = -sine[3 * p * step];
            pass(stride, stride * p, stride * quarter, 4 * stride * p, c1, s1, c2, s2, c3, s3, xr, xi, yr, yi);
        }
    }

    /** One butterfly for a whole stride: small enough to be compiled into one vector loop. */
    private static void pass(
            int stride,
            int from,
            int apart,
            int to,
            double c1,
            double s1,
            double c2,
            double s2,
            double c3,
            double s3,
            double[] xr,
            double[] xi,
            double[] yr,
            double[] yi) {
        int b = from + apart;
        int c = b + apart;
        int d = c + apart;
        int t1 = to + stride;
        int t2 = t1 + stride;
        int t3 = t2 + stride;
        for (int q = 0; q < stride; q++) {
            double sumR = xr[from + q] + xr[c + q];
            double sumI = xi[from + q] + xi[c + q];
            double difR = xr[from + q] - xr[c + q];
            double difI = xi[from + q] - xi[c + q];
            double addR = xr[b + q] + xr[d + q];
            double addI = xi[b + q] + xi[d + q];
            double subR = xr[b + q] - xr[d + q];
            double subI = xi[b + q] - xi[d + q];
            yr[to + q] = sumR + addR;
            yi[to + q] = sumI + addI;
            // −i (b − d)
            double r1 = difR + subI;
            double i1 = difI - subR;
            double r2 = sumR - addR;
            double i2 = sumI - addI;
            double r3 = difR - subI;
            double i3 = difI + subR;
            yr[t1 + q] = c1 * r1 - s1 * i1;
            yi[t1 + q] = c1 * i1 + s1 * r1;
            yr[t2 + q] = c2 * r2 - s2 * i2;
            yi[t2 + q] = c2 * i2 + s2 * r2;
            yr[t3 + q] = c3 * r3 - s3 * i3;
            yi[t3 + q] = c3 * i3 + s3 * r3;
        }
    }
}
