package ladderwell.kernel.picture;

import java.util.OptionalDouble;
import ladderwell.Density;
import ladderwell.Oscillator;
import ladderwell.Run;
import ladderwell.classical.ClassicalOrbit;
import ladderwell.quantity.Kind;
import ladderwell.quantity.Scale;
import ladderwell.quantity.Unit;

/**
 * What a density animation shows: frames of the density with everything that is drawn over them, in the units in which
 * it is drawn. Long runs are thinned to at most {@link #MOST_FRAMES} frames; the picture says so.
 */
final class Motion {
    /** A page stays light and the player smooth up to here. */
    static final int MOST_FRAMES = 301;

    /** More points than a picture has pixels show nothing more. */
    static final int MOST_POINTS = 800;

    /** Above this many periods the classical line would fill the strip; its ring stays. */
    private static final double MOST_PERIODS_OF_LINE = 40;

    private final String name;
    private final Run run;
    private final Density density;
    private final int stride;
    private final int pointStride;
    private final Unit length;
    private final Unit time;
    private final Unit energy;
    private final double lengthScale;
    private final double timeScale;
    private final double energyScale;
    private final OptionalDouble period;
    private final double meanEnergy;
    private final double top;
    private final ClassicalOrbit orbit;

    private Motion(String name, Run run, Density density) {
        this.name = name;
        this.run = run;
        this.density = density;
        this.stride = (density.times() - 2) / (MOST_FRAMES - 1) + 1;
        this.pointStride = (density.points() - 2) / (MOST_POINTS - 1) + 1;
        Oscillator oscillator = run.state().oscillator();
        Scale scale = oscillator.scale();
        this.meanEnergy = run.state().meanEnergy();
        this.top = top(oscillator, meanEnergy, density);
        this.length = scale.display(Kind.LENGTH, Math.abs(density.position(0)) * scale.length());
        this.time = scale.display(Kind.TIME, run.time(density.times() - 1) * scale.time());
        this.energy = scale.display(Kind.ENERGY, top * scale.energy());
        this.lengthScale = length.fromSi(scale.length());
        this.timeScale = time.fromSi(scale.time());
        this.energyScale = energy.fromSi(scale.energy());
        this.period = period(run);
        this.orbit = run.classical();
    }

    /** The motion of a run. @param density its frames, at the run's own times */
    static Motion of(String name, Run run, Density density) {
        return new Motion(name, run, density);
    }

    private static OptionalDouble period(Run run) {
        try {
            return OptionalDouble.of(run.state().period());
        } catch (IllegalArgumentException e) {
            return OptionalDouble.empty(); // no classical particle is bound at this energy
        }
    }

    /** Top of the energy scale: about twice the mean energy; the rim of a well where that is near. */
    private static double top(Oscillator oscillator, double meanEnergy, Density density) {
        double rim = oscillator.levels().threshold();
        if (rim < 5 * meanEnergy) {
            return 1.12 * rim;
        }
        double edge = oscillator.potential(density.position(density.points() - 1));
        double twice = 2.1 * Math.max(meanEnergy, 1e-300);
        return Double.isInfinite(edge) || edge <= 0 ? twice : Math.min(twice, Math.max(1.02 * edge, 1.2 * meanEnergy));
    }

    String name() {
        return name;
    }

    Run run() {
        return run;
    }

    /** Number of frames shown. */
    int frames() {
        return (density.times() - 1) / stride + 1;
    }

    /** How many times of the run stand between two frames. */
    int stride() {
        return stride;
    }

    /** How many positions of the grid one shown position stands for. */
    int pointStride() {
        return pointStride;
    }

    /** Number of positions shown. */
    int points() {
        return (density.points() - 1) / pointStride + 1;
    }

    /** Symbol of the unit of length; empty in natural units. */
    String lengthUnit() {
        return length.symbol();
    }

    String timeUnit() {
        return time.symbol();
    }

    String energyUnit() {
        return energy.symbol();
    }

    double position(int i) {
        return density.position(i * pointStride) * lengthScale;
    }

    /** Scaled time of a frame. */
    private double scaledTime(int frame) {
        return run.time(frame * stride);
    }

    double labTime(int frame) {
        return scaledTime(frame) * timeScale;
    }

