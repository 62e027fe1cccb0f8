/** The classical motion of the same oscillators, in their scaled units. */
@NullMarked
package ladderwell.classical;

import org.jspecify.annotations.NullMarked;
