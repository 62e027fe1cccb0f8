package ladderwell.kernel.picture;

import java.util.Arrays;
import ladderwell.Oscillator;
import ladderwell.PotentialWell;
import ladderwell.level.Levels;
import ladderwell.quantity.Kind;
import ladderwell.quantity.Scale;
import ladderwell.quantity.Unit;

/** Some levels of an oscillator with their wave functions, in the units in which they are drawn. */
final class LevelDiagram {
    /** More curves than this cannot be told apart. */
    static final int MOST_LEVELS = 12;

    static final int POINTS = 301;

    /** Height of the wave function of the topmost level at the edge of the picture. */
    private static final double DROP = 2e-3;

    private final String name;
    private final Oscillator oscillator;
    private final long[] levels;
    private final int asked;
    private final double[] energies;
    private final double[][] waves;
    private final double[] x;
    private final Unit length;
    private final Unit energy;
    private final double lengthScale;
    private final double energyScale;
    private final double lift;
    private final double bottom;
    private final double top;

    private LevelDiagram(String name, Oscillator oscillator, long[] asked) {
        this.name = name;
        this.oscillator = oscillator;
        long[] sorted = Arrays.stream(asked).sorted().distinct().toArray();
        this.asked = sorted.length;
        this.levels = Arrays.copyOf(sorted, Math.min(sorted.length, MOST_LEVELS));
        if (levels.length == 0) {
            throw new IllegalArgumentException("a picture of levels needs at least one level");
        }
        Levels all = oscillator.levels();
        this.energies = Arrays.stream(levels).mapToDouble(all::energyHigh).toArray();
        double[] ends = ends(oscillator, all, levels[levels.length - 1]);
        double middle = (ends[0] + ends[1]) / 2;
        double half = (ends[1] - ends[0]) / 2;
        this.x = new double[POINTS];
        double least = Double.POSITIVE_INFINITY;
        for (int i = 0; i < POINTS; i++) {
            x[i] = middle + half * (2 * i - (POINTS - 1)) / (POINTS - 1);
            least = Math.min(least, oscillator.potential(x[i]));
        }
        this.waves = new double[all.hasWaveFunctions() ? levels.length : 0][];
        double highest = 0;
        for (int k = 0; k < waves.length; k++) {
            waves[k] = all.waveFunctions(levels[k], 1, x)[0];
            for (double value : waves[k]) {
                highest = Math.max(highest, Math.abs(value));
            }
        }
        double last = energies[energies.length - 1];
        double first = energies[0];
        double span = levels.length > 1 ? (last - first) / (levels.length - 1) : Math.max(last - least, 1e-300) / 2;
        double closest = span;
        for (int k = 1; k < levels.length; k++) {
            closest = Math.min(closest, energies[k] - energies[k - 1]);
        }
        // Curves of neighbours may touch but not cover each other, and stay large enough to be seen.
        double amplitude = Math.max(0.62 * closest, 0.34 * span);
        this.lift = highest > 0 ? amplitude / highest : 0;
        double rim = all.threshold();
        double above = last + 1.15 * amplitude;
        boolean rimNear = rim - first < 1.6 * (above - first) + 0.6 * (first - least);
        this.top = rimNear ? Math.max(above, rim + 0.04 * (rim - least)) : above;
        // From the bottom of the well where that leaves room for the curves; else from below the lowest one.
        this.bottom =
                first - least < 4 * (top - first) ? Math.min(least, first - 1.1 * amplitude) : first - 1.6 * amplitude;
        Scale scale = oscillator.scale();
        this.length = scale.display(Kind.LENGTH, Math.max(Math.abs(ends[0]), Math.abs(ends[1])) * scale.length());
        this.energy = scale.display(Kind.ENERGY, Math.max(Math.abs(bottom), Math.abs(top)) * scale.energy());
        this.lengthScale = length.fromSi(scale.length());
        this.energyScale = energy.fromSi(scale.energy());
    }

    static LevelDiagram of(String name, Oscillator oscillator, long... levels) {
        return new LevelDiagram(name, oscillator, levels);
    }

    /** Where the picture begins and ends: a little outside the turning points of the topmost level. */
    private static double[] ends(Oscillator oscillator, Levels levels, long last) {
        if (oscillator instanceof PotentialWell well) {
            return levels.hasWaveFunctions()
                    ? ends(well, levels, last)
                    : new double[] {oscillator.left(), oscillator.right()};
        }
        double energy = levels.energyHigh(last);
        double turn = oscillator.orbit(0, Math.sqrt(2 * energy), energy).turningPoint();
        double half = Math.max(1.12 * turn, Math.min(levels.reach(last, DROP), 2.2 * turn));
        return new double[] {-half, half};
    }

