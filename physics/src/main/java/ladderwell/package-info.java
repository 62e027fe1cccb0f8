/**
 * The words a theorist types, and nothing else: an {@link ladderwell.Oscillator} is declared, a
 * {@link ladderwell.State} is prepared in it, {@link ladderwell.State#evolve evolved} into a
 * {@link ladderwell.Run}, and read as a table ({@link ladderwell.Run#table}) or as density frames
 * ({@link ladderwell.Run#density}).
 *
 * <p>Read in that order. The methods live in the rooms below ({@code numeric}, {@code quantity}, {@code evidence},
 * {@code level}, {@code state}, {@code classical}), which work on numbers and arrays and know none of these nouns.
 *
 * <p>Conventions: the outside speaks lab units ({@code Quantity}); inside, every oscillator has its own
 * {@link ladderwell.quantity.Scale} with ħ = m = 1, and levels are counted from 0.
 */
@NullMarked
package ladderwell;

import org.jspecify.annotations.NullMarked;
