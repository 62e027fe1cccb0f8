package ladderwell.kernel.magic;

import java.util.Optional;
import java.util.stream.LongStream;
import ladderwell.Oscillator;
import ladderwell.kernel.sentence.MisreadSentence;
import ladderwell.kernel.sentence.Sentence;

/** {@code levels well, count 5}. */
final class LevelsMagic implements Magic {
    /** Levels shown where no count is given. */
    private static final long USUAL = 10;

    @Override
    public Optional<Promise> promise(Sentence sentence) {
        return Optional.empty();
    }

    @Override
    public Outcome carryOut(Sentence sentence, Things things) throws MisreadSentence {
        Oscillator oscillator = things.oscillator(sentence.name());
        long bound = oscillator.levels().count();
        if (bound == 0) {
            throw new MisreadSentence("'" + sentence.name() + "' has no bound level", sentence.namePlace());
        }
        long count = sentence.has("count") ? sentence.count("count") : Math.min(USUAL, bound);
        if (count > bound) {
            throw new MisreadSentence(
                    "count must be at most " + bound + ", not " + count + ": '" + sentence.name() + "' has " + bound
                            + (bound == 1 ? " bound level" : " bound levels"),
                    sentence.placeOf("count"));
        }
        long[] levels = LongStream.range(0, count).toArray();
        LevelTable table = new LevelTable(sentence.name(), oscillator, oscillator.levelTable(levels), levels);
        return new Outcome(table, table);
    }
}
