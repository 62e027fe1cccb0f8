package ladderwell.kernel.picture;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.google.gson.JsonObject;
import java.util.stream.LongStream;
import ladderwell.Oscillator;
import ladderwell.formula.Amount;
import ladderwell.formula.Parameters;
import ladderwell.potential.Potential;
import ladderwell.quantity.Quantity;
import ladderwell.quantity.Units;
import org.junit.jupiter.api.Test;

class SpacingsTest {
    private static final Quantity UNIT = Quantity.of(1, Units.ONE);

    private static Oscillator in(String formula) {
        return Oscillator.in(Potential.of(formula, UNIT, Parameters.none()));
    }

    private static long[] lowest(int count) {
        return LongStream.range(0, count).toArray();
    }

    @Test
    void thePairsOfADoubleWellAreNamedWithTheirSplittings() {
        // p² + x⁴ − 10 x² is twice p²/2 + x⁴/2 − 5x²; splitting 2.98185428881e-5 of Banerjee and Bhatnagar 1978, row
        // S-DW-04b
        Spacings spacings = Spacings.of(in("x^4/2 - 5*x^2"), lowest(6));
        assertTrue(
                spacings.words().startsWith("levels 0 and 1 are split by 1.4909×10⁻⁵, 2 and 3 by "), spacings.words());
    }

    @Test
    void spacingsOfOneWellAreSaidAsTheyRun() {
        Oscillator morse = Oscillator.in(Potential.morse(UNIT, Quantity.of(10, Units.ONE), Amount.number(0.5)));
        // E_{n+1} − E_n = a√(2D) − a²(n + 1), Morse, Phys. Rev. 34 (1929) 57
        assertEquals(
                "spacings fall from 1.986 to 0.9861 with n",
                Spacings.of(morse, lowest(5)).words());
        assertEquals(
                "all spacings are 1",
                Spacings.of(Oscillator.harmonic().natural(), lowest(8)).words());
        assertTrue(Spacings.of(in("x^4"), lowest(8)).words().startsWith("spacings rise from "));
    }

    @Test
    void theLastLevelOfAWellThatEndsHasNoSpacing() {
        Oscillator morse = Oscillator.in(Potential.morse(UNIT, Quantity.of(10, Units.ONE), Amount.number(0.5)));
        assertEquals(9, morse.levels().count());
        assertEquals(8, Spacings.of(morse, lowest(9)).count());
        assertEquals(0, Spacings.of(morse, 8).count());
        assertEquals("", Spacings.of(morse, 8).words());
    }

    @Test
    void ofThousandsOfLevelsAFewHundredPointsAreDrawnAndNoPairIsClaimed() {
        Spacings spacings = Spacings.of(Oscillator.harmonic().natural(), lowest(5000));
        assertTrue(spacings.count() <= 400, "points: " + spacings.count());
        assertEquals("all spacings are 1", spacings.words());
    }

    @Test
    void thePictureShowsThemOnAxesOfTheirOwn() {
        LevelPicture picture = LevelPicture.of("mo", in("x^4"), lowest(6));
        JsonObject layout = picture.drawing().getAsJsonObject("layout");
        assertTrue(layout.has("xaxis2") && layout.has("yaxis3"), layout.keySet().toString());
        assertEquals("y3", layout.getAsJsonObject("xaxis2").get("anchor").getAsString());
        assertTrue(picture.description().contains("Spacings rise from"), picture.description());
        assertTrue(picture.still().contains("n from 0 to 5"), "the still shows them too");
        assertFalse(LevelPicture.of("mo", in("x^4"), 0)
                .drawing()
                .getAsJsonObject("layout")
                .has("xaxis2"));
    }

    @Test
    void levelsThatAreNotToldApartAreSaidToBeSo() {
        // Two wells far apart, one lower than the other by less than levels can be told apart
        Oscillator far = in("(x^4 - 50*x^2)/2 + 1e-13*tanh(x)");
        Spacings spacings = Spacings.of(far, lowest(4));
        assertTrue(spacings.words().contains("levels 0 to 1 are not told apart, they lie within "), spacings.words());
    }
}
