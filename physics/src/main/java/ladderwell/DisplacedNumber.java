package ladderwell;

import static ladderwell.quantity.Units.ONE;

import java.util.ArrayList;
import java.util.List;
import ladderwell.evidence.Bound;
import ladderwell.operator.LadderPolynomial;
import ladderwell.quantity.Kind;
import ladderwell.quantity.Quantity;
import ladderwell.quantity.Unit;
import ladderwell.state.Amplitudes;
import ladderwell.state.HarmonicStates;

/**
 * The displaced number state D(α) |n⟩ of a harmonic mode: it swings like the classical oscillator and keeps the shape of its level.
 *
 * @param oscillator the oscillator
 * @param level n, from 0
 * @param mean quanta |α|² of the displacement
 * @param phaseAngle arg α in rad; 0 starts at the turning point on the +x side
 * @param given the inputs as they were typed
 * @source de Oliveira, Kim, Knight and Buzek, Phys. Rev. A 41 (1990) 2645
 */
public record DisplacedNumber(Ladder oscillator, long level, double mean, double phaseAngle, List<Fact> given)
        implements State {
    private static final long HIGHEST = 1_000_000_000;

    public DisplacedNumber {
        if (level < 0 || level > HIGHEST) {
            throw new IllegalArgumentException(
                    "the level of a displaced number state must lie between 0 and 1e9, not " + level);
        }
        Checks.meanQuanta(mean);
        Checks.finite("phase", phaseAngle);
        given = List.copyOf(given);
    }

    static DisplacedNumber mean(Ladder oscillator, long level, double mean) {
        return new DisplacedNumber(
                oscillator,
                level,
                mean,
                0,
                List.of(
                        Fact.exact("level", "n", level, ONE),
                        Fact.exact("mean", "|α|²", Checks.finite("mean quanta", mean), ONE)));
    }

    static DisplacedNumber alpha(Ladder oscillator, long level, double re, double im) {
        Checks.finite("the real part of alpha", re);
        Checks.finite("the imaginary part of alpha", im);
        return new DisplacedNumber(
                oscillator,
                level,
                re * re + im * im,
                Math.atan2(im, re),
                List.of(
                        Fact.exact("level", "n", level, ONE),
                        Fact.exact("alpha, real part", "Re α", re, ONE),
                        Fact.exact("alpha, imaginary part", "Im α", im, ONE)));
    }

    /** The same with its displacement turned to this phase. */
    public DisplacedNumber phase(double value, Unit unit) {
        Quantity phase = Checks.kind("phase", Quantity.of(value, unit), Kind.ANGLE);
        return new DisplacedNumber(
                oscillator, level, mean, phase.si(), Fact.with(given, Fact.exact("phase", "φ", phase)));
    }

    /** Mean quanta |α|² + n. */
    public double meanQuanta() {
        return mean + level;
    }

    /** Variance of the quanta |α|² (2n + 1). */
    public double varianceOfQuanta() {
        return mean * (2.0 * level + 1);
    }

    @Override
    public String kind() {
        return "displaced number";
    }

    @Override
    public Amplitudes amplitudes(double tolerance) {
        return HarmonicStates.displacedNumber(level, mean, phaseAngle, tolerance);
    }

    @Override
    public double meanEnergy() {
        return energy()[0];
    }

    /** ⟨H⟩ and the size of its terms. */
    private double[] energy() {
        if (oscillator instanceof Harmonic) {
            double value = meanQuanta() + 0.5;
            return new double[] {value, value};
        }
        double root = Math.sqrt(mean);
        LadderPolynomial moved = oscillator
                .energyOperator()
                .shifted(root * Math.cos(phaseAngle), root * Math.sin(phaseAngle))
                .diagonalPart();
        double value = moved.diagonal(level).value();
        return new double[] {value, Math.abs(value) + moved.norm()};
    }

    @Override
    public List<Fact> facts() {
        Shown shown = new Shown(oscillator.scale());
        double uncertainty = Checks.lengthUncertainty(oscillator);
        List<Fact> facts = new ArrayList<>();
        facts.add(Fact.exact("level", "n", level, ONE));
        facts.add(Fact.closedForm("quanta of the displacement", "|α|²", mean, ONE, 0));
        facts.add(Fact.angle("phase", "φ", phaseAngle));
        facts.add(Fact.closedForm("mean quanta", "|α|² + n", meanQuanta(), ONE, 0));
        facts.add(Fact.closedForm("variance of quanta", "|α|²(2n + 1)", varianceOfQuanta(), ONE, 0));
        if (meanQuanta() > 0) {
            facts.add(Fact.closedForm("Fano factor", "Var n/⟨n⟩", varianceOfQuanta() / meanQuanta(), ONE, 0));
        }
        Bound rounding = Bound.guaranteed(8 * Math.ulp(Math.sqrt(level + 0.5)));
        facts.add(shown.scaled(
                "swing",
                "√2|α|·ℓ",
                Kind.LENGTH,
                Math.sqrt(2 * mean),
                Bound.guaranteed(8 * Math.ulp(Math.sqrt(2 * mean))),
                uncertainty));
        facts.add(shown.scaled(
                "spread of position", "Δx = √(n + ½)·ℓ", Kind.LENGTH, Math.sqrt(level + 0.5), rounding, uncertainty));
        facts.add(shown.scaled(
                "spread of momentum",
                "Δp = √(n + ½)·ħ/ℓ",
                Kind.MOMENTUM,
                Math.sqrt(level + 0.5),
                rounding,
                uncertainty));
        double[] energy = energy();
        facts.add(shown.ladderEnergy(
                oscillator instanceof Harmonic ? "(|α|² + n + ½)ħω" : "⟨H⟩", energy[0], energy[1], oscillator));
        return List.copyOf(facts);
    }
}
