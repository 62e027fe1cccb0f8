package ladderwell.level;

/**
 * Solutions of −y″ + v y = e y from both ends to a matching edge of the mesh: their angles, their zeros, their derivatives by e.
 *
 * <p>Zeros are counted in every half cell: one at most where r² (e − mean) + theta &lt; π², otherwise by the Prüfer angle at the local
 * frequency, whose slow part is below π. So the count is certain up to rounding and the fit of the cells.
 */
final class Shot {
    /** What an end is. */
    enum End {
        EVEN,
        ODD,
        OPEN,
        EDGE
    }

    private static final double BIG = 0x1p300;

    private final ShootingMesh mesh;
    private final CurveSurvey survey;
    private final boolean even;
    private final boolean openLeft;
    private final boolean openRight;
    private final double[] g = EtaSeries.room();
    private final double[] in = new double[8];
    private final double[] out = new double[8];

    private Cell[] cells = {};
    int from;
    int to;
    int mid;

    // The travelling solution.
    private double y;
    private double p;
    private double yE;
    private double pE;
    private int zeros;
    private int exponent;
    private double[] centreValue = {};
    private double[] centreSlope = {};
    private int[] scale = {};
    private boolean keep;

    /** Values at the matching edge from the left and the right. */
    double leftY;

    double leftP;
    double rightY;
    double rightP;
    /** ∫y² from each side, in the same scale. */
    double leftNorm;

    double rightNorm;
    /** Derivative of the mismatch by e. */
    double slope;

    int count;

    Shot(ShootingMesh mesh, CurveSurvey survey) {
        this.mesh = mesh;
        this.survey = survey;
        even = survey.even;
        openLeft = !even && Double.isInfinite(survey.left);
        openRight = Double.isInfinite(survey.right);
    }

    /** Chooses the cells between tails of the given depth and the matching edge near the deepest place. */
    void range(double e, double depth, int forced) {
        cells = mesh.cells();
        int m = cells.length;
        double usual = survey.length;
        double deep = Double.POSITIVE_INFINITY;
        mid = mesh.startIndex();
        int first = m;
        int last = 0;
        int lastMean = 0;
        for (int i = 0; i < m; i++) {
            // Deep and not too short a cell.
            if (cells[i].mean < deep && cells[i].r > 0.02 * usual) {
                deep = cells[i].mean;
                mid = i;
            }
            if (cells[i].mean < e) {
                lastMean = i;
            }
            if (cells[i].low < e) {
                last = i;
                first = Math.min(first, i);
            }
        }
        // Half way out, where that is not under a barrier.
        if (even && m > 0 && cells[(lastMean + 1) / 2].mean < e) {
            mid = Math.max(mid, (lastMean + 1) / 2);
        }
        mid = Math.max(1, Math.min(m - 1, mid));
        if (forced > 0) {
            mid = forced;
        }
        to = m;
        double fall = 0;
        for (int i = last + 1; i < m; i++) {
            fall += 2 * cells[i].r * Math.sqrt(Math.max(0, cells[i].low - e));
            if (fall >= depth) {
                to = i + 1;
                break;
            }
        }
        from = 0;
        fall = 0;
        if (!even) {
            for (int i = Math.min(first, m) - 1; i >= 0; i--) {
                fall += 2 * cells[i].r * Math.sqrt(Math.max(0, cells[i].low - e));
                if (fall >= depth) {
                    from = i;
                    break;
                }
            }
        }
        if (m == 1) {
            mid = 1;
        }
        mid = Math.max(from, Math.min(mid, to));
    }

    private void begin(End kind, double e, double kappaSquared, int direction) {
        yE = 0;
        pE = 0;
        exponent = 0;
        zeros = 0;
        switch (kind) {
            case EVEN -> {
                y = 1;
                p = 0;
            }
            case ODD -> {
                y = 0;
                p = direction;
            }
            case EDGE -> {
                double[] q = mesh.edge == null ? new double[4] : mesh.edge.values(e);
                y = q[0];
                p = q[1];
                yE = q[2];
                pE = q[3];
            }
            case OPEN -> {
                double kappa = Math.sqrt(Math.max(kappaSquared, 1e-300));
                y = 1;
                p = direction * kappa;
                pE = -direction / (2 * kappa);
            }
        }
    }

