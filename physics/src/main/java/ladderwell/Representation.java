package ladderwell;

import ladderwell.evidence.Bound;
import ladderwell.evidence.Record;

/** In what a run carries its state from time 0 on: amplitudes on levels, or values on a grid of positions. */
sealed interface Representation permits OnLevels {

    /** Number of times. */
    int times();

    /** The j-th time in scaled units. */
    double time(int j);

    /** Largest ‖ψ − ψ̃‖ at any of the times. */
    Bound stateError();

    /** The method in a few words. */
    String method();

    /** Why this method, in a few words. */
    String reason();

    /** What was kept, as one reads it: "levels 0–40". */
    String size();

    /** Adds what was kept to a record. */
    void describe(Record.Builder record);

    /** One observable at every time, in scaled units. */
    Series series(Observable observable);

    /** |ψ|² at every time on so many points that cover the motion. */
    Density density(Run run, int points);

    /** What the motion does, in one line. */
    String verdict(Run run);
}
