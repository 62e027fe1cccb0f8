package ladderwell.operator;

import java.util.Optional;
import ladderwell.numeric.DoubleDouble;

/**
 * Σ c_jk a†^j a^k with complex coefficients, always in normal order. Immutable.
 *
 * <p>Products are put in normal order with a^k a†^l = Σ_s s! C(k,s) C(l,s) a†^(l−s) a^(k−s), which follows from [a, a†] = 1.
 *
 * @accuracy coefficients are sums of products in double-double arithmetic: integers are exact up to 2^106, other numbers are right to
 *     some 1e-31 of the largest term in their sum; the doubles handed out are rounded once
 * @source Louisell, Quantum Statistical Properties of Radiation (1973), chapter 3
 */
public final class LadderPolynomial {
    /** Largest degree j + k of a term. */
    public static final int HIGHEST = 64;

    /** Coefficients of a pair of mirrored terms that agree to this part of them count as equal. */
    private static final double SAME = 0x1p-44;
    /** What is left of a coefficient after cancellation in double-double counts as nothing below this part of the largest. */
    private static final double NOTHING = 0x1p-90;

    private static final DoubleDouble ROOT_HALF = DoubleDouble.of(0.5).sqrt();

    private static final LadderPolynomial ZERO = new LadderPolynomial(new Coefficients(1, 1));

    private final Coefficients c;

    private LadderPolynomial(Coefficients sums) {
        for (int i = 0; i < sums.re.length; i++) {
            if (!Double.isFinite(sums.re[i]) || !Double.isFinite(sums.im[i])) {
                throw new IllegalArgumentException(
                        "the coefficient of " + LadderText.name(i / sums.columns, i % sums.columns) + " is "
                                + LadderText.number(sums.re[i], sums.im[i]) + "; coefficients must be finite");
            }
        }
        c = sums.trimmed();
    }

    /** Nothing. */
    public static LadderPolynomial zero() {
        return ZERO;
    }

    /** The number itself, times the unit operator. */
    public static LadderPolynomial constant(double re, double im) {
        return term(0, 0, re, im);
    }

    /**
     * (re + i im) a†^j a^k.
     *
     * @throws IllegalArgumentException if an exponent is negative, the degree is above 64, or a part is not finite
     */
    public static LadderPolynomial term(int j, int k, double re, double im) {
        return term(j, k, DoubleDouble.of(re), DoubleDouble.of(im));
    }

    /** The same with all digits; see {@link #term(int, int, double, double)}. */
    public static LadderPolynomial term(int j, int k, DoubleDouble re, DoubleDouble im) {
        if (j < 0 || k < 0) {
            throw new IllegalArgumentException("exponents of a† and a must be 0 or more, got " + j + " and " + k);
        }
        checkDegree(j + k);
        Coefficients single = new Coefficients(j + 1, k + 1);
        single.set(single.at(j, k), re, im);
        return new LadderPolynomial(single);
    }

    /** The lowering operator a. */
    public static LadderPolynomial a() {
        return term(0, 1, 1, 0);
    }

    /** The raising operator a†. */
    public static LadderPolynomial adagger() {
        return term(1, 0, 1, 0);
    }

    /** The number operator n = a†a. */
    public static LadderPolynomial number() {
        return term(1, 1, 1, 0);
    }

    /** The position x = (a + a†)/√2. */
    public static LadderPolynomial position() {
        return term(0, 1, ROOT_HALF, DoubleDouble.ZERO).plus(term(1, 0, ROOT_HALF, DoubleDouble.ZERO));
    }

    /** The momentum p = −i (a − a†)/√2. */
    public static LadderPolynomial momentum() {
        return term(0, 1, DoubleDouble.ZERO, ROOT_HALF.negated()).plus(term(1, 0, DoubleDouble.ZERO, ROOT_HALF));
    }

    /** This plus other. */
    public LadderPolynomial plus(LadderPolynomial other) {
        return sum(other, false);
    }

