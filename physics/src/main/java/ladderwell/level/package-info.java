/**
 * Bound levels of a potential in scaled units: energies, wave functions and transition elements.
 *
 * <p>Scaled units: ħ = m = 1. The harmonic oscillator measures length in √(ħ/mω) and energy in ħω; box and finite well
 * measure length in the full width L (centre at 0, walls at ±1/2) and energy in ħ²/(m L²). Levels count from 0.
 *
 * <p>Sign of the wave functions: φ_n is real, has parity (−1)^n, and is positive beyond its outermost zero towards +x.
 *
 * <p>Read {@link ladderwell.level.Levels} first, then {@link ladderwell.level.Elements}, then the three kinds of
 * levels; {@code WellEquation} holds the one equation that has to be solved.
 */
@NullMarked
package ladderwell.level;

import org.jspecify.annotations.NullMarked;
