package ladderwell.kernel.magic;

import ladderwell.PhaseSpace;

/**
 * A run at one instant in phase space, and the name of the run.
 *
 * @param name the run's name
 * @param space the state in phase space
 * @param husimi whether the Husimi function is shown instead of the Wigner function
 */
public record PhasePortrait(String name, PhaseSpace space, boolean husimi) {}