    /** This minus other. */
    public LadderPolynomial minus(LadderPolynomial other) {
        return sum(other, true);
    }

    private LadderPolynomial sum(LadderPolynomial other, boolean negated) {
        Coefficients d = other.c;
        Coefficients result = new Coefficients(Math.max(c.rows, d.rows), Math.max(c.columns, d.columns));
        copyInto(result);
        for (int j = 0; j < d.rows; j++) {
            for (int k = 0; k < d.columns; k++) {
                int i = d.at(j, k);
                if (!d.isZero(i)) {
                    DoubleDouble re = negated ? d.re(i).negated() : d.re(i);
                    DoubleDouble im = negated ? d.im(i).negated() : d.im(i);
                    result.add(result.at(j, k), re, im);
                }
            }
        }
        return new LadderPolynomial(result);
    }

    private void copyInto(Coefficients target) {
        for (int j = 0; j < c.rows; j++) {
            for (int k = 0; k < c.columns; k++) {
                target.set(target.at(j, k), c.re(c.at(j, k)), c.im(c.at(j, k)));
            }
        }
    }

    /** This times a real number. */
    public LadderPolynomial times(double factor) {
        return times(factor, 0);
    }

    /** This times re + i im. */
    public LadderPolynomial times(double re, double im) {
        Coefficients result = new Coefficients(c.rows, c.columns);
        for (int i = 0; i < c.re.length; i++) {
            if (!c.isZero(i)) {
                result.set(
                        i,
                        c.re(i).times(re).minus(c.im(i).times(im)),
                        c.re(i).times(im).plus(c.im(i).times(re)));
            }
        }
        return new LadderPolynomial(result);
    }

    /**
     * The product this · other, this acting last, put in normal order.
     *
     * @throws IllegalArgumentException if the degree of the product is above 64
     */
    public LadderPolynomial times(LadderPolynomial other) {
        if (isZero() || other.isZero()) {
            return ZERO;
        }
        checkDegree(degree() + other.degree());
        Coefficients d = other.c;
        Coefficients result = new Coefficients(c.rows + d.rows - 1, c.columns + d.columns - 1);
        for (int k = 0; k < c.columns; k++) {
            for (int l = 0; l < d.rows; l++) {
                DoubleDouble[] contractions = contractions(k, l);
                for (int j = 0; j < c.rows; j++) {
                    int left = c.at(j, k);
                    if (c.isZero(left)) {
                        continue;
                    }
                    for (int m = 0; m < d.columns; m++) {
                        int right = d.at(l, m);
                        if (d.isZero(right)) {
                            continue;
                        }
                        DoubleDouble re =
                                c.re(left).times(d.re(right)).minus(c.im(left).times(d.im(right)));
                        DoubleDouble im =
                                c.re(left).times(d.im(right)).plus(c.im(left).times(d.re(right)));
                        for (int s = 0; s < contractions.length; s++) {
                            result.add(
                                    result.at(j + l - s, k + m - s),
                                    re.times(contractions[s]),
                                    im.times(contractions[s]));
                        }
                    }
                }
            }
        }
        return new LadderPolynomial(result);
    }

    /** s! C(k,s) C(l,s) for s = 0 … min(k, l); each follows from the one before by (k−s)(l−s)/(s+1). */
    private static DoubleDouble[] contractions(int k, int l) {
        DoubleDouble[] result = new DoubleDouble[Math.min(k, l) + 1];
        result[0] = DoubleDouble.ONE;
        for (int s = 0; s + 1 < result.length; s++) {
            result[s + 1] = result[s].times((double) (k - s) * (l - s)).dividedBy(s + 1);
        }
        return result;
    }

    /**
     * This operator exponent times over.
     *
     * @throws IllegalArgumentException if the exponent is negative or the degree of the result is above 64
     */
    public LadderPolynomial power(int exponent) {
        if (exponent < 0) {
            throw new IllegalArgumentException("an operator has no negative powers here, got exponent " + exponent);
        }
        checkDegree((long) degree() * exponent);
        LadderPolynomial result = constant(1, 0);
        for (int i = 0; i < exponent; i++) {
            result = result.times(this);
        }
        return result;
    }

