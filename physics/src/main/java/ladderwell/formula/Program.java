package ladderwell.formula;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.IdentityHashMap;
import java.util.List;
import java.util.Map;

/**
 * A tree as a flat list of instructions on numbered registers; equal parts are computed once. Registers 0 and 1 hold x and
 * t, the next ones the numbers that do not vary, the rest what is computed. Points are taken in blocks, so that each
 * instruction is a plain loop over primitive arrays and nothing is allocated for a point.
 */
final class Program {

    private static final int BLOCK = 128;
    private static final int WIDEST_POWER = 16;

    private final Op[] ops;
    private final int[] a;
    private final int[] b;
    private final int[] c;
    private final int[] to;
    /** First values of all registers: the fixed numbers, zero elsewhere. */
    private final double[] start;

    private final int result;
    /** The first instructions, which do not depend on x. */
    private final int leading;

    private Program(List<Step> steps, int leading, double[] start, int result) {
        this.leading = leading;
        int n = steps.size();
        ops = new Op[n];
        a = new int[n];
        b = new int[n];
        c = new int[n];
        to = new int[n];
        for (int i = 0; i < n; i++) {
            Step step = steps.get(i);
            ops[i] = step.op;
            a[i] = step.a;
            b[i] = step.b;
            c[i] = step.c;
            to[i] = step.to;
        }
        this.start = start;
        this.result = result;
    }

    private record Step(Op op, int a, int b, int c, int to) {}

    /** What makes two computed values the same. */
    private record Key(Op op, int a, int b, int c) {}

    /** True for an exponent computed by multiplications: whole, fixed and at most 16. */
    static boolean isWhole(Node exponent) {
        if (!exponent.isFixed()) {
            return false;
        }
        double value = exponent.value(0, 0);
        return value == Math.rint(value) && Math.abs(value) <= WIDEST_POWER;
    }

    static Program of(Node node) {
        Compiler compiler = new Compiler();
        compiler.timeOnly(node, new IdentityHashMap<>());
        compiler.leading = compiler.steps.size();
        int result = compiler.register(node);
        return compiler.finish(result);
    }

    private static final class Compiler {
        private final Map<Node, Integer> seen = new IdentityHashMap<>();
        private final Map<Key, Integer> computed = new HashMap<>();
        private final Map<Double, Integer> numbers = new HashMap<>();
        private final List<Double> fixed = new ArrayList<>();
        private final List<Step> steps = new ArrayList<>();
        private int leading;

        /** Parts that vary with t alone come first: many points at one time need them only once. */
        void timeOnly(Node node, Map<Node, Boolean> done) {
            if (!node.usesT() || done.put(node, true) != null) {
                return;
            }
            if (!node.usesX()) {
                register(node);
                return;
            }
            for (Node arg : node.args) {
                timeOnly(arg, done);
            }
        }

        /** Registers before the number of fixed ones is known: x is 0, t is 1, fixed k is −1 − k, step k is 2 + k. */
        int register(Node node) {
            Integer there = seen.get(node);
            if (there != null) {
                return there;
            }
            int made = make(node);
            seen.put(node, made);
            return made;
        }

        private int make(Node node) {
            if (node.op == Op.X) {
                return 0;
            }
            if (node.op == Op.T) {
                return 1;
            }
            if (node.isFixed()) {
                return number(node.value(0, 0));
            }
            if (node.op == Op.POWER && isWhole(node.args[1])) {
                return step(Op.WHOLE_POWER, register(node.args[0]), (int) node.args[1].value(0, 0), 0);
            }
            int[] args = new int[node.args.length];
            for (int i = 0; i < args.length; i++) {
                args[i] = register(node.args[i]);
            }
            switch (node.op) {
                case ADD, MULTIPLY, MIN, MAX, AND, OR:
                    int all = args[0];
                    for (int i = 1; i < args.length; i++) {
                        all = step(node.op, all, args[i], 0);
                    }
                    return all;
                default:
                    return step(node.op, args[0], args.length > 1 ? args[1] : 0, args.length > 2 ? args[2] : 0);
            }
        }

        private int number(double value) {
            return numbers.computeIfAbsent(value, v -> {
                fixed.add(v);
                return -fixed.size();
            });
        }

        private int step(Op op, int a, int b, int c) {
            return computed.computeIfAbsent(new Key(op, a, b, c), key -> {
                steps.add(new Step(op, a, b, c, steps.size() + 2));
                return steps.size() + 1;
            });
        }

