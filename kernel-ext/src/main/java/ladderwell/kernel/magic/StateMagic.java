package ladderwell.kernel.magic;

import java.util.List;
import java.util.Map;
import java.util.Optional;
import ladderwell.Cat;
import ladderwell.Coherent;
import ladderwell.DisplacedNumber;
import ladderwell.Ladder;
import ladderwell.LevelOf;
import ladderwell.NumberState;
import ladderwell.Oscillator;
import ladderwell.Packet;
import ladderwell.PotentialWell;
import ladderwell.Squeezed;
import ladderwell.State;
import ladderwell.Superposition;
import ladderwell.kernel.sentence.Complex;
import ladderwell.kernel.sentence.MisreadSentence;
import ladderwell.kernel.sentence.Sentence;
import ladderwell.quantity.Kind;
import ladderwell.quantity.Quantity;
import ladderwell.quantity.Unit;
import ladderwell.quantity.Units;

/** {@code state psi: coherent in trap, mean 9.5, phase 30 deg}. */
final class StateMagic implements Magic {
    /** The loosest tolerance that an evolution takes. */
    private static final double LOOSEST_TOLERANCE = 0.1;

    private static final Map<String, Class<?>> TYPES = Map.of(
            "number", NumberState.class,
            "coherent", Coherent.class,
            "squeezed", Squeezed.class,
            "cat", Cat.class,
            "displaced number", DisplacedNumber.class,
            "superposition", Superposition.class,
            "gaussian", Packet.class,
            "ground", LevelOf.class,
            "level", LevelOf.class);

    @Override
    public Optional<Promise> promise(Sentence sentence) {
        return Optional.of(
                new Promise(sentence.name(), TYPES.getOrDefault(sentence.kind(), State.class), sentence.namePlace()));
    }

    @Override
    public Outcome carryOut(Sentence sentence, Things things) throws MisreadSentence {
        Oscillator oscillator = things.oscillator(sentence.reference("in"));
        State state = switch (sentence.kind()) {
            case "number" -> oscillator.number(sentence.count("level"));
            case "coherent" -> coherent(sentence, (Ladder) oscillator);
            case "squeezed" -> squeezed(sentence, (Ladder) oscillator);
            case "cat" -> cat(sentence, (Ladder) oscillator);
            case "displaced number" -> displacedNumber(sentence, (Ladder) oscillator);
            case "superposition" -> superposition(sentence, oscillator);
            case "gaussian" -> gaussian(sentence, oscillator);
            case "ground" -> levelOf(sentence, things, oscillator, 0);
            case "level" -> levelOf(sentence, things, oscillator, sentence.count("number"));
            default -> throw new IllegalStateException("no state is made of kind " + sentence.kind());
        };
        return new Outcome(new Declared(sentence.name(), "state", state), state);
    }

    private static Coherent coherent(Sentence sentence, Ladder oscillator) {
        if (sentence.has("mean")) {
            Coherent state = oscillator.coherent(sentence.number("mean"));
            if (sentence.has("phase")) {
                Quantity phase = sentence.quantity("phase");
                return state.phase(phase.value(), phase.unit());
            }
            return state;
        }
        if (sentence.has("alpha")) {
            Complex alpha = sentence.complex("alpha");
            return oscillator.coherentAlpha(alpha.re(), alpha.im());
        }
        return oscillator.coherentAt(
                orZero(sentence, "displacement", Units.METRE),
                orZero(sentence, "momentum", Units.KILOGRAM_METRE_PER_SECOND));
    }

    private static Squeezed squeezed(Sentence sentence, Ladder oscillator) throws MisreadSentence {
        Quantity squeezing =
                sentence.has("r") ? Quantity.of(sentence.number("r"), Units.ONE) : sentence.quantity("squeezing");
        if (squeezing.kind() == Kind.NUMBER && !sentence.has("r")) {
            throw new MisreadSentence(
                    "squeezing is given in dB, such as 6 dB; the squeezing parameter is given as r",
                    sentence.placeOf("squeezing"));
        }
        Squeezed state = oscillator.squeezed(squeezing.value(), squeezing.unit());
        if (sentence.has("angle")) {
            Quantity angle = sentence.quantity("angle");
            state = state.angle(angle.value(), angle.unit());
        }
        if (sentence.has("mean")) {
            state = state.mean(sentence.number("mean"));
        }
        if (sentence.has("phase")) {
            if (!sentence.has("mean")) {
                throw new MisreadSentence(
                        "phase turns a displacement, and there is none; give its quanta, such as 'mean 4', or the angle of"
                                + " the squeezing as 'angle'",
                        sentence.placeOf("phase"));
            }
            Quantity phase = sentence.quantity("phase");
            state = state.phase(phase.value(), phase.unit());
        }
        return state;
    }

