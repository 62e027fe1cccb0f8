package ladderwell;

import static ladderwell.quantity.Units.ONE;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.stream.DoubleStream;
import ladderwell.evidence.Bound;
import ladderwell.evidence.PhysicsException;
import ladderwell.level.Levels;
import ladderwell.quantity.Digits;
import ladderwell.quantity.Kind;
import ladderwell.quantity.Quantity;
import ladderwell.quantity.Units;
import ladderwell.state.Amplitudes;
import ladderwell.state.Shape;

/**
 * A level of another oscillator, found in this one after a sudden change: a quench, or a vibronic transition, whose Franck–Condon factors are
 * the populations.
 *
 * @param oscillator where the state is from time 0 on
 * @param source the oscillator whose level it is; of the same particle
 * @param n the level of the source, from 0
 * @param shift by how much the source's origin lies to the right of this one's
 */
public record LevelOf(Oscillator oscillator, Oscillator source, long n, Quantity shift) implements State {

    public LevelOf {
        Superposition.checkLevel(source, n);
        boolean natural = oscillator.scale().isNatural();
        Checks.kind("shift", shift, oscillator.scale().position());
        Checks.finite("shift", shift.si());
        if (natural != source.scale().isNatural()) {
            throw new IllegalArgumentException(
                    "a level can be taken over only between two oscillators in lab units or two in natural units");
        }
        double mass = oscillator.scale().mass();
        if (!(Math.abs(source.scale().mass() - mass) <= 1e-9 * mass)) {
            throw new IllegalArgumentException("a level can be taken over only by the same particle: the masses are "
                    + Digits.significant(source.scale().mass(), 6) + " kg and " + Digits.significant(mass, 6) + " kg");
        }
    }

    static LevelOf of(Oscillator oscillator, Oscillator source, long n) {
        return new LevelOf(
                oscillator,
                source,
                n,
                Quantity.of(0, Units.si(oscillator.scale().position())));
    }

    /** The same with the source's origin moved to the right. */
    public LevelOf shifted(Quantity shift) {
        return new LevelOf(oscillator, source, n, shift);
    }

    @Override
    public String kind() {
        return "level";
    }

    @Override
    public String origin() {
        String of = source.formula().isEmpty() ? "" : ", " + source.formula();
        return (n == 0 ? "ground" : "level " + n) + " of " + source.kind() + of;
    }

    @Override
    public Amplitudes amplitudes(double tolerance) {
        try {
            return Amplitudes.expanded(oscillator.levels(), new Form(this), tolerance);
        } catch (PhysicsException.NotCarried scaled) {
            throw new PhysicsException.NotCarried(
                    origin() + ", wanted to a norm error of " + Digits.shortest(tolerance) + ",",
                    scaled.missingWeight(),
                    scaled.levels(),
                    scaled.remedy());
        }
    }

    Shape shape() {
        return new Form(this);
    }

    /** Kinetic energy as in the source, potential energy as here. */
    @Override
    public double meanEnergy() {
        return new Form(this).energy();
    }

    /**
     * The wave function in this oscillator's scaled units.
     *
     * @param level what it is the wave function of
     */
    private record Form(LevelOf level) implements Shape {
        private static final double DROP = 1e-15;
        private static final int SAMPLES = 4000;

        private double ratio() {
            return level.oscillator.scale().length() / level.source.scale().length();
        }

        private double there(double x) {
            double shift = level.shift.si() / level.oscillator.scale().length();
            return (x - shift) * ratio();
        }

        private double here(double y) {
            double shift = level.shift.si() / level.oscillator.scale().length();
            return y / ratio() + shift;
        }

        private double[] extent() {
            return level.source.levels().extent(level.n, DROP);
        }

        @Override
        public void sample(double[] x, double[] re, double[] im) {
            double[] y = new double[x.length];
            Arrays.setAll(y, i -> there(x[i]));
            double[] wave = level.source.levels().waveFunctions(level.n, 1, y)[0];
            double size = Math.sqrt(ratio());
            for (int i = 0; i < x.length; i++) {
                re[i] = size * wave[i];
                im[i] = 0;
            }
        }

        @Override
        public double left() {
            return Math.max(level.oscillator.left(), here(Math.max(extent()[0], level.source.left())));
        }

        @Override
        public double right() {
            return Math.min(level.oscillator.right(), here(Math.min(extent()[1], level.source.right())));
        }

        @Override
        public double[] breaks() {
            double left = left();
            double right = right();
            return DoubleStream.concat(
                            Arrays.stream(level.oscillator.breaks()),
                            Arrays.stream(level.source.breaks()).map(this::here))
                    .filter(b -> b > left && b < right)
                    .sorted()
                    .distinct()
                    .toArray();
        }

        private double kinetic() {
            double[] extent = extent();
            double least = Shapes.bottom(level.source, extent[0], extent[1]);
            return Math.max(level.source.levels().energyHigh(level.n) - least, 0) * ratio() * ratio();
        }

        @Override
        public double wave() {
            return 2 * Math.sqrt(2 * kinetic()) + 12 / (right() - left());
        }

        @Override
        public double energy() {
            Levels levels = level.source.levels();
            double left = left();
            double right = right();
            double step = (right - left) / SAMPLES;
            double[] y = new double[SAMPLES];
            Arrays.setAll(y, i -> there(left + (i + 0.5) * step));
            double[] wave = levels.waveFunctions(level.n, 1, y)[0];
            double sum = 0;
            double weight = 0;
            for (int i = 0; i < SAMPLES; i++) {
                double density = wave[i] * wave[i];
                double here = level.oscillator.potential(left + (i + 0.5) * step);
                double there = level.source.potential(y[i]) * ratio() * ratio();
                if (density > 1e-25 && Double.isFinite(here) && Double.isFinite(there)) {
                    sum += density * (here - there);
                    weight += density;
                }
            }
            if (weight == 0) {
                throw new IllegalArgumentException("the level lies where this oscillator's potential is infinite");
            }
            return levels.energyHigh(level.n) * ratio() * ratio() + sum / weight;
        }

        @Override
        public double bottom() {
            return Shapes.bottom(level.oscillator, left(), right());
        }
    }

    @Override
    public List<Fact> facts() {
        List<Fact> facts = new ArrayList<>(given());
        facts.add(new Shown(oscillator.scale())
                .scaled(
                        "mean energy",
                        "⟨H⟩",
                        Kind.ENERGY,
                        meanEnergy(),
                        Bound.estimated(1e-6 * Math.abs(meanEnergy())),
                        0));
        return List.copyOf(facts);
    }

    @Override
    public List<Fact> given() {
        List<Fact> given = new ArrayList<>();
        given.add(Fact.exact("level", "n", n, ONE));
        if (shift.si() != 0) {
            given.add(Fact.exact("shift", "d", shift));
        }
        for (Fact fact : source.given()) {
            given.add(new Fact("source's " + fact.name(), fact.symbol(), fact.value(), fact.bound()));
        }
        return List.copyOf(given);
    }
}
