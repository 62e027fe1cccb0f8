package ladderwell.kernel.magic;

import java.util.Optional;
import ladderwell.Evolution;
import ladderwell.Run;
import ladderwell.State;
import ladderwell.kernel.sentence.MisreadSentence;
import ladderwell.kernel.sentence.Sentence;
import ladderwell.quantity.Quantity;

/** {@code evolve run: psi for 3 periods, frames 120, tolerance 1e-9}. */
final class EvolveMagic implements Magic {

    @Override
    public Optional<Promise> promise(Sentence sentence) {
        return Optional.of(new Promise(sentence.name(), Run.class, sentence.namePlace()));
    }

    @Override
    public Outcome carryOut(Sentence sentence, Things things) throws MisreadSentence {
        Run run = evolution(sentence, things.state(sentence.reference("state"))).run();
        return new Outcome(new Declared(sentence.name(), "evolve", run), run);
    }

    /** What a sentence asks of a state. */
    static Evolution evolution(Sentence sentence, State state) throws MisreadSentence {
        Quantity duration = sentence.quantity("for");
        Evolution evolution = state.evolve(duration.value(), duration.unit());
        if (sentence.has("frames")) {
            evolution = evolution.frames(sentence.count("frames"));
        }
        if (sentence.has("tolerance")) {
            evolution = evolution.tolerance(sentence.number("tolerance"));
        }
        if (!Double.isFinite(evolution.scaledDuration() * evolution.frames())) {
            throw new MisreadSentence(
                    "a duration of " + duration
                            + " is too long to count in the oscillator's own time; expected a shorter one",
                    sentence.placeOf("for"));
        }
        return evolution;
    }
}