    /** The adjoint: c_jk becomes the conjugate of c_kj. */
    public LadderPolynomial adjoint() {
        Coefficients result = new Coefficients(c.columns, c.rows);
        for (int j = 0; j < c.rows; j++) {
            for (int k = 0; k < c.columns; k++) {
                int i = c.at(j, k);
                result.set(result.at(k, j), c.re(i), c.im(i).negated());
            }
        }
        return new LadderPolynomial(result);
    }

    /** [this, other] = this · other − other · this. */
    public LadderPolynomial commutator(LadderPolynomial other) {
        return times(other).minus(other.times(this));
    }

    /** (this + this†)/2. */
    public LadderPolynomial hermitianPart() {
        return plus(adjoint()).times(0.5);
    }

    /** The terms with as many a† as a, diagonal in the number of quanta. */
    public LadderPolynomial diagonalPart() {
        Coefficients result = new Coefficients(c.rows, c.columns);
        for (int j = 0; j < Math.min(c.rows, c.columns); j++) {
            int i = c.at(j, j);
            result.set(i, c.re(i), c.im(i));
        }
        return new LadderPolynomial(result);
    }

    /** This with a replaced by a + α, α = re + i im: D(α)† P D(α) with D(α) = exp(α a† − α* a). */
    public LadderPolynomial shifted(double re, double im) {
        return shifted(DoubleDouble.of(re), DoubleDouble.of(im));
    }

    /**
     * This with a replaced by a + α: D(α)† P D(α) with D(α) = exp(α a† − α* a).
     *
     * @param re real part of α
     * @param im imaginary part of α
     */
    public LadderPolynomial shifted(DoubleDouble re, DoubleDouble im) {
        // (a + α)^k = Σ_q C(k,q) α^(k−q) a^q, and likewise for a†: normal order stays
        int most = Math.max(c.rows, c.columns);
        DoubleDouble[] powerRe = new DoubleDouble[most];
        DoubleDouble[] powerIm = new DoubleDouble[most];
        powerRe[0] = DoubleDouble.ONE;
        powerIm[0] = DoubleDouble.ZERO;
        for (int i = 1; i < most; i++) {
            powerRe[i] = powerRe[i - 1].times(re).minus(powerIm[i - 1].times(im));
            powerIm[i] = powerRe[i - 1].times(im).plus(powerIm[i - 1].times(re));
        }
        Coefficients result = new Coefficients(c.rows, c.columns);
        for (int j = 0; j < c.rows; j++) {
            for (int k = 0; k < c.columns; k++) {
                int i = c.at(j, k);
                if (c.isZero(i)) {
                    continue;
                }
                DoubleDouble chooseP = DoubleDouble.ONE;
                for (int p = j; p >= 0; p--) {
                    DoubleDouble leftRe = powerRe[j - p].times(chooseP);
                    DoubleDouble leftIm = powerIm[j - p].times(chooseP).negated();
                    DoubleDouble outerRe = c.re(i).times(leftRe).minus(c.im(i).times(leftIm));
                    DoubleDouble outerIm = c.re(i).times(leftIm).plus(c.im(i).times(leftRe));
                    DoubleDouble chooseQ = DoubleDouble.ONE;
                    for (int q = k; q >= 0; q--) {
                        DoubleDouble rightRe = powerRe[k - q].times(chooseQ);
                        DoubleDouble rightIm = powerIm[k - q].times(chooseQ);
                        result.add(
                                result.at(p, q),
                                outerRe.times(rightRe).minus(outerIm.times(rightIm)),
                                outerRe.times(rightIm).plus(outerIm.times(rightRe)));
                        chooseQ = chooseQ.times(q).dividedBy(k - q + 1);
                    }
                    chooseP = chooseP.times(p).dividedBy(j - p + 1);
                }
            }
        }
        return new LadderPolynomial(result);
    }

