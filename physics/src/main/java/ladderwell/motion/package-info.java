/**
 * Mean values of a state that moves by exact phases on levels, each with its error.
 *
 * <p>{@link ladderwell.motion.PhasedState} is the state with its times; {@link ladderwell.motion.Means} reads position and
 * momentum from it (by ladder sums for equal spacing, by transition elements otherwise), {@link
 * ladderwell.motion.Populations} what never changes, {@link ladderwell.motion.Returns} the overlap with time 0. Scaled
 * units, ħ = m = 1.
 *
 * <p>All errors rest on one number δ ≥ ‖ψ − ψ̃‖ and on the tail moments of {@link ladderwell.state.Amplitudes}: for an
 * operator A, |⟨A⟩ − ⟨A⟩~| ≤ ‖Aδψ‖(‖ψ‖ + ‖ψ̃‖) and ‖Aδψ‖ splits into what is kept (norm of A on the window times δ) and
 * what is discarded (a tail moment).
 */
@NullMarked
package ladderwell.motion;

import org.jspecify.annotations.NullMarked;
