package ladderwell.kernel.sentence;

import java.util.List;
import java.util.Optional;

/**
 * Looks up the names that a sentence speaks of.
 *
 * @param kind the kind of the sentence
 */
record References(Grammar grammar, Surroundings surroundings, Optional<NounKind> kind) {

    /** What a name stands for. @param noun the noun it must count as @param taker the word that takes it */
    Known known(String noun, Piece piece, String taker) throws MisreadSentence {
        String name = piece.text();
        String thing = Grammar.thing(noun);
        List<String> fitting = surroundings.all().stream()
                .filter(known -> known.noun().equals(noun))
                .map(Known::name)
                .toList();
        Optional<Known> found = name.length() > 200 ? Optional.empty() : surroundings.find(name);
        if (found.isEmpty()) {
            String hint = fitting.isEmpty()
                    ? "; none is declared yet, as in '"
                            + grammar.noun(noun).map(Noun::example).orElse(noun) + "'"
                    : Words.didYouMean(Words.nearest(name, fitting));
            throw new MisreadSentence(
                    "there is no " + thing.substring(thing.indexOf(' ') + 1) + " " + Words.quoted(name) + hint,
                    piece.place());
        }
        Known known = found.get();
        if (!known.noun().equals(noun)) {
            String such = fitting.isEmpty() ? "" : ", such as " + fitting.get(fitting.size() - 1);
            throw new MisreadSentence(
                    Words.quoted(name) + " is " + Grammar.thing(known.noun()) + "; '" + taker + "' takes " + thing
                            + such,
                    piece.place());
        }
        return known;
    }

    /** Refuses what the kind of the sentence cannot live in. */
    void checkHome(Key key, Known known, Place at) throws MisreadSentence {
        List<String> homes = kind.map(NounKind::homes).orElse(List.of());
        if (homes.isEmpty() || homes.contains(known.kind())) {
            return;
        }
        List<String> phrases =
                homes.stream().map(home -> phrase(key.noun(), home)).toList();
        throw new MisreadSentence(
                Words.article(kind.orElseThrow().phrase()) + " lives in "
                        + Words.either(phrases.stream().map(Words::article).toList()) + "; "
                        + Words.quoted(known.name()) + " is " + Words.article(phrase(key.noun(), known.kind())),
                at);
    }

    private String phrase(String noun, String word) {
        return grammar.noun(noun)
                .flatMap(some -> some.kind(word))
                .map(NounKind::phrase)
                .orElse(word);
    }
}
