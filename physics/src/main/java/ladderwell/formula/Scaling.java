package ladderwell.formula;

import java.util.IdentityHashMap;
import java.util.Map;

/** Puts a·x in place of x, and b·t or a number in place of t. */
final class Scaling {

    private final Node x;
    private final Node t;
    private final Map<Node, Node> known = new IdentityHashMap<>();

    private Scaling(Node x, Node t) {
        this.x = x;
        this.t = t;
    }

    Scaling(double length, double time) {
        this(Algebra.multiply(Node.constant(length), Node.X), Algebra.multiply(Node.constant(time), Node.T));
    }

    /** The tree at x = 0 as a function of x in place of t: time is walked along like position. */
    static Node alongTime(Node node) {
        return new Scaling(Node.ZERO, Node.X).of(node);
    }

    /** The tree at one time. */
    static Node at(double time, Node node) {
        return node.usesT() ? new Scaling(Node.X, Node.constant(time)).of(node) : node;
    }

    Node of(Node node) {
        if (node.isFixed()) {
            return node;
        }
        Node there = known.get(node);
        if (there == null) {
            there = replace(node);
            known.put(node, there);
        }
        return there;
    }

    private Node replace(Node node) {
        if (node.op == Op.X) {
            return x;
        }
        if (node.op == Op.T) {
            return t;
        }
        Node[] args = new Node[node.args.length];
        for (int i = 0; i < args.length; i++) {
            args[i] = of(node.args[i]);
        }
        return Node.of(node.op, args);
    }
}
