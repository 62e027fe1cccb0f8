package ladderwell;

import static ladderwell.quantity.Units.DECIBEL;
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
 * The squeezed state D(α) S(ξ) |0⟩ of a harmonic mode, ξ = r e^{2iθ}, S(ξ) = exp[(ξ* a² − ξ a†²)/2]: the vacuum, squeezed and then displaced. The
 * variance of the quadrature x cos θ + p sin θ is e^{−2r}/2, that of the one across e^{2r}/2; the vacuum has ½ in both. Squeezing in dB is
 * 10 log₁₀ e^{2r}.
 *
 * @param oscillator the oscillator
 * @param r squeezing parameter, 0 … 5
 * @param angleOfLeast θ in rad: the quadrature of least variance; 0 squeezes the position
 * @param mean quanta |α|² of the displacement; 0 for the squeezed vacuum
 * @param phaseAngle arg α in rad; 0 displaces to the +x side
 * @param given the inputs as they were typed
 */
public record Squeezed(
        Ladder oscillator, double r, double angleOfLeast, double mean, double phaseAngle, List<Fact> given)
        implements State {
    /** Largest r, 43 dB. */
    public static final double LARGEST = HarmonicStates.LARGEST_SQUEEZING;

    private static final double DECIBELS = 20 / Math.log(10);

    public Squeezed {
        if (!(r >= 0 && r <= LARGEST)) {
            throw new IllegalArgumentException("squeezing must lie between 0 and "
                    + Checks.number(Math.floor(LARGEST * DECIBELS)) + " dB (r between 0 and " + Checks.number(LARGEST)
                    + "), not " + Checks.number(r * DECIBELS) + " dB");
        }
        Checks.finite("angle", angleOfLeast);
        Checks.meanQuanta(mean);
        Checks.finite("phase", phaseAngle);
        given = List.copyOf(given);
    }

    static Squeezed of(Ladder oscillator, Quantity squeezing) {
        Checks.kind("squeezing", squeezing, Kind.SQUEEZING, Kind.NUMBER);
        boolean decibels = squeezing.kind() == Kind.SQUEEZING;
        return new Squeezed(
                oscillator,
                decibels ? squeezing.si() / DECIBELS : squeezing.value(),
                0,
                0,
                0,
                List.of(Fact.exact("squeezing", decibels ? "" : "r", squeezing)));
    }

    /** The same with its least variance along the quadrature x cos θ + p sin θ. */
    public Squeezed angle(double value, Unit unit) {
        Quantity angle = Checks.kind("angle", Quantity.of(value, unit), Kind.ANGLE);
        return new Squeezed(
                oscillator, r, angle.si(), mean, phaseAngle, Fact.with(given, Fact.exact("angle", "θ", angle)));
    }

    /** The same, then displaced by α with |α|² = mean. */
    public Squeezed mean(double value) {
        return new Squeezed(
                oscillator,
                r,
                angleOfLeast,
                value,
                phaseAngle,
                Fact.with(given, Fact.exact("mean", "|α|²", Checks.finite("mean quanta", value), ONE)));
    }

    /** The same with its displacement turned to this phase; the squeezing stays as it is. */
    public Squeezed phase(double value, Unit unit) {
        Quantity phase = Checks.kind("phase", Quantity.of(value, unit), Kind.ANGLE);
        return new Squeezed(
                oscillator, r, angleOfLeast, mean, phase.si(), Fact.with(given, Fact.exact("phase", "φ", phase)));
    }

    /** Squeezing in dB: 10 log₁₀ of the vacuum's variance over the least one. */
    public double decibels() {
        return r * DECIBELS;
    }

    /** Mean quanta |α|² + sinh² r. */
    public double meanQuanta() {
        return mean + Math.sinh(r) * Math.sinh(r);
    }

    /** Variance of the quanta: |α cosh r − α* e^{2iθ} sinh r|² + 2 sinh² r cosh² r. */
    public double varianceOfQuanta() {
        double along = Math.sqrt(mean) * Math.cos(phaseAngle - angleOfLeast) * Math.exp(-r);
        double across = Math.sqrt(mean) * Math.sin(phaseAngle - angleOfLeast) * Math.exp(r);
        double pairs = Math.sinh(r) * Math.cosh(r);
        return along * along + across * across + 2 * pairs * pairs;
    }

    /** −ln⟨(−1)^n⟩, and ⟨(−1)^n⟩ = e^{−2(along² e^{2r} + across² e^{−2r})} of the two parts of α. */
    private double parityExponent() {
        double along = Math.sqrt(mean) * Math.cos(phaseAngle - angleOfLeast) * Math.exp(r);
        double across = Math.sqrt(mean) * Math.sin(phaseAngle - angleOfLeast) * Math.exp(-r);
        return 2 * (along * along + across * across);
    }

    /** Variance of the quadrature at an angle from the least one, [x, p] = i. */
    private double variance(double angle) {
        double along = Math.cos(angle) * Math.exp(-r);
        double across = Math.sin(angle) * Math.exp(r);
        return (along * along + across * across) / 2;
    }

    @Override
    public String kind() {
        return "squeezed";
    }

    @Override
    public String origin() {
        return mean > 0 ? "the vacuum, squeezed, then displaced" : "squeezed vacuum";
    }

    @Override
    public Amplitudes amplitudes(double tolerance) {
        return HarmonicStates.displacedSqueezed(mean, phaseAngle, r, 2 * angleOfLeast, tolerance);
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
        double mixing = Math.sinh(r);
        LadderPolynomial moved = oscillator
                .energyOperator()
                .shifted(root * Math.cos(phaseAngle), root * Math.sin(phaseAngle))
                .mixed(Math.cosh(r), 0, -mixing * Math.cos(2 * angleOfLeast), -mixing * Math.sin(2 * angleOfLeast));
        return new double[] {moved.re(0, 0), moved.norm()};
    }

    @Override
    public List<Fact> facts() {
        Shown shown = new Shown(oscillator.scale());
        double uncertainty = Checks.lengthUncertainty(oscillator);
        // r carries a few roundings, and e^{2r} takes 2r times as many
        double ulps = 16 + 16 * r;
        List<Fact> facts = new ArrayList<>();
        facts.add(Fact.closedForm("squeezing", "10 log₁₀ e^{2r}", decibels(), DECIBEL, 0));
        facts.add(Fact.closedForm("squeezing parameter", "r", r, ONE, 0));
        facts.add(Fact.angle("angle of least variance", "θ", angleOfLeast));
        facts.add(Shown.number("least variance (vacuum ½)", "e^{−2r}/2", Math.exp(-2 * r) / 2, ulps));
        facts.add(Shown.number("largest variance (vacuum ½)", "e^{2r}/2", Math.exp(2 * r) / 2, ulps));
        if (mean > 0) {
            facts.add(Fact.closedForm("quanta of the displacement", "|α|²", mean, ONE, 0));
            facts.add(Fact.angle("phase of the displacement", "φ", phaseAngle));
        }
        facts.add(Shown.number("mean quanta", "|α|² + sinh² r", meanQuanta(), ulps));
        double turned = Math.abs(phaseAngle) + Math.abs(angleOfLeast);
        double size = mean * Math.exp(2 * r);
        facts.add(new Fact(
                "variance of quanta",
                "Var n",
                Quantity.of(varianceOfQuanta(), ONE),
                Bound.guaranteed((varianceOfQuanta() * ulps + 4 * turned * size) * 0x1p-52)));
        double exponent = parityExponent();
        double parity = Math.exp(-exponent);
        facts.add(new Fact(
                "parity",
                "⟨(−1)ⁿ⟩",
                Quantity.of(parity, ONE),
                Bound.guaranteed(Math.min(
                        1, parity * (Math.expm1((exponent * ulps + 8 * turned * size) * 0x1p-52) + 0x1p-51)))));
        facts.add(spread(shown, "spread of position", "Δx", Kind.LENGTH, angleOfLeast, ulps, uncertainty));
        facts.add(spread(
                shown, "spread of momentum", "Δp", Kind.MOMENTUM, Math.PI / 2 - angleOfLeast, ulps, uncertainty));
        double[] energy = energy();
        facts.add(shown.ladderEnergy(
                oscillator instanceof Harmonic ? "(⟨n⟩ + ½)ħω" : "⟨H⟩", energy[0], energy[1], oscillator));
        return List.copyOf(facts);
    }

    private Fact spread(
            Shown shown, String name, String symbol, Kind kind, double angle, double ulps, double uncertainty) {
        double variance = variance(angle);
        // an angle off by its rounding tips the wide quadrature into the narrow one
        double off = (variance * ulps + 4 * (Math.abs(angle) + 2) * Math.exp(2 * r)) * 0x1p-52;
        double value = Math.sqrt(variance);
        return shown.scaled(name, symbol, kind, value, Bound.guaranteed(off / value), uncertainty);
    }
}
