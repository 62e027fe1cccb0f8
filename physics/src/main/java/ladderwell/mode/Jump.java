package ladderwell.mode;

import static java.util.Objects.requireNonNull;

import java.util.ArrayList;
import java.util.List;
import ladderwell.operator.LadderPolynomial;
import ladderwell.operator.OperatorFormula;
import ladderwell.quantity.Constants;
import ladderwell.quantity.Digits;

/**
 * A jump operator with its rate.
 *
 * @param name what it is in the trade's words: "loss"
 * @param operator L, without a unit
 * @param rate γ
 */
public record Jump(String name, LadderPolynomial operator, Rate rate) {

    /** Refuses nulls and jumps that do nothing whatever their rate. */
    public Jump {
        requireNonNull(name, "name");
        requireNonNull(operator, "operator");
        requireNonNull(rate, "rate");
        if (operator.degree() == 0) {
            throw new IllegalArgumentException(
                    "the jump operator " + operator + " is a number and changes nothing; expected one such as a");
        }
    }

    /** Loss of single quanta, L = a: ⟨n⟩ decays at the rate, ⟨a⟩ at half of it. */
    public static Jump loss(Rate rate) {
        return new Jump("loss", LadderPolynomial.a(), rate);
    }

    /** Gain of single quanta, L = a†. */
    public static Jump gain(Rate rate) {
        return new Jump("gain", LadderPolynomial.adagger(), rate);
    }

    /** Dephasing, L = n: the coherence of |m⟩ and |n⟩ decays at γ (m − n)²/2. */
    public static Jump dephasing(Rate rate) {
        return new Jump("dephasing", LadderPolynomial.number(), rate);
    }

    /** Loss of pairs of quanta, L = a². */
    public static Jump pairLoss(Rate rate) {
        return new Jump("two-quantum loss", LadderPolynomial.a().power(2), rate);
    }

    /**
     * A thermal bath: loss at κ (n_th + 1) and gain at κ n_th; ⟨n⟩ goes to n_th at the rate κ.
     *
     * @param kappa κ
     * @param quanta n_th, mean quanta of the bath
     * @throws IllegalArgumentException if n_th is negative, or above 0 while κ is 0
     */
    public static List<Jump> bath(Rate kappa, double quanta) {
        if (!(quanta >= 0) || Double.isInfinite(quanta)) {
            throw new IllegalArgumentException("the mean quanta of a bath must be finite and 0 or more, got " + quanta);
        }
        if (quanta > 0 && kappa.perSecond() == 0) {
            throw new IllegalArgumentException(
                    "a bath of " + Digits.shortest(quanta)
                            + " quanta heats only through a loss, and the loss is 0; give a rate of loss, or a gain of its own");
        }
        List<Jump> both = new ArrayList<>();
        both.add(loss(kappa.times(quanta + 1, quanta == 0 ? "" : " × " + Digits.shortest(quanta + 1))));
        if (quanta > 0) {
            both.add(gain(kappa.times(quanta, " × " + Digits.shortest(quanta))));
        }
        return List.copyOf(both);
    }

    /**
     * Mean quanta at a temperature, 1/(e^{ħω/kT} − 1).
     *
     * @param omega rad/s, above 0
     * @param temperature K, at least 0
     */
    public static double thermalQuanta(double omega, double temperature) {
        if (!(omega > 0) || Double.isInfinite(omega)) {
            throw new IllegalArgumentException(
                    "a temperature gives mean quanta only beside a frequency above 0, got " + omega);
        }
        if (!(temperature >= 0) || Double.isInfinite(temperature)) {
            throw new IllegalArgumentException("a temperature is finite and 0 or more, got " + temperature);
        }
        return temperature == 0 ? 0 : 1 / Math.expm1(Constants.HBAR * omega / (Constants.BOLTZMANN * temperature));
    }

    /**
     * Any polynomial as jump operator.
     *
     * @throws IllegalArgumentException if the operator varies with time
     */
    public static Jump of(OperatorFormula operator, Rate rate) {
        if (operator.dependsOnTime()) {
            throw new IllegalArgumentException(
                    "the jump operator '" + operator + "' varies with time; put what varies into the Hamiltonian");
        }
        return new Jump("jump " + operator.text(), operator.constant(), rate);
    }

    /** √γ L, whose square adds up to the rate. */
    public LadderPolynomial scaledOperator() {
        return operator.times(Math.sqrt(rate.perSecond()));
    }

    /** True for u a + v a† + w: such jumps keep Gaussian states Gaussian. */
    public boolean isLinear() {
        return operator.degree() == 1;
    }
}
