package ladderwell.kernel.magic;

import java.util.Map;
import java.util.Optional;
import ladderwell.Box;
import ladderwell.FiniteWell;
import ladderwell.Harmonic;
import ladderwell.LadderMode;
import ladderwell.MovingWell;
import ladderwell.Oscillator;
import ladderwell.PotentialWell;
import ladderwell.kernel.sentence.MisreadSentence;
import ladderwell.kernel.sentence.Sentence;
import ladderwell.quantity.Quantity;

/** {@code oscillator trap: harmonic, mass 40 u, frequency 1.2 MHz}. */
final class OscillatorMagic implements Magic {
    private static final Map<String, Class<?>> TYPES = Map.of(
            "harmonic", Harmonic.class,
            "box", Box.class,
            "finite well", FiniteWell.class,
            "kerr", LadderMode.class,
            "duffing", LadderMode.class,
            "hamiltonian", LadderMode.class);

    @Override
    public Optional<Promise> promise(Sentence sentence) {
        return Optional.of(new Promise(
                sentence.name(),
                Potentials.moves(sentence)
                        ? MovingWell.class
                        : TYPES.getOrDefault(sentence.kind(), PotentialWell.class),
                sentence.namePlace()));
    }

    @Override
    public Outcome carryOut(Sentence sentence, Things things) throws MisreadSentence {
        Oscillator oscillator = switch (sentence.kind()) {
            case "harmonic" -> harmonic(sentence);
            case "box" -> box(sentence);
            case "finite well" -> finiteWell(sentence);
            case "kerr", "duffing", "hamiltonian" -> new Modes(sentence).oscillator();
            default -> new Potentials(sentence).oscillator();
        };
        // A mass and a length may be fine and their scale still outside the range of numbers: refused here, not later.
        oscillator.scale();
        return new Outcome(new Declared(sentence.name(), "oscillator", oscillator), oscillator);
    }

    private static Harmonic harmonic(Sentence sentence) {
        if (sentence.natural()) {
            return Oscillator.harmonic().natural();
        }
        Quantity mass = sentence.quantity("mass");
        Harmonic.WithMass heavy = Oscillator.harmonic().mass(mass.value(), mass.unit());
        if (sentence.has("frequency")) {
            Quantity frequency = sentence.quantity("frequency");
            return heavy.frequency(frequency.value(), frequency.unit());
        }
        if (sentence.has("wavenumber")) {
            Quantity wavenumber = sentence.quantity("wavenumber");
            return heavy.wavenumber(wavenumber.value(), wavenumber.unit());
        }
        Quantity spacing = sentence.quantity("spacing");
        return heavy.spacing(spacing.value(), spacing.unit());
    }

    private static Box box(Sentence sentence) {
        if (sentence.natural()) {
            return Oscillator.box().natural();
        }
        Quantity mass = sentence.quantity("mass");
        Quantity width = sentence.quantity("width");
        return Oscillator.box().mass(mass.value(), mass.unit()).width(width.value(), width.unit());
    }

    private static FiniteWell finiteWell(Sentence sentence) {
        Quantity depth = sentence.quantity("depth");
        if (sentence.natural()) {
            return Oscillator.finiteWell().natural(depth.value());
        }
        Quantity mass = sentence.quantity("mass");
        Quantity width = sentence.quantity("width");
        return Oscillator.finiteWell()
                .mass(mass.value(), mass.unit())
                .width(width.value(), width.unit())
                .depth(depth.value(), depth.unit());
    }
}
