package ladderwell.window;

import java.util.Arrays;
import java.util.List;
import ladderwell.numeric.Interruption;
import ladderwell.numeric.LegendreRule;

/**
 * One step of an equation whose generator is a polynomial in time: y(s) = Σ_{k≤m} C_k s^k with C_{k+1} = P Σ_j L_j C_{k−j}/(k+1). Its defect in the window
 * is s^m times the first coefficient left out, which is computed, and higher ones, which are bounded by norms; the border is a polynomial
 * in s whose square Gauss' rule integrates exactly. Coefficients do not depend on the length of the step, which is found from the bound.
 */
final class TaylorStep {
    /** Order m; the border's square has degree 2m, exact with m + 1 nodes. */
    static final int ORDER = 23;

    private static final double[][] RULE = LegendreRule.of(ORDER + 1);

    private Equation equation;
    private final Plane[] c = new Plane[ORDER + 1];
    private final Plane out;
    private Plane[] sums = {};
    private final double[][] edgeRe;
    private final double[][] edgeIm;
    private final double[] sizes = new double[ORDER + 1];
    private final double[] roundings = new double[ORDER + 1];
    private double omitted;
    private int orders;

    TaylorStep(Equation equation) {
        this.equation = equation;
        for (int k = 0; k <= ORDER; k++) {
            c[k] = equation.plane();
        }
        out = equation.plane();
        List<Equation.Outside> outside = equation.outside();
        int size = outside.get(outside.size() - 1).to();
        edgeRe = new double[ORDER + 1][size];
        edgeIm = new double[ORDER + 1][size];
    }

    /** The same arrays for another equation of the same shape; new ones for another shape. */
    TaylorStep on(Equation next) {
        if (next.first == equation.first && next.levels == equation.levels && next.reach == equation.reach) {
            equation = next;
            return this;
        }
        return new TaylorStep(next);
    }

    /**
     * Computes the coefficients.
     *
     * @param start y(0), kept
     * @param most highest order of the generator that is used; those above are booked
     */
    void prepare(Plane start, int most) {
        orders = Math.min(most, equation.norms.length - 1);
        c[0].copyFrom(start);
        for (int k = 0; k <= ORDER; k++) {
            Interruption.check();
            sizes[k] = equation.size(c[k]);
            double off = equation.rounding();
            for (int j = 1; j <= Math.min(k, orders); j++) {
                off += equation.roundings() * equation.norms[j] * sizes[k - j];
            }
            roundings[k] = off;
            out.clear();
            equation.apply(c, k, orders, out);
            equation.takeOutside(out, edgeRe[k], edgeIm[k]);
            equation.tidy(out);
            if (k < ORDER) {
                c[k + 1].copyFrom(out);
                equation.scale(c[k + 1], 1.0 / (k + 1), 0);
                equation.tidy(c[k + 1]);
            } else {
                omitted = equation.size(out);
            }
        }
    }

    /** Bound of what the series of length h leaves out, orders of the generator that were not used included. */
    double series(double h) {
        double sum = Math.pow(h, ORDER + 1.0) / (ORDER + 1) * omitted;
        for (int j = 1; j < equation.norms.length; j++) {
            if (equation.norms[j] == 0) {
                continue;
            }
            int first = j > orders ? 0 : Math.max(ORDER + 1 - j, 0);
            double part = 0;
            for (int k = first; k <= ORDER; k++) {
                part += Math.pow(h, k + j + 1.0) / (k + j + 1) * sizes[k];
            }
            sum += equation.norms[j] * part;
        }
        return wide() * sum;
    }

    /** What stands beyond the window counts too. */
    private double wide() {
        double rank = equation.rank();
        return rank == 1 ? 1 : Math.sqrt(rank * rank + 2 * equation.reach);
    }

    /** Bounds of what sticks out in a step of length h, integrated: below the window, and above it. */
    void border(double h, double[] belowAndAbove) {
        belowAndAbove[0] = 0;
        belowAndAbove[1] = 0;
        for (Equation.Outside stretch : equation.outside()) {
            double integral = 0;
            for (int i = 0; i <= ORDER; i++) {
                double s = h * (RULE[0][i] + 1) / 2;
                double squares = 0;
                for (int e = stretch.from(); e < stretch.to(); e++) {
                    double re = 0;
                    double im = 0;
                    for (int k = ORDER; k >= 0; k--) {
                        re = re * s + edgeRe[k][e];
                        im = im * s + edgeIm[k][e];
                    }
                    squares += re * re + im * im;
                }
                integral += RULE[1][i] * h / 2 * squares;
            }
            // Cauchy and Schwarz in time
            belowAndAbove[stretch.below() ? 0 : 1] += stretch.weight() * Math.sqrt(h * integral);
        }
    }

    /** Bound of the roundings in a step of length h: those of the coefficients act as forces, those of the sum as a jump. */
    double rounding(double h) {
        double forces = 0;
        double jump = 0;
        double power = 1;
        for (int k = 0; k <= ORDER; k++) {
            jump += power * sizes[k];
            power *= h;
            forces += power / (k + 1) * roundings[k];
        }
        return equation.rank() * (forces + 4 * Equation.U * (ORDER + 2) * jump);
    }

    /** Puts y at some times into planes that hold until the next time. */
    void at(double[] times) {
        if (sums.length < times.length) {
            int had = sums.length;
            sums = Arrays.copyOf(sums, times.length);
            for (int i = had; i < times.length; i++) {
                sums[i] = equation.plane();
            }
        }
        for (int i = 0; i < times.length; i++) {
            Plane sum = sums[i];
            sum.clear();
            double power = 1;
            for (int k = 0; k <= ORDER; k++) {
                equation.accumulate(c[k], power, sum);
                power *= times[i];
            }
            equation.tidy(sum);
        }
    }

    Plane at(int i) {
        return sums[i];
    }
}
