package ladderwell.state;

import static ladderwell.state.CoherentTest.says;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.math.BigDecimal;
import java.util.Random;
import java.util.stream.LongStream;
import ladderwell.evidence.PhysicsException;
import ladderwell.level.Elements;
import ladderwell.level.Levels;
import org.apache.commons.math3.analysis.integration.gauss.GaussIntegrator;
import org.apache.commons.math3.analysis.integration.gauss.GaussIntegratorFactory;
import org.apache.commons.math3.special.Erf;
import org.junit.jupiter.api.Test;

class PacketTest {
    private static final BigDecimal TWO = BigDecimal.valueOf(2);

    /** Box coefficients of the packet with its tails folded back, in 60 digits. */
    private static BigDecimal[] folded(double position, double momentum, double width, long n, BigDecimal size) {
        BigDecimal sigma = new BigDecimal(width);
        BigDecimal k = FiftyDigits.PI.multiply(BigDecimal.valueOf(n + 1));
        BigDecimal p = new BigDecimal(momentum);
        BigDecimal minus = gauss(sigma.multiply(p.subtract(k)));
        BigDecimal plus = gauss(sigma.multiply(p.add(k)));
        BigDecimal angle = k.multiply(new BigDecimal("0.5").subtract(new BigDecimal(position)));
        BigDecimal[] turn = FiftyDigits.cosSin(angle);
        return new BigDecimal[] {
            size.multiply(minus.add(plus)).multiply(turn[1]),
            size.multiply(plus.subtract(minus)).multiply(turn[0])
        };
    }

    /** (8πσ²)^{1/4} / √2. */
    private static BigDecimal size(double width) {
        BigDecimal square = FiftyDigits.PI.multiply(BigDecimal.valueOf(8)).multiply(new BigDecimal(width).pow(2));
        return square.sqrt(FiftyDigits.DIGITS).divide(TWO).sqrt(FiftyDigits.DIGITS);
    }

    private static BigDecimal gauss(BigDecimal x) {
        BigDecimal y = x.multiply(x);
        return y.doubleValue() > 400 ? BigDecimal.ZERO : FiftyDigits.exp(y.negate());
    }

    @Test
    void boxAmplitudesAndTailsKeepTheirBoundsOnRandomCases() {
        Random random = new Random(31);
        for (int trial = 0; trial < 1000; trial++) {
            double width = Math.pow(10, -3.5 + 1.9 * random.nextDouble());
            double tolerance = Math.pow(10, -2 - 11 * random.nextDouble());
            double position = (0.5 - 16 * width) * (2 * random.nextDouble() - 1);
            double momentum = 2000 * random.nextGaussian();
            String at = "trial " + trial + ": " + position + ", " + momentum + ", " + width + ", " + tolerance;
            Amplitudes state = Amplitudes.packet(Levels.box(), position, momentum, width, tolerance);
            assertTrue(state.normError() <= tolerance, at);
            long first = state.first(0);
            long last = first + state.length(0) - 1;
            BigDecimal size = size(width);
            double distance = 0;
            long stride = Math.max(1, (last - first) / 4);
            for (long n = first; n <= last; n += stride) {
                BigDecimal[] exact = folded(position, momentum, width, n, size);
                distance += square(exact[0].subtract(new BigDecimal(state.re(0, (int) (n - first))))
                                .doubleValue())
                        + square(exact[1].subtract(new BigDecimal(state.im(0, (int) (n - first))))
                                .doubleValue());
            }
            double rounding = new PacketOverlaps(
                            Levels.box(), new GaussianPacket(position, momentum, width), first, state.length(0))
                    .rounding;
            assertTrue(Math.sqrt(distance) <= rounding, at + ": amplitudes off by " + Math.sqrt(distance));
            checkTails(state, momentum, width, first, last, at);
        }
    }

    private static double square(double x) {
        return x * x;
    }

