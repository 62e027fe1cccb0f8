package ladderwell;

import static ladderwell.quantity.Units.ONE;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import ladderwell.classical.ClassicalOrbit;
import ladderwell.evidence.Bound;
import ladderwell.level.Levels;
import ladderwell.quantity.Constants;
import ladderwell.quantity.Kind;
import ladderwell.quantity.Quantity;
import ladderwell.quantity.Scale;
import ladderwell.quantity.Unit;

/**
 * The finite square well: V = 0 for |x| &lt; L/2, V = depth outside. Scaled: lengths in L, energies in ħ²/mL². All bound
 * levels are known, from 0 up; above the depth nothing is bound.
 *
 * @param mass the mass; empty for natural units (ħ = m = L = 1)
 * @param width the full width L; empty for natural units
 * @param depth the depth; in units of ħ²/mL² (a plain number) for natural units
 * @param levels the bound levels, made from the others
 */
public record FiniteWell(Optional<Quantity> mass, Optional<Quantity> width, Quantity depth, Levels levels)
        implements Oscillator {

    /** A finite well on the way: its mass, or natural units. */
    public static final class Declaring {
        Declaring() {}

        /** The well with ħ = m = L = 1 and the given depth in that unit of energy. */
        public FiniteWell natural(double depth) {
            return of(Optional.empty(), Optional.empty(), Quantity.of(depth, ONE));
        }

        /** The mass; then give width and depth. */
        public WithMass mass(double value, Unit unit) {
            return new WithMass(Checks.positive("mass", Quantity.of(value, unit), Kind.MASS));
        }
    }

    /** A finite well with its mass, waiting for width and depth. */
    public record WithMass(Quantity mass) {

        /** The full width L; then give the depth. */
        public WithWidth width(double value, Unit unit) {
            return new WithWidth(mass, Checks.positive("width", Quantity.of(value, unit), Kind.LENGTH));
        }
    }

    /** A finite well with mass and width, waiting for its depth. */
    public record WithWidth(Quantity mass, Quantity width) {

        /** The depth, as an energy. */
        public FiniteWell depth(double value, Unit unit) {
            return of(Optional.of(mass), Optional.of(width), Quantity.of(value, unit));
        }
    }

    private static FiniteWell of(Optional<Quantity> mass, Optional<Quantity> width, Quantity depth) {
        Checks.positive("depth", depth, mass.isPresent() ? Kind.ENERGY : Kind.NUMBER);
        Scale scale = scale(mass, width);
        return new FiniteWell(mass, width, depth, Levels.finiteWell(depth.si() / scale.energy()));
    }

    private static Scale scale(Optional<Quantity> mass, Optional<Quantity> width) {
        return mass.map(m -> Scale.of(m.si(), width.orElseThrow().si())).orElseGet(Scale::natural);
    }

    @Override
    public String kind() {
        return "finite well";
    }

    @Override
    public Scale scale() {
        return scale(mass, width);
    }

    /** The depth in scaled energy. */
    public double scaledDepth() {
        return levels.threshold();
    }

    @Override
    public double potential(double x) {
        return Math.abs(x) < 0.5 ? 0 : scaledDepth();
    }

    @Override
    public double[] breaks() {
        return new double[] {-0.5, 0.5};
    }

    @Override
    public double classicalPeriod(double energy) {
        if (energy >= scaledDepth()) {
            throw new IllegalArgumentException("at this energy the classical particle leaves the well");
        }
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
        given.add(Fact.exact("depth", "V₀", depth));
        return List.copyOf(given);
    }

    @Override
    public List<Fact> facts() {
        Scale scale = scale();
        double boxGround = Math.PI * Math.PI / 2;
        List<Fact> facts = new ArrayList<>();
        mass.ifPresent(m -> facts.add(Fact.exact("mass", "m", m)));
        width.ifPresent(w -> facts.add(Fact.exact("width", "L", w)));
        facts.add(Fact.exact("depth", "V₀", depth));
        facts.add(Fact.exact("bound levels", "", levels.count(), ONE));
        double uncertainty = mass.map(Checks::relativeUncertainty).orElse(0.0);
        facts.add(Fact.closedForm(
                "depth over the box's ground energy", "V₀/(π²ħ²/2mL²)", scaledDepth() / boxGround, ONE, uncertainty));
        facts.add(level("ground energy", "E₀", 0, scale, uncertainty));
        if (levels.count() > 1) {
            facts.add(
                    level("highest bound level", "E_" + (levels.count() - 1), levels.count() - 1, scale, uncertainty));
            double spacing = levels.energyHigh(1) - levels.energyHigh(0);
            if (!scale.isNatural()) {
                facts.add(new Shown(scale)
                        .fact(
                                "first spacing as a frequency",
                                "(E₁ − E₀)/h",
                                Kind.CYCLE_FREQUENCY,
                                spacing * scale.energy() / Constants.PLANCK,
                                uncertainty));
            }
        }
        return List.copyOf(facts);
    }

    private Fact level(String name, String symbol, long n, Scale scale, double uncertainty) {
        double si = levels.energyHigh(n) * scale.energy();
        double error = levels.energyError(n) * scale.energy() + 4 * Math.ulp(si);
        Unit unit = scale.display(Kind.ENERGY, si);
        double inUnit = unit.fromSi(si);
        double factor = si == 0 ? 1 : inUnit / si;
        Bound bound = uncertainty == 0
                ? Bound.guaranteed(error * factor)
                : Bound.statistical((error + si * uncertainty) * factor);
        return new Fact(name, symbol, Quantity.of(inUnit, unit), bound);
    }
}
