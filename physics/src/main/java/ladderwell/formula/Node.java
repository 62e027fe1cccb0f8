package ladderwell.formula;

/** A node of a formula's tree. Immutable; made by {@link Algebra}. Nodes may be shared, so trees are walked with care. */
final class Node {

    static final int USES_X = 1;
    static final int USES_T = 2;
    /** Letters of operator formulas, the imaginary unit among them; only {@link OperatorExpression} reads trees with these. */
    static final int USES_LETTER = 4;
    /** Letters that are operators. */
    static final int USES_LADDER = 8;
    /** The letter of the imaginary unit. */
    static final String IMAGINARY = "i";

    private static final Node[] LEAF = {};

    final Op op;
    /** Arguments; not to be modified. */
    final Node[] args;
    /** Of constants and parameters. */
    final double value;
    /** Of parameters and letters. */
    final String name;
    /** {@link #USES_X}, {@link #USES_T}, {@link #USES_LETTER} and {@link #USES_LADDER}. */
    final int uses;
    /** Longest way down to a leaf. */
    final int depth;

    private Node(Op op, double value, String name, Node... args) {
        this.op = op;
        this.value = value;
        this.name = name;
        this.args = args;
        int used = op == Op.X ? USES_X : op == Op.T ? USES_T : 0;
        if (op == Op.LETTER) {
            used = name.equals(IMAGINARY) ? USES_LETTER : USES_LETTER | USES_LADDER;
        }
        int deepest = 0;
        for (Node arg : args) {
            used |= arg.uses;
            deepest = Math.max(deepest, arg.depth + 1);
        }
        uses = used;
        depth = deepest;
    }

    static final Node X = new Node(Op.X, 0, "x", LEAF);
    static final Node T = new Node(Op.T, 0, "t", LEAF);
    static final Node ZERO = constant(0);
    static final Node ONE = constant(1);

    static Node constant(double value) {
        return new Node(Op.CONSTANT, value, "", LEAF);
    }

    static Node parameter(String name, double value) {
        return new Node(Op.PARAMETER, value, name, LEAF);
    }

    static Node letter(String name) {
        return new Node(Op.LETTER, 0, name, LEAF);
    }

    static Node of(Op op, Node... args) {
        return new Node(op, 0, "", args);
    }

    boolean isConstant() {
        return op == Op.CONSTANT;
    }

    boolean is(double number) {
        return op == Op.CONSTANT && value == number;
    }

    /** True where neither x nor t nor a letter occurs. */
    boolean isFixed() {
        return uses == 0;
    }

    boolean usesX() {
        return (uses & USES_X) != 0;
    }

    boolean usesT() {
        return (uses & USES_T) != 0;
    }

    boolean usesLetter() {
        return (uses & USES_LETTER) != 0;
    }

    boolean usesLadder() {
        return (uses & USES_LADDER) != 0;
    }

    /** Whether two trees are the same, number by number; counts down the nodes that may be looked at. */
    static boolean same(Node a, Node b, int[] budget) {
        if (a == b) {
            return true;
        }
        if (--budget[0] < 0
                || a.op != b.op
                || a.args.length != b.args.length
                || Double.compare(a.value, b.value) != 0
                || !a.name.equals(b.name)) {
            return false;
        }
        for (int i = 0; i < a.args.length; i++) {
            if (!same(a.args[i], b.args[i], budget)) {
                return false;
            }
        }
        return true;
    }

    /** The value at one point, by walking the tree; for the rare points where no compiled program is at hand. */
    double value(double x, double t) {
        switch (op) {
            case CONSTANT, PARAMETER:
                return value;
            case X:
                return x;
            case T:
                return t;
            case POWER:
                return Program.isWhole(args[1])
                        ? Op.wholePower(args[0].value(x, t), (int) args[1].value(0, 0))
                        : Math.pow(args[0].value(x, t), args[1].value(x, t));
            case ADD, MULTIPLY, MIN, MAX, AND, OR:
                double all = args[0].value(x, t);
                for (int i = 1; i < args.length; i++) {
                    all = op.apply(all, args[i].value(x, t), 0);
                }
                return all;
            case IF:
                return args[0].value(x, t) != 0 ? args[1].value(x, t) : args[2].value(x, t);
            default:
                return op.apply(
                        args[0].value(x, t),
                        args.length > 1 ? args[1].value(x, t) : 0,
                        args.length > 2 ? args[2].value(x, t) : 0);
        }
    }
}