    private static Cat cat(Sentence sentence, Ladder oscillator) {
        Cat state = oscillator.cat(sentence.number("mean"));
        if (sentence.has("components")) {
            state = state.components((int) sentence.count("components"));
        }
        if (sentence.has("phase")) {
            Quantity phase = sentence.quantity("phase");
            state = state.phase(phase.value(), phase.unit());
        }
        if (sentence.has("parity")) {
            state = sentence.choice("parity").equals("even") ? state.even() : state.odd();
        }
        if (sentence.has("residue")) {
            state = state.residue((int) sentence.count("residue"));
        }
        if (sentence.has("relative phase")) {
            Quantity phase = sentence.quantity("relative phase");
            state = state.relativePhase(phase.value(), phase.unit());
        }
        // what leaves nothing of its components is refused here
        state.meanQuanta();
        return state;
    }

    private static DisplacedNumber displacedNumber(Sentence sentence, Ladder oscillator) {
        long level = sentence.count("level");
        if (sentence.has("alpha")) {
            Complex alpha = sentence.complex("alpha");
            return oscillator.displacedNumberAlpha(level, alpha.re(), alpha.im());
        }
        DisplacedNumber state = oscillator.displacedNumber(level, sentence.number("mean"));
        if (sentence.has("phase")) {
            Quantity phase = sentence.quantity("phase");
            return state.phase(phase.value(), phase.unit());
        }
        return state;
    }

    private static Quantity orZero(Sentence sentence, String key, Unit unit) {
        return sentence.has(key) ? sentence.quantity(key) : Quantity.of(0, sentence.natural() ? Units.ONE : unit);
    }

    private static Superposition superposition(Sentence sentence, Oscillator oscillator) throws MisreadSentence {
        List<Long> levels = sentence.counts("levels");
        Superposition equal = (Superposition) oscillator.superposition(
                levels.stream().mapToLong(Long::longValue).toArray());
        if (!sentence.has("weights")) {
            return equal;
        }
        List<Complex> weights = sentence.complexes("weights");
        if (weights.size() != levels.size()) {
            throw new MisreadSentence(
                    "there are " + levels.size() + " levels but " + weights.size()
                            + " weights; expected one weight for each level, in the same order",
                    sentence.placeOf("weights"));
        }
        return equal.weights(
                weights.stream().mapToDouble(Complex::re).toArray(),
                weights.stream().mapToDouble(Complex::im).toArray());
    }

    private static Packet gaussian(Sentence sentence, Oscillator oscillator) {
        Quantity position =
                orZero(sentence, "position", Units.si(oscillator.scale().position()));
        Quantity momentum = orZero(sentence, "momentum", Units.KILOGRAM_METRE_PER_SECOND);
        Quantity spread = sentence.quantity("spread");
        Packet packet = oscillator.gaussian(position, momentum, spread);
        refuseUncarried(packet);
        return packet;
    }

    private static LevelOf levelOf(Sentence sentence, Things things, Oscillator oscillator, long n) {
        LevelOf state = oscillator.levelOf(things.oscillator(sentence.reference("of")), n);
        LevelOf placed = sentence.has("shift") ? state.shifted(sentence.quantity("shift")) : state;
        refuseUncarried(placed);
        return placed;
    }

    /**
     * What the bound levels of a box or a square well cannot carry even loosely is refused here; what they cannot carry closely, by the run. In
     * other potentials a state need not be on levels.
     */
    private static void refuseUncarried(State state) {
        if (!(state.oscillator() instanceof PotentialWell)
                && !state.oscillator().moves()) {
            state.amplitudes(LOOSEST_TOLERANCE);
        }
    }
}
