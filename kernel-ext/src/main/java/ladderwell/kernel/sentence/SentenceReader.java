package ladderwell.kernel.sentence;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import ladderwell.kernel.sentence.Noun.Head;
import ladderwell.kernel.sentence.Outline.Clause;
import ladderwell.kernel.sentence.Piece.Sort;
import ladderwell.kernel.sentence.Sentence.Value;

/**
 * Reads one sentence. Mistakes are found in this order: marks, noun, name, kind, keys, names spoken of, keys that do not go
 * together, values from left to right, keys that are missing.
 */
final class SentenceReader {
    private final Grammar grammar;
    private final Place place;
    private final Surroundings surroundings;
    private final Expressions expressions;
    private final List<Piece> pieces;
    private final Outline outline;
    private final Map<String, Value> values = new LinkedHashMap<>();
    private Optional<String> natural = Optional.empty();

    SentenceReader(Grammar grammar, String text, Place place, Surroundings surroundings, Expressions expressions) {
        this.grammar = grammar;
        this.place = place;
        this.surroundings = surroundings;
        this.expressions = expressions;
        this.pieces = Pieces.of(text, place.start(), place.end()).stream()
                .filter(piece -> !piece.is(Sort.COMMENT))
                .toList();
        this.outline = Outline.of(grammar, pieces);
    }

    Sentence read() throws MisreadSentence {
        Opening opening = new Opening(grammar, place, pieces, outline);
        opening.refuseLooseMarks();
        Noun noun = opening.noun();
        Piece name = opening.name(noun);
        opening.checkHead(noun);
        checkClauses(noun);
        readReferences(noun, name);
        if (outline.kind().isPresent()) {
            Ways.refuseConflict(outline.kind().get(), outline.clauses());
        }
        List<String> items = readValues(noun);
        refuseMissing(noun, items);
        return new Sentence(
                noun,
                name.text(),
                name.place(),
                outline.kind(),
                natural.isPresent(),
                Outline.placeOf(pieces).orElse(place),
                values,
                items);
    }

    // ------------------------------------------------------------------ keys

    private List<Key> keys(Noun noun) {
        return noun.keys(outline.kind());
    }

    private void checkClauses(Noun noun) throws MisreadSentence {
        Map<String, Clause> seen = new LinkedHashMap<>();
        Optional<Clause> before = Optional.empty();
        for (Clause clause : outline.clauses()) {
            if (clause.key().isPresent()) {
                Key key = clause.key().get();
                if (clause.joined() && !mayJoin(noun, key)) {
                    throw commaMissing(clause.keyPieces().get(0));
                }
                if (seen.put(key.word(), clause) != null) {
                    throw new MisreadSentence(
                            "'" + key.word() + "' is given twice; keep one of them",
                            clause.place().orElse(place));
                }
            } else if (noun.head() != Head.ITEMS || clause.value().isEmpty()) {
                throw noKey(noun, clause, before);
            }
            before = Optional.of(clause);
        }
    }

    private boolean mayJoin(Noun noun, Key key) {
        return noun.leads(outline.kind()).contains(key)
                || outline.kind().flatMap(NounKind::argument).equals(Optional.of(key));
    }

    private MisreadSentence noKey(Noun noun, Clause clause, Optional<Clause> before) {
        List<String> keys = keys(noun).stream().map(Key::word).toList();
        if (clause.value().isEmpty()) {
            Place at = clause.comma()
                    .map(Piece::place)
                    .orElseGet(() -> outline.colon().map(Piece::place).orElse(place));
            String where = clause.comma().isPresent() ? "this comma" : "the colon";
            return new MisreadSentence(
                    "nothing stands behind " + where + "; expected "
                            + (noun.head() == Head.ITEMS
                                    ? Words.article(noun.items().get(0).sort()) + " such as "
                                            + noun.items().get(0).words()
                                    : "a key: " + Words.either(keys)),
                    at);
        }
        Piece first = clause.value().get(0);
        if (clause.joined()) {
            String lead = noun.leads(outline.kind()).stream()
                    .filter(key -> outline.clauses().stream()
                            .noneMatch(other -> other.key().equals(Optional.of(key))))
                    .findFirst()
                    .map(key -> " or '" + key.typed() + "'")
                    .orElse("");
            return new MisreadSentence(
                    Words.quoted(first.typed()) + " is too much here; expected a comma" + lead
                            + Words.didYouMean(Words.nearest(first.text(), keys)),
                    first.place());
        }
        boolean digits =
                Character.isDigit(first.text().isEmpty() ? ' ' : first.text().charAt(0));
        boolean afterDigits = before.map(Clause::value)
                .filter(value -> !value.isEmpty())
                .map(value -> value.get(value.size() - 1).text())
                .filter(text -> text.chars().allMatch(c -> c >= '0' && c <= '9'))
                .isPresent();
        if (digits && afterDigits) {
            return new MisreadSentence(
                    "expected a key after the comma, not " + Words.quoted(first.typed())
                            + "; decimals are written with a point, as in 9.5",
                    first.place());
        }
        String of = outline.kind().map(kind -> Words.article(kind.phrase())).orElse("'" + noun.word() + "'");
        return new MisreadSentence(
                Words.quoted(first.typed()) + " is no key of " + of + "; expected " + Words.either(keys)
                        + Words.didYouMean(Words.nearest(first.text(), keys)),
                first.place());
    }

