package ladderwell.kernel.sentence;

import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.Set;
import ladderwell.kernel.sentence.Noun.Head;
import ladderwell.kernel.sentence.Offers.Offer;
import ladderwell.kernel.sentence.Outline.Clause;
import ladderwell.kernel.sentence.Piece.Sort;
import ladderwell.quantity.Kind;
import ladderwell.quantity.Units;

/** Finds what could stand at a cursor. Looks at what is before it, and after it only for keys already used. */
final class Completer {
    private final Grammar grammar;
    private final Surroundings surroundings;

    Completer(Grammar grammar, Surroundings surroundings) {
        this.grammar = grammar;
        this.surroundings = surroundings;
    }

    Offers at(SentenceText text, int cursor) {
        if (cursor < 0 || cursor > text.text().length()) {
            return Offers.none(Math.max(0, cursor));
        }
        if (text.opening().isPresent() && text.opening().get().touches(cursor)) {
            Place opening = text.opening().get();
            return fitting(text.text(), opening.start(), cursor, List.of(new Offer(Grammar.CELL, "cell")));
        }
        Place sentence = text.at(cursor);
        List<Piece> pieces = Pieces.of(text.text(), sentence.start(), cursor);
        if (!pieces.isEmpty()) {
            Piece last = pieces.get(pieces.size() - 1);
            boolean inside = last.is(Sort.UNCLOSED) || last.is(Sort.COMMENT);
            if (inside || (last.is(Sort.JAVA) && last.place().end() == cursor)) {
                return Offers.none(cursor);
            }
        }
        Outline whole = Outline.of(grammar, Pieces.of(text.text(), sentence.start(), sentence.end()));
        return new AtCursor(text.text(), cursor, pieces, whole).offers();
    }

    /** Keeps the offers that begin with what stands between two positions; blanks before it are left alone. */
    private static Offers fitting(String text, int from, int cursor, List<Offer> offers) {
        int start = from;
        while (start < cursor && Pieces.blank(text.charAt(start))) {
            start++;
        }
        String typed = Words.plain(text.substring(start, cursor));
        boolean blankBehind = cursor > start && Pieces.blank(text.charAt(cursor - 1));
        String prefix = blankBehind ? typed + " " : typed;
        List<Offer> kept = offers.stream()
                .filter(offer -> offer.text().toLowerCase(Locale.ROOT).startsWith(prefix))
                .toList();
        return new Offers(new Place(start, cursor), kept);
    }

    /** One request: the pieces before the cursor, and the outline of the whole sentence. */
    private final class AtCursor {
        private final String text;
        private final int cursor;
        private final List<Piece> pieces;
        private final Outline before;
        private final Outline whole;

        AtCursor(String text, int cursor, List<Piece> pieces, Outline whole) {
            this.text = text;
            this.cursor = cursor;
            this.pieces = pieces;
            this.before = Outline.of(grammar, pieces);
            this.whole = whole;
        }

        Offers offers() {
            if (before.nounPiece().isEmpty() || touched(before.nounPiece().get())) {
                int from =
                        before.nounPiece().map(piece -> piece.place().start()).orElse(cursor);
                List<Offer> nouns = grammar.nouns().stream()
                        .map(noun -> new Offer(noun.word(), "noun"))
                        .toList();
                return fitting(text, from, cursor, nouns);
            }
            if (before.noun().isEmpty()) {
                return Offers.none(cursor);
            }
            Noun noun = before.noun().get();
            boolean inSubject = before.subject().isEmpty()
                    || (before.subject().size() == 1 && touched(before.subject().get(0)));
            if (before.colon().isEmpty() && inSubject && before.clauses().isEmpty()) {
                return noun.declares() ? Offers.none(cursor) : names(noun.subject(), List.of());
            }
            if (noun.head() != Head.NONE && before.colon().isEmpty()) {
                return Offers.none(cursor);
            }
            boolean first =
                    before.clauses().stream().allMatch(clause -> clause.comma().isEmpty());
            return first
                    ? inHead(noun)
                    : inClause(noun, before.clauses().get(before.clauses().size() - 1));
        }

