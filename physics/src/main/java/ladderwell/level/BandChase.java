package ladderwell.level;

/**
 * Makes a symmetric matrix with two off-diagonals tridiagonal: plane rotations take the outer one away column by column, and each bulge is
 * chased off the end. next[j] = A(j+1, j), second[j] = A(j+2, j).
 */
final class BandChase {
    private final double[] d;
    private final double[] next;
    private final double[] second;
    private final int size;
    /** The rotation of rows i and i + 1 to be made next; none where i is negative. */
    private int i;

    private double c;
    private double s;

    BandChase(double[] diagonal, double[] next, double[] second) {
        d = diagonal;
        this.next = next;
        this.second = second;
        size = diagonal.length;
    }

    void run() {
        for (int k = 0; k < size - 2; k++) {
            begin(k);
            finish();
        }
    }

    /** Each rotation waits for a root and a division before it; two matrices side by side fill that time. */
    static void both(BandChase a, BandChase b) {
        int columns = Math.max(a.size, b.size) - 2;
        for (int k = 0; k < columns; k++) {
            a.begin(k);
            b.begin(k);
            pair(a, b);
            a.finish();
            b.finish();
        }
    }

    /** The rotation that takes second[k] away. */
    private void begin(int k) {
        i = -1;
        if (k >= size - 2 || second[k] == 0) {
            return;
        }
        double gone = second[k];
        double pivot = next[k];
        double inverse = 1 / Math.sqrt(pivot * pivot + gone * gone);
        c = pivot * inverse;
        s = gone * inverse;
        next[k] = c * pivot + s * gone;
        second[k] = 0;
        i = k + 1;
    }

    private void finish() {
        int at = i;
        double cos = c;
        double sin = s;
        while (at >= 0) {
            int j = at + 1;
            double left = d[at];
            double right = d[j];
            double e = next[at];
            double shift = sin * (sin * (right - left) + 2 * cos * e);
            d[at] = left + shift;
            d[j] = right - shift;
            next[at] = (cos - sin) * (cos + sin) * e + cos * sin * (right - left);
            if (j + 1 < size) {
                double a = second[at];
                double b = next[j];
                second[at] = cos * a + sin * b;
                next[j] = cos * b - sin * a;
            }
            if (j + 2 >= size) {
                break;
            }
            double bulge = sin * second[j];
            second[j] *= cos;
            if (bulge == 0) {
                break;
            }
            double a = second[at];
            double inverse = 1 / Math.sqrt(a * a + bulge * bulge);
            cos = a * inverse;
            sin = bulge * inverse;
            second[at] = cos * a + sin * bulge;
            double b1 = next[j];
            double b2 = second[j];
            next[j] = cos * b1 + sin * b2;
            second[j] = cos * b2 - sin * b1;
            at = j + 1;
        }
        i = -1;
    }

    /** As far as both have four rows more. */
    private static void pair(BandChase one, BandChase two) {
        int i = one.i;
        int k = two.i;
        if (i < 0 || k < 0) {
            return;
        }
        double[] d1 = one.d;
        double[] n1 = one.next;
        double[] s1 = one.second;
        double[] d2 = two.d;
        double[] n2 = two.next;
        double[] s2 = two.second;
        double cos1 = one.c;
        double sin1 = one.s;
        double cos2 = two.c;
        double sin2 = two.s;
        int end1 = one.size - 3;
        int end2 = two.size - 3;
        while (i < end1 && k < end2) {
            double bulge1 = sin1 * s1[i + 1];
            double bulge2 = sin2 * s2[k + 1];
            if (bulge1 == 0 || bulge2 == 0) {
                break;
            }
            double left1 = d1[i];
            double left2 = d2[k];
            double right1 = d1[i + 1];
            double right2 = d2[k + 1];
            double e1 = n1[i];
            double e2 = n2[k];
            double a1 = cos1 * s1[i] + sin1 * n1[i + 1];
            double a2 = cos2 * s2[k] + sin2 * n2[k + 1];
            double b1 = cos1 * n1[i + 1] - sin1 * s1[i];
            double b2 = cos2 * n2[k + 1] - sin2 * s2[k];
            double inverse1 = 1 / Math.sqrt(a1 * a1 + bulge1 * bulge1);
            double inverse2 = 1 / Math.sqrt(a2 * a2 + bulge2 * bulge2);
            double shift1 = sin1 * (sin1 * (right1 - left1) + 2 * cos1 * e1);
            double shift2 = sin2 * (sin2 * (right2 - left2) + 2 * cos2 * e2);
            d1[i] = left1 + shift1;
            d2[k] = left2 + shift2;
            d1[i + 1] = right1 - shift1;
            d2[k + 1] = right2 - shift2;
            n1[i] = (cos1 - sin1) * (cos1 + sin1) * e1 + cos1 * sin1 * (right1 - left1);
            n2[k] = (cos2 - sin2) * (cos2 + sin2) * e2 + cos2 * sin2 * (right2 - left2);
            double outer1 = s1[i + 1] * cos1;
            double outer2 = s2[k + 1] * cos2;
            cos1 = a1 * inverse1;
            cos2 = a2 * inverse2;
            sin1 = bulge1 * inverse1;
            sin2 = bulge2 * inverse2;
            s1[i] = cos1 * a1 + sin1 * bulge1;
            s2[k] = cos2 * a2 + sin2 * bulge2;
            n1[i + 1] = cos1 * b1 + sin1 * outer1;
            n2[k + 1] = cos2 * b2 + sin2 * outer2;
            s1[i + 1] = cos1 * outer1 - sin1 * b1;
            s2[k + 1] = cos2 * outer2 - sin2 * b2;
            i += 2;
            k += 2;
        }
        one.i = i;
        one.c = cos1;
        one.s = sin1;
        two.i = k;
        two.c = cos2;
        two.s = sin2;
    }
}
