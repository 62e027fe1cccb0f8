package ladderwell.kernel.sentence;

import java.util.List;
import java.util.Optional;

/** What a sentence can see: the names declared before it. */
public interface Surroundings {
    /** Every declared name, in the order of declaration. */
    List<Known> all();

    /** What a name stands for, variables of the Java session included. */
    Optional<Known> find(String name);
}
