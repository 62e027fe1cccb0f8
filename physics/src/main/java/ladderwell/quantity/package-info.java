/**
 * Units, constants and quantities: lab units in, lab units out.
 *
 * <p>Conventions. A {@link ladderwell.quantity.Quantity} is a finite number with a {@link ladderwell.quantity.Unit}; a
 * unit belongs to one {@link ladderwell.quantity.Kind}. A frequency in Hz is a cycle frequency ν and is multiplied by 2π
 * to give ω; a rate in /s or rad/s is an angular frequency and is taken as it stands. Both have the dimension 1/s, so the
 * kind, not the dimension, tells them apart. Wavenumbers are those of spectroscopy, 1/λ.
 *
 * <p>Reading order: {@link ladderwell.quantity.Kind}, {@link ladderwell.quantity.Unit},
 * {@link ladderwell.quantity.Units}, {@link ladderwell.quantity.Quantity}, {@link ladderwell.quantity.Frequency},
 * {@link ladderwell.quantity.Constants}, {@link ladderwell.quantity.Scale}, {@link ladderwell.quantity.Digits}.
 */
@NullMarked
package ladderwell.quantity;

import org.jspecify.annotations.NullMarked;
