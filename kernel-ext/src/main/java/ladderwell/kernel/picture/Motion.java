package ladderwell.kernel.picture;

import java.util.ArrayList;
import java.util.List;
import java.util.OptionalDouble;
import ladderwell.Density;
import ladderwell.LadderMode;
import ladderwell.Observable;
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
    private final double floor;
    private final double top;
    private final ClassicalOrbit orbit;

    private Motion(String name, Run run, Density density, int mostFrames) {
        this.name = name;
        this.run = run;
        this.density = density;
        this.stride = (density.times() - 2) / (mostFrames - 1) + 1;
        this.pointStride = (density.points() - 2) / (MOST_POINTS - 1) + 1;
        Oscillator oscillator = run.state().oscillator();
        Scale scale = oscillator.scale();
        this.meanEnergy = drawnEnergy(run);
        this.floor = floor(oscillator, density);
        this.top = floor + height(oscillator, meanEnergy - floor, density);
        double last = Math.abs(density.position(density.points() - 1));
        this.length = scale.display(Kind.LENGTH, Math.max(Math.abs(density.position(0)), last) * scale.length());
        this.time = scale.display(Kind.TIME, run.time(density.times() - 1) * scale.time());
        this.energy = scale.display(Kind.ENERGY, Math.max(Math.abs(top), Math.abs(floor)) * scale.energy());
        this.lengthScale = length.fromSi(scale.length());
        this.timeScale = time.fromSi(scale.time());
        this.energyScale = energy.fromSi(scale.energy());
        this.period = period(run);
        this.orbit = run.classical();
    }

    /** The motion of a run. @param density its frames, at the run's own times */
    static Motion of(String name, Run run, Density density) {
        return new Motion(name, run, density, MOST_FRAMES);
    }

    /** The same with no more frames than this. */
    static Motion of(String name, Run run, Density density, int mostFrames) {
        return new Motion(name, run, density, mostFrames);
    }

    private static OptionalDouble period(Run run) {
        try {
            return OptionalDouble.of(run.state().period());
        } catch (IllegalArgumentException e) {
            return OptionalDouble.empty(); // no classical particle is bound at this energy
        }
    }

    /** The mean energy; of a mode, whose Hamiltonian stands in a frame, that of the swing in the parabola that is drawn. */
    private static double drawnEnergy(Run run) {
        if (!(run.state().oscillator() instanceof LadderMode)) {
            return run.state().meanEnergy();
        }
        double x = run.series(Observable.POSITION).value(0);
        double p = run.series(Observable.MOMENTUM).value(0);
        return (x * x + p * p + 1) / 2;
    }

    /** The least of the potential in the picture: the energy scale begins there. */
    private static double floor(Oscillator oscillator, Density density) {
        double least = Double.POSITIVE_INFINITY;
        for (int i = 0; i < density.points(); i++) {
            least = Math.min(least, oscillator.potential(density.position(i)));
        }
        // The grid may miss the very bottom of a well that begins at 0.
        double edge = Math.min(
                oscillator.potential(density.position(0)),
                oscillator.potential(density.position(density.points() - 1)));
        double missed = Math.max(0.01 * Math.min(edge - least, 1), Math.min(0.002 * (edge - least), 1));
        return Math.abs(least) < missed ? 0 : least;
    }

    /** Height of the energy scale: about twice the mean energy above the bottom; the rim of a well where that is near. */
    private double height(Oscillator oscillator, double mean, Density density) {
        double rim = oscillator.levels().threshold() - floor;
        if (rim < 5 * mean) {
            return Math.max(1.12 * rim, 1.3 * mean);
        }
        double edge = Math.min(
                        oscillator.potential(density.position(0)),
                        oscillator.potential(density.position(density.points() - 1)))
                - floor;
        double twice = 2.1 * Math.max(mean, 1e-300);
        return Double.isInfinite(edge) || edge <= 0 ? twice : Math.min(twice, Math.max(1.02 * edge, 1.2 * mean));
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

    /** Where the classical particle turns back, on the left and on the right; the edge of the picture where it does not. */
    double[] turningPoints() {
        return new double[] {
            Math.max(orbit.leftTurningPoint(), density.position(0)) * lengthScale,
            Math.min(orbit.turningPoint(), density.position(density.points() - 1)) * lengthScale
        };
    }

    double meanEnergy() {
        return meanEnergy * energyScale;
    }

    double top() {
        return top * energyScale;
    }

    /** The lower end of the energy scale, the least of the potential. */
    double floor() {
        return floor * energyScale;
    }

    /**
     * Where the potential lies below the mean energy, as ends of the lines that are drawn there: left, right, NaN, left, right …; a well
     * that the particle does not start in has its line too.
     */
    double[] stretchesAtMeanEnergy() {
        Oscillator oscillator = run.state().oscillator();
        int last = density.points() - 1;
        List<Double> ends = new ArrayList<>();
        int from = -1;
        for (int i = 0; i <= last; i++) {
            boolean below = oscillator.potential(density.position(i)) <= meanEnergy;
            if (below && from < 0) {
                from = i;
            }
            if (from >= 0 && (!below || i == last)) {
                int to = below ? i : i - 1;
                if (!ends.isEmpty()) {
                    ends.add(Double.NaN);
                }
                ends.add((from == 0 ? density.position(0) : crossing(oscillator, from, from - 1)) * lengthScale);
                ends.add((to == last ? density.position(last) : crossing(oscillator, to, to + 1)) * lengthScale);
                from = -1;
            }
        }
        return ends.stream().mapToDouble(Double::doubleValue).toArray();
    }

    /** Where the potential crosses the mean energy between two neighbours of the grid, the first below it, the second above. */
    private double crossing(Oscillator oscillator, int below, int above) {
        double inside = density.position(below);
        double outside = density.position(above);
        for (int i = 0; i < 60; i++) {
            double middle = (inside + outside) / 2;
            if (oscillator.potential(middle) > meanEnergy) {
                outside = middle;
            } else {
                inside = middle;
            }
        }
        return inside;
    }

    Potential potential() {
        return Potential.of(
                run.state().oscillator(),
                density.position(0),
                density.position(density.points() - 1),
                top + 0.1 * (top - floor));
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
