package ladderwell.kernel.sentence;

/** What the value of a key looks like. */
public enum Form {
    /** The key alone, without a value. */
    FLAG,
    /** A number with a unit; a plain number in natural units. */
    QUANTITY,
    /** A number with a unit of any make, such as 2 eV/angstrom^4; a plain number in natural units. */
    AMOUNT,
    /** A text in quotes. */
    TEXT,
    /** A real number without a unit. */
    NUMBER,
    /** A whole number. */
    COUNT,
    /** A complex number such as 1.5+0.5i. */
    COMPLEX,
    /** One of a few words. */
    CHOICE,
    /** Whole numbers, parted by blanks. */
    COUNTS,
    /** Complex numbers, parted by blanks. */
    COMPLEXES,
    /** The name of something declared before. */
    REFERENCE,
    /** A new name. */
    NEW_NAME
}