    private static MisreadSentence commaMissing(Piece piece) {
        return new MisreadSentence("a comma is missing before " + Words.quoted(piece.typed()), piece.place());
    }

    // ------------------------------------------------------------------ names spoken of

    private void readReferences(Noun noun, Piece name) throws MisreadSentence {
        References references = new References(grammar, surroundings, outline.kind());
        if (!noun.declares()) {
            speakOf(references.known(noun.subject(), name, noun.word()));
        }
        if (noun.head() == Head.REFERENCE) {
            Piece head = outline.head().get(0);
            if (!head.is(Sort.WORD)) {
                throw new MisreadSentence(
                        "expected the name of " + Grammar.thing(noun.headNoun()) + " after the colon, not "
                                + Words.quoted(head.typed()),
                        head.place());
            }
            Known known = speakOf(references.known(noun.headNoun(), head, noun.word()));
            values.put(noun.headNoun(), new Value(known.name(), List.of(), head.place()));
        }
        for (Clause clause : outline.clauses()) {
            if (clause.key().isEmpty()) {
                continue;
            }
            Key key = clause.key().get();
            if (key.form() == Form.REFERENCE) {
                Piece spoken = one(key, clause);
                Known known = speakOf(references.known(key.noun(), spoken, key.word()));
                references.checkHome(key, known, spoken.place());
                values.put(key.word(), new Value(known.name(), List.of(), spoken.place()));
            } else if (key.form() == Form.FLAG && key.word().equals("natural")) {
                natural = Optional.of(Words.quoted(name.typed()));
            }
        }
    }

    private Known speakOf(Known known) {
        if (known.natural()) {
            natural = Optional.of(Words.quoted(known.name()));
        }
        return known;
    }

    // ------------------------------------------------------------------ values

    private List<String> readValues(Noun noun) throws MisreadSentence {
        List<String> items = new ArrayList<>();
        List<Clause> clauses = outline.clauses();
        for (int i = 0; i < clauses.size(); i++) {
            Clause clause = clauses.get(i);
            if (clause.key().isEmpty()) {
                ItemList.Found found = new ItemList(noun, expressions).read(clauses.subList(i, clauses.size()));
                i += found.clauses() - 1;
                Clause end = clauses.get(i);
                Place at = clause.place()
                        .map(start -> end.place().map(start::to).orElse(start))
                        .orElse(place);
                for (String item : found.items()) {
                    if (values.put(item, new Value(item, List.of(), at)) != null) {
                        throw new MisreadSentence("'" + item + "' is listed twice; once is enough", at);
                    }
                    items.add(item);
                }
            } else if (clause.key().get().form() != Form.REFERENCE) {
                Key key = clause.key().get();
                values.put(key.word(), value(key, clause));
            }
        }
        return items;
    }

    private Value value(Key key, Clause clause) throws MisreadSentence {
        Place keyPlace = Outline.placeOf(clause.keyPieces()).orElse(place);
        if (key.form() == Form.FLAG) {
            if (!clause.value().isEmpty()) {
                throw after(Term.word(clause.value().get(0)), key.word());
            }
            return new Value(Boolean.TRUE, List.of(), keyPlace);
        }
        if (key.form() == Form.NEW_NAME) {
            Piece name = one(key, clause);
            Opening.checkIdentifier(name);
            return new Value(name.text(), List.of(), name.place());
        }
        if (key.form() == Form.TEXT) {
            return text(key, clause);
        }
        List<Term> terms = terms(key, clause);
        Values reading = new Values(key, terms, new Values.Beyond() {
            @Override
            public MisreadSentence mistake(Term term, String complete) {
                return after(term, complete);
            }

            @Override
            public boolean isEntry(Term term) {
                return startsEntry(term);
            }
        });
        Object object = switch (key.form()) {
            case QUANTITY -> reading.quantity(natural);
            case AMOUNT -> reading.amount();
            case NUMBER -> reading.number();
            case COUNT -> reading.count();
            case COMPLEX -> reading.complex();
            case CHOICE -> reading.choice();
            case COUNTS -> reading.counts();
            case COMPLEXES -> reading.complexes();
            default -> throw new IllegalStateException("read elsewhere: " + key.form());
        };
        return new Value(object, terms, Outline.placeOf(clause.value()).orElse(keyPlace));
    }

