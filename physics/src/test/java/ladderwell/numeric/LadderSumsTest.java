package ladderwell.numeric;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.math.BigDecimal;
import java.math.MathContext;
import java.util.Arrays;
import java.util.List;
import java.util.Random;
import java.util.concurrent.CancellationException;
import java.util.concurrent.ExecutorService;
import java.util.concurrent.Executors;
import org.junit.jupiter.api.Test;

class LadderSumsTest {
    private static final MathContext DIGITS = new MathContext(60);

    /** Direct formulas on exact coefficients, 60 digits: ⟨a⟩, ⟨δ†δ⟩, ⟨δ²⟩, ⟨n⟩, Var n. */
    private record Direct(
            BigDecimal amplitudeRe,
            BigDecimal amplitudeIm,
            BigDecimal fluctuation,
            BigDecimal squeezingRe,
            BigDecimal squeezingIm,
            BigDecimal mean,
            BigDecimal variance) {
        static Direct of(BigDecimal[] re, BigDecimal[] im, int first) {
            int levels = re.length;
            BigDecimal norm = BigDecimal.ZERO;
            BigDecimal n1 = BigDecimal.ZERO;
            BigDecimal n2 = BigDecimal.ZERO;
            BigDecimal aRe = BigDecimal.ZERO;
            BigDecimal aIm = BigDecimal.ZERO;
            BigDecimal sRe = BigDecimal.ZERO;
            BigDecimal sIm = BigDecimal.ZERO;
            for (int k = 0; k < levels; k++) {
                BigDecimal n = BigDecimal.valueOf((long) first + k);
                BigDecimal weight = re[k].multiply(re[k]).add(im[k].multiply(im[k]));
                norm = norm.add(weight);
                n1 = n1.add(weight.multiply(n));
                n2 = n2.add(weight.multiply(n).multiply(n));
                if (k + 1 < levels) {
                    BigDecimal root = Decimals.sqrt(n.add(BigDecimal.ONE));
                    aRe = aRe.add(root.multiply(re[k].multiply(re[k + 1]).add(im[k].multiply(im[k + 1]))));
                    aIm = aIm.add(root.multiply(re[k].multiply(im[k + 1]).subtract(im[k].multiply(re[k + 1]))));
                }
                if (k + 2 < levels) {
                    BigDecimal root = Decimals.sqrt(n.add(BigDecimal.ONE).multiply(n.add(BigDecimal.valueOf(2))));
                    sRe = sRe.add(root.multiply(re[k].multiply(re[k + 2]).add(im[k].multiply(im[k + 2]))));
                    sIm = sIm.add(root.multiply(re[k].multiply(im[k + 2]).subtract(im[k].multiply(re[k + 2]))));
                }
            }
            aRe = aRe.divide(norm, DIGITS);
            aIm = aIm.divide(norm, DIGITS);
            sRe = sRe.divide(norm, DIGITS);
            sIm = sIm.divide(norm, DIGITS);
            BigDecimal mean = n1.divide(norm, DIGITS);
            return new Direct(
                    aRe,
                    aIm,
                    mean.subtract(aRe.multiply(aRe)).subtract(aIm.multiply(aIm)),
                    sRe.subtract(aRe.multiply(aRe)).add(aIm.multiply(aIm)),
                    sIm.subtract(aRe.multiply(aIm).multiply(BigDecimal.valueOf(2))),
                    mean,
                    n2.divide(norm, DIGITS).subtract(mean.multiply(mean)));
        }

        void check(String name, LadderSums sums, int j) {
            BigDecimal re = amplitudeRe.subtract(new BigDecimal(sums.amplitudeRe(j)));
            BigDecimal im = amplitudeIm.subtract(new BigDecimal(sums.amplitudeIm(j)));
            within(name + " amplitude", Math.hypot(re.doubleValue(), im.doubleValue()), sums.amplitudeError(j));
            double bound = sums.fluctuationError(j);
            within(name + " fluctuation", Decimals.distance(fluctuation, new BigDecimal(sums.fluctuation(j))), bound);
            re = squeezingRe.subtract(new BigDecimal(sums.squeezingRe(j)));
            im = squeezingIm.subtract(new BigDecimal(sums.squeezingIm(j)));
            within(name + " squeezing", Math.hypot(re.doubleValue(), im.doubleValue()), bound);
            within(
                    name + " mean",
                    Decimals.distance(mean, new BigDecimal(sums.meanQuanta(j))),
                    sums.meanQuantaError(j));
            within(
                    name + " variance",
                    Decimals.distance(variance, new BigDecimal(sums.varianceQuanta(j))),
                    sums.varianceQuantaError(j));
        }

        private static void within(String name, double error, double bound) {
            assertTrue(error <= bound, name + ": error " + error + " above " + bound);
        }
    }

