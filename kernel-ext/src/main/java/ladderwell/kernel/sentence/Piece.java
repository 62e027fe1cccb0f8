package ladderwell.kernel.sentence;

/**
 * A word, a mark, or an expression of a sentence.
 *
 * @param sort what it is
 * @param text the text; of an expression or a quotation, what stands inside
 * @param place where it stands, braces and quotes included
 */
record Piece(Sort sort, String text, Place place) {
    enum Sort {
        WORD,
        COMMA,
        COLON,
        JAVA,
        QUOTED,
        COMMENT,
        /** A brace or quote that is never closed; it reaches to the end. */
        UNCLOSED,
        /** A closing brace that closes nothing. */
        STRAY
    }

    /** The text as it was typed, braces and quotes included. */
    String typed() {
        return switch (sort) {
            case JAVA -> "{" + text + "}";
            case QUOTED -> '"' + text + '"';
            default -> text;
        };
    }

    boolean is(Sort other) {
        return sort == other;
    }

    boolean isWord(String word) {
        return sort == Sort.WORD && Words.plain(text).equals(word);
    }
}
