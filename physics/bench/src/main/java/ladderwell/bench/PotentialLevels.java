package ladderwell.bench;

import java.util.function.DoubleUnaryOperator;
import ladderwell.level.Levels;
import ladderwell.level.PotentialCurve;

/** Levels of p²/2 + x⁴ and of a finite well, each time from nothing. */
final class PotentialLevels {
    private static final double BOX = Math.PI * Math.PI / 2;

    /** p²/2 + x⁴, levels 0, 49 and 999: own recomputation with 64-bit mantissas. */
    private static final double[] QUARTIC = {0.667986259155777108, 250.18335869707518736, 13755.898570503518};

    /** Textbook condition for depth 8 in units of the box: Schiff; Barker et al., Am. J. Phys. 59 (1991) 1038. */
    private static final double[] WELL = {0.6628034136891765, 2.603461128122489, 5.608649434860538};

    private double[] levels = {};
    private double single;

    private record Even(DoubleUnaryOperator v, double[] breaks) implements PotentialCurve {
        @Override
        public double value(double x) {
            return v.applyAsDouble(x);
        }

        @Override
        public double left() {
            return Double.NEGATIVE_INFINITY;
        }

        @Override
        public double right() {
            return Double.POSITIVE_INFINITY;
        }

        @Override
        public boolean isEven() {
            return true;
        }
    }

    private static Levels quartic() {
        return Levels.of(new Even(x -> x * x * x * x, new double[0]));
    }

    void fifty() {
        levels = Levels.polynomial(0, 0, 0, 0, 1).energies(0, 50);
    }

    /** Energies with proved bounds and the vectors; no wave is evaluated. */
    void fiftyWithVectors() {
        Levels all = Levels.polynomial(0, 0, 0, 0, 1);
        levels = all.energies(0, 50);
        all.waveFunctions(0, 50, new double[0]);
    }

    void thousand() {
        levels = quartic().energies(0, 1000);
    }

    void well() {
        Levels well = Levels.of(new Even(x -> Math.abs(x) < 0.5 ? 0 : 8 * BOX, new double[] {-0.5, 0.5}));
        levels = well.energies(0, (int) well.count());
    }

    void alone(long n) {
        single = quartic().energyHigh(n);
    }

    double quarticError() {
        double error = Math.abs(levels[0] / QUARTIC[0] - 1);
        error = Math.max(error, Math.abs(levels[49] / QUARTIC[1] - 1));
        return levels.length < 1000 ? error : Math.max(error, Math.abs(levels[999] / QUARTIC[2] - 1));
    }

    double wellError() {
        double error = levels.length == 3 ? 0 : 1;
        for (int n = 0; n < Math.min(3, levels.length); n++) {
            error = Math.max(error, Math.abs(levels[n] / (WELL[n] * BOX) - 1));
        }
        return error;
    }

    /** Against the semiclassical series E = c (n + 1/2)^(4/3) (1 + 1/(9π (n + 1/2)²)), right to n^−4. */
    double aloneError(long n) {
        double half = n + 0.5;
        // The factor is fixed by level 1000 of the same series.
        double scale = 13774.252002055304 / (Math.pow(1000.5, 4.0 / 3) * (1 + 1 / (9 * Math.PI * 1000.5 * 1000.5)));
        return Math.abs(single / (scale * Math.pow(half, 4.0 / 3) * (1 + 1 / (9 * Math.PI * half * half))) - 1);
    }
}
