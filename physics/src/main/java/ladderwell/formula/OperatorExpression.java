package ladderwell.formula;

import static java.util.Objects.requireNonNull;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import ladderwell.formula.Parser.Leaf;

/**
 * A polynomial in the operators of one mode as it was typed: factors that vary with t, operators in the order they stand in, nothing
 * reordered. What the operators are is left to the {@link Ring} it is built in.
 *
 * <p>Names: a, ad or a† (raising), n (number), x, p, the imaginary unit i, the time t, pi, hbar and the parameters given. Functions take
 * real numbers, parameters and t, never operators; exp also takes an imaginary number: exp(i*w*t). Everything else is as in a
 * {@link Formula}. Immutable.
 */
public final class OperatorExpression {

    /** The letters of operator formulas. */
    public enum Letter {
        /** a. */
        LOWERING("a"),
        /** ad, also a†. */
        RAISING("ad"),
        /** n = a†a. */
        NUMBER("n"),
        /** x. */
        POSITION("x"),
        /** p. */
        MOMENTUM("p"),
        /** The imaginary unit. */
        IMAGINARY(Node.IMAGINARY);

        private final String text;

        Letter(String text) {
            this.text = text;
        }

        /** As it is typed. */
        public String text() {
            return text;
        }

        private static Letter of(String text) {
            return Arrays.stream(values())
                    .filter(letter -> letter.text.equals(text))
                    .findFirst()
                    .orElseThrow();
        }
    }

    /**
     * Sums and products that an expression is built with.
     *
     * @param <T> what is added and multiplied; products keep their order
     */
    public interface Ring<T> {
        /** A fixed number. */
        T number(double value);

        /** A real factor that varies with t. */
        T factor(Formula factor);

        /** An operator, or the imaginary unit. */
        T letter(Letter letter);

        /** left + right. */
        T sum(T left, T right);

        /** left · right, in this order. */
        T product(T left, T right);
    }

    private final String text;
    private final Parser.Result read;
    private final boolean natural;

    private OperatorExpression(String text, Parser.Result read, boolean natural) {
        this.text = text;
        this.read = read;
        this.natural = natural;
    }

    /**
     * In natural units: numbers and parameters without units.
     *
     * @throws FormulaException if the text is no operator formula
     * @throws IllegalArgumentException if a parameter that occurs has a unit
     */
    public static OperatorExpression natural(String text, Parameters parameters) {
        OperatorExpression all = read(text, parameters, true, Dimension.NONE, Dimension.NONE);
        for (String name : all.parameters()) {
            Amount amount = requireNonNull(parameters.values().get(name));
            if (!amount.dimension().isNone()) {
                throw new IllegalArgumentException("in natural units parameters are plain numbers; '" + name + "' is "
                        + amount.dimension().word());
            }
        }
        return all;
    }

    /**
     * In lab units, with x and p as plain numbers: in units of the zero-point length √(ħ/mω) and of ħ over it.
     *
     * @throws FormulaException if the text is no operator formula
     */
    public static OperatorExpression lab(String text, Parameters parameters) {
        return read(text, parameters, false, Dimension.NONE, Dimension.NONE);
    }

    /**
     * In lab units, with x a length and p a momentum.
     *
     * @throws FormulaException if the text is no operator formula
     */
    public static OperatorExpression labCoordinates(String text, Parameters parameters) {
        return read(text, parameters, false, Dimension.LENGTH, Dimension.MOMENTUM);
    }

    private static OperatorExpression read(
            String text, Parameters parameters, boolean natural, Dimension position, Dimension momentum) {
        Map<String, Leaf> names = new LinkedHashMap<>();
        for (Letter letter : Letter.values()) {
            Dimension dimension =
                    letter == Letter.POSITION ? position : letter == Letter.MOMENTUM ? momentum : Dimension.NONE;
            names.put(letter.text, new Leaf(Node.letter(letter.text), dimension));
        }
        names.put("a†", new Leaf(Node.letter(Letter.RAISING.text), Dimension.NONE));
        names.put("t", new Leaf(Node.T, natural ? Dimension.NONE : Dimension.TIME));
        Parser.Result read = new Parser(text, parameters, natural, Collections.unmodifiableMap(names)).parse();
        return new OperatorExpression(text.strip(), read, natural);
    }

    /** As typed. */
    public String text() {
        return text;
    }

    /** What it measures; none in natural units. */
    public Dimension dimension() {
        return read.dimension().equals(Dimension.ANY) ? Dimension.NONE : read.dimension();
    }

    /** True for an expression that is literally zero and so fits any dimension. */
    public boolean isZero() {
        return read.dimension().equals(Dimension.ANY);
    }

    /** Names of the parameters that occur in the text. */
    public Set<String> parameters() {
        return Collections.unmodifiableSet(read.parameters());
    }

    /** The expression in a ring. */
    public <T> T in(Ring<T> ring) {
        return new Walk<>(ring).of(read.node());
    }

    /** A complex number that varies with t. */
    private record Complex(Node re, Node im) {}

    private final class Walk<T> {
        private final Ring<T> ring;

        Walk(Ring<T> ring) {
            this.ring = ring;
        }

