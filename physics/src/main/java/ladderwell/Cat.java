package ladderwell;

import static ladderwell.quantity.Units.ONE;

import java.util.ArrayList;
import java.util.List;
import java.util.OptionalInt;
import ladderwell.evidence.Bound;
import ladderwell.operator.LadderPolynomial;
import ladderwell.quantity.Kind;
import ladderwell.quantity.Quantity;
import ladderwell.quantity.Unit;
import ladderwell.state.Amplitudes;
import ladderwell.state.CatMoments;
import ladderwell.state.HarmonicStates;

/**
 * A cat: k coherent components evenly on a circle, Σ_j e^{ijχ} |α e^{2πij/k}⟩, normalised. Either χ is given, or the class of levels n ≡ residue
 * modulo k that alone remain, χ = −2π·residue/k; with two components these are the even cat (0) and the odd one (1).
 *
 * @param oscillator the oscillator
 * @param mean quanta |α|² of each component
 * @param phaseAngle arg α of the first component in rad
 * @param components k, 2 … 64
 * @param residue the class of levels; empty where χ is given
 * @param chi χ in rad, the phase from each component to the next; 0 where the class is given
 * @param given the inputs as they were typed
 * @source Buzek, Vidiella-Barranco and Knight, Phys. Rev. A 45 (1992) 6570; Yurke and Stoler, Phys. Rev. Lett. 57 (1986) 13
 */
