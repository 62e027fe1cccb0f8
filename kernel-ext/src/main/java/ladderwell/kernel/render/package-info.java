/**
 * What a cell returns, as the forms that clients can show: one class per kind of result, {@code text/plain} always.
 *
 * <p>{@link ladderwell.kernel.render.Renderings} finds the class for a value. Cards and tables are plain HTML that takes
 * ink and paper from the page; pictures come from {@code ladderwell.kernel.picture}.
 */
@NullMarked
package ladderwell.kernel.render;

import org.jspecify.annotations.NullMarked;
