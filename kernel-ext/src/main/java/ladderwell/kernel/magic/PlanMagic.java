package ladderwell.kernel.magic;

import java.util.Optional;
import ladderwell.kernel.sentence.MisreadSentence;
import ladderwell.kernel.sentence.Sentence;
import tech.tablesaw.api.Table;

/** {@code plan psi for 50 us, tolerance 1e-7}. */
final class PlanMagic implements Magic {

    @Override
    public Optional<Promise> promise(Sentence sentence) {
        return Optional.empty();
    }

    @Override
    public Outcome carryOut(Sentence sentence, Things things) throws MisreadSentence {
        Table plan = EvolveMagic.evolution(sentence, things.state(sentence.name()))
                .plan()
                .table();
        return new Outcome(plan, plan);
    }
}
