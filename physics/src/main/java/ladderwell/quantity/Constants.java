package ladderwell.quantity;

import java.util.List;

/**
 * Fundamental constants in SI units, CODATA 2022.
 *
 * <p>h, e, k and c are exact by the definition of the SI (2019); ħ = h/2π is exact and given as the nearest double. The
 * two masses are measured and carry a standard uncertainty.
 *
 * @source P. J. Mohr, D. B. Newell, B. N. Taylor and E. Tiesinga, CODATA recommended values of the fundamental physical
 *     constants: 2022, Rev. Mod. Phys. 97 (2025) 025002
 */
public final class Constants {

    /** Planck constant h, J s (exact). */
    public static final double PLANCK = 6.62607015e-34;

    /** Reduced Planck constant ħ = h/2π = 1.05457181764615639126…e-34 J s (exact, nearest double). */
    public static final double HBAR = 1.0545718176461564e-34;

    /** Elementary charge e, C (exact); also one electronvolt in J. */
    public static final double ELEMENTARY_CHARGE = 1.602176634e-19;

    /** Boltzmann constant k, J/K (exact). */
    public static final double BOLTZMANN = 1.380649e-23;

    /** Speed of light in vacuum c, m/s (exact). */
    public static final double LIGHT_SPEED = 299792458;

    /** Atomic mass constant, kg. */
    public static final double ATOMIC_MASS_CONSTANT = 1.66053906892e-27;

    /** Standard uncertainty of {@link #ATOMIC_MASS_CONSTANT}, kg. */
    public static final double ATOMIC_MASS_CONSTANT_UNCERTAINTY = 0.00000000052e-27;

    /** Electron mass, kg. */
    public static final double ELECTRON_REST_MASS = 9.1093837139e-31;

    /** Standard uncertainty of {@link #ELECTRON_REST_MASS}, kg. */
    public static final double ELECTRON_REST_MASS_UNCERTAINTY = 0.0000000028e-31;

    /** The set these values come from, as written into records: "CODATA 2022". */
    public static final String EDITION = "CODATA 2022";

    /**
     * One constant with its standing.
     *
     * @param name in words
     * @param symbol as in formulas
     * @param value in SI units
     * @param standardUncertainty in SI units; 0 for an exact constant
     * @param unit SI unit, as text
     */
    public record Constant(String name, String symbol, double value, double standardUncertainty, String unit) {
        /** True where the value defines the SI, or follows from values that do. */
        public boolean isExact() {
            return standardUncertainty == 0;
        }

        /** For instance "electron mass m_e = 9.1093837139(28)e-31 kg". */
        @Override
        public String toString() {
            String number =
                    isExact() ? Digits.shortest(value) : Digits.withStandardUncertainty(value, standardUncertainty);
            return name + " " + symbol + " = " + number + " " + unit + (isExact() ? " (exact)" : "");
        }
    }

    private static final List<Constant> ALL = List.of(
            new Constant("Planck constant", "h", PLANCK, 0, "J s"),
            new Constant("reduced Planck constant", "ħ", HBAR, 0, "J s"),
            new Constant("elementary charge", "e", ELEMENTARY_CHARGE, 0, "C"),
            new Constant("Boltzmann constant", "k", BOLTZMANN, 0, "J/K"),
            new Constant("speed of light", "c", LIGHT_SPEED, 0, "m/s"),
            new Constant("atomic mass constant", "m_u", ATOMIC_MASS_CONSTANT, ATOMIC_MASS_CONSTANT_UNCERTAINTY, "kg"),
            new Constant("electron mass", "m_e", ELECTRON_REST_MASS, ELECTRON_REST_MASS_UNCERTAINTY, "kg"));

    private Constants() {}

    /** All constants, each with its standard uncertainty. */
    public static List<Constant> all() {
        return ALL;
    }
}
