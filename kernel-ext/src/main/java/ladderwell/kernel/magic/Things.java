package ladderwell.kernel.magic;

import java.util.List;
import java.util.Optional;
import ladderwell.Oscillator;
import ladderwell.Run;
import ladderwell.State;
import ladderwell.kernel.cell.Names;
import ladderwell.kernel.cell.Names.Named;
import ladderwell.kernel.sentence.Known;
import ladderwell.kernel.sentence.Surroundings;

/** The names of the notebook, as the sentences see them: what counts is what a value is, not who declared it. */
record Things(Names names) implements Surroundings {

    @Override
    public List<Known> all() {
        return names.declared().stream().map(Things::known).toList();
    }

    @Override
    public Optional<Known> find(String name) {
        return names.find(name).map(Things::known);
    }

    private static Known known(Named named) {
        Object value = named.value();
        if (value instanceof Oscillator oscillator) {
            return new Known(named.name(), "oscillator", oscillator.kind(), natural(oscillator));
        }
        if (value instanceof State state) {
            return new Known(named.name(), "state", state.kind(), natural(state.oscillator()));
        }
        if (value instanceof Run run) {
            return new Known(named.name(), "evolve", "", natural(run.state().oscillator()));
        }
        return new Known(named.name(), named.noun(), "", false);
    }

    private static boolean natural(Oscillator oscillator) {
        try {
            return oscillator.scale().isNatural();
        } catch (IllegalArgumentException e) {
            // A scale outside the range of numbers, from a Java cell: it has units, and whoever uses it will hear of
            // it.
            return false;
        }
    }

    Oscillator oscillator(String name) {
        return value(name, Oscillator.class);
    }

    State state(String name) {
        return value(name, State.class);
    }

    Run run(String name) {
        return value(name, Run.class);
    }

    /** The value of a name that the sentence has been checked to speak of. */
    private <T> T value(String name, Class<T> type) {
        Object value = names.find(name).map(Named::value).orElse("nothing");
        if (!type.isInstance(value)) {
            throw new IllegalArgumentException("'" + name + "' is no longer what it was when the cell began");
        }
        return type.cast(value);
    }
}