    End leftEnd(int parity) {
        if (even) {
            return parity == 0 ? End.EVEN : End.ODD;
        }
        if (from > 0) {
            return End.OPEN;
        }
        return mesh.edge != null ? End.EDGE : openLeft ? End.OPEN : End.ODD;
    }

    private End rightEnd() {
        return to < cells.length || openRight ? End.OPEN : End.ODD;
    }

    /** Whether the tail on the right goes on beyond the last cell. */
    boolean openTail() {
        return rightEnd() == End.OPEN;
    }

    boolean openHead() {
        return !even && (from > 0 || openLeft);
    }

    /**
     * (θ_left + θ_right)/π − 1 − n: increases with e and vanishes at level n of the parity.
     *
     * @param s the frequency that scales the angles
     */
    double mismatch(double e, int n, double s, int parity, boolean derivative, boolean counted) {
        count++;
        begin(leftEnd(parity), e, from < cells.length ? cells[from].mean - e : 0, 1);
        for (int i = from; i < mid; i++) {
            pass(i, 1, e, derivative, counted);
        }
        int leftZeros = zeros;
        leftY = y;
        leftP = p;
        leftNorm = p * yE - y * pE;
        leftExponent = exponent;
        begin(rightEnd(), e, cells[to - 1].mean - e, -1);
        for (int i = to - 1; i >= mid; i--) {
            pass(i, -1, e, derivative, counted);
        }
        rightY = y;
        rightP = p;
        rightNorm = y * pE - p * yE;
        rightExponent = exponent;
        double left = angle(s * leftY, leftP);
        double right = angle(s * rightY, -rightP);
        slope = s
                / Math.PI
                * (leftNorm / (s * s * leftY * leftY + leftP * leftP)
                        + rightNorm / (s * s * rightY * rightY + rightP * rightP));
        return leftZeros + zeros + (left + right) / Math.PI - 1 - n;
    }

    private int leftExponent;
    private int rightExponent;

    /**
     * Comes in from the far end of a mesh that lies on one side of the well, to where that mesh begins. Leaves the solution in {@link #rightY} and
     * {@link #rightP}.
     *
     * @param direction of the mesh as seen from the well
     * @return zeros on the way
     */
    int inwards(double e, int direction) {
        count++;
        range(e, ShootingMesh.TAIL, -1);
        if (direction > 0) {
            begin(rightEnd(), e, cells[to - 1].mean - e, -1);
            for (int i = to - 1; i >= 0; i--) {
                pass(i, -1, e, false, true);
            }
        } else {
            begin(leftEnd(0), e, cells[from].mean - e, 1);
            for (int i = from; i < cells.length; i++) {
                pass(i, 1, e, false, true);
            }
        }
        rightY = y;
        rightP = p;
        return zeros;
    }

    private static double angle(double sy, double p) {
        double t = Math.atan2(sy, p);
        return t < 0 ? t + Math.PI : t == Math.PI ? 0 : t;
    }

    /** Carries the solution through cell i. */
    private void pass(int i, int direction, double e, boolean derivative, boolean counted) {
        Cell c = cells[i];
        double r = c.r;
        double z = c.z(e);
        int grown = EtaSeries.fill(z, c.terms + 1, g);
        c.end(-direction, z, g, derivative, in);
        c.end(direction, z, g, derivative, out);
        double d = r * p;
        // The matrix has determinant 1.
        double ym = in[3] * y - in[2] * d;
        double dm = in[0] * d - in[1] * y;
        double yo = out[0] * ym + out[2] * dm;
        double po = out[1] * ym + out[3] * dm;
        if (derivative) {
            double f = -r * r;
            double dE = r * pE;
            double ymE = f * (in[7] * y - in[6] * d) + in[3] * yE - in[2] * dE;
            double dmE = f * (in[4] * d - in[5] * y) + in[0] * dE - in[1] * yE;
            yE = f * (out[4] * ym + out[6] * dm) + out[0] * ymE + out[2] * dmE;
            pE = (f * (out[5] * ym + out[7] * dm) + out[1] * ymE + out[3] * dmE) / r;
        }
        if (counted) {
            zeros += half(y, direction * d, ym, direction * dm, -z, c.theta)
                    + half(ym, direction * dm, yo, direction * po, -z, c.theta);
        }
        if (keep) {
            centreValue[i] = ym;
            centreSlope[i] = dm;
            scale[i] = exponent + grown;
        }
        y = yo;
        p = po / r;
        exponent += 2 * grown;
        if (Math.abs(y) > BIG || Math.abs(p) > BIG) {
            y *= 1 / BIG;
            p *= 1 / BIG;
            yE *= 1 / BIG;
            pE *= 1 / BIG;
            exponent += 300;
        }
    }

