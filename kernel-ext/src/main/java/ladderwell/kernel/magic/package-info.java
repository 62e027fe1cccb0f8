/**
 * What the sentences do: one class per noun turns a sentence into a physics call and returns the value. A shorter way to
 * type what the Java API says in the same words; nothing here prints, and nothing has a path of its own.
 *
 * <p>Reading order: {@link ladderwell.kernel.magic.Declarations} (texts of sentences in, results out), {@code Magic} (what
 * a noun's class must do) and those classes, then the results: {@link ladderwell.kernel.magic.Declared}, {@link
 * ladderwell.kernel.magic.TableRead}, {@link ladderwell.kernel.magic.Animation}, {@link
 * ladderwell.kernel.magic.LevelTable}.
 */
@NullMarked
package ladderwell.kernel.magic;

import org.jspecify.annotations.NullMarked;
