package ladderwell.operator;

import static java.util.Objects.requireNonNull;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.SplittableRandom;
import java.util.function.UnaryOperator;
import ladderwell.formula.Dimension;
import ladderwell.formula.Formula;
import ladderwell.formula.FormulaException;
import ladderwell.formula.OperatorExpression;
import ladderwell.formula.Parameters;
import ladderwell.quantity.Constants;
import ladderwell.quantity.Scale;

/**
 * An operator that may vary with time: P_0 + Σ f_k(t) P_k, with polynomials P_k in normal order and real factors f_k given as formulas of
 * t. Immutable.
 *
 * <p>Read from text such as "w*n + k/2*n*(n-1) + f*cos(wd*t)*(a + a†)"; see {@link OperatorExpression} for the language. A Hamiltonian is
 * kept as a frequency, H/ħ.
 *
 * @units of a lab formula: t in s and a Hamiltonian in rad/s; of a natural one: plain numbers
 */
public final class OperatorFormula {
    private static final int SAMPLES = 32;

    /**
     * One part that varies with time.
     *
     * @param factor f(t), real; its x is not used
     * @param operator what it multiplies
     */
    public record Term(Formula factor, LadderPolynomial operator) {
        /** Refuses nulls. */
        public Term {
            requireNonNull(factor, "factor");
            requireNonNull(operator, "operator");
        }

        /**
         * f(t).
         *
         * @throws IllegalArgumentException if it is not finite there
         */
        public double factor(double t) {
            double value = factor.value(0, t);
            if (!Double.isFinite(value)) {
                throw new IllegalArgumentException(
                        "the factor '" + factor + "' of " + operator + " has no finite value at t = " + t);
            }
            return value;
        }
    }

    private final String text;
    private final LadderPolynomial constant;
    private final List<Term> terms;

    private OperatorFormula(String text, LadderPolynomial constant, List<Term> terms) {
        this.text = text;
        this.constant = constant;
        this.terms = List.copyOf(terms);
    }

    /** An operator that does not vary. */
    public static OperatorFormula of(LadderPolynomial constant) {
        return new OperatorFormula(constant.toString(), constant, List.of());
    }

    /** f(t) P. */
    public static OperatorFormula of(Formula factor, LadderPolynomial operator) {
        return factor.dependsOnTime()
                ? new OperatorFormula(
                        "(" + factor + ")·(" + operator + ")",
                        LadderPolynomial.zero(),
                        List.of(new Term(factor, operator)))
                : of(operator.times(factor.value(0, 0)));
    }

    /**
     * A Hamiltonian in natural units, ħ = 1: numbers and parameters without units.
     *
     * @throws FormulaException if the text is no operator formula or not Hermitian
     */
    public static OperatorFormula naturalHamiltonian(String text, Parameters parameters) {
        return hermitian(text, built(OperatorExpression.natural(text, parameters), 1, 1), "");
    }

    /**
     * A Hamiltonian in lab units: a frequency (in Hz a cycle frequency, which stands for 2πν) or an energy; x and p are plain numbers, in
     * units of √(ħ/mω) and of ħ over it.
     *
     * @throws FormulaException if the text is no operator formula, no frequency or energy, or not Hermitian
     */
    public static OperatorFormula hamiltonian(String text, Parameters parameters) {
        return frequency(text, OperatorExpression.lab(text, parameters), 1, 1);
    }

    /**
     * A Hamiltonian in lab units with x a length and p a momentum; a belongs to the oscillator of this mass and frequency.
     *
     * @param mass kg
     * @param omega rad/s
     * @throws FormulaException if the text is no operator formula, no frequency or energy, or not Hermitian
     */
    public static OperatorFormula hamiltonian(String text, Parameters parameters, double mass, double omega) {
        Scale scale = Scale.harmonic(mass, omega);
        return frequency(text, OperatorExpression.labCoordinates(text, parameters), scale.length(), scale.momentum());
    }

    private static OperatorFormula frequency(String text, OperatorExpression read, double position, double momentum) {
        boolean energy = read.dimension().equals(Dimension.ENERGY);
        if (!energy && !read.dimension().equals(Dimension.RATE) && !read.isZero()) {
            throw located(
                    "a Hamiltonian is a frequency, such as 2 MHz*n, or an energy, and this is "
                            + read.dimension().word(),
                    text);
        }
        OperatorFormula built = built(read, position, momentum);
        return hermitian(text, energy ? built.times(1 / Constants.HBAR) : built, " (numbers in rad/s)");
    }

    /**
     * An operator without a unit: an observable or a jump operator, in natural units.
     *
     * @throws FormulaException if the text is no operator formula
     */
    public static OperatorFormula naturalOperator(String text, Parameters parameters) {
        return built(OperatorExpression.natural(text, parameters), 1, 1);
    }

