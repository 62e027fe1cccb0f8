package ladderwell.kernel.sentence;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;

/** The table agrees with itself: what it says of a sentence is what the reader reads. */
class GrammarTest {
    private final Grammar grammar = Grammar.of(List.of(
            new Item("position", false, "⟨x⟩", "a length", "mean position"),
            new Item("spread of position", false, "Δx", "a length", "standard deviation"),
            new Item("energy", false, "⟨E⟩", "an energy", "mean energy"),
            new Item("return probability", false, "P", "a plain number", "probability to return"),
            new Item("population of", true, "P_n", "a plain number", "probability of a level")));

    private final Surroundings surroundings = new Surroundings() {
        private final List<Known> known = List.of(
                new Known("trap", "oscillator", "harmonic", false),
                new Known("hard", "oscillator", "box", false),
                new Known("well", "oscillator", "finite well", false),
                new Known("psi", "state", "coherent", false),
                new Known("run", "evolve", "", false));

        @Override
        public List<Known> all() {
            return known;
        }

        @Override
        public Optional<Known> find(String name) {
            return known.stream().filter(one -> one.name().equals(name)).findFirst();
        }
    };

    private Sentence check(String text) throws MisreadSentence {
        return grammar.check(text, new Place(0, text.length()), surroundings);
    }

    @Test
    void theExampleOfEachNounIsRead() throws MisreadSentence {
        for (Noun noun : grammar.nouns()) {
            Sentence sentence = check(noun.example());
            assertEquals(noun, sentence.noun());
            assertTrue(noun.pattern().startsWith(noun.word()), noun.pattern());
            assertFalse(noun.meaning().isBlank());
        }
    }

    @Test
    void eachWayOfEachKindIsReadFromTheExamplesOfItsKeys() throws MisreadSentence {
        for (Noun noun : grammar.nouns()) {
            for (NounKind kind : noun.kinds()) {
                assertEquals(Optional.of(kind), noun.kind(kind.word().toUpperCase(Locale.ROOT)));
                String home = kind.homes().contains("box") ? "hard" : "trap";
                StringBuilder head = new StringBuilder(noun.word() + " x: " + kind.word());
                kind.argument().ifPresent(key -> head.append(' ').append(key.example()));
                for (Key lead : noun.leads(Optional.of(kind))) {
                    if (lead.form() == Form.REFERENCE) {
                        head.append(' ').append(lead.word()).append(' ').append(home);
                    }
                }
                for (Way way : kind.ways()) {
                    // In natural units the depth is a plain number, and its example has a unit.
                    boolean natural = way.required().contains("natural");
                    StringBuilder sentence = new StringBuilder(head);
                    for (String word : List.of(way.required(), way.optional()).stream()
                            .flatMap(List::stream)
                            .toList()) {
                        Key key = Stream.concat(kind.keys().stream(), kind.links().stream())
                                .filter(one -> one.word().equals(word))
                                .findFirst()
                                .orElseThrow(() -> new AssertionError(kind.word() + " has no key " + word));
                        sentence.append(kind.links().contains(key) ? " " : ", ")
                                .append(natural && key.form() == Form.QUANTITY ? word + " 39.5" : key.typed());
                    }
                    Sentence read = check(sentence.toString());
                    assertEquals(kind.word(), read.kind());
                    way.required().forEach(word -> assertTrue(read.has(word), word));
                }
            }
        }
    }

    @Test
    void eachKeyBelongsToAWayAndSaysWhatItMeans() {
        for (Noun noun : grammar.nouns()) {
            for (NounKind kind : noun.kinds()) {
                for (Key key : kind.keys()) {
                    assertTrue(kind.ways().stream().anyMatch(way -> way.allows(key.word())), key.word());
                }
            }
            for (Key key : noun.keys(noun.kinds().stream().findFirst())) {
                assertFalse(key.meaning().isBlank(), key.word());
                assertTrue(key.form() == Form.FLAG || !key.example().isBlank(), key.word());
            }
        }
    }

    @Test
    void aKindIsFoundByItsOtherNameToo() throws MisreadSentence {
        assertEquals("number", check("state x: fock in trap, level 2").kind());
        assertEquals(
                "box",
                check("oscillator x: infinite well, mass 1 u, width 1 nm").kind());
    }
}