public record Cat(
        Ladder oscillator,
        double mean,
        double phaseAngle,
        int components,
        OptionalInt residue,
        double chi,
        List<Fact> given)
        implements State {
    private static final int MOST = 64;

    public Cat {
        Checks.meanQuanta(mean);
        Checks.finite("phase", phaseAngle);
        Checks.finite("relative phase", chi);
        if (components < 2 || components > MOST) {
            throw new IllegalArgumentException("components of a cat number 2 to " + MOST + ", not " + components);
        }
        if (residue.isPresent() && (residue.getAsInt() < 0 || residue.getAsInt() >= components)) {
            throw new IllegalArgumentException("the residue of a cat of " + components
                    + " components lies between 0 and " + (components - 1) + ", not " + residue.getAsInt());
        }
        given = List.copyOf(given);
    }

    static Cat mean(Ladder oscillator, double mean) {
        return new Cat(
                oscillator,
                mean,
                0,
                2,
                OptionalInt.of(0),
                0,
                List.of(Fact.exact("mean", "|α|²", Checks.finite("mean quanta", mean), ONE)));
    }

    private Cat as(OptionalInt remaining, double relative, Fact fact) {
        return new Cat(oscillator, mean, phaseAngle, components, remaining, relative, Fact.with(unsaid(), fact));
    }

    /** What was given, but for what the components add up to. */
    private List<Fact> unsaid() {
        List<Fact> all = new ArrayList<>(given);
        all.removeIf(f -> List.of("parity", "residue", "relative phase").contains(f.name()));
        return all;
    }

    /** The same with so many components: those with a phase between them keep it, others start at residue 0. */
    public Cat components(int count) {
        Fact fact = Fact.exact("components", "k", count, ONE);
        return residue.isPresent()
                ? new Cat(oscillator, mean, phaseAngle, count, OptionalInt.of(0), 0, Fact.with(unsaid(), fact))
                : new Cat(oscillator, mean, phaseAngle, count, residue, chi, Fact.with(given, fact));
    }

    /** The first component turned to this phase, and the others with it. */
    public Cat phase(double value, Unit unit) {
        Quantity phase = Checks.kind("phase", Quantity.of(value, unit), Kind.ANGLE);
        return new Cat(
                oscillator,
                mean,
                phase.si(),
                components,
                residue,
                chi,
                Fact.with(given, Fact.exact("phase", "φ", phase)));
    }

    /** Only even levels, |α⟩ + |−α⟩. */
    public Cat even() {
        return parity(0);
    }

    /** Only odd levels, |α⟩ − |−α⟩. */
    public Cat odd() {
        return parity(1);
    }

    private Cat parity(int remaining) {
        if (components != 2) {
            throw new IllegalArgumentException("parity, even or odd, is that of a cat of 2 components; with "
                    + components + " give the residue of its levels, 0 to " + (components - 1));
        }
        return as(OptionalInt.of(remaining), 0, Fact.exact("parity", "⟨(−1)ⁿ⟩", 1 - 2 * remaining, ONE));
    }

    /** Only the levels n ≡ residue modulo the number of components. */
    public Cat residue(int remaining) {
        return as(OptionalInt.of(remaining), 0, Fact.exact("residue", "n mod k", remaining, ONE));
    }

    /** A phase χ from each component to the next: |α⟩ + e^{iχ}|−α⟩ for two. */
    public Cat relativePhase(double value, Unit unit) {
        Quantity phase = Checks.kind("relative phase", Quantity.of(value, unit), Kind.ANGLE);
        return as(OptionalInt.empty(), phase.si(), Fact.exact("relative phase", "χ", phase));
    }

    private CatMoments moments() {
        return residue.isPresent()
                ? CatMoments.ofClass(mean, components, residue.getAsInt())
                : CatMoments.phased(mean, components, chi);
    }

    /** Mean quanta of the cat, which differ from those of a component where the components overlap. */
    public double meanQuanta() {
        return mean * (1 + moments().excess(1));
    }

    @Override
    public String kind() {
        return "cat";
    }

    @Override
    public String origin() {
        String what = components + " coherent components, ";
        if (residue.isEmpty()) {
            return what + "a phase from each to the next";
        }
        if (components == 2) {
            return what + (residue.getAsInt() == 0 ? "even" : "odd");
        }
        return what + "levels " + residue.getAsInt() + " modulo " + components;
    }

    @Override
    public Amplitudes amplitudes(double tolerance) {
        return residue.isPresent()
                ? HarmonicStates.cat(mean, phaseAngle, components, residue.getAsInt(), tolerance)
                : HarmonicStates.phasedCat(mean, phaseAngle, components, chi, tolerance);
    }

    @Override
    public double meanEnergy() {
        return energy(moments())[0];
    }

    /** ⟨H⟩ = Σ h_jk ⟨a†^j a^k⟩ and the size of its terms. */
    private double[] energy(CatMoments moments) {
        if (oscillator instanceof Harmonic) {
            double value = mean * (1 + moments.excess(1)) + 0.5;
            return new double[] {value, value + mean * moments.excessError(1) * 0x1p44};
        }
        LadderPolynomial h = oscillator.energyOperator();
        double sum = 0;
        double size = 0;
        for (int j = 0; j <= h.raisingDegree(); j++) {
            for (int k = 0; k <= h.loweringDegree(); k++) {
                double[] ratio = moments.ratio(j, k);
                double angle = (k - j) * phaseAngle;
                double scale = Math.pow(mean, (j + k) / 2.0);
                double re = h.re(j, k) * Math.cos(angle) - h.im(j, k) * Math.sin(angle);
                double im = h.re(j, k) * Math.sin(angle) + h.im(j, k) * Math.cos(angle);
                sum += scale * (re * ratio[0] - im * ratio[1]);
                size += scale * Math.hypot(re, im) * Math.hypot(ratio[0], ratio[1]) * (1 + Math.abs(angle));
            }
        }
        return new double[] {sum, size};
    }

    @Override
    public List<Fact> facts() {
        CatMoments moments = moments();
        List<Fact> facts = new ArrayList<>();
        facts.add(Fact.exact("components", "k", components, ONE));
        facts.add(Fact.closedForm("quanta of a component", "|α|²", mean, ONE, 0));
        facts.add(Fact.angle("phase of the first component", "φ", phaseAngle));
        residue.ifPresentOrElse(
                only -> facts.add(Fact.exact("levels kept, modulo k", "n mod k", only, ONE)),
                () -> facts.add(Fact.angle("phase between components", "χ", chi)));
        facts.add(value("parity", "⟨(−1)ⁿ⟩", moments.parity(), moments.error()));
        double one = moments.excess(1);
        double oneError = moments.excessError(1);
        double quanta = mean * (1 + one);
        double quantaError = mean * oneError + 4 * Math.ulp(quanta);
        facts.add(value("mean quanta", "⟨n⟩", quanta, quantaError));
        // Var n = ⟨a†²a²⟩ + ⟨n⟩ − ⟨n⟩², the squares of |α|² dropped
        double above = moments.excess(2) - 2 * one - one * one;
        double aboveError = moments.excessError(2)
                + (2 + 2 * Math.abs(one) + oneError) * oneError
                + 0x1p-51 * (Math.abs(moments.excess(2)) + 2 * Math.abs(one) + one * one);
        double variance = mean * mean * above + quanta;
        double varianceError = mean * mean * (aboveError + Math.abs(above) * 0x1p-50) + quantaError + 0x1p-50 * quanta;
        facts.add(value("variance of quanta", "Var n", variance, varianceError));
        if (quanta > 2 * quantaError) {
            double mandel = mean * above / (1 + one);
            double mandelError = (varianceError + Math.abs(mandel + 1) * quantaError) / (quanta - quantaError);
            facts.add(value("Mandel Q", "(Var n − ⟨n⟩)/⟨n⟩", mandel, mandelError));
        }
        double turn = 2 * Math.sin(Math.PI / components);
        double apart = mean * turn * turn;
        facts.add(Shown.number(
                "overlap of neighbours", "|⟨α_j|α_{j+1}⟩|²", Math.exp(-apart), 4 + 8 * Math.min(apart, 800)));
        double[] energy = energy(moments);
        facts.add(new Shown(oscillator.scale())
                .ladderEnergy(
                        oscillator instanceof Harmonic ? "(⟨n⟩ + ½)ħω" : "⟨H⟩", energy[0], energy[1], oscillator));
        return List.copyOf(facts);
    }

    private static Fact value(String name, String symbol, double value, double error) {
        return new Fact(name, symbol, Quantity.of(value, ONE), Bound.guaranteed(error));
    }
}
