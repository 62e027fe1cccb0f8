package ladderwell.gaussian;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.SplittableRandom;
import ladderwell.state.Amplitudes;
import ladderwell.state.DensityOperator;
import ladderwell.state.HarmonicStates;
import ladderwell.state.Mixture;
import org.junit.jupiter.api.Test;

/** The same states as mean and covariance and as amplitudes on levels: two routes, one physics. */
class GaussianAgainstNumbersTest {
    /** Norm error of the amplitudes, times what each observable makes of it for at most some 100 quanta. */
    private static final double STATE = 1e-13;

    private static double probability(Amplitudes state, int i) {
        return state.re(0, i) * state.re(0, i) + state.im(0, i) * state.im(0, i);
    }

    @Test
    void pureStatesHaveTheSameReadings() {
        SplittableRandom random = new SplittableRandom(31);
        for (int trial = 0; trial < 40; trial++) {
            double mean = random.nextDouble(0, 12);
            double phase = random.nextDouble(-3, 3);
            double r = random.nextDouble(0, 1.2);
            double phi = random.nextDouble(-3, 3);
            boolean squeezedLast = random.nextBoolean();
            double re = Math.sqrt(mean) * Math.cos(phase);
            double im = Math.sqrt(mean) * Math.sin(phase);
            GaussianState gaussian = squeezedLast
                    ? GaussianState.coherent(re, im).squeezed(r, phi)
                    : GaussianState.vacuum().squeezed(r, phi).displaced(re, im);
            Amplitudes state = squeezedLast
                    ? HarmonicStates.squeezedDisplaced(mean, phase, r, phi, STATE)
                    : HarmonicStates.displacedSqueezed(mean, phase, r, phi, STATE);
            double quanta = 0;
            double square = 0;
            double parity = 0;
            double aRe = 0;
            double aIm = 0;
            double a2Re = 0;
            double a2Im = 0;
            for (int i = 0; i < state.length(0); i++) {
                double n = state.first(0) + i;
                double p = probability(state, i);
                quanta += n * p;
                square += n * n * p;
                parity += (n % 2 == 0 ? 1 : -1) * p;
                for (int k = 1; k <= 2 && i + k < state.length(0); k++) {
                    double root = k == 1 ? Math.sqrt(n + 1) : Math.sqrt((n + 1) * (n + 2));
                    double x = root * (state.re(0, i) * state.re(0, i + k) + state.im(0, i) * state.im(0, i + k));
                    double y = root * (state.re(0, i) * state.im(0, i + k) - state.im(0, i) * state.re(0, i + k));
                    if (k == 1) {
                        aRe += x;
                        aIm += y;
                    } else {
                        a2Re += x;
                        a2Im += y;
                    }
                }
            }
            GaussianPoint point = gaussian.known();
            double scale = 100 * (1 + quanta);
            assertEquals(gaussian.x(), Math.sqrt(2) * aRe, STATE * scale);
            assertEquals(gaussian.p(), Math.sqrt(2) * aIm, STATE * scale);
            // x² = (a² + a†² + 2n + 1)/2, p² with the opposite sign, (xp + px)/2 = Im a²
            assertEquals(gaussian.xx() + gaussian.x() * gaussian.x(), a2Re + quanta + 0.5, STATE * scale);
            assertEquals(gaussian.pp() + gaussian.p() * gaussian.p(), -a2Re + quanta + 0.5, STATE * scale);
            assertEquals(gaussian.xp() + gaussian.x() * gaussian.p(), a2Im, STATE * scale);
            assertEquals(
                    point.quanta().value(),
                    quanta,
                    STATE * scale + point.quanta().bound().size());
            assertEquals(
                    point.quantaVariance().value(),
                    square - quanta * quanta,
                    STATE * scale * scale + point.quantaVariance().bound().size());
            assertEquals(
                    point.parity().value(),
                    parity,
                    4 * STATE + point.parity().bound().size());
            // fidelity with a coherent state of three quanta
            Amplitudes coherent = Amplitudes.coherent(3, 0.5, STATE);
            double fRe = 0;
            double fIm = 0;
            for (int i = 0; i < coherent.length(0); i++) {
                int j = (int) (coherent.first(0) + i - state.first(0));
                if (j >= 0 && j < state.length(0)) {
                    fRe += coherent.re(0, i) * state.re(0, j) + coherent.im(0, i) * state.im(0, j);
                    fIm += coherent.re(0, i) * state.im(0, j) - coherent.im(0, i) * state.re(0, j);
                }
            }
            Measured fidelity =
                    point.fidelity(GaussianState.coherent(Math.sqrt(3) * Math.cos(0.5), Math.sqrt(3) * Math.sin(0.5)));
            assertEquals(
                    fidelity.value(),
                    fRe * fRe + fIm * fIm,
                    8 * STATE + fidelity.bound().size());
        }
    }

    @Test
    void displacedHeatHasTheSameReadings() {
        double heat = 1.3;
        GaussianPoint point = GaussianState.thermal(heat).displaced(1.1, -0.6).known();
        double mean = 1.1 * 1.1 + 0.6 * 0.6;
        DensityOperator rho = Mixture.displacedThermal(heat, mean, Math.atan2(-0.6, 1.1), 1e-12)
                .density(1e9);
        double quanta = 0;
        double square = 0;
        double parity = 0;
        for (int m = 0; m < rho.size(); m++) {
            double n = rho.first() + m;
            quanta += n * rho.re(m, m);
            square += n * n * rho.re(m, m);
            parity += (n % 2 == 0 ? 1 : -1) * rho.re(m, m);
        }
        assertEquals(point.quanta().value(), quanta, 1e-10);
        assertEquals(point.quantaVariance().value(), square - quanta * quanta, 1e-8);
        assertEquals(
                point.parity().value(),
                parity,
                rho.traceNormError() + point.parity().bound().size());
        assertEquals(point.purity().value(), rho.purity(), 2 * rho.traceNormError() + 1e-15);
        // fidelity with a pure state is ⟨ψ|ρ|ψ⟩
        Amplitudes psi = HarmonicStates.displacedSqueezed(0.5, 0, 0.6, 1.2, 1e-12);
        double value = 0;
        for (int m = 0; m < rho.size(); m++) {
            for (int n = 0; n < rho.size(); n++) {
                int i = (int) (rho.first() + m - psi.first(0));
                int j = (int) (rho.first() + n - psi.first(0));
                if (Math.min(i, j) >= 0 && Math.max(i, j) < psi.length(0)) {
                    double re = psi.re(0, i) * psi.re(0, j) + psi.im(0, i) * psi.im(0, j);
                    double im = psi.re(0, i) * psi.im(0, j) - psi.im(0, i) * psi.re(0, j);
                    value += re * rho.re(m, n) - im * rho.im(m, n);
                }
            }
        }
        Measured fidelity =
                point.fidelity(GaussianState.vacuum().squeezed(0.6, 1.2).displaced(Math.sqrt(0.5), 0));
        assertEquals(fidelity.value(), value, 1e-11 + fidelity.bound().size());
    }
}
