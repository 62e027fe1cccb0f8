package ladderwell.kernel.sentence;

import java.util.List;

/**
 * A kind of a noun: harmonic, box, coherent, ….
 *
 * @param word the word or words after the colon, lower case
 * @param alias another name that the trade uses for it; may be empty
 * @param phrase how messages call it: "harmonic oscillator", "box", "coherent state"
 * @param meaning one line that says what it is
 * @param formula its formula; may be empty
 * @param homes the kinds of the noun named after {@code in} that it can live in; empty where any will do
 * @param keys its keys, most usual first
 * @param ways the ways to say enough
 */
public record NounKind(
        String word,
        String alias,
        String phrase,
        String meaning,
        String formula,
        List<String> homes,
        List<Key> keys,
        List<Way> ways) {

    /** Copies the lists. */
    public NounKind {
        homes = List.copyOf(homes);
        keys = List.copyOf(keys);
        ways = List.copyOf(ways);
    }

    static NounKind of(String word, String phrase, String meaning, String formula) {
        return new NounKind(word, "", phrase, meaning, formula, List.of(), List.of(), List.of());
    }

    NounKind alias(String other) {
        return new NounKind(word, other, phrase, meaning, formula, homes, keys, ways);
    }

    NounKind homes(String... kinds) {
        return new NounKind(word, alias, phrase, meaning, formula, List.of(kinds), keys, ways);
    }

    NounKind keys(Key... list) {
        return new NounKind(word, alias, phrase, meaning, formula, homes, List.of(list), ways);
    }

    NounKind ways(Way... list) {
        return new NounKind(word, alias, phrase, meaning, formula, homes, keys, List.of(list));
    }
}
