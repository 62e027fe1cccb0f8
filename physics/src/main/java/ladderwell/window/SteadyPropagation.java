package ladderwell.window;

/** Under a constant equation, by a Chebyshev series in each step. */
final class SteadyPropagation extends Propagation {
    /** R h of one step: vectors are happy with long steps; the terms of a damped series grow along the damping and lose digits. */
    private static final double VECTOR_STEP = 100;

    private static final double DENSITY_STEP = 24;
    private static final double DAMPED_STEP = 1.3;

    /** Where rounding would take more than this share of the tolerance, steps are halved: the terms of the series stay smaller. */
    private static final double ROUNDED = 0.2;

    /** A series that grew is made again with R larger by this. */
    private static final double WIDEN = 1.4;

    private final Generator generator;
    private ChebyshevStep stepper;
    private Spectrum spectrum = new Spectrum(0, 0, 0);
    private double rate = 1;
    private double widened = 1;

    SteadyPropagation(
            Generator generator, boolean pure, Equation start, Plane state, Budget budget, double allowedBytes) {
        super(pure, start, state, budget, allowedBytes);
        this.generator = generator;
        stepper = new ChebyshevStep(start, 1);
        resize(start.first, start.levels);
    }

    @Override
    Equation on(long first, int levels) {
        spectrum = Spectrum.of(generator.drift().get(0), first, levels);
        double width = pure ? spectrum.width() / 2 : spectrum.width();
        rate = widened * Math.max(Math.max(width, -spectrum.damping()), Double.MIN_NORMAL / Equation.U);
        checkWork(levels, rate, 2 * generator.reach() + 1, generator.jumps().size());
        Equation next = pure
                ? new VectorEquation(generator, first, levels, 2 / rate, turning())
                : new DensityEquation(generator, first, levels, 2 / rate, damping());
        stepper = new ChebyshevStep(next, rate);
        return next;
    }

    @Override
    int planes() {
        return 6;
    }

    /** c, real part. */
    private double damping() {
        return pure ? 0 : spectrum.damping() / 2;
    }

    /** c, imaginary part: K = −iE turns by −E. */
    private double turning() {
        return pure ? -spectrum.centre() : 0;
    }

    @Override
    double longestStep() {
        if (pure) {
            return VECTOR_STEP / rate;
        }
        double share = budget.roundingToCome(time) > ROUNDED * budget.tolerance() ? 0.5 : 1;
        double byWidth = share * DENSITY_STEP / rate;
        return damping() < 0 ? Math.min(byWidth, share * DAMPED_STEP / -damping()) : byWidth;
    }

    @Override
    boolean attempt(double[] times) {
        double length = times[times.length - 1];
        stepper.take(state, times, damping(), turning(), budget.forSeries(length));
        applications += stepper.applications();
        if (stepper.grown()) {
            widened *= WIDEN;
            redone++;
            resize(equation.first, equation.levels);
            return false;
        }
        return book(length, stepper.defect(), stepper.rounding());
    }

    @Override
    Plane at(int i) {
        return stepper.at(i);
    }

    @Override
    double leaked(boolean below) {
        return stepper.edge(below);
    }

    @Override
    void kept(double length) {
        // nothing varies
    }
}
