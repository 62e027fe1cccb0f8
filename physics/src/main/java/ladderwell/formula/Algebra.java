package ladderwell.formula;

import java.util.ArrayList;
import java.util.List;

/**
 * Builds nodes and simplifies on the way: literal numbers are joined, zeros and ones vanish, sums and products are flat.
 * Parameters stay by name, so that derivatives can be read.
 */
final class Algebra {

    private Algebra() {}

    static Node add(Node... terms) {
        List<Node> flat = new ArrayList<>(terms.length);
        double number = 0;
        for (Node term : terms) {
            if (term.op == Op.ADD) {
                for (Node inner : term.args) {
                    number = join(flat, inner, number);
                }
            } else {
                number = join(flat, term, number);
            }
        }
        if (number != 0 || flat.isEmpty()) {
            flat.add(Node.constant(number));
        }
        return flat.size() == 1 ? flat.get(0) : Node.of(Op.ADD, flat.toArray(new Node[0]));
    }

    private static double join(List<Node> flat, Node term, double number) {
        if (term.isConstant()) {
            return number + term.value;
        }
        flat.add(term);
        return number;
    }

    static Node subtract(Node a, Node b) {
        return add(a, negate(b));
    }

    static Node negate(Node a) {
        if (a.isConstant()) {
            return Node.constant(-a.value);
        }
        if (a.op == Op.NEGATE) {
            return a.args[0];
        }
        if (a.op == Op.MULTIPLY && a.args[0].isConstant()) {
            Node[] factors = a.args.clone();
            factors[0] = Node.constant(-factors[0].value);
            return multiply(factors);
        }
        return Node.of(Op.NEGATE, a);
    }

    static Node multiply(Node... factors) {
        List<Node> flat = new ArrayList<>(factors.length);
        double number = 1;
        for (Node factor : factors) {
            Node bare = factor;
            if (bare.op == Op.NEGATE) {
                number = -number;
                bare = bare.args[0];
            }
            for (Node inner : bare.op == Op.MULTIPLY ? bare.args : new Node[] {bare}) {
                if (inner.isConstant()) {
                    number *= inner.value;
                } else {
                    flat.add(inner);
                }
            }
        }
        if (number == 0 || flat.isEmpty()) {
            return Node.constant(number == 0 ? 0 : number);
        }
        boolean negative = number == -1;
        if (number != 1 && !negative) {
            flat.add(0, Node.constant(number));
        }
        Node product = flat.size() == 1 ? flat.get(0) : Node.of(Op.MULTIPLY, flat.toArray(new Node[0]));
        return negative ? Node.of(Op.NEGATE, product) : product;
    }

    static Node divide(Node a, Node b) {
        if (b.is(1)) {
            return a;
        }
        if (b.is(0)) {
            return Node.of(Op.DIVIDE, a, b);
        }
        if (a.is(0)) {
            return Node.ZERO;
        }
        if (a.op == Op.NEGATE) {
            return negate(divide(a.args[0], b));
        }
        if (b.op == Op.NEGATE) {
            return negate(divide(a, b.args[0]));
        }
        if (b.isConstant()) {
            if (a.isConstant()) {
                return Node.constant(a.value / b.value);
            }
            // 2*x/2 is x; only where the quotient of the two numbers is whole and so free of rounding
            if (a.op == Op.MULTIPLY && a.args[0].isConstant()) {
                double quotient = a.args[0].value / b.value;
                if (quotient == Math.rint(quotient)
                        && Math.abs(quotient) < 1e15
                        && quotient * b.value == a.args[0].value) {
                    Node[] factors = a.args.clone();
                    factors[0] = Node.constant(quotient);
                    return multiply(factors);
                }
            }
        }
        return Node.of(Op.DIVIDE, a, b);
    }

    static Node power(Node base, Node exponent) {
        if (exponent.is(1)) {
            return base;
        }
        if (exponent.is(0)) {
            return Node.ONE;
        }
        if (base.isConstant() && exponent.isConstant()) {
            return Node.constant(Math.pow(base.value, exponent.value));
        }
        if (base.op == Op.POWER
                && Program.isWhole(base.args[1])
                && Program.isWhole(exponent)
                && base.args[1].isConstant()
                && exponent.isConstant()
                && Math.abs(base.args[1].value * exponent.value) < 1e6
                && base.args[1].value > 0
                && exponent.value > 0) {
            return power(base.args[0], Node.constant(base.args[1].value * exponent.value));
        }
        return Node.of(Op.POWER, base, exponent);
    }

    static Node call(Op op, Node... args) {
        boolean constant = true;
        for (Node arg : args) {
            constant &= arg.isConstant();
        }
        if (op == Op.IF) {
            if (args[0].isConstant()) {
                return args[0].value != 0 ? args[1] : args[2];
            }
            if (args[1].isConstant() && args[2].isConstant() && args[1].value == args[2].value) {
                return args[1];
            }
        }
        Node node = Node.of(op, args);
        return constant ? Node.constant(node.value(0, 0)) : node;
    }

    static Node square(Node a) {
        return power(a, Node.constant(2));
    }
}
