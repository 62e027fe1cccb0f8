package ladderwell.window;

import java.util.function.IntConsumer;
import ladderwell.evidence.Bound;
import ladderwell.evidence.PhysicsException;
import ladderwell.operator.LadderPolynomial;
import ladderwell.quantity.Digits;

/** Follows one state under a constant equation: window and step by what the bound says. */
final class Propagation {
    /** R h of one step: vectors are happy with long steps; the terms of a damped series grow along the damping and lose digits. */
    private static final double VECTOR_STEP = 100;

    private static final double DENSITY_STEP = 24;
    private static final double DAMPED_STEP = 1.3;

    /** One complex product and sum in a row, on a slow machine. */
    private static final double SECONDS_PER_ELEMENT = 2e-9;

    private static final double LONGEST = 3600;

    private static final int LEAST_LEVELS = 8;

    /** Where rounding would take more than this share of the tolerance, steps are halved: the terms of the series stay smaller. */
    private static final double ROUNDED = 0.2;

    /** A series that grew is made again with R larger by this. */
    private static final double WIDEN = 1.4;

    private final Generator generator;
    private final boolean pure;
    private final double allowedBytes;
    private final Budget budget;

    private Equation equation;
    private ChebyshevStep stepper;
    private Plane state;
    private Plane reached;
    private Spectrum spectrum;
    private double rate;
    private double widened = 1;

    private double time;
    private long steps;
    private long redone;
    private long applications;
    private int mostLevels;

    /** @param start state on its own window, tidy */
    Propagation(Generator generator, boolean pure, Equation start, Plane state, Budget budget, double allowedBytes) {
        this.generator = generator;
        this.pure = pure;
        this.allowedBytes = allowedBytes;
        this.budget = budget;
        equation = start;
        this.state = state;
        reached = state;
        spectrum = new Spectrum(0, 0, 0);
        stepper = new ChebyshevStep(start, 1);
        resize(start.first, Math.max(LEAST_LEVELS, start.levels));
    }

    /** An equation on a window, to hold a state that is put in. */
    static Equation plain(Generator generator, boolean pure, long first, int levels) {
        return pure
                ? new VectorEquation(generator, first, levels, 1, 0)
                : new DensityEquation(generator, first, levels, 1, 0);
    }

    /** Another window, the state moved into it. */
    private void resize(long first, int levels) {
        double side = levels + 4.0 * generator.reach();
        double bytes = 16 * 6 * (pure ? side : side * side);
        if (bytes > allowedBytes) {
            throw new PhysicsException.TooLarge(
                    "a state that has spread over " + levels + " levels at time " + time,
                    bytes,
                    allowedBytes,
                    "ask for a shorter time, fewer quanta or a looser tolerance");
        }
        LadderPolynomial drift = generator.drift().get(0);
        spectrum = Spectrum.of(drift, first, levels);
        double width = pure ? spectrum.width() / 2 : spectrum.width();
        rate = widened * Math.max(Math.max(width, -spectrum.damping()), Double.MIN_NORMAL / Equation.U);
        checkWork(levels);
        Equation next = pure
                ? new VectorEquation(generator, first, levels, 2 / rate, turning())
                : new DensityEquation(generator, first, levels, 2 / rate, damping());
        Plane moved = next.plane();
        equation.moveTo(state, next, moved);
        equation = next;
        state = moved;
        stepper = new ChebyshevStep(equation, rate);
        mostLevels = Math.max(mostLevels, levels);
    }

    /** Refuses what would take hours: a spectrum this wide for the time that is left. */
    private void checkWork(int levels) {
        double bands = 2.0 * generator.reach() + 1;
        double elements = pure
                ? levels * bands
                : levels * (levels / 2.0) * (2 * bands + generator.jumps().size());
        double seconds = 1.5 * rate * budget.timeLeft(time) * elements * SECONDS_PER_ELEMENT;
        if (seconds > LONGEST) {
            throw new PhysicsException.TooLong(
                    "a state on " + levels + " levels with frequencies up to " + Digits.significant(rate, 2)
                            + " (it reached time " + Digits.significant(time, 3) + ")",
                    seconds,
                    "ask for a shorter time, fewer quanta or a looser tolerance");
        }
    }

    /** c, real part. */
    private double damping() {
        return pure ? 0 : spectrum.damping() / 2;
    }

    /** c, imaginary part: K = −iE turns by −E. */
    private double turning() {
        return pure ? -spectrum.centre() : 0;
    }

    private double longestStep() {
        if (pure) {
            return VECTOR_STEP / rate;
        }
        double share = budget.roundingToCome(time) > ROUNDED * budget.tolerance() ? 0.5 : 1;
        double byWidth = share * DENSITY_STEP / rate;
        return damping() < 0 ? Math.min(byWidth, share * DAMPED_STEP / -damping()) : byWidth;
    }

