package ladderwell.window;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import ladderwell.evidence.Certainty;
import ladderwell.numeric.DoubleDouble;
import ladderwell.operator.LadderPolynomial;
import ladderwell.operator.OperatorFormula;

/**
 * A Hamiltonian whose factors are formulas of t, in number windows. Each factor is replaced over a step by the polynomial through its values at
 * Chebyshev's nodes; how far that is off is measured between them, so it is an estimate.
 */
final class FormulaCourse implements Course {
    /** Degree of the polynomials in time. */
    private static final int DEGREE = 10;
    /** What is measured between the nodes may be more where it was not looked. */
    private static final double SAFETY = 4;
    /** A step that ends as near to a break as so many units of rounding ends at it. */
    private static final double BREAK = 8;

    private final OperatorFormula hamiltonian;
    private final List<LadderPolynomial> jumps;
    private final double[] breaks;
    private final double[] off;
    private final double[] missed;
    private final double[] sizes;
    private long sizedFirst = -1;
    private int sizedLevels;

    /** @param end when the run ends */
    FormulaCourse(OperatorFormula hamiltonian, List<LadderPolynomial> jumps, double end) {
        this.hamiltonian = hamiltonian;
        this.jumps = jumps;
        off = new double[hamiltonian.terms().size()];
        missed = new double[off.length];
        sizes = new double[off.length];
        breaks = hamiltonian.terms().stream()
                .flatMapToDouble(term -> Arrays.stream(term.factor().breakTimes(0, Math.max(end, Double.MIN_NORMAL))))
                .sorted()
                .toArray();
    }

    @Override
    public Generator generator(double time, double length) {
        return Generator.of(orders(time, length), jumps.stream().map(List::of).toList());
    }

    /** The Hamiltonian by orders of the time since a step began. */
    List<LadderPolynomial> orders(double time, double length) {
        List<LadderPolynomial> orders = new ArrayList<>();
        orders.add(hamiltonian.constant());
        for (int j = 1; j <= DEGREE && off.length > 0; j++) {
            orders.add(LadderPolynomial.zero());
        }
        for (int i = 0; i < off.length; i++) {
            OperatorFormula.Term term = hamiltonian.terms().get(i);
            double[] fit = fit(term, time, length, i);
            for (int j = 0; j <= DEGREE; j++) {
                if (fit[j] != 0) {
                    orders.set(j, orders.get(j).plus(term.operator().times(fit[j])));
                }
            }
        }
        return orders;
    }

    /** Coefficients of 1, s, s² …; puts down what the polynomial is off. */
    private double[] fit(OperatorFormula.Term term, double time, double length, int index) {
        int nodes = DEGREE + 1;
        // a break is known within rounding: what is looked at lies that much inside
        double inside = touchesBreak(time, length) ? 16 * Math.ulp(time + length) : 0;
        double first = time + inside;
        double last = time + length - inside;
        double[] values = new double[nodes];
        double most = 0;
        for (int i = 0; i < nodes; i++) {
            double x = Math.cos(Math.PI * (i + 0.5) / nodes);
            values[i] = term.factor(Math.max(first, Math.min(last, time + length * (x + 1) / 2)));
            most = Math.max(most, Math.abs(values[i]));
        }
        // Chebyshev coefficients, then powers of u = s/length; the large integers on the way need the longer numbers
        DoubleDouble[] powers = new DoubleDouble[nodes];
        Arrays.fill(powers, DoubleDouble.ZERO);
        DoubleDouble[] before = shifted(0);
        DoubleDouble[] here = shifted(1);
        for (int k = 0; k < nodes; k++) {
            double sum = 0;
            for (int i = 0; i < nodes; i++) {
                sum += values[i] * Math.cos(Math.PI * k * (i + 0.5) / nodes);
            }
            double coefficient = sum * (k == 0 ? 1.0 : 2.0) / nodes;
            DoubleDouble[] t = k == 0 ? before : here;
            for (int j = 0; j <= k; j++) {
                powers[j] = powers[j].plus(t[j].times(coefficient));
            }
            if (k > 0) {
                // T_{k+1}(2u − 1) = 2 (2u − 1) T_k − T_{k−1}
                DoubleDouble[] next = new DoubleDouble[nodes + 1];
                for (int j = 0; j <= nodes; j++) {
                    DoubleDouble value = here[j].times(-2).minus(before[j]);
                    next[j] = j > 0 ? value.plus(here[j - 1].times(4)) : value;
                }
                before = here;
                here = next;
            }
        }
        double[] fit = new double[nodes];
        double scale = 1;
        for (int j = 0; j < nodes; j++) {
            fit[j] = powers[j].value() * scale;
            scale /= length;
        }
        double worst = 0;
        for (int i = 0; i <= 2 * nodes; i++) {
            double s =
                    length * (1 - Math.cos(Math.PI * Math.max(1e-4, Math.min(2 * nodes - 1e-4, i)) / (2 * nodes))) / 2;
            double value = 0;
            for (int j = DEGREE; j >= 0; j--) {
                value = value * s + fit[j];
            }
            worst = Math.max(worst, Math.abs(value - term.factor(Math.max(first, Math.min(last, time + s)))));
        }
        off[index] = SAFETY * worst + 4 * Math.ulp(most);
        missed[index] = 4 * most * inside;
        return fit;
    }

