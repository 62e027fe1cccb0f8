package ladderwell.mode;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import ladderwell.formula.Formula;
import ladderwell.formula.Parameters;
import ladderwell.operator.LadderPolynomial;
import ladderwell.operator.OperatorFormula;
import ladderwell.quantity.Constants;
import ladderwell.quantity.Quantity;
import ladderwell.quantity.Units;
import org.junit.jupiter.api.Test;

class ModeTest {
    private static final LadderPolynomial A = LadderPolynomial.a();
    private static final LadderPolynomial N = LadderPolynomial.number();

    private static LadderPolynomial formula(String text) {
        return OperatorFormula.naturalHamiltonian(text, Parameters.none()).constant();
    }

    private static void assertSame(LadderPolynomial expected, LadderPolynomial actual) {
        // a few roundings of sums of products
        assertTrue(
                actual.minus(expected).norm() <= 1e-14 * expected.norm(),
                () -> "expected " + expected + ", got " + actual);
    }

    private static Quantity quantity(double value, String unit) {
        return Quantity.of(value, Units.parse(unit).orElseThrow());
    }

    @Test
    void aDrivenKerrModeIsTheSameInBothFramesUpToWhatTurnsFast() {
        Formula envelope = Formula.natural("0.02*(1 - exp(-t))", Parameters.none());
        Mode lab = Mode.natural(1).with(new Part.Kerr(0.01)).with(new Part.Drive(envelope, 0.9, 0.3));
        double t = 2.7;
        double f = 0.02 * (1 - Math.exp(-t));
        assertSame(
                N.plus(LadderPolynomial.term(2, 2, 0.005, 0))
                        .plus(A.plus(A.adjoint()).times(f * Math.cos(0.9 * t + 0.3))),
                lab.hamiltonian().at(t));
        Mode turning = lab.rotating(0.9);
        LadderPolynomial h = turning.hamiltonian().at(t);
        assertEquals(0.1, h.re(1, 1), 1e-15);
        assertEquals(0.005, h.re(2, 2));
        assertEquals(f / 2 * Math.cos(0.3), h.re(0, 1), 1e-16);
        assertEquals(f / 2 * Math.sin(0.3), h.im(0, 1), 1e-16);
        assertEquals(1, turning.neglected().size());
        assertTrue(turning.neglected().get(0).startsWith("the part of the drive that turns at 1.8"));
        assertTrue(lab.neglected().isEmpty());
    }

    @Test
    void theRotatingFrameKeepsTheSlowPartsOfTheLab() {
        // averaged over a turn of the frame, U(t) H U(t)† − ω n with a → a e^{−iω_f t} is the Hamiltonian of the frame
        Formula envelope = Formula.natural("0.3", Parameters.none());
        Mode lab = Mode.natural(1.1)
                .with(new Part.Duffing(0.05))
                .with(new Part.Pump(0.2, 2, 0.4))
                .with(new Part.Drive(envelope, 1, -0.2));
        LadderPolynomial average = LadderPolynomial.zero();
        int steps = 64;
        for (int i = 0; i < steps; i++) {
            double t = 2 * Math.PI * i / steps;
            average = average.plus(lab.hamiltonian()
                    .at(t)
                    .mixed(Math.cos(t), -Math.sin(t), 0, 0)
                    .times(1.0 / steps));
        }
        average = average.minus(N);
        LadderPolynomial gap = average.minus(lab.rotating(1).hamiltonian().at(0.7));
        assertTrue(gap.norm() < 1e-14, gap::toString);
        assertEquals(3, lab.rotating(1).neglected().size());
    }

    @Test
    void twoDrivesOfDifferentFrequencyStayApart() {
        Formula one = Formula.natural("1", Parameters.none());
        Mode mode = Mode.natural(0).with(new Part.Drive(one, 2, 0)).with(new Part.Drive(one, 3, 0));
        double t = 0.4;
        assertEquals(Math.cos(2 * t) + Math.cos(3 * t), mode.hamiltonian().at(t).re(0, 1), 1e-15);
        assertEquals(2, mode.hamiltonian().terms().size());
    }

