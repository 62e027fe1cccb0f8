package ladderwell.kernel.sentence;

import java.util.Arrays;
import java.util.Collection;
import java.util.List;
import java.util.Locale;
import java.util.Optional;

/** Words in messages: quoted so that any text can be shown, listed, and the nearest valid one found. */
final class Words {
    /** Most characters of a quoted text. */
    private static final int QUOTED = 40;

    private Words() {}

    /** Lower case, single blanks. */
    static String plain(String text) {
        return text.length() > 200 ? text : text.strip().replaceAll("\\s+", " ").toLowerCase(Locale.ROOT);
    }

    /** With "a" or "an" before it. */
    static String article(String word) {
        return word.isEmpty() ? word : ("aeiou".indexOf(word.charAt(0)) >= 0 ? "an " : "a ") + word;
    }

    /** In quotes, shortened, with nothing in it that cannot be shown. */
    static String quoted(String text) {
        String shown = text.length() > QUOTED ? text.substring(0, QUOTED) + "…" : text;
        return "'" + shown(shown).strip() + "'";
    }

    /** One line of visible characters: controls and lone surrogates replaced, blanks of every sort made plain. */
    static String shown(String text) {
        StringBuilder out = new StringBuilder(text.length());
        text.codePoints().forEach(c -> {
            int type = Character.getType(c);
            if (Character.isWhitespace(c) || Character.isSpaceChar(c)) {
                out.append(' ');
            } else if (type == Character.CONTROL
                    || type == Character.SURROGATE
                    || type == Character.FORMAT
                    || type == Character.UNASSIGNED) {
                out.append('\uFFFD');
            } else {
                out.appendCodePoint(c);
            }
        });
        return out.toString();
    }

    /** "a, b or c". */
    static String either(List<String> words) {
        return joined(words, " or ");
    }

    /** "a, b and c". */
    static String all(List<String> words) {
        return joined(words, " and ");
    }

    private static String joined(List<String> words, String last) {
        int n = words.size();
        return n < 2 ? String.join("", words) : String.join(", ", words.subList(0, n - 1)) + last + words.get(n - 1);
    }

    /** "; did you mean 'harmonic'?" or nothing. */
    static String didYouMean(Optional<String> nearest) {
        return nearest.map(word -> "; did you mean '" + word + "'?").orElse("");
    }

    /**
     * The word nearest to what was typed, if one is near: at most one slip in four letters, two in eight, three beyond. A
     * wrong case is no slip, and the beginning of a word is near to the word.
     */
    static Optional<String> nearest(String typed, Collection<String> words) {
        String text = typed.strip();
        if (text.isEmpty() || text.length() > QUOTED) {
            return Optional.empty();
        }
        String lower = text.toLowerCase(Locale.ROOT);
        String best = "";
        int least = text.length() < 2 ? 1 : text.length() <= 4 ? 2 : text.length() <= 8 ? 3 : 4;
        for (String word : words) {
            if (Math.abs(word.length() - text.length()) >= 4) {
                continue;
            }
            int distance = distance(lower, word.toLowerCase(Locale.ROOT));
            if (distance < least) {
                least = distance;
                best = word;
            }
        }
        if (!best.isEmpty()) {
            return Optional.of(best);
        }
        return text.length() < 3
                ? Optional.empty()
                : words.stream()
                        .filter(word -> word.toLowerCase(Locale.ROOT).startsWith(lower))
                        .findFirst();
    }

    /**
     * Insertions, deletions, changes and swaps of neighbours that turn one word into the other (F. J. Damerau, Commun. ACM
     * 7 (1964) 171), no letter touched twice.
     */
    static int distance(String a, String b) {
        int[] beforeLast = new int[b.length() + 1];
        int[] last = new int[b.length() + 1];
        int[] row = new int[b.length() + 1];
        Arrays.setAll(last, j -> j);
        for (int i = 1; i <= a.length(); i++) {
            row[0] = i;
            for (int j = 1; j <= b.length(); j++) {
                int change = last[j - 1] + (a.charAt(i - 1) == b.charAt(j - 1) ? 0 : 1);
                row[j] = Math.min(Math.min(last[j], row[j - 1]) + 1, change);
                if (i > 1 && j > 1 && a.charAt(i - 1) == b.charAt(j - 2) && a.charAt(i - 2) == b.charAt(j - 1)) {
                    row[j] = Math.min(row[j], beforeLast[j - 2] + 1);
                }
            }
            int[] free = beforeLast;
            beforeLast = last;
            last = row;
            row = free;
        }
        return last[b.length()];
    }
}
