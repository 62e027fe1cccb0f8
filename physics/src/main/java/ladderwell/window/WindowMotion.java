package ladderwell.window;

import java.util.ArrayList;
import java.util.List;
import ladderwell.evidence.Bound;
import ladderwell.evidence.Certainty;
import ladderwell.operator.LadderPolynomial;
import ladderwell.operator.OperatorFormula;
import ladderwell.state.Amplitudes;
import ladderwell.state.DensityOperator;

/** A state of one mode at some times, each with its guaranteed error. Immutable. */
public final class WindowMotion {
    private final double[] times;
    private final List<WindowState> states;
    private final Work work;

    /**
     * What it took.
     *
     * @param steps steps kept
     * @param redone steps made again, with a larger window or a wider spectrum
     * @param applications applications of the generator
     * @param mostLevels largest window
     */
    public record Work(long steps, long redone, long applications, int mostLevels) {}

    private WindowMotion(double[] times, List<WindowState> states, Work work) {
        this.times = times;
        this.states = List.copyOf(states);
        this.work = work;
    }

    /**
     * A pure state under a Hamiltonian: by a Chebyshev series in steps where it does not vary, else by a Taylor series.
     *
     * @param hamiltonian H/ħ, Hermitian
     * @param start ψ(0); its error counts
     * @param times 0 or more, ascending
     * @param tolerance largest ‖ψ − ψ̃‖ allowed at any of the times
     * @param allowedBytes memory allowed
     */
    public static WindowMotion pure(
            OperatorFormula hamiltonian, Amplitudes start, double[] times, double tolerance, double allowedBytes) {
        int last = start.segments() - 1;
        long first = start.first(0);
        int levels = (int) (start.first(last) + start.length(last) - first);
        Generator generator = Generator.constant(hamiltonian.at(0), List.of());
        Equation equation = Propagation.plain(generator, true, first, levels);
        Plane plane = equation.plane();
        for (int s = 0; s <= last; s++) {
            int at = (int) (start.first(s) - first) + equation.margin();
            System.arraycopy(start.reals(s), 0, plane.re, at, start.length(s));
            System.arraycopy(start.imaginaries(s), 0, plane.im, at, start.length(s));
        }
        double end = checked(times);
        Budget budget = new Budget(tolerance, start.normError(), end);
        return run(hamiltonian, List.of(), true, equation, plane, budget, times, allowedBytes);
    }

    /**
     * A density operator under a Hamiltonian and jumps: by a Chebyshev series in steps where nothing varies, else by a Taylor series.
     *
     * @param hamiltonian H/ħ, Hermitian
     * @param jumps √γ L each
     * @param start ρ(0); its error counts
     * @param times 0 or more, ascending
     * @param tolerance largest ‖ρ − ρ̃‖₁ allowed at any of the times
     * @param allowedBytes memory allowed
     */
    public static WindowMotion mixed(
            OperatorFormula hamiltonian,
            List<LadderPolynomial> jumps,
            DensityOperator start,
            double[] times,
            double tolerance,
            double allowedBytes) {
        Generator generator = Generator.constant(hamiltonian.at(0), jumps);
        DensityEquation equation = (DensityEquation) Propagation.plain(generator, false, start.first(), start.size());
        Plane plane = equation.plane();
        equation.load(start.lowerRe(), start.lowerIm(), plane);
        double end = checked(times);
        Budget budget = new Budget(tolerance, start.traceNormError(), end);
        return run(hamiltonian, jumps, false, equation, plane, budget, times, allowedBytes);
    }

    /** The last time, once all are found in order. */
    private static double checked(double[] times) {
        double before = 0;
        for (double t : times) {
            if (!(t >= before) || Double.isInfinite(t)) {
                throw new IllegalArgumentException(
                        "times must be finite, 0 or more and ascending, got " + t + " after " + before);
            }
            before = t;
        }
        return Math.max(before, Double.MIN_NORMAL);
    }

    private static WindowMotion run(
            OperatorFormula hamiltonian,
            List<LadderPolynomial> jumps,
            boolean pure,
            Equation equation,
            Plane plane,
            Budget budget,
            double[] times,
            double allowedBytes) {
        Certainty certainty = Certainty.GUARANTEED;
        Propagation propagation;
        if (hamiltonian.dependsOnTime()) {
            Course course = new FormulaCourse(hamiltonian, jumps, budget.timeLeft(0));
            certainty = course.certainty();
            propagation = new VaryingPropagation(course, pure, equation, plane, budget, allowedBytes);
        } else {
            Generator generator = Generator.constant(hamiltonian.constant(), jumps);
            propagation = new SteadyPropagation(generator, pure, equation, plane, budget, allowedBytes);
        }
        Certainty kind = certainty;
        List<WindowState> states = new ArrayList<>();
        propagation.go(times, j -> states.add(propagation.seen(new Bound(kind, budget.spent()))));
        return new WindowMotion(
                times.clone(),
                states,
                new Work(
                        propagation.steps(),
                        propagation.redone(),
                        propagation.applications(),
                        propagation.mostLevels()));
    }

    /** Number of times. */
    public int size() {
        return times.length;
    }

    /** The j-th time. */
    public double time(int j) {
        return times[j];
    }

    /** The state at the j-th time. */
    public WindowState state(int j) {
        return states.get(j);
    }

    /** What it took. */
    public Work work() {
        return work;
    }
}
