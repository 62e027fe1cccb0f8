package ladderwell;

import java.util.ArrayList;
import java.util.List;
import ladderwell.evidence.PhysicsException;
import ladderwell.quantity.Digits;
import ladderwell.quantity.Kind;
import ladderwell.quantity.Quantity;
import ladderwell.quantity.Scale;
import ladderwell.state.Amplitudes;

/**
 * A Gaussian packet: mean position and momentum, and the spread Δx; Δx Δp = ħ/2 at time 0.
 *
 * <p>In a box or a finite well the error of its expansion is guaranteed, elsewhere it is estimated.
 *
 * @param oscillator any oscillator
 * @param position mean position, from the oscillator's origin (the middle of box and well)
 * @param momentum mean momentum
 * @param spread Δx
 */
public record Packet(Oscillator oscillator, Quantity position, Quantity momentum, Quantity spread) implements State {

    public Packet {
        boolean natural = oscillator.scale().isNatural();
        Checks.kind("position", position, oscillator.scale().position());
        Checks.kind("momentum", momentum, natural ? Kind.NUMBER : Kind.MOMENTUM);
        Checks.positive("spread", spread, oscillator.scale().position());
    }

    @Override
    public String kind() {
        return "gaussian";
    }

    @Override
    public Amplitudes amplitudes(double tolerance) {
        GaussianShape shape = shape();
        try {
            return switch (oscillator.levels().kind()) {
                case BOX, FINITE_WELL ->
                    Amplitudes.packet(
                            oscillator.levels(), shape.position(), shape.momentum(), shape.width(), tolerance);
                case HARMONIC, GENERAL -> Amplitudes.expanded(oscillator.levels(), shape, tolerance);
            };
        } catch (PhysicsException.NotCarried scaled) {
            // the room speaks of scaled units; the user typed these
            throw new PhysicsException.NotCarried(
                    "a packet of spread " + spread + " at " + position + " with momentum " + momentum
                            + ", wanted to a norm error of " + Digits.shortest(tolerance) + ",",
                    scaled.missingWeight(),
                    scaled.levels(),
                    scaled.remedy());
        }
    }

    GaussianShape shape() {
        Scale scale = oscillator.scale();
        return new GaussianShape(
                oscillator,
                position.si() / scale.length(),
                momentum.si() / scale.momentum(),
                spread.si() / scale.length());
    }

    /**
     * ⟨p²⟩/2m of the free packet in box and well, whose walls change it only through what leaks into them; elsewhere with the mean
     * potential energy.
     */
    @Override
    public double meanEnergy() {
        Scale scale = oscillator.scale();
        double p = momentum.si() / scale.momentum();
        double dp = 0.5 / (spread.si() / scale.length());
        return switch (oscillator.levels().kind()) {
            case BOX, FINITE_WELL -> (p * p + dp * dp) / 2;
            case HARMONIC, GENERAL -> shape().energy();
        };
    }

    @Override
    public List<Fact> facts() {
        Scale scale = oscillator.scale();
        Shown shown = new Shown(scale);
        List<Fact> facts = new ArrayList<>(given());
        facts.add(shown.fact(
                "spread of momentum",
                "Δp = ħ/2Δx",
                Kind.MOMENTUM,
                0.5 * scale.length() / spread.si() * scale.momentum(),
                0));
        facts.add(shown.energy("mean energy", "⟨H⟩", meanEnergy(), oscillator));
        return List.copyOf(facts);
    }

    @Override
    public List<Fact> given() {
        return List.of(
                Fact.exact("position", "⟨x⟩", position),
                Fact.exact("momentum", "⟨p⟩", momentum),
                Fact.exact("spread", "Δx", spread));
    }
}
