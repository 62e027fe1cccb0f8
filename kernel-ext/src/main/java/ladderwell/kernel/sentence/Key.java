package ladderwell.kernel.sentence;

import java.util.List;
import java.util.stream.Collectors;
import ladderwell.quantity.Kind;

/**
 * A key of the language: the word before a value.
 *
 * @param word the word, lower case
 * @param form what its value looks like
 * @param kinds what its unit may measure, most usual first; empty where the form is no {@link Form#QUANTITY}
 * @param noun the noun whose names it takes; empty where the form is no {@link Form#REFERENCE}
 * @param least smallest whole number allowed
 * @param most largest whole number allowed
 * @param example a value as one would type it
 * @param meaning one line that says what it is
 * @param formula how it enters; may be empty
 * @param standard what holds where it is not given; empty where it must be given or nothing holds
 * @param choices the words that it takes; empty where the form is no {@link Form#CHOICE}
 * @param called how messages of physics call the value; mostly the word itself
 */
public record Key(
        String word,
        Form form,
        List<Kind> kinds,
        String noun,
        long least,
        long most,
        String example,
        String meaning,
        String formula,
        String standard,
        List<String> choices,
        String called) {

    /** Copies the lists. */
    public Key {
        kinds = List.copyOf(kinds);
        choices = List.copyOf(choices);
    }

    static Key quantity(String word, String meaning, Kind... kinds) {
        List<Kind> all = List.of(kinds);
        return new Key(word, Form.QUANTITY, all, "", 0, 0, all.get(0).example(), meaning, "", "", List.of(), word);
    }

    static Key of(String word, Form form, String example, String meaning) {
        return new Key(word, form, List.of(), "", 0, Long.MAX_VALUE, example, meaning, "", "", List.of(), word);
    }

    static Key count(String word, long least, long most, String example, String meaning) {
        return new Key(word, Form.COUNT, List.of(), "", least, most, example, meaning, "", "", List.of(), word);
    }

    static Key reference(String word, String noun, String example, String meaning) {
        return new Key(word, Form.REFERENCE, List.of(), noun, 0, 0, example, meaning, "", "", List.of(), word);
    }

    static Key choice(String word, String meaning, String... choices) {
        List<String> all = List.of(choices);
        return new Key(word, Form.CHOICE, List.of(), "", 0, 0, all.get(0), meaning, "", "", all, word);
    }

    /** The key of a parameter that a formula names. */
    static Key parameter(String name) {
        return of(name, Form.AMOUNT, "2 eV/angstrom^2", "a parameter of the formula");
    }

    Key formula(String text) {
        return new Key(word, form, kinds, noun, least, most, example, meaning, text, standard, choices, called);
    }

    Key standard(String text) {
        return new Key(word, form, kinds, noun, least, most, example, meaning, formula, text, choices, called);
    }

    Key called(String text) {
        return new Key(word, form, kinds, noun, least, most, example, meaning, formula, standard, choices, text);
    }

    /** The key with a value, as one would type it: "mass 40 u". */
    public String typed() {
        return example.isEmpty() ? word : word + " " + example;
    }

    /** What its value must be, with an example: "a mass such as 40 u". */
    public String expected() {
        return switch (form) {
            case FLAG -> "no value";
            case QUANTITY ->
                kinds.stream()
                        .map(kind -> kind.word() + " such as " + kind.example())
                        .collect(Collectors.joining(" or "));
            case AMOUNT -> "a number with its unit such as " + example;
            case TEXT -> "a text in quotes such as " + example;
            case NUMBER -> "a plain number such as " + example;
            case COUNT -> "a whole number such as " + example;
            case COMPLEX -> "a complex number such as " + example;
            case CHOICE -> Words.either(choices);
            case COUNTS -> "whole numbers such as " + example;
            case COMPLEXES -> "numbers, real or complex, such as " + example;
            case REFERENCE -> "the name of " + Words.article(noun);
            case NEW_NAME -> "a new name such as " + example;
        };
    }
}
