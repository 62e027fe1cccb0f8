package ladderwell.window;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import ladderwell.evidence.Bound;
import ladderwell.evidence.Certainty;
import ladderwell.numeric.DoubleDouble;
import ladderwell.operator.LadderPolynomial;
import ladderwell.operator.OperatorFormula;
import ladderwell.state.Amplitudes;
import ladderwell.state.DensityOperator;

/** A state of one mode at some times, each with its guaranteed error. Immutable. */
public final class WindowMotion {
    private final double[] times;
    private final List<WindowState> states;
    private final List<DoubleDouble[]> displacements;
    private final List<Squeeze> squeezes;
    private final Work work;
    private final double allowedBytes;
    private final Map<Integer, WindowState> plain = new HashMap<>();

    /** Levels that a frame starts with. */
    private static final int FRAME_LEVELS = 8;

    /**
     * What it took.
     *
     * @param steps steps kept
     * @param redone steps made again, with a larger window or a wider spectrum
     * @param applications applications of the generator
     * @param mostLevels largest window
     */
    public record Work(long steps, long redone, long applications, int mostLevels) {}

    private WindowMotion(
            double[] times,
            List<WindowState> states,
            List<DoubleDouble[]> displacements,
            List<Squeeze> squeezes,
            Work work,
            double allowedBytes) {
        this.times = times;
        this.states = List.copyOf(states);
        this.displacements = List.copyOf(displacements);
        this.squeezes = List.copyOf(squeezes);
        this.work = work;
        this.allowedBytes = allowedBytes;
    }

    /**
     * A coherent state, followed in a frame displaced along its mean-field path: what is carried is the fluctuation about α(t), however many quanta α
     * stands for.
     *
     * @param hamiltonian H/ħ, Hermitian
     * @param jumps √γ L each; a vector is carried where there are none
     * @param alphaRe real part of α at time 0
     * @param alphaIm imaginary part of α at time 0
     * @param times 0 or more, ascending
     * @param tolerance largest error of the vector, or of the density operator in trace norm
     * @param mostLevels the frame is given up where the fluctuation needs more levels
     * @param allowedBytes memory allowed
     * @return empty if the fluctuation outgrew the frame
     */
    public static Optional<WindowMotion> framed(
            OperatorFormula hamiltonian,
            List<LadderPolynomial> jumps,
            double alphaRe,
            double alphaIm,
            double[] times,
            double tolerance,
            int mostLevels,
            double allowedBytes) {
        boolean pure = jumps.isEmpty();
        double end = checked(times);
        FormulaCourse formula = new FormulaCourse(hamiltonian, jumps, end);
        FrameCourse course = new FrameCourse(formula, jumps, alphaRe, alphaIm);
        Equation equation = Propagation.plain(Generator.constant(hamiltonian.at(0), jumps), pure, 0, FRAME_LEVELS);
        Plane plane = equation.plane();
        if (equation instanceof DensityEquation density) {
            double[] ground = new double[FRAME_LEVELS * (FRAME_LEVELS + 1) / 2];
            ground[0] = 1;
            density.load(ground, new double[ground.length], plane);
        } else {
            plane.re[equation.margin()] = 1;
        }
        Budget budget = new Budget(tolerance, 0, end);
        VaryingPropagation propagation = new VaryingPropagation(course, pure, equation, plane, budget, allowedBytes);
        propagation.allow(mostLevels);
        List<WindowState> states = new ArrayList<>();
        List<DoubleDouble[]> displacements = new ArrayList<>();
        List<Squeeze> squeezes = new ArrayList<>();
        try {
            propagation.go(times, j -> {
                states.add(propagation.seen(new Bound(course.certainty(), budget.spent())));
                displacements.add(propagation.displacement());
                squeezes.add(propagation.squeezing());
            });
        } catch (VaryingPropagation.LeftFrame left) {
            return Optional.empty();
        }
        return Optional.of(
                new WindowMotion(times.clone(), states, displacements, squeezes, work(propagation), allowedBytes));
    }

    private static Work work(Propagation propagation) {
        return new Work(
                propagation.steps(), propagation.redone(), propagation.applications(), propagation.mostLevels());
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
        return new WindowMotion(times.clone(), states, List.of(), List.of(), work(propagation), allowedBytes);
    }

    /** Number of times. */
    public int size() {
        return times.length;
    }

    /** The j-th time. */
    public double time(int j) {
        return times[j];
    }

    /** The state at the j-th time; in a frame the fluctuation, see {@link #seen}. */
    public WindowState state(int j) {
        return states.get(j);
    }

    /** Whether states are fluctuations about a displacement. */
    public boolean framed() {
        return !displacements.isEmpty();
    }

    /** An operator as the j-th state has it: {@link #state} is what its mean is taken with. */
    public LadderPolynomial seen(int j, LadderPolynomial operator) {
        return framed() ? fluctuation(j, operator.shifted(displacementRe(j), displacementIm(j))) : operator;
    }

    /** An operator of the fluctuation about the displacement as the j-th state has it. */
    public LadderPolynomial fluctuation(int j, LadderPolynomial operator) {
        return framed() ? squeezes.get(j).seen(operator) : operator;
    }

    /**
     * σ of D(α) σ D(α)† at the j-th time, the frame's squeezing taken out again; the state itself without a frame. Its error counts what that
     * takes.
     */
    public WindowState displaced(int j) {
        if (!framed() || squeezes.get(j).isNone()) {
            return state(j);
        }
        synchronized (plain) {
            return plain.computeIfAbsent(j, i -> squeezes.get(i).takenOut(state(i), allowedBytes));
        }
    }

    /** Real part of α: the j-th state is D(α) σ D(α)† with σ given by {@link #displaced}; 0 without a frame. */
    public DoubleDouble displacementRe(int j) {
        return framed() ? displacements.get(j)[0] : DoubleDouble.ZERO;
    }

    /** Imaginary part of α; see {@link #displacementRe}. */
    public DoubleDouble displacementIm(int j) {
        return framed() ? displacements.get(j)[1] : DoubleDouble.ZERO;
    }

    /** What it took. */
    public Work work() {
        return work;
    }
}
