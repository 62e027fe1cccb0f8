/**
 * Arrays of numbers and special functions: arithmetic that knows no physics.
 *
 * <p>Reading order: {@link ladderwell.numeric.DoubleDouble} (a number as the unevaluated sum of two doubles), then
 * {@link ladderwell.numeric.HermiteFunctions} (the oscillator's wave functions for a window of levels). Hot loops work on plain
 * {@code double[]}; everything public says how accurate it is and how that was found.
 */
@NullMarked
package ladderwell.numeric;

import org.jspecify.annotations.NullMarked;
