package ladderwell.kernel.magic;

import java.util.Optional;
import java.util.stream.LongStream;
import ladderwell.Coupling;
import ladderwell.Oscillator;
import ladderwell.formula.FormulaException;
import ladderwell.formula.Parameters;
import ladderwell.kernel.sentence.MisreadSentence;
import ladderwell.kernel.sentence.Place;
import ladderwell.kernel.sentence.Sentence;
import tech.tablesaw.api.Table;

/** {@code elements well: position, momentum, "x^2", levels 0..4, as dipoles}. */
final class ElementsMagic implements Magic {
    /** Levels between which elements are shown where none are named. */
    private static final long USUAL = 5;

    @Override
    public Optional<Promise> promise(Sentence sentence) {
        return sentence.has("as")
                ? Optional.of(new Promise(sentence.reference("as"), Table.class, sentence.placeOf("as")))
                : Optional.empty();
    }

    @Override
    public Outcome carryOut(Sentence sentence, Things things) throws MisreadSentence {
        Oscillator oscillator = things.oscillator(sentence.name());
        if (oscillator.levels().count() == 0) {
            throw new MisreadSentence("'" + sentence.name() + "' has no bound level", sentence.namePlace());
        }
        long[] levels = sentence.has("levels")
                ? sentence.counts("levels").stream().mapToLong(Long::longValue).toArray()
                : LongStream.range(0, Math.min(USUAL, oscillator.levels().count()))
                        .toArray();
        Coupling[] couplings = new Coupling[sentence.items().size()];
        for (int i = 0; i < couplings.length; i++) {
            couplings[i] = coupling(sentence.items().get(i));
        }
        Table table;
        try {
            table = oscillator.elementTable(levels, couplings);
        } catch (FormulaException e) {
            throw new MisreadSentence(e.reason(), inside(sentence, e), e);
        }
        table.setName("elements " + sentence.name() + ": " + oscillator.kind());
        return new Outcome(table, table);
    }

    /** The coupling of that name, or the function whose text stands in quotes. */
    private static Coupling coupling(String item) {
        return item.startsWith("\"")
                ? Coupling.function(item.substring(1, item.length() - 1), Parameters.none())
                : Coupling.named(item).orElseThrow(() -> new IllegalArgumentException("'" + item + "' is no coupling"));
    }

    private static Place inside(Sentence sentence, FormulaException e) {
        for (String item : sentence.items()) {
            if (item.startsWith("\"")
                    && item.substring(1, item.length() - 1)
                            .strip()
                            .equals(e.text().strip())) {
                Place place = sentence.placeOf(item);
                int blanks = item.indexOf(e.text(), 1);
                int start = place.start() + Math.max(1, blanks) + e.start();
                return new Place(start, Math.max(start + 1, start + e.end() - e.start()));
            }
        }
        return sentence.place();
    }
}
