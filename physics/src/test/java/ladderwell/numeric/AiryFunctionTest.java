package ladderwell.numeric;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;

class AiryFunctionTest {
    /** z, Ai(z): mpmath 1.2.1, airyai at 30 digits, 20 printed. */
    private static final double[][] VALUES = {
        {-12.4, -0.30029984453501423773},
        {-11.9, 0.037673024339358154192},
        {-7.0, 0.18428083525050563728},
        {-3.3, -0.41718093737455014137},
        {-1.0, 0.5355608832923521188},
        {-0.1, 0.38084866812012151321},
        {0.0, 0.35502805388781723926},
        {0.3, 0.27880648195500492466},
        {1.0, 0.13529241631288141552},
        {2.7, 0.011198535451065877517},
        {5.0, 0.00010834442813607441735},
        {8.2, 2.6397418340282837561e-8},
        {11.9, 1.9725778430252003674e-13},
        {12.4, 3.4177138512040366394e-14},
    };

    @Test
    void valuesAgreeWithTheReferences() {
        for (double[] row : VALUES) {
            // Two roundings of the modulus: absolute where Ai oscillates, relative where it decays (5 ulp: z itself is
            // a rounded decimal,
            // and Ai'/Ai is up to 3.5).
            double allowed = row[0] < 0 ? 4e-16 : 1.1e-15 * row[1];
            assertEquals(row[1], AiryFunction.value(row[0], 0.0), allowed, "z " + row[0]);
        }
    }

    @Test
    void zerosAreWhereTheTablesPutThem() {
        // DLMF table 9.9.1 has the first ten to 10 digits; more digits from mpmath 1.2.1, airyaizero(1, 2, 3).
        double[] zeros = {-2.3381074104597670385, -4.0879494441309706166, -5.5205598280955510591};
        for (int k = 0; k < 3; k++) {
            assertEquals(0.0, AiryFunction.value(zeros[k], 0.0), 1e-15);
            assertTrue(AiryFunction.value(zeros[k] - 0.01, 0.0) * AiryFunction.value(zeros[k] + 0.01, 0.0) < 0);
        }
    }

    @Test
    void restIsAddedToTheArgument() {
        for (double z = -12.3; z < 12.3; z += 0.37) {
            assertEquals(AiryFunction.value(z + 0.0625, 0.0), AiryFunction.value(z, 0.0625), 2e-15, "z " + z);
        }
    }

    @Test
    void logarithmOfTheSeriesHasItsExactFirstCoefficients() {
        // By hand from u_1 = 5/72, u_2 = 385/10368, u_3 = 85085/2239488 (DLMF 9.7.2).
        assertEquals(5.0 / 72, AiryFunction.LOGARITHM[1], 1e-17);
        assertEquals(5.0 / 144, AiryFunction.LOGARITHM[2], 1e-17);
        assertEquals(1105.0 / 31104, AiryFunction.LOGARITHM[3], 2e-17);
    }
}
