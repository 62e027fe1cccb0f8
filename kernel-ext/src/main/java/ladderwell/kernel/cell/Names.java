package ladderwell.kernel.cell;

import java.util.List;
import java.util.Optional;

/**
 * The names that sentences declared, with their values. They live apart from the Java session, so that a cell of
 * sentences never waits for it; before a Java part runs they are made variables there, each of its public type, and
 * what Java assigned to such a variable is read back afterwards.
 *
 * <p>Declarations of one cell count together: when the cell fails, all of them are undone.
 */
public interface Names {
    /**
     * What a name stands for: a declared value or, failing that, a variable of the Java session that is not null.
     */
    Optional<Named> find(String name);

    /** Every name that a sentence declared, in the order of declaration. */
    List<Named> declared();

    /**
     * Refuses a declaration that {@link #declare} would refuse, so that it can be refused before long work.
     *
     * @throws IllegalArgumentException as {@link #declare} does
     */
    void check(String noun, String name, Class<?> type);

    /**
     * Gives a name its value. A name may be declared anew by the same noun; the value of a Java variable of the same
     * type may be replaced.
     *
     * @param noun the noun of the sentence: oscillator, state, …
     * @param name the name
     * @param type the type the Java variable gets; a public class
     * @param value the value, of that type
     * @throws IllegalArgumentException when the name is no Java identifier, or stands for something else already; the
     *     message is one sentence for the user
     */
    <T> void declare(String noun, String name, Class<T> type, T value);

    /**
     * A name and its value.
     *
     * @param name the name
     * @param noun the noun that declared it; "java" for a variable of the Java session
     * @param type its declared type
     * @param value its value
     */
    record Named(String name, String noun, Class<?> type, Object value) {}
}
