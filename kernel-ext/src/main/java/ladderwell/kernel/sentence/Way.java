package ladderwell.kernel.sentence;

import java.util.List;

/**
 * One way to say enough: which keys must stand together, and which may join them.
 *
 * @param required words of the keys that this way needs
 * @param optional words of the keys that it allows besides
 */
public record Way(List<String> required, List<String> optional) {
    /** Copies both lists. */
    public Way {
        required = List.copyOf(required);
        optional = List.copyOf(optional);
    }

    static Way of(String... required) {
        return new Way(List.of(required), List.of());
    }

    Way with(String... more) {
        return new Way(required, List.of(more));
    }

    boolean allows(String key) {
        return required.contains(key) || optional.contains(key);
    }
}
