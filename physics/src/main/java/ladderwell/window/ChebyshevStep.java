package ladderwell.window;

import java.util.Arrays;
import ladderwell.numeric.Interruption;

/**
 * One step of a constant equation: y(s) = e^{cs} Σ a_k(R s) P_k, a_0 = J_0, a_k = 2 J_k, with P_0 = y(0), P_1 = Y P_0, P_{k+1} = 2 Y P_k + P_{k−1} and
 * Y = (L − c)/R projected on the window. Its defect inside the window is exactly −R e^{cs} (J_{m+1} P_m + J_m P_{m+1}); R and c change the speed, never
 * the validity.
 *
 * @source Tal-Ezer and Kosloff, J. Chem. Phys. 81 (1984) 3967 for the series; its defect follows from 2 J_k' = J_{k−1} − J_{k+1}
 */
final class ChebyshevStep {
    /** P_k that grow beyond this times the start say that R is too small. */
    private static final double GROWN = 200;

    private final Equation equation;
    private final double rate;
    private final Plane[] recent = new Plane[3];
    private final Plane[] input = new Plane[1];
    private Plane[] sums = {};
    private final double[] sides = new double[2];
    private final double[] edges = new double[2];

    private double defect;
    private double rounding;
    private int applications;
    private boolean grown;

    /** @param equation 2 (L − c)/R */
    ChebyshevStep(Equation equation, double rate) {
        this.equation = equation;
        this.rate = rate;
        for (int i = 0; i < 3; i++) {
            recent[i] = equation.plane();
        }
    }

    /**
     * Takes a step to the last of some times.
     *
     * @param start y(0), kept
     * @param times ascending, above 0
     * @param damping c, real part, at most 0
     * @param turning imaginary part of c
     * @param allowed defect allowed
     */
    void take(Plane start, double[] times, double damping, double turning, double allowed) {
        double end = times[times.length - 1];
        BesselNumbers[] bessel = new BesselNumbers[times.length];
        for (int i = 0; i < times.length; i++) {
            bessel[i] = new BesselNumbers(rate * times[i]);
        }
        BesselNumbers last = bessel[times.length - 1];
        double z = rate * end;
        room(times.length);
        double rank = equation.rank();
        Plane before = recent[0];
        Plane here = recent[1];
        Plane next = recent[2];
        equation.copy(start, before);
        here.clear();
        double startSize = equation.size(before);
        double rounded = equation.rounding();
        edges[0] = 0;
        edges[1] = 0;
        applications = 0;
        grown = false;
        double lostDigits = 0;
        // P_1 = Y P_0
        apply(before, here);
        equation.border(here, sides);
        add(0.5 * last.weight(0));
        equation.tidy(here);
        equation.scale(here, 0.5, 0);
        equation.tidy(here);
        double size = equation.size(here);
        double error = rounded;
        rounded = equation.rounding();
        lostDigits += last.weight(0) * (0.5 * error + Equation.U * size);
        double sizes = startSize + size;
        double squares = startSize * startSize / 2 + size * size;
        for (int i = 0; i < times.length; i++) {
            equation.accumulate(before, bessel[i].value(0), sums[i]);
            equation.accumulate(here, 2 * bessel[i].value(1), sums[i]);
        }
        double sizeBefore = startSize;
        int k = 1;
        while (true) {
            equation.copy(before, next);
            apply(here, next);
            error = rounded;
            equation.border(next, sides);
            add(last.weight(k));
            equation.tidy(next);
            double nextSize = equation.size(next);
            rounded = equation.rounding();
            lostDigits += last.weight(k) * (error + Equation.U * (sizeBefore + nextSize));
            // the sum up to k leaves J_{k+1} P_k + J_k P_{k+1}
            if (k > z) {
                defect = rank * (size * last.integral(k + 1) + nextSize * last.integral(k));
                if (defect <= allowed || k + 3 >= last.count()) {
                    break;
                }
            }
            if (!(nextSize <= GROWN * startSize)) {
                grown = true;
                break;
            }
            for (int i = 0; i < times.length; i++) {
                double weight = 2 * bessel[i].value(k + 1);
                if (Math.abs(weight) > 1e-40) {
                    equation.accumulate(next, weight, sums[i]);
                }
            }
            sizes += nextSize;
            squares += nextSize * nextSize;
            Plane free = before;
            before = here;
            here = next;
            next = free;
            sizeBefore = size;
            size = nextSize;
            k++;
        }
        // Roundings of the recurrence act as forces; those of the sums, of J_k and of the length as jumps at the end. Σ
        // J_k² + … = 1, so no
        // partial sum is larger than 2 (Σ ‖P_k‖²)^½.
        rounding = rank
                * (lostDigits
                        + 2 * Math.sqrt(squares) * Equation.U * (k + 8)
                        + 2 * z * Equation.U * startSize
                        + 2 * BesselNumbers.ERROR * sizes);
        for (int i = 0; i < times.length; i++) {
            double size0 = Math.exp(damping * times[i]);
            equation.scale(sums[i], size0 * Math.cos(turning * times[i]), size0 * Math.sin(turning * times[i]));
            equation.tidy(sums[i]);
        }
    }

    private void apply(Plane y, Plane out) {
        Interruption.check();
        input[0] = y;
        equation.apply(input, 0, 0, out);
        applications++;
    }

    /** The border of 2 (L − c)/R P_k, times ∫ |J_k| dz: 2/R and R dz/2 · 2 J_k cancel. */
    private void add(double weight) {
        edges[0] += weight * sides[0];
        edges[1] += weight * sides[1];
    }

    private void room(int times) {
        if (sums.length < times) {
            int had = sums.length;
            sums = Arrays.copyOf(sums, times);
            for (int i = had; i < times; i++) {
                sums[i] = equation.plane();
            }
        }
        for (int i = 0; i < times; i++) {
            sums[i].clear();
        }
    }

    /** y at one of the times; valid until the next step. */
    Plane at(int i) {
        return sums[i];
    }

    /** What the series leaves out, integrated. */
    double defect() {
        return defect;
    }

    /** What the motion pushes out below and above the window, integrated. */
    double edge(boolean below) {
        return edges[below ? 0 : 1];
    }

    /** Roundings. */
    double rounding() {
        return rounding;
    }

    int applications() {
        return applications;
    }

    /** True if the step must be made again with a larger R or a shorter time. */
    boolean grown() {
        return grown;
    }
}
