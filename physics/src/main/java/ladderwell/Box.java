package ladderwell;

import static ladderwell.quantity.Units.ONE;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import ladderwell.classical.ClassicalOrbit;
import ladderwell.level.Levels;
import ladderwell.quantity.Constants;
import ladderwell.quantity.Kind;
import ladderwell.quantity.Quantity;
import ladderwell.quantity.Scale;
import ladderwell.quantity.Unit;

/**
 * The box: V = 0 for |x| &lt; L/2, infinite outside. Scaled: lengths in L, energies in ħ²/mL², E_n = π²(n+1)²/2 with n from
 * 0. Everything returns after T_rev = 4mL²/πħ (Robinett, Phys. Rep. 392 (2004) 1).
 *
 * @param mass the mass; empty for natural units
 * @param width the full width L; empty for natural units (L = 1)
 */
public record Box(Optional<Quantity> mass, Optional<Quantity> width) implements Oscillator {

    private static final Levels LEVELS = Levels.box();

    /** T_rev in scaled time mL²/ħ. */
    public static final double REVIVAL_TIME = 4 / Math.PI;

    public Box {
        if (mass.isPresent() != width.isPresent()) {
            throw new IllegalArgumentException("a box needs a mass and a width, or neither (natural units)");
        }
        mass.ifPresent(m -> Checks.positive("mass", m, Kind.MASS));
        width.ifPresent(w -> Checks.positive("width", w, Kind.LENGTH));
        if (mass.isPresent()) {
            // refuses a mass and a width whose scale leaves the range of numbers
            Scale.of(mass.orElseThrow().si(), width.orElseThrow().si());
        }
    }

    /** A box on the way: its mass, or natural units. */
    public static final class Declaring {
        Declaring() {}

        /** The box with ħ = m = L = 1. */
        public Box natural() {
            return new Box(Optional.empty(), Optional.empty());
        }

        /** The mass; then give the width. */
        public WithMass mass(double value, Unit unit) {
            return new WithMass(Checks.positive("mass", Quantity.of(value, unit), Kind.MASS));
        }
    }

    /** A box with its mass, waiting for its width. */
    public record WithMass(Quantity mass) {

        /** The full width L. */
        public Box width(double value, Unit unit) {
            return new Box(Optional.of(mass), Optional.of(Quantity.of(value, unit)));
        }
    }

    @Override
    public String kind() {
        return "box";
    }

    @Override
    public Scale scale() {
        return mass.map(m -> Scale.of(m.si(), width.orElseThrow().si())).orElseGet(Scale::natural);
    }

    @Override
    public Levels levels() {
        return LEVELS;
    }

    @Override
    public double potential(double x) {
        return Math.abs(x) < 0.5 ? 0 : Double.POSITIVE_INFINITY;
    }

    @Override
    public double left() {
        return -0.5;
    }

    @Override
    public double right() {
        return 0.5;
    }

    @Override
    public double classicalPeriod(double energy) {
        return 2 / Math.sqrt(2 * energy);
    }

    @Override
    public ClassicalOrbit orbit(double position, double momentum, double energy) {
        return ClassicalOrbit.bouncing(position, momentum, energy, 0.5);
    }

    @Override
    public List<Fact> given() {
        List<Fact> given = new ArrayList<>();
        mass.ifPresent(m -> given.add(Fact.exact("mass", "m", m)));
        width.ifPresent(w -> given.add(Fact.exact("width", "L", w)));
        return List.copyOf(given);
    }

    @Override
    public List<Fact> facts() {
        Scale scale = scale();
        double ground = LEVELS.energyHigh(0);
        if (scale.isNatural()) {
            return List.of(
                    Fact.exact("mass", "m", 1, ONE),
                    Fact.exact("width", "L", 1, ONE),
                    Fact.closedForm("ground energy", "π²ħ²/2mL²", ground, ONE, 0),
                    Fact.closedForm("revival time", "4mL²/πħ", REVIVAL_TIME, ONE, 0));
        }
        double uncertainty = Checks.relativeUncertainty(mass.orElseThrow());
        Shown shown = new Shown(scale);
        return List.of(
                Fact.exact("mass", "m", mass.orElseThrow()),
                Fact.exact("width", "L", width.orElseThrow()),
                shown.fact("ground energy", "E₀ = π²ħ²/2mL²", Kind.ENERGY, ground * scale.energy(), uncertainty),
                shown.fact("first spacing", "E₁ − E₀", Kind.ENERGY, 3 * ground * scale.energy(), uncertainty),
                shown.fact(
                        "first spacing as a frequency",
                        "(E₁ − E₀)/h",
                        Kind.CYCLE_FREQUENCY,
                        3 * ground * scale.energy() / Constants.PLANCK,
                        uncertainty),
                shown.fact("revival time", "4mL²/πħ", Kind.TIME, REVIVAL_TIME * scale.time(), uncertainty));
    }
}
