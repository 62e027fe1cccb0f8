package ladderwell.bench;

import java.util.List;
import java.util.function.DoubleSupplier;
import java.util.function.Supplier;

/**
 * One line of the side-by-side table.
 *
 * @param name what is done
 * @param threads how many threads each side may use
 * @param goal the largest ratio of times, ours to the partner's, that meets the goal
 * @param errorGoal the largest error, of the kind the task names, that ours may have
 * @param other whom we run against
 * @param work makes our side; called once
 */
record Task(String name, int threads, double goal, double errorGoal, Other other, Supplier<Work> work) {
    /** Whom we run against: a Python script with its arguments, or other work of our own. */
    sealed interface Other permits Script, Ours {}

    record Script(List<String> command) implements Other {
        static Script of(String... command) {
            return new Script(List.of(command));
        }
    }

    record Ours(Supplier<Work> work) implements Other {}

    /**
     * Work to be timed.
     *
     * @param run does it once
     * @param error largest error of the last run
     */
    record Work(Runnable run, DoubleSupplier error) {}
}
