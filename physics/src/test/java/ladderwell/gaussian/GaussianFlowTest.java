package ladderwell.gaussian;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.SplittableRandom;
import ladderwell.evidence.Bound;
import ladderwell.formula.Formula;
import ladderwell.formula.Parameters;
import ladderwell.mode.Jump;
import ladderwell.mode.Mode;
import ladderwell.mode.Part;
import ladderwell.mode.Rate;
import ladderwell.operator.LadderPolynomial;
import ladderwell.operator.OperatorFormula;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;

class GaussianFlowTest {
    private static final double TIGHT = 1e-12;

    private static OperatorFormula natural(String text) {
        return OperatorFormula.naturalHamiltonian(text, Parameters.none());
    }

    private static GaussianFlow flow(String text) {
        return GaussianFlow.of(natural(text), List.of());
    }

    private static void assertWithin(double expected, double digits, Measured measured) {
        assertEquals(expected, measured.value(), digits + measured.bound().size());
        // a bound that is useless would let everything pass
        assertTrue(measured.bound().size() < 1e-9 * (1 + Math.abs(expected)), measured.bound()::toString);
    }

    private static List<Jump> randomJumps(SplittableRandom random) {
        List<Jump> jumps = new ArrayList<>();
        for (int i = 0; i < random.nextInt(3); i++) {
            LadderPolynomial l = LadderPolynomial.term(0, 1, random.nextDouble(-1, 1), random.nextDouble(-1, 1))
                    .plus(LadderPolynomial.term(1, 0, random.nextDouble(-0.5, 0.5), random.nextDouble(-0.5, 0.5)))
                    .plus(LadderPolynomial.constant(random.nextDouble(-1, 1), random.nextDouble(-1, 1)));
            jumps.add(new Jump("jump", l, Rate.natural(random.nextDouble(0, 0.6))));
        }
        return jumps;
    }

    private static LadderPolynomial randomQuadratic(SplittableRandom random) {
        LadderPolynomial half = LadderPolynomial.term(2, 0, random.nextDouble(-0.3, 0.3), random.nextDouble(-0.3, 0.3))
                .plus(LadderPolynomial.term(1, 0, random.nextDouble(-1, 1), random.nextDouble(-1, 1)));
        return LadderPolynomial.number()
                .times(random.nextDouble(-1.5, 1.5))
                .plus(half)
                .plus(half.adjoint());
    }

    /** i[H, O] + Σ γ (L† O L − ½ L†L O − ½ O L†L): how the mean of O changes, by operator algebra alone. */
    private static LadderPolynomial change(LadderPolynomial h, List<Jump> jumps, LadderPolynomial o) {
        LadderPolynomial sum = h.commutator(o).times(0, 1);
        for (Jump jump : jumps) {
            LadderPolynomial l = jump.operator();
            LadderPolynomial square = l.adjoint().times(l);
            LadderPolynomial part = l.adjoint()
                    .times(o)
                    .times(l)
                    .minus(square.times(o).times(0.5))
                    .minus(o.times(square).times(0.5));
            sum = sum.plus(part.times(jump.rate().perSecond()));
        }
        return sum;
    }

    @Test
    void driftAndNoiseAgreeWithOperatorAlgebra() {
        SplittableRandom random = new SplittableRandom(21);
        LadderPolynomial x = LadderPolynomial.position();
        LadderPolynomial p = LadderPolynomial.momentum();
        LadderPolynomial one = LadderPolynomial.constant(1, 0);
        for (int trial = 0; trial < 50; trial++) {
            LadderPolynomial h = randomQuadratic(random);
            List<Jump> jumps = randomJumps(random);
            Drift drift = new Drift(OperatorFormula.of(h), jumps);
            double[] at = new double[Drift.SIZE];
            drift.at(0, at);
            double g = drift.damping / 2;
            LadderPolynomial dx = x.times(at[0] - g).plus(p.times(at[1])).plus(one.times(at[3]));
            LadderPolynomial dp = x.times(at[2]).plus(p.times(-at[0] - g)).plus(one.times(at[4]));
            LadderPolynomial[] gaps = {
                change(h, jumps, x).minus(dx),
                change(h, jumps, p).minus(dp),
                change(h, jumps, x.times(x))
                        .minus(x.times(dx).plus(dx.times(x)))
                        .minus(one.times(drift.noiseXx)),
                change(h, jumps, p.times(p))
                        .minus(p.times(dp).plus(dp.times(p)))
                        .minus(one.times(drift.noisePp)),
                change(h, jumps, x.times(p).plus(p.times(x)).times(0.5))
                        .minus(x.times(dp)
                                .plus(dp.times(x))
                                .plus(p.times(dx))
                                .plus(dx.times(p))
                                .times(0.5))
                        .minus(one.times(drift.noiseXp))
            };
            for (LadderPolynomial gap : gaps) {
                assertTrue(gap.norm() < 1e-14, gap::toString);
            }
        }
    }

