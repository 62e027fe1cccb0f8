package ladderwell.kernel.cell;

/** Whether a text can be run as it stands; consoles ask before they run or open a new line. */
public enum Completeness {
    /** It can be run. */
    COMPLETE,
    /** More must follow. */
    INCOMPLETE,
    /** It can never be run. */
    INVALID
}
