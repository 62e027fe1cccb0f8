package ladderwell.kernel.sentence;

import java.util.List;

/**
 * What could replace a stretch of the text.
 *
 * @param place the stretch
 * @param offers the replacements, best first
 */
public record Offers(Place place, List<Offer> offers) {
    /** Copies the offers. */
    public Offers {
        offers = List.copyOf(offers);
    }

    /**
     * One replacement.
     *
     * @param text what is put in
     * @param kind what it is: noun, kind, key, value, unit, observable, or the noun of a declared name
     */
    public record Offer(String text, String kind) {}

    static Offers none(int cursor) {
        return new Offers(new Place(cursor, cursor), List.of());
    }
}