    /**
     * Goes on to the last of some times.
     *
     * @param ahead ascending times from {@link #time} on
     * @param seen takes the index of a time that was reached
     */
    void go(double[] ahead, IntConsumer seen) {
        int next = 0;
        reached = state;
        while (next < ahead.length && ahead[next] <= time) {
            seen.accept(next++);
        }
        while (next < ahead.length) {
            double left = ahead[ahead.length - 1] - time;
            double length = left / Math.ceil(left / longestStep() * (1 - 1e-12));
            int inside = next;
            while (inside < ahead.length - 1 && ahead[inside] < time + length * (1 - 1e-12)) {
                inside++;
            }
            // ends at an asked time where one is near
            boolean atLast = inside == ahead.length - 1 && left <= length * (1 + 1e-9);
            int count = inside - next + 1;
            double[] times = new double[count];
            for (int i = 0; i < count - 1; i++) {
                times[i] = ahead[next + i] - time;
            }
            // the length that the rounded times are apart, so that no rounding of times adds up
            times[count - 1] = atLast ? left : time + length - time;
            if (!step(times)) {
                continue;
            }
            double began = time;
            for (int i = 0; i < count - 1; i++) {
                reached = stepper.at(i);
                time = began + times[i];
                seen.accept(next + i);
            }
            time = atLast ? ahead[ahead.length - 1] : began + times[count - 1];
            state.copyFrom(stepper.at(count - 1));
            reached = state;
            next = inside;
            if (atLast) {
                seen.accept(next++);
            }
            budget.spread(time);
            shrink(times[count - 1]);
        }
    }

    /** True if the step holds its share. */
    private boolean step(double[] times) {
        double length = times[times.length - 1];
        stepper.take(state, times, damping(), turning(), budget.forSeries(length));
        applications += stepper.applications();
        if (stepper.grown()) {
            widened *= WIDEN;
            redone++;
            resize(equation.first, equation.levels);
            return false;
        }
        double share = budget.forBorder(length);
        double below = stepper.edge(true);
        double above = stepper.edge(false);
        if (below + above > share) {
            redone++;
            long down = below > 0.4 * share ? Math.min(more(below, share), equation.first) : 0;
            int up = above > 0.4 * share ? more(above, share) : 0;
            resize(equation.first - down, (int) (equation.levels + down + up));
            return false;
        }
        budget.series(stepper.defect());
        budget.border(below + above);
        budget.rounding(stepper.rounding());
        if (budget.spent() > budget.tolerance()) {
            throw new PhysicsException.NotConverged(
                    "the state at time " + time + " (rounding and the start set this floor)",
                    steps,
                    budget.spent(),
                    budget.tolerance());
        }
        steps++;
        return true;
    }

    /** Levels to add on a side that leaks: more where it leaks by orders of magnitude. */
    private int more(double leak, double share) {
        double tens = Math.log10(leak / share);
        return (int) Math.max(2, equation.levels * Math.min(0.5, (1 + tens / 4) / 8));
    }

    /** Drops levels at the edges that hold next to nothing. */
    private void shrink(double length) {
        long first = equation.first;
        int levels = equation.levels;
        double quiet = 0.002 * budget.forBorder(length);
        int count = Math.max(1, levels / 16);
        int down = 0;
        int up = 0;
        if (levels < LEAST_LEVELS + 4) {
            return;
        }
        if (stepper.edge(false) < quiet) {
            double edge = equation.edge(state, false, count);
            if (edge < budget.forDrop(length)) {
                budget.dropped(edge);
                up = count;
            }
        }
        if (first + count < first + levels - up && stepper.edge(true) < quiet) {
            double edge = equation.edge(state, true, count);
            if (edge < budget.forDrop(length)) {
                budget.dropped(edge);
                down = count;
            }
        }
        if (up > 0 || down > 0) {
            resize(first + down, levels - up - down);
        }
    }

    double time() {
        return time;
    }

    /** The state at the time just seen. */
    WindowState seen(Bound error) {
        if (pure) {
            double[] re = new double[equation.levels];
            double[] im = new double[equation.levels];
            System.arraycopy(reached.re, equation.margin(), re, 0, re.length);
            System.arraycopy(reached.im, equation.margin(), im, 0, im.length);
            return new PureWindow(equation.first, re, im, error);
        }
        DensityEquation density = (DensityEquation) equation;
        int levels = density.levels;
        double[] re = new double[levels * (levels + 1) / 2];
        double[] im = new double[re.length];
        density.unload(reached, re, im);
        return new MixedWindow(density.first, levels, re, im, error);
    }

    long steps() {
        return steps;
    }

    long redone() {
        return redone;
    }

    long applications() {
        return applications;
    }

    int mostLevels() {
        return mostLevels;
    }
}
