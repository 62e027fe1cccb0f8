/**
 * One-dimensional potentials in the scaled units of a level solver or a grid: ħ = m = 1, positions in the scale's length ℓ,
 * energies in ħ²/(mℓ²).
 *
 * <p>A potential is declared in lab units or, with the mass {@code Quantity.number(1)}, in natural ones, which are taken as they
 * stand (ℓ = 1). Outside its domain [left, right] the potential is an infinite wall.
 *
 * <p>Reading order: {@link ladderwell.potential.Potential}, {@code Given} (checks and units), {@code Survey} (minimum,
 * length scale, bounded or not), then the kinds.
 */
@NullMarked
package ladderwell.potential;

import org.jspecify.annotations.NullMarked;
