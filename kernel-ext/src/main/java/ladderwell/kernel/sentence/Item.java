package ladderwell.kernel.sentence;

/**
 * Something that a sentence lists: an observable, a coupling.
 *
 * @param words its name in words, lower or mixed case: "spread of position"
 * @param numbered whether a whole number follows the words: "population of 3"
 * @param symbol how the trade writes it
 * @param unit what it measures: "a length"
 * @param meaning one line that says what it is
 * @param sort what messages call it: "observable"
 * @param quoted whether it stands for any text in quotes; its words then say what the text is
 */
public record Item(
        String words, boolean numbered, String symbol, String unit, String meaning, String sort, boolean quoted) {

    /** An observable. */
    public Item(String words, boolean numbered, String symbol, String unit, String meaning) {
        this(words, numbered, symbol, unit, meaning, "observable", false);
    }

    /** How a list of what could stand here names it. */
    String typed() {
        return numbered ? words + " 3" : quoted ? "\"…\", " + words : words;
    }
}
