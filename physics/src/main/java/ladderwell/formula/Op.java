package ladderwell.formula;

import java.util.Optional;

/** What a node of a formula does. Names in brackets are those that can be typed. */
enum Op {
    CONSTANT,
    PARAMETER,
    X,
    T,
    /** An operator or the imaginary unit, in operator formulas. */
    LETTER,
    ADD,
    MULTIPLY,
    DIVIDE,
    NEGATE,
    POWER,
    /** Whole power; the exponent is the node's value. Made by the compiler only. */
    WHOLE_POWER,
    EXP("exp", 1),
    LOG("log", 1),
    SIN("sin", 1),
    COS("cos", 1),
    TAN("tan", 1),
    SINH("sinh", 1),
    COSH("cosh", 1),
    TANH("tanh", 1),
    SQRT("sqrt", 1),
    ABS("abs", 1),
    SIGN("sign", 1),
    STEP("step", 1),
    MIN("min", 2),
    MAX("max", 2),
    GAUSS("gauss", 3),
    IF("if", 3),
    LESS,
    LESS_EQUAL,
    AND,
    OR;

    private static final Op[] ALL = values();

    private final String function;
    private final int arguments;

    Op() {
        this("", 0);
    }

    Op(String function, int arguments) {
        this.function = function;
        this.arguments = arguments;
    }

    /** The name to type; empty where it is no function. */
    String function() {
        return function;
    }

    /** How many arguments the function takes (min and max: at least). */
    int arguments() {
        return arguments;
    }

    boolean isFunction() {
        return !function.isEmpty();
    }

    /** True where the value depends on the sign of something: the source of jumps and kinks. */
    boolean isSwitch() {
        return switch (this) {
            case ABS, SIGN, STEP, MIN, MAX, LESS, LESS_EQUAL -> true;
            default -> false;
        };
    }

    static Optional<Op> function(String name) {
        for (Op op : ALL) {
            if (op.isFunction() && op.function.equals(name)) {
                return Optional.of(op);
            }
        }
        return Optional.empty();
    }

    /** The value of an operation on one, two or three numbers; conditions are 1 and 0. */
    double apply(double a, double b, double c) {
        return switch (this) {
            case ADD -> a + b;
            case MULTIPLY -> a * b;
            case DIVIDE -> a / b;
            case NEGATE -> -a;
            case POWER -> Math.pow(a, b);
            case EXP -> Math.exp(a);
            case LOG -> Math.log(a);
            case SIN -> Math.sin(a);
            case COS -> Math.cos(a);
            case TAN -> Math.tan(a);
            case SINH -> Math.sinh(a);
            case COSH -> Math.cosh(a);
            case TANH -> Math.tanh(a);
            case SQRT -> Math.sqrt(a);
            case ABS -> Math.abs(a);
            case SIGN -> Math.signum(a);
            case STEP -> a >= 0 ? 1 : a < 0 ? 0 : Double.NaN;
            case MIN -> Math.min(a, b);
            case MAX -> Math.max(a, b);
            case GAUSS -> gauss(a, b, c);
            case IF -> a != 0 ? b : c;
            case LESS -> a < b ? 1 : 0;
            case LESS_EQUAL -> a <= b ? 1 : 0;
            case AND -> a != 0 && b != 0 ? 1 : 0;
            case OR -> a != 0 || b != 0 ? 1 : 0;
            default -> throw new IllegalStateException("no operation: " + this);
        };
    }

    /** exp(−(x − centre)²/2 width²). */
    static double gauss(double x, double centre, double width) {
        double u = (x - centre) / width;
        return Math.exp(-0.5 * u * u);
    }

    /** x^n by repeated squaring: about log2 n roundings. */
    static double wholePower(double x, int n) {
        double square = x;
        double result = 1;
        for (int left = Math.abs(n); left > 0; left >>= 1) {
            if ((left & 1) == 1) {
                result *= square;
            }
            square *= square;
        }
        return n < 0 ? 1 / result : result;
    }
}
