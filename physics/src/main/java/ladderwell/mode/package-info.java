/**
 * One driven, lossy, nonlinear mode as data: its frequency, the parts of its Hamiltonian, what it is coupled to, and the frame it is
 * looked at in.
 *
 * <p>Conventions. A Hamiltonian is a frequency, H/ħ, in rad/s (a plain number in natural units). A {@link ladderwell.mode.Jump} with
 * operator L and rate γ adds γ (L ρ L† − ½ L†L ρ − ½ ρ L†L) to dρ/dt. In the frame rotating at ω_f, a stands for a e^{iω_f t} of the lab.
 *
 * <p>Reading order: {@link ladderwell.mode.Mode}, {@link ladderwell.mode.Part}, {@link ladderwell.mode.Frame},
 * {@link ladderwell.mode.Jump}, {@link ladderwell.mode.Rate}.
 */
@NullMarked
package ladderwell.mode;

import org.jspecify.annotations.NullMarked;