    /** Sums the largest possible |c_n|², sin² = cos² → 1 for the nearer Gaussian, over the discarded levels. */
    private static void checkTails(Amplitudes state, double momentum, double width, long first, long last, String at) {
        double size = Math.sqrt(8 * Math.PI) * width / 2;
        double[] sums = new double[6];
        for (long n = last + 1; ; n++) {
            if (!adds(sums, size, momentum, width, n)) {
                break;
            }
        }
        for (long n = first - 1; n >= 0; n--) {
            if (!adds(sums, size, momentum, width, n)) {
                break;
            }
        }
        for (int j = 0; j < 5; j++) {
            assertTrue(
                    sums[j] <= state.tailMoment(j),
                    at + ": moment " + j + " is " + sums[j] + ", bound " + state.tailMoment(j));
        }
        assertTrue(sums[5] <= state.tailSum(), at);
    }

    private static boolean adds(double[] sums, double size, double momentum, double width, long n) {
        double k = (n + 1) * Math.PI;
        double weight =
                size * (Math.exp(-2 * square(width * (k - momentum))) + Math.exp(-2 * square(width * (k + momentum))));
        double power = weight;
        for (int j = 0; j < 5; j++) {
            sums[j] += power;
            power *= n + 1;
        }
        double root = Math.sqrt(weight);
        sums[5] += root;
        return root > 1e-10 * sums[5] * width;
    }

    /** ∫ g φ_n over a range by panels of 20 nodes, in plain double. */
    private static double[] overlap(
            Levels levels, long n, double position, double momentum, double width, double from, double to) {
        double k = Math.sqrt(2 * levels.energyHigh(n));
        int panels = 4 + (int) ((to - from) * ((Math.abs(momentum) + k) / 6 + 2 / width));
        double[] sum = new double[2];
        GaussIntegratorFactory rules = new GaussIntegratorFactory();
        for (int i = 0; i < panels; i++) {
            GaussIntegrator rule =
                    rules.legendre(20, from + (to - from) * i / panels, from + (to - from) * (i + 1) / panels);
            for (int j = 0; j < 20; j++) {
                double x = rule.getPoint(j);
                double t = x - position;
                double value = rule.getWeight(j)
                        * levels.waveFunctions(n, 1, new double[] {x})[0][0]
                        * Math.exp(-square(t / (2 * width)))
                        / Math.sqrt(Math.sqrt(2 * Math.PI) * width);
                sum[0] += value * Math.cos(momentum * t);
                sum[1] += value * Math.sin(momentum * t);
            }
        }
        return sum;
    }

    @Test
    void boxAmplitudesAreTheOverlapsOfThePacketBetweenTheWalls() {
        Levels box = Levels.box();
        for (double[] declared : new double[][] {{0, 30, 0.05, 1e-10}, {0.2, -55, 0.06, 1e-2}, {-0.1, 0, 0.1, 0.05}}) {
            Amplitudes state = Amplitudes.packet(box, declared[0], declared[1], declared[2], declared[3]);
            double distance = 0;
            for (int i = 0; i < state.length(0); i++) {
                double[] exact = overlap(box, state.first(0) + i, declared[0], declared[1], declared[2], -0.5, 0.5);
                distance += square(exact[0] - state.re(0, i)) + square(exact[1] - state.im(0, i));
            }
            // The quadrature of the test itself errs by 1e-14 each.
            assertTrue(Math.sqrt(distance) <= state.normError() + 1e-13, "off by " + Math.sqrt(distance));
        }
    }

    @Test
    void closedFormAndQuadratureAgreeInsideAWell() {
        Levels well = Levels.finiteWell(5e4);
        GaussianPacket packet = new GaussianPacket(0.05, 120, 0.03);
        PacketOverlaps closed = new PacketOverlaps(well, packet, 0, (int) well.count());
        LeakingOverlaps integrated = new LeakingOverlaps(well, packet, 0, (int) well.count());
        double distance = 0;
        for (int i = 0; i < well.count(); i++) {
            distance += square(closed.re[i] - integrated.re[i]) + square(closed.im[i] - integrated.im[i]);
        }
        // Beyond the walls, 15 σ away, lies 1e-25.
        assertTrue(Math.sqrt(distance) <= closed.rounding + integrated.error, "apart by " + Math.sqrt(distance));
        assertTrue(integrated.error < 1e-12);
    }

