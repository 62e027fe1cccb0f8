package ladderwell.kernel.sentence;

import java.lang.reflect.Array;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import ladderwell.kernel.sentence.Piece.Sort;

/**
 * A piece of a value, after the expressions have been evaluated.
 *
 * @param text the word; of an expression, the expression in its braces
 * @param place where it stands
 * @param result what the expression gave, if it is one and gave no text
 * @param word whether it is a word of the sentence or the text that an expression gave
 */
record Term(String text, Place place, Optional<Object> result, boolean word) {

    /** Evaluates expressions. A text is read as if it had been typed; arrays and lists give one term per element. */
    static List<Term> of(List<Piece> pieces, Expressions expressions) throws MisreadSentence {
        List<Term> terms = new ArrayList<>();
        for (Piece piece : pieces) {
            if (!piece.is(Sort.JAVA)) {
                terms.add(word(piece));
                continue;
            }
            if (piece.text().isBlank()) {
                throw new MisreadSentence(
                        "these braces are empty; expected a Java expression, as in {nbar}", piece.place());
            }
            String shown = "{" + piece.text().strip() + "}";
            Object value = expressions.value(piece.text().strip(), piece.place());
            if (value instanceof CharSequence typed) {
                List<Piece> words = Pieces.of(typed.toString(), 0, typed.length());
                if (words.isEmpty() || !words.stream().allMatch(word -> word.is(Sort.WORD))) {
                    throw new MisreadSentence(
                            Words.quoted(shown) + " gives the text " + Words.quoted(typed.toString())
                                    + "; expected a number, a quantity, or words without commas and braces",
                            piece.place());
                }
                for (Piece word : words) {
                    terms.add(new Term(word.text(), piece.place(), Optional.empty(), true));
                }
            } else if (value.getClass().isArray()) {
                for (int i = 0; i < Array.getLength(value); i++) {
                    terms.add(new Term(shown, piece.place(), Optional.ofNullable(Array.get(value, i)), false));
                }
            } else if (value instanceof Iterable<?> several) {
                several.forEach(one -> terms.add(new Term(shown, piece.place(), Optional.ofNullable(one), false)));
            } else {
                terms.add(new Term(shown, piece.place(), Optional.of(value), false));
            }
        }
        return terms;
    }

    /** A piece that is no expression. */
    static Term word(Piece piece) {
        return new Term(piece.typed(), piece.place(), Optional.empty(), piece.is(Sort.WORD));
    }

    boolean isUnknown() {
        return result.isPresent() && result.get() == Values.UNKNOWN;
    }

    /** Where a part of the word stands; the whole place if the text did not stand there itself. */
    Place part(int from, int to) {
        return word && place.end() - place.start() == text.length()
                ? new Place(place.start() + from, place.start() + to)
                : place;
    }

    /** What is left of the word from a position on. */
    Term from(int start) {
        return new Term(text.substring(start), part(start, text.length()), Optional.empty(), true);
    }
}
