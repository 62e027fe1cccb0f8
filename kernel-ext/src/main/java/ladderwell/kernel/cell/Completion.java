package ladderwell.kernel.cell;

import java.util.List;

/**
 * What could replace the text between two positions.
 *
 * @param start where the replaced text begins
 * @param end where it ends, exclusive
 * @param candidates the replacements, best first
 */
public record Completion(int start, int end, List<Candidate> candidates) {
    /** Copies the candidates and checks the positions. */
    public Completion {
        if (start < 0 || end < start) {
            throw new IllegalArgumentException("completion from " + start + " to " + end + " is no piece of text");
        }
        candidates = List.copyOf(candidates);
    }

    /** Nothing fits at the cursor. */
    public static Completion none(int cursor) {
        return new Completion(cursor, cursor, List.of());
    }

    /** This completion, {@code distance} characters further on in a longer text. */
    Completion moved(int distance) {
        return new Completion(start + distance, end + distance, candidates);
    }

    /**
     * One replacement.
     *
     * @param text what is put in
     * @param kind what it is, in a word a client may print beside it: class, function, instance, keyword, unit, …
     */
    public record Candidate(String text, String kind) {}
}
