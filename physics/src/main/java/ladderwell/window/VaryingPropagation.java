package ladderwell.window;

import ladderwell.evidence.PhysicsException;
import ladderwell.numeric.DoubleDouble;
import ladderwell.quantity.Digits;

/** Under an equation that varies with time, or in a frame that moves, by a Taylor series in each step. */
final class VaryingPropagation extends Propagation {
    /** Of the share for the series, what the course and the orders left out may take. */
    private static final double COURSE = 0.3;

    private static final double SHORTEN = 0.9;
    /** Shortest step, as a share of the run. */
    private static final double SHORTEST = 1e-10;
    /** Share of the mean of the fluctuation by which the frame goes after it in a step. */
    private static final double PULL = 0.15;
    /** Squeezing r of the fluctuation from which on the frame takes it over. */
    private static final double WORTH = 0.12;
    /** Steps before it is tried again where it gained nothing. */
    private static final int WAIT = 2;

    /** Share of what is left of the tolerance that one such change may take. */
    private static final double SQUEEZING = 0.01;

    /** The fluctuation has outgrown what pays in a frame. */
    static final class LeftFrame extends RuntimeException {
        private static final long serialVersionUID = 1L;
    }

    private final Course course;
    private int mostAllowed = Integer.MAX_VALUE;
    private TaylorStep stepper;
    private final double[] sides = new double[2];
    private boolean ready;
    private double planned;
    private double longest;
    private double uncut;
    private int waits;

    VaryingPropagation(Course course, boolean pure, Equation start, Plane state, Budget budget, double allowedBytes) {
        super(pure, start, state, budget, allowedBytes);
        this.course = course;
        // a first guess, far too long: the first step finds its own
        planned = Math.min(budget.timeLeft(0), course.nextBreak(0)) / 16;
        stepper = new TaylorStep(start);
        resize(start.first, start.levels);
    }

    /** Gives up with {@link LeftFrame} when the window is larger than this. */
    void allow(int levels) {
        mostAllowed = levels;
    }

    /** Displacement of the frame at the instant just seen; empty for number windows. */
    DoubleDouble[] displacement() {
        return course instanceof FrameCourse frame ? frame.at(since) : new DoubleDouble[0];
    }

    /** Squeezing of the frame at the instant just seen. */
    Squeeze squeezing() {
        return course instanceof FrameCourse frame ? frame.squeeze() : Squeeze.NONE;
    }

    /** Takes squeezing of the fluctuation into the frame once it is worth it. */
    private void squeeze(FrameCourse frame, double[] mean) {
        double[] pair = equation.lowering(state, 2);
        double re = pair[0] - (mean[0] * mean[0] - mean[1] * mean[1]);
        double im = pair[1] - 2 * mean[0] * mean[1];
        double quanta = equation.quanta(state) - mean[0] * mean[0] - mean[1] * mean[1];
        double ratio = 2 * Math.hypot(re, im) / (2 * quanta + 1);
        if (!(ratio > 0 && ratio < 1)) {
            return;
        }
        // ⟨(a cosh r + a† e^{iφ} sinh r)²⟩ = 0
        double r = 0.5 * Math.log((1 + ratio) / (1 - ratio)) / 2;
        if (r < WORTH || waits-- > 0) {
            return;
        }
        double phi = Math.atan2(im, re) + Math.PI;
        double allowed = SQUEEZING * (budget.tolerance() - budget.spent());
        Squeeze.Changed changed;
        try {
            changed = Squeeze.turn(pure, equation, state, r, phi, allowed, allowedBytes());
        } catch (PhysicsException.NotConverged tooFine) {
            return; // the frame stays as it is
        }
        int before = needed(equation, state, allowed);
        int after = needed(changed.equation(), changed.state(), allowed);
        if (after >= before) {
            waits = WAIT; // a bent fluctuation gains nothing
            return;
        }
        Equation wide = changed.equation();
        budget.dropped(changed.spent() + wide.edge(changed.state(), false, Math.max(0, wide.levels - after)));
        frame.squeezed(r, phi);
        take(wide, changed.state(), after + equation.reach + Math.max(3, after / 5));
    }

    /** How many levels hold all but so much. */
    private static int needed(Equation equation, Plane state, double allowed) {
        int levels = equation.levels;
        int drop = 0;
        while (drop < levels - 2 && equation.edge(state, false, drop + 1) <= allowed) {
            drop++;
        }
        return levels - drop;
    }

    @Override
    Equation on(long first, int levels) {
        Generator generator = course.generator(time, planned);
        Spectrum spectrum = Spectrum.of(generator.drift().get(0), first, levels);
        checkWork(
                levels,
                (pure ? 1 : 2) * spectrum.width(),
                (2 * generator.reach() + 1) * generator.drift().size(),
                generator.jumps().size());
        Equation next = Propagation.plain(generator, pure, first, levels);
        stepper = stepper.on(next);
        ready = false;
        return next;
    }

    @Override
    int planes() {
        return TaylorStep.ORDER + 4;
    }

    @Override
    double longestStep() {
        if (!ready) {
            double end = course.nextBreak(time);
            double room = Math.min(end - time, budget.timeLeft(time));
            // a step that a break cuts short says nothing about the next one
            uncut = Math.max(planned, uncut);
            planned = Math.min(uncut, room);
            // the course must be known well enough over what is planned
            double least = SHORTEST * budget.duration();
            resize(equation.first, equation.levels);
            while (course.off(equation, planned) > COURSE * budget.forSeries(planned) && planned >= least) {
                planned *= 0.5;
                resize(equation.first, equation.levels);
            }
            if (planned < least && planned < room) {
                throw new PhysicsException.NotConverged(
                        "the Hamiltonian near time " + Digits.significant(time, 6)
                                + " (it varies too fast to be followed at this tolerance)",
                        steps,
                        course.off(equation, planned),
                        budget.forSeries(planned));
            }
            stepper.prepare(state, orders());
            applications += TaylorStep.ORDER + 1;
            longest = planned;
            while (stepper.series(longest) + course.off(equation, longest) > budget.forSeries(longest)
                    && longest > least) {
                longest *= SHORTEN;
            }
            if (longest < room) {
                uncut = 2 * longest;
            }
            ready = true;
        }
        return longest;
    }

    /** Orders of the generator that matter over the planned step. */
    private int orders() {
        int most = equation.norms.length - 1;
        double left = 0;
        double allowed = COURSE * budget.forSeries(planned) / equation.rank();
        while (most > 0) {
            left += equation.norms[most] * Math.pow(planned, most + 1.0) / (most + 1);
            if (left > 0.1 * allowed) {
                break;
            }
            most--;
        }
        return most;
    }

    @Override
    boolean attempt(double[] times) {
        double length = times[times.length - 1];
        stepper.border(length, sides);
        double off = course.off(equation, length) + course.atBreaks(equation);
        if (!book(length, stepper.series(length) + off, stepper.rounding(length))) {
            return false;
        }
        stepper.at(times);
        return true;
    }

    @Override
    Plane at(int i) {
        return stepper.at(i);
    }

    @Override
    double leaked(boolean below) {
        return sides[below ? 0 : 1];
    }

    @Override
    void kept(double length) {
        course.advance(length);
        if (course instanceof FrameCourse frame) {
            double[] mean = equation.lowering(state, 1);
            double[] seen = frame.unsqueezed(mean);
            frame.recentre(seen[0], seen[1], PULL / length);
            squeeze(frame, mean);
            if (equation.levels > mostAllowed) {
                throw new LeftFrame();
            }
        }
        planned = uncut;
        ready = false;
    }
}
