/**
 * Motion of one mode in a window of number levels with a guaranteed error: pure states and density operators under Hamiltonians and jumps
 * that are polynomials in a and a†.
 *
 * <p>What is computed is a path that is close to the exact one because it nearly solves its equation: the norm of what it misses of the
 * equation (the defect), summed over the run, bounds its distance from the exact path, since the exact motion never makes distances
 * longer (it keeps the norm of vectors and does not raise the trace norm of operators). The defect has three parts, all computed: what the motion would push out
 * of the window (the border), what the series in time leaves out, and rounding. They steer window and step.
 *
 * <p>Reading order: {@link ladderwell.window.WindowMotion}, {@link ladderwell.window.WindowState}; inside, {@code Equation} and {@code
 * ChebyshevStep}. Scaled units, ħ = 1.
 *
 * @source Lubich, From Quantum to Classical Molecular Dynamics (2008), chapter III, for defects of unitary motion; contraction of the
 *     trace norm: Ruskai, Rev. Math. Phys. 6 (1994) 1147
 */
@NullMarked
package ladderwell.window;

import org.jspecify.annotations.NullMarked;
