package ladderwell.quantity;

/**
 * A frequency that shows both its faces: ω, and ν = ω/2π, so that no factor 2π can hide.
 *
 * @param omega angular frequency ω, rad/s; finite, may be negative (a detuning, an anharmonicity)
 */
public record Frequency(double omega) {

    /** Refuses NaN and infinities. */
    public Frequency {
        if (!Double.isFinite(omega)) {
            throw new IllegalArgumentException("a frequency must be a finite number, not " + omega + "; for example "
                    + Kind.CYCLE_FREQUENCY.example());
        }
    }

    /**
     * ω = 2πν.
     *
     * @param nu cycle frequency ν, Hz
     */
    public static Frequency ofNu(double nu) {
        return new Frequency(2 * Math.PI * nu);
    }

    /**
     * ω of a quantity that fixes a frequency: ν in Hz gives 2πν; ω or a rate in rad/s or /s stands; a wavenumber k̃ gives
     * 2πc k̃; an energy, a level spacing, gives E/ħ.
     *
     * @throws IllegalArgumentException for any other kind
     */
    public static Frequency of(Quantity quantity) {
        double si = quantity.si();
        return switch (quantity.kind()) {
            case CYCLE_FREQUENCY -> ofNu(si);
            case ANGULAR_FREQUENCY -> new Frequency(si);
            case WAVENUMBER -> ofNu(Constants.LIGHT_SPEED * si);
            case ENERGY -> new Frequency(si / Constants.HBAR);
            default ->
                throw new IllegalArgumentException("'" + quantity + "' is "
                        + quantity.kind().word()
                        + " and fixes no frequency; expected a frequency (1.2 MHz), an angular frequency or rate"
                        + " (7.5 Mrad/s), a wavenumber (2991 /cm) or an energy (0.3 eV)");
        };
    }

    /** Cycle frequency ν = ω/2π, Hz. */
    public double nu() {
        return omega / (2 * Math.PI);
    }

    /** Period 2π/|ω|, s; infinite at ω = 0. */
    public double period() {
        return 2 * Math.PI / Math.abs(omega);
    }

    /** Quantum of energy ħω, J. */
    public double energy() {
        return Constants.HBAR * omega;
    }

    /** Wavenumber ω/2πc, 1/m. */
    public double wavenumber() {
        return nu() / Constants.LIGHT_SPEED;
    }

    /** For people: "ν = 1.2 MHz, ω = 7.5398 Mrad/s". */
    public String both() {
        Unit cycles = Prefixes.readable(Units.HERTZ, nu());
        Unit radians = Prefixes.readable(Units.RADIAN_PER_SECOND, omega);
        return "ν = " + Digits.pretty(ended(cycles.fromSi(nu()))) + " " + cycles.symbol() + ", ω = "
                + Digits.pretty(ended(radians.fromSi(omega))) + " " + radians.symbol();
    }

    /** As {@link #both} in ASCII: "nu = 1.2 MHz, omega = 7.5398 Mrad/s". */
    public String bothPlain() {
        Unit cycles = Prefixes.readable(Units.HERTZ, nu());
        Unit radians = Prefixes.readable(Units.RADIAN_PER_SECOND, omega);
        return "nu = " + ended(cycles.fromSi(nu())) + " " + cycles.plain() + ", omega = " + ended(radians.fromSi(omega))
                + " " + radians.plain();
    }

    /** A number that ends within nine digits is shown to its end (it was typed), any other to five digits. */
    private static String ended(double value) {
        double atTwelve = Double.parseDouble(Digits.significant(value, 12));
        double atNine = Double.parseDouble(Digits.significant(value, 9));
        return atTwelve == atNine ? Digits.shortest(atNine) : Digits.significant(value, 5);
    }
}
