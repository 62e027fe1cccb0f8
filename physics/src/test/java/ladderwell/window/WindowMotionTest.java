package ladderwell.window;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import java.util.concurrent.CancellationException;
import java.util.function.DoubleUnaryOperator;
import ladderwell.evidence.Certainty;
import ladderwell.evidence.PhysicsException;
import ladderwell.formula.Formula;
import ladderwell.formula.Parameters;
import ladderwell.operator.LadderPolynomial;
import ladderwell.operator.OperatorFormula;
import ladderwell.state.Amplitudes;
import ladderwell.state.HarmonicStates;
import ladderwell.state.Mixture;
import org.junit.jupiter.api.Test;

/** Values with an S-… number are those of the project's table of published values; sources beside them. */
class WindowMotionTest {
    private static final double MEMORY = 1e9;
    private static final double TOLERANCE = 1e-9;

    private static final LadderPolynomial A = LadderPolynomial.a();

    private static LadderPolynomial kerr(double strength) {
        return LadderPolynomial.term(2, 2, strength / 2, 0);
    }

    private static LadderPolynomial drive(double strength) {
        return A.plus(LadderPolynomial.adagger()).times(strength);
    }

    private static WindowState mixed(
            LadderPolynomial h, List<LadderPolynomial> jumps, Mixture start, double time, double tolerance) {
        return WindowMotion.mixed(
                        OperatorFormula.of(h), jumps, start.density(MEMORY), new double[] {time}, tolerance, MEMORY)
                .state(0);
    }

    @Test
    void aKerrStateCollapsesAsItsClosedFormSays() {
        // S-KER-01, S-KER-02: H = χ n², α = 2, χt = 0.1; Yurke and Stoler, Phys. Rev. Lett. 57 (1986) 13
        LadderPolynomial h = LadderPolynomial.number().power(2);
        WindowState state = WindowMotion.pure(
                        OperatorFormula.of(h),
                        Amplitudes.coherent(4, 0, TOLERANCE / 10),
                        new double[] {0.1},
                        TOLERANCE,
                        MEMORY)
                .state(0);
        double[] a = state.mean(A);
        // ⟨a⟩ of an error ε in a window of N levels: below 2 ε √N and what was cut off, far below
        double allowed = 3 * state.error().size() * Math.sqrt(state.first() + state.levels());
        assertEquals(1.846724430996562, Math.hypot(a[0], a[1]), allowed);
        assertEquals(1.155625742951775, a[0], allowed);
        assertTrue(state.error().isGuaranteed());
    }

    @Test
    void aDampedKerrStateFollowsItsClosedForm() {
        // S-DK-01a: H = χ n², loss κ, α = 1, χ = 1, κ = 0.2, t = 0.3; Milburn and Holmes, Phys. Rev. Lett. 56 (1986)
        // 2237
        WindowState state = mixed(
                LadderPolynomial.number().power(2),
                List.of(A.times(Math.sqrt(0.2))),
                Mixture.pure(Amplitudes.coherent(1, 0, TOLERANCE / 10)),
                0.3,
                TOLERANCE);
        assertEquals(0.54239350700974, state.mean(A)[0], state.error().size() * Math.sqrt(state.levels()) + 5e-15);
    }

    @Test
    void aCatLosesItsParityAndPurity() {
        // S-DC-01a, S-DC-01b: even cat α = 2, κt = 0.1; Walls and Milburn, Phys. Rev. A 31 (1985) 2403
        WindowState state = mixed(
                LadderPolynomial.zero(),
                List.of(A),
                Mixture.pure(HarmonicStates.cat(4, 0, 2, 0, TOLERANCE / 10)),
                0.1,
                TOLERANCE);
        double error = state.traceNormError().size();
        assertEquals(0.46761992573919, state.diagonalMean(n -> n % 2 == 0 ? 1 : -1), error);
        assertEquals(0.60933419747416, state.purity(), 2 * error);
    }

    @Test
    void lossTakesQuantaAsTheBinomialLawSays() {
        // S-TZ-03: P(3) of |5⟩ after κt = 0.4; Walls and Milburn, Quantum Optics
        WindowState state =
                mixed(LadderPolynomial.zero(), List.of(A), Mixture.pure(Amplitudes.level(5)), 0.4, TOLERANCE);
        assertEquals(
                0.327364591595040,
                state.population((int) (3 - state.first())),
                state.traceNormError().size());
    }