    /** A text in quotes, or an expression that gives one. */
    private Value text(Key key, Clause clause) throws MisreadSentence {
        refuseNoValue(key, clause);
        Piece piece = clause.value().get(0);
        Term term = Term.word(piece);
        if (clause.value().size() > 1) {
            throw after(Term.word(clause.value().get(1)), piece.typed());
        }
        if (piece.is(Sort.JAVA)) {
            Object given = expressions.value(piece.text().strip(), piece.place());
            if (given == Values.UNKNOWN) {
                return new Value("", List.of(term), piece.place());
            }
            if (given instanceof CharSequence typed) {
                return new Value(typed.toString(), List.of(term), piece.place());
            }
        }
        if (!piece.is(Sort.QUOTED)) {
            throw new MisreadSentence(
                    key.word() + " takes " + key.expected() + ", not " + Words.quoted(piece.typed()), piece.place());
        }
        return new Value(piece.text(), List.of(term), piece.place());
    }

    private void refuseNoValue(Key key, Clause clause) throws MisreadSentence {
        if (clause.value().isEmpty()) {
            String word = outline.kind().flatMap(NounKind::argument).equals(Optional.of(key))
                    ? outline.kind().orElseThrow().word()
                    : key.word();
            throw new MisreadSentence(
                    "a value is missing after '" + word + "'; expected " + key.expected(),
                    Outline.placeOf(clause.keyPieces()).orElse(place).behind());
        }
    }

    private List<Term> terms(Key key, Clause clause) throws MisreadSentence {
        refuseNoValue(key, clause);
        List<Term> terms = Term.of(clause.value(), expressions);
        if (terms.isEmpty()) {
            throw new MisreadSentence(
                    "the expression gives no numbers; " + key.word() + " takes " + key.expected(),
                    Outline.placeOf(clause.value()).orElse(place));
        }
        return terms;
    }

    /** The one word of a name; a name is no value and does not come from an expression. */
    private Piece one(Key key, Clause clause) throws MisreadSentence {
        refuseNoValue(key, clause);
        Piece first = clause.value().get(0);
        if (!first.is(Sort.WORD)) {
            throw new MisreadSentence(
                    key.word() + " takes " + key.expected() + ", not " + Words.quoted(first.typed()), first.place());
        }
        if (clause.value().size() > 1) {
            throw after(Term.word(clause.value().get(1)), first.text());
        }
        return first;
    }

    private boolean startsEntry(Term term) {
        return term.word()
                && outline.noun().stream()
                        .flatMap(noun -> keys(noun).stream())
                        .anyMatch(key -> key.word().equals(Words.plain(term.text())));
    }

    private MisreadSentence after(Term term, String complete) {
        return startsEntry(term)
                ? new MisreadSentence("a comma is missing before " + Words.quoted(term.text()), term.place())
                : new MisreadSentence(
                        Words.quoted(term.text()) + " is too much after " + Words.quoted(complete)
                                + "; expected a comma or the end of the sentence",
                        term.place());
    }

    // ------------------------------------------------------------------ what is missing

    private void refuseMissing(Noun noun, List<String> items) throws MisreadSentence {
        Place end = Outline.placeOf(pieces).orElse(place).behind();
        for (Key lead : noun.leads(outline.kind())) {
            if (!values.containsKey(lead.word()) && lead.standard().isEmpty()) {
                Place afterHead = Outline.placeOf(outline.head())
                        .orElseGet(() -> outline.subject().get(0).place());
                throw new MisreadSentence(
                        "'" + lead.word() + "' is missing after " + Words.quoted(Outline.text(outline.head()))
                                + ", as in '"
                                + (noun.lead().equals(Optional.of(lead)) ? noun.example() : lead.typed()) + "'",
                        afterHead.behind());
            }
        }
        if (outline.kind().isPresent()) {
            Ways.refuseMissing(outline.kind().get(), values.keySet(), end);
        }
        boolean unnamed =
                outline.clauses().stream().anyMatch(clause -> clause.key().isEmpty());
        if (noun.head() == Head.ITEMS && items.isEmpty() && !unnamed) {
            throw new MisreadSentence(
                    noun.word() + " lists nothing; expected "
                            + noun.items().get(0).sort() + "s, as in '" + noun.example() + "'",
                    end);
        }
    }
}
