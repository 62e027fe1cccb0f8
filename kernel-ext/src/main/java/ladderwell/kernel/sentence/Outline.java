package ladderwell.kernel.sentence;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.stream.Collectors;
import ladderwell.kernel.sentence.Noun.Head;
import ladderwell.kernel.sentence.Piece.Sort;

/**
 * The parts of a sentence as far as they can be told apart. Never fails; what is missing is empty, and what is wrong is
 * found by whoever asks more of it: the reader, the completer, the inspector.
 *
 * @param nounPiece the first piece
 * @param noun the noun it is
 * @param subject the pieces up to the colon, or up to the first comma where the noun takes no colon
 * @param colon the colon
 * @param head the kind, or the name after the colon
 * @param kind the kind it is
 * @param clauses what follows, parted at commas; the first is joined where it follows the head without a comma
 */
record Outline(
        Optional<Piece> nounPiece,
        Optional<Noun> noun,
        List<Piece> subject,
        Optional<Piece> colon,
        List<Piece> head,
        Optional<NounKind> kind,
        List<Clause> clauses) {

    /**
     * An entry: a key and its value, or an item of a list.
     *
     * @param joined whether it follows the head without a comma
     * @param comma the comma before it, if there is one
     * @param key the key, if it starts with one
     * @param keyPieces the pieces of the key
     * @param value the pieces after the key; all of them where there is no key
     */
    record Clause(boolean joined, Optional<Piece> comma, Optional<Key> key, List<Piece> keyPieces, List<Piece> value) {
        /** The key's pieces, or of a kind's own argument the kind's, and the value's. */
        List<Piece> pieces() {
            List<Piece> all = new ArrayList<>(keyPieces);
            all.addAll(value);
            return all;
        }

        Optional<Place> place() {
            return placeOf(pieces());
        }
    }

    static Optional<Place> placeOf(List<Piece> pieces) {
        return pieces.isEmpty()
                ? Optional.empty()
                : Optional.of(
                        pieces.get(0).place().to(pieces.get(pieces.size() - 1).place()));
    }

    static String text(List<Piece> pieces) {
        return pieces.stream().map(Piece::typed).collect(Collectors.joining(" "));
    }

    static Outline of(Grammar grammar, List<Piece> all) {
        List<Piece> pieces =
                all.stream().filter(piece -> !piece.is(Sort.COMMENT)).toList();
        if (pieces.isEmpty()) {
            return new Outline(
                    Optional.empty(),
                    Optional.empty(),
                    List.of(),
                    Optional.empty(),
                    List.of(),
                    Optional.empty(),
                    List.of());
        }
        Optional<Noun> noun = Optional.of(pieces.get(0))
                .filter(piece -> piece.is(Sort.WORD))
                .flatMap(piece -> grammar.noun(piece.text()));
        List<Piece> rest = pieces.subList(1, pieces.size());
        int colonAt = index(rest, Sort.COLON);
        int commaAt = index(rest, Sort.COMMA);
        boolean takesColon = noun.isPresent() && noun.get().head() != Head.NONE;
        List<Piece> subject;
        Optional<Piece> colon = Optional.empty();
        List<Piece> body;
        if (colonAt < commaAt || (takesColon && colonAt < rest.size())) {
            subject = rest.subList(0, colonAt);
            colon = Optional.of(rest.get(colonAt));
            body = rest.subList(colonAt + 1, rest.size());
        } else if (takesColon) {
            subject = rest.subList(0, commaAt);
            body = rest.subList(commaAt, rest.size());
        } else {
            // Without a colon the name is one word, and a lead key may follow it.
            int words = Math.min(1, commaAt);
            subject = rest.subList(0, words);
            body = rest.subList(words, rest.size());
        }
        return new Body(noun, body, colon.isPresent()).outline(pieces.get(0), subject, colon);
    }

    private static int index(List<Piece> pieces, Sort sort) {
        for (int i = 0; i < pieces.size(); i++) {
            if (pieces.get(i).is(sort)) {
                return i;
            }
        }
        return pieces.size();
    }

    /** What follows the colon, or the name where there is none. */
    private record Body(Optional<Noun> noun, List<Piece> pieces, boolean afterColon) {

        Outline outline(Piece nounPiece, List<Piece> subject, Optional<Piece> colon) {
            int first = index(pieces, Sort.COMMA);
            List<Piece> opening = pieces.subList(0, first);
            Head form = noun.map(Noun::head).orElse(Head.NONE);
            List<Piece> head = List.of();
            Optional<NounKind> kind = Optional.empty();
            if (afterColon && form == Head.REFERENCE) {
                head = opening.subList(0, Math.min(1, opening.size()));
            } else if (afterColon && form == Head.KIND) {
                int words = kindLength(opening);
                kind = words == 0 ? Optional.empty() : noun.get().kind(text(opening.subList(0, words)));
                head = opening.subList(0, words == 0 ? beforeLead(opening) : words);
            }
            Optional<NounKind> found = kind;
            List<Key> keys = noun.map(n -> n.keys(found)).orElse(List.of());
            List<Clause> clauses = new ArrayList<>();
            List<Piece> joined = opening.subList(head.size(), opening.size());
            Optional<Key> argument = kind.flatMap(NounKind::argument);
            List<String> leads = noun.map(n -> n.leads(found)).orElse(List.of()).stream()
                    .map(Key::word)
                    .toList();
            if (argument.isPresent()) {
                boolean missing = joined.isEmpty() || isLead(leads, joined.get(0));
                List<Piece> value = joined.subList(0, missing ? 0 : 1);
                clauses.add(new Clause(true, Optional.empty(), argument, head, value));
                joined = joined.subList(value.size(), joined.size());
            }
            for (int from = 0; from < joined.size(); ) {
                int to = from + 1;
                while (to < joined.size() && !isLead(leads, joined.get(to))) {
                    to++;
                }
                clauses.add(clause(keys, form != Head.ITEMS, Optional.empty(), joined.subList(from, to)));
                from = to;
            }
            if (joined.isEmpty() && afterColon && form == Head.ITEMS) {
                clauses.add(clause(keys, false, Optional.empty(), joined));
            }
            for (int at = first; at < pieces.size(); ) {
                List<Piece> after = pieces.subList(at + 1, pieces.size());
                int next = index(after, Sort.COMMA);
                List<Piece> words = after.subList(0, next);
                int rider = rider(kind, words);
                Clause clause = clause(keys, false, Optional.of(pieces.get(at)), words.subList(0, rider));
                clauses.add(kind.filter(NounKind::parameters).isPresent() ? named(clause) : clause);
                if (rider < next) {
                    clauses.add(clause(keys, true, Optional.empty(), words.subList(rider, next)));
                }
                at += 1 + next;
            }
            return new Outline(Optional.of(nounPiece), noun, subject, colon, head, kind, clauses);
        }

        /** Where a key of the kind that needs no comma stands behind a value, as in "drive 80 kHz at 5 GHz"; else the end. */
        private static int rider(Optional<NounKind> kind, List<Piece> words) {
            List<String> links = kind.map(NounKind::links).orElse(List.of()).stream()
                    .map(Key::word)
                    .toList();
            for (int i = 2; i < words.size(); i++) {
                if (isLead(links, words.get(i))) {
                    return i;
                }
            }
            return words.size();
        }

        /** How many pieces the longest kind takes that they start with. */
        private int kindLength(List<Piece> opening) {
            for (int n = Math.min(3, opening.size()); n > 0; n--) {
                List<Piece> words = opening.subList(0, n);
                if (words.stream().allMatch(piece -> piece.is(Sort.WORD))
                        && noun.flatMap(some -> some.kind(text(words))).isPresent()) {
                    return n;
                }
            }
            return 0;
        }

        private int beforeLead(List<Piece> opening) {
            Optional<Key> lead = noun.flatMap(Noun::lead);
            for (int i = 0; i < opening.size(); i++) {
                Piece piece = opening.get(i);
                if (lead.isPresent() && piece.isWord(lead.get().word())) {
                    return i;
                }
            }
            return opening.size();
        }

        private static boolean isLead(List<String> leads, Piece piece) {
            return leads.stream().anyMatch(piece::isWord);
        }

        /** A name with a value behind it, where any name may stand, is a parameter. */
        private static Clause named(Clause clause) {
            List<Piece> pieces = clause.value();
            if (clause.key().isPresent()
                    || pieces.size() < 2
                    || !pieces.get(0).is(Sort.WORD)
                    || !Character.isLetter(pieces.get(0).text().codePointAt(0))) {
                return clause;
            }
            return new Clause(
                    false,
                    clause.comma(),
                    Optional.of(Key.parameter(pieces.get(0).text())),
                    pieces.subList(0, 1),
                    pieces.subList(1, pieces.size()));
        }

        private static Clause clause(List<Key> keys, boolean joined, Optional<Piece> comma, List<Piece> pieces) {
            for (Key key : keys) {
                int words = key.word().split(" ").length;
                if (words <= pieces.size()
                        && pieces.subList(0, words).stream().allMatch(piece -> piece.is(Sort.WORD))
                        && Words.plain(text(pieces.subList(0, words))).equals(key.word())) {
                    return new Clause(
                            joined,
                            comma,
                            Optional.of(key),
                            pieces.subList(0, words),
                            pieces.subList(words, pieces.size()));
                }
            }
            return new Clause(joined, comma, Optional.empty(), List.of(), pieces);
        }
    }
}