    /** Zeros of y in a half cell (length 1 in s), travelling forwards. */
    private static int half(double y0, double d0, double y1, double d1, double square, double theta) {
        if (square + theta < 9.86) {
            return y0 * y1 < 0 || y1 == 0 && y0 != 0 ? 1 : 0;
        }
        double w = Math.sqrt(square);
        // The angle advances by w up to theta/w, the zeros are within one of that over pi, and even or odd as the signs
        // say: most often one
        // number is left.
        double product = y0 * y1;
        if (Math.abs(product) >= Double.MIN_NORMAL) {
            double slack = theta / w;
            double low = (w - slack) / Math.PI - 1 - 1e-9;
            double high = (w + slack) / Math.PI + 1 + 1e-9;
            int least = (int) Math.floor(low) + 1;
            if ((least & 1) != (product < 0 ? 1 : 0)) {
                least++;
            }
            if (least >= 0 && least + 2 > high) {
                return least;
            }
        }
        double a = Math.atan2(w * y0, d0);
        double b = Math.atan2(w * y1, d1);
        double t = a + w + Math.IEEEremainder(b - a - w, 2 * Math.PI);
        return (int) (2 * Math.rint((t - b) / (2 * Math.PI)) + Math.floor(b / Math.PI) - Math.floor(a / Math.PI));
    }

    /** The edge where cutting and joining the two solutions leaves the least jump: where the level lives. */
    int bestEdge(double e, int parity) {
        double[] a = new double[cells.length + 1];
        double[] b = new double[cells.length + 1];
        double[] norm = new double[cells.length + 1];
        begin(leftEnd(parity), e, cells[from].mean - e, 1);
        for (int i = from; i < to - 1; i++) {
            pass(i, 1, e, true, false);
            double h = 1 / Math.hypot(y, p);
            a[i + 1] = y * h;
            b[i + 1] = p * h;
            norm[i + 1] = (p * yE - y * pE) * h * h;
        }
        begin(rightEnd(), e, cells[to - 1].mean - e, -1);
        double least = Double.POSITIVE_INFINITY;
        int best = mid;
        for (int i = to - 1; i > from; i--) {
            pass(i, -1, e, true, false);
            double h = 1 / Math.hypot(y, p);
            double both = norm[i] + (y * pE - p * yE) * h * h;
            double jump = Math.abs(a[i] * p * h - b[i] * y * h) / both;
            // In a forbidden region one of the two has lost the level to its growing part.
            boolean allowed = cells[i].mean < e || cells[i - 1].mean < e;
            // A norm that is not positive has been lost by cancellation: the level lives in another well.
            if (allowed && both > 0 && jump < least) {
                least = jump;
                best = i;
            }
        }
        count++;
        return best;
    }

    /** One more shot that keeps the solution, normed over the half line for an even potential and over all of it otherwise. */
    Wave wave(double e, double s, int parity) {
        int m = cells.length;
        centreValue = new double[m];
        centreSlope = new double[m];
        scale = new int[m];
        keep = true;
        mismatch(e, 0, s, parity, true, false);
        keep = false;
        boolean byValue = Math.abs(s * leftY) > Math.abs(leftP);
        // Right times this is left, at the matching edge.
        double join = byValue ? leftY / rightY : leftP / rightP;
        double norm = leftNorm + join * join * rightNorm;
        double left = 1 / Math.sqrt(norm);
        double right = left * join;
        // Positive beyond the last zero: the right solution begins positive.
        if (right < 0) {
            left = -left;
            right = -right;
        }
        for (int i = from; i < to; i++) {
            double factor =
                    i < mid ? Math.scalb(left, scale[i] - leftExponent) : Math.scalb(right, scale[i] - rightExponent);
            centreValue[i] *= factor;
            centreSlope[i] *= factor;
        }
        double head = openHead() ? Math.scalb(left, -leftExponent) : 0;
        double tail = openTail() ? Math.scalb(right, -rightExponent) : 0;
        double near = mesh.edge == null ? 0 : Math.scalb(left, -leftExponent);
        return new Wave(cells, mesh.edge, e, from, to, centreValue, centreSlope, head, tail, near);
    }
}
