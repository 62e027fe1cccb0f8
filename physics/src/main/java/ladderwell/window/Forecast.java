package ladderwell.window;

import java.util.List;
import ladderwell.operator.LadderPolynomial;

/**
 * What a run in a window would take, roughly, before it runs.
 *
 * @param levels levels of the window
 * @param applications applications of the generator
 * @param bytes memory at work
 * @param seconds time on a slow core
 */
public record Forecast(int levels, double applications, double bytes, double seconds) {
    /** Terms of a series for each radian of the widest frequency, beyond the least that a step needs. */
    private static final double TERMS = 2;

    private static final double LEAST_TERMS = 40;
    private static final double SECONDS_PER_ELEMENT = 2e-9;
    private static final double PLANES = 6;

    /**
     * For a window.
     *
     * @param hamiltonian H/ħ at a time that stands for the others
     * @param jumps √γ L each; none for a vector
     * @param first first level
     * @param levels how many
     * @param time length of the run
     */
    public static Forecast of(
            LadderPolynomial hamiltonian, List<LadderPolynomial> jumps, long first, int levels, double time) {
        Generator generator = Generator.constant(hamiltonian, jumps);
        Spectrum spectrum = Spectrum.of(generator.drift().get(0), first, levels);
        boolean pure = jumps.isEmpty();
        double rate = Math.max(pure ? spectrum.width() / 2 : spectrum.width(), -spectrum.damping());
        double applications = LEAST_TERMS + TERMS * rate * time;
        double bands = 2.0 * generator.reach() + 1;
        double elements = pure ? levels * bands : levels * (levels / 2.0) * (2 * bands + jumps.size());
        double side = levels + 4.0 * generator.reach();
        return new Forecast(
                levels,
                applications,
                16 * PLANES * (pure ? side : side * side),
                applications * elements * SECONDS_PER_ELEMENT);
    }
}
