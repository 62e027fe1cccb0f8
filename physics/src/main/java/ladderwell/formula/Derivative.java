package ladderwell.formula;

import static ladderwell.formula.Algebra.add;
import static ladderwell.formula.Algebra.call;
import static ladderwell.formula.Algebra.divide;
import static ladderwell.formula.Algebra.multiply;
import static ladderwell.formula.Algebra.negate;
import static ladderwell.formula.Algebra.power;
import static ladderwell.formula.Algebra.square;
import static ladderwell.formula.Algebra.subtract;

import java.util.ArrayList;
import java.util.IdentityHashMap;
import java.util.List;
import java.util.Map;

/** The exact derivative of a tree by one variable, away from breaks (there a jump contributes nothing). */
final class Derivative {

    private final int variable;
    private final Map<Node, Node> known = new IdentityHashMap<>();

    private Derivative(int variable) {
        this.variable = variable;
    }

    /** By x ({@link Node#USES_X}) or t ({@link Node#USES_T}). */
    static Node of(Node node, int variable) {
        return new Derivative(variable).of(node);
    }

    private Node of(Node node) {
        if ((node.uses & variable) == 0) {
            return Node.ZERO;
        }
        Node there = known.get(node);
        if (there == null) {
            there = derive(node);
            known.put(node, there);
        }
        return there;
    }

    private Node derive(Node node) {
        Node a = node.args.length > 0 ? node.args[0] : Node.ZERO;
        Node b = node.args.length > 1 ? node.args[1] : Node.ZERO;
        return switch (node.op) {
            case X, T -> Node.ONE;
            case ADD -> sum(node);
            case MULTIPLY -> product(node);
            case DIVIDE -> quotient(a, b);
            case NEGATE -> negate(of(a));
            case POWER -> raised(node, a, b);
            case EXP -> multiply(of(a), node);
            case LOG -> divide(of(a), a);
            case SIN -> multiply(of(a), call(Op.COS, a));
            case COS -> negate(multiply(of(a), call(Op.SIN, a)));
            case TAN -> divide(of(a), square(call(Op.COS, a)));
            case SINH -> multiply(of(a), call(Op.COSH, a));
            case COSH -> multiply(of(a), call(Op.SINH, a));
            case TANH -> divide(of(a), square(call(Op.COSH, a)));
            case SQRT -> divide(of(a), multiply(Node.constant(2), node));
            case ABS -> multiply(of(a), call(Op.SIGN, a));
            case MIN -> chosen(node, Op.MIN);
            case MAX -> chosen(node, Op.MAX);
            case GAUSS -> bell(node);
            case IF -> call(Op.IF, a, of(b), of(node.args[2]));
            case CONSTANT, PARAMETER, LETTER, WHOLE_POWER, SIGN, STEP, LESS, LESS_EQUAL, AND, OR -> Node.ZERO;
        };
    }

    private Node sum(Node node) {
        Node[] terms = new Node[node.args.length];
        for (int i = 0; i < terms.length; i++) {
            terms[i] = of(node.args[i]);
        }
        return add(terms);
    }

    private Node product(Node node) {
        List<Node> terms = new ArrayList<>();
        for (int i = 0; i < node.args.length; i++) {
            if ((node.args[i].uses & variable) != 0) {
                Node[] factors = node.args.clone();
                factors[i] = of(node.args[i]);
                terms.add(multiply(factors));
            }
        }
        return add(terms.toArray(new Node[0]));
    }

    private Node quotient(Node a, Node b) {
        if ((b.uses & variable) == 0) {
            return divide(of(a), b);
        }
        Node inner = divide(multiply(a, of(b)), square(b));
        return (a.uses & variable) == 0 ? negate(inner) : subtract(divide(of(a), b), inner);
    }

    private Node raised(Node node, Node a, Node b) {
        if ((b.uses & variable) == 0) {
            return multiply(b, power(a, subtract(b, Node.ONE)), of(a));
        }
        if ((a.uses & variable) == 0) {
            return multiply(node, call(Op.LOG, a), of(b));
        }
        return multiply(node, add(multiply(of(b), call(Op.LOG, a)), divide(multiply(b, of(a)), a)));
    }

    private Node chosen(Node node, Op op) {
        Node best = node.args[0];
        Node slope = of(best);
        for (int i = 1; i < node.args.length; i++) {
            Node next = node.args[i];
            Node first = op == Op.MIN ? call(Op.LESS_EQUAL, best, next) : call(Op.LESS_EQUAL, next, best);
            slope = call(Op.IF, first, slope, of(next));
            best = call(op, best, next);
        }
        return slope;
    }

    /** g = exp(−u²/2), u = (x − c)/w: g′ = −g u u′. */
    private Node bell(Node node) {
        Node u = divide(subtract(node.args[0], node.args[1]), node.args[2]);
        return negate(multiply(node, u, of(u)));
    }
}
