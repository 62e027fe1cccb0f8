package ladderwell.formula;

import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTimeoutPreemptively;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.time.Duration;
import java.util.Random;
import org.junit.jupiter.api.Test;

/** Broken texts from a seeded source: each one is read or refused with a place; nothing else is thrown. */
class MalformedFormulasTest {

    private static final String[] PIECES = {
        "x",
        "t",
        "a",
        "1",
        "2.5",
        "1e5",
        "3 eV",
        "2 nm",
        "1/nm",
        "hbar",
        "pi",
        "(",
        ")",
        "((",
        "))",
        ",",
        "+",
        "-",
        "*",
        "/",
        "^",
        "^2",
        "^-1",
        "^0.5",
        "<",
        "<=",
        ">",
        ">=",
        " and ",
        " or ",
        "if(",
        "exp(",
        "log(",
        "sqrt(",
        "abs(",
        "sign(",
        "step(",
        "min(",
        "max(",
        "gauss(",
        "sin(",
        "tan(",
        " ",
        "nm",
        "eV",
        "e",
        "1e",
        ".",
        "..",
        "'",
        "\"",
        "\\",
        "\u0000",
        "é",
        "😀",
        "\ud800",
        "²",
        "°",
        "=",
        "[",
        "]",
        "1e308",
        "1e-320",
        "0",
        "9999999999999999999",
        "µ",
        "Å",
        "foo",
        "x0"
    };

    private static void readOrRefuse(String text) {
        Parameters parameters = Parameters.none().with("a", "2 eV/angstrom^4");
        try {
            Formula formula = Formula.lab(text, parameters);
            formula.value(1e-9, 0);
            formula.slope().value(1e-9, 0);
            formula.breaks(-1e-8, 1e-8);
            formula.polynomial();
        } catch (FormulaException e) {
            assertTrue(0 <= e.start() && e.start() <= e.end() && e.end() <= text.length(), text);
            assertTrue(!e.reason().isBlank(), text);
        } catch (IllegalArgumentException e) {
            assertTrue(e.getMessage().contains("jumps or kinks"), () -> text + ": " + e);
        } catch (RuntimeException | StackOverflowError e) {
            throw new AssertionError("'" + text + "' gave " + e, e);
        }
    }

    @Test
    void everyTextIsReadOrRefusedWithItsPlace() {
        Random random = new Random(20260407);
        String good = "if(x < 2 nm and t > 0, 2 eV/nm^2*x^2, a*x^4 - min(1 eV, 3 eV*gauss(x, 0, 1 nm)))";
        for (int i = 0; i < 6000; i++) {
            StringBuilder text = new StringBuilder();
            if (i % 3 == 0) {
                text.append(good);
                for (int k = random.nextInt(4); k >= 0; k--) {
                    int from = random.nextInt(text.length());
                    int to = Math.min(text.length(), from + random.nextInt(4));
                    text.replace(from, to, random.nextBoolean() ? "" : PIECES[random.nextInt(PIECES.length)]);
                }
            } else {
                for (int k = random.nextInt(i % 3 == 1 ? 8 : 40); k >= 0; k--) {
                    text.append(PIECES[random.nextInt(PIECES.length)]);
                }
            }
            readOrRefuse(text.toString());
        }
    }

    @Test
    void deepNestingIsRefusedBeforeTheStackEnds() {
        assertTimeoutPreemptively(Duration.ofSeconds(30), () -> {
            String[] opening = {"(", "-", "exp(", "2^", "if(x<1,x,", "abs(-(", "x/(1+", "min(1,", "1+2*("};
            for (String open : opening) {
                for (int depth : new int[] {10, 60, 99, 2000}) {
                    String text = open.repeat(depth) + "x";
                    readOrRefuse(text);
                    long brackets = open.chars().filter(c -> c == '(').count();
                    readOrRefuse(text + ")".repeat((int) brackets * depth));
                    if (depth == 2000) {
                        assertThrows(FormulaException.class, () -> Formula.natural(text, Parameters.none()));
                    }
                }
            }
            readOrRefuse("x" + "+x".repeat(9000));
            readOrRefuse("1" + "*x/1 nm".repeat(60));
            readOrRefuse("x" + "/2".repeat(9000));
            readOrRefuse("x".repeat(30_000));
            readOrRefuse("1" + "*x".repeat(9000));
            readOrRefuse("min(x" + ",x".repeat(9000) + ")");
            readOrRefuse("x" + "+abs(sin(x/1 nm))*1 m".repeat(200));
            readOrRefuse("(a*x + a*x^2/1 m)^31*(a + a*x*sin(t/1 s)/1 m)^32");
            readOrRefuse("abs(a*x^3 - a*(x - 1 nm*cos(t/1 s))^3)^0.5");
            readOrRefuse("step((x - 1 nm*cos(t/1 s))^64)");
            readOrRefuse("if(x<0,x,".repeat(99) + "x" + ")".repeat(99));
        });
    }

    @Test
    void derivativesOfDeepFormulasStayOfBoundedSize() {
        String text = "sin(".repeat(90) + "x^2" + ")".repeat(90);
        Formula formula = Formula.natural(text, Parameters.none());
        Formula second = formula.slope().slope();
        assertTrue(Double.isFinite(second.value(0.3)));
        assertTrue(second.text().length() < 5000);
    }
}
