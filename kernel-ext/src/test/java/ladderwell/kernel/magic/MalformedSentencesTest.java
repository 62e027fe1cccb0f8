package ladderwell.kernel.magic;

import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertSame;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.junit.jupiter.api.Assertions.fail;

import java.util.List;
import java.util.Random;
import java.util.concurrent.TimeUnit;
import ladderwell.kernel.cell.Completion;
import ladderwell.kernel.cell.SentenceFailure;
import ladderwell.kernel.sentence.Grammar;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.Timeout;

/**
 * Any text either works or is refused in one sentence; completion and inspection survive it too. The time limit only turns a
 * text that is never answered into a failure; the work takes seconds.
 */
@Timeout(value = 10, unit = TimeUnit.MINUTES, threadMode = Timeout.ThreadMode.SEPARATE_THREAD)
class MalformedSentencesTest {
    private static final long SEED = 20_260_412;
    private static final int CASES = 4000;

    private static final List<String> GOOD = List.of(
            "%oscillator a: harmonic, mass 40 u, frequency 1.2 MHz",
            "%oscillator b: finite well, mass 0.067 me, width 10 nm, depth 0.3 eV",
            "%oscillator c: box, natural",
            "%state d: coherent in trap, mean 9.5, phase 30 deg",
            "%state e: superposition in trap, levels 0 1 2, weights 1 1i 0.5-0.2i",
            "%state f: number in trap, level {n}",
            "%evolve g: psi for 3 periods, frames 3, tolerance 1e-9",
            "%table run: position, spread of position, population of 3, every 2, as t",
            "%animate run, points 20",
            "%levels trap, count 3",
            "%%declare\noscillator x: box,\n   mass 1 u, # comment\n   width 3 nm\n\nstate y: number in x, level 2");

    private static final List<String> SCRAPS = List.of(
            ",",
            ":",
            "{",
            "}",
            "\"",
            "'",
            "#",
            "%",
            "\n",
            "\r",
            "\t",
            " ",
            "\u00a0",
            "\u0000",
            "\u001b",
            "\ud800",
            "\udc00",
            "−",
            "NaN",
            "Infinity",
            "1e999",
            "-1",
            "1e-400",
            "/",
            "^",
            "i",
            "+",
            "..",
            "{{}",
            "\\",
            "for",
            "in",
            "mass",
            "u",
            "m",
            "levels",
            "natural",
            "ψ",
            "\u202e",
            "\ud83c\udf0a",
            "٣",
            "e",
            "1_0",
            "=",
            "(",
            "kg m/s",
            "%%");

    private static String mutated(Random random) {
        StringBuilder text = new StringBuilder(GOOD.get(random.nextInt(GOOD.size())));
        for (int changes = 1 + random.nextInt(4); changes > 0; changes--) {
            int at = random.nextInt(text.length() + 1);
            int to = Math.min(text.length(), at + random.nextInt(8));
            switch (random.nextInt(5)) {
                case 0 -> text.delete(at, to);
                case 1 -> text.insert(at, SCRAPS.get(random.nextInt(SCRAPS.size())));
                case 2 -> text.replace(at, to, SCRAPS.get(random.nextInt(SCRAPS.size())));
                case 3 -> text.insert(at, text.substring(at, to));
                default -> text.insert(at, (char) random.nextInt(0x10000));
            }
        }
        return text.toString();
    }

    @Test
    void everyMalformedSentenceWorksOrIsRefusedInOneSentence() throws SentenceFailure {
        Bench bench = prepared();
        Object trap = bench.value("trap");
        Random random = new Random(SEED);
        int refused = 0;
        for (int i = 0; i < CASES; i++) {
            String text = mutated(random);
            refused += refusal(bench, text);
            if (!bench.find("trap").orElseThrow().noun().equals("oscillator")) {
                fail("lost trap by: " + text);
            }
        }
        assertTrue(refused > CASES / 2, "only " + refused + " of " + CASES + " were refused");
        assertSame(trap, bench.value("trap"));
    }

    private static Bench prepared() throws SentenceFailure {
        Bench bench = new Bench();
        bench.expressions.put("n", 2);
        bench.run("%oscillator trap: harmonic, mass 40 u, frequency 1.2 MHz\n%state psi: coherent in trap, mean 4\n"
                + "%evolve run: psi for 1 periods, frames 4");
        return bench;
    }

    /** 1 if the text is refused as it should be, 0 if it works. */
    private static int refusal(Bench bench, String text) {
        int refused = 0;
        try {
            bench.run(text);
        } catch (SentenceFailure failure) {
            refused = 1;
            String message = failure.message();
            assertFalse(message.isBlank() || message.equals("null"), () -> "no message for: " + text);
            assertTrue(message.length() < 600, () -> "long message: " + message);
            assertTrue(
                    message.codePoints()
                            .noneMatch(c -> Character.getType(c) == Character.SURROGATE || Character.isISOControl(c)),
                    () -> "unprintable message for: " + text);
            assertTrue(failure.lines().size() == 2, () -> "no place for: " + text);
        }
        for (int cursor = 0; cursor <= text.length(); cursor += 7) {
            Completion completion = bench.declarations.complete(text, cursor, bench);
            assertTrue(completion.end() <= text.length());
            bench.declarations.inspect(text, cursor, 1, bench);
        }
        return refused;
    }

    @Test
    void aMegabyteOfAnythingIsRefusedUnread() throws SentenceFailure {
        Bench bench = prepared();
        for (String scrap : SCRAPS) {
            String much = scrap.repeat((1 << 20) / scrap.length());
            for (String before : List.of("%", "%%declare\n", "%oscillator x: box, mass 1 u, width ", "%table run: ")) {
                String text = before + much;
                try {
                    bench.run(text);
                    assertTrue(
                            much.isBlank() || scrap.equals("\u00a0") || scrap.equals("#"),
                            () -> "accepted much of " + scrap);
                } catch (SentenceFailure failure) {
                    assertTrue(failure.message().length() < 200, failure.message());
                }
                bench.declarations.complete(text, text.length(), bench);
                bench.declarations.inspect(text, text.length(), 1, bench);
            }
        }
    }

    @Test
    void aSentenceAsLongAsAllowedIsReadOrRefusedLikeAnyOther() throws SentenceFailure {
        Bench bench = prepared();
        for (String scrap : SCRAPS) {
            for (String before : List.of(
                    "%",
                    "%oscillator x: ",
                    "%oscillator x: box, mass 1 u, width ",
                    "%table run: ",
                    "%levels ",
                    "%state x: superposition in trap, levels 0 ",
                    "%state x: coherent in trap, alpha 1 ")) {
                String text = before + scrap.repeat((Grammar.LONGEST_SENTENCE - before.length()) / scrap.length());
                try {
                    bench.run(text);
                } catch (SentenceFailure failure) {
                    assertTrue(failure.message().length() < 600, failure.message());
                }
                bench.declarations.complete(text, text.length(), bench);
                bench.declarations.inspect(text, text.length(), 1, bench);
            }
        }
    }
}
