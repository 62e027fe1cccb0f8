package ladderwell.kernel.magic;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertTrue;

import ladderwell.LadderMode;
import ladderwell.Observable;
import ladderwell.Run;
import ladderwell.Series;
import ladderwell.kernel.cell.SentenceFailure;
import ladderwell.mode.Jump;
import org.junit.jupiter.api.Test;
import tech.tablesaw.api.Table;

/** Modes declared in sentences. */
class ModeSentencesTest {
    private static final double TWO_PI = 2 * Math.PI;

    private final Bench bench = new Bench();

    private LadderMode mode(String name) {
        return assertInstanceOf(LadderMode.class, bench.value(name));
    }

    private static double rate(LadderMode mode, String jump) {
        return mode.mode().jumps().stream()
                .filter(one -> one.name().equals(jump))
                .mapToDouble(one -> one.rate().perSecond())
                .sum();
    }

    @Test
    void ratesCountAsLinewidthLifetimeAndQuality() throws SentenceFailure {
        bench.run("""
                %%declare
                oscillator w: kerr, frequency 5 GHz, kerr -200 kHz, loss 10 kHz, thermal 0.5
                oscillator t: kerr, frequency 5 GHz, kerr -200 kHz, loss 20 us
                oscillator q: kerr, frequency 5 GHz, kerr -200 kHz, quality 1e6, temperature 100 mK
                oscillator r: duffing, natural, strength 0.1, loss 0.2, dephasing 0.03, pair loss 0.01, gain 0.05
                """);
        assertEquals(TWO_PI * 1e4 * 1.5, rate(mode("w"), "loss"), 1e-6);
        assertEquals(TWO_PI * 1e4 * 0.5, rate(mode("w"), "gain"), 1e-6);
        assertEquals(5e4, rate(mode("t"), "loss"), 1e-6);
        double quanta = Jump.thermalQuanta(TWO_PI * 5e9, 0.1);
        assertEquals(TWO_PI * 5e9 / 1e6 * (quanta + 1), rate(mode("q"), "loss"), 1e-3);
        assertEquals(4, mode("r").mode().jumps().size());
    }

    @Test
    void theFrameIsThatOfTheDriveAndIsNamed() throws SentenceFailure {
        bench.run("""
                %%declare
                oscillator d: kerr, frequency 5.1 GHz, kerr -210 kHz, loss 12 kHz, drive 80 kHz at 5.09 GHz, phase 90 deg
                oscillator p: kerr, frequency 5 GHz, kerr -200 kHz, loss 3 MHz, parametric 100 kHz
                oscillator l: kerr, frequency 5 GHz, kerr -200 kHz, loss 3 MHz, frame 0 Hz
                """);
        assertEquals(TWO_PI * 5.09e9, mode("d").mode().frame().frequency(), 1);
        assertTrue(mode("d").formula().contains("left out"), mode("d").formula());
        assertEquals(TWO_PI * 5e9, mode("p").mode().frame().frequency(), 1);
        assertTrue(mode("l").mode().frame().isLab());
    }

    @Test
    void aLossyModeIsDeclaredEvolvedTabulatedAndPlanned() throws SentenceFailure {
        bench.run("""
                %%declare
                oscillator m: hamiltonian "d*n + f*(a + a†)", d 0 Hz, f 100 kHz, loss 1 us
                state v: number in m, level 0
                plan v for 8 us
                evolve run: v for 8 us, frames 8, tolerance 1e-8
                table run: mean quanta, purity, population of 0
                """);
        Run run = assertInstanceOf(Run.class, bench.value("run"));
        assertTrue(run.method().contains("density operator"), run.method());
        // α(t) = −2i f/κ (1 − e^{−κt/2}) with f = 2π·1e5, κ = 1e6: a coherent state all along
        Series quanta = run.series(Observable.MEAN_QUANTA);
        double alpha = 2 * TWO_PI * 1e5 / 1e6 * (1 - Math.exp(-4));
        assertEquals(alpha * alpha, quanta.value(8), quanta.error(8));
        Table plan = (Table) bench.emitted.stream()
                .filter(one -> one instanceof Table)
                .findFirst()
                .orElseThrow();
        assertEquals(run.method(), plan.getString(0, 1));
    }

    @Test
    void aDriveThatVariesStandsInTheFormula() throws SentenceFailure {
        bench.run("""
                %%declare
                oscillator m: hamiltonian "w*n + f*cos(wd*t)*(a + ad)", w 1 MHz, wd 1 MHz, f 50 kHz
                state v: coherent in m, mean 1
                evolve run: v for 2 us, frames 4
                """);
        assertTrue(mode("m").moves());
        Run run = assertInstanceOf(Run.class, bench.value("run"));
        assertTrue(run.method().startsWith("Taylor"), run.method());
    }
}
