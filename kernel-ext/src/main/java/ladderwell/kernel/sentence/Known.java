package ladderwell.kernel.sentence;

/**
 * What is known of a declared name.
 *
 * @param name the name
 * @param noun the noun it counts as: oscillator, state, evolve; another word for what sentences cannot use
 * @param kind its kind: harmonic, coherent, …; empty where its noun has none
 * @param natural whether it is in natural units
 */
public record Known(String name, String noun, String kind, boolean natural) {}
