package ladderwell.kernel.magic;

import java.util.Optional;
import ladderwell.Density;
import ladderwell.Run;
import ladderwell.kernel.sentence.Sentence;

/** {@code animate run, points 400}. */
final class AnimateMagic implements Magic {

    @Override
    public Optional<Promise> promise(Sentence sentence) {
        return Optional.empty();
    }

    @Override
    public Outcome carryOut(Sentence sentence, Things things) {
        Run run = things.run(sentence.name());
        Density density = sentence.has("points") ? run.density((int) sentence.count("points")) : run.density();
        Animation animation = new Animation(sentence.name(), run, density);
        return new Outcome(animation, animation);
    }
}