    @Test
    void aMillionTurnsKeepTheirDigits() {
        double t = 2 * Math.PI * 1e6 + 0.7;
        GaussianPoint point = flow("n").at(GaussianState.coherent(100, 0), t, TIGHT);
        double swing = 100 * Math.sqrt(2);
        assertWithin(swing * Math.cos(t), 2 * Math.ulp(swing), point.position());
        assertWithin(-swing * Math.sin(t), 2 * Math.ulp(swing), point.momentum());
        assertTrue(point.meanError().isGuaranteed());
        assertWithin(1e4, 1e-12, point.quanta());
        assertWithin(1e4, 1e-12, point.quantaVariance());
        assertWithin(1, 0, point.purity());
    }

    @Test
    void flowsComposeWithinTheirBounds() {
        SplittableRandom random = new SplittableRandom(4);
        for (int trial = 0; trial < 100; trial++) {
            GaussianFlow flow = GaussianFlow.of(OperatorFormula.of(randomQuadratic(random)), randomJumps(random));
            GaussianState start = GaussianState.thermal(random.nextDouble())
                    .squeezed(random.nextDouble(), 1)
                    .displaced(1, -2);
            double t = random.nextDouble(0, 8);
            double part = t * random.nextDouble();
            GaussianPoint whole = flow.at(start, t, TIGHT);
            GaussianPoint first = flow.at(start, part, TIGHT);
            GaussianPoint second = flow.at(first.state(), t - part, TIGHT);
            double size = 1 + Math.hypot(whole.state().x(), whole.state().p());
            // the error of the first half grows with the second one: by e^{0.9 t} at most here (growth up to 2 |c20| −
            // Γ/2)
            double carried = Math.exp(2.5 * t);
            assertEquals(
                    whole.state().x(),
                    second.state().x(),
                    whole.meanError().size()
                            + second.meanError().size()
                            + carried * first.meanError().size()
                            + 1e-15 * size);
            assertEquals(
                    whole.state().pp(),
                    second.state().pp(),
                    whole.covarianceError().size()
                            + second.covarianceError().size()
                            + carried * first.covarianceError().size()
                            + 1e-15 * whole.state().pp());
        }
    }

    @Test
    void steadyStatesAreWhereAllStatesGo() {
        Mode mode = Mode.natural(0.3)
                .with(new Part.Given(natural("0.1*(a^2 + ad^2) + 0.4*(a + ad)")))
                .with(Jump.bath(Rate.natural(1), 0.6));
        GaussianFlow flow = GaussianFlow.of(mode);
        GaussianState steady = flow.steady().orElseThrow();
        GaussianPoint late = flow.at(GaussianState.coherent(3, 1), 200, TIGHT);
        assertEquals(steady.x(), late.state().x(), 1e-14);
        assertEquals(steady.p(), late.state().p(), 1e-14);
        assertEquals(steady.xx(), late.state().xx(), 1e-14);
        assertEquals(steady.xp(), late.state().xp(), 1e-14);
        assertEquals(steady.pp(), late.state().pp(), 1e-14);
        assertTrue(flow("n").steady().isEmpty());
    }

    // Reference rows
    // ------------------------------------------------------------------------------------------------------------