        private boolean touched(Piece piece) {
            return piece.place().end() == cursor;
        }

        /** Behind the colon, before any comma; or behind the name of a noun that takes no colon. */
        private Offers inHead(Noun noun) {
            Place colon = before.colon().map(Piece::place).orElse(new Place(cursor, cursor));
            switch (noun.head()) {
                case KIND -> {
                    boolean done = before.kind().isPresent()
                            && !touched(before.head().get(before.head().size() - 1));
                    if (!done) {
                        List<Offer> kinds = noun.kinds().stream()
                                .map(kind -> new Offer(kind.word(), "kind"))
                                .toList();
                        return fitting(text, colon.end(), cursor, kinds);
                    }
                }
                case REFERENCE -> {
                    if (before.head().isEmpty() || touched(before.head().get(0))) {
                        return names(noun.headNoun(), List.of());
                    }
                }
                case ITEMS -> {
                    return inClause(noun, before.clauses().get(0));
                }
                case NONE -> {}
            }
            List<Key> leads = noun.leads(before.kind());
            List<Clause> done = before.clauses();
            boolean argumentDone = done.size() == 1
                    && done.get(0).key().isPresent()
                    && before.kind()
                            .flatMap(NounKind::argument)
                            .equals(done.get(0).key())
                    && !done.get(0).value().isEmpty()
                    && !touched(done.get(0).value().get(0));
            boolean linkDone = !done.isEmpty()
                    && done.get(done.size() - 1).key().map(Key::form).equals(Optional.of(Form.REFERENCE))
                    && done.get(done.size() - 1).value().size() == 1
                    && !touched(done.get(done.size() - 1).value().get(0));
            if (leads.isEmpty()) {
                return Offers.none(cursor);
            }
            if (done.isEmpty() || argumentDone || linkDone) {
                List<String> used = done.stream()
                        .flatMap(clause -> clause.key().stream())
                        .map(Key::word)
                        .toList();
                return fitting(
                        text,
                        cursor,
                        cursor,
                        leads.stream()
                                .filter(lead -> !used.contains(lead.word()))
                                .limit(1)
                                .map(lead -> new Offer(lead.word(), "key"))
                                .toList());
            }
            return inClause(noun, done.get(done.size() - 1));
        }

        private Offers inClause(Noun noun, Clause clause) {
            boolean keyDone = clause.key().isPresent()
                    && !touched(clause.keyPieces().get(clause.keyPieces().size() - 1));
            if (keyDone) {
                return inValue(clause.key().get(), clause.value());
            }
            int from = clause.place().map(Place::start).orElse(cursor);
            List<Offer> offers = new ArrayList<>();
            if (!clause.joined()) {
                noun.items().stream()
                        .filter(item -> !item.quoted())
                        .forEach(item ->
                                offers.add(new Offer(item.words() + (item.numbered() ? " " : ""), item.sort())));
            }
            usableKeys(noun, clause).forEach(key -> offers.add(new Offer(key.word(), "key")));
            return fitting(text, from, cursor, offers);
        }

        /** Keys that are not used yet and go with those that are. */
        private List<Key> usableKeys(Noun noun, Clause at) {
            Set<String> used = new HashSet<>();
            int here = at.place().map(Place::start).orElse(cursor);
            for (Clause clause : whole.clauses()) {
                boolean same = clause.place().map(Place::start).orElse(-1) == here;
                if (!same) {
                    clause.key().ifPresent(key -> used.add(key.word()));
                }
            }
            Optional<NounKind> kind = whole.kind().isPresent() ? whole.kind() : before.kind();
            if (at.joined()) {
                return noun.leads(kind).stream()
                        .filter(lead -> !used.contains(lead.word()))
                        .toList();
            }
            return noun.keys(kind).stream()
                    .filter(key -> !used.contains(key.word()))
                    .filter(key -> {
                        Set<String> more = new HashSet<>(used);
                        more.add(key.word());
                        return kind.isEmpty() || !Ways.open(kind.get(), more).isEmpty();
                    })
                    .toList();
        }

