/**
 * Operators of one mode: polynomials in the ladder operators a and a†, in normal order, with exact bookkeeping.
 *
 * <p>Conventions. [a, a†] = 1, n = a†a, x = (a + a†)/√2, p = −i (a − a†)/√2, ħ = 1: x and p in units of the zero-point length
 * √(ħ/mω) and of the momentum ħ over it, so that [x, p] = i and the vacuum has Δx² = Δp² = 1/2. Normal order puts every a† to the
 * left of every a. Coefficients are kept in double-double arithmetic, so that integers up to 2^106 and the 1/√2 of x and p leave no
 * trace of rounding in the doubles that are read.
 *
 * <p>Reading order: {@link ladderwell.operator.LadderPolynomial}, {@link ladderwell.operator.OperatorFormula},
 * {@link ladderwell.operator.Boundedness}.
 */
@NullMarked
package ladderwell.operator;

import org.jspecify.annotations.NullMarked;