    /**
     * This with a replaced by u a + v a† (a Bogoliubov transformation) and put in normal order. With an offset: first
     * {@link #shifted(double, double)} by α, then this, gives a → u a + v a† + α.
     *
     * @throws IllegalArgumentException unless |u|² − |v|² = 1 to one part in 10^12 of |u|²
     */
    public LadderPolynomial mixed(double uRe, double uIm, double vRe, double vIm) {
        double u2 = uRe * uRe + uIm * uIm;
        double v2 = vRe * vRe + vIm * vIm;
        if (!(Math.abs(u2 - v2 - 1) <= 1e-12 * u2)) {
            throw new IllegalArgumentException(
                    "u and v must keep |u|² − |v|² = 1, got |u|² = " + u2 + " and |v|² = " + v2);
        }
        LadderPolynomial lowering = term(0, 1, uRe, uIm).plus(term(1, 0, vRe, vIm));
        LadderPolynomial raising = lowering.adjoint();
        // Horner from the left: Σ_j A†^j R_j with R_j = Σ_k c_jk A^k
        LadderPolynomial[] powers = new LadderPolynomial[c.columns];
        powers[0] = constant(1, 0);
        for (int k = 1; k < c.columns; k++) {
            powers[k] = powers[k - 1].times(lowering);
        }
        LadderPolynomial result = ZERO;
        for (int j = c.rows - 1; j >= 0; j--) {
            LadderPolynomial row = ZERO;
            for (int k = 0; k < c.columns; k++) {
                int i = c.at(j, k);
                if (!c.isZero(i)) {
                    row = row.plus(powers[k].times(term(0, 0, c.re(i), c.im(i))));
                }
            }
            result = raising.times(result).plus(row);
        }
        return result;
    }

    /** Whether this equals its adjoint, mirrored coefficients within 2^−44 of each other. */
    public boolean isHermitian() {
        return hermiticityBreak().isEmpty();
    }

    /**
     * The pair of terms that breaks hermiticity most, in words; empty if this is Hermitian.
     *
     * @return such as "the term 0.5i a² needs its mirror −0.5i a†², found 0"
     */
    public Optional<String> hermiticityBreak() {
        int side = Math.max(c.rows, c.columns);
        double largest = norm();
        double worst = 0;
        int worstJ = -1;
        int worstK = -1;
        for (int j = 0; j < side; j++) {
            for (int k = 0; k <= j; k++) {
                double gap = Math.hypot(re(j, k) - re(k, j), im(j, k) + im(k, j));
                double size = Math.max(Math.hypot(re(j, k), im(j, k)), Math.hypot(re(k, j), im(k, j)));
                if (gap > SAME * size + NOTHING * largest && gap > worst) {
                    worst = gap;
                    worstJ = j;
                    worstK = k;
                }
            }
        }
        if (worstJ < 0) {
            return Optional.empty();
        }
        int j = worstJ;
        int k = worstK;
        if (j == k) {
            return Optional.of("the term " + text(j, k) + " needs a real factor");
        }
        if (Math.hypot(re(j, k), im(j, k)) < Math.hypot(re(k, j), im(k, j))) {
            j = worstK;
            k = worstJ;
        }
        String found = re(k, j) == 0 && im(k, j) == 0 ? "0" : text(k, j);
        return Optional.of("the term " + text(j, k) + " needs its mirror " + LadderText.term(re(j, k), -im(j, k), k, j)
                + ", found " + found);
    }

    /** The largest |c_jk|. */
    public double norm() {
        double largest = 0;
        for (int i = 0; i < c.re.length; i++) {
            largest = Math.max(largest, Math.hypot(c.re[i], c.im[i]));
        }
        return largest;
    }

    /** Whether every coefficient is zero. */
    public boolean isZero() {
        return c.re.length == 1 && c.isZero(0);
    }

