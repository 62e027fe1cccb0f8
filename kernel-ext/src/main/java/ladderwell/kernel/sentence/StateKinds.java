package ladderwell.kernel.sentence;

import static ladderwell.quantity.Kind.ANGLE;
import static ladderwell.quantity.Kind.LENGTH;
import static ladderwell.quantity.Kind.MOMENTUM;
import static ladderwell.quantity.Kind.SQUEEZING;

/** The kinds of state, as the table of the language lists them. */
final class StateKinds {
    /** Oscillators with quanta. */
    private static final String[] LADDERS = {"harmonic", "kerr", "duffing", "hamiltonian"};

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
            .homes(LADDERS)
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

    private static final NounKind SQUEEZED = NounKind.of(
                    "squeezed",
                    "squeezed state",
                    "the vacuum with one quadrature less uncertain than the other, displaced where a mean is given",
                    "D(α) S(ξ)|0⟩,  S(ξ) = exp[(ξ* a² − ξ a†²)/2],  ξ = r e^{2iθ}")
            .homes(LADDERS)
            .keys(
                    Key.quantity("squeezing", "how far the least variance lies below that of the vacuum", SQUEEZING)
                            .formula("10 log₁₀ e^{2r} dB; 6 dB is r = 0.691"),
                    Key.of("r", Form.NUMBER, "0.7", "the squeezing parameter r in place of dB, from 0 to 5")
                            .formula("least variance e^{−2r}/2, largest e^{2r}/2; the vacuum has ½"),
                    Key.quantity("angle", "angle θ of the quadrature of least variance; 0 squeezes the position", ANGLE)
                            .formula("x cos θ + p sin θ")
                            .standard("0 deg"),
                    Key.of("mean", Form.NUMBER, "4", "quanta |α|² of a displacement that follows the squeezing")
                            .standard("0, the squeezed vacuum"),
                    Key.quantity("phase", "phase of the displacement α; 0 displaces to the +x side", ANGLE)
                            .standard("0 deg"))
            .ways(
                    Way.of("squeezing").with("angle", "mean", "phase"),
                    Way.of("r").with("angle", "mean", "phase"));

    private static final NounKind CAT = NounKind.of(
                    "cat",
                    "cat state",
                    "coherent states evenly on a circle, all at once",
                    "Σ_j e^{ijχ}|α e^{2πij/k}⟩, normalised;  |α⟩ ± |−α⟩ for two")
            .homes(LADDERS)
            .keys(
                    Key.of("mean", Form.NUMBER, "4", "mean quanta of each component")
                            .formula("|α|²"),
                    Key.count("components", 2, 64, "2", "number k of coherent components")
                            .standard("2"),
                    Key.choice(
                                    "parity",
                                    "which levels of a cat of two components remain: the even or the odd ones",
                                    "even",
                                    "odd")
                            .formula("even: |α⟩ + |−α⟩;  odd: |α⟩ − |−α⟩")
                            .standard("even"),
                    Key.count("residue", 0, 63, "1", "the levels that remain, n ≡ residue modulo the components")
                            .formula("χ = −2π residue/k")
                            .standard("0"),
                    Key.quantity("relative phase", "phase χ from each component to the next", ANGLE)
                            .formula("|α⟩ + e^{iχ}|−α⟩ for two"),
                    Key.quantity("phase", "phase of α, the first component; 0 lies on the +x side", ANGLE)
                            .standard("0 deg"))
            .ways(
                    Way.of("mean").with("components", "parity", "phase"),
                    Way.of("mean").with("components", "relative phase", "phase"),
                    Way.of("mean").with("components", "residue", "phase"));

    private static final NounKind DISPLACED_NUMBER = NounKind.of(
                    "displaced number",
                    "displaced number state",
                    "a number state that swings like the classical oscillator and keeps its shape",
                    "D(α)|n⟩")
            .homes(LADDERS)
            .keys(
                    Key.count("level", 0, 1_000_000_000, "3", "the level n that is displaced, counted from 0"),
                    Key.of("mean", Form.NUMBER, "4", "quanta |α|² of the displacement")
                            .formula("⟨n⟩ = |α|² + n"),
                    Key.quantity("phase", "phase of α; 0 starts at the turning point on the +x side", ANGLE)
                            .standard("0 deg"),
                    Key.of("alpha", Form.COMPLEX, "1.5+0.5i", "the displacement α")
                            .formula("|α|² quanta"))
            .ways(Way.of("level", "mean").with("phase"), Way.of("level", "alpha"));

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
        return new NounKind[] {COHERENT, NUMBER, SQUEEZED, CAT, DISPLACED_NUMBER, SUPERPOSITION, GAUSSIAN, GROUND, LEVEL
        };
    }
}
