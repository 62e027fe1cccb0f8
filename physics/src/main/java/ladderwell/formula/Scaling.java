package ladderwell.formula;

import java.util.IdentityHashMap;
import java.util.Map;

/** Puts a·x in place of x and b·t in place of t. */
final class Scaling {

    private final Node x;
    private final Node t;
    private final Map<Node, Node> known = new IdentityHashMap<>();

    Scaling(double length, double time) {
        x = Algebra.multiply(Node.constant(length), Node.X);
        t = Algebra.multiply(Node.constant(time), Node.T);
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
