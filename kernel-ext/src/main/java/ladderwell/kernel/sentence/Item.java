package ladderwell.kernel.sentence;

/**
 * Something that a sentence lists by its name: an observable.
 *
 * @param words its name in words, lower or mixed case: "spread of position"
 * @param numbered whether a whole number follows the words: "population of 3"
 * @param symbol how the trade writes it
 * @param unit what it measures: "a length"
 * @param meaning one line that says what it is
 */
public record Item(String words, boolean numbered, String symbol, String unit, String meaning) {}
