package ladderwell.kernel.magic;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import ladderwell.Observable;
import ladderwell.evidence.PhysicsException;
import ladderwell.kernel.cell.Completion;
import ladderwell.kernel.cell.MimeBundle;
import ladderwell.kernel.cell.Names;
import ladderwell.kernel.cell.SentenceContext;
import ladderwell.kernel.cell.SentenceFailure;
import ladderwell.kernel.cell.Sentences;
import ladderwell.kernel.sentence.Explanation;
import ladderwell.kernel.sentence.Grammar;
import ladderwell.kernel.sentence.Item;
import ladderwell.kernel.sentence.Known;
import ladderwell.kernel.sentence.MisreadSentence;
import ladderwell.kernel.sentence.Offers;
import ladderwell.kernel.sentence.Place;
import ladderwell.kernel.sentence.Sentence;
import ladderwell.kernel.sentence.SentenceText;
import ladderwell.kernel.sentence.Surroundings;

/**
 * The declarations language of a notebook. A text is first checked as a whole, so that a slip in its last sentence does not
 * wait for the work of the first; then its sentences are carried out in order.
 */
public final class Declarations implements Sentences {
    private final Grammar grammar = Grammar.of(observables());
    private final Map<String, Magic> magics = Map.of(
            "oscillator", new OscillatorMagic(),
            "state", new StateMagic(),
            "evolve", new EvolveMagic(),
            "plan", new PlanMagic(),
            "table", new TableMagic(),
            "animate", new AnimateMagic(),
            "phasespace", new PhaseSpaceMagic(),
            "levels", new LevelsMagic(),
            "elements", new ElementsMagic());

    /** The table of the language, for a reference page. */
    public Grammar grammar() {
        return grammar;
    }

    private static List<Item> observables() {
        List<Item> items = new ArrayList<>();
        for (Observable observable : Observable.all()) {
            items.add(new Item(
                    observable.name(),
                    false,
                    observable.symbol(),
                    observable.kind().word(),
                    observable.meaning()));
        }
        Observable population = Observable.population(0);
        items.add(new Item("population of", true, "P_n", population.kind().word(), "probability to find level n"));
        return items;
    }

    @Override
    public void run(String text, SentenceContext context) throws SentenceFailure {
        SentenceText sentences = SentenceText.of(text);
        try {
            sentences.checkOpening();
            check(sentences, context.names());
            for (Place place : sentences.sentences()) {
                carryOut(text, place, context);
            }
        } catch (MisreadSentence e) {
            throw new SentenceFailure(e.message(), e.place().marked(text, context.firstLine()), e);
        }
    }

    /** Reads every sentence without carrying it out, each with the names that those before it will have declared. */
    private void check(SentenceText text, Names names) throws MisreadSentence {
        Foreseen foreseen = new Foreseen(new Things(names), new LinkedHashMap<>());
        for (Place place : text.sentences()) {
            Sentence sentence = grammar.check(text.text(), place, foreseen);
            Optional<Magic.Promise> promise = magic(sentence).promise(sentence);
            if (promise.isPresent()) {
                String noun = sentence.noun().word();
                check(noun, promise.get(), names, foreseen);
                foreseen.promised.put(
                        promise.get().name(),
                        sentence.declared().orElse(new Known(promise.get().name(), noun, "", false)));
            }
        }
    }

    private static void check(String noun, Magic.Promise promise, Names names, Foreseen foreseen)
            throws MisreadSentence {
        Known before = foreseen.promised.get(promise.name());
        if (before != null && !before.noun().equals(noun)) {
            throw new MisreadSentence(
                    "'" + promise.name() + "' is declared by '" + before.noun() + "' above and cannot be declared by '"
                            + noun + "' too; take another name",
                    promise.place());
        }
        try {
            names.check(noun, promise.name(), promise.type());
        } catch (IllegalArgumentException e) {
            throw new MisreadSentence(String.valueOf(e.getMessage()), promise.place(), e);
        }
    }

    /** The names there are, and those that the sentences read so far will declare. */
    private record Foreseen(Surroundings declared, Map<String, Known> promised) implements Surroundings {
        @Override
        public List<Known> all() {
            Map<String, Known> all = new LinkedHashMap<>();
            declared.all().forEach(known -> all.put(known.name(), known));
            all.putAll(promised);
            return List.copyOf(all.values());
        }

        @Override
        public Optional<Known> find(String name) {
            Known known = promised.get(name);
            return known == null ? declared.find(name) : Optional.of(known);
        }
    }

    private void carryOut(String text, Place place, SentenceContext context) throws MisreadSentence {
        Names names = context.names();
        Things things = new Things(names);
        Sentence sentence = grammar.read(text, place, things, (expression, at) -> {
            try {
                return context.evaluate(expression);
            } catch (SentenceFailure e) {
                throw new MisreadSentence(e.message(), at, e);
            }
        });
        Magic magic = magic(sentence);
        Magic.Outcome outcome;
        try {
            outcome = magic.carryOut(sentence, things);
        } catch (IllegalArgumentException | PhysicsException e) {
            String message = String.valueOf(e.getMessage());
            throw new MisreadSentence(message, sentence.placeSpokenOf(message), e);
        }
        Optional<Magic.Promise> promise = magic.promise(sentence);
        if (promise.isPresent()) {
            try {
                Magic.Promise kept = promise.get();
                declare(names, sentence.noun().word(), kept.name(), kept.type(), outcome.kept());
            } catch (IllegalArgumentException e) {
                throw new MisreadSentence(
                        String.valueOf(e.getMessage()), promise.get().place(), e);
            }
        }
        context.emit(outcome.shown());
    }

    private static <T> void declare(Names names, String noun, String name, Class<T> type, Object value) {
        names.declare(noun, name, type, type.cast(value));
    }

    private Magic magic(Sentence sentence) {
        Magic magic = magics.get(sentence.noun().word());
        if (magic == null) {
            throw new IllegalStateException(
                    "no class carries out '" + sentence.noun().word() + "'");
        }
        return magic;
    }

    @Override
    public Completion complete(String text, int cursor, Names names) {
        SentenceText sentences = SentenceText.of(text);
        Offers offers = grammar.complete(sentences, cursor, new Things(names));
        return new Completion(
                offers.place().start(),
                offers.place().end(),
                offers.offers().stream()
                        .map(offer -> new Completion.Candidate(offer.text(), offer.kind()))
                        .toList());
    }

    @Override
    public Optional<MimeBundle> inspect(String text, int cursor, int detail, Names names) {
        SentenceText sentences = SentenceText.of(text);
        return grammar.explain(sentences, cursor)
                .or(() -> grammar.wordAt(sentences, cursor).flatMap(names::find).map(DeclaredName::explanation))
                .map(explanation -> MimeBundle.plain(written(explanation, detail)));
    }

    private static String written(Explanation explanation, int detail) {
        List<String> lines = new ArrayList<>();
        lines.add(explanation.title());
        explanation.lines().forEach(line -> lines.add("  " + line));
        if (detail > 0) {
            explanation.more().forEach(line -> lines.add("  " + line));
        }
        return String.join("\n", lines);
    }
}