    private static BigDecimal[] exact(double[] values) {
        return Arrays.stream(values).mapToObj(BigDecimal::new).toArray(BigDecimal[]::new);
    }

    /** Coefficients of a coherent state of the given mean, from the ratio of neighbours, normalised. */
    private static double[] coherent(double mean, int first, int levels) {
        double[] c = new double[levels];
        int top = (int) Math.max(first, Math.floor(mean)) - first;
        c[top] = 1;
        for (int k = top + 1; k < levels; k++) {
            c[k] = c[k - 1] * Math.sqrt(mean / ((double) first + k));
        }
        for (int k = top - 1; k >= 0; k--) {
            c[k] = c[k + 1] * Math.sqrt(((double) first + k + 1) / mean);
        }
        double norm = Math.sqrt(Arrays.stream(c).map(v -> v * v).sum());
        return Arrays.stream(c).map(v -> v / norm).toArray();
    }

    @Test
    void agreesWithDirectFormulasForRowsAnywhereOnTheLadder() {
        Random random = new Random(31);
        for (int first : new int[] {0, 1, 7, 1000, 100_000_000}) {
            for (int levels : new int[] {1, 2, 3, 4, 5, 17, 255, 256, 257, 600}) {
                double[][] re = MatrixProductTest.random(random, 2, levels);
                double[][] im = MatrixProductTest.random(random, 2, levels);
                LadderSums sums = LadderSums.of(re, im, first, Workers.CALLER);
                assertEquals(2, sums.rows());
                for (int j = 0; j < 2; j++) {
                    Direct.of(exact(re[j]), exact(im[j]), first).check(first + "+" + levels, sums, j);
                }
            }
        }
    }

    @Test
    void phasesKeepTheirBoundsAgainstExactEvolution() {
        Random random = new Random(32);
        for (int first : new int[] {0, 100_000_000}) {
            int levels = 40;
            double[] zero = new double[levels];
            double[] c = coherent(first + 20.0, first, levels);
            double[] energy = new double[levels];
            Arrays.setAll(energy, k -> (first + k + 0.5) * (1 + 1e-3 * k));
            double[] times = new double[40];
            Arrays.setAll(times, j -> 0.3 * j);
            LadderSums sums = LadderSums.of(ExactPhases.of(energy, zero, c, zero, times), first, Workers.CALLER);
            for (int check = 0; check < 5; check++) {
                int j = random.nextInt(40);
                BigDecimal[] re = new BigDecimal[levels];
                BigDecimal[] im = new BigDecimal[levels];
                for (int k = 0; k < levels; k++) {
                    BigDecimal phase = new BigDecimal(energy[k]).multiply(new BigDecimal(times[j]));
                    re[k] = new BigDecimal(c[k]).multiply(Decimals.cos(phase)).round(DIGITS);
                    im[k] = new BigDecimal(c[k])
                            .multiply(Decimals.sin(phase))
                            .negate()
                            .round(DIGITS);
                }
                Direct.of(re, im, first).check("first " + first + " time " + times[j], sums, j);
            }
        }
    }