    /** Largest j + k of a term; 0 for a constant and for zero. */
    public int degree() {
        int degree = 0;
        for (int j = 0; j < c.rows; j++) {
            for (int k = 0; k < c.columns; k++) {
                if (!c.isZero(c.at(j, k))) {
                    degree = Math.max(degree, j + k);
                }
            }
        }
        return degree;
    }

    /** Largest exponent of a† in any term. */
    public int raisingDegree() {
        return c.rows - 1;
    }

    /** Largest exponent of a in any term. */
    public int loweringDegree() {
        return c.columns - 1;
    }

    /** How many levels a term raises at most: the largest j − k, never below 0. */
    public int raises() {
        int most = 0;
        for (int j = 0; j < c.rows; j++) {
            for (int k = 0; k < Math.min(j, c.columns); k++) {
                if (!c.isZero(c.at(j, k))) {
                    most = Math.max(most, j - k);
                }
            }
        }
        return most;
    }

    /** How many levels a term lowers at most: the largest k − j, never below 0. */
    public int lowers() {
        return adjoint().raises();
    }

    /** Matrix elements ⟨m|P|n⟩ vanish for |m − n| above this. */
    public int bandwidth() {
        return Math.max(raises(), lowers());
    }

    /** Real part of the coefficient of a†^j a^k; 0 where there is no such term. */
    public double re(int j, int k) {
        return j < c.rows && k < c.columns ? c.re[c.at(j, k)] : 0;
    }

    /** Imaginary part of the coefficient of a†^j a^k; 0 where there is no such term. */
    public double im(int j, int k) {
        return j < c.rows && k < c.columns ? c.im[c.at(j, k)] : 0;
    }

    /** Real part of the coefficient of a†^j a^k with all its digits. */
    public DoubleDouble fullRe(int j, int k) {
        return j < c.rows && k < c.columns ? c.re(c.at(j, k)) : DoubleDouble.ZERO;
    }

    /** Imaginary part of the coefficient of a†^j a^k with all its digits. */
    public DoubleDouble fullIm(int j, int k) {
        return j < c.rows && k < c.columns ? c.im(c.at(j, k)) : DoubleDouble.ZERO;
    }

    /** Real part of ⟨m|P|n⟩; see {@link #band}. */
    public double elementRe(long m, long n) {
        return element(m, n)[0];
    }

    /** Imaginary part of ⟨m|P|n⟩; see {@link #band}. */
    public double elementIm(long m, long n) {
        return element(m, n)[1];
    }

    private double[] element(long m, long n) {
        if (m < 0 || n < 0) {
            throw new IllegalArgumentException("levels count from 0, got " + m + " and " + n);
        }
        double[] re = new double[1];
        double[] im = new double[1];
        if (Math.abs(m - n) <= bandwidth()) {
            band((int) (m - n), n, re, im);
        }
        return new double[] {re[0], im[0]};
    }

    /**
     * One diagonal of the matrix: ⟨n + d|P|n⟩ for n = first, first + 1, …; elements whose row would be below 0 are 0.
     *
     * @param d row minus column
     * @param first column of the first element, 0 … 2^53
     * @param re receives the real parts, one for each column
     * @param im receives the imaginary parts
     * @accuracy to (2 + |d|/2) · 2^−52 of the element plus 1e-30 of its largest term, so differences of large terms, as in (n − n₀)², keep
     *     their digits
     * @throws IllegalArgumentException if the columns do not lie in 0 … 2^53 or the arrays differ in length
     */
    public void band(int d, long first, double[] re, double[] im) {
        if (re.length != im.length) {
            throw new IllegalArgumentException("re and im differ in length: " + re.length + " and " + im.length);
        }
        if (first < 0 || first + re.length > 1L << 53) {
            throw new IllegalArgumentException("columns must lie in 0 … 2^53, got first = " + first);
        }
        // ⟨n+d| a†^(k+d) a^k |n⟩ = √((m)_|d|) (l)_k, m the upper and l the lower of the two levels, (l)_k = l (l−1) …
        // (l−k+1)
        int size = Math.abs(d);
        int terms = Math.max(0, Math.min(c.rows - Math.max(d, 0), c.columns - Math.max(-d, 0)));
        for (int i = 0; i < re.length; i++) {
            long column = first + i;
            long lower = Math.min(column, column + d);
            if (lower < 0) {
                re[i] = 0;
                im[i] = 0;
                continue;
            }
            DoubleDouble falling = DoubleDouble.ONE;
            DoubleDouble sumRe = DoubleDouble.ZERO;
            DoubleDouble sumIm = DoubleDouble.ZERO;
            for (int k = 0; k < terms && k <= lower; k++) {
                int at = c.at(k + Math.max(d, 0), k + Math.max(-d, 0));
                if (!c.isZero(at)) {
                    sumRe = sumRe.plus(c.re(at).times(falling));
                    sumIm = sumIm.plus(c.im(at).times(falling));
                }
                falling = falling.times((double) (lower - k));
            }
            double root = 1;
            for (int s = 1; s <= size; s++) {
                root *= Math.sqrt((double) (lower + s));
            }
            re[i] = sumRe.hi() * root;
            im[i] = sumIm.hi() * root;
        }
    }

