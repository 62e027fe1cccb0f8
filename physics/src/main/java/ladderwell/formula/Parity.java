package ladderwell.formula;

import java.util.IdentityHashMap;
import java.util.Map;

/** What of a tree is even or odd in x for certain, by its form. */
final class Parity {
    static final int EVEN = 1;
    static final int ODD = -1;
    static final int UNKNOWN = 0;

    private final Map<Node, Integer> known = new IdentityHashMap<>();

    /** {@link #EVEN}, {@link #ODD} or {@link #UNKNOWN}. */
    int of(Node node) {
        if (!node.usesX()) {
            return EVEN;
        }
        Integer before = known.get(node);
        if (before == null) {
            before = found(node);
            known.put(node, before);
        }
        return before;
    }

    private int found(Node node) {
        Node[] args = node.args;
        return switch (node.op) {
            case X -> ODD;
            case NEGATE, SIN, TAN, SINH, TANH, SIGN -> of(args[0]);
            case COS, COSH, ABS -> of(args[0]) == UNKNOWN ? UNKNOWN : EVEN;
            case ADD -> {
                int all = of(args[0]);
                for (Node arg : args) {
                    all = of(arg) == all ? all : UNKNOWN;
                }
                yield all;
            }
            case MULTIPLY, DIVIDE -> {
                int all = EVEN;
                for (Node arg : args) {
                    all *= of(arg);
                }
                yield all;
            }
            case POWER -> power(args[0], args[1]);
            default -> {
                for (Node arg : args) {
                    if (of(arg) != EVEN) {
                        yield UNKNOWN;
                    }
                }
                yield EVEN;
            }
        };
    }

    private int power(Node base, Node exponent) {
        if (of(base) == ODD && exponent.isConstant() && exponent.value == Math.rint(exponent.value)) {
            return exponent.value % 2 == 0 ? EVEN : ODD;
        }
        return of(base) == EVEN && of(exponent) == EVEN ? EVEN : UNKNOWN;
    }

    /**
     * The outermost sum in two parts.
     *
     * @param odd the terms that are odd for certain
     * @param rest all others
     */
    record Parts(Node odd, Node rest) {}

    Parts parts(Node node) {
        if (node.op == Op.ADD) {
            Parts all = new Parts(Node.ZERO, Node.ZERO);
            for (Node arg : node.args) {
                Parts part = parts(arg);
                all = new Parts(sum(all.odd, part.odd), sum(all.rest, part.rest));
            }
            return all;
        }
        if (node.op == Op.NEGATE) {
            Parts a = parts(node.args[0]);
            return new Parts(negative(a.odd), negative(a.rest));
        }
        if (node.op == Op.MULTIPLY && node.args.length == 2 && !(node.args[0].usesX() && node.args[1].usesX())) {
            boolean first = !node.args[0].usesX();
            Node factor = node.args[first ? 0 : 1];
            Parts parts = parts(node.args[first ? 1 : 0]);
            return new Parts(times(factor, parts.odd), times(factor, parts.rest));
        }
        if (node.op == Op.DIVIDE && !node.args[1].usesX()) {
            Parts parts = parts(node.args[0]);
            return new Parts(over(parts.odd, node.args[1]), over(parts.rest, node.args[1]));
        }
        return of(node) == ODD ? new Parts(node, Node.ZERO) : new Parts(Node.ZERO, node);
    }

    private static Node sum(Node a, Node b) {
        return a.is(0) ? b : b.is(0) ? a : Node.of(Op.ADD, a, b);
    }

    private static Node times(Node factor, Node a) {
        return a.is(0) ? a : Node.of(Op.MULTIPLY, factor, a);
    }

    private static Node over(Node a, Node divisor) {
        return a.is(0) ? a : Node.of(Op.DIVIDE, a, divisor);
    }

    private static Node negative(Node a) {
        return a.is(0) ? a : Node.of(Op.NEGATE, a);
    }
}
