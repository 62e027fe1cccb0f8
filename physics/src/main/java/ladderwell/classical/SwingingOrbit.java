package ladderwell.classical;

/** Periodic motion through a given point, read from its {@link Swing}. */
final class SwingingOrbit implements ClassicalOrbit {
    private final Swing swing;
    private final double period;
    /** Time on the way right from the left end at which the orbit is at time 0. */
    private final double start;

    private final boolean backwards;

    SwingingOrbit(Swing swing, double position, double momentum) {
        this.swing = swing;
        period = swing.period();
        double there = swing.timeTo(position);
        backwards = swing.goesAround() && momentum < 0;
        start = momentum < 0 && !swing.goesAround() ? period - there : there;
    }

    private double along(double time) {
        double t = (start + (backwards ? -time : time)) % period;
        return t < 0 ? t + period : t;
    }

    @Override
    public double position(double time) {
        double t = along(time);
        return swing.positionAfter(swing.goesAround() || t <= period / 2 ? t : period - t);
    }

    @Override
    public double momentum(double time) {
        double t = along(time);
        double p = swing.momentumAt(position(time));
        boolean right = swing.goesAround() ? !backwards : t <= period / 2;
        return right ? p : -p;
    }

    @Override
    public double turningPoint() {
        return swing.right();
    }

    @Override
    public double leftTurningPoint() {
        return swing.left();
    }
}