    @Test
    void quadratureKeepsItsBoundWhereThePacketLeaks() {
        for (double[] declared : new double[][] {{30, 0, 3, 0.4}, {2000, 0.45, 40, 0.02}, {9, -0.3, -2, 1.5}}) {
            Levels well = Levels.finiteWell(declared[0]);
            GaussianPacket packet = new GaussianPacket(declared[1], declared[2], declared[3]);
            LeakingOverlaps integrated = new LeakingOverlaps(well, packet, 0, (int) well.count());
            for (int n = 0; n < well.count(); n++) {
                double[] exact = new double[2];
                double[] edges = {declared[1] - 18 * declared[3], -0.5, 0.5, declared[1] + 18 * declared[3]};
                for (int i = 0; i < 3; i++) {
                    if (edges[i + 1] > edges[i]) {
                        double[] part = overlap(well, n, declared[1], declared[2], declared[3], edges[i], edges[i + 1]);
                        exact[0] += part[0];
                        exact[1] += part[1];
                    }
                }
                assertEquals(exact[0], integrated.re[n], integrated.error + 2e-14, "level " + n);
                assertEquals(exact[1], integrated.im[n], integrated.error + 2e-14, "level " + n);
            }
        }
    }

    @Test
    void theProvedBoundOfWhatLiesAboveTheRimHoldsOnRandomWells() {
        Random random = new Random(64);
        int telling = 0;
        for (int trial = 0; trial < 1000; trial++) {
            Levels well = Levels.finiteWell(Math.pow(10, 1.5 + 2.5 * random.nextDouble()));
            double rim = Math.sqrt(2 * well.threshold());
            double width = 0.03 + 0.2 * random.nextDouble();
            GaussianPacket packet = new GaussianPacket(
                    0.8 * (random.nextDouble() - 0.5), rim * (1.6 * random.nextDouble() - 0.8), width);
            LeakingOverlaps overlaps = new LeakingOverlaps(well, packet, 0, (int) well.count());
            double carried = 0;
            for (int n = 0; n < well.count(); n++) {
                carried += square(overlaps.re[n]) + square(overlaps.im[n]);
            }
            double bound = new PacketState(well, packet, 0.1).aboveRim();
            assertTrue(
                    1 - carried <= square(bound) + 3 * overlaps.error,
                    "trial " + trial + ": " + (1 - carried) + " > " + square(bound));
            telling += bound < 0.5 && 1 - carried > 10 * overlaps.error ? 1 : 0;
        }
        // Cases in which the bound says something and the measured rest is more than rounding.
        assertTrue(telling > 100, telling + " telling cases");
    }

    @Test
    void packetsHaveTheirMeansAndSpreads() {
        for (Levels levels : new Levels[] {Levels.box(), Levels.finiteWell(2e5)}) {
            Amplitudes state = Amplitudes.packet(levels, 0.1, -140, 0.04, 1e-10);
            int count = state.length(0);
            Elements elements = levels.elements(
                    LongStream.range(state.first(0), state.first(0) + count).toArray());
            double norm = 0;
            double position = 0;
            double square = 0;
            double momentum = 0;
            double kinetic = 0;
            for (int i = 0; i < count; i++) {
                norm += square(state.re(0, i)) + square(state.im(0, i));
                for (int j = 0; j < count; j++) {
                    double re = state.re(0, i) * state.re(0, j) + state.im(0, i) * state.im(0, j);
                    double im = state.re(0, i) * state.im(0, j) - state.im(0, i) * state.re(0, j);
                    position += re * elements.position(i, j);
                    square += re * elements.positionSquared(i, j);
                    // Re of (re + i im) · i A
                    momentum -= im * elements.momentum(i, j);
                    kinetic += re * elements.momentumSquared(i, j);
                }
            }
            // Tolerance 1e-10 in norm: moments follow to 2e-10 times their scale.
            assertEquals(1, norm, 1e-10);
            assertEquals(0.1, position, 1e-9);
            assertEquals(0.01 + 0.0016, square, 1e-9);
            assertEquals(-140, momentum, 1e-7);
            assertEquals(140 * 140 + 1 / (4 * 0.0016), kinetic, 1e-4);
        }
    }

