package ladderwell.kernel.sentence;

import java.util.ArrayList;
import java.util.Collection;
import java.util.List;
import java.util.stream.Collectors;
import ladderwell.kernel.sentence.Outline.Clause;

/** Which keys of a kind go together, and which are missing. */
final class Ways {
    private Ways() {}

    /** The ways that allow all of these keys; keys that are not the kind's own do not count. */
    static List<Way> open(NounKind kind, Collection<String> given) {
        return kind.ways().stream()
                .filter(way -> given.stream().allMatch(word -> !isOwn(kind, word) || way.allows(word)))
                .toList();
    }

    private static boolean isOwn(NounKind kind, String word) {
        return kind.keys().stream().anyMatch(key -> key.word().equals(word));
    }

    static void refuseConflict(NounKind kind, List<Clause> clauses) throws MisreadSentence {
        List<String> given = new ArrayList<>();
        for (Clause clause : clauses) {
            if (clause.key().isPresent()) {
                String word = clause.key().get().word();
                List<String> more = new ArrayList<>(given);
                more.add(word);
                if (open(kind, more).isEmpty()) {
                    List<String> against = given.stream()
                            .filter(other -> open(kind, List.of(other, word)).isEmpty())
                            .map(other -> "'" + other + "'")
                            .toList();
                    throw new MisreadSentence(
                            "'" + word + "' does not go with "
                                    + (against.isEmpty() ? "what stands before it" : Words.all(against)) + "; "
                                    + Words.article(kind.phrase()) + " takes " + all(kind),
                            Outline.placeOf(clause.keyPieces()).orElse(new Place(0, 0)));
                }
                given = more;
            }
        }
    }

    private static String all(NounKind kind) {
        return Words.either(kind.ways().stream()
                .map(way -> way.required().size() == 1
                        ? way.required().get(0)
                        : way.required().stream().collect(Collectors.joining(" with ")))
                .toList());
    }

    static void refuseMissing(NounKind kind, Collection<String> given, Place end) throws MisreadSentence {
        List<Way> open = open(kind, given);
        List<List<String>> missing = open.stream()
                .map(way -> way.required().stream()
                        .filter(word -> !given.contains(word))
                        .toList())
                .toList();
        if (missing.isEmpty() || missing.stream().anyMatch(List::isEmpty)) {
            return;
        }
        int least = missing.stream().mapToInt(List::size).min().orElse(0);
        boolean started = given.stream().anyMatch(word -> isOwn(kind, word));
        // Before anything is given every way is open; afterwards only the nearest ones are worth naming.
        String choices = Words.either(missing.stream()
                .filter(words -> !started || words.size() == least)
                .map(words -> words.stream()
                        .map(word -> "'" + typed(kind, word) + "'")
                        .collect(Collectors.joining(" and ")))
                .toList());
        throw new MisreadSentence(
                Words.article(kind.phrase()) + (started ? " needs " + choices + " besides" : " needs " + choices), end);
    }

    private static String typed(NounKind kind, String word) {
        return kind.keys().stream()
                .filter(key -> key.word().equals(word))
                .map(Key::typed)
                .findFirst()
                .orElse(word);
    }
}
