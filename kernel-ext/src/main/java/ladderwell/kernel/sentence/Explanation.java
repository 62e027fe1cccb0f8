package ladderwell.kernel.sentence;

import java.util.List;

/**
 * What a word of the language means.
 *
 * @param title the word and what it is: "mass, a key of harmonic oscillator"
 * @param lines meaning, unit, default: the short form
 * @param more formula, what goes with it, an example: the long form besides
 */
public record Explanation(String title, List<String> lines, List<String> more) {
    /** Copies the lines. */
    public Explanation {
        lines = List.copyOf(lines);
        more = List.copyOf(more);
    }
}
