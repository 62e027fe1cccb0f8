/**
 * States as amplitudes on levels.
 *
 * <p>A <em>window</em> is a run of consecutive kept levels; a state keeps one or more of them ({@code segments}).
 * What is left out is always measured and carried as a guaranteed error.
 */
@NullMarked
package ladderwell.state;

import org.jspecify.annotations.NullMarked;
