package ladderwell.kernel.session;

import java.lang.reflect.Member;
import java.lang.reflect.Modifier;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;

/**
 * Imports on demand. To JShell an import is a snippet like any other, and a dozen of them double the time to the first
 * answer. An import of everything in a package or class means something to a text only if the text holds a name that is
 * found there, so each waits for the first such text; what a text means is the same as with all of them.
 */
final class Imports {
    private static final Pattern NAME = Pattern.compile("\\p{javaJavaIdentifierStart}\\p{javaJavaIdentifierPart}*");
    private static final String STATIC = "static ";

    private final List<String> waiting;
    private final Set<String> known = new HashSet<>();
    private final Map<String, Set<String>> members = new HashMap<>();

    /** @param imports as {@code java.util.*} or {@code static java.lang.Math.*} */
    Imports(List<String> imports) {
        waiting = new ArrayList<>(imports);
    }

    /** The imports that a text needs and that were not asked for before. */
    List<String> neededBy(String text) {
        List<String> needed = new ArrayList<>();
        Matcher names = NAME.matcher(text);
        while (names.find()) {
            String name = names.group();
            if (!waiting.isEmpty() && known.add(name)) {
                waiting.stream().filter(each -> offers(each, name)).forEach(needed::add);
                waiting.removeAll(needed);
            }
        }
        return needed;
    }

    /** Every import that was not asked for before and leads somewhere. */
    List<String> rest() {
        List<String> rest = List.copyOf(waiting);
        waiting.clear();
        return rest;
    }

    private boolean offers(String each, String name) {
        if (!each.endsWith(".*")) {
            return each.endsWith("." + name);
        }
        String owner = each.substring(0, each.length() - 2).replace(STATIC, "").strip();
        if (each.startsWith(STATIC)) {
            return members.computeIfAbsent(owner, Imports::staticMembers).contains(name);
        }
        // Classes are named with a capital letter in every package that is imported from the start.
        return Character.isUpperCase(name.codePointAt(0)) && exists(owner + "." + name);
    }

    private static boolean exists(String className) {
        try {
            Class.forName(className, false, Imports.class.getClassLoader());
            return true;
        } catch (ClassNotFoundException | LinkageError e) {
            return false;
        }
    }

    private static Set<String> staticMembers(String className) {
        Set<String> names = new HashSet<>();
        try {
            Class<?> owner = Class.forName(className, false, Imports.class.getClassLoader());
            Stream.<Member>concat(Arrays.stream(owner.getMethods()), Arrays.stream(owner.getFields()))
                    .filter(member -> Modifier.isStatic(member.getModifiers()))
                    .forEach(member -> names.add(member.getName()));
            for (Class<?> inner : owner.getClasses()) {
                names.add(inner.getSimpleName());
            }
        } catch (ClassNotFoundException | LinkageError e) {
            // Then it offers nothing.
        }
        return names;
    }
}
