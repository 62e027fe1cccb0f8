package ladderwell.quantity;

/**
 * What 1 means inside the library for one oscillator: a mass and a length; with ħ they fix momentum, energy and time.
 *
 * <p>Lab scales carry ħ of the SI; the natural scale has mass = length = ħ = 1, and its units have no symbols.
 *
 * @param mass kg, or 1 when natural; positive
 * @param length m, or 1 when natural; positive
 * @param hbar J s, or 1 when natural; positive
 * @param coordinate what a position is
 */
public record Scale(double mass, double length, double hbar, Coordinate coordinate) {

    /** What a position is. */
    public enum Coordinate {
        /** A length. */
        LENGTH,
        /** An angle: the mass is a moment of inertia in kg m², the length 1 rad. */
        ANGLE,
        /** A quadrature (a + a†)/√2 of a mode, a plain number: the length is 1, the mass ħ/ω. */
        QUADRATURE
    }

    private static final Scale NATURAL = new Scale(1, 1, 1, Coordinate.LENGTH);

    private static final Unit ANGULAR_MOMENTUM = new Unit("ħ", Kind.MOMENTUM, Constants.HBAR, 0);

    /** Refuses what is not finite and positive, and scales whose energy or time would leave the range of doubles. */
    public Scale {
        require("mass", mass);
        require("length", length);
        require("hbar", hbar);
        double energy = hbar / mass * (hbar / length) / length;
        double time = mass / hbar * length * length;
        if (!(energy > 0 && energy < Double.POSITIVE_INFINITY && time > 0 && time < Double.POSITIVE_INFINITY)) {
            throw new IllegalArgumentException("a mass of " + Digits.significant(mass, 3) + " kg and a length of "
                    + Digits.significant(length, 3) + " m give an energy or time outside the range of numbers");
        }
    }

    private static void require(String what, double value) {
        if (!(value > 0) || Double.isInfinite(value)) {
            throw new IllegalArgumentException(
                    "the " + what + " of a scale must be finite and above 0, not " + Digits.text(value));
        }
    }

    /**
     * Lab scale.
     *
     * @param mass kg
     * @param length m
     */
    public static Scale of(double mass, double length) {
        return new Scale(mass, length, Constants.HBAR, Coordinate.LENGTH);
    }

    /**
     * Lab scale of a motion in an angle.
     *
     * @param inertia moment of inertia, kg m²
     */
    public static Scale turning(double inertia) {
        return new Scale(inertia, 1, Constants.HBAR, Coordinate.ANGLE);
    }

    /**
     * Lab scale of a mode whose position and momentum are quadratures: time 1/ω, energy ħω.
     *
     * @param omega rad/s
     */
    public static Scale mode(double omega) {
        require("angular frequency", omega);
        return new Scale(Constants.HBAR / omega, 1, Constants.HBAR, Coordinate.QUADRATURE);
    }

    /** What a position measures: a length, an angle, or nothing in natural units and for a quadrature. */
    public Kind position() {
        if (isNatural()) {
            return Kind.NUMBER;
        }
        return switch (coordinate) {
            case LENGTH -> Kind.LENGTH;
            case ANGLE -> Kind.ANGLE;
            case QUADRATURE -> Kind.NUMBER;
        };
    }

    /** ħ = m = length = 1; symbols are empty. */
    public static Scale natural() {
        return NATURAL;
    }

    /**
     * Scale of a harmonic oscillator, ℓ = √(ħ/(mω)); its time is 1/ω and its energy ħω. The root mean square position in
     * the ground state, √(ħ/(2mω)), is ℓ/√2.
     *
     * @param mass kg
     * @param omega rad/s
     */
    public static Scale harmonic(double mass, double omega) {
        require("mass", mass);
        if (!(omega > 0) || Double.isInfinite(omega)) {
            throw new IllegalArgumentException(
                    "the angular frequency of a scale must be finite and above 0, not " + Digits.text(omega));
        }
        return of(mass, Math.sqrt(Constants.HBAR / mass / omega));
    }

    /** True for {@link #natural()}. */
    public boolean isNatural() {
        return hbar == 1;
    }

    /** ħ/ℓ, kg m/s. */
    public double momentum() {
        return hbar / length;
    }

    /** ħ²/(mℓ²), J. */
    public double energy() {
        return hbar / mass * (hbar / length) / length;
    }

    /** mℓ²/ħ, s. */
    public double time() {
        return mass / hbar * length * length;
    }

    /** ħ/(mℓ²), rad/s. */
    public double angularFrequency() {
        return hbar / mass / length / length;
    }

    /** SI value (or natural value) of one scaled unit of a kind; 1 for kinds that a scale does not touch. */
    public double of(Kind kind) {
        return switch (kind) {
            case MASS -> mass;
            case LENGTH -> length;
            case TIME -> time();
            case MOMENTUM -> coordinate == Coordinate.QUADRATURE ? 1 : momentum();
            case ENERGY -> energy();
            case ANGULAR_FREQUENCY -> angularFrequency();
            case CYCLE_FREQUENCY -> isNatural() ? 1 : angularFrequency();
            default -> 1;
        };
    }

    /**
     * The unit to print a whole column in, chosen so that its largest magnitude reads between 1 and 1000.
     *
     * <p>Energies print in prefixed electronvolts, masses in electron masses, u or kg, wavenumbers in /cm, and momenta in
     * ħ over a prefixed metre: beside positions in that length, Δx Δp ≥ ħ/2 can be read off the table. In the natural
     * scale the symbols are empty.
     *
     * @param magnitude largest absolute value in the column, SI; for 0 the scale's own size of the kind is taken
     * @throws IllegalArgumentException if the magnitude is not finite
     */
    public Unit display(Kind kind, double magnitude) {
        if (!Double.isFinite(magnitude)) {
            throw new IllegalArgumentException(
                    "no unit can be chosen for " + kind.word() + " of size " + Digits.text(magnitude));
        }
        if (isNatural()) {
            return switch (kind) {
                case ANGLE, SQUEEZING, PERIODS, NUMBER -> Units.si(kind);
                default -> Units.natural(kind);
            };
        }
        if (kind == Kind.LENGTH || kind == Kind.MOMENTUM) {
            if (coordinate == Coordinate.QUADRATURE) {
                return Units.natural(kind);
            }
            if (coordinate == Coordinate.ANGLE) {
                return kind == Kind.LENGTH ? Units.RADIAN : ANGULAR_MOMENTUM;
            }
        }
        return Prefixes.display(kind, magnitude == 0 ? of(kind) : Math.abs(magnitude));
    }
}
