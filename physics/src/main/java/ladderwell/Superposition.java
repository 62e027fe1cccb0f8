package ladderwell;

import static ladderwell.quantity.Units.ONE;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import ladderwell.state.Amplitudes;

/**
 * A superposition Σ (re + i·im)|level⟩ of levels; normalised when it is used, so weights count relative to one another.
 *
 * @param oscillator the oscillator
 * @param levels the levels, from 0, each once
 * @param re real parts of the weights, one per level
 * @param im imaginary parts of the weights, one per level
 */
public record Superposition(Oscillator oscillator, List<Long> levels, List<Double> re, List<Double> im)
        implements State {

    public Superposition {
        levels = List.copyOf(levels);
        re = List.copyOf(re);
        im = List.copyOf(im);
        if (levels.isEmpty()) {
            throw new IllegalArgumentException("a superposition needs at least one level");
        }
        if (re.size() != levels.size() || im.size() != levels.size()) {
            throw new IllegalArgumentException("a superposition of " + levels.size()
                    + " levels needs as many weights, not " + Math.max(re.size(), im.size()));
        }
        if (levels.stream().distinct().count() != levels.size()) {
            throw new IllegalArgumentException("a superposition names each level once, not " + levels);
        }
        for (long n : levels) {
            checkLevel(oscillator, n);
        }
        double norm = 0;
        for (int i = 0; i < levels.size(); i++) {
            norm += Math.abs(Checks.finite("weight", re.get(i))) + Math.abs(Checks.finite("weight", im.get(i)));
        }
        if (norm == 0) {
            throw new IllegalArgumentException("at least one weight of a superposition must differ from 0");
        }
    }

    static void checkLevel(Oscillator oscillator, long n) {
        if (n < 0) {
            throw new IllegalArgumentException("levels are counted from 0, not " + n);
        }
        long count = oscillator.levels().count();
        if (count == 0) {
            throw new IllegalArgumentException(
                    "this " + oscillator.kind() + " has no bound level; prepare a packet in it");
        }
        if (n >= count) {
            throw new IllegalArgumentException("level " + n + " is not bound: this " + oscillator.kind() + " has "
                    + count + " bound level" + (count == 1 ? "" : "s") + ", 0 to " + (count - 1));
        }
    }

    static Superposition equal(Oscillator oscillator, long... levels) {
        List<Long> names = Arrays.stream(levels).boxed().toList();
        return new Superposition(
                oscillator,
                names,
                names.stream().map(n -> 1.0).toList(),
                names.stream().map(n -> 0.0).toList());
    }

    /** The same levels with these real weights. */
    public Superposition weights(double... weights) {
        return weights(weights, new double[weights.length]);
    }

    /** The same levels with these complex weights. */
    public Superposition weights(double[] re, double[] im) {
        return new Superposition(
                oscillator,
                levels,
                Arrays.stream(re).boxed().toList(),
                Arrays.stream(im).boxed().toList());
    }

    @Override
    public String kind() {
        return "superposition";
    }

    @Override
    public Amplitudes amplitudes(double tolerance) {
        return Amplitudes.superposition(
                levels.stream().mapToLong(Long::longValue).toArray(),
                re.stream().mapToDouble(Double::doubleValue).toArray(),
                im.stream().mapToDouble(Double::doubleValue).toArray());
    }

    @Override
    public double meanEnergy() {
        double weighted = 0;
        double total = 0;
        for (int i = 0; i < levels.size(); i++) {
            double weight = Math.hypot(re.get(i), im.get(i));
            weighted += weight * weight * oscillator.levels().energyHigh(levels.get(i));
            total += weight * weight;
        }
        return weighted / total;
    }

    @Override
    public List<Fact> facts() {
        List<Fact> facts = new ArrayList<>();
        facts.add(Fact.exact("levels", "", levels.size(), ONE));
        facts.add(new Shown(oscillator.scale()).energy("mean energy", "⟨E⟩", meanEnergy(), oscillator));
        return List.copyOf(facts);
    }

    @Override
    public List<Fact> given() {
        List<Fact> given = new ArrayList<>();
        for (int i = 0; i < levels.size(); i++) {
            given.add(Fact.exact("level", "", levels.get(i), ONE));
            given.add(Fact.exact("weight, real part", "", re.get(i), ONE));
            given.add(Fact.exact("weight, imaginary part", "", im.get(i), ONE));
        }
        return List.copyOf(given);
    }
}
