package ladderwell.window;

/** Elements of a^k between number states. */
final class Roots {
    private Roots() {}

    /** √((n+1) (n+2) … (n+k)) = ⟨n| a^k |n+k⟩. */
    static double of(long n, int k) {
        double product = 1;
        for (int i = 1; i <= k; i++) {
            product *= n + i;
        }
        return Math.sqrt(product);
    }
}