    @Test
    void aFrequencyThatVariesIsTheOscillatorOfThatFrequency() {
        Formula path = Formula.natural("1 + t", Parameters.none());
        Mode mode = Mode.natural(1).with(new Part.FrequencyPath(path, 1));
        // p²/2 + ω² x²/2 up to the ground energy of ω n
        assertSame(formula("p^2/2 + 9*x^2/2 - 1/2"), mode.hamiltonian().at(2));
        assertThrows(IllegalArgumentException.class, () -> mode.rotating(1));
    }

    @Test
    void labUnitsCountTwoPiForHertz() {
        Formula envelope = Formula.lab("2 MHz", Parameters.none());
        double omega = 2 * Math.PI * 5e9;
        Mode mode = Mode.lab(omega).with(new Part.Drive(envelope, omega, 0)).rotating(omega);
        assertEquals(2 * Math.PI * 1e6, mode.hamiltonian().at(0).re(0, 1), 1e-8);
        assertThrows(IllegalArgumentException.class, () -> Mode.natural(1).with(new Part.Drive(envelope, omega, 0)));
        IllegalArgumentException unit = assertThrows(
                IllegalArgumentException.class, () -> new Part.Drive(Formula.lab("2", Parameters.none()), 1, 0));
        assertEquals(
                "the envelope '2' of a drive is a plain number; expected a frequency such as 2 MHz", unit.getMessage());
        // β x⁴ = 1 feV at the zero-point length
        double mass = 40 * Constants.ATOMIC_MASS_CONSTANT;
        double length = Math.sqrt(Constants.HBAR / (mass * omega));
        double beta = 1e-15 * Constants.ELEMENTARY_CHARGE / Math.pow(length, 4);
        double expected = 1e-15 * Constants.ELEMENTARY_CHARGE / Constants.HBAR;
        assertEquals(expected, Part.Duffing.of(beta, mass, omega).strength(), 1e-14 * expected);
    }

    @Test
    void ratesComeInManyUnits() {
        assertEquals(3e4, Rate.of(quantity(3e4, "/s")).perSecond());
        assertEquals(3e4, Rate.of(quantity(3e4, "rad/s")).perSecond());
        assertEquals(2 * Math.PI * 2e4, Rate.of(quantity(20, "kHz")).perSecond(), 1e-10);
        assertEquals(1 / 8e-6, Rate.of(quantity(8, "us")).perSecond(), 1e-9);
        assertEquals(2 * Math.PI, Rate.quality(1e6, 2 * Math.PI * 1e6).perSecond(), 1e-15);
        assertEquals(
                "the rate 3 has no unit; expected one such as 20 kHz (a linewidth, counts 2π), 1e5 /s or 8 us (a lifetime)",
                assertThrows(IllegalArgumentException.class, () -> Rate.of(Quantity.number(3)))
                        .getMessage());
        assertEquals(
                "the rate -2 kHz is negative; a rate is 0 or more, and what adds quanta is a gain",
                assertThrows(IllegalArgumentException.class, () -> Rate.of(quantity(-2, "kHz")))
                        .getMessage());
        assertEquals(
                "'2 nm' is a length and no rate; expected one such as 20 kHz (a linewidth, counts 2π), 1e5 /s or 8 us (a lifetime)",
                assertThrows(IllegalArgumentException.class, () -> Rate.of(quantity(2, "nm")))
                        .getMessage());
        assertThrows(IllegalArgumentException.class, () -> Rate.of(quantity(0, "us")));
        assertThrows(IllegalArgumentException.class, () -> Rate.quality(0, 1));
        assertThrows(IllegalArgumentException.class, () -> Rate.quality(1e4, 0));
        assertThrows(IllegalArgumentException.class, () -> Rate.natural(Double.NaN));
    }

    @Test
    void bathsAreLossAndGain() {
        List<Jump> bath = Jump.bath(Rate.natural(0.5), 3);
        assertEquals(2, bath.size());
        assertEquals(2, bath.get(0).rate().perSecond());
        assertEquals(A, bath.get(0).operator());
        assertEquals(1.5, bath.get(1).rate().perSecond());
        assertEquals(A.adjoint(), bath.get(1).operator());
        assertEquals(1, Jump.bath(Rate.natural(0.5), 0).size());
        assertEquals(
                "a bath of 0.2 quanta heats only through a loss, and the loss is 0; give a rate of loss, or a gain of its own",
                assertThrows(IllegalArgumentException.class, () -> Jump.bath(Rate.natural(0), 0.2))
                        .getMessage());
        assertThrows(IllegalArgumentException.class, () -> Jump.bath(Rate.natural(1), -0.1));
        // kT = ħω
        double omega = 1e9;
        double temperature = Constants.HBAR * omega / Constants.BOLTZMANN;
        assertEquals(1 / (Math.E - 1), Jump.thermalQuanta(omega, temperature), 1e-15);
        assertEquals(0, Jump.thermalQuanta(omega, 0));
        assertSame(A.times(2), Jump.loss(Rate.natural(4)).scaledOperator());
    }