    /** Where the topmost wave function has fallen off; of a level just bound no more than shows the ones below it too. */
    private static double[] ends(PotentialWell well, Levels levels, long last) {
        double[] ends = levels.extent(last, DROP);
        double[] top = allowed(well, ends, levels.energyHigh(last));
        double[] middle = allowed(well, ends, levels.energyHigh(last / 2));
        double margin = 0.6 * (top[1] - top[0]);
        double most = 3 * (middle[1] - middle[0]);
        return new double[] {
            Math.max(ends[0], Math.max(top[0] - margin, middle[0] - most)),
            Math.min(ends[1], Math.min(top[1] + margin, middle[1] + most))
        };
    }

    /** The outermost places that a classical particle of that energy can be at. */
    private static double[] allowed(PotentialWell well, double[] ends, double energy) {
        double[] allowed = {Double.POSITIVE_INFINITY, Double.NEGATIVE_INFINITY};
        for (int i = 0; i <= 4000; i++) {
            double x = ends[0] + (ends[1] - ends[0]) * i / 4000;
            if (well.potential(x) <= energy) {
                allowed[0] = Math.min(allowed[0], x);
                allowed[1] = Math.max(allowed[1], x);
            }
        }
        return allowed[0] <= allowed[1] ? allowed : ends;
    }

    String name() {
        return name;
    }

    /** Number of levels drawn. */
    int count() {
        return levels.length;
    }

    /** Number of wave functions drawn: all, or none where the levels have no real ones. */
    int curves() {
        return waves.length;
    }

    long level(int k) {
        return levels[k];
    }

    double energy(int k) {
        return energies[k] * energyScale;
    }

    String energyUnit() {
        return energy.symbol();
    }

    String lengthUnit() {
        return length.symbol();
    }

    double from() {
        return x[0] * lengthScale;
    }

    double to() {
        return x[POINTS - 1] * lengthScale;
    }

    double bottom() {
        return bottom * energyScale;
    }

    double top() {
        return top * energyScale;
    }

    /** The wave function of the k-th level as it is drawn: lifted to its energy. */
    double[] lifted(int k) {
        double[] out = new double[POINTS];
        for (int i = 0; i < POINTS; i++) {
            out[i] = (energies[k] + lift * waves[k][i]) * energyScale;
        }
        return out;
    }

    Potential potential() {
        return Potential.of(oscillator, x[0], x[POINTS - 1], top + (top - bottom) * 0.1);
    }

    double lengthScale() {
        return lengthScale;
    }

    double energyScale() {
        return energyScale;
    }

    /** Which levels have a label: all, or as many as stand clear of each other. */
    boolean labelled(int k, double pixels) {
        double need = 13 * (top - bottom) / pixels;
        double free = Double.POSITIVE_INFINITY;
        int drawn = levels.length - 1;
        for (int j = levels.length - 1; j >= 0; j--) {
            boolean label = energies[j] <= free;
            if (label) {
                free = energies[j] - need;
                drawn = j;
            }
            if (j == k) {
                return label && drawn == k;
            }
        }
        return false;
    }

    String label(int k) {
        return "n = " + levels[k];
    }

    /** The label of level k and of those below it that lie so close that one line is drawn for all. */
    String label(int k, double pixels) {
        double close = 7.5 * (top - bottom) / pixels;
        int first = k;
        while (first > 0 && energies[first] - energies[first - 1] < close) {
            first--;
        }
        if (first == k) {
            return label(k);
        }
        return "n = " + levels[first] + (k - first == 1 ? ", " : "–") + levels[k];
    }

    String description() {
        String which = count() == 1 ? "Level " + levels[0] : "Levels " + levels[0] + " to " + levels[count() - 1];
        String part = asked > count() ? ", the lowest " + count() + " of " + asked + "," : "";
        String curves =
                waves.length == 0 ? "" : " with " + (count() == 1 ? "its wave function" : "their wave functions") + ",";
        return which + " of " + name + " (" + oscillator.kind() + ")" + part + curves
                + " in the potential; energies from " + Written.number(energy(0), 4) + " to "
                + Written.number(energy(count() - 1), 4) + Written.behind(energyUnit()) + ".";
    }
}
