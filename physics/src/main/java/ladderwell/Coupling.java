package ladderwell;

import java.util.Locale;
import java.util.Optional;
import ladderwell.formula.Formula;
import ladderwell.formula.Parameters;

/**
 * What couples two levels: the position, the momentum, or any function of the position.
 *
 * @param name the name in words, or the function as it was typed
 * @param symbol how the trade writes it between ⟨m| and |n⟩
 * @param parameters the parameters of the function
 */
public record Coupling(String name, String symbol, Parameters parameters) {
    /** x: dipole transitions. */
    public static final Coupling POSITION = new Coupling("position", "x", Parameters.none());

    /** p. */
    public static final Coupling MOMENTUM = new Coupling("momentum", "p", Parameters.none());

    /** A function of x such as "x^3" or "cos(k*x)", in lab units where the oscillator is. */
    public static Coupling function(String text, Parameters parameters) {
        String stripped = text.strip();
        if (stripped.isEmpty()) {
            throw new IllegalArgumentException("a coupling is position, momentum or a function of x such as x^2");
        }
        return stripped.equals("x") ? POSITION : new Coupling(stripped, stripped, parameters);
    }

    /** A function of x without parameters. */
    public static Coupling function(String text) {
        return function(text, Parameters.none());
    }

    /** The coupling of that name: "position" or "momentum". */
    public static Optional<Coupling> named(String name) {
        return switch (name.strip().toLowerCase(Locale.ROOT)) {
            case "position" -> Optional.of(POSITION);
            case "momentum" -> Optional.of(MOMENTUM);
            default -> Optional.empty();
        };
    }

    /** The function as read, for one of lab or natural units. */
    Formula formula(boolean natural) {
        Formula formula = natural ? Formula.natural(name, parameters) : Formula.lab(name, parameters);
        if (formula.dependsOnTime()) {
            throw new IllegalArgumentException(
                    "'" + name + "' depends on time; elements between levels are of a function of x alone");
        }
        return formula;
    }
}