    @Test
    void vacuumBecomesThermal() {
        // S-TZ-02: κ = 1, n_th = 0.6, t = 0.9; Gardiner and Zoller, Quantum Noise
        WindowState state = mixed(
                LadderPolynomial.zero(),
                List.of(A.times(Math.sqrt(1.6)), LadderPolynomial.adagger().times(Math.sqrt(0.6))),
                Mixture.pure(Amplitudes.level(0)),
                0.9,
                TOLERANCE);
        assertEquals(
                0.0508401709886575, state.population(2), state.traceNormError().size());
        assertEquals(1, state.trace(), state.traceNormError().size());
    }

    @Test
    void heatAndLossKeepTheMeanOfTheirClosedForm() {
        // S-TZ-01: κ = 0.5, n_th = 3, ⟨n⟩(0) = 10, t = 2
        WindowState state = mixed(
                LadderPolynomial.zero(),
                List.of(A.times(Math.sqrt(2.0)), LadderPolynomial.adagger().times(Math.sqrt(1.5))),
                Mixture.pure(Amplitudes.coherent(10, 0.7, 1e-10)),
                2,
                1e-7);
        // the tail of heat falls by 3/4 a level: its weight times a few hundred levels
        assertEquals(
                5.575156088200096,
                state.diagonalMean(n -> n),
                400 * state.traceNormError().size());
    }

    @Test
    void aDrivenDampedKerrModeSettlesWhereTheHypergeometricSolutionIs() {
        // S-DDK-02a, S-DDK-02b: Δ = 1, U = 0.5, F = 0.8, κ = 1; Drummond and Walls, J. Phys. A 13 (1980) 725
        LadderPolynomial h = kerr(0.5).plus(LadderPolynomial.number().times(-1)).plus(drive(0.8));
        WindowState state = mixed(h, List.of(A), Mixture.pure(Amplitudes.level(0)), 90, 1e-7);
        double mean = state.diagonalMean(n -> n);
        double pairs = state.diagonalMean(n -> n * (n - 1.0));
        // the slowest part of the transient decays at about 0.2 κ: e^{−18}; the rest is the error times the levels
        double levels = state.levels();
        double error = state.traceNormError().size();
        assertEquals(1.3847927652210, mean, levels * error + 1e-7);
        assertEquals(1.2278223408365, pairs / (mean * mean), levels * levels * error + 1e-6);
    }

    private static OperatorFormula driven(String envelope) {
        return OperatorFormula.of(LadderPolynomial.number())
                .plus(OperatorFormula.of(Formula.natural(envelope, Parameters.none()), drive(1)));
    }

    /** α(t) of H = n + f(t)(a + a†) with loss κ from vacuum: −i ∫ f(s) e^{−(i + κ/2)(t − s)} ds, by Simpson's rule on a stretch. */
    private static double[] response(DoubleUnaryOperator f, double kappa, double from, double to, double t) {
        int n = 40_000;
        double h = (to - from) / n;
        double re = 0;
        double im = 0;
        for (int i = 0; i <= n; i++) {
            double s = from + i * h;
            double weight = (i == 0 || i == n ? 1 : i % 2 == 1 ? 4 : 2) * h / 3 * f.applyAsDouble(s);
            double decay = weight * Math.exp(-kappa / 2 * (t - s));
            re += -decay * Math.sin(t - s);
            im += -decay * Math.cos(t - s);
        }
        return new double[] {re, im};
    }

    @Test
    void aForceThatVariesLeavesACoherentState() {
        double[] alpha = response(s -> 0.4 * Math.sin(0.8 * s), 0, 0, 7, 7);
        WindowState state = WindowMotion.pure(
                        driven("0.4*sin(0.8*t)"), Amplitudes.level(0), new double[] {3, 7}, TOLERANCE, MEMORY)
                .state(1);
        assertPoissonian(state, alpha);
        assertEquals(Certainty.ESTIMATED, state.error().kind());
    }

    @Test
    void aPulseAndAStepAreMetUnderLossToo() {
        double[] pulse = response(s -> Math.exp(-(s - 3) * (s - 3) / (2 * 0.04)), 0.3, 0, 6, 6);
        assertPoissonian(lossy("exp(-(t - 3)^2/(2*0.04))", 6), pulse);
        double[] step = response(s -> 0.5, 0.3, 2.3, 6, 6);
        assertPoissonian(lossy("0.5*step(t - 2.3)", 6), step);
    }

    private static WindowState lossy(String envelope, double time) {
        return WindowMotion.mixed(
                        driven(envelope),
                        List.of(A.times(Math.sqrt(0.3))),
                        Mixture.pure(Amplitudes.level(0)).density(MEMORY),
                        new double[] {time},
                        1e-8,
                        MEMORY)
                .state(0);
    }