        T of(Node node) {
            if (!node.usesLetter()) {
                return scalar(node);
            }
            return switch (node.op) {
                case LETTER -> ring.letter(Letter.of(node.name));
                case NEGATE -> ring.product(ring.number(-1), of(node.args[0]));
                case ADD -> sum(node);
                case MULTIPLY -> product(node);
                case DIVIDE -> ring.product(scalar(Algebra.divide(Node.ONE, node.args[1])), of(node.args[0]));
                case POWER -> power(of(node.args[0]), (int) node.args[1].value(0, 0));
                case EXP -> rotating(node);
                default -> throw new IllegalStateException("no operator: " + node.op);
            };
        }

        private T scalar(Node node) {
            if (node.isFixed()) {
                return ring.number(node.value(0, 0));
            }
            // numbers are split off, so that −2 cos t and cos t are one factor
            if (node.op == Op.NEGATE) {
                return ring.product(ring.number(-1), scalar(node.args[0]));
            }
            if (node.op == Op.DIVIDE && node.args[1].isFixed()) {
                return ring.product(ring.number(1 / node.args[1].value(0, 0)), scalar(node.args[0]));
            }
            if (node.op == Op.MULTIPLY) {
                double number = 1;
                List<Node> varying = new ArrayList<>();
                for (Node arg : node.args) {
                    if (arg.isFixed()) {
                        number *= arg.value(0, 0);
                    } else {
                        varying.add(arg);
                    }
                }
                if (varying.size() < node.args.length) {
                    return ring.product(ring.number(number), scalar(Algebra.multiply(varying.toArray(new Node[0]))));
                }
            }
            return ring.factor(Formula.factor(node, natural, read.hazards(), read.parameters()));
        }

        private T sum(Node node) {
            List<Node> scalars = new ArrayList<>();
            Optional<T> sum = Optional.empty();
            for (Node arg : node.args) {
                if (!arg.usesLetter()) {
                    scalars.add(arg);
                    continue;
                }
                T next = of(arg);
                sum = Optional.of(sum.isPresent() ? ring.sum(sum.orElseThrow(), next) : next);
            }
            T all = sum.orElseThrow();
            return scalars.isEmpty() ? all : ring.sum(all, scalar(Algebra.add(scalars.toArray(new Node[0]))));
        }

        /** Numbers and factors of t commute with everything and are joined first. */
        private T product(Node node) {
            List<Node> scalars = new ArrayList<>();
            Optional<T> product = Optional.empty();
            for (Node arg : node.args) {
                if (arg.usesLetter()) {
                    T next = of(arg);
                    product = Optional.of(product.isPresent() ? ring.product(product.orElseThrow(), next) : next);
                } else {
                    scalars.add(arg);
                }
            }
            T all = product.orElseThrow();
            return scalars.isEmpty() ? all : ring.product(scalar(Algebra.multiply(scalars.toArray(new Node[0]))), all);
        }

        private T power(T base, int exponent) {
            T result = ring.number(1);
            for (int i = 0; i < exponent; i++) {
                result = i == 0 ? base : ring.product(result, base);
            }
            return result;
        }

        private T rotating(Node node) {
            Complex value = complex(node);
            return ring.sum(scalar(value.re), ring.product(scalar(value.im), ring.letter(Letter.IMAGINARY)));
        }
    }

    /** The two parts of a number that holds the imaginary unit and no operator. */
    private static Complex complex(Node node) {
        if (!node.usesLetter()) {
            return new Complex(node, Node.ZERO);
        }
        Complex first = node.args.length == 0 ? new Complex(Node.ZERO, Node.ONE) : complex(node.args[0]);
        switch (node.op) {
            case LETTER:
                return first;
            case NEGATE:
                return new Complex(Algebra.negate(first.re), Algebra.negate(first.im));
            case ADD, MULTIPLY:
                for (int i = 1; i < node.args.length; i++) {
                    Complex next = complex(node.args[i]);
                    first = node.op == Op.ADD
                            ? new Complex(Algebra.add(first.re, next.re), Algebra.add(first.im, next.im))
                            : times(first, next);
                }
                return first;
            case DIVIDE:
                return new Complex(Algebra.divide(first.re, node.args[1]), Algebra.divide(first.im, node.args[1]));
            case POWER:
                Complex power = new Complex(Node.ONE, Node.ZERO);
                for (int i = 0; i < (int) node.args[1].value(0, 0); i++) {
                    power = times(power, first);
                }
                return power;
            case EXP:
                Node size = Algebra.call(Op.EXP, first.re);
                // cos(−u) is cos(u), sin(−u) is −sin(u): the two partners of a rotating pair get the same factors
                boolean negative = first.im.op == Op.NEGATE
                        || first.im.op == Op.MULTIPLY && first.im.args[0].isConstant() && first.im.args[0].value < 0;
                Node angle = negative ? Algebra.negate(first.im) : first.im;
                Node sine = Algebra.multiply(size, Algebra.call(Op.SIN, angle));
                return new Complex(
                        Algebra.multiply(size, Algebra.call(Op.COS, angle)), negative ? Algebra.negate(sine) : sine);
            default:
                throw new IllegalStateException("no complex number: " + node.op);
        }
    }

    private static Complex times(Complex a, Complex b) {
        return new Complex(
                Algebra.subtract(Algebra.multiply(a.re, b.re), Algebra.multiply(a.im, b.im)),
                Algebra.add(Algebra.multiply(a.re, b.im), Algebra.multiply(a.im, b.re)));
    }

    /** {@link #text}. */
    @Override
    public String toString() {
        return text;
    }
}
