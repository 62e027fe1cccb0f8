package ladderwell;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import ladderwell.quantity.Kind;

/**
 * What can be read from a run, by the name that sentences use too. The constants are meant for static import:
 * {@code run.table(POSITION, SPREAD_OF_POSITION, population(3))}.
 *
 * @param name the name in words
 * @param symbol how the trade writes it
 * @param kind its physical kind; {@link Kind#NUMBER} for a plain number
 * @param meaning one line that says what it is
 * @param level the level for a population, −1 otherwise
 */
public record Observable(String name, String symbol, Kind kind, String meaning, long level) {

    public static final Observable POSITION = of("position", "⟨x⟩", Kind.LENGTH, "mean position");
    public static final Observable MOMENTUM = of("momentum", "⟨p⟩", Kind.MOMENTUM, "mean momentum");
    public static final Observable SPREAD_OF_POSITION =
            of("spread of position", "Δx", Kind.LENGTH, "standard deviation of the position");
    public static final Observable SPREAD_OF_MOMENTUM =
            of("spread of momentum", "Δp", Kind.MOMENTUM, "standard deviation of the momentum");
    public static final Observable UNCERTAINTY_PRODUCT =
            of("uncertainty product", "2ΔxΔp/ħ", Kind.NUMBER, "Δx Δp in units of ħ/2; 1 is the least possible");
    public static final Observable SPREAD_OVER_SWING = of(
            "spread over swing",
            "Δx/A",
            Kind.NUMBER,
            "Δx over the turning point A of the mean motion; 1/(2√n̄) for a coherent state (harmonic only)");
    public static final Observable ENERGY =
            of("energy", "⟨E⟩", Kind.ENERGY, "mean energy above the bottom of the well");
    public static final Observable MEAN_QUANTA =
            of("mean quanta", "⟨n⟩", Kind.NUMBER, "mean number of quanta (harmonic only)");
    public static final Observable VARIANCE_OF_QUANTA =
            of("variance of quanta", "Var n", Kind.NUMBER, "variance of the number of quanta (harmonic only)");
    public static final Observable MANDEL_Q =
            of("Mandel Q", "Q", Kind.NUMBER, "(Var n − ⟨n⟩)/⟨n⟩: 0 Poissonian, −1 a number state (harmonic only)");
    public static final Observable RETURN_PROBABILITY =
            of("return probability", "|⟨ψ(0)|ψ(t)⟩|²", Kind.NUMBER, "probability to find the initial state again");
    public static final Observable RETURN_AMPLITUDE_REAL =
            of("return amplitude, real part", "Re⟨ψ(0)|ψ(t)⟩", Kind.NUMBER, "overlap with the initial state");
    public static final Observable RETURN_AMPLITUDE_IMAGINARY =
            of("return amplitude, imaginary part", "Im⟨ψ(0)|ψ(t)⟩", Kind.NUMBER, "overlap with the initial state");
    public static final Observable PURITY =
            of("purity", "tr ρ²", Kind.NUMBER, "1 for a pure state, less for a mixed one");
    public static final Observable NORM =
            of("norm", "‖ψ‖", Kind.NUMBER, "norm of the amplitudes kept; 1 but for what was discarded");

    private static final Map<String, Observable> NAMED = new LinkedHashMap<>();

    static {
        for (Observable o : List.of(
                POSITION,
                MOMENTUM,
                SPREAD_OF_POSITION,
                SPREAD_OF_MOMENTUM,
                UNCERTAINTY_PRODUCT,
                SPREAD_OVER_SWING,
                ENERGY,
                MEAN_QUANTA,
                VARIANCE_OF_QUANTA,
                MANDEL_Q,
                PURITY,
                RETURN_PROBABILITY,
                RETURN_AMPLITUDE_REAL,
                RETURN_AMPLITUDE_IMAGINARY)) {
            NAMED.put(o.name.toLowerCase(Locale.ROOT), o);
        }
    }

    private static Observable of(String name, String symbol, Kind kind, String meaning) {
        return new Observable(name, symbol, kind, meaning, -1);
    }

    /** The probability to find level n. */
    public static Observable population(long n) {
        if (n < 0) {
            throw new IllegalArgumentException("levels are counted from 0, not " + n);
        }
        return new Observable("population of " + n, "P_" + n, Kind.NUMBER, "probability of level " + n, n);
    }

    /** The observable of that name ("spread of position"), populations ("population of 3") included. */
    public static Optional<Observable> named(String name) {
        String key = name.strip().toLowerCase(Locale.ROOT);
        if (key.matches("population of \\d{1,18}")) {
            return Optional.of(population(Long.parseLong(key.substring("population of ".length()))));
        }
        return Optional.ofNullable(NAMED.get(key));
    }

    /** All of them but the populations, in the order in which they are offered. */
    public static List<Observable> all() {
        return List.copyOf(NAMED.values());
    }
}
