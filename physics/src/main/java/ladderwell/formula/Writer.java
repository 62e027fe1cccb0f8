package ladderwell.formula;

import ladderwell.quantity.Digits;

/** A tree as text that can be read again; lab numbers are in SI. */
final class Writer {

    /** A text longer than this serves nobody. */
    private static final int LONGEST = 4000;

    private final StringBuilder out = new StringBuilder();

    private Writer() {}

    static String text(Node node) {
        Writer writer = new Writer();
        writer.write(node, 0);
        return writer.out.length() > LONGEST ? writer.out.substring(0, LONGEST) + " …" : writer.out.toString();
    }

    /** Binding: or 1, and 2, comparison 3, sum 4, product 5, sign 6, power 7, leaf 9. */
    private static int binding(Node node) {
        return switch (node.op) {
            case OR -> 1;
            case AND -> 2;
            case LESS, LESS_EQUAL -> 3;
            case ADD -> 4;
            case MULTIPLY, DIVIDE -> 5;
            case NEGATE -> 6;
            case POWER -> 7;
            case CONSTANT -> node.value < 0 ? 6 : 9;
            default -> 9;
        };
    }

    private void write(Node node, int outer) {
        if (out.length() > LONGEST) {
            return;
        }
        boolean bracket = binding(node) < outer;
        if (bracket) {
            out.append('(');
        }
        switch (node.op) {
            case CONSTANT ->
                out.append(Double.isFinite(node.value) ? Digits.shortest(node.value) : String.valueOf(node.value));
            case PARAMETER, X, T, LETTER -> out.append(node.name);
            case ADD -> sum(node);
            case MULTIPLY -> list(node, "*", 6);
            case DIVIDE -> pair(node, 5, "/", 6);
            case NEGATE -> {
                out.append('-');
                write(node.args[0], 6);
            }
            case POWER -> pair(node, 8, "^", 6);
            case LESS -> pair(node, 4, " < ", 4);
            case LESS_EQUAL -> pair(node, 4, " <= ", 4);
            case AND -> list(node, " and ", 3);
            case OR -> list(node, " or ", 2);
            default -> {
                out.append(node.op.function()).append('(');
                list(node, ", ", 0);
                out.append(')');
            }
        }
        if (bracket) {
            out.append(')');
        }
    }

    private void pair(Node node, int left, String mark, int right) {
        write(node.args[0], left);
        out.append(mark);
        write(node.args[1], right);
    }

    private void list(Node node, String mark, int inner) {
        for (int i = 0; i < node.args.length; i++) {
            if (i > 0) {
                out.append(mark);
            }
            write(node.args[i], i == 0 && inner == 6 ? 5 : inner);
        }
    }

    private void sum(Node node) {
        for (int i = 0; i < node.args.length; i++) {
            Node term = node.args[i];
            boolean minus = term.op == Op.NEGATE
                    || term.isConstant() && term.value < 0
                    || term.op == Op.MULTIPLY && term.args[0].isConstant() && term.args[0].value < 0;
            if (i > 0) {
                out.append(minus ? " - " : " + ");
            }
            write(i > 0 && minus ? Algebra.negate(term) : term, 5);
        }
    }
}
