package ladderwell.kernel.session;

import java.util.List;

/**
 * The ways to go on at a cursor.
 *
 * @param start where the text to be replaced begins; it ends at the cursor
 * @param list the ways, those that fit the expected type first
 */
public record Suggestions(int start, List<Suggestion> list) {
    /** Copies the list. */
    public Suggestions {
        list = List.copyOf(list);
    }
}
