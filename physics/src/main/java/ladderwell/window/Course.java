package ladderwell.window;

import ladderwell.evidence.Certainty;

/** The generator along a run, step by step, as a polynomial in the time since a step began. */
interface Course {

    /** The generator from a time on, good for a step up to this length. */
    Generator generator(double time, double length);

    /**
     * What the generator just given is off over a step of this length, as it acts on a window: a bound of the integrated norm of the
     * difference.
     */
    double off(Equation equation, double length);

    /** What it is off beside that because a jump is known only within rounding; whatever the length. */
    default double atBreaks(Equation equation) {
        return 0;
    }

    /** The next time at which something jumps or bends; infinite if nothing does. */
    double nextBreak(double time);

    /** A step of this length was kept. */
    void advance(double length);

    /** How sure {@link #off} is. */
    Certainty certainty();
}