    @Test
    void freePacketSpreads() {
        // S-FP-01: closed form of Schrödinger and Kennard, σ₀ √(1 + (t/2σ₀²)²), σ₀ = 1, t = 3
        GaussianState start = new GaussianState(0, 0, 1, 0, 0.25);
        GaussianPoint point = flow("p^2/2").at(start, 3, TIGHT);
        assertEquals(1.802775637731995, Math.sqrt(point.state().xx()), 5e-16 * 4);
    }

    @Test
    void forcedOscillatorGainsTheSquareOfItsSpectrum() {
        // S-FO-01: Husimi, Prog. Theor. Phys. 9 (1953) 381; Kerner, Can. J. Phys. 36 (1958) 371
        GaussianPoint point = flow("p^2/2 + x^2/2 - x*0.3*cos(t)").at(GaussianState.vacuum(), 10, 1e-13);
        assertWithin(1.23103587910916, 5e-15, point.quanta());
        assertFalse(point.meanError().isGuaranteed());
    }

    @Test
    void suddenChangeOfFrequencySqueezes() {
        // S-FQ-01a: Husimi 1953; Janszky and Yushin, Opt. Commun. 59 (1986) 151: ⟨n⟩ of the new oscillator, 1/3, at any
        // time
        GaussianPoint point = GaussianFlow.of(Mode.natural(1)
                        .with(new Part.FrequencyPath(Formula.natural("1 + 2*step(t - 2)", Parameters.none()), 1)))
                .at(GaussianState.vacuum(), 5, 1e-12);
        GaussianState s = point.state();
        double quanta = (s.pp() + 9 * s.xx()) / 6 - 0.5;
        assertEquals(
                0.333333333333333, quanta, 5e-16 + 2 * point.covarianceError().size());
        assertTrue(point.covarianceError().size() < 1e-10);
    }

    @Test
    void thermalisationFollowsItsRate() {
        // S-TZ-01: Lindblad master equation for a thermal bath; Walls and Milburn, Quantum Optics, ch. 6
        GaussianFlow flow = GaussianFlow.of(Mode.natural(1).with(Jump.bath(Rate.natural(0.5), 3)));
        assertWithin(
                5.575156088200096,
                5e-16,
                flow.at(GaussianState.thermal(10), 2, TIGHT).quanta());
        // coherent start of the same mean: ⟨n⟩ is the same, the state is not
        GaussianPoint coherent = flow.at(GaussianState.coherent(Math.sqrt(10), 0), 2, TIGHT);
        assertWithin(5.575156088200096, 5e-15, coherent.quanta());
    }

    @ParameterizedTest
    @CsvSource({
        // S-MAT-02, S-MAT-03, S-MAT-04, S-MAT-05: Abramowitz and Stegun, table 20.1 (DLMF 28.2). y″ + (a − 2q cos 2t) y
        // = 0 has a
        // periodic (2) or antiperiodic (−2) solution there, so that the sum of c(π) and s′(π) is 2 or −2
        "7.44910973952917781, 5, 2",
        "-5.79008059863777104, 5, -2",
        "1.85818754154775089, 5, -2",
        "-2.38215823595695572, 10, 2"
    })
    void parametricOscillatorHasItsBandEdgesAtMathieusValues(double a, double q, double trace) {
        GaussianFlow flow = flow("p^2/2 + (" + a + " - " + 2 * q + "*cos(2*t))*x^2/2");
        GaussianState up = new GaussianState(1, 0, 0.5, 0, 0.5);
        GaussianState on = new GaussianState(0, 1, 0.5, 0, 0.5);
        GaussianPoint c = flow.at(up, Math.PI, 1e-13);
        GaussianPoint s = flow.at(on, Math.PI, 1e-13);
        double bound = c.meanError().size() + s.meanError().size();
        // solutions grow to about 1e3 within the period and come back: 18 digits of a and doubles leave this much
        assertEquals(trace, c.state().x() + s.state().p(), bound + 1e-12);
        assertTrue(bound < 1e-7, "bound " + bound);
    }

    // Bounds
    // --------------------------------------------------------------------------------------------------------------------

