/**
 * Arrays and special functions that know no physics: phases reduced exactly, ladder sums, matrix products, densities, Hermite functions.
 *
 * <p>Conventions. Complex numbers are split into {@code double[] re, im}; a table is an array of rows. A row over levels starts at
 * level {@code first}: entry i belongs to level {@code first + i}. Arrays handed in are not modified and not kept unless a method says so.
 * Long loops look at the thread's interrupt flag at least every 0.1 s; when it is set they clear it and throw
 * {@link java.util.concurrent.CancellationException}. Where the module {@code jdk.incubator.vector} is present, sums over rows use it;
 * without it plain loops give the same numbers within rounding. The number of threads never changes a bit of a result.
 *
 * <p>Reading order: {@link ladderwell.numeric.ExactPhases}, {@link ladderwell.numeric.LadderSums},
 * {@link ladderwell.numeric.MatrixProduct}, {@link ladderwell.numeric.DensityFrames}, {@link ladderwell.numeric.Workers},
 * {@link ladderwell.numeric.HermiteFunctions} (wave functions of any index), {@link ladderwell.numeric.DoubleDouble}; {@link ladderwell.numeric.HermitianTransform} and {@link
 * ladderwell.numeric.HermitianForm} (Fourier sums of rows and forms at mirrored places).
 */
@NullMarked
package ladderwell.numeric;

import org.jspecify.annotations.NullMarked;
