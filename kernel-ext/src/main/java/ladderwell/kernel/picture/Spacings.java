package ladderwell.kernel.picture;

import com.google.gson.JsonArray;
import com.google.gson.JsonObject;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import ladderwell.Oscillator;
import ladderwell.level.Levels;
import ladderwell.quantity.Kind;
import ladderwell.quantity.Scale;
import ladderwell.quantity.Unit;

/**
 * Distances from each level to the next, E_{n+1} − E_n against n: what tells an anharmonic oscillator from a harmonic one at a glance, and
 * what there is to say of them in words.
 */
final class Spacings {
    /** More points than this cannot be told apart. */
    private static final int MOST = 400;

    /** A spacing below this share of its smaller neighbour makes a pair of its two levels. */
    private static final double PAIR = 0.2;

    private static final int MOST_SAID = 3;

    private final long[] levels;
    private final double[] gaps;
    private final double[] errors;
    private final Unit unit;
    private final List<Levels.Cluster> clusters = new ArrayList<>();
    private final Scale scale;

    private Spacings(Oscillator oscillator, long[] asked) {
        Levels all = oscillator.levels();
        this.scale = oscillator.scale();
        long[] kept = Arrays.stream(asked)
                .sorted()
                .distinct()
                .filter(n -> n + 1 < all.count())
                .toArray();
        int stride = (kept.length - 1) / MOST + 1;
        this.levels = new long[(kept.length + stride - 1) / stride];
        this.gaps = new double[levels.length];
        this.errors = new double[levels.length];
        for (int i = 0; i < levels.length; i++) {
            levels[i] = kept[i * stride];
            gaps[i] = all.splitting(levels[i]) * scale.energy();
            errors[i] = all.splittingBound(levels[i]).size() * scale.energy();
            Levels.Cluster cluster = all.cluster(levels[i]);
            if (!cluster.single() && !clusters.contains(cluster)) {
                clusters.add(cluster);
            }
        }
        this.unit = scale.display(Kind.ENERGY, Arrays.stream(gaps).max().orElse(0));
    }

    static Spacings of(Oscillator oscillator, long... levels) {
        return new Spacings(oscillator, levels);
    }

    /** Number of points. */
    int count() {
        return levels.length;
    }

    long level(int i) {
        return levels[i];
    }

    double gap(int i) {
        return unit.fromSi(gaps[i]);
    }

    /** How far it can be off. */
    double error(int i) {
        return unit.fromSi(errors[i]);
    }

    String unit() {
        return unit.symbol();
    }

    /** Upper end of the scale of spacings; the lower one is 0. */
    double top() {
        double top = 0;
        for (int i = 0; i < gaps.length; i++) {
            top = Math.max(top, gap(i));
        }
        return top > 0 ? 1.15 * top : 1;
    }

    double[] gaps() {
        double[] shown = new double[gaps.length];
        Arrays.setAll(shown, this::gap);
        return shown;
    }

    double[] levels() {
        return Arrays.stream(levels).asDoubleStream().toArray();
    }

    /** Whether an error is wide enough to be seen. */
    boolean isErrorSeen() {
        double top = top();
        for (int i = 0; i < errors.length; i++) {
            if (error(i) > 0.01 * top) {
                return true;
            }
        }
        return false;
    }

    JsonObject errorBars() {
        JsonArray sizes = new JsonArray();
        for (int i = 0; i < errors.length; i++) {
            sizes.add(Written.rounded(error(i), 4));
        }
        JsonObject bars = new JsonObject();
        bars.addProperty("type", "data");
        bars.add("array", sizes);
        bars.addProperty("thickness", 1);
        bars.addProperty("width", 2);
        return bars;
    }

    JsonArray hover() {
        JsonArray hover = new JsonArray();
        for (int i = 0; i < levels.length; i++) {
            hover.add(levels[i] + " to " + (levels[i] + 1) + ": "
                    + Markup.plot(Written.number(gap(i), 6) + Written.behind(unit())));
        }
        return hover;
    }

    /** What is to be said of them; empty where that is nothing. */
    String words() {
        List<String> said = new ArrayList<>();
        for (Levels.Cluster cluster : clusters.subList(0, Math.min(clusters.size(), MOST_SAID))) {
            said.add("levels " + cluster.first() + " to " + cluster.last() + " are not told apart, they lie within "
                    + energy(cluster.spread().size() * scale.energy(), 2));
        }
        List<Integer> pairs = pairs();
        if (!pairs.isEmpty()) {
            StringBuilder text = new StringBuilder("levels ");
            for (int k = 0; k < Math.min(pairs.size(), MOST_SAID); k++) {
                long n = levels[pairs.get(k)];
                text.append(k == 0 ? "" : ", ")
                        .append(n)
                        .append(" and ")
                        .append(n + 1)
                        .append(k == 0 ? " are split by " : " by ")
                        .append(energy(gaps[pairs.get(k)], 5));
            }
            if (pairs.size() > MOST_SAID) {
                text.append(", and so on in ").append(pairs.size()).append(" pairs");
            }
            said.add(text.toString());
        } else if (clusters.isEmpty() && gaps.length > 1) {
            trend().ifPresent(said::add);
        }
        return String.join("; ", said);
    }

    private Optional<String> trend() {
        boolean falls = true;
        boolean rises = true;
        boolean equal = true;
        for (int i = 1; i < gaps.length; i++) {
            double off = errors[i] + errors[i - 1];
            falls &= gaps[i] < gaps[i - 1] - off;
            rises &= gaps[i] > gaps[i - 1] + off;
            equal &= Math.abs(gaps[i] - gaps[i - 1]) <= off + 1e-12 * gaps[i];
        }
        String from = energy(gaps[0], 4);
        String to = energy(gaps[gaps.length - 1], 4);
        if (equal) {
            return Optional.of("all spacings are " + from);
        }
        if (!falls && !rises) {
            return Optional.empty();
        }
        return Optional.of((falls ? "spacings fall from " : "spacings rise from ") + from + " to " + to + " with n");
    }

    /** Places in the list of spacings that are small beside both of their neighbours. */
    private List<Integer> pairs() {
        List<Integer> pairs = new ArrayList<>();
        if (gaps.length > 1 && levels[gaps.length - 1] - levels[0] >= gaps.length) {
            return pairs; // not every level is here
        }
        for (int i = 0; i < gaps.length; i++) {
            long n = levels[i];
            boolean clustered = clusters.stream().anyMatch(cluster -> cluster.first() <= n && n < cluster.last());
            boolean below = i == 0 || gaps[i] < PAIR * gaps[i - 1];
            boolean above = i == gaps.length - 1 || gaps[i] < PAIR * gaps[i + 1];
            if (!clustered && below && above && gaps.length > 1) {
                pairs.add(i);
            }
        }
        return pairs;
    }

    private String energy(double si, int digits) {
        Unit own = scale.display(Kind.ENERGY, si);
        return Written.number(own.fromSi(si), digits) + (own.symbol().isEmpty() ? "" : " " + own.symbol());
    }
}
