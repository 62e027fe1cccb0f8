/**
 * Gaussian states of one mode and their motion under quadratic Hamiltonians and linear jumps: a mean vector and a covariance matrix carry
 * everything, whatever the number of quanta.
 *
 * <p>Conventions. r = (x, p) with ħ = 1, [x, p] = i and a = (x + ip)/√2; the vacuum has covariance ½ on both axes. Times and rates are
 * in the units of the Hamiltonian given. A state moves as r̄′ = A r̄ + b, V′ = A V + V Aᵀ + D.
 *
 * <p>Reading order: {@link ladderwell.gaussian.GaussianState}, {@link ladderwell.gaussian.GaussianFlow},
 * {@link ladderwell.gaussian.GaussianPoint}, then {@code Drift} (A, b and D), {@code ExactFlow} (constant), {@code SteppedFlow}.
 */
@NullMarked
package ladderwell.gaussian;

import org.jspecify.annotations.NullMarked;
