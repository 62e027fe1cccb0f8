package ladderwell.evidence;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.Locale;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class PhysicsExceptionTest {

    @Test
    void tooLargeNamesTheEstimateAndTheRemedy() {
        PhysicsException.TooLarge refused = new PhysicsException.TooLarge(
                "1e9 frames of 400 points need too much memory", 3.2e12, 8e9, "ask for at most 2500000 frames");
        assertEquals(
                "1e9 frames of 400 points need too much memory (3.2 TB, allowed 8.0 GB); ask for at most 2500000 frames",
                refused.getMessage());
        assertEquals(3.2e12, refused.estimate());
        assertEquals(8e9, refused.allowed());
        assertEquals("ask for at most 2500000 frames", refused.remedy());
        assertTrue(refused.what().startsWith("1e9 frames"));
    }

    @ParameterizedTest
    @CsvSource({
        "12, 12 bytes",
        "1500, 1.5 kB",
        "95e9, 95 GB",
        "999.6e6, 1.0 GB",
        "9.96e6, 10 MB",
        "1e30, 1e12 EB",
        "1e300, 1e282 EB"
    })
    void sizesReadLikeSizes(double bytes, String text) {
        Locale before = Locale.getDefault();
        try {
            Locale.setDefault(Locale.GERMANY);
            assertTrue(new PhysicsException.TooLarge("x", bytes, 1, "y")
                    .getMessage()
                    .startsWith("x (" + text + ", "));
        } finally {
            Locale.setDefault(before);
        }
    }

    @Test
    void notConvergedNamesStepsAndErrors() {
        PhysicsException.NotConverged failed =
                new PhysicsException.NotConverged("level n = 12 of well", 60, 3.04e-10, 1e-13);
        assertEquals(
                "level n = 12 of well did not converge in 60 steps: error 3e-10 reached, 1e-13 wanted",
                failed.getMessage());
        assertEquals(60, failed.steps());
        assertEquals(3.04e-10, failed.reached());
        assertEquals(1e-13, failed.wanted());
        assertEquals("level n = 12 of well", failed.what());
        assertTrue(new PhysicsException.NotConverged("x", 1, Double.POSITIVE_INFINITY, 1)
                .getMessage()
                .contains("error unknown reached"));
    }

    @Test
    void notCarriedNamesTheMissingWeightAndTheLastLevel() {
        PhysicsException.NotCarried refused = new PhysicsException.NotCarried(
                "the coherent state psi of mean 6", 0.0312, 5, "lower the mean, or make the well deeper or wider");
        assertEquals(
                "the coherent state psi of mean 6 needs weight 0.031 above the last bound level (n = 4); the bound levels"
                        + " cannot carry it: lower the mean, or make the well deeper or wider",
                refused.getMessage());
        assertEquals(0.0312, refused.missingWeight());
        assertEquals(5, refused.levels());
        assertEquals("the coherent state psi of mean 6", refused.state());
        assertEquals("lower the mean, or make the well deeper or wider", refused.remedy());
    }
}
