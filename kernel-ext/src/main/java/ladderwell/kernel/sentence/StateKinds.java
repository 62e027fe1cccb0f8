package ladderwell.kernel.sentence;

import static ladderwell.quantity.Kind.ANGLE;
import static ladderwell.quantity.Kind.LENGTH;
import static ladderwell.quantity.Kind.MOMENTUM;

/** The kinds of state, as the table of the language lists them. */
final class StateKinds {
    private static final NounKind NUMBER = NounKind.of(
                    "number",
                    "number state",
                    "one level of the oscillator, the Fock state |n⟩ of a harmonic one",
                    "|n⟩")
            .alias("fock")
            .keys(Key.count("level", 0, Long.MAX_VALUE, "3", "the level n, counted from 0"))
            .ways(Way.of("level"));

    private static final NounKind COHERENT = NounKind.of(
                    "coherent",
                    "coherent state",
                    "the state that swings like the classical oscillator and keeps its shape",
                    "|α⟩, α = √n̄ e^{iφ},  a|α⟩ = α|α⟩")
            .homes("harmonic", "kerr", "duffing", "hamiltonian")
            .keys(
                    Key.of("mean", Form.NUMBER, "9.5", "mean quanta n̄, any real number from 0")
                            .formula("n̄ = |α|²"),
                    Key.quantity("phase", "phase φ of α at time 0; 0 starts at the turning point on the +x side", ANGLE)
                            .standard("0 deg"),
                    Key.of("alpha", Form.COMPLEX, "1.5+0.5i", "the amplitude α").formula("n̄ = |α|²"),
                    Key.quantity("displacement", "mean position at time 0", LENGTH)
                            .formula("⟨x⟩ = √2 ℓ Re α,  ℓ = √(ħ/mω)")
                            .standard("0 where a momentum is given"),
                    Key.quantity("momentum", "mean momentum at time 0", MOMENTUM)
                            .formula("⟨p⟩ = √2 (ħ/ℓ) Im α,  ℓ = √(ħ/mω)")
                            .standard("0 where a displacement is given"))
            .ways(
                    Way.of("mean").with("phase"),
                    Way.of("alpha"),
                    Way.of("displacement").with("momentum"),
                    Way.of("momentum").with("displacement"));

    private static final NounKind SUPERPOSITION = NounKind.of(
                    "superposition",
                    "superposition",
                    "several levels at once, each with its weight",
                    "Σ w_j |n_j⟩ / √(Σ |w_j|²)")
            .keys(
                    Key.of("levels", Form.COUNTS, "0 1 2", "the levels, counted from 0, each once"),
                    Key.of("weights", Form.COMPLEXES, "1 1i 0.5-0.2i", "weights of the levels, in the same order")
                            .formula("only their ratios count; the state is normalised")
                            .standard("all equal"))
            .ways(Way.of("levels").with("weights"));

    private static final NounKind GAUSSIAN = NounKind.of(
                    "gaussian",
                    "Gaussian packet",
                    "a packet thrown into an oscillator; what the bound levels cannot carry is refused",
                    "ψ ∝ exp(−(x − x₀)²/4Δx² + ip₀(x − x₀)/ħ),  ΔxΔp = ħ/2")
            .keys(
                    Key.quantity(
                                    "position",
                                    "mean position x₀, measured from the origin; the middle of a box or well",
                                    LENGTH,
                                    ANGLE)
                            .standard("0"),
                    Key.quantity("momentum", "mean momentum p₀", MOMENTUM).standard("0, at rest"),
                    Key.quantity("spread", "standard deviation Δx of the position", LENGTH, ANGLE))
            .ways(Way.of("spread").with("position", "momentum"));

    private static final Key SHIFT = Key.quantity(
                    "shift", "how far the other oscillator lies to the right", LENGTH, ANGLE)
            .standard("0");
    private static final Key OF = Key.reference("of", "oscillator", "cold", "the oscillator whose level it is");

    private static final NounKind GROUND = NounKind.of(
                    "ground",
                    "ground state of another oscillator",
                    "the ground state of another oscillator of the same particle, found in this one after a sudden change",
                    "Σ |k⟩⟨k|0′⟩")
            .links(OF)
            .keys(SHIFT)
            .ways(Way.of().with("shift"));

    private static final NounKind LEVEL = NounKind.of(
                    "level",
                    "level of another oscillator",
                    "a level of another oscillator of the same particle, found in this one after a sudden change",
                    "Σ |k⟩⟨k|n′⟩")
            .argument(
                    Key.count("number", 0, Long.MAX_VALUE, "3", "the level n of the other oscillator, counted from 0"))
            .links(OF)
            .keys(SHIFT)
            .ways(Way.of().with("shift"));

    private StateKinds() {}

    static NounKind[] all() {
        return new NounKind[] {COHERENT, NUMBER, SUPERPOSITION, GAUSSIAN, GROUND, LEVEL};
    }
}
