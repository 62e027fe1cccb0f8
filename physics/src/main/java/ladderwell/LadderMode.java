package ladderwell;

import java.util.ArrayList;
import java.util.List;
import ladderwell.classical.ClassicalOrbit;
import ladderwell.level.Levels;
import ladderwell.mode.Jump;
import ladderwell.mode.Mode;
import ladderwell.operator.LadderPolynomial;
import ladderwell.operator.OperatorFormula;
import ladderwell.quantity.Kind;
import ladderwell.quantity.Quantity;
import ladderwell.quantity.Scale;
import ladderwell.quantity.Unit;
import ladderwell.quantity.Units;
import tech.tablesaw.api.Table;

/**
 * A nonlinear, driven or lossy mode on the number states of its ladder. Position and momentum are the quadratures (a + a†)/√2 and
 * −i(a − a†)/√2, in the frame of the mode.
 *
 * @param kind the trade's name: "kerr", "duffing", "hamiltonian"
 * @param mode Hamiltonian, jumps and frame
 * @param scale time unit; natural for a natural mode
 * @param given what was typed, for the record
 */
public record LadderMode(String kind, Mode mode, Scale scale, List<Fact> given) implements Ladder {
    /** Relative error of an energy: the coefficients in the scale's unit, a few roundings. */
    private static final double ENERGY_ERROR = 0x1p-51;

    public LadderMode {
        given = List.copyOf(given);
        if (mode.natural() != scale.isNatural()) {
            throw new IllegalArgumentException(
                    "a mode in natural units needs the natural scale, one in lab units a lab scale");
        }
        mode.runawayWarning(0).ifPresent(words -> {
            throw new IllegalArgumentException(words);
        });
    }

    /** A mode with a time unit of its own: 1 over its frequency, or over the largest coefficient of H where it has none. */
    static LadderMode of(String kind, Mode mode, List<Fact> given) {
        if (mode.natural()) {
            return new LadderMode(kind, mode, Scale.natural(), given);
        }
        double omega = Math.abs(mode.omega());
        if (omega == 0) {
            LadderPolynomial h = mode.hamiltonian().at(0);
            omega = h.isZero() ? largestRate(mode) : h.norm();
        }
        return new LadderMode(kind, mode, Scale.mode(omega), given);
    }

    private static double largestRate(Mode mode) {
        double most = 0;
        for (Jump jump : mode.jumps()) {
            most = Math.max(most, jump.rate().perSecond());
        }
        if (most == 0) {
            throw new IllegalArgumentException(
                    "a mode needs a frequency, a Hamiltonian or a rate; everything here is 0");
        }
        return most;
    }

    private double unit() {
        return scale.isNatural() ? 1 : scale.angularFrequency();
    }

    /** H/ħ in the frame of the mode, in scaled units. */
    OperatorFormula hamiltonian() {
        OperatorFormula h = mode.hamiltonian();
        return scale.isNatural() ? h : h.scaled(unit());
    }

    /** √γ L of each jump that happens, in scaled units. */
    List<LadderPolynomial> jumps() {
        List<LadderPolynomial> all = new ArrayList<>();
        for (Jump jump : mode.jumps()) {
            if (jump.rate().perSecond() > 0) {
                all.add(jump.scaledOperator().times(1 / Math.sqrt(unit())));
            }
        }
        return all;
    }

    /** Whether number states keep their populations: nothing jumps, and H is diagonal and does not vary. */
    boolean isDiagonal() {
        OperatorFormula h = mode.hamiltonian();
        return jumps().isEmpty() && !h.dependsOnTime() && h.constant().bandwidth() == 0;
    }

    @Override
    public boolean moves() {
        return mode.hamiltonian().dependsOnTime();
    }

    /** Levels where the Hamiltonian is diagonal; else the number states, whose energies are the means ⟨n|H|n⟩ at time 0. */
    @Override
    public Levels levels() {
        LadderPolynomial h = hamiltonian().at(0).diagonalPart();
        return Levels.ofNumberStates(h::diagonal, ENERGY_ERROR);
    }

    @Override
    public Table levelTable(long... levels) {
        if (!isDiagonal()) {
            throw new IllegalArgumentException(
                    "a mode that is driven, lossy or mixes its number states has no table of levels here; "
                            + "ask a run for populations");
        }
        return LevelColumns.of(this, levels);
    }

    @Override
    public Table levelTable(int count) {
        return levelTable(LevelColumns.lowest(count));
    }

    @Override
    public double coherentEnergy(double re, double im) {
        return hamiltonian().at(0).coherentMean(re, im)[0];
    }

