package ladderwell.evidence;

/** What stands behind a bound, strongest first. The words are never mixed up. */
public enum Certainty {
    /** A theorem about this very run: the exact answer is inside. */
    GUARANTEED("g"),
    /** From refinement, a second run at a tighter setting: the exact answer is expected inside. */
    ESTIMATED("e"),
    /** A confidence interval: by construction the exact answer is outside at a known rate. */
    STATISTICAL("s");

    private final String letter;

    Certainty(String letter) {
        this.letter = letter;
    }

    /** The letter in tables and records: g, e or s. */
    public String letter() {
        return letter;
    }

    /** The word in sentences: "guaranteed". */
    public String word() {
        return switch (this) {
            case GUARANTEED -> "guaranteed";
            case ESTIMATED -> "estimated";
            case STATISTICAL -> "statistical";
        };
    }

    /** The weaker of two; what rests on both is no surer than that. */
    public Certainty weaker(Certainty other) {
        return compareTo(other) >= 0 ? this : other;
    }
}
