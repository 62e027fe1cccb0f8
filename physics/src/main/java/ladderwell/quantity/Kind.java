package ladderwell.quantity;

/**
 * The physical kinds that declarations know. Finer than a dimension: a cycle frequency and an angular frequency are both
 * 1/s and yet differ by 2π.
 */
public enum Kind {
    /** SI unit kg. */
    MASS("a mass", "40 u"),
    /** SI unit m. */
    LENGTH("a length", "10 nm"),
    /** SI unit s. */
    TIME("a time", "50 us"),
    /** SI unit kg m/s. */
    MOMENTUM("a momentum", "0.5 hbar/nm"),
    /** SI unit J. */
    ENERGY("an energy", "0.3 eV"),
    /** SI unit K. */
    TEMPERATURE("a temperature", "20 mK"),
    /** ν, SI unit Hz; multiplied by 2π where ω is needed. */
    CYCLE_FREQUENCY("a frequency", "1.2 MHz"),
    /** ω or a rate, SI unit rad/s or /s; taken as it stands. */
    ANGULAR_FREQUENCY("an angular frequency or rate", "7.5 Mrad/s"),
    /** 1/λ, SI unit /m. */
    WAVENUMBER("a wavenumber", "2991 /cm"),
    /** SI unit rad. */
    ANGLE("an angle", "30 deg"),
    /** A ratio of variances in decibels; its "SI" value is the number of decibels. */
    SQUEEZING("a squeezing", "6 dB"),
    /** A duration in periods of the oscillator at hand; its "SI" value is the number of periods. */
    PERIODS("a number of periods", "3 periods"),
    /** A dimensionless number, or any quantity in natural units. */
    NUMBER("a plain number", "9.5");

    private final String word;
    private final String example;

    Kind(String word, String example) {
        this.word = word;
        this.example = example;
    }

    /** The kind in words, with its article, for messages: "a mass". */
    public String word() {
        return word;
    }

    /** A value of this kind as one would type it: "40 u". */
    public String example() {
        return example;
    }
}