    @Test
    void steppedMotionStaysWithinItsBoundOfTheExactOne() {
        SplittableRandom random = new SplittableRandom(77);
        double worst = 0;
        for (int trial = 0; trial < 60; trial++) {
            // (G/2)(a² e^{iδt} + h.c.) + F (a e^{iδt/2} + h.c.) + Δ n stands still in the frame turning at δ/2
            double g = random.nextDouble(0.05, 0.4);
            double f = random.nextDouble(-1, 1);
            double delta = random.nextDouble(-3, 3);
            double detuning = random.nextDouble(-1, 1);
            double kappa = random.nextDouble(0, 0.5);
            double t = random.nextDouble(1, 12);
            Parameters parameters = Parameters.none()
                    .with("g", Double.toString(g))
                    .with("f", Double.toString(f))
                    .with("d", Double.toString(delta))
                    .with("w", Double.toString(detuning))
                    .with("s", Double.toString(detuning - delta / 2));
            List<Jump> bath = Jump.bath(Rate.natural(kappa), 0.3);
            GaussianState start = GaussianState.vacuum().squeezed(0.4, 1.1).displaced(0.7, -0.2);
            GaussianPoint stepped = GaussianFlow.of(
                            OperatorFormula.naturalHamiltonian(
                                    "w*n + g/2*(a^2*exp(i*d*t) + ad^2*exp(-i*d*t)) + f*(a*exp(i*d*t/2) + ad*exp(-i*d*t/2))",
                                    parameters),
                            bath)
                    .at(start, t, 1e-9);
            GaussianPoint still = GaussianFlow.of(
                            OperatorFormula.naturalHamiltonian("s*n + g/2*(a^2 + ad^2) + f*(a + ad)", parameters), bath)
                    .at(start, t, TIGHT);
            // back from the frame: a → a e^{−iδt/2}
            double c = Math.cos(delta * t / 2);
            double s = Math.sin(delta * t / 2);
            GaussianState e = still.state();
            double x = c * e.x() + s * e.p();
            double p = c * e.p() - s * e.x();
            double xx = c * c * e.xx() + 2 * c * s * e.xp() + s * s * e.pp();
            double xp = (c * c - s * s) * e.xp() + c * s * (e.pp() - e.xx());
            double pp = s * s * e.xx() - 2 * c * s * e.xp() + c * c * e.pp();
            GaussianState got = stepped.state();
            double meanGap = Math.hypot(got.x() - x, got.p() - p);
            double gap =
                    Math.sqrt(Math.pow(got.xx() - xx, 2) + 2 * Math.pow(got.xp() - xp, 2) + Math.pow(got.pp() - pp, 2));
            double rounding = 4e-15 * (1 + Math.hypot(x, p) + xx + pp);
            assertTrue(meanGap <= stepped.meanError().size() + still.meanError().size() + rounding, "mean " + meanGap);
            assertTrue(
                    gap
                            <= stepped.covarianceError().size()
                                    + still.covarianceError().size()
                                    + rounding,
                    "covariance " + gap);
            worst = Math.max(worst, stepped.meanError().size());
        }
        assertTrue(worst < 1e-7, "bounds up to " + worst);
    }

    @Test
    void jumpsInTimeAreStepEnds() {
        // a kick of length 0.01 every unit of time: the same as kicks followed piece by piece
        GaussianFlow kicked = flow("n + 5*(step(t - 1) - step(t - 1.01) + step(t - 2) - step(t - 2.01))*x");
        GaussianPoint whole = kicked.at(GaussianState.vacuum(), 3, 1e-12);
        GaussianState piece = GaussianState.vacuum();
        double[] lengths = {1, 0.01, 0.99, 0.01, 0.99};
        for (int i = 0; i < lengths.length; i++) {
            piece = flow(i % 2 == 0 ? "n" : "n + 5*x")
                    .at(piece, lengths[i], TIGHT)
                    .state();
        }
        assertEquals(piece.x(), whole.state().x(), whole.meanError().size() + 1e-14);
        assertEquals(piece.p(), whole.state().p(), whole.meanError().size() + 1e-14);
        assertTrue(whole.meanError().size() < 1e-11, whole.meanError()::toString);
    }

