package ladderwell.kernel.notebook;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import java.util.Random;
import ladderwell.kernel.real.RealPrograms;
import ladderwell.kernel.real.RealPrograms.Outcome;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

class NumberTextTest {
    @TempDir
    private Path folder;

    @Test
    void numbersHaveTheFormOfPythons() {
        Map<Double, String> expected = Map.of(
                1e-9,
                "1e-09",
                1.5e-5,
                "1.5e-05",
                1e-4,
                "0.0001",
                1.0,
                "1.0",
                -120.0,
                "-120.0",
                1e15,
                "1000000000000000.0",
                1e16,
                "1e+16",
                2e-323,
                "2e-323",
                -1.7976931348623157e308,
                "-1.7976931348623157e+308",
                0.1,
                "0.1");
        expected.forEach((number, text) -> assertEquals(text, NumberText.of(number)));
        assertEquals("-0.0", NumberText.of(-0.0));
    }

    @Test
    void pythonPrintsTheSameNumbersTheSameWay() throws Exception {
        RealPrograms.needPython("json");
        Random random = new Random(20261201);
        StringBuilder text = new StringBuilder();
        for (int i = 0; i < 20_000; i++) {
            double number = i % 2 == 0
                    ? Double.longBitsToDouble(random.nextLong())
                    : Math.round(random.nextDouble() * 1e6) * Math.pow(10, random.nextInt(30) - 20);
            if (Double.isFinite(number)) {
                text.append(NumberText.of(number)).append('\n');
            }
        }
        Path file = Files.writeString(folder.resolve("numbers"), text);
        Outcome outcome = RealPrograms.run(
                Map.of(),
                60,
                RealPrograms.PYTHON,
                "-c",
                "import sys\nfor t in open(sys.argv[1]).read().split():\n    assert repr(float(t)) == t, t",
                file.toString());
        assertEquals(List.of(0, ""), List.of(outcome.exitCode(), outcome.text()));
    }
}
