/**
 * Measurements: JMH benchmarks of the kernels, each of which checks its answer before it is timed, and side-by-side runs against
 * NumPy/SciPy.
 *
 * <p>Reading order: {@link ladderwell.bench.Tasks} (what is measured, one entry a task), {@link ladderwell.bench.SideBySide} (how),
 * {@link ladderwell.bench.Partner} (the Python process on the other side).
 */
@NullMarked
package ladderwell.bench;

import org.jspecify.annotations.NullMarked;
