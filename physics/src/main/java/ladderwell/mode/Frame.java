package ladderwell.mode;

import ladderwell.quantity.Digits;

/**
 * The frame a mode is looked at in: at rest, or rotating at ω_f.
 *
 * @param frequency ω_f, rad/s or plain in natural units; 0 is the lab
 */
public record Frame(double frequency) {

    /** At rest. */
    public static final Frame LAB = new Frame(0);

    /** Refuses NaN and infinities. */
    public Frame {
        if (!Double.isFinite(frequency)) {
            throw new IllegalArgumentException(
                    "the frequency of a rotating frame must be a finite number, not " + frequency);
        }
    }

    /** True at rest. */
    public boolean isLab() {
        return frequency == 0;
    }

    /** In words. */
    @Override
    public String toString() {
        return isLab() ? "in the lab" : "in the frame rotating at " + Digits.significant(frequency, 6) + " rad/s";
    }
}
