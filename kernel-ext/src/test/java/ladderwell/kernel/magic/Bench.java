package ladderwell.kernel.magic;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import javax.lang.model.SourceVersion;
import ladderwell.kernel.cell.CellOutput;
import ladderwell.kernel.cell.Names;
import ladderwell.kernel.cell.SentenceContext;
import ladderwell.kernel.cell.SentenceFailure;

/** A workbench in memory, without Java: names are undone when a cell fails, expressions have fixed values. */
final class Bench implements Names, SentenceContext {
    final Declarations declarations = new Declarations();
    final Map<String, Object> expressions = new LinkedHashMap<>();
    final List<String> evaluated = new ArrayList<>();
    List<Object> emitted = new ArrayList<>();
    private Map<String, Named> declared = new LinkedHashMap<>();
    private final Map<String, Named> java = new LinkedHashMap<>();

    /** Runs a cell; what it emitted is in {@link #emitted}. */
    void run(String cell) throws SentenceFailure {
        Map<String, Named> before = new LinkedHashMap<>(declared);
        emitted = new ArrayList<>();
        try {
            declarations.run(cell, this);
        } catch (SentenceFailure | RuntimeException | Error e) {
            declared = before;
            throw e;
        }
    }

    Object value(String name) {
        return find(name).orElseThrow().value();
    }

    void javaVariable(String name, Object value) {
        java.put(name, new Named(name, "java", value.getClass(), value));
    }

    @Override
    public Optional<Named> find(String name) {
        return Optional.ofNullable(declared.getOrDefault(name, java.get(name)));
    }

    @Override
    public List<Named> declared() {
        return List.copyOf(declared.values());
    }

    @Override
    public void check(String noun, String name, Class<?> type) {
        if (!SourceVersion.isIdentifier(name)) {
            throw new IllegalArgumentException("'" + name + "' is no Java identifier");
        }
        Named before = declared.get(name);
        if (before != null && !before.noun().equals(noun)) {
            throw new IllegalArgumentException("'" + name + "' is declared by '" + before.noun()
                    + "' already and cannot be declared by '" + noun + "'; take another name");
        }
        Named variable = java.get(name);
        if (before == null && variable != null && !variable.type().equals(type)) {
            throw new IllegalArgumentException("'" + name + "' is a Java variable of type "
                    + variable.type().getSimpleName() + " already, not " + type.getSimpleName());
        }
    }

    @Override
    public <T> void declare(String noun, String name, Class<T> type, T value) {
        check(noun, name, type);
        declared.put(name, new Named(name, noun, type, value));
    }

    @Override
    public Names names() {
        return this;
    }

    @Override
    public int firstLine() {
        return 1;
    }

    @Override
    public Object evaluate(String expression) throws SentenceFailure {
        evaluated.add(expression);
        Object value = expressions.get(expression);
        if (value == null) {
            throw new SentenceFailure("Java does not know '" + expression + "'", List.of());
        }
        return value;
    }

    @Override
    public void emit(Object result) {
        emitted.add(result);
    }

    @Override
    public CellOutput output() {
        throw new UnsupportedOperationException("nothing is shown while a sentence runs");
    }
}