        private Offers inChoice(Key key, List<Piece> value) {
            boolean done = value.size() > 1 || (value.size() == 1 && !touched(value.get(0)));
            int from = value.isEmpty() ? cursor : value.get(0).place().start();
            List<Offer> offers =
                    key.choices().stream().map(word -> new Offer(word, "value")).toList();
            return done ? Offers.none(cursor) : fitting(text, from, cursor, offers);
        }

        private Offers inValue(Key key, List<Piece> value) {
            if (key.form() == Form.REFERENCE) {
                boolean nameDone = value.size() > 1 || (value.size() == 1 && !touched(value.get(0)));
                List<String> homes = before.kind().map(NounKind::homes).orElse(List.of());
                return nameDone ? Offers.none(cursor) : names(key.noun(), homes);
            }
            if (key.form() == Form.CHOICE) {
                return inChoice(key, value);
            }
            if (key.form() != Form.QUANTITY || value.isEmpty()) {
                return Offers.none(cursor);
            }
            Piece number = value.get(0);
            int numberEnd = number.is(Sort.WORD)
                    ? number.place().start() + NumberText.at(number.text(), 0).end()
                    : number.place().end();
            boolean glued = value.size() == 1 && touched(number);
            boolean any = numberEnd > number.place().start();
            if (!any || (glued && numberEnd == cursor) || value.size() > 2) {
                return Offers.none(cursor);
            }
            if (value.size() == 2 && !touched(value.get(1))) {
                return Offers.none(cursor);
            }
            if (value.size() == 1 && !glued && numberEnd < number.place().end()) {
                return Offers.none(cursor);
            }
            int from =
                    glued ? numberEnd : value.size() == 2 ? value.get(1).place().start() : cursor;
            return fitting(text, from, cursor, units(key));
        }

        private List<Offer> units(Key key) {
            boolean natural = isNatural();
            return key.kinds().stream()
                    .filter(kind -> !natural || kind == Kind.ANGLE || kind == Kind.PERIODS)
                    .flatMap(kind -> Units.symbols(kind).stream())
                    .map(symbol -> new Offer(symbol, "unit"))
                    .toList();
        }

        private boolean isNatural() {
            boolean flagged = whole.clauses().stream()
                    .anyMatch(clause -> clause.key().map(Key::word).equals(Optional.of("natural")));
            List<String> spoken = new ArrayList<>();
            whole.head().forEach(piece -> spoken.add(piece.text()));
            whole.clauses().stream()
                    .filter(clause -> clause.key().map(Key::form).equals(Optional.of(Form.REFERENCE)))
                    .forEach(clause -> clause.value().forEach(piece -> spoken.add(piece.text())));
            return flagged
                    || surroundings.all().stream().anyMatch(known -> known.natural() && spoken.contains(known.name()));
        }

        private Offers names(String noun, List<String> homes) {
            int from = pieces.isEmpty()
                            || !touched(pieces.get(pieces.size() - 1))
                            || !pieces.get(pieces.size() - 1).is(Sort.WORD)
                    ? cursor
                    : pieces.get(pieces.size() - 1).place().start();
            List<Offer> offers = surroundings.all().stream()
                    .filter(known -> known.noun().equals(noun))
                    .filter(known -> homes.isEmpty() || homes.contains(known.kind()))
                    .map(known -> new Offer(known.name(), Grammar.thing(noun).replaceFirst("an? ", "")))
                    .toList();
            return fitting(text, from, cursor, offers);
        }
    }
}
