package ladderwell.window;

import java.util.function.IntConsumer;
import ladderwell.evidence.Bound;
import ladderwell.evidence.PhysicsException;
import ladderwell.quantity.Digits;

/** Follows one state: window and step by what the bound says. */
abstract sealed class Propagation permits SteadyPropagation, VaryingPropagation {
    /** One complex product and sum in a row, on a slow machine. */
    private static final double SECONDS_PER_ELEMENT = 2e-9;

    private static final double LONGEST = 3600;

    private static final int LEAST_LEVELS = 8;

    final boolean pure;
    final Budget budget;
    private final double allowedBytes;

    Equation equation;
    Plane state;
    private Plane reached;

    double time;
    /** Time since the step began, at an instant inside it; 0 once the step is kept. */
    double since;

    long steps;
    long redone;
    long applications;
    private int mostLevels;

    /** @param start state on its own window, tidy */
    Propagation(boolean pure, Equation start, Plane state, Budget budget, double allowedBytes) {
        this.pure = pure;
        this.allowedBytes = allowedBytes;
        this.budget = budget;
        equation = start;
        this.state = state;
        reached = state;
    }

    /** The longest step from here. */
    abstract double longestStep();

    /** Takes a step to the last of some times, counted from here; false if it must be made again with what was changed. */
    abstract boolean attempt(double[] times);

    /** The state at one of the times of the last attempt. */
    abstract Plane at(int i);

    /** What the last attempt pushed out on a side. */
    abstract double leaked(boolean below);

    /** The step was kept. */
    abstract void kept(double length);

    /** The equation on another window. */
    abstract Equation on(long first, int levels);

    /** Planes that an attempt needs at once. */
    abstract int planes();

    /** An equation on a window, to hold a state that is put in. */
    static Equation plain(Generator generator, boolean pure, long first, int levels) {
        return pure
                ? new VectorEquation(generator, first, levels, 1, 0)
                : new DensityEquation(generator, first, levels, 1, 0);
    }

    /** Another window, the state moved into it. */
    final void resize(long first, int levels) {
        double side = levels + 4.0 * equation.reach;
        double bytes = 16.0 * planes() * (pure ? side : side * side);
        if (bytes > allowedBytes) {
            throw new PhysicsException.TooLarge(
                    "a state that has spread over " + levels + " levels at time " + Digits.significant(time, 3),
                    bytes,
                    allowedBytes,
                    "ask for a shorter time, fewer quanta or a looser tolerance");
        }
        Equation next = on(first, Math.max(LEAST_LEVELS, levels));
        Plane moved = next.plane();
        equation.moveTo(state, next, moved);
        equation = next;
        state = moved;
        mostLevels = Math.max(mostLevels, levels);
    }

    /** Takes a state on another window that was made elsewhere. */
    final void take(Equation there, Plane theirs, int levels) {
        equation = there;
        state = theirs;
        resize(there.first, levels);
        reached = state;
    }

    final double allowedBytes() {
        return allowedBytes;
    }

    /** Refuses what would take hours: frequencies this large for the time that is left. */
    final void checkWork(int levels, double rate, int bands, int jumps) {
        double elements = pure ? (double) levels * bands : levels * (levels / 2.0) * (2 * bands + jumps);
        double seconds = 1.5 * rate * budget.timeLeft(time) * elements * SECONDS_PER_ELEMENT;
        if (seconds > LONGEST) {
            throw new PhysicsException.TooLong(
                    "a state on " + levels + " levels with frequencies up to " + Digits.significant(rate, 2)
                            + " (it reached time " + Digits.significant(time, 3) + ")",
                    seconds,
                    "ask for a shorter time, fewer quanta or a looser tolerance");
        }
    }

    /**
     * Goes on to the last of some times.
     *
     * @param ahead ascending times from {@link #time} on
     * @param seen takes the index of a time that was reached
     */
    final void go(double[] ahead, IntConsumer seen) {
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
            if (!attempt(times)) {
                continue;
            }
            double began = time;
            for (int i = 0; i < count - 1; i++) {
                reached = at(i);
                time = began + times[i];
                since = times[i];
                seen.accept(next + i);
            }
            time = atLast ? ahead[ahead.length - 1] : began + times[count - 1];
            state.copyFrom(at(count - 1));
            reached = state;
            since = 0;
            kept(times[count - 1]);
            steps++;
            next = inside;
            if (atLast) {
                seen.accept(next++);
            }
            budget.spread(time);
            shrink(times[count - 1]);
        }
    }

    /** Books a step that holds its share of the border; else grows the window and says no. */
    final boolean book(double length, double series, double rounding) {
        double share = budget.forBorder(length);
        double below = leaked(true);
        double above = leaked(false);
        if (below + above > share) {
            redone++;
            long down = below > 0.4 * share ? Math.min(more(below, share), equation.first) : 0;
            int up = above > 0.4 * share ? more(above, share) : 0;
            resize(equation.first - down, (int) (equation.levels + down + up));
            return false;
        }
        budget.series(series);
        budget.border(below + above);
        budget.rounding(rounding);
        if (budget.spent() > budget.tolerance()) {
            throw new PhysicsException.NotConverged(
                    "the state at time " + Digits.significant(time, 3) + " (rounding and the start set this floor)",
                    steps,
                    budget.spent(),
                    budget.tolerance());
        }
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
        if (leaked(false) < quiet) {
            double edge = equation.edge(state, false, count);
            if (edge < budget.forDrop(length)) {
                budget.dropped(edge);
                up = count;
            }
        }
        if (first + count < first + levels - up && leaked(true) < quiet) {
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

    /** The state at the time just seen. */
    final WindowState seen(Bound error) {
        return state(pure, equation, reached, error);
    }

    /** A copy of what a plane holds. */
    static WindowState state(boolean pure, Equation equation, Plane reached, Bound error) {
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

    final long steps() {
        return steps;
    }

    final long redone() {
        return redone;
    }

    final long applications() {
        return applications;
    }

    final int mostLevels() {
        return mostLevels;
    }
}
