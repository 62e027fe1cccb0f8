package ladderwell.kernel.magic;

import java.util.Optional;
import ladderwell.Run;
import ladderwell.kernel.sentence.MisreadSentence;
import ladderwell.kernel.sentence.Sentence;
import ladderwell.quantity.Quantity;

/** {@code phasespace run at 1.5 periods, husimi}; without an instant the whole run as a film. */
final class PhaseSpaceMagic implements Magic {

    @Override
    public Optional<Promise> promise(Sentence sentence) {
        return Optional.empty();
    }

    @Override
    public Outcome carryOut(Sentence sentence, Things things) throws MisreadSentence {
        Run run = things.run(sentence.name());
        if (!sentence.has("at")) {
            if (sentence.has("husimi")) {
                throw new MisreadSentence(
                        "'husimi' shows one instant; expected 'at', as in 'phasespace run at 1.5 periods, husimi'",
                        sentence.placeOf("husimi"));
            }
            PhaseAnimation film = new PhaseAnimation(sentence.name(), run, run.density(), run.phaseFilm());
            return new Outcome(film, film);
        }
        Quantity instant = sentence.quantity("at");
        PhasePortrait portrait = new PhasePortrait(
                sentence.name(), run.phaseSpace(instant.value(), instant.unit()), sentence.has("husimi"));
        return new Outcome(portrait, portrait);
    }
}
