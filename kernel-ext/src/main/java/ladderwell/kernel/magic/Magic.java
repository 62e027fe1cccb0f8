package ladderwell.kernel.magic;

import java.util.Optional;
import ladderwell.kernel.sentence.MisreadSentence;
import ladderwell.kernel.sentence.Place;
import ladderwell.kernel.sentence.Sentence;

/** What the sentences of one noun do. */
interface Magic {
    /**
     * A name that a sentence declares.
     *
     * @param name the name
     * @param type the type of its Java variable
     * @param place where the name stands
     */
    record Promise(String name, Class<?> type, Place place) {}

    /**
     * What a sentence gave.
     *
     * @param shown what is rendered
     * @param kept what the promised name stands for from now on; where no name is promised, the same as what is shown
     */
    record Outcome(Object shown, Object kept) {}

    /** The name that this sentence declares, if it declares one. Known before anything runs. */
    Optional<Promise> promise(Sentence sentence);

    /**
     * Carries the sentence out.
     *
     * @throws MisreadSentence where a value is wrong and the place is known
     * @throws IllegalArgumentException where physics refuses a value
     * @throws ladderwell.evidence.PhysicsException where physics cannot give what was asked
     */
    Outcome carryOut(Sentence sentence, Things things) throws MisreadSentence;
}
