package ladderwell.level;

import static ladderwell.level.WellLevelsTest.says;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.math.BigDecimal;
import java.math.MathContext;
import java.util.Random;
import java.util.function.DoubleUnaryOperator;
import java.util.stream.LongStream;
import ladderwell.state.FiftyDigits;
import org.apache.commons.math3.analysis.integration.gauss.GaussIntegrator;
import org.apache.commons.math3.analysis.integration.gauss.GaussIntegratorFactory;
import org.junit.jupiter.api.Test;

class ElementsTest {
    private static final MathContext DIGITS = FiftyDigits.DIGITS;
    private static final BigDecimal TWO = BigDecimal.valueOf(2);

    private static long[] firstLevels(int count) {
        return LongStream.range(0, count).toArray();
    }

    @Test
    void wellElementsAreTheIntegralsOverTheWaveFunctions() {
        for (double depth :
                new double[] {0.03, 2, 40, 500, 5.001 * Math.PI * Math.PI / 2, 4.0001 * Math.PI * Math.PI / 2}) {
            Levels well = Levels.finiteWell(depth);
            int count = (int) well.count();
            Elements elements = well.elements(firstLevels(count));
            for (int m = 0; m < count; m++) {
                for (int n = 0; n < count; n++) {
                    checkByQuadrature(well, elements, m, n, "depth " + depth + ", " + m + ", " + n);
                }
            }
        }
    }

    private static void checkByQuadrature(Levels well, Elements elements, int m, int n, String at) {
        DoubleUnaryOperator left = x -> wave(well, m, x);
        DoubleUnaryOperator right = x -> wave(well, n, x);
        DoubleUnaryOperator leftSlope = x -> slope(well, m, x);
        DoubleUnaryOperator rightSlope = x -> slope(well, n, x);
        double decay = well.decay(m) + well.decay(n);
        // Panels of 30 nodes resolve a tenth of the width and 4 decay lengths to rounding; rounding 1e-13 of the
        // integral of sizes.
        double scale = 1 + 8 / (decay * decay) + well.energyHigh(Math.max(m, n));
        double tolerance = 1e-13 * scale;
        assertEquals(m == n ? 1 : 0, integral(decay, x -> left.applyAsDouble(x) * right.applyAsDouble(x)), 1e-13, at);
        assertEquals(
                integral(decay, x -> left.applyAsDouble(x) * x * right.applyAsDouble(x)),
                elements.position(m, n),
                tolerance,
                at);
        assertEquals(
                integral(decay, x -> left.applyAsDouble(x) * x * x * right.applyAsDouble(x)),
                elements.positionSquared(m, n),
                tolerance,
                at);
        assertEquals(
                -integral(decay, x -> left.applyAsDouble(x) * rightSlope.applyAsDouble(x)),
                elements.momentum(m, n),
                tolerance,
                at);
        assertEquals(
                integral(decay, x -> leftSlope.applyAsDouble(x) * rightSlope.applyAsDouble(x)),
                elements.momentumSquared(m, n),
                tolerance,
                at);
    }

    private static double wave(Levels levels, long n, double x) {
        return levels.waveFunctions(n, 1, new double[] {x})[0][0];
    }

    private static double slope(Levels well, long n, double x) {
        if (Math.abs(x) > 0.5) {
            return -Math.signum(x) * well.decay(n) * wave(well, n, x);
        }
        double k = Math.sqrt(2 * well.energyHigh(n));
        double amplitude = Math.sqrt(2 / (1 + 2 / well.decay(n)));
        return -amplitude * k * Math.cos((n + 1) * Math.PI / 2 - k * x);
    }

    private static double integral(double decay, DoubleUnaryOperator f) {
        GaussIntegratorFactory rules = new GaussIntegratorFactory();
        double sum = 0;
        for (int i = 0; i < 20; i++) {
            GaussIntegrator rule = rules.legendre(30, -0.5 + i / 20.0, -0.5 + (i + 1) / 20.0);
            sum += rule.integrate(f::applyAsDouble);
        }
        double step = 4 / decay;
        for (int i = 0; i < 12; i++) {
            GaussIntegrator rule = rules.legendre(30, 0.5 + i * step, 0.5 + (i + 1) * step);
            sum += rule.integrate(x -> f.applyAsDouble(x) + f.applyAsDouble(-x));
        }
        return sum;
    }