    private static void assertPoissonian(WindowState state, double[] alpha) {
        double mean = alpha[0] * alpha[0] + alpha[1] * alpha[1];
        double error = state.traceNormError().size();
        double p = Math.exp(-mean);
        for (int n = 0; n < state.levels(); n++) {
            assertEquals(p, state.population(n), error, "level " + n);
            p *= mean / (n + 1);
        }
        double[] a = state.mean(A);
        double allowed = error * Math.sqrt(state.levels());
        assertEquals(alpha[0], a[0], allowed);
        assertEquals(alpha[1], a[1], allowed);
    }

    @Test
    void normAndTraceAreKeptAndPurityStaysOneWithoutJumps() {
        LadderPolynomial h = kerr(0.2).plus(drive(1.5));
        double[] times = {0, 0.5, 1, 2};
        WindowMotion vectors =
                WindowMotion.pure(OperatorFormula.of(h), Amplitudes.coherent(4, 0, 1e-10), times, TOLERANCE, MEMORY);
        WindowMotion operators = WindowMotion.mixed(
                OperatorFormula.of(h),
                List.of(),
                Mixture.pure(Amplitudes.coherent(4, 0, 1e-10)).density(MEMORY),
                times,
                TOLERANCE,
                MEMORY);
        for (int j = 0; j < times.length; j++) {
            WindowState v = vectors.state(j);
            WindowState w = operators.state(j);
            assertEquals(1, v.trace(), v.traceNormError().size());
            assertEquals(1, w.purity(), 2 * w.traceNormError().size());
            double both = v.traceNormError().size() + w.traceNormError().size();
            for (long n = 0; n < 12; n++) {
                double p = n < v.first() ? 0 : v.population((int) (n - v.first()));
                double q = n < w.first() ? 0 : w.population((int) (n - w.first()));
                assertEquals(p, q, both, "level " + n + " at " + times[j]);
            }
        }
    }

    @Test
    void farFromTheGroundLevelTheWindowFollowsTheState() {
        // 400 quanta that decay: the window moves down with the mean, 400 e^{−κt}
        WindowMotion motion = WindowMotion.mixed(
                OperatorFormula.of(LadderPolynomial.zero()),
                List.of(A),
                Mixture.pure(Amplitudes.coherent(400, 0, 1e-7)).density(MEMORY),
                new double[] {0, 0.4},
                1e-5,
                MEMORY);
        WindowState end = motion.state(1);
        assertTrue(end.first() > 120 && end.first() + end.levels() < 420, end.first() + "+" + end.levels());
        // the state stays coherent: its Frobenius distance, below the trace norm, must lie below the bound
        Amplitudes exact = Amplitudes.coherent(400 * Math.exp(-0.4), 0, 1e-12);
        double squares = 0;
        for (int m = 0; m < end.levels(); m++) {
            for (int n = 0; n < end.levels(); n++) {
                double re = amplitude(exact, end.first() + m) * amplitude(exact, end.first() + n);
                squares += Math.pow(end.re(m, n) - re, 2) + Math.pow(end.im(m, n), 2);
            }
        }
        double bound = end.traceNormError().size();
        assertTrue(Math.sqrt(squares) <= bound, Math.sqrt(squares) + " against " + bound);
        double mean = 400 * Math.exp(-0.4);
        assertEquals(mean, end.diagonalMean(n -> n), mean * end.traceNormError().size());
    }

    private static double amplitude(Amplitudes state, long n) {
        long i = n - state.first(0);
        return i >= 0 && i < state.length(0) ? state.re(0, (int) i) : 0;
    }

    @Test
    void aStateThatEscapesIsRefusedWithAnEstimate() {
        // a cubic potential lets a state reach infinity in finite time
        LadderPolynomial cubic = LadderPolynomial.position().power(3).times(0.1);
        PhysicsException refused = assertThrows(
                PhysicsException.class,
                () -> WindowMotion.pure(
                        OperatorFormula.of(cubic), Amplitudes.level(0), new double[] {50}, TOLERANCE, MEMORY));
        assertTrue(String.valueOf(refused.getMessage()).contains("levels"), refused.getMessage());
    }

    @Test
    void aToleranceBelowRoundingIsRefused() {
        assertThrows(
                PhysicsException.NotConverged.class,
                () -> mixed(drive(1), List.of(A), Mixture.pure(Amplitudes.level(0)), 10, 1e-13));
    }

    @Test
    void anInterruptEndsARun() {
        Thread.currentThread().interrupt();
        try {
            assertThrows(
                    CancellationException.class,
                    () -> mixed(drive(1), List.of(A), Mixture.pure(Amplitudes.level(0)), 10, 1e-8));
        } finally {
            Thread.interrupted();
        }
    }
}
