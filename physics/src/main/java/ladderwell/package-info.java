/**
 * The words a theorist types: oscillators, states, runs and what is read from them.
 */
@NullMarked
package ladderwell;

import org.jspecify.annotations.NullMarked;