    @Test
    void wellElementsKeepTheirBoundsOnRandomWells() {
        Random random = new Random(99);
        for (int trial = 0; trial < 1000; trial++) {
            double depth = Math.pow(10, -6 + 12 * random.nextDouble());
            Levels well = Levels.finiteWell(depth);
            long m = (long) (random.nextDouble() * well.count());
            long n = (long) (random.nextDouble() * well.count());
            boolean same = m == n;
            Elements elements = well.elements(same ? new long[] {m} : new long[] {m, n});
            int j = same ? 0 : 1;
            String at = "depth " + depth + ", levels " + m + ", " + n;
            BigDecimal gap = energy(well, m).subtract(energy(well, n));
            BigDecimal w = weight(depth, well, m).multiply(weight(depth, well, n));
            BigDecimal decays = decay(depth, well, m).add(decay(depth, well, n));
            if ((m + n) % 2 != 0) {
                BigDecimal p = TWO.multiply(w).divide(gap, DIGITS);
                within(p.divide(gap, DIGITS), elements.position(0, j), elements.positionError(), at);
                within(p, elements.momentum(0, j), elements.momentumError(), at);
                assertEquals(0, elements.positionSquared(0, j));
                assertEquals(0, elements.momentumSquared(0, j));
            } else if (!same) {
                BigDecimal tails = BigDecimal.valueOf(4).divide(decays, DIGITS);
                BigDecimal xx = TWO.multiply(w)
                        .multiply(BigDecimal.ONE.add(tails))
                        .divide(gap, DIGITS)
                        .divide(gap, DIGITS);
                within(xx, elements.positionSquared(0, j), elements.positionSquaredError(), at);
                within(w.multiply(tails).negate(), elements.momentumSquared(0, j), elements.momentumSquaredError(), at);
                assertEquals(0, elements.position(0, j));
                assertEquals(0, elements.momentum(0, j));
            } else {
                within(
                        squaredWidth(depth, well, n),
                        elements.positionSquared(0, 0),
                        elements.positionSquaredError(),
                        at);
            }
        }
    }

    private static void within(BigDecimal exact, double value, double error, String at) {
        double off = exact.subtract(new BigDecimal(value)).abs().doubleValue();
        assertTrue(off <= error, at + ": off by " + off + ", bound " + error);
    }

    private static BigDecimal energy(Levels well, long n) {
        return new BigDecimal(well.energyHigh(n)).add(new BigDecimal(well.energyLow(n)));
    }

    private static BigDecimal decay(double depth, Levels well, long n) {
        return new BigDecimal(depth).subtract(energy(well, n)).multiply(TWO).sqrt(DIGITS);
    }

    /** A √E, A² = 2κ/(κ+2). */
    private static BigDecimal weight(double depth, Levels well, long n) {
        BigDecimal decay = decay(depth, well, n);
        BigDecimal square = TWO.multiply(decay).divide(decay.add(TWO), DIGITS);
        return square.multiply(energy(well, n)).sqrt(DIGITS);
    }

    /** ∫ x² φ² from the antiderivatives, with parity, in 60 digits. */
    private static BigDecimal squaredWidth(double depth, Levels well, long n) {
        BigDecimal k = energy(well, n).multiply(TWO).sqrt(DIGITS);
        BigDecimal kappa = decay(depth, well, n);
        BigDecimal square = TWO.multiply(kappa).divide(kappa.add(TWO), DIGITS);
        BigDecimal[] full = FiftyDigits.cosSin(k);
        BigDecimal parity = BigDecimal.valueOf(n % 2 == 0 ? 1 : -1);
        // ∫ x² cos 2kx over the width
        BigDecimal wave = full[1].divide(k.multiply(BigDecimal.valueOf(4)), DIGITS)
                .add(full[0].divide(k.pow(2).multiply(TWO), DIGITS))
                .subtract(full[1].divide(k.pow(3).multiply(TWO), DIGITS));
        BigDecimal inside = BigDecimal.ONE
                .divide(BigDecimal.valueOf(24), DIGITS)
                .add(parity.multiply(wave).divide(TWO))
                .multiply(square);
        BigDecimal half = FiftyDigits.cosSin(k.divide(TWO))[n % 2 == 0 ? 0 : 1];
        BigDecimal tail = BigDecimal.ONE
                .divide(kappa.multiply(BigDecimal.valueOf(4)), DIGITS)
                .add(BigDecimal.ONE.divide(kappa.pow(2).multiply(TWO), DIGITS))
                .add(BigDecimal.ONE.divide(kappa.pow(3).multiply(TWO), DIGITS));
        return inside.add(square.multiply(half.pow(2)).multiply(tail));
    }