    @Test
    void readingsMoveLessThanTheirBounds() {
        SplittableRandom random = new SplittableRandom(8);
        for (int trial = 0; trial < 3000; trial++) {
            GaussianState state = GaussianState.thermal(random.nextInt(3) == 0 ? 0 : random.nextDouble(0, 3))
                    .squeezed(random.nextDouble(0, 1.5), random.nextDouble(-3, 3))
                    .displaced(random.nextDouble(-2, 2), random.nextDouble(-2, 2));
            double dm = Math.pow(10, random.nextDouble(-9, -0.5));
            double dv = Math.pow(10, random.nextDouble(-9, -0.5));
            GaussianPoint point = new GaussianPoint(0, state, Bound.guaranteed(dm), Bound.guaranteed(dv));
            double angle = random.nextDouble(6.3);
            double a = random.nextDouble(-1, 1);
            double b = random.nextDouble(-1, 1);
            double c = random.nextDouble(-1, 1);
            double norm = Math.sqrt(a * a + 2 * b * b + c * c);
            GaussianState moved;
            try {
                moved = new GaussianState(
                        state.x() + dm * Math.cos(angle),
                        state.p() + dm * Math.sin(angle),
                        state.xx() + dv * a / norm,
                        state.xp() + dv * b / norm,
                        state.pp() + dv * c / norm);
            } catch (IllegalArgumentException e) {
                continue; // no state
            }
            GaussianPoint there = moved.known();
            GaussianState other = GaussianState.thermal(0.2).squeezed(0.5, 1).displaced(1, 0);
            Measured[][] pairs = {
                {point.quanta(), there.quanta()},
                {point.quantaVariance(), there.quantaVariance()},
                {point.purity(), there.purity()},
                {point.entropy(), there.entropy()},
                {point.parity(), there.parity()},
                {point.leastVariance(), there.leastVariance()},
                {point.mostVariance(), there.mostVariance()},
                {point.variance(0.3), there.variance(0.3)},
                {point.fidelity(other), there.fidelity(other)}
            };
            for (int i = 0; i < pairs.length; i++) {
                double gap = Math.abs(pairs[i][0].value() - pairs[i][1].value());
                double allowed =
                        pairs[i][0].bound().size() + pairs[i][1].bound().size();
                int reading = i;
                assertTrue(
                        gap <= allowed,
                        () -> "reading " + reading + " of " + state + " off by " + gap + " > " + allowed);
            }
            double turn = Math.abs(point.leastVarianceAngle().value()
                    - there.leastVarianceAngle().value());
            turn = Math.min(turn, Math.PI - turn);
            assertTrue(turn
                    <= point.leastVarianceAngle().bound().size()
                            + there.leastVarianceAngle().bound().size());
        }
    }

    @Test
    void runawayIsToldBeforeNumbersEnd() {
        GaussianFlow pumped = flow("a^2 + ad^2");
        assertTrue(pumped.at(GaussianState.vacuum(), 3, TIGHT).quanta().value() > 1e4);
        assertThrows(IllegalArgumentException.class, () -> pumped.at(GaussianState.vacuum(), 1000, TIGHT));
    }

    @Test
    void whatIsNotGaussianIsRefused() {
        IllegalArgumentException kerr = assertThrows(IllegalArgumentException.class, () -> flow("n + 0.1*n^2"));
        assertEquals(
                "Gaussian states stay Gaussian only under a quadratic Hamiltonian, and 'n + 0.1*n^2' is of degree 4",
                kerr.getMessage());
        IllegalArgumentException pairs = assertThrows(
                IllegalArgumentException.class,
                () -> GaussianFlow.of(natural("n"), List.of(Jump.dephasing(Rate.natural(1)))));
        assertEquals(
                "Gaussian states stay Gaussian only under jumps that are linear in a and a†, and dephasing jumps by a† a",
                pairs.getMessage());
        GaussianState vacuum = GaussianState.vacuum();
        assertThrows(IllegalArgumentException.class, () -> flow("n").at(vacuum, -1, TIGHT));
        assertThrows(IllegalArgumentException.class, () -> flow("n").at(vacuum, 1, 0));
        assertThrows(IllegalArgumentException.class, () -> flow("n").at(vacuum, 1e30, TIGHT));
    }
}