    @Test
    void aConfinedPacketInADeepWellKeepsItsToleranceWithAMeasuredRest() {
        Amplitudes state = Amplitudes.packet(Levels.finiteWell(1e6), 0.1, 300, 0.03, 1e-13);
        assertTrue(state.normError() <= 1e-13);
        assertTrue(state.missingWeight() <= 1e-26);
        double norm = 0;
        for (int i = 0; i < state.length(0); i++) {
            norm += square(state.re(0, i)) + square(state.im(0, i));
        }
        assertEquals(1, norm, 2e-14);
        Amplitudes small = Amplitudes.packet(Levels.finiteWell(1e20), 0, 1e8, 0.03, 1e-9);
        assertTrue(small.levels() < 200, "window of " + small.levels());
        assertEquals(1e8 / Math.PI, small.first(0) + small.levels() / 2.0, 20);
    }

    @Test
    void aLeakingPacketThatTheBoundLevelsCarryIsKeptWithItsMissingWeight() {
        // One bound level of decay length 1/κ = 9.9: a packet of like shape overlaps it well.
        Levels well = Levels.finiteWell(0.1);
        double width = 7;
        double[] overlap = new double[2];
        double[] edges = {-18 * width, -0.5, 0.5, 18 * width};
        for (int i = 0; i < 3; i++) {
            double[] part = overlap(well, 0, 0, 0, width, edges[i], edges[i + 1]);
            overlap[0] += part[0];
        }
        double missing = 1 - square(overlap[0]);
        PhysicsException.NotCarried refusal =
                assertThrows(PhysicsException.NotCarried.class, () -> Amplitudes.packet(well, 0, 0, width, 0.1));
        assertEquals(missing, refusal.missingWeight(), 1e-11);
        assertEquals(1, refusal.levels());
        // Near a wall of a deep well the tail beyond is carried by the levels themselves.
        Amplitudes near = Amplitudes.packet(Levels.finiteWell(4000), 0.3, 0, 0.08, 0.1);
        assertTrue(near.normError() <= 0.1);
        assertTrue(near.missingWeight() > 1e-8);
        assertEquals(Levels.finiteWell(4000).count(), near.levels());
    }

    @Test
    void aPacketAboveTheRimIsRefusedWithItsMissingWeight() {
        // Momentum at the rim k₀ = 63.2: about half of the packet lies above.
        PhysicsException.NotCarried refusal = assertThrows(
                PhysicsException.NotCarried.class,
                () -> Amplitudes.packet(Levels.finiteWell(2000), 0, Math.sqrt(4000), 0.02, 1e-6));
        assertEquals(0.5, refusal.missingWeight(), 0.05);
        assertTrue(refusal.getMessage().contains("a packet of spread 0.02 at 0.0"), refusal.getMessage());
    }

    @Test
    void aPacketThatSticksOutOfTheBoxIsRefusedWithItsWeight() {
        double beyond = Erf.erfc(0.1 / (Math.sqrt(2) * 0.05)) / 2;
        assertTrue(new GaussianPacket(0.4, 0, 0.05).weightBeyond() >= beyond);
        says("beyond the walls of the box", () -> Amplitudes.packet(Levels.box(), 0.4, 0, 0.05, 1e-6));
        says("beyond the walls of the box", () -> Amplitudes.packet(Levels.box(), 0, 0, 40, 1e-6));
    }

    @Test
    void badPacketsAreNamed() {
        says("is expanded as a shape", () -> Amplitudes.packet(Levels.harmonic(), 0, 0, 0.1, 1e-6));
        says("must lie between the walls", () -> Amplitudes.packet(Levels.box(), 0.5, 0, 0.1, 1e-6));
        says("got NaN", () -> Amplitudes.packet(Levels.box(), Double.NaN, 0, 0.1, 1e-6));
        says("the momentum of a packet", () -> Amplitudes.packet(Levels.box(), 0, Double.POSITIVE_INFINITY, 0.1, 1e-6));
        says("the spread of a packet", () -> Amplitudes.packet(Levels.box(), 0, 0, -0.1, 1e-6));
        says("the spread of a packet", () -> Amplitudes.packet(Levels.box(), 0, 0, 0, 1e-6));
        says("the tolerance is a norm error", () -> Amplitudes.packet(Levels.box(), 0, 0, 0.1, 1));
        says("too many to integrate", () -> Amplitudes.packet(Levels.finiteWell(1e12), 0.49, 1e6, 0.3, 1e-3));
    }
}