    /**
     * An operator without a unit: an observable or a jump operator, beside lab units; x and p are plain numbers as in
     * {@link #hamiltonian(String, Parameters)}.
     *
     * @throws FormulaException if the text is no operator formula or has a unit
     */
    public static OperatorFormula operator(String text, Parameters parameters) {
        OperatorExpression read = OperatorExpression.lab(text, parameters);
        if (!read.dimension().isNone()) {
            throw located(
                    "this operator is " + read.dimension().word()
                            + "; expected an operator without a unit, its rate is given beside it",
                    text);
        }
        return built(read, 1, 1);
    }

    private static OperatorFormula built(OperatorExpression read, double position, double momentum) {
        try {
            Sum sum = read.in(new Sums(position, momentum));
            return new OperatorFormula(read.text(), sum.constant, sum.varying);
        } catch (FormulaException e) {
            throw e;
        } catch (IllegalArgumentException e) {
            FormulaException located = located(String.valueOf(e.getMessage()), read.text());
            located.initCause(e);
            throw located;
        }
    }

    private static OperatorFormula hermitian(String text, OperatorFormula built, String unit) {
        Optional<String> broken = built.hermiticityBreak();
        if (broken.isPresent()) {
            throw located("the Hamiltonian is not Hermitian: " + broken.orElseThrow() + unit, text);
        }
        // equal to the sum itself, and free of what rounding left
        return built.each(LadderPolynomial::hermitianPart);
    }

    private static FormulaException located(String reason, String text) {
        int start = text.length() - text.stripLeading().length();
        return new FormulaException(reason, text, start, text.stripTrailing().length());
    }

    /** Sum gathered while an expression is read: equal factors share one polynomial. */
    private record Sum(LadderPolynomial constant, List<Term> varying) {
        static Sum of(LadderPolynomial constant) {
            return new Sum(constant, List.of());
        }

        static void add(List<Term> all, Term term) {
            if (term.operator.isZero()) {
                return;
            }
            for (int i = 0; i < all.size(); i++) {
                Term there = all.get(i);
                if (there.factor.isSame(term.factor)) {
                    all.set(i, new Term(there.factor, there.operator.plus(term.operator)));
                    return;
                }
            }
            all.add(term);
        }

        static LadderPolynomial addFolded(LadderPolynomial constant, List<Term> all, Formula f, LadderPolynomial p) {
            if (f.dependsOnTime()) {
                add(all, new Term(f, p));
                return constant;
            }
            return constant.plus(p.times(f.value(0, 0)));
        }

        Sum plus(Sum other) {
            List<Term> all = new ArrayList<>(varying);
            other.varying.forEach(term -> add(all, term));
            all.removeIf(term -> term.operator.isZero());
            return new Sum(constant.plus(other.constant), all);
        }

        Sum times(Sum other) {
            List<Term> all = new ArrayList<>();
            LadderPolynomial product = constant.times(other.constant);
            for (Term left : varying) {
                add(all, new Term(left.factor, left.operator.times(other.constant)));
            }
            for (Term right : other.varying) {
                add(all, new Term(right.factor, constant.times(right.operator)));
                for (Term left : varying) {
                    product = addFolded(
                            product, all, left.factor.times(right.factor), left.operator.times(right.operator));
                }
            }
            return new Sum(product, all);
        }
    }

    private record Sums(double position, double momentum) implements OperatorExpression.Ring<Sum> {
        @Override
        public Sum number(double value) {
            return Sum.of(LadderPolynomial.constant(value, 0));
        }

        @Override
        public Sum factor(Formula factor) {
            List<Term> one = new ArrayList<>();
            LadderPolynomial rest =
                    Sum.addFolded(LadderPolynomial.zero(), one, factor, LadderPolynomial.constant(1, 0));
            return new Sum(rest, one);
        }

        @Override
        public Sum letter(OperatorExpression.Letter letter) {
            return Sum.of(
                    switch (letter) {
                        case LOWERING -> LadderPolynomial.a();
                        case RAISING -> LadderPolynomial.adagger();
                        case NUMBER -> LadderPolynomial.number();
                        case POSITION -> LadderPolynomial.position().times(position);
                        case MOMENTUM -> LadderPolynomial.momentum().times(momentum);
                        case IMAGINARY -> LadderPolynomial.constant(0, 1);
                    });
        }

        @Override
        public Sum sum(Sum left, Sum right) {
            return left.plus(right);
        }

        @Override
        public Sum product(Sum left, Sum right) {
            return left.times(right);
        }
    }

    private Sum sum() {
        List<Term> all = new ArrayList<>();
        terms.forEach(term -> Sum.add(all, term));
        return new Sum(constant, all);
    }

    private static OperatorFormula of(String text, Sum sum) {
        return new OperatorFormula(text, sum.constant, sum.varying);
    }

    /** As typed, or written from the parts. */
    public String text() {
        return text;
    }

