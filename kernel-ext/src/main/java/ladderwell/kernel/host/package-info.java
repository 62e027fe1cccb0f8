/**
 * Ladderwell in a Jupyter client: as a kernel of its own, and as a plugin in an existing Java kernel. The only package
 * that sees the protocol.
 *
 * <p>Reading order: {@link ladderwell.kernel.host.KernelMain} (starting and ending), {@code CellKernel} (what is
 * answered to each request), {@code CellMessages} and {@code Publisher} (what a running cell sends), {@code Messages}
 * (their form), {@code History}, {@code CodePoints}; {@link ladderwell.kernel.host.Plugin} stands alone.
 *
 * <p>The base library's own handlers leave out parts of the protocol (statuses, silent runs, user expressions, history,
 * aborting after an error) and stop at exceptions only, so each is replaced.
 */
@NullMarked
package ladderwell.kernel.host;

import org.jspecify.annotations.NullMarked;
