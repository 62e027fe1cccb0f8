package ladderwell.kernel.sentence;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.Locale;
import java.util.Optional;
import org.junit.jupiter.api.Test;

class SentenceTextTest {
    private static List<String> sentences(String text) {
        return SentenceText.of(text).sentences().stream()
                .map(place -> text.substring(place.start(), place.end()))
                .toList();
    }

    @Test
    void eachLineWithAPercentSignIsASentence() {
        assertEquals(List.of("a x: b", "c"), sentences("%a x: b\n\n  %c\n# not this"));
        assertEquals(List.of("a", " b"), sentences("%a\n% b"));
    }

    @Test
    void deeperLinesGoOnWithASentence() {
        assertEquals(List.of("a,\n  b,\n   c", "d"), sentences("%%declare\na,\n  b,\n   c\nd"));
        assertEquals(List.of("a", "b"), sentences("%%declare\n  a\n  b"));
        assertEquals(List.of("a", "b"), sentences("%%declare\na\n\n  b"));
        assertEquals(List.of("a,\n# note\n  b"), sentences("%%declare\na,\n# note\n  b"));
        assertEquals(List.of("a", "state psi: x"), sentences("%%declare\na\n  state psi: x"));
        assertEquals(List.of("a", "b"), sentences("%%declare\na\n  %b"));
    }

    @Test
    void theNearestWordIsNearEnough() {
        List<String> words = List.of("harmonic", "box", "finite well", "psi");
        assertEquals(Optional.of("harmonic"), Words.nearest("hramonic", words));
        assertEquals(Optional.of("harmonic"), Words.nearest("HARMONIC", words));
        assertEquals(Optional.of("harmonic"), Words.nearest("harm", words));
        assertEquals(Optional.of("psi"), Words.nearest("phi", words));
        assertEquals(Optional.empty(), Words.nearest("vac", words));
        assertEquals(Optional.empty(), Words.nearest("x", words));
        assertEquals(Optional.empty(), Words.nearest("", words));
        assertEquals(Optional.empty(), Words.nearest("h".repeat(1000), words));
    }

    @Test
    void theDistanceCountsSlips() {
        assertEquals(0, Words.distance("mass", "mass"));
        assertEquals(1, Words.distance("mass", "mas"));
        assertEquals(1, Words.distance("mass", "amss"));
        assertEquals(2, Words.distance("mass", "amsz"));
        assertEquals(4, Words.distance("", "mass"));
        // Letters touched by a swap are not touched again: 3, where the unrestricted distance is 2.
        assertEquals(3, Words.distance("ca", "abc"));
    }

    @Test
    void numbersAreReadTheSameInEveryLocale() {
        Locale before = Locale.getDefault();
        try {
            Locale.setDefault(Locale.forLanguageTag("ar-EG"));
            assertEquals(new NumberText(1.5, 3), NumberText.at("1.5", 0));
            assertEquals(new NumberText(-3e-9, 5), NumberText.at("−3e-9u", 0));
            assertEquals(new NumberText(2, 1), NumberText.at("2eV", 0));
            assertEquals(new NumberText(0.5, 2), NumberText.at(".5", 0));
            assertEquals(new NumberText(5, 2), NumberText.at("5.", 0));
            assertEquals(new NumberText(1, 1), NumberText.at("1..100", 0));
            assertEquals(0, NumberText.at("٣", 0).end());
            assertEquals(0, NumberText.at("-", 0).end());
            assertEquals(0, NumberText.at(".", 0).end());
        } finally {
            Locale.setDefault(before);
        }
    }

    @Test
    void aPlaceFarToTheRightIsShownWithoutWhatIsBeforeIt() {
        String text = "first\n" + "a".repeat(500) + "\u0000\ud83c\udf0a\t" + "b".repeat(500);
        List<String> lines = new Place(510, 515).marked(text, 7);
        assertTrue(lines.get(0).startsWith("line 8: …aaaa"), lines.get(0));
        assertTrue(lines.get(0).endsWith("b…"), lines.get(0));
        // The wave is two chars of Java but one place on the screen.
        int caret = lines.get(1).indexOf('^');
        assertEquals(
                "bbbbb",
                lines.get(0)
                        .substring(lines.get(0).offsetByCodePoints(0, caret))
                        .substring(0, 5));
        assertEquals(caret + 5, lines.get(1).length());
    }

    @Test
    void aPlaceAtTheEndOfTheTextIsMarkedBehindIt() {
        assertEquals(List.of("line 1: abc", "           ^"), new Place(3, 3).marked("abc", 1));
        assertEquals(List.of("line 2: ", "        ^"), new Place(4, 4).marked("abc\n", 1));
    }
}