    @Test
    void sumsThatKeepTheCoefficientsGiveBothAlike() {
        Random random = new Random(35);
        for (int levels : new int[] {1, 2, 40, 254, 255, 256, 600}) {
            for (double step : new double[] {0.1, Math.sqrt(0.1)}) {
                double[] energy = random.doubles(levels).map(e -> 30 * e).toArray();
                double[] cRe = random.doubles(levels).toArray();
                double[] cIm = random.doubles(levels).toArray();
                double[] times = new double[90];
                Arrays.setAll(times, j -> step == 0.1 ? step * j : step * Math.sqrt(j));
                ExactPhases phases = ExactPhases.of(energy, new double[levels], cRe, cIm, times);
                double[][] expectedRe = new double[90][levels];
                double[][] expectedIm = new double[90][levels];
                phases.fill(0, 90, expectedRe, expectedIm);
                double[][] re = new double[90][levels];
                double[][] im = new double[90][levels];
                LadderSums kept = LadderSums.of(phases, 3, re, im, Workers.CALLER);
                LadderSums alone = LadderSums.of(phases, 3, Workers.CALLER);
                for (int j = 0; j < 90; j++) {
                    // Coefficients are below √2; either way is right to the bound of the phases.
                    assertArrayEquals(expectedRe[j], re[j], 3 * phases.errorBound());
                    assertArrayEquals(expectedIm[j], im[j], 3 * phases.errorBound());
                    double bound = kept.amplitudeError(j) + alone.amplitudeError(j);
                    assertEquals(alone.amplitudeRe(j), kept.amplitudeRe(j), bound);
                    assertEquals(alone.amplitudeIm(j), kept.amplitudeIm(j), bound);
                    bound = kept.fluctuationError(j) + alone.fluctuationError(j);
                    assertEquals(alone.fluctuation(j), kept.fluctuation(j), bound);
                    assertEquals(alone.squeezingRe(j), kept.squeezingRe(j), bound);
                    assertEquals(alone.squeezingIm(j), kept.squeezingIm(j), bound);
                }
            }
        }
    }

    @Test
    void anharmonicPhasesFarUpTheLadderKeepTheirBounds() {
        // n(n-1)/2 near 1e8: phases reach 1e16, in the turning frame 1e3.
        Random random = new Random(36);
        int first = 100_000_000;
        int levels = 40;
        double[] zero = new double[levels];
        double[] c = coherent(first + 20.0, first, levels);
        double[] energy = new double[levels];
        double[] low = new double[levels];
        for (int k = 0; k < levels; k++) {
            BigDecimal n = BigDecimal.valueOf((long) first + k);
            BigDecimal exact = n.multiply(n.subtract(BigDecimal.ONE)).divide(BigDecimal.valueOf(2));
            energy[k] = exact.doubleValue();
            low[k] = exact.subtract(new BigDecimal(energy[k])).doubleValue();
        }
        double[] times = new double[60];
        Arrays.setAll(times, j -> 0.05 * j);
        LadderSums sums = LadderSums.of(ExactPhases.of(energy, low, c, zero, times), first, Workers.CALLER);
        for (int check = 0; check < 4; check++) {
            int j = random.nextInt(60);
            BigDecimal[] re = new BigDecimal[levels];
            BigDecimal[] im = new BigDecimal[levels];
            for (int k = 0; k < levels; k++) {
                BigDecimal phase = Decimals.exact(energy[k], low[k]).multiply(new BigDecimal(times[j]));
                re[k] = new BigDecimal(c[k]).multiply(Decimals.cos(phase)).round(DIGITS);
                im[k] = new BigDecimal(c[k])
                        .multiply(Decimals.sin(phase))
                        .negate()
                        .round(DIGITS);
            }
            Direct.of(re, im, first).check("anharmonic time " + times[j], sums, j);
        }
    }

    @Test
    void aCoherentStateFarUpTheLadderKeepsItsNoise() {
        // Harmonic motion from a coherent state: ⟨a⟩ = α e^{-it}, ⟨δ†δ⟩ = ⟨δ²⟩ = 0 (exact theory), up to the tail
        // beyond 9 spreads.
        int first = 100_000_000 - 90_000;
        int levels = 180_000;
        double[] zero = new double[levels];
        double[] energy = new double[levels];
        Arrays.setAll(energy, k -> first + k + 0.5);
        double[] times = {0, 0.5, 1, 1e4};
        LadderSums sums = LadderSums.of(
                ExactPhases.of(energy, zero, coherent(1e8, first, levels), zero, times), first, Workers.CALLER);
        for (int j = 0; j < times.length; j++) {
            assertTrue(sums.amplitudeError(j) < 1e-10);
            // Coefficients made from 1e5 ratios drift by about 1e-13 of 1e4.
            assertEquals(1e4 * Math.cos(times[j]), sums.amplitudeRe(j), 1e-8);
            assertEquals(-1e4 * Math.sin(times[j]), sums.amplitudeIm(j), 1e-8);
            assertEquals(0, sums.fluctuation(j), 1e-9);
            assertEquals(0, sums.squeezingRe(j), 1e-9);
            assertEquals(1e8, sums.meanQuanta(j), 1e-5);
            assertEquals(1, sums.varianceQuanta(j) / 1e8, 1e-9);
        }
    }

