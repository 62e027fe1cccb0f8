package ladderwell.kernel.picture;

import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import ladderwell.Oscillator;
import ladderwell.Run;
import ladderwell.classical.ClassicalOrbit;
import ladderwell.phasespace.PhaseField;
import ladderwell.phasespace.PhaseGrid;
import ladderwell.quantity.Kind;
import ladderwell.quantity.Scale;
import ladderwell.quantity.Unit;

/** Positions and momenta of a phase-space picture in the units in which they are drawn, with the classical orbit in them. */
final class PhaseScale {
    private static final int ORBIT_POINTS = 361;

    /** Less of a swing than this, in scaled units, is a particle at rest. */
    private static final double REST = 1e-6;

    private final Run run;
    private final PhaseGrid grid;
    private final Unit length;
    private final Unit momentum;
    private final double lengthScale;
    private final double momentumScale;
    private final ClassicalOrbit orbit;
    private final boolean resting;

    PhaseScale(Run run, PhaseGrid grid) {
        this.run = run;
        this.grid = grid;
        Scale scale = run.state().oscillator().scale();
        double farX = Math.max(Math.abs(grid.position(0)), Math.abs(grid.position(grid.nx() - 1)));
        double farP = Math.max(Math.abs(grid.momentum(0)), Math.abs(grid.momentum(grid.np() - 1)));
        length = scale.display(Kind.LENGTH, farX * scale.length());
        momentum = scale.display(Kind.MOMENTUM, farP * scale.of(Kind.MOMENTUM));
        lengthScale = length.fromSi(scale.length());
        momentumScale = momentum.fromSi(scale.of(Kind.MOMENTUM));
        orbit = run.classical();
        resting = orbit.turningPoint() - orbit.leftTurningPoint() < REST && Math.abs(orbit.momentum(0)) < REST;
    }

    PhaseGrid grid() {
        return grid;
    }

    String lengthUnit() {
        return length.symbol();
    }

    String momentumUnit() {
        return momentum.symbol();
    }

    double position(int i) {
        return grid.position(i) * lengthScale;
    }

    double momentum(int j) {
        return grid.momentum(j) * momentumScale;
    }

    double left() {
        return position(0);
    }

    double right() {
        return position(grid.nx() - 1);
    }

    double low() {
        return momentum(0);
    }

    double high() {
        return momentum(grid.np() - 1);
    }

    double lengthScale() {
        return lengthScale;
    }

    double momentumScale() {
        return momentumScale;
    }

    /** Whether the classical particle through the means stands still; its orbit is then the one at the mean energy. */
    boolean isResting() {
        return resting;
    }

    double classicalPosition(double time) {
        return orbit.position(time) * lengthScale;
    }

    double classicalMomentum(double time) {
        return orbit.momentum(time) * momentumScale;
    }

    /** The classical orbit over one period, or over the run where there is none; NaN where a wall turns the momentum round. */
    double[][] orbit() {
        Oscillator oscillator = run.state().oscillator();
        double last = run.time(run.times() - 1);
        OptionalDouble period = OptionalDouble.empty();
        try {
            period = OptionalDouble.of(run.state().period());
        } catch (IllegalArgumentException e) {
            // No classical particle is bound at this energy: what it does during the run is drawn.
        }
        double end = oscillator.moves() ? last : period.orElse(last);
        ClassicalOrbit drawn = orbit;
        if (resting && !oscillator.moves()) {
            double energy = run.state().meanEnergy();
            double kinetic = energy - oscillator.potential(orbit.position(0));
            if (kinetic > 0) {
                drawn = oscillator.orbit(orbit.position(0), Math.sqrt(2 * kinetic), energy);
            }
        }
        List<double[]> points = new ArrayList<>();
        double swing = Math.max(Math.abs(drawn.momentum(0)), grid.halfP() / 4);
        for (int i = 0; i < ORBIT_POINTS; i++) {
            double t = end * i / (ORBIT_POINTS - 1);
            double x = drawn.position(t);
            double p = drawn.momentum(t);
            if (!points.isEmpty()) {
                double before = points.get(points.size() - 1)[1] / momentumScale;
                if (Math.abs(p - before) > swing) {
                    points.add(new double[] {Double.NaN, Double.NaN});
                }
            }
            points.add(new double[] {x * lengthScale, p * momentumScale});
        }
        double[][] line = new double[2][points.size()];
        for (int i = 0; i < points.size(); i++) {
            line[0][i] = points.get(i)[0];
            line[1][i] = points.get(i)[1];
        }
        return line;
    }

    /** "1.5 periods = 1.25 µs". */
    static String instant(OptionalDouble periods, String labTime) {
        return periods.isPresent() ? Written.number(periods.getAsDouble(), 4) + " periods = " + labTime : labTime;
    }

    /** Values between −1 and 1 at places of the unit square, between the points of the grid on straight lines. */
    static double between(PhaseField field, double peak, double across, double up) {
        double i = across * (field.grid().nx() - 1);
        double j = up * (field.grid().np() - 1);
        int a = Math.min((int) i, field.grid().nx() - 2);
        int b = Math.min((int) j, field.grid().np() - 2);
        double[] left = field.row(a);
        double[] right = field.row(a + 1);
        double s = i - a;
        double t = j - b;
        return ((1 - s) * ((1 - t) * left[b] + t * left[b + 1]) + s * ((1 - t) * right[b] + t * right[b + 1])) / peak;
    }

    String range() {
        return "position from " + Written.number(left(), 3) + " to " + Written.number(right(), 3)
                + Written.behind(lengthUnit()) + ", momentum from " + Written.number(low(), 3) + " to "
                + Written.number(high(), 3) + Written.behind(momentumUnit());
    }
}
