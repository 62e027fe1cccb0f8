package ladderwell.kernel.sentence;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * A noun of the language, the first word of a sentence.
 *
 * @param word the word, lower case
 * @param subject the noun whose name follows; empty where a new name follows, which the sentence declares
 * @param head what follows the colon
 * @param headNoun the noun named after the colon, where the head is {@link Head#REFERENCE}; otherwise empty
 * @param kinds the kinds, where the head is {@link Head#KIND}
 * @param lead the key that follows the head without a comma: in, for, …
 * @param keys the keys that every sentence of this noun takes
 * @param items what a sentence lists, where the head is {@link Head#ITEMS}
 * @param pattern the form of the sentence
 * @param example a sentence as one would type it
 * @param meaning one line that says what the sentence does
 */
public record Noun(
        String word,
        String subject,
        Head head,
        String headNoun,
        List<NounKind> kinds,
        Optional<Key> lead,
        List<Key> keys,
        List<Item> items,
        String pattern,
        String example,
        String meaning) {

    /** What follows the colon. */
    public enum Head {
        /** A kind. */
        KIND,
        /** The name of something declared before. */
        REFERENCE,
        /** A list of items. */
        ITEMS,
        /** There is no colon. */
        NONE
    }

    /** Copies the lists. */
    public Noun {
        kinds = List.copyOf(kinds);
        keys = List.copyOf(keys);
        items = List.copyOf(items);
    }

    static Noun of(String word, String pattern, String example, String meaning) {
        return new Noun(
                word, "", Head.NONE, "", List.of(), Optional.empty(), List.of(), List.of(), pattern, example, meaning);
    }

    Noun about(String noun) {
        return new Noun(word, noun, head, headNoun, kinds, lead, keys, items, pattern, example, meaning);
    }

    Noun kinds(NounKind... list) {
        return new Noun(word, subject, Head.KIND, "", List.of(list), lead, keys, items, pattern, example, meaning);
    }

    Noun reference(String noun) {
        return new Noun(word, subject, Head.REFERENCE, noun, kinds, lead, keys, items, pattern, example, meaning);
    }

    Noun items(List<Item> list) {
        return new Noun(word, subject, Head.ITEMS, "", kinds, lead, keys, list, pattern, example, meaning);
    }

    Noun lead(Key key) {
        return new Noun(word, subject, head, headNoun, kinds, Optional.of(key), keys, items, pattern, example, meaning);
    }

    Noun keys(Key... list) {
        return new Noun(word, subject, head, headNoun, kinds, lead, List.of(list), items, pattern, example, meaning);
    }

    /** Whether its sentences declare a name. */
    public boolean declares() {
        return subject.isEmpty();
    }

    /** The kind of that word or alias, in any case. */
    public Optional<NounKind> kind(String words) {
        String typed = Words.plain(words);
        return kinds.stream()
                .filter(kind -> kind.word().equals(typed)
                        || (!kind.alias().isEmpty() && kind.alias().equals(typed)))
                .findFirst();
    }

    /** The keys that follow the head without a comma, in their order: those of the kind, then the noun's. */
    public List<Key> leads(Optional<NounKind> kind) {
        List<Key> all = new ArrayList<>();
        kind.ifPresent(k -> all.addAll(k.links()));
        lead.ifPresent(all::add);
        return all;
    }

    /**
     * Every key that a sentence of this noun and kind takes: those that follow the head first, those of the kind, those of the
     * noun.
     */
    public List<Key> keys(Optional<NounKind> kind) {
        List<Key> all = new ArrayList<>(leads(kind));
        kind.ifPresent(k -> all.addAll(k.keys()));
        all.addAll(keys);
        return all;
    }
}
