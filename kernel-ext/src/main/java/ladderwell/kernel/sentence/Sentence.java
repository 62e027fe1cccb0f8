package ladderwell.kernel.sentence;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Collectors;
import ladderwell.formula.Amount;
import ladderwell.quantity.Quantity;

/**
 * A sentence that has been read: its noun, its name, its kind, and the values of its keys, each of the type that its key
 * promises. Immutable.
 */
public final class Sentence {
    private final Noun noun;
    private final String name;
    private final Place namePlace;
    private final Optional<NounKind> kind;
    private final boolean natural;
    private final Place place;
    private final Map<String, Value> values;
    private final List<String> items;

    /**
     * The value of a key.
     *
     * @param object a Quantity, Amount, Double, Long, Complex, String, a list of Long or Complex, or TRUE for a flag
     * @param places where its parts stand
     */
    record Value(Object object, List<Term> terms, Place place) {}

    Sentence(
            Noun noun,
            String name,
            Place namePlace,
            Optional<NounKind> kind,
            boolean natural,
            Place place,
            Map<String, Value> values,
            List<String> items) {
        this.noun = noun;
        this.name = name;
        this.namePlace = namePlace;
        this.kind = kind;
        this.natural = natural;
        this.place = place;
        this.values = new LinkedHashMap<>(values);
        this.items = List.copyOf(items);
    }

    /** The noun. */
    public Noun noun() {
        return noun;
    }

    /** The name after the noun: the one declared, or the one spoken of. */
    public String name() {
        return name;
    }

    /** Where the name stands. */
    public Place namePlace() {
        return namePlace;
    }

    /** The word of the kind; empty where the noun has none. */
    public String kind() {
        return kind.map(NounKind::word).orElse("");
    }

    /** The formula of the kind; empty where there is none. */
    public String kindFormula() {
        return kind.map(NounKind::formula).orElse("");
    }

    /** Whether it speaks of something in natural units. */
    public boolean natural() {
        return natural;
    }

    /** Where the sentence stands. */
    public Place place() {
        return place;
    }

    /** What it declares under its name, once it has been carried out; empty where it declares none. */
    public Optional<Known> declared() {
        return noun.declares() ? Optional.of(new Known(name, noun.word(), kind(), natural)) : Optional.empty();
    }

    /** Whether the key was given. */
    public boolean has(String key) {
        return values.containsKey(key);
    }

    /** The quantity given for a key. */
    public Quantity quantity(String key) {
        return value(key, Quantity.class);
    }

    /** The number with its unit given for a key that takes any unit, or for a parameter of a formula. */
    public Amount amount(String key) {
        return value(key, Amount.class);
    }

    /** The text given for a key. */
    public String text(String key) {
        return value(key, String.class);
    }

    /** The value of a key as it was typed. */
    public String typed(String key) {
        Value value = values.get(key);
        return value == null ? "" : value.terms().stream().map(Term::text).collect(Collectors.joining(" "));
    }

    /** The names that were given a value for a formula to use, in the order given. */
    public List<String> parameters() {
        List<String> known = noun.keys(kind).stream().map(Key::word).toList();
        List<String> argument =
                kind.flatMap(NounKind::argument).map(Key::word).stream().toList();
        return values.keySet().stream()
                .filter(key -> !known.contains(key) && !argument.contains(key))
                .filter(key -> kind.map(NounKind::parameters).orElse(false))
                .toList();
    }

    /** The number given for a key. */
    public double number(String key) {
        return value(key, Double.class);
    }

    /** The whole number given for a key. */
    public long count(String key) {
        return value(key, Long.class);
    }

    /** The complex number given for a key. */
    public Complex complex(String key) {
        return value(key, Complex.class);
    }

    /** The name given for a key; under the head noun's word, the name after the colon. */
    public String reference(String key) {
        return value(key, String.class);
    }

    /** The word given for a key that takes one of a few, lower case. */
    public String choice(String key) {
        return value(key, String.class);
    }

    /** The whole numbers given for a key. */
    public List<Long> counts(String key) {
        List<Long> all = new ArrayList<>();
        value(key, List.class).forEach(one -> all.add((Long) one));
        return all;
    }

    /** The complex numbers given for a key. */
    public List<Complex> complexes(String key) {
        List<Complex> all = new ArrayList<>();
        value(key, List.class).forEach(one -> all.add((Complex) one));
        return all;
    }

    /** The items listed, as they are called in full: "spread of position", "population of 3". */
    public List<String> items() {
        return items;
    }

    private <T> T value(String key, Class<T> type) {
        Value value = values.get(key);
        if (value == null || !type.isInstance(value.object())) {
            throw new IllegalArgumentException("sentence '" + noun.word() + " " + name + "' holds no "
                    + type.getSimpleName() + " under '" + key + "'");
        }
        return type.cast(value.object());
    }

    /** Where the value of a key stands; the whole sentence where the key was not given. */
    public Place placeOf(String key) {
        Value value = values.get(key);
        return value == null ? place : value.place();
    }

    /**
     * The place that a message from elsewhere speaks of: the value of the key whose word comes first in it, and of a list
     * the one number it names; the whole sentence where no key is named.
     */
    public Place placeSpokenOf(String message) {
        String padded = " " + separated(message) + " ";
        int first = Integer.MAX_VALUE;
        Place found = place;
        for (Map.Entry<String, Value> entry : values.entrySet()) {
            int at = spokenOf(padded, separated(called(entry.getKey())));
            if (at >= 0 && at < first) {
                first = at;
                found = part(entry.getValue(), padded, at);
            }
        }
        return found;
    }

    private String called(String key) {
        return noun.keys(kind).stream()
                .filter(known -> known.word().equals(key))
                .map(Key::called)
                .findFirst()
                .orElse(key);
    }

    /** Where the message has the word, in the singular or the plural; −1 if nowhere. */
    private static int spokenOf(String padded, String word) {
        String other = word.endsWith("s") ? word.substring(0, word.length() - 1) : word + "s";
        int at = padded.indexOf(" " + word + " ");
        int otherAt = padded.indexOf(" " + other + " ");
        return at < 0 || (otherAt >= 0 && otherAt < at) ? otherAt : at;
    }

    /** The part of a value that the message names first, behind the word of the key. */
    private static Place part(Value value, String padded, int from) {
        int first = Integer.MAX_VALUE;
        Place found = value.place();
        for (Term term : value.terms()) {
            int at = padded.indexOf(" " + term.text() + " ", from);
            if (value.terms().size() > 1 && at >= 0 && at < first) {
                first = at;
                found = term.place();
            }
        }
        return found;
    }

    private static String separated(String text) {
        return text.replaceAll("[^\\p{L}\\p{N}.+−-]+", " ");
    }
}