    @Test
    void plainAndVectorLoopsAgreeWithinRounding() {
        Random random = new Random(33);
        for (int count : new int[] {0, 1, 3, 4, 5, 8, 9, 100, 257}) {
            double[] re = MatrixProductTest.random(random, 1, count + 2)[0];
            double[] im = MatrixProductTest.random(random, 1, count + 2)[0];
            double[] up = random.doubles(count + 3).toArray();
            double[] down = random.doubles(count + 3).toArray();
            double[][] sums = new double[2][7];
            List<Loops> kinds = List.of(new PlainLoops(), new VectorLoops());
            for (int i = 0; i < 2; i++) {
                kinds.get(i).ladder(re, im, up, down, 3, count, 0.7, -0.3, sums[i], 1);
            }
            // Terms are below about 50 in size; each of up to 257 additions rounds.
            assertArrayEquals(sums[0], sums[1], 257 * 257 * 50 * 0x1p-53);
            assertEquals(0, sums[1][0]);
            assertEquals(0, sums[1][6]);
        }
    }

    @Test
    void threadsDoNotChangeBits() {
        Random random = new Random(34);
        int levels = 20_000;
        double[] energy = random.doubles(levels).toArray();
        double[] re = random.doubles(levels).toArray();
        double[] im = random.doubles(levels).toArray();
        double[] times = new double[40];
        Arrays.setAll(times, j -> 0.25 * j);
        ExactPhases phases = ExactPhases.of(energy, new double[levels], re, im, times);
        LadderSums alone = LadderSums.of(phases, 5, Workers.CALLER);
        ExecutorService executor = Executors.newFixedThreadPool(3);
        try {
            LadderSums shared = LadderSums.of(phases, 5, new Workers(executor, 4));
            for (int j = 0; j < 40; j++) {
                assertEquals(alone.amplitudeRe(j), shared.amplitudeRe(j), 0);
                assertEquals(alone.fluctuation(j), shared.fluctuation(j), 0);
                assertEquals(alone.squeezingIm(j), shared.squeezingIm(j), 0);
            }
        } finally {
            executor.shutdownNow();
        }
    }

    @Test
    void aNumberStateHasNoAmplitude() {
        double[] one = {1};
        double[] zero = {0};
        LadderSums sums = LadderSums.of(ExactPhases.of(new double[] {7.5}, zero, one, zero, one), 7, Workers.CALLER);
        assertEquals(0, sums.amplitudeRe(0), 0);
        assertEquals(7, sums.fluctuation(0), sums.fluctuationError(0));
        assertEquals(7, sums.meanQuanta(0), 0);
        assertEquals(0, sums.varianceQuanta(0), 0);
        assertEquals(1, sums.norm(0), 0);
    }

    @Test
    void refusesEmptyStatesAndNegativeLevels() {
        double[][] zero = {{0, 0}};
        double[][] one = {{1, 0}};
        double[][] nan = {{1, Double.NaN}};
        assertThrows(IllegalArgumentException.class, () -> LadderSums.of(zero, zero, 0, Workers.CALLER));
        assertThrows(IllegalArgumentException.class, () -> LadderSums.of(one, nan, 0, Workers.CALLER));
        assertThrows(IllegalArgumentException.class, () -> LadderSums.of(one, zero, -1, Workers.CALLER));
        assertThrows(IllegalArgumentException.class, () -> LadderSums.of(one, new double[1][3], 0, Workers.CALLER));
        assertThrows(IllegalArgumentException.class, () -> LadderSums.of(one, new double[2][2], 0, Workers.CALLER));
    }

    @Test
    void stopsSoonWhenTheThreadIsInterrupted() throws InterruptedException {
        int levels = 100_000;
        double[] energy = new double[levels];
        Arrays.setAll(energy, k -> 1e14 + k);
        double[] ones = new double[levels];
        Arrays.fill(ones, 1);
        double[] times = new double[3000];
        Arrays.setAll(times, j -> Math.sqrt(j));
        // Minutes of work: phases near 5e15 are made one by one.
        ExactPhases phases = ExactPhases.of(energy, new double[levels], ones, new double[levels], times);
        Throwable[] thrown = new Throwable[1];
        Thread worker = new Thread(() -> {
            try {
                LadderSums.of(phases, 0, Workers.CALLER);
            } catch (CancellationException interrupted) {
                thrown[0] = interrupted;
            }
        });
        worker.start();
        worker.interrupt();
        worker.join(60_000);
        assertTrue(thrown[0] instanceof CancellationException);
    }
}
