package ladderwell.mode;

import static java.util.Objects.requireNonNull;

import ladderwell.formula.Amount;
import ladderwell.formula.Dimension;
import ladderwell.formula.Formula;
import ladderwell.formula.Parameters;
import ladderwell.operator.LadderPolynomial;
import ladderwell.operator.OperatorFormula;
import ladderwell.quantity.Constants;
import ladderwell.quantity.Digits;

/**
 * One term of a Hamiltonian besides ω n. Strengths are frequencies: rad/s, or plain numbers in natural units; they may be negative.
 */
public sealed interface Part {

    /** H/ħ of this part in the lab. */
    OperatorFormula inLab();

    /**
     * H/ħ of this part in the frame rotating at ω_f, without what turns fast there.
     *
     * @param frame ω_f
     * @throws IllegalArgumentException if the part has no rotating frame
     */
    OperatorFormula inFrame(double frame);

    /** What {@link #inFrame} leaves out, in words; empty if nothing. */
    String neglected(double frame);

    /** True if numbers are in natural units; a part that does not say fits both. */
    default boolean fits(boolean natural) {
        return true;
    }

    /**
     * Kerr nonlinearity (K/2) a†² a² = (K/2) n (n − 1).
     *
     * @param strength K
     */
    record Kerr(double strength) implements Part {
        /** Refuses NaN and infinities. */
        public Kerr {
            finite("the Kerr strength", strength);
        }

        @Override
        public OperatorFormula inLab() {
            return OperatorFormula.of(LadderPolynomial.term(2, 2, strength / 2, 0));
        }

        @Override
        public OperatorFormula inFrame(double frame) {
            return inLab();
        }

        @Override
        public String neglected(double frame) {
            return "";
        }
    }

    /**
     * Duffing nonlinearity g x⁴, x = (a + a†)/√2.
     *
     * @param strength g; for β x⁴ with β in J/m⁴ it is β (ħ/mω)²/ħ, see {@link #of}
     */
    record Duffing(double strength) implements Part {
        /** Refuses NaN and infinities. */
        public Duffing {
            finite("the Duffing strength", strength);
        }

        /**
         * From β of the potential m ω² x²/2 + β x⁴.
         *
         * @param beta J/m⁴
         * @param mass kg
         * @param omega rad/s
         */
        public static Duffing of(double beta, double mass, double omega) {
            double square = Constants.HBAR / (mass * omega);
            return new Duffing(beta * square / Constants.HBAR * square);
        }

        @Override
        public OperatorFormula inLab() {
            return OperatorFormula.of(LadderPolynomial.position().power(4).times(strength));
        }

        @Override
        public OperatorFormula inFrame(double frame) {
            return OperatorFormula.of(inLab().constant().diagonalPart());
        }

        @Override
        public String neglected(double frame) {
            return "the parts of the Duffing term that turn at 2 and 4 times the frame's frequency ("
                    + Digits.significant(Math.abs(1.5 * strength), 3) + " against " + Digits.significant(2 * frame, 3)
                    + " for a few quanta)";
        }
    }

    /**
     * Two-quantum (parametric) pump: G cos(ω_p t + φ) (a + a†)² in the lab, (G/2)(a†² e^{−iφ} + a² e^{iφ}) in the frame at ω_p/2.
     *
     * @param strength G
     * @param frequency ω_p
     * @param phase φ, rad
     */
    record Pump(double strength, double frequency, double phase) implements Part {
        /** Refuses NaN and infinities. */
        public Pump {
            finite("the pump strength", strength);
            finite("the pump frequency", frequency);
            finite("the pump phase", phase);
        }

        @Override
        public OperatorFormula inLab() {
            LadderPolynomial square = LadderPolynomial.a()
                    .plus(LadderPolynomial.adagger())
                    .power(2)
                    .times(strength);
            return OperatorFormula.of(turning("cos", frequency, phase, true), square);
        }

        @Override
        public OperatorFormula inFrame(double frame) {
            // a² e^{i(ω_p − 2 ω_f) t + iφ} + h.c.
            return rotating(2, strength / 2, frequency - 2 * frame, phase, true);
        }

        @Override
        public String neglected(double frame) {
            return "the parts of the pump that turn at its frequency and twice that ("
                    + Digits.significant(Math.abs(strength), 3) + " against "
                    + Digits.significant(Math.abs(frequency), 3) + ")";
        }
    }

    /**
     * Displacement drive: f(t) cos(ω_d t + φ) (a + a†) in the lab, (f(t)/2)(a† e^{−iφ} + a e^{iφ}) in the frame at ω_d.
     *
     * @param envelope f(t), a frequency; what it varies with is t alone
     * @param frequency ω_d
     * @param phase φ, rad
     */
    record Drive(Formula envelope, double frequency, double phase) implements Part {
        /** Refuses envelopes that are no frequency or depend on x, NaN and infinities. */
        public Drive {
            requireNonNull(envelope, "envelope");
            finite("the drive frequency", frequency);
            finite("the drive phase", phase);
            if (envelope.dependsOnPosition()) {
                throw new IllegalArgumentException(
                        "the envelope '" + envelope + "' of a drive depends on x; it may depend on t only");
            }
            if (!envelope.isNatural() && !envelope.dimension().equals(Dimension.RATE)) {
                throw new IllegalArgumentException("the envelope '" + envelope + "' of a drive is "
                        + envelope.dimension().word() + "; expected a frequency such as 2 MHz");
            }
        }