    @Test
    void jumpsAreReadFromFormulas() {
        Jump jump = Jump.of(OperatorFormula.naturalOperator("a^2 - 4", Parameters.none()), Rate.natural(1));
        assertEquals(-4, jump.operator().re(0, 0));
        assertThrows(
                IllegalArgumentException.class,
                () -> Jump.of(OperatorFormula.naturalOperator("cos(t)*a", Parameters.none()), Rate.natural(1)));
        assertThrows(
                IllegalArgumentException.class,
                () -> Jump.of(OperatorFormula.naturalOperator("3", Parameters.none()), Rate.natural(1)));
        // a² − 4 turns at two rates
        assertThrows(
                IllegalArgumentException.class, () -> Mode.natural(1).with(jump).rotating(1));
        assertEquals(
                1,
                Mode.natural(1)
                        .with(Jump.pairLoss(Rate.natural(1)))
                        .rotating(1)
                        .jumps()
                        .size());
    }

    @Test
    void runawayPumpsAreDetectedAndSaid() {
        Mode mode = Mode.natural(1)
                .with(new Part.Pump(0.6, 2, 0))
                .with(Jump.loss(Rate.natural(0.4)))
                .rotating(1);
        // (G/2)(a² + a†²): ⟨a⟩ grows at G − κ/2
        assertEquals(0.4, mode.runaway(0).orElseThrow(), 1e-15);
        assertEquals(
                "the mode runs away: ⟨a⟩ grows at 0.4 and nothing stops it; more loss, more detuning or a Kerr term would",
                mode.runawayWarning(0).orElseThrow());
        assertTrue(mode.with(new Part.Kerr(0.1)).runaway(0).isEmpty());
        assertTrue(mode.with(Jump.pairLoss(Rate.natural(0.1))).runaway(0).isEmpty());
        assertTrue(mode.with(Jump.loss(Rate.natural(0.9))).runaway(0).isEmpty());
        // detuned by Δ: √(G² − Δ²) − κ/2
        Mode detuned = new Mode(1.5, true, mode.frame(), mode.parts(), mode.jumps());
        assertEquals(Math.sqrt(0.36 - 0.25) - 0.2, detuned.runaway(0).orElseThrow(), 1e-15);
        assertEquals(
                0.05,
                Mode.natural(1).with(Jump.gain(Rate.natural(0.1))).runaway(0).orElseThrow());
        assertTrue(mode.isGaussian());
        assertFalse(mode.with(new Part.Kerr(0.1)).isGaussian());
        assertFalse(mode.with(Jump.dephasing(Rate.natural(0.1))).isGaussian());
    }

    @Test
    void hamiltoniansThatLetStatesEscapeAreRefused() {
        IllegalArgumentException cubic = assertThrows(
                IllegalArgumentException.class,
                () -> Mode.natural(1)
                        .with(new Part.Given(OperatorFormula.naturalHamiltonian("0.1*x^3", Parameters.none()))));
        assertEquals(
                "the Hamiltonian is bounded neither below nor above and lets states escape in finite time: its highest"
                        + " power, 3, is odd, so it falls without end in one direction; add a term of a higher even degree,"
                        + " or use a potential with a wall",
                cubic.getMessage());
        assertThrows(IllegalArgumentException.class, () -> Mode.natural(1).with(new Part.Duffing(-0.1)));
        // a negative Kerr term is bounded above: its levels are those of −H
        assertEquals(1, Mode.natural(1).with(new Part.Kerr(-0.1)).parts().size());
        assertThrows(
                IllegalArgumentException.class,
                () -> new Part.Given(OperatorFormula.naturalOperator("a", Parameters.none())));
        assertThrows(IllegalArgumentException.class, () -> new Part.Kerr(Double.NaN));
    }
}
