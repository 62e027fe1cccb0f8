package ladderwell;

import ladderwell.evidence.PhysicsException;

/** Refuses what would not fit, before it is allocated. */
final class Memory {
    private Memory() {}

    /** A quarter of the heap: the rest is for what is kept, read and drawn from it. */
    static double allowed() {
        return Runtime.getRuntime().maxMemory() / 4.0;
    }

    static void require(String what, double bytes, String remedy) {
        if (bytes > allowed()) {
            throw new PhysicsException.TooLarge(what, bytes, allowed(), remedy);
        }
    }
}