    /**
     * ⟨α|P|α⟩ = Σ c_jk α*^j α^k: what a classical mode of amplitude α has in place of P.
     *
     * @return real part, imaginary part
     */
    public double[] coherentMean(double re, double im) {
        double sumRe = 0;
        double sumIm = 0;
        for (int j = c.rows - 1; j >= 0; j--) {
            double rowRe = 0;
            double rowIm = 0;
            for (int k = c.columns - 1; k >= 0; k--) {
                double next = rowRe * re - rowIm * im + c.re[c.at(j, k)];
                rowIm = rowRe * im + rowIm * re + c.im[c.at(j, k)];
                rowRe = next;
            }
            double next = sumRe * re + sumIm * im + rowRe;
            sumIm = sumIm * re - sumRe * im + rowIm;
            sumRe = next;
        }
        return new double[] {sumRe, sumIm};
    }

    /** ⟨n|P|n⟩ of a diagonal operator with all its digits. */
    public DoubleDouble diagonal(long n) {
        DoubleDouble falling = DoubleDouble.ONE;
        DoubleDouble sum = DoubleDouble.ZERO;
        for (int k = 0; k < Math.min(c.rows, c.columns) && k <= n; k++) {
            sum = sum.plus(c.re(c.at(k, k)).times(falling));
            falling = falling.times((double) (n - k));
        }
        return sum;
    }

    private static void checkDegree(long degree) {
        if (degree > HIGHEST) {
            throw new IllegalArgumentException(
                    "operators are carried up to degree " + HIGHEST + " in a and a†, this one has degree " + degree);
        }
    }

    @Override
    public boolean equals(Object other) {
        return other instanceof LadderPolynomial p && minus(p).isZero();
    }

    @Override
    public int hashCode() {
        int hash = 0;
        for (int j = 0; j < c.rows; j++) {
            for (int k = 0; k < c.columns; k++) {
                hash = 31 * hash + Double.hashCode(re(j, k)) + 7 * Double.hashCode(im(j, k));
            }
        }
        return hash;
    }

    /** Terms from the highest degree down, such as "0.5 a†² a² + (0.1 − 0.2i) a". */
    @Override
    public String toString() {
        StringBuilder text = new StringBuilder();
        for (int degree = degree(); degree >= 0; degree--) {
            for (int j = degree; j >= 0; j--) {
                if (re(j, degree - j) == 0 && im(j, degree - j) == 0) {
                    continue;
                }
                String term = text(j, degree - j);
                if (text.isEmpty()) {
                    text.append(term);
                } else if (term.startsWith("−")) {
                    text.append(" − ").append(term.substring(1));
                } else {
                    text.append(" + ").append(term);
                }
            }
        }
        return text.isEmpty() ? "0" : text.toString();
    }

    private String text(int j, int k) {
        return LadderText.term(re(j, k), im(j, k), j, k);
    }
}
