/**
 * Wigner and Husimi functions of pure and mixed states on grids of position and momentum.
 *
 * <p>Scaled units, [x, p] = i. The Wigner function is W(x, p) = (1/π) ∫ ψ(x+y) ψ*(x−y) e^{−2ipy} dy and integrates to 1 over x and p, so
 * |W| ≤ 1/π; the Husimi function Q(x, p) = ⟨α|ρ|α⟩/(2π), α = (x + ip)/√2, integrates to 1 as well. Wigner functions are sums over y of the state's
 * <em>correlations</em> ρ(x+y, x−y); Husimi functions are squares of overlaps for pure states and smoothed correlations for mixed ones. All are taken on
 * lattices of positions so fine that no image of the state in momentum falls on the grid: sums of terms of the size of the result, at any number of quanta.
 *
 * <p>Read {@link ladderwell.phasespace.WaveFunction} with {@link ladderwell.phasespace.Support} (what a pure state is here) and {@link
 * ladderwell.phasespace.NumberWave}, {@link ladderwell.phasespace.SampledWave}; {@link ladderwell.phasespace.NumberMatrix} (a mixed one)
 * and {@link ladderwell.phasespace.Displaced} (either of them far from the origin);
 * {@link ladderwell.phasespace.PhaseGrid}; {@link ladderwell.phasespace.PhaseFunctions}, which makes a {@link
 * ladderwell.phasespace.PhaseField}; then {@code Lattice}, {@code PureCorrelations}, {@code MixedCorrelations}, {@code Smoothed}
 * and {@code CoherentOverlaps}.
 *
 * @source E. Wigner, Phys. Rev. 40 (1932) 749; K. Husimi, Proc. Phys.-Math. Soc. Japan 22 (1940) 264; K. E. Cahill and R. J. Glauber, Phys.
 *     Rev. 177 (1969) 1882
 */
@NullMarked
package ladderwell.phasespace;

import org.jspecify.annotations.NullMarked;
