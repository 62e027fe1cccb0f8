/**
 * Formulas as they stand on the board: text → tree → values, exact derivatives, breaks, polynomials.
 *
 * <p>Conventions. A formula is a function of the position x and the time t. In lab units every number carries its unit
 * and the formula is computed in SI; dimensions are checked part by part. In natural units (ħ = 1) numbers stand alone.
 * Names: x, t, pi, hbar and the parameters given. Operators: + - * / ^ (from the right), comparisons &lt; &lt;= &gt;
 * &gt;= with and / or in if(condition, value, value). Functions: exp, log (natural), sin, cos, tan, sinh, cosh, tanh,
 * sqrt, abs, sign, step(u) (0 below u = 0, 1 from there on), min, max, gauss(x, centre, width) = exp(−(x −
 * centre)²/(2 width²)). A product is always written with *. Units: see {@code UnitReader} and
 * {@link ladderwell.formula.Amount}.
 *
 * <p>Reading order: {@link ladderwell.formula.Formula}, {@link ladderwell.formula.Parameters},
 * {@link ladderwell.formula.Amount}, then {@code Parser}, {@code Program} (how values are computed), {@code Derivative},
 * {@code BreakSearch}.
 */
@NullMarked
package ladderwell.formula;

import org.jspecify.annotations.NullMarked;
