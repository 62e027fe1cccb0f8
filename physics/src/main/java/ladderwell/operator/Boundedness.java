package ladderwell.operator;

/**
 * Whether a Hermitian polynomial is bounded below or above, read from its symbol far out in phase space.
 *
 * <p>With a = r e^{iθ}, terms of the highest degree d make r^d h(θ). Where h has one sign everywhere the operator has that sign up to a
 * constant; where h takes both signs (always so for odd d) it has neither bound. Where h touches zero in one direction, that direction
 * (P, the other X) is looked at by itself: with pure powers c X^k and e P^m, and every term X^i P^j of weight i/k + j/m below 1, the
 * operator is bounded on the side of c and e if they agree in sign. Anything else is not decided.
 *
 * @param kind the verdict
 * @param reason one clause: why
 * @source Hörmander, The Analysis of Linear Partial Differential Operators III (1985), §18.6 (Gårding's inequality)
 */
public record Boundedness(Kind kind, String reason) {
    private static final int DIRECTIONS = 2880;
    /** A symbol below this part of its largest value counts as zero; between two directions it bends by 1e-6 of it per degree². */
    private static final double TOUCHES = 1e-9;

    /** Which bounds there are. */
    public enum Kind {
        /** Bounded below only. */
        BELOW,
        /** Bounded above only; −H is bounded below. */
        ABOVE,
        /** On both sides: a constant. */
        BOTH,
        /** On neither side. */
        NEITHER,
        /** The leading terms do not tell. */
        NOT_DECIDED
    }

    /**
     * True where the dynamics may leave every bound in finite time, so that the operator generates no motion by itself: neither bound, and
     * a degree above 2.
     */
    public static boolean isRefused(LadderPolynomial h) {
        return h.degree() > 2 && of(h).kind == Kind.NEITHER;
    }

    /**
     * The verdict on a polynomial.
     *
     * @throws IllegalArgumentException if it is not Hermitian
     */
    public static Boundedness of(LadderPolynomial h) {
        h.hermiticityBreak().ifPresent(broken -> {
            throw new IllegalArgumentException("only a Hermitian operator can be bounded below: " + broken);
        });
        int degree = h.degree();
        if (degree == 0) {
            return new Boundedness(Kind.BOTH, "it is a constant");
        }
        if (degree % 2 == 1) {
            return new Boundedness(
                    Kind.NEITHER,
                    "its highest power, " + degree + ", is odd, so it falls without end in one direction");
        }
        double least = Double.POSITIVE_INFINITY;
        double most = Double.NEGATIVE_INFINITY;
        double leastSize = Double.POSITIVE_INFINITY;
        double touching = 0;
        for (int i = 0; i < DIRECTIONS; i++) {
            double theta = Math.PI * i / DIRECTIONS;
            double value = symbol(h, degree, theta);
            least = Math.min(least, value);
            most = Math.max(most, value);
            if (Math.abs(value) < leastSize) {
                leastSize = Math.abs(value);
                touching = theta;
            }
        }
        double size = Math.max(Math.abs(least), Math.abs(most));
        double zero = TOUCHES * size;
        if (least < -zero && most > zero) {
            return new Boundedness(
                    Kind.NEITHER,
                    "its terms of degree " + degree
                            + " take both signs: they fall in some directions of phase space and rise in others");
        }
        Kind side = most > zero ? Kind.BELOW : Kind.ABOVE;
        // between two directions the least value is missed by h″ (Δθ)²/8, h″ up to degree² size
        double missed = degree * degree * size * Math.pow(Math.PI / DIRECTIONS, 2) / 8;
        if (leastSize > missed + zero) {
            return new Boundedness(
                    side,
                    "its terms of degree " + degree + " are " + (side == Kind.BELOW ? "positive" : "negative")
                            + " in every direction of phase space");
        }
        return touching(h, side, refined(h, degree, touching, size));
    }

    /** Σ_{j+k = degree} c_jk e^{i(k−j)θ}, real. */
    private static double symbol(LadderPolynomial h, int degree, double theta) {
        double sum = 0;
        for (int j = 0; j <= degree; j++) {
            double angle = (degree - 2 * j) * theta;
            sum += h.re(j, degree - j) * Math.cos(angle) - h.im(j, degree - j) * Math.sin(angle);
        }
        return sum;
    }