    @Override
    public LadderPolynomial energyOperator() {
        return hamiltonian().at(0);
    }

    @Override
    public double numberEnergy(long n) {
        return hamiltonian().at(0).diagonalPart().diagonal(n).value();
    }

    /** x²/2: the curvature of the mode at rest, for pictures. */
    @Override
    public double potential(double x) {
        return x * x / 2;
    }

    /** 2π/ω of the mode at rest in the lab, whatever the energy. */
    @Override
    public double classicalPeriod(double energy) {
        double omega = Math.abs(
                mode.omega() != 0 ? mode.omega() : mode.hamiltonian().at(0).re(1, 1));
        if (omega == 0) {
            throw new IllegalArgumentException(
                    "this mode has no frequency and so no period; give times in units of time");
        }
        return 2 * Math.PI / omega * unit();
    }

    /** The mean-field orbit: ⟨a⟩ as if every product were that of means. */
    @Override
    public ClassicalOrbit orbit(double position, double momentum, double energy) {
        LadderPolynomial a = LadderPolynomial.a();
        LadderPolynomial decay = LadderPolynomial.zero();
        for (LadderPolynomial g : jumps()) {
            LadderPolynomial adjoint = g.adjoint();
            decay = decay.plus(adjoint.times(a.commutator(g)))
                    .plus(adjoint.commutator(a).times(g));
        }
        LadderPolynomial damping = decay.times(0.5);
        OperatorFormula force = hamiltonian().each(h -> h.commutator(a).times(0, 1));
        boolean moves = force.dependsOnTime();
        LadderPolynomial still = force.at(0).plus(damping);
        double root = Math.sqrt(0.5);
        return ClassicalOrbit.along(
                (t, x, p, out) -> {
                    LadderPolynomial at = moves ? force.at(t).plus(damping) : still;
                    double[] velocity = at.coherentMean(x * root, p * root);
                    out[0] = velocity[0] / root;
                    out[1] = velocity[1] / root;
                },
                position,
                momentum);
    }

    @Override
    public String formula() {
        StringBuilder text =
                new StringBuilder("H/ħ = ").append(mode.hamiltonian().text());
        text.append(scale.isNatural() ? "" : " (rad/s)");
        if (!mode.frame().isLab()) {
            text.append(", ").append(mode.frame());
            for (String words : mode.neglected()) {
                text.append("; left out: ").append(words);
            }
        }
        return text.toString();
    }

    @Override
    public List<Fact> facts() {
        List<Fact> facts = new ArrayList<>(given);
        if (scale.isNatural()) {
            return List.copyOf(facts);
        }
        // shown with its ω below
        facts.removeIf(fact -> fact.name().equals("frequency"));
        Shown shown = new Shown(scale);
        double omega = Math.abs(mode.omega());
        if (omega > 0) {
            facts.add(shown.fact("frequency", "ν", Kind.CYCLE_FREQUENCY, omega / (2 * Math.PI), 0));
            facts.add(shown.fact("angular frequency", "ω = 2πν", Kind.ANGULAR_FREQUENCY, omega, 0));
            facts.add(shown.fact("period", "T = 1/ν", Kind.TIME, 2 * Math.PI / omega, 0));
        }
        if (!mode.frame().isLab()) {
            double frame = mode.frame().frequency();
            facts.add(shown.fact("frame", "ω_f/2π", Kind.CYCLE_FREQUENCY, frame / (2 * Math.PI), 0));
            facts.add(shown.fact(
                    "detuning", "(ω − ω_f)/2π", Kind.CYCLE_FREQUENCY, (mode.omega() - frame) / (2 * Math.PI), 0));
        }
        for (Jump jump : mode.jumps()) {
            double rate = jump.rate().perSecond();
            if (rate > 0) {
                facts.add(shown.fact("rate of " + jump.name(), "γ", Kind.ANGULAR_FREQUENCY, rate, 0));
                facts.add(shown.fact("the same as a linewidth", "γ/2π", Kind.CYCLE_FREQUENCY, rate / (2 * Math.PI), 0));
                facts.add(shown.fact("the same as a lifetime", "1/γ", Kind.TIME, 1 / rate, 0));
                if (omega > 0 && jump.name().equals("loss")) {
                    facts.add(Fact.closedForm("quality factor", "ω/γ", omega / rate, Units.ONE, 0));
                }
            }
        }
        return List.copyOf(facts);
    }

    /** A time in the unit that reads well. */
    Quantity lab(double scaled) {
        Unit unit = scale.display(Kind.TIME, scaled * scale.time());
        return Quantity.of(unit.fromSi(scaled * scale.time()), unit);
    }
}
