package ladderwell.kernel.sentence;

import java.util.List;
import java.util.Optional;
import ladderwell.kernel.sentence.Outline.Clause;
import ladderwell.kernel.sentence.Piece.Sort;

/** Reads what a sentence lists. */
final class ItemList {
    private final Noun noun;
    private final Expressions expressions;

    ItemList(Noun noun, Expressions expressions) {
        this.noun = noun;
        this.expressions = expressions;
    }

    /**
     * What was found.
     *
     * @param items full names; none where they come from an expression that was not evaluated
     * @param clauses how many clauses were read
     */
    record Found(List<String> items, int clauses) {}

    /** Reads the first item. A name may hold commas, so that it takes several clauses; the longest name wins. */
    Found read(List<Clause> clauses) throws MisreadSentence {
        int most = noun.items().stream()
                .mapToInt(item -> item.words().split(",", -1).length)
                .max()
                .orElse(1);
        for (int n = Math.min(most, clauses.size()); n > 1; n--) {
            List<Clause> several = clauses.subList(0, n);
            if (several.stream().allMatch(clause -> clause.key().isEmpty())) {
                String name = String.join(
                        ", ",
                        several.stream()
                                .map(clause -> Outline.text(clause.value()))
                                .toList());
                Optional<Item> item = named(name);
                if (item.isPresent()) {
                    return new Found(List.of(item.get().words()), n);
                }
            }
        }
        return new Found(one(clauses.get(0).value()), 1);
    }

    private List<String> one(List<Piece> pieces) throws MisreadSentence {
        if (pieces.size() == 1 && pieces.get(0).is(Sort.JAVA)) {
            return evaluated(pieces.get(0));
        }
        if (pieces.size() == 1
                && pieces.get(0).is(Sort.QUOTED)
                && noun.items().stream().anyMatch(Item::quoted)) {
            return List.of('"' + pieces.get(0).text() + '"');
        }
        if (pieces.stream().allMatch(piece -> piece.is(Sort.WORD))) {
            Optional<Item> item = named(Outline.text(pieces));
            if (item.isPresent()) {
                return List.of(item.get().words());
            }
        }
        for (Item item : noun.items()) {
            int words = item.words().split(" ").length;
            if (item.numbered() && pieces.size() >= words && startsWith(pieces, item, words)) {
                return List.of(item.words() + " " + level(item, pieces, words));
            }
        }
        throw unknown(pieces);
    }

    private static boolean startsWith(List<Piece> pieces, Item item, int words) {
        return Words.plain(Outline.text(pieces.subList(0, words))).equals(Words.plain(item.words()));
    }

    private long level(Item item, List<Piece> pieces, int words) throws MisreadSentence {
        Key key = Key.count(item.words(), 0, Long.MAX_VALUE, "3", item.meaning());
        if (pieces.size() == words) {
            throw new MisreadSentence(
                    "a number is missing after '" + item.words() + "', as in '" + item.words() + " 3'",
                    pieces.get(words - 1).place().behind());
        }
        List<Term> terms = Term.of(pieces.subList(words, pieces.size()), expressions);
        if (terms.isEmpty()) {
            throw unknown(pieces);
        }
        return new Values(key, terms, new Values.Beyond() {
                    @Override
                    public MisreadSentence mistake(Term term, String complete) {
                        return new MisreadSentence(
                                Words.quoted(term.text()) + " is too much after " + Words.quoted(complete)
                                        + "; expected a comma or the end of the sentence",
                                term.place());
                    }

                    @Override
                    public boolean isEntry(Term term) {
                        return false;
                    }
                })
                .count();
    }

    private List<String> evaluated(Piece piece) throws MisreadSentence {
        Object value = expressions.value(piece.text().strip(), piece.place());
        if (value == Values.UNKNOWN) {
            return List.of();
        }
        String name = value instanceof CharSequence ? value.toString() : "";
        List<Piece> words = Pieces.of(name, 0, name.length()).stream()
                .map(word -> new Piece(word.sort(), word.text(), piece.place()))
                .toList();
        Optional<Item> item = named(name);
        if (item.isPresent()) {
            return List.of(item.get().words());
        }
        if (words.isEmpty() || !words.stream().allMatch(word -> word.is(Sort.WORD))) {
            throw new MisreadSentence(
                    Words.quoted("{" + piece.text().strip() + "}")
                            + " gives no text; expected the name of " + Words.article(sort()) + ", such as "
                            + noun.items().get(0).words(),
                    piece.place());
        }
        return one(words);
    }

    private Optional<Item> named(String name) {
        String typed = Words.plain(name);
        return noun.items().stream()
                .filter(item -> !item.numbered()
                        && !item.quoted()
                        && Words.plain(item.words()).equals(typed))
                .findFirst();
    }

    private String sort() {
        return noun.items().get(0).sort();
    }

    private MisreadSentence unknown(List<Piece> pieces) {
        for (int n = pieces.size() - 1; n > 0; n--) {
            if (n < 6 && named(Outline.text(pieces.subList(0, n))).isPresent()) {
                return new MisreadSentence(
                        "a comma is missing before "
                                + Words.quoted(pieces.get(n).typed()),
                        pieces.get(n).place());
            }
        }
        String typed = Outline.text(pieces);
        List<String> names = noun.items().stream().map(Item::typed).toList();
        Optional<String> near = Words.nearest(typed, names)
                .or(() -> Words.nearest(
                        pieces.get(0).text(),
                        noun.keys().stream().map(Key::word).toList()));
        return new MisreadSentence(
                Words.quoted(typed) + " is no " + sort()
                        + (near.isPresent() ? Words.didYouMean(near) : "; expected one of " + String.join("; ", names)),
                Outline.placeOf(pieces).orElse(new Place(0, 0)));
    }
}