    /** The direction near the given one where the symbol is nearest to zero, by the parabola through three of its values. */
    private static double refined(LadderPolynomial h, int degree, double theta, double size) {
        double best = theta;
        double step = Math.PI / DIRECTIONS;
        for (int i = 0; i < 60; i++) {
            double left = Math.abs(symbol(h, degree, best - step));
            double here = Math.abs(symbol(h, degree, best));
            double right = Math.abs(symbol(h, degree, best + step));
            // only beyond rounding: a direction on the grid that is right stays as it is
            if (Math.min(left, right) < here - 1e-14 * size) {
                best += left < right ? -step : step;
            } else {
                step /= 2;
            }
        }
        return best;
    }

    private static Boundedness touching(LadderPolynomial h, Kind side, double theta) {
        // a → a e^{iθ} / i turns the direction where the symbol touches zero into P: a = (X + iP)/√2
        double c = Math.cos(theta - Math.PI / 2);
        double s = Math.sin(theta - Math.PI / 2);
        double[][] symbol = coordinates(h.mixed(c, s, 0, 0));
        int degree = h.degree();
        dropRounding(symbol, degree);
        int k = highest(symbol, degree, true);
        int m = highest(symbol, degree, false);
        double sign = side == Kind.BELOW ? 1 : -1;
        if (m == 0) {
            boolean alone = true;
            for (int i = 0; i <= degree; i++) {
                for (int j = 1; i + j <= degree; j++) {
                    alone &= symbol[i][j] == 0;
                }
            }
            return alone
                    ? new Boundedness(side, "it depends on one coordinate only, by an even power")
                    : new Boundedness(Kind.NOT_DECIDED, "its leading terms vanish in one direction of phase space");
        }
        if (m % 2 == 1 || symbol[0][m] * sign < 0) {
            return new Boundedness(
                    Kind.NEITHER,
                    "where its terms of degree " + degree + " vanish, those of degree " + m
                            + (m % 2 == 1 ? " change their sign" : " have the opposite sign"));
        }
        for (int i = 0; i <= degree; i++) {
            for (int j = 0; i + j <= degree; j++) {
                boolean pure = i == k && j == 0 || i == 0 && j == m;
                if (!pure && symbol[i][j] != 0 && (double) i / k + (double) j / m > 1 - 1e-9) {
                    return new Boundedness(
                            Kind.NOT_DECIDED, "its leading terms vanish in one direction of phase space");
                }
            }
        }
        return new Boundedness(side, "two even powers of one sign, " + k + " and " + m + ", lead all other terms");
    }

    /** Turning mixes terms of one degree only; what it leaves of 0 is small beside the largest of that degree. */
    private static void dropRounding(double[][] symbol, int degree) {
        for (int d = 1; d <= degree; d++) {
            double size = 0;
            for (int i = 0; i <= d; i++) {
                size = Math.max(size, Math.abs(symbol[i][d - i]));
            }
            for (int i = 0; i <= d; i++) {
                if (Math.abs(symbol[i][d - i]) <= 1e-7 * size) {
                    symbol[i][d - i] = 0;
                }
            }
        }
    }

    private static int highest(double[][] symbol, int degree, boolean inX) {
        for (int i = degree; i > 0; i--) {
            if ((inX ? symbol[i][0] : symbol[0][i]) != 0) {
                return i;
            }
        }
        return 0;
    }

    /** Coefficients of X^i P^j of Σ c_jk α*^j α^k with α = (X + iP)/√2, real parts (the imaginary ones vanish). */
    private static double[][] coordinates(LadderPolynomial h) {
        int degree = h.degree();
        double[][] sum = new double[degree + 1][degree + 1];
        for (int j = 0; j <= h.raisingDegree(); j++) {
            for (int k = 0; k <= h.loweringDegree(); k++) {
                if (h.re(j, k) == 0 && h.im(j, k) == 0) {
                    continue;
                }
                // (X − iP)^j (X + iP)^k / √2^(j+k), coefficients of P^q by repeated multiplication
                double[] re = {1};
                double[] im = {0};
                for (int f = 0; f < j + k; f++) {
                    double turn = f < j ? -1 : 1;
                    double[] nextRe = new double[re.length + 1];
                    double[] nextIm = new double[re.length + 1];
                    for (int q = 0; q < re.length; q++) {
                        nextRe[q] += re[q];
                        nextIm[q] += im[q];
                        nextRe[q + 1] -= turn * im[q];
                        nextIm[q + 1] += turn * re[q];
                    }
                    re = nextRe;
                    im = nextIm;
                }
                double scale = Math.pow(2, -0.5 * (j + k));
                for (int q = 0; q < re.length; q++) {
                    sum[j + k - q][q] += scale * (h.re(j, k) * re[q] - h.im(j, k) * im[q]);
                }
            }
        }
        return sum;
    }
}
