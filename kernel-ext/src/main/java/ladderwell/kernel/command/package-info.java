/**
 * The command line: {@code ladderwell run}, {@code install}, {@code kernel}.
 *
 * <p>Reading order: {@link ladderwell.kernel.command.Ladderwell} (what {@code java -jar} reaches), {@link
 * ladderwell.kernel.command.RunCommand}, {@link ladderwell.kernel.command.InstallCommand} with {@link
 * ladderwell.kernel.command.KernelSpec} (what Jupyter finds) and {@link ladderwell.kernel.command.StartupArchive} (why
 * the kernel starts fast). Exit codes: 0 done, 1 a cell failed, 2 the command or its files are wrong, 130 interrupted.
 */
@NullMarked
package ladderwell.kernel.command;

import org.jspecify.annotations.NullMarked;