    @Test
    void dipoleStrengthsOfTheBoxSumToOneHalf() {
        // Thomas, Reiche, Kuhn: Σ |x_mn|² (E_m − E_n) = ħ²/2m. The terms fall as m^−4: the rest after 2000 levels is
        // below 1e-8/3.
        Levels box = Levels.box();
        Elements elements = box.elements(firstLevels(2000));
        for (int n = 0; n < 20; n++) {
            double strengths = 0;
            double square = 0;
            double kinetic = 0;
            for (int m = 0; m < 2000; m++) {
                double x = elements.position(m, n);
                strengths += x * x * (box.energyHigh(m) - box.energyHigh(n));
                square += x * x;
                kinetic += elements.momentum(m, n) * elements.momentum(m, n);
            }
            assertEquals(0.5, strengths, 1e-8 * (n + 1) * (n + 1), "level " + n);
            // Completeness: the same sums without the energies give ⟨x²⟩; the rest falls as m^−5.
            assertEquals(elements.positionSquared(n, n), square, 1e-14 * (n + 1) * (n + 1), "level " + n);
            // Σ |p_mn|² converges to ⟨p²⟩ only as 1/m: the rest is about 4 (n+1)² 2 / 2000.
            assertEquals(elements.momentumSquared(n, n), kinetic, 5e-3 * (n + 1) * (n + 1), "level " + n);
        }
    }

    @Test
    void velocityIsTheRateOfChangeOfPosition() {
        // Ehrenfest: ⟨m|p|n⟩ = i (E_m − E_n) ⟨m|x|n⟩, in the box as well: its wave functions vanish at the walls.
        for (Levels levels : new Levels[] {Levels.box(), Levels.finiteWell(900), Levels.harmonic()}) {
            Elements elements = levels.elements(firstLevels(12));
            for (int m = 0; m < 12; m++) {
                for (int n = 0; n < 12; n++) {
                    double gap = levels.energyHigh(m) - levels.energyHigh(n);
                    // A few ulp of energies up to 900.
                    assertEquals(
                            gap * elements.position(m, n), elements.momentum(m, n), 1e-13, levels + " " + m + ", " + n);
                    assertEquals(0, elements.momentum(m, n) + elements.momentum(n, m));
                    assertEquals(0, elements.positionSquared(m, n) - elements.positionSquared(n, m));
                }
            }
        }
    }

    @Test
    void boxElementsAreTheIntegralsOverTheWaveFunctions() {
        Levels box = Levels.box();
        Elements elements = box.elements(firstLevels(8));
        for (int m = 0; m < 8; m++) {
            for (int n = 0; n < 8; n++) {
                int left = m;
                int right = n;
                // Nothing lies outside: any decay does.
                DoubleUnaryOperator product = x -> wave(box, left, x) * wave(box, right, x);
                assertEquals(m == n ? 1 : 0, integral(1, product), 1e-14);
                assertEquals(integral(1, x -> x * product.applyAsDouble(x)), elements.position(m, n), 1e-14);
                assertEquals(integral(1, x -> x * x * product.applyAsDouble(x)), elements.positionSquared(m, n), 1e-14);
            }
            assertEquals(2 * box.energyHigh(m), elements.momentumSquared(m, m));
        }
    }

    @Test
    void aDeepWellHasTheElementsOfTheBox() {
        Elements well = Levels.finiteWell(1e20).elements(firstLevels(10));
        Elements box = Levels.box().elements(firstLevels(10));
        // The wave leaks a length 1/k₀ = 7e-11 into the walls.
        for (int m = 0; m < 10; m++) {
            for (int n = 0; n < 10; n++) {
                assertEquals(box.position(m, n), well.position(m, n), 1e-9);
                assertEquals(box.positionSquared(m, n), well.positionSquared(m, n), 1e-9);
                assertEquals(box.momentum(m, n), well.momentum(m, n), 1e-7);
                assertEquals(box.momentumSquared(m, n), well.momentumSquared(m, n), 1e-6);
            }
        }
    }

    @Test
    void harmonicElementsAreThoseOfTheLadder() {
        long[] levels = {7, 3, 4, 5, 1_000_000_000_000L, 1_000_000_000_002L};
        Elements elements = Levels.harmonic().elements(levels);
        assertEquals(6, elements.size());
        assertEquals(1_000_000_000_000L, elements.level(4));
        assertEquals(Math.sqrt(2), elements.position(1, 2), 4e-16);
        assertEquals(-Math.sqrt(2), elements.momentum(1, 2), 4e-16);
        assertEquals(Math.sqrt(2), elements.momentum(2, 1), 4e-16);
        assertEquals(3.5, elements.positionSquared(1, 1));
        assertEquals(3.5, elements.momentumSquared(1, 1));
        assertEquals(Math.sqrt(20) / 2, elements.positionSquared(1, 3), 6e-16);
        assertEquals(-Math.sqrt(20) / 2, elements.momentumSquared(3, 1), 6e-16);
        assertEquals(0, elements.position(0, 1));
        assertEquals(5e11 + 0.75, elements.positionSquared(4, 5), elements.positionSquaredError());
        assertTrue(elements.positionBound().isGuaranteed());
    }

    @Test
    void badListsAreNamed() {
        says("level 2 appears twice", () -> Levels.harmonic().elements(new long[] {2, 5, 2}));
        says("levels count from 0", () -> Levels.box().elements(new long[] {-1}));
        says("too many, at most 4000", () -> Levels.box().elements(new long[4001]));
    }
}
