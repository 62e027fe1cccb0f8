/** What the sentences give: the values that their cells return. */
@NullMarked
package ladderwell.kernel.magic;

import org.jspecify.annotations.NullMarked;
