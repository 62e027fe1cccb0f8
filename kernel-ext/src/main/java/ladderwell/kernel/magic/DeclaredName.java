package ladderwell.kernel.magic;

import java.util.ArrayList;
import java.util.List;
import ladderwell.Fact;
import ladderwell.Oscillator;
import ladderwell.Run;
import ladderwell.State;
import ladderwell.kernel.cell.Names.Named;
import ladderwell.kernel.sentence.Explanation;

/** What is said of a declared name. */
final class DeclaredName {
    private DeclaredName() {}

    static Explanation explanation(Named named) {
        Object value = named.value();
        if (value instanceof Oscillator oscillator) {
            return card(named, "oscillator, " + oscillator.kind(), oscillator.given(), oscillator.facts());
        }
        if (value instanceof State state) {
            return card(
                    named,
                    "state, " + state.kind() + " in " + state.oscillator().kind(),
                    state.given(),
                    state.facts());
        }
        if (value instanceof Run run) {
            return new Explanation(
                    named.name() + ": run, " + run.evolution().duration(),
                    List.of(run.verdict(), run.errorLine()),
                    List.of("Java variable of type " + named.type().getSimpleName()));
        }
        return new Explanation(named.name() + ": " + named.type().getSimpleName(), List.of(), List.of());
    }

    private static Explanation card(Named named, String what, List<Fact> given, List<Fact> facts) {
        List<String> more = lines(facts);
        more.add("Java variable of type " + named.type().getSimpleName());
        return new Explanation(named.name() + ": " + what, lines(given), more);
    }

    private static List<String> lines(List<Fact> facts) {
        List<String> lines = new ArrayList<>();
        for (Fact fact : facts) {
            String symbol = fact.symbol().isEmpty() ? "" : " " + fact.symbol();
            String value = fact.bound().isExact()
                    ? fact.value().toString()
                    : (fact.bound().beside(fact.value().value()) + " "
                                    + fact.value().unit())
                            .strip();
            lines.add(fact.name() + symbol + " = " + value);
        }
        return lines;
    }
}
