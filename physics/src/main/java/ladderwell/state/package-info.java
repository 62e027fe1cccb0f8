/**
 * States as amplitudes on levels.
 *
 * <p>A <em>window</em> is a run of consecutive kept levels; a state keeps one or more of them ({@code segments}).
 * What is left out is always measured and carried as a guaranteed error.
 *
 * <p>Read {@link ladderwell.state.Amplitudes} and {@link ladderwell.state.HarmonicStates} first; then {@code PoissonWindow} and {@code ExactTurns} for coherent states, and {@code
 * PacketState} with {@code PacketOverlaps} (closed forms) and {@code LeakingOverlaps} (quadrature) for Gaussian packets, {@code
 * SqueezedWindow} and {@code DisplacedNumberWindow} (recurrences, the residual of the state's own equation as bound) with {@code
 * QuantaTail}, {@code CatState} with {@link ladderwell.state.CatMoments}; then {@link ladderwell.state.Mixture} and {@link ladderwell.state.DensityOperator} for mixed states.
 */
@NullMarked
package ladderwell.state;

import org.jspecify.annotations.NullMarked;
