package ladderwell.kernel.sentence;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;

/**
 * A text of sentences and where in it each sentence stands.
 *
 * <p>A text whose first line that is not blank starts with {@code %%} is a cell: one sentence a line, with or without a
 * {@code %}; a line indented deeper than the one on which a sentence began goes on with it, until a blank line or a line that
 * reads {@code NOUN NAME:}. In any other text each line is a sentence of its own. Lines of comment alone are passed over.
 *
 * @param text the whole text
 * @param opening what stands behind the {@code %%} of a cell; empty in a text of lines
 * @param sentences the places of the sentences, without the {@code %}
 */
public record SentenceText(String text, Optional<Place> opening, List<Place> sentences) {
    /** Copies the places. */
    public SentenceText {
        sentences = List.copyOf(sentences);
    }

    /** Finds the sentences of a text. Never fails. */
    public static SentenceText of(String text) {
        Optional<Place> opening = Optional.empty();
        List<Place> sentences = new ArrayList<>();
        boolean first = true;
        boolean open = false;
        int openIndent = 0;
        for (int line = 0; line < text.length(); ) {
            int newline = text.indexOf('\n', line);
            int end = newline < 0 ? text.length() : newline;
            int start = afterBlanks(text, line, end);
            int indent = start - line;
            boolean blank = start == end;
            if (blank) {
                open = false;
            } else if (first && text.startsWith("%%", start)) {
                opening = Optional.of(new Place(start + 2, end));
            } else if (text.charAt(start) != '#') {
                boolean percent = text.charAt(start) == '%';
                if (open
                        && opening.isPresent()
                        && indent > openIndent
                        && !percent
                        && !opensSentence(text, start, end)) {
                    int last = sentences.size() - 1;
                    sentences.set(last, new Place(sentences.get(last).start(), end));
                } else {
                    sentences.add(new Place(percent ? start + 1 : start, end));
                    open = true;
                    openIndent = indent;
                }
            }
            first &= blank;
            line = end + 1;
        }
        return new SentenceText(text, opening, sentences);
    }

    /** Whether a line starts with two words and a colon: then it is no continuation, however it is indented. */
    private static boolean opensSentence(String text, int start, int end) {
        int at = start;
        for (int word = 0; word < 2; word++) {
            int wordStart = at;
            while (at < end && Character.isJavaIdentifierPart(text.charAt(at))) {
                at++;
            }
            if (at == wordStart) {
                return false;
            }
            at = afterBlanks(text, at, end);
        }
        return at < end && text.charAt(at) == ':';
    }

    private static int afterBlanks(String text, int from, int end) {
        int at = from;
        while (at < end && Pieces.blank(text.charAt(at))) {
            at++;
        }
        return at;
    }

    /**
     * Checks that a cell of sentences starts with the line {@code %%declare} and nothing else on it.
     *
     * @throws MisreadSentence if it starts otherwise
     */
    public void checkOpening() throws MisreadSentence {
        if (opening.isEmpty()) {
            return;
        }
        Place place = opening.get();
        // What stands beyond so many characters is too much anyway.
        int end = Math.min(place.end(), place.start() + Grammar.LONGEST_SENTENCE);
        List<Piece> pieces = Pieces.of(text, place.start(), end).stream()
                .filter(piece -> !piece.is(Piece.Sort.COMMENT))
                .toList();
        if (pieces.isEmpty()) {
            throw new MisreadSentence("a word is missing after '%%'; a cell of sentences starts with %%declare", place);
        }
        if (!pieces.get(0).isWord(Grammar.CELL)) {
            throw new MisreadSentence(
                    "'%%" + Words.quoted(pieces.get(0).text()).substring(1)
                            + " is unknown; a cell of sentences starts with" + " %%declare",
                    pieces.get(0).place());
        }
        if (pieces.size() > 1) {
            throw new MisreadSentence(
                    "nothing may follow %%declare on its line; the sentences start on the next one",
                    pieces.get(1).place());
        }
    }

    /**
     * The sentence that a cursor stands in, up to its end; an empty one where a new sentence would begin. Blanks between a
     * sentence and the cursor belong to it as long as they do not start a new line.
     */
    Place at(int cursor) {
        int limit = Math.min(cursor, text.length());
        for (int i = sentences.size() - 1; i >= 0; i--) {
            Place place = sentences.get(i);
            if (place.start() <= limit) {
                if (limit <= place.end()) {
                    return place;
                }
                String between = text.substring(place.end(), limit);
                boolean sameLine = between.indexOf('\n') < 0;
                boolean nextLineIndented = opening.isPresent()
                        && between.isBlank()
                        && between.chars().filter(c -> c == '\n').count() == 1
                        && between.length() - between.lastIndexOf('\n') - 1 > indent(place);
                return sameLine || nextLineIndented ? new Place(place.start(), limit) : new Place(limit, limit);
            }
        }
        return new Place(limit, limit);
    }

    private int indent(Place sentence) {
        int line = text.lastIndexOf('\n', Math.max(0, sentence.start() - 1)) + 1;
        return afterBlanks(text, line, text.length()) - line;
    }
}
