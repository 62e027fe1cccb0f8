package ladderwell.kernel.sentence;

import java.util.List;
import java.util.Optional;

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
 * @param argument what follows the kind at once, without a word before it: a formula, a file, a number
 * @param links keys that follow without a comma, before the noun's own lead: of, …
 * @param parameters whether any other name may be given a value, for a formula to use
 */
public record NounKind(
        String word,
        String alias,
        String phrase,
        String meaning,
        String formula,
        List<String> homes,
        List<Key> keys,
        List<Way> ways,
        Optional<Key> argument,
        List<Key> links,
        boolean parameters) {

    /** Copies the lists. */
    public NounKind {
        homes = List.copyOf(homes);
        keys = List.copyOf(keys);
        ways = List.copyOf(ways);
        links = List.copyOf(links);
    }

    static NounKind of(String word, String phrase, String meaning, String formula) {
        return new NounKind(
                word,
                "",
                phrase,
                meaning,
                formula,
                List.of(),
                List.of(),
                List.of(),
                Optional.empty(),
                List.of(),
                false);
    }

    NounKind alias(String other) {
        return new NounKind(word, other, phrase, meaning, formula, homes, keys, ways, argument, links, parameters);
    }

    NounKind homes(String... kinds) {
        return new NounKind(
                word, alias, phrase, meaning, formula, List.of(kinds), keys, ways, argument, links, parameters);
    }

    NounKind keys(Key... list) {
        return new NounKind(
                word, alias, phrase, meaning, formula, homes, List.of(list), ways, argument, links, parameters);
    }

    NounKind ways(Way... list) {
        return new NounKind(
                word, alias, phrase, meaning, formula, homes, keys, List.of(list), argument, links, parameters);
    }

    NounKind argument(Key key) {
        return new NounKind(
                word, alias, phrase, meaning, formula, homes, keys, ways, Optional.of(key), links, parameters);
    }

    NounKind links(Key... list) {
        return new NounKind(
                word, alias, phrase, meaning, formula, homes, keys, ways, argument, List.of(list), parameters);
    }

    NounKind withParameters() {
        return new NounKind(word, alias, phrase, meaning, formula, homes, keys, ways, argument, links, true);
    }
}