        /** Gives the computed values registers, each free again after its last use. */
        Program finish(int result) {
            int base = 2 + fixed.size();
            int[] lastUse = new int[steps.size()];
            for (int i = 0; i < steps.size(); i++) {
                Step step = steps.get(i);
                use(lastUse, step.a, i);
                if (step.op != Op.WHOLE_POWER) {
                    use(lastUse, step.b, i);
                }
                use(lastUse, step.c, i);
            }
            use(lastUse, result, steps.size());
            Arrays.fill(lastUse, 0, leading, steps.size());
            int[] place = new int[steps.size()];
            List<Integer> free = new ArrayList<>();
            List<Step> placed = new ArrayList<>();
            int registers = base;
            Map<Integer, List<Integer>> ending = new HashMap<>();
            for (int i = 0; i < steps.size(); i++) {
                Step step = steps.get(i);
                int to = free.isEmpty() ? registers++ : free.remove(free.size() - 1);
                place[i] = to;
                int second = step.op == Op.WHOLE_POWER ? step.b : placed(place, step.b);
                placed.add(new Step(step.op, placed(place, step.a), second, placed(place, step.c), to));
                ending.computeIfAbsent(lastUse[i], k -> new ArrayList<>()).add(i);
                List<Integer> over = ending.remove(i);
                if (over != null) {
                    for (int k : over) {
                        free.add(place[k]);
                    }
                }
            }
            double[] start = new double[registers];
            for (int i = 0; i < fixed.size(); i++) {
                start[2 + i] = fixed.get(i);
            }
            return new Program(placed, leading, start, placed(place, result));
        }

        private static void use(int[] lastUse, int register, int at) {
            if (register >= 2) {
                lastUse[register - 2] = at;
            }
        }

        private static int placed(int[] place, int register) {
            if (register >= 2) {
                return place[register - 2];
            }
            return register >= 0 ? register : 1 - register;
        }
    }

    /** The value at one point. */
    double value(double x, double t) {
        double[] r = start.clone();
        r[0] = x;
        r[1] = t;
        run(r, 0, ops.length);
        return r[result];
    }

    private void run(double[] r, int from, int to) {
        for (int i = from; i < to; i++) {
            double u = r[a[i]];
            r[this.to[i]] = ops[i] == Op.WHOLE_POWER ? Op.wholePower(u, b[i]) : ops[i].apply(u, r[b[i]], r[c[i]]);
        }
    }

    /** The values at many points; {@code out} may be {@code x}. */
    void values(double[] x, double t, double[] out) {
        int width = Math.min(BLOCK, x.length);
        double[] first = start.clone();
        first[1] = t;
        run(first, 0, leading);
        double[][] r = new double[start.length][width];
        for (int k = 1; k < r.length; k++) {
            if (first[k] != 0) {
                Arrays.fill(r[k], first[k]);
            }
        }
        for (int from = 0; from < x.length; from += width) {
            int n = Math.min(width, x.length - from);
            System.arraycopy(x, from, r[0], 0, n);
            for (int i = leading; i < ops.length; i++) {
                if (ops[i] == Op.WHOLE_POWER) {
                    wholePowers(r[a[i]], b[i], r[to[i]], n);
                } else {
                    block(ops[i], r[a[i]], r[b[i]], r[c[i]], r[to[i]], n);
                }
            }
            System.arraycopy(r[result], 0, out, from, n);
        }
    }

    private static void wholePowers(double[] u, int power, double[] to, int n) {
        switch (power) {
            case 2:
                for (int i = 0; i < n; i++) {
                    to[i] = u[i] * u[i];
                }
                return;
            case 4:
                for (int i = 0; i < n; i++) {
                    double square = u[i] * u[i];
                    to[i] = square * square;
                }
                return;
            default:
                for (int i = 0; i < n; i++) {
                    to[i] = Op.wholePower(u[i], power);
                }
        }
    }

    /** The frequent ones as loops of their own, which the compiler can vectorise; the same bits as {@link Op#apply}. */
    private static void block(Op op, double[] u, double[] v, double[] w, double[] to, int n) {
        switch (op) {
            case ADD:
                for (int i = 0; i < n; i++) {
                    to[i] = u[i] + v[i];
                }
                return;
            case MULTIPLY:
                for (int i = 0; i < n; i++) {
                    to[i] = u[i] * v[i];
                }
                return;
            case DIVIDE:
                for (int i = 0; i < n; i++) {
                    to[i] = u[i] / v[i];
                }
                return;
            case NEGATE:
                for (int i = 0; i < n; i++) {
                    to[i] = -u[i];
                }
                return;
            case EXP:
                for (int i = 0; i < n; i++) {
                    to[i] = Math.exp(u[i]);
                }
                return;
            case SIN:
                for (int i = 0; i < n; i++) {
                    to[i] = Math.sin(u[i]);
                }
                return;
            case COS:
                for (int i = 0; i < n; i++) {
                    to[i] = Math.cos(u[i]);
                }
                return;
            case SQRT:
                for (int i = 0; i < n; i++) {
                    to[i] = Math.sqrt(u[i]);
                }
                return;
            case ABS:
                for (int i = 0; i < n; i++) {
                    to[i] = Math.abs(u[i]);
                }
                return;
            case LESS:
                for (int i = 0; i < n; i++) {
                    to[i] = u[i] < v[i] ? 1 : 0;
                }
                return;
            case LESS_EQUAL:
                for (int i = 0; i < n; i++) {
                    to[i] = u[i] <= v[i] ? 1 : 0;
                }
                return;
            case IF:
                for (int i = 0; i < n; i++) {
                    to[i] = u[i] != 0 ? v[i] : w[i];
                }
                return;
            case GAUSS:
                for (int i = 0; i < n; i++) {
                    to[i] = Op.gauss(u[i], v[i], w[i]);
                }
                return;
            default:
                for (int i = 0; i < n; i++) {
                    to[i] = op.apply(u[i], v[i], w[i]);
                }
        }
    }
}
