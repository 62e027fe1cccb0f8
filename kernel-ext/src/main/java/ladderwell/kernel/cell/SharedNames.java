package ladderwell.kernel.cell;

import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.Set;
import java.util.function.Supplier;
import javax.lang.model.SourceVersion;
import ladderwell.kernel.session.JavaSession;
import ladderwell.kernel.session.Variable;

/** The declared names, carried into the Java session when Java needs them and read back from it. */
final class SharedNames implements Names {
    private static final String JAVA = "java";

    private final Supplier<Optional<JavaSession>> started;
    private final Map<String, Named> named = new LinkedHashMap<>();
    private Map<String, Named> beforeCell = Map.of();
    private final Set<String> inJava = new HashSet<>();
    /** Java's own variables whose names this cell's declarations took. */
    private final Map<String, Variable> displaced = new LinkedHashMap<>();

    /** @param started the Java session, if it has started */
    SharedNames(Supplier<Optional<JavaSession>> started) {
        this.started = started;
    }

    @Override
    public synchronized Optional<Named> find(String name) {
        Named known = named.get(name);
        return known != null ? Optional.of(known) : javaVariable(name).flatMap(SharedNames::asNamed);
    }

    private Optional<Variable> javaVariable(String name) {
        return started.get().flatMap(session -> session.variable(name));
    }

    private static Optional<Named> asNamed(Variable variable) {
        return variable.value().map(value -> new Named(variable.name(), JAVA, variable.type(), value));
    }

    @Override
    public synchronized List<Named> declared() {
        return List.copyOf(named.values());
    }

    @Override
    public synchronized void check(String noun, String name, Class<?> type) {
        if (!SourceVersion.isIdentifier(name) || SourceVersion.isKeyword(name)) {
            throw new IllegalArgumentException("\"" + name
                    + "\" cannot be a name; expected a letter, then letters, digits or _, and no word of Java");
        }
        Named known = named.get(name);
        if (known != null && !known.noun().equals(noun)) {
            throw new IllegalArgumentException(
                    name + " is already declared as " + known.noun() + "; choose another name for this " + noun);
        }
        if (known == null) {
            javaVariable(name).filter(variable -> variable.type() != type).ifPresent(variable -> {
                throw new IllegalArgumentException(name + " is already a Java variable of type "
                        + variable.type().getSimpleName() + "; choose another name for this " + noun);
            });
        }
    }

    @Override
    public synchronized <T> void declare(String noun, String name, Class<T> type, T value) {
        check(noun, name, type);
        if (!named.containsKey(name)) {
            javaVariable(name).ifPresent(variable -> displaced.put(name, variable));
        }
        named.put(name, new Named(name, noun, type, type.cast(value)));
    }

    /** Marks the state to which {@link #undo} returns. */
    synchronized void begin() {
        beforeCell = new LinkedHashMap<>(named);
        displaced.clear();
    }

    /** Takes back every declaration since {@link #begin}. */
    synchronized void undo() {
        named.keySet().stream()
                .filter(name -> !beforeCell.containsKey(name))
                .toList()
                .forEach(this::forget);
        named.clear();
        named.putAll(beforeCell);
    }

    private void forget(String name) {
        Variable former = displaced.get(name);
        started.get().filter(session -> inJava.remove(name)).ifPresent(session -> {
            if (former == null) {
                session.drop(name);
            } else {
                former.value().ifPresent(value -> session.define(name, former.type(), value));
            }
        });
    }

    /**
     * Makes declared names variables of the session: those that {@code text} mentions, and those that already are, so
     * that methods defined earlier see their present values.
     */
    synchronized void enter(JavaSession session, String text) {
        Set<String> words = new HashSet<>(List.of(text.split("\\P{javaJavaIdentifierPart}+")));
        for (Named name : named.values()) {
            if (words.contains(name.name()) || inJava.contains(name.name())) {
                session.define(name.name(), name.type(), name.value());
                inJava.add(name.name());
            }
        }
    }

    /** Takes over what Java assigned to declared names; a name that Java gave another type is Java's from now on. */
    synchronized void leave(JavaSession session) {
        for (Named name : List.copyOf(named.values())) {
            session.variable(name.name()).ifPresent(variable -> {
                if (variable.type() != name.type()) {
                    named.remove(name.name());
                    inJava.remove(name.name());
                } else if (inJava.contains(name.name())) {
                    variable.value()
                            .ifPresent(value ->
                                    named.put(name.name(), new Named(name.name(), name.noun(), name.type(), value)));
                }
            });
        }
    }
}
