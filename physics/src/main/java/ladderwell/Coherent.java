package ladderwell;

import static ladderwell.quantity.Units.ONE;

import java.util.ArrayList;
import java.util.List;
import ladderwell.quantity.Kind;
import ladderwell.quantity.Quantity;
import ladderwell.quantity.Scale;
import ladderwell.quantity.Unit;
import ladderwell.state.Amplitudes;

/**
 * The coherent state |α⟩ of a harmonic oscillator, α = √n̄ e^{iφ}: ⟨x⟩ = √2 ℓ Re α, ⟨p⟩ = √2 (ħ/ℓ) Im α with ℓ = √(ħ/mω),
 * quanta Poisson-distributed about n̄. Its shape stays that of the ground state for ever.
 *
 * @param oscillator the oscillator
 * @param mean mean quanta n̄ = |α|², any real from 0 to 1e8 and beyond
 * @param phaseAngle φ in rad at time 0; φ = 0 starts at the turning point on the +x side
 * @param given the inputs as they were typed
 */
public record Coherent(Ladder oscillator, double mean, double phaseAngle, List<Fact> given) implements State {

    public Coherent {
        Checks.meanQuanta(mean);
        Checks.finite("phase", phaseAngle);
        given = List.copyOf(given);
    }

    static Coherent mean(Ladder oscillator, double mean) {
        return new Coherent(
                oscillator, mean, 0, List.of(Fact.exact("mean", "n̄", Checks.finite("mean quanta", mean), ONE)));
    }

    static Coherent alpha(Ladder oscillator, double re, double im) {
        Checks.finite("the real part of alpha", re);
        Checks.finite("the imaginary part of alpha", im);
        return new Coherent(
                oscillator,
                re * re + im * im,
                Math.atan2(im, re),
                List.of(
                        Fact.exact("alpha, real part", "Re α", re, ONE),
                        Fact.exact("alpha, imaginary part", "Im α", im, ONE)));
    }

    static Coherent at(Ladder oscillator, Quantity displacement, Quantity momentum) {
        Scale scale = oscillator.scale();
        Kind length = scale.position();
        Kind push = length == Kind.NUMBER ? Kind.NUMBER : Kind.MOMENTUM;
        Checks.kind("displacement", displacement, length);
        Checks.kind("momentum", momentum, push);
        double re = displacement.si() / scale.of(Kind.LENGTH) * Math.sqrt(0.5);
        double im = momentum.si() / scale.of(Kind.MOMENTUM) * Math.sqrt(0.5);
        return new Coherent(
                oscillator,
                re * re + im * im,
                Math.atan2(im, re),
                List.of(Fact.exact("displacement", "⟨x⟩", displacement), Fact.exact("momentum", "⟨p⟩", momentum)));
    }

    /** The same state with α turned to this phase: it starts later on the same orbit, clockwise in phase space. */
    public Coherent phase(double value, Unit unit) {
        Quantity phase = Checks.kind("phase", Quantity.of(value, unit), Kind.ANGLE);
        return new Coherent(oscillator, mean, phase.si(), Fact.with(given, Fact.exact("phase", "φ", phase)));
    }

    /** ⟨x⟩ at time 0, scaled. */
    public double position() {
        return Math.sqrt(2 * mean) * Math.cos(phaseAngle);
    }

    /** ⟨p⟩ at time 0, scaled. */
    public double momentum() {
        return Math.sqrt(2 * mean) * Math.sin(phaseAngle);
    }

    @Override
    public String kind() {
        return "coherent";
    }

    @Override
    public Amplitudes amplitudes(double tolerance) {
        return Amplitudes.coherent(mean, phaseAngle, tolerance);
    }

    @Override
    public double meanEnergy() {
        return oscillator.coherentEnergy(
                Math.sqrt(mean) * Math.cos(phaseAngle), Math.sqrt(mean) * Math.sin(phaseAngle));
    }

    @Override
    public List<Fact> facts() {
        Scale scale = oscillator.scale();
        Shown shown = new Shown(scale);
        double uncertainty = Checks.lengthUncertainty(oscillator);
        List<Fact> facts = new ArrayList<>();
        facts.add(Fact.closedForm("mean quanta", "n̄ = |α|²", mean, ONE, 0));
        facts.add(Fact.angle("phase", "φ", phaseAngle));
        double swing = Math.sqrt(2 * mean) * scale.of(Kind.LENGTH);
        facts.add(shown.fact("swing (turning point)", "√(2n̄)·ℓ", Kind.LENGTH, swing, uncertainty));
        facts.add(shown.fact(
                "spread of position", "Δx = ℓ/√2", Kind.LENGTH, scale.of(Kind.LENGTH) * Math.sqrt(0.5), uncertainty));
        facts.add(shown.fact(
                "spread of momentum",
                "Δp = ħ/√2ℓ",
                Kind.MOMENTUM,
                scale.of(Kind.MOMENTUM) * Math.sqrt(0.5),
                uncertainty));
        if (mean > 0) {
            facts.add(Fact.closedForm("spread over swing", "1/(2√n̄)", 0.5 / Math.sqrt(mean), ONE, 0));
        }
        facts.add(shown.energy(
                "mean energy", oscillator instanceof Harmonic ? "(n̄ + ½)ħω" : "⟨α|H|α⟩", meanEnergy(), oscillator));
        facts.add(shown.fact(
                "swing in momentum",
                "√(2n̄)·ħ/ℓ",
                Kind.MOMENTUM,
                Math.sqrt(2 * mean) * scale.of(Kind.MOMENTUM),
                uncertainty));
        return List.copyOf(facts);
    }
}