        @Override
        public OperatorFormula inLab() {
            LadderPolynomial both = LadderPolynomial.a().plus(LadderPolynomial.adagger());
            return OperatorFormula.of(envelope, LadderPolynomial.constant(1, 0))
                    .times(OperatorFormula.of(turning("cos", frequency, phase, envelope.isNatural()), both));
        }

        @Override
        public OperatorFormula inFrame(double frame) {
            return OperatorFormula.of(envelope, LadderPolynomial.constant(1, 0))
                    .times(rotating(1, 0.5, frequency - frame, phase, envelope.isNatural()));
        }

        @Override
        public boolean fits(boolean natural) {
            return envelope.isNatural() == natural;
        }

        @Override
        public String neglected(double frame) {
            return "the part of the drive that turns at " + Digits.significant(Math.abs(frequency + frame), 3)
                    + " (it counts as long as the envelope is far below that and slow)";
        }
    }

    /**
     * A frequency that varies: (ω(t)² − ω²)/(2ω) x² beside ω n, so that the whole is p²/2m + m ω(t)² x²/2.
     *
     * @param path ω(t)
     * @param reference ω of the mode, above 0
     */
    record FrequencyPath(Formula path, double reference) implements Part {
        /** Refuses paths that are no frequency or depend on x, and reference frequencies that are not above 0. */
        public FrequencyPath {
            requireNonNull(path, "path");
            if (!(reference > 0) || Double.isInfinite(reference)) {
                throw new IllegalArgumentException(
                        "a frequency that varies needs a reference frequency above 0, got " + reference);
            }
            if (path.dependsOnPosition()) {
                throw new IllegalArgumentException(
                        "the frequency '" + path + "' depends on x; it may depend on t only");
            }
            if (!path.isNatural() && !path.dimension().equals(Dimension.RATE)) {
                throw new IllegalArgumentException(
                        "the frequency '" + path + "' is " + path.dimension().word() + "; expected one such as 2 MHz");
            }
        }

        @Override
        public OperatorFormula inLab() {
            LadderPolynomial square = LadderPolynomial.position().power(2);
            return OperatorFormula.of(path.times(path), square.times(0.5 / reference))
                    .plus(OperatorFormula.of(square.times(-0.5 * reference)));
        }

        @Override
        public OperatorFormula inFrame(double frame) {
            throw new IllegalArgumentException(
                    "a frequency that varies is followed in the lab; it has no rotating frame here");
        }

        @Override
        public boolean fits(boolean natural) {
            return path.isNatural() == natural;
        }

        @Override
        public String neglected(double frame) {
            return "";
        }
    }

    /**
     * A Hamiltonian given by its formula, taken as it stands: in whatever frame it is meant.
     *
     * @param hamiltonian Hermitian
     */
    record Given(OperatorFormula hamiltonian) implements Part {
        /** Refuses what is not Hermitian. */
        public Given {
            hamiltonian.hermiticityBreak().ifPresent(broken -> {
                throw new IllegalArgumentException("the Hamiltonian '" + hamiltonian + "' is not Hermitian: " + broken);
            });
        }

        @Override
        public OperatorFormula inLab() {
            return hamiltonian;
        }

        @Override
        public OperatorFormula inFrame(double frame) {
            return hamiltonian;
        }

        @Override
        public boolean fits(boolean natural) {
            return hamiltonian.terms().stream().allMatch(term -> term.factor().isNatural() == natural);
        }

        @Override
        public String neglected(double frame) {
            return "";
        }
    }

    private static void finite(String what, double value) {
        if (!Double.isFinite(value)) {
            throw new IllegalArgumentException(what + " must be a finite number, not " + value);
        }
    }

    /** strength (a^k e^{i(ωt + φ)} + h.c.), factors in lab and natural units alike. */
    private static OperatorFormula rotating(int k, double strength, double omega, double phase, boolean natural) {
        LadderPolynomial lowering = LadderPolynomial.term(0, k, strength, 0);
        LadderPolynomial even = lowering.plus(lowering.adjoint());
        LadderPolynomial odd = lowering.times(0, 1);
        odd = odd.plus(odd.adjoint());
        if (omega == 0) {
            return OperatorFormula.of(even.times(Math.cos(phase)).plus(odd.times(Math.sin(phase))));
        }
        return OperatorFormula.of(turning("cos", omega, phase, natural), even)
                .plus(OperatorFormula.of(turning("sin", omega, phase, natural), odd));
    }

    /** cos or sin of ω t + φ. */
    private static Formula turning(String function, double omega, double phase, boolean natural) {
        String text = function + "(omega*t" + (phase == 0 ? "" : " + phi") + ")";
        Parameters parameters = Parameters.none()
                .with("omega", natural ? Amount.number(omega) : new Amount(omega, Dimension.RATE))
                .with("phi", Amount.number(phase));
        return natural ? Formula.natural(text, parameters) : Formula.lab(text, parameters, Dimension.NONE);
    }
}