    private boolean touchesBreak(double time, double length) {
        for (double at : breaks) {
            if (Math.min(Math.abs(at - time), Math.abs(at - time - length)) <= BREAK * Math.ulp(at)) {
                return true;
            }
        }
        return false;
    }

    /** T_0 or T_1 of 2u − 1 in powers of u. */
    private static DoubleDouble[] shifted(int k) {
        DoubleDouble[] t = new DoubleDouble[DEGREE + 2];
        Arrays.fill(t, DoubleDouble.ZERO);
        t[0] = k == 0 ? DoubleDouble.ONE : DoubleDouble.of(-1);
        if (k == 1) {
            t[1] = DoubleDouble.of(2);
        }
        return t;
    }

    @Override
    public double off(Equation equation, double length) {
        return off(equation, length, DoubleDouble.ZERO, DoubleDouble.ZERO);
    }

    /** The same for operators displaced by α. */
    double off(Equation equation, double length, DoubleDouble re, DoubleDouble im) {
        if (off.length == 0) {
            return 0;
        }
        boolean displaced = re.hi() != 0 || im.hi() != 0;
        if (displaced || sizedFirst != equation.first || sizedLevels != equation.levels) {
            sizedFirst = equation.first;
            sizedLevels = equation.levels;
            for (int i = 0; i < sizes.length; i++) {
                sizes[i] = Bands.of(
                                hamiltonian.terms().get(i).operator().shifted(re, im),
                                1,
                                equation.first,
                                equation.levels,
                                0)
                        .norm();
            }
        }
        return length * weighted(off, equation);
    }

    @Override
    public double atBreaks(Equation equation) {
        return weighted(missed, equation);
    }

    /** ‖[P, ρ]‖₁ ≤ 2 ‖P‖. */
    private double weighted(double[] errors, Equation equation) {
        double sum = 0;
        for (int i = 0; i < sizes.length; i++) {
            sum += errors[i] * sizes[i];
        }
        return (equation.rank() == 1 ? 1 : 2) * sum;
    }

    @Override
    public double nextBreak(double time) {
        for (double at : breaks) {
            // a break is where it is found within rounding: one as near as that is behind
            if (at - time > BREAK * Math.ulp(at)) {
                return at;
            }
        }
        return Double.POSITIVE_INFINITY;
    }

    @Override
    public void advance(double length) {
        // number states stand still
    }

    @Override
    public Certainty certainty() {
        return off.length == 0 ? Certainty.GUARANTEED : Certainty.ESTIMATED;
    }
}
