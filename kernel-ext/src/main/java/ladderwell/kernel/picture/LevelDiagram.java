package ladderwell.kernel.picture;

import java.util.Arrays;
import ladderwell.Oscillator;
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
        double half = half(oscillator, all, levels[levels.length - 1]);
        this.x = new double[POINTS];
        for (int i = 0; i < POINTS; i++) {
            x[i] = half * (2 * i - (POINTS - 1)) / (POINTS - 1);
        }
        this.waves = new double[levels.length][];
        double highest = 0;
        for (int k = 0; k < levels.length; k++) {
            waves[k] = all.waveFunctions(levels[k], 1, x)[0];
            for (double value : waves[k]) {
                highest = Math.max(highest, Math.abs(value));
            }
        }
        double last = energies[energies.length - 1];
        double first = energies[0];
        double span = levels.length > 1 ? (last - first) / (levels.length - 1) : Math.max(last, 1e-300) / 2;
        double least = span;
        for (int k = 1; k < levels.length; k++) {
            least = Math.min(least, energies[k] - energies[k - 1]);
        }
        // Curves of neighbours may touch but not cover each other, and stay large enough to be seen.
        double amplitude = Math.max(0.62 * least, 0.34 * span);
        this.lift = highest > 0 ? amplitude / highest : 0;
        double rim = all.threshold();
        double above = last + 1.15 * amplitude;
        this.top = rim < 1.6 * above ? Math.max(above, 1.04 * rim) : above;
        // From the bottom of the well where that leaves room for the curves; else from below the lowest one.
        this.bottom = first < 4 * (top - first) ? Math.min(0, first - 1.1 * amplitude) : first - 1.6 * amplitude;
        Scale scale = oscillator.scale();
        this.length = scale.display(Kind.LENGTH, half * scale.length());
        this.energy = scale.display(Kind.ENERGY, top * scale.energy());
        this.lengthScale = length.fromSi(scale.length());
        this.energyScale = energy.fromSi(scale.energy());
    }

    static LevelDiagram of(String name, Oscillator oscillator, long... levels) {
        return new LevelDiagram(name, oscillator, levels);
    }

    private static double half(Oscillator oscillator, Levels levels, long last) {
        double energy = levels.energyHigh(last);
        double turn = oscillator.orbit(0, Math.sqrt(2 * energy), energy).turningPoint();
        return Math.max(1.12 * turn, Math.min(levels.reach(last, DROP), 2.2 * turn));
    }

    String name() {
        return name;
    }

    /** Number of levels drawn. */
    int count() {
        return levels.length;
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

    String description() {
        String which = count() == 1 ? "Level " + levels[0] : "Levels " + levels[0] + " to " + levels[count() - 1];
        String part = asked > count() ? ", the lowest " + count() + " of " + asked + "," : "";
        return which + " of " + name + " (" + oscillator.kind() + ")" + part + " with "
                + (count() == 1 ? "its wave function" : "their wave functions")
                + ", in the potential; energies from " + Written.number(energy(0), 4) + " to "
                + Written.number(energy(count() - 1), 4) + Written.behind(energyUnit()) + ".";
    }
}
