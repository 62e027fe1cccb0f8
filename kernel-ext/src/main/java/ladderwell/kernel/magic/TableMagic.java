package ladderwell.kernel.magic;

import java.util.Optional;
import java.util.stream.IntStream;
import ladderwell.Observable;
import ladderwell.Run;
import ladderwell.kernel.sentence.Sentence;
import tech.tablesaw.api.Table;

/** {@code table run: position, spread of position, population of 3, every 10, as motion}. */
final class TableMagic implements Magic {

    @Override
    public Optional<Promise> promise(Sentence sentence) {
        return sentence.has("as")
                ? Optional.of(new Promise(sentence.reference("as"), Table.class, sentence.placeOf("as")))
                : Optional.empty();
    }

    @Override
    public Outcome carryOut(Sentence sentence, Things things) {
        Run run = things.run(sentence.name());
        Observable[] observables = sentence.items().stream()
                .map(name -> Observable.named(name)
                        .orElseThrow(() -> new IllegalArgumentException("'" + name + "' is no observable")))
                .toArray(Observable[]::new);
        Table table = run.table(observables);
        if (sentence.has("every")) {
            long step = sentence.count("every");
            int last = table.rowCount() - 1;
            Table kept = table.rows(IntStream.rangeClosed(0, (int) (last / step))
                    .map(i -> (int) (i * step))
                    .toArray());
            kept.setName(table.name());
            table = kept;
        }
        return new Outcome(new TableRead(run, table), table);
    }
}
