/**
 * Wave packets on a grid of positions, in a potential that may move: what levels cannot carry.
 *
 * <p>Scaled units (ħ = m = 1). Read {@link ladderwell.packet.PotentialField}, {@link ladderwell.packet.Grid}, {@link
 * ladderwell.packet.GridMotion}, then {@code SplitStep} (one step), {@code Pair} (two step sizes on one grid) and {@link
 * ladderwell.packet.GridFrame} (what is read from a wave function).
 */
@NullMarked
package ladderwell.packet;

import org.jspecify.annotations.NullMarked;
