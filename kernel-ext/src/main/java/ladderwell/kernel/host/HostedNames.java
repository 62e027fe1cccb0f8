package ladderwell.kernel.host;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.concurrent.ConcurrentHashMap;
import javax.lang.model.SourceVersion;
import ladderwell.kernel.cell.Names;

/**
 * The names that sentences declared in a kernel that is not ours. They become its variables at the end of the magic that
 * declared them; what its Java cells assign to them afterwards counts.
 */
final class HostedNames implements Names {
    /** What a variable is defined from, since the kernel takes text only. */
    private static final Map<String, Object> HANDED_OVER = new ConcurrentHashMap<>();

    private final HostedKernel host;
    private final Map<String, Named> named = new LinkedHashMap<>();
    private final Map<String, Named> fresh = new LinkedHashMap<>();

    HostedNames(HostedKernel host) {
        this.host = host;
    }

    /** The value handed over under a name. */
    static Object handedOver(String name) {
        Object value = HANDED_OVER.remove(name);
        if (value == null) {
            throw new IllegalStateException("nothing is handed over as " + name);
        }
        return value;
    }

    @Override
    public Optional<Named> find(String name) {
        Named now = fresh.get(name);
        if (now != null) {
            return Optional.of(now);
        }
        Optional<Object> inJava = javaValue(name);
        Named known = named.get(name);
        if (known == null) {
            return inJava.map(value -> new Named(name, "java", value.getClass(), value));
        }
        return Optional.of(inJava.filter(known.type()::isInstance)
                .map(value -> new Named(name, known.noun(), known.type(), value))
                .orElse(known));
    }

    @SuppressWarnings("NullAway") // The kernel returns null for null.
    private Optional<Object> javaValue(String name) {
        if (!isName(name)) {
            return Optional.empty();
        }
        try {
            return Optional.ofNullable(host.evaluate(name));
        } catch (Exception e) {
            // No such variable.
            return Optional.empty();
        }
    }

    private static boolean isName(String name) {
        return SourceVersion.isIdentifier(name) && !SourceVersion.isKeyword(name);
    }

    @Override
    public List<Named> declared() {
        Map<String, Named> all = new LinkedHashMap<>(named);
        all.putAll(fresh);
        return List.copyOf(all.values());
    }

    @Override
    public void check(String noun, String name, Class<?> type) {
        if (!isName(name)) {
            throw new IllegalArgumentException("\"" + name
                    + "\" cannot be a name; expected a letter, then letters, digits or _, and no word of Java");
        }
        find(name).ifPresent(known -> {
            boolean ofJava = known.noun().equals("java");
            if (ofJava ? !type.isInstance(known.value()) : !known.noun().equals(noun)) {
                String what = ofJava
                        ? "a Java variable of type " + known.type().getSimpleName()
                        : "declared as " + known.noun();
                throw new IllegalArgumentException(
                        name + " is already " + what + "; choose another name for this " + noun);
            }
        });
    }

    @Override
    public <T> void declare(String noun, String name, Class<T> type, T value) {
        check(noun, name, type);
        fresh.put(name, new Named(name, noun, type, type.cast(value)));
    }

    /** Forgets what was declared since the last {@link #keep}. */
    void undo() {
        fresh.clear();
    }

    /** Makes variables of what was declared since the last time. */
    void keep() throws Exception {
        for (Named name : List.copyOf(fresh.values())) {
            String type = name.type().getCanonicalName();
            HANDED_OVER.put(name.name(), name.value());
            Object unused = host.evaluate(type + " " + name.name() + " = (" + type + ") " + Plugin.class.getName()
                    + ".value(\"" + name.name() + "\");");
            named.put(name.name(), name);
        }
        fresh.clear();
    }
}
