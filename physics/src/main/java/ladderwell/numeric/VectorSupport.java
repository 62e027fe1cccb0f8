package ladderwell.numeric;

/** Whether the Vector API can be used: its module is present and vectors hold at least two numbers. */
final class VectorSupport {
    private VectorSupport() {}

    static boolean available() {
        return ModuleLayer.boot().findModule("jdk.incubator.vector").isPresent() && VectorLoops.LANES > 1;
    }
}
