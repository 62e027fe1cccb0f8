package ladderwell.formula;

import java.util.ArrayList;
import java.util.Collection;
import java.util.List;
import java.util.Locale;
import ladderwell.quantity.Units;

/** What a name that means nothing may have been meant to be. */
final class Names {

    private Names() {}

    static String unknown(
            String name, boolean called, boolean natural, Collection<String> variables, Parameters parameters) {
        List<String> functions = new ArrayList<>();
        for (Op op : Op.values()) {
            if (op.isFunction()) {
                functions.add(op.function());
            }
        }
        if (called) {
            return "there is no function '" + name + "'; functions are " + String.join(", ", functions)
                    + meant(name, functions);
        }
        if (!natural && Units.parse(name).isPresent()) {
            return "'" + name + "' is a unit, and no parameter of this name is given; a unit stands behind a number,"
                    + " such as 1 " + name;
        }
        List<String> known = new ArrayList<>(parameters.values().keySet());
        known.addAll(variables);
        known.add("pi");
        known.add("hbar");
        List<String> all = new ArrayList<>(known);
        all.addAll(functions);
        return "'" + name + "' has no value; names here are " + String.join(", ", known) + meant(name, all);
    }

    static String signature(Op op) {
        return switch (op) {
            case MIN, MAX -> op.function() + "(a, b)";
            case GAUSS -> "gauss(x, centre, width)";
            case IF -> "if(condition, value, value)";
            default -> op.function() + "(…)";
        };
    }

    private static String meant(String name, List<String> known) {
        String best = "";
        int least = Math.max(1, Math.min(2, name.length() / 2)) + 1;
        for (String candidate : known) {
            int distance = candidate.equalsIgnoreCase(name)
                    ? 0
                    : distance(name.toLowerCase(Locale.ROOT), candidate.toLowerCase(Locale.ROOT));
            // a single letter is near to every other
            if (distance < least && distance < Math.max(name.length(), candidate.length())) {
                least = distance;
                best = candidate;
            }
        }
        return best.isEmpty() ? "" : "; did you mean '" + best + "'?";
    }

    /** Edit distance with swaps of neighbours (Damerau 1964, restricted), by rows; texts far apart in length are not compared. */
    private static int distance(String a, String b) {
        if (Math.abs(a.length() - b.length()) > 2) {
            return Integer.MAX_VALUE;
        }
        int[][] d = new int[a.length() + 1][b.length() + 1];
        for (int i = 0; i <= a.length(); i++) {
            for (int j = 0; j <= b.length(); j++) {
                if (i == 0 || j == 0) {
                    d[i][j] = i + j;
                    continue;
                }
                int change = a.charAt(i - 1) == b.charAt(j - 1) ? 0 : 1;
                d[i][j] = Math.min(Math.min(d[i - 1][j], d[i][j - 1]) + 1, d[i - 1][j - 1] + change);
                if (i > 1 && j > 1 && a.charAt(i - 1) == b.charAt(j - 2) && a.charAt(i - 2) == b.charAt(j - 1)) {
                    d[i][j] = Math.min(d[i][j], d[i - 2][j - 2] + 1);
                }
            }
        }
        return d[a.length()][b.length()];
    }
}
