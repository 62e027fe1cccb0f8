package ladderwell;

import java.util.ArrayList;
import java.util.List;
import ladderwell.classical.ClassicalOrbit;
import ladderwell.formula.Formula;
import ladderwell.level.Levels;
import ladderwell.quantity.Scale;

/**
 * A particle in a potential that moves: driven, shaken, quenched slowly. States are prepared in the levels it has at time 0; populations are of
 * those levels.
 *
 * @param kind the trade's name; "potential" for a formula
 * @param start the potential as it stands at time 0
 * @param motion V(x, t) in scaled units
 * @param formula the potential in one line, with its parameters
 * @param given what was typed, for the record: mass and parameters
 */
public record MovingWell(String kind, PotentialWell start, Formula motion, String formula, List<Fact> given)
        implements Oscillator {

    public MovingWell {
        given = List.copyOf(given);
    }

    static MovingWell of(String kind, PotentialWell start, Formula formula, List<Fact> given) {
        Scale scale = start.scale();
        Formula motion = scale.isNatural() ? formula : formula.scaled(scale.length(), scale.time(), scale.energy());
        return new MovingWell(kind, start, motion, formula.text(), given);
    }

    /** The same with its kind, its formula and what was given in the words of a declaration, for card and record. */
    public MovingWell declared(String kind, String formula, List<Fact> given) {
        return new MovingWell(kind, start, motion, formula, given);
    }

    @Override
    public boolean moves() {
        return true;
    }

    @Override
    public Scale scale() {
        return start.scale();
    }

    @Override
    public Levels levels() {
        return start.levels();
    }

    @Override
    public double potential(double x) {
        return start.potential(x);
    }

    @Override
    public double potential(double x, double t) {
        return motion.value(x, t);
    }

    /** The period in the potential at time 0. */
    @Override
    public double classicalPeriod(double energy) {
        return start.classicalPeriod(energy);
    }

    @Override
    public double[] breaks() {
        return start.breaks();
    }

    @Override
    public ClassicalOrbit orbit(double position, double momentum, double energy) {
        return ClassicalOrbit.driven(motion.slope()::value, position, momentum);
    }

    @Override
    public List<Fact> facts() {
        List<Fact> facts = new ArrayList<>(given);
        for (Fact fact : start.facts()) {
            if (start.given().contains(fact)) {
                continue;
            }
            facts.add(new Fact(fact.name() + " at time 0", fact.symbol(), fact.value(), fact.bound()));
        }
        return List.copyOf(facts);
    }
}