    /** P_0, what does not vary. */
    public LadderPolynomial constant() {
        return constant;
    }

    /** What varies with time, each factor once. */
    public List<Term> terms() {
        return terms;
    }

    /** True if anything varies with time. */
    public boolean dependsOnTime() {
        return !terms.isEmpty();
    }

    /**
     * The operator at one time.
     *
     * @throws IllegalArgumentException if a factor is not finite there
     */
    public LadderPolynomial at(double t) {
        LadderPolynomial sum = constant;
        for (Term term : terms) {
            sum = sum.plus(term.operator.times(term.factor(t)));
        }
        return sum;
    }

    /** d/dt, exact away from jumps of the factors. */
    public OperatorFormula derivative() {
        List<Term> all = new ArrayList<>();
        LadderPolynomial rest = LadderPolynomial.zero();
        for (Term term : terms) {
            rest = Sum.addFolded(rest, all, term.factor.derivative(Formula.Variable.TIME), term.operator);
        }
        return of("d/dt (" + text + ")", new Sum(rest, all));
    }

    /** This plus other. */
    public OperatorFormula plus(OperatorFormula other) {
        String joined = isZero() ? other.text : other.isZero() ? text : text + " + " + other.text;
        return of(joined, sum().plus(other.sum()));
    }

    /** This times a real number. */
    public OperatorFormula times(double factor) {
        return each(operator -> operator.times(factor));
    }

    /** The product this · other in this order. */
    public OperatorFormula times(OperatorFormula other) {
        return of("(" + text + ")·(" + other.text + ")", sum().times(other.sum()));
    }

    /** Every polynomial changed alike: shifted, mixed, adjoint. The text stays. */
    public OperatorFormula each(UnaryOperator<LadderPolynomial> change) {
        List<Term> changed = new ArrayList<>();
        for (Term term : terms) {
            LadderPolynomial operator = change.apply(term.operator);
            if (!operator.isZero()) {
                changed.add(new Term(term.factor, operator));
            }
        }
        return new OperatorFormula(text, change.apply(constant), changed);
    }

    /**
     * In units of a rate: this/rate as a function of rate·t, a natural formula.
     *
     * @param rate rad/s, positive
     */
    public OperatorFormula scaled(double rate) {
        if (!(rate > 0) || Double.isInfinite(rate)) {
            throw new IllegalArgumentException("a unit of rates must be finite and above 0, got " + rate);
        }
        List<Term> scaled = new ArrayList<>();
        for (Term term : terms) {
            scaled.add(new Term(term.factor.scaled(1, 1 / rate, 1), term.operator.times(1 / rate)));
        }
        return new OperatorFormula(text, constant.times(1 / rate), scaled);
    }

    /** True if nothing is left. */
    public boolean isZero() {
        return constant.isZero() && terms.isEmpty();
    }

    /** Largest degree of any part. */
    public int degree() {
        int degree = constant.degree();
        for (Term term : terms) {
            degree = Math.max(degree, term.operator.degree());
        }
        return degree;
    }

    /** Largest bandwidth of any part. */
    public int bandwidth() {
        int width = constant.bandwidth();
        for (Term term : terms) {
            width = Math.max(width, term.operator.bandwidth());
        }
        return width;
    }

    /** See {@link #hermiticityBreak}. */
    public boolean isHermitian() {
        return hermiticityBreak().isEmpty();
    }

    /**
     * The pair of terms that breaks hermiticity, in words; empty if the operator is Hermitian at all times. Parts are checked one by
     * one; where a part is not Hermitian by itself, the whole is looked at at 32 times (two parts may make up for each other).
     */
    public Optional<String> hermiticityBreak() {
        Optional<String> broken = constant.hermiticityBreak();
        String factor = "";
        for (Term term : terms) {
            if (broken.isEmpty()) {
                broken = term.operator.hermiticityBreak();
                factor = " beside the factor " + term.factor;
            }
        }
        if (broken.isEmpty() || terms.isEmpty()) {
            return broken;
        }
        SplittableRandom random = new SplittableRandom(1);
        for (int i = 0; i < SAMPLES; i++) {
            // from 1e-12 to 1e4: whatever the unit of time is
            double t = Math.pow(10, -12 + 0.5 * i) * (1 + random.nextDouble());
            if (!isFiniteAt(t)) {
                continue;
            }
            Optional<String> then = at(t).hermiticityBreak();
            if (then.isPresent()) {
                return Optional.of(broken.orElseThrow() + factor);
            }
        }
        return Optional.empty();
    }

    private boolean isFiniteAt(double t) {
        for (Term term : terms) {
            if (!Double.isFinite(term.factor.value(0, t))) {
                return false;
            }
        }
        return true;
    }

    /** {@link #text}. */
    @Override
    public String toString() {
        return text;
    }
}