    OptionalDouble periods(int frame) {
        return period.isPresent()
                ? OptionalDouble.of(scaledTime(frame) / period.getAsDouble())
                : OptionalDouble.empty();
    }

    /** |ψ|² per unit of length. */
    double density(int frame, int i) {
        return Math.max(0, density.value(frame * stride, i * pointStride)) / lengthScale;
    }

    double peak() {
        double peak = 0;
        for (int j = 0; j < frames(); j++) {
            for (int i = 0; i < points(); i++) {
                peak = Math.max(peak, density(j, i));
            }
        }
        return peak > 0 ? peak : 1;
    }

    /** The mean position of a frame, from the density itself. */
    double meanPosition(int frame) {
        double sum = 0;
        double moment = 0;
        double[] values = density.frame(frame * stride);
        for (int i = 0; i < values.length; i++) {
            sum += values[i];
            moment += values[i] * density.position(i);
        }
        return sum > 0 ? moment / sum * lengthScale : 0;
    }

    /** Where the classical particle is. */
    double classicalPosition(int frame) {
        return orbit.position(scaledTime(frame)) * lengthScale;
    }

    /** Height of the classical particle on the potential. */
    double classicalHeight(int frame) {
        // A hair inside, so that a particle that touches a wall does not jump to its top.
        double x = orbit.position(scaledTime(frame)) * (1 - 1e-9);
        return Math.min(run.state().oscillator().potential(x), top) * energyScale;
    }

    /** The classical orbit on evenly spaced times over the whole run; empty where the line would fill the strip. */
    double[] classicalLine() {
        double periods = periods(frames() - 1).orElse(0);
        if (periods > MOST_PERIODS_OF_LINE) {
            return new double[0];
        }
        int points = Math.max(401, Math.min(2001, 200 * (int) Math.ceil(periods) + 1));
        double end = scaledTime(frames() - 1);
        double[] line = new double[points];
        for (int i = 0; i < points; i++) {
            line[i] = orbit.position(end * i / (points - 1)) * lengthScale;
        }
        return line;
    }

    /** The outermost classical position; the other one is its mirror image. */
    double turningPoint() {
        return orbit.turningPoint() * lengthScale;
    }

    double meanEnergy() {
        return meanEnergy * energyScale;
    }

    double top() {
        return top * energyScale;
    }

    /** Half the length of the line at the mean energy: where the potential reaches it, or the edge of the picture. */
    double reachAtMeanEnergy() {
        double inside = 0;
        double outside = density.position(density.points() - 1);
        Oscillator oscillator = run.state().oscillator();
        if (oscillator.potential(outside) <= meanEnergy) {
            return outside * lengthScale;
        }
        for (int i = 0; i < 60; i++) {
            double middle = (inside + outside) / 2;
            if (oscillator.potential(middle) > meanEnergy) {
                outside = middle;
            } else {
                inside = middle;
            }
        }
        return inside * lengthScale;
    }

    Potential potential() {
        return Potential.of(
                run.state().oscillator(), density.position(0), density.position(density.points() - 1), 1.1 * top);
    }

    double lengthScale() {
        return lengthScale;
    }

    double energyScale() {
        return energyScale;
    }

    /** A time as people say it: in periods, or in lab units where there is no period. */
    String shortTime(int frame) {
        OptionalDouble periods = periods(frame);
        return periods.isPresent()
                ? Written.number(periods.getAsDouble(), 3)
                : Written.number(labTime(frame), 3) + Written.behind(timeUnit());
    }

    /** What the picture shows, in a sentence for those who do not see it. */
    String description() {
        int last = frames() - 1;
        String span = periods(last).isPresent()
                ? Written.number(periods(last).getAsDouble(), 4) + " periods = " + Written.number(labTime(last), 4)
                        + Written.behind(timeUnit())
                : Written.number(labTime(last), 4) + Written.behind(timeUnit());
        return "Density of " + name + " moving in the potential of its oscillator ("
                + run.state().oscillator().kind()
                + ") over " + span + ", " + frames() + " frames, position from " + Written.number(position(0), 3)
                + " to "
                + Written.number(position(points() - 1), 3) + Written.behind(lengthUnit()) + "; "
                + run.verdict() + ".";
    }
}
