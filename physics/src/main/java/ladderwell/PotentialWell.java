package ladderwell;

import static ladderwell.quantity.Units.ONE;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import ladderwell.classical.ClassicalOrbit;
import ladderwell.classical.Landscape;
import ladderwell.evidence.Bound;
import ladderwell.level.Levels;
import ladderwell.level.PotentialCurve;
import ladderwell.potential.Potential;
import ladderwell.quantity.Kind;
import ladderwell.quantity.Scale;

/**
 * A particle in any potential that binds it: a named one, a formula, a table of points. Scaled as {@link Potential#scale} says.
 *
 * <p>Levels of a polynomial are guaranteed as long as a basis proves them; all others are estimated, or statistical where the potential itself
 * is uncertain.
 *
 * @param kind the trade's name: "morse", "double well", …; "potential" for a formula
 * @param potential the potential
 * @param formula the potential in one line, with its parameters
 * @param given what was typed, for the record: mass and parameters
 * @param levels the levels, made from the potential
 */
public record PotentialWell(String kind, Potential potential, String formula, List<Fact> given, Levels levels)
        implements Oscillator {

    public PotentialWell {
        given = List.copyOf(given);
    }

    /**
     * A particle in a potential.
     *
     * @param boundaryPhase for one that repeats: what the wave function is turned by after one period; 0 for a pendulum, 2π n_g for a
     *     junction with offset charge n_g; ignored by all others
     * @throws IllegalArgumentException if the potential binds nothing
     */
    static PotentialWell of(String kind, Potential potential, double boundaryPhase, List<Fact> given) {
        Curve curve = new Curve(potential);
        Levels levels;
        if (!potential.confines()) {
            levels = Levels.none();
        } else if (potential.period().isPresent()) {
            levels = Levels.onCircle(curve, potential.period().getAsDouble(), boundaryPhase);
        } else if (potential.polynomial().isPresent() && curve.isOpen()) {
            levels = Levels.polynomial(potential.polynomial().orElseThrow());
        } else {
            levels = Levels.of(curve);
        }
        if (potential.uncertainty() > 0 && levels.count() > 0) {
            levels = levels.within(potential.uncertainty());
        }
        if (levels.count() == 0 && potential.confines()) {
            throw new IllegalArgumentException("the potential " + potential.text() + " has no bound level");
        }
        return new PotentialWell(kind, potential, potential.text(), given, levels);
    }

    /** The same with its kind, its formula and what was given in the words of a declaration, for card and record. */
    public PotentialWell declared(String kind, String formula, List<Fact> given) {
        return new PotentialWell(kind, potential, formula, given, levels);
    }

    /** The potential as level solvers and classical orbits see it. */
    private record Curve(Potential potential) implements PotentialCurve, Landscape {
        @Override
        public double value(double x) {
            return potential.value(x);
        }

        @Override
        public double slope(double x) {
            return potential.slope(x);
        }

        @Override
        public double left() {
            return potential.left();
        }

        @Override
        public double right() {
            return potential.right();
        }

        @Override
        public double[] breaks() {
            return potential.breaks();
        }

        @Override
        public boolean isEven() {
            return potential.isEven();
        }

        @Override
        public boolean turns() {
            return potential.period().isPresent();
        }

        boolean isOpen() {
            return Double.isInfinite(left()) && Double.isInfinite(right());
        }
    }

    @Override
    public Scale scale() {
        return potential.scale();
    }

    @Override
    public double potential(double x) {
        return potential.value(x);
    }

    @Override
    public double[] breaks() {
        return potential.breaks();
    }

    @Override
    public double left() {
        return potential.left();
    }

    @Override
    public double right() {
        return potential.right();
    }

    @Override
    public double classicalPeriod(double energy) {
        return ClassicalOrbit.period(new Curve(potential), inside(), energy);
    }

    /** The minimum, or a place beside it where that is a singular end. */
    private double inside() {
        double minimum = potential.minimum();
        if (minimum <= potential.left()) {
            return potential.left() + 1e-6;
        }
        return minimum >= potential.right() ? potential.right() - 1e-6 : minimum;
    }

    @Override
    public ClassicalOrbit orbit(double position, double momentum, double energy) {
        return ClassicalOrbit.through(new Curve(potential), position, momentum);
    }

    /** V at its minimum, scaled; −∞ at a singular end. */
    private double bottom() {
        return potential.value(potential.minimum());
    }

    /**
     * ω of small swings about the minimum, scaled, with its estimated error; empty where V has no parabola there.
     */
    private Optional<double[]> smallSwings() {
        double x = potential.minimum();
        double[] curvature = new double[2];
        for (int k = 0; k < 2; k++) {
            double h = 1e-4 * (k + 1);
            if (!(x - h > potential.left() && x + h < potential.right())) {
                return Optional.empty();
            }
            curvature[k] = (potential.slope(x + h) - potential.slope(x - h)) / (2 * h);
        }
        double best = (4 * curvature[0] - curvature[1]) / 3;
        double off = Math.abs(curvature[1] - curvature[0]) + 1e-9 * Math.abs(best);
        if (!(best > 10 * off) || !Double.isFinite(best)) {
            return Optional.empty();
        }
        return Optional.of(new double[] {Math.sqrt(best), off / (2 * Math.sqrt(best))});
    }

    @Override
    public List<Fact> facts() {
        Scale scale = scale();
        Shown shown = new Shown(scale);
        double uncertainty = shown.massUncertainty(this);
        List<Fact> facts = new ArrayList<>(given);
        smallSwings().ifPresent(swing -> {
            Kind kind = Kind.ANGULAR_FREQUENCY;
            Bound bound = Bound.estimated(swing[1]);
            if (scale.isNatural()) {
                facts.add(shown.scaled("small swings", "ω", kind, swing[0], bound, 0));
            } else {
                facts.add(shown.scaled(
                        "small swings", "ν", Kind.CYCLE_FREQUENCY, swing[0] / (2 * Math.PI), bound, uncertainty));
                facts.add(shown.scaled("small swings", "ω = 2πν", kind, swing[0], bound, uncertainty));
            }
        });
        if (Double.isFinite(potential.edge())) {
            facts.add(shown.scaled(
                    "edge above the minimum",
                    "V(∞) − V_min",
                    Kind.ENERGY,
                    potential.edge() - bottom(),
                    Bound.guaranteed(0),
                    0));
            if (levels.count() < Long.MAX_VALUE) {
                facts.add(Fact.exact("bound levels", "", levels.count(), ONE));
            }
        }
        if (levels.count() > 0) {
            facts.add(shown.level("ground energy", "E₀", this, 0));
        }
        if (levels.count() > 1) {
            facts.add(shown.scaled(
                    "first spacing",
                    "E₁ − E₀",
                    Kind.ENERGY,
                    levels.splitting(0),
                    levels.splittingBound(0),
                    uncertainty));
            if (!scale.isNatural()) {
                Bound spacing = levels.splittingBound(0);
                double perHertz = 1 / (2 * Math.PI);
                facts.add(shown.scaled(
                        "first spacing as a frequency",
                        "(E₁ − E₀)/h",
                        Kind.CYCLE_FREQUENCY,
                        levels.splitting(0) * perHertz,
                        new Bound(spacing.kind(), spacing.size() * perHertz),
                        uncertainty));
            }
        }
        return List.copyOf(facts);
    }
}
