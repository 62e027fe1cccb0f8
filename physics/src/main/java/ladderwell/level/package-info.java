/**
 * Bound levels of a potential in scaled units: energies, wave functions and transition elements.
 *
 * <p>Scaled units: ħ = m = 1. The harmonic oscillator measures length in √(ħ/mω) and energy in ħω; box and finite well
 * measure length in the full width L (centre at 0, walls at ±1/2) and energy in ħ²/(m L²). Levels count from 0.
 *
 * <p>Sign of the wave functions: φ_n is real, has parity (−1)^n, and is positive beyond its outermost zero towards +x.
 *
 * <p>Read {@link ladderwell.level.Levels} first, then {@link ladderwell.level.Elements}, then the closed kinds of levels; {@code
 * WellEquation} holds the one equation of the finite well. Polynomials: {@code Polynomial}, {@code OscillatorBasis}, {@code BandSpectrum},
 * {@code BasisProof}, {@code LevelCount}, {@code BasisBlock}. Anything else: {@link ladderwell.level.PotentialCurve}, {@code CurveSurvey},
 * {@code Cell}, {@code ShootingMesh}, {@code Shot}, {@code LevelSearch}, {@code Wave}; far up {@code PhaseCell}, {@code PhaseWell}, {@code HighLevels}. What repeats:
 * {@link ladderwell.level.PeriodicLevels}.
 */
@NullMarked
package ladderwell.level;

import org.jspecify.annotations.NullMarked;
