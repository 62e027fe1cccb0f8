package ladderwell.state;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.SplittableRandom;
import java.util.function.UnaryOperator;
import ladderwell.evidence.PhysicsException;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class HarmonicStatesTest {
    private static final double TIGHT = 1e-13;

    private static double weight(Amplitudes state, long n) {
        int i = (int) (n - state.first(0));
        return i < 0 || i >= state.length(0) ? 0 : Math.pow(state.re(0, i), 2) + Math.pow(state.im(0, i), 2);
    }

    private static double moment(Amplitudes state, int power) {
        double sum = 0;
        for (int i = 0; i < state.length(0); i++) {
            sum += Math.pow(state.first(0) + i, power) * weight(state, state.first(0) + i);
        }
        return sum;
    }

    /** Var n = Σ (n − n̄)² P_n, without large differences. */
    private static double variance(Amplitudes state) {
        double mean = moment(state, 1);
        double sum = 0;
        for (int i = 0; i < state.length(0); i++) {
            sum += Math.pow(state.first(0) + i - mean, 2) * weight(state, state.first(0) + i);
        }
        return sum;
    }

    /** ⟨one|other⟩: real and imaginary part. */
    private static double[] overlap(Amplitudes one, Amplitudes other) {
        double re = 0;
        double im = 0;
        for (int i = 0; i < one.length(0); i++) {
            int j = (int) (one.first(0) + i - other.first(0));
            if (j >= 0 && j < other.length(0)) {
                re += one.re(0, i) * other.re(0, j) + one.im(0, i) * other.im(0, j);
                im += one.re(0, i) * other.im(0, j) - one.im(0, i) * other.re(0, j);
            }
        }
        return new double[] {re, im};
    }

    // Reference rows
    // ------------------------------------------------------------------------------------------------------------

    @Test
    void squeezedVacuumHasItsPopulations() {
        // S-SQ-01: Walls and Milburn, Quantum Optics, ch. 2; Yuen, Phys. Rev. A 13 (1976) 2226
        assertEquals(0.6480542736638854, weight(HarmonicStates.squeezedVacuum(1, 0, TIGHT), 0), 5e-16);
        // S-FQ-01b: ground state of ω = 1 in the levels of ω = 3, r = ½ ln 3: Husimi 1953; Janszky and Yushin 1986
        assertEquals(0.108253175473055, weight(HarmonicStates.squeezedVacuum(Math.log(3) / 2, 0, TIGHT), 2), 5e-16);
    }

    @Test
    void squeezedCoherentStateHasItsPopulations() {
        // S-SC-01c: Yuen 1976 eq. (3.23); Gong and Aravind, Am. J. Phys. 58 (1990) 1003
        Amplitudes state = HarmonicStates.displacedSqueezed(4, 0, 0.5, 0, TIGHT);
        assertEquals(0.246962001495588, weight(state, 5), 1e-15);
        // S-SC-01a: Loudon and Knight, J. Mod. Opt. 34 (1987) 709
        double mean = moment(state, 1);
        assertEquals(-0.493843783085530, (variance(state) - mean) / mean, 1e-13);
        // S-OV-02: Scutaru, J. Phys. A 31 (1998) 3659
        double[] overlap =
                overlap(Amplitudes.coherent(4, 0, TIGHT), HarmonicStates.displacedSqueezed(1, 0, 0.8, 0, TIGHT));
        assertEquals(0.141594161545450, overlap[0] * overlap[0] + overlap[1] * overlap[1], 1e-14);
    }

    @Test
    void displacedNumberStateHasItsElements() {
        // S-DM-01: Cahill and Glauber, Phys. Rev. 177 (1969) 1857, eq. B4: ⟨3|D(1)|2⟩
        Amplitudes state = HarmonicStates.displacedNumber(2, 1, 0, TIGHT);
        assertEquals(0.1750903198284251, state.re(0, (int) (3 - state.first(0))), 5e-16);
        // S-DF-01: de Oliveira, Kim, Knight and Buzek, Phys. Rev. A 41 (1990) 2645: Fano factor of D(2)|1⟩
        Amplitudes one = HarmonicStates.displacedNumber(1, 4, 0.7, TIGHT);
        assertEquals(2.4, variance(one) / moment(one, 1), 1e-12);
    }

    @Test
    void catsHaveTheirQuanta() {
        // S-CAT-01a, S-CAT-01b, S-CAT-02a: Buzek, Vidiella-Barranco and Knight, Phys. Rev. A 45 (1992) 6570; Gerry 1993
        Amplitudes even = HarmonicStates.cat(1, 0, 2, 0, TIGHT);
        assertEquals(0.7615941559557649, moment(even, 1), 1e-15);
        assertEquals(0.55144112954357, (variance(even) - moment(even, 1)) / moment(even, 1), 1e-14);
        assertEquals(1.313035285499331, moment(HarmonicStates.cat(1, 0, 2, 1, TIGHT), 1), 2e-15);
    }

    @Test
    void kerrEvolutionMakesTheCatOfYurkeAndStoler() {
        // S-KER-03: Yurke and Stoler, Phys. Rev. Lett. 57 (1986) 13: H = χ n², α = 2, χt = π/2: fidelity 1 with χ = π/2
        // between
        Amplitudes start = Amplitudes.coherent(4, 0, TIGHT);
        Amplitudes cat = HarmonicStates.phasedCat(4, 0, 2, Math.PI / 2, TIGHT);
        double re = 0;
        double im = 0;
        for (int i = 0; i < start.length(0); i++) {
            // e^{−iπn²/2} is 1 for even n, −i for odd n
            int j = (int) (start.first(0) + i - cat.first(0));
            boolean even = (start.first(0) + i) % 2 == 0;
            double a = even ? start.re(0, i) : 0;
            double b = even ? 0 : -start.re(0, i);
            if (j >= 0 && j < cat.length(0)) {
                re += cat.re(0, j) * a + cat.im(0, j) * b;
                im += cat.re(0, j) * b - cat.im(0, j) * a;
            }
        }
        assertEquals(1, re * re + im * im, 5e-15 + 4 * TIGHT);
    }

    @Test
    void heatHasItsPopulations() {
        // S-TH-01a: Bose and Einstein; Mandel and Wolf, sect. 13.2
        DensityOperator thermal = Mixture.thermal(2, 1e-12).density(1e9);
        assertEquals(0.09876543209876543, thermal.re(3, 3), 1e-16);
        assertEquals(1, thermal.trace(), thermal.traceNormError());
        assertTrue(thermal.traceNormError() <= 1e-12);
    }

    // Independent routes
    // --------------------------------------------------------------------------------------------------------

    /** e^{G} v by Taylor series in steps, on levels 0 … size − 1; g applies the generator. */
    private static double[][] exponential(double[][] v, int steps, UnaryOperator<double[][]> g) {
        double[][] state = v;
        for (int s = 0; s < steps; s++) {
            double[][] term = state;
            double[][] sum = {state[0].clone(), state[1].clone()};
            for (int k = 1; k < 60; k++) {
                double[][] next = g.apply(term);
                for (int part = 0; part < 2; part++) {
                    for (int i = 0; i < next[part].length; i++) {
                        next[part][i] /= (double) k * steps;
                        sum[part][i] += next[part][i];
                    }
                }
                term = next;
            }
            state = sum;
        }
        return state;
    }

    /** (z a†^k − z* a^k)/k v, z = re + i im. */
    private static double[][] generator(double[][] v, double re, double im, int k) {
        int size = v[0].length;
        double[][] out = new double[2][size];
        for (int n = 0; n + k < size; n++) {
            double root = k == 1 ? Math.sqrt(n + 1) : Math.sqrt((n + 1.0) * (n + 2));
            root /= k;
            out[0][n + k] += root * (re * v[0][n] - im * v[1][n]);
            out[1][n + k] += root * (re * v[1][n] + im * v[0][n]);
            out[0][n] -= root * (re * v[0][n + k] + im * v[1][n + k]);
            out[1][n] -= root * (re * v[1][n + k] - im * v[0][n + k]);
        }
        return out;
    }

    private static double distance(Amplitudes one, Amplitudes other) {
        int size = (int) (one.first(0) + one.length(0));
        double[][] dense = new double[2][size];
        System.arraycopy(one.reals(0), 0, dense[0], (int) one.first(0), one.length(0));
        System.arraycopy(one.imaginaries(0), 0, dense[1], (int) one.first(0), one.length(0));
        return distance(dense, other);
    }

    private static double distance(double[][] dense, Amplitudes state) {
        double sum = 0;
        for (int n = 0; n < dense[0].length; n++) {
            int i = (int) (n - state.first(0));
            double re = i >= 0 && i < state.length(0) ? state.re(0, i) : 0;
            double im = i >= 0 && i < state.length(0) ? state.im(0, i) : 0;
            sum += Math.pow(dense[0][n] - re, 2) + Math.pow(dense[1][n] - im, 2);
        }
        return Math.sqrt(sum);
    }

    @Test
    void statesAreWhatTheirOperatorsMake() {
        SplittableRandom random = new SplittableRandom(42);
        // large enough that nothing arrives at the edge; the Taylor sums leave some 1e-13
        int size = 420;
        for (int trial = 0; trial < 25; trial++) {
            double mean = random.nextDouble(0, 9);
            double phase = random.nextDouble(-3, 3);
            double r = random.nextDouble(0, 0.8);
            double phi = random.nextDouble(-3, 3);
            int level = random.nextInt(4);
            double tolerance = Math.pow(10, random.nextDouble(-13, -2));
            double re = Math.sqrt(mean) * Math.cos(phase);
            double im = Math.sqrt(mean) * Math.sin(phase);
            UnaryOperator<double[][]> displace = v -> generator(v, re, im, 1);
            // (ξ* a² − ξ a†²)/2
            UnaryOperator<double[][]> squeeze = v -> generator(v, -r * Math.cos(phi), -r * Math.sin(phi), 2);
            double[][] vacuum = new double[2][size];
            vacuum[0][0] = 1;
            double[][] number = new double[2][size];
            number[0][level] = 1;
            Amplitudes first = HarmonicStates.displacedSqueezed(mean, phase, r, phi, tolerance);
            Amplitudes second = HarmonicStates.squeezedDisplaced(mean, phase, r, phi, tolerance);
            Amplitudes third = HarmonicStates.displacedNumber(level, mean, phase, tolerance);
            double gap1 = distance(exponential(exponential(vacuum, 120, squeeze), 40, displace), first);
            double gap2 = distance(exponential(exponential(vacuum, 40, displace), 120, squeeze), second);
            double gap3 = distance(exponential(number, 40, displace), third);
            assertTrue(gap1 <= first.normError() + 1e-12, "D S: " + gap1 + " > " + first.normError());
            assertTrue(gap2 <= second.normError() + 1e-12, "S D: " + gap2 + " > " + second.normError());
            assertTrue(gap3 <= third.normError() + 1e-12, "D n: " + gap3 + " > " + third.normError());
            double most = Math.max(tolerance, 1e-13);
            assertTrue(first.normError() <= most && second.normError() <= most && third.normError() <= most);
        }
    }

    @Test
    void tailsLeftOutAreWithinTheirBounds() {
        SplittableRandom random = new SplittableRandom(17);
        for (int trial = 0; trial < 40; trial++) {
            double mean = random.nextDouble(0, 400);
            double r = random.nextDouble(0, 1.5);
            double phi = random.nextDouble(-3, 3);
            Amplitudes[][] pairs = {
                {
                    HarmonicStates.displacedSqueezed(mean, 0.3, r, phi, 1e-3),
                    HarmonicStates.displacedSqueezed(mean, 0.3, r, phi, TIGHT)
                },
                {
                    HarmonicStates.displacedNumber(trial, mean, 0.3, 1e-3),
                    HarmonicStates.displacedNumber(trial, mean, 0.3, TIGHT)
                },
                {HarmonicStates.cat(mean + 0.1, 0.3, 3, 1, 1e-3), HarmonicStates.cat(mean + 0.1, 0.3, 3, 1, TIGHT)}
            };
            for (Amplitudes[] pair : pairs) {
                double[] moments = new double[Amplitudes.MOMENTS];
                double sum = 0;
                for (int i = 0; i < pair[1].length(0); i++) {
                    long n = pair[1].first(0) + i;
                    if (n >= pair[0].first(0) && n < pair[0].first(0) + pair[0].length(0)) {
                        continue;
                    }
                    double p = weight(pair[1], n);
                    for (int k = 0; k < moments.length; k++) {
                        moments[k] += Math.pow(n + 1.0, k) * p;
                    }
                    sum += Math.sqrt(p);
                }
                for (int k = 0; k < moments.length; k++) {
                    // the finer state is itself right to 1e-13 only
                    assertTrue(
                            moments[k] <= pair[0].tailMoment(k) * (1 + 1e-9) + 1e-20,
                            "moment " + k + " of " + mean + ", " + r);
                }
                assertTrue(sum <= pair[0].tailSum() * (1 + 1e-9) + 1e-9);
                double gap = distance(pair[1], pair[0]);
                assertTrue(gap <= pair[0].normError() + TIGHT, "off by " + gap + " > " + pair[0].normError());
                // and it is no looser than it need be
                assertTrue(
                        pair[0].normError() <= 1e-3 && pair[0].normError() <= 20 * gap,
                        gap + " " + pair[0].normError());
            }
        }
    }

    @ParameterizedTest
    @CsvSource({"1e2, 1", "1e4, 0.7", "1e6, 1.5", "1e8, 0.3", "1e4, 3", "0, 4.5", "1e-20, 0.1", "25, 0"})
    void squeezedStatesOfAnySizeHaveTheirMoments(double mean, double r) {
        for (double phi : new double[] {0, 2.1, Math.PI}) {
            Amplitudes state = HarmonicStates.displacedSqueezed(mean, 0, r, phi, 1e-10);
            // ⟨n⟩ = |α|² + sinh² r; Var n = |α cosh r − α* e^{iφ} sinh r|² + 2 sinh² r cosh² r (Loudon and Knight 1987)
            double s = Math.sinh(r);
            double c = Math.cosh(r);
            double quanta = mean + s * s;
            double cross = mean * (c * c + s * s - 2 * c * s * Math.cos(phi));
            double variance = cross + 2 * s * s * c * c;
            // the norm error times the spread of n, twice
            assertEquals(quanta, moment(state, 1), 1e-9 * (1 + quanta) + 1e-14 * quanta);
            assertEquals(variance, variance(state), 1e-8 * (1 + variance) * (1 + 40 * s * s));
            // ⟨a⟩ = α, which the phases carry
            double re = 0;
            double im = 0;
            for (int i = 1; i < state.length(0); i++) {
                double root = Math.sqrt(state.first(0) + i);
                re += root * (state.re(0, i - 1) * state.re(0, i) + state.im(0, i - 1) * state.im(0, i));
                im += root * (state.re(0, i - 1) * state.im(0, i) - state.im(0, i - 1) * state.re(0, i));
            }
            assertEquals(Math.sqrt(mean), re, 1e-9 * (1 + Math.sqrt(quanta)));
            assertEquals(0, im, 1e-9 * (1 + Math.sqrt(quanta)));
        }
    }

    @ParameterizedTest
    @CsvSource({"1, 1e4, 0", "3, 1e6, 0.5", "10, 400, -2", "200, 50, 1", "2, 1e8, 1e9", "5, 1e-12, 0"})
    void displacedNumberStatesOfAnySizeAreRaisedCoherentOnes(long level, double mean, double phase) {
        Amplitudes state = HarmonicStates.displacedNumber(level, mean, phase, 1e-10);
        // (a − α) lowers: √m D|m − 1⟩
        Amplitudes lower = HarmonicStates.displacedNumber(level - 1, mean, phase, 1e-10);
        double alphaRe = Math.sqrt(mean) * Math.cos(phase);
        double alphaIm = Math.sqrt(mean) * Math.sin(phase);
        double sum = 0;
        for (int i = -1; i < state.length(0); i++) {
            long n = state.first(0) + i;
            if (n < 0) {
                continue;
            }
            double root = Math.sqrt(n + 1.0);
            double upRe = i + 1 < state.length(0) ? root * state.re(0, i + 1) : 0;
            double upIm = i + 1 < state.length(0) ? root * state.im(0, i + 1) : 0;
            double re = i >= 0 ? state.re(0, i) : 0;
            double im = i >= 0 ? state.im(0, i) : 0;
            int j = (int) (n - lower.first(0));
            double wantRe = j >= 0 && j < lower.length(0) ? Math.sqrt(level) * lower.re(0, j) : 0;
            double wantIm = j >= 0 && j < lower.length(0) ? Math.sqrt(level) * lower.im(0, j) : 0;
            sum += Math.pow(upRe - (alphaRe * re - alphaIm * im) - wantRe, 2)
                    + Math.pow(upIm - (alphaRe * im + alphaIm * re) - wantIm, 2);
        }
        // both errors lifted by |α|, and cos and sin of the phase
        assertEquals(
                0,
                Math.sqrt(sum),
                1e-9 * (1 + Math.sqrt(level)) + 1e-9 * Math.sqrt(mean) * 1e-2 + 1e-15 * Math.sqrt(mean));
        if (level == 1) {
            assertEquals(1, overlap(lower, Amplitudes.coherent(mean, phase, 1e-12))[0], 1e-10);
        }
    }

    @Test
    void bothOrdersOfALargeStateAreOneState() {
        double gamma = 1000;
        double phi = 0.8;
        double r = 0.6;
        // α = γ cosh r − γ e^{iφ} sinh r
        double re = gamma * (Math.cosh(r) - Math.cos(phi) * Math.sinh(r));
        double im = -gamma * Math.sin(phi) * Math.sinh(r);
        Amplitudes last = HarmonicStates.squeezedDisplaced(gamma * gamma, 0, r, phi, 1e-11);
        Amplitudes first = HarmonicStates.displacedSqueezed(re * re + im * im, Math.atan2(im, re), r, phi, 1e-11);
        // mean and phase of α are rounded: 1e-16 of 1e6 quanta
        double[] overlap = overlap(last, first);
        assertEquals(1, overlap[0], 1e-10);
        assertEquals(0, overlap[1], 1e-9);
    }

    @Test
    void phasesOfCatsFollowTheirComponents() {
        double chi = 0.8;
        Amplitudes cat = HarmonicStates.phasedCat(2, 0.4, 3, chi, TIGHT);
        double[][] sum = new double[2][60];
        for (int j = 0; j < 3; j++) {
            Amplitudes part = Amplitudes.coherent(2, 0.4 + 2 * Math.PI * j / 3, 1e-14);
            for (int i = 0; i < part.length(0) && part.first(0) + i < 60; i++) {
                int n = (int) part.first(0) + i;
                double c = Math.cos(chi * j);
                double s = Math.sin(chi * j);
                sum[0][n] += c * part.re(0, i) - s * part.im(0, i);
                sum[1][n] += c * part.im(0, i) + s * part.re(0, i);
            }
        }
        double norm = 0;
        for (int n = 0; n < 60; n++) {
            norm += sum[0][n] * sum[0][n] + sum[1][n] * sum[1][n];
        }
        for (int n = 0; n < 60; n++) {
            sum[0][n] /= Math.sqrt(norm);
            sum[1][n] /= Math.sqrt(norm);
        }
        assertTrue(distance(sum, cat) <= cat.normError() + 1e-14);
        // all phases alike: the class n ≡ 0
        assertTrue(distance(sum, HarmonicStates.cat(2, 0.4, 3, 0, TIGHT)) > 0.1);
        double[] same = overlap(HarmonicStates.phasedCat(2, 0.4, 3, 0, TIGHT), HarmonicStates.cat(2, 0.4, 3, 0, TIGHT));
        assertEquals(1, same[0], 1e-14);
    }

    @Test
    void smallCatsOfHighClassAreStillStates() {
        // four components, n ≡ 3: |3⟩ for a small mean
        Amplitudes cat = HarmonicStates.cat(1e-3, 0, 4, 3, 1e-9);
        assertEquals(1, weight(cat, 3), 1e-9);
        assertEquals(3, moment(cat, 1), 1e-9);
        IllegalArgumentException nothing =
                assertThrows(IllegalArgumentException.class, () -> HarmonicStates.cat(0, 0, 2, 1, 1e-9));
        assertEquals(
                "at 0 quanta per component nothing is left of this cat; give it some quanta or another parity",
                nothing.getMessage());
        assertThrows(IllegalArgumentException.class, () -> HarmonicStates.cat(1e-30, 0, 20, 19, 1e-9));
        assertEquals(0, HarmonicStates.cat(0, 0, 2, 0, 1e-9).first(0));
    }

    @Test
    void displacedHeatIsAGaussianState() {
        double heat = 0.7;
        double mean = 3;
        Mixture mixture = Mixture.displacedThermal(heat, mean, 0.9, 1e-11);
        DensityOperator rho = mixture.density(1e9);
        assertEquals(1, rho.trace(), rho.traceNormError());
        // 1/(2n̄ + 1)
        assertEquals(1 / 2.4, rho.purity(), 2 * rho.traceNormError());
        double quanta = 0;
        double re = 0;
        double im = 0;
        for (int m = 0; m < rho.size(); m++) {
            quanta += (rho.first() + m) * rho.re(m, m);
            if (m > 0) {
                // ⟨a⟩ = Σ √m ρ_{m, m−1}
                double root = Math.sqrt(rho.first() + m);
                re += root * rho.re(m, m - 1);
                im += root * rho.im(m, m - 1);
            }
        }
        assertEquals(mean + heat, quanta, 1e-9);
        assertEquals(Math.sqrt(mean) * Math.cos(0.9), re, 1e-10);
        assertEquals(Math.sqrt(mean) * Math.sin(0.9), im, 1e-10);
        assertEquals(rho.im(4, 2), -rho.im(2, 4));
        assertEquals(1, mixture.weight(0) * 1.7, 1e-15);
    }

    @Test
    void badNumbersAreRefused() {
        assertThrows(IllegalArgumentException.class, () -> HarmonicStates.displacedSqueezed(-1, 0, 1, 0, 1e-9));
        assertThrows(IllegalArgumentException.class, () -> HarmonicStates.displacedSqueezed(1, 0, -1, 0, 1e-9));
        assertThrows(IllegalArgumentException.class, () -> HarmonicStates.displacedSqueezed(1, 0, 6, 0, 1e-9));
        assertThrows(IllegalArgumentException.class, () -> HarmonicStates.squeezedVacuum(1, Double.NaN, 1e-9));
        assertThrows(IllegalArgumentException.class, () -> HarmonicStates.displacedNumber(-1, 1, 0, 1e-9));
        assertThrows(IllegalArgumentException.class, () -> HarmonicStates.cat(1, 0, 1, 0, 1e-9));
        assertThrows(IllegalArgumentException.class, () -> HarmonicStates.cat(1, 0, 2, 2, 1e-9));
        assertThrows(IllegalArgumentException.class, () -> Mixture.thermal(-1, 1e-9));
        IllegalArgumentException large = assertThrows(
                IllegalArgumentException.class, () -> HarmonicStates.displacedSqueezed(1e12, 0, 4, 3.1, 1e-9));
        assertTrue(large.getMessage().startsWith("this squeezed state needs about "), large.getMessage());
        PhysicsException.TooLarge heavy = assertThrows(
                PhysicsException.TooLarge.class,
                () -> Mixture.thermal(1000, 1e-9).density(1e6));
        assertTrue(
                heavy.getMessage().startsWith("the density operator of this thermal state needs "), heavy.getMessage());
    }
}
