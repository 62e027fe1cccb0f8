package ladderwell.kernel.sentence;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import ladderwell.kernel.sentence.Noun.Head;
import ladderwell.kernel.sentence.Outline.Clause;
import ladderwell.kernel.sentence.Piece.Sort;
import ladderwell.quantity.Constants;
import ladderwell.quantity.Digits;
import ladderwell.quantity.Kind;
import ladderwell.quantity.Unit;
import ladderwell.quantity.Units;

/** Says what a word of a sentence means. */
final class Inspector {
    private final Grammar grammar;

    Inspector(Grammar grammar) {
        this.grammar = grammar;
    }

    Optional<Explanation> at(SentenceText text, int cursor) {
        if (text.opening().isPresent() && text.opening().get().touches(cursor)) {
            return Optional.of(cell());
        }
        Place place = text.at(cursor);
        List<Piece> pieces = Pieces.of(text.text(), place.start(), place.end());
        Optional<Piece> word = wordAt(pieces, cursor);
        if (word.isEmpty()) {
            return Optional.empty();
        }
        Outline outline = Outline.of(grammar, pieces);
        Piece piece = word.get();
        if (outline.nounPiece().equals(word)) {
            return outline.noun().map(this::noun);
        }
        if (outline.head().contains(piece) && outline.kind().isPresent()) {
            return Optional.of(kind(outline.noun().orElseThrow(), outline.kind().get()));
        }
        for (Clause clause : outline.clauses()) {
            if (clause.keyPieces().contains(piece)) {
                return Optional.of(key(outline, clause.key().orElseThrow()));
            }
            if (clause.value().contains(piece)) {
                return clause.key().isPresent()
                        ? clause.key()
                                .filter(key -> key.form() == Form.QUANTITY)
                                .flatMap(key -> unit(piece))
                        : item(outline, clause);
            }
        }
        return Optional.empty();
    }

    /** The word under the cursor; between two that touch it, the one that begins there. */
    static Optional<Piece> wordAt(List<Piece> pieces, int cursor) {
        return pieces.stream()
                .filter(piece -> piece.is(Sort.WORD) && piece.place().touches(cursor))
                .reduce((first, second) -> second);
    }

    private Explanation cell() {
        return new Explanation(
                "%%" + Grammar.CELL + ": a cell of sentences",
                List.of(
                        "one sentence a line, without the %; # starts a comment; a line indented deeper goes on with the"
                                + " sentence before it"),
                grammar.nouns().stream().map(Noun::pattern).toList());
    }

    private Explanation noun(Noun noun) {
        List<String> more = new ArrayList<>();
        noun.kinds().forEach(kind -> more.add(kind.word() + ": " + kind.meaning()));
        noun.lead().ifPresent(key -> more.add(key.word() + ": " + key.meaning()));
        noun.keys().forEach(key -> more.add(key.word() + ": " + key.meaning() + standard(key)));
        if (noun.head() == Head.ITEMS) {
            noun.items()
                    .forEach(item -> more.add(item.words() + (item.numbered() ? " n" : "") + "  " + item.symbol() + ": "
                            + item.meaning()));
        }
        return new Explanation(
                noun.word() + ": a noun",
                List.of(noun.meaning(), "form: " + noun.pattern(), "example: " + noun.example()),
                more);
    }

    private static String standard(Key key) {
        return key.standard().isEmpty() ? "" : " (default " + key.standard() + ")";
    }

    private static Explanation kind(Noun noun, NounKind kind) {
        List<String> lines = new ArrayList<>();
        lines.add(kind.meaning());
        if (!kind.formula().isEmpty()) {
            lines.add("formula: " + kind.formula());
        }
        lines.add("keys: "
                + String.join(
                        "; ",
                        kind.ways().stream()
                                .map(way -> String.join(", ", way.required())
                                        + (way.optional().isEmpty()
                                                ? ""
                                                : " [" + String.join(", ", way.optional()) + "]"))
                                .toList()));
        return new Explanation(
                kind.word() + ": a kind of " + noun.word(),
                lines,
                kind.keys().stream()
                        .map(key -> key.typed() + ": " + key.meaning() + standard(key))
                        .toList());
    }

    private static Explanation key(Outline outline, Key key) {
        List<String> lines = new ArrayList<>();
        lines.add(key.meaning());
        if (key.form() == Form.QUANTITY) {
            lines.add("unit: "
                    + String.join(
                            "; ",
                            key.kinds().stream()
                                    .map(kind -> kind.word() + " (" + String.join(", ", Units.symbols(kind)) + ")")
                                    .toList()));
        } else {
            lines.add("value: " + key.expected());
        }
        lines.add("default: " + (key.standard().isEmpty() ? "none" : key.standard()));
        if (!key.formula().isEmpty()) {
            lines.add("formula: " + key.formula());
        }
        String owner = outline.kind()
                .filter(kind -> kind.keys().contains(key))
                .map(kind -> Words.article(kind.phrase()))
                .orElseGet(() -> outline.noun().map(Noun::word).orElse(""));
        return new Explanation(key.word() + ": a key of " + owner, lines, List.of("example: " + key.typed()));
    }

    private static Optional<Explanation> unit(Piece piece) {
        String symbol = piece.text().substring(NumberText.at(piece.text(), 0).end());
        if (symbol.isEmpty() || symbol.length() > 24) {
            return Optional.empty();
        }
        return Units.parse(symbol)
                .filter(unit -> !unit.isNatural())
                .map(unit -> new Explanation(
                        unit.plain() + ": a unit of " + unit.kind().word().replaceFirst("^an? ", ""),
                        meaning(unit),
                        List.of()));
    }

    private static List<String> meaning(Unit unit) {
        List<String> lines = new ArrayList<>();
        Unit si = Units.si(unit.kind());
        if (unit.kind() == Kind.PERIODS) {
            lines.add("classical periods at the mean energy of the state");
        } else if (!unit.equals(si)) {
            boolean measured = unit.equals(Units.ATOMIC_MASS) || unit.equals(Units.ELECTRON_MASS);
            lines.add("1 " + unit.symbol() + " = " + Digits.pretty(Digits.shortest(unit.factor())) + " " + si.symbol()
                    + (measured ? " (" + Constants.EDITION + ")" : ""));
        }
        if (unit.kind() == Kind.CYCLE_FREQUENCY) {
            lines.add("a cycle frequency ν; ω = 2πν");
        } else if (unit.kind() == Kind.ANGULAR_FREQUENCY) {
            lines.add("an angular frequency or rate, taken as it stands; no factor 2π");
        }
        lines.add("others of its kind: " + String.join(", ", Units.symbols(unit.kind())));
        return lines;
    }

    /** An item; one whose name holds a comma is found from either of its parts. */
    private static Optional<Explanation> item(Outline outline, Clause clause) {
        if (outline.noun().isEmpty()) {
            return Optional.empty();
        }
        String typed = Words.plain(Outline.text(clause.value()));
        return outline.noun().get().items().stream()
                .filter(item -> {
                    String words = Words.plain(item.words());
                    return words.equals(typed)
                            || (item.numbered() && typed.startsWith(words))
                            || (words.contains(",") && (words.startsWith(typed + ",") || words.endsWith(", " + typed)));
                })
                .findFirst()
                .map(item -> new Explanation(
                        item.words() + ": " + Words.article(item.sort()),
                        List.of(item.symbol() + ": " + item.meaning(), "value: " + item.unit()),
                        List.of()));
    }
}
