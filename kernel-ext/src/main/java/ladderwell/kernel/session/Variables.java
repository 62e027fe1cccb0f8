package ladderwell.kernel.session;

import java.lang.reflect.Field;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import jdk.jshell.JShell;
import jdk.jshell.Snippet;
import jdk.jshell.SnippetEvent;
import jdk.jshell.VarSnippet;
import org.jspecify.annotations.Nullable;

/**
 * The variables of a session, each with the static field that JShell keeps it in: a value is read and written there
 * without compiling anything.
 */
final class Variables {
    private final JShell shell;
    private final SnippetControl control;
    private final Map<String, Holder> holders = new LinkedHashMap<>();

    private record Holder(VarSnippet snippet, Field field) {
        @Nullable Object read() {
            try {
                return field.get(null);
            } catch (IllegalAccessException e) {
                throw new IllegalStateException(e);
            } catch (ExceptionInInitializerError | NoClassDefFoundError e) {
                return null;
            }
        }

        void write(@Nullable Object value) {
            try {
                field.set(null, value);
            } catch (IllegalAccessException e) {
                throw new IllegalStateException(e);
            }
        }
    }

    Variables(JShell shell, SnippetControl control) {
        this.shell = shell;
        this.control = control;
    }

    List<String> names() {
        return List.copyOf(holders.keySet());
    }

    Optional<Variable> find(String name) {
        Holder holder = holders.get(name);
        return holder == null
                ? Optional.empty()
                : Optional.of(new Variable(name, holder.field.getType(), Optional.ofNullable(holder.read())));
    }

    /** Makes a variable, or gives the one of that name and type another value. */
    void define(String name, Class<?> type, Object value) {
        Holder holder = holders.get(name);
        if (holder == null || holder.field.getType() != type) {
            for (SnippetEvent event : shell.eval(type.getCanonicalName() + " " + name + ";")) {
                note(event, true);
            }
            holder = holders.get(name);
        }
        if (holder == null) {
            throw new IllegalArgumentException(
                    "Java takes no variable " + name + " of type " + type.getCanonicalName());
        }
        holder.write(value);
    }

    void drop(String name) {
        Holder holder = holders.remove(name);
        if (holder != null) {
            release(holder);
            if (shell.status(holder.snippet).isActive()) {
                shell.drop(holder.snippet);
            }
        }
    }

    /**
     * Follows what a snippet did to the variables.
     *
     * @param succeeded whether the snippet ran to its end; if not, a variable that it meant to define anew gets its old
     *     value back, where JShell would leave it zero or null
     */
    void note(SnippetEvent event, boolean succeeded) {
        if (!(event.snippet() instanceof VarSnippet snippet)) {
            return;
        }
        Holder old = holders.get(snippet.name());
        if (event.status() == Snippet.Status.DROPPED || event.status() == Snippet.Status.NONEXISTENT) {
            holders.remove(snippet.name(), old);
            return;
        }
        if (!event.status().isDefined()) {
            return;
        }
        Optional<Field> field = fieldOf(snippet);
        if (field.isEmpty()) {
            return;
        }
        Holder now = new Holder(snippet, field.get());
        holders.put(snippet.name(), now);
        if (old != null && old.field.equals(now.field)) {
            return;
        }
        if (!succeeded) {
            undo(old, now);
        } else if (old != null) {
            release(old);
        }
    }

    private void undo(@Nullable Holder old, Holder failed) {
        if (old == null) {
            drop(failed.snippet.name());
        } else if (old.field.getType() == failed.field.getType()) {
            failed.write(old.read());
        } else {
            Object value = old.read();
            drop(failed.snippet.name());
            for (SnippetEvent event : shell.eval(old.snippet.typeName() + " " + old.snippet.name() + ";")) {
                note(event, true);
            }
            Holder again = holders.get(old.snippet.name());
            if (again != null) {
                again.write(value);
            }
        }
    }

    private Optional<Field> fieldOf(VarSnippet snippet) {
        try {
            String unused = shell.varValue(snippet);
        } catch (IllegalArgumentException | IllegalStateException e) {
            return Optional.empty();
        }
        return control.lastField();
    }

    /** A replaced variable's class stays loaded; its value must not. */
    private static void release(Holder holder) {
        if (!holder.field.getType().isPrimitive()) {
            holder.write(null);
        }
    }
}
